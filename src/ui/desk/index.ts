// The shared state of the panes and the commands of the page, without any DOM.

export { commandForKey, keyOf } from './command.ts';
export type { Command } from './command.ts';
export { insertBlock } from './insert-block.ts';
export { COLUMNS, createDesk } from './desk.ts';
export type { Column, Desk } from './desk.ts';
