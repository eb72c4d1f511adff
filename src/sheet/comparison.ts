// Conditions: comparisons, `within`, and/or/not. A condition is 1 or 0 in the program.

import type { BinaryExpr, Expr, WithinExpr } from '../language/index.ts';
import type { Handle } from '../network/index.ts';
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
  if (left.type === 'region') {
    return { type: 'condition', handle: scope.builder.op('equal', left.handle, right.handle) };
  }
  const [a, b] = expr.operator.startsWith('<') ? [left.handle, right.handle] : [right.handle, left.handle];
  const holds = scope.builder.op(expr.operator.endsWith('=') ? 'lessOrEqual' : 'less', a, b);
  return { type: 'condition', handle: ofNumbers(holds, [a, b], scope) };
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
  const inside = builder.op(
    'and',
    builder.op('lessOrEqual', low, value.handle),
    builder.op('lessOrEqual', value.handle, high),
  );
  return { type: 'condition', handle: ofNumbers(inside, [value.handle, low, high], scope) };
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

/** A comparison that is no number itself where one of its sides is none: it neither holds nor fails. */
function ofNumbers(holds: Handle, sides: readonly Handle[], { builder }: Scope): Handle {
  const [first, ...others] = sides.map((side) => builder.op('equal', side, side));
  const known = others.reduce((all, one) => builder.op('and', all, one), first!);
  return builder.mul(holds, builder.div(known, known));
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
