// Test conditions behind `at`: read for the rows of parts, kept as text behind a plain quantity.

import { nearestNames } from '../language/index.ts';
import type { Line, QuantityEntry } from '../language/index.ts';
import { sameKind } from '../quantity/index.ts';
import { CONDITION_KINDS } from './part-fields.ts';
import { stop } from './stop.ts';
import { typeName } from './value-type.ts';

/** The conditions of a part's row by name, in SI; stops at one that is unknown, doubled or of the wrong kind. */
export function conditionsOf(entry: QuantityEntry, line: Line): Map<string, number> {
  const found = new Map<string, number>();
  for (const { name, literal } of entry.conditions) {
    const kind = Object.hasOwn(CONDITION_KINDS, name.name) ? CONDITION_KINDS[name.name] : undefined;
    if (!kind) {
      const near = nearestNames(name.name, Object.keys(CONDITION_KINDS));
      stop(
        'unknown-condition',
        `${name.name} is no test condition.${near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : ` Conditions are ${Object.keys(CONDITION_KINDS).join(', ')}.`}`,
        name.span,
        line,
      );
    }
    if (!sameKind(kind, literal.kind)) {
      stop(
        'condition-dimension',
        `${name.name} is ${typeName(kind)}; ${line.text.slice(literal.span.start, literal.span.end)} is ${typeName(literal.kind)}.`,
        literal.span,
        line,
      );
    }
    if (found.has(name.name))
      stop('condition-twice', `${name.name} stands twice behind at. Keep one.`, name.span, line);
    found.set(name.name, literal.value);
  }
  return found;
}

/** What is said of conditions behind a plain quantity that the sheet does not know. */
export function conditionCautions(entry: QuantityEntry): string[] {
  return entry.conditions
    .filter(({ name }) => !Object.hasOwn(CONDITION_KINDS, name.name))
    .map(
      ({ name }) =>
        `${name.name} is no test condition that the sheet knows, which are ${Object.keys(CONDITION_KINDS).join(', ')}. It is kept as text and changes nothing.`,
    );
}
