// The words of the grammar, and which names a cell may bear.

import { isUnitSymbol } from '../quantity/index.ts';
import { canonicalName, isLetter, nameEnd } from './characters.ts';

/** Words that join parts of an entry: they stand where the grammar puts them and name nothing. */
const JOINING = (
  'in at as to from of over such that with within against another each ' +
  'through common and or not if check plot stage point bench fitted'
).split(' ');

/** Words that an expression may name although no cell may: constants, regions, the signal and the terminals. */
const NAMING = 'pi k_B q_e cutoff ohmic saturation signal gate drain source bulk'.split(' ');

const JOINING_WORDS: ReadonlySet<string> = new Set(JOINING);

/** Every word that is refused as a cell name. */
export const RESERVED: ReadonlySet<string> = new Set([...JOINING, ...NAMING]);

/** Whether the word joins parts of an entry and so can name nothing in an expression. */
export function isJoiningWord(name: string): boolean {
  return JOINING_WORDS.has(name);
}

/** Whether a cell may bear this name, in any spelling: a letter, then letters, digits and `_`, no unit and no word of the grammar. */
export function isCellName(written: string): boolean {
  if (written === '' || !isLetter(written.charCodeAt(0)) || nameEnd(written, 0, written.length) < written.length)
    return false;
  const name = canonicalName(written);
  return !RESERVED.has(name) && !isUnitSymbol(written) && !isUnitSymbol(name);
}

/** A free name near a refused one: `V` gives `V_1`. */
export function proposeName(refused: string): string {
  return `${refused}_1`;
}
