// Keeping: when edits are written, and what is said when they are not.

import fc from 'fast-check';
import { beforeEach, expect, test } from 'vitest';
import { createKeeper, EMPTY_HISTORY } from '../../src/storage/index.ts';
import type { Keeper, KeepState, SheetContent, SheetRecord } from '../../src/storage/index.ts';
import { KEEPER_TIMES } from '../../src/storage/keeper.ts';
import {
  createHandClock,
  createTestShelf,
  createTouchyStore,
  DEAF_TABS,
  freshDisk,
  MINUTE,
  settle,
} from './memory-surroundings.ts';
import type { HandClock, TouchyStore } from './memory-surroundings.ts';

let clock: HandClock;
let touchy: TouchyStore;
beforeEach(() => {
  freshDisk();
  clock = createHandClock();
  touchy = createTouchyStore();
});

const content = (text: string): SheetContent => ({ text, history: EMPTY_HISTORY, folded: [] });

function open(opened?: SheetRecord): { keeper: Keeper; states: KeepState[]; id: string } {
  const shelf = createTestShelf({ ...clock, store: touchy.store });
  const states: KeepState[] = [];
  const record = opened ?? shelf.draft({});
  const keeper = createKeeper(record, { ...clock, shelf, tabs: DEAF_TABS, onState: (state) => states.push(state) });
  return { keeper, states, id: record.id };
}

/** What a page that is opened now would find. */
async function textOnDisk(id: string): Promise<string | null> {
  const found = await createTestShelf(clock).load(id);
  return 'record' in found ? found.record.text : null;
}

test('a draft is on no shelf until it is edited', async () => {
  const { keeper, states, id } = open();
  await clock.turn(MINUTE);
  expect(keeper.state()).toEqual({ state: 'kept', at: null });
  expect(states).toEqual([]);
  expect(await textOnDisk(id)).toBeNull();
});

test('the first edit is written soon, and the state tells', async () => {
  const { keeper, states, id } = open();
  keeper.keep(content('a'));
  const at = clock.now();
  expect(states).toEqual([{ state: 'keeping' }]);
  await clock.turn(KEEPER_TIMES.writeAfter - 1);
  expect(await textOnDisk(id)).toBeNull();
  await clock.turn(1);
  await settle();
  expect(await textOnDisk(id)).toBe('a');
  expect(states).toEqual([{ state: 'keeping' }, { state: 'kept', at }]);
});

test('while typing, every edit is on the disk within a second, and writes are at most 400 ms apart in number', async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(fc.integer({ min: 0, max: 700 }), { minLength: 1, maxLength: 40 }), async (pauses) => {
      freshDisk();
      clock = createHandClock();
      touchy = createTouchyStore();
      const { keeper, id } = open();
      const edits: { at: number }[] = [];
      const start = clock.now();
      for (const pause of pauses) {
        await clock.turn(pause);
        edits.push({ at: clock.now() });
        keeper.keep(content(String(edits.length - 1)));
        await settle();
        const due = edits.findLastIndex(({ at }) => at <= clock.now() - 1000);
        expect(Number((await textOnDisk(id)) ?? -1)).toBeGreaterThanOrEqual(due);
      }
      await clock.turn(KEEPER_TIMES.writeEvery);
      await settle();
      expect(await textOnDisk(id)).toBe(String(edits.length - 1));
      expect(keeper.state()).toEqual({ state: 'kept', at: edits.at(-1)!.at });
      expect(touchy.writes).toBeLessThanOrEqual(1 + Math.ceil((clock.now() - start) / KEEPER_TIMES.writeEvery));
      expect(clock.pending()).toBe(0);
    }),
    { seed: 1907, numRuns: 30 },
  );
});

test('a flush writes at once, and only where there is something to write', async () => {
  const { keeper, id } = open();
  await keeper.flush();
  expect(touchy.writes).toBe(0);
  keeper.keep(content('a'));
  expect(await keeper.flush()).toEqual({ state: 'kept', at: clock.now() });
  expect(await textOnDisk(id)).toBe('a');
  await clock.turn(MINUTE);
  await keeper.flush();
  expect(touchy.writes).toBe(1);
});

test('a flush while a write is under way sends the rest without waiting for it', async () => {
  const { keeper, id } = open();
  keeper.keep(content('a'));
  const first = keeper.flush();
  keeper.keep(content('ab'));
  const second = keeper.flush();
  // Begun in the same turn: a page that goes now has sent both.
  expect(touchy.writes).toBe(2);
  await Promise.all([first, second]);
  expect(await textOnDisk(id)).toBe('ab');
  expect(keeper.state()).toEqual({ state: 'kept', at: clock.now() });
  const third = keeper.flush();
  expect(touchy.writes).toBe(2);
  await third;
});

