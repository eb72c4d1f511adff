// Which part of a stage goes where, before there is any coordinate.
//
// The channel stands upright. From its upper terminal the *line* goes up through the shortest d.c. path
// to a rail, from the lower one down. Every other node belongs to a *branch*, a connected set of nodes
// outside the line: left of the channel if it serves the gate or brings in the signal, right otherwise.
// A branch is drawn as a tree; legs of it that the tree does not use, and legs between nodes of the
// line, are *chords*. Legs to a rail *hang* from their node. A leg to the signal ends on a leaf of the
// tree that has the leg's own name (`leafOf`). So every leg is exactly one of: line, tree, chord, hang.

import type { SchematicInput, StageLeg } from './stage-input.ts';

export type Side = 'left' | 'right';

/** One step of the line, outwards: the leg and the node it leads to, null for a rail. */
export interface LineStep {
  readonly leg: number;
  readonly node: string | null;
}
export interface TreeEdge {
  readonly parent: string;
  readonly child: string;
  /** Null where a branch hangs on nothing and begins by itself. */
  readonly leg: number | null;
  readonly side: Side;
}
export interface Chord {
  readonly leg: number;
  readonly a: string;
  readonly b: string;
}
export interface Hang {
  readonly leg: number;
  readonly up: boolean;
}
export interface Topology {
  readonly upper: 'drain' | 'source';
  readonly lower: 'drain' | 'source';
  /** Whether the bulk is a place of its own. */
  readonly hasBulk: boolean;
  readonly above: readonly LineStep[];
  readonly below: readonly LineStep[];
  readonly edges: readonly TreeEdge[];
  readonly chords: readonly Chord[];
  readonly hangs: ReadonlyMap<string, readonly Hang[]>;
  /** How many legs a node has. */
  readonly degree: ReadonlyMap<string, number>;
}

/** The leaf on which a leg to the signal ends. */
export function leafOf(leg: number): string {
  return `leg ${leg}`;
}

/** Sorts the legs of a stage into line, trees, chords and hangs. */
export function sortLegs(input: SchematicInput): Topology {
  const graph = createGraph(input);
  const [upper, lower] = orient(input, graph);
  const used = new Set<number>();
  const above = followLine(graph, upper, 'up', used, railsFrom(graph, lower));
  const below = followLine(graph, lower, 'down', used, railsFrom(graph, upper), new Set(lineNodes(above)));
  const hangs = new Map<string, Hang[]>();
  input.legs.forEach((leg, index) => {
    if (used.has(index) || !endsOnRail(leg)) return;
    used.add(index);
    const up = leg.to.kind === 'rail' && isUp(leg);
    hangs.set(leg.from, [...(hangs.get(leg.from) ?? []), { leg: index, up }]);
  });
  const anchors = [...graph.terminals, ...lineNodes(above), ...lineNodes(below)];
  const edges = growTrees(input, graph, anchors, used);
  const chords: Chord[] = [];
  input.legs.forEach((leg, index) => {
    if (!used.has(index)) chords.push({ leg: index, a: leg.from, b: leg.to.name });
  });
  const degree = new Map<string, number>();
  for (const [node, legs] of graph.legsOf) degree.set(node, legs.length);
  return { upper, lower, hasBulk: graph.terminals.includes('bulk'), above, below, edges, chords, hangs, degree };
}

// ---------------------------------------------------------------- the graph

interface Graph {
  readonly legs: readonly StageLeg[];
  readonly terminals: readonly string[];
  /** Named nodes other than terminals. */
  readonly named: readonly string[];
  readonly legsOf: ReadonlyMap<string, readonly number[]>;
}

function createGraph(input: SchematicInput): Graph {
  const legsOf = new Map<string, number[]>();
  for (const name of input.nodes) legsOf.set(name, []);
  for (const name of ['gate', 'drain', 'source']) legsOf.set(name, []);
  const attach = (node: string, leg: number): void => {
    legsOf.set(node, [...(legsOf.get(node) ?? []), leg]);
  };
  input.legs.forEach((leg, index) => {
    attach(leg.from, index);
    if (leg.to.kind === 'node' && leg.to.name !== leg.from) attach(leg.to.name, index);
  });
  const hasBulk = input.family === 'MOSFET' && (legsOf.get('bulk') ?? []).length > 0;
  const terminals = ['gate', 'drain', 'source', ...(hasBulk ? ['bulk'] : [])];
  const bare = input.family === 'MOSFET' && !hasBulk ? ['bulk'] : [];
  const named = [...legsOf.keys()].filter((name) => !terminals.includes(name) && !bare.includes(name));
  return { legs: input.legs, terminals, named, legsOf };
}

/** A leg from a node to itself is shown hanging, too, with the node's name at its end. */
function endsOnRail(leg: StageLeg): boolean {
  return leg.to.kind === 'rail' || (leg.to.kind === 'node' && leg.to.name === leg.from);
}

