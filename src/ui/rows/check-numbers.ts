// What a check compares, as the number beside it.

import { plainText } from '../../quantity/index.ts';
import { pathsOf } from '../../language/index.ts';
import type { Expr, Line } from '../../language/index.ts';
import { evaluateExpression } from '../../sheet/index.ts';
import type { CellReading, Reading, Sheet } from '../../sheet/index.ts';
import { valueFigure } from './numbers.ts';
import type { Figure } from './row.ts';

/** The value that a single comparison holds against its limit; null where several are joined or it has none. */
export function comparedFigure(condition: Expr, line: Line, sheet: Sheet): Figure | null {
  const expr = comparedSide(condition);
  if (expr === null) return null;
  const reading = expr.type === 'path' ? readingOf(pathText(expr), sheet) : evaluated(expr, line, sheet);
  return reading && valueFigure(reading);
}

function comparedSide(expr: Expr): Expr | null {
  if (expr.type === 'group') return comparedSide(expr.inner);
  if (expr.type === 'within') return expr.value;
  if (expr.type !== 'binary' || expr.operator === 'and' || expr.operator === 'or') return null;
  // The side that is a plain number is the limit.
  return pathsOf(expr.left).length === 0 && pathsOf(expr.right).length > 0 ? expr.right : expr.left;
}

/** The expression with the present values put in place of its names. */
function evaluated(expr: Expr, line: Line, sheet: Sheet): Reading | null {
  let text = line.text.slice(expr.span.start, expr.span.end);
  for (const path of pathsOf(expr).toSorted((a, b) => b.span.start - a.span.start)) {
    const reading = readingOf(pathText(path), sheet);
    const number = reading && literalText(reading);
    if (!number) return null;
    text = text.slice(0, path.span.start - expr.span.start) + number + text.slice(path.span.end - expr.span.start);
  }
  const result = evaluateExpression(text);
  return 'code' in result ? null : { ...result, as: null };
}

function literalText({ value, type }: Reading): string | null {
  if (typeof value !== 'number' || !Number.isFinite(value) || typeof type === 'string') return null;
  const text = plainText(value, type);
  return text.startsWith('-') && type.scale !== 'celsius' ? `(${text})` : text;
}

function pathText(expr: Expr & { readonly type: 'path' }): string {
  return expr.names.map((name) => name.name).join('.');
}

function readingOf(path: string, sheet: Sheet): Reading | null {
  const [name, ...rest] = path.split('.');
  const cell: CellReading | null = sheet.cell(name!);
  if (!cell) return null;
  return rest.length === 0 ? cell.reading : (cell.values.find((value) => value.name === rest.join('.')) ?? null);
}
