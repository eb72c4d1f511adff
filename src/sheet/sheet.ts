// A sheet: the text, its compiled cells and their values, kept in step under edits.
//
// After an edit the text is parsed again (unchanged lines keep their trees), the cells are put in
// topological order, and one pass visits them. A cell is compiled again when its tree, the interface of
// a cell it looked up, or its own shape has changed; it is run when it was compiled or when something
// it reads has changed. Everything else is left as it stands. Every cell owns a block of slots and
// keeps it as long as it fits, so an edited formula does not move the addresses its users know.

import { applySplices, parseSheet } from '../language/index.ts';
import type { CellTree, Expr, Line, SheetTree } from '../language/index.ts';
import { createBuilder, runOperations } from '../program/index.ts';
import type { Program } from '../program/index.ts';
import { askedAmong } from './asked.ts';
import { compileCell } from './compile-cell.ts';
import type { CompiledCell } from './compiled-cell.ts';
import { coneOf, programOf } from './course.ts';
import type { Course } from './course.ts';
import { namesUsed } from './dependencies.ts';
import type { Placed } from './draft.ts';
import { compileExpression } from './expression.ts';
import { topologicalOrder } from './graph.ts';
import { sameInterface } from './interface.ts';
import type { Interface } from './interface.ts';
import { inputNames } from './input-of.ts';
import { KERNELS } from './kernels.ts';
import type { Analyses, Sheet, ValueType } from './model.ts';
import type { Node } from './node.ts';
import { waitingText } from './readings.ts';
import { createScope } from './resolve.ts';
import { createRestating } from './restate.ts';
import type { Typed } from './scope.ts';
import { spreadModel } from './spread-model.ts';
import { runCell } from './turned.ts';
import { createView, stateAt, waiting } from './view.ts';
import type { SheetState } from './view.ts';

/** The compiled form of a whole sheet, for those who evaluate it many times over. */
interface CompiledSheet {
  readonly program: Program;
  /** Slots as they stand. */
  readonly slots: Float64Array;
  /** Name of each segment's cell, in the order of the program. */
  readonly cells: readonly string[];
}

