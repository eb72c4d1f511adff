// One analysis of a model as a sequence of answers, each better than the one before. Pure: who asks decides when to go on.

import type { SpreadModel } from '../sheet/index.ts';
import { createAnalysis } from './analysis.ts';
import { bandsOver } from './band.ts';
import type { Band } from './band.ts';
import { createBuilds } from './builds.ts';
import type { SearchEffort } from './extremes.ts';
import { mendWith, reservesWith } from './mending.ts';
import type { CheckStanding, Mending } from './mending.ts';
import { portionsOf } from './portion.ts';
import type { SpreadReport } from './report.ts';

/** What is asked of the worker: how far values move, what would mend the checks, or the bands of a plot. */
export type Question = SpreadQuestion | MendQuestion | BandQuestion;
export type Answer = SpreadAnswer | MendAnswer | BandAnswer;

export interface SpreadQuestion {
  readonly kind: 'spread';
  /** Grows from question to question. */
  readonly id: number;
  readonly model: SpreadModel;
  readonly samples: number;
  readonly seed: number;
  readonly effort: SearchEffort;
}

export interface SpreadAnswer {
  readonly kind: 'spread';
  readonly id: number;
  readonly report: SpreadReport;
  /** Nothing more will come. */
  readonly isLast: boolean;
}

export interface MendQuestion {
  readonly kind: 'mend';
  readonly id: number;
  readonly model: SpreadModel;
  /** The inputs to turn, each with the values one can buy, the most welcome first. */
  readonly inputs: readonly { readonly name: string; readonly values: readonly number[] }[];
}

export interface MendAnswer {
  readonly kind: 'mend';
  readonly id: number;
  readonly mending: Mending;
  /** The first value to buy inside the window, with every check as it then stands at its worst extreme. */
  readonly choice: { readonly value: number; readonly checks: readonly CheckStanding[] } | null;
  readonly isLast: boolean;
}

export interface BandQuestion {
  readonly kind: 'band';
  readonly id: number;
  readonly model: SpreadModel;
  /** The slot of the input, and the values that it takes, SI. */
  readonly input: number;
  readonly places: Float64Array;
  /** Slots of values. */
  readonly wanted: readonly number[];
}

export interface BandAnswer {
  readonly kind: 'band';
  readonly id: number;
  /** One for each wanted value. */
  readonly bands: readonly Band[];
  readonly isLast: true;
}

/** Answers at once. */
export function* createBandJob({ id, model, input, places, wanted }: BandQuestion): Generator<BandAnswer> {
  yield { kind: 'band', id, bands: bandsOver(model, input, places, wanted), isLast: true };
}

/** Answers for one input after the other. */
export function* createMendJob({ id, model, inputs }: MendQuestion): Generator<MendAnswer> {
  for (const [n, { name, values }] of inputs.entries()) {
    const mending = mendWith(model, name);
    const { window } = mending;
    const value = window && values.find((each) => each >= window.low && each <= window.high);
    const choice = value ? { value, checks: reservesWith(model, name, value) } : null;
    yield { kind: 'mend', id, mending, choice, isLast: n === inputs.length - 1 };
  }
}

/** Portions between two answers. */
const PORTIONS_PER_ANSWER = 4;

/** Answers a question step by step. */
export function* createSpreadJob({ id, model, samples, seed, effort }: SpreadQuestion): Generator<SpreadAnswer> {
  const analysis = createAnalysis(model, seed, effort);
  const builds = createBuilds(model, seed, analysis.ranges());
  for (const [n, { first, count }] of portionsOf(samples).entries()) {
    analysis.take(builds.count(first, count));
    const isLast = first + count >= samples;
    if (isLast && effort === 'full') analysis.lookForTracking();
    if (isLast || n === 0 || (n + 1) % PORTIONS_PER_ANSWER === 0)
      yield { kind: 'spread', id, report: analysis.report(), isLast };
  }
}
