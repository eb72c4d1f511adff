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
import { turn } from './turned.ts';
import type { Course } from './course.ts';

interface Surroundings extends Course {
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

  const top = sheet.slots.length;
  const builder = createBuilder(KERNELS);
  const look = (name: string) => sheet.byName.get(name)?.compiled.interface ?? null;
  const scope = createScope(builder, line, { look, names: () => [], later: () => {} });
  const outputs = entry.values.map((expr) => ({ expr, ...compileExpression(expr, scope) }));
  const { segment, slot } = builder.finish(top);
  const room = new Float64Array(top + segment.size);
  room.set(sheet.slots);
  install(segment, room);
  const turned = turn({ node: inputNode, slot: input }, plot, room, sheet);

  const series = outputs.map(({ expr, type }) => ({
    label: label(expr),
    type,
    values: new Float64Array(points),
    present: sheet.now(expr, line).value,
  }));
  const present = sheet.slots[input]!;
  for (let i = 0; i < points; i++) {
    const sound = turned.at(values[i]!);
    runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, turned.slots, KERNELS);
    outputs.forEach(({ handle }, k) => {
      series[k]!.values[i] = sound ? turned.slots[slot(handle)]! : NaN;
    });
  }
  return {
    input: {
      label: label(entry.against),
      type: plotType(inputNode, entry),
      values,
      log: entry.over.log,
      present,
      slot: input,
    },
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
