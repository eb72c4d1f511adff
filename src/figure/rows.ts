// The heights of a schematic. Every node has a *row*, a height at which its horizontal wires run; symbols
// stand in the gaps between rows and never on one, so no horizontal wire can meet an upright symbol or
// a label. Nodes joined by a lying element share a row; all others have one of their own, unique over
// the whole width, so that a wire on it can reach any column.
//
// From top to bottom: rows above the channel, the row of its upper terminal, the lower terminal's, rows
// below. The gate's row lies between those two on the left, the bulk's on the right.

import { FET, HALF_LENGTH } from './symbols.ts';
import type { Side } from './topology.ts';

/** Middle of a symbol below or above the row it hangs on; more above, for the row's own labels. */
const CENTRE_BELOW = 36;
const CENTRE_ABOVE = 40;
/** From the middle of a symbol to the bar at its end, and of a tie from the row. */
const BAR_BEYOND = HALF_LENGTH + 9;
const TIE_BELOW = 24;
const TIE_ABOVE = 28;
const RAIL_LABEL = 20;
const MARGIN = 10;
const LEAST_GAP = 42;
/** Room for lying symbols with labels on the row of a channel terminal beside the gate's row. */
const LYING_GAP = 46;

export const GATE_ROW = 'gate';
/** Row of a bulk that is joined on the spot; a bulk with branches has a row `bulk` among the others. */
export const BULK_PIN_ROW = 'bulk pin';

/** Where an upright element stands: the middle of its symbol relative to a row. */
export interface Spot {
  readonly row: string;
  readonly down: boolean;
  /** The row that bounds the gap on the other side; null where nothing does. */
  readonly next: string | null;
}

export class Rows {
  readonly #order: readonly string[];
  readonly #upper: number;
  readonly #sourceUp: boolean;
  readonly #needs = new Map<string, number>();
  #y: Map<string, number> | null = null;

  /** `above` and `below` are read from the channel outwards. */
  constructor(above: readonly string[], upper: string, lower: string, below: readonly string[]) {
    this.#order = [...above.toReversed(), upper, lower, ...below];
    this.#upper = above.length;
    this.#sourceUp = upper === 'source';
  }

  /** Where a leg to a rail stands that hangs on `row`. `underGate`: between the gate's row and the one below it. */
  hangSpot(row: string, up: boolean, side: Side, underGate: boolean): Spot {
    const [upper, lower] = this.#channel();
    if (row === GATE_ROW && !up && underGate) return { row, down: true, next: lower };
    if (row === GATE_ROW || row === BULK_PIN_ROW) return up ? this.#above(upper) : this.#below(lower);
    if (side === 'left' && row === upper && !up) return { row, down: true, next: GATE_ROW };
    if (side === 'left' && row === lower && up) return { row, down: false, next: GATE_ROW };
    return up ? this.#above(row) : this.#below(row);
  }

  /** Where an upright element between two rows stands. */
  betweenSpot(a: string, b: string): Spot {
    const [upper, lower] = this.#channel();
    const [top, bottom] = this.#rank(a) < this.#rank(b) ? [a, b] : [b, a];
    const inside = (row: string): boolean => row === GATE_ROW || row === BULK_PIN_ROW;
    if (inside(top)) return bottom === lower ? { row: top, down: true, next: lower } : this.#below(lower);
    if (inside(bottom)) return top === upper ? { row: top, down: true, next: bottom } : this.#above(upper);
    if (top === upper && bottom !== lower) return this.#below(lower);
    return this.#below(top);
  }

  /** Where the element stands by which the channel's line goes on from `row`. */
  lineSpot(row: string, up: boolean): Spot {
    return up ? this.#above(row) : this.#below(row);
  }

  /** Asks for room at a spot; `hanging` with a bar at its end, `labelled` with a text beyond that, `tie` without a symbol. */
  need(spot: Spot, { hanging, labelled, tie }: { hanging: boolean; labelled: boolean; tie: boolean }): void {
    if (spot.next === null) return;
    let room = LEAST_GAP;
    if (hanging) room = this.barOffset(spot.down, tie) + (labelled ? RAIL_LABEL : 4) + MARGIN;
    else if (!tie) room = (spot.down ? CENTRE_BELOW : CENTRE_ABOVE) + HALF_LENGTH + 20;
    this.#ask(spot.row, spot.next, room);
  }

  /** Asks for room for lying symbols between a channel terminal's row and the gate's. */
  needLying(row: string): void {
    this.#ask(row, GATE_ROW, LYING_GAP);
  }

  /** Distance of a bar from the row of its spot. */
  barOffset(down: boolean, tie: boolean): number {
    if (tie) return down ? TIE_BELOW : TIE_ABOVE;
    return (down ? CENTRE_BELOW : CENTRE_ABOVE) + BAR_BEYOND;
  }

  /** Height of the symbol's middle, or of the bar, at a spot. */
  centreOf({ row, down }: Spot): number {
    return this.yOf(row) + (down ? CENTRE_BELOW : -CENTRE_ABOVE);
  }
  barOf({ row, down }: Spot, tie: boolean): number {
    return this.yOf(row) + (down ? 1 : -1) * this.barOffset(down, tie);
  }

  /** Height of a row, the channel's middle at 0; settles all heights at the first call. */
  yOf(row: string): number {
    this.#y ??= this.#solve();
    const y = this.#y.get(row);
    if (y === undefined) throw new RangeError(`no row ${row}`);
    return y;
  }

  #channel(): [string, string] {
    return [this.#order[this.#upper]!, this.#order[this.#upper + 1]!];
  }

  #rank(row: string): number {
    if (row === GATE_ROW || row === BULK_PIN_ROW) return this.#upper + 0.5;
    const rank = this.#order.indexOf(row);
    if (rank < 0) throw new RangeError(`no row ${row}`);
    return rank;
  }

  #above(row: string): Spot {
    return { row, down: false, next: this.#order[this.#rank(row) - 1] ?? null };
  }
  #below(row: string): Spot {
    return { row, down: true, next: this.#order[this.#rank(row) + 1] ?? null };
  }

  #ask(a: string, b: string, room: number): void {
    const key = this.#rank(a) < this.#rank(b) ? `${a}|${b}` : `${b}|${a}`;
    this.#needs.set(key, Math.max(this.#needs.get(key) ?? 0, room));
  }

  #solve(): Map<string, number> {
    const [upper, lower] = this.#channel();
    const need = (a: string, b: string): number => this.#needs.get(`${a}|${b}`) ?? 0;
    const gate = this.#sourceUp ? -FET.contact : FET.contact;
    const y = new Map([
      [GATE_ROW, gate],
      [BULK_PIN_ROW, 0],
    ]);
    // The upper lead has the arrow of the current beside it.
    const top = -Math.max(FET.reach + 18, need(upper, GATE_ROW) - gate, need(upper, BULK_PIN_ROW));
    const least = Math.max(FET.reach + 12, need(GATE_ROW, lower) + gate, need(BULK_PIN_ROW, lower));
    y.set(upper, top);
    y.set(lower, Math.max(least, top + need(upper, lower)));
    for (let at = this.#upper - 1; at >= 0; at--) {
      const [row, next] = [this.#order[at]!, this.#order[at + 1]!];
      y.set(row, y.get(next)! - Math.max(LEAST_GAP, need(row, next)));
    }
    for (let at = this.#upper + 2; at < this.#order.length; at++) {
      const [before, row] = [this.#order[at - 1]!, this.#order[at]!];
      y.set(row, y.get(before)! + Math.max(LEAST_GAP, need(before, row)));
    }
    return y;
  }
}
