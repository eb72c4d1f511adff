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
  const saturated = drawInputs(SAMPLES);
  const mixed = drawInputs(SAMPLES, MIXED);
  return [
    compareColumns('39 cells, all saturated', saturated, everything, createHandColumns(saturated), 1.3, 0.75),
    compareColumns('6 cells, all saturated', saturated, SUMMED, createHandSums(saturated), 1.3, 0.85),
    compareColumns('39 cells, saturated and ohmic', mixed, everything, createHandColumns(mixed), 1.9, 0.75),
    compareColumns('6 cells, saturated and ohmic', mixed, SUMMED, createHandSums(mixed), 1.9, 0.85),
    compareWithLibrary(saturated, everything),
  ];
}

type Inputs = ReturnType<typeof drawInputs>;

function compareColumns(
  what: string,
  inputs: Inputs,
  kept: readonly number[],
  hand: ReturnType<typeof createHandColumns>,
  columnsAtMost: number,
  lanesAtMost: number,
): string {
  const columns = createColumnar(inputs, kept, { lanes: false });
  const lanes = createColumnar(inputs, kept, { lanes: true });
  for (const variant of [hand, columns, lanes]) variant.run();
  for (const { outputs } of [columns, lanes]) {
    const worst = Math.max(...hand.outputs.map((column, k) => worstDifference(column, outputs[k])));
    if (!(worst < 1e-11)) throw new Error(`The columns differ by ${worst} from the loop by hand.`);
  }
  const timings = compare(
    [
      { name: 'loop by hand', run: hand.run },
      { name: 'columns', run: columns.run, target: { atMost: columnsAtMost } },
      { name: 'columns, two lanes', run: lanes.run, target: { atMost: lanesAtMost } },
    ],
    { units: SAMPLES },
  );
  return formatTimings(`One stage as columns, ${what}`, 'sample', timings);
}

function compareWithLibrary(inputs: Inputs, kept: readonly number[]): string {
  const lanes = createColumnar(inputs, kept, { lanes: true });
  const columns = createColumnar(inputs, kept, { lanes: false });
  const library = createExpressions(inputs, objectScope());
  const beside = (name: string, run: () => number, atLeast: number) =>
    compare(
      [
        { name, run },
        { name: 'general library', run: library.run, target: { atLeast } },
      ],
      { units: SAMPLES, rounds: 5, warmUps: 1 },
    );
  return formatTimings('One stage as columns beside a general library', 'sample', [
    ...beside('columns', columns.run, 80),
    ...beside('columns, two lanes', lanes.run, 140),
  ]);
}
