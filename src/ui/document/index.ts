// The text of the sheet with its history and what is computed from it, without any DOM.

export { createSheetDocument } from './document.ts';
export type { SheetDocument } from './document.ts';
export { EMPTY_HISTORY } from './history.ts';
export type { History, Step } from './history.ts';
