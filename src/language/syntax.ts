// The syntax tree of a sheet. The text is the document; the tree only points into it.
//
// A sheet is parsed line by line, and a line's tree knows nothing of the lines around it: every span
// is in UTF-16 units from the start of its own line. So a line whose text has not changed keeps its
// tree (the same object) through every edit elsewhere, and an offset in the document is
// `line.offset + span.start`. Names are canonical (`β` is `beta`); the text keeps the author's spelling.

import type { Unit, ValueKind } from '../quantity/index.ts';

/** Half-open stretch of one line, in UTF-16 units from the line's start. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

/** What is wrong with a piece of text, where, and what would be right. */
export interface Message {
  /** Stable code, e.g. `unit-blank-missing`. */
  readonly code: string;
  /** Whole sentence(s), as shown to the user. */
  readonly text: string;
  readonly span: Span;
}

/** A name as written, with its canonical spelling. */
export interface NameRef {
  readonly name: string;
  readonly span: Span;
}

// ---------------------------------------------------------------- expressions

export type BinaryOperator = '+' | '-' | '*' | '/' | '||' | '^' | 'and' | 'or' | '=' | '<' | '>' | '<=' | '>=';

/** A number with or without unit; `value` is SI (kelvin for a point of the Celsius scale, dB for decibels). */
export interface NumberExpr {
  readonly type: 'number';
  readonly value: number;
  /** The unit as written; null for a bare number; the unit of ohm or farad for an IEC 60062 code. */
  readonly unit: Unit | null;
  readonly kind: ValueKind;
  readonly span: Span;
}
/** `R_S`, `A1.g_m`, `A1.Qa.I_D`. */
export interface PathExpr {
  readonly type: 'path';
  readonly names: readonly NameRef[];
  readonly span: Span;
}
export interface CallExpr {
  readonly type: 'call';
  readonly name: NameRef;
  readonly args: readonly Expr[];
  readonly span: Span;
}
export interface UnaryExpr {
  readonly type: 'unary';
  readonly operator: '+' | '-' | '√' | 'not';
  readonly operand: Expr;
  readonly span: Span;
}
export interface BinaryExpr {
  readonly type: 'binary';
  readonly operator: BinaryOperator;
  readonly left: Expr;
  readonly right: Expr;
  readonly operatorSpan: Span;
  readonly span: Span;
}
/** A pair of parentheses, kept because the author wrote them. */
interface GroupExpr {
  readonly type: 'group';
  readonly inner: Expr;
  readonly span: Span;
}
/** `a within lo .. hi`, or `a within c ± d` (then `low` is c - d, `high` is c + d, folded by the parser into literals). */
export interface WithinExpr {
  readonly type: 'within';
  readonly value: Expr;
  readonly low: Expr;
  readonly high: Expr;
  readonly span: Span;
}
/** `A1.A_v with V_C = -8 V`. */
export interface WithExpr {
  readonly type: 'with';
  readonly value: Expr;
  readonly input: PathExpr;
  readonly setting: Expr;
  readonly span: Span;
}
export type Expr = NumberExpr | PathExpr | CallExpr | UnaryExpr | BinaryExpr | GroupExpr | WithinExpr | WithExpr;

/** A signed number. */
export interface Literal {
  readonly value: number;
  readonly unit: Unit | null;
  readonly kind: ValueKind;
  readonly span: Span;
}

// ---------------------------------------------------------------- quantities

/** `lo .. hi`, `lo ..`, `.. hi`, in the order written (the ends may stand in either order). */
export interface Bounds {
  readonly first: Literal | null;
  readonly last: Literal | null;
  readonly span: Span;
}
export interface Spread {
  readonly tolerance: Literal | null; // behind ±
  readonly bounds: Bounds | null; // behind `in`, or a quantity of bounds alone
  readonly law: 'uniform' | 'normal' | null; // as written
  readonly service: boolean;
  readonly span: Span;
}
/** `V_DS = 15 V` behind `at`. */
export interface Condition {
  readonly name: NameRef;
  readonly literal: Literal;
}
export interface QuantityEntry {
  readonly type: 'quantity';
  /** null where bounds stand alone. */
  readonly value: Expr | null;
  readonly spread: Spread | null;
  readonly conditions: readonly Condition[];
  readonly as: { readonly unit: Unit; readonly span: Span } | null;
  readonly span: Span;
}

