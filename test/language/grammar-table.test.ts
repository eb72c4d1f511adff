// What the sheet's grammar says of expressions, numbers and quantities, row by row.

import { describe, expect, test } from 'vitest';
import { literalOf, parseExpression } from '../../src/language/index.ts';
import type { Expr } from '../../src/language/index.ts';
import { quantity, reads, showLiteral } from './show.ts';

describe('an expression', () => {
  test.each([
    // Division and units
    ['10 V / R', '(10[V] / R)'],
    ['10 V/R', 'unit-glued'],
    ['10 V/2', 'unit-glued'],
    ['10 V*R', 'unit-glued'],
    ['0.01 /V', '0.01[1/V]'],
    ['0.01/V', '0.01[1/V]'],
    ['0.5 V^0.5', '0.5[V^0.5]'],
    ['1/A1.g_m || R', '((1 / A1.g_m) || R)'],
    ['1 /A1.g_m', '(1 / A1.g_m)'],
    ['1/50 V', '(1 / 50[V])'],
    ['1 /V', '1[1/V]'],
    ['x /V', 'unit-without-number'],
    ['10 V /A', 'unit-blank'],
    ['10 V//5 V', '(10[V] || 5[V])'],
    ['2 mA/V^2', '0.002[A/V^2]'],
    ['4.7 nV/√Hz', '4.7e-9[V/Hz^0.5]'],
    ['60 degC', '333.15[degC]'],
    ['5 %', '0.05'],
    ['5%', '0.05'],
    // Codes
    ['1M0', '1000000[ohm]'],
    ['4k7', '4700[ohm]'],
    ['4K7', '4700[ohm]'],
    ['47k', '47000[ohm]'],
    ['470R', '470[ohm]'],
    ['4n7', '4.7e-9[F]'],
    ['10p', '1e-11[F]'],
    ['2µ2', '0.0000022[F]'],
    ['4m7', 'code-letter'],
    ['4k7 ohm', 'code-with-unit'],
    ['300K', '300[K]'],
    ['R47', 'R47'],
    ['4.7k', 'code-decimals'],
    ['47kohm', '47000[ohm]'],
    ['10pF', '1e-11[F]'],
    ['47k / 2', '(47000[ohm] / 2)'],
    // Signs and powers
    ['-20 V', '(- 20[V])'],
    ['-40 degC', '233.15[degC]'],
    ['+40 degC', '313.15[degC]'],
    ['T - 40 degC', '(T - 313.15[degC])'],
    ['- -40 degC', '(- 233.15[degC])'],
    ['-x^2', '(- (x ^ 2))'],
    ['2^-1', '(2 ^ (- 1))'],
    ['√x²', '((√ x) ^ 2)'],
    ['x⁻¹', '(x ^ (- 1))'],
    ['2^3^2', '(2 ^ (3 ^ 2))'],
    ['10 V^2', '10[V^2]'],
    ['10 V²', '10[V^2]'],
    ['(10 V)^2', '({10[V]} ^ 2)'],
    ['10 V ^ 2', 'unit-power'],
    ['10 V ²', 'unit-power'],
    // The ladder
    ['a - b - c', '((a - b) - c)'],
    ['a / b * c', '((a / b) * c)'],
    ['a + b || c', '(a + (b || c))'],
    ['a / b || c', '((a / b) || c)'],
    ['- a * b', '((- a) * b)'],
    ['a * -b', '(a * (- b))'],
    ['(a + b) >= c', '({(a + b)} >= c)'],
    ['(a >= b) and (c <= d)', '({(a >= b)} and {(c <= d)})'],
    ['a >= b and c <= d or not e = f', '(((a >= b) and (c <= d)) or (not (e = f)))'],
    ['not a and b', '((not a) and b)'],
    ['not not a', '(not (not a))'],
    ['A1.A_v with V_C = -8 V', '(A1.A_v with V_C = (- 8[V]))'],
    ['a with b = 1 with c = 2 > 3', '(((a with b = 1) with c = 2) > 3)'],
    ['a with Q1.V_P = x + 1 = 4', '((a with Q1.V_P = (x + 1)) = 4)'],
    ['x within 4 .. 12', '(x within 4 .. 12)'],
    ['x within a - 1 .. a + 1', '(x within (a - 1) .. (a + 1))'],
    ['x within 5 mA ± 10 %', '(x within 0.0045[A] .. 0.0055[A])'],
    ['x within -5 V ± 10 %', '(x within (- 5.5[V]) .. (- 4.5[V]))'],
    ['x within 1 V ± 2 V', '(x within (- 1[V]) .. 3[V])'],
    ['x within 25 degC ± 5 K', '(x within 293.15[degC] .. 303.15[degC])'],
    ['x within 25 degC ± 5 degC', '(x within 293.15[degC] .. 303.15[degC])'],
    ['x within 20 dB ± 1 dB', '(x within 19[dB] .. 21[dB])'],
    ['a < b < c', 'comparison-chained'],
    ['a within 1 .. 2 < 3', 'comparison-chained-within'],
    ['A1.region = saturation', '(A1.region = saturation)'],
    // Primaries
    ['gain(A1, 1 kHz) + gain', '(gain(A1, 1000[Hz]) + gain)'],
    ['f()', 'f()'],
    ['if(a > b, a, b)', 'if((a > b), a, b)'],
    ['√√16', '(√ (√ 16))'],
    ['sqrt(x)', 'sqrt(x)'],
    ['A1.Qa.I_D', 'A1.Qa.I_D'],
    ['Q1.K', 'Q1.K'],
    ['A1.V_in', 'A1.V_in'],
    ['A1.in', 'A1.in'],
    ['β * beta', '(beta * beta)'],
    ['Δ_1 + λ + Ω_2 + µ_r', '(((Delta_1 + lambda) + Omega_2) + mu_r)'],
    ['pi * k_B / q_e', '((pi * k_B) / q_e)'],
    ['3 R_D', 'operator-missing'],
    ['10 000', 'digits-grouped'],
    ['10\u202f000', 'digits-grouped'],
    ['3,3', 'decimal-comma'],
    ['max(3,3)', 'decimal-comma'],
    ['max(3, 3)', 'max(3, 3)'],
    ['max(1.5,2.5)', 'max(1.5, 2.5)'],
    ['3(a)', 'operator-missing-plain'],
    ['1e3 + 1E-3 V', '(1000 + 0.001[V])'],
  ])('%s reads as %s', (text, expected) => {
    expect(reads(text)).toBe(expected);
  });
});

