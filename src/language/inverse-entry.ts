// inverse = sum "such" "that" sum "=" sum "over" range [ "each" ] ;   the first sum is a path to an input.

import type { EntryKind } from './entry-kind.ts';
import { readSum } from './expression.ts';
import { halt } from './messages.ts';
import { readOver } from './range.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { InverseEntry } from './syntax.ts';

export const INVERSE: EntryKind = {
  type: 'inverse',
  starts: (body) => /(?<![A-Za-z0-9_.])such(?![A-Za-z0-9_.])/.test(body),
  read: readInverse,
  fields: null,
};

function readInverse(reader: Reader): InverseEntry {
  const { start } = reader.ahead;
  if (reader.atWord('such')) halt('inverse-form', spanOf(reader.ahead));
  const input = readSum(reader);
  if (!reader.takeWord('such') || !reader.takeWord('that')) halt('inverse-form', spanOf(reader.ahead));
  if (input.type !== 'path') halt('inverse-input', input.span, reader.textOf(input.span));
  const target = readSum(reader);
  if (!reader.takeSign('=')) refuseRest(reader);
  const value = readSum(reader);
  if (!reader.atWord('over')) refuseRest(reader);
  const over = readOver(reader);
  if (over.log) halt('log-misplaced', spanOf(reader.last));
  const each = reader.takeWord('each') !== null;
  reader.expectEnd();
  return { type: 'inverse', input, target, value, over, each, span: reader.spanFrom(start) };
}

function refuseRest(reader: Reader): never {
  if (reader.ahead.type === 'number') reader.refuse();
  return halt('inverse-form', spanOf(reader.ahead));
}
