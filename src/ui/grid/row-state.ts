// What the cells of one row need to know of it.

import { createMemo } from 'solid-js';
import type { Column } from '../desk/index.ts';
import { emptyRow } from '../rows/index.ts';
import type { Row, RowFault } from '../rows/index.ts';
import { shiftOf } from './bar-shape.ts';
import { columnsOf } from './columns.ts';
import type { Editing } from './editor.ts';
import type { Grid } from './grid.ts';

export interface RowState {
  readonly grid: Grid;
  readonly key: string;
  row(): Row;
  has(column: Column): boolean;
  columns(): readonly Column[];
  editing(): Editing | null;
  /** The column that has become a text field. */
  editedColumn(): Column | null;
  /** What is wrong, once there is time to say it. */
  fault(): RowFault | null;
  /** How far the tick is dragged off its place, as a share of the scale. */
  shift(): number;
  /** Its number among the rows of the grid, the head being the first. */
  index(): number;
  /** Whether a column shows all lines of a long text. */
  isWhole(column: Column): boolean;
  toggleWhole(column: Column): void;
  /** Id of the element that says it. */
  readonly messageId: string;
}

/** Creates the state of a row; to be called inside a component. */
export function createRowState(grid: Grid, key: string): RowState {
  const row = createMemo<Row>((last) => grid.row(key) ?? last, emptyRow(key, 'line'));
  const columns = createMemo(() => columnsOf(row()));
  const editing = createMemo(() => {
    const present = grid.editor.editing();
    return present?.place.row.key === key ? present : null;
  });
  const editedColumn = createMemo(() => {
    const column = editing()?.place.column ?? null;
    return column === null || columns().includes(column) ? column : columns()[0]!;
  });
  const fault = createMemo<RowFault | null>(() => {
    if (editing() === null) return row().fault;
    if (!grid.editor.rested()) return null;
    return grid.editor.unread() ?? row().fault;
  });
  return {
    grid,
    key,
    row,
    has: (column) => columns().includes(column),
    columns,
    editing,
    editedColumn,
    fault,
    shift() {
      const dragged = grid.dragged();
      return dragged?.key === key && row().bar?.scale === 'shared' ? shiftOf(dragged.to, dragged.from) : 0;
    },
    index: () => grid.indexOf(key) + 2,
    isWhole: (column) => grid.whole.has(key, column),
    toggleWhole(column) {
      grid.whole.toggle(key, column);
      grid.focus(key, column);
    },
    messageId: `about-${key.replace(/[^\w-]/g, '_')}`,
  };
}

/** Columns that a cell stretches over where a row has fewer than all. */
export function spanOf(state: RowState, column: Column): number | undefined {
  const columns = state.columns();
  const missing = 8 - columns.length;
  return missing > 0 && column === columns[columns.length - 1] ? missing + 1 : undefined;
}
