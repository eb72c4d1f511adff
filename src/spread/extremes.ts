// The least and the largest of every value over the declared set, and where each occurs.
//
// A value is mostly monotonic in each draw, so the search is one over vertices: around the best position so far every draw
// is moved alone, to both ends and to places between; where draws bound each other, along the border of their plane. All
// moves that help together give the next position. It ends when no move helps; then a draw that stands between its ends is
// settled by narrowing. Every position that is evaluated counts for every value, and so does every sample that is brought
// later (`witness`): an extreme that a sample beats is searched for again from there.

import { reachOf, reaches } from '../program/index.ts';
import type { SpreadModel } from '../sheet/index.ts';
import { createBatch } from './batch.ts';
import type { Batch } from './batch.ts';
import { choicesOf } from './state-columns.ts';
import { declaredSet } from './declared-set.ts';
import type { DeclaredSet, Plane } from './declared-set.ts';
import type { Position } from './position.ts';

/** One end of a value. */
export interface Extreme {
  /** NaN where the value is not known at some position of the set. */
  readonly value: number;
  readonly position: Position;
}

export interface Extremes {
  readonly low: Extreme;
  readonly high: Extreme;
  /** A position of the set at which the value could not be computed; null where there is none. */
  readonly unsolved: Position | null;
}

export interface ExtremeSearch {
  /** The extremes of the k-th value. */
  of(k: number): Extremes;
  /** Whether the set has any member; without one nothing is known. */
  readonly isEmpty: boolean;
  /** Takes positions of the set, each for the value that is larger or smaller there than any so far; says how many extremes moved. */
  witness(positions: readonly Position[]): number;
}

/** Places to which a draw is moved alone. */
const PLACES = [-1, -0.5, 0, 0.5, 1];
/** Radians to either side within which a place on a border is narrowed down: further than its neighbours. */
const FAN = 0.2;
/** How often moving and settling may take turns. */
const PASS_CAP = 4;
/** Rounds after which a search is given up where it stands; most end within four. */
const ROUND_CAP = 24;
/** Places tried at once when a draw is narrowed down, and how often: the last bracket is below 1e-9 of the range. */
const NARROW_PLACES = 8;
const NARROWINGS = 14;

/** How hard a search tries: `quick` is one round of moves around the nominal, for an answer within a frame. */
export type SearchEffort = 'quick' | 'full';

/** What a search is given beside the model and what is wanted of it. */
interface SearchOptions {
  readonly effort: SearchEffort;
  readonly set: DeclaredSet;
  /** Whether a draw may leave its nominal. */
  readonly moving: (draw: number) => boolean;
  /** Computes what is wanted. */
  readonly batch: Batch;
  /** Which ends are looked for; the others are left wherever that search comes by. */
  readonly ends: readonly ('low' | 'high')[];
}

