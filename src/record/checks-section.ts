// The checks as a table: failing ones first, then those that could not be decided.

import type { CellReading, Sheet } from '../sheet/index.ts';
import { checkText } from './check-text.ts';
import { name, plainText, sentence, strong } from './inline.ts';
import type { Block, Inline, Mark, TableRow } from './record-tree.ts';
import { typed } from './open-points.ts';
import { workingsOf } from './workings.ts';

const COLUMNS = [
  { title: 'check', kind: 'text' },
  { title: 'requirement', kind: 'text' },
  { title: 'with the values put in', kind: 'text' },
  { title: 'result', kind: 'text' },
] as const;

const ORDER: readonly Mark[] = ['fails', 'unknown', 'holds'];

/** The table of checks, or the sentence that nothing is required. */
export function checksBlock(sheet: Sheet): Block {
  const checks = sheet.cells().filter(({ tree }) => tree.entry.type === 'check');
  if (checks.length === 0) {
    return { type: 'paragraph', tone: 'plain', content: plainText('Nothing is required of this sheet yet.') };
  }
  const rows = checks.map((cell) => row(cell, sheet));
  const sorted = ORDER.flatMap((mark) => rows.filter((each) => each.mark === mark));
  return { type: 'table', name: 'checks', columns: COLUMNS, rows: sorted };
}

function row(cell: CellReading, sheet: Sheet): TableRow {
  const mark: Mark = cell.check === null ? 'unknown' : cell.check.holds ? 'holds' : 'fails';
  const result = cell.waitsFor === null ? checkText(cell) : `waits for ${cell.waitsFor}`;
  const step = workingsOf(sheet, cell.name)[0];
  const written: Inline = step
    ? { type: 'formula', tex: step.tex.formula, text: step.text.formula }
    : { type: 'entry', text: typed(cell.tree.line, cell.tree.entry.span).replace(/^check\s+/, '') };
  const filled: readonly Inline[] =
    step && step.text.substitution !== null
      ? [{ type: 'formula', tex: step.tex.substitution!, text: step.text.substitution }]
      : [];
  return {
    mark,
    cells: [
      { content: [name(cell.name)] },
      { content: [written] },
      { content: filled },
      { content: mark === 'fails' ? [strong(result)] : sentence(result) },
    ],
  };
}
