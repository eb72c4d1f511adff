// What a line has to know of the lines above it: which block it stands in, and whether the title has been.
// There are few contexts, each one object, so that a line's tree can be kept by (context, text).

import type { EntryKind } from './entry-kind.ts';
import { kindOfEntry, kindOfType } from './entries.ts';
import type { Entry, LineTree } from './syntax.ts';

/**
 * `none`: no cell since the last heading; `loose`: a line that should have been a cell could not be read;
 * `title`: the title's fields; `unread`: below a cell of unknown kind; `plain`: below a cell without fields;
 * else the kind whose fields stand here.
 */
type Block = 'none' | 'loose' | 'title' | 'unread' | 'plain' | EntryKind['type'];

export interface Context {
  readonly block: Block;
  readonly titled: boolean;
  readonly fields: EntryKind['fields'];
}

const UNTITLED = new Map<Block, Context>();
const TITLED = new Map<Block, Context>();

function context(block: Block, titled: boolean, fields: EntryKind['fields'] = null): Context {
  const contexts = titled ? TITLED : UNTITLED;
  let known = contexts.get(block);
  if (!known) contexts.set(block, (known = { block, titled, fields }));
  return known;
}

/** The context of a sheet's first line. */
export const FIRST_CONTEXT = context('none', false);

/** The context below a line; blank lines, notes, prose, fields and rows end no block. */
export function contextBelow(above: Context, tree: LineTree, text: string): Context {
  if (tree.type === 'heading') return tree.level === 1 ? context('title', true) : context('none', above.titled);
  if (tree.type === 'cell') return contextOfCell(above, tree.entry, text);
  if (tree.type !== 'broken') return above;
  if (tree.name) return context('unread', above.titled);
  if (text.startsWith('#')) return context('none', above.titled);
  // With an equals sign it was meant as a cell, and what stands below belongs to that; else it is a slip inside the block.
  return text.includes('=') ? context('loose', above.titled) : above;
}

/** A head that cannot be read still tells of which kind its fields are, so that they are read and renamed with the rest. */
function contextOfCell(above: Context, { type, span }: Entry, text: string): Context {
  const kind = type === 'broken' ? kindOfEntry(text.slice(span.start, span.end)) : kindOfType(type);
  if (kind.fields) return context(kind.type, above.titled, kind.fields);
  return context(type === 'broken' && kind.type === 'quantity' ? 'unread' : 'plain', above.titled);
}
