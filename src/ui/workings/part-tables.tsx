// A part or a point in tables: what was given, and the other forms it can be written in.

import { For, Show } from 'solid-js';
import { Name, Prose } from '../typeset/index.ts';
import type { FormRow, PartRow } from './part-rows.ts';

/** What the data sheet gives. */
export function PartTable(props: { readonly rows: readonly PartRow[] }) {
  return (
    <Show when={props.rows.length > 0}>
      <div class="table-scroll" tabindex="0" role="group" aria-label="Numbers given">
        <table class="workings-table">
          <thead>
            <tr>
              <th scope="col">given</th>
              <th scope="col" class="value-number">
                low
              </th>
              <th scope="col" class="value-number">
                nominal
              </th>
              <th scope="col" class="value-number">
                high
              </th>
              <th scope="col">source</th>
            </tr>
          </thead>
          <tbody>
            <For each={props.rows}>
              {(row) => (
                <tr>
                  <th scope="row">
                    <Name path={row.name} />
                  </th>
                  <td class="value-number">{row.low}</td>
                  <td class="value-number">{row.nominal}</td>
                  <td class="value-number">{row.high}</td>
                  <td class="words">{row.source}</td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </div>
    </Show>
  );
}

/** The same law in other forms, or what a point offers. */
export function FormTable(props: { readonly title: string; readonly rows: readonly FormRow[] }) {
  return (
    <Show when={props.rows.length > 0}>
      <table class="workings-table">
        <thead>
          <tr>
            <th scope="col">{props.title}</th>
            <th scope="col" class="value-number">
              nominal
            </th>
            <th scope="col">what it is</th>
          </tr>
        </thead>
        <tbody>
          <For each={props.rows}>
            {(row) => (
              <tr>
                <th scope="row">
                  <Name path={row.name} />
                </th>
                <td class="value-number">{row.value}</td>
                <td class="words">
                  <Prose text={row.sentence} />
                </td>
              </tr>
            )}
          </For>
        </tbody>
      </table>
    </Show>
  );
}
