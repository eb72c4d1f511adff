// The rows of a bench as points of specimens, in SI and as a voltmeter shows them.

import type { CellTree, Literal, NameRef, Span } from '../../language/index.ts';
import type { Points } from '../../measured/index.ts';
import { PLAIN, sameKind, scaleToSI } from '../../quantity/index.ts';
import { stop } from '../stop.ts';
import { typeName } from '../value-type.ts';
import { MEASURED } from './columns.ts';
import type { BenchColumn } from './columns.ts';

type Row = CellTree['rows'][number];

export interface BenchSpecimen {
  /** '' where no column names it: the bench holds one specimen then. */
  readonly name: string;
  readonly points: Points;
  /** The row of each point. */
  readonly rows: readonly Row[];
}

export interface BenchRows {
  readonly channel: 1 | -1;
  readonly specimens: readonly BenchSpecimen[];
}

interface Reading {
  readonly row: Row;
  readonly specimen: string;
  readonly V_GS: number;
  readonly V_DS: number;
  readonly I_D: number;
}

/** Reads all rows; `drainVoltage` stands where no column does. Stops at the first place that cannot be read. */
export function benchRows(tree: CellTree, columns: readonly BenchColumn[], drainVoltage: number | null): BenchRows {
  if (tree.rows.length === 0) {
    const text = `${tree.name.name} has no rows. Below its columns stand the measured values with commas between them, as in -0.5, 2.1, 15.`;
    stop('bench-rows', text, tree.entry.span);
  }
  const readings = tree.rows.map((row) => readRow(row, columns, drainVoltage));
  const channel = channelOf(readings);
  const groups = new Map<string, Reading[]>();
  for (const reading of readings) {
    const group = groups.get(reading.specimen);
    if (group) group.push(reading);
    else groups.set(reading.specimen, [reading]);
  }
  return { channel, specimens: [...groups].map(([name, group]) => specimenOf(name, group)) };
}

function specimenOf(name: string, readings: readonly Reading[]): BenchSpecimen {
  const column = (quantity: 'V_GS' | 'V_DS' | 'I_D'): Float64Array =>
    Float64Array.from(readings, (reading) => reading[quantity]);
  const points = { V_GS: column('V_GS'), V_DS: column('V_DS'), I_D: column('I_D') };
  return { name, points, rows: readings.map(({ row }) => row) };
}

function readRow(row: Row, columns: readonly BenchColumn[], drainVoltage: number | null): Reading {
  const { values, line } = row;
  if (values.length !== columns.length) {
    const names = columns.map(({ name }) => name);
    const last = values[values.length - 1]!.span;
    const few = values.length < columns.length;
    const which = few
      ? `${listed(names.slice(values.length))} ${names.length - values.length === 1 ? 'is' : 'are'} missing`
      : 'the last ones belong to none';
    const text = `This row has ${counted(values.length, 'place')} and ${counted(names.length, 'column')}: ${which}. The columns are ${names.join(', ')}.`;
    stop('bench-row-length', text, few ? last : values[columns.length]!.span, line);
  }
  const reading: Record<'V_GS' | 'V_DS' | 'I_D', number> = { V_GS: NaN, V_DS: drainVoltage ?? NaN, I_D: NaN };
  let specimen = '';
  columns.forEach((column, i) => {
    if (column.measured === null) specimen = specimenName(values[i]!, column, row);
    else reading[column.measured] = numberOf(values[i]!, column, row);
  });
  return { row, specimen, ...reading };
}

/** A number in the place of a name is a specimen's number: `3` in the column `unit` is unit3. */
function specimenName(value: Literal | NameRef, column: BenchColumn, { line }: Row): string {
  if ('name' in value) return value.name;
  if (sameKind(value.kind, PLAIN) && Number.isInteger(value.value) && value.value >= 0)
    return `${column.name}${value.value}`;
  const text = `${line.text.slice(value.span.start, value.span.end)} names no specimen: ${column.name} holds a name such as s1, or a whole number.`;
  return stop('bench-specimen', text, value.span, line);
}

function numberOf(value: Literal | NameRef, { name, measured, unit }: BenchColumn, { line }: Row): number {
  const kind = MEASURED[measured!];
  const written = line.text.slice(value.span.start, value.span.end);
  if ('name' in value)
    stop(
      'bench-value',
      `${written} is a name; ${name} is ${typeName(kind)} and stands here as a number.`,
      value.span,
      line,
    );
  if (value.unit === null) {
    if (unit === null) {
      const text = `${written} has no unit. Write the unit in the line of columns, as in ${name} [${name === 'I_D' ? 'mA' : 'V'}].`;
      stop('bench-value', text, value.span, line);
    }
    return inRange(scaleToSI(String(value.value), unit), written, value.span, line);
  }
  if (!sameKind(value.kind, kind))
    stop('bench-value', `${name} is ${typeName(kind)}; ${written} is ${typeName(value.kind)}.`, value.span, line);
  return value.value;
}

function inRange(value: number, written: string, span: Span, line: Row['line']): number {
  if (Number.isFinite(value)) return value;
  return stop('bench-value', `${written} is too large to be computed with in the unit of its column.`, span, line);
}

/** The channel by the sign of V_DS, which all rows share. */
function channelOf(readings: readonly Reading[]): 1 | -1 {
  const positive = readings.find(({ V_DS }) => V_DS > 0);
  const negative = readings.find(({ V_DS }) => V_DS < 0);
  const first = readings[0]!;
  if (!positive && !negative) {
    const text = 'V_DS is 0 in every row, where no drain current flows. Measure with the drain at its working voltage.';
    stop('bench-drain', text, first.row.values[0]!.span, first.row.line);
  }
  if (positive && negative) {
    const { row } = readings.indexOf(positive) > readings.indexOf(negative) ? positive : negative;
    const text =
      'V_DS has the other sign here than in the rows above. It is positive on an n-channel FET and negative on a p-channel one.';
    stop('bench-drain', text, { start: row.values[0]!.span.start, end: row.values.at(-1)!.span.end }, row.line);
  }
  const largest = readings.reduce((most, each) => (Math.abs(each.I_D) > Math.abs(most.I_D) ? each : most));
  if (largest.I_D < 0) {
    const text =
      'I_D is negative. Currents are written positive on both channels, into the drain of an n-channel FET and out of that of a p-channel one.';
    stop(
      'bench-current',
      text,
      { start: largest.row.values[0]!.span.start, end: largest.row.values.at(-1)!.span.end },
      largest.row.line,
    );
  }
  return positive ? 1 : -1;
}

function counted(n: number, noun: string): string {
  return `${n} ${noun}${n === 1 ? '' : 's'}`;
}

function listed(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
