// The figures: the planes of every stage that is solved, the readings of every bench, then the plots that the sheet asks for.

import {
  benchCharts,
  deviceStages,
  drawChart,
  planesOf,
  searchBands,
  sheetPlot,
  stackCharts,
  svgText,
  TOKENS,
} from '../figure/index.ts';
import type { Chart, Drawing } from '../figure/index.ts';
import type { CellReading, Sheet } from '../sheet/index.ts';
import type { SheetSpread } from '../spread/index.ts';
import { sentence, strong } from './inline.ts';
import type { Block, Figure, Inlines } from './record-tree.ts';

/** In CSS pixels; two stand side by side and are printed a little larger than drawn. */
const CHART = { width: 288, height: 190 };

/** Figures with their captions, and a sentence for each plot that could not be drawn. */
export function figuresBlocks(sheet: Sheet, spread: SheetSpread | null): readonly Block[] {
  const figures: Figure[] = [];
  const messages: Inlines[] = [];
  const asked = new Map<string, string[]>();
  const add = (drawing: Drawing, cells: readonly string[]): void => {
    const number = figures.length + 1;
    const svg = svgText(drawing, { id: `record-figure-${number}`, colors: TOKENS });
    const lead = `Figure ${number}${cells.length > 0 ? ` (${cells.join(', ')})` : ''}. `;
    figures.push({ kind: 'chart', svg, caption: [strong(lead), ...sentence(drawing.sentence)] });
  };
  const plots = sheet.cells().filter(({ tree }) => tree.entry.type === 'plot');
  for (const cell of plots) {
    const key = fixedKey(cell);
    if (key !== null) asked.set(key, [...(asked.get(key) ?? []), cell.name]);
  }
  for (const cell of sheet.cells().filter(({ kind, fault }) => kind === 'stage' && fault === null)) {
    const stage = sheet.stage(cell.name);
    const planes = stage === null ? null : planesOf(stage, sheet, deviceStages(sheet, cell.name, spread));
    if (planes === null) continue;
    for (const plane of ['transfer', 'output'] as const) {
      add(drawChart(planes[plane], CHART), asked.get(`${plane} of ${cell.name}`) ?? []);
    }
  }
  for (const cell of sheet.cells().filter(({ kind }) => kind === 'bench')) {
    const bench = sheet.bench(cell.name);
    if (bench === null) continue;
    const charts = benchCharts(bench);
    add(stackCharts(charts, sizeFor(charts)), asked.get(`bench of ${cell.name}`) ?? []);
  }
  for (const cell of plots) {
    const plot = sheetPlot(sheet, cell.name, spread, spread && searchBands(sheet, cell.name, spread));
    if ('message' in plot)
      messages.push(sentence(plot.message.startsWith(cell.name) ? plot.message : `${cell.name}: ${plot.message}`));
    else if (fixedKey(cell) === null) add(stackCharts(plot.charts, sizeFor(plot.charts)), [cell.name]);
  }
  const blocks: Block[] = figures.length > 0 ? [{ type: 'figures', figures }] : [];
  return [...blocks, ...messages.map((content): Block => ({ type: 'paragraph', tone: 'remark', content }))];
}

const FIXED = ['transfer', 'output', 'bench'];

/** `transfer of A1`, `bench of M1`: what is drawn whether it is asked for or not; null for other plots. */
function fixedKey({ tree }: CellReading): string | null {
  const { entry } = tree;
  if (entry.type !== 'plot' || !FIXED.includes(entry.figure)) return null;
  return `${entry.figure} of ${entry.of?.name ?? ''}`;
}

function sizeFor(charts: readonly Chart[]): typeof CHART {
  return charts.length === 1 ? CHART : { width: CHART.width, height: Math.round(CHART.height * 0.8) };
}
