// A line being read: one token of lookahead, and what every construct asks of it.

import { isUnitFault } from '../quantity/index.ts';
import { trimEnd } from './characters.ts';
import type { Sign, Token } from './lexer.ts';
import { scanToken } from './lexer.ts';
import { halt } from './messages.ts';
import { isJoiningWord } from './reserved.ts';
import type { NameRef, Span } from './syntax.ts';
import { scanUnitAt } from './unit-memo.ts';

/** Parentheses, signs, roots and powers inside one another. */
const DEEPEST = 100;
/** Keeps trees shallow enough for any recursive walk. */
const MOST_OPERATORS = 1000;

export class Reader {
  readonly text: string;
  /** Where the body ends: the start of a source or note, or the end of the line. */
  readonly limit: number;
  #position: number;
  #ahead: Token | null = null;
  #last: Token;
  #depth = 0;
  #operators = 0;

  constructor(text: string, at: number, limit: number) {
    this.text = text;
    this.limit = trimEnd(text, at, limit);
    this.#position = at;
    this.#last = { type: 'end', start: at, end: at };
  }

  /** The next token, which stays. */
  get ahead(): Token {
    return (this.#ahead ??= scanToken(this.text, this.#position, this.limit));
  }

  /** The token taken last; one of type `end` before the first. */
  get last(): Token {
    return this.#last;
  }

  take(): Token {
    const token = this.ahead;
    this.#last = token;
    this.#position = token.end;
    this.#ahead = null;
    return token;
  }

  /** Goes on reading behind a stretch that was read as text. */
  jump({ start, end }: Span): void {
    this.#last = { type: 'end', start, end };
    this.#position = end;
    this.#ahead = null;
  }

  /** Where the next token begins. */
  get position(): number {
    return this.#ahead?.start ?? this.#position;
  }

  atEnd(): boolean {
    return this.ahead.type === 'end';
  }

  /** The sign that comes next; null where another token does. */
  get sign(): Sign | null {
    const { ahead } = this;
    return ahead.type === 'sign' ? ahead.sign : null;
  }

  atSign(sign: Sign): boolean {
    return this.sign === sign;
  }

  takeSign(sign: Sign): Token | null {
    return this.atSign(sign) ? this.take() : null;
  }

  atWord(word: string): boolean {
    const { ahead } = this;
    return ahead.type === 'name' && ahead.name === word;
  }

  atOneOf(words: readonly string[]): boolean {
    const { ahead } = this;
    return ahead.type === 'name' && words.includes(ahead.name);
  }

  takeWord(word: string): Token | null {
    return this.atWord(word) ? this.take() : null;
  }

  /** The name of a cell, specimen or column, which is no joining word; `what` and `example` say what belongs there. */
  takeName(what: string, example: string): NameRef {
    const { ahead } = this;
    if (ahead.type !== 'name' || isJoiningWord(ahead.name)) halt('name-missing', spanOf(ahead), what, example);
    this.take();
    return { name: ahead.name, span: { start: ahead.start, end: ahead.end } };
  }

  textOf(span: Span): string {
    return this.text.slice(span.start, span.end);
  }

  /** From `start` to the end of the token taken last. */
  spanFrom(start: number): Span {
    return { start, end: Math.max(start, this.#last.end) };
  }

  /** Reads a construct that may contain itself. */
  nested<T>(read: () => T): T {
    if (++this.#depth > DEEPEST) halt('nested-too-deep', { start: this.position, end: this.limit }, DEEPEST);
    const result = read();
    this.#depth--;
    return result;
  }

  countOperator(): void {
    if (++this.#operators > MOST_OPERATORS)
      halt('expression-too-long', { start: this.position, end: this.limit }, MOST_OPERATORS);
  }

  /** Leaves with a message unless everything is read; behind an expression. */
  expectEnd(): void {
    if (!this.atEnd()) this.refuse();
  }

  /** Leaves with a message unless everything is read; where no operator could follow. */
  expectNothing(): void {
    const { ahead, last } = this;
    if (ahead.type !== 'end') halt('leftover', ahead, this.textOf(ahead), this.textOf(last));
  }

  /** Leaves with a message unless everything is read; behind an item of a list. */
  expectListEnd(): void {
    const { ahead, last } = this;
    const item = ahead.type === 'name' || ahead.type === 'number';
    if (item) halt('comma-missing', { start: last.start, end: ahead.end }, this.textOf(last), this.textOf(ahead));
    this.expectNothing();
  }

  /** Leaves with the message about a token that nothing can take. */
  refuse(): never {
    const { ahead, last } = this;
    const here = spanOf(ahead);
    if (ahead.type === 'sign' && ahead.sign === ')') halt('parenthesis-extra', here);
    if (endsOperand(last) && beginsOperand(ahead)) this.#refuseProduct(ahead);
    return halt('leftover', here, this.textOf(here), this.textOf(last));
  }

  #refuseProduct(ahead: Token): never {
    const { last } = this;
    const span = { start: last.start, end: ahead.end };
    if (last.type === 'sign' || ahead.type === 'sign') halt('operator-missing-plain', span);
    if (last.type === 'number' && !last.unit && ahead.type === 'name') {
      const read = scanUnitAt(this.text, ahead.start, this.limit);
      if (isUnitFault(read) && read.hint)
        halt('operator-missing-unit', span, this.textOf(last), this.textOf(ahead), read.hint);
    }
    return halt('operator-missing', span, this.textOf(last), this.textOf(ahead));
  }
}

/** The span of a token. */
export function spanOf({ start, end }: Token): Span {
  return { start, end };
}

function endsOperand(token: Token): boolean {
  if (token.type === 'name') return !isJoiningWord(token.name);
  return token.type === 'number' || token.type === 'superscript' || (token.type === 'sign' && token.sign === ')');
}

function beginsOperand(token: Token): boolean {
  if (token.type === 'name') return !isJoiningWord(token.name);
  return token.type === 'number' || (token.type === 'sign' && (token.sign === '(' || token.sign === '√'));
}
