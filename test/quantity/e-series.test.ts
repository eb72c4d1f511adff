// The preferred numbers against the published tables.

import { expect, test } from 'vitest';
import { SERIES, SERIES_NAMES } from '../../src/quantity/index.ts';
import { PUBLISHED } from './published-series.ts';

const COUNTS = { E3: 3, E6: 6, E12: 12, E24: 24, E48: 48, E96: 96, E192: 192 };

test.each(SERIES_NAMES)('%s is the published table, value for value', (name) => {
  expect(SERIES[name].join(' ')).toBe(PUBLISHED[name]);
  expect(SERIES[name]).toHaveLength(COUNTS[name]);
});

test.each([
  ['E3', 'E6'],
  ['E6', 'E12'],
  ['E12', 'E24'],
  ['E48', 'E96'],
  ['E96', 'E192'],
] as const)('%s is every second value of %s', (coarse, fine) => {
  expect(SERIES[coarse]).toEqual(SERIES[fine].filter((_, i) => i % 2 === 0));
});

test.each(['E48', 'E96', 'E192'] as const)('%s is the rounded geometric series, with the one exception 920', (name) => {
  const count = COUNTS[name];
  const ruled = SERIES[name].map((_, i) => Math.round(100 * 10 ** (i / count)));
  const exceptions = SERIES[name].flatMap((value, i) => (value === ruled[i] ? [] : [[i, ruled[i], value]]));
  expect(exceptions).toEqual(name === 'E192' ? [[185, 919, 920]] : []);
});

test('eight values of E24 are not those of the rounded geometric series', () => {
  const off = SERIES.E24.filter((value, i) => value !== Math.round(10 * 10 ** (i / 24)));
  expect(off).toEqual([27, 30, 33, 36, 39, 43, 47, 82]);
});

test('thirteen values of E24 are not in E192', () => {
  const missing = SERIES.E24.filter((value) => !SERIES.E192.includes(value * 10));
  expect(missing).toEqual([22, 27, 30, 33, 36, 39, 43, 51, 56, 62, 68, 82, 91]);
});

test.each(SERIES_NAMES)(
  'no two neighbours of %s have a rational geometric mean, so that nearest has no tie',
  (name) => {
    const series = SERIES[name];
    const ties = series.filter((value, i) => Number.isInteger(Math.sqrt(value * (series[i + 1] ?? series[0] * 10))));
    expect(ties).toEqual([]);
  },
);
