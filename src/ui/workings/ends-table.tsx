// The ends of a stage in a table: with the low device, nominally, with the high one, and over the whole declared set.

import { For, Show, createMemo } from 'solid-js';
import { stageEnds } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { Name } from '../typeset/index.ts';

/** The table of a stage; nothing for another cell, or where nothing moves it. */
export function EndsTable(props: { readonly desk: Desk; readonly cell: CellReading }) {
  const rows = createMemo(() => {
    const spread = props.desk.spread.now();
    return spread && props.cell.kind === 'stage' ? stageEnds(props.cell, spread) : [];
  });
  return (
    <Show when={rows().length > 0}>
      <div class="table-scroll" tabindex="0" role="group" aria-label="Ends over the declared set">
        <table class="workings-table">
          <thead>
            <tr>
              <th scope="col">ends</th>
              <For each={['low', 'low device', 'nominal', 'high device', 'high', 'max : min']}>
                {(title) => (
                  <th scope="col" class="value-number">
                    {title}
                  </th>
                )}
              </For>
            </tr>
          </thead>
          <tbody>
            <For each={rows()}>
              {(row) => (
                <tr>
                  <th scope="row">
                    <Name path={row.name} />
                  </th>
                  <For each={[row.low, row.lowDevice, row.nominal, row.highDevice, row.high, row.ratio]}>
                    {(text) => <td class="value-number">{text}</td>}
                  </For>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </div>
    </Show>
  );
}
