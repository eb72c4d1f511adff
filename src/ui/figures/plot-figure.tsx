// A plot cell of the sheet as a figure that folds.

import { Index, Match, Show, Switch, createMemo, createSignal } from 'solid-js';
import { sheetPlot } from '../../figure/index.ts';
import type { Desk } from '../desk/index.ts';
import { createRested } from '../pace/index.ts';
import type { Pace } from '../pace/index.ts';
import { Prose } from '../typeset/index.ts';
import { createBands } from './band-feed.ts';
import { selectedBench } from './bench-figure.tsx';
import { ChartView } from './chart-view.tsx';
import { isFollowed, plotTitle } from './plot-title.ts';

/** A sweep computes the sheet many times over: it follows typing and turning a few times a second. */
const PACE: Pace = { rest: 80, most: 400 };

/** One plot cell; while it is folded nothing of it is computed. */
export function PlotFigure(props: { readonly desk: Desk; readonly name: string }) {
  const { document } = props.desk;
  const [chosen, setChosen] = createSignal<boolean | null>(null);
  // What stands above already is folded until it is asked for.
  const open = createMemo(
    () => chosen() ?? !isFollowed(document.cell(props.name), props.desk.stage(), selectedBench(props.desk)),
  );
  const onToggle = (isOpen: boolean): void => {
    if (isOpen !== open()) setChosen(isOpen);
  };
  const version = createRested(document.version, PACE);
  const bands = createBands(props.desk, () => props.name, open);
  const plot = createMemo(() => {
    version();
    const { spread } = props.desk;
    const known = spread.now() ?? (spread.isStale() ? 'not counted' : null);
    return open() ? sheetPlot(props.desk.view(), props.name, known, bands()) : null;
  });
  const charts = createMemo(() => {
    const shown = plot();
    return shown && 'charts' in shown ? shown.charts : null;
  });
  const message = (): string | null => {
    const shown = plot();
    return shown && 'message' in shown ? shown.message : null;
  };

  return (
    <details class="plot-figure" open={open()} onToggle={(event) => onToggle(event.currentTarget.open)}>
      <summary>
        <strong>{props.name}</strong>{' '}
        <span class="plot-title">
          <Prose text={plotTitle(document.cell(props.name))} />
        </span>
      </summary>
      <Switch>
        <Match when={message()}>
          {(text) => (
            <p class="figure-message">
              <Prose text={text()} />
            </p>
          )}
        </Match>
        <Match when={charts()}>
          {(shown) => <Index each={shown()}>{(chart) => <ChartView chart={chart()} />}</Index>}
        </Match>
      </Switch>
      <Show when={open()}>
        <button
          type="button"
          class="quiet-button to-cell"
          aria-label={`${props.name} in the sheet`}
          onClick={() => props.desk.jump(props.name)}
        >
          in the sheet
        </button>
      </Show>
    </details>
  );
}
