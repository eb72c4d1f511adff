// Indented lines: fields of the title and of block cells, and the rows of a bench.

import { COLUMNS } from './bench-entry.ts';
import { skipBlanks, trimEnd } from './characters.ts';
import type { Context } from './context.ts';
import type { EntryKind } from './entry-kind.ts';
import type { Label } from './label.ts';
import { bodySpan, labelAt, nameAt } from './label.ts';
import { atLiteral, readLiteral } from './literal.ts';
import { halt, message, reading } from './messages.ts';
import { nearestNames } from './nearest.ts';
import { Reader, spanOf } from './reader.ts';
import { orRemark } from './remark.ts';
import type { FieldBody, LineTree, Literal, Message, NameRef, Span } from './syntax.ts';
import type { Tail } from './tail.ts';
import { readTail } from './tail.ts';
import { TITLE_FIELDS } from './title-fields.ts';

type Fields = NonNullable<EntryKind['fields']>;

const NO_TAIL = { source: null, note: null };

/** Reads the line whose first character behind the blanks is at `at`. */
export function readIndentedLine(text: string, at: number, context: Context): LineTree {
  const label = labelAt(text, at);
  if (context.block === 'title') return readTitleField(text, at, label);
  if (context.block === 'unread') return textField(text, label ?? noLabel(at));
  if (context.fields) return label ? readField(text, label, context.fields) : readUnlabelled(text, at, context.fields);
  if (!label) return refuseUnlabelled(text, at, context);
  if (context.block === 'plain') return brokenField(message('field-not-taken', label.span), label, text);
  return loose(message(context.block === 'loose' ? 'field-of-unread-line' : 'field-without-cell', label.span));
}

function readField(text: string, label: Label, fields: Fields): LineTree {
  const unitBrackets = fields.rows && label.names[0].name === COLUMNS;
  const tail = readTail(text, label.bodyStart, { unitBrackets });
  const span = bodySpan(text, label.bodyStart, tail.limit);
  const read = reading(
    () => fields.read(new Reader(text, span.start, span.end), label.names),
    (fault) => brokenBody(orRemark(fault, text, span), span),
  );
  return field(label, tail.fault && read.type !== 'broken' ? brokenBody(tail.fault, span) : read, tail);
}

/** A row of a bench, or a field whose colon is missing. */
function readUnlabelled(text: string, at: number, fields: Fields): LineTree {
  if (!fields.rows) {
    const name = nameAt(text, at);
    const equals = nameBeforeEquals(text, at);
    const label = name ? { names: [name], span: name.span, bodyStart: name.span.end } : noLabel(at);
    const here = { start: at, end: trimEnd(text, at, text.length) };
    if (!name) return brokenField(unlabelled(text, here), label, text);
    if (!equals)
      return brokenField(message('colon-missing', name.span, text.slice(name.span.start, name.span.end)), label, text);
    const written = text.slice(equals.span.start, equals.span.end);
    return brokenField(message('field-equals', equals.span, written), label, text);
  }
  const tail = readTail(text, at);
  const span = bodySpan(text, at, tail.limit);
  const row = reading(
    () => readRow(new Reader(text, span.start, span.end)),
    (fault) => fault,
  );
  const fault = 'code' in row ? row : tail.fault;
  if (fault) return field(noLabel(at), brokenBody(fault, span), tail);
  return { type: 'row', values: row as RowValues, source: tail.source, note: tail.note };
}

type RowValues = readonly (Literal | NameRef)[];

// row = value { "," value } ;   value = literal | name ;
function readRow(reader: Reader): RowValues {
  const values: (Literal | NameRef)[] = [];
  do {
    const { ahead } = reader;
    if (atLiteral(reader)) values.push(readLiteral(reader));
    else if (ahead.type === 'name') values.push({ name: ahead.name, span: spanOf(reader.take()) });
    else if (ahead.type === 'end') halt('operand-missing', spanOf(ahead), 'The place behind the comma');
    else if (reader.atSign(',')) halt('row-gap', spanOf(ahead), values.length + 1);
    else halt('row-form', spanOf(ahead), reader.textOf(ahead));
  } while (reader.takeSign(','));
  reader.expectListEnd();
  return values;
}

// ---------------------------------------------------------------- the title

function readTitleField(text: string, at: number, label: Label | null): LineTree {
  if (!label) {
    const equals = nameBeforeEquals(text, at);
    if (equals) return loose(message('field-equals', equals.span, text.slice(equals.span.start, equals.span.end)));
    const here = { start: at, end: trimEnd(text, at, text.length) };
    return loose(message('field-unreadable', here, 'project: Tank level sensor'));
  }
  const written = text.slice(label.span.start, label.span.end);
  if (!TITLE_FIELDS.includes(written))
    return loose(message('title-field-unknown', label.span, written, nearestNames(written, TITLE_FIELDS)));
  return textField(text, label);
}

/** Free text; what does not end as a source and a note is text as well. */
function textField(text: string, label: Label): LineTree {
  const tail = readTail(text, label.bodyStart);
  const kept = tail.fault ? NO_TAIL : tail;
  const span = bodySpan(text, label.bodyStart, tail.fault ? text.length : tail.limit);
  return field(label, { type: 'text', text: text.slice(span.start, span.end), span }, kept);
}

// ---------------------------------------------------------------- what belongs nowhere

function refuseUnlabelled(text: string, at: number, context: Context): LineTree {
  const name = nameBeforeEquals(text, at);
  if (name) return loose(message('cell-indented', name.span, text.slice(name.span.start, name.span.end)), name);
  const here = { start: at, end: trimEnd(text, at, text.length) };
  const fault = unlabelled(text, here);
  return context.block === 'plain' ? brokenField(fault, noLabel(at), text) : loose(fault);
}

function unlabelled(text: string, here: Span): Message {
  if (/^[-+−]?\d/.test(text.slice(here.start))) return message('row-without-bench', here);
  return message('field-unreadable', here, 'gate: R_G to 0 V');
}

function nameBeforeEquals(text: string, at: number): NameRef | null {
  const name = nameAt(text, at);
  return name && text[skipBlanks(text, name.span.end, text.length)] === '=' ? name : null;
}

function noLabel(at: number): Label {
  return { names: [], span: { start: at, end: at }, bodyStart: at };
}

function field(label: Label, body: FieldBody, { source, note }: Pick<Tail, 'source' | 'note'> = NO_TAIL): LineTree {
  return { type: 'field', label: label.names, labelSpan: label.span, body, source, note };
}

function brokenField(fault: Message, label: Label, text: string): LineTree {
  return field(label, brokenBody(fault, bodySpan(text, label.bodyStart, text.length)));
}

function brokenBody(fault: Message, span: Span): FieldBody {
  return { type: 'broken', message: fault, span };
}

function loose(fault: Message, name: NameRef | null = null): LineTree {
  return { type: 'broken', name, message: fault };
}
