// The lines of a block as they were entered: what hangs where in a stage, or the rows of a part that could not be read.

import type { CellReading, Sheet } from '../sheet/index.ts';
import { name, plainText } from './inline.ts';
import { labelOf, typed } from './open-points.ts';
import { originCell } from './origin-cell.ts';
import type { Block, Inline, Inlines, TableRow } from './record-tree.ts';

/** A table of two columns: the label of each line, and what stands behind it. */
export function enteredTable(cell: CellReading, sheet: Sheet, titles: readonly [string, string]): Block {
  const rows = cell.tree.fields.map((field): TableRow => {
    const origin = originCell(field.line, sheet, false).content;
    const entry: Inline = { type: 'entry', text: typed(field.line, field.body.span) };
    const content: Inlines = origin.length === 0 ? [entry] : [entry, ...plainText('  '), ...origin];
    return { mark: null, cells: [{ content: [name(labelOf(field), cell.name)] }, { content }] };
  });
  const columns = titles.map((title) => ({ title, kind: 'text' as const }));
  return { type: 'table', name: 'entered', columns, rows };
}
