// What is said about keeping: one short phrase in the status line, and the sentences of a banner.

import { timeText } from '../../storage/index.ts';
import type { KeepState } from '../../storage/index.ts';
import type { Origin } from '../session/index.ts';

/** `kept in this browser, 14:07`. */
export function keepWords(state: KeepState, origin: Origin, now: number): string {
  switch (state.state) {
    case 'kept':
      if (state.at === null)
        return origin === 'received' ? 'received copy, not kept yet' : 'not changed yet, so not kept';
      return `kept in this browser, ${timeText(state.at, now)}`;
    case 'keeping':
      return 'keeping ..';
    case 'not kept':
      return 'not kept';
    case 'elsewhere':
      return 'changed in another tab';
  }
}

/** Facts of the sheet beside its title: revision, status, and how well its inputs are sourced. */
export function inputWords(inputs: number, assumed: number, unsourced: number): string {
  const parts = [`${inputs} ${inputs === 1 ? 'input' : 'inputs'}`];
  const open = [];
  if (assumed > 0) open.push(`${assumed} assumed`);
  if (unsourced > 0) open.push(`${unsourced} without a source`);
  return open.length > 0 ? `${parts[0]}: ${open.join(', ')}` : parts[0]!;
}
