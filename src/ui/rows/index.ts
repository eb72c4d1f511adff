// The sheet as rows of plain data, and edits of rows as splices of the text; no DOM.

export type { Folding } from './block-rows.ts';
export { rowFault } from './faults.ts';
export { emptyRow } from './row.ts';
export type { Figure, Mark, Row, RowEntry, RowFault, RowFold, RowName, RowSource, RowType } from './row.ts';
export type { EditPlace } from './row-edits.ts';
export { editLabel, editSplices, editText } from './row-edits.ts';
export type { SheetRows } from './sheet-rows.ts';
export { sheetRows } from './sheet-rows.ts';
export { nextValue, setTurned, snapped, turnedNumber } from './turning.ts';
export { complete } from './completion.ts';
export type { Completion } from './completion.ts';
export type { Suggestion } from './suggestions.ts';
export { INSERTIONS, insertionLines } from './insertions.ts';
export type { Insertion, InsertionChoice } from './insertions.ts';
export { setNumbers } from './part-numbers.ts';
