// Completion of what is being typed: which token stands before the caret, what fits there, and in which order.

import type { SheetTree } from '../../language/index.ts';
import { dimensionName, sameKind } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { CellReading, SheetView } from '../../sheet/index.ts';
import { expectedKind } from './expected-kind.ts';
import type { EditPlace } from './row-edits.ts';
import { inBlock } from './row-edits.ts';
import {
  cellSuggestions,
  fieldSuggestions,
  functionSuggestions,
  kindSuggestions,
  nameSuggestions,
  partSuggestions,
  placeSuggestions,
  sourceSuggestions,
  unitSuggestions,
} from './suggestions.ts';
import type { Suggestion } from './suggestions.ts';

export interface Completion {
  /** The token it replaces, in the text. */
  readonly from: number;
  readonly to: number;
  readonly token: string;
  readonly items: readonly Suggestion[];
  /** What is expected here, in a sentence; empty where anything may stand. */
  readonly expected: string;
  /** Which item is marked at first: one of which the token is a proper prefix; -1 for none. */
  readonly marked: number;
}

interface Context {
  readonly token: string;
  readonly items: readonly Suggestion[];
  readonly expected: ValueKind | null;
}

/** Letters after which the list opens by itself. */
const LEAST = 2;
const MOST_ITEMS = 40;

/** What fits at the caret; null where nothing does, or where too little is typed and it was not asked for. */
export function complete(
  sheet: SheetView,
  tree: SheetTree,
  place: EditPlace,
  typed: { readonly text: string; readonly caret: number; readonly asked: boolean },
): Completion | null {
  const { text, caret, asked } = typed;
  const before = text.slice(0, caret);
  const context = contextOf(sheet, tree, place, before);
  if (context === null || (context.token.length < LEAST && !asked)) return null;
  const { token, expected } = context;
  const items = ranked(context).slice(0, MOST_ITEMS);
  const finished = items.some((item) => item.text === token);
  if (items.length === 0 || (finished && items.length === 1)) return null;
  const marked = finished || token === '' ? -1 : items.findIndex((item) => item.text.startsWith(token));
  return {
    from: caret - token.length,
    to: caret,
    token,
    items,
    expected: expected === null ? '' : `${dimensionName(expected)} is expected here`,
    marked,
  };
}

function contextOf(sheet: SheetView, tree: SheetTree, place: EditPlace, before: string): Context | null {
  const { column, row, line, isNew } = place;
  if (column === 'source') return before.includes(';') ? null : sources(tree, line, before.trimStart());
  if (column === 'name' && !isNew) return null;
  // A note and what stands behind a source are the user's own words.
  if (/[;\]]/.test(before)) return null;
  const bracket = /\[([^\]]*)$/.exec(before);
  if (bracket && isNew) return sources(tree, line, bracket[1]!);
  if (column === 'low' || column === 'nominal' || column === 'high') return units(before, place, sheet);
  if (!isNew) return entryContext(before, place, row.cell, sheet);
  const block = inBlock(tree, line) ? blockAbove(tree, line, sheet) : null;
  const field = /^\s*([\w.Ͱ-Ͽ]*)\s*:(.*)$/u.exec(before);
  if (field && block) return fieldContext(field[2]!, field[1]!, block, place, sheet);
  const entry = /^\s*([\w.Ͱ-Ͽ]+)\s*=(.*)$/u.exec(before);
  if (entry) return entryContext(entry[2]!, place, entry[1]!, sheet);
  if (block === null || /\s\S/.test(before.trimStart())) return null;
  return { token: before.trimStart(), items: fieldSuggestions(block), expected: null };
}

function entryContext(before: string, place: EditPlace, self: string | null, sheet: SheetView): Context | null {
  const cell = self === null ? null : sheet.cell(self);
  if (place.row.type === 'field' && cell) return fieldContext(before, place.row.name?.text ?? '', cell, place, sheet);
  const of = /^\s*(stage|point|another|plot \w+)\s+(?:of\s+)?(?:.*[=,]\s*)?([\w.]*)$/.exec(before);
  if (of && /\b(?:of|another)\s/.test(before)) {
    return { token: of[2]!, items: cellSuggestions(sheet, subjectsOf(of[1]!)), expected: null };
  }
  const part = /^\s*[np]-(?:JFET|MOSFET)\s+(?:fitted\s+to\s+([\w.]*)|(\w*))$/.exec(before);
  if (part?.[1] !== undefined) return { token: part[1], items: cellSuggestions(sheet, ['bench']), expected: null };
  if (part) return { token: part[2]!, items: partSuggestions(), expected: null };
  // The word log behind a range is complete in itself.
  if (/\bover\b.*\.\..*\s(?:l|lo|log)$/.test(before)) return null;
  const unit = units(before, place, sheet);
  if (unit) return unit;
  const token = tokenOf(before);
  // The name of a kind may hold a hyphen.
  const start = /^\s*([\w-]*)$/.exec(before);
  return {
    token: start ? start[1]! : token,
    items: [...(start ? kindSuggestions() : []), ...nameSuggestions(sheet, self), ...functionSuggestions()],
    expected: expectedKind(before.slice(0, before.length - token.length), place, sheet),
  };
}

