// The text of the sheet with its history and what is computed from it, without any DOM.

export { createSheetDocument } from './document.ts';
export type { SheetDocument } from './document.ts';
