// Expressions as canonical text: ASCII operators with blanks around, names by their Latin spelling, units
// as written. Parsing the text gives the same tree, spans apart. Parentheses are written where the author
// wrote them, and where a tree that was not parsed needs them.

import { numeralOf } from './numeral.ts';
import type { BinaryOperator, Expr, NumberExpr } from './syntax.ts';

// The rungs of the grammar's ladder, from `expr` to `primary`.
const RUNGS = ['or', 'and', 'not', 'relation', 'state', 'sum', 'product', 'signed', 'power', 'primary'] as const;
type Rung = (typeof RUNGS)[number];

const RELATION: readonly [Rung, Rung, Rung] = ['relation', 'state', 'state'];

/** For each operator its own rung and those that its operands have to reach. */
const BINARY: Readonly<Record<BinaryOperator, readonly [own: Rung, left: Rung, right: Rung]>> = {
  or: ['or', 'or', 'and'],
  and: ['and', 'and', 'not'],
  '=': RELATION,
  '<': RELATION,
  '>': RELATION,
  '<=': RELATION,
  '>=': RELATION,
  '+': ['sum', 'sum', 'product'],
  '-': ['sum', 'sum', 'product'],
  '*': ['product', 'product', 'signed'],
  '/': ['product', 'product', 'signed'],
  '||': ['product', 'product', 'signed'],
  '^': ['power', 'primary', 'signed'],
};

/** The canonical text of an expression. */
export function printExpr(expr: Expr): string {
  switch (expr.type) {
    case 'number':
      return printNumber(expr);
    case 'path':
      return expr.names.map((each) => each.name).join('.');
    case 'call':
      return `${expr.name.name}(${expr.args.map(printExpr).join(', ')})`;
    case 'unary':
      if (expr.operator === '√') return `√${operand(expr.operand, 'primary')}`;
      if (expr.operator === 'not') return `not ${operand(expr.operand, 'not')}`;
      return expr.operator + signedOperand(expr.operand);
    case 'binary': {
      const [, left, right] = BINARY[expr.operator];
      if (expr.operator === '^') return `${powerBase(expr.left)}^${operand(expr.right, right)}`;
      return `${operand(expr.left, left)} ${expr.operator} ${operand(expr.right, right)}`;
    }
    case 'group':
      return `(${printExpr(expr.inner)})`;
    case 'within':
      return `${operand(expr.value, 'state')} within ${operand(expr.low, 'sum')} .. ${operand(expr.high, 'sum')}`;
    case 'with':
      return `${operand(expr.value, 'state')} with ${printExpr(expr.input)} = ${operand(expr.setting, 'sum')}`;
  }
}

function printNumber({ value, unit }: NumberExpr): string {
  const numeral = numeralOf(value, unit);
  return unit ? `${numeral} ${unit.text}` : numeral;
}

function rungOf(expr: Expr): Rung {
  switch (expr.type) {
    case 'number':
      return printNumber(expr).startsWith('-') ? 'signed' : 'primary';
    case 'unary':
      return expr.operator === '√' ? 'primary' : expr.operator === 'not' ? 'not' : 'signed';
    case 'binary':
      return BINARY[expr.operator][0];
    case 'within':
      return 'relation';
    case 'with':
      return 'state';
    default:
      return 'primary';
  }
}

function operand(expr: Expr, least: Rung): string {
  const text = printExpr(expr);
  return RUNGS.indexOf(rungOf(expr)) < RUNGS.indexOf(least) ? `(${text})` : text;
}

/** A sign before a point of the Celsius scale would become part of it, unless it has one of its own. */
function signedOperand(expr: Expr): string {
  const point = expr.type === 'number' && expr.kind.scale === 'celsius' && rungOf(expr) === 'primary';
  return point ? `+${printExpr(expr)}` : operand(expr, 'signed');
}

/** A quantity with its unit is no base without parentheses. */
function powerBase(expr: Expr): string {
  return expr.type === 'number' && expr.unit ? `(${printExpr(expr)})` : operand(expr, 'primary');
}
