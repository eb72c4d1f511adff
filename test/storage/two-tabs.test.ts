// One sheet open in two tabs: neither overwrites the other, and both texts live on whatever is decided.

import { promisifyRequest } from 'idb-keyval';
import { beforeEach, expect, test } from 'vitest';
import { createKeeper, edit, EMPTY_HISTORY, openStore, splicesBetween, undo } from '../../src/storage/index.ts';
import type { Edited, Keeper, KeepState, SheetContent, SheetRecord, Shelf, Tabs } from '../../src/storage/index.ts';
import { FORMAT } from '../../src/storage/sheet-record.ts';
import {
  createHandClock,
  createTabSet,
  createTestShelf,
  createTouchyStore,
  DEAF_TABS,
  freshDisk,
  MINUTE,
  settle,
} from './memory-surroundings.ts';
import type { HandClock, TouchyStore } from './memory-surroundings.ts';

let clock: HandClock;
let join: () => Tabs;
let opened: SheetRecord;
beforeEach(async () => {
  freshDisk();
  clock = createHandClock();
  join = createTabSet();
  const shelf = createTestShelf(clock);
  const result = await shelf.save(shelf.draft({}), typed(EMPTY, '# Stage\nR = 1 kohm\n'), clock.now());
  if (result.status !== 'kept') throw new Error(result.status);
  opened = result.record;
  await clock.turn(MINUTE);
});

const EMPTY: Edited = { text: '', history: EMPTY_HISTORY };
const typed = (from: Edited, text: string): SheetContent => ({
  ...edit(from, splicesBetween(from.text, text), 'typing'),
  folded: [],
});

interface Tab {
  keeper: Keeper;
  shelf: Shelf;
  touchy: TouchyStore;
  states: KeepState[];
  /** What the page shows. */
  content: SheetContent;
  type(text: string): void;
}

/** A tab with the sheet open. `deaf`: it sleeps while the others speak. */
async function openTab(options: { deaf?: boolean } = {}): Promise<Tab> {
  const tabs = options.deaf ? { ...join(), listen: DEAF_TABS.listen } : join();
  const touchy = createTouchyStore();
  const shelf = createTestShelf({ ...clock, store: touchy.store, tabs });
  const found = await shelf.load(opened.id);
  if ('fault' in found) throw new Error(found.fault.text);
  const states: KeepState[] = [];
  const keeper = createKeeper(found.record, { ...clock, shelf, tabs, onState: (state) => states.push(state) });
  const tab: Tab = {
    keeper,
    shelf,
    touchy,
    states,
    content: found.record,
    type(text) {
      tab.content = typed(tab.content, text);
      keeper.keep(tab.content);
    },
  };
  return tab;
}

async function texts(): Promise<Record<string, string>> {
  const shelf = createTestShelf(clock);
  const listed = await shelf.list();
  if ('fault' in listed) throw new Error(listed.fault.text);
  const found: Record<string, string> = {};
  for (const { id, asideOf } of listed.sheets) {
    const sheet = await shelf.load(id);
    found[asideOf === null ? 'sheet' : 'aside'] = 'record' in sheet ? sheet.record.text : sheet.fault.code;
  }
  return found;
}

/** Every text that undo leads back to. */
function undone(content: SheetContent): string[] {
  const trail: string[] = [];
  for (let at: Edited | null = content; at; at = undo(at)) trail.push(at.text);
  return trail;
}

async function collide(): Promise<[mine: Tab, theirs: Tab]> {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  await clock.turn(8 * MINUTE);
  theirs.type('theirs');
  await theirs.keeper.flush();
  await clock.turn(MINUTE);
  mine.type('mine');
  await mine.keeper.flush();
  return [mine, theirs];
}

test('a save over what another tab wrote overwrites nothing, keeps both texts and says so', async () => {
  const [mine] = await collide();
  expect(mine.keeper.state()).toMatchObject({
    state: 'elsewhere',
    kind: 'changed',
    own: 'set aside',
    theirs: { text: 'theirs' },
    mine: { text: 'mine' },
    reason: 'This sheet was changed in another tab at 14:09. Both texts are kept: take theirs, keep yours, or compare.',
  });
  expect(await texts()).toEqual({ sheet: 'theirs', aside: 'mine' });
});

