// The shelf: the sheets kept in this browser.
//
// Whoever lists or loads sheets first brings to the shelf what pages have left that went before an edit was kept.

import type { UseStore } from 'idb-keyval';
import { EMPTY_HISTORY } from './history.ts';
import { dropWords, findWords, leaveWords, openSmallStorage } from './last-words.ts';
import type { LastWords, SmallStorage } from './last-words.ts';
import { DAMAGED_SHEET, MISSING_SHEET, NEWER_SHEET, shelfFault } from './sentences.ts';
import type { StorageFault } from './sentences.ts';
import { FORMAT, formatOf, readRecord } from './sheet-record.ts';
import type { SheetContent, SheetHead, SheetRecord } from './sheet-record.ts';
import { readHeads, readSheet, removeSheet, writeSheet } from './sheet-store.ts';
import type { Saved } from './sheet-store.ts';
import { failureOf } from './store.ts';
import type { Tabs } from './tabs.ts';

interface ShelfSurroundings {
  readonly store: UseStore;
  /** Where a page that goes leaves its text; that of the browser unless given. */
  readonly smallStorage?: SmallStorage | null;
  /** Told of what is kept and removed here. */
  readonly tabs: Tabs;
  /** Milliseconds of the epoch. */
  readonly now: () => number;
  /** A name that no other sheet and no other page has. */
  readonly newId: () => string;
}
type Loaded = { readonly record: SheetRecord } | { readonly fault: StorageFault };
type Listed = { readonly sheets: readonly SheetHead[] } | { readonly fault: StorageFault };
type Removed = { readonly removed: true } | { readonly fault: StorageFault };

export interface Shelf {
  /** Names this page among all that write to the shelf. */
  readonly writer: string;
  /** A record that is not on the shelf until it is saved. */
  draft(content: Partial<SheetContent>, options?: { asideOf?: string }): SheetRecord;
  /** All sheets, the one changed last first. */
  list(): Promise<Listed>;
  load(id: string): Promise<Loaded>;
  /** Puts `content` in place of `base`, which this page loaded, kept or drafted. `changed` is when it was edited. */
  save(base: SheetRecord, content: SheetContent, changed: number): Promise<Saved>;
  /** Puts it by within the call, for a page that may not live to see a save through. */
  leave(base: SheetRecord, content: SheetContent, changed: number): void;
  /** Takes back what this page has left of a sheet. */
  takeBack(id: string): void;
  /** Puts it by for a sheet that this page closes without having kept it: whoever looks next brings it to the shelf. */
  abandon(base: SheetRecord, content: SheetContent, changed: number): void;
  /** Takes a sheet off the shelf; one of a newer version stays. */
  remove(id: string): Promise<Removed>;
  /** Puts a second sheet with the same text on the shelf, without the history. */
  duplicate(id: string): Promise<Loaded>;
}

/** The shelf in `store`. */
export function createShelf(surroundings: ShelfSurroundings): Shelf {
  const { store, tabs, now, newId, smallStorage = openSmallStorage() } = surroundings;
  const writer = newId();

  async function save(base: SheetRecord, content: SheetContent, changed: number, by = writer): Promise<Saved> {
    const result = await writeSheet(store, { base, content, changed, writer: by });
    if (result.status === 'kept') tabs.tell({ type: 'kept', id: base.id, changed, writer: by });
    return result;
  }

  const draft: Shelf['draft'] = ({ text = '', history = EMPTY_HISTORY, folded = [] }, { asideOf } = {}) => {
    const at = now();
    const content = { text, history, folded };
    const origin = { format: FORMAT, id: newId(), revision: 0, writer, asideOf: asideOf ?? null };
    return { ...origin, ...content, created: at, changed: at };
  };

  function leave(base: SheetRecord, { text, history, folded }: SheetContent, changed: number, by: string): void {
    leaveWords(smallStorage, { record: { ...base, text, history, folded, changed }, writer: by });
  }

  /** Brings to the shelf what other pages left. What cannot be brought there now stays where it is. */
  async function gather(): Promise<void> {
    for (const words of findWords(smallStorage)) {
      if (words.writer !== writer && (await isGathered(words))) dropWords(smallStorage, words.record.id, words.writer);
    }
  }

  async function isGathered({ record, writer: leaver }: LastWords): Promise<boolean> {
    const standing = readRecord(await readSheet(store, record.id));
    // The save that was under way when the page went may have come through after all.
    if (standing?.writer === leaver && (standing.changed > record.changed || standing.text === record.text))
      return true;
    const result = await save(record, record, record.changed, leaver);
    if (result.status === 'kept' || result.status === 'failed') return result.status === 'kept';
    if (result.status === 'changed' && result.theirs.text === record.text) return true;
    // Two pages that gather at once name it alike, and so set it aside once.
    const aside = { ...record, id: `${record.id}-${leaver}`, revision: 0, asideOf: record.id };
    return (await save(aside, aside, record.changed, leaver)).status !== 'failed';
  }

  const load: Shelf['load'] = async (id) => {
    try {
      await gather();
      return loadedFrom(await readSheet(store, id));
    } catch (thrown) {
      return { fault: shelfFault(failureOf(thrown), 'The sheet') };
    }
  };

  return {
    writer,
    draft,
    load,
    save: (base, content, changed) => save(base, content, changed),
    leave: (base, content, changed) => leave(base, content, changed, writer),
    // Under a name of its own, for this page passes over what it has left itself.
    abandon: (base, content, changed) => leave(base, content, changed, newId()),
    takeBack: (id) => dropWords(smallStorage, id, writer),
    async list() {
      try {
        await gather();
        return { sheets: await readHeads(store) };
      } catch (thrown) {
        return { fault: shelfFault(failureOf(thrown), 'The list') };
      }
    },
    async remove(id) {
      try {
        if (!(await removeSheet(store, id))) return { fault: NEWER_SHEET };
      } catch (thrown) {
        return { fault: shelfFault(failureOf(thrown), 'Room') };
      }
      dropWords(smallStorage, id, writer);
      tabs.tell({ type: 'removed', id, changed: now(), writer });
      return { removed: true };
    },
    async duplicate(id) {
      const original = await load(id);
      if ('fault' in original) return original;
      const { text, folded } = original.record;
      const copy = draft({ text, folded });
      const result = await save(copy, copy, copy.changed);
      if (result.status === 'kept') return { record: result.record };
      if (result.status !== 'failed') throw new Error(`a sheet named ${copy.id} stands on the shelf already`);
      return { fault: shelfFault(result.failure, 'The copy') };
    },
  };
}

/** A name of 128 random bits. */
export function randomId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

function loadedFrom(kept: unknown): Loaded {
  if (kept === undefined) return { fault: MISSING_SHEET };
  if (formatOf(kept) > FORMAT) return { fault: NEWER_SHEET };
  const record = readRecord(kept);
  return record ? { record } : { fault: DAMAGED_SHEET };
}
