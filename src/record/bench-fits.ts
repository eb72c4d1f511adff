// The fitted laws of a bench in a table, and each of its readings beside the law.

import { CURRENT, PLAIN, RECIPROCAL_VOLTAGE, SQUARE_LAW_CONSTANT, VOLTAGE, formatValue } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { BenchReading } from '../sheet/index.ts';
import { byColumns, namesOf, number, quantity, word } from './bench-table.ts';
import type { BenchTable } from './bench-table.ts';
import { NONE, columnTexts, columnWithErrors } from './column-texts.ts';

type Specimen = BenchReading['specimens'][number];

const METER_DIGITS = 4;
const DIFFERENCE_DIGITS = 2;

function percent(share: number, rounding: 'nearest' | 'down' | 'up' = 'nearest'): string {
  return formatValue(100 * share, PLAIN, { digits: 2, zeros: 'drop', rounding }).text;
}

/** One row for each specimen. */
export function fitsTable({ specimens, kept, unfitted }: BenchReading): BenchTable {
  const hasNames = specimens.some(({ name }) => name !== '');
  const hasCurrent = specimens.some(({ I_DSS }) => I_DSS > 0);
  const isFree = specimens.some(({ errors }) => errors.exponent !== null);
  const hasRejected = unfitted.length > 0 || specimens.some(({ isKept }) => !isKept);
  const given = specimens.every(({ errors }) => errors.lambda === null) ? specimens[0]!.lambda : null;
  const all = (name: 'beta' | 'V_TO' | 'I_DSS' | 'lambda' | 'exponent', kind: ValueKind): string[] =>
    columnWithErrors(
      specimens.map((each) => each[name]),
      specimens.map(({ errors }) => errors[name]),
      kind,
    );
  const { columns, rows } = byColumns([
    ...(hasNames ? [word('specimen', namesOf(specimens))] : []),
    number(
      'readings',
      specimens.map(({ points }) => String(points.I_D.length)),
    ),
    quantity('beta', all('beta', SQUARE_LAW_CONSTANT)),
    quantity('V_TO', all('V_TO', VOLTAGE)),
    ...(hasCurrent ? [quantity('I_DSS', all('I_DSS', CURRENT))] : []),
    ...(given === null ? [quantity('lambda', all('lambda', RECIPROCAL_VOLTAGE))] : []),
    ...(isFree ? [number('exponent', all('exponent', PLAIN))] : []),
    number(
      'rms',
      columnTexts(
        specimens.map(({ rms }) => rms),
        CURRENT,
        DIFFERENCE_DIGITS,
      ),
    ),
    ...(hasRejected
      ? [
          word(
            'kept',
            specimens.map(({ isKept }) => (isKept ? 'yes' : 'no')),
          ),
        ]
      : []),
  ]);
  const slope = given === null ? '' : ` lambda is ${formatValue(given, RECIPROCAL_VOLTAGE, { zeros: 'drop' }).text}.`;
  const share = kept
    ? ` ${kept.count} of ${kept.of} are kept, ${percent(kept.count / kept.of)} %; of a batch from which they were taken at random it would be ${percent(kept.low, 'down')} to ${percent(kept.high, 'up')} %.`
    : '';
  const caption = `The fitted square law${hasNames ? ' of each specimen' : ''}; ± is one standard error.${slope}${share}`;
  const left = unfitted.map(({ name, readings }) =>
    columns.map(({ title }) => ({ specimen: name, readings: String(readings), kept: 'no' })[title] ?? NONE),
  );
  return { name: 'fits', caption, columns, rows: [...rows, ...left] };
}

/** One row for each reading. */
export function readingsTable({ specimens }: BenchReading): BenchTable {
  const hasNames = specimens.some(({ name }) => name !== '');
  const all = (pick: (each: Specimen) => Iterable<number>): number[] => specimens.flatMap((each) => [...pick(each)]);
  const law = all(({ points, residuals }) => points.I_D.map((current, i) => current - residuals[i]!));
  return {
    name: 'readings',
    caption: 'Each reading, the law there, and by how much the reading differs from it.',
    ...byColumns([
      ...(hasNames
        ? [
            word(
              'specimen',
              specimens.flatMap(({ name, regions }) => regions.map(() => name)),
            ),
          ]
        : []),
      quantity(
        'V_GS',
        columnTexts(
          all(({ points }) => points.V_GS),
          VOLTAGE,
          METER_DIGITS,
        ),
      ),
      quantity(
        'V_DS',
        columnTexts(
          all(({ points }) => points.V_DS),
          VOLTAGE,
        ),
      ),
      quantity(
        'I_D',
        columnTexts(
          all(({ points }) => points.I_D),
          CURRENT,
          METER_DIGITS,
        ),
      ),
      number('law', columnTexts(law, CURRENT, METER_DIGITS)),
      number(
        'difference',
        columnTexts(
          all(({ residuals }) => residuals),
          CURRENT,
          DIFFERENCE_DIGITS,
        ),
      ),
      word(
        'region',
        specimens.flatMap(({ regions }) => regions),
      ),
    ]),
  };
}
