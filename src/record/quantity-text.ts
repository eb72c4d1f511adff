// Numbers spelled so that the sheet language reads them again: what stands in place of names in a
// line of workings can be typed back and computed.

import { formatValue, plainText, siUnitText } from '../quantity/index.ts';
import type { Unit, ValueKind } from '../quantity/index.ts';

/** An operand that needs no more digits than these is printed with just them: 1.2 kΩ, 18 V, 1.0625. */
const SHORT = 6;

/** `−1.31 V`, `1.2 kΩ`: `digits` significant digits, fewer or more where up to six hold the value exactly; ∞ for what has no end. */
export function operandText(value: number, kind: ValueKind, as: Unit | null, digits: number): string {
  return exactText(value, kind, as, SHORT) ?? quantityText(value, kind, as, digits);
}

/** The value with `digits` significant digits, zeros at their end kept. */
export function quantityText(value: number, kind: ValueKind, as: Unit | null, digits: number | 'all'): string {
  const shown = formatValue(value, kind, { unit: as, digits });
  if (!Number.isFinite(value)) return shown.text;
  // The number as the language reads it, without groups of three; the unit as it is set.
  const [number] = plainText(value, kind, { unit: as, digits, zeros: digits === 'all' ? 'drop' : 'keep' }).split(' ');
  const signed = number!.replace(/^-/, '−');
  return shown.unit === '' ? signed : `${signed} ${shown.unit}`;
}

/** The value in as few digits as hold it, up to `most`; null where it takes more. */
export function exactText(value: number, kind: ValueKind, as: Unit | null, most: number): string | null {
  if (!Number.isFinite(value)) return null;
  const options = { unit: as, zeros: 'drop' } as const;
  const isExact = plainText(value, kind, { ...options, digits: most }) === plainText(value, kind, options);
  return isExact ? quantityText(value, kind, as, 'all') : null;
}

/** Infinity as the language can say it: it has no numeral for it, but one over nothing is the same. */
export function infinityText(value: number, kind: ValueKind): string {
  const unit = siUnitText(kind);
  return `(${value < 0 ? '−' : ''}1${unit === '1' ? '' : ` ${unit}`} / 0)`;
}
