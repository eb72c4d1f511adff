// A field of a part or point as data sheets print it: min, nominal, max and condition, each to be edited alone.
// Of negative quantities min and max are by magnitude, as printed there; the text holds them in order of value.

import { literalOf, parseSheet } from '../../language/index.ts';
import type { Line, Literal, QuantityEntry, SheetTree, Splice } from '../../language/index.ts';
import { setEntry } from '../../language/index.ts';

type NumberColumn = 'low' | 'nominal' | 'high';

/** The pieces of a field's text, each as the author spelled it. */
interface Pieces {
  readonly low: string;
  readonly nominal: string;
  readonly high: string;
  /** Unit as typed, with the blank before it: ` mA`. */
  readonly unit: string;
  /** Law, condition and shown unit, with the blank before them. */
  readonly rest: string;
  readonly negative: boolean;
}

/** The body of a field that is a number or bounds, as a table of data-sheet numbers can show it; null for formulas. */
export function tableEntry(line: Line): QuantityEntry | null {
  const { tree } = line;
  if (tree.type !== 'field' || tree.body.type !== 'quantity') return null;
  const { value } = tree.body;
  return value === null || literalOf(value) !== null ? tree.body : null;
}

/** What stands at `at` and behind it: law, conditions, unit to show. */
export function conditionText(line: Line, entry: QuantityEntry): string {
  return line.text.slice(numbersEnd(entry), entry.span.end).trim();
}

/** The text of one number of the table, to be edited; empty where none is given. */
export function numberText(line: Line, column: NumberColumn): string {
  const pieces = piecesOf(line);
  return pieces === null ? '' : pieces[column];
}

/** The edit that gives one number of the table another text; a number without unit takes the row's. */
export function setNumber(tree: SheetTree, lineIndex: number, column: NumberColumn, text: string): Splice[] {
  const line = tree.lines[lineIndex]!;
  const pieces = piecesOf(line);
  if (pieces === null) return setEntry(tree, lineIndex, text);
  const written = text.trim();
  const withUnit = /^[-+−]?[\d.]+(?:[eE][-+]?\d+)?$/.test(written) ? written + pieces.unit : written;
  const next = { ...pieces, [column]: withUnit };
  return setEntry(tree, lineIndex, compose(next));
}

/** Three numbers in order of the table, such as come from a spreadsheet; empty ones stay blank. */
export function setNumbers(tree: SheetTree, lineIndex: number, numbers: readonly string[]): Splice[] {
  let present = tree;
  (['low', 'nominal', 'high'] as const).forEach((column, i) => {
    const text = numbers[i];
    if (text === undefined) return;
    const [splice] = setNumber(present, lineIndex, column, text);
    if (splice)
      present = parseSheet(present.text.slice(0, splice.start) + splice.text + present.text.slice(splice.end));
  });
  const [before, after] = [tree.lines[lineIndex]!, present.lines[lineIndex]!];
  return [{ start: before.offset, end: before.offset + before.text.length, text: after.text }];
}

function piecesOf(line: Line): Pieces | null {
  const entry = tableEntry(line);
  if (entry === null) return null;
  const slice = (literal: Literal | null | undefined): string =>
    literal ? line.text.slice(literal.span.start, literal.span.end) : '';
  const nominal = entry.value ? literalOf(entry.value) : null;
  const { bounds = null, tolerance = null } = entry.spread ?? {};
  const known = [nominal, bounds?.first ?? null, bounds?.last ?? null].filter((each) => each !== null);
  const negative = known.length > 0 && known.every((literal) => literal.value < 0);
  const unitOf = known.map((literal) => unitText(line, literal)).find((unit) => unit !== '') ?? '';
  const rest = line.text.slice(numbersEnd(entry), entry.span.end).trim();
  let low = bounds?.first ?? null;
  let high = bounds?.last ?? null;
  const swapped = low !== null && high !== null && low.value > high.value;
  if (swapped) [low, high] = [high, low];
  const shown = { low: slice(low), high: slice(high), nominal: slice(nominal), unit: unitOf, rest, negative };
  if (tolerance && nominal) {
    // Ends of a tolerance have no text of their own; the nominal carries it.
    return { ...shown, nominal: line.text.slice(nominal.span.start, tolerance.span.end), low: '', high: '' };
  }
  return negative ? { ...shown, low: shown.high, high: shown.low } : shown;
}

function compose({ low, nominal, high, rest, negative }: Pieces): string {
  const [first, last] = negative || /^[-−]/.test(low || high) ? [high, low] : [low, high];
  const bounds = first === '' && last === '' ? '' : [first, '..', last].filter((part) => part !== '').join(' ');
  const numbers = nominal === '' ? bounds : bounds === '' ? nominal : `${nominal} in ${bounds}`;
  return rest === '' ? numbers : `${numbers} ${rest}`;
}

function numbersEnd(entry: QuantityEntry): number {
  const { spread, value, conditions } = entry;
  const ends = [value?.span.end, spread?.bounds?.span.end, spread?.tolerance?.span.end].filter(
    (end) => end !== undefined,
  );
  return ends.length === 0 ? (conditions[0]?.name.span.start ?? entry.span.end) : Math.max(...ends);
}

/** The unit behind a number, with the blank before it. */
function unitText(line: Line, literal: Literal): string {
  const text = line.text.slice(literal.span.start, literal.span.end);
  return /^[-+−]?[\d.]+(?:[eE][-+]?\d+)?(\s*\D.*)$/.exec(text)?.[1] ?? '';
}
