// What the lines under the title say about the document itself.

import type { SheetTree } from '../language/index.ts';

/** Fields that the title block shows, with the words it shows them under. */
export const TITLE_LABELS = {
  project: 'Project',
  number: 'Number',
  revision: 'Revision',
  status: 'Status',
  date: 'Date',
  reason: 'What this revision changes',
  author: 'Made by',
  checker: 'Checked by',
} as const;
export type TitleField = keyof typeof TITLE_LABELS;

/** Stands for a field that is filled in by hand. */
const BY_HAND = /^[-–—]?$/;

/** The text of a field of the title; null where there is none or a dash stands for it. */
export function titleField(tree: SheetTree, label: string): string | null {
  const field = tree.title?.fields.find((each) => each.label[0]?.name === label);
  if (!field || field.body.type !== 'text') return null;
  const text = field.body.text.trim();
  return BY_HAND.test(text) ? null : text;
}

/** The `checked:` lines: what was checked, and who says so when. */
export function checkedLines(tree: SheetTree): readonly { readonly what: string; readonly by: string | null }[] {
  return (tree.title?.fields ?? []).flatMap(({ label, body, source }) => {
    if (label[0]?.name !== 'checked' || body.type !== 'text') return [];
    return [{ what: body.text.trim(), by: source?.text.trim() ?? null }];
  });
}

/** The paper the record is printed on; A4 unless the sheet says Letter. */
export function paperOf(tree: SheetTree): 'A4' | 'Letter' {
  return /^letter$/i.test(titleField(tree, 'paper') ?? '') ? 'Letter' : 'A4';
}
