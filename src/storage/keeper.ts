// Keeps the sheet that is open: every edit reaches the shelf within a second.
//
// Edits are numbered. The first one is written soon, further ones while typing at most every `writeEvery`. A write that
// fails is tried again at the next edit and every `retryEvery`; meanwhile the last kept version stands. A flush sends
// what is left without waiting for the write before it: the shelf takes them in order.

import { createOpenSheet } from './open-sheet.ts';
import { elsewhereText, silentFault, unkeptFault } from './sentences.ts';
import type { Elsewhere, OwnText } from './sentences.ts';
import type { SheetContent, SheetRecord } from './sheet-record.ts';
import type { Shelf } from './shelf.ts';
import type { StoreFailure } from './store.ts';
import type { Tabs } from './tabs.ts';

/** Milliseconds: from an edit to its write, between writes, between attempts, and until silence is said. */
export const KEEPER_TIMES = Object.freeze({ writeAfter: 40, writeEvery: 400, retryEvery: 5000, silentAfter: 5000 });

/** Runs something after some milliseconds; the answer calls it off. */
export type Schedule = (run: () => void, milliseconds: number) => () => void;

export type KeepState =
  /** `at` is when the text was last changed; null for a draft that nobody has edited, which is on no shelf yet. */
  | { readonly state: 'kept'; readonly at: number | null }
  | { readonly state: 'keeping' }
  | { readonly state: 'not kept'; readonly code: string; readonly reason: string }
  /** Another tab has changed or deleted the sheet. `theirs` where it can be read, `mine` is what stands here. */
  | {
      readonly state: 'elsewhere';
      readonly kind: Elsewhere['kind'];
      readonly own: OwnText;
      readonly reason: string;
      readonly theirs: SheetRecord | null;
      readonly mine: SheetContent;
    };

interface KeeperSurroundings {
  readonly shelf: Shelf;
  readonly tabs: Tabs;
  readonly schedule: Schedule;
  /** Milliseconds of the epoch. */
  readonly now: () => number;
  /** Told of every new state, but not of the first. */
  readonly onState: (state: KeepState) => void;
}

export interface Keeper {
  state(): KeepState;
  /** What is to be kept from now on; to be called behind every edit. */
  keep(content: SheetContent): void;
  /** Writes at once what is not kept yet, and waits for it. */
  flush(): Promise<KeepState>;
  /** Puts by what is not kept yet, within the call, and flushes: for a page that may vanish. */
  leave(): void;
  /** Looks whether another tab has written, for a page that slept. */
  look(): Promise<KeepState>;
  /**
   * Goes over to what the other tab wrote: answers what to show from now on, or null where there is nothing that
   * could be taken. Edits of one's own come back with one undo. A sheet that was deleted is let go.
   */
  takeTheirs(): Promise<SheetContent | null>;
  /** Puts what stands here in place of what the other tab did: answers it, with their text in its undo history. */
  keepMine(): Promise<SheetContent | null>;
  /** Flushes, then stops listening and trying; what could not be kept is put by. */
  close(): Promise<void>;
}

