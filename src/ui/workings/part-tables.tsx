// A part or a point in tables: what was given, and the other forms it can be written in.

import { For, Show, createMemo } from 'solid-js';
import { conventionRows, routesTable } from '../../record/index.ts';
import type { PartReading } from '../../sheet/index.ts';
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

/** The law of a part in every convention, and the routes to it side by side where there are several. */
export function LawTables(props: { readonly part: PartReading; readonly isJfet: boolean }) {
  const rows = createMemo(() => conventionRows(props.part));
  const hasWritten = (): boolean => rows().some(({ written }) => written !== '');
  return (
    <>
      <Show when={props.part.routes.length > 1}>
        <RoutesTable part={props.part} isJfet={props.isJfet} />
      </Show>
      <div class="table-scroll" tabindex="0" role="group" aria-label="The law in every convention">
        <table class="workings-table" aria-label="The law in every convention">
          <thead>
            <tr>
              <th scope="col">the law as</th>
              <th scope="col" class="value-number">
                nominal
              </th>
              <Show when={hasWritten()}>
                <th scope="col" class="value-number">
                  as written
                </th>
              </Show>
              <th scope="col">what it is</th>
            </tr>
          </thead>
          <tbody>
            <For each={rows()}>
              {(row) => (
                <tr>
                  <th scope="row">
                    <Name path={row.name} />
                    <Show when={row.condition}>
                      {' '}
                      <span class="condition">
                        <Prose text={row.condition} />
                      </span>
                    </Show>
                  </th>
                  <td class="value-number">{row.value}</td>
                  <Show when={hasWritten()}>
                    <td class="value-number">{row.written}</td>
                  </Show>
                  <td class="words">
                    <Prose text={row.sentence} />
                  </td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </div>
    </>
  );
}

function RoutesTable(props: { readonly part: PartReading; readonly isJfet: boolean }) {
  const table = createMemo(() => routesTable(props.part, props.isJfet));
  return (
    <div class="table-scroll" tabindex="0" role="group" aria-label="Routes to the law">
      <table class="workings-table" aria-label="Routes to the law">
        <thead>
          <tr>
            <For each={table().columns}>
              {({ title, isName, isNumber }) => (
                <th scope="col" classList={{ 'value-number': isNumber }}>
                  {isName ? <Name path={title} /> : title}
                </th>
              )}
            </For>
          </tr>
        </thead>
        <tbody>
          <For each={table().rows}>
            {([rows, ...numbers]) => (
              <tr>
                <th scope="row">
                  <Prose text={rows!} />
                </th>
                <For each={numbers}>{(text) => <td class="value-number">{text}</td>}</For>
              </tr>
            )}
          </For>
        </tbody>
      </table>
    </div>
  );
}
