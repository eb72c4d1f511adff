// A band of the drain current: what is wanted of it over the spread of a part, three ways to bias into it side by side, and
// the transfer plane of the one that is taken.

import { For, Show } from 'solid-js';
import { SERIES_NAMES } from '../../quantity/index.ts';
import { createBandChoice } from '../design/index.ts';
import type { BandChoice } from '../design/index.ts';
import { insertBlock } from '../desk/index.ts';
import type { Desk } from '../desk/index.ts';
import { ChartView } from '../figures/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { EntryField, SelectField } from './entry-field.tsx';
import { Modal } from './modal.tsx';
import './choice-dialog.css';

const INTRODUCTION =
  'The drain current that every device of a part is to keep, over its limits and the ambient temperature. The bias line goes through both limit devices; what is then reached is computed with every tolerance.';
const ROOM = [
  { value: 'roomy', words: 'tolerances of resistors and supply' },
  { value: 'exact', words: 'the devices alone' },
] as const;

/** Compares the ways to bias and writes one as resistors, a stage and its checks. */
export function BandDialog(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const choice = createBandChoice(props.desk.document.sheet);
  function putIn(): void {
    const chosen = choice.chosen();
    if (choice.fault() !== null || chosen === null) return;
    props.onClose();
    insertBlock(props.desk, chosen.lines, `insert a band, ${chosen.row.title}`);
  }
  return (
    <Modal title="Band of the drain current" onClose={() => props.onClose()}>
      <p>{INTRODUCTION}</p>
      <Fields choice={choice} />
      <section class="choice-found" classList={{ 'choice-stale': choice.isStale() }} aria-label="Ways to bias">
        <Show when={choice.forms().length > 0}>
          <Forms choice={choice} />
          <Show when={choice.chosen()?.transfer}>{(chart) => <ChartView chart={chart()} />}</Show>
          <pre class="choice-lines">{choice.chosen()?.lines.join('\n')}</pre>
        </Show>
      </section>
      <div class="modal-row">
        <button type="button" aria-disabled={choice.fault() !== null} aria-describedby="band-fault" onClick={putIn}>
          Put in
        </button>
        <span id="band-fault" class="soft" aria-live="polite">
          <Prose text={choice.fault() ?? ''} />
        </span>
      </div>
    </Modal>
  );
}

function Fields(props: { readonly choice: BandChoice }) {
  const { choice } = props;
  const entry = choice.entries;
  return (
    <div class="choice-fields">
      <SelectField
        label="Part"
        value={entry().part}
        options={choice.parts.map((name) => ({ value: name, words: name }))}
        onChange={(name) => choice.set('part', name)}
      />
      <EntryField label="I_D at least" value={entry().least} short onInput={(text) => choice.set('least', text)} />
      <EntryField label="I_D at most" value={entry().most} short onInput={(text) => choice.set('most', text)} />
      <EntryField
        label="Supply"
        value={entry().supply}
        hint="15 V ± 5 %"
        onInput={(text) => choice.set('supply', text)}
      />
      <EntryField
        label="Drain resistor"
        value={entry().drain}
        hint="none"
        onInput={(text) => choice.set('drain', text)}
      />
      <EntryField label="Resistance at the gate" value={entry().gate} onInput={(text) => choice.set('gate', text)} />
      <SelectField
        label="Series"
        value={entry().series}
        options={SERIES_NAMES.map((name) => ({ value: name, words: name }))}
        onChange={(name) => choice.set('series', name)}
      />
      <EntryField label="Tolerance" value={entry().tolerance} short onInput={(text) => choice.set('tolerance', text)} />
      <SelectField
        label="The line leaves room for"
        value={entry().roomy ? 'roomy' : 'exact'}
        options={ROOM}
        onChange={(value) => choice.set('roomy', value === 'roomy')}
      />
      <EntryField
        label="Tolerance of a current source"
        value={entry().sourceTolerance}
        onInput={(text) => choice.set('sourceTolerance', text)}
      />
    </div>
  );
}

/** The ways to bias side by side; arrow keys go from one to the next. */
function Forms(props: { readonly choice: BandChoice }) {
  const { choice } = props;
  return (
    <>
      <div class="choice-table">
        <table>
          <thead>
            <tr>
              <th scope="col" class="choice-name">
                bias
              </th>
              <th scope="col" class="choice-name">
                the band
              </th>
              <th scope="col">max : min</th>
              <th scope="col">
                <Name path="I_D" /> reached
              </th>
              <th scope="col">source</th>
              <th scope="col">
                <Name path="V_GG" />
              </th>
            </tr>
          </thead>
          <tbody>
            <For each={choice.forms()}>
              {({ row, lines }) => (
                <tr>
                  <th scope="row" class="choice-name">
                    <label>
                      <input
                        type="radio"
                        name="bias-form"
                        disabled={lines.length === 0}
                        checked={choice.chosen()?.row.form === row.form}
                        onChange={() => choice.pick(row.form)}
                      />
                      {row.title}
                    </label>
                  </th>
                  <td class="choice-name" classList={{ 'choice-misses': row.verdict === 'misses' }}>
                    {row.verdict}
                  </td>
                  <td>{row.ratio}</td>
                  <td>{row.band}</td>
                  <td>{row.source}</td>
                  <td>{row.V_GG}</td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </div>
      <dl class="choice-reasons">
        <For each={choice.forms()}>
          {({ row }) => (
            <div>
              <dt>{row.title}</dt>
              <dd>
                <Prose text={row.sentences.join(' ')} />
              </dd>
            </div>
          )}
        </For>
      </dl>
    </>
  );
}
