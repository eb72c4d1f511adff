// The list of what fits at the caret: open or not, and which line is marked.

import { batch, createSignal } from 'solid-js';
import type { SheetDocument } from '../document/index.ts';
import { complete } from '../rows/index.ts';
import type { Completion } from '../rows/index.ts';
import type { Editor } from './editor.ts';

export interface Completing {
  /** null while the list is closed. */
  list(): Completion | null;
  /** Index of the marked line; -1 for none. */
  marked(): number;
  mark(index: number): void;
  /** Follows the text and the caret; `asked` opens the list however little is typed. */
  follow(caret: number, asked: boolean): void;
  move(step: 1 | -1): void;
  /** The text with the marked line taken in, and the caret behind it; null where none is marked. */
  taken(): { readonly text: string; readonly caret: number } | null;
  close(): void;
}

/** Creates the completion of an editor. */
export function createCompleting(document: SheetDocument, editor: Editor): Completing {
  const [list, setList] = createSignal<Completion | null>(null);
  const [marked, setMarked] = createSignal(-1);

  return {
    list,
    marked,
    mark: setMarked,
    follow(caret, asked) {
      const editing = editor.editing();
      const found = editing
        ? complete(document.sheet, editing.tree, editing.place, { text: editor.text(), caret, asked })
        : null;
      batch(() => {
        setList(found);
        setMarked(found?.marked ?? -1);
      });
    },
    move(step) {
      const present = list();
      if (!present) return;
      const count = present.items.length;
      setMarked((index) => (index < 0 ? (step === 1 ? 0 : count - 1) : (index + step + count) % count));
    },
    taken() {
      const present = list();
      const item = present?.items[marked()];
      if (!present || !item) return null;
      const text = editor.text();
      const kept = text.slice(0, present.from) + item.text;
      // A parenthesis that is there already is not written twice.
      const rest = text.slice(present.to);
      return {
        text: kept + (item.text.endsWith('(') && rest.startsWith('(') ? rest.slice(1) : rest),
        caret: kept.length,
      };
    },
    close: () => setList(null),
  };
}
