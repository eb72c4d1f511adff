// What a row says of spread, by the path of its value.

import { failingText, failsCheck } from '../../record/index.ts';
import type { JudgedSpread } from '../../record/index.ts';
import type { CellReading, Reading } from '../../sheet/index.ts';
import { spreadNumbers } from './numbers.ts';
import type { Devices, Numbers } from './numbers.ts';

/** The spread of the sheet as its rows show it. */
export interface RowSpread {
  readonly judged: JudgedSpread;
  /** Not all builds are counted yet. */
  readonly refining: boolean;
}

/** The numbers of a value by its path; null where nothing moves it. */
export function numbersAt(path: string, reading: Reading, spread: RowSpread | null): Numbers | null {
  if (spread === null) return null;
  const known = spread.judged.spread;
  return spreadNumbers(reading, known.value(path), devicesAt(path, spread), spread.refining);
}

function devicesAt(path: string, { judged }: RowSpread): Devices {
  for (const { low, high } of judged.spread.report.devices) {
    const [a, b] = [low.values.get(path), high.values.get(path)];
    if (a !== undefined && b !== undefined) return { low: a, high: b };
  }
  return { low: null, high: null };
}

/** Whether a check that holds nominally counts as failing, and why in words; null where it does not. */
export function failsAtAnEnd(cell: CellReading, spread: RowSpread | null): string | null {
  if (spread === null || cell.check?.holds !== true || !failsCheck(cell, spread.judged)) return null;
  return failingText(cell, spread.judged);
}
