// The columns of a bench: what each holds, and in which unit its bare numbers are.

import type { CellTree, FieldTree } from '../../language/index.ts';
import { CURRENT, VOLTAGE, sameKind } from '../../quantity/index.ts';
import type { Unit, ValueKind } from '../../quantity/index.ts';
import { stop } from '../stop.ts';
import { typeName } from '../value-type.ts';

/** What a bench measures. */
type Measured = 'V_GS' | 'I_D' | 'V_DS';

export interface BenchColumn {
  readonly name: string;
  /** null for the column that names the specimen. */
  readonly measured: Measured | null;
  readonly unit: Unit | null;
}

/** The kind of each measured quantity. */
export const MEASURED: Readonly<Record<Measured, ValueKind>> = { V_GS: VOLTAGE, I_D: CURRENT, V_DS: VOLTAGE };

/** Reads the line of columns; stops where one is missing, doubled or in a wrong unit. */
export function benchColumns(tree: CellTree, hasOneDrainVoltage: boolean): readonly BenchColumn[] {
  const field = tree.fields.find(({ body }) => body.type === 'columns');
  if (!field || field.body.type !== 'columns') {
    const text = `${tree.name.name} does not say what its rows hold. Write columns: V_GS [V], I_D [mA], V_DS [V] above them.`;
    stop('bench-columns', text, tree.entry.span);
  }
  const columns = field.body.columns.map((column): BenchColumn => readColumn(column, field));
  columns.forEach(({ name, measured }, i) => {
    const first = columns.findIndex((other) => other.measured === measured);
    if (first === i) return;
    const text =
      measured === null
        ? `${columns[first]!.name} and ${name} both have no quantity of a bench: one column names the specimen, the others are V_GS, I_D and V_DS.`
        : `${name} stands in two columns. Keep one.`;
    stop('bench-columns', text, spanOf(field, i), field.line);
  });
  const has = (wanted: Measured): boolean => columns.some(({ measured }) => measured === wanted);
  for (const wanted of ['V_GS', 'I_D'] as const)
    if (!has(wanted)) stop('bench-columns', missingText(tree.name.name, wanted), field.body.span, field.line);
  if (!has('V_DS') && !hasOneDrainVoltage) {
    const text = `${tree.name.name} does not say at which V_DS it was measured. Add a column V_DS [V], or one line for all rows: V_DS: 10 V.`;
    stop('bench-columns', text, field.body.span, field.line);
  }
  return columns;
}

function readColumn(
  { name, unit, span }: Extract<FieldTree['body'], { type: 'columns' }>['columns'][number],
  field: FieldTree,
): BenchColumn {
  const measured = Object.hasOwn(MEASURED, name.name) ? (name.name as Measured) : null;
  if (measured === null && unit !== null) {
    const text = `${name.name} is no quantity of a bench, which has V_GS, I_D and V_DS. A column without a unit names the specimen.`;
    stop('bench-columns', text, span, field.line);
  }
  if (measured !== null && unit !== null && !sameKind(unit.kind, MEASURED[measured])) {
    const text = `${measured} is ${typeName(MEASURED[measured])}, and ${unit.text} measures ${typeName(unit.kind)}. Write ${measured} [${measured === 'I_D' ? 'mA' : 'V'}].`;
    stop('bench-columns', text, span, field.line);
  }
  return { name: name.name, measured, unit };
}

function missingText(cell: string, wanted: Measured): string {
  return `${cell} has no column ${wanted}. It wants V_GS and I_D, and V_DS or one V_DS for all rows.`;
}

function spanOf({ body }: FieldTree, i: number): { start: number; end: number } {
  if (body.type !== 'columns') throw new Error('Not a line of columns.');
  return body.columns[i]!.span;
}
