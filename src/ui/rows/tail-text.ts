// Source and note as one text: `stock list 12 ; from rev B`. Brackets stand around a source only where it would
// be misread without them.

import type { Note, SheetTree, Source, Splice } from '../../language/index.ts';
import { applySplices, parseSheet, setNote, setSource } from '../../language/index.ts';

/** The text in which source and note are edited. */
export function tailText(source: Source | null, note: Note | null): string {
  const first = source === null ? '' : source.text.includes(';') ? `[${source.text}]` : source.text;
  return note === null ? first : `${first === '' ? '' : `${first} `}; ${note.text}`;
}

/** Source and note as written in that text; null for one that is not there. */
function readTailText(text: string): { source: string | null; note: string | null } {
  const bracketed = /^\s*\[([^\]]*)\]\s*/.exec(text);
  const rest = bracketed ? text.slice(bracketed[0].length) : text;
  const at = rest.indexOf(';');
  const first = (at < 0 ? rest : rest.slice(0, at)).trim();
  const note = at < 0 ? null : rest.slice(at + 1).trim();
  const source = bracketed ? bracketed[1]! : first === '' ? null : first;
  return { source, note: note === '' ? null : note };
}

/** The edit of a line that gives it this source and note. */
export function setTail(tree: SheetTree, lineIndex: number, text: string): Splice[] {
  const { source, note } = readTailText(text);
  const line = tree.lines[lineIndex]!;
  const takesSource = 'source' in line.tree || line.tree.type === 'broken';
  const first = takesSource ? setSource(tree, lineIndex, source) : [];
  const between = parseSheet(applySplices(tree.text, first), tree);
  const second = setNote(between, lineIndex, takesSource ? note : text.replace(/^\s*;\s*/, ''));
  const after = applySplices(between.text, second);
  // One splice of the line, whatever the two steps were.
  const { offset } = line;
  const grown = after.length - tree.text.length;
  const end = offset + line.text.length;
  return [{ start: offset, end, text: after.slice(offset, end + grown) }];
}
