// A line that is not in the text yet, as a row among the others.

import { emptyRow } from '../rows/index.ts';
import type { Row, SheetRows } from '../rows/index.ts';

/** The key of the row of a line that is not in the text yet. */
export const DRAFT = 'draft';

/** A place for a new line, shown behind (or before) the row of `beside`. */
export interface Draft {
  readonly beside: string;
  readonly side: 'above' | 'below';
  /** The line of the text before which it goes. */
  readonly line: number;
}

/** The row of such a line. */
export const DRAFT_ROW: Row = {
  ...emptyRow(DRAFT, 'ghost'),
  markText: 'new line',
  name: { text: '', isName: false, said: 'new line' },
  editable: ['name', 'entry'],
};

/** The rows shown: those of the text, the one being written, without the row of a new line's preview. */
export function shownKeys(model: SheetRows, draft: Draft | null, pending: number | null): string[] {
  const shown: string[] = [];
  for (const { key } of model.rows) {
    if (pending !== null && model.lineOf(key) === pending && model.row(key)!.type !== 'ghost') continue;
    const beside = draft !== null && draft.beside === key;
    if (beside && draft.side === 'above') shown.push(DRAFT);
    shown.push(key);
    if (beside && draft.side === 'below') shown.push(DRAFT);
  }
  return shown;
}
