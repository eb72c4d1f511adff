// From a plot cell of a sheet to its charts.

import type { SheetView, ValueType } from '../sheet/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Chart } from './chart.ts';
import { planesOf } from './sheet-planes.ts';
import { plotCharts } from './plot.ts';
import type { PlotSeries } from './plot.ts';
import { comparableText, requirementsOf } from './requirements.ts';

/** How many values of the input a plot shows. */
const PLOT_POINTS = 161;

/** The charts of a plot cell, or the sentence that says why there are none. */
type SheetPlot = { readonly charts: readonly Chart[] } | { readonly message: string };

/** What a plot cell shows. */
export function sheetPlot(sheet: SheetView, name: string): SheetPlot {
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
  const sweep = sheet.sweep(name, PLOT_POINTS);
  if (sweep === null) return { message: `A figure of this kind is not drawn yet.` };
  const { input } = sweep;
  const requirements = requirementsOf(sheet);
  const series = sweep.series.flatMap(({ label, type, values, present }): PlotSeries[] => {
    if (!isKind(type)) return [];
    const limits = requirements.filter(({ text }) => text === comparableText(label));
    return [{ label, kind: type, values, present: finite(present), limits }];
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

function isKind(type: ValueType): type is ValueKind {
  return typeof type !== 'string';
}

function finite(value: number | null): number | null {
  return value !== null && Number.isFinite(value) ? value : null;
}
