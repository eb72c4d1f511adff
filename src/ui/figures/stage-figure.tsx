// The stage that the figures speak of: its schematic, its values beside it, its two planes.

import { For, Show, createMemo, untrack } from 'solid-js';
import { deviceStages, drawSchematic, planesOf, schematicOf } from '../../figure/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { createBehindPaint } from '../pace/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { ChartView } from './chart-view.tsx';
import { DrawingView } from './drawing-view.tsx';
import { isKept, keepFigure } from './pinning.ts';
import type { PlaneName } from './pinning.ts';
import { NO_VALUES, stageValues } from './stage-values.ts';
import type { StageValue } from './stage-values.ts';
import { createQHandle } from './turn-q.ts';

/** Everything drawn of one stage; where it is not solved, its schematic without numbers and why. */
export function StageFigure(props: { readonly desk: Desk; readonly stage: string }) {
  const { document } = props.desk;
  /** Everything that is drawn follows the sheet one frame behind its rows. */
  const shown = createBehindPaint(() => {
    const { desk } = props;
    const { spread } = desk;
    const version = document.version();
    return { version, view: desk.view(), corner: desk.corner(), spread: spread.now(), isStale: spread.isStale() };
  });
  const sheet = createMemo(shown, undefined, { equals: (a, b) => a.version === b.version && a.view === b.view });
  const behind = <T,>(read: (view: SheetView) => T): T => {
    const { view } = sheet();
    return untrack(() => read(view));
  };
  const cell = createMemo(() => behind((view) => view.cell(props.stage)));
  const reading = createMemo(() => behind((view) => view.stage(props.stage)));
  const message = (): string | null => {
    const fault = cell()?.fault;
    if (!fault) return null;
    return cell()!.waitsFor ? `${props.stage} waits for ${cell()!.waitsFor}.` : fault.text;
  };
  const schematic = createMemo(() => {
    const stage = reading();
    return stage ? behind((view) => drawSchematic(schematicOf(stage, view))) : null;
  });
  /** The low and the high device beside the nominal one; none at a corner, which is a device of its own. */
  const devices = createMemo<ReturnType<typeof deviceStages>>(
    () => {
      const { corner, isStale, spread } = shown();
      return corner !== null || isStale ? [] : untrack(() => deviceStages(document.sheet, props.stage, spread));
    },
    [],
    { equals: (a, b) => a === b || (a.length === 0 && b.length === 0) },
  );
  const planes = createMemo(() => {
    const stage = reading();
    const lines = devices();
    return stage ? behind((view) => planesOf(stage, view, lines)) : null;
  });
  const handle = createQHandle(props.desk, reading);
  const values = createMemo(() => {
    const stage = cell();
    return stage ? stageValues(stage) : NO_VALUES;
  });

  return (
    <>
      <Show when={message()}>
        {(text) => (
          <p class="figure-message">
            <Prose text={text()} />
          </p>
        )}
      </Show>
      <div class="stage-figure">
        <Show when={schematic()}>
          {(drawing) => (
            <figure class="schematic">
              <figcaption class="unseen">{drawing().sentence}</figcaption>
              <DrawingView drawing={drawing()} follow={(name) => props.desk.jump(name)} />
            </figure>
          )}
        </Show>
        <Show when={values().atRest.length > 0}>
          <RestTable stage={props.stage} rows={values().atRest} />
        </Show>
      </div>
      <Show when={values().inMotion.length > 0}>
        <dl class="motion-values" aria-label={`Small signals and power of ${props.stage}`}>
          <For each={values().inMotion}>
            {(value) => (
              <div title={value.sentence}>
                <dt>
                  <Name path={value.name} />
                </dt>
                <dd>
                  {value.number} <span class="value-unit">{value.unit}</span>
                </dd>
              </div>
            )}
          </For>
        </dl>
      </Show>
      <Show when={planes()}>
        {(charts) => (
          <div class="planes">
            <section aria-label={charts().transfer.title}>
              <PlaneHead desk={props.desk} title="Transfer" plane="transfer" stage={props.stage} />
              <ChartView chart={charts().transfer} handle={handle()} />
            </section>
            <section aria-label={charts().output.title}>
              <PlaneHead desk={props.desk} title="Output" plane="output" stage={props.stage} />
              <ChartView chart={charts().output} />
            </section>
          </div>
        )}
      </Show>
    </>
  );
}

function RestTable(props: { readonly stage: string; readonly rows: readonly StageValue[] }) {
  return (
    <table class="stage-values">
      <caption>{props.stage} at rest</caption>
      <thead class="unseen">
        <tr>
          <th scope="col">value</th>
          <th scope="col">nominal</th>
          <th scope="col">unit</th>
        </tr>
      </thead>
      <tbody>
        <For each={props.rows}>
          {(value) => (
            <tr>
              <th scope="row" title={value.sentence}>
                <Name path={value.name} />
              </th>
              <td class="value-number">{value.number}</td>
              <td class="value-unit">{value.unit}</td>
            </tr>
          )}
        </For>
      </tbody>
    </table>
  );
}

function PlaneHead(props: {
  readonly desk: Desk;
  readonly title: string;
  readonly plane: PlaneName;
  readonly stage: string;
}) {
  return (
    <div class="plane-head">
      <h3>{props.title}</h3>
      <Show when={!isKept(props.desk.document.cells(), props.plane, props.stage)}>
        <button
          type="button"
          class="quiet-button"
          title="Writes a plot cell, which the link and the record hold, too"
          onClick={() => keepFigure(props.desk, props.plane, props.stage)}
        >
          keep in the sheet
        </button>
      </Show>
    </div>
  );
}