test('on a full disk the change is said not to be kept, and which version is safe', async () => {
  const { keeper, states, id } = open();
  await clock.turn(6 * MINUTE);
  keeper.keep(content('a'));
  await keeper.flush();
  touchy.fault = 'full';
  await clock.turn(MINUTE);
  keeper.keep(content('ab'));
  await clock.turn(100);
  await settle();
  const expected = {
    state: 'not kept',
    code: 'storage-full',
    reason:
      'The last change, at 14:07, could not be kept: storage is full. The version of 14:06 is safe. ' +
      'Save a file now, then make room on the shelf.',
  };
  expect(keeper.state()).toEqual(expected);
  expect(states.at(-1)).toEqual(expected);
  expect(await textOnDisk(id)).toBe('a');
});

test('with no version kept at all that is said', async () => {
  const { keeper } = open();
  touchy.fault = 'full';
  keeper.keep(content('a'));
  expect(await keeper.flush()).toHaveProperty(
    'reason',
    'The last change, at 14:00, could not be kept: storage is full. No version of it is kept yet. ' +
      'Save a file now, then make room on the shelf.',
  );
});

test('once there is room again the change is kept without a further edit', async () => {
  const { keeper, states, id } = open();
  touchy.fault = 'full';
  keeper.keep(content('a'));
  const at = clock.now();
  await keeper.flush();
  await clock.turn(KEEPER_TIMES.retryEvery);
  await settle();
  expect(keeper.state()).toHaveProperty('state', 'not kept');
  touchy.fault = 'none';
  await clock.turn(KEEPER_TIMES.retryEvery);
  await settle();
  expect(states.at(-1)).toEqual({ state: 'kept', at });
  expect(await textOnDisk(id)).toBe('a');
});

test('behind a failure the next edit is tried soon, not with the next attempt', async () => {
  const { keeper, id } = open();
  touchy.fault = 'full';
  keeper.keep(content('a'));
  await keeper.flush();
  touchy.fault = 'none';
  keeper.keep(content('ab'));
  expect(keeper.state()).toHaveProperty('state', 'not kept');
  await clock.turn(KEEPER_TIMES.writeEvery);
  await settle();
  expect(await textOnDisk(id)).toBe('ab');
  expect(clock.pending()).toBe(0);
});

test('where storage is refused the sheet is said to live in this tab only', async () => {
  const { keeper } = open();
  touchy.fault = 'refused';
  keeper.keep(content('a'));
  expect(await keeper.flush()).toEqual({
    state: 'not kept',
    code: 'storage-refused',
    reason:
      'This browser refuses to store anything, perhaps because the window is private. ' +
      'Your sheet lives in this tab only; save it as a file or copy a link before you close it.',
  });
});

test('where storage is refused later on, the kept version is named', async () => {
  const { keeper } = open();
  keeper.keep(content('a'));
  await keeper.flush();
  touchy.fault = 'refused';
  await clock.turn(2 * MINUTE);
  keeper.keep(content('ab'));
  expect(await keeper.flush()).toEqual({
    state: 'not kept',
    code: 'storage-refused',
    reason:
      'The last change, at 14:02, could not be kept: the browser refuses to store it. ' +
      'The version of 14:00 is safe. Save a file now.',
  });
});

test('a store that does not answer is said to, and what it does in the end counts', async () => {
  let answer: () => void = () => undefined;
  const shelf = createTestShelf({
    ...clock,
    store: (mode, run) => new Promise<void>((done) => (answer = done)).then(() => touchy.store(mode, run)),
  });
  const keeper = createKeeper(shelf.draft({}), { ...clock, shelf, tabs: DEAF_TABS, onState: () => undefined });
  keeper.keep(content('a'));
  await clock.turn(KEEPER_TIMES.writeAfter + KEEPER_TIMES.silentAfter);
  expect(keeper.state()).toEqual({
    state: 'not kept',
    code: 'storage-silent',
    reason:
      'The last change, at 14:00, is not kept yet: storage has not answered for 5 s. ' +
      'No version of it is kept yet. Save a file before you close this tab.',
  });
  answer();
  await settle();
  expect(keeper.state()).toEqual({
    state: 'kept',
    at: clock.now() - KEEPER_TIMES.writeAfter - KEEPER_TIMES.silentAfter,
  });
});

test('a keeper that is closed has written all, and writes nothing more', async () => {
  const { keeper, id } = open();
  keeper.keep(content('a'));
  await keeper.close();
  expect(await textOnDisk(id)).toBe('a');
  touchy.fault = 'full';
  keeper.keep(content('ab'));
  await clock.turn(MINUTE);
  expect(touchy.writes).toBe(1);
  expect(clock.pending()).toBe(0);
});

test('a crash loses nothing that was said to be kept', async () => {
  const { keeper, states, id } = open();
  let said = '';
  for (const text of ['a', 'ab', 'abc', 'abcd']) {
    keeper.keep(content(text));
    await clock.turn(90);
    if (keeper.state().state === 'kept') said = text;
    expect((await textOnDisk(id)) ?? '').toMatch(new RegExp(`^${said}`));
  }
  expect(said).not.toBe('');
  expect(states.length).toBeGreaterThan(1);
});
