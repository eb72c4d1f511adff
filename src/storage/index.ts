// What is kept and passed on: the shelf of this browser with the undo history, share links, files.
//
// Moments are milliseconds of the epoch, lengths of text UTF-16 units. What the browser or other people's input
// does to us is a value with a code and whole sentences; what is our own fault throws.

export type { Edited, History } from './history.ts';
export { edit, EMPTY_HISTORY, redo, splicesBetween, undo } from './history.ts';
export type { Keeper, KeepState, Schedule } from './keeper.ts';
export { createKeeper } from './keeper.ts';
export { followPage, pageSchedule } from './page-life.ts';
export type { StorageFault } from './sentences.ts';
export { timeText } from './sentences.ts';
export type { SheetContent, SheetHead, SheetRecord } from './sheet-record.ts';
export { titleOf } from './sheet-record.ts';
export type { Shelf } from './shelf.ts';
export { createShelf, randomId } from './shelf.ts';
export { openStore } from './store.ts';
export type { TabNews, Tabs } from './tabs.ts';
export { joinTabs } from './tabs.ts';
export { fileName, openFile, saveFile } from './file.ts';
export type { Written } from './share-link.ts';
export { LINK_LIMIT, readLink, TEXT_LIMIT, writeLink } from './share-link.ts';
export type { KeptPart, PartShelf, ShownPart } from './part-shelf.ts';
export { createPartShelf } from './part-shelf.ts';
