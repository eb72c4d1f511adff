// Kinds of value: telling them apart and naming them in the words of the trade.

import { dimensionName, sameKind } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { ValueType } from './model.ts';

/** Whether the type is a quantity (of any kind), not a condition or a region. */
export function isQuantity(type: ValueType): type is ValueKind {
  return typeof type !== 'string';
}

/** Whether two types are the same, dimensions and scales compared. */
export function sameType(a: ValueType, b: ValueType): boolean {
  if (typeof a === 'string' || typeof b === 'string') return a === b;
  return sameKind(a, b);
}

/** With its article: "a voltage", "a condition", "a region". */
export function typeName(type: ValueType): string {
  return typeof type === 'string' ? `a ${type}` : dimensionName(type);
}
