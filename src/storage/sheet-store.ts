// The transactions on sheets: read one, list all, compare and set, remove.
//
// A save goes through only where the sheet still is as the writer knows it, or where that writer wrote last itself (so
// that it need not wait for one save before it sends the next). What another tab or a newer version wrote is never
// overwritten. Failures of the browser are thrown, to be read by `failureOf`.

import { promisifyRequest } from 'idb-keyval';
import type { UseStore } from 'idb-keyval';
import { FORMAT, formatOf, headOf, readHead, readRecord } from './sheet-record.ts';
import type { SheetContent, SheetHead, SheetRecord } from './sheet-record.ts';
import { failureOf, transact } from './store.ts';
import type { StoreFailure } from './store.ts';

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

interface Write {
  /** The version that the writer loaded, kept or drafted. */
  readonly base: SheetRecord;
  readonly content: SheetContent;
  /** When it was edited. */
  readonly changed: number;
  readonly writer: string;
}

/** A sheet that was deleted and made anew may count to the same revision again: the writer tells. */
export function isSameVersion(a: SheetRecord, b: SheetRecord): boolean {
  return a.revision === b.revision && a.writer === b.writer;
}

/** What stands of one sheet, not checked in any way; undefined where nothing does. */
export function readSheet(store: UseStore, id: string): Promise<unknown> {
  return transact(store, 'readonly', (objects) => promisifyRequest<unknown>(objects.get(sheetKey(id))));
}

/** The lines of all sheets, the one changed last first. */
export async function readHeads(store: UseStore): Promise<SheetHead[]> {
  const kept = await transact(store, 'readonly', (objects) => promisifyRequest<unknown[]>(objects.getAll(allHeads())));
  const heads = kept.map(readHead).filter((head) => head !== null);
  return heads.toSorted((a, b) => b.changed - a.changed || (a.id < b.id ? -1 : 1));
}

/** Puts a new version in place of the one it was made from; failures of the browser come as a status here. */
export async function writeSheet(store: UseStore, write: Write): Promise<Saved> {
  try {
    return await transact(store, 'readwrite', (objects) => compareAndSet(objects, write));
  } catch (thrown) {
    return { status: 'failed', failure: failureOf(thrown) };
  }
}

/** Removes a sheet; false where it is one of a newer version, which stays. */
export function removeSheet(store: UseStore, id: string): Promise<boolean> {
  return transact(store, 'readwrite', async (objects) => {
    const done = finished(objects);
    const kept: unknown = await promisifyRequest(objects.get(sheetKey(id)));
    if (kept !== undefined && formatOf(kept) > FORMAT) return false;
    objects.delete(sheetKey(id));
    objects.delete(headKey(id));
    await done;
    return true;
  });
}

async function compareAndSet(objects: IDBObjectStore, { base, content, changed, writer }: Write): Promise<Saved> {
  const done = finished(objects);
  const kept: unknown = await promisifyRequest(objects.get(sheetKey(base.id)));
  const standing = readRecord(kept);
  if (kept !== undefined && !standing) return { status: 'unreadable', changed: readHead(kept)?.changed || null };
  if (!standing && base.revision > 0) return { status: 'deleted' };
  if (standing && standing.writer !== writer && !isSameVersion(standing, base)) {
    return { status: 'changed', theirs: standing };
  }
  const { format, id, created, asideOf } = base;
  const { text, history, folded } = content;
  const revision = Math.max(base.revision, standing?.revision ?? 0) + 1;
  const record = { format, id, text, history, folded, revision, writer, created, changed, asideOf };
  objects.put(record, sheetKey(id));
  objects.put(headOf(record), headKey(id));
  await done;
  return { status: 'kept', record };
}

/** Settles when all of the transaction is on the disk, or nothing is. */
function finished(objects: IDBObjectStore): Promise<void> {
  const done = promisifyRequest<void>(objects.transaction);
  // Where a request before it fails, nobody waits for this one.
  done.catch(() => undefined);
  return done;
}

const sheetKey = (id: string) => ['sheet', id];
const headKey = (id: string) => ['head', id];
/** An array sorts behind every string. */
const allHeads = () => IDBKeyRange.bound(['head'], ['head', []]);
