// The ends of a stage: its values with the low device, nominally, with the high device, and over the whole declared set.

import { formatRow, formatValue } from '../quantity/index.ts';
import type { CellReading, OfferedReading } from '../sheet/index.ts';
import type { SheetSpread } from '../spread/index.ts';

/** One value of a stage; a number that is not known is `–`, a missing limit `no limit`. */
interface StageEnd {
  readonly name: string;
  readonly low: string;
  readonly lowDevice: string;
  readonly nominal: string;
  readonly highDevice: string;
  readonly high: string;
  /** The larger end over the smaller one by magnitude; empty where they differ in sign or one is 0. */
  readonly ratio: string;
}

/** The values of a stage that anything moves, in the order in which it offers them. */
export function stageEnds(cell: CellReading, spread: SheetSpread): StageEnd[] {
  const devices = spread.report.devices.find(({ stage }) => stage === cell.name) ?? null;
  return cell.values.flatMap((value) => {
    const path = `${cell.name}.${value.name}`;
    return endOf(value, path, spread, devices?.low.values.get(path), devices?.high.values.get(path));
  });
}

function endOf(
  { name, value, type, as }: OfferedReading,
  path: string,
  spread: SheetSpread,
  lowDevice: number | undefined,
  highDevice: number | undefined,
): StageEnd[] {
  const found = spread.value(path);
  if (!found?.moves || found.isWord || typeof value !== 'number' || typeof type === 'string') return [];
  const { low, high } = found;
  if (low.value === high.value && low.value === value) return [];
  const row = formatRow({ low: low.value, nominal: value, high: high.value }, type, { unit: as });
  const device = (x: number | undefined): string => (x === undefined ? '–' : formatValue(x, type, { unit: as }).text);
  const end = (at: typeof low, text: string | undefined): string => text ?? (at.open.length > 0 ? 'no limit' : '–');
  return [
    {
      name,
      low: end(low, row.low?.text),
      lowDevice: device(lowDevice),
      nominal: row.nominal.text,
      highDevice: device(highDevice),
      high: end(high, row.high?.text),
      ratio: type.scale === 'linear' ? ratioText(low.value, high.value) : '',
    },
  ];
}

function ratioText(low: number | null, high: number | null): string {
  if (low === null || high === null || low * high <= 0) return '';
  const ratio = Math.max(low / high, high / low);
  return ratio < Infinity ? `${ratio < 10 ? ratio.toFixed(2) : ratio.toPrecision(3)} : 1` : '';
}
