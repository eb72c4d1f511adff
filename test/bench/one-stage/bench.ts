// The one-stage bench: the product's compiled form beside a hand-written loop and a general mathematics library.

import { worstDifference } from '../agreement.ts';
import { compare, formatTimings } from '../compare.ts';
import { createHandColumns, createHandSums } from './hand-columns.ts';
import { createExpressions, mapScope, objectScope } from './expressions.ts';
import { createHandLoop } from './hand.ts';
import { CELLS, MIXED, SUMMED, drawInputs } from './inputs.ts';
import { createColumnar, createTape } from './tape.ts';

const SAMPLES = 1024;

/** Times one evaluation of the sheet after another. Throws where the variants disagree. */
export function benchOneStage(): string[] {
  const columns = drawInputs(SAMPLES);
  const hand = createHandLoop(columns);
  const tape = createTape(columns);
  const withObject = createExpressions(columns, objectScope());
  const withMap = createExpressions(columns, mapScope());
  for (const other of [tape, withObject, withMap]) {
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
  const general = compare(
    [
      { name: 'compiled form, scalar', run: tape.run },
      { name: 'general library, names in an object', run: withObject.run, target: { atLeast: 50 } },
      { name: 'general library, names in a Map', run: withMap.run, target: { atLeast: 50 } },
    ],
    { units: SAMPLES, rounds: 5, warmUps: 1 },
  );
  return [
    formatTimings('One stage, 8 inputs, 39 cells: one evaluation', 'sheet', evaluated),
    formatTimings('The same beside a general library', 'sheet', general),
    ...benchColumns(),
  ];
}

/** Times many samples as columns, the FET saturated in all of them or in about half. Throws where the variants disagree. */
function benchColumns(): string[] {
  const everything = CELLS.map((_, k) => k);
  return (
    [
      ['all saturated', drawInputs(SAMPLES), 1.3],
      ['saturated and ohmic', drawInputs(SAMPLES, MIXED), 1.9],
    ] as const
  ).flatMap(([regions, columns, atMost]) =>
    (
      [
        ['39 cells', createHandColumns(columns), createColumnar(columns, everything)],
        ['6 cells', createHandSums(columns), createColumnar(columns, SUMMED)],
      ] as const
    ).map(([cells, hand, columnar]) => {
      hand.run();
      columnar.run();
      const worst = Math.max(...hand.outputs.map((column, k) => worstDifference(column, columnar.outputs[k])));
      if (!(worst < 1e-11)) throw new Error(`The columns differ by ${worst} from the loop by hand.`);
      const timings = compare(
        [
          { name: 'loop by hand', run: hand.run },
          { name: 'columns', run: columnar.run, target: { atMost } },
        ],
        { units: SAMPLES },
      );
      return formatTimings(`One stage as columns, ${cells}, ${regions}`, 'sample', timings);
    }),
  );
}
