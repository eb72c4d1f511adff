// Places the pieces of a schematic. Heights are settled first (rows), then every piece is pushed outwards from
// the channel until its boxes are clear of all others; wires along the rows follow from where the pieces
// came to stand. Horizontal wires run on rows alone and symbols stand in gaps, so a crossing is always one
// of a horizontal and a vertical wire, never of a wire and a symbol.

import { Board } from './board.ts';
import { currentArrow } from './current-arrow.ts';
import type { Built } from './elements.ts';
import { hangingLeg, lyingLeg, lyingLength, railNeedsName, uprightLeg, WIRE_HALF } from './elements.ts';
import type { Box } from './geometry.ts';
import { boxAround } from './geometry.ts';
import { joinRuns, LABEL_SIZE, plain, textBox, typeset, widthOf } from './labels.ts';
import type { Piece, Plan } from './pieces.ts';
import { BULK_PIN_ROW, GATE_ROW } from './rows.ts';
import type { Rows, Spot } from './rows.ts';
import { CIRCLE_RADIUS, circlePlace } from './places.ts';
import { Reach } from './reach.ts';
import { fetSentence, legSentence, sourceName } from './sentences.ts';
import type { Pin } from './sketch.ts';
import { labelText, Sketch } from './sketch.ts';
import type { SchematicInput, StageLeg } from './stage-input.ts';
import { FET, fetSymbol } from './symbols.ts';
import { leafOf } from './topology.ts';
import type { LineStep, Side, Topology } from './topology.ts';

/** First step away from the end of a wire. */
const STEP = 8;
const STUB = 12;

/** The finished sketch with the wires' nets and pins. */
interface Laid {
  readonly sketch: Sketch;
  readonly pins: readonly Pin[];
  /** The net that stands for all nets joined to one by ties. */
  readonly same: (net: string) => string;
}

/** Puts everything in its place. Distances are drawing units, the channel's middle at (0, 0). */
export function layOut(input: SchematicInput, topology: Topology, plan: Plan): Laid {
  const layout = new Layout(input, topology, plan);
  layout.run();
  return { sketch: layout.sketch, pins: layout.pins, same: layout.sameNet() };
}

class Layout {
  readonly sketch = new Sketch();
  readonly pins: Pin[] = [];
  readonly #board = new Board();
  readonly #input: SchematicInput;
  readonly #topology: Topology;
  readonly #plan: Plan;
  readonly #rows: Rows;
  readonly #reach = new Reach();

  constructor(input: SchematicInput, topology: Topology, plan: Plan) {
    this.#input = input;
    this.#topology = topology;
    this.#plan = plan;
    this.#rows = plan.rows;
  }

  run(): void {
    this.#settleHeights();
    this.#placeFet();
    this.#placeLine(this.#topology.upper, this.#topology.above, true);
    this.#placeLine(this.#topology.lower, this.#topology.below, false);
    for (const piece of this.#plan.pieces) this.#place(piece);
    for (const { node, from, to } of this.#reach.spans()) {
      this.sketch.wire(node, from, this.#yOf(node), to, this.#yOf(node));
    }
  }

  /** Nets joined by ties, as a function to the one that stands for all. */
  sameNet(): (net: string) => string {
    const parent = new Map<string, string>();
    const find = (net: string): string => {
      let at = net;
      for (let up = parent.get(at); up !== undefined; up = parent.get(at)) at = up;
      return at;
    };
    this.#input.legs.forEach(({ from, to, kind }, index) => {
      if (kind !== 'tie') return;
      for (const end of [leafOf(index), ...(to.kind === 'node' ? [to.name] : [])]) {
        const [a, b] = [find(from), find(end)];
        if (a !== b) parent.set(b, a);
      }
    });
    return find;
  }

  // -------------------------------------------------------------- heights

