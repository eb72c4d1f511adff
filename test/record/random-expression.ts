// Random expressions of the sheet language, as text.

import fc from 'fast-check';

/** Every form that an expression can take, with names, units, calls and conditions. */
export const anyExpression: fc.Arbitrary<string> = fc.letrec<{ expr: string; atom: string }>((tie) => ({
  atom: fc.oneof(
    fc.constantFrom(
      'V_DD',
      'I_D',
      'R_Sbuy',
      'Q1',
      'headroom',
      'beta',
      'lambda_1',
      'A1.I_D',
      'A1.Qa.V_GS',
      'B2.margin',
      'V_GSoff',
      'pi',
    ),
    fc.constantFrom(
      '15 V',
      '4k7',
      '10p',
      '2.5 mA/V^2',
      '4.7 nV/√Hz',
      '-40 degC',
      '5 %',
      '20 dB',
      '0.01 /V',
      '1.5e-3',
      '3 uA',
      '0.5 V^0.5',
    ),
    fc.constantFrom('saturation', '12345.678 ohm', '1 V·s', '45 deg', '3 ppm', '7', '0'),
  ),
  expr: fc.oneof(
    { maxDepth: 5, withCrossShrink: true },
    tie('atom'),
    fc
      .tuple(tie('expr'), fc.constantFrom('+', '-', '*', '/', '||', '>=', '=', 'and', 'or'), tie('expr'))
      .map(([a, o, b]) => `(${a}) ${o} (${b})`),
    fc
      .tuple(tie('expr'), fc.constantFrom('+', '-', '*', '/', '||'), tie('atom'))
      .map(([a, o, b]) => `(${a}) ${o} ${b}`),
    fc.tuple(tie('expr'), fc.constantFrom('2', '-1', '(1/2)', '0.5')).map(([a, n]) => `(${a})^${n}`),
    tie('expr').map((a) => `-(${a})`),
    tie('expr').map((a) => `√(${a})`),
    tie('expr').map((a) => `not (${a})`),
    fc
      .tuple(fc.constantFrom('sqrt', 'abs', 'ln', 'dB', 'E24_up', 'low', 'log10', 'atan'), tie('expr'))
      .map(([f, a]) => `${f}(${a})`),
    fc
      .tuple(fc.constantFrom('min', 'max', 'par', 'hypot', 'round', 'e_n', 'HD2'), tie('expr'), tie('expr'))
      .map(([f, a, b]) => `${f}(${a}, ${b})`),
    fc.tuple(tie('expr'), tie('expr'), tie('expr')).map(([a, b, c]) => `if(${a}, ${b}, ${c})`),
    fc.tuple(tie('expr'), tie('expr')).map(([a, b]) => `((${a}) with V_C = (${b}))`),
    fc.tuple(tie('expr'), tie('expr'), tie('expr')).map(([a, b, c]) => `((${a}) within (${b}) .. (${c}))`),
  ),
})).expr;

/** Arithmetic of plain numbers and names, and how to compute it. */
export interface Arithmetic {
  readonly text: string;
  readonly value: number;
}

const NAMED: Readonly<Record<string, number>> = { V_A: 1.25, I_B: 0.75, gain: 2.5, beta: 3.5 };

/** The names in `anyArithmetic` by their TeX symbol. */
export const ARITHMETIC_SYMBOLS: Readonly<Record<string, number>> = {
  'V_{\\mathrm{A}}': NAMED['V_A']!,
  'I_{\\mathrm{B}}': NAMED['I_B']!,
  '\\mathrm{gain}': NAMED['gain']!,
  '\\beta': NAMED['beta']!,
};

/** Arithmetic with every sign and with no more parentheses than the sheet language needs. */
export const anyArithmetic: fc.Arbitrary<Arithmetic> = fc.letrec<{ expr: Ranked; atom: Ranked }>((tie) => ({
  atom: fc.oneof(
    fc.constantFrom(...Object.entries(NAMED)).map(([text, value]): Ranked => ({ text, value, rank: 4 })),
    fc.constantFrom('2', '0.5', '13', '1.75').map((text): Ranked => ({ text, value: Number(text), rank: 4 })),
  ),
  expr: fc.oneof(
    { maxDepth: 5, withCrossShrink: true },
    tie('atom'),
    pair(tie, (a, b) => ({ text: `${at(a, 1)} + ${at(b, 2)}`, value: a.value + b.value, rank: 1 })),
    pair(tie, (a, b) => ({ text: `${at(a, 1)} - ${at(b, 2)}`, value: a.value - b.value, rank: 1 })),
    pair(tie, (a, b) => ({ text: `${at(a, 2)} * ${at(b, 3)}`, value: a.value * b.value, rank: 2 })),
    pair(tie, (a, b) => ({ text: `${at(a, 2)} / ${at(b, 3)}`, value: a.value / b.value, rank: 2 })),
    pair(tie, (a, b) => ({
      text: `${at(a, 2)} || ${at(b, 3)}`,
      value: (a.value * b.value) / (a.value + b.value),
      rank: 2,
    })),
    tie('expr').map((a): Ranked => ({ text: `-${at(a, 3)}`, value: -a.value, rank: 3 })),
    tie('expr').map((a): Ranked => ({ text: `${at(a, 5)}^2`, value: a.value ** 2, rank: 4 })),
    tie('expr').map((a): Ranked => ({ text: `${at(a, 5)}^-1`, value: a.value ** -1, rank: 4 })),
    tie('expr').map((a): Ranked => ({ text: `abs(${a.text})`, value: Math.abs(a.value), rank: 5 })),
    tie('expr').map((a): Ranked => ({ text: `sqrt(abs(${a.text}))`, value: Math.sqrt(Math.abs(a.value)), rank: 5 })),
  ),
})).expr;

interface Ranked extends Arithmetic {
  /** 1 sum, 2 product, 3 signed, 4 power or atom, 5 what stands in marks of its own. */
  readonly rank: number;
}

function at(part: Ranked, rank: number): string {
  const isName = /^[\w.]+$/.test(part.text);
  return part.rank >= rank || isName ? part.text : `(${part.text})`;
}

function pair(
  tie: (key: 'expr') => fc.Arbitrary<Ranked>,
  join: (a: Ranked, b: Ranked) => Ranked,
): fc.Arbitrary<Ranked> {
  return fc.tuple(tie('expr'), tie('expr')).map(([a, b]) => join(a, b));
}
