// What closes a record: cautions and limits, lines to sign on, and the sheet text from which all of it can be had again.

import type { Sheet } from '../sheet/index.ts';
import { orBlank, plainText, sentence } from './inline.ts';
import type { Block, Inlines } from './record-tree.ts';
import { checkedLines, titleField } from './title-fields.ts';

/** What is said in every record, whatever the sheet. 60 V d.c.: IEC 62368-1, ES1. */
const ALWAYS = [
  'The model is the square law with channel-length modulation: cutoff, ohmic region and saturation. Weak inversion, velocity saturation, breakdown and ageing are not in it.',
  'Voltages above 60 V d.c. are dangerous to touch; so may be lower ones where it is wet. Before work, switch off, discharge what stores charge, and measure.',
  'Capacitors hold their charge after the supply is off, and inductors drive their current on when it is interrupted; neither is computed here.',
  'What dissipates gets hot. Junction temperatures rest on the thermal resistance stated for each part and on the ambient temperature of this sheet, not on the box it ends up in.',
  'Local codes and licensed practice decide what may be built, connected and operated; this record does not.',
];

/** Cautions of the sheet, then what holds for any. */
export function cautionBlocks(sheet: Sheet): readonly Block[] {
  const own = sheet.cautions().map(({ cell, line, text }): Inlines => {
    const words = text.startsWith(`${cell}:`) ? text : `${cell}: ${text}`;
    return [...sentence(words, cell), ...plainText(` (line ${line + 1})`)];
  });
  return [{ type: 'list', mark: 'dot', items: [...own, ...ALWAYS.map((text) => sentence(text))] }];
}

/** Lines for those who answer for the record, and what was checked already. */
export function signOffBlocks(sheet: Sheet): readonly Block[] {
  const { tree } = sheet;
  const date = titleField(tree, 'date');
  const checked = checkedLines(tree).map(({ what, by }): Inlines => {
    return [...plainText('Checked: '), ...sentence(what), ...(by === null ? [] : plainText(`, by ${by}`))];
  });
  const people: Block = {
    type: 'sign-off',
    people: [
      { role: 'Designed', name: orBlank(titleField(tree, 'author')), date: orBlank(date) },
      { role: 'Checked', name: orBlank(titleField(tree, 'checker')), date: orBlank(null) },
      { role: 'Approved', name: orBlank(null), date: orBlank(null) },
    ],
  };
  return checked.length === 0 ? [people] : [people, { type: 'list', mark: 'dot', items: checked }];
}

/** The sheet text with its line numbers, and what of it cannot be seen in print. */
export function textBlocks(sheet: Sheet): readonly Block[] {
  const { lines, text } = sheet.tree;
  const unseen = [
    ...numbered('ends in blanks', 'end in blanks', linesWith(sheet, /[ \t]$/)),
    ...numbered('holds tabs', 'hold tabs', linesWith(sheet, /\t/)),
    ...(/\r\n/.test(text) ? ['Lines end with carriage return and line feed.'] : []),
    ...(text === '' || text.endsWith('\n') ? [] : ['No line end stands behind the last line.']),
  ];
  const remark: readonly Block[] =
    unseen.length === 0 ? [] : [{ type: 'paragraph', tone: 'remark', content: plainText(unseen.join(' ')) }];
  return [...remark, { type: 'listing', lines: lines.map((line) => line.text) }];
}

function linesWith(sheet: Sheet, pattern: RegExp): readonly number[] {
  return sheet.tree.lines.filter((line) => pattern.test(line.text)).map((line) => line.index + 1);
}

function numbered(one: string, several: string, lines: readonly number[]): readonly string[] {
  if (lines.length === 0) return [];
  return [lines.length === 1 ? `Line ${lines[0]} ${one}.` : `Lines ${lines.join(', ')} ${several}.`];
}
