// A sheet from its lines. Each line is read on its own in the context of the block above it, and its tree is
// kept by (context, text) for the next parse: an edit reads anew only what it touched, and every other
// line keeps the very object it had.

import type { Context } from './context.ts';
import { contextBelow, FIRST_CONTEXT } from './context.ts';
import { parseLine } from './line.ts';
import { message } from './messages.ts';
import { splitLines } from './split-lines.ts';
import type { CellTree, FieldTree, Line, LineTree, LooseLine, NameRef, RowTree, SheetTree } from './syntax.ts';
import { CHECKED } from './title-fields.ts';

type Kept = Map<Context, Map<string, LineTree>>;

/** The line trees of sheets that were parsed, for parsing what an edit makes of them. */
const KEPT = new WeakMap<SheetTree, Kept>();

/** Reads a sheet; faults are in the tree. Lines that `previous` has in the same context keep their tree objects. */
export function parseSheet(text: string, previous?: SheetTree): SheetTree {
  const before = previous && KEPT.get(previous);
  const kept: Kept = new Map();
  const lines: Line[] = [];
  let context = FIRST_CONTEXT;
  for (const raw of splitLines(text)) {
    const tree = lineTree(raw.text, context, kept, before);
    lines.push({ index: lines.length, offset: raw.offset, text: raw.text, tree });
    context = contextBelow(context, tree, raw.text);
  }
  const sheet = { text, lines, ...assemble(lines) };
  KEPT.set(sheet, kept);
  return sheet;
}

function lineTree(text: string, context: Context, kept: Kept, before: Kept | undefined): LineTree {
  let trees = kept.get(context);
  if (!trees) kept.set(context, (trees = new Map()));
  let tree = trees.get(text);
  if (!tree) {
    tree = before?.get(context)?.get(text) ?? parseLine(text, context);
    trees.set(text, tree);
  }
  return tree;
}

// ---------------------------------------------------------------- assembly

interface Assembled {
  title: SheetTree['title'];
  cells: CellTree[];
  loose: LooseLine[];
}

function assemble(lines: readonly Line[]): Assembled {
  const sheet: Assembled = { title: null, cells: [], loose: [] };
  let fields: FieldTree[] = [];
  let rows: RowTree[] = [];
  for (const line of lines) {
    const { tree } = line;
    if (tree.type === 'cell' || (tree.type === 'broken' && tree.name)) {
      const cell = tree.type === 'cell' ? tree : brokenCell(tree.name!, tree, line);
      fields = [];
      rows = [];
      sheet.cells.push({
        name: cell.name,
        entry: cell.entry,
        source: cell.source,
        note: cell.note,
        line,
        fields,
        rows,
      });
    } else if (tree.type === 'broken') sheet.loose.push({ line, message: tree.message });
    else if (tree.type === 'heading' && tree.level === 1) {
      fields = [];
      sheet.title = { line, text: tree.text, fields };
    } else if (tree.type === 'field') {
      const { label, labelSpan, body, source, note } = tree;
      const field = { label, labelSpan, body, source, note, line };
      const doubled = fields === sheet.title?.fields ? doubledField(field, fields) : null;
      if (doubled) sheet.loose.push(doubled);
      else fields.push(field);
    } else if (tree.type === 'row') rows.push({ values: tree.values, line });
  }
  return sheet;
}

function brokenCell(name: NameRef, tree: Extract<LineTree, { type: 'broken' }>, line: Line) {
  const entry = {
    type: 'broken' as const,
    message: tree.message,
    span: { start: name.span.end, end: line.text.length },
  };
  return { name, entry, source: null, note: null };
}

function doubledField(field: FieldTree, fields: readonly FieldTree[]): LooseLine | null {
  const { name } = field.label[0];
  if (name === CHECKED || !fields.some((each) => each.label[0].name === name)) return null;
  return { line: field.line, message: message('title-field-doubled', field.labelSpan, name) };
}
