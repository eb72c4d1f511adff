// What a bench has found, in tables: the laws, what matches, what to fit; its readings fold.

import { For, Show, createMemo } from 'solid-js';
import { benchTables } from '../../record/index.ts';
import type { BenchTable } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { Name, Prose } from '../typeset/index.ts';

/** The tables of a bench; nothing for another cell, or where it cannot be read. */
export function BenchSection(props: { readonly desk: Desk; readonly cell: CellReading }) {
  const bench = createMemo(() => (props.cell.kind === 'bench' ? props.desk.view().bench(props.cell.name) : null));
  const tables = createMemo(() => {
    const found = bench();
    return found ? benchTables(found) : [];
  });
  return (
    <For each={tables()}>
      {(table) => (
        <Show when={table.name === 'readings'} fallback={<Captioned table={table} />}>
          <details class="all-steps">
            <summary>all {table.rows.length} readings</summary>
            <Captioned table={table} />
          </details>
        </Show>
      )}
    </For>
  );
}

function Captioned(props: { readonly table: BenchTable }) {
  const numberClass = (column: number): string | undefined =>
    props.table.columns[column]!.isNumber ? 'value-number' : undefined;
  return (
    <section class="bench-table">
      <p>
        <Prose text={props.table.caption} />
      </p>
      <div class="table-scroll" tabindex="0" role="group" aria-label={props.table.caption}>
        <table class="workings-table" aria-label={props.table.caption}>
          <thead>
            <tr>
              <For each={props.table.columns}>
                {({ title, isName }, i) => (
                  <th scope="col" class={numberClass(i())}>
                    {isName ? <Name path={title} /> : <Prose text={title} />}
                  </th>
                )}
              </For>
            </tr>
          </thead>
          <tbody>
            <For each={props.table.rows}>
              {([first, ...rest]) => (
                <tr>
                  <th scope="row" class={numberClass(0)}>
                    {first}
                  </th>
                  <For each={rest}>{(text, i) => <td class={numberClass(i() + 1)}>{text}</td>}</For>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </div>
    </section>
  );
}
