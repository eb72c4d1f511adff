// A part as its data sheet prints it, and the law that its rows settle.

import { formatValue } from '../quantity/index.ts';
import type { CellReading, FieldReading, Sheet } from '../sheet/index.ts';
import type { Condition, FieldTree } from '../language/index.ts';
import { enteredTable } from './entered-table.ts';
import { EMPTY_CELL, name, plainText, sentence } from './inline.ts';
import { labelOf, typed } from './open-points.ts';
import type { Block, Cell, Inline, Inlines, TableRow } from './record-tree.ts';
import { originCell } from './origin-cell.ts';
import { inputCells, offeredCell } from './value-cells.ts';

const COLUMNS = [
  { title: 'row', kind: 'text' },
  { title: 'min', kind: 'number' },
  { title: 'nominal', kind: 'number' },
  { title: 'max', kind: 'number' },
  { title: 'condition', kind: 'text' },
  { title: 'source and note', kind: 'text' },
] as const;

/** The rows of a part or point, and what follows from them; of negative quantities min and max are by magnitude. */
export function partBlocks(cell: CellReading, sheet: Sheet): readonly Block[] {
  if (cell.fault !== null) return [enteredTable(cell, sheet, ['row', 'as entered'])];
  const readings = new Map(cell.fields.map((field) => [field.line, field]));
  const rows = [
    ...cell.measured.map((reading) => measuredRow(reading, cell)),
    ...cell.tree.fields.map((field) => fieldRow(field, readings.get(field.line.index) ?? null, cell, sheet)),
  ];
  const table: readonly Block[] = rows.length === 0 ? [] : [{ type: 'table', name: 'part', columns: COLUMNS, rows }];
  return [...table, ...offeredBlocks(cell)];
}

/** What a part, point or stage offers beyond what was written in it, and why some of it has no value. */
export function offeredBlocks(cell: CellReading): readonly Block[] {
  const written = new Set([...cell.fields, ...cell.measured].map((field) => field.name));
  const offered = cell.values.filter((value) => !written.has(value.name));
  if (cell.fault !== null || offered.length === 0) return [];
  const known = offered.filter(({ value }) => value !== null);
  const values = known.map((value) => ({ name: name(value.name), value: offeredCell(value) }));
  const missing = offered.filter(({ value }) => value === null);
  return [{ type: 'values', values }, ...(missing.length === 0 ? [] : [missingBlock(missing)])];
}

/** `Without a value: C_gs, C_gd (needs C_iss and C_rss); f_low (is not computed yet).` */
function missingBlock(missing: CellReading['values']): Block {
  const reasons = new Map<string, string[]>();
  for (const { name: path, missing: fault } of missing) {
    const words = (fault?.text ?? 'unknown').replace(/[.]$/, '');
    const reason = words.startsWith(`${path} `) ? words.slice(path.length + 1) : words;
    reasons.set(reason, [...(reasons.get(reason) ?? []), path]);
  }
  const groups = [...reasons].flatMap(([reason, paths], group): Inlines => {
    const names = paths.flatMap((path, at): Inlines => [...plainText(at === 0 ? '' : ', '), name(path)]);
    return [
      ...plainText(group === 0 ? '' : '; '),
      ...names,
      ...plainText(' ('),
      ...sentence(reason),
      ...plainText(')'),
    ];
  });
  const content: Inlines = [...plainText('Without a value: '), ...groups, ...plainText('.')];
  return { type: 'paragraph', tone: 'remark', content };
}

function fieldRow(field: FieldTree, reading: FieldReading | null, cell: CellReading, sheet: Sheet): TableRow {
  const origin = originCell(field.line, sheet, reading?.isInput ?? false);
  const label: Cell = { content: [name(labelOf(field), cell.name)] };
  if (reading === null || field.body.type !== 'quantity') {
    const entry: Inline = { type: 'entry', text: typed(field.line, field.body.span) };
    return { mark: null, cells: [label, EMPTY_CELL, EMPTY_CELL, EMPTY_CELL, { content: [entry] }, origin] };
  }
  const condition: Cell = { content: conditionInlines(field.body.conditions) };
  return { mark: null, cells: [label, ...asPrinted(reading), condition, origin] };
}

/** A row that the bench gives: the least, the median and the largest of what was measured. */
function measuredRow(reading: FieldReading, { tree, name: part }: CellReading): TableRow {
  const bench = tree.entry.type === 'part' ? (tree.entry.fittedTo?.name ?? '') : '';
  const rounded = { ...reading, spread: reading.spread && ({ ...reading.spread, form: 'tolerance' } as const) };
  const cells = [{ content: [name(reading.name, part)] }, ...asPrinted(rounded), EMPTY_CELL];
  return { mark: null, cells: [...cells, { content: [...plainText('bench '), name(bench)] }] };
}

/** Least, nominal and largest; of negative quantities by magnitude. */
function asPrinted(reading: FieldReading): [Cell, Cell, Cell] {
  const [low, nominal, high] = inputCells(reading, reading);
  return typeof reading.value === 'number' && reading.value < 0 ? [high, nominal, low] : [low, nominal, high];
}

/** `V_DS = 15 V, T = 25 °C`. */
function conditionInlines(conditions: readonly Condition[]): Inlines {
  return conditions.flatMap(({ name: ref, literal }, at): Inlines => {
    const { text } = formatValue(literal.value, literal.kind, { unit: literal.unit, digits: 'all' });
    return [...plainText(at === 0 ? '' : ', '), name(ref.name), ...plainText(` = ${text}`)];
  });
}
