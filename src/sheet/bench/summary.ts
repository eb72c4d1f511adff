// What a bench comes to as a whole: one specimen's constants with their standard errors, or what several spread over.

import { binomialInterval } from '../../numeric/index.ts';
import { summarise } from '../../measured/index.ts';
import type { BenchReading } from './bench-reading.ts';
import type { FittedSpecimen } from './fits.ts';
import type { Measured } from './measured.ts';

/** The share that is kept, and that of a whole batch from which these were taken at random. */
export function keptShare({ kept, specimens }: Measured): NonNullable<BenchReading['kept']> {
  return { count: kept, of: specimens, ...binomialInterval(kept, specimens) };
}

/** The numbers that parts take and formulas read, of the specimens that are kept; so many more are `unfitted`. */
export function measuredOf(channel: 1 | -1, specimens: readonly FittedSpecimen[], unfitted: number): Measured {
  const kept = specimens.filter(({ reading }) => reading.isKept);
  const counts = { specimens: specimens.length + unfitted, kept: kept.length };
  const [{ fit, reading }] = kept as [FittedSpecimen];
  if (counts.specimens === 1) {
    const one = (nominal: number, error: number | null) => ({ nominal, low: null, high: null, error });
    return {
      channel,
      depletion: reading.I_DSS > 0,
      ...counts,
      beta: one(fit.beta, reading.errors.beta),
      V_TO: one(fit.V_TO, reading.errors.V_TO),
      I_DSS: one(reading.I_DSS, reading.errors.I_DSS),
      lambda: one(fit.lambda, reading.errors.lambda),
      tracking: null,
    };
  }
  const summary = summarise(kept.map((each) => each.fit));
  const several = ({ min, median, max }: { readonly min: number; readonly median: number; readonly max: number }) => ({
    nominal: median,
    low: min,
    high: max,
    error: null,
  });
  const depletion = kept.every((each) => each.reading.I_DSS > 0);
  return {
    channel,
    depletion,
    ...counts,
    beta: several(summary.beta),
    V_TO: several(summary.V_TO),
    I_DSS: several(depletion ? summary.I_DSS : { min: 0, median: 0, max: 0 }),
    lambda: several(summary.lambda),
    tracking: summary.tracking,
  };
}
