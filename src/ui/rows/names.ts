// Names of rows: as written, as set, and as read aloud.

import type { NameRef } from '../../language/index.ts';
import type { RowName } from './row.ts';

/** The name of a cell. */
export function cellName(written: string): RowName {
  return { text: written, isName: true, said: written };
}

/** A name inside a block: a field of a part, a place of a stage, an offered value. */
export function innerName(written: string, owner: string): RowName {
  return { text: written, isName: true, said: `${written}, of ${owner}` };
}

/** A word that stands as it is. */
export function wordName(text: string, said = text): RowName {
  return { text, isName: false, said };
}

/** The label of a field as a key and for readers: `Qa.gate`. */
export function labelText(label: readonly NameRef[]): string {
  return label.map((part) => part.name).join('.');
}
