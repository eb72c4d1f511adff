// The rows that a part takes from the bench it is fitted to.
//
// One specimen gives plain numbers: beta (K) with V_TO. Several give what they spread over, from the least
// to the largest with the median between: I_DSS with V_P where they conduct at V_GS = 0, else K with V_TO.
// The bench settles the law. A row of the law that the part has itself is compared with it, or, having
// limits, cuts the declared set; any other row of the part takes the place of the bench's.

import type { PartEntry, QuantityEntry } from '../language/index.ts';
import { CURRENT, PLAIN, RECIPROCAL_VOLTAGE, SQUARE_LAW_CONSTANT, VOLTAGE, formatValue } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Measured } from './bench/measured.ts';
import type { CellContext } from './draft.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import { Waiting, kindName } from './resolve.ts';
import { PART_FIELDS } from './part-fields.ts';
import { stop } from './stop.ts';
import { nearestNames } from '../language/index.ts';

/** A row that a bench can give, and what it is of the bench's offered values. */
interface Row {
  readonly name: string;
  readonly kind: ValueKind;
  readonly formula: string;
  readonly nominal: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly error: number | null;
}

/** What was written in a part and what its bench adds, with the sentences that say so. */
interface MeasuredRows {
  readonly given: GivenFields;
  readonly assumptions: readonly string[];
}

/** Joins the rows of the bench to those of the part; stops where there is no such bench or it speaks of another kind of FET. */
export function measuredRows(entry: PartEntry, written: GivenFields, context: CellContext): MeasuredRows {
  const bench = entry.fittedTo!.name;
  const measured = benchOf(entry, context);
  const rows = rowsOf(entry.family, bench, measured);
  const given = new Map<string, readonly GivenField[]>(written);
  const part = context.tree.name.name;
  const assumptions: string[] = [sampleText(part, bench, measured)];
  for (const row of rows) {
    const own = written.get(row.name) ?? (row.name === 'lambda' ? written.get('g_os') : undefined);
    if (own && PART_FIELDS[row.name]!.role !== 'law') {
      assumptions.push(replacedText(part, bench, own[0]!.name, row));
      continue;
    }
    given.set(row.name, [fieldOf(row, context), ...(own ?? [])]);
  }
  const compared = [...written.keys()].filter(
    (name) => PART_FIELDS[name]!.role === 'law' && !['W', 'L'].includes(name),
  );
  if (compared.length > 0)
    assumptions.push(
      `${part}: ${bench} settles the law; ${compared.join(', ')} as written ${compared.length === 1 ? 'is' : 'are'} compared with it, and limits cut the set.`,
    );
  return { given, assumptions };
}

function benchOf(entry: PartEntry, context: CellContext): Measured {
  const { name, span } = entry.fittedTo!;
  const cell = context.look(name);
  if (!cell) {
    const near = nearestNames(name, context.names());
    stop(
      'unknown-name',
      `There is no bench ${name}.${near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : ''}`,
      span,
    );
  }
  if (!cell.settled) throw new Waiting(name);
  const { bench } = cell;
  if (!bench)
    stop('bench-expected', `${name} is ${kindName(cell.kind)}; a bench is wanted here, such as M1 = bench.`, span);
  const channel = entry.channel === 'n' ? 1 : -1;
  const other = `${bench.channel === 1 ? 'n' : 'p'}-${entry.family}`;
  if (bench.channel !== channel)
    stop(
      'fitted-channel',
      `V_DS of ${name} is ${bench.channel === 1 ? 'above' : 'below'} 0 V, as on ${bench.channel === 1 ? 'an n' : 'a p'}-channel FET. Write ${other} fitted to ${name}, or mend the signs of the bench.`,
      span,
    );
  if (entry.family === 'JFET' && !bench.depletion) {
    const volts = formatValue(bench.V_TO.nominal, VOLTAGE).text;
    stop(
      'fitted-kind',
      `${name} opens at V_GS = ${volts} and carries nothing at 0 V: that is no JFET. Write ${entry.channel}-MOSFET fitted to ${name}.`,
      span,
    );
  }
  return bench;
}

function rowsOf(family: PartEntry['family'], bench: string, measured: Measured): Row[] {
  const { beta, V_TO, I_DSS, lambda, tracking, channel, depletion } = measured;
  const row = (name: string, kind: ValueKind, formula: string, number: Measured['beta']): Row => ({
    name,
    kind,
    formula,
    ...number,
  });
  const slope = row('lambda', RECIPROCAL_VOLTAGE, `${bench}.lambda`, { ...lambda, low: null, high: null });
  if (tracking === null) {
    const card = family === 'JFET' && channel === -1;
    const threshold = card ? { ...V_TO, nominal: -V_TO.nominal } : V_TO;
    return [
      row('V_TO', VOLTAGE, card ? `-${bench}.V_TO` : `${bench}.V_TO`, threshold),
      row(family === 'JFET' ? 'beta' : 'K', SQUARE_LAW_CONSTANT, `${bench}.beta`, beta),
      slope,
    ];
  }
  // Of a MOSFET the quantile of the threshold itself is tied, which in depletion counts down as its amount grows.
  const tied = family === 'MOSFET' && depletion ? -tracking : tracking;
  const together = row('tracking', PLAIN, `${bench}.tracking`, { nominal: tied, low: null, high: null, error: null });
  if (depletion)
    return [
      row('V_P', VOLTAGE, `${bench}.V_TO`, V_TO),
      row('I_DSS', CURRENT, `${bench}.I_DSS`, I_DSS),
      slope,
      together,
    ];
  return [
    row('V_TO', VOLTAGE, `${bench}.V_TO`, V_TO),
    row('K', SQUARE_LAW_CONSTANT, `${bench}.beta`, beta),
    slope,
    together,
  ];
}

function fieldOf({ name, kind, formula, nominal, low, high, error }: Row, { builder, tree }: CellContext): GivenField {
  const handle = builder.input(nominal);
  const spread = low === null || high === null || low === high ? null : { low, high };
  const body: QuantityEntry = {
    type: 'quantity',
    value: null,
    spread: null,
    conditions: [],
    as: null,
    span: tree.entry.span,
  };
  return {
    name,
    handle,
    kind,
    quantity: {
      type: kind,
      handle,
      draw: spread && { handle, form: 'value' },
      spread:
        spread &&
        ((read) => ({
          ...spread,
          nominal: read(handle),
          law: 'uniform',
          form: 'limits',
          service: false,
          nominalChosen: false,
        })),
      isInput: false,
      chosen: false,
      fromZero: false,
    },
    conditions: new Map(),
    tree: { label: [], labelSpan: tree.entry.span, body, source: null, note: null, line: tree.line },
    measured: { formula, error },
  };
}

function sampleText(part: string, bench: string, { specimens, kept }: Measured): string {
  if (specimens === 1)
    return `${part}: one specimen was measured in ${bench}; what others of its kind spread over is not in it.`;
  const which = kept === specimens ? `the ${specimens} specimens` : `${kept} of the ${specimens} specimens`;
  const together = kept > 2 ? '' : ' So few do not say what goes together: their constants are taken as independent.';
  return `${part}: ${which} of ${bench} stand for all; their least and largest are taken as the limits.${together}`;
}

function replacedText(part: string, bench: string, own: string, row: Row): string {
  return `${part}.${own}: as written in the part, in the place of what ${bench} gives, ${row.name} = ${formatValue(row.nominal, row.kind).text}.`;
}
