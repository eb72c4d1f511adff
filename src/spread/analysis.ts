// The spread of one model, step by step: extremes first, then portions of builds, each of which may beat an extreme.

import { binomialInterval, quantileOf } from '../numeric/index.ts';
import { reachOf, reaches } from '../program/index.ts';
import type { SpreadModel } from '../sheet/index.ts';
import { choicesOf } from './state-columns.ts';
import { createBuilds } from './builds.ts';
import { declaredSet } from './declared-set.ts';
import { searchExtremes } from './extremes.ts';
import type { Extreme, SearchEffort } from './extremes.ts';
import { stageDevices } from './devices.ts';
import { openEnds } from './open-ends.ts';
import type {
  Cause,
  CheckSpread,
  DeclaredPart,
  Distribution,
  End,
  Share,
  SpreadReport,
  ValueSpread,
} from './report.ts';
import { BINS, addTally, emptyTally } from './tally.ts';
import type { Tally } from './tally.ts';
import { trackingNeeded } from './tracking-needed.ts';
import type { NeededTracking } from './tracking-needed.ts';
import { whereIs } from './where.ts';

interface Analysis {
  /** The present ranges, as those who count builds need them. */
  ranges(): { low: Float64Array; high: Float64Array };
  /** Takes a tally of the builds that follow those taken so far. */
  take(tally: Tally): void;
  /** Works out for each failing check from which tracking on it would hold. */
  lookForTracking(): void;
  report(): SpreadReport;
}

