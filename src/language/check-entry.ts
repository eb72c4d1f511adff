// check = "check" expr ;

import { beginsWith } from './entry-kind.ts';
import type { EntryKind } from './entry-kind.ts';
import { readExpression } from './expression.ts';
import type { Reader } from './reader.ts';
import type { CheckEntry } from './syntax.ts';

export const CHECK: EntryKind = { type: 'check', starts: beginsWith('check'), read: readCheck, fields: null };

function readCheck(reader: Reader): CheckEntry {
  const { start } = reader.take();
  const condition = readExpression(reader);
  reader.expectEnd();
  return { type: 'check', condition, span: reader.spanFrom(start) };
}
