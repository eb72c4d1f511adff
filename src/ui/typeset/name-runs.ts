// Names as runs of text: a quantity's letter italic with its subscript upright, a designator upright and whole.

import { typeset } from '../../figure/index.ts';
import type { Run } from '../../figure/index.ts';

/** A name or path (`V_DD`, `A1.I_D`); the cell that owns a value stands in the subscript unless it is `subject`. */
export function pathRuns(path: string, subject: string | null): readonly Run[] {
  const own = subject !== null && path.startsWith(`${subject}.`);
  return typeset(own ? path.slice(subject.length + 1) : path);
}
