// A chart as geometry: hairline grid, numbers on every tick, quantity and unit once at the end of each axis, no frame
// and no legend, labels on the lines.

import type { Axis } from './axis.ts';
import { positionOn } from './axis.ts';
import type { Area, Chart, Curve, Mark, Post } from './chart.ts';
import type { Box, Drawing, Item, TextItem } from './geometry.ts';
import { joinRuns, plain, proseRuns, textBox, widthOf } from './labels.ts';
import { placeLabels } from './place-labels.ts';
import type { LabelledLine } from './place-labels.ts';
import { translate } from './translate.ts';

export interface Size {
  readonly width: number;
  readonly height: number;
}

const TICK_SIZE = 11.5;
const TOP = 20;
const BOTTOM = 36;
const SIDE = 12;
const LEAST_ROOM = 40;
const TICK_GAP = 6;
const HATCH_STEP = 6;
const POST_HATCH = 6;
const MARK_RADIUS = 4.5;

/** One chart in the given size. Throws RangeError where the size leaves no room for curves. */
export function drawChart(chart: Chart, size: Size): Drawing {
  const { title, sentence } = chart;
  return { ...size, title, sentence, items: chartItems(chart, size) };
}

/** Charts below each other, each in the given size, as one drawing named after the first. Throws RangeError for none. */
export function stackCharts(charts: readonly Chart[], size: Size): Drawing {
  const first = charts[0];
  if (first === undefined) throw new RangeError('no chart to draw');
  return {
    width: size.width,
    height: size.height * charts.length,
    title: first.title,
    sentence: charts.map(({ sentence }) => sentence).join(' '),
    items: charts.flatMap((chart, at) => chartItems(chart, size).map((item) => translate(item, 0, at * size.height))),
  };
}

/** Where the curves of a chart lie in a drawing of that size. Throws RangeError where there is no room for them. */
export function chartFrame({ y, yAt }: Chart, size: Size): Box {
  const numbers = Math.max(...y.labels.map((label) => widthOf(plain(label), TICK_SIZE))) + TICK_GAP + 2;
  const x0 = yAt === 'left' ? numbers : SIDE;
  const x1 = size.width - (yAt === 'left' ? SIDE : numbers);
  const y1 = size.height - BOTTOM;
  if (x1 - x0 < LEAST_ROOM || y1 - TOP < LEAST_ROOM) throw new RangeError('there is no room for the curves');
  return { x0, y0: TOP, x1, y1 };
}

/** A chart in the order it is painted: what lies under the curves, the curves, what stands over them. */
export interface ChartLayers {
  readonly frame: Box;
  readonly under: readonly Item[];
  readonly curves: readonly Item[];
  readonly over: readonly Item[];
}

function chartItems(chart: Chart, size: Size): Item[] {
  const { under, curves, over } = chartLayers(chart, size);
  return [...under, ...curves, ...over];
}

/** The layers of a chart, for those who draw the curves themselves. Throws RangeError where the size leaves no room for them. */
export function chartLayers(chart: Chart, size: Size): ChartLayers {
  const { x, y } = chart;
  const frame = chartFrame(chart, size);
  const scale: Scale = {
    x: (value) => frame.x0 + positionOn(x, value) * (frame.x1 - frame.x0),
    y: (value) => frame.y1 - positionOn(y, value) * (frame.y1 - frame.y0),
  };
  const lines = chart.curves.map((curve): LabelledLine => {
    const { role, label, labelAt = 0.5 } = curve;
    return { role, points: pointsOf(curve, scale), label, at: labelAt };
  });
  const marks = chart.marks.map((mark) => markItem(mark, scale));
  const posts = chart.posts.map((post) => postItems(post, frame, scale));
  const markBoxes = chart.marks.map((mark) => around(scale.x(mark.x), scale.y(mark.y), MARK_RADIUS + 2));
  const markLabels = placeLabels(markLines(chart.marks, scale, lines), frame, markBoxes).slice(0, chart.marks.length);
  const taken = [...markBoxes, ...markLabels.map(textBox)];
  const postLines = chart.posts.map((post, at): LabelledLine => {
    return { role: post.passed ? 'limit' : 'label', points: posts[at]!.line, label: post.label, at: 0.9 };
  });
  const labels = placeLabels([...lines, ...postLines], frame, taken);
  const areas = chart.areas.flatMap((area) => areaItems(area, frame, scale));
  const curves = lines.flatMap(({ role, points }, at) => curveItems(role, points, chart.curves[at]!.rings ?? 'none'));
  return {
    frame,
    under: [...gridItems(chart, frame, scale), clip(frame, [...areas, ...posts.flatMap(({ items }) => items)])],
    curves: [clip(frame, curves)],
    over: [...marks, ...markLabels, ...labels, ...axisTexts(chart, frame, scale, size)],
  };
}

