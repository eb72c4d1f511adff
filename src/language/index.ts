// The language of the sheet: text to syntax tree and back, edits as splices, messages.
//
// Spans count UTF-16 units from the start of their line, offsets of splices from the start of the document.
// Numbers are SI. What a user got wrong is in the tree, as a broken entry, body or line with its message.

export type {
  AnotherEntry,
  BinaryExpr,
  CallExpr,
  CellTree,
  CheckEntry,
  Condition,
  Entry,
  Expr,
  FieldBody,
  FieldTree,
  InverseEntry,
  Leg,
  Line,
  LineTree,
  Literal,
  Message,
  NameRef,
  Note,
  NumberExpr,
  PartEntry,
  PathExpr,
  PlotEntry,
  PointEntry,
  QuantityEntry,
  SheetTree,
  Source,
  Span,
  Splice,
  StageEntry,
  UnaryExpr,
  WithExpr,
  WithinExpr,
} from './syntax.ts';
export { entrySpan, setEntry, setLine, setNote, setSource } from './edits.ts';
export { parseExpression } from './expression.ts';
export { literalOf } from './literal.ts';
export { blockOf, deleteLines, insertLines, moveLines } from './line-edits.ts';
export { nearestNames } from './nearest.ts';
export { lineColumn } from './position.ts';
export { printExpr } from './print.ts';
export { isCellName, RESERVED } from './reserved.ts';
export { renameCell } from './rename.ts';
export { pastedBench, readPastedRows } from './pasted-rows.ts';
export { parseSheet } from './sheet.ts';
export { partsOf, pathsOf, walkExpr } from './walk.ts';
export { applySplices, invertSplices } from './splice.ts';
export { cardLines, nameOfCard, readModelCards } from './model-card.ts';
export { readCardNumeral } from './card-numeral.ts';
export { partsOfText, partText, renamedPart } from './part-text.ts';
export { dataSheetLine } from './data-sheet-row.ts';
export type { DataSheetRow } from './data-sheet-row.ts';
