// The rows of one cell with its block. They are made anew only when what the cell's reading says, what the sheet uses
// of it, or one of its folds has changed; comparing is much cheaper than setting the numbers again.

import type { CellTree, Line } from '../../language/index.ts';
import type { CellReading, SheetView } from '../../sheet/index.ts';
import { blockRows } from './block-rows.ts';
import type { Folding, PlacedRow } from './block-rows.ts';
import { cellRow } from './cell-row.ts';
import type { RowSpread } from './row-spread.ts';
import type { Row } from './row.ts';
import { sameData } from './same.ts';

/** Rows as they were made, and of what. */
export interface Made {
  readonly cell: CellReading;
  readonly used: string;
  readonly spread: RowSpread | null;
  /** Every fold that was asked for, with its default and the answer. */
  readonly folds: readonly (readonly [key: string, byDefault: boolean, folded: boolean])[];
  readonly rows: readonly PlacedRow[];
}

/** The row of a cell and those below it; `used` are the values that the sheet reads of it. */
export function rowsOfCell(
  key: string,
  cell: CellReading,
  sheet: SheetView,
  used: ReadonlySet<string>,
  isFolded: Folding,
  spread: RowSpread | null,
  known: Made | undefined,
): Made {
  const usedText = [...used].join(' ');
  const stands =
    known !== undefined &&
    known.used === usedText &&
    known.spread === spread &&
    known.folds.every(([fold, byDefault, folded]) => isFolded(fold, byDefault) === folded) &&
    sameReading(known.cell, cell);
  if (stands) return known;
  const folds: [string, boolean, boolean][] = [];
  const asked: Folding = (fold, byDefault) => {
    const folded = isFolded(fold, byDefault);
    folds.push([fold, byDefault, folded]);
    return folded;
  };
  const rows = makeRows(key, cell, sheet, used, asked, spread);
  return { cell, used: usedText, spread, folds, rows };
}

/** Whether two readings say the same of the same lines, so that their rows are the same. */
function sameReading(a: CellReading, b: CellReading): boolean {
  if (a === b) return true;
  return (
    sameLines(a.tree, b.tree) &&
    a.kind === b.kind &&
    a.isInput === b.isInput &&
    a.waitsFor === b.waitsFor &&
    sameData(a.fault, b.fault) &&
    sameData(a.reading, b.reading) &&
    sameData(a.spread, b.spread) &&
    sameData(a.check, b.check) &&
    sameData(a.values, b.values) &&
    sameData(a.fields, b.fields) &&
    sameData(a.cautions, b.cautions)
  );
}

/** A line whose text has not changed keeps its tree. */
function sameLines(a: CellTree, b: CellTree): boolean {
  const [left, right] = [linesOf(a), linesOf(b)];
  return (
    left.length === right.length &&
    left.every((line, i) => line.tree === right[i]!.tree && line.index === right[i]!.index)
  );
}

function linesOf(tree: CellTree): readonly Line[] {
  return [tree.line, ...tree.fields.map((field) => field.line), ...tree.rows.map((row) => row.line)];
}

function makeRows(
  key: string,
  cell: CellReading,
  sheet: SheetView,
  used: ReadonlySet<string>,
  isFolded: Folding,
  spread: RowSpread | null,
): readonly PlacedRow[] {
  const row = cellRow(key, cell, sheet, spread);
  const line = cell.tree.line.index;
  const below = blockRows(cell, used, isFolded, spread);
  if (below.length === 0) return [{ row, line }];
  const foldKey = `block:${key}`;
  const faulty = below.some((inner) => inner.row.fault !== null);
  const folded = !faulty && isFolded(foldKey, false);
  const head: Row = { ...row, fold: { key: foldKey, open: !folded } };
  return [{ row: head, line }, ...(folded ? [] : below)];
}