function isDirect(leg: StageLeg): boolean {
  return leg.kind !== 'capacitor';
}

function isUp(leg: StageLeg): boolean {
  const { volts, name } = leg.to;
  return volts === null ? !/^[-−]/.test(name) : volts > 0;
}

function otherEnd(leg: StageLeg, node: string): string | null {
  if (leg.to.kind !== 'node') return null;
  return leg.from === node ? leg.to.name : leg.from;
}

function lineNodes(steps: readonly LineStep[]): string[] {
  return steps.flatMap(({ node }) => (node === null ? [] : [node]));
}

// ---------------------------------------------------------------- the line

interface Route {
  readonly steps: readonly LineStep[];
  readonly volts: number | null;
  readonly up: boolean;
}

/** All shortest d.c. routes from a terminal through named nodes to rails, nearest first. */
function routesFrom(graph: Graph, start: string, taken: ReadonlySet<string>, used: ReadonlySet<number>): Route[] {
  const routes: Route[] = [];
  const seen = new Set([start, ...taken]);
  let frontier: { node: string; steps: LineStep[] }[] = [{ node: start, steps: [] }];
  while (frontier.length > 0) {
    const next: typeof frontier = [];
    for (const { node, steps } of frontier) {
      for (const index of graph.legsOf.get(node) ?? []) {
        const leg = graph.legs[index]!;
        if (used.has(index) || !isDirect(leg)) continue;
        if (leg.to.kind === 'rail') {
          routes.push({ steps: [...steps, { leg: index, node: null }], volts: leg.to.volts, up: isUp(leg) });
          continue;
        }
        const far = otherEnd(leg, node);
        if (far === null || seen.has(far) || !graph.named.includes(far)) continue;
        seen.add(far);
        next.push({ node: far, steps: [...steps, { leg: index, node: far }] });
      }
    }
    frontier = next;
  }
  return routes;
}

function railsFrom(graph: Graph, terminal: string): Route[] {
  return routesFrom(graph, terminal, new Set(), new Set());
}

/** A rail without a value counts as just above or below 0 V, as its name says. */
function height(route: Route): number {
  return route.volts ?? (route.up ? 1 : -1);
}

/** Which terminal stands up: the one on the higher rail, else the drain of an n- and the source of a p-channel FET. */
function orient(input: SchematicInput, graph: Graph): ['drain' | 'source', 'drain' | 'source'] {
  const drain = nearestHeight(railsFrom(graph, 'drain'));
  const source = nearestHeight(railsFrom(graph, 'source'));
  const known = drain !== null && source !== null && drain !== source;
  let drainUp = known ? drain > source : input.channel === 'n';
  // With one rail alone it is that rail which says where its terminal goes.
  if (!known && drain === null && source !== null && source !== 0) drainUp = source < 0;
  if (!known && source === null && drain !== null && drain !== 0) drainUp = drain > 0;
  return drainUp ? ['drain', 'source'] : ['source', 'drain'];
}

/** Mean height of the nearest rails. */
function nearestHeight(routes: readonly Route[]): number | null {
  const first = routes[0];
  if (first === undefined) return null;
  const nearest = routes.filter(({ steps }) => steps.length === first.steps.length).map(height);
  return nearest.reduce((sum, each) => sum + each, 0) / nearest.length;
}

/** The route that makes the line on one side of the channel; its legs are marked as used. */
function followLine(
  graph: Graph,
  terminal: string,
  direction: 'up' | 'down',
  used: Set<number>,
  opposite: readonly Route[],
  taken: ReadonlySet<string> = new Set(),
): readonly LineStep[] {
  const sign = direction === 'up' ? 1 : -1;
  const across = opposite.map((route) => sign * height(route));
  const fits = (route: Route): boolean => {
    const own = sign * height(route);
    if (direction === 'up' ? own > 0 : own >= 0) return true;
    return across.length > 0 && across.every((other) => own > other);
  };
  const routes = routesFrom(graph, terminal, taken, used).filter(fits);
  const steps = best(routes, sign) ?? firstHang(graph, terminal, direction, used);
  for (const { leg } of steps) used.add(leg);
  return steps;
}

/** The shortest route, among equals the one to the most outlying rail. */
function best(routes: readonly Route[], sign: number): readonly LineStep[] | null {
  let found: Route | null = null;
  for (const route of routes) {
    if (found === null) found = route;
    else if (route.steps.length === found.steps.length && sign * height(route) > sign * height(found)) found = route;
  }
  return found?.steps ?? null;
}

