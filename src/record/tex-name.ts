// Names and paths in TeX: a name with `_` is a quantity, set italic with an upright subscript; one
// without is a designator or a word, set upright and whole; a Greek letter's name is the letter.

import { greekLetter, symbolName } from '../figure/index.ts';

/** `I_D` as I_{\mathrm{D}}, `Q1` as \mathrm{Q1}, `beta` as \beta; `name` is canonical (ASCII letters, digits, `_`). */
export function texOfName(name: string): string {
  return symbolOf(name, []);
}

/**
 * A path, such as `A1.I_D` or `A1.Qa.I_D`, set as its last name; the FET stands in the subscript, the
 * cell only where it is another one than `subject`.
 */
export function texOfPath(names: readonly string[], subject: string | null): string {
  const value = names[names.length - 1]!;
  const owners = names.slice(names.length > 1 && names[0] === subject ? 1 : 0, -1);
  return symbolOf(value, owners.length > 0 ? [owners.join('.')] : []);
}

function symbolOf(name: string, owners: readonly string[]): string {
  const { head, letter, hat, style, subscripts } = symbolName(name);
  const below = [...subscripts, ...owners].map(word);
  const base = letter !== null ? word(head) : style === 'italic' ? italic(head) : word(head);
  const whole = hat ? `\\hat{${base}}` : base;
  return below.length === 0 ? whole : `${whole}_{${below.join(',\\,')}}`;
}

function italic(text: string): string {
  return text.length === 1 ? text : `\\mathit{${text}}`;
}

/** A word upright, a Greek letter by its name in TeX; those that look like a Latin one have none there. */
function word(text: string): string {
  const letter = greekLetter(text);
  if (letter === null) return `\\mathrm{${text}}`;
  return letter < '\u0080' ? `\\mathrm{${letter}}` : `\\${text}`;
}
