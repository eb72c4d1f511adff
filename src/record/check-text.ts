// What a check says: whether it holds and by how much. What is to spare is rounded down and what is
// short is rounded up, in the unit of the limit as the author wrote it.

import type { Expr } from '../language/index.ts';
import { formatValue, fromSI, PLAIN, sameKind } from '../quantity/index.ts';
import type { Unit, ValueKind } from '../quantity/index.ts';
import type { CellReading } from '../sheet/index.ts';

/** From one of the limit's units on three digits are shown, below it two: 1.79 V, 0.40 V, 0.042 mA. */
const DIGITS = { above: 3, below: 2 };
/** Outside of this range in the limit's unit the reserve chooses its own prefix. */
const READABLE = { least: 1e-3, most: 1e4 };

/** `holds, 0.40 V to spare`, `fails, 1.79 V short`, `not computed`. */
export function checkText(cell: Pick<CellReading, 'check' | 'tree'>): string {
  const { check } = cell;
  if (check === null) return 'not computed';
  const verb = check.holds ? 'holds' : 'fails';
  if (check.reserve === null || check.reserveType === null || Number.isNaN(check.reserve)) return verb;
  if (check.reserve === 0) return check.holds ? 'holds, nothing to spare' : 'fails, exactly at the limit';
  return `${verb}, ${reserveText(check.reserve, check.reserveType, checkUnit(cell))}`;
}

/** The unit of a check's limit; null where it has none. */
export function checkUnit({ check, tree }: Pick<CellReading, 'check' | 'tree'>): Unit | null {
  return tree.entry.type === 'check' && check?.reserveType ? limitUnit(tree.entry.condition, check.reserveType) : null;
}

/** `0.40 V to spare`, `1.79 V short`; `unit` is that of the limit, null where it has none. */
export function reserveText(reserve: number, kind: ValueKind, unit: Unit | null): string {
  const size = Math.abs(reserve);
  const rounding = reserve > 0 ? 'down' : 'up';
  const amount = unit ? fromSI(size, unit) : size;
  const hasUnit = unit !== null || sameKind(kind, PLAIN);
  const inUnit = hasUnit && amount >= READABLE.least && amount < READABLE.most;
  const digits = amount >= 1 || !inUnit ? DIGITS.above : DIGITS.below;
  const { text } = formatValue(size, kind, { digits, rounding, ...(unit && inUnit ? { unit } : {}) });
  return `${text} ${reserve > 0 ? 'to spare' : 'short'}`;
}

/** The unit of the first limit in the condition that is written as a number of the kind compared. */
function limitUnit(expr: Expr, kind: ValueKind): Unit | null {
  switch (expr.type) {
    case 'group':
      return limitUnit(expr.inner, kind);
    case 'unary':
      return limitUnit(expr.operand, kind);
    case 'number':
      return expr.unit !== null && sameKind(expr.unit.kind, kind) ? expr.unit : null;
    case 'within':
      return limitUnit(expr.low, kind) ?? limitUnit(expr.high, kind);
    case 'binary':
      return limitUnit(expr.right, kind) ?? limitUnit(expr.left, kind);
    default:
      return null;
  }
}
