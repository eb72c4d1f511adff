// Choosing preferred values, in every decade and under float noise.

import { expect, test } from 'vitest';
import { nextPreferred, preferredValue, SERIES, SERIES_NAMES } from '../../src/quantity/index.ts';
import type { SeriesName } from '../../src/quantity/index.ts';
import { createDraw } from '../support/counter-random.ts';

test.each([
  ['E24', 1550, 'nearest', 1600], // by ratio: 1.5 and 1.6 meet at 1549.2
  ['E24', 1549, 'nearest', 1500],
  ['E24', 1510, 'up', 1600],
  ['E24', 1590, 'down', 1500],
  ['E24', 9.4, 'nearest', 9.1],
  ['E24', 9.6, 'nearest', 10], // across the decade
  ['E24', 9.2, 'up', 10],
  ['E24', 0.99, 'down', 0.91],
  ['E3', 3.2, 'nearest', 2.2], // √(2.2 · 4.7) = 3.2156
  ['E3', 3.22, 'nearest', 4.7],
  ['E3', 6.8, 'nearest', 4.7], // √(4.7 · 10) = 6.8557
  ['E3', 6.9, 'nearest', 10],
  ['E12', 1e-9, 'nearest', 1e-9],
  ['E96', 4.7e3, 'nearest', 4.75e3],
  ['E192', 919, 'nearest', 920],
  ['E192', 4.725e-12, 'down', 4.7e-12],
] as const)('in %s the value for %d, %s, is %d', (series, wanted, direction, value) => {
  expect(preferredValue(series, wanted, direction)).toBe(value);
});

test.each(SERIES_NAMES)(
  'each value of %s is its own answer in every decade, float noise of either sign included',
  (name) => {
    const wrong: number[] = [];
    for (let decade = -15; decade <= 12; decade++) {
      for (const printed of SERIES[name]) {
        const value = Number(`${printed}e${decade}`);
        for (const noisy of [value, value * (1 + 4e-16), value * (1 - 4e-16), value * (1 + 2e-14), value * (1 - 2e-14)])
          for (const direction of ['nearest', 'up', 'down'] as const)
            if (preferredValue(name, noisy, direction) !== value) wrong.push(noisy);
      }
    }
    expect(wrong).toEqual([]);
  },
);

test('what differs by more than the noise is rounded: 4700.00001 goes up to 5100', () => {
  expect(preferredValue('E24', 4700.00001, 'up')).toBe(5100);
  expect(preferredValue('E24', 4699.99999, 'down')).toBe(4300);
});

test('up is the least value not below, down the greatest not above, nearest the one with the smaller ratio', () => {
  const draw = createDraw(60063);
  const wrong: unknown[] = [];
  for (let i = 0; i < 20_000; i++) {
    const series = SERIES_NAMES[Math.floor(draw() * SERIES_NAMES.length)];
    const x = 10 ** (draw() * 24 - 14);
    const all = decadesAround(series, x);
    const up = all.find((value) => value >= x)!;
    const down = all.findLast((value) => value <= x)!;
    const nearest = Math.log(up / x) < Math.log(x / down) ? up : down;
    const found = (['up', 'down', 'nearest'] as const).map((direction) => preferredValue(series, x, direction));
    if (found[0] !== up || found[1] !== down || found[2] !== nearest) wrong.push([series, x, found]);
  }
  expect(wrong).toEqual([]);
});

test('the next value is never the value itself', () => {
  expect(nextPreferred('E24', 1000, 'down')).toBe(910);
  expect(nextPreferred('E24', 1000, 'up')).toBe(1100);
  expect(nextPreferred('E24', 910, 'up')).toBe(1000);
  expect(nextPreferred('E24', 1050, 'up')).toBe(1100);
  expect(nextPreferred('E24', 1050, 'down')).toBe(1000);
});

test('stepping up through a decade and down again passes every value once', () => {
  let value = 1e-9;
  const passed: number[] = [];
  for (let i = 0; i < 96; i++) passed.push((value = nextPreferred('E96', value, 'up')));
  expect(passed).toEqual([...SERIES.E96.slice(1).map((printed) => Number(`${printed}e-11`)), 1e-8]);
  for (let i = 0; i < 96; i++) value = nextPreferred('E96', value, 'down');
  expect(value).toBe(1e-9);
});

test.each([0, -4700, Infinity, NaN])('there is no preferred value for %d', (x) => {
  expect(() => preferredValue('E24', x, 'nearest')).toThrow(RangeError);
  expect(() => nextPreferred('E24', x, 'up')).toThrow(RangeError);
});

function decadesAround(series: SeriesName, x: number): number[] {
  const digits = series === 'E48' || series === 'E96' || series === 'E192' ? 2 : 1;
  const decade = Math.floor(Math.log10(x));
  return [-1, 0, 1, 2].flatMap((step) =>
    SERIES[series].map((printed) => Number(`${printed}e${decade + step - digits}`)),
  );
}
