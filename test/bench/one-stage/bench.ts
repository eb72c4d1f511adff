// The one-stage bench: the product's compiled form beside a hand-written loop and a general mathematics library.

import { worstDifference } from '../agreement.ts';
import { compare, formatTimings } from '../compare.ts';
import { createColumnar } from './columnar.ts';
import { createExpressions, mapScope, objectScope } from './expressions.ts';
import { createHandLoop } from './hand.ts';
import { CELLS, SUMMED, drawInputs } from './inputs.ts';
import { createTape } from './tape.ts';

const SAMPLES = 1024;

/** Times one evaluation of the sheet after another. Throws where the variants disagree. */
export function benchOneStage(): string[] {
  const columns = drawInputs(SAMPLES);
  const hand = createHandLoop(columns);
  const tape = createTape(columns);
  const all = createColumnar(
    columns,
    CELLS.map((_, k) => k),
  );
  const few = createColumnar(columns, SUMMED);
  const withObject = createExpressions(columns, objectScope());
  const withMap = createExpressions(columns, mapScope());
  for (const other of [tape, all, withObject, withMap]) {
    for (let i = 0; i < SAMPLES; i++) {
      hand.runOne(i);
      other.runOne(i);
      // A cell that is a difference near zero loses digits; all others agree to rounding.
      const worst = worstDifference(hand.row, other.row);
      if (!(worst < 1e-11)) throw new Error(`Sample ${i} differs by ${worst} between the variants.`);
    }
  }
  const evaluated = compare(
    [
      { name: 'loop by hand, one row', run: hand.run },
      { name: 'compiled form, scalar', run: tape.run, target: { atMost: 4 } },
    ],
    { units: SAMPLES },
  );
  const columnar = compare(
    [
      { name: 'loop by hand, one row', run: hand.run },
      { name: 'columns, all cells', run: all.run, target: { atMost: 1.3 } },
      { name: 'columns, six cells', run: few.run, target: { atMost: 1.3 } },
    ],
    { units: SAMPLES },
  );
  const general = compare(
    [
      { name: 'compiled form, scalar', run: tape.run },
      { name: 'general library, names in an object', run: withObject.run, target: { atLeast: 50 } },
      { name: 'general library, names in a Map', run: withMap.run, target: { atLeast: 50 } },
    ],
    { units: SAMPLES, rounds: 5, warmUps: 1 },
  );
  const generalColumns = compare(
    [
      { name: 'columns, all cells', run: all.run },
      { name: 'general library, names in an object', run: withObject.run, target: { atLeast: 80 } },
      { name: 'general library, names in a Map', run: withMap.run, target: { atLeast: 80 } },
    ],
    { units: SAMPLES, rounds: 5, warmUps: 1 },
  );
  return [
    formatTimings('One stage, 8 inputs, 39 cells: one evaluation', 'sheet', evaluated),
    formatTimings('The same beside a general library', 'sheet', general),
    formatTimings('The same in columns of many samples', 'sample', columnar),
    formatTimings('Columns beside a general library', 'sample', generalColumns),
  ];
}
