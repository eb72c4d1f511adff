// The schematic of a one-FET stage: sort the legs, order the pieces, lay them out, and hand over plain geometry
// with its upper left corner at (0, 0).

import type { CircleItem, Drawing, Item, LineItem } from './geometry.ts';
import { layOut } from './layout.ts';
import { planPieces } from './pieces.ts';
import { stageSentence } from './sentences.ts';
import type { SchematicInput } from './stage-input.ts';
import { sortLegs } from './topology.ts';
import { translate } from './translate.ts';

/** Free room around the drawing. */
const MARGIN = 8;
const DOT_RADIUS = 2.4;

/**
 * Draws a stage: its FET upright, legs in rows and columns around it, every leg one group with the cell it leads to.
 * Symbols, words and wires never cover each other. Drawing units are CSS pixels; numbers come in as words.
 */
export function drawSchematic(input: SchematicInput): Drawing {
  const topology = sortLegs(input);
  const { sketch, pins, same } = layOut(input, topology, planPieces(input, topology));
  const wires: LineItem[] = [];
  const ties = new Map<number, Item[]>();
  for (const { x0, y0, x1, y1, leg } of sketch.segments) {
    const item: LineItem = { kind: 'line', role: 'wire', points: [x0, y0, x1, y1] };
    if (leg === null) wires.push(item);
    else ties.set(leg, [...(ties.get(leg) ?? []), item]);
  }
  const groups = sketch.groups.map((group) => {
    const own = group.leg === null ? undefined : ties.get(group.leg);
    return own === undefined ? group : { ...group, items: [...own, ...group.items] };
  });
  const dots = sketch
    .dots(same, pins)
    .map(({ x, y }): CircleItem => ({ kind: 'circle', role: 'dot', x, y, radius: DOT_RADIUS, filled: true }));
  const { x0, y0, x1, y1 } = sketch.bounds();
  const items = [...wires, ...groups, ...dots, ...sketch.marks, ...sketch.texts];
  return {
    width: Math.ceil(x1 - x0) + 2 * MARGIN,
    height: Math.ceil(y1 - y0) + 2 * MARGIN,
    title: `Schematic of ${input.name}`,
    sentence: stageSentence(input),
    items: items.map((item) => translate(item, MARGIN - Math.floor(x0), MARGIN - Math.floor(y0))),
  };
}
