// Find: goes through the cells whose name, entry, source or note holds the words.

import { createSignal, onMount } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { cellsWith } from './find-cells.ts';

/** A field over the sheet; Enter goes on, Shift+Enter back, Escape closes. */
export function FindBar(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const { desk } = props;
  const [query, setQuery] = createSignal('');
  const found = () => cellsWith(desk.document.cells(), query());
  let field!: HTMLInputElement;
  onMount(() => field.focus());
  function go(step: 1 | -1): void {
    const names = found();
    if (names.length === 0) return;
    const at = names.indexOf(desk.selection()?.cell ?? '');
    const next = names.at((at < 0 && step < 0 ? 0 : at + step) % names.length)!;
    desk.jump(next);
    field.focus();
  }
  return (
    <form
      class="find-bar"
      role="search"
      onSubmit={(event) => {
        event.preventDefault();
        go(1);
      }}
      onKeyDown={(event) => {
        if (event.key === 'Escape') {
          props.onClose();
          const cell = desk.selection()?.cell;
          if (cell) desk.jump(cell);
        }
        if (event.key === 'Enter' && event.shiftKey) {
          event.preventDefault();
          go(-1);
        }
      }}
    >
      <label>
        Find{' '}
        <input
          type="search"
          ref={(element) => (field = element)}
          value={query()}
          onInput={(event) => setQuery(event.currentTarget.value)}
        />
      </label>
      <span class="soft" role="status">
        {query() === '' ? '' : `${found().length} found`}
      </span>
      <button type="submit">Next</button>
      <button type="button" onClick={() => props.onClose()}>
        Close
      </button>
    </form>
  );
}
