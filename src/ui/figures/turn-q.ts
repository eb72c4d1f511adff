// Turning the source resistor by Q: along the curve with the pointer, one step of the preferred series by key. A drag is
// one step of the history, and so are the key steps of one stay.

import { createMemo, createSignal } from 'solid-js';
import type { Accessor } from 'solid-js';
import { sourceLeg } from '../../figure/index.ts';
import type { SourceLeg } from '../../figure/index.ts';
import { CURRENT, formatValue } from '../../quantity/index.ts';
import { shownCell } from '../../record/index.ts';
import type { StageReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { nextValue, setTurned, snapped, turnedNumber } from '../rows/index.ts';

/** A point of a chart that can be moved along its curve. */
export interface ChartHandle {
  readonly at: { readonly x: number; readonly y: number };
  /** What a reader calls it. */
  readonly label: string;
  /** `R_S 1.3 kΩ, I_D 1.09 mA`. */
  readonly text: string;
  /** Drain current in amperes, which grows with the value of the slider. */
  readonly now: number;
  /** Why it cannot be moved; null where it can. */
  readonly reason: string | null;
  /** A stay of the keyboard begins: its steps are one step of the history. */
  enter(): void;
  step(way: 'more' | 'less'): void;
  /** Follows the pointer to a value on the x axis. */
  move(x: number): void;
  end(keep: boolean): void;
}

/** The handle of Q in the transfer plane of a solved stage; null where there is no Q. */
export function createQHandle(desk: Desk, stage: Accessor<StageReading | null>): Accessor<ChartHandle | null> {
  const { document } = desk;
  const [stay, setStay] = createSignal(0);
  /** The stage and the text as they stood when the drag began; the preview moves both. */
  let dragged: { leg: Exclude<SourceLeg, { reason: string }>; target: number | null } | null = null;

  const leg = createMemo(() => {
    const reading = stage();
    return reading === null ? null : sourceLeg(reading, document.sheet);
  });
  const numberOf = (cell: string): ReturnType<typeof turnedNumber> => {
    const line = document.cell(cell)?.tree.line.index;
    return line === undefined ? null : turnedNumber(document.tree(), line, 'nominal');
  };
  let turned: ReturnType<typeof turnedNumber> = null;

  return createMemo(() => {
    const reading = stage();
    const present = leg();
    if (!reading?.q || present === null) return null;
    const { q, name } = reading;
    const cell = 'cell' in present ? document.cell(present.cell) : null;
    const current = `I_D ${formatValue(q.id, CURRENT).text}`;
    return {
      at: { x: q.vgs, y: q.id },
      label: `Q of ${name}`,
      text: cell ? `${cell.name} ${shownCell(cell) ?? ''}, ${current}` : current,
      now: q.id,
      reason: 'reason' in present ? present.reason : null,
      enter: () => setStay((n) => n + 1),
      step(way) {
        if ('reason' in present) return desk.say(present.reason);
        const number = numberOf(present.cell);
        // More current takes less resistance.
        const next = number && nextValue(number, way === 'more' ? 'down' : 'up');
        if (number && next !== null) {
          document.edit(setTurned(number, next), `turn ${present.cell}`, `turn ${present.cell} by Q ${stay()}`);
        }
      },
      move(x) {
        if (dragged === null) {
          if ('reason' in present) return desk.say(present.reason);
          dragged = { leg: present, target: null };
          turned = numberOf(present.cell);
        }
        const resistance = dragged.leg.resistanceAt(x);
        if (resistance === null || turned === null) return;
        dragged.target = snapped(turned, resistance);
        document.preview(setTurned(turned, dragged.target));
      },
      end(keep) {
        const done = dragged;
        dragged = null;
        if (done === null) return;
        if (keep && done.target !== null && turned !== null && done.target !== turned.literal.value) {
          document.edit(setTurned(turned, done.target), `turn ${done.leg.cell}`);
        } else {
          document.preview(null);
        }
      },
    };
  });
}
