// The sheet in its own order: headings and prose in place, inputs and formulas with their values in tables, parts as
// data sheets print them, stages drawn, with their wiring and what they come to.

import { drawSchematic, schematicOf, svgText, TOKENS } from '../figure/index.ts';
import type { CellReading, Sheet } from '../sheet/index.ts';
import { benchBlocks } from './bench-blocks.ts';
import { enteredTable } from './entered-table.ts';
import { EMPTY_CELL, name, plainText, sentence, strong } from './inline.ts';
import { leadProse } from './lead-prose.ts';
import { faultLine, typed } from './open-points.ts';
import { originCell } from './origin-cell.ts';
import { offeredBlocks, partBlocks } from './part-blocks.ts';
import type { Block, Cell, Figure, Inlines, TableRow } from './record-tree.ts';
import { shownCell } from './shown.ts';
import type { SheetSpread } from '../spread/index.ts';
import { stageEnds } from './stage-ends.ts';
import { inputCells, spreadCells, valueCell } from './value-cells.ts';
import type { JudgedSpread } from './verdict.ts';
import { shareText } from './yield-text.ts';

const INPUT_COLUMNS = [
  { title: 'name', kind: 'text' },
  { title: 'as entered', kind: 'text' },
  { title: 'low', kind: 'number' },
  { title: 'nominal', kind: 'number' },
  { title: 'high', kind: 'number' },
  { title: 'source and note', kind: 'text' },
] as const;
const KINDS: Readonly<Record<string, string>> = {
  part: 'part',
  another: 'part',
  point: 'point',
  stage: 'stage',
  bench: 'bench',
};

/** The blocks of the sheet; `number` is that of their section. */
export function sheetBlocks(sheet: Sheet, number: string, judged: JudgedSpread | null): readonly Block[] {
  return new SheetWriter(sheet, number, judged?.spread ?? null).blocks();
}

class SheetWriter {
  readonly #blocks: Block[] = [];
  readonly #sheet: Sheet;
  readonly #number: string;
  readonly #spread: SheetSpread | null;
  #rows: TableRow[] = [];
  #prose: string[] = [];
  #headings = 0;

  constructor(sheet: Sheet, number: string, spread: SheetSpread | null) {
    this.#sheet = sheet;
    this.#number = number;
    this.#spread = spread;
  }

