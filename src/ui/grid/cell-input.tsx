// The text field that a cell becomes while it is edited: a combobox whose list stands outside the row.

import { onCleanup, onMount } from 'solid-js';
import { pasteLinesWhileEditing } from './clipboard.ts';
import type { Grid } from './grid.ts';
import { whileEditing } from './keys.ts';
import { LIST_ID, suggestionId } from './suggestion-list.tsx';

/** Edits the text of the grid's editor. */
export function CellInput(props: { readonly grid: Grid; readonly label: string }) {
  const { grid } = props;
  const { editor, completing } = grid;

  onMount(() => {
    const field = grid.field();
    const caret = editor.editing()?.caret ?? editor.text().length;
    field?.focus({ preventScroll: true });
    field?.setSelectionRange(caret, caret);
    field?.scrollIntoView({ block: 'nearest', inline: 'nearest' });
    grid.followText(editor.text() === '' && editor.editing()?.place.column === 'source');
  });
  onCleanup(() => {
    completing.close();
    grid.setField(null);
  });

  const open = () => completing.list() !== null;
  return (
    <input
      ref={(element) => grid.setField(element)}
      class="cell-input"
      type="text"
      autocomplete="off"
      autocapitalize="off"
      spellcheck={false}
      enterkeyhint="done"
      role="combobox"
      aria-label={props.label}
      aria-autocomplete="list"
      aria-expanded={open()}
      aria-controls={open() ? LIST_ID : undefined}
      aria-activedescendant={open() && completing.marked() >= 0 ? suggestionId(completing.marked()) : undefined}
      size={editor.width()}
      value={editor.text()}
      onInput={(event) => {
        editor.setText(event.currentTarget.value);
        grid.followText(false);
      }}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (whileEditing(grid, event)) event.preventDefault();
      }}
      onPaste={(event) => {
        if (pasteLinesWhileEditing(grid, event.clipboardData?.getData('text/plain') ?? '')) event.preventDefault();
      }}
      onBlur={() => grid.moving.rows || grid.commit('leave')}
    />
  );
}
