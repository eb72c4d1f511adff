// The draws of builds: every draw of every build from its own counter, so that build 4711 is the same one whatever else the
// sheet draws, in whatever order or portion it is made.
//
// Draws that go together are tied by the fold law; a specimen that reads outside a further limit of its part is drawn again,
// all draws of that part together, until it belongs to the declared set.

import { drawKey, uniformAt } from '../numeric/index.ts';
import type { DrawKey } from '../numeric/index.ts';
import { createColumns, planColumns, reachOf, reaches } from '../program/index.ts';
import { KERNELS } from '../sheet/index.ts';
import type { SpreadModel, Tie } from '../sheet/index.ts';
import { choicesOf } from './batch.ts';
import { placeAt } from './law.ts';
import { valueAt } from './position.ts';
import type { Position } from './position.ts';
import { follow } from './tracking.ts';

/** A specimen that was drawn so often without belonging to the set is given up. */
const ATTEMPT_CAP = 2000;

/** How often the specimens of a part had to be drawn. */
export interface Trial {
  readonly cell: string;
  readonly attempts: number;
  /** Builds whose specimen was given up. */
  readonly givenUp: number;
}

export interface Draws {
  /** Where the draws of builds first .. first + count stand: position k of build i in `place(k)[i]`. Service stays at its nominal. */
  draw(first: number, count: number): readonly Trial[];
  place(k: number): Float64Array;
  /** 1 for each build that was given up. */
  readonly void: Uint8Array;
}

/** Prepares the draws of up to `width` builds at a time. */
export function createDraws(model: SpreadModel, seed: number, width: number): Draws {
  const { drawn, ties } = model;
  const keys = drawn.map(({ name }) => drawKey(seed, name));
  const places = drawn.map(() => new Float64Array(width));
  const isVoid = new Uint8Array(width);
  const parts = partsOf(model, width);
  const tieOf = new Map(ties.map((tie) => [tie.gain, tie]));

  /** Draws number k of one build; the tied one after the one it follows. */
  function place(k: number, build: number, attempt: number): number {
    const each = drawn[k]!;
    if (each.spread.service) return 0;
    const u = uniformAt(keys[k]!, build, attempt);
    const tie = tieOf.get(k);
    return placeAt(each.spread.law, tie ? tied(tie, keys, build, attempt, u) : u);
  }

  return {
    void: isVoid,
    place: (k) => places[k]!,
    draw(first, count) {
      isVoid.fill(0, 0, count);
      for (let k = 0; k < drawn.length; k++) {
        const column = places[k]!;
        for (let i = 0; i < count; i++) column[i] = place(k, first + i, 0);
      }
      return parts.map(({ cell, draws, check }) => {
        let pending = check(places, null, count);
        let attempts = count;
        for (let attempt = 1; pending.length > 0 && attempt < ATTEMPT_CAP; attempt++) {
          for (const i of pending) for (const k of draws) places[k]![i] = place(k, first + i, attempt);
          attempts += pending.length;
          pending = check(places, pending, pending.length);
        }
        for (const i of pending) isVoid[i] = 1;
        return { cell, attempts, givenUp: pending.length };
      });
    },
  };
}

/** The quantile of the row that follows another. */
function tied(tie: Tie, keys: readonly DrawKey[], build: number, attempt: number, r: number): number {
  const drawnThreshold = uniformAt(keys[tie.threshold]!, build, attempt);
  const u = tie.thresholdFalls ? 1 - drawnThreshold : drawnThreshold;
  const v = follow(u, 2 * r - 1, tie.tracking);
  return tie.gainFalls ? 1 - v : v;
}

/** A part with further limits: its draws, and which of some builds lie outside. */
interface CutPart {
  readonly cell: string;
  readonly draws: readonly number[];
  /** Gives the builds among `rows` (all of 0 .. count where null) that do not belong to the set. */
  check(places: readonly Float64Array[], rows: readonly number[] | null, count: number): number[];
}

function partsOf(model: SpreadModel, width: number): CutPart[] {
  const { program, slots, drawn, cuts } = model;
  const frozen = choicesOf(model);
  const reach = reachOf(
    program,
    drawn.map(({ slot }) => slot),
    new Set(frozen),
  );
  return [...new Set(cuts.map(({ cell }) => cell))].map((cell) => {
    const own = cuts.filter((cut) => cut.cell === cell);
    const draws = drawn.flatMap((_, k) => (own.some(({ slot }) => reaches(reach, k, slot)) ? [k] : []));
    const plan = planColumns(
      { program, slots, varying: draws.map((k) => drawn[k]!.slot), frozen, outputs: own.map(({ slot }) => slot) },
      KERNELS,
    );
    const columns = createColumns(plan, KERNELS);
    return {
      cell,
      draws,
      check(places, rows, count) {
        const outside: number[] = [];
        for (let from = 0; from < count; from += columns.width) {
          const portion = Math.min(columns.width, count - from);
          draws.forEach((k, n) => {
            const column = columns.input(n);
            for (let i = 0; i < portion; i++)
              column[i] = valueAt(drawn[k]!, places[k]![rows ? rows[from + i]! : from + i]!);
          });
          columns.run(portion);
          for (let i = 0; i < portion; i++) {
            const belongs = own.every(
              ({ low, high }, n) => columns.output(n)[i]! >= low && columns.output(n)[i]! <= high,
            );
            if (!belongs) outside.push(rows ? rows[from + i]! : from + i);
          }
        }
        return outside;
      },
    };
  });
}

/** Where one build stands. */
export function positionOf(model: SpreadModel, draws: Draws, build: number): Position {
  draws.draw(build, 1);
  return Float64Array.from(model.drawn, (_, k) => draws.place(k)[0]!);
}
