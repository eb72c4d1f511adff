// Tokens of one line, taken one at a time. All spellings of a sign are one sign here.

import { canonicalName, isDigit, isLetter, nameEnd, skipBlanks } from './characters.ts';
import { halt } from './messages.ts';
import type { NumberToken } from './number.ts';
import { scanNumber } from './number.ts';

export type Sign =
  | '+'
  | '-'
  | '*'
  | '/'
  | '||'
  | '^'
  | '='
  | '<'
  | '>'
  | '<='
  | '>='
  | '±'
  | '..'
  | ','
  | '('
  | ')'
  | '√'
  | '.'
  | ':'
  | '[';

interface NameToken {
  readonly type: 'name';
  readonly start: number;
  readonly end: number;
  readonly name: string;
}
interface SignToken {
  readonly type: 'sign';
  readonly start: number;
  readonly end: number;
  readonly sign: Sign;
}
/** `²`, `⁻¹`. */
export interface SuperscriptToken {
  readonly type: 'superscript';
  readonly start: number;
  readonly end: number;
  readonly value: number;
}
interface EndToken {
  readonly type: 'end';
  readonly start: number;
  readonly end: number;
}
export type Token = NumberToken | NameToken | SignToken | SuperscriptToken | EndToken;

const SPELLINGS: Readonly<Record<string, Sign>> = {
  '+': '+',
  '-': '-',
  '−': '-',
  '*': '*',
  '·': '*',
  '⋅': '*',
  '×': '*',
  '/': '/',
  '||': '||',
  '//': '||',
  '∥': '||',
  '^': '^',
  '=': '=',
  '<': '<',
  '>': '>',
  '<=': '<=',
  '≤': '<=',
  '>=': '>=',
  '≥': '>=',
  '±': '±',
  '+/-': '±',
  '..': '..',
  '…': '..',
  ',': ',',
  '(': '(',
  ')': ')',
  '√': '√',
  '.': '.',
  ':': ':',
  '[': '[',
};

/** What other languages and keyboards write, and what is written here. */
const FOREIGN: Readonly<Record<string, string>> = {
  '...': 'two dots',
  '**': '^',
  '==': '=',
  '=<': '<=',
  '=>': '>=',
  '!=': 'not (a = b)',
  '<>': 'not (a = b)',
  '≠': 'not (a = b)',
  '&&': 'and',
  '|': '||',
  '–': '-',
  '—': '-',
  '‐': '-',
  '‑': '-',
  '÷': '/',
  '∙': '*',
};

interface Spelling {
  readonly text: string;
  readonly sign: Sign | null;
  readonly right: string;
}

/** All spellings by their first character, the longer ones first. */
const BY_FIRST = new Map<string, Spelling[]>();
for (const [text, sign] of Object.entries(SPELLINGS)) add({ text, sign, right: text });
for (const [text, right] of Object.entries(FOREIGN)) add({ text, sign: null, right });

function add(spelling: Spelling): void {
  const others = BY_FIRST.get(spelling.text[0]) ?? [];
  const all = [...others, spelling].toSorted((a, b) => b.text.length - a.text.length);
  BY_FIRST.set(spelling.text[0], all);
}

/** With its sign; no exponent on paper has more. */
const LONGEST_SUPERSCRIPT = 4;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Reads the token at or behind `at`; one of type `end` at `limit`. Leaves with a message where no token can be read. */
export function scanToken(text: string, at: number, limit: number): Token {
  const start = skipBlanks(text, at, limit);
  if (start >= limit) return { type: 'end', start: limit, end: limit };
  const code = text.charCodeAt(start);
  if (isDigit(code)) return scanNumber(text, start, limit);
  if (isLetter(code)) {
    const end = nameEnd(text, start, limit);
    return { type: 'name', start, end, name: canonicalName(text.slice(start, end)) };
  }
  return scanSuperscript(text, start, limit) ?? scanSign(text, start, limit);
}

function scanSign(text: string, start: number, limit: number): SignToken {
  if (text[start] === '.' && start + 1 < limit && isDigit(text.charCodeAt(start + 1))) {
    let end = start + 1;
    while (end < limit && isDigit(text.charCodeAt(end))) end++;
    halt('whole-part-missing', { start, end }, `0${text.slice(start, end)}`);
  }
  for (const { text: spelling, sign, right } of BY_FIRST.get(text[start]) ?? []) {
    const end = start + spelling.length;
    if (end > limit || !text.startsWith(spelling, start)) continue;
    return sign ? { type: 'sign', start, end, sign } : halt('operator-spelling', { start, end }, spelling, right);
  }
  const remark = text[start] === '#' ? text.slice(start + 1, limit).trim() : '';
  if (remark !== '') halt('remark-mark', { start, end: start + 1 }, '#', remark);
  const character = String.fromCodePoint(text.codePointAt(start)!);
  return halt('character-unknown', { start, end: start + character.length }, visible(character));
}

/** The character, or its number where nothing would be seen. */
function visible(character: string): string {
  const hidden = /[\p{C}\p{Z}\p{M}]/u.test(character);
  return hidden ? `U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}` : character;
}

function scanSuperscript(text: string, start: number, limit: number): SuperscriptToken | null {
  const negative = text[start] === '⁻';
  let end = negative ? start + 1 : start;
  let value = 0;
  for (; end < limit; end++) {
    const digit = SUPERSCRIPTS.indexOf(text[end]);
    if (digit < 0) break;
    value = value * 10 + digit;
  }
  if (end === (negative ? start + 1 : start)) return null;
  if (end - start > LONGEST_SUPERSCRIPT) halt('number-range', { start, end }, text.slice(start, end));
  return { type: 'superscript', start, end, value: negative ? -value : value };
}
