// The shelf: what it keeps, in which order, and what it refuses to overwrite.

import { promisifyRequest } from 'idb-keyval';
import { beforeEach, expect, test } from 'vitest';
import { edit, EMPTY_HISTORY, openStore, randomId, titleOf } from '../../src/storage/index.ts';
import type { SheetContent, SheetRecord, Shelf, TabNews } from '../../src/storage/index.ts';
import { FORMAT } from '../../src/storage/sheet-record.ts';
import {
  createHandClock,
  createTabSet,
  createTestShelf,
  createTouchyStore,
  DEAF_TABS,
  freshDisk,
} from './memory-surroundings.ts';
import type { HandClock } from './memory-surroundings.ts';

let clock: HandClock;
beforeEach(() => {
  freshDisk();
  clock = createHandClock();
});

const content = (text: string): SheetContent => ({ text, history: EMPTY_HISTORY, folded: [] });

async function put(shelf: Shelf, text: string, base = shelf.draft({})): Promise<SheetRecord> {
  const result = await shelf.save(base, content(text), clock.now());
  if (result.status !== 'kept') throw new Error(result.status);
  return result.record;
}

async function loaded(shelf: Shelf, id: string): Promise<SheetRecord> {
  const result = await shelf.load(id);
  if ('fault' in result) throw new Error(result.fault.text);
  return result.record;
}

async function titles(shelf: Shelf): Promise<string[]> {
  const listed = await shelf.list();
  if ('fault' in listed) throw new Error(listed.fault.text);
  return listed.sheets.map(({ title }) => title);
}

/** Writes to the disk past the shelf, as another version of the program might. */
function plant(key: string[], value: unknown): Promise<void> {
  return openStore()('readwrite', (objects) => {
    objects.put(value, key);
    return promisifyRequest<void>(objects.transaction);
  });
}

function onDisk(key: string[]): Promise<unknown> {
  return openStore()('readonly', (objects) => promisifyRequest<unknown>(objects.get(key)));
}

test('a sheet comes back with its text, history, folding and times', async () => {
  const shelf = createTestShelf(clock);
  const edited = edit(
    { text: '# Tänk\r\nR = 1 kΩ', history: EMPTY_HISTORY },
    [{ start: 8, end: 9, text: 'R_S' }],
    'rename',
  );
  const draft = shelf.draft({});
  await clock.turn(1000);
  const result = await shelf.save(draft, { ...edited, folded: ['Q1'] }, clock.now());
  expect(result.status).toBe('kept');
  const record = await loaded(createTestShelf(clock), draft.id);
  expect(record).toEqual({
    format: FORMAT,
    id: draft.id,
    revision: 1,
    writer: shelf.writer,
    asideOf: null,
    text: edited.text,
    history: edited.history,
    folded: ['Q1'],
    created: draft.created,
    changed: draft.created + 1000,
  });
});

test('a draft is on the shelf only once it is saved', async () => {
  const shelf = createTestShelf(clock);
  const draft = shelf.draft({ text: '# A' });
  expect(await titles(shelf)).toEqual([]);
  expect(await shelf.load(draft.id)).toEqual({
    fault: { code: 'sheet-missing', text: 'This sheet is no longer on the shelf.' },
  });
  await put(shelf, '# A', draft);
  expect(await titles(shelf)).toEqual(['A']);
});

test('the list begins with the sheet that was changed last', async () => {
  const shelf = createTestShelf(clock);
  const first = await put(shelf, '# First');
  await clock.turn(10);
  await put(shelf, '# Second');
  await clock.turn(10);
  await put(shelf, '# Third');
  expect(await titles(shelf)).toEqual(['Third', 'Second', 'First']);
  await clock.turn(10);
  await put(shelf, '# First again', first);
  expect(await titles(shelf)).toEqual(['First again', 'Third', 'Second']);
});

