// The spread of a whole sheet at once, for those who can wait for it.

import type { Analyses, SpreadModel } from '../sheet/index.ts';
import { reachOf, reaches } from '../program/index.ts';
import { createAnalysis } from './analysis.ts';
import { createTurnedBatch } from './batch.ts';
import { createBuilds } from './builds.ts';
import { declaredSet } from './declared-set.ts';
import { searchExtremes } from './extremes.ts';
import type { ExtremeSearch } from './extremes.ts';
import { openEnds } from './open-ends.ts';
import { portionsOf } from './portion.ts';
import { choicesOf } from './state-columns.ts';
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
  ends: (model, wanted, ends) => endsOf(model, wanted, searchExtremes(model, wanted, { ends })),
  endsOver(model, turned, wanted, ends) {
    if (!standsAlone(turned, model)) return (at) => endsOf(at, wanted, searchExtremes(at, wanted, { ends }));
    const set = declaredSet(model);
    const batch = createTurnedBatch(model, turned, wanted);
    return (at) => {
      batch.take(at);
      return endsOf(at, wanted, searchExtremes(at, wanted, { set, batch, ends }));
    };
  },
};

function endsOf(model: SpreadModel, wanted: readonly number[], search: ExtremeSearch): ReturnType<Analyses['ends']> {
  const open = openEnds(model, wanted, search);
  return wanted.map((_, k) => {
    const { low, high, unsolved } = search.of(k);
    const isKnown = unsolved === null && !search.isEmpty;
    return {
      low: isKnown && open[k]!.low.length === 0 ? low.value : NaN,
      high: isKnown && open[k]!.high.length === 0 ? high.value : NaN,
    };
  });
}

/** Whether neither the declared set nor anything chosen depends on an input. */
function standsAlone(input: number, model: SpreadModel): boolean {
  const { program, drawn, cuts, pairs } = model;
  const reach = reachOf(program, [input], new Set());
  const isTied = pairs.some(({ threshold, gain }) => [threshold, gain].some((draw) => drawn[draw]!.slot === input));
  const inTheWay = [...choicesOf(model), ...cuts.map(({ slot }) => slot)];
  return !isTied && !inTheWay.some((slot) => reaches(reach, 0, slot));
}
