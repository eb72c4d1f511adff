// Trees as short text, for tests: `(10[V] / R)`, `{a}` for parentheses that were written, numbers in SI.

import type { Expr, Literal, Message, QuantityEntry } from '../../src/language/index.ts';
import { parseExpression, parseSheet } from '../../src/language/index.ts';
import { siUnitText } from '../../src/quantity/index.ts';

/** The tree of an expression as text. */
export function show(expr: Expr): string {
  switch (expr.type) {
    case 'number':
      return showLiteral(expr);
    case 'path':
      return expr.names.map((each) => each.name).join('.');
    case 'call':
      return `${expr.name.name}(${expr.args.map(show).join(', ')})`;
    case 'unary':
      return `(${expr.operator} ${show(expr.operand)})`;
    case 'binary':
      return `(${show(expr.left)} ${expr.operator} ${show(expr.right)})`;
    case 'group':
      return `{${show(expr.inner)}}`;
    case 'within':
      return `(${show(expr.value)} within ${show(expr.low)} .. ${show(expr.high)})`;
    case 'with':
      return `(${show(expr.value)} with ${show(expr.input)} = ${show(expr.setting)})`;
  }
}

/** `10[V]`, `25+273.15`-style numbers stay as their SI value: `298.15[degC]`. */
export function showLiteral({ value, kind }: Pick<Literal, 'value' | 'kind'>): string {
  if (kind.scale === 'celsius') return `${value}[degC]`;
  const unit = siUnitText(kind);
  return unit === '1' ? String(value) : `${value}[${unit}]`;
}

/** The tree of a text, or the code of the message about it. */
export function reads(text: string): string {
  const read = parseExpression(text);
  return isMessage(read) ? read.code : show(read);
}

export function isMessage(read: Expr | Message): read is Message {
  return 'code' in read;
}

/** The quantity that a text is as an entry; its message's code where it is broken or no quantity. */
export function quantity(entry: string): QuantityEntry | string {
  const read = parseSheet(`x = ${entry}`).cells[0].entry;
  return read.type === 'quantity' ? read : read.type === 'broken' ? read.message.code : read.type;
}

/** `JSON` of a tree without its spans. */
export function withoutSpans(tree: unknown): string {
  return JSON.stringify(tree, (key, value: unknown) => (key === 'span' || key === 'operatorSpan' ? undefined : value));
}
