// The declared set: all positions that the limits of the sheet allow, cut by every further limit of a part and by the
// draws that go together.
//
// Where a part has such limits, two of its draws span the plane in which the set has its border: those that go together, or
// those that move the further limits most. The border is followed along lines of either direction, each end found by
// halving from the inner side, so that every border position belongs to the set to the last bit.

import { atan, cos, sin } from '../numeric/index.ts';
import type { SpreadModel, Tie } from '../sheet/index.ts';
import { createBatch } from './batch.ts';
import type { Batch } from './batch.ts';
import { quantileAt } from './law.ts';
import type { Position } from './position.ts';

/** Lines in either direction along which the border of a plane is looked for, and steps on each. */
const LINES = 17;
const STEPS = 65;
/** A place on the border is known once it is off by less than this share of the way to it. */
const SETTLED = 1e-11;
/** Steps after which a place is taken as it is: the secant settles within ten, halving alone within forty. */
const STEP_CAP = 48;

/** Two draws of a part between which its further limits lie. */
export interface Plane {
  readonly cell: string;
  readonly a: number;
  readonly b: number;
}

export interface DeclaredSet {
  readonly planes: readonly Plane[];
  /** Says of each position whether it belongs to the set. */
  membership(positions: readonly Position[]): Uint8Array;
  /** Positions on the border of a plane, all other draws at their nominal; none where no position of the plane belongs to the set. */
  border(plane: Plane): readonly Position[];
  /** For each position the place on the border of a plane in this direction (radians) from the middle of the plane. */
  rays(plane: Plane, at: readonly Position[], angles: readonly number[]): Position[];
  /** The direction in which a position stands from the middle of a plane. */
  angleOf(plane: Plane, position: Position): number;
  /** The last position of the set on each way from a member to another position; that position itself where it belongs. */
  pullBack(members: readonly Position[], others: readonly Position[]): Position[];
}

/** The set of a model. */
export function declaredSet(model: SpreadModel): DeclaredSet {
  const { cuts, ties, drawn } = model;
  const batch =
    cuts.length === 0
      ? null
      : createBatch(
          model,
          cuts.map(({ slot }) => slot),
        );
  /** How far the share of one draw is from where the one it follows lets it be. */
  const tieExcess = (tie: Tie, position: Position): number => {
    const u = quantileAt(drawn[tie.threshold]!, position[tie.threshold]!);
    const v = quantileAt(drawn[tie.gain]!, position[tie.gain]!);
    const a = tie.thresholdFalls ? 1 - u : u;
    const b = tie.gainFalls !== tie.tracking < 0 ? 1 - v : v;
    return Math.abs(a - b) - (1 - Math.abs(tie.tracking)) - TIE_ROUNDING;
  };
  const widths = cuts.map(({ low, high }) =>
    high - low < Infinity ? high - low || Math.abs(high) : Math.abs(high < Infinity ? high : low),
  );

  /** How far each position is outside of the set, as a share of the limit that it passes most; not above 0 inside. */
  function excess(positions: readonly Position[]): Float64Array {
    const found = new Float64Array(positions.length).fill(-Infinity);
    for (const tie of ties) {
      positions.forEach((position, i) => (found[i] = Math.max(found[i]!, tieExcess(tie, position))));
    }
    batch?.run(positions, (from, count) => {
      cuts.forEach(({ low, high }, k) => {
        const reading = batch.column(k);
        for (let i = 0; i < count; i++) {
          const beyond = Math.max(low - reading[i]!, reading[i]! - high) / widths[k]!;
          // What reads as no number, or infinitely far off, is outside, no matter how far.
          found[from + i] = beyond === beyond ? Math.max(found[from + i]!, beyond) : Infinity;
        }
      });
    });
    return found;
  }

  function membership(positions: readonly Position[]): Uint8Array {
    return Uint8Array.from(excess(positions), (beyond) => (beyond <= 0 ? 1 : 0));
  }

  /** By the rule of false position, the lasting end halved (Illinois); by halving where no number tells how far it is. */
  function pullBack(members: readonly Position[], others: readonly Position[]): Position[] {
    const found = others.slice();
    const farOutside = excess(others);
    let open = others.flatMap((_, i) => (farOutside[i]! <= 0 ? [] : [i]));
    if (open.length === 0) return found;
    const low = new Float64Array(others.length);
    const high = new Float64Array(others.length).fill(1);
    const below = excess(members);
    const above = farOutside;
    const lasts = new Int8Array(others.length);
    const at = (i: number, share: number): Position => {
      const other = others[i]!;
      return members[i]!.map((t, k) => (t === other[k] ? t : t + share * (other[k]! - t)));
    };
    for (let n = 0; n < STEP_CAP && open.length > 0; n++) {
      const shares = open.map((i) => {
        const width = high[i]! - low[i]!;
        const secant = low[i]! + (width * below[i]!) / (below[i]! - above[i]!);
        const isSafe = n % 4 !== 3 && secant > low[i]! && secant < high[i]!;
        return isSafe ? secant : low[i]! + width / 2;
      });
      const beyond = excess(open.map((i, k) => at(i, shares[k]!)));
      open.forEach((i, k) => {
        if (beyond[k]! <= 0) {
          low[i] = shares[k]!;
          below[i] = beyond[k]!;
          if (lasts[i] === 1) above[i]! /= 2;
          lasts[i] = 1;
        } else {
          high[i] = shares[k]!;
          above[i] = beyond[k]!;
          if (lasts[i] === -1) below[i]! /= 2;
          lasts[i] = -1;
        }
      });
      open = open.filter((i) => {
        const isSettled = high[i]! - low[i]! <= SETTLED || below[i] === 0;
        if (isSettled) found[i] = at(i, low[i]!);
        return !isSettled;
      });
    }
    for (const i of open) found[i] = at(i, low[i]!);
    return found;
  }

  function trace(plane: Plane): { anchor: Position; places: Position[] } | null {
    const { a, b } = plane;
    const nominal = new Float64Array(drawn.length);
    const grid: Position[] = [];
    for (const [along, across] of [
      [a, b],
      [b, a],
    ] as const) {
      for (let line = 0; line < LINES; line++) {
        for (let step = 0; step < STEPS; step++) {
          const position = nominal.slice();
          position[along] = -1 + (2 * line) / (LINES - 1);
          position[across] = -1 + (2 * step) / (STEPS - 1);
          grid.push(position);
        }
      }
    }
    const inside = membership(grid);
    const members = grid.filter((_, i) => inside[i] === 1);
    if (members.length === 0) return null;
    const inner: Position[] = [];
    const outer: Position[] = [];
    for (let i = 0; i < grid.length; i++) {
      if (inside[i] !== 1) continue;
      const step = i % STEPS;
      for (const [isLast, neighbour] of [
        [step === 0, i - 1],
        [step === STEPS - 1, i + 1],
      ] as const) {
        if (!isLast && inside[neighbour] === 1) continue;
        inner.push(grid[i]!);
        outer.push(isLast ? grid[i]! : grid[neighbour]!);
      }
    }
    return { anchor: middleOf(members, plane), places: pullBack(inner, outer) };
  }

  const traced = new Map<Plane, ReturnType<typeof trace>>();
  function traceOf(plane: Plane): ReturnType<typeof trace> {
    if (!traced.has(plane)) traced.set(plane, trace(plane));
    return traced.get(plane)!;
  }

  function rays(plane: Plane, at: readonly Position[], angles: readonly number[]): Position[] {
    const { a, b } = plane;
    const { anchor } = traceOf(plane)!;
    const starts = at.map((position) => position.with(a, anchor[a]!).with(b, anchor[b]!));
    const ends = starts.map((start, i) => {
      const [x, y] = [cos(angles[i]!), sin(angles[i]!)];
      const far = Math.min(toEdge(anchor[a]!, x), toEdge(anchor[b]!, y));
      return start.with(a, clamp(anchor[a]! + far * x)).with(b, clamp(anchor[b]! + far * y));
    });
    return pullBack(starts, ends);
  }

  return {
    planes: planesOf(model, batch),
    membership,
    pullBack,
    border: (plane) => traceOf(plane)?.places ?? [],
    rays,
    angleOf(plane, position) {
      const { anchor } = traceOf(plane)!;
      const [x, y] = [position[plane.a]! - anchor[plane.a]!, position[plane.b]! - anchor[plane.b]!];
      const angle = atan(Math.abs(y) / Math.abs(x));
      const half = x < 0 ? Math.PI - angle : angle;
      return y < 0 ? -half : half;
    },
  };
}