test('a line of the list tells times, length and revision', async () => {
  const shelf = createTestShelf(clock);
  const record = await put(shelf, '# A', await put(shelf, '# A\n'));
  expect(await shelf.list()).toEqual({
    sheets: [
      {
        format: FORMAT,
        id: record.id,
        title: 'A',
        created: clock.now(),
        changed: clock.now(),
        revision: 2,
        asideOf: null,
        length: 3,
      },
    ],
  });
});

test('a title is the first heading; a sheet without one, and an empty one, are called so', () => {
  expect(titleOf('V = 1 V\n# Input stage, rev B\n# Later\n')).toBe('Input stage, rev B');
  expect(titleOf('## Section\r\n# Stage\r\n')).toBe('Stage');
  expect(titleOf('\uFEFF# Stage')).toBe('Stage');
  expect(titleOf('#Stage\n# \nV = 1 V')).toBe('Sheet without a title');
  expect(titleOf(' \n')).toBe('Empty sheet');
});

test('a sheet that is removed is gone, and the others stay', async () => {
  const shelf = createTestShelf(clock);
  const [a, b] = [await put(shelf, '# A'), await put(shelf, '# B')];
  expect(await shelf.remove(a.id)).toEqual({ removed: true });
  expect(await titles(shelf)).toEqual(['B']);
  expect(await shelf.load(a.id)).toHaveProperty('fault.code', 'sheet-missing');
  expect((await loaded(shelf, b.id)).text).toBe('# B');
});

test('a duplicate has the same text and folding, a history and times of its own', async () => {
  const shelf = createTestShelf(clock);
  const base = shelf.draft({});
  const edited = edit({ text: '', history: EMPTY_HISTORY }, [{ start: 0, end: 0, text: '# A' }], 'typing');
  await shelf.save(base, { ...edited, folded: ['Q1'] }, clock.now());
  await clock.turn(5000);
  const made = await shelf.duplicate(base.id);
  if ('fault' in made) throw new Error(made.fault.text);
  expect(made.record).toMatchObject({ text: '# A', folded: ['Q1'], history: EMPTY_HISTORY, created: clock.now() });
  expect(made.record.id).not.toBe(base.id);
  await put(shelf, '# A, other', made.record);
  expect((await loaded(shelf, base.id)).text).toBe('# A');
  expect(await shelf.duplicate('nowhere')).toHaveProperty('fault.code', 'sheet-missing');
});

test('a save over what another page wrote leaves it, and answers with it', async () => {
  const [mine, other] = [createTestShelf(clock), createTestShelf(clock)];
  const base = await put(mine, 'one');
  const theirs = await put(other, 'two', await loaded(other, base.id));
  expect(await mine.save(base, content('three'), clock.now())).toEqual({ status: 'changed', theirs });
  expect(await loaded(mine, base.id)).toEqual(theirs);
  expect(theirs.revision).toBe(2);
});

test('of two saves at once one goes through, and the other one learns of it', async () => {
  const [mine, other] = [createTestShelf(clock), createTestShelf(clock)];
  const base = await put(mine, 'one');
  const known = await loaded(other, base.id);
  // A third page wrote last, so that neither of the two counts as the last writer.
  const third = createTestShelf(clock);
  const now = await put(third, 'two', known);
  const results = await Promise.all([
    mine.save(now, content('mine'), clock.now()),
    other.save(now, content('other'), clock.now()),
  ]);
  expect(results.map(({ status }) => status)).toEqual(['kept', 'changed']);
  expect((await loaded(mine, base.id)).text).toBe('mine');
});

test('a page need not wait for its own save before the next one', async () => {
  const shelf = createTestShelf(clock);
  const base = await put(shelf, 'one');
  const results = await Promise.all(['two', 'three'].map((text) => shelf.save(base, content(text), clock.now())));
  expect(results.map(({ status }) => status)).toEqual(['kept', 'kept']);
  expect(await loaded(shelf, base.id)).toMatchObject({ text: 'three', revision: 3 });
});

test('a save of a sheet that another page removed does not bring it back', async () => {
  const [mine, other] = [createTestShelf(clock), createTestShelf(clock)];
  const base = await put(mine, 'one');
  await other.remove(base.id);
  expect(await mine.save(base, content('two'), clock.now())).toEqual({ status: 'deleted' });
  expect(await titles(mine)).toEqual([]);
});

