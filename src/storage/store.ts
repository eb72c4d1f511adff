// The store in the browser: opening it, and what its failures mean.
//
// One object store holds all. A sheet stands in it twice, written in one transaction: whole under ['sheet', id], and
// as a line of the list under ['head', id], so that the list is read without reading every text and history.

import { createStore } from 'idb-keyval';
import type { UseStore } from 'idb-keyval';

/** `refused`: nothing can be stored, or what was stored cannot be reached. `newer`: the store has another shape than this version knows. */
export type StoreFailure = 'full' | 'refused' | 'newer';

const DATABASE = 'squarelaw';
const OBJECTS = 'sheets';

/** Access to the store of this browser, opened at its first use; where there is none, every use fails as refused. */
export function openStore(): UseStore {
  if (typeof indexedDB === 'undefined' || indexedDB === null) {
    return () => Promise.reject(new DOMException('there is no IndexedDB', 'NotSupportedError'));
  }
  return createStore(DATABASE, OBJECTS);
}

/**
 * Runs one transaction. Where the browser has closed the connection on its own account (it was idle, the site's data
 * were cleared), the first use finds it closed and the second opens it anew.
 */
export async function transact<T>(
  store: UseStore,
  mode: IDBTransactionMode,
  run: (objects: IDBObjectStore) => Promise<T>,
): Promise<T> {
  try {
    return await store(mode, run);
  } catch (thrown) {
    if (nameOf(thrown) !== 'InvalidStateError') throw thrown;
    return store(mode, run);
  }
}

/** What the browser's failure means; throws on what is our own fault. */
export function failureOf(thrown: unknown): StoreFailure {
  const name = nameOf(thrown);
  if (name === 'QuotaExceededError') return 'full';
  if (name === 'NotFoundError') return 'newer';
  // An aborted transaction may come without a reason.
  const isBrowsers = thrown === null || (thrown instanceof DOMException && !OUR_FAULTS.has(name));
  if (!isBrowsers) throw thrown;
  return 'refused';
}

const OUR_FAULTS = new Set([
  'DataCloneError',
  'DataError',
  'ReadOnlyError',
  'TransactionInactiveError',
  'InvalidAccessError',
  'SyntaxError',
]);

function nameOf(thrown: unknown): string {
  return thrown instanceof Error || thrown instanceof DOMException ? thrown.name : '';
}
