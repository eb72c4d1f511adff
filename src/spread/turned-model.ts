// A model as if one of its inputs had another value.

import { runAll } from '../program/index.ts';
import { KERNELS } from '../sheet/index.ts';
import type { Drawn, SpreadModel } from '../sheet/index.ts';
import { answerAnew } from './state-columns.ts';

/**
 * The model with the input of this slot at a value; what was chosen at the nominal values is chosen anew. The spread of the
 * input itself goes along in proportion (`scaled`), or the input stands just there (`held`).
 */
export function turnedModel(model: SpreadModel, slot: number, value: number, own: 'scaled' | 'held'): SpreadModel {
  const slots = model.slots.slice();
  const factor = value / slots[slot]!;
  slots[slot] = value;
  runAll(model.program, slots, KERNELS);
  answerAnew({ ...model, slots });
  const end = (present: number | null): number | null =>
    own === 'held' ? value : present === null ? null : present * factor;
  const turned = (each: Drawn): Drawn => {
    if (each.slot !== slot) return each;
    const { spread } = each;
    return { ...each, spread: { ...spread, low: end(spread.low), nominal: value, high: end(spread.high) } };
  };
  return { ...model, slots, drawn: model.drawn.map(turned) };
}
