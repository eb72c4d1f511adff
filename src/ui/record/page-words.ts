// What the margins of printed pages say, as strings of CSS.

import type { RecordTree } from '../../record/index.ts';

/** Shown of the digest in the margin; the whole of it stands in the title block. */
const DIGEST_SHOWN = 16;

/** Custom properties that the margin boxes read. */
export function pageWords(tree: RecordTree): Readonly<Record<string, string>> {
  const digest = tree.digest.slice(0, DIGEST_SHOWN).replace(/(.{8})(?=.)/g, '$1 ');
  const state = tree.incomplete === null ? [] : ['incomplete'];
  return {
    '--record-head': cssString(tree.title),
    '--record-edition': cssString([...state, tree.edition].filter((part) => part !== '').join(', ')),
    '--record-foot': cssString(`Squarelaw, text ${digest}`),
    '--record-when': cssString(tree.printedAt === null ? '' : `printed ${tree.printedAt}`),
  };
}

/** A text as a quoted string of CSS, whatever stands in it. */
export function cssString(text: string): string {
  return `"${text.replace(/["\\<>]|[^\P{C} ]/gu, (character) => `\\${character.codePointAt(0)!.toString(16)} `)}"`;
}
