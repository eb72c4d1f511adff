// The row of a cell's own line, one maker for each kind of cell.

import { literalOf } from '../../language/index.ts';
import type { CellTree, Entry, Line, Note, Source } from '../../language/index.ts';
import { checkText } from '../../record/index.ts';
import type { CellKind, CellReading, SheetView } from '../../sheet/index.ts';
import type { Column } from '../desk/index.ts';
import { checkNumbers } from './check-numbers.ts';
import { isBroken, rowFault } from './faults.ts';
import { cellName } from './names.ts';
import { inputNumbers, NO_NUMBERS, typedUnit, valueFigure } from './numbers.ts';
import type { Numbers } from './numbers.ts';
import { failsAtAnEnd, numbersAt } from './row-spread.ts';
import type { RowSpread } from './row-spread.ts';
import { emptyRow, MARK_TEXT } from './row.ts';
import type { Mark, Row, RowEntry, RowSource } from './row.ts';

const EDITABLE: readonly Column[] = ['name', 'entry', 'source'];

const KIND_MARKS: Readonly<Record<CellKind, Mark>> = {
  quantity: 'computed',
  part: 'part',
  another: 'computed',
  point: 'part',
  stage: 'stage',
  bench: 'part',
  check: 'holds',
  plot: 'figure',
  inverse: 'inverse',
  broken: 'broken',
};

/** The row of a cell, whatever its kind. */
export function cellRow(key: string, cell: CellReading, sheet: SheetView, spread: RowSpread | null): Row {
  const { tree } = cell;
  const { line } = tree;
  if (line.tree.type === 'broken') return brokenLineRow(key, cell, line);
  const broken = isBroken(cell.fault);
  const atEnd = failsAtAnEnd(cell, spread);
  const mark = broken ? 'broken' : atEnd === null ? markOf(cell) : 'fails-at-an-end';
  const text = line.text.slice(tree.entry.span.start, tree.entry.span.end);
  return {
    ...emptyRow(key, 'cell'),
    cell: cell.name,
    mark,
    markText: MARK_TEXT[mark],
    name: cellName(line.text.slice(tree.name.span.start, tree.name.span.end)),
    entry: { text, look: cell.isInput && !broken ? 'input' : 'formula' },
    ...(broken ? NO_NUMBERS : numbersOf(cell, sheet, spread)),
    turns: cell.isInput && nominalOf(tree) !== null,
    source: atEnd === null ? sourceOf(cell, broken) : { text: atEnd, note: cell.tree.note?.text ?? '', look: 'fail' },
    fault: broken && cell.fault!.line === line.index ? rowFault(cell.fault!, line) : null,
    cautions: ownCautions(cell),
    waitsFor: cell.waitsFor,
    editable: EDITABLE,
  };
}

/** The mark of an input by what its source says. */
export function inputMark(source: Source | null): Mark {
  if (source === null) return 'no-source';
  return source.text.trim() === 'assumed' ? 'assumed' : 'input';
}

/** Source and note of a line as they are shown. */
export function shownSource(source: Source | null, note: Note | null, isInput: boolean): RowSource | null {
  if (source === null && note === null && !isInput) return null;
  const look = source === null ? (isInput ? 'missing' : 'plain') : source.text === 'assumed' ? 'assumed' : 'plain';
  return { text: source?.text ?? (isInput ? 'no source yet' : ''), note: note?.text ?? '', look };
}

function brokenLineRow(key: string, cell: CellReading, line: Line): Row {
  return {
    ...emptyRow(key, 'line'),
    cell: cell.name,
    mark: 'broken',
    markText: MARK_TEXT.broken,
    entry: { text: line.text, look: 'formula' },
    fault: cell.fault ? rowFault(cell.fault, line) : null,
    editable: ['entry'],
  };
}

function markOf(cell: CellReading): Mark {
  if (cell.kind === 'check') return cell.check === null ? 'computed' : cell.check.holds ? 'holds' : 'fails';
  if (cell.kind === 'quantity' && cell.isInput) return inputMark(cell.tree.source);
  return KIND_MARKS[cell.kind];
}

function numbersOf(cell: CellReading, sheet: SheetView, spread: RowSpread | null): Numbers {
  const { tree } = cell;
  if (cell.kind === 'check' && tree.entry.type === 'check' && cell.check !== null) {
    return checkNumbers(tree.entry.condition, tree.line, sheet, spread);
  }
  if (cell.reading === null) return NO_NUMBERS;
  if (!cell.isInput && cell.spread === null) {
    return numbersAt(cell.name, cell.reading, spread) ?? { ...NO_NUMBERS, nominal: valueFigure(cell.reading) };
  }
  return inputNumbers(cell.reading, cell.spread, {
    unit: typedUnit(nominalOf(tree) ?? firstBound(tree.entry), tree.line.text),
    endsTyped: cell.spread?.form === 'limits',
  });
}

function sourceOf(cell: CellReading, broken: boolean): RowSource | null {
  const { tree } = cell;
  if (cell.kind === 'check' && !broken && cell.check !== null) {
    const note = tree.note?.text ?? tree.source?.text ?? '';
    const { holds } = cell.check;
    const said = checkText(cell);
    const text = said.replace(/^(?:holds|fails), /, '');
    return { text, note, look: holds ? 'ok' : 'fail' };
  }
  const shown = shownSource(tree.source, tree.note, cell.isInput && !broken);
  if (cell.fault?.code === 'not-computed-yet' && shown === null) {
    return { text: cell.fault.text, note: '', look: 'words' };
  }
  return shown;
}

function ownCautions(cell: CellReading): readonly string[] {
  return cell.cautions.filter((caution) => caution.line === cell.tree.line.index).map((caution) => caution.text);
}

function nominalOf(tree: CellTree): ReturnType<typeof literalOf> {
  const { entry } = tree;
  return entry.type === 'quantity' && entry.value ? literalOf(entry.value) : null;
}

function firstBound(entry: Entry): ReturnType<typeof literalOf> {
  if (entry.type !== 'quantity') return null;
  return entry.spread?.bounds?.first ?? entry.spread?.bounds?.last ?? null;
}

/** The entry of a line that is text alone. */
export function proseEntry(text: string): RowEntry {
  return { text, look: 'prose' };
}
