// Surroundings for tests of storage: a clock that is turned by hand, a store that fails on demand, tabs that hear
// each other.

import { IDBFactory } from 'fake-indexeddb';
import 'fake-indexeddb/auto';
import type { UseStore } from 'idb-keyval';
import { createShelf, openStore } from '../../src/storage/index.ts';
import type { Schedule, Shelf, TabNews, Tabs } from '../../src/storage/index.ts';
import type { SmallStorage } from '../../src/storage/last-words.ts';

/** Any time zone reads this as 14:00. */
export const TWO_O_CLOCK = new Date(2031, 4, 6, 14, 0, 0).getTime();
export const MINUTE = 60_000;

export interface HandClock {
  now: () => number;
  schedule: Schedule;
  /** Turns on to `at`, running what is due on the way; between two of them, all that waits for the store settles. */
  turnTo(at: number): Promise<void>;
  turn(milliseconds: number): Promise<void>;
  pending(): number;
}

export function createHandClock(start = TWO_O_CLOCK): HandClock {
  let time = start;
  let due: { at: number; run: () => void }[] = [];
  const turnTo = async (at: number) => {
    for (;;) {
      await settle();
      const next = due.filter((entry) => entry.at <= at).toSorted((a, b) => a.at - b.at)[0];
      if (!next) break;
      due = due.filter((entry) => entry !== next);
      time = Math.max(time, next.at);
      next.run();
    }
    time = at;
  };
  return {
    now: () => time,
    schedule: (run, milliseconds) => {
      const entry = { at: time + milliseconds, run };
      due.push(entry);
      return () => void (due = due.filter((other) => other !== entry));
    },
    turnTo,
    turn: (milliseconds) => turnTo(time + milliseconds),
    pending: () => due.length,
  };
}

/** Until the store has nothing left to do: it answers by immediates, a few for each request. */
export async function settle(): Promise<void> {
  for (let turn = 0; turn < 40; turn++) await new Promise((done) => setImmediate(done));
}

/** A disk for this test alone. */
export function freshDisk(): void {
  globalThis.indexedDB = new IDBFactory();
}

export interface TouchyStore {
  readonly store: UseStore;
  /** What becomes of transactions that write, from now on. */
  fault: 'none' | 'full' | 'refused' | 'silent';
  /** Writing transactions that were begun. */
  writes: number;
}

/** The store of the present disk, failing as it is told. */
export function createTouchyStore(): TouchyStore {
  const inner = openStore();
  const touchy: TouchyStore = {
    fault: 'none',
    writes: 0,
    store: (mode, run) => {
      if (mode === 'readonly') return inner(mode, run);
      touchy.writes++;
      switch (touchy.fault) {
        case 'none':
          return inner(mode, run);
        case 'full':
          return inner(mode, (objects) =>
            Promise.resolve(run(undoneBehindPuts(objects))).catch(() =>
              Promise.reject(new DOMException('', 'QuotaExceededError')),
            ),
          );
        case 'refused':
          return Promise.reject(new DOMException('', 'SecurityError'));
        case 'silent':
          return new Promise(() => undefined);
      }
    },
  };
  return touchy;
}

/** A full disk is noticed once all is written: then the whole transaction is undone. */
function undoneBehindPuts(objects: IDBObjectStore): IDBObjectStore {
  return new Proxy(objects, {
    get(target, name) {
      if (name === 'put') {
        return (value: unknown, key: IDBValidKey[]) => {
          target.put(value, key);
          if (key[0] === 'head' || key[0] === 'part') target.transaction.abort();
        };
      }
      const member = Reflect.get(target, name, target) as unknown;
      return typeof member === 'function' ? member.bind(target) : member;
    },
  });
}

/** Several tabs of one browser: each hears what the others tell. */
export function createTabSet(): () => Tabs {
  const all = new Set<(from: object, news: TabNews) => void>();
  return () => {
    const me = {};
    const mine = new Set<(news: TabNews) => void>();
    all.add((from, news) => {
      if (from !== me) for (const hear of mine) hear(news);
    });
    return {
      tell: (news) => all.forEach((hear) => hear(me, news)),
      listen(hear) {
        mine.add(hear);
        return () => void mine.delete(hear);
      },
      close: () => mine.clear(),
    };
  };
}

export const DEAF_TABS: Tabs = { tell: () => undefined, listen: () => () => undefined, close: () => undefined };

let ids = 0;
interface TestSurroundings {
  now: () => number;
  store?: UseStore;
  tabs?: Tabs;
  smallStorage?: SmallStorage;
}
/** A shelf of the present disk, as one page of the browser has it. */
export function createTestShelf(surroundings: TestSurroundings): Shelf {
  const { now, store = openStore(), tabs = DEAF_TABS, smallStorage = null } = surroundings;
  return createShelf({ store, tabs, now, smallStorage, newId: () => `id-${++ids}` });
}

/** A small storage with room for so many characters. */
export function createSmallStorage(room = Infinity): SmallStorage & { entries: Map<string, string> } {
  const entries = new Map<string, string>();
  return {
    entries,
    get length() {
      return entries.size;
    },
    key: (index) => [...entries.keys()][index] ?? null,
    getItem: (key) => entries.get(key) ?? null,
    removeItem: (key) => void entries.delete(key),
    setItem(key, value) {
      const others = [...entries].filter(([other]) => other !== key);
      const used = others.reduce((sum, [name, text]) => sum + name.length + text.length, 0);
      if (used + key.length + value.length > room) throw new DOMException('', 'QuotaExceededError');
      entries.set(key, value);
    },
  };
}
