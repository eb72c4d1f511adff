// Puts the ends of values that a cell asks for (`low(x)`, `high(x)`) into its slots.

import { askedAmong } from './asked.ts';
import { coneOf, programOf } from './course.ts';
import type { Course } from './course.ts';
import type { Node } from './node.ts';
import { spreadModel } from './spread-model.ts';

/** Computes the ends over all that the cell rests on, whose operations have run on these slots. */
export function putEnds(node: Node, slots: Float64Array, course: Course): void {
  createEndPutter(node, null, course)(slots);
}

/** Puts the ends of a cell into slots again and again, of which those of one input and what follows from it differ; null where anything may. */
export function createEndPutter(node: Node, turned: number | null, course: Course): (slots: Float64Array) => void {
  const { nodes, order } = course;
  const analyses = course.analyses!;
  const { ends } = node.compiled;
  const k = nodes.indexOf(node);
  const cone = coneOf(k, nodes).add(k);
  const parts = order.filter((u) => cone.has(u));
  const program = programOf(parts, nodes);
  const wanted = ends.map(({ of }) => of);
  const sides = [...new Set(ends.map(({ which }) => which))];
  const rests = parts.map((u) => nodes[u]!);
  const isAlone = rests.every(
    (each) => each === node || (each.compiled.ends.length === 0 && each.compiled.asks === null),
  );
  let over: ReturnType<typeof analyses.endsOver> | null = null;
  return (slots) => {
    const model = spreadModel(rests, askedAmong(cone, slots, course), program, slots);
    if (turned !== null && isAlone) over ??= analyses.endsOver(model, turned, wanted, sides);
    const found = over === null ? analyses.ends(model, wanted, sides) : over(model);
    ends.forEach(({ which, into }, i) => (slots[into] = found[i]![which]));
  };
}
