// Where in the declared set something happens, in words: `low device of Q1, V_DD 17.2 V, T_A −40 °C`.

import { formatValue } from '../quantity/index.ts';
import type { SheetSpread, StandingDraw } from '../spread/index.ts';

/** Draws of values that are told apart; further ones are counted. */
const MOST_NAMES = 4;

/** The place in words; '' where everything stands at its nominal. */
export function whereText(spread: SheetSpread, where: readonly StandingDraw[], most = MOST_NAMES): string {
  const { drawn } = spread.model;
  const told: string[] = [];
  let rest = where;
  for (const { part, low, high } of spread.report.devices) {
    const ofPart = rest.filter(({ draw }) => drawn[draw]!.cell === part);
    const device =
      ofPart.length === 0 ? null : sameDraws(ofPart, low.where) ? 'low' : sameDraws(ofPart, high.where) ? 'high' : null;
    if (device === null) continue;
    told.push(`${device} device of ${part}`);
    rest = rest.filter((each) => !ofPart.includes(each));
  }
  const named = rest.map(({ draw, value }) => `${drawn[draw]!.name} ${formatValue(value, drawn[draw]!.type).text}`);
  const room = Math.max(0, most - told.length);
  const left = named.length - room;
  return [...told, ...named.slice(0, room), ...(left > 0 ? [`${left} more`] : [])].join(', ');
}

function sameDraws(a: readonly StandingDraw[], b: readonly StandingDraw[]): boolean {
  return a.length === b.length && a.every(({ draw, t }) => b.some((other) => other.draw === draw && other.t === t));
}
