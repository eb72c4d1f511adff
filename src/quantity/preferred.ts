// The preferred value nearest to a wanted one, in any decade.

import type { SeriesName } from './e-series.ts';
import { SERIES } from './e-series.ts';

export type PreferredDirection = 'nearest' | 'up' | 'down';

/** Digits to which a wanted value is read: closer to a preferred value than 5e-13 of it counts as that value. */
const READ_DIGITS = 13;

/** Where a value stands in its series: index in the decade, and the decade's power of ten. */
interface Place {
  readonly index: number;
  readonly decade: number;
}

/**
 * The preferred value nearest to `x` by ratio, or the next one not below (`up`) or not above it (`down`). A value of
 * the series is its own answer whatever the float noise. Throws RangeError unless 0 < x < infinity.
 */
export function preferredValue(series: SeriesName, x: number, direction: PreferredDirection): number {
  const { below, exact, wanted } = locate(series, x);
  if (exact || direction === 'down') return valueAt(series, below);
  const above = stepPlace(series, below, 1);
  if (direction === 'up') return valueAt(series, above);
  // wanted / below < above / wanted, in whole numbers; no two neighbours have a rational mean, so there is no tie.
  const [low, high] = [integerAt(series, below, below.decade), integerAt(series, above, below.decade)];
  const nearBelow = BigInt(wanted) ** 2n < BigInt(low) * BigInt(high);
  return valueAt(series, nearBelow ? below : above);
}

/** The preferred value next above (`up`) or below (`down`) `x`, never x itself. Throws RangeError unless 0 < x < infinity. */
export function nextPreferred(series: SeriesName, x: number, direction: 'up' | 'down'): number {
  const { below, exact } = locate(series, x);
  if (direction === 'up') return valueAt(series, stepPlace(series, below, 1));
  return valueAt(series, exact ? stepPlace(series, below, -1) : below);
}

function locate(series: SeriesName, x: number): { below: Place; exact: boolean; wanted: number } {
  if (!(x > 0 && x < Infinity)) throw new RangeError(`no preferred value near ${x}`);
  const [mantissa, exponent] = x.toExponential(READ_DIGITS - 1).split('e') as [string, string];
  const decade = Number(exponent);
  const wanted = Number(mantissa.replace('.', ''));
  const unit = unitOfSeries(series);
  // The last value not above; every series begins with the decade itself, so there is one.
  const index = SERIES[series].findLastIndex((printed) => printed * unit <= wanted);
  const below = { index, decade };
  return { below, exact: integerAt(series, below, decade) === wanted, wanted };
}

function stepPlace(series: SeriesName, { index, decade }: Place, step: 1 | -1): Place {
  const count = SERIES[series].length;
  const next = index + step;
  if (next === count) return { index: 0, decade: decade + 1 };
  return next < 0 ? { index: count - 1, decade: decade - 1 } : { index: next, decade };
}

/** The value in units of the last of 13 digits of `inDecade`, its own decade or the one below. */
function integerAt(series: SeriesName, { index, decade }: Place, inDecade: number): number {
  return SERIES[series][index] * unitOfSeries(series) * (decade > inDecade ? 10 : 1);
}

/** The last printed digit of the series in units of the last of 13 digits: 10^11 or 10^10. */
function unitOfSeries(series: SeriesName): number {
  return SERIES[series][0] === 10 ? 1e11 : 1e10;
}

function valueAt(series: SeriesName, { index, decade }: Place): number {
  const printedDigits = SERIES[series][0] === 10 ? 2 : 3;
  return Number(`${SERIES[series][index]}e${decade - printedDigits + 1}`);
}