/** Without a d.c. path: a capacitor to a rail on that side, if there is one. */
function firstHang(
  graph: Graph,
  terminal: string,
  direction: 'up' | 'down',
  used: ReadonlySet<number>,
): readonly LineStep[] {
  const leg = (graph.legsOf.get(terminal) ?? []).find((index) => {
    const { from, to } = graph.legs[index]!;
    return (
      !used.has(index) && from === terminal && to.kind === 'rail' && isUp(graph.legs[index]!) === (direction === 'up')
    );
  });
  return leg === undefined ? [] : [{ leg, node: null }];
}

// ---------------------------------------------------------------- branches

function growTrees(input: SchematicInput, graph: Graph, anchors: readonly string[], used: Set<number>): TreeEdge[] {
  const edges: TreeEdge[] = [];
  const sideOf = new Map<string, Side>();
  for (const anchor of anchors) sideOf.set(anchor, anchor === 'bulk' ? 'right' : 'left');
  for (const branch of branchesOf(graph, new Set(anchors))) {
    const wanted = sideOfBranch(input, graph, branch);
    const root = rootOf(graph, branch, anchors, wanted);
    // The gate can be reached from the left alone, the bulk from the right.
    const side = root?.parent === 'gate' ? 'left' : root?.parent === 'bulk' || root === null ? 'right' : wanted;
    for (const node of branch) sideOf.set(node, side);
    if (root === null) edges.push({ parent: '', child: branch[0]!, leg: null, side });
    else {
      used.add(root.leg);
      edges.push({ ...root, side });
    }
    growTree(graph, branch, root?.child ?? branch[0]!, side, used, edges);
  }
  input.legs.forEach((leg, index) => {
    if (used.has(index) || (leg.to.kind !== 'signal' && leg.to.kind !== 'common')) return;
    used.add(index);
    edges.push({ parent: leg.from, child: leafOf(index), leg: index, side: sideOf.get(leg.from) ?? 'left' });
  });
  return edges;
}

/** Sets of named nodes that hang together without the anchors. */
function branchesOf(graph: Graph, anchors: ReadonlySet<string>): string[][] {
  const seen = new Set<string>();
  const branches: string[][] = [];
  for (const start of graph.named) {
    if (seen.has(start) || anchors.has(start)) continue;
    const branch: string[] = [start];
    seen.add(start);
    for (let at = 0; at < branch.length; at++) {
      for (const index of graph.legsOf.get(branch[at]!) ?? []) {
        const far = otherEnd(graph.legs[index]!, branch[at]!);
        if (far === null || seen.has(far) || anchors.has(far) || !graph.named.includes(far)) continue;
        seen.add(far);
        branch.push(far);
      }
    }
    branches.push(branch);
  }
  return branches;
}

function sideOfBranch(input: SchematicInput, graph: Graph, branch: readonly string[]): Side {
  const isOut = branch.some((node) => node === 'load' || input.output.includes(node));
  if (isOut) return 'right';
  let gateOnly = true;
  let signal = false;
  let anchored = false;
  for (const node of branch) {
    for (const index of graph.legsOf.get(node) ?? []) {
      const leg = graph.legs[index]!;
      if (leg.to.kind === 'signal' || leg.to.kind === 'common') signal = true;
      const far = otherEnd(leg, node);
      if (far === null || branch.includes(far)) continue;
      anchored = true;
      if (far !== 'gate') gateOnly = false;
    }
  }
  return signal || (gateOnly && anchored) ? 'left' : 'right';
}

/** The leg by which a branch is held: at the gate on the left, at the channel's line on the right, if it has the choice. */
function rootOf(
  graph: Graph,
  branch: readonly string[],
  anchors: readonly string[],
  side: Side,
): { parent: string; child: string; leg: number } | null {
  const holds: { parent: string; child: string; leg: number }[] = [];
  graph.legs.forEach((leg, index) => {
    if (leg.to.kind !== 'node' || leg.to.name === leg.from) return;
    const ends = [leg.from, leg.to.name];
    const child = ends.find((end) => branch.includes(end));
    const parent = ends.find((end) => anchors.includes(end));
    if (child !== undefined && parent !== undefined) holds.push({ parent, child, leg: index });
  });
  const wanted = holds.find(({ parent }) =>
    side === 'left' ? parent === 'gate' : parent !== 'gate' && parent !== 'bulk',
  );
  return wanted ?? holds[0] ?? null;
}

function growTree(
  graph: Graph,
  branch: readonly string[],
  root: string,
  side: Side,
  used: Set<number>,
  edges: TreeEdge[],
): void {
  const reached = [root];
  for (let at = 0; at < reached.length; at++) {
    for (const index of graph.legsOf.get(reached[at]!) ?? []) {
      const far = otherEnd(graph.legs[index]!, reached[at]!);
      if (used.has(index) || far === null || !branch.includes(far) || reached.includes(far)) continue;
      reached.push(far);
      used.add(index);
      edges.push({ parent: reached[at]!, child: far, leg: index, side });
    }
  }
}
