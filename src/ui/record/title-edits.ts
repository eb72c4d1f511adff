// The title and its fields as edits of the text: ordinary splices, undone like any other.

import { deleteLines, insertLines, setEntry } from '../../language/index.ts';
import type { FieldTree, SheetTree, Splice } from '../../language/index.ts';

/** Fields in the order they stand in under the title. */
const ORDER = ['project', 'number', 'author', 'checker', 'revision', 'reason', 'status', 'date', 'paper'] as const;

/** The text of a field as written, a dash included; empty where there is none. */
export function fieldText(tree: SheetTree, label: string): string {
  const field = fieldOf(tree, label);
  return field?.body.type === 'text' ? field.body.text.trim() : '';
}

/** Gives a field another text: a missing one gets a line under the title, an emptied one loses its line. A sheet without a title gets one. */
export function setField(tree: SheetTree, label: string, raw: string): Splice[] {
  const text = raw.replace(/\s+/g, ' ').trim();
  const present = fieldOf(tree, label);
  if (present) {
    const { index } = present.line;
    return text === '' ? deleteLines(tree, index, 1) : setEntry(tree, index, text);
  }
  if (text === '') return [];
  const line = `  ${label}: ${text}`;
  if (!tree.title) return insertLines(tree, 0, `# Sheet without a title\n${line}`);
  return insertLines(tree, placeFor(tree, label), line);
}

/** Gives the sheet another title, or a first one. */
export function setTitle(tree: SheetTree, raw: string): Splice[] {
  const text = raw.replace(/\s+/g, ' ').trim();
  if (tree.title) return setEntry(tree, tree.title.line.index, text);
  return text === '' ? [] : insertLines(tree, 0, `# ${text}`);
}

function fieldOf(tree: SheetTree, label: string): FieldTree | null {
  return tree.title?.fields.find((field) => field.label[0]?.name === label) ?? null;
}

/** Behind the last of the fields that come before it, so that they stand in their order however they were added. */
function placeFor(tree: SheetTree, label: string): number {
  const before: readonly string[] = ORDER.slice(0, ORDER.indexOf(label as (typeof ORDER)[number]));
  const above = tree.title!.fields.filter((field) => before.includes(field.label[0]?.name ?? ''));
  return Math.max(tree.title!.line.index, ...above.map((field) => field.line.index)) + 1;
}
