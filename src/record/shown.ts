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

/**
 * The value of a cell or of a field: the digits typed where it is an input whose nominal value the author gave, and
 * 1.6 kΩ where three digits would be 1.60 kΩ exactly; null where there is none.
 */
export function shownOwn(reading: Reading, of: Pick<CellReading, 'isInput' | 'spread'>): string | null {
  const { value, type, as } = reading;
  if (typeof value !== 'number' || Number.isNaN(value) || typeof type === 'string') return shownReading(reading);
  const exact = formatValue(value, type, { unit: as, digits: 'all' }).text;
  const short = formatValue(value, type, { unit: as, zeros: 'drop' }).text;
  const isTyped = of.isInput && of.spread?.nominalChosen !== true;
  return isTyped || exact === short ? exact : shownReading(reading);
}

/** The value of a cell, as `shownOwn` says. */
export function shownCell(cell: Pick<CellReading, 'reading' | 'isInput' | 'spread'>): string | null {
  return cell.reading === null ? null : shownOwn(cell.reading, cell);
}
