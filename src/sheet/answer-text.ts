// What is said of an inverse cell that has no answer, or more than one.

import type { Expr, InverseEntry, Line } from '../language/index.ts';
import { formatValue } from '../quantity/index.ts';
import type { Handle } from '../network/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { ValueType } from './model.ts';
import type { Answers } from './answers.ts';
import { isQuantity } from './value-type.ts';

/** One side of what is asked, and the values that it names. */
interface AskedSide {
  readonly type: ValueKind;
  readonly handle: Handle;
  readonly named: readonly { readonly name: string; readonly type: ValueType; readonly handle: Handle }[];
}

/** An inverse cell as it was compiled. */
export interface Asked {
  readonly entry: InverseEntry;
  readonly line: Line;
  /** What it asks for. */
  readonly input: ValueType;
  readonly target: AskedSide;
  readonly value: AskedSide;
}

/** Answers that are named at most. */
const MOST_NAMED = 5;

/** Why there is no value; null where there is just one answer. `wanted` is the value of the target that was asked for, at both ends. */
export function answerText(
  { obstacle, roots, jumps, atFirst, atLast, isConstant, low, high }: Answers,
  { entry, line, input, target }: Asked,
  wanted: number,
): { code: string; text: string } | null {
  const written = (expr: Expr): string => line.text.slice(expr.span.start, expr.span.end).trim();
  const show = (value: number, type: ValueType = input): string =>
    isQuantity(type) ? formatValue(value, type, { zeros: 'drop' }).text : String(value);
  const range = `from ${show(low)} to ${show(high)}`;
  const [name, goal] = [written(entry.input), written(entry.target)];
  const asked = show(wanted, target.type);
  if (obstacle === 'range')
    return {
      code: 'inverse-range',
      text: `The range of ${name} goes ${range}. Give it two ends that differ and are finite, such as over 100 ohm .. 10 kohm.`,
    };
  if (obstacle === 'depth')
    return {
      code: 'inverse-depth',
      text: `More than three inverse cells stand in each other here. Put the answer of one of them into its input, and ask from there.`,
    };
  if (isConstant && atFirst === atFirst)
    return {
      code: 'inverse-independent',
      text: `${goal} does not depend on ${name}: it is ${show(atFirst + wanted, target.type)} ${range}.`,
    };
  if (roots.length > 1) {
    const named = roots.slice(0, MOST_NAMED).map((root) => show(root));
    const all = `${named.slice(0, -1).join(', ')} and ${named.at(-1)}${roots.length > MOST_NAMED ? ' among others' : ''}`;
    return {
      code: 'several-answers',
      text: `${goal} is ${asked} at ${roots.length} values of ${name} ${range}: ${all}. Narrow the range to the one that is meant.`,
    };
  }
  if (roots.length === 1) return null;
  if (jumps.length > 0)
    return {
      code: 'no-answer',
      text: `No ${name} ${range} gives ${asked}: ${goal} jumps over it at ${show(jumps[0]!)}.`,
    };
  const [first, last] = [atFirst, atLast].map((residual) => residual + wanted);
  const known = (value: number): string => (value === value ? show(value, target.type) : 'no value');
  return {
    code: 'no-answer',
    text:
      first !== first && last !== last
        ? `No ${name} ${range} gives ${asked}: ${goal} has no value at either end of that range.`
        : `No ${name} ${range} gives ${asked}: ${goal} goes from ${known(first!)} to ${known(last!)} over that range.`,
  };
}
