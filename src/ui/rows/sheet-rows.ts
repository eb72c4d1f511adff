// The rows of the whole sheet: one for each line that is not blank, and those that no line stands for (results,
// folds, the place for a new line at the end of each section). A row that says what it said before is the old object.

import { entrySpan } from '../../language/index.ts';
import type { Line, SheetTree } from '../../language/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import type { Folding, PlacedRow } from './block-rows.ts';
import { proseEntry } from './cell-row.ts';
import { rowsOfCell } from './rows-of-cell.ts';
import type { Made } from './rows-of-cell.ts';
import { rowFault } from './faults.ts';
import { labelText, wordName } from './names.ts';
import type { RowSpread } from './row-spread.ts';
import { usedValues } from './pinned.ts';
import { emptyRow, MARK_TEXT } from './row.ts';
import type { Mark, Row, RowSource } from './row.ts';
import { sameData } from './same.ts';

export interface SheetRows {
  readonly rows: readonly Row[];
  /** The rows of cells by their keys, for the next time. */
  readonly made: ReadonlyMap<string, Made>;
  row(key: string): Row | null;
  /** The line of the text that a row stands for; for a place for a new line, the line before which it goes; null for results. */
  lineOf(key: string): number | null;
  /** The row of a line, or null (blank, or folded away). */
  ofLine(line: number): Row | null;
}

const NONE: ReadonlySet<string> = new Set();

/** Marks that a folded row passes on, worst first. */
const CHECK_MARKS: readonly Mark[] = ['holds', 'fails', 'fails-at-an-end'];
const WORST: readonly Mark[] = ['broken', 'fails', 'fails-at-an-end'];

const TITLE_FOLD = 'title';
const SHOWN_IN_TITLE = ['number', 'revision', 'status'] as const;
const TITLE_WORDS: Readonly<Record<(typeof SHOWN_IN_TITLE)[number], string>> = {
  number: '',
  revision: 'revision ',
  status: '',
};

const EMPTY_SHEET = 'V_DD = 15 V ± 5 %';

/** The rows of a sheet; rows that are as they were in `previous` are the same objects. */
export function sheetRows(
  sheet: SheetView,
  isFolded: Folding,
  previous: SheetRows | null = null,
  spread: RowSpread | null = null,
): SheetRows {
  const { tree } = sheet;
  const cellAt = new Map(sheet.cells().map((cell) => [cell.tree.line.index, cell]));
  const used = usedValues(tree);
  const inBlock = new Set<number>();
  for (const cell of tree.cells) for (const { line } of [...cell.fields, ...cell.rows]) inBlock.add(line.index);
  const titleFields = new Map((tree.title?.fields ?? []).map((field) => [field.line.index, field]));
  const loose = new Map(tree.loose.map(({ line, message }) => [line.index, message]));
  const keys = keyMaker();
  const allMade = new Map<string, Made>();

  const placed: PlacedRow[] = [];
  for (const [k, section] of sectionsOf(tree).entries()) {
    const inner: PlacedRow[] = [];
    for (const line of section.lines) {
      if (inBlock.has(line.index)) continue;
      const cell = cellAt.get(line.index);
      if (cell) {
        const key = keys(`cell:${cell.name}`);
        const made = rowsOfCell(
          key,
          cell,
          sheet,
          used.get(cell.name) ?? NONE,
          isFolded,
          spread,
          previous?.made.get(key),
        );
        allMade.set(key, made);
        inner.push(...made.rows);
      } else {
        const row = plainRow(line, { titleFields, loose, keys, tree, isFolded });
        if (row) inner.push({ row, line: line.index });
      }
    }
    const ghost = ghostRow(k, section, tree);
    if (section.heading === null) {
      placed.push(...inner, ...(ghost ? [ghost] : []));
      continue;
    }
    const foldKey = keys(`section:${section.heading.text}`);
    const folded = isFolded(foldKey, false);
    const row = sectionRow(k, section.heading, inner, foldKey, !folded, spread);
    placed.push({ row, line: section.heading.line.index });
    if (!folded) placed.push(...inner, ...(ghost ? [ghost] : []));
  }
  return collect(placed, previous, allMade);
}

// ---------------------------------------------------------------- sections

interface Section {
  /** null before the first heading. */
  readonly heading: { readonly line: Line; readonly text: string } | null;
  /** Without its heading. */
  readonly lines: readonly Line[];
}

/** The sheet cut at its headings; the title and what is below it stand before the first. */
function sectionsOf(tree: SheetTree): Section[] {
  const sections: { heading: Section['heading']; lines: Line[] }[] = [{ heading: null, lines: [] }];
  for (const line of tree.lines) {
    const isTitle = line.index === tree.title?.line.index;
    if (line.tree.type === 'heading' && !isTitle) {
      sections.push({ heading: { line, text: line.tree.text }, lines: [] });
    } else {
      sections[sections.length - 1]!.lines.push(line);
    }
  }
  return sections;
}

function sectionRow(
  k: number,
  heading: NonNullable<Section['heading']>,
  inner: readonly PlacedRow[],
  foldKey: string,
  open: boolean,
  spread: RowSpread | null,
): Row {
  const mark = open ? null : (WORST.find((each) => inner.some(({ row }) => row.mark === each)) ?? null);
  return {
    ...emptyRow(`section:${k}`, 'section'),
    mark,
    markText: mark ? `${MARK_TEXT[mark]} inside` : 'section',
    name: wordName(heading.text),
    source: checksText(inner, spread),
    fold: { key: foldKey, open },
    editable: ['name'],
  };
}

