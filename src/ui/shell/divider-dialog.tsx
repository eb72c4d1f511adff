// The best pair of preferred resistors for a divider, chosen from a ranked list and put into the sheet.

import { For, Show } from 'solid-js';
import { formatValue, PLAIN, RESISTANCE, VOLTAGE } from '../../quantity/index.ts';
import { insertBlock } from '../desk/index.ts';
import type { Desk } from '../desk/index.ts';
import { createDivider } from './divider-state.ts';
import { EntryField, SelectField } from './entry-field.tsx';
import { Modal } from './modal.tsx';
import './choice-dialog.css';
import './rows-dialog.css';

/** Offers pairs for a ratio and a resistance of both in parallel. */
export function DividerDialog(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const divider = createDivider(props.desk.document.sheet);
  function putIn(): void {
    if (divider.fault() !== null) return;
    const lines = divider.lines();
    props.onClose();
    insertBlock(props.desk, lines, 'insert divider');
  }
  const share = (error: number): string =>
    `${error < 0 ? '−' : '+'}${formatValue(Math.abs(error) * 100, PLAIN, { digits: 2, zeros: 'drop' }).text} %`;
  const ohms = (value: number): string => formatValue(value, RESISTANCE, { zeros: 'drop' }).text;
  return (
    <Modal title="Divider pair" onClose={() => props.onClose()}>
      <p>
        Two preferred resistors for a voltage at their tap and for both in parallel, which is what the tap looks like.
        An error of the voltage weighs ten times one of the resistance.
      </p>
      <div class="choice-fields">
        <For each={divider.fields}>
          {([label, example, value, setValue]) => (
            <EntryField label={label} hint={example} value={value()} onInput={setValue} />
          )}
        </For>
        <SelectField
          label="Series"
          value={divider.series()}
          options={divider.names.map((name) => ({ value: name, words: name }))}
          onChange={(name) => divider.setSeries(name)}
        />
      </div>
      <section aria-label="Pairs" aria-live="polite">
        <Show when={divider.pairs().length > 0}>
          <div class="rows-table">
            <table>
              <thead>
                <tr>
                  <th scope="col">take</th>
                  <th scope="col">upper</th>
                  <th scope="col">lower</th>
                  <th scope="col">at the tap</th>
                  <th scope="col">off by</th>
                  <th scope="col">in parallel</th>
                  <th scope="col">off by</th>
                </tr>
              </thead>
              <tbody>
                <For each={divider.pairs()}>
                  {(pair, at) => (
                    <tr>
                      <td>
                        <input
                          type="radio"
                          name="pair"
                          aria-label={`${ohms(pair.upper)} over ${ohms(pair.lower)}`}
                          checked={at() === divider.chosen()}
                          onChange={() => divider.choose(at())}
                        />
                      </td>
                      <td>{ohms(pair.upper)}</td>
                      <td>{ohms(pair.lower)}</td>
                      <td>{formatValue(divider.voltageAt(pair), VOLTAGE, { digits: 4 }).text}</td>
                      <td>{share(pair.ratioError)}</td>
                      <td>{formatValue(pair.parallel, RESISTANCE).text}</td>
                      <td>{share(pair.parallelError)}</td>
                    </tr>
                  )}
                </For>
              </tbody>
            </table>
          </div>
          <pre class="choice-lines">{divider.lines().join('\n')}</pre>
        </Show>
      </section>
      <div class="modal-row">
        <button type="button" aria-disabled={divider.fault() !== null} aria-describedby="divider-fault" onClick={putIn}>
          Put in
        </button>
        <span id="divider-fault" class="soft">
          {divider.fault() ?? ''}
        </span>
      </div>
    </Modal>
  );
}
