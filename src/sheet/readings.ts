// What others read of a cell, made from its compiled form and the slots as they stand.

import type { Line, Message, Span } from '../language/index.ts';
import type { FieldDraft, Placed, Read } from './draft.ts';
import type { CellReading, Fault, FieldReading, OfferedReading, Reading } from './model.ts';
import type { Node } from './node.ts';
import { readable } from './workings.ts';

/** A message as a fault of the line it stands in. */
export function faultAt(message: Message, line: Line): Fault {
  return { code: message.code, text: message.text, span: message.span, line: line.index };
}

/** The reading of a node; `slot` reads a slot. */
export function readCell(node: Node, nodes: readonly Node[], slot: (index: number) => number): CellReading {
  const { tree, compiled } = node;
  const { draft } = compiled;
  const read: Read = (handle) => slot(compiled.slot(handle));
  const present = (line: Line): Line => lineNow(node, line);
  const place = (placed: Placed): Fault => faultAt(placed.message, present(placed.line));
  const alive = !node.fault && !node.waitsFor;
  const fault = node.fault ? place(node.fault) : node.waitsFor ? waiting(node) : null;
  const as = tree.entry.type === 'quantity' ? (tree.entry.as?.unit ?? null) : null;
  const own: Reading | null =
    draft.type === null || compiled.fault || compiled.waitsFor
      ? null
      : { type: draft.type, value: alive ? readable(draft.type, slot(compiled.interface.slot)) : null, as };
  const values: OfferedReading[] = draft.offers.map((offer) => {
    const number = alive && offer.handle !== null ? slot(compiled.interface.offers.get(offer.name)!.slot) : null;
    const missing = number !== null && Number.isNaN(number) ? noNumber(offer.name, tree.entry.span) : offer.missing;
    return {
      name: offer.name,
      type: offer.type,
      as: offer.as ?? null,
      sentence: offer.sentence,
      value: number === null || Number.isNaN(number) ? null : readable(offer.type, number),
      missing: missing ? faultAt(missing, tree.line) : null,
    };
  });
  const placed = (field: FieldDraft): FieldReading => ({ ...field, line: present(field.line).index });
  const names = (indices: readonly number[]): string[] => indices.map((i) => nodes[i]!.tree.name.name);
  return {
    name: tree.name.name,
    kind: tree.entry.type,
    tree,
    fault,
    waitsFor: node.waitsFor,
    reading: own,
    values,
    fields: alive ? draft.fields(read).map(placed) : [],
    measured: alive ? draft.measured(read).map(placed) : [],
    check: alive && draft.check ? draft.check(read) : null,
    isInput: draft.isInput,
    spread: alive && draft.spread ? draft.spread(read) : null,
    uses: names(node.uses),
    usedBy: names(node.usedBy),
    cautions: alive
      ? draft
          .cautions(read)
          .map((caution) => ({ cell: tree.name.name, line: present(caution.line).index, text: caution.text }))
      : [],
    assumptions: alive ? draft.assumptions.map((text) => ({ cell: tree.name.name, text })) : [],
  };
}

function waiting({ waitingText: text, tree }: Node): Fault {
  return { code: 'waits-for', text, line: tree.line.index, span: tree.name.span };
}

/** `waits for R_1, which is broken in line 3`: the cell it waits for, and the one at the root of it where that is another. */
export function waitingText({ waitsFor, root }: Node): string {
  if (!root?.fault) return `waits for ${waitsFor}`;
  const state = root.fault.message.code === 'not-computed-yet' ? 'is not computed yet' : 'is broken';
  const which = root.tree.name.name === waitsFor ? 'which' : `because ${root.tree.name.name}`;
  return `waits for ${waitsFor}, ${which} ${state} in line ${lineNow(root, root.fault.line).index + 1}`;
}

/** Why an offered value that is computed has no number. */
function noNumber(name: string, span: Span): Message {
  return {
    code: 'no-value',
    text: `${name} comes out as no number here: what it is made of overflows, or is nothing over nothing.`,
    span,
  };
}

/** Where a line of the compiled tree stands now. */
export function lineNow(node: Node, line: Line): Line {
  const { compiledTree, tree } = node;
  if (line === compiledTree.line) return tree.line;
  const field = compiledTree.fields.findIndex((candidate) => candidate.line === line);
  if (field >= 0) return tree.fields[field]!.line;
  const row = compiledTree.rows.findIndex((candidate) => candidate.line === line);
  return row >= 0 ? tree.rows[row]!.line : tree.line;
}
