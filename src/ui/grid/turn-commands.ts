// Turning the number of a row: by key one step at a time, by its tick as far as the pointer goes. A run of steps is
// one step of the history, and so is a drag.

import { nextValue, setTurned, snapped, turnedNumber } from '../rows/index.ts';
import { factorOf, ownSpan } from './bar-shape.ts';
import type { Grid } from './grid.ts';

/** Steps the number of the selected cell. */
export function stepNumber(grid: Grid, way: 'up' | 'down'): void {
  const { desk } = grid;
  const selection = desk.selection();
  const line = selection && grid.lineOf(selection.row);
  const turned = selection && line !== null ? turnedNumber(desk.document.tree(), line!, selection.column) : null;
  if (!selection || !turned) return desk.say('This row has no number of its own to step.');
  const next = nextValue(turned, way);
  if (next === null) return desk.say('There is no step in this direction: the sign would change.');
  const name = grid.row(selection.row)?.name?.text ?? 'a number';
  desk.document.edit(setTurned(turned, next), `step ${name}`, grid.runOf(`step ${selection.row} ${selection.column}`));
}

/** One drag of a tick. */
interface Drag {
  move(pixels: number): void;
  /** Ends the drag; `keep` says whether its value stays. */
  end(keep: boolean): void;
}

/** Begins to drag the tick of a row; null where it has none that moves. */
export function beginDrag(grid: Grid, key: string): Drag | null {
  const { document } = grid.desk;
  const tree = document.tree();
  const line = grid.lineOf(key);
  const row = grid.row(key);
  const turned = line === null ? null : turnedNumber(tree, line, 'nominal');
  const bar = row?.bar;
  if (!turned || !row || !bar) return null;
  const from = turned.literal.value;
  const spread = row.cell === null ? null : (document.cell(row.cell)?.spread ?? null);
  const span = bar.scale === 'own' ? ownSpan(spread?.low ?? null, spread?.high ?? null) : null;
  if (bar.scale === 'own' && span === null) return null;
  let target = from;
  return {
    move(pixels) {
      const wanted = span === null ? from * factorOf(pixels) : from + span * pixels;
      target = snapped(turned, wanted);
      document.preview(target === from ? null : setTurned(turned, target));
      grid.setDragged({ key, from, to: target });
    },
    end(keep) {
      grid.setDragged(null);
      if (keep && target !== from) document.edit(setTurned(turned, target), `turn ${row.name?.text ?? 'a number'}`);
      else document.preview(null);
    },
  };
}
