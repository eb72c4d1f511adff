// Rows on the clipboard: sheet text for sheets, a table for spreadsheets; and what is pasted back.

import { escapeXml } from '../../figure/index.ts';
import { blockOf, insertLines } from '../../language/index.ts';
import type { Figure, Row } from '../rows/index.ts';
import { setNumbers } from '../rows/index.ts';
import type { Grid } from './grid.ts';
import { removeRows } from './row-commands.ts';

/** Puts the rows of the range on the clipboard; `cut` takes them from the sheet. */
export function copyRows(grid: Grid, event: ClipboardEvent, cut: boolean): void {
  // Text that was marked with the pointer is copied as it is.
  if (!cut && getSelection()?.isCollapsed === false) return;
  const text = rowsText(grid);
  if (!event.clipboardData || text === '') return;
  event.clipboardData.setData('text/plain', text);
  event.clipboardData.setData('text/html', rowsTable(grid));
  event.preventDefault();
  if (cut) removeRows(grid);
}

/** Takes pasted text: numbers of a table into a data-sheet row, lines as lines, anything else as an entry. */
export function pasteInto(grid: Grid, event: ClipboardEvent): void {
  const pasted = event.clipboardData?.getData('text/plain') ?? '';
  const selection = grid.desk.selection();
  const row = selection && grid.row(selection.row);
  if (pasted === '' || !selection || !row) return;
  event.preventDefault();
  if (pasteNumbers(grid, row, pasted) || pasteLines(grid, pasted)) return;
  grid.edit({ text: pasted.trim() });
}

/** Puts several lines, pasted while a line is edited, in the place of that line; says whether they were several. */
export function pasteLinesWhileEditing(grid: Grid, pasted: string): boolean {
  const editing = grid.editor.editing();
  if (!editing?.place.isNew || !/\n\s*\S/.test(pasted)) return false;
  const { line } = editing.place;
  grid.cancel();
  putLines(grid, line, pasted);
  return true;
}

function pasteNumbers(grid: Grid, row: Row, pasted: string): boolean {
  const numbers = pasted.trim().split('\t');
  const line = grid.lineOf(row.key);
  if (numbers.length < 2 || numbers.length > 3 || line === null || !row.editable.includes('low')) return false;
  const { document } = grid.desk;
  document.edit(
    setNumbers(
      document.tree(),
      line,
      numbers.map((each) => each.trim()),
    ),
    `paste ${row.name?.text}`,
  );
  return true;
}

function pasteLines(grid: Grid, pasted: string): boolean {
  if (!/\n\s*\S/.test(pasted) && !/^\s*[\w.Ͱ-Ͽ]+\s*[=:]/.test(pasted)) return false;
  const selection = grid.desk.selection()!;
  const tree = grid.desk.document.tree();
  const row = grid.row(selection.row)!;
  const own = grid.lineOf(selection.row);
  const block = own === null || row.type !== 'cell' ? null : blockOf(tree, own);
  const before =
    row.type === 'ghost' ? own! : block ? block.first + block.count : own === null ? tree.lines.length : own + 1;
  putLines(grid, before, pasted);
  return true;
}

function putLines(grid: Grid, before: number, pasted: string): void {
  const { document } = grid.desk;
  document.edit(insertLines(document.tree(), before, pasted.replace(/\s+$/, '')), 'paste lines');
  grid.focusLine(before, 'entry');
}

/** The text of the lines of the range; results have none. */
function rowsText(grid: Grid): string {
  const { lines } = grid.desk.document.tree();
  const taken = new Set<number>();
  for (const key of grid.range()) {
    const row = grid.row(key);
    const line = grid.lineOf(key);
    if (!row || line === null || row.type === 'ghost') continue;
    const folded = row.fold?.open === false && row.type !== 'title';
    const { first, count } = folded ? blockOf(grid.desk.document.tree(), line) : { first: line, count: 1 };
    for (let index = first; index < first + count; index++) taken.add(index);
  }
  const text = [...taken].toSorted((a, b) => a - b).map((index) => lines[index]!.text);
  return text.length === 0 ? '' : `${text.join('\n')}\n`;
}

function rowsTable(grid: Grid): string {
  const number = (figure: Figure | null): string => figure?.number.replaceAll('−', '-').replaceAll('\u2009', '') ?? '';
  const rows = grid.range().flatMap((key) => {
    const row = grid.row(key);
    if (!row || row.type === 'ghost') return [];
    const cells = [
      row.name?.text ?? '',
      row.entry?.text ?? '',
      number(row.low),
      number(row.nominal),
      number(row.high),
      row.nominal?.unit ?? '',
      [row.source?.text, row.source?.note].filter((each) => each).join('; '),
    ];
    return [`<tr>${cells.map((cell) => `<td>${escapeXml(cell)}</td>`).join('')}</tr>`];
  });
  return `<table>${rows.join('')}</table>`;
}
