// + - * / ^ || and signs, with the dimensions they ask for and yield.
//
// Temperatures: a point of the Celsius scale less a point is a difference in kelvin; a point and a
// difference give a point; in products and quotients a point counts as its absolute temperature.
// Decibels add and subtract among themselves and are multiplied by nothing.

import {
  CAPACITANCE,
  CONDUCTANCE,
  INDUCTANCE,
  PLAIN,
  RESISTANCE,
  TEMPERATURE_DIFFERENCE,
  divideDimensions,
  multiplyDimensions,
  raiseDimension,
  sameDimension,
  sameKind,
  siUnitText,
} from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { BinaryExpr, Expr, Span, UnaryExpr } from '../language/index.ts';
import { compilePlain, compileQuantity } from './operand.ts';
import type { Scope, Typed } from './scope.ts';
import { operandText } from './scope.ts';
import { stop } from './stop.ts';
import { typeName } from './value-type.ts';

/** Compiles a sign, a root sign or `not`. */
export function compileUnary(expr: UnaryExpr, scope: Scope): Typed {
  if (expr.operator === 'not') {
    const operand = scope.compile(expr.operand);
    if (operand.type !== 'condition') {
      stop(
        'condition-expected',
        `not wants a condition; ${operandText(scope, expr.operand.span, 'this')} is ${typeName(operand.type)}.`,
        expr.operand.span,
      );
    }
    return { type: 'condition', handle: scope.builder.op('not', operand.handle) };
  }
  const operand = compileQuantity(expr.operand, scope);
  if (expr.operator === '√') return squareRoot(operand, expr.operand.span, scope);
  if (operand.type.scale === 'celsius') {
    stop(
      'sign-of-temperature',
      `${operandText(scope, expr.operand.span, 'This')} is a point of the temperature scale: it takes no sign. Write a point as -40 degC, a difference as -40 K.`,
      expr.span,
    );
  }
  if (expr.operator === '+') return operand;
  // A negative number is one constant, so that a sweep can turn it like any other input.
  if (expr.operand.type === 'number')
    return { type: operand.type, handle: scope.builder.constant(-expr.operand.value) };
  return { type: operand.type, handle: scope.builder.neg(operand.handle) };
}

/** The square root of a quantity: half of its exponents. */
export function squareRoot(operand: Typed & { type: ValueKind }, span: Span, scope: Scope): Typed {
  const type = linear(operand.type, span, 'has no square root', scope);
  return { type: plainScale(raiseDimension(type.dimension, 0.5)), handle: scope.builder.sqrt(operand.handle) };
}

/** Compiles one of + - * / ^ ||. */
export function compileBinary(expr: BinaryExpr, scope: Scope): Typed {
  if (expr.operator === '^') return power(expr, scope);
  const left = compileQuantity(expr.left, scope);
  const right = compileQuantity(expr.right, scope);
  const { builder } = scope;
  switch (expr.operator) {
    case '+':
    case '-': {
      const type = sumType(expr, left.type, right.type, scope);
      return { type, handle: builder.op(expr.operator === '+' ? 'add' : 'sub', left.handle, right.handle) };
    }
    case '*': {
      const a = linear(left.type, expr.left.span, 'cannot be multiplied', scope);
      const b = linear(right.type, expr.right.span, 'cannot be multiplied', scope);
      return {
        type: plainScale(multiplyDimensions(a.dimension, b.dimension)),
        handle: builder.mul(left.handle, right.handle),
      };
    }
    case '/': {
      const a = linear(left.type, expr.left.span, 'cannot be divided', scope);
      const b = linear(right.type, expr.right.span, 'divides nothing', scope);
      return {
        type: plainScale(divideDimensions(a.dimension, b.dimension)),
        handle: builder.div(left.handle, right.handle),
      };
    }
    case '||':
      return sideBySide([left, right], [expr.left.span, expr.right.span], scope);
    default:
      throw new Error(`${expr.operator} is no arithmetic operator.`);
  }
}

/** Elements in parallel: ohms and henries combine reciprocally, siemens and farads add; all else stops. */
export function sideBySide(
  operands: readonly (Typed & { type: ValueKind })[],
  spans: readonly Span[],
  scope: Scope,
): Typed {
  const first = operands[0]!;
  const reciprocal = sameKind(first.type, RESISTANCE) || sameKind(first.type, INDUCTANCE);
  const additive = sameKind(first.type, CONDUCTANCE) || sameKind(first.type, CAPACITANCE);
  if (!reciprocal && !additive) {
    const between = scope.text.slice(spans[0]!.end, spans[1]?.start ?? spans[0]!.end);
    const remark = between.includes('//') ? ' Before a remark stands ; instead of //.' : '';
    stop(
      'parallel-kind',
      `${operandText(scope, spans[0]!, 'This')} is ${typeName(first.type)}: only resistances, conductances, inductances and capacitances stand in parallel.${remark}`,
      spans[0]!,
    );
  }
  let handle = first.handle;
  for (let i = 1; i < operands.length; i++) {
    const next = operands[i]!;
    if (!sameKind(first.type, next.type)) {
      stop(
        'parallel-mixed',
        `${operandText(scope, spans[0]!, 'The first')} is ${typeName(first.type)} and ${operandText(scope, spans[i]!, 'the next')} is ${typeName(next.type)}: they cannot stand in parallel. Give both as the same kind of element.`,
        spans[i]!,
      );
    }
    handle = scope.builder.op(reciprocal ? 'parallel' : 'add', handle, next.handle);
  }
  return { type: first.type, handle };
}

