// Charts in words and numbers: what the curves say at one value of the axis, and the whole chart as a table.

import { formatValue } from '../quantity/index.ts';
import type { Axis } from './axis.ts';
import type { Chart, Curve } from './chart.ts';

export interface ChartTable {
  /** Headings as names with units: `V_GS (V)`, `nominal (mA)`. */
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** Lines that bound something and are no value to be read. */
const SILENT: ReadonlySet<Curve['role']> = new Set(['edge', 'limit']);
const TABLE_DIGITS = 3;

/** `V_GS −1.20 V: nominal 1.30 mA, bias line 1.00 mA`; families and curves that have no value there are left out. */
export function readOut({ x, y, curves, areas }: Chart, at: number): string {
  const lone = spoken(curves).filter(({ role }) => role !== 'family');
  const values = lone.flatMap((curve) => {
    const value = heightAt(curve, at);
    if (value === null) return [];
    const name = nameOf(curve, y);
    const text = (each: number): string => formatValue(each, y.kind, { prefix: y.prefix }).text;
    const [low, high] = reachAt(areas, name, at);
    return [
      low === null || high === null
        ? `${name} ${text(value)}`
        : `${name} ${text(value)} (${text(low)} to ${text(high)})`,
    ];
  });
  const place = `${x.symbol} ${formatValue(at, x.kind, { prefix: x.prefix }).text}`;
  return values.length === 0 ? `${place}: no curve here` : `${place}: ${values.join(', ')}`;
}

/** The curves at the ticks of the x axis and at its marked points. */
export function chartTable({ x, y, curves, marks, areas }: Chart): ChartTable {
  const shown = spoken(curves);
  const reaching = [...new Set(areas.flatMap(({ said }) => said ?? []))];
  const measured = shown.filter(({ rings }) => rings === 'only').flatMap((curve) => [...curve.x]);
  const places = [...new Set([...x.ticks, ...marks.map((mark) => mark.x), ...measured])].toSorted((a, b) => a - b);
  const heading = (symbol: string, { unit }: Axis): string => (unit === '' ? symbol : `${symbol} (${unit})`);
  const number = (value: number, { kind, prefix }: Axis): string =>
    formatValue(value, kind, { prefix, digits: TABLE_DIGITS, zeros: 'drop' }).number;
  return {
    columns: [
      heading(x.symbol, x),
      ...shown.map((curve) => heading(nameOf(curve, y), y)),
      ...reaching.flatMap((said) => [heading(`low ${said}`, y), heading(`high ${said}`, y)]),
    ],
    rows: places.map((place) => [
      number(place, x),
      ...shown.map((curve) => {
        const value = heightAt(curve, place);
        return value === null ? '–' : number(value, y);
      }),
      ...reaching.flatMap((said) =>
        reachAt(areas, said, place).map((value) => (value === null ? '–' : number(value, y))),
      ),
    ]),
  };
}

/** The ends of what a value reaches at x; null where that is not known. */
function reachAt(areas: Chart['areas'], said: string, at: number): [low: number | null, high: number | null] {
  for (const area of areas) {
    if (area.said !== said) continue;
    const [low, high] = [area.low, area.high].map((y) => heightAt({ x: area.x, y }, at));
    if (low !== null) return [low!, high!];
  }
  return [null, null];
}

/** Height of a curve at x, by straight lines between its points; null beyond its ends, in its gaps, and between points that were measured. */
function heightAt({ x, y, rings }: Pick<Curve, 'x' | 'y' | 'rings'>, at: number): number | null {
  if (rings === 'only') {
    const found = x.indexOf(at);
    return found < 0 ? null : y[found]!;
  }
  for (let i = 1; i < x.length; i++) {
    const [x0, x1, y0, y1] = [x[i - 1]!, x[i]!, y[i - 1]!, y[i]!];
    if (at < Math.min(x0, x1) || at > Math.max(x0, x1) || x0 === x1) continue;
    const value = y0 + ((y1 - y0) * (at - x0)) / (x1 - x0);
    if (Number.isFinite(value)) return value;
  }
  return null;
}

/** What a curve is called away from the figure. */
function nameOf({ said, label }: Curve, y: Axis): string {
  return said ?? (label === '' ? y.symbol : label);
}

function spoken(curves: readonly Curve[]): readonly Curve[] {
  return curves.filter(({ role }) => !SILENT.has(role));
}
