// Reads a drawn schematic by its geometry alone: which wires touch, which symbols and places hang on them.
// A crossing of two wires joins nothing; an end that meets another wire does.

import type { Drawing, GroupItem, Item } from '../../src/figure/index.ts';

export interface Point {
  readonly x: number;
  readonly y: number;
}
export interface Wire {
  readonly a: Point;
  readonly b: Point;
}
export interface ReadBack {
  readonly wires: readonly Wire[];
  readonly dots: readonly Point[];
  /** Net of each wire, by index. */
  readonly netOf: readonly number[];
  /** Nets at the pins of the upper and lower channel terminal, gate and bulk (null where it has no lead). */
  readonly fet: { readonly upper: number; readonly lower: number; readonly gate: number; readonly bulk: number | null };
  /** Nets at both ends of each leg that has a symbol, and of each tie; a bar or circle counts as a net of its own. */
  readonly legs: ReadonlyMap<number, readonly number[]>;
  /** Ends of wires that touch nothing. */
  readonly loose: readonly Point[];
}

export function readBack(drawing: Drawing): ReadBack {
  const wires: Wire[] = [];
  const owner: (number | null)[] = [];
  const add = (item: Item, leg: number | null): void => {
    if (item.kind !== 'line' || item.role !== 'wire') return;
    for (let at = 0; at + 3 < item.points.length; at += 2) {
      const [x0, y0, x1, y1] = [item.points[at]!, item.points[at + 1]!, item.points[at + 2]!, item.points[at + 3]!];
      wires.push({ a: { x: x0, y: y0 }, b: { x: x1, y: y1 } });
      owner.push(leg);
    }
  };
  const groups = drawing.items.filter((item): item is GroupItem => item.kind === 'group');
  for (const item of drawing.items) add(item, null);
  for (const group of groups) if (isTie(group)) for (const item of group.items) add(item, group.leg);
  const nets = new Nets(wires);
  const ends: Point[] = [];
  const legs = new Map<number, number[]>();
  for (const group of groups) {
    if (group.of !== 'leg') continue;
    const pins = isTie(group) ? tiePins(group) : symbolPins(group);
    ends.push(...pins, ...barPoints(group));
    legs.set(
      group.leg!,
      pins.map((pin) => nets.at(pin)),
    );
  }
  const circles = groups.filter(({ of }) => of === 'place').flatMap(({ items }) => items.flatMap(circlePoints));
  const fetGroup = groups.find(({ of }) => of === 'fet')!;
  const leads = fetGroup.items.filter((item) => item.kind === 'line' && item.role === 'wire');
  const [upper, lower, gate, bulk] = leads.map((item) => pointsOf(item));
  // The joined body lead ends on the source inside the symbol; one that is brought out is a straight line.
  const bulkPin = bulk?.length === 2 ? bulk[1]! : null;
  const fetPins = [upper![0]!, lower![0]!, gate![0]!, ...(bulkPin ? [bulkPin] : [])];
  ends.push(...fetPins);
  const loose = wires
    .flatMap(({ a, b }) => [a, b])
    .filter((end) => nets.touching(end) < 2 && ![...ends, ...circles].some((pin) => same(pin, end)));
  return {
    wires,
    netOf: wires.map((_, index) => nets.find(index)),
    dots: drawing.items.flatMap((item) =>
      item.kind === 'circle' && item.role === 'dot' ? [{ x: item.x, y: item.y }] : [],
    ),
    fet: {
      upper: nets.at(upper![0]!),
      lower: nets.at(lower![0]!),
      gate: nets.at(gate![0]!),
      bulk: bulkPin ? nets.at(bulkPin) : null,
    },
    legs,
    loose,
  };
}

/** A leg that is drawn as a wire alone, with or without a bar at its end. */
export function isTie({ of, sentence }: GroupItem): boolean {
  return of === 'leg' && / tied to /.test(sentence);
}

class Nets {
  readonly #wires: readonly Wire[];
  readonly #parent: number[];

  constructor(wires: readonly Wire[]) {
    this.#wires = wires;
    this.#parent = wires.map((_, index) => index);
    wires.forEach((wire, index) => {
      wires.forEach((other, far) => {
        if (far !== index && (on(wire.a, other) || on(wire.b, other))) this.#parent[this.find(index)] = this.find(far);
      });
    });
  }

  find(index: number): number {
    let at = index;
    while (this.#parent[at] !== at) at = this.#parent[at]!;
    return at;
  }

  /** The net at a pin; a negative number of its own where no wire comes. */
  at(pin: Point): number {
    const index = this.#wires.findIndex((wire) => on(pin, wire));
    return index < 0 ? -1 - Math.round(pin.x * 10_000 + pin.y) : this.find(index);
  }

  touching(end: Point): number {
    return this.#wires.filter((wire) => on(end, wire)).length;
  }
}

function on({ x, y }: Point, { a, b }: Wire): boolean {
  const inX = x >= Math.min(a.x, b.x) && x <= Math.max(a.x, b.x);
  const inY = y >= Math.min(a.y, b.y) && y <= Math.max(a.y, b.y);
  return inX && inY;
}

function same(p: Point, q: Point): boolean {
  return p.x === q.x && p.y === q.y;
}

function pointsOf(item: Item): Point[] {
  if (item.kind !== 'line') return [];
  const points: Point[] = [];
  for (let at = 0; at + 1 < item.points.length; at += 2) points.push({ x: item.points[at]!, y: item.points[at + 1]! });
  return points;
}

/** Both pins of a symbol: the outer ends of its leads, or the middles of a rectangle's short sides. */
function symbolPins({ items }: GroupItem): Point[] {
  const rect = items.find((item) => item.kind === 'rect');
  if (rect?.kind === 'rect') {
    const { x, y, width, height } = rect;
    if (height > width)
      return [
        { x: x + width / 2, y },
        { x: x + width / 2, y: y + height },
      ];
    return [
      { x, y: y + height / 2 },
      { x: x + width, y: y + height / 2 },
    ];
  }
  const [first, second] = items.filter((item) => item.kind === 'line' && item.role === 'wire').map(pointsOf);
  return [first![0]!, second![1]!];
}

function tiePins({ items }: GroupItem): Point[] {
  const [wire] = items.filter((item) => item.kind === 'line' && item.role === 'wire').map(pointsOf);
  return [wire![0]!, wire![1]!];
}

function barPoints({ items }: GroupItem): Point[] {
  return items.flatMap((item) => {
    if (item.kind !== 'line' || item.role !== 'bar') return [];
    const [a, b] = pointsOf(item);
    return [{ x: (a!.x + b!.x) / 2, y: a!.y }];
  });
}

function circlePoints(item: Item): Point[] {
  if (item.kind !== 'circle') return [];
  const { x, y, radius } = item;
  return [
    { x: x - radius, y },
    { x: x + radius, y },
    { x, y },
  ];
}
