// Which resistor in the source lead sets which specimen to one current: for those that were measured, and as a table
// for the next ones, by the V_GS that a voltmeter shows at that current.

import { nextPreferred, preferredValue } from '../../quantity/index.ts';
import type { FittedReading, FittingReading, FittingRow } from './bench-reading.ts';
import { gateAt } from './fits.ts';
import type { FittedSpecimen } from './fits.ts';
import type { Fitting } from './settings.ts';

/** The series that is fitted from. */
const FITTED_SERIES = 'E24';

/** The resistors of those that are kept. */
export function fittingReading(
  channel: 1 | -1,
  specimens: readonly FittedSpecimen[],
  { I_D, V_DS, V_GG }: Fitting,
): FittingReading {
  const kept = specimens.filter(({ reading }) => reading.isKept);
  const fitted = kept.map((each) => fittedReading(each, { I_D, V_DS, V_GG }));
  return { I_D, V_DS, V_GG, specimens: fitted, table: tableOf(channel, fitted, { I_D, V_GG }) };
}

function fittedReading(
  { specimen, fit }: FittedSpecimen,
  { I_D, V_DS, V_GG }: Pick<Fitting, 'I_D' | 'V_DS' | 'V_GG'>,
): FittedReading {
  const V_GS = gateAt(fit, { I_D, V_DS });
  const R_S = (fit.channel * (V_GG - V_GS)) / I_D;
  if (!(R_S > 0)) return { name: specimen.name, V_GS, R_S: null, bought: null };
  const nearest = preferredValue(FITTED_SERIES, R_S, 'nearest');
  // V_GG - R I = V_TO + √(I / beta'), a quadratic in √I; this form of its root keeps all digits.
  const slope = 1 / Math.sqrt(fit.beta * (Number.isNaN(V_DS) ? 1 : 1 + fit.lambda * V_DS));
  const drive = fit.channel * (V_GG - fit.V_TO);
  const root = (2 * drive) / (slope + Math.sqrt(slope * slope + 4 * nearest * drive));
  return { name: specimen.name, V_GS, R_S, bought: { R_S: nearest, I_D: root * root } };
}

/** A row for each value that is sold, from the least to the largest that the specimens take; each reaches half way, by ratio, to its neighbours. */
function tableOf(
  channel: 1 | -1,
  fitted: readonly FittedReading[],
  { I_D, V_GG }: Pick<Fitting, 'I_D' | 'V_GG'>,
): FittingRow[] {
  const values = fitted.flatMap(({ bought }) => (bought ? [bought.R_S] : []));
  if (values.length === 0) return [];
  const last = Math.max(...values);
  const rows: FittingRow[] = [];
  for (let value = Math.min(...values); value <= last; value = nextPreferred(FITTED_SERIES, value, 'up')) {
    const gate = (resistance: number): number => V_GG - channel * I_D * resistance;
    const below = nextPreferred(FITTED_SERIES, value, 'down');
    const above = nextPreferred(FITTED_SERIES, value, 'up');
    rows.push({ from: gate(Math.sqrt(below * value)), to: gate(Math.sqrt(value * above)), R_S: value });
  }
  return rows;
}