/** What a figure shows, or what a point, a stage or a further piece is made of. */
function subjectsOf(word: string): readonly CellReading['kind'][] {
  if (/^plot\s+bench/.test(word)) return ['bench'];
  return word.startsWith('plot') ? ['stage', 'point'] : ['part', 'another'];
}

function fieldContext(
  before: string,
  label: string,
  cell: CellReading,
  place: EditPlace,
  sheet: SheetView,
): Context | null {
  if (cell.kind === 'stage' || cell.tree.entry.type === 'stage') {
    const leads = /\b(?:to|from)\s+([^\s,]*)$/.exec(before);
    if (leads || label === 'output') {
      return { token: leads?.[1] ?? tokenOf(before), items: placeSuggestions(cell, sheet), expected: null };
    }
  }
  const unit = units(before, { ...place, row: { ...place.row, cell: cell.name, type: 'field' } }, sheet);
  if (unit) return unit;
  const token = tokenOf(before);
  return { token, items: [...nameSuggestions(sheet, cell.name), ...functionSuggestions()], expected: null };
}

function sources(tree: SheetTree, line: number, token: string): Context {
  return { token, items: sourceSuggestions(tree, line), expected: null };
}

/** Behind a number: its unit. */
function units(before: string, place: EditPlace, sheet: SheetView): Context | null {
  const found = /(?:^|[^\w.])(?:\d+\.?\d*|\.\d+)(?:[eE][-+]?\d+)?\s?([A-Za-zµΩ°%√/][\w^²√/·]*)?$/u.exec(before);
  if (!found) return null;
  const token = found[1] ?? '';
  const number = before.slice(0, before.length - token.length).replace(/[-+−]?[\d.]+(?:[eE][-+]?\d+)?\s?$/, '');
  return { token, items: unitSuggestions(), expected: expectedKind(number, place, sheet) };
}

function blockAbove(tree: SheetTree, line: number, sheet: SheetView): CellReading | null {
  const cell = tree.cells.findLast((each) => each.line.index < line);
  return cell ? sheet.cell(cell.name.name) : null;
}

function tokenOf(before: string): string {
  return /[A-Za-zͰ-Ͽ_][\w.Ͱ-Ͽ]*$/u.exec(before)?.[0] ?? '';
}

/** What fits the token: of the expected kind first, then whole prefixes, then those that fit when written loosely. */
function ranked({ token, items, expected }: Context): Suggestion[] {
  const loose = token.includes('_') ? lower(token) : bare(token);
  return items
    .map((item, order) => ({ item, order, rank: rankOf(item, token, loose, expected) }))
    .filter(({ rank }) => rank !== null)
    .toSorted((a, b) => a.rank! - b.rank! || a.order - b.order)
    .map(({ item }) => item);
}

function rankOf(item: Suggestion, token: string, loose: string, expected: ValueKind | null): number | null {
  const { text } = item;
  const plain = token.includes('_') ? lower : bare;
  const fit = text.startsWith(token)
    ? 0
    : plain(text).startsWith(loose)
      ? 1
      : !token.includes('.') && plain(text.slice(text.indexOf('.') + 1)).startsWith(loose)
        ? 2
        : null;
  if (fit === null) return null;
  const wanted = expected !== null && item.kind !== null && sameKind(expected, item.kind);
  // Values inside blocks come behind names of cells, unless their block was named.
  const inner = /^\w+\.\w/.test(text) && !token.includes('.') ? 3 : 0;
  return (wanted ? 0 : 10) + fit + inner;
}

function lower(text: string): string {
  return text.toLowerCase();
}

function bare(text: string): string {
  return lower(text).replaceAll('_', '');
}
