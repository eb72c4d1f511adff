// A printed step as the sides of an equation.

import type { PrintedStep } from '../../record/index.ts';

export interface Side {
  readonly tex: string;
  /** The same in the language of the sheet. */
  readonly text: string;
}

interface Equation {
  /** null for a comparison without a name. */
  readonly left: Side | null;
  /** Formula, numbers in place, result; none of them twice. */
  readonly sides: readonly Side[];
  /** `holds`, `does not hold`; null where the step is no condition. */
  readonly verdict: string | null;
}

/** The sides of a step, in the order they are read. */
export function equationOf({ text, tex, isCondition }: PrintedStep): Equation {
  const left = text.left === null ? null : { text: text.left, tex: tex.left! };
  const formula = { text: text.formula, tex: tex.formula };
  const substitution = text.substitution === null ? [] : [{ text: text.substitution, tex: tex.substitution! }];
  if (isCondition) return { left, sides: [formula, ...substitution], verdict: text.result };
  const sides = [formula, ...substitution, { text: text.result, tex: tex.result }];
  return { left, sides: sides.filter((side, i) => side.text !== sides[i - 1]?.text), verdict: null };
}
