// Puts the ends of values that a cell asks for (`low(x)`, `high(x)`) into its slots.

import { assemble } from '../program/index.ts';
import type { Program } from '../program/index.ts';
import type { Node } from './node.ts';
import { spreadModel } from './spread-model.ts';
import type { Course } from './turned.ts';

/** Every node that a node rests on, by index. */
export function coneOf(k: number, nodes: readonly Node[]): Set<number> {
  const found = new Set<number>();
  const open = [...nodes[k]!.uses];
  for (let u = open.pop(); u !== undefined; u = open.pop()) {
    if (found.has(u)) continue;
    found.add(u);
    open.push(...nodes[u]!.uses);
  }
  return found;
}

/** Computes the ends over all that the cell rests on, whose operations have run on these slots. */
export function putEnds(node: Node, slots: Float64Array, { nodes, order, analyses }: Course): void {
  const { ends } = node.compiled;
  const k = nodes.indexOf(node);
  const cone = coneOf(k, nodes).add(k);
  const parts = order.filter((u) => cone.has(u));
  const found = analyses!.ends(
    spreadModel(
      parts.map((u) => nodes[u]!),
      programOf(parts, nodes),
      slots,
    ),
    ends.map(({ of }) => of),
  );
  ends.forEach(({ which, into }, i) => (slots[into] = found[i]![which]));
}

/** The program of some nodes, given in topological order. */
export function programOf(live: readonly number[], nodes: readonly Node[]): Program {
  const position = new Map(live.map((k, i) => [k, i]));
  return assemble(
    live.map((k) => nodes[k]!.compiled.segment),
    live.map((k) => nodes[k]!.usedBy.map((d) => position.get(d)).filter((d) => d !== undefined)),
  );
}
