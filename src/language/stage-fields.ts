// The lines below a stage: what hangs on a place, and what the labels output, driven and midband say.
//
// body  = legs | path [ "-" path ] (* output *) | sum (* midband *) | "through" sum (* driven *) ;
// legs  = [ leg { "," leg } ] ;   leg = [ sum ] ("to" | "from") place ;
// place = [ "-" ] "signal" | "common" | sum ;

import type { FieldBodyReader } from './entry-kind.ts';
import { readPathFrom, readSum } from './expression.ts';
import { halt } from './messages.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { FieldBody, Leg, NameRef, PathExpr, Place } from './syntax.ts';

const OWN_LABELS: Readonly<Record<string, (reader: Reader) => FieldBody>> = {
  output: readOutput,
  driven: readDriven,
  midband: readMidband,
};

/** Reads the body of a stage's line, to its end. */
export const readStageField: FieldBodyReader = (reader: Reader, label: readonly NameRef[]): FieldBody => {
  const own = label.length === 1 && Object.hasOwn(OWN_LABELS, label[0].name) ? OWN_LABELS[label[0].name] : readLegs;
  const body = own(reader);
  reader.expectEnd();
  return body;
};

function readOutput(reader: Reader): FieldBody {
  const { start } = reader.ahead;
  const plus = readPlacePath(reader);
  const minus = reader.takeSign('-') ? readPlacePath(reader) : null;
  return { type: 'output', plus, minus, span: reader.spanFrom(start) };
}

/** A path to a place; a node may bear any name, `in` and `to` too. */
function readPlacePath(reader: Reader): PathExpr {
  const { ahead } = reader;
  if (ahead.type !== 'name') halt('output-form', spanOf(ahead));
  reader.take();
  return readPathFrom(reader, { name: ahead.name, span: spanOf(ahead) });
}

function readDriven(reader: Reader): FieldBody {
  const { start } = reader.ahead;
  if (!reader.takeWord('through')) halt('driven-form', spanOf(reader.ahead));
  return { type: 'driven', through: readSum(reader), span: reader.spanFrom(start) };
}

function readMidband(reader: Reader): FieldBody {
  const { start } = reader.ahead;
  return { type: 'midband', frequency: readSum(reader), span: reader.spanFrom(start) };
}

function readLegs(reader: Reader): FieldBody {
  const { start } = reader.ahead;
  const legs: Leg[] = [];
  if (!reader.atEnd()) {
    do legs.push(readLeg(reader));
    while (reader.takeSign(','));
  }
  return { type: 'legs', legs, span: reader.spanFrom(start) };
}

function readLeg(reader: Reader): Leg {
  const { start } = reader.ahead;
  const element = reader.atOneOf(['to', 'from']) ? null : readSum(reader);
  if (reader.atSign('±') || reader.atWord('in')) halt('spread-in-leg', spanOf(reader.ahead));
  if (!reader.atOneOf(['to', 'from'])) {
    if (!reader.atEnd() && !reader.atSign(',')) reader.refuse();
    halt('leg-form', { start, end: reader.last.end });
  }
  const direction = reader.textOf(reader.take()) as 'to' | 'from';
  const place = readPlace(reader, direction);
  if (reader.atSign('±') || reader.atWord('in')) halt('spread-in-leg', spanOf(reader.ahead));
  return { element, direction, place, span: reader.spanFrom(start) };
}

function readPlace(reader: Reader, direction: string): Place {
  const { ahead } = reader;
  if (reader.atEnd() || reader.atSign(',')) halt('place-missing', spanOf(reader.last), direction);
  const span = spanOf(ahead);
  if (reader.takeWord('signal')) return { type: 'signal', inverted: false, span };
  if (reader.takeWord('common')) return { type: 'common', span };
  if (reader.atSign('-') && /^signal(?![A-Za-z0-9_.])/.test(reader.text.slice(ahead.end).trimStart())) {
    reader.take();
    reader.take();
    return { type: 'signal', inverted: true, span: reader.spanFrom(ahead.start) };
  }
  const expr = nodeNamedLikeAWord(reader) ?? readSum(reader);
  return { type: 'expr', expr, span: expr.span };
}

/** `to in`: a node may bear a word of the grammar as its name, where nothing else could stand. */
function nodeNamedLikeAWord(reader: Reader): PathExpr | null {
  const { ahead } = reader;
  if (ahead.type !== 'name' || !/^\s*(?:,|$)/.test(reader.text.slice(ahead.end, reader.limit))) return null;
  return readPlacePath(reader);
}
