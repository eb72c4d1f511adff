// Workings of an expression: the formula as the author wrote it and the values of its operands.

import { partsOf, printExpr } from '../language/index.ts';
import type { CallExpr, Expr, Line, PathExpr, WithExpr } from '../language/index.ts';
import type { Unit } from '../quantity/index.ts';
import type { CellContext } from './draft.ts';
import type { ValueType, WorkingStep } from './model.ts';
import { REGIONS } from '../network/index.ts';

/** One step: `name = expr` with what stands in for each path, and the result. */
export function expressionStep(
  name: string,
  expr: Expr,
  line: Line,
  type: ValueType,
  value: number,
  as: Unit | null,
  context: CellContext,
): WorkingStep {
  const operands = operandsOf(expr).map((operand) => {
    const now = context.now(operand, line);
    return { name: operandName(operand), type: now.type, value: readable(now.type, now.value), as: null };
  });
  return {
    name,
    formula: line.text.slice(expr.span.start, expr.span.end),
    operands,
    type,
    value: readable(type, value),
    as,
    sentence: '',
  };
}

/** What a formula takes as a number from elsewhere. */
type Operand = PathExpr | CallExpr | WithExpr;

/** Whether a part speaks of other builds or of another state than that in which the formula stands: its value is not that of its operands. */
export function isOwnState(expr: Expr): expr is CallExpr | WithExpr {
  return expr.type === 'with' || (expr.type === 'call' && OTHER_BUILDS.has(expr.name.name));
}

const OTHER_BUILDS: ReadonlySet<string> = new Set(['low', 'high', 'nominal']);

/** The operands of a formula, each once, in the order written. */
export function operandsOf(expr: Expr): readonly Operand[] {
  const found = new Map<string, Operand>();
  const visit = (part: Expr): void => {
    if (part.type !== 'path' && !isOwnState(part)) return partsOf(part).forEach(visit);
    const name = operandName(part);
    if (!(REGIONS as readonly string[]).includes(name) && !found.has(name)) found.set(name, part);
  };
  visit(expr);
  return [...found.values()];
}

/** How a formula's operand is known: a path as its names, anything else as it is printed. */
export function operandName(operand: Operand): string {
  return operand.type === 'path' ? operand.names.map(({ name }) => name).join('.') : printExpr(operand);
}

/** A slot's number as it is read: the word of a region, true or false of a condition. */
export function readable<T extends ValueType>(type: T, value: number): number | string;
export function readable(type: ValueType, value: number): number | string | boolean {
  if (type === 'region') return REGIONS[value] ?? 'unknown';
  if (type === 'condition') return value === 1;
  return value;
}
