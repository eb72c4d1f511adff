// Going through expressions and entries.

import type { Entry, Expr, FieldBody, PathExpr, Place } from './syntax.ts';

/** The expressions directly inside one, from left to right; the input of a `with` is among them. */
export function partsOf(expr: Expr): readonly Expr[] {
  switch (expr.type) {
    case 'number':
    case 'path':
      return [];
    case 'call':
      return expr.args;
    case 'unary':
      return [expr.operand];
    case 'binary':
      return [expr.left, expr.right];
    case 'group':
      return [expr.inner];
    case 'within':
      return [expr.value, expr.low, expr.high];
    case 'with':
      return [expr.value, expr.input, expr.setting];
  }
}

/** Visits an expression and all inside it, each before its parts. */
export function walkExpr(expr: Expr, visit: (expr: Expr) => void): void {
  visit(expr);
  for (const part of partsOf(expr)) walkExpr(part, visit);
}

/** Every path in an expression, in the order written; the inputs of `with` are among them. */
export function pathsOf(expr: Expr): PathExpr[] {
  const paths: PathExpr[] = [];
  walkExpr(expr, (each) => {
    if (each.type === 'path') paths.push(each);
  });
  return paths;
}

/** The expressions that stand in an entry, in the order written. */
export function exprsOfEntry(entry: Entry): readonly Expr[] {
  switch (entry.type) {
    case 'quantity':
      return entry.value ? [entry.value] : [];
    case 'check':
      return [entry.condition];
    case 'plot': {
      const { values, against, over } = entry;
      return [...values, ...(against ? [against] : []), ...(over ? [over.low, over.high] : [])];
    }
    case 'inverse':
      return [entry.input, entry.target, entry.value, entry.over.low, entry.over.high];
    default:
      return [];
  }
}

/** The expressions in the body of a field that speak of cells: not the places of an output or of a leg. */
export function exprsOfBody(body: FieldBody): readonly Expr[] {
  switch (body.type) {
    case 'quantity':
      return exprsOfEntry(body);
    case 'legs':
      return body.legs.flatMap((leg) => (leg.element ? [leg.element] : []));
    case 'driven':
      return [body.through];
    case 'midband':
      return [body.frequency];
    default:
      return [];
  }
}

/** The places that stand in the body of a field. */
export function placesOfBody(body: FieldBody): readonly Place[] {
  return body.type === 'legs' ? body.legs.map((leg) => leg.place) : [];
}
