// The state of the sheet grid: its rows, the focused cell, what is folded, what is being edited, and new lines that
// are not in the text yet. No DOM but through `focus`, which the view supplies.

import { batch, createEffect, createMemo, createSelector, createSignal, on, untrack } from 'solid-js';
import type { Column, Desk } from '../desk/index.ts';
import { sheetRows } from '../rows/index.ts';
import type { Row, RowSpread, SheetRows } from '../rows/index.ts';
import { columnBeside, nearestColumn, typedColumn } from './columns.ts';
import { createCompleting } from './completing.ts';
import type { Completing } from './completing.ts';
import { DRAFT, DRAFT_ROW, shownKeys } from './draft.ts';
import type { Draft } from './draft.ts';
import { createEditor } from './editor.ts';
import type { Editor } from './editor.ts';
import type { Folds } from '../session/index.ts';
import { heldCells } from './held.ts';
import { reveal } from './reveal.ts';
import { createWholeTexts } from './whole-texts.ts';
import type { WholeTexts } from './whole-texts.ts';

interface Dragged {
  readonly key: string;
  readonly from: number;
  readonly to: number;
}

export interface Grid {
  readonly desk: Desk;
  readonly editor: Editor;
  readonly folds: Folds;
  /** Which long texts are open. */
  readonly whole: WholeTexts;
  model(): SheetRows;
  /** Keys of the rows shown, in order. */
  keys(): readonly string[];
  row(key: string): Row | null;
  indexOf(key: string): number;
  /** Rows with the head. */
  count(): number;
  isSelected(key: string): boolean;
  /** Whether this is the one cell that Tab reaches. */
  isStop(key: string, column: Column): boolean;
  /** The row that the one cell is in that Tab reaches. */
  stop(): string | null;
  isInRange(key: string): boolean;
  /** Whether a cell keeps its last values because what is typed cannot be read. */
  isHeld(cell: string | null): boolean;
  /** Keys of the rows of the range; the selected row alone where there is none. */
  range(): readonly string[];
  selectAll(): void;
  clearRange(): void;
  /** Focuses a cell; `extend` keeps the other end of the range where it is. */
  focus(key: string, column: Column, extend?: boolean): void;
  /** Takes the focus that the browser gave to a cell. */
  focused(key: string, column: Column): void;
  move(rows: number, columns: number, extend?: boolean): void;
  moveTo(row: 'first' | 'last', column?: Column): void;
  edit(start?: { readonly text?: string; readonly caret?: number; readonly column?: Column }): boolean;
  commit(then: 'stay' | 'down' | 'right' | 'left' | 'leave'): void;
  cancel(): void;
  draft(): Draft | null;
  /** The row that the new line being typed would be. */
  pending(): Row | null;
  openDraft(draft: Draft): void;
  /** The line number at which a row's text stands, or null. */
  lineOf(key: string): number | null;
  toggle(key: string): boolean;
  /** Focuses the row of a line, or the one nearest. */
  focusLine(line: number, column: Column): void;
  readonly completing: Completing;
  /** Whether the menu of what can be inserted is open. */
  inserting(): boolean;
  setInserting(open: boolean): void;
  /** Set while rows are put among others: the focus that is lost by it comes back. */
  readonly moving: { rows: boolean };
  /** The text field of the cell that is edited. */
  field(): HTMLInputElement | null;
  setField(field: HTMLInputElement | null): void;
  /** Lets the list of suggestions follow the text and the caret. */
  followText(asked: boolean): void;
  /** Takes a line of the list, the marked one unless told; says whether there was one. */
  take(index?: number): boolean;
  /** The mark of a run of steps: the same as long as the same thing is done to the same cell. */
  runOf(what: string): string;
  /** The tick that is being dragged, in SI. */
  dragged(): Dragged | null;
  setDragged(dragged: Dragged | null): void;
  onFocus(listener: (key: string, column: Column, jump: boolean) => void): void;
}

