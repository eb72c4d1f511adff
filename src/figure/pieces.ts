// The order in which a schematic is put together: a list of pieces, each fastened to the wire of one node
// and pushed outwards in turn. What comes first stands nearest to the channel. Chords come before
// branches, because a branch takes the rest of its row.

import type { SchematicInput, StageLeg } from './stage-input.ts';
import type { Chord, Hang, Side, Topology, TreeEdge } from './topology.ts';
import { BULK_PIN_ROW, GATE_ROW, Rows } from './rows.ts';

/** One thing to place on a side of the channel. `node` is the one whose wire it is fastened to. */
export type Piece = { readonly side: Side; readonly node: string } & (
  | { readonly kind: 'label' }
  | { readonly kind: 'hang'; readonly up: Hang | null; readonly down: Hang | null; readonly underGate: boolean }
  | { readonly kind: 'chord'; readonly leg: number; readonly far: string }
  /** A lying element from a channel terminal to the gate, with a wire down or up to the gate's row. */
  | { readonly kind: 'bridge'; readonly leg: number }
  | { readonly kind: 'upright'; readonly leg: number; readonly child: string }
  | { readonly kind: 'lying'; readonly leg: number; readonly child: string }
  /** The bulk's way from its pin to its row. */
  | { readonly kind: 'riser' }
  | { readonly kind: 'begin' }
  | { readonly kind: 'terminal'; readonly last: boolean }
  /** Wires beside the channel are finished: of its terminals on the left, of the bulk on the right. */
  | { readonly kind: 'settle' }
);

export interface Plan {
  readonly pieces: readonly Piece[];
  readonly rows: Rows;
  /** The row of every node and leaf. */
  readonly rowOf: ReadonlyMap<string, string>;
}

/** Puts the pieces in order and gives every node its row. */
export function planPieces(input: SchematicInput, topology: Topology): Plan {
  const planner = new Planner(input, topology);
  const rowOf = planner.assignRows();
  return { pieces: planner.order(), rows: planner.rows(), rowOf };
}

class Planner {
  readonly #input: SchematicInput;
  readonly #topology: Topology;
  readonly #line: readonly string[];
  readonly #lineAbove: readonly string[];
  readonly #lineBelow: readonly string[];
  readonly #children = new Map<string, TreeEdge[]>();
  readonly #inChord = new Set<string>();
  readonly #left = new Set<string>();
  readonly #bulkOnPin: boolean;
  readonly #lying = new Set<TreeEdge>();
  readonly #above: string[] = [];
  readonly #below: string[] = [];
  readonly #pieces: Piece[] = [];

