// What the language knows of one kind of cell; entries.ts joins the kinds in one table.

import type { Reader } from './reader.ts';
import type { Entry, FieldBody, NameRef } from './syntax.ts';

/** Reads the body of the field with this label, to its end. */
export type FieldBodyReader = (reader: Reader, label: readonly NameRef[]) => FieldBody;

export interface EntryKind {
  readonly type: Exclude<Entry['type'], 'broken'>;
  /** Whether the text of an entry is meant to be of this kind, however badly it is written. */
  readonly starts: (body: string) => boolean;
  /** Reads the whole entry, to the end of the body. */
  readonly read: (reader: Reader) => Entry;
  /** How the indented lines below are read; null where the kind takes none. */
  readonly fields: { readonly read: FieldBodyReader; readonly rows: boolean } | null;
}

/** Whether a text begins with this word. */
export function beginsWith(word: string): (body: string) => boolean {
  const pattern = new RegExp(`^${word}(?![A-Za-z0-9_.])`);
  return (body) => pattern.test(body);
}
