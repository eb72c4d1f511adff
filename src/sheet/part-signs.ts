// Which sign a field wants on each channel, and what to say when it has the other.

import type { PartEntry } from '../language/index.ts';
import { formatValue } from '../quantity/index.ts';
import { wantedSign } from '../fet/index.ts';
import type { GivenField } from './part-given.ts';
import type { Placed, Read } from './draft.ts';

/** The fault of a field whose value, or one of whose limits, has the wrong sign or is not a number; null where all is well. */
export function signFault(entry: PartEntry, channel: 1 | -1, field: GivenField, read: Read): Placed | null {
  const { line, body } = field.tree;
  const value = read(field.handle);
  const place = (code: string, text: string): Placed => ({ line, message: { code, text, span: body.span } });
  if (!Number.isFinite(value)) return place('field-value', `${field.name} is not a finite number here.`);
  const wanted = wantedSign(field.name, entry.family, channel);
  if (wanted === 'any') return null;
  const spread = field.quantity.spread?.(read);
  const wrong = [value, spread?.low ?? value, spread?.high ?? value].find((x) =>
    wanted === 'positive' ? x <= 0 : wanted === 'negative' ? x >= 0 : x < 0,
  );
  if (wrong === undefined) return null;
  const kind = `${entry.channel === 'n' ? 'an n' : 'a p'}-${entry.family}`;
  const shown = formatValue(wrong, field.kind, { zeros: 'drop' }).text;
  const word = wanted === 'not negative' ? 'not negative' : wanted;
  if (wrong === 0) return place('field-sign', `${field.name} of ${kind} is ${word}; 0 will not do.`);
  const mended = formatValue(-wrong, field.kind, { zeros: 'drop' }).text;
  return place('field-sign', `${field.name} of ${kind} is ${word}. You wrote ${shown}; did you mean ${mended}?`);
}
