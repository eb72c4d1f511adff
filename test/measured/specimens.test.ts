// Several specimens: what they spread over, how far their constants go together, and which of them match.

import { describe, expect, it } from 'vitest';
import { matchGroups, selfHeating, summarise } from '../../src/measured/index.ts';
import type { LawFit } from '../../src/measured/index.ts';
import { rankCorrelation, trackingFor } from '../../src/measured/rank.ts';
import { drawKey, uniformAt } from '../../src/numeric/index.ts';
import { createNormal } from './devices.ts';

function specimen(beta: number, V_TO: number, lambda = 0, channel: 1 | -1 = 1): LawFit {
  return {
    channel,
    beta,
    V_TO,
    lambda,
    exponent: 2,
    errors: { beta: 0, V_TO: 0, lambda: null, exponent: null },
    correlation: 0,
    rms: 0,
    relative: 0,
    residuals: new Float64Array(0),
    regions: [],
    flags: [],
  };
}

describe('a summary', () => {
  it('has the least, the middle and the largest of each constant', () => {
    const summary = summarise([specimen(1e-3, -2, 0.01), specimen(3e-3, -1, 0.02), specimen(2e-3, -1.5, 0.03)]);
    expect(summary.V_TO).toEqual({ min: -2, median: -1.5, max: -1 });
    expect(summary.beta).toEqual({ min: 1e-3, median: 2e-3, max: 3e-3 });
    expect(summary.I_DSS.min).toBeCloseTo(3e-3, 12);
    expect(summary.I_DSS.median).toBeCloseTo(4e-3, 12);
    expect(summary.I_DSS.max).toBeCloseTo(4.5e-3, 12);
    expect(summary.lambda.median).toBe(0.02);
    expect(summarise([specimen(1e-3, 2), specimen(2e-3, 3)]).V_TO.median).toBe(2.5);
  });

  it('says how far the pinch-off voltage and the current go together', () => {
    // I_DSS grows with |V_TO|.
    const rising = [1, 1.5, 2, 2.5].map((volts) => specimen(1e-3, -volts));
    expect(summarise(rising).tracking).toBeCloseTo(1, 6);
    // Of channels that are closed at 0 V: beta falls as the threshold grows.
    const falling = [1, 1.5, 2, 2.5].map((volts) => specimen(1e-3 / volts, volts));
    expect(summarise(falling).tracking).toBeCloseTo(-1, 6);
    expect(summarise(rising.slice(0, 2)).tracking).toBe(0);
  });
});

describe('tracking', () => {
  it('is the inverse of the rank correlation of the fold law', () => {
    for (const t of [-1, -0.8, -0.3, 0, 0.25, 0.5, 0.9, 1]) {
      const w = 1 - Math.abs(t);
      expect(trackingFor(Math.sign(t) * (1 - 2 * w * w + w ** 3))).toBeCloseTo(t, 7);
    }
  });

  it('comes back from draws that were made with it', () => {
    // v = fold(u + (1 - t) r), fold reflecting at 0 and 1 (the law of the sheet's own draws).
    const n = 4000;
    for (const t of [0.2, 0.6, 0.9]) {
      const [first, second] = [drawKey(5, 'u'), drawKey(5, 'r')];
      const u = Array.from({ length: n }, (_, i) => uniformAt(first, i, 0));
      const v = u.map((at, i) => {
        const there = Math.abs(at + (1 - t) * (2 * uniformAt(second, i, 0) - 1));
        return there > 1 ? 2 - there : there;
      });
      // The rank correlation of n pairs scatters by less than 1 / sqrt(n).
      expect(Math.abs(trackingFor(rankCorrelation(u, v)) - t)).toBeLessThan(4 / Math.sqrt(n));
    }
  });

  // Textbook example of the coefficient: IQ and hours of television of ten persons, rho = -29/165 (from memory).
  it('rests on the rank correlation of a published example', () => {
    const iq = [106, 100, 86, 101, 99, 103, 97, 113, 112, 110];
    const hours = [7, 27, 2, 50, 28, 29, 20, 12, 6, 17];
    expect(rankCorrelation(iq, hours)).toBeCloseTo(-29 / 165, 12);
  });

  it('gives equal values the mean of their ranks', () => {
    expect(rankCorrelation([1, 2, 2, 3], [1, 2, 3, 4])).toBeCloseTo(4.5 / Math.sqrt(4.5 * 5), 12);
    expect(rankCorrelation([1, 1, 1], [1, 2, 3])).toBe(0);
  });
});

