// Names of rows: as written, as set, and as read aloud.

import type { NameRef } from '../../language/index.ts';
import { texOfName, texOfPath } from '../../record/index.ts';
import type { RowName } from './row.ts';

/** The name of a cell. */
export function cellName(written: string, canonical: string): RowName {
  return { text: written, tex: texOfName(canonical), said: written };
}

/** A name inside a block: a field of a part, a place of a stage, an offered value. */
export function innerName(written: string, names: readonly string[], owner: string): RowName {
  return { text: written, tex: texOfPath(names, null), said: `${written}, of ${owner}` };
}

/** A word that stands as it is. */
export function wordName(text: string, said = text): RowName {
  return { text, tex: null, said };
}

/** The label of a field as a key and for readers: `Qa.gate`. */
export function labelText(label: readonly NameRef[]): string {
  return label.map((part) => part.name).join('.');
}
