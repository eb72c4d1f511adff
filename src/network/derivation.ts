// The workings of a stage and of a point as data: a list of steps, each a formula in the sheet's own expression
// language with what stands in for its names, and its result. What is shown can be evaluated as it stands.
//
// The steps come from the lowering itself, run once more with an emitter that writes formulas: so every closed form
// is the network's own solution. A step whose result is a value that the program has computed is held against it;
// where the two differ by more than AGREEMENT the step is replaced by both sides and what is left between them.

import { createSymbolicEmitter } from './symbolic-emitter.ts';
import type { Operand, SymbolicEmitter } from './symbolic-emitter.ts';
import type { Handle } from './emitter.ts';

/** One step of the workings. */
export interface DerivationStep {
  /** Name of the result, legal in a sheet. */
  readonly name: string;
  /** In the sheet's expression language. */
  readonly formula: string;
  readonly operands: readonly Operand[];
  /** SI; infinite where nothing limits it. */
  readonly value: number;
  /** SI unit text as in the operands. */
  readonly unit: string;
  /** What the step is or shows, whole sentences; may be empty. */
  readonly sentence: string;
}

/** Relative difference up to which a closed form stands for the program's number. */
const AGREEMENT = 1e-9;

/** Collects steps; handles are formulas. */
export interface Derivation {
  readonly e: SymbolicEmitter;
  /** The steps, in order. */
  finish(): readonly DerivationStep[];
  /** Writes `name = formula` and answers with the name. */
  state(name: string, unit: string, formula: Handle, sentence: string): Handle;
  /**
   * Writes `name = formula` where the formula gives the program's `value`; else both, with what is left between them.
   * Answers with the name, which bears the program's value.
   */
  conclude(name: string, unit: string, formula: Handle, value: number, sentence: string): Handle;
  /** Writes out that `name`, a value found numerically, meets `formula`: the other side, and what is left. */
  confirm(name: string, unit: string, formula: Handle, value: number, sentence: string): void;
}

/** An empty list of steps and the emitter to write them with. */
export function createDerivation(): Derivation {
  const steps: DerivationStep[] = [];
  const parts = new Set<string>();
  const e = createSymbolicEmitter((name, formula, unit) => {
    parts.add(name);
    steps.push({ name, formula: formula.text, operands: formula.operands, value: formula.value, unit, sentence: '' });
  });
  const push = (name: string, unit: string, formula: Handle, sentence: string): void => {
    const { text, operands, value } = e.formula(formula);
    steps.push({ name, formula: text, operands, value, unit, sentence });
  };
  const derivation: Derivation = {
    e,
    finish() {
      // Parts that were named on the way to something that is not shown are left out again.
      const wanted = new Set<string>();
      const kept = steps.toReversed().filter(({ name, operands }) => {
        if (parts.has(name) && !wanted.has(name)) return false;
        for (const operand of operands) wanted.add(operand.name);
        return true;
      });
      return kept.toReversed();
    },
    state(name, unit, formula, sentence) {
      push(name, unit, formula, sentence);
      return e.leaf(name, e.value(formula), unit);
    },
    conclude(name, unit, formula, value, sentence) {
      if (agrees(e.value(formula), value)) push(name, unit, formula, sentence);
      else derivation.confirm(name, unit, formula, value, sentence);
      return e.leaf(name, value, unit);
    },
    confirm(name, unit, formula, value, sentence) {
      push(`${name}_right`, unit, formula, `${sentence} ${name} itself was found numerically.`.trimStart());
      const right = e.leaf(`${name}_right`, e.value(formula), unit);
      push(`${name}_left`, unit, e.leaf(name, value, unit), 'The number found.');
      const left = e.leaf(`${name}_left`, value, unit);
      push(`${name}_rest`, unit, e.sub(left, right), 'What is left between the two sides.');
    },
  };
  return derivation;
}

/** Whether two results are the same to `AGREEMENT`. */
function agrees(x: number, y: number): boolean {
  return x === y || Math.abs(x - y) <= AGREEMENT * Math.max(Math.abs(x), Math.abs(y));
}
