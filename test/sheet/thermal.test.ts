import { describe, expect, it } from 'vitest';
import { KINDS, number, sheetOf } from './kinds.ts';

/** A FET without beta drift at a fixed V_GS: T_J - T_A = 390 (V_ov + 2 mV/K (T_J - T_A))² has two roots. */
function hot(kind: string, drive: number, resistance = 390): string {
  return `Q1 = ${kind}
  V_TO: {2}
  K: 100 mA/V^2
  R_thJA: ${resistance} K/W
  tempco: -2 mV/K
  beta_exponent: 0
P1 = point of Q1
  V_GS: {${2 + drive}}
  V_DS: {10}
A1 = stage of Q1
  gate: to {${2 + drive}}
  drain: to {10}
  source: to 0 V
`;
}

describe.each(KINDS.filter(([kind]) => kind.endsWith('MOSFET')))('a self-heating %s', (kind) => {
  it('with two thermal equilibria is shown at the cooler one and said to run away beyond the other', () => {
    const sheet = sheetOf(kind, hot(kind, 0.3));
    // 0.00156 x² - 0.532 x + 35.1 = 0, the smaller root.
    const rise = (0.532 - Math.sqrt(0.532 ** 2 - 4 * 0.00156 * 35.1)) / (2 * 0.00156);
    for (const cell of ['P1', 'A1']) {
      expect(number(sheet, `${cell}.T_J`)).toBeCloseTo(298.15 + rise, 6);
      expect(sheet.cautions().flatMap((caution) => (caution.cell === cell ? [caution.text] : []))).toEqual([
        'Q1 has 2 thermal equilibria below 600 K. The coolest is shown, which a cold start reaches; once heated beyond the next one, it runs away (thermal runaway). Lower R_thJA or the dissipation.',
      ]);
    }
  });

  it('with one equilibrium gets no word of it', () => {
    const sheet = sheetOf(kind, hot(kind, 0.3, 100));
    expect(sheet.cautions()).toEqual([]);
    expect(number(sheet, 'P1.T_J')).toBeGreaterThan(300);
  });

  it('with none runs away and has no values', () => {
    const sheet = sheetOf(kind, hot(kind, 0.3, 600));
    expect(sheet.error('P1')!.text).toContain('the FET runs away (thermal runaway)');
    expect(sheet.value('P1.I_D')).toBeNull();
  });
});
