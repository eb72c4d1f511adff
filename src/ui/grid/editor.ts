// Editing one cell of the grid: the text being typed, its preview in the sheet, and how it ends.
//
// All splices are made against the tree as it stood when the edit began, which is the committed text; the sheet
// shows the preview meanwhile. What cannot be read is committed all the same: text is never refused.

import { batch, createSignal } from 'solid-js';
import { applySplices, parseSheet } from '../../language/index.ts';
import type { Line, Message, SheetTree, Splice } from '../../language/index.ts';
import type { SheetDocument } from '../document/index.ts';
import { editLabel, editSplices, editText, rowFault } from '../rows/index.ts';
import type { EditPlace, RowFault } from '../rows/index.ts';

/** Messages about what is being typed wait for this much rest, in milliseconds. */
const REST = 600;
const HEADING = /^\s*#/;
/** The narrowest field, in characters. */
const LEAST_WIDTH = 8;

export interface Editing {
  readonly place: EditPlace;
  readonly tree: SheetTree;
  /** The text before the edit. */
  readonly was: string;
  /** Where the caret goes first; null for the end. */
  readonly caret: number | null;
}

export interface Editor {
  editing(): Editing | null;
  text(): string;
  setText(text: string): void;
  /** Characters that the field makes room for. */
  width(): number;
  /** Whether typing has paused long enough for messages to be shown. */
  rested(): boolean;
  /** Why what is being typed cannot be read, or null. */
  unread(): RowFault | null;
  begin(place: EditPlace, start: { readonly text?: string; readonly caret?: number }): void;
  /** Ends the edit with its text; gives the line that was edited. */
  commit(): number | null;
  cancel(): void;
}

/** Creates the editor of a grid. */
export function createEditor(document: SheetDocument): Editor {
  const [editing, setEditing] = createSignal<Editing | null>(null);
  const [text, setText] = createSignal('');
  const [rested, setRested] = createSignal(true);
  let timer: ReturnType<typeof setTimeout> | undefined;

  function splices(present: Editing, written: string): Splice[] {
    return written === present.was ? [] : editSplices(present.tree, present.place, written);
  }

  function preview(present: Editing, written: string): void {
    // A name is taken over everywhere at once, or not at all.
    if (present.place.column === 'name' && !present.place.isNew) return;
    // A heading computes nothing, and would move the place for a new line while it is being written there.
    const wanted = present.place.isNew && HEADING.test(written) ? [] : splices(present, written);
    document.preview(wanted.length === 0 ? null : wanted);
  }

  function wait(): void {
    clearTimeout(timer);
    setRested(false);
    timer = setTimeout(() => setRested(true), REST);
  }

  function finish(): void {
    clearTimeout(timer);
    setEditing(null);
    setRested(true);
  }

  return {
    editing,
    text,
    setText(written) {
      const present = editing();
      if (!present) return;
      batch(() => {
        setText(written);
        wait();
        preview(present, written);
      });
    },
    width: () => Math.max(LEAST_WIDTH, text().length + 2),
    rested,
    unread() {
      const present = editing();
      if (!present || !document.held()) return null;
      const { tree, place } = present;
      const after = parseSheet(applySplices(tree.text, splices(present, text())), tree);
      const line = after.lines[place.line];
      const message = line && messageOf(line);
      return line && message ? rowFault(message, line) : null;
    },
    begin(place, { text: first, caret }) {
      const tree = document.tree();
      const was = editText(tree, place);
      const present: Editing = { place, tree, was, caret: caret ?? null };
      batch(() => {
        setEditing(present);
        setText(first ?? was);
        setRested(true);
        if (first !== undefined) {
          wait();
          preview(present, first);
        }
      });
    },
    commit() {
      const present = editing();
      if (!present) return null;
      const written = text();
      const wanted = splices(present, written);
      batch(() => {
        finish();
        if (wanted.length === 0) document.preview(null);
        else document.edit(wanted, editLabel(present.place, written));
      });
      return present.place.isNew && wanted.length === 0 ? null : present.place.line;
    },
    cancel() {
      batch(() => {
        finish();
        document.preview(null);
      });
    },
  };
}

function messageOf({ tree }: Line): Message | null {
  if (tree.type === 'broken') return tree.message;
  if (tree.type === 'cell') return tree.entry.type === 'broken' ? tree.entry.message : null;
  return tree.type === 'field' && tree.body.type === 'broken' ? tree.body.message : null;
}
