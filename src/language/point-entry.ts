// point = "point" "of" name ;   its fields are quantities.

import { beginsWith } from './entry-kind.ts';
import type { EntryKind } from './entry-kind.ts';
import { halt } from './messages.ts';
import { readQuantityField } from './quantity-entry.ts';
import type { Reader } from './reader.ts';
import type { PointEntry } from './syntax.ts';

export const POINT: EntryKind = {
  type: 'point',
  starts: beginsWith('point'),
  read: readPoint,
  fields: { read: readQuantityField, rows: false },
};

function readPoint(reader: Reader): PointEntry {
  const { start } = reader.take();
  if (!reader.takeWord('of')) halt('name-missing', reader.ahead, 'The word of', 'point of Q1');
  const of = reader.takeName('The name of a part', 'point of Q1');
  reader.expectNothing();
  return { type: 'point', of, span: reader.spanFrom(start) };
}
