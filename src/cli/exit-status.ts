// What the exit status says of a sheet.

import type { Verdict } from '../record/index.ts';

export const EXIT = { holds: 0, checkFails: 1, incomplete: 2, notComputed: 3, ownFault: 70 } as const;

/** 0 all checks hold (or nothing is required), 1 one fails, 2 something is broken or has no value, which comes before 1. */
export function exitStatus(verdict: Verdict): number {
  switch (verdict.state) {
    case 'incomplete':
      return EXIT.incomplete;
    case 'fails':
      return EXIT.checkFails;
    default:
      return EXIT.holds;
  }
}
