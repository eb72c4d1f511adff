// Puts the ends of values that a cell asks for (`low(x)`, `high(x)`) into its slots.

import { askedAmong } from './asked.ts';
import { coneOf, programOf } from './course.ts';
import type { Course } from './course.ts';
import type { Node } from './node.ts';
import { spreadModel } from './spread-model.ts';

/** Computes the ends over all that the cell rests on, whose operations have run on these slots. */
export function putEnds(node: Node, slots: Float64Array, course: Course): void {
  const { nodes, order, analyses } = course;
  const { ends } = node.compiled;
  const k = nodes.indexOf(node);
  const cone = coneOf(k, nodes).add(k);
  const parts = order.filter((u) => cone.has(u));
  const found = analyses!.ends(
    spreadModel(
      parts.map((u) => nodes[u]!),
      askedAmong(cone, slots, course),
      programOf(parts, nodes),
      slots,
    ),
    ends.map(({ of }) => of),
  );
  ends.forEach(({ which, into }, i) => (slots[into] = found[i]![which]));
}
