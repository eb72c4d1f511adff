// A sheet from its lines. Each line is read on its own in the context of the block above it, so a line with the
// same text in the same context has the same tree: an edit reads anew only what it touched, and every
// other line keeps the very object it had.

import type { Context } from './context.ts';
import { contextBelow, FIRST_CONTEXT } from './context.ts';
import { parseLine } from './line.ts';
import { message } from './messages.ts';
import type { RawLine } from './split-lines.ts';
import { splitLines } from './split-lines.ts';
import type { CellTree, FieldTree, Line, LineTree, LooseLine, NameRef, RowTree, SheetTree } from './syntax.ts';
import { CHECKED } from './title-fields.ts';

/** The context of each line of the sheets that were parsed. */
const CONTEXTS = new WeakMap<SheetTree, readonly Context[]>();

/** Reads a sheet; faults are in the tree. Lines that `previous` has in the same context keep their tree objects. */
export function parseSheet(text: string, previous?: SheetTree): SheetTree {
  const raw = splitLines(text);
  const known = previous ? knownTrees(raw, previous) : () => null;
  const lines: Line[] = [];
  const contexts: Context[] = [];
  let context = FIRST_CONTEXT;
  for (let index = 0; index < raw.length; index++) {
    const { offset, text: line } = raw[index];
    const tree = known(index, context) ?? parseLine(line, context);
    lines.push({ index, offset, text: line, tree });
    contexts.push(context);
    context = contextBelow(context, tree, line);
  }
  const sheet = { text, lines, ...assemble(lines) };
  CONTEXTS.set(sheet, contexts);
  return sheet;
}

type KnownTree = (index: number, context: Context) => LineTree | null;

/** Looks lines up in another sheet: those that stand alike from the top or from the end by place, the others by their text. */
function knownTrees(raw: readonly RawLine[], previous: SheetTree): KnownTree {
  const { lines } = previous;
  const contexts = CONTEXTS.get(previous) ?? [];
  const shift = lines.length - raw.length;
  const shorter = Math.min(lines.length, raw.length);
  let top = 0;
  while (top < shorter && lines[top].text === raw[top].text) top++;
  let end = 0;
  while (end < shorter - top && lines[lines.length - 1 - end].text === raw[raw.length - 1 - end].text) end++;
  const others = new Map<string, number[]>();
  for (let index = top; index < lines.length - end; index++) {
    const alike = others.get(lines[index].text);
    if (alike) alike.push(index);
    else others.set(lines[index].text, [index]);
  }
  return (index, context) => {
    const found =
      index < top
        ? index
        : index >= raw.length - end
          ? index + shift
          : others.get(raw[index].text)?.find((each) => contexts[each] === context);
    return found !== undefined && contexts[found] === context ? lines[found].tree : null;
  };
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
    } else if (tree.type === 'row') rows.push({ values: tree.values, source: tree.source, note: tree.note, line });
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
