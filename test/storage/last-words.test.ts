// A page that goes before its last edit is kept: the next page finds the edit all the same.

import { beforeEach, expect, test, vi } from 'vitest';
import { createKeeper, edit, EMPTY_HISTORY, splicesBetween, undo } from '../../src/storage/index.ts';
import type { Edited, Keeper, SheetContent, SheetRecord, Shelf } from '../../src/storage/index.ts';
import { findWords, openSmallStorage } from '../../src/storage/last-words.ts';
import { FORMAT } from '../../src/storage/sheet-record.ts';
import {
  createHandClock,
  createSmallStorage,
  createTestShelf,
  createTouchyStore,
  DEAF_TABS,
  freshDisk,
  MINUTE,
  settle,
} from './memory-surroundings.ts';
import type { HandClock, TouchyStore } from './memory-surroundings.ts';

let clock: HandClock;
let smallStorage: ReturnType<typeof createSmallStorage>;
beforeEach(() => {
  freshDisk();
  clock = createHandClock();
  smallStorage = createSmallStorage();
});

const EMPTY: Edited = { text: '', history: EMPTY_HISTORY };
const typed = (from: Edited, text: string): SheetContent => ({
  ...edit(from, splicesBetween(from.text, text), 'typing'),
  folded: ['Q1'],
});

interface Page {
  shelf: Shelf;
  touchy: TouchyStore;
  keeper: Keeper;
  record: SheetRecord;
  type(text: string): void;
}

async function openPage(id?: string): Promise<Page> {
  const touchy = createTouchyStore();
  const shelf = createTestShelf({ ...clock, store: touchy.store, smallStorage });
  const record = id === undefined ? shelf.draft({}) : await load(shelf, id);
  const keeper = createKeeper(record, { ...clock, shelf, tabs: DEAF_TABS, onState: () => undefined });
  let content: SheetContent = record;
  const type = (text: string) => keeper.keep((content = typed(content, text)));
  return { shelf, touchy, keeper, record, type };
}

async function load(shelf: Shelf, id: string): Promise<SheetRecord> {
  const found = await shelf.load(id);
  if ('fault' in found) throw new Error(found.fault.text);
  return found.record;
}

/** The page goes, and of what it has sent nothing comes through any more. */
function vanish({ keeper, touchy }: Page): void {
  touchy.fault = 'silent';
  keeper.leave();
}

async function sheets(): Promise<Record<string, string>> {
  const shelf = createTestShelf({ ...clock, smallStorage });
  const listed = await shelf.list();
  if ('fault' in listed) throw new Error(listed.fault.text);
  const found: Record<string, string> = {};
  for (const { id, asideOf } of listed.sheets)
    found[asideOf === null ? 'sheet' : 'aside'] = (await load(shelf, id)).text;
  return found;
}

async function startSheet(text: string): Promise<string> {
  const page = await openPage();
  page.type(text);
  await page.keeper.close();
  return page.record.id;
}

test('the last edit of a page that went is on the shelf for the next one, with its history', async () => {
  const id = await startSheet('one');
  const page = await openPage(id);
  page.type('two');
  vanish(page);
  const record = await load(createTestShelf({ ...clock, smallStorage }), id);
  expect(record).toMatchObject({ id, text: 'two', folded: ['Q1'], changed: clock.now(), revision: 2 });
  expect(undo(record)!.text).toBe('one');
  expect(smallStorage.entries.size).toBe(0);
});

test('so is a sheet that was on no shelf before', async () => {
  const page = await openPage();
  page.type('one');
  vanish(page);
  expect(await sheets()).toEqual({ sheet: 'one' });
  expect(await sheets()).toEqual({ sheet: 'one' });
});

test('a page that has kept everything leaves nothing, and one that lives on takes back what it left', async () => {
  const page = await openPage();
  page.keeper.leave();
  expect(smallStorage.entries.size).toBe(0);
  page.type('one');
  page.keeper.leave();
  expect(smallStorage.entries.size).toBe(1);
  await settle();
  expect(smallStorage.entries.size).toBe(0);
  expect(page.keeper.state()).toHaveProperty('state', 'kept');
});

test('a page does not gather what it left itself, for it still has it', async () => {
  const id = await startSheet('one');
  const page = await openPage(id);
  page.type('two');
  vanish(page);
  expect((await load(page.shelf, id)).text).toBe('one');
  expect(smallStorage.entries.size).toBe(1);
});

test('what was left is not put over a later version of the same page', async () => {
  const id = await startSheet('one');
  const page = await openPage(id);
  page.type('two');
  // The page stays after all, so the write it sent has to come to an end, as it does in a browser.
  page.touchy.fault = 'refused';
  page.keeper.leave();
  const left = new Map(smallStorage.entries);
  page.touchy.fault = 'none';
  await clock.turn(1000);
  page.type('three');
  await page.keeper.flush();
  expect(smallStorage.entries.size).toBe(0);
  for (const [key, text] of left) smallStorage.setItem(key, text);
  expect(await sheets()).toEqual({ sheet: 'three' });
  expect(smallStorage.entries.size).toBe(0);
});

test('of two edits in the same millisecond the later one counts', async () => {
  const page = await openPage();
  page.type('first');
  await page.keeper.flush();
  page.type('last');
  vanish(page);
  expect(await sheets()).toEqual({ sheet: 'last' });
});

