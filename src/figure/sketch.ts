// A schematic while it is being put together: wires with the net they belong to, groups with their boxes,
// and in the end the junction dots, which follow from where wires of one net meet.

import type { Box, GroupItem, Item, Run, TextItem, Role } from './geometry.ts';
import { boxAround } from './geometry.ts';
import { LABEL_SIZE, textBox } from './labels.ts';

export interface Segment {
  readonly net: string;
  readonly x0: number;
  readonly y0: number;
  readonly x1: number;
  readonly y1: number;
  /** The leg that is nothing but this wire; null for wires of a node. */
  readonly leg: number | null;
}

/** Text of a schematic in its usual size. */
export function labelText(
  role: Role,
  x: number,
  y: number,
  anchor: TextItem['anchor'],
  runs: readonly Run[],
): TextItem {
  return { kind: 'text', role, x, y, anchor, size: LABEL_SIZE, runs };
}

export class Sketch {
  readonly segments: Segment[] = [];
  readonly groups: GroupItem[] = [];
  readonly texts: TextItem[] = [];
  readonly marks: Item[] = [];
  /** Boxes of what stands alone in `texts` and `marks`. */
  readonly #boxes: Box[] = [];

  wire(net: string, x0: number, y0: number, x1: number, y1: number, leg: number | null = null): void {
    if (x0 === x1 && y0 === y1) return;
    this.segments.push({
      net,
      x0: Math.min(x0, x1),
      y0: Math.min(y0, y1),
      x1: Math.max(x0, x1),
      y1: Math.max(y0, y1),
      leg,
    });
  }

  text(item: TextItem): void {
    this.texts.push(item);
    this.#boxes.push(textBox(item));
  }

  mark(item: Item, box: Box): void {
    this.marks.push(item);
    this.#boxes.push(box);
  }

  group(group: GroupItem): void {
    this.groups.push(group);
  }

  /** Around all that was drawn. */
  bounds(): Box {
    return boxAround([...this.segments, ...this.groups.map(({ box }) => box), ...this.#boxes]);
  }

  /**
   * Points where three or more wires of one net meet. `same` gives the net that stands for all nets tied together;
   * `pins` are points where a symbol's own lead goes on, with its direction.
   */
  dots(same: (net: string) => string, pins: readonly Pin[]): { readonly x: number; readonly y: number }[] {
    const points = new Map<string, { x: number; y: number; net: string }>();
    for (const { net, x0, y0, x1, y1 } of this.segments) {
      for (const [x, y] of [[x0, y0] as const, [x1, y1] as const]) {
        points.set(`${same(net)} ${x} ${y}`, { x, y, net: same(net) });
      }
    }
    const dots: { x: number; y: number }[] = [];
    for (const { x, y, net } of points.values()) {
      const directions = new Set<string>();
      for (const segment of this.segments) {
        if (same(segment.net) !== net) continue;
        const { x0, y0, x1, y1 } = segment;
        if (y0 === y1 && y === y0 && x >= x0 && x <= x1) {
          if (x > x0) directions.add('west');
          if (x < x1) directions.add('east');
        }
        if (x0 === x1 && x === x0 && y >= y0 && y <= y1) {
          if (y > y0) directions.add('north');
          if (y < y1) directions.add('south');
        }
      }
      for (const pin of pins) if (pin.x === x && pin.y === y && same(pin.net) === net) directions.add(pin.towards);
      if (directions.size > 2) dots.push({ x, y });
    }
    return dots;
  }
}

/** Where a symbol's lead meets the wires, and to which side the symbol lies. */
export interface Pin {
  readonly net: string;
  readonly x: number;
  readonly y: number;
  readonly towards: 'north' | 'south' | 'east' | 'west';
}