interface Scale {
  readonly x: (value: number) => number;
  readonly y: (value: number) => number;
}

// ---------------------------------------------------------------- axes

function gridItems({ x, y }: Chart, frame: Box, scale: Scale): Item[] {
  const zero = (axis: Axis): number => (axis.log || axis.low > 0 ? axis.low : Math.min(0, axis.high));
  const vertical = (role: 'grid' | 'axis', at: number): Item => ({
    kind: 'line',
    role,
    points: [at, frame.y0, at, frame.y1],
  });
  const level = (role: 'grid' | 'axis', at: number): Item => ({
    kind: 'line',
    role,
    points: [frame.x0, at, frame.x1, at],
  });
  return [
    ...x.ticks.map((tick) => vertical('grid', scale.x(tick))),
    ...y.ticks.map((tick) => level('grid', scale.y(tick))),
    vertical('axis', scale.x(zero(x))),
    level('axis', scale.y(zero(y))),
  ];
}

function axisTexts({ x, y, yAt }: Chart, frame: Box, scale: Scale, size: Size): TextItem[] {
  const left = yAt === 'left';
  const text = (at: number, down: number, anchor: TextItem['anchor'], runs: TextItem['runs']): TextItem => ({
    kind: 'text',
    role: 'tick',
    x: at,
    y: down,
    anchor,
    size: TICK_SIZE,
    runs,
  });
  const texts = y.ticks.map((tick, at) => {
    const [place, anchor] = left ? [frame.x0 - TICK_GAP, 'end' as const] : [frame.x1 + TICK_GAP, 'start' as const];
    return text(place, scale.y(tick) + 4, anchor, plain(y.labels[at]!));
  });
  let free = -Infinity;
  x.ticks.forEach((tick, at) => {
    const half = widthOf(plain(x.labels[at]!), TICK_SIZE) / 2;
    const place = Math.min(Math.max(scale.x(tick), half), size.width - half);
    // Numbers that would run into each other leave the later one out; the grid still shows its tick.
    if (place - half < free) return;
    free = place + half + 3;
    texts.push(text(place, frame.y1 + 15, 'middle', plain(x.labels[at]!)));
  });
  texts.push(text(frame.x1, frame.y1 + 31, 'end', axisTitle(x)));
  texts.push(text(left ? 2 : size.width - 2, 12, left ? 'start' : 'end', axisTitle(y)));
  return texts;
}

function axisTitle({ symbol, unit }: Axis): TextItem['runs'] {
  return joinRuns(proseRuns(symbol), unit === '' ? [] : plain(`(${unit})`));
}

// ---------------------------------------------------------------- curves and areas

function pointsOf({ x, y }: Curve, scale: Scale): number[] {
  const points: number[] = [];
  for (let at = 0; at < x.length; at++) points.push(scale.x(x[at]!), scale.y(y[at]!));
  return points;
}

/** The pieces between gaps; a single point between two gaps shows only where it has a ring. */
function curveItems(role: LabelledLine['role'], points: readonly number[], rings: 'none' | 'tenth' | 'only'): Item[] {
  const items: Item[] = [];
  const circles: Item[] = [];
  let piece: number[] = [];
  const finish = (): void => {
    if (piece.length > 2 && rings !== 'only') items.push({ kind: 'line', role, points: piece });
    piece = [];
  };
  for (let at = 0; at + 1 < points.length; at += 2) {
    const [x, y] = [points[at]!, clamp(points[at + 1]!)];
    if (!Number.isFinite(x) || Number.isNaN(y)) {
      finish();
      continue;
    }
    piece.push(x, y);
    if (rings === 'only' || (rings === 'tenth' && (at / 2) % 10 === 5)) {
      circles.push({ kind: 'circle', role: 'terminal', x, y, radius: 2.5, filled: false });
    }
  }
  finish();
  return [...items, ...circles];
}

