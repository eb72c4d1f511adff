// The sheet as a grid of rows.

import { createEffect, createMemo, createSignal, For, on, onMount, Show } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import './grid.css';
import './marks.css';
import './lists.css';
import './narrow.css';
import { gridCommands } from './commands.ts';
import { createGrid } from './grid.ts';
import { copyRows, pasteInto } from './clipboard.ts';
import { InsertMenu } from './insert-menu.tsx';
import { navigate } from './keys.ts';
import { cellAt, createFocus, rowAt } from './focus.ts';
import { foldsByClick } from './columns.ts';
import { itemOf, itemText, windowItems } from './row-window.ts';
import type { Seen } from './row-window.ts';
import { RowView } from './row-view.tsx';
import { createSeen } from './seen.ts';
import { SuggestionList } from './suggestion-list.tsx';

/** The grid of a desk's sheet. */
export function SheetGrid(props: { readonly desk: Desk }) {
  const grid = createGrid(props.desk);
  let table: HTMLDivElement | undefined;

  const [seen, setSeen] = createSignal<() => Seen>(() => ({ top: 0, height: 0 }));
  let heldFocus: Element | null = null;
  const items = createMemo(() => {
    heldFocus = table?.contains(document.activeElement) ? document.activeElement : null;
    grid.moving.rows = true;
    return windowItems(grid.keys(), seen()(), grid.stop()).map(itemText);
  });
  // A row that is moved among others loses the focus, though it stays.
  createEffect(
    on(items, () => {
      grid.moving.rows = false;
      if (heldFocus instanceof HTMLElement && heldFocus.isConnected && document.activeElement === document.body)
        heldFocus.focus({ preventScroll: true });
    }),
  );

  onMount(() => {
    if (table) {
      const follow = createSeen(table);
      setSeen(() => follow);
      grid.onFocus(createFocus(table));
    }
    props.desk.addCommands(gridCommands(grid));
  });

  return (
    <div class="sheet">
      <div
        ref={(element) => (table = element)}
        class="grid"
        role="grid"
        aria-label="Sheet"
        aria-colcount={8}
        aria-rowcount={grid.count()}
        aria-multiselectable="true"
        onKeyDown={(event) => {
          if (!navigate(grid, event)) return;
          event.preventDefault();
          event.stopPropagation();
        }}
        onFocusIn={(event) => {
          const place = cellAt(event.target);
          if (place && !grid.editor.editing()) grid.focused(place.key, place.column);
        }}
        onCopy={(event) => !grid.editor.editing() && copyRows(grid, event, false)}
        onCut={(event) => !grid.editor.editing() && copyRows(grid, event, true)}
        onPaste={(event) => !grid.editor.editing() && pasteInto(grid, event)}
        onDblClick={(event) => {
          if (cellAt(event.target) && !grid.editor.editing()) grid.edit();
        }}
        onClick={(event) => {
          const place = rowAt(event.target);
          const row = place && grid.row(place.key);
          if (place && row?.fold && foldsByClick(row, place.column)) grid.toggle(place.key);
          else if (place?.column && event instanceof PointerEvent && event.pointerType === 'touch') {
            // A finger has neither a key nor a double click to begin with.
            if (row?.type === 'ghost' || row?.editable.includes(place.column)) grid.edit();
          }
        }}
      >
        <div role="row" class="row row-columns" aria-rowindex={1}>
          <span role="columnheader" class="head-mark">
            <span class="unseen">mark</span>
          </span>
          <span role="columnheader">name</span>
          <span role="columnheader">entry</span>
          <span role="columnheader" class="head-number">
            low
          </span>
          <span role="columnheader" class="head-nominal">
            {props.desk.corner() === null ? 'nominal' : 'at corner'}
          </span>
          <span role="columnheader" class="head-number">
            high
          </span>
          <span role="columnheader" class="head-spread">
            <span class="unseen">spread</span>
            <span class="scale" aria-hidden="true">
              <span>¼</span>
              <span>½</span>
              <span>1</span>
              <span>2</span>
              <span>4</span>
            </span>
          </span>
          <span role="columnheader" class="head-source">
            source, note
          </span>
        </div>
        <For each={items()}>
          {(text) => {
            const item = itemOf(text);
            return 'key' in item ? (
              <RowView grid={grid} rowKey={item.key} />
            ) : (
              <div class="gap" style={{ height: `${item.gap}px` }} aria-hidden="true" />
            );
          }}
        </For>
      </div>
      <Show when={grid.inserting()}>
        <div class="insert-place">
          <InsertMenu grid={grid} onClose={() => grid.setInserting(false)} />
        </div>
      </Show>
      <SuggestionList grid={grid} take={(index) => grid.take(index)} />
    </div>
  );
}
