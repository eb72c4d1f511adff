// Cells by name with their values, each a way to go there.

import { For, Show } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { Name } from '../typeset/index.ts';
import { valueWords } from './cell-words.ts';

/** A line `uses R_S 1.2 kΩ, V_DD 18 V`; nothing where there are no names. */
export function CellLinks(props: { readonly desk: Desk; readonly title: string; readonly names: readonly string[] }) {
  const value = (name: string): string | null => {
    const cell = props.desk.document.cell(name);
    return cell && valueWords(cell);
  };
  return (
    <Show when={props.names.length > 0}>
      <div class="cell-links">
        <h3>{props.title}</h3>
        <ul>
          <For each={props.names}>
            {(name) => (
              <li>
                <button type="button" onClick={() => props.desk.jump(name)}>
                  <Name path={name} />
                  <Show when={value(name)}>{(text) => <span class="link-value">{text()}</span>}</Show>
                </button>
              </li>
            )}
          </For>
        </ul>
      </div>
    </Show>
  );
}
