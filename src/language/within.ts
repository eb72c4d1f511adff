// `a within lo .. hi` and `a within c ± d`. A centre and its tolerance are folded into two literals, in
// exact decimals, so that 5 mA ± 10 % ends at 4.5 mA and not beside it.

import { dimensionName, fromSI, sameKind, TEMPERATURE_DIFFERENCE } from '../quantity/index.ts';
import { addTolerance } from './decimal-sum.ts';
import { literalOf, readLiteral } from './literal.ts';
import { halt } from './messages.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { Expr, Literal, NumberExpr, Span, WithinExpr } from './syntax.ts';

const EXAMPLE = 'within 4 .. 12 or within 5 mA ± 10 %';

/** Reads from the word `within`; `readSum` reads an end. */
export function readWithin(reader: Reader, value: Expr, readSum: (reader: Reader) => Expr): WithinExpr {
  const word = reader.take();
  reader.countOperator();
  const first = readSum(reader);
  if (reader.takeSign('..')) {
    if (reader.atEnd()) halt('range-missing', spanOf(word), 'within', EXAMPLE);
    const high = readSum(reader);
    return { type: 'within', value, low: first, high, span: reader.spanFrom(value.span.start) };
  }
  if (!reader.takeSign('±')) halt('range-missing', spanOf(word), 'within', EXAMPLE);
  const centre = literalOf(first) ?? halt('limit-not-literal', first.span, reader.textOf(first.span));
  const tolerance = readLiteral(reader);
  const width = widthOf(reader, centre, tolerance);
  const span = reader.spanFrom(first.span.start);
  const end = (sign: 1 | -1): Expr =>
    literalExpr(addTolerance(centre.value, sign * width.amount, width.relative), centre, span);
  return { type: 'within', value, low: end(-1), high: end(1), span: reader.spanFrom(value.span.start) };
}

/** Half the width: relative to the centre, or in the centre's own SI unit. Degrees are differences here. */
function widthOf(reader: Reader, centre: Literal, tolerance: Literal): { amount: number; relative: boolean } {
  const { unit, kind, value } = tolerance;
  if (unit?.symbol === '%' || unit?.symbol === 'ppm') return { amount: value, relative: true };
  const point = centre.kind.scale === 'celsius';
  if (point && kind.scale === 'celsius') return { amount: fromSI(value, unit!), relative: false };
  if (!sameKind(kind, point ? TEMPERATURE_DIFFERENCE : centre.kind))
    halt(
      'tolerance-kind',
      tolerance.span,
      `${reader.textOf(tolerance.span)}, ${dimensionName(kind)},`,
      `${reader.textOf(centre.span)}, ${dimensionName(centre.kind)}`,
    );
  return { amount: value, relative: false };
}

/** A signed number as the expression that would be written for it. */
function literalExpr(value: number, { unit, kind }: Literal, span: Span): Expr {
  const number = (magnitude: number): NumberExpr => ({ type: 'number', value: magnitude, unit, kind, span });
  if (value >= 0 || kind.scale === 'celsius') return number(value);
  return { type: 'unary', operator: '-', operand: number(-value), span };
}
