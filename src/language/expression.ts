// Expressions: one ladder of operators, one function per rung, each under its line of the grammar.
// Where a condition may stand is for the checker to say; here it may stand wherever an operand may.

import { isUnitSymbol, PLAIN } from '../quantity/index.ts';
import { halt, reading } from './messages.ts';
import { checkedValue, refusePower } from './number.ts';
import type { NumberToken } from './number.ts';
import type { Sign, SuperscriptToken } from './lexer.ts';
import { Reader, spanOf } from './reader.ts';
import { isJoiningWord } from './reserved.ts';
import type { BinaryExpr, BinaryOperator, Expr, Message, NameRef, NumberExpr, PathExpr, Span } from './syntax.ts';
import { readWithin } from './within.ts';

/** Reads a whole text as one expression, or says what is wrong with it. */
export function parseExpression(text: string): Expr | Message {
  return reading(
    () => {
      const reader = new Reader(text, 0, text.length);
      const expr = readExpression(reader);
      reader.expectEnd();
      return expr;
    },
    (message) => message,
  );
}

// expr = conj { "or" conj } ;
export function readExpression(reader: Reader): Expr {
  let left = readConjunction(reader);
  while (reader.atWord('or')) left = binary(reader, 'or', left, readConjunction);
  return left;
}

// conj = neg { "and" neg } ;
function readConjunction(reader: Reader): Expr {
  let left = readNegation(reader);
  while (reader.atWord('and')) left = binary(reader, 'and', left, readNegation);
  return left;
}

// neg = { "not" } rel ;
function readNegation(reader: Reader): Expr {
  const not = reader.takeWord('not');
  if (!not) return readRelation(reader);
  reader.countOperator();
  const operand = reader.nested(() => readNegation(reader));
  return { type: 'unary', operator: 'not', operand, span: reader.spanFrom(not.start) };
}

// rel = state [ ("="|"<"|">"|"<="|">=") state | "within" ( range | literal "±" literal ) ] ;
function readRelation(reader: Reader): Expr {
  const left = readState(reader);
  const { sign } = reader;
  let whole: Expr;
  if (isComparison(sign)) whole = binary(reader, sign, left, readState);
  else if (reader.atWord('within')) whole = readWithin(reader, left, readSum);
  else return left;
  refuseChain(reader, whole);
  return whole;
}

/** Whether the sign compares. */
export function isComparison(sign: Sign | null): sign is '=' | '<' | '>' | '<=' | '>=' {
  return sign === '=' || sign === '<' || sign === '>' || sign === '<=' || sign === '>=';
}

function refuseChain(reader: Reader, whole: Expr): void {
  if (!isComparison(reader.sign) && !reader.atWord('within')) return;
  const { ahead } = reader;
  if (whole.type !== 'binary' || ahead.type === 'name') halt('comparison-chained-within', spanOf(ahead));
  const rest = reader.text.slice(ahead.start, reader.limit);
  halt(
    'comparison-chained',
    spanOf(ahead),
    `${reader.textOf(whole.span)} and ${reader.textOf(whole.right.span)} ${rest}`,
  );
}

// state = sum { "with" path "=" sum } ;
export function readState(reader: Reader): Expr {
  let value = readSum(reader);
  while (reader.atWord('with')) {
    const word = reader.take();
    reader.countOperator();
    const input = reader.ahead.type === 'name' ? readOperand(reader) : null;
    if (input?.type !== 'path' || !reader.takeSign('='))
      halt('with-form', { start: word.start, end: reader.ahead.end });
    const setting = readSum(reader);
    value = { type: 'with', value, input, setting, span: reader.spanFrom(value.span.start) };
  }
  return value;
}

// sum = product { ("+"|"-") product } ;
export function readSum(reader: Reader): Expr {
  let left = readProduct(reader);
  for (;;) {
    const { sign } = reader;
    if (sign !== '+' && sign !== '-') return left;
    left = binary(reader, sign, left, readProduct);
  }
}

// product = signed { ("*"|"/"|"||") signed } ;
function readProduct(reader: Reader): Expr {
  let left = readSigned(reader);
  for (;;) {
    const { sign } = reader;
    if (sign !== '*' && sign !== '/' && sign !== '||') return left;
    left = binary(reader, sign, left, readSigned);
  }
}

// signed = { "+"|"-" } power ;
function readSigned(reader: Reader): Expr {
  const { sign: operator } = reader;
  if (operator !== '+' && operator !== '-') return readPower(reader);
  const sign = reader.take();
  const { ahead } = reader;
  // A point of the Celsius scale owns its sign: -40 degC is one literal.
  if (ahead.type === 'number' && ahead.kind.scale === 'celsius') {
    const operand = readPower(reader);
    if (operand.type === 'number') return signedPoint(ahead, operand, operator === '-', sign.start);
  }
  reader.countOperator();
  const operand = reader.nested(() => readSigned(reader));
  return { type: 'unary', operator, operand, span: reader.spanFrom(sign.start) };
}

function signedPoint(token: NumberToken, operand: NumberExpr, negative: boolean, start: number): NumberExpr {
  const span = { start, end: operand.span.end };
  return { ...operand, value: checkedValue(negative ? `-${token.numeral}` : token.numeral, token.unit, span), span };
}