/** Starts with the extremes. `seed` as in the builds that will be taken. */
export function createAnalysis(model: SpreadModel, seed: number, effort: SearchEffort): Analysis {
  const { values, checks, drawn } = model;
  // Values, then the verdicts of checks, then their reserves.
  const reserves = checks.flatMap(({ reserve }) => (reserve === null ? [] : [reserve]));
  const wanted = [...values.map(({ slot }) => slot), ...checks.map(({ slot }) => slot), ...reserves];
  const verdictAt = (c: number): number => values.length + c;
  const reserveAt = (c: number): number | null => {
    if (checks[c]!.reserve === null) return null;
    const before = checks.slice(0, c).filter(({ reserve }) => reserve !== null).length;
    return values.length + checks.length + before;
  };
  const set = declaredSet(model);
  const search = searchExtremes(model, wanted, { effort, set });
  const reach = reachOf(
    model.program,
    drawn.map(({ slot }) => slot),
    new Set(choicesOf(model)),
  );
  // An answer does not depend on what its own input happens to be.
  const turnedBy = new Map(model.asked.map(({ answer, input }) => [answer, input]));
  const counting =
    (w: number) =>
    (k: number): boolean =>
      reaches(reach, k, wanted[w]!) && drawn[k]!.slot !== turnedBy.get(wanted[w]!);
  let open = openEnds(model, wanted, search);
  const holdsNominal = set.membership([new Float64Array(drawn.length)])[0] === 1;
  const parts = [...new Set(model.cuts.map(({ cell }) => cell))];
  const ranges = (): { low: Float64Array; high: Float64Array } => ({
    low: Float64Array.from(values, (_, k) => search.of(k).low.value),
    high: Float64Array.from(values, (_, k) => search.of(k).high.value),
  });
  const first = ranges();
  const builds = createBuilds(model, seed, first);
  const sum = emptyTally(builds.shape);
  const devices = stageDevices(model, effort, set);
  const needed = new Map<string, NeededTracking | null>();
  let repaired = 0;

  function take(tally: Tally): void {
    addTally(sum, tally);
    const beaten = tally.beatenBy.reduce<number[]>((found, build, e) => (build < 0 ? found : [...found, e]), []);
    if (beaten.length === 0) return;
    const positions = new Map(
      beaten.map((e) => [
        `${tally.beatenBy[e]} ${tally.beatenIn[e]}`,
        [tally.beatenBy[e]!, tally.beatenIn[e]!] as const,
      ]),
    );
    repaired += search.witness([...positions.values()].map(([build, state]) => builds.position(build, state)));
    open = openEnds(model, wanted, search);
  }

  function end(w: number, which: 'low' | 'high'): End {
    const { [which]: extreme, unsolved } = search.of(w);
    const isKnown =
      (unsolved === null || (values[w]?.isAnswer ?? false)) && open[w]![which].length === 0 && !search.isEmpty;
    return { value: isKnown ? extreme.value : null, where: place(w, extreme), open: open[w]![which] };
  }

  function place(w: number, { position }: Extreme): ReturnType<typeof whereIs> {
    return whereIs(model, position, counting(w));
  }

  function valueSpread(w: number): ValueSpread {
    const { unsolved, low, high } = search.of(w);
    const { path, type, isAnswer } = values[w]!;
    const isWord = typeof type === 'string';
    const isKnown = (unsolved === null || isAnswer) && open[w]!.any.length === 0;
    return {
      path,
      isWord,
      moves: drawn.some((_, k) => counting(w)(k)),
      low: end(w, 'low'),
      high: end(w, 'high'),
      unsolved: unsolved && whereIs(model, unsolved, counting(w)),
      answered: isAnswer && sum.builds > 0 ? share(sum.moments.count[w]!, sum.builds) : null,
      distribution:
        isKnown && sum.builds > 0 && !isWord
          ? distribution(w, Math.min(low.value, first.low[w]!), Math.max(high.value, first.high[w]!))
          : null,
    };
  }

  function distribution(w: number, low: number, high: number): Distribution | null {
    const n = sum.moments.count[w]!;
    if (n === 0 || (n < sum.builds && !values[w]!.isAnswer) || !(low > -Infinity && high < Infinity)) return null;
    const bins = sum.bins.slice(w * BINS, (w + 1) * BINS);
    const histogram = { counts: bins, low: first.low[w]!, high: first.high[w]!, least: low, largest: high };
    // Where the ends were one number when counting began, nothing was put into bins.
    const isCounted = first.low[w]! < first.high[w]!;
    const at = (p: number): number => (isCounted ? quantileOf(histogram, p) : sum.moments.mean[w]!);
    return {
      n,
      mean: sum.moments.mean[w]!,
      sd: n > 1 ? Math.sqrt(sum.moments.m2[w]! / (n - 1)) : 0,
      p01: at(0.01),
      p05: at(0.05),
      p50: at(0.5),
      p95: at(0.95),
      p99: at(0.99),
      bins,
    };
  }

  function checkSpread(c: number): CheckSpread {
    const verdict = search.of(verdictAt(c));
    const r = reserveAt(c);
    const fails = verdict.low.value === 0;
    const ends = open[verdictAt(c)]!;
    const isDecided = !search.isEmpty && (fails || (verdict.unsolved === null && ends.low.length === 0));
    const failing = r === null || !fails ? verdict.low : search.of(r).low;
    return {
      name: checks[c]!.name,
      holds: isDecided ? !fails : null,
      reserve: r === null ? null : end(r, 'low'),
      failsAt: fails ? place(verdictAt(c), failing) : null,
      yield: ends.any.length > 0 || sum.builds === 0 ? null : share(sum.passes[c]!, sum.builds),
      open: ends.any,
      trackingNeeded: fails ? (needed.get(checks[c]!.name) ?? null) : null,
      causes: causes(c),
    };
  }

  function causes(c: number): Cause[] {
    const failing = sum.builds - sum.passes[c]!;
    if (failing === 0) return [];
    const found = drawn.flatMap((_, draw): Cause[] => {
      if (drawn[draw]!.spread.service || !counting(verdictAt(c))(draw)) return [];
      const at = (c * drawn.length + draw) * 3;
      const [a, b, d] = [0, 1, 2].map((third) => sum.thirds[at + third]! / failing);
      return [{ draw, thirds: [a!, b!, d!] }];
    });
    const tells = ({ thirds }: Cause): number => Math.max(...thirds);
    // Below this a third holds hardly more than its share would by chance.
    const telling = 1 / 3 + Math.max(0.1, 2 * Math.sqrt(2 / 9 / failing));
    return found.filter((cause) => tells(cause) > telling).toSorted((a, b) => tells(b) - tells(a));
  }

  return {
    ranges: () => first,
    take,
    lookForTracking() {
      checks.forEach(({ name }, c) => {
        if (search.of(verdictAt(c)).low.value === 0) needed.set(name, trackingNeeded(model, name));
      });
    },
    report: () => ({
      builds: sum.builds,
      isEmpty: search.isEmpty,
      parts: parts.map((cell, n): DeclaredPart => ({
        cell,
        share: sum.attempts[n]! > 0 ? (sum.builds + sum.givenUp[n]!) / sum.attempts[n]! : null,
        holdsNominal,
      })),
      values: values.map((_, w) => valueSpread(w)),
      checks: checks.map((_, c) => checkSpread(c)),
      all:
        checks.length === 0 || sum.builds === 0 || checks.some((_, c) => open[verdictAt(c)]!.any.length > 0)
          ? null
          : share(sum.allPass, sum.builds),
      devices,
      repaired,
    }),
  };
}

function share(passes: number, n: number): Share {
  return { share: passes / n, ...binomialInterval(passes, n), n };
}
