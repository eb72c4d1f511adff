// One cell of the grid: what it shows, or the text field it has become.

import { Show } from 'solid-js';
import type { JSX } from 'solid-js';
import type { Column } from '../desk/index.ts';
import type { Row } from '../rows/index.ts';
import { CellInput } from './cell-input.tsx';
import { spanOf } from './row-state.ts';
import type { RowState } from './row-state.ts';

interface CellProps {
  readonly state: RowState;
  readonly column: Column;
  readonly class?: string;
  readonly children: JSX.Element;
}

/** A cell; `class` is what its content asks for. */
export function Cell(props: CellProps) {
  const state = props.state;
  const column = props.column;
  const isFaulty = () => state.fault()?.at?.column === column;
  const isEdited = () => state.editedColumn() === column;
  const fold = () => (column === 'name' ? state.row().fold : null);
  return (
    <div
      role={column === 'name' ? 'rowheader' : 'gridcell'}
      class={`cell cell-${column} ${props.class ?? ''}`}
      classList={{ 'cell-only': state.columns().length === 1, 'cell-editing': isEdited() }}
      data-column={column}
      tabIndex={state.grid.isStop(state.key, column) ? 0 : -1}
      aria-colspan={spanOf(state, column)}
      aria-invalid={isFaulty() ? true : undefined}
      aria-describedby={isFaulty() ? state.messageId : undefined}
      aria-expanded={fold()?.open}
    >
      <Show when={isEdited()} fallback={props.children}>
        <CellInput grid={state.grid} label={labelOf(state.row(), column)} />
      </Show>
    </div>
  );
}

function labelOf(row: Row, column: Column): string {
  if (row.type === 'ghost') return 'new line';
  return `${column} of ${row.name?.said ?? 'this line'}`;
}
