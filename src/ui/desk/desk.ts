// What all panes of the page share: the document, what is selected, which stage the figures speak of,
// the commands, and the one line of status.

import { createMemo, createSignal } from 'solid-js';
import type { SheetDocument } from '../document/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { slotsOf } from '../../spread/index.ts';
import type { Folds } from '../session/index.ts';
import type { Corner, SpreadFeed } from '../spread/index.ts';
import type { Command } from './command.ts';

/** The columns of the sheet, in order. */
export const COLUMNS = ['mark', 'name', 'entry', 'low', 'nominal', 'high', 'spread', 'source'] as const;
export type Column = (typeof COLUMNS)[number];

/** The one selected row and the focused cell in it. */
interface Selection {
  /** Key of the row, as the row model gives it. */
  readonly row: string;
  readonly column: Column;
  /** The cell the row belongs to (`A1` for its field or result rows), or null. */
  readonly cell: string | null;
  /** The offered value a result row shows (`I_D`), or null. */
  readonly value: string | null;
}

/** A sentence in the status line, with one thing that can be done about it. */
interface Status {
  readonly text: string;
  readonly action: { readonly title: string; readonly run: () => void } | null;
}

export interface Desk {
  readonly document: SheetDocument;
  /** The spread of the sheet as far as it is known. */
  readonly spread: SpreadFeed;
  /** The corner of its spread at which the page stands; null at the nominal values. */
  corner(): Corner | null;
  stand(corner: Corner | null): void;
  /** The readings that are shown: at the nominal values, or at the corner. */
  view(): SheetView;
  /** What is folded of the sheet. */
  readonly folds: Folds;
  selection(): Selection | null;
  select(selection: Selection | null): void;
  /** Selects a cell by name and asks the sheet to bring it into view and focus it. */
  jump(cell: string, value?: string | null): void;
  /** The same for a line that belongs to no cell; lines count from 0. */
  jumpToLine(line: number): void;
  /** Counts jumps: the sheet scrolls to the selection and focuses it whenever it changes. */
  jumped(): number;
  /** The stage that figures speak of, or null. */
  stage(): string | null;
  /** Whether the figures follow the selection. */
  following(): boolean;
  setFollowing(following: boolean): void;
  /** Whether the selected line belongs to no stage, so that the last one stays. */
  strayed(): boolean;
  status(): Status | null;
  say(text: string, action?: Status['action']): void;
  commands(): readonly Command[];
  addCommands(commands: readonly Command[]): void;
}

/** Creates the shared state around a document. */
export function createDesk(document: SheetDocument, spread: SpreadFeed, folds: Folds): Desk {
  const [selection, select] = createSignal<Selection | null>(null);
  const [jumped, setJumped] = createSignal(0);
  const [following, setFollowing] = createSignal(true);
  const [status, setStatus] = createSignal<Status | null>(null);
  const [commands, setCommands] = createSignal<readonly Command[]>([]);

  const [corner, stand] = createSignal<Corner | null>(null);
  const cornerView = createMemo<SheetView | null>(() => {
    document.version();
    const present = corner();
    if (present === null) return null;
    const model = document.sheet.spreadModel();
    const where = model.drawn.flatMap(({ name }, draw) => {
      const t = present.at.get(name);
      return t === undefined ? [] : [{ draw, t, value: NaN }];
    });
    return document.sheet.standing(slotsOf(model, where));
  });

  /** The stage of the selected row: the one it belongs to, else the one it reads, else the one that reads it. */
  const chosen = createMemo<string | null>(() => {
    const name = selection()?.cell;
    const cell = name ? document.cell(name) : null;
    if (!cell) return null;
    const isStage = (other: string): boolean => document.cell(other)?.kind === 'stage';
    if (cell.kind === 'stage') return cell.name;
    const reads = cell.uses.filter(isStage);
    if (reads.length === 1) return reads[0]!;
    if (reads.length > 1) return null;
    const read = cell.usedBy.filter(isStage);
    return read.length === 1 ? read[0]! : null;
  });
  const stage = createMemo<string | null>((last) => {
    const stages = document.cells().filter((cell) => cell.kind === 'stage');
    const next = following() ? chosen() : null;
    if (next) return next;
    if (last && stages.some((cell) => cell.name === last)) return last;
    return stages[0]?.name ?? null;
  }, null);

  return {
    document,
    spread,
    corner,
    stand,
    view: () => (document.version(), cornerView() ?? document.sheet),
    folds,
    selection,
    select,
    jump(cell, value = null) {
      select({ row: value ? `value:${cell}.${value}` : `cell:${cell}`, column: 'name', cell, value });
      setJumped((n) => n + 1);
    },
    jumpToLine(line) {
      select({ row: `line:${line}`, column: 'entry', cell: null, value: null });
      setJumped((n) => n + 1);
    },
    jumped,
    stage,
    following,
    setFollowing,
    strayed: () => following() && typeof selection()?.cell === 'string' && chosen() === null,
    status,
    say: (text, action = null) => setStatus({ text, action }),
    commands,
    addCommands: (more) =>
      setCommands((present) => [
        ...present.filter((command) => !more.some((other) => other.id === command.id)),
        ...more,
      ]),
  };
}
