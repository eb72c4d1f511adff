// Values in another state of the same build: `VALUE with INPUT = setting` is what the sheet would say with that entry.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { analyse } from '../../src/spread/index.ts';

const STAGE = `V_DD = 15 V ± 5 %
R_D = 3.3 kohm ± 1 %
R_S = 1.2 kohm ± 1 %
R_B = E24(R_S / 3)
T_A = 25 degC in 0 degC .. 60 degC
Q1 = n-JFET
  I_DSS: 4 mA in 2 mA .. 9 mA
  V_P: -2 V in -3 V .. -1 V
  lambda: 0.01 /V
A1 = stage of Q1
  gate: to 0 V
  drain: R_D to V_DD
  source: R_S to m
  m: R_B to 0 V
I_B = A1.I_D * 2
`;

/** The sheet with an entry in place of the present one. */
function entered(text: string, line: string, instead: string): string {
  if (!text.includes(line)) throw new Error(line);
  return text.replace(line, instead);
}

describe('a value with another setting', () => {
  it.each([
    ['A1.I_D with R_D = 4 kohm', 'R_D = 3.3 kohm ± 1 %', 'R_D = 4 kohm', 'A1.I_D'],
    ['A1.V_drain with V_DD = 12 V', 'V_DD = 15 V ± 5 %', 'V_DD = 12 V', 'A1.V_drain'],
    ['A1.g_m with Q1.V_P = -2.5 V', 'V_P: -2 V in -3 V .. -1 V', 'V_P: -2.5 V', 'A1.g_m'],
    ['I_B with T_A = 60 degC', 'T_A = 25 degC in 0 degC .. 60 degC', 'T_A = 60 degC', 'I_B'],
    ['A1.margin with R_D = 20 kohm', 'R_D = 3.3 kohm ± 1 %', 'R_D = 20 kohm', 'A1.margin'],
  ])('%s is what the sheet says with that entry, to the last bit', (state, line, instead, path) => {
    const sheet = createSheet(`${STAGE}x = ${state}\n`);
    expect(sheet.error('x')).toBeNull();
    expect(sheet.value('x')).toBe(createSheet(entered(STAGE, line, instead)).value(path));
  });

  it('keeps what was chosen: the part is fitted already', () => {
    const sheet = createSheet(`${STAGE}x = A1.I_D with R_S = 6 kohm\ny = R_B with R_S = 6 kohm\n`);
    expect(sheet.value('R_B')).toBe(390);
    expect(sheet.value('y')).toBe(390);
    const held = createSheet(
      entered(entered(STAGE, 'R_B = E24(R_S / 3)', 'R_B = 390 ohm'), 'R_S = 1.2 kohm ± 1 %', 'R_S = 6 kohm'),
    );
    expect(sheet.value('x')).toBe(held.value('A1.I_D'));
  });

  it('takes several settings, and formulas of several values', () => {
    const sheet = createSheet(
      `${STAGE}x = A1.I_D with R_D = 4 kohm with V_DD = 12 V\ny = (A1.V_DS + 2 * A1.V_GS) with V_DD = 12 V\nz = (A1.I_D with T_A = 60 degC) / (A1.I_D with T_A = 0 degC)\n`,
    );
    const both = createSheet(
      entered(entered(STAGE, 'R_D = 3.3 kohm ± 1 %', 'R_D = 4 kohm'), 'V_DD = 15 V ± 5 %', 'V_DD = 12 V'),
    );
    expect(sheet.value('x')).toBe(both.value('A1.I_D'));
    const low = createSheet(entered(STAGE, 'V_DD = 15 V ± 5 %', 'V_DD = 12 V'));
    expect(sheet.value('y')).toBe((low.value('A1.V_DS') as number) + 2 * (low.value('A1.V_GS') as number));
    expect(sheet.value('z')).toBeLessThan(1);
  });

  it('follows edits of what lies between the input and the value', () => {
    const tail = 'x = I_B with R_D = 4 kohm\n';
    const sheet = createSheet(STAGE + tail);
    const check = (text: string): void => {
      sheet.update(text + tail);
      expect(sheet.value('x')).toBe(createSheet(entered(text, 'R_D = 3.3 kohm ± 1 %', 'R_D = 4 kohm')).value('I_B'));
    };
    check(entered(STAGE, 'A1.I_D * 2', 'A1.I_D * 3'));
    check(entered(STAGE, 'lambda: 0.01 /V', 'lambda: 0.02 /V'));
    check(entered(STAGE, '  m: R_B to 0 V', '  m: R_B to 0 V, 10 kohm to V_DD'));
    check(`k = 2\n${entered(STAGE, 'A1.I_D * 2', 'A1.I_D * k')}`);
    check(STAGE);
  });

  it('is the same build in another state: draws stay as they are', () => {
    // A supply regulation whose spread would be far wider if both states were drawn apart.
    const sheet = createSheet(
      `V_1 = 10 V
R_1 = 10 kohm ± 20 %
R_2 = 10 kohm ± 20 %
V_x = V_1 * R_2 / (R_1 + R_2)
rise = (V_x with V_1 = 11 V) - V_x
`,
    );
    const spread = analyse(sheet.spreadModel(), { samples: 1000, seed: 1 })!;
    const { low, high } = spread.value('rise')!;
    expect(low.value).toBeCloseTo(8 / 20, 12);
    expect(high.value).toBeCloseTo(12 / 20, 12);
  });

  it('is what an inverse cell may ask for', () => {
    const sheet = createSheet(
      'V_1 = 10 V\nR_1 = 10 kohm\nR_2 = 10 kohm\nx = R_2 such that (V_1 * R_2 / (R_1 + R_2) with V_1 = 20 V) = 5 V over 100 ohm .. 1 Mohm\n',
    );
    expect(sheet.value('x')).toBeCloseTo(10_000 / 3, 8);
  });

  it('leaves the cells of the demo as they are', () => {
    const demo = readFileSync('public/examples/crevasse-listener.txt', 'utf8');
    const sheet = createSheet(`${demo}\nx_state = A1.I_D with V_DD = V_DD\n`);
    expect(sheet.value('x_state')).toBe(createSheet(demo).value('A1.I_D'));
  });
});
