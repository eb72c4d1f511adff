// What the sheet knows of its cells once it has been checked and evaluated: the reading side, used by
// the terminal, the record and the page.

import type { CellTree, SheetTree, Span, Splice } from '../language/index.ts';
import type { Unit, ValueKind } from '../quantity/index.ts';

export type CellKind =
  | 'quantity'
  | 'part'
  | 'another'
  | 'point'
  | 'stage'
  | 'bench'
  | 'check'
  | 'plot'
  | 'inverse'
  | 'broken';

/** What an expression yields: a quantity of some kind, a condition (holds or not), or a region. */
export type ValueType = ValueKind | 'condition' | 'region';

/** Something that keeps a cell from having a value, said where it stands. */
export interface Fault {
  readonly code: string;
  readonly text: string;
  /** Line of the sheet, from 0. */
  readonly line: number;
  readonly span: Span;
}

/** A value with what is needed to show it: SI number, +-Infinity included; a region's word; true or false of a condition; null where there is none. */
export interface Reading {
  readonly type: ValueType;
  readonly value: number | string | boolean | null;
  /** Unit fixed by `as`, where the cell has one. */
  readonly as: Unit | null;
}

/** One value that a part, point or stage offers. */
export interface OfferedReading extends Reading {
  /** `I_D`, `V_drain`, `Qa.I_D`. */
  readonly name: string;
  readonly sentence: string;
  /** Why it has no value though the cell itself is sound (e.g. needs frequency); null otherwise. */
  readonly missing: Fault | null;
}

/** What an input's spread is declared to be, in SI; an open end is null. */
export interface DeclaredSpread {
  readonly low: number | null;
  readonly nominal: number;
  readonly high: number | null;
  readonly law: 'uniform' | 'normal';
  /** `in` halves the units below and above the nominal; `±` does not. */
  readonly form: 'tolerance' | 'limits';
  readonly service: boolean;
  /** The sheet chose the nominal (limits alone were given). */
  readonly nominalChosen: boolean;
}

export interface CheckReading {
  readonly holds: boolean;
  /** By how much, in the unit of what is compared; null where that has no meaning (regions, and/or of different kinds). */
  readonly reserve: number | null;
  readonly reserveType: ValueKind | null;
}

export interface Caution {
  readonly cell: string;
  /** From 0. */
  readonly line: number;
  readonly text: string;
}

/** One default the sheet took because nothing was given. */
export interface Assumption {
  readonly cell: string;
  readonly text: string;
}

/** One line of workings: `name = formula`, with the operands' values to put in place, and the result. */
export interface WorkingStep {
  /** A legal name or path of the sheet language; null for a bare comparison of two sides. */
  readonly name: string | null;
  /** In the sheet's own expression language. */
  readonly formula: string;
  readonly operands: readonly {
    readonly name: string;
    readonly value: number | string;
    readonly type: ValueType;
    readonly as: Unit | null;
  }[];
  readonly value: number | string | boolean | null;
  readonly type: ValueType;
  readonly as: Unit | null;
  /** What the step is, in a sentence; may be empty. */
  readonly sentence: string;
}

/** A field of a part or point that is a number. */
export interface FieldReading extends Reading {
  readonly name: string;
  readonly line: number;
  readonly spread: DeclaredSpread | null;
  readonly isInput: boolean;
}

export interface CellReading {
  readonly name: string;
  readonly kind: CellKind;
  readonly tree: CellTree;
  /** Why the cell has no value: its own fault, or `waits-for` with the name of the cell it waits for. */
  readonly fault: Fault | null;
  readonly waitsFor: string | null;
  /** The cell's own value; null for parts, points, stages, plots. A check's is its condition. */
  readonly reading: Reading | null;
  /** In the order of the table of offered values; empty for other kinds. */
  readonly values: readonly OfferedReading[];
  readonly fields: readonly FieldReading[];
  readonly check: CheckReading | null;
  /** Entry is one number, with or without spread. */
  readonly isInput: boolean;
  readonly spread: DeclaredSpread | null;
  /** Names of the cells it uses, and of those that use it, in sheet order. */
  readonly uses: readonly string[];
  readonly usedBy: readonly string[];
  readonly cautions: readonly Caution[];
  readonly assumptions: readonly Assumption[];
}

export interface Sheet {
  readonly tree: SheetTree;
  /** In sheet order; the second of two cells of one name is there, too, with a fault. */
  cells(): readonly CellReading[];
  cell(name: string): CellReading | null;
  /** Broken lines that belong to no cell. */
  loose(): readonly Fault[];
  cautions(): readonly Caution[];
  assumptions(): readonly Assumption[];
  /** The fault of a cell, or null. */
  error(name: string): Fault | null;
  /** The SI value of `R_S`, `A1.I_D`, `A1.Qa.I_D`; a region's word; null where there is none. */
  value(path: string): number | string | boolean | null;
  /** The formulas, operands and results that stand behind a cell. */
  workings(name: string): readonly WorkingStep[];
  /** Takes a new text; recompiles and recomputes just what that reaches; gives the names whose readings changed. */
  update(text: string): ReadonlySet<string>;
  /** The same for splices of the present text. */
  edit(splices: readonly Splice[]): ReadonlySet<string>;
}
