// Values as they are shown: the same text in the terminal, on the page and in the record.

import { formatValue } from '../quantity/index.ts';
import type { CellReading, Reading } from '../sheet/index.ts';

/** Three significant digits with a unit, a region's word, `holds` or `does not hold`; null where there is no value. */
export function shownReading(reading: Reading): string | null {
  const { value, type, as } = reading;
  if (value === null || Number.isNaN(value)) return null;
  if (typeof value === 'boolean') return value ? 'holds' : 'does not hold';
  if (typeof value === 'string' || typeof type === 'string') return String(value);
  return formatValue(value, type, { unit: as }).text;
}

/** A cell's own value: an input with the digits typed, 1.6 kΩ where three digits would be 1.60 kΩ exactly. */
export function shownCell(cell: Pick<CellReading, 'reading' | 'isInput'>): string | null {
  return cell.reading === null ? null : shownOwn(cell.reading, cell.isInput);
}

/** The value of a cell or a field, as `shownCell` says. */
export function shownOwn(reading: Reading, isInput: boolean): string | null {
  const { value, type, as } = reading;
  if (typeof value !== 'number' || Number.isNaN(value) || typeof type === 'string') return shownReading(reading);
  const exact = formatValue(value, type, { unit: as, digits: 'all' }).text;
  const short = formatValue(value, type, { unit: as, zeros: 'drop' }).text;
  return isInput || exact === short ? exact : shownReading(reading);
}
