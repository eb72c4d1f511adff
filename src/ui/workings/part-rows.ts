// The numbers of a part or point as data sheets print them, and the forms its law can be written in.

import { shownReading } from '../../record/index.ts';
import { formatRow, formatValue } from '../../quantity/index.ts';
import type { CellReading, FieldReading, SheetView } from '../../sheet/index.ts';
import { sourceWords } from './source-words.ts';

export interface PartRow {
  readonly name: string;
  readonly low: string;
  readonly nominal: string;
  readonly high: string;
  readonly source: string;
}

export interface FormRow {
  readonly name: string;
  readonly value: string;
  readonly sentence: string;
}

const DIGITS = 4;

/** Whether a part is one of a JFET. */
export function isJfet({ tree }: CellReading): boolean {
  return tree.entry.type === 'part' && tree.entry.family === 'JFET';
}

/** One row for each field that is a number, behind those that come from a bench. */
export function partRows(cell: CellReading, sheet: SheetView): readonly PartRow[] {
  const { entry } = cell.tree;
  const bench = entry.type === 'part' && entry.fittedTo ? `bench ${entry.fittedTo.name}` : '';
  const measured = cell.measured.map((field) => ({ name: field.name, ...numbersOf(field), source: bench }));
  const written = cell.fields.map((field) => {
    const tree = cell.tree.fields.find(({ line }) => line.index === field.line);
    const source = tree ? sourceWords(tree, sheet.tree.lines) : null;
    return { name: field.name, ...numbersOf(field), source: source ?? (field.isInput ? 'no source yet' : '') };
  });
  return [...measured, ...written];
}

/** What a part or point offers beyond what was given, as far as it has a value. */
export function formRows(cell: CellReading): readonly FormRow[] {
  const given = new Set([...cell.fields, ...cell.measured].map(({ name }) => name));
  return cell.values.flatMap((offered) => {
    const value = shownReading(offered);
    return value === null || given.has(offered.name) ? [] : [{ name: offered.name, value, sentence: offered.sentence }];
  });
}

function numbersOf({ value, type, as, spread, isInput }: FieldReading): Pick<PartRow, 'low' | 'nominal' | 'high'> {
  if (typeof value !== 'number' || typeof type === 'string' || Number.isNaN(value)) {
    return { low: '', nominal: value === null ? '' : String(value), high: '' };
  }
  if (spread === null) {
    const digits = isInput ? 'all' : DIGITS;
    return { low: '', nominal: formatValue(value, type, { unit: as, digits, zeros: 'drop' }).text, high: '' };
  }
  const { low, nominal, high } = formatRow({ low: spread.low, nominal: value, high: spread.high }, type, {
    unit: as,
    digits: DIGITS,
    zeros: 'drop',
  });
  return { low: low?.text ?? 'open', nominal: nominal.text, high: high?.text ?? 'open' };
}
