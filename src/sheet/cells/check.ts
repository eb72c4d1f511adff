// A check: a condition, and by how much it holds.

import type { BinaryExpr, CheckEntry, Expr } from '../../language/index.ts';
import type { Handle } from '../../network/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import { TEMPERATURE_DIFFERENCE, sameKind } from '../../quantity/index.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft } from '../draft.ts';
import type { Scope } from '../scope.ts';
import { operandText } from '../scope.ts';
import { stop } from '../stop.ts';
import { isQuantity, typeName } from '../value-type.ts';
import { diagnose } from '../diagnose.ts';
import { expressionStep } from '../workings.ts';

interface Reserve {
  readonly handle: Handle;
  readonly type: ValueKind;
}

/** Compiles a check cell. */
export function compileCheckCell(context: CellContext): Draft {
  const { tree } = context;
  const { condition } = tree.entry as CheckEntry;
  const scope = context.scope(tree.line);
  const holds = scope.compile(condition);
  if (holds.type !== 'condition') {
    stop(
      'condition-expected',
      `A check is a condition; ${operandText(scope, condition.span, 'this')} is ${typeName(holds.type)}. Compare it with a limit, such as >= 1 V, or within lo .. hi.`,
      condition.span,
    );
  }
  const reserve = reserveOf(condition, scope);
  return {
    ...EMPTY_DRAFT,
    type: 'condition',
    value: holds.handle,
    reserve: reserve?.handle ?? null,
    // A comparison with what is no number neither holds nor fails: there is no verdict at all.
    verify: (read) =>
      Number.isNaN(read(holds.handle)) ? { line: tree.line, message: diagnose(condition, context, tree.line) } : null,
    check: (read) => ({
      holds: read(holds.handle) === 1,
      reserve: reserve ? read(reserve.handle) : null,
      reserveType: reserve?.type ?? null,
    }),
    workings: (read) => [
      expressionStep(tree.name.name, condition, tree.line, 'condition', read(holds.handle), null, context),
    ],
  };
}

/** By how much a condition holds: the distance to its limit, the least of an `and`, the largest of an `or`; null for regions and mixed kinds. */
function reserveOf(expr: Expr, scope: Scope): Reserve | null {
  const { builder } = scope;
  switch (expr.type) {
    case 'group':
      return reserveOf(expr.inner, scope);
    case 'unary': {
      const inner = expr.operator === 'not' ? reserveOf(expr.operand, scope) : null;
      return inner && { type: inner.type, handle: builder.neg(inner.handle) };
    }
    case 'within': {
      const value = scope.compile(expr.value);
      const [a, b] = [scope.compile(expr.low), scope.compile(expr.high)];
      if (!isQuantity(value.type)) return null;
      const below = builder.sub(value.handle, builder.min(a.handle, b.handle));
      const above = builder.sub(builder.max(a.handle, b.handle), value.handle);
      return { type: difference(value.type), handle: builder.min(below, above) };
    }
    case 'binary':
      return expr.operator === 'and' || expr.operator === 'or' ? joined(expr, scope) : distance(expr, scope);
    default:
      return null;
  }
}

function joined(expr: BinaryExpr, scope: Scope): Reserve | null {
  const left = reserveOf(expr.left, scope);
  const right = reserveOf(expr.right, scope);
  if (!left || !right || !sameKind(left.type, right.type)) return null;
  const handle = scope.builder.op(expr.operator === 'and' ? 'min' : 'max', left.handle, right.handle);
  return { type: left.type, handle };
}

function distance(expr: BinaryExpr, scope: Scope): Reserve | null {
  const left = scope.compile(expr.left);
  const right = scope.compile(expr.right);
  if (!isQuantity(left.type)) return null;
  const upward = expr.operator === '>' || expr.operator === '>=';
  const handle = upward ? scope.builder.sub(left.handle, right.handle) : scope.builder.sub(right.handle, left.handle);
  return { type: difference(left.type), handle };
}

/** The difference of two temperature points is in kelvin. */
function difference(kind: ValueKind): ValueKind {
  return kind.scale === 'celsius' ? TEMPERATURE_DIFFERENCE : kind;
}
