// The rows below a cell's own: its fields, its wiring on one line, and the values it offers.

import { literalOf } from '../../language/index.ts';
import type { CellTree, FieldTree } from '../../language/index.ts';
import type { CellReading, FieldReading, OfferedReading } from '../../sheet/index.ts';
import type { Column } from '../desk/index.ts';
import { inputMark, shownSource } from './cell-row.ts';
import { isBroken, rowFault } from './faults.ts';
import { innerName, labelText, wordName } from './names.ts';
import { inputNumbers, measuredNumbers, NO_NUMBERS, typedUnit, valueFigure } from './numbers.ts';
import type { Numbers } from './numbers.ts';
import { conditionText, tableEntry } from './part-numbers.ts';
import { numbersAt } from './row-spread.ts';
import type { RowSpread } from './row-spread.ts';
import { splitValues } from './pinned.ts';
import { emptyRow, MARK_TEXT } from './row.ts';
import type { Figure, Mark, Row, RowEntry } from './row.ts';
import { valueWords } from './value-words.ts';

/** A row and the line it stands for; null for a row that is no line of the text. */
export interface PlacedRow {
  readonly row: Row;
  readonly line: number | null;
}

export interface Folding {
  /** Whether something that can be folded is; `byDefault` where the user has not said. */
  (key: string, byDefault: boolean): boolean;
}

const TABLE: readonly Column[] = ['name', 'low', 'nominal', 'high', 'entry', 'source'];
const PLAIN: readonly Column[] = ['name', 'entry', 'source'];

/** A bench of more readings than these folds them. */
const MOST_READINGS = 8;

/** All rows of a block below its own line. */
export function blockRows(
  cell: CellReading,
  used: ReadonlySet<string>,
  isFolded: Folding,
  spread: RowSpread | null,
): PlacedRow[] {
  const { tree } = cell;
  const fields = fieldRows(cell);
  if (cell.kind !== 'stage')
    return [...fields, ...benchRows(cell, isFolded), ...valueRows(cell, used, isFolded, spread)];
  const solved = cell.values.length > 0 && cell.fault === null && cell.waitsFor === null;
  const faulty = fields.some(({ row }) => row.fault !== null);
  const key = `wiring:${cell.name}`;
  const folded = !faulty && fields.length > 0 && isFolded(key, solved);
  const wiring = fields.length === 0 || faulty ? [] : [{ line: null, row: wiringRow(key, tree, !folded) }];
  return [...wiring, ...(folded ? [] : fields), ...valueRows(cell, used, isFolded, spread)];
}

/** The readings of a bench; a long table folds as long as nothing is wrong with it. */
function benchRows(cell: CellReading, isFolded: Folding): PlacedRow[] {
  const rows = cell.tree.rows.map(({ line }, k): PlacedRow => {
    const row = emptyRow(`row:${cell.name}.${k + 1}`, 'bench-row');
    const fault = isFaultHere(cell, line.index) ? cell.fault : null;
    return {
      line: line.index,
      row: {
        ...row,
        cell: cell.name,
        inside: true,
        mark: fault ? 'broken' : row.mark,
        markText: fault ? MARK_TEXT.broken : row.markText,
        name: wordName(`${k + 1}`),
        entry: { text: line.text.trim(), look: 'input' },
        fault: fault ? rowFault(fault, line) : null,
        cautions: cautionsAt(cell, line.index),
        editable: ['entry'],
      },
    };
  });
  if (rows.length <= MOST_READINGS) return rows;
  const key = `readings:${cell.name}`;
  const closed = isFolded(key, cell.fault === null) && !rows.some(({ row }) => row.fault !== null);
  return [{ line: null, row: readingsRow(key, cell, !closed) }, ...(closed ? [] : rows)];
}

function readingsRow(key: string, cell: CellReading, open: boolean): Row {
  const count = cell.tree.rows.length;
  return {
    ...emptyRow(key, 'wiring'),
    cell: cell.name,
    inside: true,
    markText: 'readings',
    name: wordName('readings', `readings of ${cell.name}`),
    entry: { text: `${count} rows`, look: 'words' },
    source: { text: `${open ? 'fold' : 'unfold'} ${count} lines`, note: '', look: 'words' },
    cautions: open ? [] : cell.tree.rows.flatMap(({ line }) => cautionsAt(cell, line.index)),
    fold: { key, open },
  };
}

/** What is said of a line below the cell's own. */
function cautionsAt(cell: CellReading, line: number): string[] {
  if (line === cell.tree.line.index) return [];
  return cell.cautions.filter((caution) => caution.line === line).map((caution) => caution.text);
}

function fieldRows(cell: CellReading): PlacedRow[] {
  const seen = new Map<string, number>();
  return cell.tree.fields.map((field): PlacedRow => {
    const label = labelText(field.label);
    const nth = (seen.get(label) ?? 0) + 1;
    seen.set(label, nth);
    const key = `field:${cell.name}.${label}${nth > 1 ? `#${nth}` : ''}`;
    return { line: field.line.index, row: fieldRow(key, field, cell) };
  });
}

