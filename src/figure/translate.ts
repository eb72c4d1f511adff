// Items moved as a whole.

import type { Item } from './geometry.ts';

/** The same item, `dx` further right and `dy` further down. */
export function translate<T extends Item>(item: T, dx: number, dy: number): T {
  return moved(item, dx, dy) as T;
}

function moved(item: Item, dx: number, dy: number): Item {
  switch (item.kind) {
    case 'line':
      return { ...item, points: shifted(item.points, dx, dy) };
    case 'clip':
      return {
        ...item,
        outline: shifted(item.outline, dx, dy),
        items: item.items.map((each) => moved(each, dx, dy)),
      };
    case 'group': {
      const { x0, y0, x1, y1 } = item.box;
      const box = { x0: x0 + dx, y0: y0 + dy, x1: x1 + dx, y1: y1 + dy };
      return { ...item, box, items: item.items.map((each) => moved(each, dx, dy)) };
    }
    default:
      return { ...item, x: item.x + dx, y: item.y + dy };
  }
}

function shifted(points: ArrayLike<number>, dx: number, dy: number): number[] {
  return Array.from(points, (value, at) => value + (at % 2 === 0 ? dx : dy));
}