// ---------------------------------------------------------------- entries

export interface PartEntry {
  readonly type: 'part';
  readonly channel: 'n' | 'p';
  readonly family: 'JFET' | 'MOSFET';
  readonly fittedTo: NameRef | null;
  readonly span: Span;
}
export interface AnotherEntry {
  readonly type: 'another';
  readonly of: NameRef;
  readonly span: Span;
}
export interface PointEntry {
  readonly type: 'point';
  readonly of: NameRef;
  readonly span: Span;
}
export interface StageEntry {
  readonly type: 'stage';
  /** `stage of Q1` has one with name null; `stage of Qa = Q1, Qb = Q1` names each. */
  readonly fets: readonly { readonly name: NameRef | null; readonly part: NameRef }[];
  readonly span: Span;
}
export interface BenchEntry {
  readonly type: 'bench';
  readonly span: Span;
}
export interface CheckEntry {
  readonly type: 'check';
  readonly condition: Expr;
  readonly span: Span;
}
export interface Range {
  readonly low: Expr;
  readonly high: Expr;
  readonly log: boolean;
  readonly span: Span;
}
export interface PlotEntry {
  readonly type: 'plot';
  readonly figure: 'transfer' | 'output' | 'response' | 'noise' | 'bench' | 'spread' | 'against';
  /** The stage, point or bench of a figure; null for `spread` and `against`. */
  readonly of: NameRef | null;
  /** The values of `spread of` and `against`. */
  readonly values: readonly Expr[];
  readonly against: PathExpr | null;
  readonly over: Range | null;
  readonly span: Span;
}
export interface InverseEntry {
  readonly type: 'inverse';
  readonly input: PathExpr;
  readonly target: Expr;
  readonly value: Expr;
  readonly over: Range;
  readonly each: boolean;
  readonly span: Span;
}
/** What could not be read; its text stands in the line. */
export interface BrokenEntry {
  readonly type: 'broken';
  readonly message: Message;
  readonly span: Span;
}
export type Entry =
  | QuantityEntry
  | PartEntry
  | AnotherEntry
  | PointEntry
  | StageEntry
  | BenchEntry
  | CheckEntry
  | PlotEntry
  | InverseEntry
  | BrokenEntry;

// ---------------------------------------------------------------- fields of block cells

export type Place =
  | { readonly type: 'signal'; readonly inverted: boolean; readonly span: Span }
  | { readonly type: 'common'; readonly span: Span }
  /** A terminal (`gate`, `Qa.gate`), a named node, or a rail in volts: the checker decides which. */
  | { readonly type: 'expr'; readonly expr: Expr; readonly span: Span };

export interface Leg {
  readonly element: Expr | null; // null ties the two places together
  readonly direction: 'to' | 'from';
  readonly place: Place;
  readonly span: Span;
}

/** `columns: unit, V_GS [V], I_D [mA]` of a bench. */
export interface ColumnsBody {
  readonly type: 'columns';
  readonly columns: readonly { readonly name: NameRef; readonly unit: Unit | null; readonly span: Span }[];
  readonly span: Span;
}
/** `exponent: free`, or `exponent: 2`. */
interface ExponentBody {
  readonly type: 'exponent';
  readonly isFree: boolean;
  readonly span: Span;
}
/** `keep: V_GS in -1.2 V .. -0.9 V at I_D = 1 mA`: the specimens that a part is made of. */
export interface KeepBody {
  readonly type: 'keep';
  readonly quantity: NameRef;
  readonly bounds: Bounds;
  readonly conditions: readonly Condition[];
  readonly span: Span;
}
/** `match: pairs at I_D = 1 mA and 3 mA, V_DS = 5 V`. */
export interface MatchBody {
  readonly type: 'match';
  readonly size: 2 | 4;
  readonly conditions: readonly Condition[];
  /** The second current, behind `and`. */
  readonly second: Literal | null;
  readonly span: Span;
}
/** `fitting: I_D = 1 mA, V_DS = 10 V`: the current for which each specimen is to get its resistor. */
export interface FittingBody {
  readonly type: 'fitting';
  readonly conditions: readonly Condition[];
  readonly span: Span;
}

