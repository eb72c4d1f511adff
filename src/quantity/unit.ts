// Units as the sheet's grammar writes them: [ "/" ] factor { ("/" | "·" | "*") factor }, without blanks.
// `scanUnit` takes the longest unit from a place in a line, so `10 V/R` yields V; what a `/` glued to
// it then means is for the language to say.

import type { Dimension } from './dimension.ts';
import { DIMENSIONLESS, multiplyDimensions, raiseDimension } from './dimension.ts';
import type { ValueKind } from './kind.ts';
import { TEMPERATURE_POINT } from './kind.ts';
import type { Exponent, UnitFactor } from './unit-factor.ts';
import { asciiFactors, EXPONENT_ONE, factorPower, typesetFactors } from './unit-factor.ts';
import type { UnitFault } from './unit-fault.ts';
import { faultOfWord, isUnitFault } from './unit-fault.ts';
import { DECIBEL_SYMBOL, DEGREE_CELSIUS, readWord } from './unit-symbols.ts';

export interface Unit {
  /** As written. */
  readonly text: string;
  /** As set: kΩ, µA, mA/V², °C, nV/√Hz. */
  readonly symbol: string;
  readonly kind: ValueKind;
  /** SI value of one of it; for a point of the Celsius scale 1, with 273.15 K added on top. */
  readonly factor: number;
  /** factor = 10^exponent10 where it is a power of ten, else null. */
  readonly exponent10: number | null;
}

/** A unit in a longer text: it ends before `end`. */
interface ScannedUnit {
  readonly end: number;
  readonly unit: Unit;
  /** Why the factor behind a `/`, `·` or `*` that stands at `end` is none; null where no such mark stands there. */
  readonly behind: UnitFault | null;
}

interface ScannedFactors {
  readonly end: number;
  readonly factors: readonly UnitFactor[];
  readonly behind: UnitFault | null;
}

/** No unit of the trade has more. */
const HIGHEST_POWER = 9;

