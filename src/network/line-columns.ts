// The line solve down columns: the region of every sample first, then one region after the other, so that the branches
// of each loop nearly always go the same way.

import {
  CURRENT,
  DRAIN_SOURCE,
  MARGIN,
  OVERDRIVE,
  REGION,
  isOhmic,
  line,
  solveOhmicLine,
  solveSaturated,
  givenLine,
} from './line-solve.ts';

/** Samples that are settled together: what one of them needs then stays in the nearest cache. */
export const BLOCK = 256;

const ohmic = new Int32Array(BLOCK);
const saturated = new Int32Array(BLOCK);

/**
 * Solves the first `count` samples as `solveLine` does: inputs beta, lambda, A, r, b, R and results I, V_ov, V_DS, margin,
 * region, by the places of their columns in `all`.
 */
export function solveLines(all: Float64Array, places: Int32Array, at: number, count: number): void {
  for (let from = 0; from < count; from += BLOCK) solveBlock(all, places, at, from, Math.min(count, from + BLOCK));
}

function solveBlock(all: Float64Array, places: Int32Array, at: number, from: number, to: number): void {
  const beta = places[at];
  const lambda = places[at + 1];
  const drive = places[at + 2];
  const r = places[at + 3];
  const b = places[at + 4];
  const R = places[at + 5];
  let ohmicCount = 0;
  let saturatedCount = 0;
  for (let i = from; i < to; i++) {
    const A = all[drive + i];
    if (!(A > 0)) {
      all[places[at + 6] + i] = 0;
      all[places[at + 7] + i] = A;
      all[places[at + 8] + i] = all[b + i];
      all[places[at + 9] + i] = A;
      all[places[at + 10] + i] = 0;
    } else if (isOhmic(all[beta + i], all[lambda + i], A, all[r + i], all[b + i], all[R + i])) ohmic[ohmicCount++] = i;
    else saturated[saturatedCount++] = i;
  }
  solveListed(all, places, at, saturated, saturatedCount, solveSaturated);
  solveListed(all, places, at, ohmic, ohmicCount, solveOhmicLine);
}

function solveListed(
  all: Float64Array,
  places: Int32Array,
  at: number,
  list: Int32Array,
  length: number,
  solve: () => number,
): void {
  const beta = places[at];
  const lambda = places[at + 1];
  const drive = places[at + 2];
  const r = places[at + 3];
  const b = places[at + 4];
  const R = places[at + 5];
  const currents = places[at + 6];
  const overdrives = places[at + 7];
  const drains = places[at + 8];
  const margins = places[at + 9];
  const regions = places[at + 10];
  for (let n = 0; n < length; n++) {
    const i = list[n];
    givenLine[0] = all[beta + i];
    givenLine[1] = all[lambda + i];
    givenLine[2] = all[drive + i];
    givenLine[3] = all[r + i];
    givenLine[4] = all[b + i];
    givenLine[5] = all[R + i];
    solve();
    all[currents + i] = line[CURRENT];
    all[overdrives + i] = line[OVERDRIVE];
    all[drains + i] = line[DRAIN_SOURCE];
    all[margins + i] = line[MARGIN];
    all[regions + i] = line[REGION];
  }
}
