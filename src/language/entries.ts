// The kinds of cells in one table. The first whose head fits reads the entry; a quantity is what no other claims.

import { ANOTHER } from './another-entry.ts';
import { BENCH } from './bench-entry.ts';
import { CHECK } from './check-entry.ts';
import type { EntryKind } from './entry-kind.ts';
import { INVERSE } from './inverse-entry.ts';
import { PART } from './part-entry.ts';
import { PLOT } from './plot-entry.ts';
import { POINT } from './point-entry.ts';
import { QUANTITY } from './quantity-entry.ts';
import { STAGE } from './stage-entry.ts';

const KINDS: readonly EntryKind[] = [PART, ANOTHER, POINT, STAGE, BENCH, CHECK, PLOT, INVERSE, QUANTITY];

/** The kind that the text of an entry is meant to be. */
export function kindOfEntry(body: string): EntryKind {
  return KINDS.find((kind) => kind.starts(body))!;
}

const BY_TYPE = new Map(KINDS.map((kind) => [kind.type, kind]));

/** The kind of an entry that was read. */
export function kindOfType(type: EntryKind['type']): EntryKind {
  return BY_TYPE.get(type)!;
}
