// The sheet that is open in this tab, against what stands on the shelf.
//
// `base` is the version on the shelf that this tab knows. Where a save finds another tab's version in its place, the
// sheet is in conflict until the user decides: nothing of theirs is overwritten, and this tab's text goes to a
// sheet of its own, set aside, on into which all further saves go. Whichever text the user decides for, the other one
// stays in the undo history. Where only folding or history differ, there is nothing to decide.

import { splicesBetween } from './history.ts';
import type { History, HistoryStep } from './history.ts';
import type { Elsewhere } from './sentences.ts';
import type { SheetContent, SheetRecord } from './sheet-record.ts';
import { isSameVersion } from './sheet-store.ts';
import type { NotSaved, Saved } from './sheet-store.ts';
import type { Shelf } from './shelf.ts';
import type { StoreFailure } from './store.ts';

/** What another tab has done; `theirs` where it can be read. */
interface Conflict {
  readonly elsewhere: Elsewhere;
  readonly theirs: SheetRecord | null;
}

interface OpenSheet {
  base(): SheetRecord;
  conflict(): Conflict | null;
  /** This tab's text on a sheet of its own; null where it was not kept so. */
  aside(): SheetRecord | null;
  /** Keeps `content`, in conflict beside the sheet; null when that is done. A later call may overtake none before. */
  save(content: SheetContent, changed: number): Promise<StoreFailure | null>;
  /** Finds out what another tab has done; `mayTell` is asked once that is known, and false leaves it to the next save. */
  look(mayTell: () => boolean): Promise<void>;
  /** Goes over to their version: what to show, or null where there is none. `hasOwn`: `mine` is to stay in the history. */
  takeTheirs(mine: SheetContent, hasOwn: boolean): Promise<SheetContent | null>;
  /** Makes ready to save `mine` in place of theirs: what to save, or null where theirs must not be touched. */
  keepMine(mine: SheetContent): Promise<SheetContent | null>;
}

/** More often than this, another tab folding rows does not get in the way of a save. */
const ATTEMPTS = 5;

/** The open sheet `opened`, a record just loaded, saved or drafted. */
export function createOpenSheet(shelf: Shelf, opened: SheetRecord): OpenSheet {
  let base = opened;
  let conflict: Conflict | null = null;
  let aside: SheetRecord | null = null;

  async function saveBase(content: SheetContent, changed: number): Promise<Saved> {
    let result = await shelf.save(base, content, changed);
    for (let attempt = 1; attempt < ATTEMPTS && result.status === 'changed'; attempt++) {
      const { theirs } = result;
      if (theirs.text !== content.text && theirs.text !== base.text) break;
      base = theirs;
      result = await shelf.save(base, content, changed);
    }
    return result;
  }

  async function saveAside(content: SheetContent, changed: number): Promise<StoreFailure | null> {
    // Made before the first wait, so that a save sent behind this one goes to the same sheet.
    aside ??= shelf.draft(content, { asideOf: base.id });
    const result = await shelf.save(aside, content, changed);
    switch (result.status) {
      case 'kept':
        if (aside.id === result.record.id) aside = result.record;
        return null;
      case 'failed':
        return result.failure;
      default:
        // Another tab has had its hands on that one, too.
        aside = null;
        return saveAside(content, changed);
    }
  }

  /** Once the text stands on the sheet itself, or was let go, it is not needed beside it. */
  async function dropAside(): Promise<void> {
    const dropped = aside;
    aside = null;
    if (dropped && dropped.revision > 0) await shelf.remove(dropped.id);
  }

  async function findTheirs(): Promise<Conflict | null> {
    const loaded = await shelf.load(base.id);
    if ('record' in loaded) {
      return { elsewhere: { kind: 'changed', changed: loaded.record.changed }, theirs: loaded.record };
    }
    switch (loaded.fault.code) {
      case 'sheet-missing':
        return { elsewhere: { kind: 'deleted' }, theirs: null };
      case 'sheet-newer':
      case 'sheet-damaged':
        return { elsewhere: { kind: 'unreadable', changed: null }, theirs: null };
      default:
        return null;
    }
  }

  /** The other tab may have gone on since it was found out. Throws Error where there is no conflict. */
  async function latestConflict(): Promise<Conflict> {
    if (!conflict) throw new Error('there is no conflict to decide');
    conflict = (await findTheirs()) ?? conflict;
    return conflict;
  }

  function settle(standing: SheetRecord): void {
    base = standing;
    conflict = null;
  }

  return {
    base: () => base,
    conflict: () => conflict,
    aside: () => (aside && aside.revision > 0 ? aside : null),
    async save(content, changed) {
      if (!conflict) {
        const result = await saveBase(content, changed);
        if (result.status === 'failed') return result.failure;
        if (result.status === 'kept') {
          if (result.record.revision > base.revision) base = result.record;
          await dropAside();
          return null;
        }
        conflict ??= conflictOf(result);
      }
      return saveAside(content, changed);
    },
    async look(mayTell) {
      if (base.revision === 0) return;
      const found = await findTheirs();
      if (!found || !mayTell()) return;
      const { theirs } = found;
      if (theirs && !conflict && (isSameVersion(theirs, base) || theirs.text === base.text)) base = theirs;
      else conflict = found;
    },
    async takeTheirs(mine, hasOwn) {
      const { elsewhere, theirs } = await latestConflict();
      if (elsewhere.kind === 'deleted') {
        settle({ ...base, revision: 0 });
        await dropAside();
      }
      if (!theirs) return null;
      settle(theirs);
      return hasOwn ? { ...theirs, history: wayBack(mine.history, [stepBetween(theirs.text, mine.text)]) } : theirs;
    },
    async keepMine(mine) {
      const { elsewhere, theirs } = await latestConflict();
      if (elsewhere.kind === 'deleted') {
        settle({ ...base, revision: 0 });
        return mine;
      }
      if (!theirs) return null;
      settle(theirs);
      const steps = [stepBetween(theirs.text, mine.text), stepBetween(mine.text, theirs.text)];
      return { ...mine, history: wayBack(mine.history, steps) };
    },
  };
}

function conflictOf(result: Exclude<NotSaved, { status: 'failed' }>): Conflict {
  switch (result.status) {
    case 'changed':
      return { elsewhere: { kind: 'changed', changed: result.theirs.changed }, theirs: result.theirs };
    case 'deleted':
      return { elsewhere: { kind: 'deleted' }, theirs: null };
    case 'unreadable':
      return { elsewhere: { kind: 'unreadable', changed: result.changed }, theirs: null };
  }
}

function stepBetween(from: string, to: string): HistoryStep {
  return { splices: splicesBetween(from, to), label: 'text of another tab' };
}

function wayBack(history: History, steps: readonly HistoryStep[]): History {
  return { undo: [...history.undo, ...steps], redo: [] };
}
