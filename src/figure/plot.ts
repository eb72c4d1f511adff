// A sheet's own plot: values against an input. Values of one kind share a panel; each further kind has a panel of its
// own below, over the same axis.

import { formatValue, sameKind } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Axis } from './axis.ts';
import { createAxis } from './axis.ts';
import type { Area, Chart, Curve, CurveRole, Mark, Post } from './chart.ts';

export interface PlotSeries {
  /** As the sheet calls it: `A1.I_D`, or a short formula. */
  readonly label: string;
  readonly kind: ValueKind;
  /** SI, one for each x; NaN where the value is not known there. */
  readonly values: Float64Array;
  /** The value at the input's own entry; null where that is not in range or unknown. */
  readonly present: number | null;
  /** How far it reaches over the declared set, at some of the places; left out where that is not known. */
  readonly band?: Pick<Area, 'x' | 'low' | 'high'>;
  /** What a check asks of it, in SI. */
  readonly limits: readonly { readonly value: number; readonly forbids: 'below' | 'above' }[];
}

export interface PlotInput {
  readonly name: string;
  readonly input: {
    readonly label: string;
    readonly kind: ValueKind;
    readonly values: Float64Array;
    readonly log: boolean;
  };
  /** The input's own entry. */
  readonly present: number;
  readonly series: readonly PlotSeries[];
}

const ROLES: readonly CurveRole[] = ['nominal', 'low', 'high', 'fourth', 'fifth'];
const ROOM = 0.06;
/** A range this many times narrower than its values is shown as if it were that wide. */
const FLATTEST = 1e-6;

/** One chart for each kind of value, in the order of the series. Throws RangeError without a series or with arrays of unequal length. */
export function plotCharts({ name, input, present, series }: PlotInput): Chart[] {
  if (series.length === 0) throw new RangeError('a plot needs a value');
  for (const { values } of series) {
    if (values.length !== input.values.length) throw new RangeError('a series and its input differ in length');
  }
  const x = createAxis(input.label, input.kind, {
    low: Math.min(...input.values),
    high: Math.max(...input.values),
    log: input.log,
  });
  const panels: PlotSeries[][] = [];
  for (const each of series) {
    const panel = panels.find(([first]) => sameKind(first!.kind, each.kind));
    if (panel) panel.push(each);
    else panels.push([each]);
  }
  return panels.map((panel) => panelOf(name, input, present, x, panel));
}

function panelOf(
  name: string,
  input: PlotInput['input'],
  present: number,
  x: Axis,
  panel: readonly PlotSeries[],
): Chart {
  const symbol = panel.length === 1 ? panel[0]!.label : '';
  const y = createAxis(symbol, panel[0]!.kind, valueRange(panel));
  const curves = panel.map((each, at): Curve => {
    const role = ROLES[at % ROLES.length]!;
    const label = panel.length === 1 ? '' : each.label;
    return { role, x: input.values, y: each.values, label, labelAt: 0.9, ...(at >= 3 && { rings: 'tenth' }) };
  });
  const marks: Mark[] = panel.flatMap(({ present: value }) =>
    value === null || !Number.isFinite(value)
      ? []
      : [
          {
            role: 'point' as const,
            shape: 'disc' as const,
            x: present,
            y: value,
            label: formatValue(value, panel[0]!.kind).text,
          },
        ],
  );
  const posts = panel.flatMap(({ limits, present: now, kind }) =>
    limits.map(({ value, forbids }): Post => {
      const passed = now !== null && (forbids === 'below' ? now < value : now > value);
      return {
        axis: 'y',
        value,
        forbids,
        passed,
        label: `limit ${formatValue(value, kind, { digits: 6, zeros: 'drop', prefix: y.prefix }).text}`,
      };
    }),
  );
  const shown = posts.filter(({ value }) => value >= y.low && value <= y.high);
  return {
    title: `Plot ${name}`,
    sentence: sentenceOf(name, input, panel),
    x,
    y,
    yAt: 'left',
    areas: panel.flatMap(areasOf),
    curves,
    posts: shown,
    marks: marks.filter((mark) => mark.y >= y.low && mark.y <= y.high && mark.x >= x.low && mark.x <= x.high),
  };
}

/** The band of a series, in pieces where it is not known everywhere. */
function areasOf({ label, band }: PlotSeries): Area[] {
  if (!band) return [];
  const areas: Area[] = [];
  const isKnown = (i: number): boolean => Number.isFinite(band.low[i]!) && Number.isFinite(band.high[i]!);
  for (let from = 0; from < band.x.length; from++) {
    let to = from;
    while (to < band.x.length && isKnown(to)) to++;
    const [x, low, high] = [band.x, band.low, band.high].map((each) => each.slice(from, to));
    if (to - from > 1) areas.push({ role: 'band', x: x!, low: low!, high: high!, said: label });
    from = to;
  }
  return areas;
}

/** Around all finite values, to 0 where that is near; limits count where they are not far off. */
function valueRange(panel: readonly PlotSeries[]): { low: number; high: number } {
  const values = panel
    .flatMap(({ values: own, band }) => [...own, ...(band ? [...band.low, ...band.high] : [])])
    .filter((value) => Number.isFinite(value));
  if (values.length === 0) return { low: 0, high: 1 };
  let low = values.reduce((least, value) => Math.min(least, value), Infinity);
  let high = values.reduce((most, value) => Math.max(most, value), -Infinity);
  for (const { value } of panel.flatMap(({ limits }) => limits)) {
    const span = high - low;
    if (value < low && low - value < span / 2) low = value;
    if (value > high && value - high < span / 2) high = value;
  }
  const size = Math.max(Math.abs(low), Math.abs(high));
  if (high - low <= FLATTEST * size) {
    const half = size === 0 ? 1 : size / 10;
    return { low: low - half, high: high + half };
  }
  const span = high - low;
  const bottom = low >= 0 && low < span / 3 ? 0 : low - ROOM * span;
  const top = high <= 0 && -high < span / 3 ? 0 : high + ROOM * span;
  return { low: bottom, high: top };
}

function sentenceOf(name: string, input: PlotInput['input'], panel: readonly PlotSeries[]): string {
  const parts = panel.map(({ label, kind, values, band }) => {
    const known = Array.from(values).filter((value) => Number.isFinite(value));
    if (known.length === 0) return `${label} has no value`;
    const [first, last] = [formatValue(known[0]!, kind).text, formatValue(known.at(-1)!, kind).text];
    return `${label} goes from ${first} to ${last}${band ? ', with its band over the declared set' : ''}`;
  });
  const [from, to] = [input.values[0]!, input.values.at(-1)!].map((value) => formatValue(value, input.kind).text);
  return `Plot ${name} against ${input.label} from ${from} to ${to}: ${parts.join('; ')}.`;
}
