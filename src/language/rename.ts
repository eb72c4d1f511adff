// Renaming a cell with all its uses.
//
// A cell is used where the first name of a path is its name; what stands behind a dot is a value that a
// cell offers. In a stage the names of its lines are nodes and those of its FETs are specimens, so
// a place spelled like them is no use of a cell.

import { canonicalName, isNamePart, nameEnd } from './characters.ts';
import type { CellTree, Entry, Expr, FieldTree, Line, NameRef, SheetTree, Splice } from './syntax.ts';
import { CHECKED } from './title-fields.ts';
import { exprsOfBody, exprsOfEntry, pathsOf, placesOfBody } from './walk.ts';

/** Gives every cell called `name` another name, in its own line and in all uses; texts, sources, notes, labels and offered values stay. */
export function renameCell(tree: SheetTree, name: string, newName: string): Splice[] {
  const old = canonicalName(name);
  const splices: Splice[] = [];
  const replace = (line: Line, use: NameRef): void => {
    if (use.name !== old) return;
    splices.push({ start: line.offset + use.span.start, end: line.offset + use.span.end, text: newName });
  };
  for (const field of tree.title?.fields ?? []) for (const use of checkedNames(field)) replace(field.line, use);
  for (const cell of tree.cells) {
    replace(cell.line, cell.name);
    for (const use of usesOfEntry(cell.entry)) replace(cell.line, use);
    const local = localNames(cell);
    for (const field of cell.fields) for (const use of usesOfField(field, local)) replace(field.line, use);
  }
  return splices;
}

/** The names of cells in an entry. */
function usesOfEntry(entry: Entry): NameRef[] {
  const uses = exprsOfEntry(entry).flatMap(firstNames);
  switch (entry.type) {
    case 'part':
      return entry.fittedTo ? [entry.fittedTo] : [];
    case 'another':
    case 'point':
      return [entry.of];
    case 'plot':
      return entry.of ? [entry.of, ...uses] : uses;
    case 'stage':
      return entry.fets.map((fet) => fet.part);
    default:
      return uses;
  }
}

function usesOfField({ body }: FieldTree, local: ReadonlySet<string>): NameRef[] {
  const uses = exprsOfBody(body).flatMap(firstNames);
  for (const place of placesOfBody(body)) {
    if (place.type !== 'expr') continue;
    const node = place.expr.type === 'path' && local.has(place.expr.names[0].name);
    if (!node) uses.push(...firstNames(place.expr));
  }
  return uses;
}

/** The names that mean a node or a FET inside a stage. */
function localNames({ entry, fields }: CellTree): ReadonlySet<string> {
  if (entry.type !== 'stage' && entry.type !== 'broken') return new Set();
  const fets = entry.type === 'stage' ? entry.fets.flatMap(({ name }) => (name ? [name.name] : [])) : [];
  return new Set([...fets, ...fields.flatMap(({ label }) => (label.length === 1 ? [label[0].name] : []))]);
}

function firstNames(expr: Expr): NameRef[] {
  return pathsOf(expr).map((path) => path.names[0]);
}

/** The first name of each item of a `checked:` line. */
function checkedNames({ label, body }: FieldTree): NameRef[] {
  if (body.type !== 'text' || label[0].name !== CHECKED) return [];
  const names: NameRef[] = [];
  for (let at = 0; at < body.text.length; at++) {
    const end = nameEnd(body.text, at, body.text.length);
    if (end === at) continue;
    const before = body.text.charCodeAt(at - 1);
    if (body.text[at - 1] !== '.' && !isNamePart(before)) {
      const span = { start: body.span.start + at, end: body.span.start + end };
      names.push({ name: canonicalName(body.text.slice(at, end)), span });
    }
    at = end;
  }
  return names;
}
