// How the builds of a sample spread: a histogram in outline, limits as posts, the nominal as a mark on the axis.

import { formatValue, PLAIN } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import { createAxis } from './axis.ts';
import type { Chart, Post } from './chart.ts';

interface HistogramInput {
  /** As the sheet calls the value: `A1.I_D`. */
  readonly label: string;
  readonly kind: ValueKind;
  /** Borders of the bins in SI, rising; one more than there are bins. */
  readonly edges: Float64Array;
  readonly counts: ArrayLike<number>;
  readonly nominal: number;
  readonly limits: readonly { readonly value: number; readonly forbids: 'below' | 'above'; readonly passed: boolean }[];
}

const ROOM = 1.08;
const SIDE_ROOM = 0.03;

/** The histogram as a chart. Throws RangeError where borders and counts do not fit each other or do not rise. */
export function histogramChart({ label, kind, edges, counts, nominal, limits }: HistogramInput): Chart {
  const bins = counts.length;
  if (edges.length !== bins + 1) throw new RangeError(`${bins} bins have ${edges.length} borders`);
  const [least, most] = [edges[0]!, edges[bins]!];
  const inside = limits
    .map(({ value }) => value)
    .filter((value) => Math.abs(value - (least + most) / 2) <= most - least);
  const room = SIDE_ROOM * (most - least);
  const low = Math.min(least, ...inside.map((value) => value - room));
  const x = createAxis(label, kind, { low, high: Math.max(most, ...inside.map((value) => value + room)) });
  let highest = 0;
  let total = 0;
  for (let bin = 0; bin < bins; bin++) {
    highest = Math.max(highest, counts[bin]!);
    total += counts[bin]!;
  }
  const y = createAxis('builds', PLAIN, { low: 0, high: Math.max(1, highest * ROOM) });
  const xs: number[] = [];
  const ys: number[] = [];
  for (let bin = 0; bin < bins; bin++) {
    // Up, across and down again: an outline of every bar.
    xs.push(edges[bin]!, edges[bin]!, edges[bin + 1]!, edges[bin + 1]!);
    ys.push(0, counts[bin]!, counts[bin]!, 0);
  }
  const posts = limits.map(({ value, forbids, passed }): Post => {
    const text = formatValue(value, kind, { digits: 6, zeros: 'drop', prefix: x.prefix }).text;
    return { axis: 'x', value, forbids, passed, label: `limit ${text}` };
  });
  const [from, to] = [
    formatValue(least, kind, { rounding: 'down' }).text,
    formatValue(most, kind, { rounding: 'up' }).text,
  ];
  return {
    title: `Spread of ${label}`,
    sentence: `Spread of ${label} over ${total} builds: from ${from} to ${to}, nominal ${formatValue(nominal, kind).text}.`,
    x,
    y,
    yAt: 'left',
    areas: [],
    curves: [{ role: 'family', x: Float64Array.from(xs), y: Float64Array.from(ys), label: '' }],
    posts: posts.filter(({ value }) => value >= x.low && value <= x.high),
    marks:
      nominal >= x.low && nominal <= x.high
        ? [{ role: 'point', shape: 'disc', x: nominal, y: 0, label: 'nominal' }]
        : [],
  };
}
