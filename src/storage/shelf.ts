// The shelf: the sheets kept in this browser.
//
// Each call is one transaction. A save compares before it sets: it goes through only where the sheet is still as
// this page knows it, or where this page itself wrote last (so a page that is being closed need not wait for one
// save before it sends the next). What another tab or a newer version wrote is never overwritten.

import { promisifyRequest } from 'idb-keyval';
import type { UseStore } from 'idb-keyval';
import { EMPTY_HISTORY } from './history.ts';
import { DAMAGED_SHEET, MISSING_SHEET, NEWER_SHEET, shelfFault } from './sentences.ts';
import type { StorageFault } from './sentences.ts';
import { FORMAT, formatOf, headOf, readHead, readRecord } from './sheet-record.ts';
import type { SheetContent, SheetHead, SheetRecord } from './sheet-record.ts';
import { failureOf, transact } from './store.ts';
import type { StoreFailure } from './store.ts';
import type { Tabs } from './tabs.ts';

interface ShelfSurroundings {
  readonly store: UseStore;
  /** Told of what is kept and removed here. */
  readonly tabs: Tabs;
  /** Milliseconds of the epoch. */
  readonly now: () => number;
  /** A name that no other sheet and no other page has. */
  readonly newId: () => string;
}
/** A write that did not come about. */
export type NotSaved =
  /** Another tab wrote since: `theirs` is what stands now. */
  | { readonly status: 'changed'; readonly theirs: SheetRecord }
  | { readonly status: 'deleted' }
  /** What stands was written by a newer version, or is damaged, and stays; `changed` where it says when it was. */
  | { readonly status: 'unreadable'; readonly changed: number | null }
  | { readonly status: 'failed'; readonly failure: StoreFailure };
/** `record` is what stands on the shelf now, and what the next save goes out from. */
export type Saved = { readonly status: 'kept'; readonly record: SheetRecord } | NotSaved;
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
  /** Takes a sheet off the shelf; one of a newer version stays. */
  remove(id: string): Promise<Removed>;
  /** Puts a second sheet with the same text on the shelf, without the history. */
  duplicate(id: string): Promise<Loaded>;
}

/** The shelf in `store`. */
export function createShelf({ store, tabs, now, newId }: ShelfSurroundings): Shelf {
  const writer = newId();

  const draft: Shelf['draft'] = ({ text = '', history = EMPTY_HISTORY, folded = [] }, { asideOf } = {}) => {
    const at = now();
    const content = { text, history, folded };
    const origin = { format: FORMAT, id: newId(), revision: 0, writer, asideOf: asideOf ?? null };
    return { ...origin, ...content, created: at, changed: at };
  };

  const save: Shelf['save'] = async (base, content, changed) => {
    const result = await saved(store, base, content, changed, writer);
    if (result.status === 'kept') tabs.tell({ type: 'kept', id: base.id, changed, writer });
    return result;
  };

  const load: Shelf['load'] = async (id) => {
    try {
      const kept = await transact(store, 'readonly', (objects) => promisifyRequest(objects.get(sheetKey(id))));
      return loadedFrom(kept);
    } catch (thrown) {
      return { fault: shelfFault(failureOf(thrown), 'The sheet') };
    }
  };

  return {
    writer,
    draft,
    save,
    load,
    async list() {
      try {
        const kept = await transact(store, 'readonly', (objects) => promisifyRequest(objects.getAll(allHeads())));
        const heads = kept.map(readHead).filter((head) => head !== null);
        return { sheets: heads.toSorted((a, b) => b.changed - a.changed || (a.id < b.id ? -1 : 1)) };
      } catch (thrown) {
        return { fault: shelfFault(failureOf(thrown), 'The list') };
      }
    },
    async remove(id) {
      try {
        const removed = await transact(store, 'readwrite', (objects) => removeFrom(objects, id));
        if (!removed) return { fault: NEWER_SHEET };
      } catch (thrown) {
        return { fault: shelfFault(failureOf(thrown), 'Room') };
      }
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

/** A sheet that was deleted and made anew may count to the same revision again: the writer tells. */
export function isSameVersion(a: SheetRecord, b: SheetRecord): boolean {
  return a.revision === b.revision && a.writer === b.writer;
}

const sheetKey = (id: string) => ['sheet', id];
const headKey = (id: string) => ['head', id];
/** An array sorts behind every string. */
const allHeads = () => IDBKeyRange.bound(['head'], ['head', []]);

function loadedFrom(kept: unknown): Loaded {
  if (kept === undefined) return { fault: MISSING_SHEET };
  if (formatOf(kept) > FORMAT) return { fault: NEWER_SHEET };
  const record = readRecord(kept);
  return record ? { record } : { fault: DAMAGED_SHEET };
}

async function saved(
  store: UseStore,
  base: SheetRecord,
  { text, history, folded }: SheetContent,
  changed: number,
  writer: string,
): Promise<Saved> {
  try {
    return await transact(store, 'readwrite', async (objects): Promise<Saved> => {
      const done = finished(objects);
      const kept: unknown = await promisifyRequest(objects.get(sheetKey(base.id)));
      const standing = readRecord(kept);
      if (kept !== undefined && !standing) return { status: 'unreadable', changed: readHead(kept)?.changed || null };
      if (!standing && base.revision > 0) return { status: 'deleted' };
      if (standing && standing.writer !== writer && !isSameVersion(standing, base)) {
        return { status: 'changed', theirs: standing };
      }
      const { format, id, created, asideOf } = base;
      const revision = Math.max(base.revision, standing?.revision ?? 0) + 1;
      const record = { format, id, text, history, folded, revision, writer, created, changed, asideOf };
      objects.put(record, sheetKey(id));
      objects.put(headOf(record), headKey(id));
      await done;
      return { status: 'kept', record };
    });
  } catch (thrown) {
    return { status: 'failed', failure: failureOf(thrown) };
  }
}

/** Settles when all of the transaction is on the disk, or nothing is. */
function finished(objects: IDBObjectStore): Promise<void> {
  const done = promisifyRequest<void>(objects.transaction);
  // Where a request before it fails, nobody waits for this one.
  done.catch(() => undefined);
  return done;
}

async function removeFrom(objects: IDBObjectStore, id: string): Promise<boolean> {
  const done = finished(objects);
  const kept: unknown = await promisifyRequest(objects.get(sheetKey(id)));
  if (kept !== undefined && formatOf(kept) > FORMAT) return false;
  objects.delete(sheetKey(id));
  objects.delete(headKey(id));
  await done;
  return true;
}