function checksText(inner: readonly PlacedRow[], spread: RowSpread | null): RowSource | null {
  const checks = inner.flatMap(({ row }) => (row.mark !== null && CHECK_MARKS.includes(row.mark) ? [row.mark] : []));
  if (checks.length === 0) return null;
  const holding = checks.filter((mark) => mark === 'holds').length;
  const text = `${holding} of ${checks.length} hold ${spread ? 'at every extreme' : 'at the nominal values'}`;
  return { text, note: '', look: holding === checks.length ? 'words' : 'fail' };
}

/** The place for a new line: behind the last line of the section that is not blank. */
function ghostRow(k: number, section: Section, tree: SheetTree): PlacedRow | null {
  const filled = section.lines.filter((line) => line.tree.type !== 'blank');
  const hasCells = filled.some((line) => line.tree.type === 'cell' || line.tree.type === 'broken');
  const alone = tree.lines.every((line) => line.tree.type !== 'heading' || line.index === tree.title?.line.index);
  if (section.heading === null && !hasCells && !alone) return null;
  const last = filled.at(-1)?.index ?? section.heading?.line.index ?? -1;
  const isEmpty = tree.cells.length === 0 && section.heading === null;
  const hint = isEmpty ? `new line, such as ${EMPTY_SHEET}` : 'new line: name = entry';
  return {
    line: last + 1,
    row: {
      ...emptyRow(`ghost:${k}`, 'ghost'),
      markText: 'new line',
      name: wordName('', 'new line at the end of the section'),
      entry: { text: hint, look: 'words' },
      editable: ['name', 'entry'],
    },
  };
}

// ---------------------------------------------------------------- lines that are no cells

interface Surroundings {
  readonly titleFields: ReadonlyMap<number, { readonly label: Parameters<typeof labelText>[0] }>;
  readonly loose: ReadonlyMap<number, Parameters<typeof rowFault>[0]>;
  readonly keys: (wanted: string) => string;
  readonly tree: SheetTree;
  readonly isFolded: Folding;
}

function plainRow(line: Line, { titleFields, loose, keys, tree, isFolded }: Surroundings): Row | null {
  const read = line.tree;
  const { start, end } = entrySpan(line);
  const text = line.text.slice(start, end);
  const key = `line:${line.index}`;
  if (line.index === tree.title?.line.index) return titleRow(text, tree, isFolded);
  const field = titleFields.get(line.index);
  if (field) {
    if (isFolded(TITLE_FOLD, true)) return null;
    const label = labelText(field.label);
    const row = emptyRow(keys(`title:${label}`), 'title-field');
    return { ...row, markText: 'title', name: wordName(label), entry: proseEntry(text), editable: ['entry'] };
  }
  const fault = loose.get(line.index);
  if (fault || read.type === 'broken') {
    return {
      ...emptyRow(key, 'line'),
      mark: 'broken',
      markText: MARK_TEXT.broken,
      entry: { text, look: 'formula' },
      fault: fault ? rowFault(fault, line) : null,
      editable: ['entry'],
    };
  }
  if (read.type === 'prose' || read.type === 'note') {
    return { ...emptyRow(key, read.type), markText: read.type, entry: proseEntry(text), editable: ['entry'] };
  }
  return null;
}

/** The title, with what is filled in below it said in one line while that is folded. */
function titleRow(text: string, tree: SheetTree, isFolded: Folding): Row {
  const fields = tree.title?.fields ?? [];
  const open = fields.length > 0 && !isFolded(TITLE_FOLD, true);
  const row: Row = { ...emptyRow('title', 'title'), markText: 'title', name: wordName(text), editable: ['name'] };
  if (fields.length === 0) return row;
  const said = SHOWN_IN_TITLE.flatMap((label) => {
    const field = fields.find((each) => labelText(each.label) === label);
    return field?.body.type === 'text' && field.body.text !== '' ? [TITLE_WORDS[label] + field.body.text] : [];
  });
  const count = `${fields.length} lines`;
  const source: RowSource = { text: open ? '' : [...said, count].join(' · '), note: '', look: 'words' };
  return { ...row, source, fold: { key: TITLE_FOLD, open } };
}

// ---------------------------------------------------------------- identity

/** Gives each key out once: a second one of the same spelling bears `#2`. */
function keyMaker(): (wanted: string) => string {
  const seen = new Map<string, number>();
  return (wanted) => {
    const nth = (seen.get(wanted) ?? 0) + 1;
    seen.set(wanted, nth);
    return nth === 1 ? wanted : `${wanted}#${nth}`;
  };
}

function collect(placed: readonly PlacedRow[], previous: SheetRows | null, made: ReadonlyMap<string, Made>): SheetRows {
  const byKey = new Map<string, Row>();
  const lines = new Map<string, number | null>();
  const byLine = new Map<number, Row>();
  const rows = placed.map(({ row: fresh, line }) => {
    const old = previous?.row(fresh.key) ?? null;
    const row = old !== null && sameData(old, fresh) ? old : fresh;
    byKey.set(row.key, row);
    lines.set(row.key, line);
    if (line !== null && row.type !== 'ghost') byLine.set(line, row);
    return row;
  });
  return {
    rows,
    made,
    row: (key) => byKey.get(key) ?? null,
    lineOf: (key) => lines.get(key) ?? null,
    ofLine: (line) => byLine.get(line) ?? null,
  };
}
