// One chart: on a canvas while it can be, as SVG until uPlot has come, where there is no canvas, and in print;
// what the curves say under the pointer, in words; and the same as a table.

import { Show, createEffect, createMemo, createSignal, on, onCleanup, onMount } from 'solid-js';
import type uPlot from 'uplot';
import { chartTable, drawChart, readOut } from '../../figure/index.ts';
import type { Chart } from '../../figure/index.ts';
import { Prose } from '../typeset/index.ts';
import { createChartCanvas } from './chart-canvas.ts';
import type { ChartCanvas } from './chart-canvas.ts';
import { DrawingView } from './drawing-view.tsx';
import { chartSize } from './figure-size.ts';
import { FigureTable } from './figure-table.tsx';
import { HandleView } from './handle-view.tsx';
import { createPalette, createPrinting } from './page-look.ts';
import type { ChartHandle } from './turn-q.ts';
import 'uplot/dist/uPlot.min.css';

type UPlotMaker = typeof uPlot;

const [plotter, setPlotter] = createSignal<UPlotMaker | null>(null);
let asked = false;

function loadPlotter(): void {
  if (asked) return;
  asked = true;
  void import('uplot').then((module) => setPlotter(() => module.default));
}

/** A chart as wide as its place. */
export function ChartView(props: { readonly chart: Chart; readonly handle?: ChartHandle | null }) {
  const palette = createPalette();
  const printing = createPrinting();
  const [width, setWidth] = createSignal(0);
  const [cursor, setCursor] = createSignal<number | null>(null);
  const [handleText, setHandleText] = createSignal<string | null>(null);
  const spoken = (): string | null => {
    const at = cursor();
    return handleText() ?? (at === null ? null : readOut(props.chart, at));
  };
  const size = createMemo(() => chartSize(width()));
  const onCanvas = (): boolean => plotter() !== null && !printing();
  let place!: HTMLDivElement;

  loadPlotter();
  onMount(() => {
    setWidth(place.clientWidth);
    const observer = new ResizeObserver(() => setWidth(place.clientWidth));
    observer.observe(place);
    onCleanup(() => observer.disconnect());
  });

  return (
    <div class="chart">
      <div class="chart-stage">
        <div class="chart-place" ref={(element) => (place = element)} role="img" aria-label={props.chart.sentence}>
          <Show when={size()}>
            {(room) => (
              <Show when={onCanvas()} fallback={<DrawingView drawing={drawChart(props.chart, room())} />}>
                <Canvas
                  chart={props.chart}
                  size={room()}
                  palette={palette()}
                  plotter={plotter()!}
                  onCursor={setCursor}
                />
              </Show>
            )}
          </Show>
        </div>
        <Show when={size()}>
          {(room) => (
            <Show when={props.handle}>
              {(handle) => <HandleView handle={handle()} chart={props.chart} size={room()} onText={setHandleText} />}
            </Show>
          )}
        </Show>
      </div>
      <div class="chart-foot">
        <p class="read-out" aria-hidden="true">
          <Show when={spoken()}>{(text) => <Prose text={text()} />}</Show>
        </p>
        <FigureTable table={() => chartTable(props.chart)} caption={props.chart.title} />
      </div>
    </div>
  );
}

function Canvas(props: {
  readonly chart: Chart;
  readonly size: { readonly width: number; readonly height: number };
  readonly palette: ReturnType<ReturnType<typeof createPalette>>;
  readonly plotter: UPlotMaker;
  readonly onCursor: (at: number | null) => void;
}) {
  let host!: HTMLDivElement;
  let canvas: ChartCanvas | null = null;
  const picture = createMemo(() => ({ chart: props.chart, size: props.size, palette: props.palette }));
  onMount(() => {
    canvas = createChartCanvas(props.plotter, host, picture(), props.onCursor);
  });
  createEffect(on(picture, (next) => canvas?.show(next), { defer: true }));
  onCleanup(() => {
    canvas?.destroy();
    props.onCursor(null);
  });
  return <div class="chart-canvas" ref={(element) => (host = element)} />;
}
