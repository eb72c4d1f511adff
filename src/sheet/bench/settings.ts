// What a bench asks of its rows: the fields beside its columns, checked.

import type { CellTree, Condition, FieldTree, Literal } from '../../language/index.ts';
import {
  CURRENT,
  RECIPROCAL_VOLTAGE,
  SQUARE_LAW_CONSTANT,
  THERMAL_RESISTANCE,
  VOLTAGE,
  sameKind,
} from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import { nearestNames } from '../../language/index.ts';
import { literalOf } from '../../language/index.ts';
import { stop } from '../stop.ts';
import { typeName } from '../value-type.ts';

/** Specimens are kept whose quantity lies in low..high, SI; null for an open end. */
export interface Keep {
  readonly quantity: keyof typeof KEPT;
  readonly low: number | null;
  readonly high: number | null;
  /** The current and V_DS at which V_GS is meant, the latter by its amount; NaN for the edge of saturation. */
  readonly at: { readonly I_D: number; readonly V_DS: number } | null;
  readonly tree: FieldTree;
}

/** Where groups are to agree; V_DS by its amount. */
export interface Match {
  readonly size: 2 | 4;
  readonly I_D: number;
  readonly I_second: number | null;
  readonly V_DS: number;
  readonly tree: FieldTree;
}

/** The current that every specimen is to be set to by a resistor in its source lead; V_DS by its amount. */
export interface Fitting {
  readonly I_D: number;
  readonly V_DS: number;
  /** The voltage at the gate, against the far end of the resistor. */
  readonly V_GG: number;
  readonly tree: FieldTree;
}

export interface BenchSettings {
  /** The one V_DS of all rows; null where a column has it. */
  readonly V_DS: number | null;
  readonly lambda: number | 'fit';
  readonly exponent: 'square' | 'free';
  readonly R_thJA: { readonly value: number; readonly tree: FieldTree } | null;
  readonly keep: readonly Keep[];
  readonly match: Match | null;
  readonly fitting: Fitting | null;
}

/** What `keep` may speak of. */
const KEPT = {
  V_P: VOLTAGE,
  V_TO: VOLTAGE,
  V_GS: VOLTAGE,
  I_DSS: CURRENT,
  beta: SQUARE_LAW_CONSTANT,
  lambda: RECIPROCAL_VOLTAGE,
} satisfies Record<string, ValueKind>;

const NUMBERS: Readonly<Record<string, ValueKind>> = {
  V_DS: VOLTAGE,
  lambda: RECIPROCAL_VOLTAGE,
  R_thJA: THERMAL_RESISTANCE,
};

/** Fields that may stand more than once. */
const REPEATED = ['keep'];

/** Reads the fields of a bench; stops at the first that does not fit. */
export function benchSettings(tree: CellTree): BenchSettings {
  const byName = new Map<string, FieldTree>();
  const keep: Keep[] = [];
  for (const field of tree.fields) {
    const { name } = field.label[0]!;
    if (byName.has(name) && !REPEATED.includes(name))
      stop(
        'field-twice',
        `${name} stands twice in this bench. Keep one of the two lines.`,
        field.labelSpan,
        field.line,
      );
    byName.set(name, field);
    if (field.body.type === 'keep') keep.push(readKeep(field));
  }
  const exponent = byName.get('exponent')?.body;
  const resistance = byName.get('R_thJA');
  return {
    V_DS: numberIn(byName.get('V_DS')),
    lambda: numberIn(byName.get('lambda')) ?? 'fit',
    exponent: exponent?.type === 'exponent' && exponent.isFree ? 'free' : 'square',
    R_thJA: resistance ? { value: numberIn(resistance)!, tree: resistance } : null,
    keep,
    match: readMatch(byName.get('match')),
    fitting: readFitting(byName.get('fitting')),
  };
}

/** The number of a field that holds one; null where there is no such field. */
function numberIn(field: FieldTree | undefined): number | null {
  if (!field || field.body.type !== 'quantity') return null;
  const { name } = field.label[0]!;
  const { value, spread, conditions, span } = field.body;
  const literal = value && literalOf(value);
  if (!literal || spread || conditions.length > 0)
    stop(
      'bench-number',
      `${name} of a bench is one number, without a spread: what was measured, not what may be.`,
      span,
      field.line,
    );
  const kind = NUMBERS[name]!;
  checkKind(name, literal, kind, field);
  if (name !== 'V_DS' && literal.value < 0)
    stop('field-sign', `${name} is 0 or more. You wrote ${textOf(field, literal)}.`, literal.span, field.line);
  return literal.value;
}