/** Keeps `opened`, a record just loaded, saved or drafted. */
export function createKeeper(opened: SheetRecord, surroundings: KeeperSurroundings): Keeper {
  const { shelf, tabs, schedule, now, onState } = surroundings;
  const sheet = createOpenSheet(shelf, opened);
  let mine: SheetContent = opened;
  let editedAt = opened.changed;
  // How many edits were made; up to which one they are in a write that was sent, and kept.
  let [made, sent, kept] = [0, 0, 0];
  let failure: StoreFailure | 'silent' | null = null;
  let startedAt = -Infinity;
  let writes = 0;
  let settled: Promise<unknown> = Promise.resolve();
  let timer: { readonly due: number; readonly cancel: () => void } | null = null;
  let closed = false;
  /** The sheet of which the text was put by. */
  let leftOf: string | null = null;
  let shown = stateNow();

  const stopListening = tabs.listen(({ id, writer }) => {
    if (id === opened.id && writer !== shelf.writer) void look();
  });

  function stateNow(): KeepState {
    const conflict = sheet.conflict();
    const isSafe = kept === made || sheet.aside() !== null;
    if (conflict && (isSafe || failure)) {
      const { elsewhere, theirs } = conflict;
      const own = ownText();
      const reason = elsewhereText(elsewhere, own, now());
      return { state: 'elsewhere', kind: elsewhere.kind, own, reason, theirs, mine };
    }
    if (kept === made) return { state: 'kept', at: versionKept() };
    if (!failure) return { state: 'keeping' };
    const times = { changed: editedAt, kept: versionKept(), now: now() };
    const { code, text } =
      failure === 'silent' ? silentFault(KEEPER_TIMES.silentAfter / 1000, times) : unkeptFault(failure, times);
    return { state: 'not kept', code, reason: text };
  }

  function ownText(): OwnText {
    if (kept < made && failure) return 'unkept';
    return sheet.aside() ? 'set aside' : 'unchanged';
  }

  function versionKept(): number | null {
    const { revision, changed } = sheet.base();
    return revision === 0 ? null : changed;
  }

  function show(): KeepState {
    const state = stateNow();
    if (!isSameState(state, shown)) {
      shown = state;
      onState(state);
    }
    return shown;
  }

  function plan(wait: number): void {
    const due = now() + wait;
    if (closed || (timer && timer.due <= due)) return;
    timer?.cancel();
    const cancel = schedule(() => {
      timer = null;
      if (kept < made) void write();
    }, wait);
    timer = { due, cancel };
  }

  function planNext(): void {
    plan(Math.max(KEEPER_TIMES.writeAfter, startedAt + KEEPER_TIMES.writeEvery - now()));
  }

  function write(): Promise<unknown> {
    timer?.cancel();
    timer = null;
    settled = Promise.all([settled, writeOnce()]);
    return settled;
  }

  async function writeOnce(): Promise<void> {
    const number = (sent = made);
    startedAt = now();
    writes++;
    const cancelSilence = schedule(() => {
      failure ??= 'silent';
      show();
    }, KEEPER_TIMES.silentAfter);
    try {
      failure = await sheet.save(mine, editedAt);
    } finally {
      cancelSilence();
      writes--;
    }
    if (!failure) kept = Math.max(kept, number);
    if (kept === made) takeBack();
    show();
    if (kept === made) return;
    if (failure) plan(KEEPER_TIMES.retryEvery);
    else if (writes === 0) planNext();
  }

  async function flush(): Promise<KeepState> {
    const isSent = sent === made && writes > 0;
    await (kept === made || isSent ? settled : write());
    return show();
  }

  function leave(): void {
    putBy();
    void flush();
  }

  function putBy(): void {
    if (kept === made) return;
    const { id } = target();
    if (leftOf !== id) takeBack();
    shelf.leave(target(), mine, editedAt);
    leftOf = id;
  }

  /** The sheet into which the next write goes, as far as known. */
  function target(): SheetRecord {
    return (sheet.conflict() && sheet.aside()) || sheet.base();
  }

  function takeBack(): void {
    if (leftOf !== null) shelf.takeBack(leftOf);
    leftOf = null;
  }

  async function look(): Promise<KeepState> {
    await sheet.look(() => kept === made);
    return show();
  }

  function change(content: SheetContent): void {
    mine = content;
    // A clock that is set back must not make a later edit look like an earlier one.
    editedAt = made === 0 ? now() : Math.max(now(), editedAt);
    made++;
  }

  return {
    state: () => shown,
    keep(content) {
      change(content);
      if (writes === 0) planNext();
      show();
    },
    flush,
    leave,
    look,
    async takeTheirs() {
      await flush();
      if (!sheet.conflict()) return null;
      const hasOwn = sheet.aside() !== null || kept < made;
      const content = await sheet.takeTheirs(mine, hasOwn);
      if (content && hasOwn) {
        change(content);
        await write();
      } else if (!sheet.conflict()) {
        // Theirs as it stands on the shelf, or the text that was let go: nothing here is to be kept.
        mine = content ?? mine;
        kept = made;
        takeBack();
      }
      show();
      return content;
    },
    async keepMine() {
      await flush();
      if (!sheet.conflict()) return null;
      const content = await sheet.keepMine(mine);
      if (content) {
        change(content);
        await write();
      }
      show();
      return content;
    },
    async close() {
      closed = true;
      stopListening();
      putBy();
      await flush();
      if (kept < made) {
        shelf.abandon(target(), mine, editedAt);
        takeBack();
      }
      timer?.cancel();
    },
  };
}

function isSameState(a: KeepState, b: KeepState): boolean {
  const keys = new Set([...Object.keys(a), ...Object.keys(b)]) as Set<keyof KeepState>;
  return [...keys].every((key) => a[key] === b[key]);
}
