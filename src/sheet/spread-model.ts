// The sheet as an analysis of spread sees it: what is drawn, which specimens there are, and every value that moves.

import { CAPACITANCE, CURRENT, INDUCTANCE, RESISTANCE, VOLTAGE, sameKind } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import { isQuantity } from './value-type.ts';
import type { Program } from '../program/index.ts';
import type { Asked, Cut, Drawn, SpreadModel, Tie, Wanted, WantedCheck } from './model.ts';
import type { Node } from './node.ts';
import { lineNow } from './readings.ts';

/** Kinds of input that one buys or sets. */
const CHOOSABLE = [RESISTANCE, CAPACITANCE, INDUCTANCE, VOLTAGE, CURRENT];

/** Collects the spread of the cells that have values, in the order of the sheet, and what is asked among them. */
export function spreadModel(
  nodes: readonly Node[],
  asked: readonly Asked[],
  program: Program,
  slots: Float64Array,
): SpreadModel {
  const drawn: Drawn[] = [];
  const cuts: Cut[] = [];
  const ties: Tie[] = [];
  const pairs: Tie[] = [];
  const values: Wanted[] = [];
  const checks: WantedCheck[] = [];
  const tunable: SpreadModel['tunable'][number][] = [];
  const stages: SpreadModel['stages'][number][] = [];
  for (const node of nodes) {
    if (node.fault || node.waitsFor) continue;
    const { draft, slot } = node.compiled;
    const read = (handle: number): number => slots[slot(handle)]!;
    const cell = node.tree.name.name;
    const path = (field: string): string => (field === '' ? cell : `${cell}.${field}`);
    const first = drawn.length;
    for (const { field, handle, line, spread, value, type, form } of draft.drawn.draws) {
      drawn.push({
        name: path(field),
        cell,
        line: lineNow(node, line).index,
        slot: slot(handle),
        spread: spread(read),
        valueSlot: slot(value),
        type,
        form,
      });
    }
    for (const { field, handle, line, limits } of draft.drawn.cuts) {
      const { low, high } = limits(read);
      cuts.push({
        name: path(field),
        cell,
        line: lineNow(node, line).index,
        slot: slot(handle),
        low: low ?? -Infinity,
        high: high ?? Infinity,
      });
    }
    const { tie } = draft.drawn;
    if (tie) {
      const place = (field: string): number => drawn.findIndex(({ name }, i) => i >= first && name === path(field));
      const [threshold, gain] = [place(tie.threshold), place(tie.gain)];
      if (threshold >= 0 && gain >= 0) {
        const { thresholdFalls, gainFalls } = tie;
        const tracking = tie.tracking === null ? 0 : read(tie.tracking);
        const pair: Tie = { cell, threshold, gain, thresholdFalls, gainFalls, tracking };
        pairs.push(pair);
        if (tie.tracking !== null) ties.push(pair);
      }
    }
    if (draft.type !== null && draft.value !== null) {
      // What builds want of an answer that is the same in all of them, or costs a search within a search, is not asked.
      const wanted = asked.find((each) => each.cell === cell && !each.isSame && !each.isNested);
      const slot = wanted?.answer ?? node.compiled.interface.slot;
      values.push({ path: cell, cell, slot, type: draft.type, isAnswer: wanted !== undefined });
    }
    if (draft.check) {
      checks.push({
        name: cell,
        slot: node.compiled.interface.slot,
        reserve: draft.reserve === null ? null : slot(draft.reserve),
      });
    }
    const { entry } = node.tree;
    const isChoosable = CHOOSABLE.some(
      (kind) => draft.type !== null && isQuantity(draft.type) && sameKind(kind, draft.type),
    );
    if (entry.type === 'quantity' && draft.isInput && isChoosable && read(draft.value!) > 0) {
      tunable.push({ name: cell, slot: node.compiled.interface.slot, type: draft.type as ValueKind });
    }
    const current = node.compiled.interface.offers.get('I_D')?.slot ?? -1;
    if (entry.type === 'stage' && entry.fets.length === 1 && current >= 0) {
      stages.push({ stage: cell, part: entry.fets[0]!.part.name, current });
    }
    for (const [name, offer] of node.compiled.interface.offers) {
      if (offer.slot >= 0) values.push({ path: path(name), cell, slot: offer.slot, type: offer.type, isAnswer: false });
    }
  }
  return { program, slots, drawn, cuts, ties, pairs, values, checks, asked, tunable, stages };
}
