// Where the number of a line comes from: `same` is followed up to the line that says it.

import type { Line, Note, Source } from '../language/index.ts';

/** What a line says of its number's origin. */
interface Origin {
  /** The document, or `assumed`, `measured`; null where none is given. */
  readonly source: string | null;
  readonly note: string | null;
}

/** Source and note of a line; `lines` are those of its sheet. */
export function originOf(line: Line, lines: readonly Line[]): Origin {
  const { source, note } = tailOf(line);
  return { source: source === 'same' ? sourceAbove(line, lines) : source, note };
}

function sourceAbove(line: Line, lines: readonly Line[]): string | null {
  for (let at = line.index - 1; at >= 0; at--) {
    const { source } = tailOf(lines[at]!);
    if (source !== null && source !== 'same') return source;
  }
  return null;
}

function tailOf({ tree }: Line): Origin {
  const text = (part: Source | Note | null): string | null => {
    const words = part?.text.trim() ?? '';
    return words === '' ? null : words;
  };
  return {
    source: 'source' in tree ? text(tree.source) : null,
    note: 'note' in tree ? text(tree.note) : null,
  };
}