test('a sheet that was removed and made anew is not taken for the old one, though it counts to the same revision', async () => {
  const [mine, other, third] = [createTestShelf(clock), createTestShelf(clock), createTestShelf(clock)];
  const base = await put(mine, 'one');
  const seen = await loaded(third, base.id);
  await other.remove(base.id);
  const anew = await put(other, 'anew', { ...base, revision: 0 });
  expect(anew.revision).toBe(seen.revision);
  expect(await third.save(seen, content('two'), clock.now())).toHaveProperty('status', 'changed');
});

test('a sheet of a newer version is listed and left as it is', async () => {
  const shelf = createTestShelf(clock);
  const base = await put(shelf, 'one');
  const newer = { format: FORMAT + 1, id: base.id, revision: 9, changed: clock.now(), words: ['another form'] };
  await plant(['sheet', base.id], newer);
  await plant(['head', base.id], { ...newer, title: 'Newer' });
  expect(await shelf.load(base.id)).toHaveProperty('fault.code', 'sheet-newer');
  expect(await shelf.save(base, content('two'), clock.now())).toEqual({ status: 'unreadable', changed: clock.now() });
  expect(await shelf.remove(base.id)).toHaveProperty('fault.code', 'sheet-newer');
  expect(await shelf.duplicate(base.id)).toHaveProperty('fault.code', 'sheet-newer');
  expect(await titles(shelf)).toEqual(['Newer']);
  expect(await onDisk(['sheet', base.id])).toEqual(newer);
});

test('what is damaged on the disk is said, and left as it is', async () => {
  const shelf = createTestShelf(clock);
  const base = await put(shelf, 'one');
  for (const damaged of [
    { ...base, text: 7 },
    { ...base, revision: null },
    { ...base, changed: 'yesterday' },
  ]) {
    await plant(['sheet', base.id], damaged);
    expect(await shelf.load(base.id)).toHaveProperty('fault.code', 'sheet-damaged');
    expect(await shelf.save(base, content('two'), clock.now())).toHaveProperty('status', 'unreadable');
    expect(await onDisk(['sheet', base.id])).toEqual(damaged);
  }
  for (const foreign of ['text', 7, null, { text: 'one' }]) {
    await plant(['sheet', base.id], foreign);
    expect(await shelf.load(base.id)).toHaveProperty('fault.code', 'sheet-newer');
  }
  await plant(['head', 'x'], 'no line');
  await plant(['head', 'y'], { id: 'y' });
  expect(await titles(shelf)).toEqual(['Sheet without a title', 'Sheet of a newer version']);
});

test('a history that does not fit its text is dropped, and the text is not', async () => {
  const shelf = createTestShelf(clock);
  const base = await put(shelf, 'one');
  const misfits = [
    { undo: [{ splices: [{ start: 0, end: 4, text: '' }], label: '' }], redo: [] },
    { undo: [{ splices: [{ start: 0.5, end: 1, text: '' }], label: '' }], redo: [] },
    { undo: [{ splices: 'all', label: '' }], redo: [] },
    { undo: [] },
    null,
  ];
  for (const history of misfits) {
    await plant(['sheet', base.id], { ...base, history, folded: [1] });
    expect(await loaded(shelf, base.id)).toEqual(base);
  }
});

test('on a full disk the last kept version stays, whole, and the list with it', async () => {
  const touchy = createTouchyStore();
  const shelf = createTestShelf({ ...clock, store: touchy.store });
  const base = await put(shelf, '# One');
  touchy.fault = 'full';
  expect(await shelf.save(base, content('# Two'), clock.now())).toEqual({ status: 'failed', failure: 'full' });
  expect(await shelf.duplicate(base.id)).toEqual({
    fault: {
      code: 'storage-full',
      text: 'The copy could not be made: storage is full. Everything else is safe. Make room on the shelf first.',
    },
  });
  expect(await loaded(shelf, base.id)).toEqual(base);
  expect(await titles(shelf)).toEqual(['One']);
});

