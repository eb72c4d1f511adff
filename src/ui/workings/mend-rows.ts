// What would hold a failing check, as rows: for each input its window, the preferred value in it, and what is then tightest.

import {
  formatValue,
  formatWindow,
  nextPreferred,
  preferredValue,
  RESISTANCE,
  CAPACITANCE,
  INDUCTANCE,
  sameKind,
} from '../../quantity/index.ts';
import type { SeriesName, ValueKind } from '../../quantity/index.ts';
import { reserveText } from '../../record/index.ts';
import type { Sheet } from '../../sheet/index.ts';
import type { MendAnswer, SheetSpread } from '../../spread/index.ts';

/** One input and what it would have to be. */
export interface MendRow {
  readonly input: string;
  /** `870 Ω to 1.13 kΩ`, or why there is none. */
  readonly window: string;
  /** The value to put in, SI; null where none can be bought. */
  readonly value: number | null;
  readonly valueText: string;
  /** `then tightest: swing, 0.4 V to spare`. */
  readonly next: string;
}

/** How far an input is turned, as a factor to either side, for values to buy. */
const RANGE = 8;
/** Series in the order in which they are looked through, coarse first. */
const SERIES: readonly SeriesName[] = ['E24', 'E96'];

/** Values one can buy around a value, the nearest by ratio first, those of the coarser series before the finer. */
export function buyable(present: number, kind: ValueKind): number[] {
  if (![RESISTANCE, CAPACITANCE, INDUCTANCE].some((each) => sameKind(each, kind))) return roundValues(present);
  return SERIES.flatMap((series) => {
    const found: number[] = [];
    let value: number | null = preferredValue(series, present / RANGE, 'up');
    while (value !== null && value <= present * RANGE) {
      found.push(value);
      value = nextPreferred(series, value, 'up');
    }
    return nearestFirst(found, present);
  });
}

/** Values of two digits around a supply or a current. */
function roundValues(present: number): number[] {
  const found: number[] = [];
  const decade = 10 ** Math.floor(Math.log10(present));
  for (const power of [0.1, 1, 10]) {
    for (let digits = 10; digits < 100; digits++) found.push(Number((digits * decade * power * 0.1).toPrecision(2)));
  }
  return nearestFirst(found, present);
}

function nearestFirst(values: readonly number[], present: number): number[] {
  const off = (value: number): number => Math.abs(Math.log(value / present));
  return values.toSorted((a, b) => off(a) - off(b));
}

/** The row of an answer. */
export function mendRow({ mending, choice }: MendAnswer, { model }: SheetSpread, sheet: Sheet): MendRow {
  const { input, window, closedBy } = mending;
  const kind = model.tunable.find(({ name }) => name === input)!.type;
  if (window === null) {
    const text = closedBy === null ? 'no value holds them all' : `no value: ${closedBy} closes it`;
    return { input, window: text, value: null, valueText: '', next: '' };
  }
  const ends = formatWindow(window.low, window.high, kind);
  const row = { input, window: `${ends.low.text} to ${ends.high.text}` };
  if (choice === null) return { ...row, value: null, valueText: 'no preferred value in it', next: '' };
  return {
    ...row,
    value: choice.value,
    valueText: formatValue(choice.value, kind, { zeros: 'drop' }).text,
    next: tightest(choice, sheet),
  };
}

/** The check with the least left of its present reserve. */
function tightest({ checks }: NonNullable<MendAnswer['choice']>, sheet: Sheet): string {
  const left = checks.flatMap(({ check, reserve }) => {
    const present = sheet.cell(check)?.check ?? null;
    if (!present?.reserveType || !present.reserve || !Number.isFinite(reserve)) return [];
    return [{ check, reserve, kind: present.reserveType, share: reserve / Math.abs(present.reserve) }];
  });
  const [first] = left.toSorted((a, b) => a.share - b.share);
  return first ? `${first.check}, ${reserveText(first.reserve, first.kind, null)}` : '';
}
