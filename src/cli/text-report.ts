// The sheet as text for a terminal: the verdict, what fails, then the sheet's own rows section by
// section with their values, and at the end what is to be heeded.

import { lineColumn } from '../language/index.ts';
import type { FieldTree, Line, Note, Source } from '../language/index.ts';
import {
  answeredSentences,
  checkText,
  declaredSentences,
  endsText,
  failingText,
  failsCheck,
  shareText,
  shownCell,
  shownOwn,
  shownReading,
  verdictOf,
} from '../record/index.ts';
import type { JudgedSpread } from '../record/index.ts';
import type { SheetSpread } from '../spread/index.ts';
import type { CellReading, Fault, OfferedReading, Sheet } from '../sheet/index.ts';
import { entryText } from './entry-text.ts';
import type { Column } from './text-table.ts';
import { characterCount, rowLines, widthLeft, wrapText } from './text-table.ts';

/** A line of the sheet, or a value under it. */
interface Row {
  readonly type: 'row';
  readonly name: string;
  readonly entry: string;
  readonly value: string;
  /** Low and high over the declared set. */
  readonly ends: string;
  readonly remark: string;
}
interface Block {
  readonly type: 'section' | 'message';
  readonly text: string;
}
type Item = Row | Block;

const INDENT = '  ';
/** The entries take at most this share of what names and values leave. */
const ENTRY_SHARE = 0.6;
const LEAST_ENTRY = 16;
/** Sources and notes that have less room than this stand under their row. */
const LEAST_REMARK = 8;
const REMARK_LINES = 2;

/** The report in lines of at most `width` characters, as far as names and values fit in it. */
export function textReport(sheet: Sheet, width: number, judged: JudgedSpread | null): string {
  const verdict = verdictOf(sheet, judged);
  const failing = verdict.failing.flatMap((cell): Item[] => {
    const row = { ...cellRow(cell, judged), name: INDENT + cell.name, remark: `line ${cell.tree.line.index + 1}` };
    const isPlain = cell.check?.holds === false;
    return isPlain ? [row] : [row, { type: 'message', text: `${cell.name} ${failingText(cell, judged)}.` }];
  });
  const blocks = [
    [sheet.tree.title?.text ?? 'Sheet without a title', ...wrapText(verdict.sentence, width)],
    failing.length === 0 ? [] : ['Failing checks', ...table(failing, width)],
    ...sections(table(sheetItems(sheet, judged), width)),
    listed('Declared set', judged ? declaredSentences(judged.spread) : [], width),
    listed('Wanted in each build', judged ? answeredSentences(judged.spread) : [], width),
    listed(
      'Cautions',
      sheet.cautions().map(({ cell, line, text }) => `${cell}, line ${line + 1}: ${text}`),
      width,
    ),
    listed(
      'Assumptions, to be confirmed',
      sheet.assumptions().map(({ cell, text }) => (text.startsWith(cell) ? text : `${cell}: ${text}`)),
      width,
    ),
  ];
  return `${blocks
    .filter((block) => block.length > 0)
    .map((block) => block.join('\n'))
    .join('\n\n')}\n`;
}

/** `line 12, column 8: what is wrong`. */
export function faultText(lines: readonly Line[], fault: Fault): string {
  return `line ${fault.line + 1}, column ${lineColumn(lines[fault.line]!, fault.span.start)}: ${fault.text}`;
}

// ---------------------------------------------------------------- rows

function sheetItems(sheet: Sheet, judged: JudgedSpread | null): Item[] {
  const { lines } = sheet.tree;
  const cells = new Map(sheet.cells().map((cell) => [cell.tree.line.index, cell]));
  const loose = new Map(sheet.loose().map((fault) => [fault.line, fault]));
  const items: Item[] = [];
  for (const line of lines) {
    const cell = cells.get(line.index);
    const fault = loose.get(line.index);
    if (line.tree.type === 'heading' && line !== sheet.tree.title?.line) {
      items.push({ type: 'section', text: line.tree.text });
    } else if (cell) {
      items.push(...cellItems(cell, lines, judged));
    } else if (fault) {
      items.push({
        type: 'row',
        name: `${INDENT}line ${line.index + 1}`,
        entry: line.text.trim(),
        value: '',
        ends: '',
        remark: '',
      });
      items.push({ type: 'message', text: faultText(lines, fault) });
    }
  }
  return items;
}

