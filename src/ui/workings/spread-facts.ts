// What the workings say of the spread of a value or check: plain data made from the report.

import { answeredSentence, countText, failingText, shareText, whereText, yieldText } from '../../record/index.ts';
import type { JudgedSpread } from '../../record/index.ts';
import { formatRow, formatValue } from '../../quantity/index.ts';
import type { Unit, ValueKind } from '../../quantity/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import type { End, Mover, SheetSpread } from '../../spread/index.ts';

/** One end, and where it is. */
interface EndFact {
  readonly which: 'low' | 'high';
  readonly value: string;
  readonly where: string;
  /** Whether one can stand there. */
  readonly isPlace: boolean;
}

interface SpreadFacts {
  readonly ends: readonly EndFact[];
  /** Sentences on the builds. */
  readonly builds: readonly string[];
}

/** The facts of a value by its path; none where nothing moves it. */
export function valueFacts(
  path: string,
  kind: ValueKind,
  as: Unit | null,
  nominal: number,
  spread: SheetSpread,
): SpreadFacts {
  const found = spread.value(path);
  if (!found?.moves || found.isWord) return { ends: [], builds: [] };
  const row = formatRow({ low: found.low.value, nominal, high: found.high.value }, kind, { unit: as });
  const end = (which: 'low' | 'high', at: End, text: string | null): EndFact => ({
    which,
    value: text ?? (at.open.length > 0 ? `no limit: ${at.open.join(', ')} has an open end` : 'not solved there'),
    where: whereText(spread, at.where, 12),
    isPlace: at.where.length > 0,
  });
  const answered = answeredSentence(path, spread);
  const builds = answered === null ? [] : [answered];
  const { distribution } = found;
  if (distribution) {
    const text = (x: number): string => formatValue(x, kind, { unit: as }).text;
    builds.push(
      `Of ${countText(distribution.n)} builds at the nominal of service half lie below ${text(distribution.p50)}, 5 % below ${text(distribution.p05)} and 5 % above ${text(distribution.p95)}.`,
    );
    if (kind.scale === 'linear') builds.push(`Standard deviation ${text(distribution.sd)}.`);
  }
  return {
    ends: [end('low', found.low, row.low?.text ?? null), end('high', found.high, row.high?.text ?? null)],
    builds,
  };
}

/** What is said of a check beyond its nominal values. */
export function checkSentences(cell: CellReading, judged: JudgedSpread): string[] {
  const found = judged.spread.check(cell.name);
  if (!found || cell.check === null) return [];
  const sentences: string[] = [];
  if (cell.check.holds) {
    sentences.push(found.holds === true ? 'It holds at every extreme.' : `${cell.name} ${failingText(cell, judged)}.`);
  }
  if (found.yield) {
    sentences.push(
      `It holds in ${yieldText(found.yield)}; the interval is that of sampling alone, not of the assumed laws.`,
    );
  }
  const { drawn } = judged.spread.model;
  for (const { draw, thirds } of found.causes.slice(0, 3)) {
    const most = Math.max(...thirds);
    const third = ['lower', 'middle', 'upper'][thirds.indexOf(most)]!;
    sentences.push(
      `Of the builds that fail ${shareText(most)} have ${drawn[draw]!.name} in the ${third} third of its units.`,
    );
  }
  return sentences;
}

/** One line of what moves a value most. */
interface MoverRow {
  readonly name: string;
  readonly low: string;
  readonly high: string;
  readonly share: string;
}

/** The strongest movers as rows. */
export function moverRows(
  movers: readonly Mover[],
  kind: ValueKind,
  as: Unit | null,
  { model }: SheetSpread,
): MoverRow[] {
  return movers.slice(0, MOST_MOVERS).map(({ draw, atLow, atHigh, share }) => {
    const text = (x: number | null): string => (x === null ? 'no limit' : formatValue(x, kind, { unit: as }).text);
    return {
      name: model.drawn[draw]!.name,
      low: text(atLow),
      high: text(atHigh),
      share: share === null ? (model.drawn[draw]!.spread.service ? 'in use' : '–') : partText(share),
    };
  });
}

const MOST_MOVERS = 6;

/** A share that is an estimate, in whole per cent. */
function partText(share: number): string {
  return share < 0.005 ? 'below 1 %' : `${Math.round(share * 100)} %`;
}