test('a clock that was set back loses no edit', async () => {
  let back = 0;
  const now = () => clock.now() - back;
  const touchy = createTouchyStore();
  const shelf = createTestShelf({ now, store: touchy.store, smallStorage });
  const keeper = createKeeper(shelf.draft({}), { ...clock, now, shelf, tabs: DEAF_TABS, onState: () => undefined });
  keeper.keep(typed(EMPTY, 'first'));
  await keeper.flush();
  back = 60 * MINUTE;
  keeper.keep(typed(EMPTY, 'last'));
  touchy.fault = 'silent';
  keeper.leave();
  expect(await sheets()).toEqual({ sheet: 'last' });
});

test.each([
  [
    'changed',
    { aside: 'mine', sheet: 'theirs' },
    (shelf: Shelf, other: Page) => shelf.save(other.record, typed(other.record, 'theirs'), clock.now()),
  ],
  ['deleted', { aside: 'mine' }, (shelf: Shelf, other: Page) => shelf.remove(other.record.id)],
] as const)('what was left is set aside where another tab has %s the sheet since', async (_, expected, deed) => {
  const id = await startSheet('one');
  const [page, other] = [await openPage(id), await openPage(id)];
  page.type('mine');
  vanish(page);
  // The other tab is one that does not look at the shelf just now.
  await deed(createTestShelf(clock), other);
  expect(await sheets()).toEqual(expected);
  expect(await sheets()).toEqual(expected);
  expect(smallStorage.entries.size).toBe(0);
});

test('what two pages gather at once is there once', async () => {
  const id = await startSheet('one');
  const page = await openPage(id);
  page.type('mine');
  vanish(page);
  await createTestShelf(clock).save({ ...page.record }, typed(EMPTY, 'theirs'), clock.now());
  const shelves = [0, 1, 2].map(() => createTestShelf({ ...clock, smallStorage }));
  await Promise.all(shelves.map((shelf) => shelf.list()));
  const listed = await shelves[0].list();
  expect('sheets' in listed && listed.sheets.length).toBe(2);
});

test('the same text on both sides is no conflict', async () => {
  const id = await startSheet('one');
  const page = await openPage(id);
  page.type('same');
  vanish(page);
  await createTestShelf(clock).save(page.record, typed(EMPTY, 'same'), clock.now());
  expect(await sheets()).toEqual({ sheet: 'same' });
});

test('in a conflict the text is left for the sheet set aside', async () => {
  const id = await startSheet('one');
  const [page, other] = [await openPage(id), await openPage(id)];
  other.type('theirs');
  await other.keeper.flush();
  page.type('mine');
  await page.keeper.flush();
  page.type('mine, longer');
  vanish(page);
  expect(await sheets()).toEqual({ sheet: 'theirs', aside: 'mine, longer' });
});

test('what cannot be brought to a full shelf waits until it can', async () => {
  const page = await openPage();
  page.type('one');
  vanish(page);
  const touchy = createTouchyStore();
  touchy.fault = 'full';
  const shelf = createTestShelf({ ...clock, store: touchy.store, smallStorage });
  expect(await shelf.list()).toEqual({ sheets: [] });
  expect(smallStorage.entries.size).toBe(1);
  touchy.fault = 'none';
  expect(await shelf.list()).toMatchObject({ sheets: [{ length: 3 }] });
  expect(smallStorage.entries.size).toBe(0);
});

test('a sheet closed on a full disk is not lost: this very page brings it once there is room', async () => {
  const id = await startSheet('one');
  const page = await openPage(id);
  page.touchy.fault = 'full';
  page.type('two');
  await page.keeper.close();
  expect((await load(page.shelf, id)).text).toBe('one');
  page.touchy.fault = 'none';
  expect((await load(page.shelf, id)).text).toBe('two');
  expect(smallStorage.entries.size).toBe(0);
  expect(clock.pending()).toBe(0);
});

test('where there is no room for the history the text is left without it, and where there is none at all nothing fails', async () => {
  const long = await openPage();
  for (let n = 0; n < 100; n++) long.type(`text ${n}`);
  smallStorage = createSmallStorage(1000);
  const page = await openPage();
  for (let n = 0; n < 100; n++) page.type(`text ${n}`);
  vanish(page);
  const [words] = findWords(smallStorage);
  expect(words.record).toMatchObject({ text: 'text 99', history: EMPTY_HISTORY });
  smallStorage = createSmallStorage(10);
  const unlucky = await openPage();
  unlucky.type('text');
  vanish(unlucky);
  expect(smallStorage.entries.size).toBe(0);
});

test('what a newer version left, or nobody can read, stays and harms nothing', async () => {
  smallStorage.setItem('squarelaw-left a b', JSON.stringify({ format: FORMAT + 1, id: 'a', leftBy: 'b' }));
  smallStorage.setItem('squarelaw-left c d', '{"format":');
  smallStorage.setItem('squarelaw-left e f', 'null');
  smallStorage.setItem('squarelaw-left g h', JSON.stringify({ format: FORMAT, id: 'g', leftBy: 'h' }));
  smallStorage.setItem('another', 'matter');
  expect(await sheets()).toEqual({});
  expect(smallStorage.entries.size).toBe(5);
});

test('a browser that refuses the small storage does without', () => {
  vi.stubGlobal('localStorage', smallStorage);
  expect(openSmallStorage()).toBe(smallStorage);
  vi.stubGlobal('localStorage', undefined);
  expect(openSmallStorage()).toBeNull();
  Object.defineProperty(globalThis, 'localStorage', {
    configurable: true,
    get: () => {
      throw new DOMException('', 'SecurityError');
    },
  });
  expect(openSmallStorage()).toBeNull();
  vi.unstubAllGlobals();
});
