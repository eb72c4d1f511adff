// Where a build stands within what the sheet declares: each draw at a number from -1, its low end, over 0, its nominal, to
// 1, its high end. A draw with an open end stays at its nominal on that side.

import type { Drawn } from '../sheet/index.ts';

/** One number from -1 to 1 for each draw. */
export type Position = Float64Array;

/** The value of a draw at t in -1..1, SI; exact at the ends and at the nominal. */
export function valueAt({ spread: { low, nominal, high } }: Drawn, t: number): number {
  if (t === 0) return nominal;
  const end = t < 0 ? low : high;
  if (end === null) return nominal;
  return Math.abs(t) === 1 ? end : nominal + Math.abs(t) * (end - nominal);
}

/** Fills a column with the values of a draw at some places within its ends. */
export function fillValues(
  { spread: { low, nominal, high } }: Drawn,
  places: Float64Array,
  count: number,
  values: Float64Array,
): void {
  const below = low === null ? 0 : low - nominal;
  const above = high === null ? 0 : high - nominal;
  for (let i = 0; i < count; i++) {
    const t = places[i]!;
    values[i] = t < 0 ? nominal - t * below : nominal + t * above;
  }
}

/** Fills columns, one per draw, with the values of some positions. */
export function fillColumns(
  drawn: readonly Drawn[],
  positions: readonly Position[],
  from: number,
  count: number,
  column: (k: number) => Float64Array,
): void {
  for (let k = 0; k < drawn.length; k++) {
    const values = column(k);
    for (let i = 0; i < count; i++) values[i] = valueAt(drawn[k]!, positions[from + i]![k]!);
  }
}
