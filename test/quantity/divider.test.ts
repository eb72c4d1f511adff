// Divider pairs against every pair of the series, and against a divider of a handbook's kind.

import { describe, expect, it } from 'vitest';
import { dividerPairs, nextPreferred, SERIES, SERIES_NAMES } from '../../src/quantity/index.ts';
import type { SeriesName } from '../../src/quantity/index.ts';
import { createDraw } from '../support/counter-random.ts';

/** The least 10 |ratio error| + |parallel error| over every pair of a series within four decades. */
function least(ratio: number, parallel: number, series: SeriesName): number {
  const values: number[] = [];
  for (let value = parallel / 10; value < parallel * 1e4; values.push(value))
    value = nextPreferred(series, value, 'up');
  let best = Infinity;
  for (const upper of values) {
    for (const lower of values) {
      const off = (x: number, y: number): number => Math.abs(x / y - 1);
      const error = 10 * off(lower / (upper + lower), ratio) + off((upper * lower) / (upper + lower), parallel);
      best = Math.min(best, error);
    }
  }
  return best;
}

describe.each(SERIES_NAMES.filter((name) => name !== 'E192'))('of %s', (series) => {
  it.each([
    [0.5, 1e5],
    [0.3, 47e3],
    [0.07, 1e4],
    [0.91, 250],
    [0.402, 1.234e6],
  ])('the best pair for a ratio of %f and %f ohm is that of all pairs', (ratio, parallel) => {
    const [best] = dividerPairs({ ratio, parallel, series }, 3);
    const error = 10 * Math.abs(best!.ratioError) + Math.abs(best!.parallelError);
    expect(error).toBeLessThanOrEqual(least(ratio, parallel, series) * (1 + 1e-12) + 1e-15);
  });
});

describe.each(SERIES_NAMES)('the list of %s', (series) => {
  it('is the head of all pairs within a factor of ten of the exact resistors, in the order of their rank', () => {
    const draw = createDraw(63);
    for (let n = 0; n < 6; n++) {
      const wanted = { ratio: 0.05 + 0.9 * draw(), parallel: 10 ** (2 + 5 * draw()) };
      const found = dividerPairs({ ...wanted, series }, 7).map(({ upper, lower }) => [upper, lower]);
      // The n-th want of seed 63.
      expect({ n, found }).toEqual({ n, found: ranked(series, wanted).slice(0, 7) });
    }
  });
});

/** Every pair of a table of values over eleven decades, sorted. */
function ranked(series: SeriesName, wanted: { ratio: number; parallel: number }): number[][] {
  const digits = SERIES[series][0] === 10 ? 1 : 2;
  const values = Array.from({ length: 11 }, (_, decade) =>
    SERIES[series].map((printed) => Number(`${printed}e${decade - digits}`)),
  ).flat();
  const near = (exact: number): number[] => values.filter((value) => value >= exact / 10 && value <= exact * 10);
  return near(wanted.parallel / wanted.ratio)
    .flatMap((upper) =>
      near(wanted.parallel / (1 - wanted.ratio)).map((lower) => {
        const ratio = lower / (upper + lower);
        const rank = 10 * Math.abs(ratio / wanted.ratio - 1) + Math.abs((upper * ratio) / wanted.parallel - 1);
        return [rank, upper, lower];
      }),
    )
    .toSorted((a, b) => a[0]! - b[0]! || a[1]! - b[1]!)
    .map(([, upper, lower]) => [upper!, lower!]);
}

it('pairs say what they come to, the best first', () => {
  const pairs = dividerPairs({ ratio: 1 / 3, parallel: 66.7e3, series: 'E24' }, 6);
  expect(pairs).toHaveLength(6);
  expect(pairs[0]).toMatchObject({ upper: 200e3, lower: 100e3 });
  expect(pairs[0]!.ratioError).toBeCloseTo(0, 12);
  expect(pairs[0]!.parallelError).toBeCloseTo(66.666e3 / 66.7e3 - 1, 4);
  const ranks = pairs.map(({ ratioError, parallelError }) => 10 * Math.abs(ratioError) + Math.abs(parallelError));
  expect(ranks).toEqual(ranks.toSorted((a, b) => a - b));
  for (const { upper, lower, ratio, parallel } of pairs) {
    expect(ratio).toBeCloseTo(lower / (upper + lower), 12);
    expect(1 / parallel).toBeCloseTo(1 / upper + 1 / lower, 15);
  }
});

it('what no divider can be is refused', () => {
  for (const ratio of [0, 1, -0.5, 2, NaN])
    expect(() => dividerPairs({ ratio, parallel: 1e4, series: 'E24' }, 1)).toThrow(RangeError);
  for (const parallel of [0, -1, Infinity, NaN])
    expect(() => dividerPairs({ ratio: 0.5, parallel, series: 'E24' }, 1)).toThrow(RangeError);
});
