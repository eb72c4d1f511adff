// Rules of rounding where more than one number is shown: what is printed may promise less than was
// computed, never more. Ends of a spread go outward, ends of a window to buy from inward, what is to
// spare goes down and what is short goes up, and a comparison shows the digits that decide it.

import type { FormatOptions, FormattedValue } from './format.ts';
import { bestPrefix, formatValue } from './format.ts';
import type { ValueKind } from './kind.ts';
import { roundDecimal } from './round-decimal.ts';
import type { Rounding } from './round-decimal.ts';

export interface FormattedRow {
  readonly low: FormattedValue | null;
  readonly nominal: FormattedValue;
  readonly high: FormattedValue | null;
}

interface FormattedWindow {
  readonly low: FormattedValue;
  readonly high: FormattedValue;
}

/** How much is to spare or short, without sign. */
interface FormattedReserve extends FormattedValue {
  readonly short: boolean;
}

/** Ends further from the nominal value than this take a prefix of their own. */
const SHARED_PREFIX_RATIO = 1000;
/** More digits than any two doubles need to differ in. */
const MOST_DIGITS = 17;

/**
 * Low, nominal and high value of one row: low rounded down and high up, one prefix for all, the nominal's, save for an
 * end more than 1000 times larger or smaller. An end that is null (open) stays null.
 */
export function formatRow(
  row: { readonly low: number | null; readonly nominal: number; readonly high: number | null },
  kind: ValueKind,
  options: FormatOptions = {},
): FormattedRow {
  const reference = referenceOf(row);
  const prefix = options.prefix ?? bestPrefix(reference, kind, options);
  const cell = (value: number, rounding: Rounding): FormattedValue =>
    formatValue(value, kind, { ...options, rounding, prefix: sharesPrefix(value, reference) ? prefix : undefined });
  return {
    low: row.low === null ? null : cell(row.low, 'down'),
    nominal: cell(row.nominal, options.rounding ?? 'nearest'),
    high: row.high === null ? null : cell(row.high, 'up'),
  };
}

/** A window of values that will do, rounded inward so that both printed ends lie in it; prefixes as in a row. */
export function formatWindow(low: number, high: number, kind: ValueKind, options: FormatOptions = {}): FormattedWindow {
  const reference = referenceOf({ low: null, nominal: low, high });
  const prefix = options.prefix ?? bestPrefix(reference, kind, options);
  const shared = (value: number) => (sharesPrefix(value, reference) ? prefix : undefined);
  return {
    low: formatValue(low, kind, { ...options, rounding: 'up', prefix: shared(low) }),
    high: formatValue(high, kind, { ...options, rounding: 'down', prefix: shared(high) }),
  };
}

/** By how much a check holds (rounded down) or, negative, fails (rounded up): the number has no sign. */
export function formatReserve(reserve: number, kind: ValueKind, options: FormatOptions = {}): FormattedReserve {
  const short = reserve < 0;
  return { ...formatValue(Math.abs(reserve), kind, { ...options, rounding: short ? 'up' : 'down' }), short };
}

/** The least count of significant digits, from `least` on, in which two different finite values print differently. */
export function digitsToTell(a: number, b: number, least = 3): number {
  const printed = (value: number, digits: number): number => {
    const rounded = roundDecimal(value, { digits, rounding: 'nearest' });
    return Number(`${rounded.negative ? '-' : ''}${rounded.digits}e${rounded.exponent}`);
  };
  let digits = least;
  while (digits < MOST_DIGITS && printed(a, digits) === printed(b, digits)) digits++;
  return digits;
}

// ---------------------------------------------------------------- parts

/** The nominal value, or the larger end where that is 0 or infinite. */
function referenceOf({ low, nominal, high }: { low: number | null; nominal: number; high: number | null }): number {
  if (nominal !== 0 && Number.isFinite(nominal)) return nominal;
  const ends = [low, high].filter((end) => end !== null).filter((end) => Number.isFinite(end));
  return Math.max(0, ...ends.map((end) => Math.abs(end)));
}

function sharesPrefix(value: number, reference: number): boolean {
  if (value === 0 || !Number.isFinite(value)) return true;
  const ratio = Math.abs(value) / Math.abs(reference);
  return ratio <= SHARED_PREFIX_RATIO && ratio >= 1 / SHARED_PREFIX_RATIO;
}
