// What the inverse cells of a sheet ask, as an analysis of spread sees it.

import { wayBetween } from './course.ts';
import type { Course } from './course.ts';
import type { Asked } from './model.ts';

/** What is asked among some cells that have values, each behind what it rests on; `slots` are the values as they stand. */
export function askedAmong(among: ReadonlySet<number>, slots: Float64Array, course: Course): Asked[] {
  const { nodes, order, byName } = course;
  return order.flatMap((k): Asked[] => {
    if (!among.has(k)) return [];
    const node = nodes[k]!;
    const { asks, ends } = node.compiled;
    if (asks === null || node.fault || node.waitsFor) return [];
    const way = wayBetween([byName.get(asks.cell)!], node, course);
    const isSame = ends.length > 0 || way.some(({ compiled }) => compiled.ends.length > 0);
    const isNested = way.some(({ compiled }) => compiled.asks !== null);
    const { input, low, high, residual, answer, held } = asks;
    return [
      {
        cell: node.tree.name.name,
        input,
        low: slots[low]!,
        high: slots[high]!,
        residual,
        answer,
        held,
        isSame,
        isNested,
      },
    ];
  });
}
