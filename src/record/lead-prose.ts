// What the author says of the whole sheet: the prose between the title and whatever comes first below it.

import type { Line, SheetTree } from '../language/index.ts';

/** The lines of that prose. */
export function leadProse({ lines, title }: SheetTree): readonly Line[] {
  if (!title) return [];
  const behind = lines.slice(title.line.index + 1);
  const end = behind.findIndex(({ tree }) => tree.type === 'heading' || tree.type === 'cell');
  return (end < 0 ? behind : behind.slice(0, end)).filter(({ tree }) => tree.type === 'prose');
}
