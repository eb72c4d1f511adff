// The compiled cells and how they hang together: what a cell rests on, what lies between two, the program of some.

import { assemble } from '../program/index.ts';
import type { Program } from '../program/index.ts';
import type { Analyses } from './model.ts';
import type { Node } from './node.ts';

export interface Course {
  readonly nodes: readonly Node[];
  readonly byName: ReadonlyMap<string, Node>;
  /** Indices of nodes, each behind those that it uses. */
  readonly order: readonly number[];
  readonly analyses: Analyses | null;
}

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

/** The cells between some inputs and a goal, in order, the goal not among them; a part or point of which a field is turned is. */
export function wayBetween(
  inputs: readonly Node[],
  goal: Node,
  { nodes, order }: Pick<Course, 'nodes' | 'order'>,
): Node[] {
  const wanted = new Set<Node>([goal]);
  for (const k of order.toReversed()) if (wanted.has(nodes[k]!)) for (const u of nodes[k]!.uses) wanted.add(nodes[u]!);
  const reached = new Set<Node>(inputs);
  const found: Node[] = [];
  for (const k of order) {
    const node = nodes[k]!;
    const isInput = inputs.includes(node);
    if (!isInput && !node.uses.some((u) => reached.has(nodes[u]!))) continue;
    reached.add(node);
    if (!isInput || node.tree.entry.type !== 'quantity') found.push(node);
  }
  return found.filter((node) => node !== goal && wanted.has(node));
}

/** The program of some nodes, given in topological order. */
export function programOf(live: readonly number[], nodes: readonly Node[]): Program {
  const position = new Map(live.map((k, i) => [k, i]));
  return assemble(
    live.map((k) => nodes[k]!.compiled.segment),
    live.map((k) => nodes[k]!.usedBy.map((d) => position.get(d)).filter((d) => d !== undefined)),
  );
}
