// What moves a value most: each draw's effect from its low to its high end with all others at their nominal, and its first-order
// share in the variance of the builds.

import { reachOf, reaches } from '../program/index.ts';
import type { SpreadModel } from '../sheet/index.ts';
import { createBatch } from './batch.ts';
import { createDraws } from './draws.ts';
import { fillValues } from './position.ts';
import { choicesOf, createStateColumns } from './state-columns.ts';

export interface Mover {
  /** Index of the draw in the model. */
  readonly draw: number;
  /** The value with the draw at its low and at its high end, SI; null where that end is open. */
  readonly atLow: number | null;
  readonly atHigh: number | null;
  /** First-order share in the variance, 0 to 1; null for what changes in use, and where the variance is not known. */
  readonly share: number | null;
}

/** Builds from which shares are taken, and groups of equal count that each draw is cut into. */
const BUILDS = 2048;
const GROUPS = 16;

/**
 * The draws that move the value in a slot, the strongest first. Shares are variances of group means, less what chance
 * gives them. Source: I. M. Sobol', "Sensitivity estimates for nonlinear mathematical models" (1993), first order.
 */
export function moversOf(model: SpreadModel, slot: number, seed: number): Mover[] {
  const { drawn, program, slots } = model;
  const frozen = choicesOf(model);
  const reach = reachOf(
    program,
    drawn.map((each) => each.slot),
    new Set(frozen),
  );
  const moving = drawn.flatMap((_, k) => (reaches(reach, k, slot) ? [k] : []));
  if (moving.length === 0) return [];
  const nominal = new Float64Array(drawn.length);
  const ends = new Float64Array(2 * moving.length);
  const batch = createBatch(model, [slot]);
  batch.run(
    moving.flatMap((k) => [nominal.with(k, -1), nominal.with(k, 1)]),
    (from, count) => ends.set(batch.column(0).subarray(0, count), from),
  );
  const shares = variances(model, slot, seed, moving);
  const movers = moving.map((draw, n): Mover => {
    const { low, high, service } = drawn[draw]!.spread;
    const share = shares === null || service ? null : shares[n]!;
    return { draw, atLow: low === null ? null : ends[2 * n]!, atHigh: high === null ? null : ends[2 * n + 1]!, share };
  });
  const effect = ({ atLow, atHigh }: Mover): number => Math.abs((atHigh ?? slots[slot]!) - (atLow ?? slots[slot]!));
  return movers.filter((mover) => effect(mover) > 0).toSorted((a, b) => effect(b) - effect(a));
}

/** The share of each draw; null where some build has no value or nothing varies. */
function variances(model: SpreadModel, slot: number, seed: number, moving: readonly number[]): Float64Array | null {
  const { drawn } = model;
  const columns = createStateColumns(
    model,
    drawn.map((each) => each.slot),
    [slot],
  );
  const draws = createDraws(model, seed, columns.width);
  const values = new Float64Array(BUILDS);
  const places = moving.map(() => new Float64Array(BUILDS));
  for (let first = 0; first < BUILDS; first += columns.width) {
    const count = Math.min(columns.width, BUILDS - first);
    draws.draw(first, count);
    drawn.forEach((each, k) => fillValues(each, draws.place(k), count, columns.input(k)));
    columns.run(count);
    values.set(columns.output(0).subarray(0, count), first);
    moving.forEach((k, n) => places[n]!.set(draws.place(k).subarray(0, count), first));
  }
  const mean = values.reduce((sum, value) => sum + value, 0) / BUILDS;
  const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / BUILDS;
  if (!(variance > 0 && variance < Infinity)) return null;
  return Float64Array.from(places, (place) => {
    const order = Array.from(place.keys()).toSorted((i, j) => place[i]! - place[j]!);
    const size = BUILDS / GROUPS;
    let between = 0;
    let within = 0;
    for (let g = 0; g < GROUPS; g++) {
      const group = order.slice(g * size, (g + 1) * size);
      const own = group.reduce((sum, i) => sum + values[i]!, 0) / size;
      between += (own - mean) ** 2 / GROUPS;
      within += group.reduce((sum, i) => sum + (values[i]! - own) ** 2, 0) / BUILDS;
    }
    return Math.max(0, Math.min(1, (between - within / size) / variance));
  });
}
