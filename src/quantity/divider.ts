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

/** The parallel resistance may be off by so much, as a factor to either side: pairs beyond are not looked at. */
const REACH = 10;
/** How much a share off the wanted ratio weighs against a share off the wanted parallel resistance. */
const RATIO_WEIGHT = 10;

/**
 * The best pairs, the best first. Ranked by 10 |error of the ratio| + |error of the parallel resistance|, both as shares: the
 * ratio sets a voltage, the parallel resistance only loads what drives it. Throws RangeError unless 0 < ratio < 1 and the
 * parallel resistance is positive and finite.
 */
export function dividerPairs({ ratio, parallel, series }: WantedDivider, count: number): DividerPair[] {
  if (!(ratio > 0 && ratio < 1)) throw new RangeError(`no divider has the ratio ${ratio}`);
  if (!(parallel > 0 && parallel < Infinity)) throw new RangeError(`no divider looks like ${parallel} ohm`);
  const found: DividerPair[] = [];
  // Exact pairs have upper = parallel / ratio and lower = parallel / (1 - ratio).
  const uppers = preferredBetween(series, parallel / ratio / REACH, (parallel / ratio) * REACH);
  for (const upper of uppers) {
    // With this upper one, the lower one of the wanted ratio, and its neighbours.
    const lower = (upper * ratio) / (1 - ratio);
    const below = preferredValue(series, lower, 'down');
    for (const each of [nextPreferred(series, below, 'down'), below, nextPreferred(series, below, 'up')])
      found.push(pairOf(upper, each, ratio, parallel));
  }
  return found.toSorted((a, b) => rank(a) - rank(b)).slice(0, count);
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

function rank({ ratioError, parallelError }: DividerPair): number {
  return RATIO_WEIGHT * Math.abs(ratioError) + Math.abs(parallelError);
}

function preferredBetween(series: SeriesName, low: number, high: number): number[] {
  const values: number[] = [];
  for (let value = preferredValue(series, low, 'up'); value <= high; value = nextPreferred(series, value, 'up'))
    values.push(value);
  return values;
}
