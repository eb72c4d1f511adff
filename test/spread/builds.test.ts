// Builds: distributions that follow from the law of one input, shares that are known, and that nothing else moves a draw.

import { jStat } from 'jstat';
import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { analyse, createAnalysis, createBuilds, createSpreadJob, portionsOf } from '../../src/spread/index.ts';
import type { SheetSpread } from '../../src/spread/index.ts';

const spreadOf = (text: string, samples = 10_000, seed = 1): SheetSpread =>
  analyse(createSheet(text).spreadModel(), { samples, seed })!;

const JFET = `Q1 = n-JFET
  I_DSS: 6 mA in 3 mA .. 9 mA
  V_P: -3 V
A1 = stage of Q1
  gate: to 0 V
  drain: 1 kohm to 30 V
  source: to 0 V`;

describe('distributions', () => {
  test('a divider of even resistors has the variance that a general library finds on a grid, and the analytic extremes', () => {
    const { value } = spreadOf('R_1 = 10 kohm ± 5 %\nR_2 = 10 kohm ± 5 %\nx = R_2 / (R_1 + R_2)', 40_000);
    const grid: number[] = [];
    for (let i = 0; i < 200; i++) {
      for (let j = 0; j < 200; j++) {
        const [a, b] = [9500 + ((i + 0.5) * 1000) / 200, 9500 + ((j + 0.5) * 1000) / 200];
        grid.push(b / (a + b));
      }
    }
    const { distribution, low, high } = value('x')!;
    expect(distribution!.mean).toBeCloseTo(jStat.mean(grid), 3);
    // The standard error of a variance of 40 000 builds is about 0.5 %; four of them.
    expect(Math.abs(distribution!.sd ** 2 / jStat.variance(grid, false) - 1)).toBeLessThan(0.02);
    expect(low.value).toBeCloseTo(9500 / 20_000, 14);
    expect(high.value).toBeCloseTo(10_500 / 20_000, 14);
  });

  test('the quantile of I_D at V_GS = 0 without lambda is that of I_DSS', () => {
    const { distribution } = spreadOf(JFET, 40_000).value('A1.I_D')!;
    for (const [p, quantile] of [
      [0.01, 3.06e-3],
      [0.05, 3.3e-3],
      [0.5, 6e-3],
      [0.95, 8.7e-3],
      [0.99, 8.94e-3],
    ] as const) {
      const found = distribution![`p${String(Math.round(p * 100)).padStart(2, '0')}` as 'p01'];
      // Four standard errors of a quantile of an even law, and a bin.
      const error = 4 * Math.sqrt((p * (1 - p)) / 40_000) * 6e-3 + 6e-3 / 256;
      expect(Math.abs(found - quantile)).toBeLessThan(error);
    }
  });

  test('a normal law has a third of its limits as standard deviation, a little less for being cut off', () => {
    const { distribution } = spreadOf('R = 1 kohm ± 30 % normal\nx = R * 1', 40_000).value('x')!;
    // Variance of a normal cut off at three standard deviations: 1 - 6 phi(3) / (2 Phi(3) - 1) = 0.9733.
    expect(Math.abs(distribution!.sd / (100 * Math.sqrt(0.97333692)) - 1)).toBeLessThan(0.02);
  });

  test('with limits about a nominal half of the units lie on either side', () => {
    const { distribution } = spreadOf('R = 2 kohm in 1 kohm .. 9 kohm\nx = R * 1', 40_000).value('x')!;
    expect(Math.abs(distribution!.p50 - 2000)).toBeLessThan(100);
    expect(distribution!.mean).toBeCloseTo((1500 + 5500) / 2, -2);
  });
});

