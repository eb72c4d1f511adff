// Spreads that reach across 0: impossible for a component, odd for anything else with a tolerance in percent.

import type { Line, QuantityEntry } from '../language/index.ts';
import { CAPACITANCE, INDUCTANCE, RESISTANCE, formatValue, sameKind } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Placed } from './draft.ts';
import type { DeclaredSpread } from './model.ts';
import { typeName } from './value-type.ts';

const COMPONENTS: readonly ValueKind[] = [RESISTANCE, CAPACITANCE, INDUCTANCE];

/** The end of a spread that lies beyond 0 from its nominal, in SI; null where none does. A tolerance may not even reach 0. */
function beyondZero({ form, low, nominal, high }: DeclaredSpread): number | null {
  const end = nominal > 0 ? low : high;
  if (end === null || nominal === 0) return null;
  const reach = end * Math.sign(nominal);
  return reach < 0 || (reach === 0 && form === 'tolerance') ? end : null;
}

/** The fault of a component whose spread reaches beyond 0; null for other quantities. */
export function limitSignFault(
  name: string,
  kind: ValueKind,
  spread: DeclaredSpread,
  entry: QuantityEntry,
  line: Line,
): Placed | null {
  const end = COMPONENTS.some((component) => sameKind(component, kind)) ? beyondZero(spread) : null;
  if (end === null) return null;
  const shown = formatValue(end, kind, { zeros: 'drop' }).text;
  const [where, right] =
    spread.form === 'tolerance'
      ? ['within its tolerance', 'Write a tolerance below 100 %, or its limits, with in low .. high.']
      : ['at a limit', 'Write limits on one side of 0.'];
  const text = `${name} reaches ${shown} ${where}, and ${typeName(kind)} does not change its sign. ${right}`;
  return { line, message: { code: 'limit-sign', text, span: entry.spread!.span } };
}

/** What is said of a tolerance of 100 % and more, within which the value changes its sign. */
export function limitSignCautions(
  name: string,
  kind: ValueKind,
  spread: DeclaredSpread,
  entry: QuantityEntry,
): string[] {
  const symbol = entry.spread?.tolerance?.unit?.symbol;
  if ((symbol !== '%' && symbol !== 'ppm') || beyondZero(spread) === null) return [];
  const [low, high] = [spread.low!, spread.high!].map((end) => formatValue(end, kind, { zeros: 'drop' }).text);
  return [`${name} goes from ${low} to ${high}: a tolerance of 100 % and more reaches 0 or beyond.`];
}
