// What several specimens spread over.

import type { LawFit } from './law-fit.ts';
import { rankCorrelation, trackingFor } from './rank.ts';

/** The least, the middle and the largest of a constant, in its unit. */
interface Ends {
  readonly min: number;
  readonly median: number;
  readonly max: number;
}

interface Summary {
  /** V, as a voltmeter shows it. */
  readonly V_TO: Ends;
  /** beta V_TO² in A: the current at V_GS = 0, where the channel is open there. */
  readonly I_DSS: Ends;
  readonly beta: Ends;
  readonly lambda: Ends;
  /** -1 to 1: of |V_TO| and I_DSS where the channels are open at V_GS = 0, else of V_TO and beta; 0 of fewer than three specimens. */
  readonly tracking: number;
}

/** Fewer specimens say nothing of what goes together. */
const LEAST = 3;

/** The summary of at least one specimen, all of one channel. */
export function summarise(fits: readonly LawFit[]): Summary {
  const size = (fit: LawFit): number => Math.abs(fit.V_TO);
  const current = ({ beta, V_TO }: LawFit): number => beta * V_TO * V_TO;
  const isOpen = fits.every(({ channel, V_TO }) => channel * V_TO < 0);
  const correlation = rankCorrelation(fits.map(size), fits.map(isOpen ? current : ({ beta }) => beta));
  return {
    V_TO: endsOf(fits.map(({ V_TO }) => V_TO)),
    I_DSS: endsOf(fits.map(current)),
    beta: endsOf(fits.map(({ beta }) => beta)),
    lambda: endsOf(fits.map(({ lambda }) => lambda)),
    tracking: fits.length < LEAST ? 0 : trackingFor(correlation),
  };
}

function endsOf(values: readonly number[]): Ends {
  const sorted = values.toSorted((a, b) => a - b);
  const half = sorted.length >> 1;
  const median = sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
  return { min: sorted[0]!, median, max: sorted.at(-1)! };
}