test('further edits go on into the text that was set aside', async () => {
  const [mine] = await collide();
  mine.type('mine, longer');
  await clock.turn(1000);
  await settle();
  expect(await texts()).toEqual({ sheet: 'theirs', aside: 'mine, longer' });
  expect(mine.keeper.state()).toMatchObject({ own: 'set aside', mine: { text: 'mine, longer' } });
});

test('two writes under way when the conflict is found go to one sheet, in order', async () => {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  theirs.type('theirs');
  await theirs.keeper.flush();
  mine.type('mine');
  const first = mine.keeper.flush();
  mine.type('mine, longer');
  await Promise.all([first, mine.keeper.flush()]);
  expect(await texts()).toEqual({ sheet: 'theirs', aside: 'mine, longer' });
  const listed = await mine.shelf.list();
  expect('sheets' in listed && listed.sheets.length).toBe(2);
});

test('theirs taken: their text stands, one undo brings mine back and leads on into its history', async () => {
  const [mine, theirs] = await collide();
  const taken = (await mine.keeper.takeTheirs())!;
  expect(undone(taken)).toEqual(['theirs', 'mine', '# Stage\nR = 1 kohm\n', '']);
  expect(mine.keeper.state()).toEqual({ state: 'kept', at: clock.now() });
  expect(await texts()).toEqual({ sheet: 'theirs' });
  // The way back is kept, too, and the other tab is not bothered with a text that is its own.
  expect(undone(await load())).toEqual(undone(taken));
  await settle();
  expect(theirs.keeper.state().state).toBe('kept');
  theirs.type('theirs, longer');
  expect((await theirs.keeper.flush()).state).toBe('kept');
});

test('mine kept: my text stands in place of theirs, which one undo brings back', async () => {
  const [mine, theirs] = await collide();
  const content = (await mine.keeper.keepMine())!;
  expect(undone(content)).toEqual(['mine', 'theirs', 'mine', '# Stage\nR = 1 kohm\n', '']);
  expect(mine.keeper.state()).toEqual({ state: 'kept', at: clock.now() });
  expect(await texts()).toEqual({ sheet: 'mine' });
  await settle();
  expect(theirs.keeper.state()).toMatchObject({ state: 'elsewhere', own: 'unchanged', theirs: { text: 'mine' } });
});

test('an idle tab hears of the change at once, has nothing to set aside, and can take it over', async () => {
  const [mine, theirs] = [await openTab(), await openTab()];
  await clock.turn(8 * MINUTE);
  theirs.type('theirs');
  await theirs.keeper.flush();
  await settle();
  expect(mine.states.at(-1)).toMatchObject({
    state: 'elsewhere',
    kind: 'changed',
    own: 'unchanged',
    theirs: { text: 'theirs' },
    reason:
      'This sheet was changed in another tab at 14:09. You changed nothing here since: take theirs, or keep what you see.',
  });
  expect(await texts()).toEqual({ sheet: 'theirs' });
  const taken = (await mine.keeper.takeTheirs())!;
  expect(taken.text).toBe('theirs');
  expect(mine.keeper.state()).toEqual({ state: 'kept', at: clock.now() });
  mine.content = taken;
  mine.type('theirs and mine');
  expect((await mine.keeper.flush()).state).toBe('kept');
  expect(await texts()).toEqual({ sheet: 'theirs and mine' });
});

test('two tabs that take turns follow each other without any question', async () => {
  const [a, b] = [await openTab(), await openTab()];
  for (const [n, tab] of [a, b, a, b].entries()) {
    const other = tab === a ? b : a;
    tab.type(`turn ${n}`);
    await tab.keeper.flush();
    await settle();
    other.content = (await other.keeper.takeTheirs())!;
  }
  expect(await texts()).toEqual({ sheet: 'turn 3' });
  expect([a, b].map(({ keeper }) => keeper.state().state)).toEqual(['kept', 'kept']);
});

