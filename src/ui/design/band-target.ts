// The bias line that a band is given with a gate voltage of its own: how far it may start above 0 V, and what is odd about it.

import { biasLine, dividerAllowance, middleResistor, selfBiasWindow } from '../../network/index.ts';
import type { BandPoints, BiasAllowance } from '../../network/index.ts';
import { amps, resistance, volts } from './amounts.ts';
import type { BandWish } from './band-wish.ts';

/** A larger share of the supply at the gate is no bias any more; a fifth is what a gate gets that may have any (common practice, no source). */
export const MOST_GATE = 0.9;
const FREE_GATE = 0.2;

/** A line and how it came about. */
export interface Target {
  readonly ohms: number;
  readonly V_GG: number;
  readonly allowance: BiasAllowance;
  /** It is the least resistance that holds the band, and so is rounded up. */
  readonly isLeast: boolean;
  /** What is odd about it; null where nothing is. */
  readonly why: string | null;
}

/** The line to bias by: through both limits, with room where it is wanted; where that is none, one that comes near, and why. */
export function targetOf(points: BandPoints, wish: BandWish): Target {
  const { height } = wish.rails;
  const most = MOST_GATE * height;
  const exact = biasLine(points)!;
  const none = { resistor: 0, gate: 0 };
  const middle = (V_GG: number, why: string | null): Target => {
    return { ohms: middleResistor(points, V_GG), V_GG, allowance: none, isLeast: false, why };
  };
  if (exact.R_S <= 0) {
    const { channel } = wish.rails;
    const fixedEnds = `${volts(channel * points.vgsLeast)} to ${volts(channel * points.vgsMost)}`;
    return middle(
      FREE_GATE * height,
      `The line through both limits asks for ${resistance(exact.R_S)}, a negative R_S: the band is wider than the part spreads at a fixed V_GS of ${fixedEnds}. V_GG is chosen at a fifth of the supply.`,
    );
  }
  const self = selfBiasWindow(points, { resistor: resistorAllowance(wish), gate: 0 });
  if (self.low <= self.high && self.high > 0) {
    return middle(
      FREE_GATE * height,
      'Self-bias holds the band already; with V_GG at a fifth of the supply, as here, the current moves less.',
    );
  }
  if (exact.V_GG > most) return middle(most, aboveSupply(exact.V_GG, wish));
  const room = lineWithRoom(points, wish, most);
  if (room === null) {
    return {
      ...exact,
      ohms: exact.R_S,
      allowance: none,
      isLeast: true,
      why: `Resistors and supply alone move the current by more than from ${amps(wish.least)} to ${amps(wish.most)}: no line leaves room for their tolerances.`,
    };
  }
  if (room.V_GG > most) return middle(most, aboveSupply(room.V_GG, wish));
  return { ohms: room.R_S, V_GG: room.V_GG, allowance: gateAllowance(room.V_GG, wish), isLeast: true, why: null };
}

/** Halvings of the range of V_GG. */
const HALVINGS = 60;

/**
 * The line that leaves room for a divider of its own V_GG, up to `most`: the higher V_GG is, the less the divider's resistors
 * move it, and the lower the line may start. null where none leaves room; beyond `most` where only such a one would.
 */
function lineWithRoom(points: BandPoints, wish: BandWish, most: number): ReturnType<typeof biasLine> {
  const lineFor = (V_GG: number): ReturnType<typeof biasLine> => biasLine(points, gateAllowance(V_GG, wish));
  const last = lineFor(most);
  if (last === null || last.V_GG > most) return last;
  let [low, high] = [0, most];
  for (let n = 0; n < HALVINGS; n++) {
    const V_GG = (low + high) / 2;
    const line = lineFor(V_GG);
    if (line === null || line.V_GG > V_GG) low = V_GG;
    else high = V_GG;
  }
  return lineFor(high);
}

/** What is wrong with a gate voltage that no divider gives, as a sentence. */
export function aboveSupply(V_GG: number, { rails }: BandWish): string {
  const beyond = V_GG - rails.height;
  return beyond > 0
    ? `The line asks for V_GG of ${volts(rails.channel * V_GG)}, ${volts(beyond)} beyond the supply of ${volts(rails.height)}; the divider stops at nine tenths of the supply.`
    : `The line asks for V_GG of ${volts(rails.channel * V_GG)}, ${volts(-beyond)} short of the supply of ${volts(rails.height)}: nothing is left for the FET. The divider stops at nine tenths of the supply.`;
}

/** By how much resistors and a divider for this V_GG may be off, where room is left for that. */
export function gateAllowance(V_GG: number, wish: BandWish): BiasAllowance {
  if (!wish.roomy) return { resistor: 0, gate: 0 };
  const ratio = Math.min(MOST_GATE, Math.max(0.01, V_GG / wish.rails.height));
  return { resistor: wish.tolerance.share, gate: dividerAllowance(ratio, wish.tolerance.share, wish.supplyOff) };
}

/** The allowance for resistors alone, where one is asked for. */
export function resistorAllowance({ roomy, tolerance }: BandWish): number {
  return roomy ? tolerance.share : 0;
}

/** What the construction gives before and, where room is left, after the tolerances. */
export function lineSentence(points: BandPoints, { isLeast, why, ohms, V_GG }: Target, { rails }: BandWish): string {
  const own = (value: number): string => volts(rails.channel * value);
  const exact = biasLine(points)!;
  const plain = `The line through both limit devices: R_S ${resistance(exact.R_S)} from V_GG ${own(exact.V_GG)}`;
  return isLeast && why === null && ohms !== exact.R_S
    ? `${plain}; with room for the tolerances ${resistance(ohms)} from ${own(V_GG)}.`
    : `${plain}.`;
}
