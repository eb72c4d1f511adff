// Preferred values for a bias: a source resistor, and a divider whose voltage stays in a window.

import { gateWindow } from '../../network/index.ts';
import type { BandPoints } from '../../network/index.ts';
import { dividerPairs, formatValue, nextPreferred, preferredValue, RESISTANCE } from '../../quantity/index.ts';
import type { DividerPair, SeriesName } from '../../quantity/index.ts';
import { MOST_GATE } from './band-target.ts';
import type { Target } from './band-target.ts';
import type { BandWish } from './band-wish.ts';

/** Divider pairs looked at for one whose voltage lies in the window, and how far their parallel resistance may be off, as a factor. */
const PAIRS = 300;
const PARALLEL_OFF = 2;
/** Values above the least source resistance that are tried for a divider in their window. */
const STEPS = 4;
/** A resistor above this is seldom stocked, ohms (common practice, no source). */
const MOST_STOCKED = 22e6;

/** The least preferred source resistance that has a divider of preferred values in its window, else the least with the nearest. */
export function preferredLine(
  points: BandPoints,
  target: Target,
  wish: BandWish,
): { readonly ohms: number; readonly pair: DividerPair; readonly isInside: boolean } {
  const most = MOST_GATE * wish.rails.height;
  let ohms = preferredValue(wish.series, target.ohms, target.isLeast ? 'up' : 'nearest');
  let first: ReturnType<typeof preferredLine> | null = null;
  for (let step = 0; step < STEPS; step++) {
    const { low, high } = gateWindow(points, ohms, target.allowance);
    const window = { low: Math.max(low, 0), high: Math.min(high, most) };
    const isOpen = window.low <= window.high;
    const { pair, isInside } = pairFor(
      isOpen ? (window.low + window.high) / 2 : Math.min(target.V_GG, most),
      window,
      wish,
    );
    first ??= { ohms, pair, isInside };
    if (isInside) return { ohms, pair, isInside };
    if (!target.isLeast) break;
    ohms = nextPreferred(wish.series, ohms, 'up');
  }
  return first!;
}

/** The preferred value nearest to one that lies in a window, else the nearest. */
export function preferredIn(series: SeriesName, wanted: number, { low, high }: { low: number; high: number }): number {
  const [nearest, up, down] = (['nearest', 'up', 'down'] as const).map((way) => preferredValue(series, wanted, way));
  return [nearest!, up!, down!].find((value) => value >= low && value <= high) ?? nearest!;
}

/** The divider for a gate voltage: the best ranked one that stays in the window, else the best; and whether it does. */
export function pairFor(
  V_GG: number,
  { low, high }: { low: number; high: number },
  wish: BandWish,
): { readonly pair: DividerPair; readonly isInside: boolean } {
  const { height } = wish.rails;
  const pairs = dividerPairs({ ratio: V_GG / height, parallel: wish.gateOhms, series: wish.series }, PAIRS);
  const inside = pairs.find(({ ratio, parallel }) => {
    const off = Math.max(parallel / wish.gateOhms, wish.gateOhms / parallel);
    return ratio * height >= low && ratio * height <= high && off <= PARALLEL_OFF;
  });
  return { pair: inside ?? pairs[0]!, isInside: inside !== undefined };
}

/** What is said of a divider resistor that is seldom stocked; null of another. */
export function tooLarge(ohms: number): string | null {
  if (ohms <= MOST_STOCKED) return null;
  return `A divider resistor of ${formatValue(ohms, RESISTANCE, { zeros: 'drop' }).text} is seldom stocked; with less resistance at the gate both are smaller.`;
}
