// The list of suggestions below the text field.

import { createEffect, createSignal, For, on, Show } from 'solid-js';
import type { Completion } from '../rows/index.ts';
import { Prose } from '../typeset/index.ts';
import type { Grid } from './grid.ts';
import { placeBelow } from './place-below.ts';
import type { Placed } from './place-below.ts';

export const LIST_ID = 'suggestions';

/** The id of one line of the list. */
export function suggestionId(index: number): string {
  return `suggestion-${index}`;
}

/** The open list, or nothing. */
export function SuggestionList(props: { readonly grid: Grid; readonly take: (index: number) => void }) {
  return (
    <Show when={props.grid.completing.list()}>
      {(list) => <OpenList grid={props.grid} list={list()} take={props.take} />}
    </Show>
  );
}

function OpenList(props: { readonly grid: Grid; readonly list: Completion; readonly take: (index: number) => void }) {
  const { completing, field } = props.grid;
  const [placed, setPlaced] = createSignal<Placed>({ left: 0, top: 0, above: false });
  let box: HTMLDivElement | undefined;

  createEffect(
    on([() => props.list, field], ([, input]) => {
      if (input && box) setPlaced(placeBelow(input, box));
    }),
  );
  createEffect(() => {
    const index = completing.marked();
    if (index >= 0) box?.querySelector(`#${suggestionId(index)}`)?.scrollIntoView({ block: 'nearest' });
  });

  return (
    <div
      ref={(element) => (box = element)}
      class="suggestions"
      classList={{ 'suggestions-above': placed().above }}
      style={{ left: `${placed().left}px`, top: `${placed().top}px` }}
      onMouseDown={(event) => event.preventDefault()}
    >
      <ul id={LIST_ID} role="listbox" aria-label="What fits here">
        <For each={props.list.items}>
          {(item, index) => (
            <li
              id={suggestionId(index())}
              role="option"
              class="suggestion"
              classList={{ 'suggestion-marked': completing.marked() === index() }}
              aria-selected={completing.marked() === index()}
              onClick={() => props.take(index())}
            >
              <span class="suggestion-label">{item.label}</span>
              <span class="suggestion-value">{item.value}</span>
              <span class="suggestion-meaning">
                <Prose text={item.meaning} />
              </span>
            </li>
          )}
        </For>
      </ul>
      <p class="suggestions-foot">
        <Show when={props.list.expected !== ''}>
          {props.list.expected.replace(/^./, (letter) => letter.toUpperCase())}.{' '}
        </Show>
        Tab or Enter takes the marked line, Esc closes the list.
      </p>
    </div>
  );
}
