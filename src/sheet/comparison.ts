// Conditions: comparisons, `within`, and/or/not. A condition is 1 or 0 in the program.

import type { BinaryExpr, Expr, WithinExpr } from '../language/index.ts';
import { advice } from './arithmetic.ts';
import type { Scope, Typed } from './scope.ts';
import { operandText } from './scope.ts';
import { stop } from './stop.ts';
import { isQuantity, sameType, typeName } from './value-type.ts';

/** Compiles a = b, a < b and the like; regions are compared with `=` alone. */
export function compileComparison(expr: BinaryExpr, scope: Scope): Typed {
  const left = scope.compile(expr.left);
  const right = scope.compile(expr.right);
  comparable(expr.left, left, expr.right, right, scope);
  if (left.type === 'region' && expr.operator !== '=') {
    stop('region-order', `A region is compared with =, such as A1.region = saturation.`, expr.operatorSpan);
  }
  if (isQuantity(left.type) && expr.operator === '=') {
    stop(
      'equality-of-numbers',
      `Computed numbers are hardly ever equal to the last digit. Write ${operandText(scope, expr.left.span, 'a')} within lo .. hi.`,
      expr.operatorSpan,
    );
  }
  const { builder } = scope;
  const type = 'condition';
  switch (expr.operator) {
    case '<':
      return { type, handle: builder.op('less', left.handle, right.handle) };
    case '<=':
      return { type, handle: builder.op('lessOrEqual', left.handle, right.handle) };
    case '>':
      return { type, handle: builder.op('less', right.handle, left.handle) };
    case '>=':
      return { type, handle: builder.op('lessOrEqual', right.handle, left.handle) };
    default:
      return { type, handle: builder.op('equal', left.handle, right.handle) };
  }
}

/** Compiles `a within lo .. hi`: both ends belong to the range, in either order. */
export function compileWithin(expr: WithinExpr, scope: Scope): Typed {
  const value = scope.compile(expr.value);
  const first = scope.compile(expr.low);
  const last = scope.compile(expr.high);
  comparable(expr.value, value, expr.low, first, scope);
  comparable(expr.value, value, expr.high, last, scope);
  if (!isQuantity(value.type)) {
    stop(
      'within-number',
      `within compares numbers; ${operandText(scope, expr.value.span, 'this')} is ${typeName(value.type)}.`,
      expr.value.span,
    );
  }
  const { builder } = scope;
  const low = builder.min(first.handle, last.handle);
  const high = builder.max(first.handle, last.handle);
  return {
    type: 'condition',
    handle: builder.op(
      'and',
      builder.op('lessOrEqual', low, value.handle),
      builder.op('lessOrEqual', value.handle, high),
    ),
  };
}

/** Compiles `a and b`, `a or b`. */
export function compileLogic(expr: BinaryExpr, scope: Scope): Typed {
  const operands = [expr.left, expr.right].map((side) => {
    const operand = scope.compile(side);
    if (operand.type !== 'condition') {
      stop(
        'condition-expected',
        `${expr.operator} joins conditions; ${operandText(scope, side.span, 'this')} is ${typeName(operand.type)}. Compare it with something, such as >= a limit.`,
        side.span,
      );
    }
    return operand.handle;
  });
  return {
    type: 'condition',
    handle: scope.builder.op(expr.operator === 'and' ? 'and' : 'or', operands[0]!, operands[1]!),
  };
}

function comparable(a: Expr, left: Typed, b: Expr, right: Typed, scope: Scope): void {
  if (sameType(left.type, right.type) && left.type !== 'condition') return;
  const x = operandText(scope, a.span, 'the left side');
  const y = operandText(scope, b.span, 'the right side');
  const hint = isQuantity(left.type) && isQuantity(right.type) ? advice(x, left.type, y, right.type) : '';
  stop(
    'compare-dimension',
    `${x} is ${typeName(left.type)} and ${y} is ${typeName(right.type)}: they cannot be compared.${hint}`,
    b.span,
  );
}
