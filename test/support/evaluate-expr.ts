// Evaluates an expression of the sheet language with given values for its names: arithmetic alone.

import { parseExpression } from '../../src/language/index.ts';
import type { Expr } from '../../src/language/index.ts';

/** The SI value of `text`; throws where it does not parse or names something that `values` lacks. */
export function evaluateText(text: string, values: ReadonlyMap<string, number>): number {
  const parsed = parseExpression(text);
  if ('code' in parsed) throw new Error(`${text}: ${parsed.text}`);
  return evaluate(parsed, values);
}

function evaluate(expr: Expr, values: ReadonlyMap<string, number>): number {
  switch (expr.type) {
    case 'number':
      return expr.value;
    case 'group':
      return evaluate(expr.inner, values);
    case 'path': {
      const name = expr.names.map((part) => part.name).join('.');
      const value = values.get(name);
      if (value === undefined) throw new Error(`no value for ${name}`);
      return value;
    }
    case 'unary': {
      const x = evaluate(expr.operand, values);
      return expr.operator === '-' ? -x : expr.operator === '√' ? Math.sqrt(x) : x;
    }
    case 'call': {
      const args = expr.args.map((arg) => evaluate(arg, values));
      const functions: Record<string, (...x: number[]) => number> = {
        sqrt: Math.sqrt,
        abs: Math.abs,
        min: Math.min,
        max: Math.max,
      };
      return functions[expr.name.name](...args);
    }
    case 'binary': {
      const x = evaluate(expr.left, values);
      const y = evaluate(expr.right, values);
      switch (expr.operator) {
        case '+':
          return x + y;
        case '-':
          return x - y;
        case '*':
          return x * y;
        case '/':
          return x / y;
        case '||':
          return (x * y) / (x + y);
        case '^':
          return x ** y;
        default:
          throw new Error(`operator ${expr.operator}`);
      }
    }
    default:
      throw new Error(`expression ${expr.type}`);
  }
}
