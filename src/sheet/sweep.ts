// A plot's curves: the sheet evaluated again and again with one input turned, on a copy of its slots.

import type { Expr, Line, PlotEntry } from '../language/index.ts';
import { exp, ln } from '../numeric/index.ts';
import { createBuilder, runOperations } from '../program/index.ts';
import type { Segment } from '../program/index.ts';
import { compileExpression } from './expression.ts';
import { KERNELS } from './kernels.ts';
import type { Sweep, ValueType } from './model.ts';
import type { Node } from './node.ts';
import { createScope } from './resolve.ts';

interface Surroundings {
  readonly nodes: readonly Node[];
  readonly byName: ReadonlyMap<string, Node>;
  readonly order: readonly number[];
  readonly slots: Float64Array;
  now(expr: Expr, line: Line): { type: ValueType; value: number };
}

/** The curves of a plot `VALUE, .. against INPUT over lo .. hi [log]`; null for a figure of another kind. */
export function sweepPlot(plot: Node, points: number, sheet: Surroundings): Sweep | null {
  const entry = plot.tree.entry as PlotEntry;
  if (entry.figure !== 'against' || !entry.against || !entry.over) return null;
  const { line } = plot.tree;
  const inputNode = sheet.byName.get(entry.against.names[0]!.name)!;
  const label = (expr: Expr): string => line.text.slice(expr.span.start, expr.span.end).trim();
  const input = inputSlot(
    entry.against.names.slice(1).map((name) => name.name),
    inputNode,
  );
  if (input === null) return null;
  const values = spaced(
    sheet.now(entry.over.low, line).value,
    sheet.now(entry.over.high, line).value,
    points,
    entry.over.log,
  );

  const path = affected(inputNode, plot, sheet);
  const top = sheet.slots.length;
  const builder = createBuilder(KERNELS);
  const look = (name: string) => sheet.byName.get(name)?.compiled.interface ?? null;
  const scope = createScope(builder, line, { look, names: () => [], later: () => {} });
  const outputs = entry.values.map((expr) => ({ expr, ...compileExpression(expr, scope) }));
  const { segment, slot } = builder.finish(top);
  const slots = new Float64Array(top + segment.size);
  slots.set(sheet.slots);
  install(segment, slots);

  const series = outputs.map(({ expr, type }) => ({
    label: label(expr),
    type,
    values: new Float64Array(points),
    present: sheet.now(expr, line).value,
  }));
  const present = sheet.slots[input]!;
  for (let i = 0; i < points; i++) {
    slots[input] = values[i]!;
    const sound = runPath(path, slots);
    runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, KERNELS);
    outputs.forEach(({ handle }, k) => {
      series[k]!.values[i] = sound ? slots[slot(handle)]! : NaN;
    });
  }
  return {
    input: { label: label(entry.against), type: plotType(inputNode, entry), values, log: entry.over.log, present },
    series,
  };
}

/** The slot of an input: a quantity cell, or a field that a part or point was given. */
function inputSlot(field: readonly string[], node: Node): number | null {
  if (field.length === 0) return node.compiled.interface.slot;
  return node.compiled.interface.offers.get(field.join('.'))?.slot ?? null;
}

function plotType(node: Node, entry: PlotEntry): ValueType {
  const field = entry
    .against!.names.slice(1)
    .map((name) => name.name)
    .join('.');
  return field === '' ? node.compiled.interface.type! : node.compiled.interface.offers.get(field)!.type;
}

/** The cells between an input and a plot, in order; a part whose field is turned is run, too. */
function affected(input: Node, plot: Node, { nodes, order }: Surroundings): Node[] {
  const wanted = new Set<Node>([plot]);
  for (const k of order.toReversed()) if (wanted.has(nodes[k]!)) for (const u of nodes[k]!.uses) wanted.add(nodes[u]!);
  const reached = new Set<Node>([input]);
  const found: Node[] = [];
  for (const k of order) {
    const node = nodes[k]!;
    if (node !== input && !node.uses.some((u) => reached.has(nodes[u]!))) continue;
    reached.add(node);
    if (node !== input || node.tree.entry.type !== 'quantity') found.push(node);
  }
  return found.filter((node) => node !== plot && wanted.has(node));
}

/** Runs the cells in order; says whether all of them have values. */
function runPath(path: readonly Node[], slots: Float64Array): boolean {
  for (const { compiled } of path) {
    const { ops, args } = compiled.segment;
    runOperations(ops, 0, ops.length, args, 0, slots, KERNELS);
  }
  return path.every((node) => isSound(node, slots));
}

function isSound({ compiled }: Node, slots: Float64Array): boolean {
  const { verify } = compiled.draft;
  return !verify || verify((handle) => slots[compiled.slot(handle)]!) === null;
}

/** Points from low to high, evenly or evenly in the logarithm; the ends are exact. */
function spaced(low: number, high: number, points: number, log: boolean): Float64Array {
  const values = new Float64Array(points);
  for (let i = 0; i < points; i++) {
    const share = i / (points - 1);
    values[i] = log
      ? Math.sign(low) * exp(ln(Math.abs(low)) * (1 - share) + ln(Math.abs(high)) * share)
      : low + (high - low) * share;
  }
  values[0] = low;
  values[points - 1] = high;
  return values;
}

function install({ constantSlots, constantValues }: Segment, slots: Float64Array): void {
  for (let i = 0; i < constantSlots.length; i++) slots[constantSlots[i]!] = constantValues[i]!;
}
