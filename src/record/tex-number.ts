// Numbers and units in TeX: digits as they were written, a thin space before the unit, the unit upright.

import type { NumberExpr } from '../language/index.ts';
import { fromSI } from '../quantity/index.ts';

/** A number in TeX, and what matters to its neighbours. */
export interface NumberTex {
  readonly tex: string;
  readonly negative: boolean;
  /** Neither a unit nor a power of ten behind the digits. */
  readonly bare: boolean;
}

const PLAIN_NUMBER = /^(\d+(?:\.\d+)?)(?:[eE]([+\-−]?\d+))?(?![\d.])/;
/** Codes of IEC 60062: the letter stands for the decimal point. */
const CODE = /^(\d+)([RkKMGpnuµμ])(\d*)$/;
/** Sign, digits, power of ten and unit of a printed value. */
const SHOWN = /^([-−]?)(∞|\d+(?:\.\d+)?)(?:e([-−]?\d+))?(?: (.*))?$/;
/** From this many digits before the point they stand in groups of three. */
const GROUPED_FROM = 5;
/** Digits of a number that has no text of its own: enough for any sum of two literals, short of the last bits. */
const FOLDED_DIGITS = 12;

/** The number at `expr.span` of `text`, with the digits that stand there; codes are spelled out (`4k7` as 4.7 kΩ). */
export function texOfNumber(expr: NumberExpr, text: string): NumberTex {
  const written = text.slice(expr.span.start, expr.span.end).trim();
  const code = CODE.exec(written);
  if (code && expr.unit) {
    const [, whole, letter, decimals] = code;
    const prefix = letter === 'R' ? '' : letter === 'K' ? 'k' : letter === 'u' || letter === 'μ' ? 'µ' : letter!;
    const unit = prefix + ('RkKMG'.includes(letter!) ? 'Ω' : 'F');
    return number(decimals === '' ? whole! : `${whole}.${decimals}`, null, unit);
  }
  const plain = PLAIN_NUMBER.exec(written);
  // Limits such as 5 mA ± 10 % are two numbers of which neither stands in the text.
  const whole = plain !== null && !/±|\+\/-/.test(written);
  if (whole) return number(plain[1]!, plain[2] ?? null, expr.unit?.symbol ?? null);
  const superscript = fromSuperscript(written);
  if (superscript !== null) return number(superscript, null, null);
  const amount = expr.unit ? fromSI(expr.value, expr.unit) : expr.value;
  const [digits, exponent] = String(Number(Math.abs(amount).toPrecision(FOLDED_DIGITS))).split('e');
  const folded = number(digits!, exponent ?? null, expr.unit?.symbol ?? null);
  return amount < 0 ? { ...folded, tex: `-${folded.tex}`, negative: true } : folded;
}

/** A value as it is printed (`−1.31 kΩ`, `2.5e7`, `∞`, `saturation`) in TeX. */
export function texOfShown(text: string): NumberTex {
  const [, sign, digits, exponent, unit] = SHOWN.exec(text) ?? [];
  if (digits === undefined)
    return { tex: `\\mathrm{${text.replace(/[^A-Za-z ]/g, '').replace(/ /g, '\\ ')}}`, negative: false, bare: true };
  const value =
    digits === '∞' ? { tex: '\\infty', negative: false, bare: true } : number(digits, exponent ?? null, unit || null);
  return sign === '' ? value : { ...value, tex: `-${value.tex}`, negative: true };
}

/** A typeset unit (`kΩ`, `mA/V²`, `nV/√Hz`, `°C`) in TeX. */
export function texOfUnit(symbol: string): string {
  return symbol.replace(UNIT_TOKEN, (token) => {
    if (token.startsWith('^')) return `^{${token.replace(/[\^()]/g, '').replace('−', '-')}}`;
    if (/^[⁻⁰¹²³⁴-⁹]/.test(token)) return `^{${fromSuperscript(token)}}`;
    if (token.startsWith('√')) return `\\sqrt{${texOfUnit(token.slice(1))}}`;
    if (token === '°C') return '{}^{\\circ}\\mathrm{C}';
    if (token === '%') return '\\%';
    if (token === '/' || /^\d/.test(token)) return token;
    if (/^[A-Za-zΩµ]+$/.test(token)) return letters(token);
    return '{\\cdot}';
  });
}

const UNIT_TOKEN = /√[A-Za-zΩµ]+|\^\([^)]*\)|\^[-−]?[\d.]+|⁻?[⁰¹²³⁴-⁹]+|°C|[A-Za-zΩµ]+|\d+|[^]/g;

/** KaTeX has no upright µ in mathematics: as text it comes upright from the face behind its own. */
function letters(text: string): string {
  return `\\mathrm{${text.replace(/Ω/g, '\\Omega{}').replace(/µ/g, '\\text{\\char"B5}')}}`;
}

function number(digits: string, exponent: string | null, unit: string | null): NumberTex {
  const power = exponent === null ? '' : ` \\times 10^{${exponent.replace('−', '-').replace(/^\+/, '')}}`;
  const behind = unit === null || unit === '' ? '' : `\\,${texOfUnit(unit)}`;
  return { tex: grouped(digits) + power + behind, negative: false, bare: power === '' && behind === '' };
}

function grouped(digits: string): string {
  const [whole, decimals] = digits.split('.');
  const inGroups = whole!.length < GROUPED_FROM ? whole! : whole!.replace(/\B(?=(\d{3})+$)/g, '\\,');
  return decimals === undefined ? inGroups : `${inGroups}.${decimals}`;
}

function fromSuperscript(text: string): string | null {
  const plain = text.replace(/[⁻⁰¹²³⁴-⁹]/g, (character) => '-0123456789'['⁻⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(character)]!);
  return /^[⁻⁰¹²³⁴-⁹]+$/.test(text) ? plain : null;
}
