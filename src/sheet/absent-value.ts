// Why an offered value has no number: not computed yet, or the sheet does not say what it takes.

import type { Message, Span } from '../language/index.ts';

/** The message of a value that has none; `reason` is a whole sentence of the network's. */
export function absentValue(reason: string, span: Span): Message {
  return { code: reason.endsWith(' is not computed yet.') ? 'not-computed-yet' : 'value-absent', text: reason, span };
}
