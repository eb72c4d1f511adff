// What would mend a check, against windows that follow from a formula.

import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { createMendJob, mendWith, tunersOf } from '../../src/spread/index.ts';

const modelOf = (text: string) => createSheet(text).spreadModel();

describe('the window of an input', () => {
  const DIVIDER = 'V_1 = 10 V ± 5 %\nR_1 = 10 kohm ± 1 %\nR_2 = 10 kohm ± 1 %\nx = V_1 * R_2 / (R_1 + R_2)\n';

  test('is where the check holds at both ends of its spread', () => {
    const model = modelOf(`${DIVIDER}a = check x within 5.5 V .. 8 V`);
    const { window } = mendWith(model, 'R_2');
    // At the low end 9.5 V 0.99 R / (10.1 k + 0.99 R) = 5.5 V, at the high end 10.5 V 1.01 R / (9.9 k + 1.01 R) = 8 V.
    const low = (5.5 * 10.1e3) / (0.99 * (9.5 - 5.5));
    const high = (8 * 9.9e3) / (1.01 * (10.5 - 8));
    expect(window!.low / low - 1).toBeGreaterThanOrEqual(-1e-12);
    expect(window!.low / low - 1).toBeLessThan(1e-3);
    expect(1 - window!.high / high).toBeGreaterThanOrEqual(-1e-12);
    expect(1 - window!.high / high).toBeLessThan(1e-3);
  });

  test('is none where no value will do, and the check that closes it is named', () => {
    const model = modelOf(`${DIVIDER}wide = check x > 0 V\ntight = check x within 5.9 V .. 6.1 V`);
    expect(mendWith(model, 'R_2')).toEqual({ input: 'R_2', window: null, closedBy: 'tight' });
  });

  test('is cut by every check, not the failing one alone', () => {
    const model = modelOf(`${DIVIDER}a = check x > 5.5 V\nb = check R_2 < 20 kohm`);
    expect(mendWith(model, 'R_2').window!.high).toBeLessThanOrEqual(20e3 / 1.01);
    expect(mendWith(model, 'R_2').window!.high).toBeGreaterThan((20e3 / 1.01) * 0.999);
  });
});

test('inputs that reach the check can be turned, those of a part and those that do not reach it cannot', () => {
  const model = modelOf(`R_S = 1 kohm
R_other = 1 kohm
Q1 = n-JFET
  I_DSS: 5 mA
  V_P: -2 V
A1 = stage of Q1
  gate: to 0 V
  drain: 1 kohm to 20 V
  source: R_S to 0 V
a = check A1.margin > 1 V`);
  expect(tunersOf(model, 'a')).toEqual(['R_S']);
});

test('the first value to buy inside the window comes with every check as it then stands', () => {
  const model = modelOf('R = 10 kohm ± 1 %\na = check R > 11 kohm\nb = check R < 14 kohm');
  const [answer] = createMendJob({
    kind: 'mend',
    id: 1,
    model,
    inputs: [{ name: 'R', values: [10e3, 11e3, 12e3, 13e3] }],
  });
  expect(answer!.choice!.value).toBe(12e3);
  expect(answer!.choice!.checks.map(({ check, holds }) => [check, holds])).toEqual([
    ['a', true],
    ['b', true],
  ]);
  expect(answer!.choice!.checks[0]!.reserve).toBeCloseTo(12e3 * 0.99 - 11e3, 9);
  expect(answer!.choice!.checks[1]!.reserve).toBeCloseTo(14e3 - 12e3 * 1.01, 9);
});