function areaItems({ role, x, low, high }: Area, frame: Box, scale: Scale): Item[] {
  const outline: number[] = [];
  for (let at = 0; at < x.length; at++) outline.push(scale.x(x[at]!), clamp(scale.y(high[at]!)));
  for (let at = x.length - 1; at >= 0; at--) outline.push(scale.x(x[at]!), clamp(scale.y(low[at]!)));
  if (role === 'band') return [{ kind: 'line', role, points: outline, closed: true, filled: true }];
  return [{ kind: 'clip', outline, items: slanted(frame) }];
}

/** Lines at 45 degrees over a whole box. */
function slanted({ x0, y0, x1, y1 }: Box): Item[] {
  const height = y1 - y0;
  const items: Item[] = [];
  for (let x = x0 - height; x < x1; x += HATCH_STEP) {
    items.push({ kind: 'line', role: 'hatch', points: [x, y1, x + height, y0] });
  }
  return items;
}

function postItems(post: Post, frame: Box, scale: Scale): { readonly line: number[]; readonly items: Item[] } {
  const role = post.passed ? 'limit' : 'symbol';
  const at = post.axis === 'x' ? scale.x(post.value) : scale.y(post.value);
  const line = post.axis === 'x' ? [at, frame.y0, at, frame.y1] : [frame.x0, at, frame.x1, at];
  const items: Item[] = [{ kind: 'line', role, points: line }];
  if (post.forbids === 'nothing') return { line, items };
  const [low, high] = post.axis === 'x' ? [frame.y0, frame.y1] : [frame.x0, frame.x1];
  // Towards the forbidden side: smaller values lie to the left, or further down.
  const side = (post.forbids === 'below') === (post.axis === 'x') ? -POST_HATCH : POST_HATCH;
  for (let along = low + POST_HATCH; along < high; along += 2 * POST_HATCH) {
    const points =
      post.axis === 'x' ? [at, along, at + side, along + POST_HATCH] : [along, at, along - POST_HATCH, at + side];
    items.push({ kind: 'line', role: post.passed ? 'hatch' : 'axis', points });
  }
  return { line, items };
}

// ---------------------------------------------------------------- marks

function markItem({ role, shape, x, y }: Mark, scale: Scale): Item {
  const [px, py] = [scale.x(x), scale.y(y)];
  const r = MARK_RADIUS;
  if (shape === 'disc') return { kind: 'circle', role, x: px, y: py, radius: r, filled: true };
  const s = shape === 'up' ? -1 : 1;
  const points = [px - r, py - s * r * 0.8, px + r, py - s * r * 0.8, px, py + s * r];
  return { kind: 'line', role, points, closed: true };
}

/** Labels of marks stand beside them; the curves come behind as what they should not cover. */
function markLines(marks: readonly Mark[], scale: Scale, curves: readonly LabelledLine[]): LabelledLine[] {
  const own = marks.map((mark): LabelledLine => {
    const [x, y] = [scale.x(mark.x), scale.y(mark.y)];
    const points = [x - 5, y - 5, x + 5, y - 5, x + 5, y + 5, x - 5, y + 5];
    return { role: mark.role === 'point' ? 'voltage' : mark.role, points, label: mark.label, at: 0.2 };
  });
  return [...own, ...curves.map((line) => ({ ...line, label: '' }))];
}

function clip({ x0, y0, x1, y1 }: Box, items: readonly Item[]): Item {
  return { kind: 'clip', outline: [x0, y0 - 1, x1, y0 - 1, x1, y1 + 1, x0, y1 + 1], items };
}

function around(x: number, y: number, half: number): Box {
  return { x0: x - half, y0: y - half, x1: x + half, y1: y + half };
}

/** Far outside is far enough: drawing programs lose their grip on coordinates of many digits. */
function clamp(y: number): number {
  return Math.min(1e5, Math.max(-1e5, y));
}