test('a browser that refuses storage is said to, whatever is asked of the shelf', async () => {
  const refusals = [
    new DOMException('', 'SecurityError'),
    new DOMException('', 'UnknownError'),
    new DOMException('', 'InvalidStateError'),
    null,
  ];
  for (const refusal of refusals) {
    const shelf = createTestShelf({ ...clock, store: () => Promise.reject(refusal) });
    const fault = {
      code: 'storage-refused',
      text:
        'This browser refuses to store anything, perhaps because the window is private. ' +
        'Your sheet lives in this tab only; save it as a file or copy a link before you close it.',
    };
    expect(await shelf.list()).toEqual({ fault });
    expect(await shelf.load('a')).toEqual({ fault });
    expect(await shelf.remove('a')).toEqual({ fault });
    expect(await shelf.save(shelf.draft({}), content(''), 0)).toEqual({ status: 'failed', failure: 'refused' });
  }
});

test('a browser without any store refuses', async () => {
  const before = globalThis.indexedDB;
  try {
    for (const none of [undefined, null]) {
      globalThis.indexedDB = none as unknown as IDBFactory;
      expect(await createTestShelf(clock).list()).toHaveProperty('fault.code', 'storage-refused');
    }
  } finally {
    globalThis.indexedDB = before;
  }
});

test('a store of another shape belongs to a newer version', async () => {
  await new Promise<void>((done) => {
    const request = indexedDB.open('squarelaw');
    request.onupgradeneeded = () => request.result.createObjectStore('another');
    request.onsuccess = () => {
      request.result.close();
      done();
    };
  });
  const shelf = createTestShelf(clock);
  expect(await shelf.list()).toHaveProperty('fault.code', 'storage-newer');
  expect(await shelf.save(shelf.draft({}), content(''), 0)).toEqual({ status: 'failed', failure: 'newer' });
});

test('a connection that the browser has closed is opened anew', async () => {
  const inner = openStore();
  let uses = 0;
  const shelf = createTestShelf({
    ...clock,
    store: (mode, run) => (uses++ === 0 ? Promise.reject(new DOMException('', 'InvalidStateError')) : inner(mode, run)),
  });
  expect(await shelf.list()).toEqual({ sheets: [] });
});

test('what cannot be stored at all is our own fault, throws, and leaves nothing half written', async () => {
  const shelf = createTestShelf(clock);
  const base = await put(shelf, '# One');
  const folded = [(() => undefined) as unknown as string];
  await expect(shelf.save(base, { ...content('# Two'), folded }, clock.now())).rejects.toThrow(/could not be cloned/);
  expect(await loaded(shelf, base.id)).toEqual(base);
  expect(await titles(shelf)).toEqual(['One']);
});

test('other tabs hear of what is kept and removed, and of nothing else', async () => {
  const join = createTabSet();
  const heard: TabNews[] = [];
  join().listen((news) => heard.push(news));
  const touchy = createTouchyStore();
  const shelf = createTestShelf({ ...clock, tabs: join(), store: touchy.store });
  const base = await put(shelf, 'one');
  touchy.fault = 'full';
  await shelf.save(base, content('two'), clock.now());
  touchy.fault = 'none';
  await createTestShelf({ ...clock, tabs: DEAF_TABS }).save(await loaded(shelf, base.id), content('x'), 0);
  await shelf.save({ ...base, writer: 'nobody' }, content('two'), 0);
  await shelf.remove(base.id);
  const { writer } = shelf;
  expect(heard).toEqual([
    { type: 'kept', id: base.id, changed: clock.now(), writer },
    { type: 'removed', id: base.id, changed: clock.now(), writer },
  ]);
});

test('names are of 128 bits', () => {
  const names = new Set(Array.from({ length: 100 }, randomId));
  expect(names.size).toBe(100);
  for (const name of names) expect(name).toMatch(/^[0-9a-f]{32}$/);
});