  blocks(): readonly Block[] {
    const { lines, title } = this.#sheet.tree;
    const cells = new Map(this.#sheet.cells().map((cell) => [cell.tree.line.index, cell]));
    // That stands with the result.
    const told = new Set(leadProse(this.#sheet.tree));
    for (const line of lines) {
      const { tree } = line;
      if (tree.type !== 'prose') this.#endProse();
      if (tree.type === 'prose') {
        this.#endTable();
        if (!told.has(line)) this.#prose.push(tree.text);
      } else if (tree.type === 'heading' && line !== title?.line) this.#heading(plainText(tree.text), '');
      else this.#cell(cells.get(line.index) ?? null);
    }
    this.#endProse();
    this.#endTable();
    return this.#blocks.filter((block, at) => !isEmptyHeading(block, this.#blocks[at + 1]));
  }

  #cell(cell: CellReading | null): void {
    if (cell === null) return;
    if (cell.kind === 'check' || cell.kind === 'plot') return;
    if (!(cell.kind in KINDS)) {
      this.#rows.push(quantityRow(cell, this.#sheet, this.#spread));
      return;
    }
    this.#endTable();
    const entry = typed(cell.tree.line, cell.tree.entry.span);
    const note = originCell(cell.tree.line, this.#sheet, false).content;
    const remark: Inlines = note.length === 0 ? [] : [...plainText(': '), ...note];
    this.#blocks.push({
      type: 'paragraph',
      tone: 'plain',
      content: [strong(cell.name), ...plainText(', '), ...plainText(entry), ...remark],
    });
    if (cell.fault !== null) this.#blocks.push(faultBlock(cell, this.#sheet));
    this.#blocks.push(...this.#blockOf(cell));
  }

  #blockOf(cell: CellReading): readonly Block[] {
    if (cell.kind === 'stage') return stageBlocks(cell, this.#sheet, this.#spread);
    return cell.kind === 'bench' ? benchBlocks(cell, this.#sheet) : partBlocks(cell, this.#sheet);
  }

  #heading(content: Inlines, remark: string): void {
    this.#endTable();
    this.#blocks.push({ type: 'heading', number: `${this.#number}.${++this.#headings}`, content, remark });
  }

  #endTable(): void {
    if (this.#rows.length === 0) return;
    this.#blocks.push({ type: 'table', name: 'inputs', columns: INPUT_COLUMNS, rows: this.#rows });
    this.#rows = [];
  }

  /** Lines of prose that follow each other are one paragraph. */
  #endProse(): void {
    if (this.#prose.length === 0) return;
    this.#blocks.push({ type: 'paragraph', tone: 'prose', content: sentence(this.#prose.join(' ')) });
    this.#prose = [];
  }
}

function quantityRow(cell: CellReading, sheet: Sheet, spread: SheetSpread | null): TableRow {
  const { line, entry } = cell.tree;
  const origin = originCell(line, sheet, cell.isInput);
  const answered = spread?.value(cell.name)?.answered ?? null;
  const remark = answered && `just one answer in ${shareText(answered.share)} of builds`;
  const cells: Cell[] = [
    { content: [name(cell.name)] },
    { content: [{ type: 'entry', text: typed(line, entry.span) }] },
    ...numbersOf(cell, spread),
    {
      content: [
        ...origin.content,
        ...(remark === null ? [] : plainText(origin.content.length > 0 ? `; ${remark}` : remark)),
      ],
    },
  ];
  return { mark: null, cells };
}

function numbersOf(cell: CellReading, spread: SheetSpread | null): [Cell, Cell, Cell] {
  if (cell.fault !== null) {
    const words = cell.waitsFor === null ? 'broken' : `waits for ${cell.waitsFor}`;
    return [EMPTY_CELL, { content: [strong(words)] }, EMPTY_CELL];
  }
  if (cell.isInput && cell.reading) return inputCells(cell.reading, cell);
  const ends = cell.reading && spreadCells(cell.reading, spread?.value(cell.name) ?? null);
  if (ends) return ends;
  const shown = shownCell(cell);
  return [EMPTY_CELL, shown === null ? { content: plainText('no value') } : valueCell(shown), EMPTY_CELL];
}

function stageBlocks(cell: CellReading, sheet: Sheet, spread: SheetSpread | null): readonly Block[] {
  const wiring = enteredTable(cell, sheet, ['place', 'what hangs on it']);
  const offered = offeredBlocks(cell);
  const values = offered.find(({ type }) => type === 'values') ?? null;
  const stage: Block = { type: 'stage', drawing: schematic(cell, sheet), wiring, values };
  const ends = spread && cell.fault === null ? endsBlocks(cell, spread) : [];
  return [stage, ...offered.filter((block) => block !== values), ...ends];
}

const ENDS_COLUMNS = [
  { title: 'over the declared set', kind: 'text' },
  { title: 'low', kind: 'text' },
  { title: 'low device', kind: 'text' },
  { title: 'nominal', kind: 'text' },
  { title: 'high device', kind: 'text' },
  { title: 'high', kind: 'text' },
  { title: 'max : min', kind: 'text' },
] as const;

/** The ends table of a stage; nothing where nothing moves it. */
function endsBlocks(cell: CellReading, spread: SheetSpread): readonly Block[] {
  const rows = stageEnds(cell, spread).map((end): TableRow => ({
    mark: null,
    cells: [
      { content: [name(end.name, cell.name)] },
      ...[end.low, end.lowDevice, end.nominal, end.highDevice, end.high, end.ratio].map((text) => ({
        content: plainText(text),
      })),
    ],
  }));
  return rows.length === 0 ? [] : [{ type: 'table', name: 'ends', columns: ENDS_COLUMNS, rows }];
}

function schematic(cell: CellReading, sheet: Sheet): Figure | null {
  const stage = cell.fault === null ? sheet.stage(cell.name) : null;
  if (stage === null) return null;
  const drawing = drawSchematic(schematicOf(stage, sheet));
  const svg = svgText(drawing, { id: `record-${cell.name}`, colors: TOKENS });
  return { kind: 'schematic', svg, caption: plainText(`${drawing.title}, at rest, nominal values`) };
}

function faultBlock(cell: CellReading, sheet: Sheet): Block {
  const words = cell.waitsFor === null ? faultLine(sheet, cell.fault!) : cell.fault!.text;
  return {
    type: 'paragraph',
    tone: 'plain',
    content: [strong('Not computed: '), ...sentence(words)],
  };
}

/** A heading under which only checks, figures or nothing stand; those have sections of their own. */
function isEmptyHeading(block: Block, next: Block | undefined): boolean {
  return block.type === 'heading' && (next === undefined || next.type === 'heading');
}
