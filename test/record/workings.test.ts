import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CURRENT, PLAIN, RESISTANCE, TEMPERATURE_POINT, VOLTAGE } from '../../src/quantity/index.ts';
import { printStep, stepText } from '../../src/record/index.ts';
import type { WorkingStep } from '../../src/sheet/index.ts';
import { wrongLine } from './printed-line.ts';

const SEED = 41;

function operand(name: string, value: number | string, type: WorkingStep['type']): WorkingStep['operands'][number] {
  return { name, value, type, as: null };
}

function step(
  formula: string,
  value: WorkingStep['value'],
  type: WorkingStep['type'],
  operands: WorkingStep['operands'],
): WorkingStep {
  return { name: 'x', formula, operands, value, type, as: null, sentence: '' };
}

describe('a printed step', () => {
  it('puts values in place of names, with parentheses where a sign or a unit wants them', () => {
    const operands = [operand('V_1', -1.25, VOLTAGE), operand('R_1', 1200, RESISTANCE), operand('n', -2, PLAIN)];
    const substitution = (formula: string, value: number, type: WorkingStep['type']): string | null =>
      printStep(step(formula, value, type, operands), 'x').text.substitution;
    expect(substitution('V_1/R_1', -1.25 / 1200, CURRENT)).toBe('−1.25 V / 1.2 kΩ');
    expect(substitution('2*V_1', -2.5, VOLTAGE)).toBe('2 * (−1.25 V)');
    expect(substitution('3 V-V_1', 4.25, VOLTAGE)).toBe('3 V - (−1.25 V)');
    expect(substitution('-V_1', 1.25, VOLTAGE)).toBe('-(−1.25 V)');
    expect(substitution('abs(V_1)', 1.25, VOLTAGE)).toBe('abs(−1.25 V)');
    expect(substitution('sqrt(V_1^2)', 1.25, VOLTAGE)).toBe('sqrt((−1.25 V)^2)');
    expect(substitution('√R_1 / √(1 ohm)', Math.sqrt(1200), PLAIN)).toBe('√(1.2 kΩ) / √(1 ohm)');
    expect(substitution('(V_1 + 3 V) * n', -3.5, VOLTAGE)).toBe('(−1.25 V + 3 V) * (−2)');
    expect(substitution('2^n', 0.25, PLAIN)).toBe('2^(−2)');
  });

  it('takes more digits for operands that nearly cancel', () => {
    const printed = printStep(
      step('V_1 - V_2', 12.3456789 - 12.3449999, VOLTAGE, [
        operand('V_1', 12.3456789, VOLTAGE),
        operand('V_2', 12.3449999, VOLTAGE),
      ]),
      'x',
    );
    expect(stepText(printed)).toBe('x = V_1 - V_2 = 12.345679 V - 12.345000 V = 679 µV');
  });

  it('shows a failing comparison with the digits in which it fails', () => {
    const printed = printStep(step('V_1 >= 2 V', false, 'condition', [operand('V_1', 1.9999876, VOLTAGE)]), 'x');
    expect(stepText(printed)).toBe('x: V_1 >= 2 V, 1.99999 V >= 2 V: does not hold');
  });

  it('shows no numbers in place where they are the result already, and no result twice', () => {
    expect(stepText(printStep(step('V_1', 1.25, VOLTAGE, [operand('V_1', 1.25, VOLTAGE)]), 'x'))).toBe(
      'x = V_1 = 1.25 V',
    );
    expect(stepText(printStep(step('1.2 kΩ', 1200, RESISTANCE, []), 'x'))).toBe('x = 1.2 kΩ');
  });

  it('keeps the digits of a typed number', () => {
    expect(printStep(step('1.23456 kohm', 1234.56, RESISTANCE, []), 'x').text.result).toBe('1.23456 kΩ');
  });

  it('shows an operand without end as ∞ and computes with it', () => {
    const printed = printStep(
      step('r_o || R_D', 5100, RESISTANCE, [operand('r_o', Infinity, RESISTANCE), operand('R_D', 5100, RESISTANCE)]),
      'x',
    );
    expect(stepText(printed)).toBe('x = r_o || R_D = ∞ || 5.1 kΩ = 5.1 kΩ');
    expect(printed.tex.substitution).toBe('\\infty \\parallel 5.1\\,\\mathrm{k\\Omega{}}');
    expect(printed.agrees).toBe(true);
  });

  it('computes with temperatures as points of the scale', () => {
    const printed = printStep(
      step('T_A + 5 K', 290.15, TEMPERATURE_POINT, [operand('T_A', 285.15, TEMPERATURE_POINT)]),
      'x',
    );
    expect(stepText(printed)).toBe('x = T_A + 5 K = 12 °C + 5 K = 17 °C');
  });

  it('does not claim agreement for a result that the formula does not give', () => {
    expect(printStep(step('V_1 * 2', 2.6, VOLTAGE, [operand('V_1', 1.25, VOLTAGE)]), 'x').agrees).toBe(false);
    expect(printStep(step('V_1 >= 1 V', false, 'condition', [operand('V_1', 1.25, VOLTAGE)]), 'x').agrees).toBe(false);
  });

  it('is found wrong by reading it back when a printed number is altered', () => {
    const printed = printStep(step('V_1 * 3', 3.75, VOLTAGE, [operand('V_1', 1.25, VOLTAGE)]), 'x');
    expect(wrongLine(printed)).toBeNull();
    const altered = { ...printed, text: { ...printed.text, substitution: '1.26 V * 3' } };
    expect(wrongLine(altered)).toBe('x = V_1 * 3 = 1.26 V * 3 = 3.75 V');
  });

  it('gives its result from its printed numbers for random operands', () => {
    const size = fc.double({ min: -12, max: 12, noNaN: true }).map((lead) => 10 ** lead);
    const signed = fc.tuple(size, fc.boolean()).map(([x, minus]) => (minus ? -x : x));
    fc.assert(
      fc.property(signed, signed, size, (v, w, r) => {
        const operands = [operand('V_1', v, VOLTAGE), operand('V_2', w, VOLTAGE), operand('R_1', r, RESISTANCE)];
        const printed = printStep(step('(V_1 - V_2) / R_1', (v - w) / r, CURRENT, operands), 'x');
        expect(printed.agrees, stepText(printed)).toBe(true);
        expect(wrongLine(printed)).toBeNull();
      }),
      { seed: SEED, numRuns: 500 },
    );
  });
});
