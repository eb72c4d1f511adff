// The circles of a schematic: where the signal comes in and where a node is taken out.

import type { Box, GroupItem, Run } from './geometry.ts';
import { boxAround } from './geometry.ts';
import { textBox } from './labels.ts';
import { placeSentence } from './sentences.ts';
import { labelText } from './sketch.ts';

export const CIRCLE_RADIUS = 3;

/** A circle at (x, y) with its name below it, above it or to its right, and the room both take. */
export function circlePlace(
  name: string,
  runs: readonly Run[],
  x: number,
  y: number,
  words: 'above' | 'below' | 'right',
): { readonly group: GroupItem; readonly boxes: readonly Box[] } {
  const label =
    words === 'right'
      ? labelText('note', x + 9, y + 4, 'start', runs)
      : labelText('note', x, words === 'below' ? y + 17 : y - 9, 'middle', runs);
  const half = CIRCLE_RADIUS + 1;
  const boxes = [{ x0: x - half, y0: y - half, x1: x + half, y1: y + half }, textBox(label)];
  const circle = { kind: 'circle', role: 'terminal', x, y, radius: CIRCLE_RADIUS, filled: false } as const;
  return {
    boxes,
    group: {
      kind: 'group',
      of: 'place',
      leg: null,
      cell: null,
      sentence: placeSentence(name),
      fails: false,
      box: boxAround(boxes),
      items: [circle, label],
    },
  };
}
