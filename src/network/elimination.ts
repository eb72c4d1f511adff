// Node voltages of a resistive network as straight-line operations.
//
// Nodes are eliminated one by one, each by the star-mesh rule: node k with conductances g_j to its neighbours
// (their sum S taken from them, never from a stored diagonal) leaves conductances g_i g_j / S between them, hands a
// share g_j / S of what is injected into it to each, and is found again as v_k = sum(g_j / S v_j) + i_k / S.
// Nothing is subtracted, so every share is right to a few last digits, however far apart the resistors lie.
// A node with one neighbour needs no division: v_k = v_j + R i_k. Fewest neighbours first.
// Source: W. K. Grassmann, M. I. Taksar, D. P. Heyman, Operations Research 33 (1985), for elimination that takes the
// diagonal from the off-diagonals; the star-mesh rule is A. Rosen's (1924).

import type { Emitter, Handle } from './emitter.ts';
import { ONE, over, plus, term, times } from './term.ts';
import type { Term } from './term.ts';

/** A resistor between two nodes of the network. */
interface Resistor {
  readonly a: number;
  readonly b: number;
  readonly ohms: Handle;
}

/** One excitation: voltages of the held nodes and currents injected into free ones. A node left out has 0. */
export interface Column {
  readonly held: ReadonlyMap<number, Term>;
  readonly injected: ReadonlyMap<number, Term>;
}

/** A connection between two nodes, as resistance or conductance, whichever has been emitted. */
interface Edge {
  ohms: Term;
  siemens: Term;
}

/** One eliminated node: how its voltage follows from its neighbours. */
interface Step {
  readonly node: number;
  readonly shares: readonly { readonly node: number; readonly share: Term }[];
  /** Resistance that what is injected meets. */
  readonly ohms: Term;
  readonly injected: readonly Term[];
}

/**
 * Voltages (V) of all `size` nodes in each column, by `result[column][node]`. Nodes in `isHeld` keep their column's
 * voltage. A free node that no resistor leads away from must not be injected into; its voltage is 0.
 */
export function solveNetwork(
  e: Emitter,
  size: number,
  isHeld: (node: number) => boolean,
  resistors: readonly Resistor[],
  columns: readonly Column[],
): Term[][] {
  const edges = connect(e, size, isHeld, resistors);
  const injected = columns.map((column) =>
    Array.from({ length: size }, (_, node) => column.injected.get(node) ?? null),
  );
  const free = new Set(Array.from({ length: size }, (_, node) => node).filter((node) => !isHeld(node)));
  const steps: Step[] = [];
  while (free.size > 0) {
    const node = [...free].reduce((best, other) => (edges[other].size < edges[best].size ? other : best));
    free.delete(node);
    steps.push(eliminate(e, node, edges, injected, isHeld));
  }
  return columns.map((column, index) => {
    const volts: Term[] = Array.from({ length: size }, (_, node) => column.held.get(node) ?? null);
    for (const step of steps.toReversed()) {
      let v = times(e, step.injected[index], step.ohms);
      for (const { node, share } of step.shares) v = plus(e, v, times(e, share, volts[node]));
      volts[step.node] = v;
    }
    return volts;
  });
}

function connect(
  e: Emitter,
  size: number,
  isHeld: (node: number) => boolean,
  resistors: readonly Resistor[],
): Map<number, Edge>[] {
  const edges: Map<number, Edge>[] = Array.from({ length: size }, () => new Map());
  for (const { a, b, ohms } of resistors) join(e, edges, isHeld, a, b, { ohms: term(ohms), siemens: null });
  return edges;
}

/** Lays an edge between two nodes, beside one that may lie there already; between two held nodes none matters. */
function join(
  e: Emitter,
  edges: Map<number, Edge>[],
  isHeld: (node: number) => boolean,
  a: number,
  b: number,
  edge: Edge,
): void {
  if (a === b || (isHeld(a) && isHeld(b))) return;
  const present = edges[a].get(b);
  const joined: Edge = present ? { ohms: null, siemens: plus(e, siemens(e, present), siemens(e, edge)) } : edge;
  edges[a].set(b, joined);
  edges[b].set(a, joined);
}

function eliminate(
  e: Emitter,
  node: number,
  edges: Map<number, Edge>[],
  injected: Term[][],
  isHeld: (node: number) => boolean,
): Step {
  const around = [...edges[node]];
  for (const [neighbour] of around) edges[neighbour].delete(node);
  const here = injected.map((column) => column[node]);
  const { shares, total } = sharesOf(e, around);
  for (let i = 0; i < around.length; i++) {
    const [to] = around[i];
    if (!isHeld(to)) injected.forEach((column, n) => (column[to] = plus(e, column[to], times(e, here[n], shares[i]))));
    for (let j = i + 1; j < around.length; j++) {
      if (isHeld(to) && isHeld(around[j][0])) continue;
      const edge: Edge =
        around.length === 2
          ? { ohms: plus(e, ohms(e, around[0][1]), ohms(e, around[1][1])), siemens: null }
          : { ohms: null, siemens: times(e, siemens(e, around[i][1]), shares[j]) };
      join(e, edges, isHeld, to, around[j][0], edge);
    }
  }
  // The resistance that an injected current meets is emitted only where a current is injected.
  const meets = here.some((x) => x !== null) ? total() : null;
  return { node, shares: around.map(([to], i) => ({ node: to, share: shares[i] })), ohms: meets, injected: here };
}

/** The share of each neighbour, and the resistance of all of them together. */
function sharesOf(e: Emitter, around: readonly (readonly [number, Edge])[]): { shares: Term[]; total: () => Term } {
  if (around.length === 0) return { shares: [], total: () => null };
  if (around.length === 1) return { shares: [ONE], total: () => ohms(e, around[0][1]) };
  if (around.length === 2) {
    const [first, second] = [ohms(e, around[0][1]), ohms(e, around[1][1])];
    const sum = plus(e, first, second);
    const shares = [over(e, second, sum), over(e, first, sum)];
    return { shares, total: () => times(e, first, shares[0]) };
  }
  const all = around.map(([, edge]) => siemens(e, edge));
  const sum = all.reduce<Term>((total, g) => plus(e, total, g), null);
  return { shares: all.map((g) => over(e, g, sum)), total: () => over(e, ONE, sum) };
}

function ohms(e: Emitter, edge: Edge): Term {
  return (edge.ohms ??= over(e, ONE, edge.siemens));
}

function siemens(e: Emitter, edge: Edge): Term {
  return (edge.siemens ??= over(e, ONE, edge.ohms));
}
