// What a check compares: the value beside it, and where it stands against its limits.

import { spreadBar } from '../../figure/index.ts';
import { plainText } from '../../quantity/index.ts';
import { pathsOf } from '../../language/index.ts';
import type { Expr, Line } from '../../language/index.ts';
import { evaluateExpression } from '../../sheet/index.ts';
import type { Reading, SheetView } from '../../sheet/index.ts';
import { numbersAt } from './row-spread.ts';
import type { RowSpread } from './row-spread.ts';
import { NO_NUMBERS, valueFigure } from './numbers.ts';
import type { Numbers } from './numbers.ts';

interface Compared {
  readonly value: Expr;
  /** null on a side without limit. */
  readonly low: Expr | null;
  readonly high: Expr | null;
}

/** The numbers of a single comparison; none where several are joined. */
export function checkNumbers(condition: Expr, line: Line, sheet: SheetView, spread: RowSpread | null): Numbers {
  const compared = comparedOf(condition);
  if (compared === null) return NO_NUMBERS;
  const read = (expr: Expr | null): Reading | null => expr && readingOf(expr, line, sheet);
  const reading = read(compared.value);
  if (reading === null) return NO_NUMBERS;
  const [low, high] = [numberOf(read(compared.low)), numberOf(read(compared.high))];
  const value = numberOf(reading);
  const moved = compared.value.type === 'path' ? numbersAt(pathText(compared.value), reading, spread) : null;
  const ends = compared.value.type === 'path' ? (spread?.judged.spread.value(pathText(compared.value)) ?? null) : null;
  const bar =
    value === null || (low === null && high === null)
      ? null
      : spreadBar({
          low: moved && ends ? ends.low.value : value,
          nominal: value,
          high: moved && ends ? ends.high.value : value,
          own: true,
          limits: { low, high },
          devices: { low: null, high: null },
          refining: spread?.refining ?? false,
        });
  return moved ? { ...moved, bar } : { ...NO_NUMBERS, nominal: valueFigure(reading), bar };
}

function comparedOf(expr: Expr): Compared | null {
  if (expr.type === 'group') return comparedOf(expr.inner);
  if (expr.type === 'within') return { value: expr.value, low: expr.low, high: expr.high };
  if (expr.type !== 'binary' || !['<', '>', '<=', '>=', '='].includes(expr.operator)) return null;
  // The side that is a plain number is the limit.
  const flipped = pathsOf(expr.left).length === 0 && pathsOf(expr.right).length > 0;
  const [value, limit] = flipped ? [expr.right, expr.left] : [expr.left, expr.right];
  if (expr.operator === '=') return { value, low: null, high: null };
  const least = expr.operator.startsWith('>') !== flipped;
  return { value, low: least ? limit : null, high: least ? null : limit };
}

/** What an expression is now: of a path as the sheet has it, else worked out with the present values put in. */
function readingOf(expr: Expr, line: Line, sheet: SheetView): Reading | null {
  if (expr.type === 'path') return readingAt(pathText(expr), sheet);
  let text = line.text.slice(expr.span.start, expr.span.end);
  for (const path of pathsOf(expr).toSorted((a, b) => b.span.start - a.span.start)) {
    const reading = readingAt(pathText(path), sheet);
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

function numberOf(reading: Reading | null): number | null {
  const value = reading?.value;
  return typeof value === 'number' && Number.isFinite(value) ? value : null;
}

function pathText(expr: Expr & { readonly type: 'path' }): string {
  return expr.names.map((name) => name.name).join('.');
}

function readingAt(path: string, sheet: SheetView): Reading | null {
  const [name, ...rest] = path.split('.');
  const cell = sheet.cell(name!);
  if (!cell) return null;
  return rest.length === 0 ? cell.reading : (cell.values.find((value) => value.name === rest.join('.')) ?? null);
}
