// plot   = "plot" ( figure | sum { "," sum } "against" path over ) ;
// figure = ("transfer"|"output"|"response"|"noise"|"bench") "of" name [ over ] | "spread" "of" sum ;

import { beginsWith } from './entry-kind.ts';
import type { EntryKind } from './entry-kind.ts';
import { readPathFrom, readState } from './expression.ts';
import { halt } from './messages.ts';
import { nearestNames } from './nearest.ts';
import { readOver } from './range.ts';
import type { Reader } from './reader.ts';
import { spanOf } from './reader.ts';
import { isJoiningWord } from './reserved.ts';
import type { Expr, PlotEntry } from './syntax.ts';

const OF_CELLS = ['transfer', 'output', 'response', 'noise', 'bench'] as const;
const FIGURES = [...OF_CELLS, 'spread'];

export const PLOT: EntryKind = { type: 'plot', starts: beginsWith('plot'), read: readPlot, fields: null };

function readPlot(reader: Reader): PlotEntry {
  const { start } = reader.take();
  // A figure's word is one only before `of`, so that a cell may be called `noise`.
  const word = /^([\p{L}_\d-]+)\s+of(?![A-Za-z0-9_.])/u.exec(
    reader.text.slice(reader.position, reader.limit).trimStart(),
  );
  return word ? readFigure(reader, start, word[1]) : readAgainst(reader, start);
}

function readFigure(reader: Reader, start: number, word: string): PlotEntry {
  const at = reader.ahead.start;
  const figure = OF_CELLS.find((each) => each === word);
  if (!figure && word !== 'spread')
    halt('figure-unknown', { start: at, end: at + word.length }, word, nearestNames(word, FIGURES));
  reader.take();
  reader.take();
  if (!figure) {
    const values = [readState(reader)];
    reader.expectEnd();
    return {
      type: 'plot',
      figure: 'spread',
      of: null,
      values,
      against: null,
      over: null,
      span: reader.spanFrom(start),
    };
  }
  const of = reader.takeName('The name of a cell', figure === 'bench' ? 'bench of M1' : `${figure} of A1`);
  const over = reader.atWord('over') ? readOver(reader) : null;
  reader.expectEnd();
  return { type: 'plot', figure, of, values: [], against: null, over, span: reader.spanFrom(start) };
}

function readAgainst(reader: Reader, start: number): PlotEntry {
  if (reader.atEnd()) halt('plot-form', spanOf(reader.last));
  const values: Expr[] = [];
  do values.push(readState(reader));
  while (reader.takeSign(','));
  if (!reader.takeWord('against')) {
    const { ahead, last } = reader;
    if (ahead.type === 'name' && last.type === 'name' && FIGURES.includes(last.name))
      halt('name-missing', ahead, 'The word of', `plot ${last.name} of A1`);
    if (!reader.atEnd()) reader.refuse();
    halt('plot-form', reader.spanFrom(start));
  }
  const input = reader.ahead;
  if (input.type !== 'name' || isJoiningWord(input.name))
    halt('name-missing', spanOf(input), 'The name of an input', 'against R_S');
  reader.take();
  const against = readPathFrom(reader, { name: input.name, span: spanOf(input) });
  if (!reader.atWord('over'))
    halt(
      'range-missing',
      { start: input.start, end: reader.last.end },
      'against',
      'against R_S over 100 ohm .. 10 kohm',
    );
  const over = readOver(reader);
  reader.expectEnd();
  return { type: 'plot', figure: 'against', of: null, values, against, over, span: reader.spanFrom(start) };
}
