// What is known of the spread of a sheet: for each value its ends, where they are, and how its builds are distributed; for
// each check whether it holds everywhere and in what share of builds. Plain data.

import type { StageDevices } from './devices.ts';
import type { NeededTracking } from './tracking-needed.ts';
import type { StandingDraw } from './where.ts';

/** One end of a value. */
export interface End {
  /** SI; null where it is not known. */
  readonly value: number | null;
  /** The draws that stand away from their nominal there. */
  readonly where: readonly StandingDraw[];
  /** Names of the draws whose missing limit keeps this end open. */
  readonly open: readonly string[];
}

/** How the builds are distributed at the nominal of service, SI. */
export interface Distribution {
  readonly n: number;
  readonly mean: number;
  readonly sd: number;
  readonly p01: number;
  readonly p05: number;
  readonly p50: number;
  readonly p95: number;
  readonly p99: number;
  /** Counts of equal bins between the two ends. */
  readonly bins: Float64Array;
}

export interface ValueSpread {
  readonly path: string;
  /** It is a region or a condition, not a number. */
  readonly isWord: boolean;
  /** Whether anything that spreads moves it. */
  readonly moves: boolean;
  readonly low: End;
  readonly high: End;
  /** Where in the declared set it could not be computed; null where it always was. */
  readonly unsolved: readonly StandingDraw[] | null;
  /** Of an inverse cell: the share of builds that have just one answer; null of another value, and before any build was counted. */
  readonly answered: Share | null;
  /** null where an end is open or a build could not be computed, and before any build was counted. */
  readonly distribution: Distribution | null;
}

/** A share of builds with its exact interval at 95 %. */
export interface Share {
  readonly share: number;
  readonly low: number;
  readonly high: number;
  readonly n: number;
}

/** Where the failing builds of a check stand on one draw: shares of its lower, middle and upper third. */
export interface Cause {
  readonly draw: number;
  readonly thirds: readonly [number, number, number];
}

export interface CheckSpread {
  readonly name: string;
  /** Whether it holds everywhere in the declared set; null where an open end or an unsolved build leaves that undecided. */
  readonly holds: boolean | null;
  /** The least reserve; null where the check has none. */
  readonly reserve: End | null;
  /** Where it fails; null where it holds. */
  readonly failsAt: readonly StandingDraw[] | null;
  readonly yield: Share | null;
  /** Draws with an open end on which it depends. */
  readonly open: readonly string[];
  /** The tracking of one part from which it would hold; null where none would, where it holds, and before that was looked for. */
  readonly trackingNeeded: NeededTracking | null;
  /** What the failing builds have in common, the most telling draw first. */
  readonly causes: readonly Cause[];
}

/** The specimens of a part that has further limits. */
export interface DeclaredPart {
  readonly cell: string;
  /** Share of the drawn specimens that belong to the set; null before any was drawn. */
  readonly share: number | null;
  /** Whether the nominal specimen belongs to it. */
  readonly holdsNominal: boolean;
}

export interface SpreadReport {
  /** Builds counted so far. */
  readonly builds: number;
  /** The limits of the sheet contradict each other: no specimen meets all of them. */
  readonly isEmpty: boolean;
  readonly parts: readonly DeclaredPart[];
  readonly values: readonly ValueSpread[];
  readonly checks: readonly CheckSpread[];
  /** All checks together. */
  readonly all: Share | null;
  readonly devices: readonly StageDevices[];
  /** Extremes that a build beat, and that were then searched for again. */
  readonly repaired: number;
}
