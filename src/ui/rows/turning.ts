// Turning a number: the literal of a row that can be stepped, its neighbours, and the text of another value in the
// author's own spelling. Resistances, capacitances and inductances go along a preferred series; other numbers go
// by 1, 2 or 5 in their third digit.

import { literalOf } from '../../language/index.ts';
import type { Line, Literal, QuantityEntry, SheetTree, Splice } from '../../language/index.ts';
import {
  CAPACITANCE,
  fromSI,
  INDUCTANCE,
  nextPreferred,
  plainText,
  preferredValue,
  RESISTANCE,
  sameKind,
  scaleToSI,
  typesetUnit,
} from '../../quantity/index.ts';
import type { SeriesName } from '../../quantity/index.ts';
import type { Column } from '../desk/index.ts';

const SERIES: SeriesName = 'E24';
const STEPPED_DIGIT = 3;
/** Share of a step that is float noise. */
const NOISE = 1e-6;

/** A number in a line that can be turned. */
interface Turned {
  readonly line: Line;
  readonly literal: Literal;
}

/** The number that a column of a line turns: an end where an end has the focus, else the nominal value; null where there is none. */
export function turnedNumber(tree: SheetTree, lineIndex: number, column: Column): Turned | null {
  const line = tree.lines[lineIndex];
  const entry = line && quantityOf(line);
  if (!line || !entry) return null;
  const nominal = entry.value && literalOf(entry.value);
  const { first = null, last = null } = entry.spread?.bounds ?? {};
  if ((column === 'low' || column === 'high') && line.tree.type === 'field' && first && last) {
    const [least, most] = first.value <= last.value ? [first, last] : [last, first];
    // Of negative quantities the ends stand by magnitude.
    const isLeast = (column === 'low') !== (least.value < 0 && most.value < 0);
    return { line, literal: isLeast ? least : most };
  }
  return nominal ? { line, literal: nominal } : null;
}

/** The next value in one direction; null where there is none. */
export function nextValue({ literal }: Turned, way: 'up' | 'down'): number | null {
  const { value, kind } = literal;
  if (isPreferred(literal)) return nextPreferred(SERIES, value, way);
  const { amount, toSI } = inUnit(literal);
  const step = stepOf(amount);
  // What stands between two steps goes to the nearer of them in that direction first.
  const place = amount / step;
  const moved = (way === 'up' ? Math.floor(place + NOISE) + 1 : Math.ceil(place - NOISE) - 1) * step;
  const next = toSI(moved);
  return kind.scale === 'linear' && next * value < 0 ? null : next;
}

/** The nearest value that stepping could reach. */
export function snapped({ literal }: Turned, value: number): number {
  if (isPreferred(literal)) return preferredValue(SERIES, Math.max(value, Number.MIN_VALUE), 'nearest');
  const { unit } = literal;
  const amount = unit ? fromSI(value, unit) : value;
  const step = stepOf(amount);
  return inUnit(literal).toSI(Math.round(amount / step) * step);
}

/** A value to three digits in the unit of the number it would replace, as it is shown. */
export function shownDigits({ literal }: Turned, value: number): number {
  const { unit } = literal;
  const amount = unit ? fromSI(value, unit) : value;
  return inUnit(literal).toSI(Number(amount.toPrecision(STEPPED_DIGIT)));
}

/** The nearest value of the series that stepping goes along; null where the number is no resistance, capacitance or inductance. */
export function nearestBuyable({ literal }: Turned, value: number): { series: SeriesName; value: number } | null {
  if (!isPreferred(literal) || !(value > 0)) return null;
  return { series: SERIES, value: preferredValue(SERIES, value, 'nearest') };
}

/** The edit that puts another value in the number's place. */
export function setTurned({ line, literal }: Turned, value: number): Splice[] {
  const { start, end } = literal.span;
  const written = line.text.slice(start, end);
  return [{ start: line.offset + start, end: line.offset + end, text: spelled(value, literal, written) }];
}

function quantityOf({ tree }: Line): QuantityEntry | null {
  if (tree.type === 'cell') return tree.entry.type === 'quantity' ? tree.entry : null;
  return tree.type === 'field' && tree.body.type === 'quantity' ? tree.body : null;
}

function isPreferred({ kind, value }: Literal): boolean {
  return value > 0 && [RESISTANCE, CAPACITANCE, INDUCTANCE].some((each) => sameKind(each, kind));
}

/** The number as it stands before its unit, and the way back. */
function inUnit({ value, unit }: Literal): { amount: number; toSI: (amount: number) => number } {
  const decimal = (amount: number): string => String(Number(amount.toPrecision(12)));
  return {
    amount: unit ? fromSI(value, unit) : value,
    toSI: (amount) => scaleToSI(decimal(amount), unit),
  };
}

/** 1, 2 or 5 in the third digit, so that a step is about one part in a hundred. */
function stepOf(amount: number): number {
  const lead = amount === 0 ? 0 : Math.floor(Math.log10(Math.abs(amount)) + 1e-9);
  const mantissa = Math.abs(amount) / 10 ** lead;
  const factor = mantissa < 2 ? 1 : mantissa < 5 ? 2 : 5;
  return Number((factor * 10 ** (lead - STEPPED_DIGIT + 1)).toPrecision(3));
}

/** A value in the spelling of the number it replaces: code, unit and the blank before it. */
function spelled(value: number, { unit, kind, value: before }: Literal, written: string): string {
  const code = /^\d+[RkKMGpnuµ]\d*$/.test(written.trim());
  if (code) return codeText(value, written.includes('K') ? 'K' : 'k') ?? plainText(value, kind);
  if (unit === null) return plainText(value, kind);
  // A unit stays as long as the number in it reads as well as the one before.
  const keeps = reads(fromSI(value, unit)) || !reads(fromSI(before, unit)) || unit.exponent10 === null;
  const plain = plainText(value, kind, keeps ? { unit } : {});
  const at = plain.indexOf(' ');
  if (at < 0) return plain;
  const asTyped = keeps
    ? unit.text
    : /[^\x20-\x7e]/.test(unit.text)
      ? typesetUnit(plain.slice(at + 1))
      : plain.slice(at + 1);
  const blank = /[\d.](\s*)\D*$/.exec(written)?.[1] ?? ' ';
  return plain.slice(0, at) + blank + asTyped;
}

/** Whether a number stands well before a unit: one to three digits before the point, or 0. */
function reads(amount: number): boolean {
  const size = Math.abs(amount);
  return size === 0 || (size >= 1 && size < 1000);
}

const CODE_PREFIXES: readonly (readonly [letter: string, size: number])[] = [
  ['G', 1e9],
  ['M', 1e6],
  ['k', 1e3],
  ['R', 1],
  ['u', 1e-6],
  ['n', 1e-9],
  ['p', 1e-12],
];

function codeText(value: number, kilo: string): string | null {
  const found = CODE_PREFIXES.find(([, size]) => value >= size * 0.9999);
  if (!found) return null;
  const [letter, size] = found;
  const digits = String(Number((value / size).toPrecision(6)));
  const mark = letter === 'k' ? kilo : letter;
  return digits.includes('.') ? digits.replace('.', mark) : digits + mark;
}
