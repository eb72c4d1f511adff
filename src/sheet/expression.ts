// Compiles an expression: settles its dimension and emits its operations in one walk.
//
// Nothing runs here. A wrong dimension stops with a message that names both operands and both
// dimensions, so no number is ever computed from a line that does not make sense.

import type { Expr } from '../language/index.ts';
import { compileBinary, compileUnary } from './arithmetic.ts';
import { compileComparison, compileLogic, compileWithin } from './comparison.ts';
import { compileCall } from './functions.ts';
import type { Scope, Typed } from './scope.ts';
import { operandText } from './scope.ts';
import { stop } from './stop.ts';
import { sameType, typeName } from './value-type.ts';

/** Compiles `expr` in `scope`; stops with a message where its dimensions do not fit. */
export function compileExpression(expr: Expr, scope: Scope): Typed {
  switch (expr.type) {
    case 'number':
      return { type: expr.kind, handle: scope.builder.constant(expr.value) };
    case 'path':
      return scope.resolve(expr);
    case 'group':
      return scope.compile(expr.inner);
    case 'call':
      return compileCall(expr, scope);
    case 'unary':
      return compileUnary(expr, scope);
    case 'within':
      return compileWithin(expr, scope);
    case 'with': {
      const input = scope.resolve(expr.input);
      const setting = scope.compile(expr.setting);
      if (!sameType(input.type, setting.type)) {
        const name = operandText(scope, expr.input.span, 'The input');
        stop(
          'with-dimension',
          `${name} is ${typeName(input.type)} and ${operandText(scope, expr.setting.span, 'the setting')} is ${typeName(setting.type)}. Set ${name} to ${typeName(input.type)}.`,
          expr.setting.span,
        );
      }
      if (scope.restated) return scope.restated(expr.input, setting.handle).compile(expr.value);
      scope.later('A value in another state', expr.span);
      return { type: scope.compile(expr.value).type, handle: scope.builder.constant(NaN) };
    }
    case 'binary':
      switch (expr.operator) {
        case 'and':
        case 'or':
          return compileLogic(expr, scope);
        case '=':
        case '<':
        case '>':
        case '<=':
        case '>=':
          return compileComparison(expr, scope);
        default:
          return compileBinary(expr, scope);
      }
  }
}
