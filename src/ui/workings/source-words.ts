// Where a line's number comes from, in words: `same` is followed up to the line that says it.

import type { CellTree, FieldTree, Line, Source } from '../../language/index.ts';

/** The source of a line and what it means; null where it has none. */
export function sourceWords(
  { source, line }: Pick<CellTree | FieldTree, 'source' | 'line'>,
  lines: readonly Line[],
): string | null {
  if (source === null) return null;
  const text = source.text.trim();
  if (text === 'assumed') return 'assumed, to be confirmed';
  if (text !== 'same') return text;
  for (let at = line.index - 1; at >= 0; at--) {
    const above = sourceOf(lines[at]!);
    if (above !== null && above.text.trim() !== 'same') return `${above.text.trim()}, as in line ${at + 1}`;
  }
  return 'same, but no line above has a source';
}

function sourceOf({ tree }: Line): Source | null {
  return 'source' in tree ? tree.source : null;
}