/** Searches for the extremes of the values in these slots. */
export function searchExtremes(
  model: SpreadModel,
  wanted: readonly number[],
  options: Partial<SearchOptions> = {},
): ExtremeSearch {
  const { effort = 'full', moving = () => true, ends: sides = ['low', 'high'] } = options;
  const set = options.set ?? declaredSet(model);
  const batch = options.batch ?? createBatch(model, wanted);
  const { drawn, program } = model;
  const reach = reachOf(
    program,
    drawn.map(({ slot }) => slot),
    new Set(choicesOf(model)),
  );
  const draws = drawn.map((_, k) => k).filter((k) => moving(k) && canMove(model, k));
  const drawsOf = wanted.map((slot) => draws.filter((k) => reaches(reach, k, slot)));
  const inPlane = new Set(set.planes.flatMap(({ a, b }) => [a, b]));
  const planes = set.planes.filter(({ a, b }) => moving(a) && moving(b));

  // Two ends per value: 2 k its least, 2 k + 1 its largest.
  const best = new Float64Array(2 * wanted.length);
  const bestAt: (Position | null)[] = Array.from(best, () => null);
  const unsolved: (Position | null)[] = wanted.map(() => null);
  for (let e = 0; e < best.length; e++) best[e] = e % 2 === 0 ? Infinity : -Infinity;
  const isBetter = (e: number, value: number): boolean => (e % 2 === 0 ? value < best[e]! : value > best[e]!);

  /** Evaluates positions of the set; every value that is better somewhere moves there. */
  function visit(positions: readonly Position[], look: (from: number, count: number) => void = () => {}): void {
    batch.run(positions, (from, count) => {
      look(from, count);
      for (let k = 0; k < wanted.length; k++) {
        const values = batch.column(k);
        for (let i = 0; i < count; i++) {
          const value = values[i]!;
          if (value !== value) unsolved[k] ??= positions[from + i]!;
          for (const e of [2 * k, 2 * k + 1]) {
            if (bestAt[e] !== null && !isBetter(e, value)) continue;
            if (value !== value) continue;
            best[e] = value;
            bestAt[e] = positions[from + i]!;
          }
        }
      }
    });
  }

  const start = firstMember();
  if (start === null) return { isEmpty: true, of: () => nowhere(model), witness: () => 0 };
  visit([start]);
  climb(allEnds());

  function allEnds(): number[] {
    return [...best.keys()].filter((e) => sides.includes(e % 2 === 0 ? 'low' : 'high'));
  }

  /** The nominal position where it belongs to the set, else the place on a border that is nearest to it. */
  function firstMember(): Position | null {
    let position: Position = new Float64Array(drawn.length);
    if (set.membership([position])[0] === 1) return position;
    for (const plane of set.planes) {
      const places = set.border(plane);
      if (places.length === 0) continue;
      const nearest = places.reduce((a, b) => (distance(a) <= distance(b) ? a : b));
      position = position.with(plane.a, nearest[plane.a]!).with(plane.b, nearest[plane.b]!);
    }
    return set.membership([position])[0] === 1 ? position : null;
  }

  /** Moves each of these ends as far as it goes, then settles what stands between; again, where that opened a way. */
  function climb(ends: readonly number[]): void {
    const effective = new Map<number, ReadonlySet<number>>();
    let open = ends;
    for (let pass = 0; pass < PASS_CAP && open.length > 0; pass++) {
      const before = best.slice();
      moveAll(open, effective);
      if (effort === 'quick') return;
      const moved = open.filter((e) => pass === 0 || hasMoved(before[e]!, best[e]!));
      const settled = best.slice();
      narrow(moved, effective);
      open = moved.filter((e) => hasMoved(settled[e]!, best[e]!));
    }
  }

  function moveAll(ends: readonly number[], effective: Map<number, ReadonlySet<number>>): void {
    const seen = new Map<number, Position>();
    const then = best.map(() => NaN);
    const rounds = effort === 'quick' ? 1 : ROUND_CAP;
    for (let round = 0; round < rounds; round++) {
      const open = ends.filter((e) => bestAt[e] !== null && seen.get(e) !== bestAt[e] && hasMoved(then[e]!, best[e]!));
      if (open.length === 0) return;
      // Ends that stand at the same place share their moves.
      const places = new Map<Position, Set<number>>();
      for (const e of open) {
        const position = bestAt[e]!;
        seen.set(e, position);
        then[e] = best[e]!;
        const wantedDraws = places.get(position) ?? new Set();
        for (const k of drawsOf[e >> 1]!) wantedDraws.add(k);
        places.set(position, wantedDraws);
      }
      for (const [position, wantedDraws] of places) {
        const group = open.filter((e) => seen.get(e) === position);
        move(position, [...wantedDraws], group, effective);
      }
    }
  }

  /** Moves every draw alone around a position, then, for each end, all moves that helped it at once. */
  function move(
    position: Position,
    wantedDraws: readonly number[],
    ends: readonly number[],
    effective: Map<number, ReadonlySet<number>>,
  ): void {
    const moves: Position[] = [];
    /** Moves of one group exclude each other. */
    const group: number[] = [];
    const moved: Position[] = [];
    wantedDraws.forEach((k, g) => {
      for (const t of placesOf(model, k)) {
        if (t === position[k]) continue;
        moves.push(position.with(k, t));
        group.push(g);
      }
    });
    planes.forEach((plane, g) => {
      if (!wantedDraws.includes(plane.a) && !wantedDraws.includes(plane.b)) return;
      for (const place of set.border(plane)) {
        const there = position.slice();
        there[plane.a] = place[plane.a]!;
        there[plane.b] = place[plane.b]!;
        moves.push(there);
        group.push(wantedDraws.length + g);
      }
    });
    const reachable = set.pullBack(
      moves.map(() => position),
      moves,
    );
    const values = ends.map(() => new Float64Array(reachable.length));
    const before = ends.map((e) => best[e]!);
    visit(reachable, (from, count) => {
      ends.forEach((e, n) => values[n]!.set(batch.column(e >> 1).subarray(0, count), from));
    });
    ends.forEach((e, n) => {
      const groups = new Set(group.filter((_, i) => values[n]![i] !== before[n]));
      effective.set(e, new Set([...groups].map((g) => wantedDraws[g] ?? -1)));
    });
    const joined = ends.flatMap((e, n): Position[] => {
      const helpful = new Map<number, number>();
      for (let i = 0; i < reachable.length; i++) {
        const value = values[n]![i]!;
        const sooner = helpful.get(group[i]!);
        const least = sooner === undefined ? before[n]! : values[n]![sooner]!;
        if (e % 2 === 0 ? value < least : value > least) helpful.set(group[i]!, i);
      }
      if (helpful.size < 2) return [];
      const together = position.slice();
      for (const i of helpful.values()) {
        for (let k = 0; k < together.length; k++) if (reachable[i]![k] !== position[k]) together[k] = reachable[i]![k]!;
      }
      return [together];
    });
    moved.push(...distinct(joined));
    if (moved.length > 0) {
      visit(
        set.pullBack(
          moved.map(() => position),
          moved,
        ),
      );
    }
  }

  /** Settles draws that have an effect and stand between their ends, and places on a border, each end of a value for itself. */
  function narrow(ends: readonly number[], effective: ReadonlyMap<number, ReadonlySet<number>>): void {
    const jobs = ends.flatMap((e) => [
      ...[...(effective.get(e) ?? [])]
        .filter((k) => k >= 0 && !inPlane.has(k) && isBetween(bestAt[e]!, k))
        .map((k) => drawJob(e, k)),
      ...planes.filter((plane) => isOnSlope(plane, e)).map((plane) => borderJob(e, plane)),
    ]);
    if (jobs.length === 0) return;
    for (let n = 0; n < NARROWINGS; n++) {
      const places = jobs.flatMap((job) => {
        const steps = Array.from({ length: NARROW_PLACES }, (_, i) => (i + 1) / (NARROW_PLACES + 1));
        return job.places(steps.map((share) => job.low + (job.high - job.low) * share));
      });
      const inside = set.membership(places);
      visit(places.filter((_, i) => inside[i] === 1));
      for (const job of jobs) {
        const half = (job.high - job.low) / (NARROW_PLACES + 1);
        const middle = job.present();
        job.low = middle - half;
        job.high = middle + half;
      }
    }
  }

  interface Narrowing {
    low: number;
    high: number;
    readonly present: () => number;
    readonly places: (at: readonly number[]) => Position[];
  }

  function drawJob(e: number, k: number): Narrowing {
    const present = (): number => bestAt[e]![k]!;
    const places = (at: readonly number[]): Position[] =>
      at.map((t) => bestAt[e]!.with(k, Math.max(-1, Math.min(1, t))));
    return { low: present() - 0.5, high: present() + 0.5, present, places };
  }

  function borderJob(e: number, plane: Plane): Narrowing {
    const present = (): number => set.angleOf(plane, bestAt[e]!);
    const places = (at: readonly number[]): Position[] =>
      set.rays(
        plane,
        at.map(() => bestAt[e]!),
        at,
      );
    return { low: present() - FAN, high: present() + FAN, present, places };
  }

  /** Whether a value stands at a place of a plane that is no corner of its draws' own limits. */
  function isOnSlope({ a, b }: Plane, e: number): boolean {
    const position = bestAt[e]!;
    const isCorner = Math.abs(position[a]!) === 1 && Math.abs(position[b]!) === 1;
    return !isCorner && (drawsOf[e >> 1]!.includes(a) || drawsOf[e >> 1]!.includes(b));
  }

  return {
    isEmpty: false,
    of: (k) => ({
      low: { value: bestAt[2 * k] ? best[2 * k]! : NaN, position: bestAt[2 * k] ?? start },
      high: { value: bestAt[2 * k + 1] ? best[2 * k + 1]! : NaN, position: bestAt[2 * k + 1] ?? start },
      unsolved: unsolved[k]!,
    }),
    witness(positions) {
      const before = best.slice();
      visit(positions);
      const beaten = allEnds().filter((e) => best[e] !== before[e]);
      if (beaten.length > 0) climb(beaten);
      return beaten.length;
    },
  };
}