test('a page that slept finds out when it looks', async () => {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  expect(await mine.keeper.look()).toHaveProperty('state', 'kept');
  theirs.type('theirs');
  await theirs.keeper.flush();
  expect(mine.keeper.state()).toHaveProperty('state', 'kept');
  expect(await mine.keeper.look()).toMatchObject({ state: 'elsewhere', own: 'unchanged' });
});

test('where another tab only folded rows, a save goes through', async () => {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  theirs.keeper.keep({ ...theirs.content, folded: ['Q1'] });
  await theirs.keeper.flush();
  mine.type('mine');
  expect(await mine.keeper.flush()).toEqual({ state: 'kept', at: clock.now() });
  expect(await texts()).toEqual({ sheet: 'mine' });
});

test('the same edit in both tabs is no conflict', async () => {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  theirs.type('same');
  await theirs.keeper.flush();
  mine.type('same');
  expect(await mine.keeper.flush()).toHaveProperty('state', 'kept');
  expect(await texts()).toEqual({ sheet: 'same' });
});

test('the same edit in both tabs is none either where the other one is heard of before the save', async () => {
  const [mine, theirs] = [await openTab(), await openTab()];
  mine.type('same');
  theirs.type('same');
  await theirs.keeper.flush();
  await settle();
  expect(await mine.keeper.flush()).toHaveProperty('state', 'kept');
  expect(await texts()).toEqual({ sheet: 'same' });
});

test('where theirs has gone on meanwhile, the latest is taken, or replaced', async () => {
  for (const action of ['takeTheirs', 'keepMine'] as const) {
    const [mine, theirs] = await collide();
    theirs.type('theirs, later');
    await theirs.keeper.flush();
    const content = (await mine.keeper[action]())!;
    expect(undone(content).slice(0, 2)).toEqual(
      action === 'takeTheirs' ? ['theirs, later', 'mine'] : ['mine', 'theirs, later'],
    );
    expect(await texts()).toEqual({ sheet: action === 'takeTheirs' ? 'theirs, later' : 'mine' });
    await theirs.keeper.close();
    await mine.keeper.close();
  }
});

test('on a full disk my text is said not to be kept beside theirs, and is once there is room', async () => {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  await clock.turn(8 * MINUTE);
  theirs.type('theirs');
  await theirs.keeper.flush();
  mine.type('mine');
  mine.touchy.fault = 'full';
  const state = await mine.keeper.flush();
  expect(state).toMatchObject({
    state: 'elsewhere',
    own: 'unkept',
    mine: { text: 'mine' },
    reason:
      'This sheet was changed in another tab at 14:09. Your text could not be kept beside it. ' +
      'Save it as a file before you close this tab.',
  });
  expect(await texts()).toEqual({ sheet: 'theirs' });
  mine.touchy.fault = 'none';
  await clock.turn(10_000);
  await settle();
  expect(mine.keeper.state()).toHaveProperty('own', 'set aside');
  expect(await texts()).toEqual({ sheet: 'theirs', aside: 'mine' });
});

test('on a full disk my text, kept in place of theirs, is not lost: it stays aside until it stands', async () => {
  const [mine] = await collide();
  mine.touchy.fault = 'full';
  await mine.keeper.keepMine();
  expect(mine.keeper.state()).toHaveProperty('code', 'storage-full');
  expect(await texts()).toEqual({ sheet: 'theirs', aside: 'mine' });
  mine.touchy.fault = 'none';
  await clock.turn(10_000);
  await settle();
  expect(mine.keeper.state()).toHaveProperty('state', 'kept');
  expect(await texts()).toEqual({ sheet: 'mine' });
});

test('a sheet deleted in another tab is said to be, and can be kept', async () => {
  const [mine, theirs] = [await openTab(), await openTab()];
  await theirs.shelf.remove(opened.id);
  await settle();
  expect(mine.keeper.state()).toMatchObject({
    state: 'elsewhere',
    kind: 'deleted',
    own: 'unchanged',
    theirs: null,
    reason: 'This sheet was deleted in another tab. What you see is kept nowhere: keep it, or let it go.',
  });
  expect(await mine.keeper.keepMine()).toMatchObject({ text: opened.text });
  expect(await texts()).toEqual({ sheet: opened.text });
  expect(mine.keeper.state()).toHaveProperty('state', 'kept');
});

