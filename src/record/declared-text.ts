// What is said of the specimens that the limits of a sheet leave.

import type { SheetSpread } from '../spread/index.ts';
import { shareText } from './yield-text.ts';

/** Sentences on every part with further limits: the share that is left, and limits that contradict each other. */
export function declaredSentences({ report, model }: SheetSpread): string[] {
  const rows = (cell: string): string =>
    model.cuts.flatMap((cut) => (cut.cell === cell ? [cut.name.slice(cell.length + 1)] : [])).join(', ');
  if (report.isEmpty) {
    const parts = report.parts.map(({ cell }) => `${cell} (${rows(cell)})`).join(', ');
    return [
      `The limits of ${parts} contradict each other: no specimen meets all of them. Nothing is said of what rests on it.`,
    ];
  }
  return report.parts.flatMap(({ cell, share, holdsNominal }) => {
    const outside = holdsNominal
      ? []
      : [`The nominal specimen of ${cell} does not meet ${rows(cell)}: its values stand outside of the declared set.`];
    const left =
      share === null
        ? []
        : [
            `${rows(cell)} of ${cell} cuts the declared set: ${shareText(share)} of the specimens that the other rows allow are left.`,
          ];
    return [...outside, ...left];
  });
}
