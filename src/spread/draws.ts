// The draws of builds: every draw of every build from its own counter, so that build 4711 is the same one whatever else the
// sheet draws, in whatever order or portion it is made.
//
// Draws that go together are tied by the fold law; a specimen that reads outside a further limit of its part is drawn again,
// all draws of that part together, until it belongs to the declared set.

import { drawKey, fillUniform, uniformAt } from '../numeric/index.ts';
import { reachOf, reaches } from '../program/index.ts';
import type { SpreadModel, Tie } from '../sheet/index.ts';
import { placeAt } from './law.ts';
import { valueAt } from './position.ts';
import type { Position } from './position.ts';
import { choicesOf, createStateColumns } from './state-columns.ts';
import { follow } from './tracking.ts';

/** A specimen that was drawn so often without belonging to the set is given up. */
const ATTEMPT_CAP = 2000;

/** How often the specimens of a part had to be drawn. */
interface Trial {
  readonly cell: string;
  readonly attempts: number;
  /** Builds whose specimen was given up. */
  readonly givenUp: number;
}

interface Draws {
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
  const parts = partsOf(model);
  const own = drawn.flatMap(({ spread }, k) => (spread.service ? [] : [k]));
  const tieOf = new Map(ties.map((tie) => [tie.gain, tie]));

  /** Draws number k of one build once more. */
  function again(k: number, build: number, attempt: number): number {
    const tie = tieOf.get(k);
    const u = uniformAt(keys[k]!, build, attempt);
    if (!tie) return placeAt(drawn[k]!.spread.law, u);
    return placeAt(drawn[k]!.spread.law, tied(tie, uniformAt(keys[tie.threshold]!, build, attempt), u));
  }

  /** Draws builds first .. first + count for the first time: shares, then what is tied to them, then places. */
  function drawAll(first: number, count: number): void {
    for (const k of own) fillUniform(places[k]!, count, keys[k]!, first, 0);
    for (const tie of ties) {
      const [threshold, gain] = [places[tie.threshold]!, places[tie.gain]!];
      for (let i = 0; i < count; i++) gain[i] = tied(tie, threshold[i]!, gain[i]!);
    }
    for (const k of own) {
      const column = places[k]!;
      if (drawn[k]!.spread.law === 'uniform') for (let i = 0; i < count; i++) column[i] = 2 * column[i]! - 1;
      else for (let i = 0; i < count; i++) column[i] = placeAt('normal', column[i]!);
    }
  }

  return {
    void: isVoid,
    place: (k) => places[k]!,
    draw(first, count) {
      isVoid.fill(0, 0, count);
      drawAll(first, count);
      return parts.map(({ cell, draws, check }) => {
        let pending = check(places, null, count);
        let attempts = count;
        for (let attempt = 1; pending.length > 0 && attempt < ATTEMPT_CAP; attempt++) {
          for (const i of pending) for (const k of draws) places[k]![i] = again(k, first + i, attempt);
          attempts += pending.length;
          pending = check(places, pending, pending.length);
        }
        for (const i of pending) isVoid[i] = 1;
        return { cell, attempts, givenUp: pending.length };
      });
    },
  };
}

/** The share of the row that follows another, from that one's share and a draw of its own. */
function tied(tie: Tie, threshold: number, r: number): number {
  const v = follow(tie.thresholdFalls ? 1 - threshold : threshold, 2 * r - 1, tie.tracking);
  return tie.gainFalls ? 1 - v : v;
}

/** A part with further limits: its draws, and which of some builds lie outside. */
interface CutPart {
  readonly cell: string;
  readonly draws: readonly number[];
  /** Gives the builds among `rows` (all of 0 .. count where null) that do not belong to the set. */
  check(places: readonly Float64Array[], rows: readonly number[] | null, count: number): number[];
}

function partsOf(model: SpreadModel): CutPart[] {
  const { program, drawn, cuts } = model;
  const reach = reachOf(
    program,
    drawn.map(({ slot }) => slot),
    new Set(choicesOf(model)),
  );
  return [...new Set(cuts.map(({ cell }) => cell))].map((cell) => {
    const own = cuts.filter((cut) => cut.cell === cell);
    const draws = drawn.flatMap((_, k) => (own.some(({ slot }) => reaches(reach, k, slot)) ? [k] : []));
    const columns = createStateColumns(
      model,
      draws.map((k) => drawn[k]!.slot),
      own.map(({ slot }) => slot),
    );
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