/** Reads, checks and evaluates a sheet. Never throws for what the user wrote. */
export function createSheet(text: string, analyses: Analyses | null = null): Sheet & { compiled(): CompiledSheet } {
  let tree: SheetTree = parseSheet('');
  let nodes: Node[] = [];
  /** The nodes that `uses` and `usedBy` last counted. */
  let linked: readonly Node[] = [];
  let byName = new Map<string, Node>();
  let order: readonly number[] = [];
  let slots = new Float64Array(256).fill(NaN);
  let top = 0;
  let pass = 0;

  function reserve(size: number): void {
    if (size <= slots.length) return;
    const wider = new Float64Array(Math.max(size, slots.length * 2)).fill(NaN);
    wider.set(slots);
    slots = wider;
  }

  let allNames: readonly string[] = [];
  const names = (): readonly string[] => allNames;
  /** Made when a message names them; kept until a tree has others. */
  let inputsOf: { tree: SheetTree; names: readonly string[] } | null = null;
  const inputs = (): readonly string[] => {
    if (inputsOf?.tree === tree) return inputsOf.names;
    const found = inputNames(tree);
    const same = inputsOf?.names.length === found.length && found.every((name, i) => name === inputsOf!.names[i]);
    inputsOf = { tree, names: same ? inputsOf!.names : found };
    return inputsOf.names;
  };
  const has = (name: string): boolean => byName.has(name);
  const treeOf = (name: string): CellTree | null => byName.get(name)?.tree ?? null;
  const look = (name: string): Interface | null => byName.get(name)?.compiled.interface ?? null;

  function now(
    expr: Expr,
    line: Line,
    known: (part: Expr) => { type: ValueType; value: number } | null = () => null,
  ): { type: ValueType; value: number } {
    const builder = createBuilder(KERNELS);
    const restating = createRestating(builder, course);
    const asConstant = (part: Expr): Typed | null => {
      const found = known(part);
      return found && { type: found.type, handle: builder.constant(found.value) };
    };
    const scope = createScope(builder, line, { look, names, later: () => {}, restating, known: asConstant });
    const { type, handle } = compileExpression(expr, scope);
    const { segment, slot } = builder.finish(top);
    reserve(top + segment.size);
    install(segment, slots);
    runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, KERNELS);
    return { type, value: slots[slot(handle)]! };
  }

  function compile(node: Node, cellTree: CellTree): void {
    const previous = node.compiled as CompiledCell | undefined;
    const compiled = compileCell(cellTree, {
      look,
      names,
      inputs,
      has,
      treeOf,
      now,
      read: (slot) => slots[slot]!,
      course,
      hasEnds: analyses !== null,
      allocate(size) {
        if (size > node.capacity) {
          node.base = top;
          node.capacity = size;
          top += size;
          reserve(top);
        }
        return node.base;
      },
    });
    install(compiled.segment, slots);
    node.compiledTree = cellTree;
    node.standsIn = false;
    const same = previous && sameInterface(previous.interface, compiled.interface);
    node.compiled = same ? { ...compiled, interface: previous.interface } : compiled;
  }

  function needsCompiling(node: Node, cellTree: CellTree): boolean {
    if (node.standsIn || !sameCell(node.compiledTree, cellTree)) return true;
    const { seen, proposedFrom, proposedInputs, presence, copied } = node.compiled;
    for (const [name, then] of seen) if (look(name) !== then) return true;
    for (const [name, then] of presence) if (has(name) !== then) return true;
    for (const [taken, then] of node.compiled.taken) if (taken.compiled?.segment !== then) return true;
    for (const [name, then] of copied) if (!isSameText(treeOf(name), then)) return true;
    if (proposedInputs !== null && proposedInputs !== inputs()) return true;
    return proposedFrom !== null && proposedFrom !== allNames;
  }

  /** Whether values that have changed ask for other code, or mend what was wrong with them. */
  function isReshaped({ draft, shape, fault, restsOnValues }: CompiledCell): boolean {
    return fault ? restsOnValues : draft.shape !== null && draft.shape() !== shape;
  }

  /** Compiles and runs what the change reaches; gives the keys of the nodes whose readings changed. */
  function evaluate(cycles: ReadonlyMap<number, readonly number[]>): Set<string> {
    pass++;
    const changed = new Set<string>();
    for (const k of order) {
      const node = nodes[k]!;
      const { tree: cellTree } = node;
      const wasFault = node.fault;
      const wasWaiting = node.waitsFor;
      let fresh = false;
      const outside =
        byName.get(cellTree.name.name) !== node ? duplicate(cellTree, byName) : cycleFault(k, cycles, nodes);
      if (outside) {
        node.compiled = unsettled(node, cellTree);
        node.standsIn = true;
        node.compiledTree = cellTree;
        node.fault = wasFault?.message.text === outside.message.text ? wasFault : outside;
        node.waitsFor = null;
      } else {
        const present = node.compiled as CompiledCell | undefined;
        const looksFar = present !== undefined && (present.ends.length > 0 || present.asks !== null);
        const seen = looksFar ? [...coneOf(k, nodes)] : node.uses;
        const reached = seen.some((u) => nodes[u]!.changedAt === pass);
        if (!node.compiled || needsCompiling(node, cellTree) || (reached && isReshaped(node.compiled))) {
          compile(node, cellTree);
          fresh = true;
        }
        const { compiled } = node;
        node.waitsFor = compiled.fault ? null : (compiled.waitsFor ?? waiting(compiled, byName));
        node.fault = compiled.fault ?? (node.waitsFor ? null : compiled.later);
        if (!node.fault && !node.waitsFor && (fresh || reached || wasFault || wasWaiting)) {
          if (run(node, fresh)) node.changedAt = pass;
          node.fault = compiled.draft.verify?.((handle) => slots[compiled.slot(handle)]!) ?? null;
        } else if (!node.fault && !node.waitsFor) {
          node.fault = wasFault;
        }
      }
      const awaited = node.waitsFor === null ? null : (byName.get(node.waitsFor) ?? null);
      node.root = awaited?.root ?? awaited;
      if (fresh || node.fault !== wasFault || node.waitsFor !== wasWaiting) node.changedAt = pass;
      if (node.changedAt === pass) {
        node.reading = null;
        changed.add(node.key);
      }
    }
    return changed;
  }

  const course = (): Course => ({ nodes, byName, order, analyses });

  /** Runs a node's segment; says whether any of its slots came out otherwise. */
  function run(node: Node, fresh: boolean): boolean {
    const { segment, draft, slot } = node.compiled;
    const before = fresh ? null : slots.slice(segment.base, segment.base + segment.size);
    const found = runCell(node, slots, course());
    if (found) {
      const { atAnswer } = found;
      draft.asks!.take(found, atAnswer && ((handle) => atAnswer[slot(handle)]!));
    }
    return before === null || before.some((value, i) => !Object.is(value, slots[segment.base + i]!));
  }

  function update(newText: string): Set<string> {
    const newTree = parseSheet(newText, tree);
    const old = new Map(nodes.map((node) => [node.key, node]));
    const seenNames = new Map<string, number>();
    byName = new Map();
    nodes = newTree.cells.map((cellTree) => {
      const { name } = cellTree.name;
      const occurrence = (seenNames.get(name) ?? 0) + 1;
      seenNames.set(name, occurrence);
      const key = occurrence === 1 ? name : `${name} (${occurrence})`;
      const node = old.get(key) ?? createNode(key, cellTree);
      old.delete(key);
      if (node.tree !== cellTree) {
        // The same cell on another line still has to be read anew: its messages name lines.
        node.reading = null;
        node.tree = cellTree;
      }
      if (occurrence === 1) byName.set(name, node);
      return node;
    });
    tree = newTree;
    const newNames = [...byName.keys()];
    if (newNames.length !== allNames.length || newNames.some((name, i) => name !== allNames[i])) allNames = newNames;
    const relinked = link();
    const sorted = topologicalOrder(nodes.map((node) => node.uses));
    order = sorted.order;
    const changed = evaluate(sorted.cycles);
    for (const node of [...relinked, ...nodes.filter(waitsOtherwise)]) {
      node.reading = null;
      changed.add(node.key);
    }
    for (const key of old.keys()) changed.add(key);
    return changed;
  }

  /** Finds anew which cells each uses and is used by; gives the nodes for which that is not what it was. */
  function link(): Node[] {
    const indexOf = new Map(nodes.map((node, k) => [node, k]));
    const before = nodes.map(({ uses, usedBy }) => ({ uses, usedBy }));
    for (const node of nodes) node.usedBy = [];
    nodes.forEach((node, k) => {
      node.uses = namesUsed(node.tree, treeOf)
        .map((name) => byName.get(name))
        .filter((used) => used !== undefined)
        .map((used) => indexOf.get(used)!);
      for (const u of node.uses) nodes[u]!.usedBy.push(k);
    });
    const same = (a: readonly number[], b: readonly number[]): boolean =>
      a.length === b.length && a.every((index, i) => linked[index] === nodes[b[i]!]);
    const relinked = nodes.filter(
      (node, k) => !same(before[k]!.uses, node.uses) || !same(before[k]!.usedBy, node.usedBy),
    );
    linked = nodes;
    return relinked;
  }

  update(text);

  const state = (): SheetState => ({ tree, slots, now, ...course() });
  const view = createView(state);
  const sheet: Sheet & { compiled(): CompiledSheet } = {
    ...view,
    get tree() {
      return tree;
    },
    update,
    edit: (splices) => update(applySplices(tree.text, splices)),
    standing(at) {
      const standing = stateAt(state(), at);
      return createView(() => standing);
    },
    spreadModel() {
      const { program, slots: values } = sheet.compiled();
      return spreadModel(nodes, askedAmong(new Set(order), values, course()), program, values);
    },
    compiled() {
      const live = order.filter((k) => !nodes[k]!.fault && !nodes[k]!.waitsFor);
      const program = programOf(live, nodes);
      return { program, slots: slots.slice(0, program.slotCount), cells: live.map((k) => nodes[k]!.key) };
    },
  };
  return sheet;
}

