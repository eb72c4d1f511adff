// Draws, moments, quantiles and intervals against printed tables, exact arithmetic and jStat (a general statistics library).

import { jStat } from 'jstat';
import { describe, expect, test } from 'vitest';
import {
  addColumn,
  addMoments,
  binomialInterval,
  createMoments,
  drawKey,
  fillUniform,
  normalQuantile,
  normalShare,
  quantileOf,
  uniformAt,
} from '../../src/numeric/index.ts';

const draws = (name: string, count: number, first = 0, attempt = 0, seed = 1): Float64Array => {
  const out = new Float64Array(count);
  fillUniform(out, count, drawKey(seed, name), first, attempt);
  return out;
};

/** Chi-square of counts against equal shares, in standard deviations from its mean. */
function chiSquareSigmas(counts: readonly number[], total: number): number {
  const expected = total / counts.length;
  const chi = counts.reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
  const freedom = counts.length - 1;
  return (chi - freedom) / Math.sqrt(2 * freedom);
}

describe('draws', () => {
  test('a portion holds the same draws as its samples one by one', () => {
    const key = drawKey(7, 'R_S');
    expect([...draws('R_S', 50, 4_294_967_200, 3, 7)]).toEqual(
      Array.from({ length: 50 }, (_, i) => uniformAt(key, 4_294_967_200 + i, 3)),
    );
  });

  test('draws stay what they were: three of them by number', () => {
    const key = drawKey(1, 'Q1.I_DSS');
    expect([0, 1, 4711].map((sample) => uniformAt(key, sample, 0))).toMatchInlineSnapshot(`
      [
        0.3263797623803839,
        0.24955648847389966,
        0.6294629002222791,
      ]
    `);
  });

  test.each(['R_S', 'Q1.I_DSS', 'β'])('those of %s are even and lie within 0..1', (name) => {
    const all = draws(name, 262_144);
    const counts = Array.from({ length: 1024 }, () => 0);
    for (const u of all) counts[Math.floor(u * 1024)]!++;
    expect(Math.abs(chiSquareSigmas(counts, all.length))).toBeLessThan(4);
    expect(Math.min(...all.subarray(0, 65_536))).toBeGreaterThan(0);
    expect(Math.max(...all.subarray(0, 65_536))).toBeLessThan(1);
  });

  test.each([
    ['neighbouring samples', draws('R_S', 262_144), draws('R_S', 262_144, 1)],
    ['two names', draws('R_Da', 262_144), draws('R_Db', 262_144)],
    ['two seeds', draws('R_Da', 262_144), draws('R_Da', 262_144, 0, 0, 2)],
    ['two attempts', draws('R_Da', 262_144), draws('R_Da', 262_144, 0, 1)],
  ])('%s are independent: pairs fill a square evenly', (_, a, b) => {
    const counts = Array.from({ length: 32 * 32 }, () => 0);
    for (let i = 0; i < a.length; i++) counts[Math.floor(a[i]! * 32) * 32 + Math.floor(b[i]! * 32)]!++;
    expect(Math.abs(chiSquareSigmas(counts, a.length))).toBeLessThan(4);
  });

  test('one bit of sample or seed changes half of the bits of a draw', () => {
    const bits = (u: number): number => (u * 2 ** 32) >>> 0;
    let flips = 0;
    let looked = 0;
    for (let n = 0; n < 2000; n++) {
      const key = drawKey(n, 'R_S');
      for (let bit = 0; bit < 32; bit++) {
        for (const other of [
          uniformAt(key, (n ^ (1 << bit)) >>> 0, 0),
          uniformAt(drawKey(n ^ (1 << bit), 'R_S'), n, 0),
        ]) {
          for (let x = bits(uniformAt(key, n, 0)) ^ bits(other); x !== 0; x &= x - 1) flips++;
          looked += 32;
        }
      }
    }
    expect(Math.abs(flips / looked - 0.5)).toBeLessThan(0.002);
  });

  test('one bit of a letter, or one letter more, changes half of the bits of a draw', () => {
    const bits = (name: string, n: number): number => (uniformAt(drawKey(1, name), n, 0) * 2 ** 32) >>> 0;
    let flips = 0;
    let looked = 0;
    for (let n = 0; n < 2000; n++) {
      const name = `Q${n}.I_DSS`;
      const others = [`${name}2`, `${name}\u0000`, `R${n}.I_DSS`];
      for (let bit = 0; bit < 16; bit++) {
        others.push(`${name.slice(0, -1)}${String.fromCharCode(name.charCodeAt(name.length - 1) ^ (1 << bit))}`);
      }
      for (const other of others) {
        for (let x = bits(name, n) ^ bits(other, n); x !== 0; x &= x - 1) flips++;
        looked += 32;
      }
    }
    // Four standard deviations of so many tosses are 0.0018.
    expect(Math.abs(flips / looked - 0.5)).toBeLessThan(0.002);
  });

  test('no two of a thousand names have a draw in common', () => {
    const names = Array.from({ length: 1000 }, (_, i) => `R_${i}`);
    // Among 1000 draws of 32 bits a pair is alike once in 8600 times.
    for (const sample of [0, 1, 2 ** 31, 2 ** 32 - 1]) {
      expect(new Set(names.map((name) => uniformAt(drawKey(1, name), sample, 0))).size).toBe(1000);
    }
  });
});

