// Source and note of a line as they stand in the tables of the record.

import type { Line } from '../language/index.ts';
import type { Sheet } from '../sheet/index.ts';
import { plainText, sentence, strong } from './inline.ts';
import type { Cell, Inlines } from './record-tree.ts';
import { originOf } from './source.ts';

/** What is assumed or has no source is set strongly: somebody must confirm it. */
export function originCell(line: Line, sheet: Sheet, isInput: boolean): Cell {
  const { source, note } = originOf(line, sheet.tree.lines);
  const from = sourceWords(source, isInput);
  const behind = note === null ? [] : sentence(note);
  return { content: [...from, ...plainText(from.length > 0 && behind.length > 0 ? '; ' : ''), ...behind] };
}

function sourceWords(source: string | null, isInput: boolean): Inlines {
  if (source === 'assumed') return [strong('assumed')];
  if (source !== null) return sentence(source);
  return isInput ? [strong('no source')] : [];
}
