// Words on the lines of a chart: each label tries places along its own curve, above and below it, and takes the
// one that covers least. Labels never cover each other or a mark; where none is left, the label is dropped,
// and the sentence of the figure still says it.

import type { Box, Role, TextItem } from './geometry.ts';
import { boxesOverlap } from './geometry.ts';
import { LABEL_SIZE, proseRuns, textBox } from './labels.ts';

/** A curve in drawing units, with what shall stand on it. */
export interface LabelledLine {
  readonly role: Role;
  readonly points: readonly number[];
  readonly label: string;
  /** Best place along the curve, 0 to 1. */
  readonly at: number;
}

const PLACES = 24;
const LIFT = 5;
/** Cost of one point of a curve under a label; of standing one whole curve length away from the best place. */
const COVER_COST = 1;
const AWAY_COST = 6;
/** Distance between the points at which a curve is looked at. */
const GRAIN = 4;

/** Texts for the lines inside `frame`, clear of `taken`; roles are those of the lines. */
export function placeLabels(lines: readonly LabelledLine[], frame: Box, taken: readonly Box[]): TextItem[] {
  const traces = lines.map(({ points }) => trace(points, frame));
  const occupied = [...taken];
  const items: TextItem[] = [];
  lines.forEach((line, index) => {
    const own = traces[index]!;
    if (line.label === '' || own.length === 0) return;
    const runs = proseRuns(line.label);
    let best: { item: TextItem; box: Box; cost: number } | null = null;
    for (let step = 0; step <= PLACES; step++) {
      const [x, y] = own[Math.round(((own.length - 1) * step) / PLACES)]!;
      const away = AWAY_COST * Math.abs(step / PLACES - line.at);
      if (best !== null && away >= best.cost) continue;
      for (const [dx, dy, anchor] of OFFSETS) {
        const item = textAt(line.role, runs, x + dx, y + dy, anchor);
        const box = textBox(item);
        if (!inside(box, frame) || occupied.some((other) => boxesOverlap(box, other))) continue;
        const cost: number = costAt(traces, box, away, best?.cost ?? Infinity);
        if (best === null || cost < best.cost) best = { item, box, cost };
      }
    }
    if (best === null) return;
    items.push(best.item);
    occupied.push(best.box);
  });
  return items;
}

const OFFSETS: readonly (readonly [number, number, TextItem['anchor']])[] = [
  [0, -LIFT, 'end'],
  [0, -LIFT, 'start'],
  [0, -LIFT, 'middle'],
  [0, LIFT + 9, 'start'],
  [0, LIFT + 9, 'end'],
  [LIFT + 2, 4, 'start'],
  [-LIFT - 2, 4, 'end'],
];

function textAt(role: Role, runs: TextItem['runs'], x: number, y: number, anchor: TextItem['anchor']): TextItem {
  return { kind: 'text', role, x, y, anchor, size: LABEL_SIZE - 0.5, runs, halo: true };
}

/** Cost of a label that stands away from its best place, with the curves under it; counted only until it is no less than `most`. */
function costAt(
  traces: readonly (readonly (readonly [number, number])[])[],
  box: Box,
  away: number,
  most: number,
): number {
  let covered = 0;
  for (const points of traces) {
    for (let at = 0; at < points.length && COVER_COST * covered + away < most; at++) {
      if (within(points[at]!, box)) covered++;
    }
  }
  return COVER_COST * covered + away;
}

/** Points of a curve inside the frame, a few units apart. */
function trace(points: readonly number[], frame: Box): (readonly [number, number])[] {
  const traced: (readonly [number, number])[] = [];
  for (let at = 0; at + 3 < points.length; at += 2) {
    const [x0, y0, x1, y1] = [points[at]!, points[at + 1]!, points[at + 2]!, points[at + 3]!];
    const parts = Math.max(1, Math.ceil(Math.max(Math.abs(x1 - x0), Math.abs(y1 - y0)) / GRAIN));
    if (!Number.isFinite(parts)) continue;
    for (let part = 0; part < parts; part++) {
      const point = [x0 + ((x1 - x0) * part) / parts, y0 + ((y1 - y0) * part) / parts] as const;
      if (within(point, frame)) traced.push(point);
    }
  }
  return thinned(traced);
}

/** Without points that lie closer than the grain: a finely sampled curve is no heavier than a straight one. */
function thinned(points: readonly (readonly [number, number])[]): (readonly [number, number])[] {
  const kept: (readonly [number, number])[] = [];
  for (const point of points) {
    const last = kept.at(-1);
    if (last === undefined || Math.abs(point[0] - last[0]) + Math.abs(point[1] - last[1]) >= GRAIN) kept.push(point);
  }
  return kept;
}

function within(point: readonly [number, number], box: Box): boolean {
  return point[0] >= box.x0 && point[0] <= box.x1 && point[1] >= box.y0 && point[1] <= box.y1;
}

function inside(box: Box, frame: Box): boolean {
  return box.x0 >= frame.x0 && box.x1 <= frame.x1 && box.y0 >= frame.y0 && box.y1 <= frame.y1;
}
