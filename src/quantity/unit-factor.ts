// One factor of a unit (`mA`, `V^2`, `√Hz`) and how factors are written: typeset for the eye
// (mA/V², nV/√Hz), in plain ASCII for the sheet text (mA/V^2, nV/Hz^0.5).

import type { Prefix, UnitSymbol } from './unit-symbols.ts';

/** The exponent behind a symbol: a whole number, a decimal or a ratio, as written but in ASCII. */
export interface Exponent {
  readonly text: string;
  readonly value: number;
}

export interface UnitFactor {
  /** Whether a `/` stands before it. */
  readonly divides: boolean;
  /** Whether it is the square root of symbol and exponent: √Hz, Hz^0.5. */
  readonly root: boolean;
  readonly prefix: Prefix | null;
  readonly symbol: UnitSymbol;
  readonly exponent: Exponent;
}

export const EXPONENT_ONE: Exponent = { text: '1', value: 1 };

const SUPERSCRIPTS: Readonly<Record<string, string>> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
};

/** A whole number in superscript digits: -12 is ⁻¹². */
export function superscript(n: number): string {
  return String(n).replace(/[-\d]/g, (mark) => SUPERSCRIPTS[mark]);
}

/** The exponent that the factor has in the whole unit, `/` and root counted. */
export function factorPower(factor: UnitFactor): number {
  return factor.exponent.value * (factor.root ? 0.5 : 1) * (factor.divides ? -1 : 1);
}

/** The unit as it is set: kΩ, mA/V², nV/√Hz, /V. */
export function typesetFactors(factors: readonly UnitFactor[]): string {
  return factors
    .map((factor, i) => {
      const word = (factor.prefix?.typeset ?? '') + factor.symbol.typeset;
      return separator(factor, i, '·') + (factor.root ? '√' : '') + word + typesetExponent(factor.exponent);
    })
    .join('');
}

/** The unit as the sheet language reads it, ASCII alone: kohm, mA/V^2, nV/Hz^0.5, /V. */
export function asciiFactors(factors: readonly UnitFactor[]): string {
  return factors
    .map((factor, i) => {
      const word = (factor.prefix?.ascii ?? '') + factor.symbol.ascii;
      return separator(factor, i, '*') + word + asciiExponent(factor);
    })
    .join('');
}

function separator(factor: UnitFactor, index: number, times: string): string {
  if (factor.divides) return '/';
  return index > 0 ? times : '';
}

function typesetExponent({ text, value }: Exponent): string {
  if (value === 1) return '';
  if (Number.isInteger(value)) return superscript(value);
  return text.includes('/') ? `^(${text})` : `^${text}`;
}

function asciiExponent({ root, exponent }: UnitFactor): string {
  if (root) return `^${exponent.value / 2}`;
  if (exponent.value === 1) return '';
  return exponent.text.includes('/') ? `^(${exponent.text})` : `^${exponent.text}`;
}
