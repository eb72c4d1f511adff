// The document of the page: the text, its history, and what is computed from it.
//
// The text is the only state; every change is a list of splices, and everything shown is computed from
// the text by the engine, which keeps what an edit does not reach. `version` counts evaluations: what is
// shown of the sheet is read inside a computation that reads `version` (or through `cell`, which does).
// A preview is an edit that has not been committed yet: while its line can be read the sheet follows it;
// while it cannot, the last values stay and `held` says so.

import { batch, createMemo, createSignal } from 'solid-js';
import { applySplices, parseSheet } from '../../language/index.ts';
import type { SheetTree, Splice } from '../../language/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { CellReading, Sheet } from '../../sheet/index.ts';
import { ANALYSES } from '../../spread/index.ts';
import { EMPTY_HISTORY, edit, redo, splicesBetween, undo } from '../../storage/index.ts';
import type { Edited, History } from '../../storage/index.ts';

export interface SheetDocument {
  /** The committed text. */
  text(): string;
  /** Counts evaluations; previews count, too. */
  version(): number;
  /** The engine. Read it inside a computation that reads `version`. */
  readonly sheet: Sheet;
  /** The tree of what is shown: that of the preview while there is one. */
  tree(): SheetTree;
  cells(): readonly CellReading[];
  cell(name: string): CellReading | null;
  /** Whether values shown are older than the text being typed. */
  held(): boolean;
  history(): History;
  canUndo(): boolean;
  canRedo(): boolean;
  /** What the next undo would take back. */
  undoLabel(): string | null;
  /** Commits splices of the committed text as one step; a `run` joins steps into one undo. */
  edit(splices: readonly Splice[], label: string, run?: string | null): void;
  /** Shows the sheet as it would be with these splices of the committed text; null takes the preview away. */
  preview(splices: readonly Splice[] | null): void;
  undo(): void;
  redo(): void;
  /** Another sheet altogether. */
  load(text: string, history?: History): void;
}

/** Creates the document around a first text. */
export function createSheetDocument(initial: string, initialHistory: History = EMPTY_HISTORY): SheetDocument {
  const sheet = createSheet(initial, ANALYSES);
  const [text, setText] = createSignal(initial);
  const [version, setVersion] = createSignal(1);
  const [held, setHeld] = createSignal(false);
  const [history, setHistory] = createSignal(initialHistory);

  function show(shown: string): void {
    if (sheet.tree.text !== shown) {
      sheet.update(shown);
      setVersion((n) => n + 1);
    }
  }

  /** The mark of the run that the last step belongs to. */
  let lastRun: string | null = null;

  function commit(edited: Edited, run: string | null = null): void {
    lastRun = run;
    batch(() => {
      setHeld(false);
      setText(edited.text);
      setHistory(edited.history);
      show(edited.text);
    });
  }
  const present = (): Edited => ({ text: text(), history: history() });

  const cells = createMemo(() => (version(), sheet.cells()));

  return {
    text,
    version,
    sheet,
    tree: () => (version(), sheet.tree),
    cells,
    cell: (name) => (version(), sheet.cell(name)),
    held,
    history,
    canUndo: () => history().undo.length > 0,
    canRedo: () => history().redo.length > 0,
    undoLabel: () => history().undo.at(-1)?.label ?? null,
    edit(splices, label, run = null) {
      const after = applySplices(text(), splices);
      if (after === text()) {
        setHeld(false);
        show(after);
        return;
      }
      // A further step of a run takes the place of the one before: one undo goes back to where the run began.
      const before = run !== null && run === lastRun ? undo(present()) : null;
      if (before)
        commit(
          edit({ ...before, history: { ...before.history, redo: [] } }, splicesBetween(before.text, after), label),
          run,
        );
      else commit(edit(present(), splices, label), run);
    },
    preview(splices) {
      const shown = splices === null ? text() : applySplices(text(), splices);
      const readable = splices === null || canBeRead(parseSheet(shown, sheet.tree), splices);
      setHeld(!readable);
      if (readable) show(shown);
    },
    undo() {
      const before = undo(present());
      if (before) commit(before);
    },
    redo() {
      const after = redo(present());
      if (after) commit(after);
    },
    load(newText, newHistory = EMPTY_HISTORY) {
      commit({ text: newText, history: newHistory });
    },
  };
}

/** Whether the lines touched by the splices (given against the text before) can be read. */
function canBeRead(tree: SheetTree, splices: readonly Splice[]): boolean {
  const first = Math.min(...splices.map((splice) => splice.start));
  const grown = splices.reduce((sum, splice) => sum + splice.text.length - (splice.end - splice.start), 0);
  const last = Math.max(...splices.map((splice) => splice.end)) + grown;
  return tree.lines.every((line) => {
    if (line.offset > last || line.offset + line.text.length < first) return true;
    if (line.tree.type === 'broken') return false;
    if (line.tree.type === 'cell') return line.tree.entry.type !== 'broken';
    if (line.tree.type === 'field') return line.tree.body.type !== 'broken';
    return true;
  });
}
