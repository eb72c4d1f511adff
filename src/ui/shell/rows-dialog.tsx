// Rows from a spreadsheet: pasted, looked at, and put into the sheet as a bench.

import { For, Show } from 'solid-js';
import { typesetUnit } from '../../quantity/index.ts';
import { insertBlock } from '../desk/index.ts';
import type { Desk } from '../desk/index.ts';
import { freeName } from '../rows/index.ts';
import { Prose } from '../typeset/index.ts';
import { Modal } from './modal.tsx';
import { createPasted } from './pasted.ts';
import type { Pasted } from './pasted.ts';
import './rows-dialog.css';

const INTRODUCTION =
  'Copy the table with its headings and paste it here: V_GS, I_D and V_DS of real specimens, and a column that names them where there are several. It becomes a bench, which fits the square law to each.';
const EXAMPLE = 'unit\tVGS [V]\tID [mA]\tVDS [V]\ns1\t-0.5\t4.21\t10\ns1\t-1.0\t2.63\t10';

/** Takes a table and writes it as a bench cell. */
export function RowsDialog(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const { sheet } = props.desk.document;
  const pasted = createPasted(sheet, freeName(sheet, 'M'));
  function putIn(): void {
    if (pasted.fault() !== null) return;
    const lines = pasted.lines();
    props.onClose();
    insertBlock(props.desk, lines, `insert ${pasted.name().trim()}`);
  }
  return (
    <Modal title="Rows from a spreadsheet" onClose={() => props.onClose()}>
      <p>
        <Prose text={INTRODUCTION} />
      </p>
      <label class="rows-text">
        Table
        <textarea
          rows="6"
          spellcheck={false}
          placeholder={EXAMPLE}
          value={pasted.text()}
          onInput={(event) => pasted.setText(event.currentTarget.value)}
        />
      </label>
      <Readings pasted={pasted} />
      <div class="rows-fields">
        <label>
          Name
          <input value={pasted.name()} onInput={(event) => pasted.setName(event.currentTarget.value)} />
        </label>
        <Show when={!pasted.isEmpty() && pasted.table().lacksDrainVoltage}>
          <label>
            <span>
              <Prose text="V_DS of all rows" />
            </span>
            <input
              placeholder="10 V"
              value={pasted.drainVoltage()}
              onInput={(event) => pasted.setDrainVoltage(event.currentTarget.value)}
            />
          </label>
        </Show>
        <Show when={pasted.table().isAmbiguous}>
          <fieldset>
            <legend>The comma</legend>
            <For each={[['comma', 'is a decimal mark'] as const, ['point', 'stands between thousands'] as const]}>
              {([mark, words]) => (
                <label>
                  <input
                    type="radio"
                    name="decimal"
                    checked={pasted.decimal() === mark}
                    onChange={() => pasted.setDecimal(mark)}
                  />
                  {words}
                </label>
              )}
            </For>
          </fieldset>
        </Show>
      </div>
      <div class="modal-row">
        <button type="button" aria-disabled={pasted.fault() !== null} aria-describedby="rows-fault" onClick={putIn}>
          Put in
        </button>
        <span id="rows-fault" class="soft">
          <Prose text={pasted.fault() ?? ''} />
        </span>
      </div>
    </Modal>
  );
}

/** What was read of the table: its first rows as they will stand, what was decided, and what cannot be read. */
function Readings(props: { readonly pasted: Pasted }) {
  const { pasted } = props;
  return (
    <section aria-label="What was read" aria-live="polite">
      <Show when={pasted.summary() !== ''}>
        <p class="rows-summary">{pasted.summary()}</p>
        <div class="rows-table">
          <table>
            <thead>
              <tr>
                <For each={pasted.table().columns}>
                  {({ name, unit }) => (
                    <th scope="col">
                      <Prose text={name} />
                      <Show when={unit}> [{typesetUnit(unit!)}]</Show>
                    </th>
                  )}
                </For>
              </tr>
            </thead>
            <tbody>
              <For each={pasted.shown()}>
                {(row) => (
                  <tr>
                    <For each={row}>{(cell) => <td>{cell}</td>}</For>
                  </tr>
                )}
              </For>
            </tbody>
          </table>
        </div>
        <Show when={pasted.beyond() > 0}>
          <p class="soft">and {pasted.beyond()} more</p>
        </Show>
      </Show>
      <ul class="rows-notes">
        <For each={pasted.isEmpty() ? [] : pasted.table().notes}>
          {(note) => (
            <li>
              <Prose text={note} />
            </li>
          )}
        </For>
      </ul>
      <ul class="rows-notes modal-fault">
        <For each={pasted.faults()}>
          {({ line, column, text }) => (
            <li>
              Line {line}, column {column}: <Prose text={text} />
            </li>
          )}
        </For>
        <Show when={pasted.moreFaults() > 0}>
          <li>and {pasted.moreFaults()} more</li>
        </Show>
      </ul>
    </section>
  );
}
