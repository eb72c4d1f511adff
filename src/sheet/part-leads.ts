// The resistances inside the leads of a part, where rows of R_DSon fit a series part of their own.

import type { Handle } from '../network/index.ts';
import { RESISTANCE, formatValue } from '../quantity/index.ts';
import type { CellContext, Placed, Read } from './draft.ts';
import type { GivenFields, RouteResult } from './part-given.ts';

/** The resistances in the leads as given; a fitted R_0 fills the drain lead with what r_s leaves of it. */
export function leadsOf(
  { R_0 }: RouteResult,
  given: GivenFields,
  { builder }: CellContext,
): { readonly r_s: Handle | null; readonly r_d: Handle | null } {
  const r_s = given.get('r_s')?.[0]?.handle ?? null;
  const r_d = given.get('r_d')?.[0]?.handle ?? null;
  if (R_0 === null || r_d !== null) return { r_s, r_d };
  return { r_s, r_d: r_s === null ? R_0 : builder.op('max', builder.sub(R_0, r_s), builder.constant(0)) };
}

/** R_0 of rows without any series part comes out this far below r_s at most, as a part of it. */
const ROUNDING = 1e-6;

/** The fault of an r_s that exceeds the series part which the rows fit, and which holds it; null where there is none. */
export function fittedLeadFault(
  { R_0 }: RouteResult,
  given: GivenFields,
  { tree }: CellContext,
  read: Read,
): Placed | null {
  const r_s = given.get('r_s')?.[0];
  if (R_0 === null || given.has('r_d') || !r_s) return null;
  if (read(R_0) >= read(r_s.handle) * (1 - ROUNDING)) return null;
  const [fitted, lead] = [R_0, r_s.handle].map((handle) => formatValue(read(handle), RESISTANCE).text);
  const text = `${tree.name.name} does not settle its square law. The three R_DSon rows fit a series part R_0 of ${fitted}, less than r_s, ${lead}, which is in it. Leave r_s out, or take a smaller one.`;
  return { line: r_s.tree.line, message: { code: 'no-law', text, span: r_s.tree.body.span } };
}

/** What is said where r_s and r_d as given differ from the series part that the rows fit by more than a share of it. */
export function leadDisagreement({ R_0 }: RouteResult, given: GivenFields, read: Read, share: number): string[] {
  if (R_0 === null || !given.has('r_d')) return [];
  const stated = ['r_s', 'r_d'].reduce((sum, name) => {
    const field = given.get(name)?.[0];
    return field ? sum + read(field.handle) : sum;
  }, 0);
  const fitted = read(R_0);
  if (Math.abs(fitted - stated) <= share * Math.max(fitted, stated)) return [];
  const [rows, leads] = [fitted, stated].map((value) => formatValue(value, RESISTANCE).text);
  return [`The R_DSon rows fit a series part R_0 of ${rows}; r_s + r_d as given are ${leads}, and stand.`];
}
