// What is open before a record can be issued: fields of the title that are missing, broken and uncomputed cells,
// failing checks, numbers that are assumed, have no source, or were taken by the sheet itself.

import { lineColumn } from '../language/index.ts';
import type { FieldTree, Line } from '../language/index.ts';
import type { CellReading, Fault, Sheet } from '../sheet/index.ts';
import { originOf } from './source.ts';
import { TITLE_LABELS, titleField } from './title-fields.ts';
import type { TitleField } from './title-fields.ts';
import { failingText, verdictOf } from './verdict.ts';
import type { JudgedSpread } from './verdict.ts';

export interface OpenPoint {
  readonly kind: 'field' | 'broken' | 'waiting' | 'failing' | 'assumed' | 'no source' | 'taken';
  /** The cell to go to; null where it concerns none. */
  readonly cell: string | null;
  /** Line of the sheet from 0; null where it stands in none. */
  readonly line: number | null;
  readonly text: string;
}

/** Fields without which a record cannot be filed; the others may stay empty. */
const NEEDED: readonly TitleField[] = ['project', 'number', 'revision', 'status', 'date', 'author', 'checker'];

/** Everything that is open, the gravest first, each kind in sheet order. */
export function openPoints(sheet: Sheet, judged: JudgedSpread | null = null): readonly OpenPoint[] {
  const cells = sheet.cells();
  return [
    ...brokenPoints(sheet),
    ...verdictOf(sheet, judged).failing.map((cell): OpenPoint =>
      point('failing', cell, `${cell.name} ${failingText(cell, judged)}.`),
    ),
    ...cells.flatMap((cell) => inputPoints('assumed', cell, inputLines(cell, sheet).filter(isAssumed))),
    ...sheet.assumptions().map(({ cell, text }): OpenPoint => {
      const line = sheet.cell(cell)?.tree.line.index ?? null;
      return { kind: 'taken', cell, line, text: text.startsWith(cell) ? text : `${cell}: ${text}` };
    }),
    ...cells.flatMap((cell) => inputPoints('no source', cell, inputLines(cell, sheet).filter(isUnsourced))),
    ...NEEDED.filter((label) => titleField(sheet.tree, label) === null).map((label): OpenPoint => {
      const line = sheet.tree.title?.line.index ?? null;
      return { kind: 'field', cell: null, line, text: `${TITLE_LABELS[label]}: not given.` };
    }),
  ];
}

/** Every line that is an input: the cell itself, or a field of a part or point. */
interface InputLine {
  /** `R_D = 6.8 kohm ± 1 %`, `Q1 lambda: 0.004 /V`. */
  readonly text: string;
  readonly line: Line;
  /** null where there is none. */
  readonly source: string | null;
}

/** The inputs of a cell, in sheet order. */
function inputLines(cell: CellReading, sheet: Sheet): readonly InputLine[] {
  const { tree } = cell;
  const { lines } = sheet.tree;
  const line = (text: string, at: Line): InputLine => ({ text, line: at, source: originOf(at, lines).source });
  const own = cell.isInput ? [line(`${cell.name} = ${typed(tree.line, tree.entry.span)}`, tree.line)] : [];
  const inputs = new Set(cell.fields.filter(({ isInput }) => isInput).map((field) => field.line));
  const fields = tree.fields
    .filter((field) => inputs.has(field.line.index))
    .map((field) => line(`${cell.name} ${labelOf(field)}: ${typed(field.line, field.body.span)}`, field.line));
  return [...own, ...fields];
}

/** How many inputs a sheet has, and how well they are founded. */
export function inputTally(sheet: Sheet): {
  readonly inputs: number;
  readonly assumed: number;
  readonly unsourced: number;
} {
  const inputs = sheet.cells().flatMap((cell) => inputLines(cell, sheet));
  return {
    inputs: inputs.length,
    assumed: inputs.filter(isAssumed).length,
    unsourced: inputs.filter(isUnsourced).length,
  };
}

/** `line 12, column 8: what is wrong`. */
export function faultLine(sheet: Sheet, { line, span, text }: Fault): string {
  return `line ${line + 1}, column ${lineColumn(sheet.tree.lines[line]!, span.start)}: ${text}`;
}

/** What stands at a span of a line, without the blanks around it. */
export function typed(line: Line, span: { readonly start: number; readonly end: number }): string {
  return line.text.slice(span.start, span.end).trim();
}

export function labelOf({ label }: Pick<FieldTree, 'label'>): string {
  return label.map(({ name }) => name).join('.');
}

function isAssumed({ source }: InputLine): boolean {
  return source === 'assumed';
}

function isUnsourced({ source }: InputLine): boolean {
  return source === null;
}

function brokenPoints(sheet: Sheet): OpenPoint[] {
  const { broken, waiting } = verdictOf(sheet);
  const named = (names: readonly string[], kind: 'broken' | 'waiting'): OpenPoint[] =>
    sheet
      .cells()
      .filter(({ name }) => names.includes(name))
      .filter(({ fault }) => kind === 'waiting' || (fault !== null && fault.code !== 'waits-for'))
      .map((cell) => {
        const words =
          cell.fault === null
            ? 'has no value.'
            : cell.waitsFor === null
              ? faultLine(sheet, cell.fault)
              : cell.fault.text;
        return point(
          kind,
          cell,
          cell.fault === null || cell.waitsFor !== null ? `${cell.name} ${words}` : `${cell.name}, ${words}`,
        );
      });
  const loose = sheet.loose().map((fault): OpenPoint => {
    return { kind: 'broken', cell: null, line: fault.line, text: faultLine(sheet, fault) };
  });
  return [
    ...[...named(broken, 'broken'), ...loose].toSorted((a, b) => a.line! - b.line!),
    ...named(waiting, 'waiting'),
  ];
}

function point(kind: OpenPoint['kind'], cell: CellReading, text: string): OpenPoint {
  return { kind, cell: cell.name, line: cell.tree.line.index, text };
}

function inputPoints(kind: OpenPoint['kind'], cell: CellReading, inputs: readonly InputLine[]): OpenPoint[] {
  return inputs.map(({ text, line }) => ({ kind, cell: cell.name, line: line.index, text }));
}
