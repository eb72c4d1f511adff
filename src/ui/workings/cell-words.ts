// What a cell is and what it comes to, in a few words.

import { checkText, shownCell } from '../../record/index.ts';
import type { CellKind, CellReading } from '../../sheet/index.ts';

const KIND_WORDS: Readonly<Record<CellKind, string>> = {
  quantity: 'computed',
  part: 'part',
  another: 'another of its kind',
  point: 'point',
  stage: 'stage',
  bench: 'bench',
  check: 'check',
  plot: 'figure',
  inverse: 'inverse',
  broken: 'broken line',
};

/** `input`, `computed`, `stage`, .. */
export function kindWords(cell: CellReading): string {
  return cell.kind === 'quantity' && cell.isInput ? 'input' : KIND_WORDS[cell.kind];
}

/** Its value, or what a check says; null where it has none. */
export function valueWords(cell: CellReading): string | null {
  if (cell.kind === 'check') return cell.fault ? null : checkText(cell);
  return shownCell(cell);
}