// power = primary [ "^" signed | SUPERSCRIPT ] ;   (* primary: not a number with a unit *)
function readPower(reader: Reader): Expr {
  const base = readPrimary(reader);
  const { ahead } = reader;
  const superscript = ahead.type === 'superscript';
  if (!superscript && !reader.atSign('^')) return base;
  if (base.type === 'number' && base.unit) {
    const from = superscript ? ahead.start : ahead.end;
    refusePower(reader.text, base.span.start, base.span.end, from, reader.limit);
  }
  reader.countOperator();
  reader.take();
  const right = superscript ? exponentOf(ahead) : reader.nested(() => readSigned(reader));
  return {
    type: 'binary',
    operator: '^',
    left: base,
    right,
    operatorSpan: spanOf(ahead),
    span: reader.spanFrom(base.span.start),
  };
}

function exponentOf(token: SuperscriptToken): Expr {
  const span = spanOf(token);
  const operand: Expr = { type: 'number', value: Math.abs(token.value), unit: null, kind: PLAIN, span };
  return token.value < 0 ? { type: 'unary', operator: '-', operand, span } : operand;
}

// primary = number | "√" primary | name "(" [ expr { "," expr } ] ")" | path | "(" expr ")" ;
function readPrimary(reader: Reader): Expr {
  const { ahead } = reader;
  if (ahead.type === 'number') {
    reader.take();
    return { type: 'number', value: ahead.value, unit: ahead.unit, kind: ahead.kind, span: spanOf(ahead) };
  }
  if (ahead.type === 'name') return readOperand(reader);
  if (reader.takeSign('√')) {
    reader.countOperator();
    const operand = reader.nested(() => readPrimary(reader));
    return { type: 'unary', operator: '√', operand, span: reader.spanFrom(ahead.start) };
  }
  if (reader.takeSign('(')) {
    const inner = reader.nested(() => readExpression(reader));
    closeParenthesis(reader, spanOf(ahead));
    return { type: 'group', inner, span: reader.spanFrom(ahead.start) };
  }
  return refuseOperand(reader);
}

/** A call, or a path, which begins with no unit and no joining word. */
function readOperand(reader: Reader): Expr {
  const token = reader.ahead;
  if (token.type !== 'name') return refuseOperand(reader);
  const span = spanOf(token);
  const written = reader.textOf(span);
  if (isJoiningWord(token.name) && token.name !== 'if') halt('word-as-value', span, written);
  reader.take();
  refuseDigitBehindDot(reader, [{ name: token.name, span }]);
  if (reader.atSign('(')) return readCall(reader, { name: token.name, span });
  if (token.name === 'if') halt('word-as-value', span, written);
  if (isUnitSymbol(written)) halt('unit-without-number', span, written);
  return readPathFrom(reader, { name: token.name, span });
}

function readCall(reader: Reader, name: NameRef): Expr {
  const open = spanOf(reader.take());
  const args: Expr[] = [];
  if (!reader.takeSign(')')) {
    do args.push(reader.nested(() => readExpression(reader)));
    while (reader.takeSign(','));
    closeParenthesis(reader, open);
  }
  return { type: 'call', name, args, span: reader.spanFrom(name.span.start) };
}

function closeParenthesis(reader: Reader, open: Span): void {
  if (reader.takeSign(')')) return;
  if (reader.atEnd()) halt('parenthesis-open', open);
  reader.refuse();
}

/** path = name { "." name } ; the dots stand glued, and behind a dot any name may stand, a unit's too (`Q1.K`). */
export function readPathFrom(reader: Reader, first: NameRef): PathExpr {
  const names = [first];
  while (reader.atSign('.')) {
    const dot = reader.take();
    const { ahead } = reader;
    const glued = dot.start === names.at(-1)!.span.end && ahead.start === dot.end;
    if (ahead.type !== 'name' || !glued)
      halt('path-name-missing', spanOf(dot), reader.textOf({ start: first.span.start, end: names.at(-1)!.span.end }));
    reader.take();
    names.push({ name: ahead.name, span: spanOf(ahead) });
    refuseDigitBehindDot(reader, names);
  }
  return { type: 'path', names, span: reader.spanFrom(first.span.start) };
}

/** `A1.5`: else its `.5` would be taken for a number without whole part. */
function refuseDigitBehindDot(reader: Reader, names: readonly NameRef[]): void {
  const { end } = names.at(-1)!.span;
  if (!/^\.\d/.test(reader.text.slice(end, Math.min(end + 2, reader.limit)))) return;
  halt('path-name-missing', { start: end, end: end + 1 }, reader.textOf({ start: names[0].span.start, end }));
}

// ---------------------------------------------------------------- parts

function binary(reader: Reader, operator: BinaryOperator, left: Expr, readRight: (reader: Reader) => Expr): BinaryExpr {
  reader.countOperator();
  const operatorSpan = spanOf(reader.take());
  const right = readRight(reader);
  return { type: 'binary', operator, left, right, operatorSpan, span: reader.spanFrom(left.span.start) };
}

function refuseOperand(reader: Reader): never {
  const { ahead, last } = reader;
  const here = spanOf(ahead);
  if (last.type === 'end') return halt('operand-missing', here, 'This place');
  return halt('operand-missing', here, `The place behind ${reader.textOf(last)}`);
}
