// The workings of the selected cell: what it is, what keeps it from having a value, formula with numbers in place and
// result, where its number comes from and how it spreads, what it uses and what uses it.

import { For, Show, batch, createMemo } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { failsCheck, shownReading } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import { createRested } from '../pace/index.ts';
import type { Pace } from '../pace/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { AnswerSection } from './answer-section.tsx';
import { BenchSection } from './bench-section.tsx';
import { CellLinks } from './cell-links.tsx';
import { kindWords, valueWords } from './cell-words.ts';
import { EndsTable } from './ends-table.tsx';
import { faultWords } from './fault-words.ts';
import { formRows, isJfet, partRows } from './part-rows.ts';
import { FormTable, LawTables, PartTable } from './part-tables.tsx';
import { MendSection } from './mend-section.tsx';
import { sourceWords } from './source-words.ts';
import { SpreadSection } from './spread-section.tsx';
import { spreadSentences } from './spread-words.ts';
import { AllSteps, StepList } from './step-list.tsx';
import { stepsFor } from './steps-for.ts';
import './workings.css';

const PACE: Pace = { rest: 80, most: 400 };

/** The pane of workings. Escape leads back to the cell in the sheet. */
export function WorkingsPane(props: { readonly desk: Desk }) {
  const { desk } = props;
  const cell = createMemo(() => {
    const name = desk.selection()?.cell;
    return name ? desk.view().cell(name) : null;
  });

  const onKeyDown = (event: KeyboardEvent): void => {
    const selection = desk.selection();
    if (event.key !== 'Escape' || !selection?.cell) return;
    event.preventDefault();
    const { cell: name, value } = selection;
    // The sheet focuses what is selected when a jump is counted: the same row and column as before.
    batch(() => {
      desk.jump(name, value);
      desk.select(selection);
    });
  };

  return (
    <section class="workings-pane" id="workings" aria-label="Workings" tabindex="-1" onKeyDown={onKeyDown}>
      <Show when={cell()} fallback={<p class="workings-empty">Select a line of the sheet to see its workings here.</p>}>
        {(shown) => <CellWorkings desk={desk} cell={shown()} value={desk.selection()?.value ?? null} />}
      </Show>
    </section>
  );
}

function CellWorkings(props: { readonly desk: Desk; readonly cell: CellReading; readonly value: string | null }) {
  const { document } = props.desk;
  const name = (): string => props.cell.name;
  const fault = createMemo(() => faultWords(props.cell, document.sheet));
  const offered = createMemo(() => props.cell.values.find((each) => each.name === props.value) ?? null);
  // Formulas cost more to set than all else: while a value is being typed or turned they follow a few times a second.
  const version = createRested(document.version, PACE);
  const steps = createMemo(() => (version(), stepsFor(props.desk.view(), name(), props.value)));
  const spread = createMemo(() => {
    const { spread: declared, reading } = props.cell;
    return declared && reading && typeof reading.type !== 'string'
      ? spreadSentences(declared, reading.type, reading.as)
      : [];
  });
  const source = createMemo(() => sourceWords(props.cell.tree, document.tree().lines));
  const isFailing = createMemo(() => failsCheck(props.cell, props.desk.spread.judged()));
  const hasForms = (): boolean => ['another', 'point'].includes(props.cell.kind);
  const lawOf = createMemo(() => (version(), props.desk.view().part(name())));

  return (
    <>
      <header class="pane-head">
        <h2>
          <Name path={name()} />
          <Show when={props.value}>{(value) => <Name path={value()} />}</Show>
        </h2>
        <p class="cell-kind">
          <Show when={offered() === null}>{kindWords(props.cell)}</Show>
          <Show when={valueWords(props.cell)}>
            {(text) => (
              <>
                {': '}
                <strong classList={{ fails: isFailing(), holds: props.cell.check?.holds === true && !isFailing() }}>
                  {isFailing() && props.cell.check?.holds ? 'holds nominally, fails at an end' : text()}
                </strong>
              </>
            )}
          </Show>
          <Show when={offered()}>
            {(value) => (
              <>
                <Show when={shownReading(value())}>{(text) => <strong>{text()}</strong>}</Show>{' '}
                <Prose text={value().sentence} subject={name()} />
              </>
            )}
          </Show>
        </p>
      </header>

      <Show when={fault()}>
        {(words) => (
          <p class="workings-fault">
            <button type="button" onClick={() => props.desk.jump(name())}>
              {words().place}
            </button>{' '}
            <Prose text={words().text} />
          </p>
        )}
      </Show>
      <Show when={props.cell.waitsFor}>
        {(other) => (
          <p class="workings-waits">
            waits for{' '}
            <button type="button" onClick={() => props.desk.jump(other())}>
              <Name path={other()} />
            </button>
          </p>
        )}
      </Show>
      <Show when={offered()?.missing}>
        {(missing) => (
          <p class="workings-note">
            <Prose text={missing().text} subject={name()} />
          </p>
        )}
      </Show>

      <StepList steps={steps().first} subject={name()} />
      <Show when={steps().all.length > 0}>
        <AllSteps steps={steps().all} subject={name()} />
      </Show>

      <BenchSection desk={props.desk} cell={props.cell} />
      <AnswerSection desk={props.desk} cell={props.cell} />
      <MendSection desk={props.desk} cell={props.cell} />
      <SpreadSection desk={props.desk} cell={props.cell} value={offered()} />

      <EndsTable desk={props.desk} cell={props.cell} />
      <PartTable rows={partRows(props.cell, props.desk.view())} />
      <Show when={lawOf()}>{(part) => <LawTables part={part()} isJfet={isJfet(props.cell)} />}</Show>
      <Show when={hasForms()}>
        <FormTable title={props.cell.kind === 'point' ? 'offers' : 'other forms'} rows={formRows(props.cell)} />
      </Show>

      <dl class="facts">
        <Show when={spread().length > 0}>
          <dt>Spread</dt>
          <dd>{spread().join(' ')}</dd>
        </Show>
        <Show when={source() ?? (props.cell.isInput ? 'no source yet' : null)}>
          {(text) => (
            <>
              <dt>Source</dt>
              <dd>
                <Prose text={text()} />
              </dd>
            </>
          )}
        </Show>
        <Show when={props.cell.tree.note}>
          {(note) => (
            <>
              <dt>Note</dt>
              <dd>
                <Prose text={note().text} />
              </dd>
            </>
          )}
        </Show>
        <Show when={props.cell.cautions.length > 0}>
          <dt>Cautions</dt>
          <For each={props.cell.cautions}>
            {(caution) => (
              <dd>
                <Prose text={caution.text} />
              </dd>
            )}
          </For>
        </Show>
        <Show when={props.cell.assumptions.length > 0}>
          <dt>Assumed</dt>
          <For each={props.cell.assumptions}>
            {(assumption) => (
              <dd>
                <Prose text={assumption.text} />
              </dd>
            )}
          </For>
        </Show>
      </dl>

      <CellLinks desk={props.desk} title="uses" names={props.cell.uses} />
      <CellLinks desk={props.desk} title="used by" names={props.cell.usedBy} />
    </>
  );
}
