// What has been put on the drawing so far, as boxes, and where the next piece fits. A piece is a set of
// boxes with fixed heights; it is pushed outwards from its starting place until it is clear of all others.

import type { Box } from './geometry.ts';
import { boxesOverlap } from './geometry.ts';

/** Room kept free around everything. */
const CLEARANCE = 4;

export class Board {
  readonly #boxes: Box[] = [];

  /** Takes the place without asking. */
  occupy(boxes: readonly Box[]): void {
    this.#boxes.push(...boxes);
  }

  /**
   * The x nearest to `start`, at or beyond it in `direction`, where `piece` (boxes around x = 0) is clear of all
   * that is there; the place is taken. Terminates: each step clears one box for good.
   */
  fit(piece: readonly Box[], start: number, direction: 1 | -1): number {
    let x = start;
    for (let moved = true; moved;) {
      moved = false;
      for (const own of piece) {
        for (const other of this.#boxes) {
          const shifted = shift(own, x);
          if (!boxesOverlap(shifted, widen(other))) continue;
          // To whole units, outwards: a remainder of rounding would find the same box again for ever.
          if (direction > 0) x = Math.floor(x + other.x1 + CLEARANCE - shifted.x0) + 1;
          else x = Math.ceil(x + other.x0 - CLEARANCE - shifted.x1) - 1;
          moved = true;
        }
      }
    }
    this.occupy(piece.map((box) => shift(box, x)));
    return x;
  }

  /** All that has been put down. */
  get boxes(): readonly Box[] {
    return this.#boxes;
  }
}

function shift(box: Box, dx: number): Box {
  return { x0: box.x0 + dx, y0: box.y0, x1: box.x1 + dx, y1: box.y1 };
}

function widen(box: Box): Box {
  return { x0: box.x0 - CLEARANCE, y0: box.y0 - CLEARANCE / 2, x1: box.x1 + CLEARANCE, y1: box.y1 + CLEARANCE / 2 };
}
