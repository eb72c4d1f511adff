// Values in the cells of a table: the number, and its unit in a line of its own from row to row.

import { formatRow } from '../quantity/index.ts';
import type { FormatOptions, FormattedValue } from '../quantity/index.ts';
import type { CellReading, DeclaredSpread, Reading } from '../sheet/index.ts';
import type { ValueSpread } from '../spread/index.ts';
import { EMPTY_CELL, plainText, textCell } from './inline.ts';
import type { Cell } from './record-tree.ts';
import { shownOwn, shownReading } from './shown.ts';

/** Ends that a tolerance gives are shown to so many digits. */
const END_DIGITS = 4;
/** A shown value: its number, and the unit behind the blank. */
const PARTS = /^([−∞\d][^ ]*)(?: (.*))?$/;

/** Low, nominal and high value of an input: the number as typed, its ends rounded outward. */
export function inputCells(reading: Reading, of: Pick<CellReading, 'isInput' | 'spread'>): [Cell, Cell, Cell] {
  const nominal = shownOwn(reading, of);
  const shown = nominal === null ? textCell('not computed') : valueCell(nominal);
  const { spread } = of;
  const { value, type, as } = reading;
  if (spread === null || typeof type === 'string' || typeof value !== 'number' || Number.isNaN(value)) {
    return [EMPTY_CELL, shown, EMPTY_CELL];
  }
  const { low, high } = formatRow({ low: spread.low, nominal: value, high: spread.high }, type, {
    unit: as,
    ...endDigits(spread),
  });
  return [endCell(low, shown.unit), shown, endCell(high, shown.unit)];
}

/** Low, nominal and high of a computed value over the declared set; null where nothing moves it. */
export function spreadCells({ value, type, as }: Reading, spread: ValueSpread | null): [Cell, Cell, Cell] | null {
  if (!spread?.moves || spread.isWord || typeof value !== 'number' || typeof type === 'string') return null;
  if (!Number.isFinite(value)) return null;
  const { low, nominal, high } = formatRow({ low: spread.low.value, nominal: value, high: spread.high.value }, type, {
    unit: as,
  });
  const shown = valueCell(nominal.text);
  return [endCell(low, shown.unit), shown, endCell(high, shown.unit)];
}

/** A value offered, or the dash that stands where there is none. */
export function offeredCell(reading: Reading): Cell {
  const text = shownReading(reading);
  return text === null ? textCell('–') : valueCell(text);
}

/** `1.2 kΩ` as a number and its unit; what is no number stays together. */
export function valueCell(text: string): Cell {
  const [, number, unit] = PARTS.exec(text) ?? [];
  return number === undefined ? textCell(text) : { content: plainText(number), unit: unit ?? '' };
}

/** Ends that were typed are shown in full. */
function endDigits({ form }: DeclaredSpread): FormatOptions {
  return form === 'limits' ? { digits: 'all' } : { digits: END_DIGITS, zeros: 'drop' };
}

/** An end bears its unit only where that is another than the nominal's; an open end says so. */
function endCell(end: FormattedValue | null, nominalUnit: string | undefined): Cell {
  if (end === null) return textCell('open');
  return { content: plainText(end.number), unit: end.unit === (nominalUnit ?? '') ? '' : end.unit };
}