function createNode(key: string, tree: CellTree): Node {
  return {
    key,
    tree,
    compiledTree: tree,
    compiled: undefined as unknown as CompiledCell,
    standsIn: false,
    base: 0,
    capacity: 0,
    fault: null,
    waitsFor: null,
    root: null,
    waitingText: '',
    uses: [],
    usedBy: [],
    changedAt: 0,
    reading: null,
  };
}

/** Notes what is said of a node's waiting; says whether that is another text than before, as where the root has moved. */
function waitsOtherwise(node: Node): boolean {
  const before = node.waitingText;
  node.waitingText = node.waitsFor ? waitingText(node) : '';
  return node.waitingText !== before;
}

function install(segment: { constantSlots: Int32Array; constantValues: Float64Array }, slots: Float64Array): void {
  for (let i = 0; i < segment.constantSlots.length; i++) slots[segment.constantSlots[i]!] = segment.constantValues[i]!;
}

function isSameText(a: CellTree | null, b: CellTree | null): boolean {
  return a === b || (a !== null && b !== null && sameCell(a, b));
}

/** Whether two cells are the same text, wherever they stand. */
function sameCell(a: CellTree, b: CellTree): boolean {
  if (a === b) return true;
  if (a.line.tree !== b.line.tree || a.fields.length !== b.fields.length || a.rows.length !== b.rows.length)
    return false;
  return (
    a.fields.every((field, i) => field.line.tree === b.fields[i]!.line.tree) &&
    a.rows.every((row, i) => row.line.tree === b.rows[i]!.line.tree)
  );
}