  #settleHeights(): void {
    const rows = this.#rows;
    this.#line((leg, spot, hanging) => this.#need(leg, spot, hanging));
    for (const piece of this.#plan.pieces) {
      const row = this.#rowOf(piece.node);
      if (piece.kind === 'hang') {
        for (const hang of [piece.up, piece.down]) {
          if (hang) this.#need(hang.leg, rows.hangSpot(row, hang.up, piece.side, piece.underGate), true);
        }
      } else if (piece.kind === 'chord') this.#need(piece.leg, rows.betweenSpot(row, this.#rowOf(piece.far)), false);
      else if (piece.kind === 'upright') this.#need(piece.leg, rows.betweenSpot(row, this.#rowOf(piece.child)), false);
      if (piece.side === 'left' && (piece.kind === 'lying' || piece.kind === 'bridge') && this.#isChannel(piece.node)) {
        rows.needLying(row);
      }
    }
  }

  #need(index: number, spot: Spot, hanging: boolean): void {
    const leg = this.#leg(index);
    const labelled = hanging && railNeedsName(leg, !spot.down);
    this.#rows.need(spot, { hanging, labelled, tie: leg.kind === 'tie' });
  }

  #line(visit: (leg: number, spot: Spot, hanging: boolean) => void): void {
    for (const [start, steps, up] of [
      [this.#topology.upper, this.#topology.above, true],
      [this.#topology.lower, this.#topology.below, false],
    ] as const) {
      let node: string = start;
      for (const step of steps) {
        visit(step.leg, this.#rows.lineSpot(this.#rowOf(node), up), step.node === null);
        node = step.node ?? node;
      }
    }
  }

  // -------------------------------------------------------------- middle

  #placeFet(): void {
    const { fetName, fetCell } = this.#input;
    const sourceUp = this.#topology.upper === 'source';
    const symbol = fetSymbol(this.#input, 0, 0, sourceUp, this.#topology.hasBulk);
    const name = labelText('label', FET.gateX + 12, sourceUp ? 17 : -9, 'end', typeset(fetName));
    const boxes = [...symbol.boxes, textBox(name)];
    this.sketch.group({
      kind: 'group',
      of: 'fet',
      leg: null,
      cell: fetCell,
      sentence: fetSentence(this.#input),
      fails: false,
      box: boxAround(boxes),
      items: [...symbol.items, name],
    });
    this.#board.occupy(boxes);
    const [top, bottom] = [this.#yOf(this.#topology.upper), this.#yOf(this.#topology.lower)];
    this.sketch.wire(this.#topology.upper, 0, top, 0, -FET.reach);
    this.sketch.wire(this.#topology.lower, 0, FET.reach, 0, bottom);
    this.#board.occupy([
      { x0: -WIRE_HALF, y0: top, x1: WIRE_HALF, y1: -FET.reach },
      { x0: -WIRE_HALF, y0: FET.reach, x1: WIRE_HALF, y1: bottom },
    ]);
    this.pins.push({ net: this.#topology.upper, x: 0, y: -FET.reach, towards: 'south' });
    this.pins.push({ net: this.#topology.lower, x: 0, y: FET.reach, towards: 'north' });
    this.pins.push({ net: 'gate', x: FET.gateX, y: this.#rows.yOf(GATE_ROW), towards: 'east' });
    this.#reach.touch('gate', 'left', FET.gateX);
    if (this.#topology.hasBulk) {
      this.pins.push({ net: 'bulk', x: FET.bulkX, y: 0, towards: 'west' });
      if (this.#rowOf('bulk') === BULK_PIN_ROW) this.#reach.touch('bulk', 'right', FET.bulkX);
    }
    if (this.#input.current === null) return;
    const down = (this.#input.channel === 'n') === !sourceUp;
    const arrow = currentArrow(this.#input.current, (top - FET.reach) / 2, { down, right: sourceUp });
    for (const item of arrow.items) this.sketch.mark(item, arrow.box);
    this.#board.occupy([arrow.box]);
  }

  #placeLine(start: 'drain' | 'source', steps: readonly LineStep[], up: boolean): void {
    this.#placeLineNode(start);
    let node: string = start;
    for (const { leg: index, node: next } of steps) {
      const spot = this.#rows.lineSpot(this.#rowOf(node), up);
      const parts =
        next === null ? this.#hanging(index, node, 0, spot, true) : this.#upright(index, node, next, 0, spot, true);
      this.#addLeg(index, parts);
      this.#board.occupy(parts.boxes);
      if (next !== null) this.#placeLineNode(next);
      node = next ?? node;
    }
  }

  #placeLineNode(node: string): void {
    this.#reach.touch(node, 'right', 0);
    this.#reach.touch(node, 'left', 0);
    const runs = this.#nodeRuns(node);
    if (runs.length === 0) return;
    const text = labelText('voltage', 7, this.#yOf(node) - 6, 'start', runs);
    this.sketch.text(text);
    this.#board.occupy([textBox(text)]);
  }

  // -------------------------------------------------------------- sides

  #place(piece: Piece): void {
    const { side, node } = piece;
    const direction = side === 'left' ? -1 : 1;
    const start = this.#reach.of(node, side) + direction * STEP;
    const y = this.#yOf(node);
    switch (piece.kind) {
      case 'label':
        return this.#placeLabel(node, side, start, y);
      case 'hang': {
        const built = (x: number): { leg: number; parts: Built }[] =>
          [piece.up, piece.down].flatMap((hang) => {
            if (hang === null) return [];
            const spot = this.#rows.hangSpot(this.#rowOf(node), hang.up, side, piece.underGate);
            return [{ leg: hang.leg, parts: this.#hanging(hang.leg, node, x, spot, false) }];
          });
        const x = this.#fit(
          built(0).flatMap(({ parts }) => parts.boxes),
          start,
          direction,
        );
        for (const { leg, parts } of built(x)) this.#addLeg(leg, parts);
        return this.#reach.touch(node, side, x);
      }
      case 'chord':
        return this.#placeColumn(piece.leg, node, piece.far, side, start);
      case 'upright': {
        this.#placeColumn(piece.leg, node, piece.child, side, start);
        if (piece.child === leafOf(piece.leg)) this.#placeLeaf(piece.leg, side);
        return;
      }
      case 'lying': {
        this.#placeLying(piece.leg, node, piece.child, side, start, y);
        if (piece.child === leafOf(piece.leg)) this.#placeLeaf(piece.leg, side);
        return;
      }
      case 'bridge':
        return this.#placeBridge(piece.leg, node, start, y);
      case 'riser':
        return this.#placeRiser();
      case 'begin': {
        // A branch that hangs on nothing: its wire begins at whatever comes first.
        const x = this.#fit([{ x0: -WIRE_HALF, y0: y - 8, x1: WIRE_HALF, y1: y + 8 }], 60, 1);
        this.#reach.extend(node, side, x);
        return;
      }
      case 'terminal':
        return this.#placeTerminal(node, side, start, y, piece.last);
      case 'settle': {
        const far = this.#reach.of(node, side);
        this.#board.occupy([{ x0: Math.min(0, far), y0: y - 2, x1: Math.max(0, far), y1: y + 2 }]);
      }
    }
  }

  #placeLabel(node: string, side: Side, start: number, y: number): void {
    const runs = this.#nodeRuns(node);
    if (runs.length === 0) return;
    const width = Math.ceil(widthOf(runs, LABEL_SIZE, 'bold'));
    const box = { x0: side === 'left' ? -width : 0, y0: y - 17, x1: side === 'left' ? 0 : width, y1: y - 3 };
    const x = this.#fit([box], start, side === 'left' ? -1 : 1);
    this.sketch.text(labelText('voltage', x, y - 6, side === 'left' ? 'end' : 'start', runs));
    this.#reach.extend(node, side, side === 'left' ? x - width : x + width);
  }

  #placeColumn(index: number, node: string, far: string, side: Side, start: number): void {
    const spot = this.#rows.betweenSpot(this.#rowOf(node), this.#rowOf(far));
    const direction = side === 'left' ? -1 : 1;
    const known = this.#reach.knows(far) ? this.#reach.of(far, side) + direction * STEP : start;
    const from = direction < 0 ? Math.min(start, known) : Math.max(start, known);
    const x = this.#fit(this.#upright(index, node, far, 0, spot, false).boxes, from, direction);
    this.#addLeg(index, this.#upright(index, node, far, x, spot, false));
    this.#reach.touch(node, side, x);
    this.#reach.touch(far, side, x);
  }

  #placeLying(index: number, node: string, child: string, side: Side, start: number, y: number): void {
    const direction = side === 'left' ? -1 : 1;
    const leg = this.#leg(index);
    const build = (x: number): Built =>
      lyingLeg(leg, index, { x, y, near: node, far: child, direction, words: 'above' });
    const x = this.#fit(build(0).boxes, start, direction);
    this.#addLeg(index, build(x));
    this.#reach.touch(node, side, x);
    this.#reach.touch(child, side, x + direction * lyingLength(leg));
  }

  #placeBridge(index: number, node: string, start: number, y: number): void {
    const leg = this.#leg(index);
    const words = node === this.#topology.upper ? 'above' : 'below';
    const build = (x: number): Built => lyingLeg(leg, index, { x, y, near: node, far: 'gate', direction: -1, words });
    const gateY = this.#rows.yOf(GATE_ROW);
    const width = lyingLength(leg);
    const drop = { x0: -width - WIRE_HALF, y0: Math.min(y, gateY), x1: -width + WIRE_HALF, y1: Math.max(y, gateY) };
    const x = this.#fit([...build(0).boxes, drop], start, -1);
    this.#addLeg(index, build(x));
    this.sketch.wire('gate', x - width, y, x - width, gateY);
    this.#reach.touch(node, 'left', x);
    // On the gate's row: the lying element ends on the same net, but at another height.
    this.#reach.touch('gate', 'left', x - width);
  }

  #placeRiser(): void {
    const y = this.#yOf('bulk');
    const x = this.#fit(
      [{ x0: -WIRE_HALF, y0: Math.min(0, y), x1: WIRE_HALF, y1: Math.max(0, y) }],
      FET.bulkX + STEP,
      1,
    );
    this.#board.occupy([{ x0: 0, y0: -2, x1: x, y1: 2 }]);
    this.sketch.wire('bulk', FET.bulkX, 0, x, 0);
    this.sketch.wire('bulk', x, 0, x, y);
    this.#reach.touch('bulk', 'right', x);
    this.#reach.touch('bulk', 'left', x);
  }

  /** The circle at which the signal comes in. */
  #placeLeaf(index: number, side: Side): void {
    const leaf = leafOf(index);
    const name = sourceName(this.#leg(index));
    const y = this.#yOf(leaf);
    const direction = side === 'left' ? -1 : 1;
    const start = this.#reach.of(leaf, side);
    const x = this.#fit(circlePlace(name, plain(name), 0, y, 'below').boxes, start + direction * STUB, direction);
    this.sketch.group(circlePlace(name, plain(name), x, y, 'below').group);
    this.sketch.wire(leaf, start, y, x - direction * CIRCLE_RADIUS, y);
    this.#endAtCircle(leaf, x, y, direction);
  }

  /** The circle at which a node is taken out: at the end of its wire, or on it with the name above. */
  #placeTerminal(node: string, side: Side, start: number, y: number, last: boolean): void {
    const direction = side === 'left' ? -1 : 1;
    const words = !last ? 'above' : side === 'right' ? 'right' : 'below';
    const from = start + (last ? direction * 4 : 0);
    const x = this.#fit(circlePlace(node, typeset(node), 0, y, words).boxes, from, direction);
    this.sketch.group(circlePlace(node, typeset(node), x, y, words).group);
    if (last) this.#endAtCircle(node, x, y, direction);
    this.#reach.touch(node, side, last ? x - direction * CIRCLE_RADIUS : x);
  }

  #endAtCircle(net: string, x: number, y: number, direction: 1 | -1): void {
    this.pins.push({ net, x: x - direction * CIRCLE_RADIUS, y, towards: direction < 0 ? 'west' : 'east' });
  }

  // -------------------------------------------------------------- elements

  #hanging(index: number, node: string, x: number, spot: Spot, wide: boolean): Built {
    const leg = this.#leg(index);
    const bar = this.#rows.barOf(spot, leg.kind === 'tie');
    return hangingLeg(leg, index, { x, y: this.#yOf(node), centre: this.#rows.centreOf(spot), bar, wide });
  }

  #upright(index: number, node: string, far: string, x: number, spot: Spot, wide: boolean): Built {
    const [yNode, yFar] = [this.#yOf(node), this.#yOf(far)];
    const [top, bottom] = yNode < yFar ? [node, far] : [far, node];
    const [y0, y1] = [Math.min(yNode, yFar), Math.max(yNode, yFar)];
    return uprightLeg(this.#leg(index), index, { x, top, y0, bottom, y1, centre: this.#rows.centreOf(spot), wide });
  }

  // -------------------------------------------------------------- book-keeping

  #addLeg(index: number, { items, own, wires, pins }: Built): void {
    const leg = this.#leg(index);
    for (const { net, x0, y0, x1, y1, leg: tied } of wires) this.sketch.wire(net, x0, y0, x1, y1, tied);
    this.pins.push(...pins);
    this.sketch.group({
      kind: 'group',
      of: 'leg',
      leg: index,
      cell: leg.cell,
      sentence: legSentence(leg),
      fails: leg.fails ?? false,
      box: boxAround(own),
      items,
    });
  }

  #nodeRuns(node: string): ReturnType<typeof plain> {
    const voltage = plain(this.#input.voltages[node] ?? '');
    const isTerminal = node === 'gate' || node === 'drain' || node === 'source' || node === 'bulk';
    // A node with a circle has its name there.
    const isEnd = (this.#topology.degree.get(node) ?? 0) < 2;
    const marked = isEnd || node === 'load' || this.#input.output.includes(node);
    return isTerminal || marked ? voltage : joinRuns(typeset(node), voltage);
  }

  #fit(piece: readonly Box[], start: number, direction: 1 | -1): number {
    return this.#board.fit(piece, start, direction);
  }
  #leg(index: number): StageLeg {
    return this.#input.legs[index]!;
  }
  #rowOf(node: string): string {
    const row = this.#plan.rowOf.get(node);
    if (row === undefined) throw new Error(`node ${node} has no row`);
    return row;
  }
  #yOf(node: string): number {
    return this.#rows.yOf(this.#rowOf(node));
  }
  #isChannel(node: string): boolean {
    return node === this.#topology.upper || node === this.#topology.lower;
  }
}
