// Operands that have to be of a certain kind.

import { PLAIN } from '../quantity/index.ts';
import type { Expr } from '../language/index.ts';
import type { Scope, Typed } from './scope.ts';
import { operandText } from './scope.ts';
import { stop } from './stop.ts';
import { isQuantity, sameType, typeName } from './value-type.ts';

/** Compiles an expression that must yield a quantity. */
export function compileQuantity(expr: Expr, scope: Scope): Typed & { type: Exclude<Typed['type'], string> } {
  const result = scope.compile(expr);
  if (!isQuantity(result.type)) {
    stop(
      'quantity-expected',
      `${operandText(scope, expr.span, 'This')} is ${typeName(result.type)}; a quantity is expected here. Conditions belong into a check or into if(condition, a, b).`,
      expr.span,
    );
  }
  return { type: result.type, handle: result.handle };
}

/** Compiles an expression that must be a plain number (an argument of exp, an exponent of a plain base). */
export function compilePlain(expr: Expr, scope: Scope, what: string): Typed {
  const result = compileQuantity(expr, scope);
  if (!sameType(result.type, PLAIN)) {
    stop(
      'plain-expected',
      `${what} is a plain number; ${operandText(scope, expr.span, 'this')} is ${typeName(result.type)}. Divide it by a quantity of the same kind.`,
      expr.span,
    );
  }
  return result;
}
