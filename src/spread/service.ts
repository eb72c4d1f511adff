// What changes in use: each build is looked at at the nominal of its surroundings and at every end of them.

import type { SpreadModel } from '../sheet/index.ts';

/** Draws of service that are combined to all their ends; of further ones each end is looked at alone. */
const COMBINED = 6;

/** One state of service: where its draws stand, in the order of `serviceDraws`. */
type ServiceState = readonly number[];

/** The draws that change in use, by their index. */
export function serviceDraws({ drawn }: SpreadModel): number[] {
  return drawn.flatMap(({ spread }, k) => (spread.service ? [k] : []));
}

/** The nominal state first, then every combination of ends; an open end is none. */
export function serviceStates(model: SpreadModel): ServiceState[] {
  const draws = serviceDraws(model);
  const ends = draws.map((k) => {
    const { low, high } = model.drawn[k]!.spread;
    return [...(low === null ? [] : [-1]), ...(high === null ? [] : [1])];
  });
  const nominal = draws.map(() => 0);
  let states: number[][] = [[]];
  for (const each of ends.slice(0, COMBINED)) {
    states = states.flatMap((state) => (each.length === 0 ? [[...state, 0]] : each.map((t) => [...state, t])));
  }
  const combined = states.map((state) => [...state, ...nominal.slice(state.length)]);
  const further = ends.slice(COMBINED).flatMap((each, n) => each.map((t) => nominal.with(COMBINED + n, t)));
  return draws.length === 0 ? [nominal] : [nominal, ...combined, ...further];
}
