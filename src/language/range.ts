// over = "over" range [ "log" ] ;   range = sum ".." sum ;

import { readSum } from './expression.ts';
import { halt } from './messages.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import type { Range } from './syntax.ts';

const EXAMPLE = 'over 100 ohm .. 10 kohm';

/** Reads a range from its word `over`. */
export function readOver(reader: Reader): Range {
  const word = reader.take();
  const { start } = reader.ahead;
  const low = reader.atSign('..') ? refuseEnd(word.start, word.end) : readSum(reader);
  const dots = reader.takeSign('..') ?? refuseEnd(word.start, reader.last.end);
  const high = reader.atEnd() ? refuseEnd(dots.start, dots.end) : readSum(reader);
  const log = reader.takeWord('log') !== null;
  if (reader.atSign('..')) halt('range-missing', spanOf(reader.ahead), 'over', EXAMPLE);
  return { low, high, log, span: reader.spanFrom(start) };
}

function refuseEnd(start: number, end: number): never {
  return halt('range-missing', { start, end }, 'over', EXAMPLE);
}
