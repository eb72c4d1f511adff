// A chart on a canvas. uPlot owns the canvas, the scales, the curves and the cursor; what lies under and over the
// curves (grid, areas, marks, words) is painted from the same geometry that the SVG form is made of.
//
// A chart is created once and fed. It is made anew only when it has other lines than before, because uPlot
// keeps one description for each.

import type uPlot from 'uplot';
import { ROLE_STYLES, chartLayers } from '../../figure/index.ts';
import type { Chart, ChartLayers, CurveRole, Size } from '../../figure/index.ts';
import { dashOf, paintItems } from './canvas-painter.ts';
import type { Palette } from './canvas-painter.ts';

type UPlot = typeof uPlot;

interface ChartPicture {
  readonly chart: Chart;
  readonly size: Size;
  readonly palette: Palette;
}

export interface ChartCanvas {
  show(picture: ChartPicture): void;
  destroy(): void;
}

/** Makes a chart inside `host`; `onCursor` gets the value on the x axis under the pointer, or null when it has left. */
export function createChartCanvas(
  UPlot: UPlot,
  host: HTMLElement,
  first: ChartPicture,
  onCursor: (at: number | null) => void,
): ChartCanvas {
  let picture = first;
  let layers: ChartLayers = chartLayers(first.chart, first.size);
  let plot = create();

  function create(): uPlot {
    const { chart, size } = picture;
    const made = new UPlot(
      {
        mode: 2,
        ...size,
        pxAlign: 0,
        padding: [
          () => layers.frame.y0,
          () => picture.size.width - layers.frame.x1,
          () => picture.size.height - layers.frame.y1,
          () => layers.frame.x0,
        ],
        legend: { show: false },
        cursor: { y: false, points: { show: false }, drag: { x: false, y: false } },
        axes: [{ show: false }, { show: false }],
        scales: {
          x: { time: false, distr: chart.x.log ? 3 : 1, range: () => [picture.chart.x.low, picture.chart.x.high] },
          y: { range: () => [picture.chart.y.low, picture.chart.y.high] },
        },
        series: [{}, ...chart.curves.map(({ role }) => seriesOf(role))] as uPlot.Series[],
        hooks: {
          drawClear: [(u) => paint(u, 'under')],
          draw: [(u) => paint(u, 'over')],
          setCursor: [(u) => onCursor(cursorValue(u))],
        },
      },
      dataOf(chart),
      host,
    );
    return made;
  }

  function seriesOf(role: CurveRole): uPlot.Series {
    const { width, dash } = ROLE_STYLES[role];
    return {
      facets: [
        { scale: 'x', auto: true },
        { scale: 'y', auto: true },
      ],
      stroke: () => picture.palette.color(ROLE_STYLES[role].color),
      width,
      dash: dashOf(dash),
      pxAlign: 0,
      points: { show: false },
      paths: (u: uPlot, index: number) => ({
        stroke: pathOf(u, index),
        fill: null,
        clip: null,
        band: null,
        gaps: null,
        flags: 1,
      }),
    } as unknown as uPlot.Series;
  }

  function pathOf(u: uPlot, index: number): Path2D {
    const path = new Path2D();
    // uPlot draws in a microtask: a plot that was replaced meanwhile may have lines that are no more.
    if (u !== plot) return path;
    const { x, y, rings } = picture.chart.curves[index - 1]!;
    if (rings === 'only') return path;
    let down = false;
    for (let at = 0; at < x.length; at++) {
      if (!Number.isFinite(y[at]!)) {
        down = false;
        continue;
      }
      const [left, top] = [u.valToPos(x[at]!, 'x', true), u.valToPos(y[at]!, 'y', true)];
      if (down) path.lineTo(left, top);
      else path.moveTo(left, top);
      down = true;
    }
    return path;
  }

  function paint(u: uPlot, layer: 'under' | 'over'): void {
    if (u !== plot) return;
    const { ctx } = u;
    const ratio = ctx.canvas.width / picture.size.width;
    ctx.save();
    ctx.scale(ratio, ratio);
    paintItems(ctx, layers[layer], picture.palette);
    if (layer === 'over') paintItems(ctx, ringsOf(layers), picture.palette);
    ctx.restore();
  }

  return {
    show(next) {
      const before = picture;
      picture = next;
      layers = chartLayers(next.chart, next.size);
      if (linesOf(before.chart) !== linesOf(next.chart)) {
        plot.destroy();
        plot = create();
        return;
      }
      plot.batch(() => {
        if (before.size.width !== next.size.width || before.size.height !== next.size.height) plot.setSize(next.size);
        plot.setData(dataOf(next.chart));
      });
    },
    destroy: () => plot.destroy(),
  };
}

function dataOf({ curves }: Chart): uPlot.AlignedData {
  return [null, ...curves.map(({ x, y }) => [x, y])] as unknown as uPlot.AlignedData;
}

/** What uPlot was told of the chart and cannot be told anew. */
function linesOf({ x, curves }: Chart): string {
  return [x.log, ...curves.map(({ role }) => role)].join();
}

/** Rings on curves are marks, not lines. */
function ringsOf({ curves }: ChartLayers): ChartLayers['curves'] {
  return curves.flatMap((item) => (item.kind === 'clip' ? item.items.filter(({ kind }) => kind === 'circle') : []));
}

function cursorValue(u: uPlot): number | null {
  const { left } = u.cursor;
  return left === undefined || left < 0 ? null : u.posToVal(left, 'x');
}
