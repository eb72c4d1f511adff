// Numbers as the grammar has them: a decimal with or without unit, or a component code. A unit is taken
// as far as it goes; what may not stand glued to it, or follow a number at all, is told from here,
// because only here the blanks are still known.

import type { Unit, ValueKind } from '../quantity/index.ts';
import { describeUnitFault, dimensionName, isUnitFault, PLAIN, scaleToSI, scanCode } from '../quantity/index.ts';
import { isBlank, isDigit, isLetter, nameEnd, skipBlanks } from './characters.ts';
import { halt } from './messages.ts';
import { scanUnitAt } from './unit-memo.ts';

export interface NumberToken {
  readonly type: 'number';
  readonly start: number;
  readonly end: number;
  /** The digits as written; '' for a component code, which has no other spelling of its value. */
  readonly numeral: string;
  readonly value: number;
  readonly unit: Unit | null;
  readonly kind: ValueKind;
}

/** More digits than any number needs; keeps exact decimal arithmetic short. */
const MOST_DIGITS = 100;

const CODE_LETTERS = 'RkMGpnuµμ';

/** Reads the number that begins at `at`, where a digit stands; leaves with a message where it is none. */
export function scanNumber(text: string, at: number, limit: number): NumberToken {
  const code = scanCode(text, at);
  if (code) {
    refuseUnitBehindCode(text, at, code.end, limit, code.kind);
    return { type: 'number', start: at, numeral: '', ...code };
  }
  const end = numeralEnd(text, at, limit);
  const numeral = text.slice(at, end);
  const found = unitBehind(text, at, end, limit);
  if (!found) refuseDigitsBehind(text, at, end, limit);
  const unit = found?.unit ?? null;
  return {
    type: 'number',
    start: at,
    end: found?.end ?? end,
    numeral,
    value: checkedValue(numeral, unit, { start: at, end }),
    unit,
    kind: unit?.kind ?? PLAIN,
  };
}

/** The SI value of a numeral; leaves with a message where it overflows or vanishes. */
export function checkedValue(numeral: string, unit: Unit | null, span: { start: number; end: number }): number {
  const value = scaleToSI(numeral, unit);
  const vanished = value === 0 && /[1-9]/.test(numeral.replace(/[eE].*$/, ''));
  if (!Number.isFinite(value) || (vanished && unit?.kind.scale !== 'celsius')) halt('number-range', span, numeral);
  return value;
}

function digitsEnd(text: string, at: number, limit: number): number {
  let i = at;
  while (i < limit && isDigit(text.charCodeAt(i))) i++;
  return i;
}

function numeralEnd(text: string, at: number, limit: number): number {
  let end = digitsEnd(text, at, limit);
  if (text[end] === '.' && end < limit && text[end + 1] !== '.') {
    const fraction = digitsEnd(text, end + 1, limit);
    if (fraction === end + 1) {
      const whole = text.slice(at, end);
      halt('decimals-missing', { start: at, end: end + 1 }, `${whole}.`, `${whole}.0`);
    }
    end = fraction;
  }
  if ((text[end] === 'e' || text[end] === 'E') && end < limit) {
    const sign = text[end + 1] === '+' || text[end + 1] === '-' || text[end + 1] === '−' ? 1 : 0;
    const exponent = digitsEnd(text, end + 1 + sign, limit);
    if (exponent > end + 1 + sign) end = exponent;
  }
  if (end - at > MOST_DIGITS) halt('number-length', { start: at, end }, MOST_DIGITS);
  return end;
}

// ---------------------------------------------------------------- units

function unitBehind(text: string, at: number, end: number, limit: number): { unit: Unit; end: number } | null {
  const start = skipBlanks(text, end, limit);
  if (start === limit) return null;
  const first = text[start];
  const begins = first === '/' || first === '√' || first === '%' || first === '°' || first === 'º' || first === '℃';
  if (!begins && !isLetter(text.charCodeAt(start))) return null;
  const read = scanUnitAt(text, start, limit);
  if (!isUnitFault(read)) {
    refuseGluedOperator(text, at, read.end, limit);
    return read;
  }
  if (read.fault === 'power not allowed' || read.fault === 'stands alone')
    halt('unit-form', { start: read.start, end: read.end }, describeUnitFault(read));
  if (first === '/' || first === '√') return null;
  const numeral = text.slice(at, end);
  const wordEnd = Math.max(nameEnd(text, start, limit), start + 1);
  const word = text.slice(start, wordEnd);
  const whole = { start: at, end: wordEnd };
  if (word.length === 1 && CODE_LETTERS.includes(word) && /^\d+(\.\d+)?$/.test(numeral)) {
    const unit = `${numeral} ${word === 'R' ? 'ohm' : `${word}${'pnuµμ'.includes(word) ? 'F' : 'ohm'}`}`;
    const code = numeral.includes('.') ? numeral.replace('.', word) : numeral + word;
    const written = text.slice(at, wordEnd);
    if (start === end) halt('code-decimals', whole, written, code, unit);
    if (word !== 'R') halt('code-blank', whole, written, code, unit);
  }
  if (/^mega?$/i.test(word)) halt('unit-mega', whole, numeral, word);
  if (start > end) return null;
  const letter = /^([A-Za-zΑ-Ωα-ωµ])\d+$/.exec(word);
  if (letter && !CODE_LETTERS.includes(letter[1])) halt('code-letter', whole, text.slice(at, wordEnd), letter[1]);
  if (/\d/.test(word)) {
    const stop = text[wordEnd] === '.' ? digitsEnd(text, wordEnd + 1, limit) : wordEnd;
    halt('code-end', { start: at, end: stop }, text.slice(at, stop));
  }
  return halt('unit-unknown', { start, end: wordEnd }, numeral, word, read.hint);
}

