// The ends of a value as they are shown: low rounded down, high up, in one unit with the nominal.

import { formatRow } from '../quantity/index.ts';
import type { FormattedRow } from '../quantity/index.ts';
import type { Reading } from '../sheet/index.ts';
import type { ValueSpread } from '../spread/index.ts';

/** `358 µA .. 1.28 mA`; an open end is `no limit`, one that is not known `–`; null where nothing moves the value. */
export function endsText({ value, type, as }: Reading, spread: ValueSpread | null): string | null {
  if (!spread?.moves || spread.isWord || typeof value !== 'number' || typeof type === 'string') return null;
  const { low, high } = spread;
  if (low.value === high.value && low.value === value) return null;
  const row = formatRow({ low: low.value, nominal: value, high: high.value }, type, { unit: as });
  const text = (end: typeof low, shown: FormattedRow['low']): string =>
    shown?.text ?? (end.open.length > 0 ? 'no limit' : '–');
  return `${text(low, row.low)} .. ${text(high, row.high)}`;
}