function cellItems(cell: CellReading, lines: readonly Line[], judged: JudgedSpread | null): Item[] {
  const fieldAt = new Map(cell.fields.map((field) => [field.line, field]));
  const fault = cell.fault?.code === 'waits-for' ? null : cell.fault;
  const items: Item[] = [cellRow(cell, judged)];
  const message = (line: number): void => {
    if (fault?.line === line) items.push({ type: 'message', text: faultText(lines, fault) });
  };
  message(cell.tree.line.index);
  for (const field of cell.tree.fields) {
    const reading = fieldAt.get(field.line.index);
    const value = reading ? (shownOwn(reading, reading) ?? '') : '';
    items.push(fieldRow(field, value, reading?.isInput ?? false));
    message(field.line.index);
  }
  if (cell.fault !== null) return items;
  // A part offers what was written in it, too; that stands in the fields' own rows.
  const written = new Set(cell.fields.map((field) => field.name));
  // Those of each specimen of a bench stand in the tables of its workings.
  const isShown = ({ name }: OfferedReading): boolean =>
    !written.has(name) && !(cell.kind === 'bench' && name.includes('.'));
  return [
    ...items,
    ...cell.values.filter(isShown).map((value) => offeredRow(value, cell.name, judged?.spread ?? null)),
  ];
}

function offeredRow(value: OfferedReading, cell: string, spread: SheetSpread | null): Row {
  return {
    type: 'row',
    name: INDENT.repeat(2) + value.name,
    entry: '',
    value: shownReading(value) ?? '–',
    ends: (spread && endsText(value, spread.value(`${cell}.${value.name}`))) ?? '',
    remark: value.missing?.text ?? '',
  };
}

function cellRow(cell: CellReading, judged: JudgedSpread | null): Row {
  const { line, entry, source, note } = cell.tree;
  return {
    type: 'row',
    name: INDENT + cell.name,
    entry: entryText(line, entry.span),
    value: ownValue(cell, judged),
    ends: cellEnds(cell, judged?.spread ?? null),
    remark: remark(source, note, cell.isInput),
  };
}

/** What a cell's own row says of its spread; an input's stands in its entry, a check's is its yield. */
function cellEnds(cell: CellReading, spread: SheetSpread | null): string {
  if (!spread || cell.fault !== null) return '';
  if (cell.kind === 'check') {
    const found = spread.check(cell.name)?.yield ?? null;
    return found === null ? '' : shareText(found.share);
  }
  return (!cell.isInput && cell.reading && endsText(cell.reading, spread.value(cell.name))) || '';
}

function ownValue(cell: CellReading, judged: JudgedSpread | null): string {
  if (cell.fault !== null) return cell.fault.code === 'waits-for' ? cell.fault.text : '';
  if (cell.kind !== 'check') return shownCell(cell) ?? '';
  const isHeld = cell.check?.holds !== true || !failsCheck(cell, judged);
  return isHeld ? checkText(cell) : 'fails at an extreme';
}

function fieldRow(field: FieldTree, value: string, isInput: boolean): Row {
  const label = field.label.map(({ name }) => name).join('.');
  return {
    type: 'row',
    name: INDENT.repeat(2) + label,
    entry: entryText(field.line, field.body.span),
    value,
    ends: '',
    remark: remark(field.source, field.note, isInput),
  };
}

function remark(source: Source | null, note: Note | null, isInput: boolean): string {
  const from = source?.text.trim() ?? (isInput ? 'no source' : '');
  return [from, note?.text ?? ''].filter((part) => part !== '').join('; ');
}

// ---------------------------------------------------------------- layout