/** `10 V/R`, `10 V*2`, `10 V^x`, `10 V /A`: behind a unit these signs need blanks on both sides, or on none if they belong to it. */
function refuseGluedOperator(text: string, at: number, end: number, limit: number): void {
  const sign = text[end];
  if (end >= limit) return;
  if (sign === '^') refusePower(text, at, end, end + 1, limit);
  const next = skipBlanks(text, end, limit);
  if (next > end && text[next] === '/') {
    const read = scanUnitAt(text, next, limit);
    if (!isUnitFault(read))
      halt(
        'unit-blank',
        { start: at, end: read.end },
        text.slice(at, read.end),
        text.slice(at, end) + text.slice(next, read.end),
      );
  }
  const parallel = sign === '/' && text[end + 1] === '/';
  if (parallel || !(sign === '/' || sign === '*' || sign === '·' || sign === '⋅' || sign === '×')) return;
  const from = skipBlanks(text, end + 1, limit);
  if (from === limit) return;
  const stop = Math.max(operandEnd(text, from, limit), end + 1);
  const right = `${text.slice(at, end)} ${sign} ${text.slice(from, stop)}`.trimEnd();
  halt('unit-glued', { start: at, end: stop }, text.slice(at, stop).trimEnd(), right);
}

/** Leaves with the message about a power behind a quantity; the exponent is looked for from `from`. */
export function refusePower(text: string, at: number, end: number, from: number, limit: number): never {
  const stop = operandEnd(text, skipBlanks(text, from, limit), limit);
  const exponent = text
    .slice(from, stop)
    .trim()
    .replace(/[⁻⁰¹²³⁴-⁹]/g, (mark) => '-0123456789'['⁻⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(mark)]);
  const quantity = text.slice(at, end);
  const code = scanCode(text, at)?.end === end;
  const glued = !code && /^-?\d+$/.test(exponent) ? `${quantity}^${exponent}` : null;
  return halt('unit-power', { start: at, end: stop }, text.slice(at, stop), `(${quantity})^${exponent}`, glued);
}

/** The end of a signed number, a path, or what stands in parentheses, for quoting it. */
function operandEnd(text: string, at: number, limit: number): number {
  let i = at;
  while (i < limit && '-−+√⁻'.includes(text[i])) i++;
  while (i < limit && '⁰¹²³⁴⁵⁶⁷⁸⁹'.includes(text[i])) i++;
  while (i < limit && (nameEnd(text, i, limit) > i || (text[i] === '.' && text[i + 1] !== '.'))) i++;
  if (text[i] !== '(') return i;
  let depth = 0;
  for (; i < limit; i++) {
    if (text[i] === '(') depth++;
    else if (text[i] === ')' && --depth === 0) return i + 1;
  }
  return limit;
}

// ---------------------------------------------------------------- what may not follow

function refuseUnitBehindCode(text: string, at: number, end: number, limit: number, kind: ValueKind): void {
  const start = skipBlanks(text, end, limit);
  if (start === limit || !(text[start] === '/' || text[start] === '√' || isLetter(text.charCodeAt(start)))) return;
  const read = scanUnitAt(text, start, limit);
  if (isUnitFault(read)) return;
  halt(
    'code-with-unit',
    { start: at, end: read.end },
    text.slice(at, read.end),
    text.slice(at, end),
    dimensionName(kind),
  );
}

/** `10 000` and `3,3`: what other notations would make one number. */
function refuseDigitsBehind(text: string, at: number, end: number, limit: number): void {
  const numeral = text.slice(at, end);
  if (text[end] === ',' && end + 1 < limit && isDigit(text.charCodeAt(end + 1)) && /^\d+$/.test(numeral)) {
    const stop = digitsEnd(text, end + 1, limit);
    const fraction = text.slice(end + 1, stop);
    // `3,3.1` has a point already, so that its comma stands between two numbers.
    if (text[stop] !== '.' || text[stop + 1] === '.')
      halt(
        'decimal-comma',
        { start: at, end: stop },
        `${numeral},${fraction}`,
        `${numeral}.${fraction}`,
        `${numeral}, ${fraction}`,
      );
  }
  let stop = end;
  while (stop < limit && isBlank(text.charCodeAt(stop))) {
    const next = skipBlanks(text, stop, limit);
    if (digitsEnd(text, next, limit) !== next + 3) break;
    stop = next + 3;
  }
  if (stop > end && nameEnd(text, stop, limit) === stop && /^\d{1,3}$/.test(numeral)) {
    const found = text.slice(at, stop);
    halt('digits-grouped', { start: at, end: stop }, found, found.replace(/\D/g, ''));
  }
}
