// From a plot cell of a sheet to its charts.

import type { CellReading, SheetView, ValueType } from '../sheet/index.ts';
import type { SheetSpread } from '../spread/index.ts';
import { benchCharts } from './bench-plot.ts';
import { histogramChart } from './histogram.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Chart } from './chart.ts';
import type { PlotBands } from './plot-bands.ts';
import { planesOf } from './sheet-planes.ts';
import { plotCharts } from './plot.ts';
import type { PlotSeries } from './plot.ts';
import { comparableText, requirementsOf } from './requirements.ts';

/** How many values of the input a plot shows. */
const PLOT_POINTS = 161;

/** The charts of a plot cell, or the sentence that says why there are none. */
type SheetPlot = { readonly charts: readonly Chart[] } | { readonly message: string };

/** What is known of the spread of a sheet: nothing yet, or that nothing spreads (null). */
type KnownSpread = SheetSpread | 'not counted' | null;

/** What a plot cell shows. */
export function sheetPlot(
  sheet: SheetView,
  name: string,
  spread: KnownSpread = null,
  bands: PlotBands | null = null,
): SheetPlot {
  const cell = sheet.cell(name);
  if (cell === null || cell.tree.entry.type !== 'plot') return { message: `${name} is no figure.` };
  if (cell.fault !== null) return { message: cell.waitsFor ? `${name} waits for ${cell.waitsFor}.` : cell.fault.text };
  const { figure, of } = cell.tree.entry;
  if (figure === 'transfer' || figure === 'output') {
    const stage = of === null ? null : sheet.stage(of.name);
    const planes = stage === null ? null : planesOf(stage, sheet);
    return planes === null
      ? { message: `${of?.name ?? 'The stage'} has no planes to draw.` }
      : { charts: [planes[figure]] };
  }
  if (figure === 'bench') {
    const bench = of === null ? null : sheet.bench(of.name);
    return bench === null
      ? { message: `${of?.name ?? 'The bench'} has no points to draw.` }
      : { charts: benchCharts(bench) };
  }
  if (figure === 'spread') return spreadPlot(sheet, cell.tree, spread);
  const sweep = sheet.sweep(name, PLOT_POINTS);
  if (sweep === null) return { message: `A figure of this kind is not drawn yet.` };
  const { input } = sweep;
  const requirements = requirementsOf(sheet);
  const series = sweep.series.flatMap(({ label, type, values, present }): PlotSeries[] => {
    if (!isKind(type)) return [];
    const limits = requirements.filter(({ text }) => text === comparableText(label));
    const band = bands?.get(label);
    const fits = band !== undefined && lieOn(band, input.values, values);
    return [{ label, kind: type, values, present: finite(present), limits, ...(fits ? { band } : {}) }];
  });
  if (series.length === 0 || !isKind(input.type)) return { message: `${name} holds no number that could be drawn.` };
  return {
    charts: plotCharts({
      name,
      input: { label: input.label, kind: input.type, values: input.values, log: input.log },
      present: input.present ?? NaN,
      series,
    }),
  };
}

/** Whether the nominal values of a band lie on a curve: a band of a sheet that has changed since, or that rests on ends that were not searched anew, is not shown. */
function lieOn(
  { x, nominal }: { x: Float64Array; nominal: Float64Array },
  at: Float64Array,
  curve: Float64Array,
): boolean {
  const step = (at.length - 1) / (x.length - 1);
  return x.every((place, k) => {
    const [there, value] = [at[k * step], curve[k * step]];
    if (there === undefined || Math.abs(there - place) > LIE_ON * Math.abs(place)) return false;
    return Number.isNaN(value) || Math.abs(value! - nominal[k]!) <= LIE_ON * Math.abs(value!);
  });
}

const LIE_ON = 1e-9;

/** The histogram of a value of the sheet. */
function spreadPlot(sheet: SheetView, tree: CellReading['tree'], spread: KnownSpread): SheetPlot {
  if (tree.entry.type !== 'plot') throw new Error('A plot is drawn of a plot cell.');
  const [value] = tree.entry.values;
  const path = value?.type === 'path' ? value.names.map((part) => part.name).join('.') : null;
  if (path === null) return { message: 'The spread of one value is drawn: write plot spread of A1.I_D.' };
  const [owner, ...rest] = path.split('.');
  const cell = sheet.cell(owner!);
  const reading = rest.length === 0 ? cell?.reading : cell?.values.find((each) => each.name === rest.join('.'));
  if (!reading || !isKind(reading.type) || typeof reading.value !== 'number')
    return { message: `${path} has no number.` };
  const uncounted: SheetPlot = { message: `The builds of ${path} are not counted yet.` };
  if (spread === 'not counted') return uncounted;
  const found = spread?.value(path) ?? null;
  if (found === null || !found.moves) return { message: `Nothing that spreads moves ${path}.` };
  const { distribution, low, high } = found;
  if (distribution === null || low.value === null || high.value === null) {
    const open = [...new Set([...low.open, ...high.open])];
    return open.length === 0
      ? uncounted
      : { message: `${path} has no spread to draw: ${open.join(', ')} has an open end.` };
  }
  const counts = Float64Array.from({ length: HISTOGRAM_BINS }, (_, bin) => {
    const size = distribution.bins.length / HISTOGRAM_BINS;
    return distribution.bins.subarray(bin * size, (bin + 1) * size).reduce((sum, count) => sum + count, 0);
  });
  const [from, to] = [low.value, high.value];
  const edges = Float64Array.from({ length: HISTOGRAM_BINS + 1 }, (_, k) => from + ((to - from) * k) / HISTOGRAM_BINS);
  const limits = requirementsOf(sheet)
    .filter(({ text }) => text === comparableText(path))
    .map(({ value: limit, forbids }) => ({
      value: limit,
      forbids,
      passed: forbids === 'below' ? from < limit : to > limit,
    }));
  return {
    charts: [histogramChart({ label: path, kind: reading.type, edges, counts, nominal: reading.value, limits })],
  };
}

/** Bars of a histogram. */
const HISTOGRAM_BINS = 32;

function isKind(type: ValueType): type is ValueKind {
  return typeof type !== 'string';
}

function finite(value: number | null): number | null {
  return value !== null && Number.isFinite(value) ? value : null;
}