function duplicate(tree: CellTree, byName: ReadonlyMap<string, Node>): Placed {
  const { name, span } = tree.name;
  const first = byName.get(name)!.tree.line.index + 1;
  return {
    line: tree.line,
    message: {
      code: 'name-taken',
      text: `${name} already stands in line ${first}. Give this cell another name.`,
      span,
    },
  };
}

/** Longest cycle that is written out whole. */
const LONGEST_PATH = 50;

function cycleFault(k: number, cycles: ReadonlyMap<number, readonly number[]>, nodes: readonly Node[]): Placed | null {
  const path = cycles.get(k);
  if (!path) return null;
  const cell = nodes[k]!;
  const named = path.slice(0, LONGEST_PATH).map((i) => nodes[i]!.tree.name.name);
  if (path.length > LONGEST_PATH) named.push('..', nodes[path[path.length - 1]!]!.tree.name.name);
  const text = `${cell.tree.name.name} depends on itself: ${named.join(' → ')}. Break the circle by entering one of them as a number.`;
  return { line: cell.tree.line, message: { code: 'cycle', text, span: cell.tree.name.span } };
}

/** Stands in for the code of a cell that cannot have any: users wait for it. */
function unsettled(node: Node, tree: CellTree): CompiledCell {
  const present = node.compiled as CompiledCell | undefined;
  if (present && !present.interface.settled && present.seen.size === 0 && present.segment.size === 0) return present;
  const broken: CellTree = {
    ...tree,
    entry: { type: 'broken', message: { code: '', text: '', span: tree.name.span }, span: tree.name.span },
    fields: [],
  };
  const nothing = (): never => {
    throw new Error('A broken cell asks for nothing.');
  };
  return compileCell(broken, {
    look: nothing,
    names: nothing,
    treeOf: nothing,
    inputs: nothing,
    has: nothing,
    now: nothing,
    read: nothing,
    course: nothing,
    hasEnds: false,
    allocate: nothing,
  });
}
