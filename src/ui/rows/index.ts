// The sheet as rows of plain data, and edits of rows as splices of the text; no DOM.

export { rowFault } from './faults.ts';
export { emptyRow } from './row.ts';
export type { Figure, Mark, Row, RowFault, RowName, RowSource } from './row.ts';
export type { EditPlace } from './row-edits.ts';
export { editLabel, editSplices, editText } from './row-edits.ts';
export type { SheetRows } from './sheet-rows.ts';
export { sheetRows } from './sheet-rows.ts';
export { nearestBuyable, nextValue, setTurned, shownDigits, snapped, turnedNumber } from './turning.ts';
export { complete } from './completion.ts';
export type { Completion } from './completion.ts';
export { INSERTIONS, insertionLines } from './insertions.ts';
export type { InsertionChoice } from './insertions.ts';
export { freeName, supplyOf } from './sheet-stock.ts';
export { setNumbers } from './part-numbers.ts';
export type { RowSpread } from './row-spread.ts';
export type { PlotInput } from './plot-against.ts';
export { inputsBehind, plotAgainst, plottedPath, writePlot } from './plot-against.ts';
