// The rows of a data sheet, typed as printed, looked at as the part they make, and put into the sheet.

import { For, Show } from 'solid-js';
import { insertBlock } from '../desk/index.ts';
import type { Desk } from '../desk/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { LawTables } from '../workings/index.ts';
import { PART_KINDS } from './data-sheet-rows.ts';
import { createDataSheet } from './data-sheet-state.ts';
import { Modal } from './modal.tsx';
import './rows-dialog.css';
import './data-sheet-dialog.css';

const INTRODUCTION =
  'Type the rows as the data sheet prints them, and leave empty what it does not give. V_GSoff and V_GSth are read at their test current; of negative limits either order is taken.';
const PLACES = ['min', 'typ', 'max'] as const;

/** Takes rows and writes them as a part. */
export function DataSheetDialog(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const state = createDataSheet(props.desk.document.sheet);
  function putIn(): void {
    if (state.fault() !== null) return;
    const [lines, name] = [state.lines(), state.name().trim()];
    props.onClose();
    insertBlock(props.desk, lines, `insert ${name}`);
  }
  return (
    <Modal title="Data sheet" onClose={() => props.onClose()}>
      <p>
        <Prose text={INTRODUCTION} />
      </p>
      <div class="rows-fields">
        <label>
          Kind
          <select onChange={(event) => state.setKind(event.currentTarget.value as (typeof PART_KINDS)[number])}>
            <For each={PART_KINDS}>{(kind) => <option value={kind}>{kind}</option>}</For>
          </select>
        </label>
        <label>
          Name
          <input value={state.name()} onInput={(event) => state.setName(event.currentTarget.value)} />
        </label>
        <label>
          Source
          <input
            placeholder="data sheet, ed. 4, p. 2"
            value={state.source()}
            onInput={(event) => state.setSource(event.currentTarget.value)}
          />
        </label>
      </div>
      <div class="rows-table data-sheet-rows">
        <table>
          <thead>
            <tr>
              <th scope="col">row</th>
              <th scope="col">condition</th>
              <For each={PLACES}>{(place) => <th scope="col">{place}</th>}</For>
              <th scope="col">unit</th>
            </tr>
          </thead>
          <tbody>
            <For each={state.rows}>
              {(row, at) => (
                <tr>
                  <th scope="row">
                    <Name path={row.field} />
                  </th>
                  <td>
                    <input
                      class="condition"
                      aria-label={`condition of ${row.field}`}
                      value={row.condition}
                      onInput={(event) => state.setRow(at(), 'condition', event.currentTarget.value)}
                    />
                  </td>
                  <For each={PLACES}>
                    {(place) => (
                      <td>
                        <input
                          class="number"
                          inputmode="decimal"
                          aria-label={`${place} of ${row.field}`}
                          value={row[place]}
                          onInput={(event) => state.setRow(at(), place, event.currentTarget.value)}
                        />
                      </td>
                    )}
                  </For>
                  <td>
                    <input
                      class="unit"
                      aria-label={`unit of ${row.field}`}
                      value={row.unit}
                      onInput={(event) => state.setRow(at(), 'unit', event.currentTarget.value)}
                    />
                  </td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </div>
      <section aria-label="The part" aria-live="polite">
        <Show when={state.lines().length > 1}>
          <pre class="card-lines">{state.lines().join('\n')}</pre>
        </Show>
        <ul class="rows-notes">
          <For each={state.outcome()?.said ?? []}>
            {(text) => (
              <li>
                <Prose text={text} />
              </li>
            )}
          </For>
        </ul>
        <ul class="rows-notes modal-fault">
          <For each={state.faults()}>
            {({ field, text }) => (
              <li>
                <Prose text={`${field}: ${text}`} />
              </li>
            )}
          </For>
        </ul>
        <Show when={state.outcome()?.law}>
          {(law) => (
            <details>
              <summary>the law in every convention, nominal</summary>
              <LawTables part={law()} isJfet={state.kind().endsWith('JFET')} />
            </details>
          )}
        </Show>
      </section>
      <div class="modal-row">
        <button
          type="button"
          aria-disabled={state.fault() !== null}
          aria-describedby="data-sheet-fault"
          onClick={putIn}
        >
          Put in
        </button>
        <span id="data-sheet-fault" class="soft">
          <Prose text={state.fault() ?? ''} />
        </span>
      </div>
    </Modal>
  );
}
