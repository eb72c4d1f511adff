// The fold law: marginals, distance and rank correlation as the design states them; and the laws of single draws.

import { describe, expect, test } from 'vitest';
import { drawKey, uniformAt } from '../../src/numeric/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import type { Drawn } from '../../src/sheet/index.ts';
import { placeAt, quantileAt } from '../../src/spread/law.ts';
import { fillValues, valueAt } from '../../src/spread/position.ts';
import { follow } from '../../src/spread/tracking.ts';

const N = 40_000;
const [uKey, rKey] = [drawKey(3, 'u'), drawKey(3, 'r')];
const pairs = (t: number): [number, number][] =>
  Array.from({ length: N }, (_, i) => {
    const u = uniformAt(uKey, i, 0);
    return [u, follow(u, 2 * uniformAt(rKey, i, 0) - 1, t)];
  });

/** Largest distance of the sample's distribution from the even one (Kolmogorov, Smirnov), times sqrt(n). */
function unevenness(values: readonly number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  return Math.sqrt(N) * Math.max(...sorted.map((v, i) => Math.abs(v - (i + 0.5) / N)));
}

function correlation(both: readonly [number, number][]): number {
  // Both are even in 0..1, so ranks and values correlate alike.
  return 12 * (both.reduce((sum, [u, v]) => sum + (u - 0.5) * (v - 0.5), 0) / N);
}

describe.each([0, 0.25, 0.5, 0.8, 1, -0.3, -0.7, -1])('at a tracking of %d', (t) => {
  const both = pairs(t);
  const w = 1 - Math.abs(t);

  test('both keep their own law', () => {
    // 1.95 is passed once in a thousand times (Smirnov 1948).
    expect(unevenness(both.map(([, v]) => v))).toBeLessThan(1.95);
  });

  test('they are never further apart than declared', () => {
    for (const [u, v] of both) expect(Math.abs(u - (t < 0 ? 1 - v : v))).toBeLessThanOrEqual(w + 1e-15);
  });

  test('the rank correlation is 1 - 2 w² + w³', () => {
    const expected = 1 - 2 * w ** 2 + w ** 3;
    expect(Math.abs(correlation(both) - (t < 0 ? -expected : expected))).toBeLessThan(0.02);
  });
});

test("at a tracking of 0 the two fill a square evenly, at 1 they are one, at -1 each other's mirror image", () => {
  const counts = Array.from({ length: 20 * 20 }, () => 0);
  for (const [u, v] of pairs(0)) counts[Math.floor(20 * u) * 20 + Math.floor(20 * v)]!++;
  const chiSquare = counts.reduce((sum, count) => sum + (count - N / 400) ** 2 / (N / 400), 0);
  // 399 degrees of freedom: four standard deviations, sqrt(2 * 399) each.
  expect(Math.abs(chiSquare - 399)).toBeLessThan(113);
  for (const [u, v] of pairs(1)) expect(v).toBe(u);
  for (const [u, v] of pairs(-1)) expect(v).toBe(1 - u);
});

test('what follows stays in 0..1 at the ends of both draws', () => {
  const least = 2 ** -33;
  for (const t of [-1, -0.9999, -0.5, -0.1, 0, 0.1, 0.5, 0.9999, 1]) {
    for (const u of [0, least, 0.5, 1 - least, 1]) {
      for (const r of [-1, 2 * least - 1, 0, 1 - 2 * least, 1]) {
        const v = follow(u, r, t);
        expect(v).toBeGreaterThanOrEqual(0);
        expect(v).toBeLessThanOrEqual(1);
      }
    }
  }
});

describe('laws', () => {
  test('an even law fills its limits evenly', () => {
    expect([0, 0.25, 0.5, 1].map((u) => placeAt('uniform', u))).toEqual([-1, -0.5, 0, 1]);
  });

  test('a normal law has its limits at three standard deviations, and nothing beyond', () => {
    expect(placeAt('normal', 0)).toBeCloseTo(-1, 13);
    expect(placeAt('normal', 0.5)).toBe(0);
    expect(placeAt('normal', 1)).toBeCloseTo(1, 13);
    // One standard deviation is a third of the way; 0.8413 of an uncut normal lie below it (common tables).
    const below = (0.841344746068543 - 0.00134989803163009) / (1 - 2 * 0.00134989803163009);
    expect(placeAt('normal', below)).toBeCloseTo(1 / 3, 12);
  });

  const column = (drawn: Drawn, places: readonly number[]): number[] => {
    const values = new Float64Array(places.length);
    fillValues(drawn, Float64Array.from(places), places.length, values);
    return [...values];
  };
  const LIMITS = [
    '1 kohm ± 5 %',
    '1 kohm ± 5 % normal',
    '0.3 ohm in 0.1 ohm .. 0.7 ohm',
    '2 V in -3 V .. 1e6 V',
    '3 V ± 1e-13 V',
  ];

  test.each(LIMITS)('no draw leaves its limits, and a column holds what its draws hold one by one: %s', (entry) => {
    const [drawn] = createSheet(`x = ${entry}`).spreadModel().drawn;
    const { law, low, high } = drawn!.spread;
    const shares = [2 ** -33, 2 ** -32, 1e-6, 0.25, 0.5 - 2 ** -33, 0.5 + 2 ** -33, 0.9, 1 - 2 ** -32, 1 - 2 ** -33];
    const places = shares.map((u) => placeAt(law, u));
    const values = column(drawn!, places);
    expect(values).toEqual(places.map((t) => valueAt(drawn!, t)));
    expect(values).toEqual(values.toSorted((a, b) => a - b));
    expect(values[0]).toBeGreaterThanOrEqual(low!);
    expect(values.at(-1)).toBeLessThanOrEqual(high!);
  });

  test.each(LIMITS)('its ends and its nominal are met to the last bit: %s', (entry) => {
    const [drawn] = createSheet(`x = ${entry}`).spreadModel().drawn;
    const { low, nominal, high } = drawn!.spread;
    expect([-1, 0, 1].map((t) => valueAt(drawn!, t))).toEqual([low, nominal, high]);
  });

  test('with limits about a nominal half of the units lie evenly below it and half evenly above', () => {
    const [drawn] = createSheet('R = 2 kohm in 1 kohm .. 9 kohm').spreadModel().drawn;
    const places = Array.from({ length: N }, (_, i) => placeAt('uniform', uniformAt(uKey, i, 0)));
    const values = column(drawn!, places);
    const eighths = [1000, 1250, 1500, 1750, 2000, 3750, 5500, 7250, 9000];
    for (let k = 0; k < 8; k++) {
      const count = values.filter((value) => value >= eighths[k]! && value < eighths[k + 1]!).length;
      // An eighth each, four standard deviations.
      expect(Math.abs(count - N / 8)).toBeLessThan(4 * Math.sqrt((N * 7) / 64));
    }
  });

  test.each(['', ' normal'])('the share below a place is the way back%s', (law) => {
    const [drawn] = createSheet(`R = 1 kohm ± 5 %${law}`).spreadModel().drawn;
    for (let u = 0.001; u < 1; u += 0.0171) {
      expect(quantileAt(drawn!, placeAt(drawn!.spread.law, u))).toBeCloseTo(u, 12);
    }
  });
});
