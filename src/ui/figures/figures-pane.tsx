// The figures: first those of the stage that is spoken of, then the plots of the sheet, in sheet order.

import { For, Show, createMemo } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { StandGroup } from '../corner/index.ts';
import { Prose } from '../typeset/index.ts';
import { BenchFigure, selectedBench } from './bench-figure.tsx';
import { PlotFigure } from './plot-figure.tsx';
import { StageFigure } from './stage-figure.tsx';
import './figures.css';

const NO_STAGE = 'No stage yet. Insert one, or write A1 = stage of Q1, and its schematic and curves appear here.';

/** The pane of figures. */
export function FiguresPane(props: { readonly desk: Desk }) {
  const { desk } = props;
  const plots = createMemo(
    () =>
      desk.document
        .cells()
        .filter(({ kind }) => kind === 'plot')
        .map(({ name }) => name),
    [],
    { equals: (a, b) => a.join() === b.join() },
  );

  return (
    <section class="figures-pane" id="figures" aria-label="Figures" tabindex="-1">
      <header class="pane-head">
        <h2>{desk.stage() ?? 'Figures'}</h2>
        <Show when={desk.stage()}>
          <label>
            <input
              type="checkbox"
              checked={desk.following()}
              onChange={(event) => desk.setFollowing(event.currentTarget.checked)}
            />
            follows the selection
          </label>
          <StandGroup desk={desk} />
        </Show>
      </header>
      <Show when={desk.strayed() && selectedBench(desk) === null && desk.stage()}>
        {(stage) => <p class="figure-message">Still showing {stage()}: the selected line belongs to no stage.</p>}
      </Show>
      <Show when={selectedBench(desk)} keyed>
        {(bench) => <BenchFigure desk={desk} bench={bench} />}
      </Show>
      <Show
        when={desk.stage()}
        keyed
        fallback={
          <p class="figure-message">
            <Prose text={NO_STAGE} />
          </p>
        }
      >
        {(stage) => <StageFigure desk={desk} stage={stage} />}
      </Show>
      <For each={plots()}>{(name) => <PlotFigure desk={desk} name={name} />}</For>
    </section>
  );
}
