// A bench: measured points of specimens. Reading and fitting them is not computed yet.

import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft } from '../draft.ts';

/** Checks a bench cell. */
export function compileBenchCell(context: CellContext): Draft {
  context.later('A bench', context.tree.entry.span, context.tree.line);
  return EMPTY_DRAFT;
}
