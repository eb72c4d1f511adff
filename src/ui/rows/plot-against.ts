// Plotting a row's value against an input that stands behind it: which values can be plotted, which inputs there are,
// and the ordinary line that does it.

import { insertLines } from '../../language/index.ts';
import type { Splice } from '../../language/index.ts';
import { formatValue, plainText } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { CellReading, SheetView } from '../../sheet/index.ts';
import { freeName } from './sheet-stock.ts';
import type { Row } from './row.ts';

/** How far an input is turned, as a factor to either side; points of temperature and levels by so much. */
const FACTOR = 4;
const KELVIN = 50;
const DECIBELS = 20;
const RANGE_DIGITS = 3;

/** An input that a plot may turn. */
export interface PlotInput {
  readonly path: string;
  /** Its present value, SI. */
  readonly value: number;
  readonly kind: ValueKind;
  /** The value as it is shown. */
  readonly text: string;
}

/** A line that was written. */
interface WrittenPlot {
  readonly splices: Splice[];
  readonly name: string;
  /** Where it stands, from 0. */
  readonly line: number;
}

/** The path of the number that a row shows; null where it shows none that a formula could name. */
export function plottedPath(row: Row, sheet: SheetView): string | null {
  const cell = row.cell === null ? null : sheet.cell(row.cell);
  if (!cell || (row.value === null && (row.type !== 'cell' || cell.kind !== 'quantity'))) return null;
  const path = row.value === null ? cell.name : `${cell.name}.${row.value}`;
  return typeof sheet.value(path) === 'number' ? path : null;
}

/** The inputs that the value of a path rests on, in sheet order, those in lines of their own before those in blocks. */
export function inputsBehind(path: string, sheet: SheetView): PlotInput[] {
  const behind = new Set<string>();
  const open = [path.split('.')[0]!];
  for (let name = open.pop(); name !== undefined; name = open.pop()) {
    if (behind.has(name)) continue;
    behind.add(name);
    open.push(...(sheet.cell(name)?.uses ?? []));
  }
  const cells = sheet.cells().filter(({ name }) => behind.has(name));
  const found = cells.flatMap((cell) => inputsOf(cell)).filter((input) => input.path !== path);
  const inBlock = ({ path: each }: PlotInput): number => Number(each.includes('.'));
  return found.toSorted((a, b) => inBlock(a) - inBlock(b));
}

/** The line that plots a value against an input, behind the plots that are there. */
export function plotAgainst(path: string, input: PlotInput, sheet: SheetView): WrittenPlot {
  return writePlot(`${path} against ${input.path} over ${rangeAround(input)}`, sheet);
}

/** A new plot cell with this entry, behind the last one, else at the end of the sheet. */
export function writePlot(entry: string, sheet: SheetView): WrittenPlot {
  const { tree } = sheet;
  const name = freeName(sheet, 'F');
  const last = tree.cells.findLast((cell) => cell.entry.type === 'plot');
  const line = last ? last.line.index + 1 : tree.lines.length;
  return { splices: insertLines(tree, line, `${name} = plot ${entry}`), name, line };
}

function inputsOf({ name, isInput, reading, fields }: CellReading): PlotInput[] {
  const own = isInput && reading ? [{ ...reading, path: name }] : [];
  const inBlock = fields.filter((field) => field.isInput).map((field) => ({ ...field, path: `${name}.${field.name}` }));
  return [...own, ...inBlock].flatMap(({ path, type, value }) => {
    if (typeof type === 'string' || typeof value !== 'number' || !Number.isFinite(value)) return [];
    return [{ path, value, kind: type, text: formatValue(value, type, { zeros: 'drop' }).text }];
  });
}

function rangeAround({ value, kind }: PlotInput): string {
  const text = (end: number): string => plainText(end, kind, { digits: RANGE_DIGITS });
  if (kind.scale === 'celsius') return `${text(value - KELVIN)} .. ${text(value + KELVIN)}`;
  if (kind.scale === 'decibel') return `${text(value - DECIBELS)} .. ${text(value + DECIBELS)}`;
  if (value === 0) return `${text(-1)} .. ${text(1)}`;
  if (value < 0) return `${text(value * FACTOR)} .. ${text(value / FACTOR)}`;
  return `${text(value / FACTOR)} .. ${text(value * FACTOR)} log`;
}
