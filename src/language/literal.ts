// Signed numbers: literal = ["+"|"-"] number ;

import { halt } from './messages.ts';
import { checkedValue } from './number.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { Expr, Literal } from './syntax.ts';

/** Whether a signed number may begin at the next token. */
export function atLiteral(reader: Reader): boolean {
  return reader.ahead.type === 'number' || reader.atSign('+') || reader.atSign('-');
}

/** Reads a signed number; leaves with a message where none stands. */
export function readLiteral(reader: Reader): Literal {
  const { start } = reader.ahead;
  const negative = reader.atSign('-');
  if (negative || reader.atSign('+')) reader.take();
  const { ahead } = reader;
  if (ahead.type === 'end') halt('operand-missing', spanOf(ahead), `The place behind ${reader.textOf(reader.last)}`);
  if (ahead.type !== 'number') halt('limit-not-literal', spanOf(ahead), reader.textOf(ahead));
  reader.take();
  const span = reader.spanFrom(start);
  const { unit, kind, numeral } = ahead;
  const point = negative && kind.scale === 'celsius';
  const value = point ? checkedValue(`-${numeral}`, unit, span) : negative ? -ahead.value : ahead.value;
  return { value, unit, kind, span };
}

/** The signed number that an expression is, or null where it is more: `-2 V`, not `-(2 V)` or `2 * 1 V`. */
export function literalOf(expr: Expr): Literal | null {
  if (expr.type === 'number') return { value: expr.value, unit: expr.unit, kind: expr.kind, span: expr.span };
  if (expr.type !== 'unary' || expr.operand.type !== 'number' || expr.operand.kind.scale === 'celsius') return null;
  if (expr.operator !== '+' && expr.operator !== '-') return null;
  const { value, unit, kind } = expr.operand;
  return { value: expr.operator === '-' ? -value : value, unit, kind, span: expr.span };
}