/** How far a ray may go from `from` in a direction before it leaves -1..1. */
function toEdge(from: number, direction: number): number {
  return direction === 0 ? Infinity : ((direction > 0 ? 1 : -1) - from) / direction;
}

function clamp(t: number): number {
  return Math.max(-1, Math.min(1, t));
}

/** The member nearest to the mean of all. */
function middleOf(members: readonly Position[], { a, b }: Plane): Position {
  const mean = (k: number): number => members.reduce((sum, position) => sum + position[k]!, 0) / members.length;
  const [x, y] = [mean(a), mean(b)];
  const off = (position: Position): number => (position[a]! - x) ** 2 + (position[b]! - y) ** 2;
  return members.reduce((nearest, position) => (off(position) < off(nearest) ? position : nearest));
}

/** |u - v| of positions on the border itself comes out this far beyond it. */
const TIE_ROUNDING = 1e-15;

/** The plane of each part that has further limits or draws that go together. */
function planesOf(model: SpreadModel, batch: Batch | null): Plane[] {
  const { cuts, ties, drawn } = model;
  const planes: Plane[] = ties.map(({ cell, threshold, gain }) => ({ cell, a: threshold, b: gain }));
  const moved = batch ? movement(model, batch) : [];
  for (const cell of new Set(cuts.map((cut) => cut.cell))) {
    if (planes.some((plane) => plane.cell === cell)) continue;
    const weight = (k: number): number =>
      cuts.reduce((sum, cut, c) => (cut.cell === cell ? sum + moved[k]![c]! : sum), 0);
    const strongest = drawn
      .map((_, k) => k)
      .filter((k) => weight(k) > 0)
      .toSorted((k, j) => weight(j) - weight(k));
    if (strongest.length === 0) continue;
    planes.push({ cell, a: strongest[0]!, b: strongest[1] ?? strongest[0]! });
  }
  return planes;
}

/** How far each draw, from one end to the other, moves what each cut reads, as a share of its nominal reading. */
function movement({ drawn, cuts }: SpreadModel, batch: Batch): Float64Array[] {
  const nominal = new Float64Array(drawn.length);
  const positions = drawn.flatMap((_, k) => [-1, 1].map((t) => nominal.with(k, t)));
  const moved = drawn.map(() => new Float64Array(cuts.length));
  const readings = cuts.map(() => new Float64Array(positions.length));
  batch.run(positions, (from, count) => {
    readings.forEach((all, c) => all.set(batch.column(c).subarray(0, count), from));
  });
  readings.forEach((all, c) => {
    for (let k = 0; k < drawn.length; k++) {
      const [low, high] = [all[2 * k]!, all[2 * k + 1]!];
      const share = Math.abs(high - low) / Math.max(Math.abs(low), Math.abs(high));
      moved[k]![c] = share > 0 ? share : 0;
    }
  });
  return moved;
}
