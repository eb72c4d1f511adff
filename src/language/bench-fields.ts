// What is asked of a bench beside its columns:
//
// exponent = "free" | "2" ;   keep = name "in" bounds [ "at" cond { "," cond } ] ;
// match = ( "pairs" | "quads" ) "at" cond [ "and" literal ] { "," cond } ;   fitting = cond { "," cond } ;

import { atLiteral, readLiteral } from './literal.ts';
import { halt } from './messages.ts';
import { readConditions, readQuantity } from './quantity-entry.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { Condition, FieldBody, FittingBody, KeepBody, Literal, MatchBody } from './syntax.ts';

/** Reads whether the exponent of the law is fitted, too. */
export function readExponent(reader: Reader): FieldBody {
  const { start } = reader.ahead;
  const isFree = reader.takeWord('free') !== null;
  if (!isFree && !isTwo(reader)) halt('exponent-form', { start, end: reader.limit });
  reader.expectNothing();
  return { type: 'exponent', isFree, span: reader.spanFrom(start) };
}

function isTwo(reader: Reader): boolean {
  return atLiteral(reader) && readLiteral(reader).value === 2;
}

/** Reads the range of one quantity in which specimens are kept. */
export function readKeep(reader: Reader): KeepBody {
  if (reader.atEnd()) halt('keep-form', spanOf(reader.ahead));
  const { value, spread, conditions, as, span } = readQuantity(reader);
  if (value?.type !== 'path' || value.names.length !== 1 || !spread?.bounds || spread.law || spread.service || as)
    halt('keep-form', span);
  return { type: 'keep', quantity: value.names[0], bounds: spread.bounds, conditions, span };
}

const SIZES = { pairs: 2, quads: 4 } as const;

/** Reads which groups of specimens are wanted, and where they are to agree. */
export function readMatch(reader: Reader): MatchBody {
  const { start } = reader.ahead;
  const size = reader.atWord('pairs') ? SIZES.pairs : reader.atWord('quads') ? SIZES.quads : null;
  if (size === null) halt('match-form', { start, end: reader.limit });
  reader.take();
  if (!reader.takeWord('at')) halt('match-form', { start, end: reader.limit });
  const conditions: Condition[] = [];
  let second: Literal | null = null;
  do {
    const { ahead } = reader;
    const [condition] = readConditions(reader, { most: 1 });
    conditions.push(condition);
    if (condition.name.name !== 'I_D' || !reader.takeWord('and')) continue;
    if (second || !atLiteral(reader)) halt('match-form', { start: ahead.start, end: reader.limit });
    second = readLiteral(reader);
  } while (reader.takeSign(','));
  reader.expectNothing();
  return { type: 'match', size, conditions, second, span: reader.spanFrom(start) };
}

/** Reads the current that every specimen is to be set to. */
export function readFitting(reader: Reader): FittingBody {
  const { start } = reader.ahead;
  if (start === reader.limit) halt('fitting-form', spanOf(reader.ahead));
  const conditions = readConditions(reader);
  reader.expectNothing();
  return { type: 'fitting', conditions, span: reader.spanFrom(start) };
}
