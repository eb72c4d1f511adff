// Numbers that stand below each other: one prefix and one last decimal for all, those of the largest.

import { bestPrefix, formatValue } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';

/** What stands where there is no number. */
export const NONE = '–';

/** Of a value with its error: no more than a good meter has. */
const MOST_DIGITS = 5;
/** As many as a double has. */
const ALL_DIGITS = 17;

/** The texts of a column; the largest number has so many significant digits, the others end where it does. */
export function columnTexts(values: readonly (number | null)[], kind: ValueKind, digits = 3): string[] {
  const largest = Math.max(0, ...values.map((value) => Math.abs(value ?? 0)));
  const prefix = bestPrefix(largest, kind, { digits });
  const last = leadOf(largest, digits) - digits + 1;
  return values.map((value) => (value === null ? NONE : textTo(value, kind, { prefix, last })));
}

/** A column of values with their standard errors: `1.002 ± 0.011 mA`. */
export function columnWithErrors(
  values: readonly number[],
  errors: readonly (number | null)[],
  kind: ValueKind,
): string[] {
  const largest = Math.max(...values.map(Math.abs));
  const reference = largest === 0 ? Math.max(0, ...errors.map((error) => error ?? 0)) : largest;
  const prefix = bestPrefix(reference, kind);
  const known = errors.filter((error): error is number => error !== null && error > 0);
  // The least error decides where all end.
  const wanted = known.length > 0 ? Math.min(...known.map((error) => leadOf(error, 2) - 1)) : -Infinity;
  const last = Math.max(wanted, leadOf(reference, MOST_DIGITS) - MOST_DIGITS + 1);
  return values.map((value, i) => {
    const error = errors[i]!;
    if (error === null) return formatValue(value, kind, { zeros: 'drop' }).text;
    const { number, unit } = partsTo(value, kind, { prefix, last });
    const spread = partsTo(error, kind, { prefix, last });
    return `${number} ± ${spread.number}${unit === '' ? '' : ` ${unit}`}`;
  });
}

function textTo(value: number, kind: ValueKind, at: { prefix: number; last: number }): string {
  return partsTo(value, kind, at).text;
}

function partsTo(value: number, kind: ValueKind, { prefix, last }: { prefix: number; last: number }) {
  const digits = value === 0 ? 0 : leadOf(value, Math.max(1, leadOf(value, ALL_DIGITS) - last + 1)) - last + 1;
  // Half of the last place and more is rounded up to one there.
  if (digits === 0 && 2 * Math.abs(value) >= Number(`1e${last}`))
    return formatValue(Math.sign(value) * Number(`1e${last}`), kind, { prefix, digits: 1 });
  return formatValue(digits <= 0 ? 0 : value, kind, { prefix, digits: Math.max(1, digits) });
}

/** Power of ten of the first digit, once rounded to so many. */
function leadOf(value: number, digits: number): number {
  return value === 0 ? 0 : Number(value.toExponential(digits - 1).split('e')[1]);
}
