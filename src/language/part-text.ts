// The text of a part as it stands apart from its sheet: `same` that points out of it says what it points at.

import { blockOf } from './line-edits.ts';
import type { CellTree, Line, SheetTree, Splice } from './syntax.ts';
import { applySplices } from './splice.ts';
import { renameCell } from './rename.ts';
import { parseSheet } from './sheet.ts';

/** The lines of a part, which are to mean elsewhere what they mean here. */
export function partText(tree: SheetTree, cell: CellTree): string {
  const { first, count } = blockOf(tree, cell.line.index);
  let ownSource = false;
  return tree.lines
    .slice(first, first + count)
    .map((line) => {
      const source = sourceOf(line);
      const pointsOut = source?.text.trim() === 'same' && !ownSource;
      if (source && source.text.trim() !== 'same') ownSource = true;
      if (!pointsOut) return line.text;
      const above = sourceAbove(tree, first);
      if (above !== null) ownSource = true;
      const at = line.text.lastIndexOf('same', source.span.end);
      return above === null ? line.text : line.text.slice(0, at) + above + line.text.slice(at + 'same'.length);
    })
    .join('\n')
    .trimEnd();
}

/** The parts of a text, each by itself. */
export function partsOfText(text: string): string[] {
  const tree = parseSheet(text);
  return tree.cells.filter(({ entry }) => entry.type === 'part').map((cell) => partText(tree, cell));
}

/** The same part under another name. */
export function renamedPart(text: string, name: string): string {
  const tree = parseSheet(text);
  const splices: Splice[] = renameCell(tree, tree.cells[0]!.name.name, name);
  return applySplices(text, splices);
}

function sourceOf({ tree }: Line) {
  return 'source' in tree ? tree.source : null;
}

function sourceAbove({ lines }: SheetTree, before: number): string | null {
  for (let at = before - 1; at >= 0; at--) {
    const text = sourceOf(lines[at]!)?.text.trim() ?? '';
    if (text !== '' && text !== 'same') return text;
  }
  return null;
}
