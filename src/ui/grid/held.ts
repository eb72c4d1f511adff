// Which cells show values older than the text being typed: the one edited, and all that rest on it.

import type { SheetDocument } from '../document/index.ts';
import type { Editing } from './editor.ts';

/** Names of the cells that keep their last values while what is typed cannot be read. */
export function heldCells(document: SheetDocument, editing: Editing | null): ReadonlySet<string> {
  const found = new Set<string>();
  const first = editing?.place.row.cell ?? null;
  if (!document.held() || first === null) return found;
  const open = [first];
  for (let name = open.pop(); name !== undefined; name = open.pop()) {
    if (found.has(name)) continue;
    found.add(name);
    open.push(...(document.cell(name)?.usedBy ?? []));
  }
  return found;
}
