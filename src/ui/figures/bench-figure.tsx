// The readings of the bench that is selected, or of the one that the selected part is fitted to.

import { Index, Show, createMemo } from 'solid-js';
import { benchCharts } from '../../figure/index.ts';
import type { Desk } from '../desk/index.ts';
import { Name } from '../typeset/index.ts';
import { ChartView } from './chart-view.tsx';
import { isKept, keepFigure } from './pinning.ts';

/** Readings with the fitted laws, and what they differ by; nothing where the bench cannot be read. */
export function BenchFigure(props: { readonly desk: Desk; readonly bench: string }) {
  const charts = createMemo(() => {
    props.desk.document.version();
    const bench = props.desk.document.sheet.bench(props.bench);
    return bench ? benchCharts(bench) : [];
  });
  return (
    <Show when={charts().length > 0}>
      <section class="bench-figure" aria-label={`Bench ${props.bench}`}>
        <div class="plane-head">
          <h3>
            Bench <Name path={props.bench} />
          </h3>
          <Show when={!isKept(props.desk.document.cells(), 'bench', props.bench)}>
            <button
              type="button"
              class="quiet-button"
              title="Writes a plot cell, which the link and the record hold, too"
              onClick={() => keepFigure(props.desk, 'bench', props.bench)}
            >
              keep in the sheet
            </button>
          </Show>
        </div>
        <div class="planes">
          <Index each={charts()}>{(chart) => <ChartView chart={chart()} />}</Index>
        </div>
      </section>
    </Show>
  );
}

/** The bench that the selected cell is, or is fitted to. */
export function selectedBench(desk: Desk): string | null {
  const name = desk.selection()?.cell;
  const cell = name ? desk.document.cell(name) : null;
  if (cell?.kind === 'bench') return cell.name;
  const entry = cell?.tree.entry;
  return entry?.type === 'part' ? (entry.fittedTo?.name ?? null) : null;
}
