// Lines that begin at the margin and are no heading: cells, and what was meant as one.

import { isUnitSymbol } from '../quantity/index.ts';
import { isDigit, skipBlanks, trimEnd } from './characters.ts';
import type { Context } from './context.ts';
import { kindOfEntry } from './entries.ts';
import { bodySpan, labelAt, nameAt } from './label.ts';
import { message, reading } from './messages.ts';
import { Reader } from './reader.ts';
import { orRemark } from './remark.ts';
import { isCellName, proposeName } from './reserved.ts';
import type { BrokenEntry, Entry, LineTree, Message, NameRef, Span } from './syntax.ts';
import { readTail } from './tail.ts';

/** What can only stand behind the name of a cell whose equals sign was forgotten. */
const ENTRY_MARKS = '+-−±[(';

/** Reads `NAME = entry tail` from the margin at `at`. */
export function readCellLine(text: string, at: number, context: Context): LineTree {
  const name = nameAt(text, at);
  const behind = name ? skipBlanks(text, name.span.end, text.length) : at;
  if (name && text[behind] === '=') return readCell(text, name, behind + 1);
  return refuseMargin(text, at, context) ?? refuseCell(text, at, name, behind);
}

function readCell(text: string, name: NameRef, at: number): LineTree {
  const { limit, source, note, fault } = readTail(text, at);
  const span = bodySpan(text, at, limit);
  const refused = refuseName(text, name);
  const entry = refused ? brokenEntry(refused, span) : readEntry(text, name, span);
  return {
    type: 'cell',
    name,
    entry: fault && entry.type !== 'broken' ? brokenEntry(fault, span) : entry,
    source,
    note,
  };
}

function readEntry(text: string, name: NameRef, span: Span): Entry {
  const body = text.slice(span.start, span.end);
  if (body === '') return brokenEntry(message('entry-missing', name.span, written(text, name)), span);
  const kind = kindOfEntry(body);
  return reading(
    () => kind.read(new Reader(text, span.start, span.end)),
    (fault) => brokenEntry(orRemark(fault, text, span), span),
  );
}

function refuseName(text: string, name: NameRef): Message | null {
  const spelled = written(text, name);
  if (isCellName(spelled)) return null;
  const unit = isUnitSymbol(spelled) || isUnitSymbol(name.name);
  return message(unit ? 'name-taken-unit' : 'name-taken-word', name.span, spelled, proposeName(spelled));
}

/** A field at the margin still belongs to the block above: without it a stage would compute with a leg less. */
function refuseMargin(text: string, at: number, context: Context): LineTree | null {
  const label = context.fields || context.block === 'unread' ? labelAt(text, at) : null;
  if (!label) return null;
  const fault = message('field-not-indented', label.span, text.slice(label.span.start, label.span.end));
  const body = brokenEntry(fault, bodySpan(text, label.bodyStart, text.length));
  return { type: 'field', label: label.names, labelSpan: label.span, body, source: null, note: null };
}

function refuseCell(text: string, at: number, name: NameRef | null, behind: number): LineTree {
  const equals = text.indexOf('=');
  if (equals >= 0) {
    const span = { start: at, end: trimEnd(text, at, equals) };
    if (span.end > at) return broken(message('name-form', span, text.slice(span.start, span.end)));
  }
  const follows = behind < text.length ? text[behind] : '';
  const meant = follows === '' || isDigit(text.charCodeAt(behind)) || ENTRY_MARKS.includes(follows);
  if (name && meant) return broken(message('equals-missing', name.span, written(text, name)), name);
  if (name && follows === ':')
    return broken(message('colon-for-equals', { start: behind, end: behind + 1 }, written(text, name)), name);
  return broken(message('line-unknown', { start: at, end: trimEnd(text, at, text.length) }));
}

function written(text: string, { span }: NameRef): string {
  return text.slice(span.start, span.end);
}

function brokenEntry(fault: Message, span: Span): BrokenEntry {
  return { type: 'broken', message: fault, span };
}

function broken(fault: Message, name: NameRef | null = null): LineTree {
  return { type: 'broken', name, message: fault };
}
