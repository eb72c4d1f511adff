// Workings of an inverse cell: both sides of its equation with the answer in place.

import { literalOf } from '../language/index.ts';
import type { Expr } from '../language/index.ts';
import { formatValue } from '../quantity/index.ts';
import type { Asked } from './answer-text.ts';
import type { Answers } from './answers.ts';
import type { Read } from './draft.ts';
import type { WorkingStep } from './model.ts';
import type { Scope, Typed } from './scope.ts';
import { operandName, operandsOf, readable } from './workings.ts';
import { isQuantity } from './value-type.ts';

/** A value that a formula names. */
interface Named extends Typed {
  readonly name: string;
}

/** The values that an expression names, each once. */
export function namedIn(expr: Expr, scope: Scope): Named[] {
  return operandsOf(expr).map((operand) => ({ name: operandName(operand), ...scope.compile(operand) }));
}

/** The answer is said to so many digits. */
const ANSWER_DIGITS = 5;

/** The steps; `at` reads the sheet turned to the answer. */
export function answerSteps(
  { entry, line, input, target, value }: Asked,
  { roots, low, high }: Answers,
  at: Read,
): WorkingStep[] {
  const asked = entry.input.names.map(({ name }) => name).join('.');
  const step = (expr: Expr, side: Asked['target'], sentence: string): WorkingStep => ({
    name: null,
    formula: line.text.slice(expr.span.start, expr.span.end).trim(),
    operands: side.named.map(({ name, type, handle }) => ({ name, type, value: readable(type, at(handle)), as: null })),
    type: side.type,
    value: at(side.handle),
    as: null,
    sentence,
  });
  const show = (x: number, digits: number): string =>
    isQuantity(input) ? formatValue(x, input, { digits, zeros: 'drop' }).text : String(x);
  const over = `${show(low, ANSWER_DIGITS)} and ${show(high, ANSWER_DIGITS)}`;
  const found = `Between ${over} there is one ${asked} for which both sides agree, ${show(roots[0]!, ANSWER_DIGITS)}. With it, the target is:`;
  const sides = [step(entry.target, target, found)];
  return literalOf(entry.value) ? sides : [...sides, step(entry.value, value, 'The value it is to have.')];
}
