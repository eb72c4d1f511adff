// A bench in the record: what was asked of its rows, what it comes to, and its tables for whoever fits and matches.

import type { CellReading, Sheet } from '../sheet/index.ts';
import type { BenchTable } from './bench-table.ts';
import { benchTables } from './bench-tables.ts';
import { enteredTable } from './entered-table.ts';
import { name, sentence, textCell } from './inline.ts';
import { offeredBlocks } from './part-blocks.ts';
import type { Block } from './record-tree.ts';

/** The readings themselves stand in the text of the sheet and in the figure. */
export function benchBlocks(cell: CellReading, sheet: Sheet): readonly Block[] {
  const entered = enteredTable(cell, sheet, ['line', 'as entered']);
  const bench = sheet.bench(cell.name);
  if (!bench) return [entered];
  // Those of each specimen are in the tables.
  const own = { ...cell, values: cell.values.filter((value) => !value.name.includes('.')) };
  const tables = benchTables(bench).filter((table) => table.name !== 'readings');
  return [entered, ...offeredBlocks(own), ...tables.flatMap(tableBlocks)];
}

function tableBlocks({ name: which, caption, columns, rows }: BenchTable): Block[] {
  return [
    { type: 'paragraph', tone: 'remark', content: sentence(caption) },
    {
      type: 'table',
      name: `bench-${which}`,
      columns: columns.map(({ title, isName, isNumber }) => ({
        title,
        head: isName ? [name(title)] : sentence(title),
        kind: isNumber ? 'right' : 'text',
      })),
      rows: rows.map((row) => ({
        mark: null,
        cells: row.map(textCell),
      })),
    },
  ];
}
