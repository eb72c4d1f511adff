// Searching the cells of a sheet.

import type { CellReading } from '../../sheet/index.ts';

/** Names of the cells of which some line holds the words, case aside. */
export function cellsWith(cells: readonly CellReading[], words: string): string[] {
  const wanted = words.trim().toLowerCase();
  if (wanted === '') return [];
  return cells
    .filter(({ tree }) =>
      [tree.line, ...tree.fields.map(({ line }) => line)].some(({ text }) => text.toLowerCase().includes(wanted)),
    )
    .map(({ name }) => name);
}
