// A model card: pasted, looked at as the part it becomes, and put into the sheet.

import { For, Show } from 'solid-js';
import { insertBlock } from '../desk/index.ts';
import type { Desk } from '../desk/index.ts';
import { freeName } from '../rows/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { LawTables } from '../workings/index.ts';
import { Modal } from './modal.tsx';
import { createPastedCard } from './pasted-card.ts';
import './rows-dialog.css';

const INTRODUCTION =
  'Paste a model card of level 1, of type NJF, PJF, NMOS or PMOS. It becomes a part of the sheet; on a card M is milli and MEG mega, and VTO of a JFET is negative for both channels.';
const EXAMPLE = '.model NAME NJF (BETA=1.1m VTO=-2.2 LAMBDA=8m\n+ RS=12 CGS=4p CGD=2p)';

/** Takes a card and writes it as a part. */
export function CardDialog(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const { sheet } = props.desk.document;
  const pasted = createPastedCard(sheet, freeName(sheet, 'Q'));
  function putIn(): void {
    if (pasted.fault() !== null) return;
    const [lines, name] = [pasted.lines(), pasted.name().trim()];
    props.onClose();
    insertBlock(props.desk, lines, `insert ${name}`);
  }
  return (
    <Modal title="Model card" onClose={() => props.onClose()}>
      <p>
        <Prose text={INTRODUCTION} />
      </p>
      <label class="rows-text">
        Card
        <textarea
          rows="6"
          spellcheck={false}
          placeholder={EXAMPLE}
          value={pasted.text()}
          onInput={(event) => pasted.setText(event.currentTarget.value)}
        />
      </label>
      <Show when={pasted.cards().length > 1}>
        <fieldset class="card-choice">
          <legend>{pasted.cards().length} cards</legend>
          <For each={pasted.cards()}>
            {(card, at) => (
              <label>
                <input
                  type="radio"
                  name="card"
                  checked={at() === pasted.chosen()}
                  onChange={() => pasted.choose(at())}
                />
                {card.name || 'without a name'}, {card.kind}
              </label>
            )}
          </For>
        </fieldset>
      </Show>
      <Outcome pasted={pasted} />
      <div class="rows-fields">
        <label>
          Name
          <input value={pasted.name()} onInput={(event) => pasted.setName(event.currentTarget.value)} />
        </label>
      </div>
      <div class="modal-row">
        <button type="button" aria-disabled={pasted.fault() !== null} aria-describedby="card-fault" onClick={putIn}>
          Put in
        </button>
        <span id="card-fault" class="soft">
          <Prose text={pasted.fault() ?? ''} />
        </span>
      </div>
    </Modal>
  );
}

/** The part as it will stand, in every convention, and what of the card no part has. */
function Outcome(props: { readonly pasted: ReturnType<typeof createPastedCard> }) {
  const { pasted } = props;
  return (
    <section aria-label="What was read" aria-live="polite">
      <Show when={pasted.law()}>
        {(law) => (
          <>
            <pre class="card-lines">{pasted.lines().join('\n')}</pre>
            <LawTables part={law()} isJfet={pasted.card()!.kind.endsWith('JFET')} />
          </>
        )}
      </Show>
      <ul class="rows-notes">
        <For each={pasted.card()?.remarks ?? []}>{(remark) => <li>{remark}</li>}</For>
      </ul>
      <Show when={pasted.card()?.untaken.length}>
        <table class="workings-table">
          <thead>
            <tr>
              <th scope="col">not taken</th>
              <th scope="col">value</th>
              <th scope="col">what it would have meant</th>
            </tr>
          </thead>
          <tbody>
            <For each={pasted.card()!.untaken}>
              {({ name, value, meaning }) => (
                <tr>
                  <th scope="row">
                    <Name path={name} />
                  </th>
                  <td>{value}</td>
                  <td class="words">
                    <Prose text={meaning} />
                  </td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </Show>
      <ul class="rows-notes modal-fault">
        <For each={pasted.faults()}>
          {({ line, column, text }) => (
            <li>
              Line {line}, column {column}: {text}
            </li>
          )}
        </For>
      </ul>
    </section>
  );
}
