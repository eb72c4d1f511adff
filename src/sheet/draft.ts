// What compiling a cell of any kind answers with, before its slots have addresses.

import type { CellTree, Line, Message, Span } from '../language/index.ts';
import type { Builder } from '../program/index.ts';
import type { Handle } from '../network/index.ts';
import type { Unit, ValueKind } from '../quantity/index.ts';
import type {
  CheckReading,
  DeclaredSpread,
  FieldReading,
  PartReading,
  StageReading,
  ValueType,
  WorkingStep,
} from './model.ts';
import type { BenchReading } from './bench/bench-reading.ts';
import type { Measured } from './bench/measured.ts';
import type { Scope } from './scope.ts';
import type { Expr } from '../language/index.ts';
import type { Interface } from './interface.ts';
import type { Answers } from './answers.ts';

/** Reads a handle after the cell has run. */
export type Read = (handle: Handle) => number;

/** A message and the line of the cell it belongs to. */
export interface Placed {
  readonly message: Message;
  readonly line: Line;
}

/** A value that the cell offers to others under a name. */
export interface OfferDraft {
  readonly name: string;
  readonly type: ValueType;
  /** null where it is not computed; `missing` then says why. */
  readonly handle: Handle | null;
  readonly sentence: string;
  readonly missing: Message | null;
  /** Unit in which the author asked for it. */
  readonly as?: Unit | null;
  /** A field that was entered as one number; left out where it was not. */
  readonly isInput?: boolean;
}

/** A field with the line it stands in. */
export type FieldDraft = Omit<FieldReading, 'line'> & { readonly line: Line };

/** One draw; `field` is '' for a quantity cell, else the name of a part's or point's field. */
interface DrawDraft {
  readonly field: string;
  readonly handle: Handle;
  readonly line: Line;
  /** What is drawn from: limits of the value, or of the factor or addend that stands behind a formula. */
  readonly spread: (read: Read) => DeclaredSpread;
  /** The value whose spread it is. */
  readonly value: Handle;
  readonly type: ValueKind;
  readonly form: 'value' | 'factor' | 'addend';
}

/** A row that is not needed to compute and has limits: specimens that read otherwise do not belong to the part. */
interface CutDraft {
  readonly field: string;
  readonly line: Line;
  /** What the row reads on the specimen. */
  readonly handle: Handle;
  readonly limits: (read: Read) => DeclaredSpread;
}

/** Two fields of a part whose draws go together (`tracking`). */
interface TieDraft {
  /** The row that places the threshold, and whether its quantile counts down as its value grows. */
  readonly threshold: string;
  readonly thresholdFalls: boolean;
  /** The row that says how much there is. */
  readonly gain: string;
  readonly gainFalls: boolean;
  /** null where nothing is declared. */
  readonly tracking: Handle | null;
}

export interface SpreadDraft {
  readonly draws: readonly DrawDraft[];
  readonly cuts: readonly CutDraft[];
  readonly tie: TieDraft | null;
}

/** What an inverse cell asks: the value of an input at which a residual is 0, within a range. */
export interface AskDraft {
  /** The cell whose value or field is turned, and its slot. */
  readonly cell: string;
  readonly input: Handle;
  readonly residual: Handle;
  readonly low: Handle;
  readonly high: Handle;
  /** Takes the answer before the cell runs for good. */
  readonly held: Handle;
  /** The answer of a build; others read what was chosen from it. */
  readonly answer: Handle;
  /** Answered again in every build. */
  readonly each: boolean;
  /** What was found for the sheet as it stands; `atAnswer` reads the sheet turned to the answer. */
  readonly take: (found: Answers, atAnswer: Read | null) => void;
}

export interface Draft {
  readonly type: ValueType | null;
  readonly value: Handle | null;
  readonly offers: readonly OfferDraft[];
  /** Looked at after each run: a message means that the cell has no values. */
  readonly verify: ((read: Read) => Placed | null) | null;
  readonly cautions: (read: Read) => readonly { readonly text: string; readonly line: Line }[];
  readonly assumptions: readonly string[];
  readonly workings: (read: Read) => readonly WorkingStep[];
  readonly check: ((read: Read) => CheckReading) | null;
  readonly fields: (read: Read) => readonly FieldDraft[];
  /** Rows of a part that its bench gives. */
  readonly measured: (read: Read) => readonly FieldDraft[];
  readonly spread: ((read: Read) => DeclaredSpread | null) | null;
  /** What is drawn in each build, and from what. */
  readonly drawn: SpreadDraft;
  /** By how much a check holds; null where that has no meaning. */
  readonly reserve: Handle | null;
  readonly isInput: boolean;
  /** Only of an inverse cell. */
  readonly asks: AskDraft | null;
  /** A stage for figures. */
  readonly stage: ((read: Read, solved: boolean) => StageReading) | null;
  /** Something that decides the shape of the code, worked out again before each run; where it has changed, the cell is compiled anew. */
  readonly shape: (() => string) | null;
  /** What a kind of cell tells those that are built on it (a part its device). */
  readonly extra: Interface['extra'];
  /** A part in every convention. */
  readonly part: ((read: Read) => PartReading) | null;
  /** What a bench has found. */
  readonly bench: { readonly measured: Measured; readonly reading: BenchReading } | null;
}

export interface CellContext {
  readonly tree: CellTree;
  readonly builder: Builder;
  /** The scope for an expression that stands in `line`. */
  scope(line: Line): Scope;
  /** The cell of this name as others see it; null where there is none. Notes the dependence. */
  look(name: string): Interface | null;
  /** The text of a cell, taken apart; the cell is compiled again when it changes. */
  treeOf(name: string): CellTree | null;
  /** The value of an expression as the sheet stands now (its cells are evaluated already). */
  now(expr: Expr, line: Line): { type: ValueType; value: number };
  /** Ambient temperature in kelvin: the cell T_A, else 25 degC. */
  ambient(): Handle;
  /** Names of all cells, for proposals; the cell is compiled again when they change. */
  names(): readonly string[];
  /** Names of all inputs, for proposals; the cell is compiled again when they change. */
  inputs(): readonly string[];
  /** Whether there is a cell of this name, without using it; the cell is compiled again when that changes. */
  has(name: string): boolean;
  /** Something is understood but not computed by now: the cell gets no value. */
  later(what: string, span: Span, line: Line): void;
}

/** Nothing spreads. */
export const NO_SPREAD: SpreadDraft = { draws: [], cuts: [], tie: null };

/** A draft of a cell that has no code of its own; kinds override what they have. */
export const EMPTY_DRAFT: Draft = {
  type: null,
  value: null,
  offers: [],
  verify: null,
  cautions: () => [],
  assumptions: [],
  workings: () => [],
  check: null,
  fields: () => [],
  measured: () => [],
  spread: null,
  drawn: NO_SPREAD,
  reserve: null,
  isInput: false,
  asks: null,
  stage: null,
  shape: null,
  extra: null,
  part: null,
  bench: null,
};