const WORD = /[A-Za-zΑ-Ωα-ω\u2126\u00b5°º℃%][A-Za-zΑ-Ωα-ω\u2126\u00b50-9_°º℃%]*/y;
const ROOT = /√|sqrt\(/y;
const EXPONENT = /\^\((?<ratio>[-−]?\d+\/\d+)\)|\^(?<decimal>[-−]?\d+(?:\.\d+)?)|(?<raised>⁻?[⁰¹²³⁴-⁹]+)/y;
const TIMES = /[·⋅×*]/;
const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Reads the longest unit that begins at `at`; a fault where none does. Spans count from the start of `text`. */
export function scanUnit(text: string, at: number): ScannedUnit | UnitFault {
  const scanned = scanFactors(text, at);
  if (isUnitFault(scanned)) return scanned;
  const unit = unitOf(text.slice(at, scanned.end), scanned.factors, at);
  return isUnitFault(unit) ? unit : { end: scanned.end, unit, behind: scanned.behind };
}

/** Reads the whole text as a unit (`kohm`, `mA/V^2`, `/V`, `1/V`, `nV/√Hz`), or tells what is wrong and where. */
export function parseUnit(text: string): Unit | UnitFault {
  const blank = /\s+/.exec(text);
  if (blank) {
    const joined = text.replace(/\s+/g, '');
    const hint = joined !== '' && !isUnitFault(parseUnit(joined)) ? joined : null;
    return { fault: 'blank inside', text, start: blank.index, end: blank.index + blank[0].length, hint };
  }
  const scanned = scanUnit(text, text.startsWith('1/') ? 1 : 0);
  if (isUnitFault(scanned)) return scanned;
  if (scanned.behind) return scanned.behind;
  const { end, unit } = scanned;
  if (end < text.length)
    return { fault: 'text behind', text: text.slice(end), start: end, end: text.length, hint: null };
  return { ...unit, text };
}

/** How a unit that the language reads is set: `uA/V^2` as µA/V²; throws RangeError where the text is no unit. */
export function typesetUnit(text: string): string {
  return knownUnit(text).symbol;
}

/** The unit of a text that must be one; throws RangeError where it is not. */
export function knownUnit(text: string): Unit {
  const unit = parseUnit(text);
  if (isUnitFault(unit)) throw new RangeError(`no unit: ${text}`);
  return unit;
}

/** The same unit in the ASCII spelling of the sheet language. */
export function asciiUnit(unit: Unit): string {
  return asciiFactors(knownFactors(unit.text));
}

/** The factors of a text that must be a unit; throws RangeError where it is not. */
export function knownFactors(text: string): readonly UnitFactor[] {
  const scanned = scanFactors(text, text.startsWith('1/') ? 1 : 0);
  if (isUnitFault(scanned) || scanned.end < text.length) throw new RangeError(`no unit: ${text}`);
  return scanned.factors;
}

/** The unit that the factors make, or what forbids them together. */
function unitOf(text: string, factors: readonly UnitFactor[], at: number): Unit | UnitFault {
  const fault = faultOfCombination(text, factors, at);
  if (fault) return fault;
  const first = factors[0];
  if (factors.length === 1 && first.symbol === DECIBEL_SYMBOL) return plainUnit(text, factors, first.symbol.kind);
  if (factors.length === 1 && first.symbol === DEGREE_CELSIUS && !first.divides)
    return plainUnit(text, factors, TEMPERATURE_POINT);
  let dimension: Dimension = DIMENSIONLESS;
  let exponent10 = 0;
  let factor = 1;
  let powerOfTen = true;
  for (const each of factors) {
    const power = factorPower(each);
    dimension = multiplyDimensions(dimension, raiseDimension(each.symbol.kind.dimension, power));
    exponent10 += ((each.prefix?.exponent10 ?? 0) + (each.symbol.exponent10 ?? 0)) * power;
    if (each.symbol.exponent10 === null) {
      factor = power > 0 ? factor * each.symbol.factor : factor / each.symbol.factor;
      powerOfTen = false;
    }
  }
  exponent10 = Math.round(exponent10 * 2) / 2;
  const whole = Math.floor(exponent10);
  if (whole !== exponent10) {
    factor *= Math.sqrt(10);
    powerOfTen = false;
  }
  return {
    text,
    symbol: typesetFactors(factors),
    kind: { dimension, scale: 'linear' },
    factor: factor * Number(`1e${whole}`),
    exponent10: powerOfTen ? whole : null,
  };
}

function plainUnit(text: string, factors: readonly UnitFactor[], kind: ValueKind): Unit {
  return { text, symbol: typesetFactors(factors), kind, factor: 1, exponent10: 0 };
}

/** dB is joined with nothing; %, ppm, deg, rad and degC have no power; a prefix under a power stays a power of √10. */
function faultOfCombination(text: string, factors: readonly UnitFactor[], start: number): UnitFault | null {
  const fault = (kind: 'power not allowed' | 'stands alone', hint: string | null): UnitFault => ({
    fault: kind,
    text,
    start,
    end: start + text.length,
    hint,
  });
  for (const factor of factors) {
    const power = Math.abs(factorPower(factor));
    if (factor.symbol === DECIBEL_SYMBOL && (factors.length > 1 || factor.divides)) return fault('stands alone', 'dB');
    if (!factor.symbol.prefixes && (factor.root || factor.exponent.value !== 1))
      return fault('power not allowed', factor.symbol.ascii);
    if (power === 0 || power > HIGHEST_POWER) return fault('power not allowed', null);
    const halves = (factor.prefix?.exponent10 ?? 0) * power * 2;
    if (Math.abs(halves - Math.round(halves)) > 1e-6)
      return fault('power not allowed', asciiFactors([{ ...factor, divides: false, prefix: null }]));
  }
  return null;
}

// ---------------------------------------------------------------- scanning

function scanFactors(text: string, at: number): ScannedFactors | UnitFault {
  const factors: UnitFactor[] = [];
  let divides = text[at] === '/';
  let end = divides ? at + 1 : at;
  for (;;) {
    const scanned = scanFactor(text, end, divides);
    if (isUnitFault(scanned)) {
      if (factors.length === 0) return scanned;
      // The separator before it is given back.
      return { end: end - 1, factors, behind: scanned };
    }
    factors.push(scanned.factor);
    end = scanned.end;
    divides = text[end] === '/';
    if (!divides && !TIMES.test(text[end] ?? '')) return { end, factors, behind: null };
    end++;
  }
}

function scanFactor(text: string, at: number, divides: boolean): { end: number; factor: UnitFactor } | UnitFault {
  const root = match(ROOT, text, at)?.[0] ?? '';
  const parenthesis = root.length > 1;
  const start = at + root.length;
  const word = match(WORD, text, start)?.[0];
  if (!word) return { fault: 'unit missing', text: '', start, end: start, hint: null };
  // A name before a parenthesis is a function, never a unit.
  const read = text[start + word.length] === '(' ? null : readWord(word);
  if (!read) return faultOfWord(word, start);
  let end = start + word.length;
  const raised = scanExponent(text, end);
  if (raised) end = raised.end;
  let exponent = raised?.exponent ?? EXPONENT_ONE;
  if (parenthesis) {
    if (text[end] !== ')') return { fault: 'unit missing', text: text.slice(at, end), start: at, end, hint: null };
    end++;
  }
  if (root && !Number.isInteger(exponent.value))
    return { fault: 'power not allowed', text: text.slice(at, end), start: at, end, hint: null };
  const half = !root && Math.abs(exponent.value % 1) === 0.5;
  if (half) exponent = { text: String(exponent.value * 2), value: exponent.value * 2 };
  return { end, factor: { divides, root: half || root !== '', ...read, exponent } };
}

function scanExponent(text: string, at: number): { end: number; exponent: Exponent } | null {
  const found = match(EXPONENT, text, at);
  if (!found) return null;
  const { ratio, decimal, raised = '' } = found.groups!;
  const written =
    ratio ?? decimal ?? [...raised].map((mark) => (mark === '⁻' ? '-' : String(RAISED.indexOf(mark)))).join('');
  const ascii = written.replace('−', '-');
  const [over, under = '1'] = ascii.split('/');
  const value = Number(over) / Number(under);
  if (!Number.isFinite(value)) return null;
  return { end: at + found[0].length, exponent: { text: ascii, value } };
}

function match(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}
