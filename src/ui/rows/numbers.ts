// The numbers of a row: nominal value, its ends and its bar. Inputs as typed, in the unit they were typed in;
// computed values to three digits; ends rounded outward, in the unit of the nominal value.

import { spreadBar } from '../../figure/index.ts';
import type { SpreadBar } from '../../figure/index.ts';
import type { Literal } from '../../language/index.ts';
import { formatRow, formatValue } from '../../quantity/index.ts';
import type { FormatOptions, FormattedValue, Unit, ValueKind } from '../../quantity/index.ts';
import type { DeclaredSpread, Reading } from '../../sheet/index.ts';
import type { End, ValueSpread } from '../../spread/index.ts';
import type { Figure } from './row.ts';

export interface Numbers {
  readonly low: Figure | null;
  readonly nominal: Figure | null;
  readonly high: Figure | null;
  readonly bar: SpreadBar | null;
}

export const NO_NUMBERS: Numbers = { low: null, nominal: null, high: null, bar: null };

/** Ends that a tolerance gives are shown to so many digits. */
const END_DIGITS = 4;

/** The value of a formula, a region or a condition; null where there is none. */
export function valueFigure(reading: Reading): Figure | null {
  const { value, type, as } = reading;
  if (value === null || Number.isNaN(value)) return null;
  if (typeof value === 'boolean') return word(value ? 'holds' : 'fails');
  if (typeof value === 'string' || typeof type === 'string') return word(String(value));
  const exact = formatValue(value, type, { unit: as, digits: 'all' });
  const short = formatValue(value, type, { unit: as, zeros: 'drop' });
  return figure(exact.text === short.text ? exact : formatValue(value, type, { unit: as }), 'plain');
}

/** The numbers of an input: as typed, with what its spread is declared to be. */
export function inputNumbers(
  reading: Reading,
  spread: DeclaredSpread | null,
  typed: { readonly unit: Unit | null; readonly endsTyped: boolean },
): Numbers {
  const { value, type } = reading;
  if (typeof value !== 'number' || typeof type === 'string' || Number.isNaN(value)) {
    return { ...NO_NUMBERS, nominal: valueFigure(reading) };
  }
  const unit = reading.as ?? typed.unit;
  const nominal = formatValue(value, type, spread?.nominalChosen ? { unit } : { unit, digits: 'all' });
  const bar = barOf(value, type, spread);
  const look = spread?.nominalChosen ? 'chosen' : 'plain';
  if (spread === null) return { low: null, nominal: figure(nominal, look), high: null, bar };
  const options: FormatOptions = typed.endsTyped
    ? { unit, digits: 'all' }
    : { unit, digits: END_DIGITS, zeros: 'drop' };
  const ends = formatRow({ low: spread.low, nominal: value, high: spread.high }, type, options);
  return {
    low: endFigure(ends.low, nominal),
    nominal: figure(nominal, look),
    high: endFigure(ends.high, nominal),
    bar,
  };
}

/** The numbers of a bench: the median of its specimens between the least and the largest. */
export function measuredNumbers(reading: Reading, low: Reading | undefined, high: Reading | undefined): Numbers | null {
  const { value, type, as } = reading;
  const ends = [low?.value, high?.value];
  if (typeof value !== 'number' || typeof type === 'string') return null;
  if (!ends.every((end) => typeof end === 'number') || ends[0] === ends[1]) return null;
  const row = formatRow({ low: ends[0]!, nominal: value, high: ends[1]! }, type, { unit: as });
  const nominal = valueFigure(reading);
  return { low: endFigure(row.low, row.nominal), nominal, high: endFigure(row.high, row.nominal), bar: null };
}

/** The numbers of a computed value with its ends over the declared set; null where nothing moves it. */
export function spreadNumbers(
  reading: Reading,
  spread: ValueSpread | null,
  devices: Devices,
  refining: boolean,
): Numbers | null {
  const { value, type, as } = reading;
  if (!spread?.moves || spread.isWord || typeof value !== 'number' || typeof type === 'string') return null;
  if (!Number.isFinite(value)) return null;
  const { low, high } = spread;
  if (low.value === high.value && low.value === value) return null;
  const row = formatRow({ low: low.value, nominal: value, high: high.value }, type, { unit: as });
  const nominal = valueFigure(reading);
  return {
    low: spreadEnd(row.low, low, row.nominal),
    nominal,
    high: spreadEnd(row.high, high, row.nominal),
    bar: spreadBar({
      low: low.value,
      nominal: value,
      high: high.value,
      own: type.scale !== 'linear',
      limits: { low: null, high: null },
      devices,
      refining,
    }),
  };
}

/** The values of the low and the high device; null where there are none. */
export interface Devices {
  readonly low: number | null;
  readonly high: number | null;
}

function spreadEnd(end: FormattedValue | null, { open }: End, nominal: FormattedValue): Figure {
  if (end === null) return word(open.length > 0 ? 'no limit' : 'unsolved');
  return { number: end.number, unit: end.unit === nominal.unit ? '' : end.unit, look: 'plain' };
}

/** The unit a number was typed in; null for bare numbers and for codes such as 4k7, which choose a prefix of their own. */
export function typedUnit(literal: Literal | null, lineText: string): Unit | null {
  const unit = literal?.unit ?? null;
  if (!literal || !unit) return null;
  return lineText.slice(literal.span.start, literal.span.end).trimEnd().endsWith(unit.text) ? unit : null;
}

function barOf(nominal: number, kind: ValueKind, spread: DeclaredSpread | null): SpreadBar | null {
  if (!Number.isFinite(nominal)) return null;
  return spreadBar({
    low: spread ? spread.low : nominal,
    nominal,
    high: spread ? spread.high : nominal,
    own: kind.scale !== 'linear',
    limits: { low: null, high: null },
    devices: { low: null, high: null },
    refining: false,
  });
}

/** An end shows its unit only where it is another than the nominal's; an open end says so. */
function endFigure(end: FormattedValue | null, nominal: FormattedValue): Figure {
  if (end === null) return word('open');
  return { number: end.number, unit: end.unit === nominal.unit ? '' : end.unit, look: 'plain' };
}

function figure({ number, unit }: FormattedValue, look: Figure['look']): Figure {
  return { number, unit, look };
}

function word(text: string): Figure {
  return { number: text, unit: '', look: 'words' };
}