/** Creates the grid of a desk; to be called inside a component. */
export function createGrid(desk: Desk): Grid {
  const { document } = desk;
  const { folds } = desk;
  const editor = createEditor(document);
  const completing = createCompleting(document, editor);
  const [field, setField] = createSignal<HTMLInputElement | null>(null);
  const [draft, setDraft] = createSignal<Draft | null>(null);
  const [inserting, setInserting] = createSignal(false);
  const [dragged, setDragged] = createSignal<Dragged | null>(null);
  const [anchor, setAnchor] = createSignal<string | null>(null);
  /** Where vertical moves come back to after a row that has fewer columns. */
  let wished: Column = 'entry';
  let listener: (key: string, column: Column, jump: boolean) => void = () => {};

  const rowSpread = createMemo<RowSpread | null>(() => {
    const judged = desk.spread.judged();
    return judged && { judged, refining: desk.spread.progress() !== null };
  });
  const model = createMemo<SheetRows>((previous) => {
    return sheetRows(desk.view(), folds.isFolded, previous ?? null, rowSpread());
  });
  const keys = createMemo<readonly string[]>(() => shownKeys(model(), draft(), pendingLine()), [], {
    equals: (a, b) => a.length === b.length && a.every((key, i) => key === b[i]),
  });
  const places = createMemo(() => new Map(keys().map((key, index) => [key, index])));
  const selectedKey = createMemo(() => desk.selection()?.row ?? null);
  const stopKey = createMemo(() => {
    const key = selectedKey();
    return key !== null && places().has(key) ? key : (keys()[0] ?? null);
  });
  const isSelected = createSelector(selectedKey);
  const isStopRow = createSelector(stopKey);
  const held = createMemo(() => heldCells(document, editor.editing()));
  const rangeSet = createMemo<ReadonlySet<string>>(() => {
    const from = anchor();
    const to = selectedKey();
    if (from === null || to === null) return new Set();
    const [a, b] = [places().get(from), places().get(to)];
    if (a === undefined || b === undefined) return new Set();
    return new Set(keys().slice(Math.min(a, b), Math.max(a, b) + 1));
  });

  /** The line that a new line would be while it is previewed: its own row is not shown beside the one being typed. */
  function pendingLine(): number | null {
    const place = editor.editing()?.place;
    if (!place?.isNew) return null;
    return document.tree().text === document.text() ? null : place.line;
  }

  const row = (key: string): Row | null => (key === DRAFT ? (draft() ? DRAFT_ROW : null) : model().row(key));

  function lineOf(key: string): number | null {
    return key === DRAFT ? (draft()?.line ?? null) : model().lineOf(key);
  }

  function select(key: string, column: Column): void {
    const found = row(key);
    const present = desk.selection();
    if (present?.row === key && present.column === column) return;
    desk.select({ row: key, column, cell: found?.cell ?? null, value: found?.value ?? null });
  }

  function focus(key: string, column: Column, extend = false): void {
    const found = row(key);
    if (!found) return;
    const target = nearestColumn(found, column);
    batch(() => {
      if (!extend) setAnchor(null);
      else if (anchor() === null) setAnchor(selectedKey());
      select(key, target);
    });
    listener(key, target, false);
  }

  function focusIndex(index: number, column: Column, extend = false): void {
    const shown = keys();
    const key = shown[Math.max(0, Math.min(shown.length - 1, index))];
    if (key !== undefined) focus(key, column, extend);
  }

  function indexOf(key: string): number {
    return places().get(key) ?? -1;
  }

  function focusLine(line: number, column: Column): void {
    for (let at = line; at >= 0; at--) {
      const found = model().ofLine(at);
      if (found && places().has(found.key)) return focus(found.key, column);
    }
    focusIndex(0, column);
  }

  function edit(start: { readonly text?: string; readonly caret?: number; readonly column?: Column } = {}): boolean {
    const selection = desk.selection();
    const found = selection && row(selection.row);
    if (!selection || !found) return false;
    const column = typedColumn(found, start.column ?? selection.column);
    const line = lineOf(found.key);
    if (column === null || line === null) return false;
    const place = { row: found, line, column, isNew: found.type === 'ghost' };
    batch(() => {
      setAnchor(null);
      select(found.key, nearestColumn(found, column));
      editor.begin(place, start);
    });
    return true;
  }

  function commit(then: 'stay' | 'down' | 'right' | 'left' | 'leave'): void {
    const editing = editor.editing();
    if (!editing) return;
    const { row: edited, column } = editing.place;
    const index = indexOf(edited.key);
    const line = editor.commit();
    const isDraft = edited.key === DRAFT;
    if (isDraft) setDraft(null);
    if (then === 'leave') {
      if (isDraft && line !== null) select(model().ofLine(line)?.key ?? '', 'entry');
      return;
    }
    // An edit may have given the row another name, and with it another key.
    const key = isDraft || !model().row(edited.key) ? (line !== null && model().ofLine(line)?.key) || null : edited.key;
    if (edited.type === 'ghost' && !isDraft) return focus(placeAfter(line) ?? edited.key, 'name');
    if (key === null) return focusIndex(index, column);
    if (then === 'stay') return focus(key, column);
    if (then === 'down') return focusIndex(indexOf(key) + 1, isDraft ? wished : column);
    focusBeside(key, column, then);
  }

  /** The place for a new line behind a line: behind a heading that of its own section. */
  function placeAfter(line: number | null): string | null {
    const from = line === null ? null : model().ofLine(line);
    if (!from) return null;
    const shown = keys();
    for (let index = indexOf(from.key); index >= 0 && index < shown.length; index++) {
      if (row(shown[index]!)?.type === 'ghost') return shown[index]!;
    }
    return null;
  }

  /** The next editable cell to the right or left, going on in the next row. */
  function focusBeside(key: string, column: Column, side: 'right' | 'left'): void {
    const step = side === 'right' ? 1 : -1;
    const shown = keys();
    let columns = row(key)?.editable ?? [];
    let at = columns.indexOf(column) + step;
    let index = indexOf(key);
    while (at < 0 || at >= columns.length) {
      index += step;
      const next = shown[index];
      if (next === undefined) return focus(key, column);
      columns = row(next)?.editable ?? [];
      at = step === 1 ? 0 : columns.length - 1;
    }
    focus(shown[index]!, columns[at]!);
  }

  createEffect(
    on(
      () => desk.jumped(),
      () => {
        const selection = untrack(() => desk.selection());
        if (!selection) return;
        reveal(selection.row, document.tree(), model(), folds);
        const found = row(selection.row);
        if (found) listener(found.key, nearestColumn(found, selection.column), true);
      },
      { defer: true },
    ),
  );

  function take(index?: number): boolean {
    if (index !== undefined) completing.mark(index);
    const taken = completing.taken();
    if (!taken) return false;
    editor.setText(taken.text);
    completing.close();
    field()?.setSelectionRange(taken.caret, taken.caret);
    return true;
  }

  let run = { what: '', selection: desk.selection(), count: 0, text: '' };
  /** A run ends when something else is selected or done. */
  function runOf(what: string): string {
    const selection = desk.selection();
    const goes = run.what === what && run.selection === selection && run.text === document.undoLabel();
    run = {
      what,
      selection,
      count: goes ? run.count : run.count + 1,
      text: `step ${row(selection?.row ?? '')?.name?.text}`,
    };
    return `${what} ${run.count}`;
  }

  // A row that is gone (deleted, undone, folded) leaves the focus to its neighbour.
  let lastIndex = 0;
  createEffect(() => {
    const key = selectedKey();
    const index = key === null ? -1 : (places().get(key) ?? -1);
    if (index >= 0) lastIndex = index;
    else if (key !== null && key !== DRAFT) {
      untrack(() => {
        const shown = keys();
        const next = shown[Math.min(lastIndex, shown.length - 1)];
        const column = desk.selection()?.column ?? 'entry';
        const found = next === undefined ? null : row(next);
        if (found) select(found.key, nearestColumn(found, column));
      });
    }
  });

  return {
    desk,
    editor,
    folds,
    whole: createWholeTexts(),
    model,
    keys,
    row,
    indexOf,
    count: () => keys().length + 1,
    isSelected,
    isStop(key, column) {
      if (!isStopRow(key)) return false;
      const selection = desk.selection();
      const found = row(key);
      return found !== null && nearestColumn(found, selection?.row === key ? selection.column : 'name') === column;
    },
    stop: stopKey,
    isHeld: (cell) => cell !== null && held().has(cell),
    isInRange: (key) => rangeSet().has(key),
    range() {
      const inside = rangeSet();
      if (inside.size > 0) return keys().filter((key) => inside.has(key));
      const key = selectedKey();
      return key === null ? [] : [key];
    },
    selectAll() {
      const shown = keys();
      const first = shown[0];
      const last = shown[shown.length - 1];
      if (first === undefined || last === undefined) return;
      focus(last, wished);
      setAnchor(first);
    },
    clearRange: () => setAnchor(null),
    focus(key, column, extend) {
      wished = column;
      focus(key, column, extend);
    },
    focused(key, column) {
      const selection = desk.selection();
      // The focus that a move brought along: what the move wished for stays.
      if (selection?.row === key && selection.column === column) return;
      if (selection?.row !== key) setAnchor(null);
      wished = column;
      select(key, column);
    },
    move(rows, columns, extend = false) {
      const selection = desk.selection();
      const index = selection ? indexOf(selection.row) : 0;
      const key = keys()[Math.max(0, index)];
      const found = key === undefined ? null : row(key);
      if (!found || key === undefined) return;
      if (columns !== 0) {
        wished = columnBeside(found, selection?.column ?? 'name', columns);
        return focus(key, wished, extend);
      }
      focusIndex(Math.max(0, index) + rows, wished, extend);
    },
    moveTo(end, column) {
      if (column) wished = column;
      focusIndex(end === 'first' ? 0 : keys().length - 1, wished);
    },
    edit,
    commit,
    cancel() {
      const editing = editor.editing();
      if (!editing) return;
      const { row: edited, column } = editing.place;
      editor.cancel();
      const beside = draft()?.beside;
      setDraft(null);
      if (edited.key !== DRAFT) focus(edited.key, column);
      else if (beside !== undefined) focus(beside, wished);
    },
    draft,
    pending() {
      const line = pendingLine();
      return line === null ? null : model().ofLine(line);
    },
    openDraft(wanted) {
      batch(() => {
        setDraft(wanted);
        setAnchor(null);
        desk.select({ row: DRAFT, column: 'name', cell: null, value: null });
      });
      edit();
    },
    lineOf,
    toggle(key) {
      const fold = row(key)?.fold;
      if (!fold) return false;
      folds.set([fold.key], fold.open);
      return true;
    },
    focusLine,
    completing,
    inserting,
    setInserting,
    moving: { rows: false },
    field,
    setField,
    followText: (asked) => completing.follow(field()?.selectionStart ?? editor.text().length, asked),
    take,
    runOf,
    dragged,
    setDragged,
    onFocus(heard) {
      listener = heard;
    },
  };
}
