// Why an expression has no value: the innermost operation whose operands are numbers and whose result
// is none, named with what it was given.

import { formatValue } from '../quantity/index.ts';
import type { Expr, Line, Message } from '../language/index.ts';
import type { CellContext } from './draft.ts';
import { isQuantity } from './value-type.ts';

/** The message for an expression that came out as no number. */
export function diagnose(expr: Expr, context: CellContext, line: Line): Message {
  const culprit = innermost(expr, context, line);
  const given = new Set(
    operands(culprit)
      .filter((operand) => operand.type !== 'number')
      .map((operand) => {
        const { type, value } = context.now(operand, line);
        const shown = isQuantity(type) ? formatValue(value, type).text : String(value);
        return `${source(operand, line)} is ${shown}`;
      }),
  );
  const because = given.size > 0 ? `: ${[...given].join(' and ')}` : '';
  return {
    code: 'no-value',
    text: `${source(culprit, line)} has no value${because}. ${reason(culprit)}`,
    span: culprit.span,
  };
}

function innermost(expr: Expr, context: CellContext, line: Line): Expr {
  for (const operand of operands(expr)) {
    if (Number.isNaN(context.now(operand, line).value)) return innermost(operand, context, line);
  }
  return expr;
}

function operands(expr: Expr): readonly Expr[] {
  switch (expr.type) {
    case 'group':
      return [expr.inner];
    case 'unary':
      return [expr.operand];
    case 'binary':
      return [expr.left, expr.right];
    case 'call':
      return expr.args;
    case 'within':
      return [expr.value, expr.low, expr.high];
    case 'with':
      return [expr.value];
    default:
      return [];
  }
}

function reason(expr: Expr): string {
  if (expr.type === 'unary' && expr.operator === '√') return 'A square root wants a value that is not negative.';
  if (expr.type === 'call') {
    const { name } = expr.name;
    if (name === 'sqrt') return 'A square root wants a value that is not negative.';
    if (name === 'ln' || name === 'log10') return 'A logarithm wants a value that is not negative.';
    if (/^E\d/.test(name)) return 'A preferred value is that of a positive, finite amount.';
    if (name === 'sin' || name === 'cos' || name === 'tan') return 'The argument is not finite.';
  }
  if (expr.type === 'binary') {
    if (expr.operator === '^') return 'A negative base wants a whole exponent.';
    if (expr.operator === '*') return 'Nothing times infinite is no number.';
    if (expr.operator === '+' || expr.operator === '-') return 'Infinite less infinite is no number.';
    if (expr.operator === '/') return 'Nothing divided by nothing, or infinite by infinite, is no number.';
  }
  return 'What comes out is no number.';
}

function source(expr: Expr, line: Line): string {
  const text = line.text.slice(expr.span.start, expr.span.end).trim();
  return text.length <= 40 ? text : 'This expression';
}
