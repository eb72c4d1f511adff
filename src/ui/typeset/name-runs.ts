// Names as runs of text: a quantity's letter italic with its subscript upright, a designator upright and whole.

import { typeset } from '../../figure/index.ts';
import type { Run } from '../../figure/index.ts';

/** A name or path (`V_DD`, `A1.I_D`); the cell that owns a value stands in the subscript unless it is `subject`. */
export function pathRuns(path: string, subject: string | null): readonly Run[] {
  const names = path.split('.');
  const last = names[names.length - 1]!;
  const owners = names.slice(names.length > 1 && names[0] === subject ? 1 : 0, -1);
  const runs = typeset(last);
  if (owners.length === 0) return runs;
  const [first, second] = runs;
  const subscript = [...(second ? [second.text] : []), owners.join('.')].join(', ');
  return [first!, { text: subscript, style: 'subscript' }];
}