/** Whether a value moved by more than rounding does. */
function hasMoved(then: number, now: number): boolean {
  return !(Math.abs(now - then) <= 1e-13 * Math.abs(now));
}

/** Whether a draw stands between its ends. */
function isBetween(position: Position, k: number): boolean {
  return Math.abs(position[k]!) < 1;
}

/** Whether a draw has an end that it can be moved to. */
function canMove({ drawn }: SpreadModel, k: number): boolean {
  const { low, nominal, high } = drawn[k]!.spread;
  return (low !== null && low !== nominal) || (high !== null && high !== nominal);
}

/** The places that a draw is moved to: none on the side of an open end. */
function placesOf({ drawn }: SpreadModel, k: number): number[] {
  const { low, high } = drawn[k]!.spread;
  return PLACES.filter((t) => t === 0 || (t < 0 ? low : high) !== null);
}

function distance(position: Position): number {
  return position.reduce((sum, t) => sum + t * t, 0);
}

function nowhere({ drawn }: SpreadModel): Extremes {
  const position = new Float64Array(drawn.length);
  return { low: { value: NaN, position }, high: { value: NaN, position }, unsolved: position };
}

/** The positions without repetition. */
function distinct(positions: readonly Position[]): Position[] {
  return [...new Map(positions.map((position) => [position.join(' '), position])).values()];
}
