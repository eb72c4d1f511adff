// Which columns a row has: some rows are one text over the whole width.

import type { Column } from '../desk/index.ts';
import { COLUMNS } from '../desk/index.ts';
import type { Row } from '../rows/index.ts';

const ALONE: Readonly<Partial<Record<Row['type'], readonly Column[]>>> = {
  title: ['name'],
  'title-field': ['name', 'entry'],
  section: ['name'],
  prose: ['entry'],
  note: ['entry'],
  line: ['entry'],
  'bench-row': ['name', 'entry'],
  wiring: ['name', 'entry'],
  more: ['name'],
  ghost: ['name'],
};

/** The columns of a row, in order. */
export function columnsOf(row: Row): readonly Column[] {
  return ALONE[row.type] ?? COLUMNS;
}

/** The column of a row that stands where `wanted` would: itself, or the nearest to its left, or the first. */
export function nearestColumn(row: Row, wanted: Column): Column {
  const columns = columnsOf(row);
  if (columns.includes(wanted)) return wanted;
  const place = COLUMNS.indexOf(wanted);
  return columns.findLast((column) => COLUMNS.indexOf(column) < place) ?? columns[0]!;
}

/** The column `steps` further to the right (negative: left), at most to the end of the row. */
export function columnBeside(row: Row, column: Column, steps: number): Column {
  const columns = columnsOf(row);
  const index = columns.indexOf(nearestColumn(row, column)) + steps;
  return columns[Math.max(0, Math.min(columns.length - 1, index))]!;
}

/** The column that typing changes when this one has the focus; null where nothing can be changed. */
export function typedColumn(row: Row, column: Column): Column | null {
  if (row.editable.includes(column)) return column;
  if (row.type === 'ghost') return 'name';
  return row.editable.includes('entry') ? 'entry' : null;
}

/** Whether a click in a column (null: left of them all) folds or unfolds the row. */
export function foldsByClick({ type }: Row, column: Column | null): boolean {
  return type === 'more' || type === 'wiring' || column === null || column === 'mark';
}
