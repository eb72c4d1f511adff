// The arrow of the channel current, beside the FET's upper lead with its value at the tail.

import type { Box, Item } from './geometry.ts';
import { boxAround } from './geometry.ts';
import { plain, textBox } from './labels.ts';
import { labelText } from './sketch.ts';
import { arrowHead } from './symbols.ts';

const BESIDE = 8;
const HALF_LENGTH = 7;

/** An arrow around height `y` beside x = 0, to the right or left, with the current in words. */
export function currentArrow(
  words: string,
  y: number,
  { down, right }: { readonly down: boolean; readonly right: boolean },
): { readonly items: readonly Item[]; readonly box: Box } {
  const side = right ? 1 : -1;
  const along = down ? 1 : -1;
  const x = BESIDE * side;
  const [tail, tip] = [y - along * HALF_LENGTH, y + along * HALF_LENGTH];
  const text = labelText('current', x + 5 * side, y + 4, right ? 'start' : 'end', plain(words));
  return {
    items: [
      { kind: 'line', role: 'current', points: [x, tail, x, tip - 6 * along] },
      ...arrowHead([x, tip], [x, tail], 'current'),
      text,
    ],
    box: boxAround([textBox(text), { x0: x - 3, y0: y - HALF_LENGTH, x1: x + 3, y1: y + HALF_LENGTH }]),
  };
}
