// What the compilation of an expression may ask of its surroundings.

import type { Expr, PathExpr, Span } from '../language/index.ts';
import type { Builder } from '../program/index.ts';
import type { Handle } from '../network/index.ts';
import type { ValueType } from './model.ts';

export type EndName = 'low' | 'high';

/** A value that the program will hold, and what it is. */
export interface Typed {
  readonly type: ValueType;
  readonly handle: Handle;
}

export interface Scope {
  readonly builder: Builder;
  /** The text of the line that is being compiled, for naming operands in messages. */
  readonly text: string;
  /** Settles type and operations of a part of the expression. */
  compile(expr: Expr): Typed;
  /** Finds a cell's value, an offered value or a constant; stops with a message when there is none. */
  resolve(path: PathExpr): Typed;
  /** Notes that something here cannot be computed by now; the dimension is settled all the same. */
  later(what: string, span: Span): void;
  /** The least or largest of a value over the declared set, as a number that is put in before the cell runs; null where nothing computes it. */
  readonly end: ((which: EndName, of: Handle) => Handle) | null;
  /** The scope of the same build with an input set otherwise; null where no cells can be taken over. Stops where the path names no input. */
  readonly restated: ((input: PathExpr, setting: Handle) => Scope) | null;
  /** Name of the stage that a function such as gain(A1, f) takes; stops when it is none. */
  stageOf(path: PathExpr): string;
}

/** The operand as the author wrote it, short enough for a sentence. */
export function operandText(scope: Pick<Scope, 'text'>, span: Span, otherwise: string): string {
  const text = scope.text.slice(span.start, span.end).trim();
  return text.length <= 32 ? text : otherwise;
}
