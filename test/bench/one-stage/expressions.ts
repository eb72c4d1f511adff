// The one-stage bench as a user of a general mathematics library writes it: one assignment per cell, compiled once and
// evaluated on plain numbers in a scope. The operating point is solved by the same function as in the hand-written loop,
// imported into the library; each of its three results is a cell, as in the other variants.

import { all, create } from 'mathjs';
import type { EvalFunction } from 'mathjs';
import { point, solvePoint } from './hand.ts';
import { CELLS, FIXED, INPUT_NAMES, POINT_INPUTS, POINT_OUTPUTS, STEPS, SUMMED } from './inputs.ts';
import type { InputName } from './inputs.ts';

const library = create(all);
library.import({
  operatingPoint(beta: number, lambda: number, A: number, r: number, b: number, R: number): number[] {
    solvePoint(beta, lambda, A, r, b, R);
    return [point[0], point[1], point[2]];
  },
});

const FORMULAS: readonly string[] = STEPS.flatMap((step) =>
  step === 'operating point'
    ? [
        `solution = operatingPoint(${POINT_INPUTS.join(', ')})`,
        ...POINT_OUTPUTS.map((name, k) => `${name} = solution[${k + 1}]`),
      ]
    : [`${step[0]} = ${step[1]}`],
);

type Columns = Readonly<Record<InputName, Float64Array>>;

/** Where the library finds the names: an object, as its manual shows, or a Map, which it reads faster. */
interface Scope {
  readonly given: object;
  readonly get: (name: string) => number;
  readonly set: (name: string, value: number) => void;
}

export function objectScope(): Scope {
  const given: Record<string, number> = { ...FIXED };
  return { given, get: (name) => given[name], set: (name, value) => (given[name] = value) };
}

export function mapScope(): Scope {
  const given = new Map<string, number>(Object.entries(FIXED));
  return { given, get: (name) => given.get(name)!, set: (name, value) => given.set(name, value) };
}

/** As `createHandLoop`, evaluated step by step from the formulas. */
export function createExpressions(columns: Columns, { given, get, set }: Scope) {
  const formulas = FORMULAS.map((formula): EvalFunction => library.compile(formula));
  const summed = SUMMED.map((k) => CELLS[k]);
  const row = new Float64Array(CELLS.length);
  const evaluate = (i: number): void => {
    for (const name of INPUT_NAMES) set(name, columns[name][i]);
    for (const formula of formulas) formula.evaluate(given);
  };
  const run = (): number => {
    let sum = 0;
    for (let i = 0; i < columns.V_DD.length; i++) {
      evaluate(i);
      for (const name of summed) sum += get(name);
    }
    return sum;
  };
  const runOne = (i: number): void => {
    evaluate(i);
    CELLS.forEach((name, k) => (row[k] = get(name)));
  };
  return { row, runOne, run };
}
