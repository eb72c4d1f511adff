// Places the pieces of a schematic. Heights are settled first (rows), then every piece is pushed outwards from
// the channel until its boxes are clear of all others; wires along the rows follow from where the pieces
// came to stand. Horizontal wires run on rows alone and symbols stand in gaps, so a crossing is always one
// of a horizontal and a vertical wire, never of a wire and a symbol.

import { Board } from './board.ts';
import type { Built } from './elements.ts';
import { hangingLeg, lyingLeg, lyingLength, railNeedsName, uprightLeg, WIRE_HALF } from './elements.ts';
import type { Box, Item } from './geometry.ts';
import { boxAround } from './geometry.ts';
import { joinRuns, LABEL_SIZE, plain, textBox, typeset, widthOf } from './labels.ts';
import type { Piece, Plan } from './pieces.ts';
import { BULK_PIN_ROW, GATE_ROW } from './rows.ts';
import type { Rows, Spot } from './rows.ts';
import { fetSentence, legSentence, placeSentence } from './sentences.ts';
import type { Pin } from './sketch.ts';
import { labelText, Sketch } from './sketch.ts';
import type { SchematicInput, StageLeg } from './stage-input.ts';
import { arrowHead, FET, fetSymbol } from './symbols.ts';
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
  /** How far the wire of a node reaches, by side. */
  readonly #reach = new Map<string, number>();
  /** All x at which something meets the wire of a node. */
  readonly #touch = new Map<string, number[]>();

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
    for (const [node, xs] of this.#touch) {
      const y = this.#yOf(node);
      this.sketch.wire(node, Math.min(...xs), y, Math.max(...xs), y);
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
    this.#touchAt('gate', 'left', FET.gateX);
    if (this.#topology.hasBulk) {
      this.pins.push({ net: 'bulk', x: FET.bulkX, y: 0, towards: 'west' });
      if (this.#rowOf('bulk') === BULK_PIN_ROW) this.#touchAt('bulk', 'right', FET.bulkX);
    }
    this.#placeCurrent(top);
  }

  /** The arrow of the current stands beside the upper lead, its value at the tail, on the side that the gate leaves free. */
  #placeCurrent(top: number): void {
    const { current, channel } = this.#input;
    if (current === null) return;
    const down = (channel === 'n') === (this.#topology.upper === 'drain');
    const side = this.#topology.upper === 'source' ? 1 : -1;
    const x = 8 * side;
    const y = (top - FET.reach) / 2;
    const [tail, tip] = down ? [y - 7, y + 7] : [y + 7, y - 7];
    const text = labelText('current', x + 5 * side, y + 4, side > 0 ? 'start' : 'end', plain(current));
    const box = boxAround([textBox(text), { x0: x - 3, y0: y - 7, x1: x + 3, y1: y + 7 }]);
    this.sketch.mark({ kind: 'line', role: 'current', points: [x, tail, x, tip - Math.sign(tip - tail) * 6] }, box);
    for (const item of arrowHead([x, tip], [x, tail], 'current')) this.sketch.mark(item, box);
    this.sketch.text(text);
    this.#board.occupy([box]);
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
    this.#touchAt(node, 'right', 0);
    this.#touchAt(node, 'left', 0);
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
    const start = this.#reachOf(node, side) + direction * STEP;
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
        return this.#touchAt(node, side, x);
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
        this.#reach.set(`${node} ${side}`, x);
        return;
      }
      case 'terminal':
        return this.#placeTerminal(node, side, start, y, piece.last);
      case 'settle': {
        const far = this.#reachOf(node, side);
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
    this.#reach.set(`${node} ${side}`, side === 'left' ? x - width : x + width);
  }

  #placeColumn(index: number, node: string, far: string, side: Side, start: number): void {
    const spot = this.#rows.betweenSpot(this.#rowOf(node), this.#rowOf(far));
    const direction = side === 'left' ? -1 : 1;
    const known = this.#touch.has(far) ? this.#reachOf(far, side) + direction * STEP : start;
    const from = direction < 0 ? Math.min(start, known) : Math.max(start, known);
    const x = this.#fit(this.#upright(index, node, far, 0, spot, false).boxes, from, direction);
    this.#addLeg(index, this.#upright(index, node, far, x, spot, false));
    this.#touchAt(node, side, x);
    this.#touchAt(far, side, x);
  }

  #placeLying(index: number, node: string, child: string, side: Side, start: number, y: number): void {
    const direction = side === 'left' ? -1 : 1;
    const leg = this.#leg(index);
    const build = (x: number): Built =>
      lyingLeg(leg, index, { x, y, near: node, far: child, direction, words: 'above' });
    const x = this.#fit(build(0).boxes, start, direction);
    this.#addLeg(index, build(x));
    this.#touchAt(node, side, x);
    this.#touchAt(child, side, x + direction * lyingLength(leg));
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
    this.#touchAt(node, 'left', x);
    // On the gate's row: the lying element ends on the same net, but at another height.
    this.#touchAt('gate', 'left', x - width);
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
    this.#touchAt('bulk', 'right', x);
    this.#touchAt('bulk', 'left', x);
  }

  /** The circle at which the signal comes in. */
  #placeLeaf(index: number, side: Side): void {
    const { to } = this.#leg(index);
    const leaf = leafOf(index);
    const y = this.#yOf(leaf);
    const direction = side === 'left' ? -1 : 1;
    const name = to.kind === 'common' ? 'common' : to.name.replace('-', '−');
    const label = labelText('note', 0, y + 17, 'middle', plain(name));
    const circle: Box = { x0: -4, y0: y - 4, x1: 4, y1: y + 4 };
    const x = this.#fit([circle, textBox(label)], this.#reachOf(leaf, side) + direction * STUB, direction);
    this.sketch.wire(leaf, this.#reachOf(leaf, side), y, x - direction * 3, y);
    this.#addPlace(placeSentence(name), [circleAt(x, y), { ...label, x }]);
    this.pins.push({ net: leaf, x: x - direction * 3, y, towards: direction < 0 ? 'west' : 'east' });
  }

  /** The circle at which a node is taken out: at the end of its wire, or on it with the name above. */
  #placeTerminal(node: string, side: Side, start: number, y: number, last: boolean): void {
    const direction = side === 'left' ? -1 : 1;
    const circle: Box = { x0: -4, y0: y - 4, x1: 4, y1: y + 4 };
    const beside = last && side === 'right';
    const label = beside
      ? labelText('note', 9, y + 4, 'start', typeset(node))
      : labelText('note', 0, last ? y + 17 : y - 9, 'middle', typeset(node));
    const x = this.#fit([circle, textBox(label)], start + (last ? direction * 4 : 0), direction);
    this.#addPlace(placeSentence(node), [circleAt(x, y), { ...label, x: label.x + x }]);
    if (last) {
      this.pins.push({ net: node, x: x - direction * 3, y, towards: direction < 0 ? 'west' : 'east' });
      return this.#touchAt(node, side, x - direction * 3);
    }
    return this.#touchAt(node, side, x);
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

  #addPlace(sentence: string, items: readonly Item[]): void {
    const boxes = items.map((item) => (item.kind === 'text' ? textBox(item) : circleBox(item)));
    this.sketch.group({
      kind: 'group',
      of: 'place',
      leg: null,
      cell: null,
      sentence,
      fails: false,
      box: boxAround(boxes),
      items,
    });
  }

  #nodeRuns(node: string): ReturnType<typeof plain> {
    const voltage = plain(this.#input.voltages[node] ?? '');
    const isTerminal = node === 'gate' || node === 'drain' || node === 'source' || node === 'bulk';
    const marked = node === 'load' || this.#input.output.includes(node);
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
  #reachOf(node: string, side: Side): number {
    return this.#reach.get(`${node} ${side}`) ?? this.#touch.get(node)?.[0] ?? 0;
  }
  #touchAt(node: string, side: Side, x: number): void {
    this.#touch.set(node, [...(this.#touch.get(node) ?? []), x]);
    const key = `${node} ${side}`;
    const before = this.#reach.get(key) ?? x;
    this.#reach.set(key, side === 'left' ? Math.min(before, x) : Math.max(before, x));
  }
}

function circleAt(x: number, y: number): Item {
  return { kind: 'circle', role: 'terminal', x, y, radius: 3, filled: false };
}

function circleBox(item: Item): Box {
  if (item.kind !== 'circle') throw new RangeError(`${item.kind} is not a circle`);
  return { x0: item.x - item.radius, y0: item.y - item.radius, x1: item.x + item.radius, y1: item.y + item.radius };
}
