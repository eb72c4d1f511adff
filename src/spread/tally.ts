// What a portion of builds comes to: plain data, of one shape whoever counted it, that adds up in the order of the builds.

import { addMoments, createMoments } from '../numeric/index.ts';
import type { Moments } from '../numeric/index.ts';

/** Bins of a histogram. */
export const BINS = 256;

export interface Tally {
  /** Builds counted; those whose specimen was given up are not. */
  builds: number;
  /** By cut part: draws of a specimen, and builds given up. */
  readonly attempts: Float64Array;
  readonly givenUp: Float64Array;
  /** Of every value, at the nominal of service. */
  readonly moments: Moments;
  /** BINS counts for each value. */
  readonly bins: Float64Array;
  /** Builds in which a check holds at every state of service, by check, and all of them together. */
  readonly passes: Float64Array;
  allPass: number;
  /** Where the draws of failing builds stand: for each check and draw how many in the lower, middle and upper third. */
  readonly thirds: Float64Array;
  /** For each end of a value the build and state of service that lies farthest beyond the extreme known before; -1 where none does. */
  readonly beatenBy: Float64Array;
  readonly beatenIn: Int32Array;
  readonly beaten: Float64Array;
}

/** Sizes of a tally. */
export interface TallyShape {
  readonly values: number;
  readonly checks: number;
  readonly draws: number;
  readonly parts: number;
}

/** A tally of nothing. */
export function emptyTally({ values, checks, draws, parts }: TallyShape): Tally {
  return {
    builds: 0,
    attempts: new Float64Array(parts),
    givenUp: new Float64Array(parts),
    moments: createMoments(values),
    bins: new Float64Array(values * BINS),
    passes: new Float64Array(checks),
    allPass: 0,
    thirds: new Float64Array(checks * draws * 3),
    beatenBy: new Float64Array(2 * values).fill(-1),
    beatenIn: new Int32Array(2 * values),
    beaten: new Float64Array(2 * values),
  };
}

/** Adds the tally of the builds that follow. */
export function addTally(sum: Tally, next: Tally): void {
  sum.builds += next.builds;
  sum.allPass += next.allPass;
  addAll(sum.attempts, next.attempts);
  addAll(sum.givenUp, next.givenUp);
  addMoments(sum.moments, next.moments);
  addAll(sum.bins, next.bins);
  addAll(sum.passes, next.passes);
  addAll(sum.thirds, next.thirds);
  for (let e = 0; e < sum.beaten.length; e++) {
    if (next.beatenBy[e]! < 0) continue;
    const isFarther = e % 2 === 0 ? next.beaten[e]! < sum.beaten[e]! : next.beaten[e]! > sum.beaten[e]!;
    if (sum.beatenBy[e]! >= 0 && !isFarther) continue;
    sum.beatenBy[e] = next.beatenBy[e]!;
    sum.beatenIn[e] = next.beatenIn[e]!;
    sum.beaten[e] = next.beaten[e]!;
  }
}

function addAll(sum: Float64Array, next: Float64Array): void {
  for (let i = 0; i < sum.length; i++) sum[i]! += next[i]!;
}
