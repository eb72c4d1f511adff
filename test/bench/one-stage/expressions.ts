// The one-stage bench as expressions of a general mathematics library, compiled once and evaluated on plain numbers;
// the operating point is solved by the same function as in the hand-written loop.

import { compile } from 'mathjs';
import type { EvalFunction } from 'mathjs';
import { point, solvePoint } from './hand.ts';
import { CELLS, FIXED, INPUT_NAMES, POINT_INPUTS, POINT_OUTPUTS, STEPS, SUMMED } from './inputs.ts';
import type { InputName } from './inputs.ts';

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
  const steps = STEPS.map((step): { name: string; formula: EvalFunction } | null =>
    step === 'operating point' ? null : { name: step[0], formula: compile(step[1]) },
  );
  const summed = SUMMED.map((k) => CELLS[k]);
  const row = new Float64Array(CELLS.length);
  const evaluate = (i: number): void => {
    for (const name of INPUT_NAMES) set(name, columns[name][i]);
    for (const step of steps) {
      if (step !== null) {
        set(step.name, step.formula.evaluate(given) as number);
        continue;
      }
      const [beta, lambda, A, r, b, R] = POINT_INPUTS.map(get);
      solvePoint(beta, lambda, A, r, b, R);
      POINT_OUTPUTS.forEach((name, k) => set(name, point[k]));
    }
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