describe('checks', () => {
  test('the yield of a limit on an even value is the share below it', () => {
    const { check, report } = spreadOf('R = 1 kohm ± 10 %\na = check R <= 1050 ohm\nb = check R >= 950 ohm');
    for (const name of ['a', 'b']) {
      const { yield: found, holds } = check(name)!;
      expect(found!.low).toBeLessThan(0.75);
      expect(found!.high).toBeGreaterThan(0.75);
      expect(holds).toBe(false);
    }
    expect(report.all!.low).toBeLessThan(0.5);
    expect(report.all!.high).toBeGreaterThan(0.5);
  });

  test('a build holds only where it holds at every end of service', () => {
    const { check } = spreadOf('V_1 = 10 V ± 10 % service\nR = 1 kohm ± 10 %\na = check V_1 / R <= 11 mA');
    // At 11 V the limit is R >= 1 kohm: half of the builds.
    expect(check('a')!.yield!.low).toBeLessThan(0.5);
    expect(check('a')!.yield!.high).toBeGreaterThan(0.5);
  });

  test('failing builds tell which input sits where', () => {
    const { check, model } = spreadOf('R = 1 kohm ± 10 %\nR_2 = 1 kohm ± 1 %\na = check R + 0.001 * R_2 <= 1091 ohm');
    const [first] = check('a')!.causes;
    expect(model.drawn[first!.draw]!.name).toBe('R');
    expect(first!.thirds[2]).toBe(1);
  });

  test('a FET in cutoff somewhere fails its headroom check there', () => {
    const { check } = spreadOf(`V_G = 3 V in 1 V .. 5 V
Q1 = n-MOSFET
  V_TO: 2 V
  K: 4 mA/V^2
A1 = stage of Q1
  gate: to V_G
  drain: 1 kohm to 30 V
  source: to 0 V
a = check A1.margin >= 0 V`);
    expect(check('a')!.holds).toBe(false);
    expect(check('a')!.yield!.share).toBeLessThan(0.8);
  });

  test('a check without reserve is judged by its condition', () => {
    const { check } = spreadOf(`${JFET}\na = check A1.region = saturation\nb = check A1.region = ohmic`);
    expect(check('a')).toMatchObject({ holds: true, reserve: null, yield: { share: 1 } });
    expect(check('b')).toMatchObject({ holds: false, yield: { share: 0 } });
  });
});

describe('the declared set', () => {
  const part = `Q1 = n-JFET
  I_DSS: 4 mA in 2 mA .. 6 mA
  V_P: -2 V in -3 V .. -1 V
`;

  test('a further limit leaves the share of specimens that a count on a grid leaves', () => {
    const { report, value } = spreadOf(`${part}  g_fs0: 3 mS .. 5 mS\nx = 2 * Q1.I_DSS / abs(Q1.V_P)`);
    let inside = 0;
    const N = 400;
    for (let i = 0; i < N; i++) {
      for (let j = 0; j < N; j++) {
        const slope = (2 * (2e-3 + (4e-3 * (i + 0.5)) / N)) / (1 + (2 * (j + 0.5)) / N);
        if (slope >= 3e-3 && slope <= 5e-3) inside++;
      }
    }
    expect(Math.abs(report.parts[0]!.share! - inside / N ** 2)).toBeLessThan(0.02);
    const { distribution } = value('x')!;
    expect(distribution!.p01).toBeGreaterThanOrEqual(3e-3);
    expect(distribution!.p99).toBeLessThanOrEqual(5e-3);
  });

  test('limits that contradict each other leave no specimen, and nothing is said of what rests on them', () => {
    const { report, value } = spreadOf(`${part}  g_fs0: 20 mS .. 30 mS\nx = Q1.I_DSS * 1`);
    expect(report.isEmpty).toBe(true);
    expect(value('x')).toMatchObject({ low: { value: null }, high: { value: null }, distribution: null });
  });

  test('at full tracking the two rows of every build stand at one quantile', () => {
    const text = `${part}  tracking: 1\nx = Q1.I_DSS / 1 mA + Q1.V_P * 2 / 1 V`;
    // I_DSS = 2 + 4 u and |V_P| = 1 + 2 u: their difference is the same in every build.
    const { low, high, distribution } = spreadOf(text, 2000).value('x')!;
    expect(low.value).toBeCloseTo(0, 9);
    expect(high.value).toBeCloseTo(0, 9);
    expect(distribution!.sd).toBeLessThan(1e-9);
  });

  test('an open end leaves spread and yield open, and names itself; what needs the other end alone is decided', () => {
    const { value, check } = spreadOf(
      'R = 1 kohm ..\nR_2 = 1 kohm ± 1 %\nx = R * 2\na = check x >= 1 kohm\nb = check x <= 5 kohm\nc = check R_2 > 900 ohm',
    );
    expect(value('x')).toMatchObject({ low: { value: 2000, open: [] }, high: { value: null, open: ['R'] } });
    expect(value('x')!.distribution).toBeNull();
    expect(check('a')).toMatchObject({ holds: true, yield: null, open: ['R'] });
    expect(check('b')).toMatchObject({ holds: null, yield: null });
    expect(check('c')).toMatchObject({ holds: true, yield: { share: 1 } });
  });
});