export type FieldBody =
  | { readonly type: 'text'; readonly text: string; readonly span: Span } // fields of the title
  | QuantityEntry // fields of parts and points, and the numbers of a bench
  | { readonly type: 'legs'; readonly legs: readonly Leg[]; readonly span: Span }
  | { readonly type: 'output'; readonly plus: PathExpr; readonly minus: PathExpr | null; readonly span: Span }
  | { readonly type: 'driven'; readonly through: Expr; readonly span: Span }
  | { readonly type: 'midband'; readonly frequency: Expr; readonly span: Span }
  | ColumnsBody
  | ExponentBody
  | KeepBody
  | MatchBody
  | FittingBody
  | BrokenEntry;

// ---------------------------------------------------------------- lines

/** `[data sheet, p. 2]`: `text` is what stands inside, `span` includes the brackets. */
export interface Source {
  readonly text: string;
  readonly span: Span;
}
/** `; inside the enclosure`: `text` without the semicolon and the blanks around, `span` with the semicolon. */
export interface Note {
  readonly text: string;
  readonly span: Span;
}

/** What one line holds, apart from where it stands. */
export type LineTree =
  | { readonly type: 'blank' }
  | { readonly type: 'note'; readonly note: Note }
  | { readonly type: 'heading'; readonly level: 1 | 2; readonly text: string; readonly span: Span }
  | { readonly type: 'prose'; readonly text: string; readonly span: Span }
  | {
      readonly type: 'cell';
      readonly name: NameRef;
      readonly entry: Entry;
      readonly source: Source | null;
      readonly note: Note | null;
    }
  | {
      readonly type: 'field';
      /** One name, or two joined by a dot (`Qa.gate`). */
      readonly label: readonly NameRef[];
      readonly labelSpan: Span;
      readonly body: FieldBody;
      readonly source: Source | null;
      readonly note: Note | null;
    }
  | {
      readonly type: 'row'; // of a bench
      readonly values: readonly (Literal | NameRef)[];
      readonly source: Source | null;
      readonly note: Note | null;
    }
  /** Could not be read as any kind of line; `name` where a cell name could still be made out. */
  | { readonly type: 'broken'; readonly name: NameRef | null; readonly message: Message };

/** One line of the sheet. */
export interface Line {
  /** From 0. */
  readonly index: number;
  /** UTF-16 offset of its first character in the document. */
  readonly offset: number;
  /** Without the line end. */
  readonly text: string;
  readonly tree: LineTree;
}

/** A named cell: its own line and, for blocks, the lines below that belong to it. */
export interface CellTree {
  readonly name: NameRef;
  readonly entry: Entry;
  readonly source: Source | null;
  readonly note: Note | null;
  readonly line: Line;
  readonly fields: readonly FieldTree[];
  readonly rows: readonly RowTree[];
}
export interface FieldTree {
  readonly label: readonly NameRef[];
  readonly labelSpan: Span;
  readonly body: FieldBody;
  readonly source: Source | null;
  readonly note: Note | null;
  readonly line: Line;
}
export interface RowTree {
  readonly values: readonly (Literal | NameRef)[];
  readonly source: Source | null;
  readonly note: Note | null;
  readonly line: Line;
}

/** A line that is broken and belongs to no cell: `line N` in reports. */
export interface LooseLine {
  readonly line: Line;
  readonly message: Message;
}

export interface SheetTree {
  readonly text: string;
  readonly lines: readonly Line[];
  /** The first `# ` heading, with its fields. */
  readonly title: { readonly line: Line; readonly text: string; readonly fields: readonly FieldTree[] } | null;
  /** In sheet order; two cells of one name both stand here. */
  readonly cells: readonly CellTree[];
  readonly loose: readonly LooseLine[];
}

/** Replace `[start, end)` of the document by `text`; offsets in UTF-16 units. */
export interface Splice {
  readonly start: number;
  readonly end: number;
  readonly text: string;
}