describe('matching', () => {
  const draw = createNormal(21);
  const lot = Array.from({ length: 9 }, () => specimen(1e-3 * Math.exp(0.2 * draw()), -2 + 0.3 * draw(), 0.01));
  const options = { I_D: 0.5e-3, I_second: 0.1e-3, V_DS: 10 } as const;
  const gate = ({ channel, beta, V_TO, lambda }: LawFit, I: number): number =>
    V_TO + channel * Math.sqrt(I / (beta * (1 + lambda * 10)));

  /** The least sum of reaches over every way to make groups of a size, with as many left over as must be. */
  function least(values: readonly number[], size: number): number {
    if (values.length < size) return 0;
    const [first, ...rest] = values;
    const spare = values.length % size;
    let best = spare > 0 ? least(rest, size) : Infinity;
    const choose = (from: number, chosen: readonly number[]): void => {
      if (chosen.length === size - 1) {
        const group = [first!, ...chosen.map((k) => rest[k]!)];
        const others = rest.filter((_, k) => !chosen.includes(k));
        best = Math.min(best, Math.max(...group) - Math.min(...group) + least(others, size));
        return;
      }
      for (let k = from; k < rest.length; k++) choose(k + 1, [...chosen, k]);
    };
    choose(0, []);
    return best;
  }

  it.each([
    [2, 9],
    [2, 8],
    [4, 9],
    [4, 8],
  ] as const)('finds the least sum of differences of groups of %i among %i', (size, count) => {
    const fits = lot.slice(0, count);
    const { groups, single } = matchGroups(fits, { size, ...options });
    expect(groups).toHaveLength(Math.floor(count / size));
    expect(single).toHaveLength(count % size);
    const seen = [...groups.flatMap(({ members }) => members.map(({ index }) => index)), ...single];
    expect(seen.toSorted((a, b) => a - b)).toEqual([...fits.keys()]);
    const sum = groups.reduce((total, { difference }) => total + difference, 0);
    expect(sum).toBeCloseTo(
      least(
        fits.map((fit) => gate(fit, options.I_D)),
        size,
      ),
      12,
    );
    expect(groups.map(({ difference }) => difference)).toEqual(
      groups.map(({ difference }) => difference).toSorted((a, b) => a - b),
    );
  });

  it('gives each member the resistor that brings the gates together', () => {
    for (const { members, difference, second, equalised } of matchGroups(lot, { size: 2, ...options }).groups) {
      const [a, b] = members.map(({ index, R_S }) => gate(lot[index]!, options.I_D) + options.I_D * R_S);
      expect(a).toBeCloseTo(b!, 12);
      expect(Math.min(...members.map(({ R_S }) => R_S))).toBe(0);
      const [V_1, V_2] = members.map(({ index }) => gate(lot[index]!, options.I_D));
      expect(difference).toBeCloseTo(Math.abs(V_1! - V_2!), 12);
      const [W_1, W_2] = members.map(({ index }) => gate(lot[index]!, options.I_second));
      expect(second).toBeCloseTo(Math.abs(W_1! - W_2!), 12);
      const [X_1, X_2] = members.map(({ index, R_S }) => gate(lot[index]!, options.I_second) + options.I_second * R_S);
      expect(equalised).toBeCloseTo(Math.abs(X_1! - X_2!), 12);
    }
  });

  it('is the same for mirrored specimens', () => {
    const mirrored = lot.map(({ beta, V_TO, lambda }) => specimen(beta, -V_TO, lambda, -1));
    const sizes = (fits: readonly LawFit[]) =>
      matchGroups(fits, { size: 2, ...options }).groups.map(({ members, ...rest }) => ({
        ...rest,
        members: members.map(({ index, R_S }) => [index, R_S]).toSorted((a, b) => a[0]! - b[0]!),
      }));
    expect(sizes(mirrored)).toEqual(sizes(lot));
  });
});

it('the warmest reading is that of the largest power', () => {
  const points = {
    V_GS: Float64Array.of(0, 0, 0),
    V_DS: Float64Array.of(-1, -10, -20),
    I_D: Float64Array.of(5e-3, 4e-3, 1e-3),
  };
  expect(selfHeating(points, 400)).toEqual({ worst: 16, index: 1 });
});