describe('draws', () => {
  const text = `${JFET}\nR_x = 1 kohm ± 5 %\ny = R_x * A1.I_D`;

  test('an edit elsewhere moves no draw', () => {
    const before = spreadOf(text, 3000).value('y')!.distribution;
    const after = spreadOf(`R_new = 47 kohm ± 20 %\n${text}\nz = R_new * 2`, 3000).value('y')!.distribution;
    expect(after).toEqual(before);
  });

  test('the name keys the draws: two inputs alike are drawn apart', () => {
    const { distribution } = spreadOf('R_a = 1 kohm ± 5 %\nR_b = 1 kohm ± 5 %\nx = R_a - R_b').value('x')!;
    expect(distribution!.sd).toBeCloseTo((100 / Math.sqrt(12)) * Math.SQRT2, 0);
  });

  test('portions counted in any order, each by another counter, give the same bits when merged in the order of their builds', () => {
    const model = createSheet(text).spreadModel();
    const whole = analyse(model, { samples: 20_000, seed: 4 })!.report;
    const analysis = createAnalysis(model, 4, 'full');
    const portions = portionsOf(20_000);
    const tallies = new Map(
      portions
        .toReversed()
        .map(({ first, count }) => [first, createBuilds(model, 4, analysis.ranges()).count(first, count)]),
    );
    for (const { first } of portions) analysis.take(tallies.get(first)!);
    expect(analysis.report()).toEqual(whole);
  });

  test.each([300, 2000, 20_000])(
    'the page, which counts step by step, shows the bits of the terminal: %d builds',
    (samples) => {
      const model = createSheet(text).spreadModel();
      const answers = [...createSpreadJob({ kind: 'spread', id: 1, model, samples, seed: 4, effort: 'full' })];
      expect(answers.map(({ isLast }) => isLast)).toEqual(answers.map((_, n) => n === answers.length - 1));
      expect(answers.at(-1)!.report).toEqual(analyse(model, { samples, seed: 4 })!.report);
    },
  );

  test('portions hold every build once', () => {
    for (const samples of [0, 1, 511, 512, 513, 8192, 8193, 50_000]) {
      let next = 0;
      for (const { first, count } of portionsOf(samples)) {
        expect(first).toBe(next);
        expect(count).toBeGreaterThan(0);
        next = first + count;
      }
      expect(next).toBe(samples);
    }
  });

  test('no build beats an extreme', () => {
    expect(spreadOf(text, 20_000).report.repaired).toBe(0);
  });

  test('an extreme that a build beats is searched for again from there', () => {
    // An island that no move of a single input comes upon: x and y have to stand near 0.63 and -0.41 together.
    const peak = 'if((x - 0.63)^2 + (y - -0.41)^2 < 0.01, 1 + x, 0)';
    const { report, value } = spreadOf(`x = 0 in -1 .. 1\ny = 0 in -1 .. 1\nz = ${peak}`, 20_000);
    expect(report.repaired).toBeGreaterThan(0);
    expect(value('z')!.high.value).toBeGreaterThan(1.725);
  });
});

test('a sheet without spread has nothing to analyse', () => {
  expect(analyse(createSheet('R = 1 kohm').spreadModel(), { samples: 10, seed: 1 })).toBeNull();
});

describe('tracking that would do', () => {
  const part =
    'Q1 = n-JFET\n  I_DSS: 5 mA in 1 mA .. 9 mA\n  V_P: -2.5 V in -4 V .. -1 V\nx = Q1.I_DSS / abs(Q1.V_P)\n';

  test('a check that fails for independent rows says from which tracking on it would hold', () => {
    // At |u - v| <= w the ratio reaches 1 + 8 w at u = 0 and 9 / (4 - 3 w) at v = 1: below 3 mS up to w = 0.25.
    const { trackingNeeded } = spreadOf(`${part}a = check x <= 3 mS`, 500).check('a')!;
    expect(trackingNeeded!.part).toBe('Q1');
    expect(trackingNeeded!.tracking).toBeGreaterThanOrEqual(0.75);
    expect(trackingNeeded!.tracking).toBeLessThanOrEqual(0.77);
  });

  test('none is named where none would do, and where the check holds', () => {
    const { check } = spreadOf(`${part}a = check x <= 1.5 mS\nb = check x <= 10 mS`, 500);
    expect([check('a')!.trackingNeeded, check('b')!.trackingNeeded]).toEqual([null, null]);
  });
});