function readKeep(tree: FieldTree): Keep {
  const { body } = tree;
  if (body.type !== 'keep') throw new Error('Not a line that keeps specimens.');
  const { name, span } = body.quantity;
  if (!Object.hasOwn(KEPT, name)) {
    const near = nearestNames(name, Object.keys(KEPT));
    const hint = near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : '';
    stop(
      'bench-keep',
      `keep cannot go by ${name}.${hint} It goes by ${Object.keys(KEPT).join(', ')}.`,
      span,
      tree.line,
    );
  }
  const quantity = name as keyof typeof KEPT;
  const { first, last } = body.bounds;
  for (const limit of [first, last]) if (limit) checkKind(quantity, limit, KEPT[quantity], tree);
  const at = conditionsIn(body.conditions, ['I_D', 'V_DS'], tree);
  if (quantity === 'V_GS' && !at.has('I_D'))
    stop(
      'bench-keep',
      'V_GS belongs to a current: write keep: V_GS in -1.2 V .. -0.9 V at I_D = 1 mA.',
      span,
      tree.line,
    );
  if (quantity !== 'V_GS' && at.size > 0)
    stop(
      'bench-keep',
      `${quantity} is one number of the fitted law and takes no condition; V_GS does.`,
      body.conditions[0]!.name.span,
      tree.line,
    );
  const ordered = first && last && first.value > last.value ? [last, first] : [first, last];
  return {
    quantity,
    low: ordered[0]?.value ?? null,
    high: ordered[1]?.value ?? null,
    at: quantity === 'V_GS' ? { I_D: at.get('I_D')!, V_DS: Math.abs(at.get('V_DS') ?? NaN) } : null,
    tree,
  };
}

function readMatch(tree: FieldTree | undefined): Match | null {
  if (tree?.body.type !== 'match') return null;
  const { size, conditions, second } = tree.body;
  const at = conditionsIn(conditions, ['I_D', 'V_DS'], tree);
  if (second) checkKind('I_D', second, CURRENT, tree);
  if (second && second.value <= 0) positiveCurrent(second, tree);
  const I_D = currentOf(at, tree);
  return { size, I_D, I_second: second?.value ?? null, V_DS: Math.abs(at.get('V_DS') ?? NaN), tree };
}

function readFitting(tree: FieldTree | undefined): Fitting | null {
  if (tree?.body.type !== 'fitting') return null;
  const at = conditionsIn(tree.body.conditions, ['I_D', 'V_DS', 'V_GG'], tree);
  return { I_D: currentOf(at, tree), V_DS: Math.abs(at.get('V_DS') ?? NaN), V_GG: at.get('V_GG') ?? 0, tree };
}

function currentOf(at: ReadonlyMap<string, number>, { body, line, label }: FieldTree): number {
  const current = at.get('I_D');
  if (current === undefined)
    stop('bench-point', `${label[0]!.name} lacks its current: write I_D = 1 mA.`, body.span, line);
  return current;
}

/** Conditions by name, in SI; stops at one that this field does not know, that stands twice or is of the wrong kind. */
function conditionsIn(
  conditions: readonly Condition[],
  known: readonly string[],
  tree: FieldTree,
): Map<string, number> {
  const found = new Map<string, number>();
  for (const { name, literal } of conditions) {
    if (!known.includes(name.name))
      stop(
        'bench-point',
        `${name.name} says nothing here. ${tree.label[0]!.name} takes ${known.join(', ')}.`,
        name.span,
        tree.line,
      );
    if (found.has(name.name))
      stop('condition-twice', `${name.name} stands twice here. Keep one.`, name.span, tree.line);
    checkKind(name.name, literal, name.name === 'I_D' ? CURRENT : VOLTAGE, tree);
    if (name.name === 'I_D' && literal.value <= 0) positiveCurrent(literal, tree);
    found.set(name.name, literal.value);
  }
  return found;
}

function positiveCurrent(literal: Literal, tree: FieldTree): never {
  return stop(
    'bench-point',
    `I_D is above 0 on both channels. You wrote ${textOf(tree, literal)}.`,
    literal.span,
    tree.line,
  );
}

function checkKind(name: string, literal: Literal, kind: ValueKind, tree: FieldTree): void {
  if (sameKind(literal.kind, kind)) return;
  stop(
    'field-dimension',
    `${name} is ${typeName(kind)}; ${textOf(tree, literal)} is ${typeName(literal.kind)}.`,
    literal.span,
    tree.line,
  );
}

function textOf({ line }: FieldTree, { span }: Literal): string {
  return line.text.slice(span.start, span.end);
}
