// One analysis of a model as a sequence of answers, each better than the one before. Pure: who asks decides when to go on.

import type { SpreadModel } from '../sheet/index.ts';
import { createAnalysis } from './analysis.ts';
import { PORTION } from './portion.ts';
import { createBuilds } from './builds.ts';
import type { SearchEffort } from './extremes.ts';
import type { SpreadReport } from './report.ts';

/** What is asked of the worker. */
export interface SpreadQuestion {
  /** Grows from question to question. */
  readonly id: number;
  readonly model: SpreadModel;
  readonly samples: number;
  readonly seed: number;
  readonly effort: SearchEffort;
}

export interface SpreadAnswer {
  readonly id: number;
  readonly report: SpreadReport;
  /** Nothing more will come. */
  readonly isLast: boolean;
}

/** Builds after which the first counts are shown. */
const FIRST_PORTION = 512;
/** Portions between two answers. */
const PORTIONS_PER_ANSWER = 4;

/** Answers a question step by step. */
export function* createSpreadJob({ id, model, samples, seed, effort }: SpreadQuestion): Generator<SpreadAnswer> {
  const analysis = createAnalysis(model, seed, effort);
  const builds = createBuilds(model, seed, analysis.ranges());
  let portions = 0;
  for (let first = 0; first < samples;) {
    const count = Math.min(first === 0 ? FIRST_PORTION : PORTION - (first % PORTION), samples - first);
    analysis.take(builds.count(first, count));
    first += count;
    portions++;
    const isLast = first >= samples;
    if (isLast || portions === 1 || portions % PORTIONS_PER_ANSWER === 0)
      yield { id, report: analysis.report(), isLast };
  }
}
