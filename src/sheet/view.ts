// The reading side of a sheet: of the values as they stand, or of a build that stands elsewhere within its spread.

import type { Expr, Line, SheetTree } from '../language/index.ts';
import { runOperations } from '../program/index.ts';
import type { CompiledCell } from './compiled-cell.ts';
import { BUILD_KERNELS } from './kernels.ts';
import type { CellReading, SheetView, ValueType } from './model.ts';
import type { Node } from './node.ts';
import { faultAt, readCell } from './readings.ts';
import { sweepPlot } from './sweep.ts';
import { answerAgain } from './turned.ts';
import type { Course } from './course.ts';

/** All that is read of a sheet. */
export interface SheetState extends Course {
  readonly tree: SheetTree;
  readonly slots: Float64Array;
  now(expr: Expr, line: Line): { type: ValueType; value: number };
  /** Readings at the nominal values, of a sheet that stands elsewhere. */
  readonly nominal?: (key: string) => CellReading | null;
}

/** A reading elsewhere within the spread: what is declared stays as it is at the nominal values. */
function declaredAs(reading: CellReading, nominal: CellReading | null): CellReading {
  if (nominal === null) return reading;
  const fields = reading.fields.map((field) => ({
    ...field,
    spread: nominal.fields.find(({ line }) => line === field.line)?.spread ?? field.spread,
  }));
  return { ...reading, spread: nominal.spread, fields };
}

/** The reading side of what `state` answers with at each call. */
export function createView(state: () => SheetState): SheetView {
  function reading(node: Node): CellReading {
    const { nodes, slots } = state();
    node.reading ??= declaredAs(
      readCell(node, nodes, (slot) => slots[slot]!),
      state().nominal?.(node.key) ?? null,
    );
    return node.reading;
  }
  const view: SheetView = {
    get tree() {
      return state().tree;
    },
    cells: () => state().nodes.map(reading),
    cell(name) {
      const node = state().byName.get(name);
      return node ? reading(node) : null;
    },
    loose: () => state().tree.loose.map(({ line, message }) => faultAt(message, line)),
    cautions: () => state().nodes.flatMap((node) => reading(node).cautions),
    assumptions: () => state().nodes.flatMap((node) => reading(node).assumptions),
    error: (name) => view.cell(name)?.fault ?? null,
    value(path) {
      const [name, ...rest] = path.split('.');
      const cell = view.cell(name!);
      if (!cell || cell.fault || cell.waitsFor) return null;
      if (rest.length === 0) return cell.reading?.value ?? null;
      return cell.values.find((value) => value.name === rest.join('.'))?.value ?? null;
    },
    workings(name) {
      const { byName, slots } = state();
      const node = byName.get(name);
      if (!node || node.fault || node.waitsFor) return [];
      const { draft, slot } = node.compiled;
      return draft.workings((handle) => slots[slot(handle)]!);
    },
    stage(name) {
      const { byName, slots } = state();
      const node = byName.get(name);
      if (!node || node.waitsFor || !node.compiled.draft.stage) return null;
      const { draft, slot } = node.compiled;
      return draft.stage!((handle) => slots[slot(handle)]!, node.fault === null);
    },
    part(name) {
      const { byName, slots } = state();
      const node = byName.get(name);
      if (!node || node.fault || node.waitsFor) return null;
      const { draft, slot } = node.compiled;
      return draft.part?.((handle) => slots[slot(handle)]!) ?? null;
    },
    bench(name) {
      const node = state().byName.get(name);
      if (!node || node.fault || node.waitsFor) return null;
      return node.compiled.draft.bench?.reading ?? null;
    },
    sweep(plot, points) {
      const node = state().byName.get(plot);
      if (!node || node.fault || node.waitsFor) return null;
      return sweepPlot(node, points, state());
    },
  };
  return view;
}

/** The same sheet with other numbers in some slots: everything runs anew, what was chosen at the nominal values stays. */
export function stateAt(state: SheetState, at: ReadonlyMap<number, number>): SheetState {
  const slots = state.slots.slice();
  for (const [slot, value] of at) slots[slot] = value;
  const nodes = state.nodes.map((node): Node => ({ ...node, reading: null }));
  const copyOf = new Map(state.nodes.map((node, k) => [node, nodes[k]!]));
  const byName = new Map([...state.byName].map(([name, node]) => [name, copyOf.get(node)!]));
  for (const k of state.order) {
    const node = nodes[k]!;
    const { compiled } = node;
    if (node.standsIn || compiled.fault || compiled.waitsFor || compiled.later) continue;
    node.waitsFor = waiting(compiled, byName);
    const awaited = node.waitsFor === null ? null : (byName.get(node.waitsFor) ?? null);
    node.root = awaited?.root ?? awaited;
    node.fault = null;
    if (node.waitsFor) continue;
    const { ops, args } = compiled.segment;
    runOperations(ops, 0, ops.length, args, 0, slots, BUILD_KERNELS);
    if (compiled.asks?.each) answerAgain(node, slots, { ...state, nodes, byName }, BUILD_KERNELS);
    node.fault = compiled.draft.verify?.((handle) => slots[compiled.slot(handle)]!) ?? null;
  }
  const nominals = new Map(state.nodes.map((node) => [node.key, node]));
  const read = (slot: number): number => state.slots[slot]!;
  return {
    ...state,
    nodes,
    byName,
    slots,
    nominal: (key) => {
      const node = nominals.get(key);
      return node ? readCell(node, state.nodes, read) : null;
    },
  };
}

/** The first cell used that has no values just now. */
export function waiting(compiled: CompiledCell, byName: ReadonlyMap<string, Node>): string | null {
  for (const name of compiled.seen.keys()) {
    const node = byName.get(name);
    if (node && (node.fault || node.waitsFor)) return name;
  }
  return null;
}