function table(all: readonly Item[], width: number): string[] {
  const items = hasRoomForEnds(all, width) ? all : all.map(withEndsBelow);
  const rows = items.filter((item) => item.type === 'row');
  const aligned = alignNumbers(rows.map((row) => row.value));
  const name = widest(rows.map((row) => row.name));
  const ends = widest(rows.map((row) => row.ends));
  // What stands alone in its row may run on where ends and remarks stand in others.
  const value = widest(
    aligned.filter((_, i) => rows[i]!.remark + rows[i]!.ends !== '' || /^ *[−∞\d]/.test(aligned[i]!)),
  );
  const fixed = ends === 0 ? [name, value] : [name, value, ends];
  const free = widthLeft(width, fixed);
  const entry = Math.min(widest(rows.map((row) => row.entry)), Math.max(LEAST_ENTRY, Math.floor(free * ENTRY_SHARE)));
  const whole = (each: number): Column => ({ width: each, mostLines: Infinity });
  const alone = [name, entry, Math.max(value, widthLeft(width, [name, entry]))].map(whole);
  const columns: Column[] = (ends === 0 ? [name, entry, value] : [name, entry, value, ends]).map(whole);
  const left = widthLeft(width, [...fixed, entry]);
  const isBeside = left >= LEAST_REMARK;
  if (isBeside) columns.push({ width: left, mostLines: REMARK_LINES });
  // Without ends the remark takes their room, too.
  const roomy = widthLeft(width, [name, entry, value]);
  const withoutEnds: Column[] = [...[name, entry, value].map(whole), { width: roomy, mostLines: REMARK_LINES }];
  const below = (text: string): string[] =>
    wrapText(text, Math.max(LEAST_ENTRY, width - 2 * INDENT.length)).map((line) => INDENT.repeat(2) + line);
  let index = 0;
  return items.flatMap((item) => {
    if (item.type !== 'row') return item.type === 'section' ? ['', item.text] : below(item.text);
    const first = [item.name, item.entry, aligned[index++]!];
    const cells = [...first, ...(ends === 0 ? [] : [item.ends]), item.remark];
    if (item.remark === '' && item.ends === '') return rowLines(first, alone);
    if (item.ends === '' && roomy >= LEAST_REMARK) return rowLines([...first, item.remark], withoutEnds);
    return isBeside || item.remark === ''
      ? rowLines(cells, columns)
      : [...rowLines(cells, columns), ...below(item.remark)];
  });
}

/** Whether entries keep some room beside names, values and ends. */
function hasRoomForEnds(items: readonly Item[], width: number): boolean {
  const rows = items.filter((item) => item.type === 'row');
  const taken = [
    rows.map(({ name }) => name),
    alignNumbers(rows.map(({ value }) => value)),
    rows.map(({ ends }) => ends),
  ];
  return widthLeft(width, taken.map(widest)) >= LEAST_ENTRY;
}

function withEndsBelow(item: Item): Item {
  if (item.type !== 'row' || item.ends === '') return item;
  return { ...item, ends: '', remark: [item.ends, item.remark].filter((part) => part !== '').join('; ') };
}

/** Numbers to the right, their units to the left of one line; what is no number stays. */
function alignNumbers(values: readonly string[]): string[] {
  const parts = values.map((value) => /^([−∞\d][^ ]*)(?: (.*))?$/.exec(value));
  const width = widest(parts.map((part) => part?.[1] ?? ''));
  return parts.map((part, i) => {
    if (!part) return values[i]!;
    const number = ' '.repeat(width - characterCount(part[1]!)) + part[1]!;
    return part[2] === undefined ? number : `${number} ${part[2]}`;
  });
}

function sections(lines: readonly string[]): string[][] {
  const blocks: string[][] = [[]];
  for (const line of lines) {
    if (line === '') blocks.push([]);
    else blocks[blocks.length - 1]!.push(line);
  }
  return blocks;
}

function listed(heading: string, texts: readonly string[], width: number): string[] {
  if (texts.length === 0) return [];
  return [heading, ...texts.flatMap((text) => wrapText(text, width - INDENT.length).map((line) => INDENT + line))];
}

function widest(texts: readonly string[]): number {
  return Math.max(0, ...texts.map(characterCount));
}
