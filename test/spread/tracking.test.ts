// The fold law: marginals, distance and rank correlation as the design states them; and the laws of single draws.

import { describe, expect, test } from 'vitest';
import { drawKey, uniformAt } from '../../src/numeric/index.ts';
import { placeAt, quantileAt } from '../../src/spread/law.ts';
import { follow } from '../../src/spread/tracking.ts';
import { createSheet } from '../../src/sheet/index.ts';

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

  test.each(['', ' normal'])('the share below a place is the way back%s', (law) => {
    const [drawn] = createSheet(`R = 1 kohm ± 5 %${law}`).spreadModel().drawn;
    for (let u = 0.001; u < 1; u += 0.0171) {
      expect(quantileAt(drawn!, placeAt(drawn!.spread.law, u))).toBeCloseTo(u, 12);
    }
  });
});
