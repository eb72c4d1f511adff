// bench = "bench" ;   its fields say what the columns are and what is asked of the rows of numbers and names below.
//
// columns = column { "," column } ;   column = name [ "[" unit "]" ] ;

import { skipBlanks } from './characters.ts';
import { beginsWith } from './entry-kind.ts';
import type { EntryKind } from './entry-kind.ts';
import { readExponent, readFitting, readKeep, readMatch } from './bench-fields.ts';
import { halt } from './messages.ts';
import { nearestNames } from './nearest.ts';
import { readQuantityField } from './quantity-entry.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { BenchEntry, ColumnsBody, FieldBody, NameRef } from './syntax.ts';
import type { Unit } from '../quantity/index.ts';
import { unitAt } from './unit-text.ts';

/** The label in whose line a bracket is a unit. */
export const COLUMNS = 'columns';

export const BENCH: EntryKind = {
  type: 'bench',
  starts: beginsWith('bench'),
  read: readBench,
  fields: { read: readBenchField, rows: true },
};

const FIELDS: Readonly<Record<string, (reader: Reader, label: readonly NameRef[]) => FieldBody>> = {
  [COLUMNS]: readColumns,
  V_DS: readQuantityField,
  lambda: readQuantityField,
  R_thJA: readQuantityField,
  exponent: readExponent,
  keep: readKeep,
  match: readMatch,
  fitting: readFitting,
};

function readBench(reader: Reader): BenchEntry {
  const { start } = reader.take();
  reader.expectNothing();
  return { type: 'bench', span: reader.spanFrom(start) };
}

function readBenchField(reader: Reader, label: readonly NameRef[]): FieldBody {
  const { name } = label[0];
  if (label.length === 1 && Object.hasOwn(FIELDS, name)) return FIELDS[name](reader, label);
  const span = { start: label[0].span.start, end: label.at(-1)!.span.end };
  return halt('bench-field', span, reader.textOf(span), nearestNames(name, Object.keys(FIELDS)));
}

function readColumns(reader: Reader): ColumnsBody {
  const { start } = reader.ahead;
  const columns: { name: NameRef; unit: Unit | null; span: { start: number; end: number } }[] = [];
  do {
    const { ahead } = reader;
    if (ahead.type !== 'name') halt('columns-form', spanOf(ahead));
    reader.take();
    const unit = reader.atSign('[') ? readBracket(reader) : null;
    columns.push({ name: { name: ahead.name, span: spanOf(ahead) }, unit, span: reader.spanFrom(ahead.start) });
  } while (reader.takeSign(','));
  reader.expectListEnd();
  return { type: 'columns', columns, span: reader.spanFrom(start) };
}

function readBracket(reader: Reader): Unit {
  const open = reader.take();
  const { unit, span } = unitAt(reader.text, skipBlanks(reader.text, open.end, reader.limit), reader.limit);
  const close = skipBlanks(reader.text, span.end, reader.limit);
  if (close >= reader.limit || reader.text[close] !== ']') halt('bracket-open', spanOf(open));
  reader.jump({ start: open.start, end: close + 1 });
  return unit;
}