test.each([
  [['ohm', 'Ω', '\u2126'], (unit: string) => `2 k${unit}`],
  [['u', '\u00b5', '\u03bc'], (prefix: string) => `2 ${prefix}A`],
  [['degC', '°C', '℃'], (unit: string) => `20 ${unit}`],
  [['*', '·', '×', '\u22c5'], (sign: string) => `a ${sign} b`],
  [['||', '//', '∥'], (sign: string) => `a ${sign} b`],
  [['-', '\u2212'], (sign: string) => `a ${sign} ${sign}b`],
  [['<=', '≤'], (sign: string) => `a ${sign} b`],
  [['>=', '≥'], (sign: string) => `a ${sign} b`],
  [['^2', '²'], (power: string) => `2 mA/V${power} + x${power}`],
  [['..', '…'], (dots: string) => `x within 1 ${dots} 2`],
  [['±', '+/-'], (sign: string) => `x within 10 ${sign} 1`],
  [[' ', '\u00a0', '\u202f', '\t'], (blank: string) => `a${blank}+${blank}5${blank}V`],
  [['beta', 'β'], (name: string) => `${name}_1`],
  [['pi', 'π'], (name: string) => `2 * ${name}`],
])('%s are one spelling', (spellings, sentence) => {
  const [first, ...others] = spellings.map((each) => reads(sentence(each)));
  expect(first).not.toMatch(/^[a-z]+(-[a-z]+)+$/);
  for (const other of others) expect(other).toBe(first);
});

