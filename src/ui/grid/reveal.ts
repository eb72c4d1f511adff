// Opening what hides a row that is to be seen.

import type { SheetTree } from '../../language/index.ts';
import type { SheetRows } from '../rows/index.ts';
import type { Folds } from '../session/index.ts';

/** Unfolds the section, the block and the part of it that a row stands in; nothing where it is seen. */
export function reveal(key: string, tree: SheetTree, model: SheetRows, folds: Folds): void {
  if (model.row(key)) return;
  const cell = /^(?:cell|value|field|row):([^.#]*)/.exec(key)?.[1];
  const line = tree.cells.find((each) => each.name.name === cell)?.line.index;
  if (cell === undefined || line === undefined) return;
  const heading = tree.lines.findLast((each) => each.tree.type === 'heading' && each.index < line)?.tree;
  folds.set([`section:${heading?.type === 'heading' ? heading.text : ''}`, `block:cell:${cell}`], false);
  if (key.startsWith('value')) folds.set([`more:${cell}`], false);
  if (key.startsWith('row')) folds.set([`readings:${cell}`], false);
  if (key.startsWith('field')) folds.set([`wiring:${cell}`], false);
}
