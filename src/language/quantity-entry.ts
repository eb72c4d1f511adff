// quantity = ( sum [ spread ] | bounds [ law ] ) [ "at" cond { "," cond } ] [ "as" unit ] ;
// The value may carry a `with` as well: `x = A1.A_v with V_C = -8 V`.

import type { EntryKind } from './entry-kind.ts';
import { isComparison, readState } from './expression.ts';
import { atLiteral, literalOf, readLiteral } from './literal.ts';
import { halt } from './messages.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { Bounds, Condition, Expr, Literal, NameRef, QuantityEntry, Spread } from './syntax.ts';
import { readAs } from './unit-text.ts';

/** What every entry is that no other kind claims. */
export const QUANTITY: EntryKind = { type: 'quantity', starts: () => true, read: readQuantity, fields: null };

/** Reads a whole quantity, to the end of the body. */
export function readQuantity(reader: Reader): QuantityEntry {
  const { start } = reader.ahead;
  return finishQuantity(reader, start, reader.atSign('..') ? null : readState(reader));
}

/** Reads the body of a field of a part or point. */
export function readQuantityField(reader: Reader, label: readonly NameRef[]): QuantityEntry {
  const span = { start: label[0].span.start, end: label.at(-1)!.span.end };
  if (reader.atEnd()) halt('field-empty', span, reader.textOf(span), '5 mA');
  return readQuantity(reader);
}

/** Reads on behind the value, null where bounds begin with an open end. */
function finishQuantity(reader: Reader, start: number, first: Expr | null): QuantityEntry {
  const bounds = reader.atSign('..') ? readBounds(reader, start, first) : null;
  const spread = bounds ? readLaw(reader, start, null, bounds) : readSpread(reader);
  const conditions = reader.takeWord('at') ? readConditions(reader) : [];
  const as = reader.atWord('as') ? readAs(reader) : null;
  refuseBehind(reader, spread);
  return { type: 'quantity', value: bounds ? null : first, spread, conditions, as, span: reader.spanFrom(start) };
}

// bounds = literal ".." literal | literal ".." | ".." literal ;
function readBounds(reader: Reader, start: number, low: Expr | null): Bounds {
  const first = low && (literalOf(low) ?? halt('limit-not-literal', low.span, reader.textOf(low.span)));
  const dots = reader.take();
  const last = atLiteral(reader) ? readLiteral(reader) : refuseFormula(reader);
  if (!first && !last) halt('bounds-empty', spanOf(dots));
  return { first, last, span: reader.spanFrom(start) };
}

/** Null where nothing stands that could be meant as a limit. */
function refuseFormula(reader: Reader): null {
  const { ahead } = reader;
  const law = reader.atOneOf(['uniform', 'normal', 'service', 'at', 'as', 'in']);
  if (ahead.type === 'name' && !law) halt('limit-not-literal', spanOf(ahead), reader.textOf(ahead));
  return null;
}

// spread = ( "±" literal | "in" bounds ) [ law ] ;
function readSpread(reader: Reader): Spread | null {
  const { start } = reader.ahead;
  if (reader.takeSign('±')) return readLaw(reader, start, readLiteral(reader), null);
  if (!reader.takeWord('in')) return null;
  const inner = reader.ahead.start;
  const low = reader.atSign('..') ? null : literalExpr(reader);
  if (!reader.atSign('..')) halt('range-missing', { start, end: reader.last.end }, 'in', '5 mA in 2 mA .. 9 mA');
  return readLaw(reader, start, null, readBounds(reader, inner, low));
}

/** A limit read as an expression, so that a formula is quoted whole in the message about it. */
function literalExpr(reader: Reader): Expr {
  return readState(reader);
}

// law = [ "uniform" | "normal" ] [ "service" ] ;
function readLaw(reader: Reader, start: number, tolerance: Literal | null, bounds: Bounds | null): Spread {
  let law: Spread['law'] = null;
  if (reader.takeWord('uniform')) law = 'uniform';
  else if (reader.takeWord('normal')) law = 'normal';
  const service = reader.takeWord('service') !== null;
  if (service && !law && reader.atOneOf(['uniform', 'normal'])) {
    const word = reader.textOf(reader.ahead);
    halt('law-order', spanOf(reader.ahead), `${word} service`);
  }
  return { tolerance, bounds, law, service, span: reader.spanFrom(start) };
}

// cond = name "=" literal ;
/** Reads conditions with commas between them, to the last one that stands there or is wanted. */
export function readConditions(reader: Reader, { most = Infinity } = {}): Condition[] {
  const conditions: Condition[] = [];
  do {
    const { ahead } = reader;
    if (ahead.type !== 'name') halt('condition-form', spanOf(ahead));
    reader.take();
    if (!reader.takeSign('=')) halt('condition-form', spanOf(reader.ahead));
    conditions.push({ name: { name: ahead.name, span: spanOf(ahead) }, literal: readLiteral(reader) });
  } while (conditions.length < most && reader.takeSign(','));
  return conditions;
}

function refuseBehind(reader: Reader, spread: Spread | null): void {
  if (reader.atEnd()) return;
  const here = spanOf(reader.ahead);
  const found = reader.textOf(here);
  if (isComparison(reader.sign) || reader.atOneOf(['within', 'and', 'or'])) halt('comparison-misplaced', here, found);
  if (reader.atOneOf(['uniform', 'normal', 'service'])) {
    if (spread) halt('spread-order', here, found);
    halt('law-without-spread', here, found);
  }
  if (reader.atSign('±') || reader.atWord('in')) halt(spread ? 'spread-twice' : 'spread-order', here, found);
  if (reader.atWord('at')) halt('spread-order', here, found);
  reader.expectEnd();
}
