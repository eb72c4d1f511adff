// Which of the values that a cell offers have a row of their own at once: the few that settle whether it works, and
// all that the sheet uses elsewhere. The others are folded under one row.

import { pathsOf } from '../../language/index.ts';
import type { Entry, Expr, FieldBody, LineTree, SheetTree } from '../../language/index.ts';
import type { CellReading, OfferedReading } from '../../sheet/index.ts';

const BIAS: ReadonlySet<string> = new Set(['I_D', 'V_GS', 'V_DS', 'margin', 'region']);
const MEASURED: ReadonlySet<string> = new Set(['beta', 'V_TO', 'I_DSS', 'lambda']);
/** What a part takes from a bench beside these. */
const SUMMED_UP: ReadonlySet<string> = new Set(['I_DSS', 'tracking']);
const LAW: ReadonlySet<string> = new Set(['beta', 'K', 'V_P', 'V_TO']);

/** The paths that a line reads; a line that stays keeps its tree. */
const PATHS = new WeakMap<LineTree, readonly string[]>();

/** The values that the sheet's formulas read of each block: of `A1.I_D` the name `I_D` under `A1`. */
export function usedValues(tree: SheetTree): ReadonlyMap<string, ReadonlySet<string>> {
  const found = new Map<string, Set<string>>();
  for (const cell of tree.cells) {
    for (const { line } of [cell, ...cell.fields]) {
      for (const path of pathsOfLine(line.tree)) {
        const dot = path.indexOf('.');
        const names = found.get(path.slice(0, dot)) ?? new Set();
        names.add(path.slice(dot + 1));
        found.set(path.slice(0, dot), names);
      }
    }
  }
  return found;
}

function pathsOfLine(tree: LineTree): readonly string[] {
  const known = PATHS.get(tree);
  if (known) return known;
  const exprs = tree.type === 'cell' ? entryExprs(tree.entry) : tree.type === 'field' ? bodyExprs(tree.body) : [];
  const paths = exprs
    .flatMap((expr) => pathsOf(expr))
    .filter((path) => path.names.length > 1)
    .map((path) => path.names.map((part) => part.name).join('.'));
  PATHS.set(tree, paths);
  return paths;
}

/** Splits the offered values of a cell into those with a row and those that are folded. */
export function splitValues(
  cell: CellReading,
  used: ReadonlySet<string>,
): { pinned: readonly OfferedReading[]; folded: readonly OfferedReading[] } {
  const given = new Set(cell.fields.map((field) => field.name));
  const offered =
    cell.kind === 'part' || cell.kind === 'point'
      ? cell.values.filter((value) => !isField(value.name, given))
      : cell.values;
  const { entry } = cell.tree;
  const isFitted = entry.type === 'part' && entry.fittedTo !== null;
  const isPinned = ({ name }: OfferedReading): boolean =>
    (isFitted && SUMMED_UP.has(name)) || settles(cell.kind, name) || used.has(name);
  return { pinned: offered.filter(isPinned), folded: offered.filter((value) => !isPinned(value)) };
}

/** Of a FET in a stage by its own name; of a bench only what all its specimens come to. */
function settles(kind: CellReading['kind'], name: string): boolean {
  if (kind === 'bench') return MEASURED.has(name);
  const own = kind === 'part' || kind === 'another' ? LAW : BIAS;
  return own.has(name.slice(name.lastIndexOf('.') + 1));
}

/** Offered fields that repeat bear a number: `R_DSon_2`. */
function isField(name: string, given: ReadonlySet<string>): boolean {
  return given.has(name) || given.has(name.replace(/_\d+$/, ''));
}

function entryExprs(entry: Entry): readonly Expr[] {
  switch (entry.type) {
    case 'quantity':
      return entry.value ? [entry.value] : [];
    case 'check':
      return [entry.condition];
    case 'plot':
      return [...entry.values, ...(entry.against ? [entry.against] : [])];
    case 'inverse':
      return [entry.input, entry.target, entry.value];
    default:
      return [];
  }
}

function bodyExprs(body: FieldBody): readonly Expr[] {
  if (body.type === 'quantity') return body.value ? [body.value] : [];
  if (body.type !== 'legs') return [];
  return body.legs.flatMap((leg) => [
    ...(leg.element ? [leg.element] : []),
    ...(leg.place.type === 'expr' ? [leg.place.expr] : []),
  ]);
}
