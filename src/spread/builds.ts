// Builds by the thousand: drawn, computed and counted in columns, portion by portion. A portion is a pure function of the
// model, the seed and its first build, so it may be counted by anyone, in any order.

import { addColumn } from '../numeric/index.ts';
import type { SpreadModel } from '../sheet/index.ts';
import { createDraws, positionOf } from './draws.ts';
import { quantileAt } from './law.ts';
import { fillValues, valueAt } from './position.ts';
import type { Position } from './position.ts';
import { serviceDraws, serviceStates } from './service.ts';
import { createStateColumns } from './state-columns.ts';
import { BINS, emptyTally } from './tally.ts';
import type { Tally, TallyShape } from './tally.ts';

/** The least and largest of each value as far as they are known, between which its histogram lies. */
interface Ranges {
  readonly low: Float64Array;
  readonly high: Float64Array;
}

interface Builds {
  readonly shape: TallyShape;
  /** Counts builds first .. first + count. */
  count(first: number, count: number): Tally;
  /** Where a build stands in a state of service. */
  position(build: number, state: number): Position;
}

/** Prepares the builds of a model; values and checks are counted in the order of the model. */
export function createBuilds(model: SpreadModel, seed: number, ranges: Ranges): Builds {
  const { drawn, values, checks, cuts } = model;
  const service = serviceDraws(model);
  const states = serviceStates(model);
  const columns = createStateColumns(
    model,
    drawn.map(({ slot }) => slot),
    [...values, ...checks].map(({ slot }) => slot),
  );
  const { width } = columns;
  const draws = createDraws(model, seed, width);
  const holds = checks.map(() => new Uint8Array(width));
  const shape: TallyShape = {
    values: values.length,
    checks: checks.length,
    draws: drawn.length,
    parts: new Set(cuts.map(({ cell }) => cell)).size,
  };
  const scale = Float64Array.from(values, (_, k) => BINS / (ranges.high[k]! - ranges.low[k]!));

  function portion(tally: Tally, first: number, count: number): void {
    draws.draw(first, count).forEach(({ attempts, givenUp }, part) => {
      tally.attempts[part]! += attempts;
      tally.givenUp[part]! += givenUp;
    });
    for (let k = 0; k < drawn.length; k++) fillValues(drawn[k]!, draws.place(k), count, columns.input(k));
    for (const each of holds) each.fill(1, 0, count);
    states.forEach((state, s) => {
      state.forEach((t, n) => columns.input(service[n]!).fill(valueAt(drawn[service[n]!]!, t), 0, count));
      columns.run(count);
      if (s === 0) countNominal(tally, count);
      for (let k = 0; k < values.length; k++) beat(tally, k, s, first, count);
      for (let c = 0; c < checks.length; c++) {
        const [verdict, each] = [columns.output(values.length + c), holds[c]!];
        for (let i = 0; i < count; i++) if (verdict[i] !== 1) each[i] = 0;
      }
    });
    countChecks(tally, count);
  }

  function countNominal(tally: Tally, count: number): void {
    for (let k = 0; k < values.length; k++) {
      const column = columns.output(k);
      addColumn(tally.moments, k, column, count, draws.void);
      const [low, factor, at] = [ranges.low[k]!, scale[k]!, k * BINS];
      if (!(factor < Infinity)) continue;
      for (let i = 0; i < count; i++) {
        if (draws.void[i] === 1 || !(Math.abs(column[i]!) < Infinity)) continue;
        tally.bins[at + Math.max(0, Math.min(BINS - 1, Math.floor((column[i]! - low) * factor)))]! += 1;
      }
    }
  }

  /** Keeps the build that lies farthest beyond an extreme. */
  function beat(tally: Tally, k: number, state: number, first: number, count: number): void {
    const column = columns.output(k);
    const { beaten, beatenBy, beatenIn } = tally;
    for (const [e, sense] of [
      [2 * k, -1],
      [2 * k + 1, 1],
    ] as const) {
      let best = sense * (beatenBy[e]! < 0 ? (sense < 0 ? ranges.low : ranges.high)[k]! : beaten[e]!);
      for (let i = 0; i < count; i++) {
        const value = sense * column[i]!;
        if (!(value > best) || draws.void[i] === 1) continue;
        best = value;
        beaten[e] = column[i]!;
        beatenBy[e] = first + i;
        beatenIn[e] = state;
      }
    }
  }

  function countChecks(tally: Tally, count: number): void {
    for (let i = 0; i < count; i++) {
      if (draws.void[i] === 1) continue;
      tally.builds++;
      let all = 1;
      for (let c = 0; c < checks.length; c++) {
        if (holds[c]![i] === 1) tally.passes[c]! += 1;
        else {
          all = 0;
          countThirds(tally, c, i);
        }
      }
      tally.allPass += all;
    }
  }

  function countThirds(tally: Tally, c: number, i: number): void {
    for (let k = 0; k < drawn.length; k++) {
      const u = quantileAt(drawn[k]!, draws.place(k)[i]!);
      tally.thirds[(c * drawn.length + k) * 3 + Math.min(2, Math.floor(3 * u))]! += 1;
    }
  }

  return {
    shape,
    count(first, count) {
      const tally = emptyTally(shape);
      for (let from = first; from < first + count; from += width)
        portion(tally, from, Math.min(width, first + count - from));
      return tally;
    },
    position(build, state) {
      const position = positionOf(model, draws, build);
      states[state]!.forEach((t, n) => (position[service[n]!] = t));
      return position;
    },
  };
}
