// The cells that some names rest on, as a small sheet of their own: what a dialog tries its values in, without the rest of
// the sheet being computed along.

import { blockOf } from '../../language/index.ts';
import type { SheetView } from '../../sheet/index.ts';

/** The lines of these cells and of all they use, and of T_A where the sheet has it, in sheet order. */
export function linesBehind(sheet: SheetView, names: readonly string[]): string[] {
  const found = new Set<string>();
  const waiting = [...names, 'T_A'];
  for (let name = waiting.pop(); name !== undefined; name = waiting.pop()) {
    const cell = found.has(name) ? null : sheet.cell(name);
    if (!cell) continue;
    found.add(name);
    waiting.push(...cell.uses);
  }
  const { tree } = sheet;
  return tree.cells
    .filter((cell) => found.has(cell.name.name))
    .flatMap((cell) => {
      const { first, count } = blockOf(tree, cell.line.index);
      return tree.lines.slice(first, first + count).map(({ text }) => text);
    });
}
