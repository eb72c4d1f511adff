// What the sheet knows of its cells once it has been checked and evaluated: the reading side, used by
// the terminal, the record and the page.

import type { CellTree, SheetTree, Span, Splice } from '../language/index.ts';
import type { BenchReading } from './bench/bench-reading.ts';
import type { Program } from '../program/index.ts';
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

interface Caution {
  readonly cell: string;
  /** From 0. */
  readonly line: number;
  readonly text: string;
}

/** One default the sheet took because nothing was given. */
interface Assumption {
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
  /** Rows of a part that come from the bench it is fitted to; their line is that of the part. */
  readonly measured: readonly FieldReading[];
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

/** The law of a part in one convention of the trade. */
export interface ConventionReading extends Reading {
  /** `I_DSS`, `R_DSon`. */
  readonly name: string;
  /** SI, at which it is read; currents are positive on both channels. */
  readonly conditions: readonly { readonly name: string; readonly value: number; readonly type: ValueKind }[];
  readonly value: number;
  readonly type: ValueKind;
  /** What the part's own row says; null where it has none. */
  readonly written: number | null;
  readonly sentence: string;
}

/** A way from rows of a part to its law. */
export interface RouteReading {
  /** `I_DSS with V_GSoff`. */
  readonly name: string;
  /** beta (K of a MOSFET) in A/V² and V_TO in V; null where these rows have no solution. */
  readonly beta: number | null;
  readonly V_TO: number | null;
  /** Of beta against that of the route that computes: 0.12 is 12 % more; null where there is no solution. */
  readonly difference: number | null;
}

export interface PartReading {
  readonly conventions: readonly ConventionReading[];
  /** The one that computes first. */
  readonly routes: readonly RouteReading[];
}

/** One leg of a stage with its number. */
interface LegReading {
  /** The place on whose line it stands. */
  readonly from: string;
  readonly kind: 'resistor' | 'capacitor' | 'inductor' | 'source' | 'tie';
  /** `R_S`, or '' for an element without a name. */
  readonly label: string;
  /** SI; null for a tie. */
  readonly value: number | null;
  readonly type: ValueKind | null;
  /** A source that drives from the far place into `from`. */
  readonly reversed: boolean;
  readonly to: {
    readonly kind: 'node' | 'rail' | 'signal' | 'common';
    readonly name: string;
    readonly volts: number | null;
  };
  /** The cell that the element is named after, or null. */
  readonly cell: string | null;
}

/** A one-FET stage as figures want it. Voltages are true node differences, currents in the device's own sense. */
export interface StageReading {
  readonly name: string;
  readonly channel: 1 | -1;
  readonly family: 'JFET' | 'MOSFET';
  readonly enhancement: boolean;
  readonly fetName: string;
  readonly fetCell: string;
  /** Named nodes in sheet order, terminals not among them. */
  readonly nodes: readonly string[];
  readonly legs: readonly LegReading[];
  /** Volts of terminals and nodes; empty where the stage is not solved. */
  readonly voltages: ReadonlyMap<string, number>;
  readonly current: number | null;
  readonly q: { readonly vgs: number; readonly vds: number; readonly id: number } | null;
  /** V_GS = V_GG - R_m I and V_DS = V_L - R_L I in the true frame, I from drain to source; null for a forced current. */
  readonly lines: { readonly V_GG: number; readonly R_m: number; readonly V_L: number; readonly R_L: number } | null;
  /** V_GS at which the channel opens, at the junction temperature and back bias. */
  readonly threshold: number | null;
  /** Drain current from V_GS and V_DS, at the junction temperature of the operating point. */
  readonly law: (vgs: number, vds: number) => number;
  /** The places where gain is taken: none, one or two. */
  readonly output: readonly string[];
}

/** Values against an input, as a plot cell asks for them. */
export interface Sweep {
  readonly input: {
    readonly label: string;
    readonly type: ValueType;
    readonly values: Float64Array;
    readonly log: boolean;
    readonly present: number;
    readonly slot: number;
  };
  /** NaN where a value is not known. */
  readonly series: readonly {
    readonly label: string;
    readonly type: ValueType;
    readonly values: Float64Array;
    readonly present: number;
  }[];
}

/** One draw of a build: a component, a row of a part, a field of a point, or a value in service. */
export interface Drawn {
  /** `R_S`, `Q1.I_DSS`: what its draws are keyed by. */
  readonly name: string;
  readonly cell: string;
  /** From 0. */
  readonly line: number;
  /** The slot that takes the draw: the value itself, or the factor or addend behind a formula. */
  readonly slot: number;
  /** Limits of what is drawn, SI; null where an end is open. */
  readonly spread: DeclaredSpread;
  /** What is drawn: the value, or what a formula's value is multiplied with, or what is added to it. */
  readonly form: 'value' | 'factor' | 'addend';
  /** The slot of the value whose spread it is, and its kind. */
  readonly valueSlot: number;
  readonly type: ValueKind;
}

/** A row of limits that the law of its part does not need: only specimens that read within them belong to the part. */
export interface Cut {
  readonly name: string;
  readonly cell: string;
  /** From 0. */
  readonly line: number;
  /** The slot of what the row reads on the specimen. */
  readonly slot: number;
  readonly low: number;
  readonly high: number;
}

/** Two draws of a part that go together; `tracking` in -1..1. */
export interface Tie {
  readonly cell: string;
  /** Indices into the draws. */
  readonly threshold: number;
  readonly gain: number;
  /** Whether the quantile that is tied counts down as the drawn value grows. */
  readonly thresholdFalls: boolean;
  readonly gainFalls: boolean;
  readonly tracking: number;
}

/** A value or condition of the sheet by its path. */
export interface Wanted {
  /** `R_S`, `A1.I_D`. */
  readonly path: string;
  readonly cell: string;
  readonly slot: number;
  readonly type: ValueType;
  /** It is what an inverse cell answers in a build, which may have none; the sheet goes on with what was chosen from it. */
  readonly isAnswer: boolean;
}

/** What an inverse cell asks, by the slots of the program. */
export interface Asked {
  readonly cell: string;
  /** The slot that is turned, and its range. */
  readonly input: number;
  readonly low: number;
  readonly high: number;
  /** The slot that is to be 0. */
  readonly residual: number;
  /** The slot of the answer of a build, and the one from which it is taken. */
  readonly answer: number;
  readonly held: number;
  /** It asks for ends of values over the whole declared set: the same answer in every build. */
  readonly isSame: boolean;
  /** Other inverse cells are answered anew while it looks for its answer. */
  readonly isNested: boolean;
}

/** A check as the draws see it. */
export interface WantedCheck {
  readonly name: string;
  /** The slot of its condition: 1 holds, 0 fails, NaN undecided. */
  readonly slot: number;
  /** The slot of its reserve; null where there is none. */
  readonly reserve: number | null;
}

/** Everything an analysis of spread needs: plain data, which can be posted to a worker. */
export interface SpreadModel {
  readonly program: Program;
  /** Every value as the sheet stands. */
  readonly slots: Float64Array;
  readonly drawn: readonly Drawn[];
  readonly cuts: readonly Cut[];
  readonly ties: readonly Tie[];
  /** Every pair of draws that could go together, tied or not; `tracking` is 0 where nothing is declared. */
  readonly pairs: readonly Tie[];
  /** Every number, region and condition of the sheet that has a value. */
  readonly values: readonly Wanted[];
  readonly checks: readonly WantedCheck[];
  /** Inverse cells, each behind those that it rests on. */
  readonly asked: readonly Asked[];
  /** Inputs that are the author's to choose: components, supplies and currents, not rows of a part. */
  readonly tunable: readonly { readonly name: string; readonly slot: number; readonly type: ValueKind }[];
  /** Stages of one FET, with its part and the slot of its drain current. */
  readonly stages: readonly { readonly stage: string; readonly part: string; readonly current: number }[];
}

interface ValueEnds {
  readonly low: number;
  readonly high: number;
}

/** What a sheet asks of the analyses that stand above it. */
export interface Analyses {
  /** The least and the largest of the values in these slots over the declared set, as far as those ends are asked for; NaN where an end is not known. */
  ends(model: SpreadModel, wanted: readonly number[], ends: readonly ('low' | 'high')[]): readonly ValueEnds[];
  /** The same for models that differ only in the input of one slot and in what follows from it; none of them may rest on other ends or on answers. */
  endsOver(
    model: SpreadModel,
    turned: number,
    wanted: readonly number[],
    ends: readonly ('low' | 'high')[],
  ): (at: SpreadModel) => readonly ValueEnds[];
}

/** What is read of a sheet. */
export interface SheetView {
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
  /** A part in every convention; null of another cell, or of a part without a law. */
  part(name: string): PartReading | null;
  /** The formulas, operands and results that stand behind a cell. */
  workings(name: string): readonly WorkingStep[];
  /** The stage as figures want it; null where there is none of that name, or it cannot be read. */
  stage(name: string): StageReading | null;
  /** What a bench has found; null where there is none of that name, or it cannot be read. */
  bench(name: string): BenchReading | null;
  /** The curves of a plot cell over its range, at so many points; null where there is none. */
  sweep(plot: string, points: number): Sweep | null;
}

export interface Sheet extends SheetView {
  /** The sheet as a build would have it whose draws, by slot, have these values. */
  standing(at: ReadonlyMap<number, number>): SheetView;
  /** What spreads, and everything that it moves. */
  spreadModel(): SpreadModel;
  /** Takes a new text; recompiles and recomputes just what that reaches; gives the names whose readings changed. */
  update(text: string): ReadonlySet<string>;
  /** The same for splices of the present text. */
  edit(splices: readonly Splice[]): ReadonlySet<string>;
}