describe('the normal law', () => {
  // The values printed with the algorithm to try an implementation by: M. J. Wichura, Applied Statistics 37 (1988).
  test.each([
    [0.25, '-0.6744897501960817'],
    [0.001, '-3.090232306167814'],
    [1e-20, '-9.262340089798408'],
  ])('its quantile at %d is the printed %s', (p, printed) => {
    expect(Math.abs(normalQuantile(p) / Number(printed) - 1)).toBeLessThan(4e-16);
  });

  test('quantile and share undo each other over all that is drawn', () => {
    // An error of the share is one of the quantile divided by the density, which is least at the ends: 4.4e-3.
    for (let i = 0; i <= 4000; i++) {
      const x = -3 + (6 * i) / 4000;
      expect(Math.abs(normalQuantile(normalShare(x)) - x)).toBeLessThan(
        1e-15 / (0.3989 * Math.exp((-x * x) / 2)) + 1e-15,
      );
    }
  });

  test('the quantile never falls, across the seams of its formulas too', () => {
    for (const seam of [0.075, 0.925, Math.exp(-25), 0.5]) {
      let before = -Infinity;
      for (let i = -200; i <= 200; i++) {
        const z = normalQuantile(seam * (1 + i * 1e-13));
        expect(z).toBeGreaterThanOrEqual(before);
        before = z;
      }
    }
  });

  // Percentage points of the normal distribution as printed in Abramowitz and Stegun, table 26.5 (from memory).
  test.each([
    [0.9, 1.28155],
    [0.95, 1.64485],
    [0.975, 1.95996],
    [0.99, 2.32635],
    [0.995, 2.57583],
    [0.999, 3.09023],
  ])('%d of all lie below the printed %d', (p, z) => {
    expect(normalQuantile(p)).toBeCloseTo(z, 5);
    expect(normalShare(normalQuantile(p))).toBeCloseTo(p, 14);
    expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 12);
  });

  test('jStat agrees', () => {
    for (let p = 0.001; p < 1; p += 0.0137) {
      expect(Math.abs(normalQuantile(p) - jStat.normal.inv(p, 0, 1))).toBeLessThan(1e-7);
      expect(Math.abs(normalShare(6 * p - 3) - jStat.normal.cdf(6 * p - 3, 0, 1))).toBeLessThan(1e-7);
    }
  });
});

describe('moments', () => {
  test('jStat agrees, however the sample was cut', () => {
    const sample = draws('x', 5000).map((u) => 1e6 + u ** 3);
    const skip = new Uint8Array(5000);
    const whole = createMoments(1);
    addColumn(whole, 0, sample, 5000, skip);
    const parts = createMoments(1);
    for (let from = 0; from < 5000; from += 777) {
      const part = createMoments(1);
      const portion = sample.subarray(from, Math.min(5000, from + 777));
      addColumn(part, 0, portion, portion.length, skip);
      addMoments(parts, part);
    }
    for (const { count, mean, m2 } of [whole, parts]) {
      expect(count[0]).toBe(5000);
      expect(Math.abs(mean[0]! / jStat.mean([...sample]) - 1)).toBeLessThan(1e-15);
      expect(Math.abs(m2[0]! / 4999 / jStat.variance([...sample], true) - 1)).toBeLessThan(1e-10);
    }
  });

  test('large equal offsets do not drown the variance', () => {
    // NIST StRD, univariate, NumAcc4: 1001 numbers 10000000.2 and alternating .1 and .3; certified sd 0.1 (from memory).
    const numbers = Float64Array.from({ length: 1001 }, (_, i) =>
      i === 0 ? 10000000.2 : i % 2 === 1 ? 10000000.1 : 10000000.3,
    );
    const moments = createMoments(1);
    addColumn(moments, 0, numbers, 1001, new Uint8Array(1001));
    expect(Math.sqrt(moments.m2[0]! / 1000)).toBeCloseTo(0.1, 8);
    expect(moments.mean[0]).toBeCloseTo(10000000.2, 8);
  });

  test('what is not finite, or marked, is not counted', () => {
    const moments = createMoments(2);
    addColumn(moments, 1, Float64Array.of(1, NaN, Infinity, 3, 100), 5, Uint8Array.of(0, 0, 0, 0, 1));
    expect([...moments.count]).toEqual([0, 2]);
    expect(moments.mean[1]).toBe(2);
  });
});

