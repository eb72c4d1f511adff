// The text field that a cell becomes while it is edited.

import { onMount } from 'solid-js';
import type { Grid } from './grid.ts';
import { whileEditing } from './keys.ts';

/** Edits the text of the grid's editor. */
export function CellInput(props: { readonly grid: Grid; readonly label: string }) {
  let field: HTMLInputElement | undefined;
  const { editor } = props.grid;

  onMount(() => {
    const caret = editor.editing()?.caret ?? editor.text().length;
    field?.focus({ preventScroll: true });
    field?.setSelectionRange(caret, caret);
  });

  return (
    <input
      ref={(element) => (field = element)}
      class="cell-input"
      type="text"
      autocomplete="off"
      autocapitalize="off"
      spellcheck={false}
      aria-label={props.label}
      size={Math.max(editor.text().length + 2, 8)}
      value={editor.text()}
      onInput={(event) => editor.setText(event.currentTarget.value)}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (whileEditing(props.grid, event)) event.preventDefault();
      }}
      onBlur={() => props.grid.commit('leave')}
    />
  );
}
