// The rows of a published data sheet against the part that carries them.

import type { PublishedPart, PublishedRow } from './comparison.ts';
import type { PartSheet } from './part-sheets.ts';
import { inPublishedUnit } from './published-units.ts';
import type { ComputedSheet } from './read-sheet.ts';

/** Rows that few parts have, and their units. */
const FURTHER_UNITS: Readonly<Record<string, string>> = {
  Cdg: 'pF',
  Csg: 'pF',
  Cdg_off: 'pF',
  Csg_off: 'pF',
  VGS_at_200uA: 'V',
};

/** Leakage, capacitances and an output conductance: where no least value is printed it is 0. */
const NEVER_NEGATIVE = /^(IGSS|C|gos)/;

/** What does not agree, in sentences: a fault, an end that was not kept, a nominal that is not the geometric mean. */
export function comparePart(
  { data }: PublishedPart,
  { rows, law, incomplete }: PartSheet,
  units: Readonly<Record<string, string>>,
  sheet: ComputedSheet,
): string[] {
  const faults = sheet.faults();
  if (incomplete) return faults.length === 1 ? [] : [`one fault is due, ${incomplete}: ${faults.join('; ') || 'none'}`];
  const findings = [...faults];
  for (const row of Object.keys(data)) if (!(row in rows)) findings.push(`${row} stands nowhere in the sheet`);
  for (const [row, path] of Object.entries(rows)) {
    const unit = units[row] ?? FURTHER_UNITS[row]!;
    const inUnit = (si: number | null): number | null => (si === null ? null : inPublishedUnit(si, unit));
    const wanted = ends(row, data[row]!);
    const spread = sheet.spread(path);
    const value = sheet.value(path);
    const nominal = inUnit(typeof value === 'number' ? value : null);
    if (!same(nominal, wanted.nominal)) findings.push(`${row}: nominal ${nominal} ${unit}, not ${wanted.nominal}`);
    if (!spread) {
      if (wanted.low !== null && wanted.high !== null) findings.push(`${row} has no ends`);
      continue;
    }
    const [low, high] = [inUnit(spread.low), inUnit(spread.high)];
    if (!same(low, wanted.low)) findings.push(`${row}: low end ${low} ${unit}, not ${wanted.low}`);
    if (!same(high, wanted.high)) findings.push(`${row}: high end ${high} ${unit}, not ${wanted.high}`);
    if (spread.nominalChosen !== (data[row]!.typ === null)) findings.push(`${row}: who chose the nominal`);
  }
  for (const [k, name] of ['beta', 'V_TO', 'lambda'].entries()) {
    const found = sheet.value(`Q1.${name}`);
    if (law && !(typeof found === 'number' && Math.abs(found - law[k]!) <= 1e-9 * Math.abs(law[k]!))) {
      findings.push(`${name}: ${found}, not ${law[k]}`);
    }
  }
  return findings;
}

/** The ends of a row in rising order and what stands for its nominal; currents are positive on both channels. */
function ends(
  row: string,
  { min, typ, max }: PublishedRow,
): { low: number | null; nominal: number; high: number | null } {
  const signed = (x: number | null): number | null => (x !== null && row === 'IDSS' ? Math.abs(x) : x);
  const [small, large, middle] = [signed(min), signed(max), signed(typ)];
  const sign = (small ?? large ?? middle)! < 0 ? -1 : 1;
  const nominal = middle ?? (small !== null && large !== null ? sign * Math.sqrt(small * large) : (small ?? large)!);
  const least = small === null && NEVER_NEGATIVE.test(row) ? 0 : small;
  return sign < 0 ? { low: large, nominal, high: small } : { low: least, nominal, high: large };
}

function same(found: number | null, wanted: number | null): boolean {
  if (found === null || wanted === null) return found === wanted;
  return Math.abs(found - wanted) <= 1e-12 * Math.abs(wanted);
}
