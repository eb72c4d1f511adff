// The spread of a whole sheet at once, for those who can wait for it.

import type { Analyses, SpreadModel } from '../sheet/index.ts';
import { createAnalysis } from './analysis.ts';
import { createBuilds } from './builds.ts';
import { searchExtremes } from './extremes.ts';
import { openEnds } from './open-ends.ts';
import { portionsOf } from './portion.ts';
import type { CheckSpread, SpreadReport, ValueSpread } from './report.ts';

/** What is known of the spread of a sheet, with the model it speaks of. */
export interface SheetSpread {
  readonly model: SpreadModel;
  readonly report: SpreadReport;
  value(path: string): ValueSpread | null;
  check(name: string): CheckSpread | null;
}

/** A report with its model; values and checks by name. */
export function readSpread(model: SpreadModel, report: SpreadReport): SheetSpread {
  const values = new Map(report.values.map((value) => [value.path, value]));
  const checks = new Map(report.checks.map((check) => [check.name, check]));
  return {
    model,
    report,
    value: (path) => values.get(path) ?? null,
    check: (name) => checks.get(name) ?? null,
  };
}

/** Searches the extremes and counts so many builds; null for a sheet without spread. */
export function analyse(model: SpreadModel, { samples, seed }: { samples: number; seed: number }): SheetSpread | null {
  if (model.drawn.length === 0) return null;
  const analysis = createAnalysis(model, seed, 'full');
  const builds = createBuilds(model, seed, analysis.ranges());
  for (const { first, count } of portionsOf(samples)) analysis.take(builds.count(first, count));
  analysis.lookForTracking();
  return readSpread(model, analysis.report());
}

/** What low(x) and high(x) of a sheet are computed by. */
export const ANALYSES: Analyses = {
  ends(model, wanted) {
    const search = searchExtremes(model, wanted);
    const open = openEnds(model, wanted, search);
    return wanted.map((_, k) => {
      const { low, high, unsolved } = search.of(k);
      const isKnown = unsolved === null && !search.isEmpty;
      return {
        low: isKnown && open[k]!.low.length === 0 ? low.value : NaN,
        high: isKnown && open[k]!.high.length === 0 ? high.value : NaN,
      };
    });
  },
};
