// A figure as a table, unfolded on demand.

import { For, Show, createSignal } from 'solid-js';
import type { ChartTable } from '../../figure/index.ts';
import { Prose } from '../typeset/index.ts';

/** The disclosure 'as table' with what it holds; the table is made when it is opened. */
export function FigureTable(props: { readonly table: () => ChartTable; readonly caption: string }) {
  const [open, setOpen] = createSignal(false);
  return (
    <details class="as-table" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>as table</summary>
      <Show when={open()}>
        <div class="table-scroll" tabindex="0" role="group" aria-label={`${props.caption} as table`}>
          <table>
            <caption class="unseen">{props.caption}</caption>
            <thead>
              <tr>
                <For each={props.table().columns}>
                  {(column) => (
                    <th scope="col">
                      <Prose text={column} />
                    </th>
                  )}
                </For>
              </tr>
            </thead>
            <tbody>
              <For each={props.table().rows}>
                {(row) => (
                  <tr>
                    <For each={row}>{(number) => <td>{number}</td>}</For>
                  </tr>
                )}
              </For>
            </tbody>
          </table>
        </div>
      </Show>
    </details>
  );
}
