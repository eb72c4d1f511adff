// The order in which cells are evaluated, and the cells that depend on themselves. No recursion: a chain
// of ten thousand cells is as safe as one of three.

/** Nodes are 0..n-1; `uses[k]` lists the nodes that k reads. */
interface Order {
  /** Every node, each after all that it reads, members of cycles apart: they come before what hangs on them. */
  readonly order: readonly number[];
  /** For each node on a cycle, a cycle through it as a path of nodes that ends where it began; shared by its members. */
  readonly cycles: ReadonlyMap<number, readonly number[]>;
}

/** Topological order by counting (Kahn), sheet order kept among independent cells. */
export function topologicalOrder(uses: readonly (readonly number[])[]): Order {
  const n = uses.length;
  const waiting = new Int32Array(n);
  const usedBy: number[][] = Array.from({ length: n }, () => []);
  for (let k = 0; k < n; k++) {
    for (const u of uses[k]!) {
      usedBy[u]!.push(k);
      waiting[k]!++;
    }
  }
  const order: number[] = [];
  let passed = 0;
  const follow = (): void => {
    for (; passed < order.length; passed++) {
      for (const d of usedBy[order[passed]!]!) if (--waiting[d]! === 0) order.push(d);
    }
  };
  for (let k = 0; k < n; k++) if (waiting[k] === 0) order.push(k);
  follow();
  const cycles = new Map<number, readonly number[]>();
  if (order.length < n) {
    const rest = new Set<number>();
    for (let k = 0; k < n; k++) if (waiting[k]! > 0) rest.add(k);
    for (const members of components(uses, rest)) {
      for (const member of [...members].toSorted((a, b) => a - b)) {
        const path = cycles.has(member) ? null : shortestCycle(uses, members, member);
        for (const k of path ?? []) if (!cycles.has(k)) cycles.set(k, path!);
      }
    }
    // Members no longer wait for anything; what hangs on them follows in order.
    const members = [...rest].filter((k) => cycles.has(k));
    for (const k of members) waiting[k] = 0;
    order.push(...members);
    follow();
  }
  return { order, cycles };
}

/** Strongly connected components of the subgraph `within` (Tarjan's method, with an explicit stack). */
function components(uses: readonly (readonly number[])[], within: ReadonlySet<number>): Set<number>[] {
  const index = new Map<number, number>();
  const low = new Map<number, number>();
  const onStack = new Set<number>();
  const stack: number[] = [];
  const found: Set<number>[] = [];
  for (const root of within) {
    if (index.has(root)) continue;
    const work: { node: number; next: number }[] = [{ node: root, next: 0 }];
    while (work.length > 0) {
      const top = work[work.length - 1]!;
      const { node } = top;
      if (top.next === 0) {
        index.set(node, index.size);
        low.set(node, index.get(node)!);
        stack.push(node);
        onStack.add(node);
      }
      const child = uses[node]![top.next++];
      if (child !== undefined) {
        if (!within.has(child)) continue;
        if (!index.has(child)) work.push({ node: child, next: 0 });
        else if (onStack.has(child)) low.set(node, Math.min(low.get(node)!, index.get(child)!));
        continue;
      }
      work.pop();
      const parent = work[work.length - 1];
      if (parent) low.set(parent.node, Math.min(low.get(parent.node)!, low.get(node)!));
      if (low.get(node) !== index.get(node)) continue;
      const members = new Set<number>();
      for (let member = -1; member !== node;) {
        member = stack.pop()!;
        onStack.delete(member);
        members.add(member);
      }
      found.push(members);
    }
  }
  return found;
}

/** A shortest path from `start` back to itself among the members of its component, or null where there is none. */
function shortestCycle(
  uses: readonly (readonly number[])[],
  members: ReadonlySet<number>,
  start: number,
): readonly number[] | null {
  const cameFrom = new Map<number, number>();
  const queue = [start];
  for (let i = 0; i < queue.length; i++) {
    const node = queue[i]!;
    for (const next of uses[node]!) {
      if (next === start) {
        const path = [start];
        for (let k = node; k !== start; k = cameFrom.get(k)!) path.push(k);
        path.push(start);
        return path.toReversed();
      }
      if (!members.has(next) || cameFrom.has(next)) continue;
      cameFrom.set(next, node);
      queue.push(next);
    }
  }
  return null;
}
