// One leg of a schematic with its symbol, words, wires and the bar at its end, around a given place: hanging
// from a row, standing between two rows, or lying on a row. The boxes say what room it takes.

import type { Box, Item } from './geometry.ts';
import { joinRuns, LABEL_SIZE, plain, textBox, typeset, widthOf } from './labels.ts';
import type { Pin, Segment } from './sketch.ts';
import { labelText } from './sketch.ts';
import type { StageLeg } from './stage-input.ts';
import { HALF_LENGTH, twoPole } from './symbols.ts';
import { leafOf } from './topology.ts';

/** From the middle of a column to the edge of what a wire takes. */
export const WIRE_HALF = 5;
const BAR_HALF = 14;
const GROUND_HALF = 10;
const TIE_LENGTH = 26;

/** A leg as built: `boxes` with the wires' room, `own` without. */
export interface Built {
  readonly items: readonly Item[];
  readonly own: readonly Box[];
  readonly boxes: readonly Box[];
  readonly wires: readonly Segment[];
  readonly pins: readonly Pin[];
}

/** A leg to a rail: from a node's row at `y` to the bar. `centre` is the height of the symbol's middle. */
export function hangingLeg(
  leg: StageLeg,
  index: number,
  at: { readonly x: number; readonly y: number; readonly centre: number; readonly bar: number; readonly wide: boolean },
): Built {
  const { x, y, centre, bar } = at;
  const down = bar > y;
  const items: Item[] = [];
  const own: Box[] = [];
  const half = leg.to.volts === 0 ? GROUND_HALF : BAR_HALF;
  items.push({ kind: 'line', role: 'bar', points: [x - half, bar, x + half, bar] });
  own.push({ x0: x - half, y0: bar - 2, x1: x + half, y1: bar + 2 });
  if (railNeedsName(leg, !down)) {
    const runs = joinRuns(typeset(leg.to.name), plain(leg.to.value));
    const label = labelText('label', x, down ? bar + 15 : bar - 6, 'middle', runs);
    items.push(label);
    own.push(textBox(label));
  }
  const column = columnBox(x, y, bar);
  const end: Pin = { net: leafOf(index), x, y: bar, towards: down ? 'south' : 'north' };
  if (leg.kind === 'tie') {
    return { items, own, boxes: [column, ...own], wires: [upright(leg.from, x, y, bar, index)], pins: [end] };
  }
  const symbol = uprightSymbol(leg, x, centre, leg.reversed !== down, at.wide);
  items.push(...symbol.items);
  own.push(...symbol.boxes);
  const near = centre + (down ? -HALF_LENGTH : HALF_LENGTH);
  const far = centre + (down ? HALF_LENGTH : -HALF_LENGTH);
  return {
    items,
    own,
    boxes: [column, ...own],
    wires: [upright(leg.from, x, y, near, null), upright(leafOf(index), x, far, bar, null)],
    pins: [
      end,
      { net: leg.from, x, y: near, towards: down ? 'south' : 'north' },
      { net: leafOf(index), x, y: far, towards: down ? 'north' : 'south' },
    ],
  };
}

/** A leg between two rows: net `top` at `y0` above, `bottom` at `y1` below. */
export function uprightLeg(
  leg: StageLeg,
  index: number,
  at: {
    readonly x: number;
    readonly top: string;
    readonly y0: number;
    readonly bottom: string;
    readonly y1: number;
    readonly centre: number;
    readonly wide: boolean;
  },
): Built {
  const { x, top, y0, bottom, y1, centre } = at;
  const column = columnBox(x, y0, y1);
  if (leg.kind === 'tie') {
    return { items: [], own: [column], boxes: [column], wires: [upright(top, x, y0, y1, index)], pins: [] };
  }
  const { items, boxes } = uprightSymbol(leg, x, centre, firstNet(leg, index) === top, at.wide);
  const [above, below] = [centre - HALF_LENGTH, centre + HALF_LENGTH];
  return {
    items,
    own: boxes,
    boxes: [column, ...boxes],
    wires: [upright(top, x, y0, above, null), upright(bottom, x, below, y1, null)],
    pins: [
      { net: top, x, y: above, towards: 'south' },
      { net: bottom, x, y: below, towards: 'north' },
    ],
  };
}

