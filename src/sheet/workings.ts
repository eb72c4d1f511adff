// Workings of an expression: the formula as the author wrote it and the values of its operands.

import { pathsOf } from '../language/index.ts';
import type { Expr, Line } from '../language/index.ts';
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
  const operands = new Map<string, WorkingStep['operands'][number]>();
  for (const path of pathsOf(expr)) {
    const operandName = path.names.map((part) => part.name).join('.');
    if (operands.has(operandName) || (REGIONS as readonly string[]).includes(operandName)) continue;
    const now = context.now(path, line);
    operands.set(operandName, { name: operandName, type: now.type, value: readable(now.type, now.value), as: null });
  }
  return {
    name,
    formula: line.text.slice(expr.span.start, expr.span.end),
    operands: [...operands.values()],
    type,
    value: readable(type, value),
    as,
    sentence: '',
  };
}

/** A slot's number as it is read: the word of a region, true or false of a condition. */
export function readable<T extends ValueType>(type: T, value: number): number | string;
export function readable(type: ValueType, value: number): number | string | boolean {
  if (type === 'region') return REGIONS[value] ?? 'unknown';
  if (type === 'condition') return value === 1;
  return value;
}