describe('a quantity', () => {
  const ends = (entry: string): unknown => {
    const read = quantity(entry);
    if (typeof read === 'string') return read;
    const { value, spread, conditions, as } = read;
    const bounds = spread?.bounds;
    return [
      value ? reads(entry.slice(value.span.start - 4, value.span.end - 4)) : null,
      spread?.tolerance ? showLiteral(spread.tolerance) : null,
      bounds ? [bounds.first && showLiteral(bounds.first), bounds.last && showLiteral(bounds.last)] : null,
      spread?.law ?? null,
      spread?.service ?? null,
      conditions.map(({ name, literal }) => `${name.name} = ${showLiteral(literal)}`),
      as?.unit.symbol ?? null,
    ];
  };

  test.each([
    ['10 kohm', ['10000[ohm]', null, null, null, null, [], null]],
    ['10 kohm ± 1 %', ['10000[ohm]', '0.01', null, null, false, [], null]],
    ['5 V +/- 50 mV', ['5[V]', '0.05[V]', null, null, false, [], null]],
    ['15 V ± 5 % service', ['15[V]', '0.05', null, null, true, [], null]],
    ['15 V ± 5 % normal service', ['15[V]', '0.05', null, 'normal', true, [], null]],
    ['-2.2 V in -4 V .. -1 V', ['(- 2.2[V])', null, ['-4[V]', '-1[V]'], null, false, [], null]],
    ['-2.2 V in -1 V .. -4 V', ['(- 2.2[V])', null, ['-1[V]', '-4[V]'], null, false, [], null]],
    ['8 mA in 5 mA ..', ['0.008[A]', null, ['0.005[A]', null], null, false, [], null]],
    ['8 mA in .. 9 mA', ['0.008[A]', null, [null, '0.009[A]'], null, false, [], null]],
    ['2 mA .. 9 mA', [null, null, ['0.002[A]', '0.009[A]'], null, false, [], null]],
    ['.. 1 nA', [null, null, [null, '1e-9[A]'], null, false, [], null]],
    ['5 mA ..', [null, null, ['0.005[A]', null], null, false, [], null]],
    ['1k..10k', [null, null, ['1000[ohm]', '10000[ohm]'], null, false, [], null]],
    ['1..5', [null, null, ['1', '5'], null, false, [], null]],
    ['-40 degC .. 85 degC', [null, null, ['233.15[degC]', '358.15[degC]'], null, false, [], null]],
    ['0 degC..60 degC uniform', [null, null, ['273.15[degC]', '333.15[degC]'], 'uniform', false, [], null]],
    [
      '5 mA in 2 mA .. 9 mA normal at V_DS = 15 V',
      ['0.005[A]', null, ['0.002[A]', '0.009[A]'], 'normal', false, ['V_DS = 15[V]'], null],
    ],
    [
      '10 mS at I_D = 200 mA, V_DS = -10 V as mA/V',
      ['0.01[S]', null, null, null, null, ['I_D = 0.2[A]', 'V_DS = -10[V]'], 'mA/V'],
    ],
    ['5 mA .. at V_DS = 15 V', [null, null, ['0.005[A]', null], null, false, ['V_DS = 15[V]'], null]],
    ['2 * R_S as kohm', ['(2 * R_S)', null, null, null, null, [], 'kΩ']],
    ['E24(R_S0) ± 1 %', ['E24(R_S0)', '0.01', null, null, false, [], null]],
    ['A1.A_v with V_C = -8 V', ['(A1.A_v with V_C = (- 8[V]))', null, null, null, null, [], null]],
    ['normal ± 5 % normal', ['normal', '0.05', null, 'normal', false, [], null]],
    ['log + service', ['(log + service)', null, null, null, null, [], null]],
    ['n-JFET', 'part'],
    ['a = b', 'comparison-misplaced'],
    ['R_D .. 5 kohm', 'limit-not-literal'],
    ['5 V ± R_D', 'limit-not-literal'],
  ])('%s', (entry, expected) => {
    expect(ends(entry)).toEqual(expected);
  });
});

test('a signed number is a literal, and nothing more is', () => {
  const literal = (text: string): string | null => {
    const found = literalOf(parseExpression(text) as Expr);
    return found && showLiteral(found);
  };
  expect(['-2 V', '2 V', '+2 V', '−40 °C', '4k7'].map(literal)).toEqual([
    '-2[V]',
    '2[V]',
    '2[V]',
    '233.15[degC]',
    '4700[ohm]',
  ]);
  expect(['-(2 V)', '- -2 V', '√4', '2 * 2', 'x', '- -2 degC'].map(literal)).toEqual([
    null,
    null,
    null,
    null,
    null,
    null,
  ]);
});
