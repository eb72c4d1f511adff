// Pairs of preferred resistors for a divider: a wanted ratio, and a wanted resistance of both in parallel.

import type { SeriesName } from './e-series.ts';
import { nextPreferred, preferredValue } from './preferred.ts';

interface WantedDivider {
  /** Lower resistor over the sum of both, between 0 and 1. */
  readonly ratio: number;
  /** Both in parallel, in ohms: what the divider looks like from its tap. */
  readonly parallel: number;
  readonly series: SeriesName;
}

export interface DividerPair {
  /** Ohms, from the supply to the tap and from the tap down. */
  readonly upper: number;
  readonly lower: number;
  readonly ratio: number;
  readonly parallel: number;
  /** How far off the wanted ones they are, as a share of these, with its sign. */
  readonly ratioError: number;
  readonly parallelError: number;
}

/** How far each resistor may be from its exact value, as a factor to either side: pairs beyond are not looked at. */
const REACH = 10;
/** How much a share off the wanted ratio weighs against a share off the wanted parallel resistance. */
const RATIO_WEIGHT = 10;

/**
 * The best pairs, the best first, of all whose resistors lie within a factor of ten of the exact ones. Ranked by
 * 10 |error of the ratio| + |error of the parallel resistance|, both as shares: the ratio sets a voltage, the parallel
 * resistance only loads what drives it. Of pairs that rank alike the one with the smaller upper resistor comes first. Throws
 * RangeError unless 0 < ratio < 1 and the parallel resistance is positive and finite.
 */
export function dividerPairs({ ratio, parallel, series }: WantedDivider, count: number): DividerPair[] {
  if (!(ratio > 0 && ratio < 1)) throw new RangeError(`no divider has the ratio ${ratio}`);
  if (!(parallel > 0 && parallel < Infinity)) throw new RangeError(`no divider looks like ${parallel} ohm`);
  // Exact pairs have upper = parallel / ratio and lower = parallel / (1 - ratio).
  const uppers = preferredAround(series, parallel / ratio);
  const lowers = preferredAround(series, parallel / (1 - ratio));
  const ranks = new Float64Array(uppers.length * lowers.length);
  for (let u = 0, at = 0; u < uppers.length; u++) {
    const upper = uppers[u]!;
    for (let l = 0; l < lowers.length; l++, at++) {
      const own = lowers[l]! / (upper + lowers[l]!);
      ranks[at] = RATIO_WEIGHT * Math.abs(own / ratio - 1) + Math.abs((upper * own) / parallel - 1);
    }
  }
  return leastOf(ranks, count).map((at) => {
    return pairOf(uppers[Math.floor(at / lowers.length)]!, lowers[at % lowers.length]!, ratio, parallel);
  });
}

function pairOf(upper: number, lower: number, ratio: number, parallel: number): DividerPair {
  const own = lower / (upper + lower);
  const both = (upper * lower) / (upper + lower);
  return {
    upper,
    lower,
    ratio: own,
    parallel: both,
    ratioError: own / ratio - 1,
    parallelError: both / parallel - 1,
  };
}

/** The values of a series within the reach of an exact one. */
function preferredAround(series: SeriesName, exact: number): Float64Array {
  const values: number[] = [];
  for (let value = preferredValue(series, exact / REACH, 'up'); value <= exact * REACH;) {
    values.push(value);
    value = nextPreferred(series, value, 'up');
  }
  return Float64Array.from(values);
}

/** Where the least ranks stand, in their order: one pass with a short sorted list. */
function leastOf(ranks: Float64Array, count: number): number[] {
  const least: number[] = [];
  for (let at = 0; at < ranks.length; at++) {
    if (least.length === count && !(ranks[at]! < ranks[least[count - 1]!]!)) continue;
    let place = least.length;
    while (place > 0 && ranks[least[place - 1]!]! > ranks[at]!) place--;
    least.splice(place, 0, at);
    if (least.length > count) least.pop();
  }
  return least;
}
