// What a page of the tests of storage can call.

import { sha256Hex } from '../../src/numeric/index.ts';
import * as storage from '../../src/storage/index.ts';
import type { Keeper, KeepState, SheetRecord, Shelf } from '../../src/storage/index.ts';

export { sha256Hex, storage };

export interface Desk {
  shelf: Shelf;
  keeper: Keeper;
  record: SheetRecord;
  states: KeepState[];
  type(text: string): void;
}

/** Opens a sheet as the page does: the one called `id`, or a draft. */
export async function openDesk(id?: string): Promise<Desk> {
  const { createKeeper, createShelf, followPage, joinTabs, openStore, pageSchedule, randomId } = storage;
  const now = () => Date.now();
  const tabs = joinTabs();
  const shelf = createShelf({ store: openStore(), tabs, now, newId: randomId });
  const loaded = id === undefined ? { record: shelf.draft({}) } : await shelf.load(id);
  if ('fault' in loaded) throw new Error(loaded.fault.text);
  const { record } = loaded;
  const states: KeepState[] = [];
  const onState = (state: KeepState) => void states.push(state);
  const keeper = createKeeper(record, { shelf, tabs, now, schedule: pageSchedule, onState });
  followPage(keeper, window);
  let content: storage.SheetContent = record;
  const type = (text: string) => {
    const edited = storage.edit(content, storage.splicesBetween(content.text, text), 'typing');
    content = { ...edited, folded: content.folded };
    keeper.keep(content);
  };
  return { shelf, keeper, record, states, type };
}
