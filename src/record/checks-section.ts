// The checks as a table: failing ones first, then those that could not be decided.

import type { CellReading, Sheet } from '../sheet/index.ts';
import { checkText } from './check-text.ts';
import { name, plainText, sentence, strong } from './inline.ts';
import type { Block, Inline, Mark, TableRow } from './record-tree.ts';
import { typed } from './open-points.ts';
import { failingText, failsCheck } from './verdict.ts';
import type { JudgedSpread } from './verdict.ts';
import { yieldText } from './yield-text.ts';
import { workingsOf } from './workings.ts';

const COLUMNS = [
  { title: 'check', kind: 'text' },
  { title: 'requirement', kind: 'text' },
  { title: 'with the values put in', kind: 'text' },
  { title: 'result', kind: 'text' },
] as const;

const YIELD = { title: 'builds that hold it', kind: 'text' } as const;

const ORDER: readonly Mark[] = ['fails', 'unknown', 'holds'];

/** The table of checks, or the sentence that nothing is required. */
export function checksBlock(sheet: Sheet, judged: JudgedSpread | null): Block {
  const checks = sheet.cells().filter(({ tree }) => tree.entry.type === 'check');
  if (checks.length === 0) {
    return { type: 'paragraph', tone: 'plain', content: plainText('Nothing is required of this sheet yet.') };
  }
  const rows = checks.map((cell) => row(cell, sheet, judged));
  const sorted = ORDER.flatMap((mark) => rows.filter((each) => each.mark === mark));
  return { type: 'table', name: 'checks', columns: judged ? [...COLUMNS, YIELD] : COLUMNS, rows: sorted };
}

function row(cell: CellReading, sheet: Sheet, judged: JudgedSpread | null): TableRow {
  const fails = failsCheck(cell, judged);
  const mark: Mark = cell.check === null ? 'unknown' : fails ? 'fails' : 'holds';
  const words = fails ? failingText(cell, judged) : checkText(cell);
  const result = cell.waitsFor === null ? words : `waits for ${cell.waitsFor}`;
  const share = judged?.spread.check(cell.name)?.yield ?? null;
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
      ...(judged ? [{ content: plainText(share ? yieldText(share) : '–') }] : []),
    ],
  };
}
