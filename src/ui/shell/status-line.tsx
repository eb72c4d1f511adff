// The foot of the page: what is selected, the keys that serve there, what was just done, and whether it is kept.

import { For, Show } from 'solid-js';
import { countText } from '../../record/index.ts';
import type { Desk } from '../desk/index.ts';

const HINTS: readonly (readonly [key: string, what: string])[] = [
  ['F2', 'edit'],
  ['Ctrl+Enter', 'new line below'],
  ['F8', 'next failing'],
  ['F1', 'help'],
];

/** One line of status. */
export function StatusLine(props: { readonly desk: Desk; readonly kept: string }) {
  const { desk } = props;
  const selected = (): string => {
    const selection = desk.selection();
    if (!selection) return 'nothing selected';
    return selection.value ? `${selection.cell}.${selection.value}` : (selection.cell ?? 'this line');
  };
  return (
    <footer class="status-line">
      <span class="status-selected">{selected()}</span>
      <Show
        when={desk.status()}
        fallback={
          <span class="status-hints">
            <For each={HINTS}>
              {([key, what]) => (
                <span>
                  <kbd>{key}</kbd> {what}
                </span>
              )}
            </For>
          </span>
        }
      >
        {(status) => (
          <span class="status-message" role="status">
            {status().text}
            <Show when={status().action}>
              {(action) => (
                <button type="button" onClick={() => action().run()}>
                  {action().title}
                </button>
              )}
            </Show>
          </span>
        )}
      </Show>
      <Show when={desk.spread.progress()}>
        {(progress) => (
          <span class="status-progress">
            {countText(progress().builds)} of {countText(progress().of)} builds counted{' '}
            <button type="button" onClick={() => desk.spread.stop()}>
              Stop
            </button>
          </span>
        )}
      </Show>
      <span class="status-kept">{props.kept}</span>
    </footer>
  );
}
