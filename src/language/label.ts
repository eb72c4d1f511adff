// Names and labels at the head of a line, and the body behind them.

import { canonicalName, isLetter, nameEnd, skipBlanks, trimEnd } from './characters.ts';
import type { NameRef, Span } from './syntax.ts';

export interface Label {
  /** One name, or two joined by a dot. */
  readonly names: readonly NameRef[];
  readonly span: Span;
  /** Behind the colon. */
  readonly bodyStart: number;
}

/** The name that begins at `at`, or null. */
export function nameAt(text: string, at: number): NameRef | null {
  if (at >= text.length || !isLetter(text.charCodeAt(at))) return null;
  const end = nameEnd(text, at, text.length);
  return { name: canonicalName(text.slice(at, end)), span: { start: at, end } };
}

/** label = name [ "." name ] ; with its colon; null where none stands at `at`. */
export function labelAt(text: string, at: number): Label | null {
  const first = nameAt(text, at);
  if (!first) return null;
  const second = text[first.span.end] === '.' ? nameAt(text, first.span.end + 1) : null;
  const { end } = (second ?? first).span;
  const colon = skipBlanks(text, end, text.length);
  if (text[colon] !== ':') return null;
  return { names: second ? [first, second] : [first], span: { start: at, end }, bodyStart: colon + 1 };
}

/** The body between `at` and `limit` without blanks around; an empty one lies one blank behind `at`, where there is one. */
export function bodySpan(text: string, at: number, limit: number): Span {
  const start = skipBlanks(text, at, limit);
  if (start < limit) return { start, end: trimEnd(text, start, limit) };
  const empty = Math.min(at + 1, limit);
  return { start: empty, end: empty };
}
