// One published case against its computed sheet. Everything that does not agree is told in a sentence.

import type { Comparison, PublishedCase, PublishedQuantity } from './comparison.ts';
import { inPublishedUnit } from './published-units.ts';
import type { ComputedSheet } from './read-sheet.ts';

/** Relative. `recomputed` has seven digits, so half of its last one is at most 5e-7. */
export const TOLERANCE = 1e-6;

export interface CaseResult {
  /** What does not agree; empty where all does. */
  readonly findings: readonly string[];
  /** Relative deviation from `recomputed` of every number that was compared. */
  readonly deviations: readonly number[];
}

/** Compares every quantity of a case, and the values of our own beside it. */
export function compareCase(one: PublishedCase, comparison: Comparison, sheet: ComputedSheet): CaseResult {
  const { quantities, waits = {}, own = [] } = comparison;
  const waiting = Object.keys(waits).length > 0;
  const findings: string[] = waiting ? [] : [...sheet.faults()];
  const deviations: number[] = [];
  for (const quantity of Object.keys(one.expect)) {
    if (!(quantity in quantities)) findings.push(`${quantity} stands nowhere in the sheet and no reason is given`);
  }
  for (const [quantity, path] of Object.entries(quantities)) {
    const published = one.expect[quantity];
    const value = sheet.value(path);
    if (!published) {
      findings.push(`${quantity} is no quantity of the case`);
    } else if (waits[quantity]) {
      if (value !== null) findings.push(`${quantity} is computed and waits no longer for ${waits[quantity]}`);
    } else if (typeof published.recomputed === 'string') {
      if (value !== published.recomputed) findings.push(`${quantity}: ${value}, not ${published.recomputed}`);
    } else if (typeof value !== 'number' || Number.isNaN(value)) {
      findings.push(`${quantity}: ${path} has no value`);
    } else {
      const found = inPublishedUnit(value, published.unit);
      const deviation = relative(found, published.recomputed);
      deviations.push(deviation);
      if (!(deviation <= TOLERANCE)) {
        findings.push(`${quantity}: ${found} ${published.unit}, not ${published.recomputed}`);
      }
      if (!asPrinted(found, published)) findings.push(`${quantity}: ${found}, printed ${published.printed}`);
    }
  }
  for (const { path, value: wanted, unit, because } of own) {
    const value = sheet.value(path);
    if (value === null && waiting) continue;
    const found = typeof value === 'number' ? inPublishedUnit(value, unit) : value;
    const agrees =
      typeof wanted === 'number' && typeof found === 'number' ? relative(found, wanted) <= TOLERANCE : found === wanted;
    if (!agrees) findings.push(`${path}: ${found} ${unit}, not ${wanted}: ${because}`);
  }
  return { findings, deviations };
}

/** The quantities of a case that are numbers and are to be compared. */
export function comparedNumbers(one: PublishedCase, { waits = {} }: Comparison): string[] {
  return Object.entries(one.expect)
    .filter(([quantity, { recomputed }]) => typeof recomputed === 'number' && !waits[quantity])
    .map(([quantity]) => quantity);
}

/** Within half of the last printed digit, where the printed figure agrees with its own source at all. */
function asPrinted(found: number, { value, halfDigit }: PublishedQuantity): boolean {
  if (value === undefined || halfDigit === undefined) return true;
  // A last digit that is an exact half may fall either way.
  return Math.abs(found - value) <= halfDigit + 1e-12 * Math.abs(value);
}

function relative(found: number, wanted: number): number {
  return Math.abs(found - wanted) / Math.abs(wanted);
}
