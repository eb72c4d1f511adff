// part = ("n-"|"p-") ("JFET"|"MOSFET") [ "fitted" "to" name ] ;   its fields are quantities.

import type { EntryKind } from './entry-kind.ts';
import { halt } from './messages.ts';
import { readQuantityField } from './quantity-entry.ts';
import type { Reader } from './reader.ts';
import type { NameRef, PartEntry } from './syntax.ts';

/** The four kinds and what is written for them elsewhere: in any case, without hyphen, without channel. */
const HEAD = /^(?:(n|p)[ -]*)?(?:ch(?:annel)?[ -]*)?(J|MOS)-?FET(?![A-Za-z0-9_.])/i;
const FAMILIES = { J: 'JFET', MOS: 'MOSFET' } as const;

/** `n-JFET`, `p-JFET`, `n-MOSFET`, `p-MOSFET`. */
export const PART: EntryKind = {
  type: 'part',
  starts: (body) => HEAD.test(body),
  read: readPart,
  fields: { read: readQuantityField, rows: false },
};

function readPart(reader: Reader): PartEntry {
  const start = reader.position;
  const [written, letter, stem] = HEAD.exec(reader.text.slice(start, reader.limit))!;
  const family = FAMILIES[stem.toUpperCase() as 'J' | 'MOS'];
  const channel = letter?.toLowerCase() === 'p' ? 'p' : 'n';
  const end = start + written.length;
  if (written !== `${channel}-${family}`)
    halt('part-spelling', { start, end }, written, letter ? `${channel}-${family}` : `n-${family} or p-${family}`);
  reader.jump({ start, end });
  const fittedTo = reader.takeWord('fitted') ? readBenchName(reader) : null;
  reader.expectNothing();
  return { type: 'part', channel, family, fittedTo, span: reader.spanFrom(start) };
}

function readBenchName(reader: Reader): NameRef {
  const example = 'n-JFET fitted to M1';
  if (!reader.takeWord('to')) halt('name-missing', reader.ahead, 'The word to', example);
  return reader.takeName('The name of a bench', example);
}