test('quantiles from bins are those of the sample to a bin', () => {
  const sample = draws('y', 20_000).map((u) => u * u);
  const counts = new Float64Array(256);
  for (const y of sample) counts[Math.min(255, Math.floor(y * 256))]!++;
  const histogram = { counts, low: 0, high: 1, least: Math.min(...sample), largest: Math.max(...sample) };
  const exact = jStat.quantiles([...sample], [0.01, 0.05, 0.5, 0.95, 0.99], 1, 1);
  [0.01, 0.05, 0.5, 0.95, 0.99].forEach((p, i) => {
    expect(Math.abs(quantileOf(histogram, p) - exact[i]!)).toBeLessThan(1 / 256);
  });
  expect(quantileOf({ ...histogram, counts: new Float64Array(4) }, 0.5)).toBeNaN();
});

/** Digits behind the point: (1 - p) ** 1000 has to keep twenty of them at every p below. */
const DIGITS = 4000n;

/** The chance of from .. to successes of n at p each, in whole numbers. */
function tail(n: number, p: number, from: number, to: number): number {
  const whole = BigInt(Math.round(p * 2 ** 52));
  const one = 1n << 52n;
  let term = 10n ** DIGITS;
  for (let i = 0; i < n; i++) term = (term * (one - whole)) / one;
  let sum = 0n;
  for (let k = 0; k <= n; k++) {
    if (k >= from && k <= to) sum += term;
    term = (term * BigInt(n - k) * whole) / (BigInt(k + 1) * (one - whole));
  }
  return Number(sum / 10n ** (DIGITS - 20n)) / 1e20;
}

describe('the exact interval of a share', () => {
  // Exact confidence limits for proportions, N = 10, 95 %: Documenta Geigy, Scientific Tables, 7th ed. (from memory), in %.
  test.each([
    [0, 0, 30.85],
    [1, 0.25, 44.5],
    [2, 2.52, 55.61],
    [3, 6.67, 65.25],
    [4, 12.16, 73.76],
    [5, 18.71, 81.29],
    [10, 69.15, 100],
  ])('%d of 10 as printed', (k, low, high) => {
    const interval = binomialInterval(k, 10);
    expect(Math.abs(100 * interval.low - low)).toBeLessThan(0.00501);
    expect(Math.abs(100 * interval.high - high)).toBeLessThan(0.00501);
  });

  // NIST/SEMATECH e-Handbook of Statistical Methods, 7.2.4.1: 4 defectives of 20, 90 %. Its lower limit is met as printed. Its upper one, 0.401029,
  // comes from a search that stopped at 0.4010294; the equation that it states there is met by 0.4010281.
  test('4 of 20 at 90 %: as printed below, and above by the equation that is printed with it', () => {
    const { low, high } = binomialInterval(4, 20, 0.9);
    expect(Math.abs(low - 0.071354)).toBeLessThan(0.5e-6);
    expect(Math.abs(tail(20, high, 0, 4) - 0.05)).toBeLessThan(1e-14);
    // Even the least number that rounds to the printed one lies beyond the root.
    expect(tail(20, 0.4010285, 0, 4)).toBeLessThan(0.05);
    expect(high).toBeCloseTo(0.401029, 5);
  });

  test('at its ends the tails hold 2.5 % each, in whole-number arithmetic', () => {
    for (const [k, n] of [
      [1, 10],
      [3, 47],
      [50, 100],
      [199, 200],
      [180, 1000],
      [997, 1000],
    ] as const) {
      const { low, high } = binomialInterval(k, n);
      expect(Math.abs(tail(n, low, k, n) - 0.025)).toBeLessThan(1e-12);
      expect(Math.abs(tail(n, high, 0, k) - 0.025)).toBeLessThan(1e-12);
    }
  });

  test('jStat agrees', () => {
    for (const [k, n] of [
      [7, 31],
      [985, 1000],
      [9855, 10_000],
    ] as const) {
      const { low, high } = binomialInterval(k, n);
      expect(Math.abs(low - jStat.beta.inv(0.025, k, n - k + 1))).toBeLessThan(1e-8);
      expect(Math.abs(high - jStat.beta.inv(0.975, k + 1, n - k))).toBeLessThan(1e-8);
    }
  });

  test('none and all of ten million have closed ends', () => {
    const n = 10_000_000;
    expect(binomialInterval(0, n).low).toBe(0);
    expect(binomialInterval(n, n).high).toBe(1);
    expect(Math.abs(binomialInterval(0, n).high / -Math.expm1(Math.log(0.025) / n) - 1)).toBeLessThan(1e-12);
    expect(1 - binomialInterval(n, n).low).toBeCloseTo(-Math.expm1(Math.log(0.025) / n), 15);
  });
});
