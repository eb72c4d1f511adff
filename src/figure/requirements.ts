// What the checks of a sheet ask of single values, as limits that a figure can show.

import type { CellReading, SheetView } from '../sheet/index.ts';

/** A limit in SI on what is written as `text` (without blanks), and the side of it that is not allowed. */
interface Requirement {
  readonly text: string;
  readonly value: number;
  readonly forbids: 'below' | 'above';
}

type CheckCondition = Extract<CellReading['tree']['entry'], { type: 'check' }>['condition'];
type Side = Requirement['forbids'];

/** Which side of the limit a relation forbids when the value stands on its left. */
const FORBIDDEN: Readonly<Record<string, Side>> = { '>=': 'below', '>': 'below', '<=': 'above', '<': 'above' };

/** Every comparison of a value with a number or a named number, in sheet order; other conditions say nothing here. */
export function requirementsOf(sheet: SheetView): readonly Requirement[] {
  return sheet.cells().flatMap(({ tree }) => {
    if (tree.entry.type !== 'check') return [];
    return requirementsIn(tree.entry.condition, tree.line.text, sheet);
  });
}

/** The text of a value as it is compared here: `A1.margin`, `abs(A1.A_v)`. */
export function comparableText(text: string): string {
  return text.replace(/\s+/g, '');
}

function requirementsIn(condition: CheckCondition, line: string, sheet: SheetView): Requirement[] {
  const textOf = (expr: CheckCondition): string => comparableText(line.slice(expr.span.start, expr.span.end));
  const limit = (of: CheckCondition, at: CheckCondition, forbids: Side): Requirement[] => {
    const value = numberOf(at, sheet);
    return value === null ? [] : [{ text: textOf(of), value, forbids }];
  };
  switch (condition.type) {
    case 'group':
      return requirementsIn(condition.inner, line, sheet);
    case 'within': {
      const { value, low, high } = condition;
      return [...limit(value, low, 'below'), ...limit(value, high, 'above')];
    }
    case 'binary': {
      const { left, right, operator } = condition;
      if (operator === 'and') return [left, right].flatMap((part) => requirementsIn(part, line, sheet));
      const forbids = FORBIDDEN[operator];
      if (forbids === undefined) return [];
      const forward = limit(left, right, forbids);
      return forward.length > 0 ? forward : limit(right, left, forbids === 'below' ? 'above' : 'below');
    }
    default:
      return [];
  }
}

function numberOf(expr: CheckCondition, sheet: SheetView): number | null {
  if (expr.type === 'number') return expr.value;
  if (expr.type === 'unary' && expr.operand.type === 'number') {
    return expr.operator === '-' ? -expr.operand.value : expr.operator === '+' ? expr.operand.value : null;
  }
  // A path with a dot is a result, which moves; a plain name is what the author set as the limit.
  if (expr.type !== 'path' || expr.names.length > 1) return null;
  const value = sheet.value(expr.names[0]!.name);
  return typeof value === 'number' && Number.isFinite(value) ? value : null;
}
