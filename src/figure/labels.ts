// Text in figures: names set as the trade sets them, and how much room a text takes. There is no font
// to ask here, so widths are those of a wide sans serif face (DejaVu Sans, from memory) and what is really drawn
// is as wide or narrower.

import type { Box, Run, TextItem } from './geometry.ts';
import { greekLetter, symbolName } from './symbol-name.ts';

/** Size of all words and numbers in a schematic. */
export const LABEL_SIZE = 12;
const SUBSCRIPT_SIZE = 0.75;
const BOLD = 1.14;
const ASCENT = 0.8;
const DESCENT = 0.25;

/** Between subscripts. */
const NEXT = ', ';
/** Above the character before it. */
const HAT = '\u0302';

/** Widths in em by character; what is not listed takes that of its class. */
const WIDTHS: Readonly<Record<string, number>> = {
  ' ': 0.32,
  '\u2009': 0.2,
  '\u202f': 0.2,
  '.': 0.32,
  ',': 0.32,
  '-': 0.37,
  '−': 0.84,
  '+': 0.84,
  '=': 0.84,
  '±': 0.84,
  '/': 0.34,
  '(': 0.4,
  ')': 0.4,
  '%': 0.96,
  '∞': 0.84,
  '°': 0.5,
  i: 0.28,
  j: 0.28,
  l: 0.28,
  f: 0.36,
  t: 0.4,
  r: 0.42,
  m: 0.98,
  w: 0.82,
  M: 0.87,
  W: 1,
  I: 0.3,
  J: 0.3,
  Q: 0.79,
  O: 0.79,
  Ω: 0.77,
};

/**
 * `V_DD` as an italic V with an upright DD below, `Q1` and `load` upright and whole; no underscore is left. The owner of
 * a value, as in `A1.I_D`, stands in the subscript.
 */
export function typeset(path: string): Run[] {
  const names = path.split('.');
  const name = names[names.length - 1]!;
  const owner = names.slice(0, -1).join('.');
  const { head, letter, hat, style, subscripts } = symbolName(name);
  const runs: Run[] = [{ text: (letter ?? head) + (hat ? HAT : ''), style }];
  const below = [...subscripts.map((part) => greekLetter(part) ?? part), ...(owner === '' ? [] : [owner])];
  if (below.length > 0) runs.push({ text: below.join(NEXT), style: 'subscript' });
  return runs;
}

/** A text as one upright run. */
export function plain(text: string): Run[] {
  return text === '' ? [] : [{ text, style: 'upright' }];
}

/** A sentence with the names in it typeset: `bias line, 1/R_S`. */
export function proseRuns(text: string): Run[] {
  return text
    .split(/((?:[A-Za-z][A-Za-z0-9]*\.)*[A-Za-z][A-Za-z0-9]*_\w+)/)
    .flatMap((part, at) => (at % 2 === 1 ? typeset(part) : plain(part)));
}

/** Two texts one behind the other, with a blank between them where both say something. */
export function joinRuns(first: readonly Run[], second: readonly Run[]): Run[] {
  if (first.length === 0 || second.length === 0) return [...first, ...second];
  const [next, ...rest] = second;
  return [...first, { text: ` ${next!.text}`, style: next!.style }, ...rest];
}

/** Width of a text, rather too large than too small. */
export function widthOf(runs: readonly Run[], size: number, weight: 'normal' | 'bold' = 'normal'): number {
  let em = 0;
  for (const { text, style } of runs) {
    let width = 0;
    for (const character of text) width += characterWidth(character);
    em += style === 'subscript' ? width * SUBSCRIPT_SIZE : width;
  }
  return em * size * (weight === 'bold' ? BOLD : 1);
}

/** The room that a text takes. */
export function textBox({ x, y, anchor, size, runs, role }: TextItem): Box {
  const width = widthOf(runs, size, role === 'voltage' || role === 'current' ? 'bold' : 'normal');
  const x0 = anchor === 'start' ? x : anchor === 'end' ? x - width : x - width / 2;
  const below = runs.some(({ style }) => style === 'subscript') ? DESCENT + 0.1 : DESCENT;
  return { x0, y0: y - ASCENT * size, x1: x0 + width, y1: y + below * size };
}

function characterWidth(character: string): number {
  const known = WIDTHS[character];
  if (known !== undefined) return known;
  if (character >= '0' && character <= '9') return 0.64;
  if (character >= 'a' && character <= 'z') return 0.64;
  if (character >= 'A' && character <= 'Z') return 0.76;
  return character.codePointAt(0)! < 0x2e80 ? 0.8 : 1.1;
}