function fieldRow(key: string, field: FieldTree, cell: CellReading): Row {
  const { line, body } = field;
  const reading = cell.fields.find((each) => each.line === line.index) ?? null;
  const message = body.type === 'broken' ? body.message : isFaultHere(cell, line.index) ? cell.fault : null;
  const table = cell.kind === 'part' || cell.kind === 'point' ? tableEntry(line) : null;
  const isInput = message === null && (reading?.isInput ?? false);
  const mark: Mark | null = message ? 'broken' : isInput ? inputMark(field.source) : reading ? 'computed' : null;
  const written = line.text.slice(field.labelSpan.start, field.labelSpan.end);
  return {
    ...emptyRow(key, 'field'),
    cell: cell.name,
    inside: true,
    mark,
    markText: mark ? MARK_TEXT[mark] : cell.kind,
    name:
      cell.kind === 'stage'
        ? wordName(written, `${written}, place of ${ownerText(cell)}`)
        : innerName(written, ownerText(cell)),
    entry: fieldEntry(field, table !== null && message === null),
    ...(message || !reading ? NO_NUMBERS : fieldNumbers(field, reading)),
    turns: isInput && table?.value !== undefined && table?.value !== null,
    source: shownSource(field.source, field.note, isInput),
    fault: message ? rowFault(message, line) : null,
    cautions: cautionsAt(cell, line.index),
    editable: table !== null && message === null ? TABLE : PLAIN,
  };
}

function isFaultHere(cell: CellReading, line: number): boolean {
  return isBroken(cell.fault) && cell.fault.line === line && line !== cell.tree.line.index;
}

/** In a table the numbers stand in their columns and the entry shows what is left: the condition. */
function fieldEntry({ line, body }: FieldTree, inTable: boolean): RowEntry {
  if (inTable && body.type === 'quantity')
    return { text: conditionText(line, body).replace(/(?<=[=\s])-(?=[\d.])/g, '−'), look: 'words' };
  return { text: line.text.slice(body.span.start, body.span.end), look: 'formula' };
}

function fieldNumbers({ line, body }: FieldTree, reading: FieldReading): Numbers {
  if (body.type !== 'quantity') return { ...NO_NUMBERS, nominal: valueFigure(reading) };
  const literal =
    (body.value && literalOf(body.value)) ?? body.spread?.bounds?.first ?? body.spread?.bounds?.last ?? null;
  const numbers = inputNumbers(reading, reading.spread, {
    unit: typedUnit(literal, line.text),
    endsTyped: reading.spread?.form === 'limits',
  });
  const typed = (figure: Figure | null): Figure | null =>
    figure && figure.look === 'plain' && reading.isInput ? { ...figure, look: 'edit' } : figure;
  const low = typed(numbers.low);
  const high = typed(numbers.high);
  const flipped = typeof reading.value === 'number' && reading.value < 0 && reading.spread !== null;
  const shown = flipped ? { low: high, high: low } : { low, high };
  return { ...numbers, ...shown, nominal: typed(numbers.nominal), bar: reading.spread ? numbers.bar : null };
}

function wiringRow(key: string, tree: CellTree, open: boolean): Row {
  const places = tree.fields.filter((field) => field.body.type === 'legs');
  const legs = places.reduce((sum, field) => sum + (field.body.type === 'legs' ? field.body.legs.length : 0), 0);
  const names = places.map((field) => labelText(field.label)).join(', ');
  const name = tree.name.name;
  return {
    ...emptyRow(key, 'wiring'),
    cell: name,
    inside: true,
    markText: 'wiring',
    name: wordName('wiring', `wiring of ${name}`),
    entry: { text: `${names}: ${legs} ${legs === 1 ? 'leg' : 'legs'}`, look: 'words' },
    source: { text: `${open ? 'fold' : 'unfold'} ${tree.fields.length} lines`, note: '', look: 'words' },
    fold: { key, open },
  };
}

function valueRows(
  cell: CellReading,
  used: ReadonlySet<string>,
  isFolded: Folding,
  spread: RowSpread | null,
): PlacedRow[] {
  if (cell.fault !== null || cell.waitsFor !== null || cell.values.length === 0) return [];
  const { pinned, folded } = splitValues(cell, used);
  const key = `more:${cell.name}`;
  const closed = folded.length > 0 && isFolded(key, true);
  const rowOf = (value: OfferedReading): PlacedRow => ({ line: null, row: valueRow(value, cell, spread) });
  const more = folded.length === 0 ? [] : [{ line: null, row: moreRow(key, cell, folded.length, !closed) }];
  return [...pinned.map(rowOf), ...more, ...(closed ? [] : folded.map(rowOf))];
}

function valueRow(value: OfferedReading, cell: CellReading, spread: RowSpread | null): Row {
  const { missing } = value;
  return {
    ...emptyRow(`value:${cell.name}.${value.name}`, 'value'),
    cell: cell.name,
    value: value.name,
    inside: true,
    mark: 'computed',
    markText: MARK_TEXT.computed,
    name: innerName(value.name, ownerText(cell)),
    entry: { text: valueWords(value), look: 'words' },
    ...(numbersAt(`${cell.name}.${value.name}`, value, spread) ??
      benchNumbers(value, cell) ?? { nominal: valueFigure(value) }),
    source: missing ? { text: missing.text, note: '', look: 'words' } : null,
  };
}

function benchNumbers(value: OfferedReading, { kind, values }: CellReading): Numbers | null {
  if (kind !== 'bench') return null;
  const end = (which: string): OfferedReading | undefined => values.find(({ name }) => name === value.name + which);
  return measuredNumbers(value, end('_min'), end('_max'));
}

function moreRow(key: string, cell: CellReading, count: number, open: boolean): Row {
  const what = cell.kind === 'part' ? 'other form' : 'more value';
  const text = `${count} ${what}${count === 1 ? '' : 's'}`;
  return {
    ...emptyRow(key, 'more'),
    cell: cell.name,
    inside: true,
    markText: open ? 'fold' : 'unfold',
    name: wordName(text, `${text} of ${cell.name}`),
    fold: { key, open },
  };
}

function ownerText(cell: CellReading): string {
  return `${cell.kind} ${cell.name}`;
}