test('an edit of a sheet deleted in another tab is set aside until it is kept or let go', async () => {
  for (const action of ['takeTheirs', 'keepMine'] as const) {
    freshDisk();
    const shelf = createTestShelf(clock);
    const result = await shelf.save({ ...opened, revision: 0 }, opened, clock.now());
    expect(result.status).toBe('kept');
    const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
    await theirs.shelf.remove(opened.id);
    mine.type('mine');
    expect(await mine.keeper.flush()).toHaveProperty(
      'reason',
      'This sheet was deleted in another tab. Your text is kept as a second sheet: keep it, or let it go.',
    );
    expect(await texts()).toEqual({ aside: 'mine' });
    const content = await mine.keeper[action]();
    expect(content?.text ?? null).toBe(action === 'keepMine' ? 'mine' : null);
    expect(await texts()).toEqual(action === 'keepMine' ? { sheet: 'mine' } : {});
    await clock.turn(MINUTE);
    expect(await texts()).toEqual(action === 'keepMine' ? { sheet: 'mine' } : {});
    await theirs.keeper.close();
  }
});

test('a text that was let go is not written later on, though it could not be kept before', async () => {
  const [mine, theirs] = [await openTab({ deaf: true }), await openTab()];
  await theirs.shelf.remove(opened.id);
  mine.type('mine');
  mine.touchy.fault = 'full';
  expect(await mine.keeper.flush()).toMatchObject({ kind: 'deleted', own: 'unkept' });
  expect(await mine.keeper.takeTheirs()).toBeNull();
  mine.touchy.fault = 'none';
  await clock.turn(MINUTE);
  await settle();
  expect(await texts()).toEqual({});
  expect(mine.keeper.state()).toEqual({ state: 'kept', at: null });
});

test('what a newer version wrote is neither overwritten nor taken, and my text is kept beside it', async () => {
  const mine = await openTab({ deaf: true });
  await clock.turn(8 * MINUTE);
  const newer = { format: FORMAT + 1, id: opened.id, changed: clock.now(), cells: [] };
  await openStore()('readwrite', (objects) => {
    objects.put(newer, ['sheet', opened.id]);
    return promisifyRequest<void>(objects.transaction);
  });
  mine.type('mine');
  expect(await mine.keeper.flush()).toMatchObject({
    state: 'elsewhere',
    kind: 'unreadable',
    own: 'set aside',
    theirs: null,
    reason:
      'This sheet was changed in another tab at 14:09, in a form that this page cannot read, as a newer version of ' +
      'the program would. It was left as it is, and your text is kept as a second sheet. ' +
      'Load the page again to open both.',
  });
  expect(await mine.keeper.takeTheirs()).toBeNull();
  expect(await mine.keeper.keepMine()).toBeNull();
  expect(await texts()).toEqual({ sheet: 'sheet-newer', aside: 'mine' });
});

test('where the text set aside is deleted from the shelf too, the next edit is set aside anew', async () => {
  const [mine, theirs] = await collide();
  const listed = await theirs.shelf.list();
  const aside = 'sheets' in listed ? listed.sheets.find(({ asideOf }) => asideOf !== null) : undefined;
  await theirs.shelf.remove(aside!.id);
  mine.type('mine, longer');
  expect(await mine.keeper.flush()).toHaveProperty('own', 'set aside');
  expect(await texts()).toEqual({ sheet: 'theirs', aside: 'mine, longer' });
});

test('without a conflict there is nothing to take and nothing to keep', async () => {
  const mine = await openTab();
  expect(await mine.keeper.takeTheirs()).toBeNull();
  expect(await mine.keeper.keepMine()).toBeNull();
  expect(mine.states).toEqual([]);
});

test('a closed keeper hears nothing more', async () => {
  const [mine, theirs] = [await openTab(), await openTab()];
  await mine.keeper.close();
  theirs.type('theirs');
  await theirs.keeper.flush();
  await settle();
  expect(mine.states).toEqual([]);
});

async function load(): Promise<SheetRecord> {
  const found = await createTestShelf(clock).load(opened.id);
  if ('fault' in found) throw new Error(found.fault.text);
  return found.record;
}
