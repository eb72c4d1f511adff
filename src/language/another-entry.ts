// another = "another" name ;   a further piece of the same kind, with draws of its own.

import { beginsWith } from './entry-kind.ts';
import type { EntryKind } from './entry-kind.ts';
import type { Reader } from './reader.ts';
import type { AnotherEntry } from './syntax.ts';

export const ANOTHER: EntryKind = {
  type: 'another',
  starts: beginsWith('another'),
  read: readAnother,
  fields: null,
};

function readAnother(reader: Reader): AnotherEntry {
  const { start } = reader.take();
  const of = reader.takeName('The name of the cell to repeat', 'another R_Da');
  reader.expectNothing();
  return { type: 'another', of, span: reader.spanFrom(start) };
}