  constructor(input: SchematicInput, topology: Topology) {
    this.#input = input;
    this.#topology = topology;
    const nodes = (steps: Topology['above']): string[] => steps.flatMap(({ node }) => (node === null ? [] : [node]));
    this.#lineAbove = [topology.upper, ...nodes(topology.above)];
    this.#lineBelow = [topology.lower, ...nodes(topology.below)];
    this.#line = [...this.#lineBelow, ...this.#lineAbove];
    for (const edge of topology.edges) {
      this.#children.set(edge.parent, [...(this.#children.get(edge.parent) ?? []), edge]);
      if (edge.side === 'left') this.#left.add(edge.child);
    }
    this.#left.add('gate');
    for (const { a, b } of topology.chords) {
      this.#inChord.add(a);
      this.#inChord.add(b);
    }
    const bulkChords = topology.chords.filter(({ a, b }) => a === 'bulk' || b === 'bulk');
    const toLine = bulkChords.every(({ a, b }) => this.#line.includes(a) || this.#line.includes(b));
    this.#bulkOnPin = topology.hasBulk && toLine && !this.#children.has('bulk');
  }

  // -------------------------------------------------------------- rows

  /** A child shares its parent's row where it is the one that lies, see `#lyingChild`. */
  assignRows(): Map<string, string> {
    const rowOf = new Map<string, string>([['gate', GATE_ROW]]);
    for (const node of this.#line) rowOf.set(node, node);
    if (this.#topology.hasBulk) rowOf.set('bulk', this.#bulkOnPin ? BULK_PIN_ROW : 'bulk');
    const walk = (parent: string, rows: string[]): void => {
      for (const side of ['left', 'right'] as const) {
        const lying = this.#lyingChild(parent, side);
        if (lying !== null) this.#lying.add(lying);
      }
      for (const edge of this.#children.get(parent) ?? []) {
        if (this.#lying.has(edge)) rowOf.set(edge.child, rowOf.get(parent)!);
        else {
          rowOf.set(edge.child, edge.child);
          rows.push(edge.child);
        }
        walk(edge.child, rows);
      }
    };
    const bulkUp = this.#bulkHangsUp();
    if (this.#topology.hasBulk && !this.#bulkOnPin) {
      (bulkUp ? this.#above : this.#below).push('bulk');
      walk('bulk', bulkUp ? this.#above : this.#below);
    }
    walk('gate', this.#below);
    this.#lineBelow.forEach((node, index) => {
      if (index > 0) this.#below.push(node);
      walk(node, this.#below);
    });
    this.#lineAbove.forEach((node, index) => {
      if (index > 0) this.#above.push(node);
      walk(node, this.#above);
    });
    walk('', this.#below);
    return rowOf;
  }

  rows(): Rows {
    return new Rows(this.#above, this.#topology.upper, this.#topology.lower, this.#below);
  }

  /** Nothing but ties: its voltage stands where it is tied to. */
  #bulkIsTied(): boolean {
    const isBulk = ({ from, to }: StageLeg): boolean => from === 'bulk' || (to.kind === 'node' && to.name === 'bulk');
    return this.#input.legs.every((leg) => !isBulk(leg) || leg.kind === 'tie');
  }

  #bulkHangsUp(): boolean {
    const hangs = this.#topology.hangs.get('bulk') ?? [];
    return hangs.length > 0 && hangs.every(({ up }) => up);
  }

  /** The child that goes on along its parent's row: one without chords, towards signal or output if there is a choice. */
  #lyingChild(parent: string, side: Side): TreeEdge | null {
    if (parent === '' || parent === 'bulk') return null;
    const able = (this.#children.get(parent) ?? []).filter(
      (edge) => edge.side === side && !this.#inChord.has(edge.child),
    );
    const goals = able.filter(({ child }) => this.#leadsOut(child));
    return goals[0] ?? able[0] ?? null;
  }

  #leadsOut(node: string): boolean {
    if (node.startsWith('leg ') || node === 'load' || this.#input.output.includes(node)) return true;
    return (this.#children.get(node) ?? []).some(({ child }) => this.#leadsOut(child));
  }

  // -------------------------------------------------------------- order

  order(): readonly Piece[] {
    const { chords, lower } = this.#topology;
    const onLine = (node: string): boolean => this.#line.includes(node);
    const onLeft = (node: string): boolean => this.#left.has(node);
    const isLeft = ({ a, b }: Chord): boolean => onLeft(a) || onLeft(b);
    const gateFirst = (this.#children.get(lower) ?? []).some(({ side }) => side === 'left');
    this.#pieces.push({ kind: 'label', side: 'left', node: 'gate' });
    if (gateFirst) this.#hangs('gate', 'left', true);
    for (const node of this.#line) {
      this.#leftChords(
        node,
        chords.filter((chord) => isLeft(chord) && (chord.a === node || chord.b === node)),
      );
    }
    for (const chord of chords) {
      if (!isLeft(chord) || onLine(chord.a) || onLine(chord.b)) continue;
      const [node, far] = chord.b === 'gate' ? [chord.b, chord.a] : [chord.a, chord.b];
      this.#pieces.push({ kind: 'chord', side: 'left', node, far, leg: chord.leg });
    }
    for (const node of this.#line) {
      const left = (this.#children.get(node) ?? []).filter(({ side }) => side === 'left');
      // The one that lies takes the rest of the row.
      for (const edge of left) if (!this.#lying.has(edge)) this.#branch(edge);
      for (const edge of left) if (this.#lying.has(edge)) this.#branch(edge);
    }
    for (const node of [this.#topology.upper, lower]) this.#pieces.push({ kind: 'settle', side: 'left', node });
    this.#outwards('gate', 'left', !gateFirst);
    this.#orderRight(chords.filter((chord) => !isLeft(chord)));
    return this.#pieces;
  }

  #orderRight(chords: readonly Chord[]): void {
    const { hasBulk } = this.#topology;
    if (hasBulk && !this.#bulkOnPin) this.#pieces.push({ kind: 'riser', side: 'right', node: 'bulk' });
    const isBulk = ({ a, b }: Chord): boolean => a === 'bulk' || b === 'bulk';
    const add = ({ a, b, leg }: Chord): void => {
      const [node, far] = b === 'bulk' || (a !== 'bulk' && this.#line.includes(b)) ? [b, a] : [a, b];
      this.#pieces.push({ kind: 'chord', side: 'right', node, far, leg });
    };
    chords.filter(isBulk).forEach(add);
    if (hasBulk) {
      if (!this.#bulkIsTied()) this.#pieces.push({ kind: 'label', side: 'right', node: 'bulk' });
      this.#outwards('bulk', 'right', true);
      if (this.#bulkOnPin) this.#pieces.push({ kind: 'settle', side: 'right', node: 'bulk' });
    }
    chords.filter((chord) => !isBulk(chord)).forEach(add);
    for (const node of this.#line) this.#outwards(node, 'right', true);
    for (const { child } of this.#children.get('') ?? []) {
      this.#pieces.push({ kind: 'begin', side: 'right', node: child });
      this.#hangs(child, 'right', false);
      this.#pieces.push({ kind: 'label', side: 'right', node: child });
      this.#outwards(child, 'right', false);
    }
  }

  /** Ties first; one element from a channel terminal to the gate may lie, if nothing else wants that row. */
  #leftChords(node: string, chords: readonly Chord[]): void {
    const { upper, lower } = this.#topology;
    const isTie = ({ leg }: Chord): boolean => this.#input.legs[leg]!.kind === 'tie';
    const rowIsFree = !(this.#children.get(node) ?? []).some(({ side }) => side === 'left');
    const toGate = chords.filter((chord) => !isTie(chord) && (chord.a === 'gate' || chord.b === 'gate'));
    const bridge = (node === upper || node === lower) && rowIsFree ? toGate.at(-1) : undefined;
    const columns = chords.filter((chord) => chord !== bridge);
    for (const { a, b, leg } of [...columns.filter(isTie), ...columns.filter((chord) => !isTie(chord))]) {
      this.#pieces.push({ kind: 'chord', side: 'left', node, far: a === node ? b : a, leg });
    }
    if (bridge !== undefined) this.#pieces.push({ kind: 'bridge', side: 'left', node, leg: bridge.leg });
  }

  #hangs(node: string, side: Side, underGate: boolean): void {
    const hangs = this.#topology.hangs.get(node) ?? [];
    const [ups, downs] = [hangs.filter(({ up }) => up), hangs.filter(({ up }) => !up)];
    for (let at = 0; at < Math.max(ups.length, downs.length); at++) {
      this.#pieces.push({ kind: 'hang', side, node, up: ups[at] ?? null, down: downs[at] ?? null, underGate });
    }
  }

  /** What hangs on a node, its branches, and the circle that marks it where it is taken out. */
  #outwards(node: string, side: Side, withHangs: boolean): void {
    if (withHangs) this.#hangs(node, side, false);
    const children = (this.#children.get(node) ?? []).filter((edge) => edge.side === side);
    const lying = children.find((edge) => this.#lying.has(edge));
    for (const edge of children) if (edge !== lying) this.#branch(edge);
    const ownSide = node === 'gate' || this.#left.has(node) ? 'left' : 'right';
    if (side === ownSide && this.#isMarked(node)) this.#pieces.push({ kind: 'terminal', side, node, last: !lying });
    if (lying) this.#branch(lying);
  }

  #branch(edge: TreeEdge): void {
    const { parent, child, side } = edge;
    const kind = this.#lying.has(edge) ? 'lying' : 'upright';
    this.#pieces.push({ kind, side, node: parent, child, leg: edge.leg! });
    if (child.startsWith('leg ')) return;
    this.#pieces.push({ kind: 'label', side, node: child });
    this.#outwards(child, side, true);
  }

  #isMarked(node: string): boolean {
    if (node === 'load' || this.#input.output.includes(node)) return true;
    const degree = this.#topology.degree.get(node) ?? 0;
    const isChannel = node === 'drain' || node === 'source' || node === 'gate';
    return isChannel ? degree === 0 : degree < 2 && node !== 'bulk';
  }
}
