// Units that stand alone: behind `as`, and in the brackets of a bench's columns.

import type { Unit } from '../quantity/index.ts';
import { describeUnitFault, isUnitFault } from '../quantity/index.ts';
import { skipBlanks } from './characters.ts';
import { halt } from './messages.ts';
import type { Reader } from './reader.ts';
import type { Span } from './syntax.ts';
import { scanUnitAt } from './unit-memo.ts';

/** Reads `as kohm` from its first word. */
export function readAs(reader: Reader): { unit: Unit; span: Span } {
  const { start, end } = reader.take();
  const { unit, span } = unitAt(reader.text, skipBlanks(reader.text, end, reader.limit), reader.limit);
  const whole = { start, end: span.end };
  reader.jump(whole);
  return { unit, span: whole };
}

/** The unit at `at`; leaves with a message where none stands or more is glued to it. */
export function unitAt(text: string, at: number, limit: number): { unit: Unit; span: Span } {
  const start = text.startsWith('1/', at) ? at + 1 : at;
  if (start >= limit) halt('unit-missing', { start: at, end: at });
  const read = scanUnitAt(text, start, limit);
  const fault = isUnitFault(read) ? read : read.behind;
  if (!fault && !isUnitFault(read)) return { unit: read.unit, span: { start: at, end: read.end } };
  const span = { start: Math.min(fault!.start, limit), end: Math.min(fault!.end, limit) };
  if (fault!.fault === 'unit missing') halt('unit-missing', span);
  return halt('unit-form', span, describeUnitFault(fault!));
}