/** How long a leg is that lies on a row. */
export function lyingLength(leg: StageLeg): number {
  if (leg.kind === 'tie') return TIE_LENGTH;
  const words = widthOf(joinRuns(typeset(leg.label), plain(leg.value)), LABEL_SIZE);
  return 2 * Math.ceil(Math.max(2 * HALF_LENGTH + 12, words + 8) / 2);
}

/** A leg on a row at `y`, from net `near` at `x` to net `far` in `direction`, with its words above or below. */
export function lyingLeg(
  leg: StageLeg,
  index: number,
  at: {
    readonly x: number;
    readonly y: number;
    readonly near: string;
    readonly far: string;
    readonly direction: 1 | -1;
    readonly words: 'above' | 'below';
  },
): Built {
  const { x, y, near, far, direction } = at;
  const end = x + direction * lyingLength(leg);
  const lane: Box = { x0: Math.min(x, end), y0: y - 4, x1: Math.max(x, end), y1: y + 4 };
  if (leg.kind === 'tie') {
    return { items: [], own: [lane], boxes: [lane], wires: [lying(near, x, end, y, index)], pins: [] };
  }
  const middle = (x + end) / 2;
  const symbol = twoPole(leg.kind, middle, y, 'x', (firstNet(leg, index) === near) === direction > 0);
  const runs = joinRuns(typeset(leg.label), plain(leg.value));
  const text = labelText(
    'label',
    middle,
    at.words === 'above' ? symbol.box.y0 - 5 : symbol.box.y1 + 13,
    'middle',
    runs,
  );
  const own = runs.length > 0 ? [symbol.box, textBox(text)] : [symbol.box];
  const [inner, outer] = [middle - direction * HALF_LENGTH, middle + direction * HALF_LENGTH];
  return {
    items: runs.length > 0 ? [...symbol.items, text] : symbol.items,
    own,
    boxes: [lane, ...own],
    wires: [lying(near, x, inner, y, null), lying(far, outer, end, y, null)],
    pins: [
      { net: near, x: inner, y, towards: direction > 0 ? 'east' : 'west' },
      { net: far, x: outer, y, towards: direction > 0 ? 'west' : 'east' },
    ],
  };
}

/** Whether the bar at the end of a leg needs its rail's name; 0 V hanging down needs none. */
export function railNeedsName({ to }: StageLeg, up: boolean): boolean {
  return up || to.kind !== 'rail' || to.volts !== 0 || !/^[-−]?0( V)?$/.test(to.name);
}

// ---------------------------------------------------------------- parts

/** An upright symbol with its words to the right: on one line in the channel's column, on two elsewhere. */
function uprightSymbol(
  leg: StageLeg,
  x: number,
  y: number,
  forward: boolean,
  wide: boolean,
): { items: readonly Item[]; boxes: readonly Box[] } {
  const symbol = twoPole(leg.kind, x, y, 'y', forward);
  const left = x + symbol.half + 5;
  const [name, value] = [leg.label === '' ? [] : typeset(leg.label), plain(leg.value)];
  const lines = wide || name.length === 0 || value.length === 0 ? [joinRuns(name, value)] : [name, value];
  const texts = lines
    .filter((runs) => runs.length > 0)
    .map((runs, at) => labelText('label', left, lines.length === 1 ? y + 4 : y - 3 + 15 * at, 'start', runs));
  return { items: [...symbol.items, ...texts], boxes: [symbol.box, ...texts.map(textBox)] };
}

/** The net from which a source drives. */
function firstNet(leg: StageLeg, index: number): string {
  if (!leg.reversed) return leg.from;
  return leg.to.kind === 'node' ? leg.to.name : leafOf(index);
}

function columnBox(x: number, ya: number, yb: number): Box {
  return { x0: x - WIRE_HALF, y0: Math.min(ya, yb), x1: x + WIRE_HALF, y1: Math.max(ya, yb) };
}

function upright(net: string, x: number, ya: number, yb: number, leg: number | null): Segment {
  return { net, x0: x, y0: Math.min(ya, yb), x1: x, y1: Math.max(ya, yb), leg };
}

function lying(net: string, xa: number, xb: number, y: number, leg: number | null): Segment {
  return { net, x0: Math.min(xa, xb), y0: y, x1: Math.max(xa, xb), y1: y, leg };
}
