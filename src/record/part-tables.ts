// A part in every convention of the trade, and the routes that lead to its law, as rows of texts.

import { PLAIN, SQUARE_LAW_CONSTANT, VOLTAGE, formatValue } from '../quantity/index.ts';
import type { PartReading } from '../sheet/index.ts';
import { byColumns, namesOf, number, quantity, word } from './bench-table.ts';
import type { BenchTable } from './bench-table.ts';
import { NONE } from './column-texts.ts';

interface ConventionRow {
  readonly name: string;
  /** `at V_GS = 10 V, I_D = 100 mA`; empty where none is needed. */
  readonly condition: string;
  readonly value: string;
  /** What the part's own row says where the law says otherwise. */
  readonly written: string;
  readonly sentence: string;
}

/** Values closer than this say the same. */
const SAME = 1e-9;

/** One row for each convention that applies. */
export function conventionRows({ conventions }: PartReading): ConventionRow[] {
  return conventions.map(({ name, conditions, value, type, written, sentence }) => ({
    name,
    condition: conditionText(conditions),
    value: formatValue(value, type).text,
    written:
      written === null || Math.abs(written - value) <= SAME * Math.abs(value)
        ? ''
        : formatValue(written, type, { zeros: 'drop' }).text,
    sentence,
  }));
}

function conditionText(conditions: PartReading['conventions'][number]['conditions']): string {
  const texts = conditions.map(
    ({ name, value, type }) => `${name} = ${formatValue(value, type, { zeros: 'drop', digits: 4 }).text}`,
  );
  return texts.length === 0 ? '' : `at ${texts.join(', ')}`;
}

/** Tables of a part for the terminal: the law in every convention, and its routes side by side where there are several. */
export function partTables(part: PartReading, isJfet: boolean): BenchTable[] {
  const rows = conventionRows(part);
  const hasWritten = rows.some(({ written }) => written !== '');
  const conventions: BenchTable = {
    name: 'conventions',
    caption: 'The law in every convention.',
    ...byColumns([
      word('form', namesOf(rows)),
      number(
        'nominal',
        rows.map(({ value }) => value),
      ),
      ...(hasWritten
        ? [
            number(
              'as written',
              rows.map(({ written }) => written),
            ),
          ]
        : []),
      word(
        'condition',
        rows.map(({ condition }) => condition),
      ),
    ]),
  };
  return part.routes.length > 1 ? [conventions, routesTable(part, isJfet)] : [conventions];
}

/** The complete routes of a part, the one that computes first, with how far they are from it. */
export function routesTable({ routes }: PartReading, isJfet: boolean): BenchTable {
  const of = (value: number | null, text: (value: number) => string): string => (value === null ? NONE : text(value));
  return {
    name: 'routes',
    caption: `Routes to the law. The difference is that of ${isJfet ? 'beta' : 'K'}.`,
    ...byColumns([
      word('rows', namesOf(routes)),
      quantity(
        isJfet ? 'beta' : 'K',
        routes.map(({ beta }) => of(beta, (value) => formatValue(value, SQUARE_LAW_CONSTANT).text)),
      ),
      quantity(
        'V_TO',
        routes.map(({ V_TO }) => of(V_TO, (value) => formatValue(value, VOLTAGE).text)),
      ),
      number(
        'difference',
        routes.map(({ difference }, at) => (at === 0 ? 'computes' : differenceText(difference))),
      ),
    ]),
  };
}

function differenceText(difference: number | null): string {
  if (difference === null) return 'no law';
  const percent = formatValue(Math.abs(difference) * 100, PLAIN, { digits: 2 }).text;
  return `${percent} % ${difference >= 0 ? 'above' : 'below'}`;
}