/** The value of an expression made of numbers alone (an exponent), or null. */
export function constantNumber(expr: Expr): number | null {
  switch (expr.type) {
    case 'number':
      return expr.unit === null ? expr.value : null;
    case 'group':
      return constantNumber(expr.inner);
    case 'unary': {
      const x = constantNumber(expr.operand);
      if (x === null) return null;
      return expr.operator === '-' ? -x : expr.operator === '+' ? x : null;
    }
    case 'binary': {
      const a = constantNumber(expr.left);
      const b = constantNumber(expr.right);
      return expr.operator === '/' && a !== null && b !== null ? a / b : null;
    }
    default:
      return null;
  }
}

function power(expr: BinaryExpr, scope: Scope): Typed {
  const base = compileQuantity(expr.left, scope);
  const exponent = compilePlain(expr.right, scope, 'An exponent');
  const known = constantNumber(expr.right);
  const handle =
    known === 2 ? scope.builder.mul(base.handle, base.handle) : scope.builder.op('pow', base.handle, exponent.handle);
  if (sameKind(base.type, PLAIN)) return { type: PLAIN, handle };
  const type = linear(base.type, expr.left.span, 'cannot be raised to a power', scope);
  if (known === null) {
    stop(
      'exponent-not-constant',
      `${operandText(scope, expr.left.span, 'The base')} is ${typeName(base.type)}, so its exponent is a number or a ratio of numbers, such as 2 or (1/2); ${operandText(scope, expr.right.span, 'this one')} is computed.`,
      expr.right.span,
    );
  }
  return { type: plainScale(raiseDimension(type.dimension, known)), handle };
}

function sumType(expr: BinaryExpr, left: ValueKind, right: ValueKind, scope: Scope): ValueKind {
  const leftPoint = left.scale === 'celsius';
  const rightPoint = right.scale === 'celsius';
  if (leftPoint && rightPoint && expr.operator === '-') return TEMPERATURE_DIFFERENCE;
  if (leftPoint && sameKind(right, TEMPERATURE_DIFFERENCE)) return left;
  if (rightPoint && sameKind(left, TEMPERATURE_DIFFERENCE) && expr.operator === '+') return right;
  if (sameKind(left, right) && !leftPoint) return left;
  const a = operandText(scope, expr.left.span, 'the left side');
  const b = operandText(scope, expr.right.span, 'the right side');
  if (leftPoint && rightPoint) {
    stop(
      'sum-of-temperatures',
      `${a} and ${b} are both points of the temperature scale: they cannot be added. Write a difference in K.`,
      expr.span,
    );
  }
  const verb = expr.operator === '+' ? 'added' : 'subtracted';
  stop(
    'sum-dimension',
    `${a} is ${typeName(left)} and ${b} is ${typeName(right)}: they cannot be ${verb}.${advice(a, left, b, right)}`,
    expr.span,
  );
}

/** What would make two kinds fit, as a further sentence; empty where nothing is near. */
export function advice(a: string, left: ValueKind, b: string, right: ValueKind): string {
  const pair = (x: ValueKind, y: ValueKind): string => `${siUnitText(x)},${siUnitText(y)}`;
  switch (pair(left, right)) {
    case 'V,A':
    case 'A,V':
      return ' Multiply the current by a resistance first.';
    case 'ohm,S':
    case 'S,ohm':
      return ' Take the reciprocal of one of them.';
    case 'V,W':
    case 'W,V':
      return ' Divide the power by a current first.';
  }
  if (sameKind(left, PLAIN) && right.scale === 'linear') return ` Give ${a} a unit, such as ${siUnitText(right)}.`;
  if (sameKind(right, PLAIN) && left.scale === 'linear') return ` Give ${b} a unit, such as ${siUnitText(left)}.`;
  if (left.scale === 'celsius' || right.scale === 'celsius') {
    if (sameDimension(left.dimension, right.dimension)) return ' Write both as points, such as 25 degC.';
  }
  if (left.scale === 'decibel' && sameKind(right, PLAIN)) return ` Write dB(${b}).`;
  if (right.scale === 'decibel' && sameKind(left, PLAIN)) return ` Write dB(${a}).`;
  return '';
}

/** The kind with a temperature point taken as absolute; decibels stop. */
function linear(kind: ValueKind, span: Span, verb: string, scope: Scope): ValueKind {
  if (kind.scale === 'decibel') {
    stop(
      'decibel-product',
      `${operandText(scope, span, 'This')} is a level in dB: it ${verb}. Levels in dB add and subtract.`,
      span,
    );
  }
  return kind.scale === 'celsius' ? TEMPERATURE_DIFFERENCE : kind;
}

function plainScale(dimension: ValueKind['dimension']): ValueKind {
  return { dimension, scale: 'linear' };
}
