// The three ways to bias a FET into a band, each as far as it goes: self-bias, fixed-plus-self and a current source.
//
// Values come from the bias-line construction and are then taken from a preferred series; what a form cannot do is said with
// the number by which it cannot.

import { biasLine, dividerAllowance, gateWindow, middleResistor, selfBiasWindow } from '../../network/index.ts';
import type { BandPoints, BiasAllowance } from '../../network/index.ts';
import {
  CURRENT,
  dividerPairs,
  formatValue,
  nextPreferred,
  preferredValue,
  RESISTANCE,
  VOLTAGE,
} from '../../quantity/index.ts';
import type { DividerPair, SeriesName } from '../../quantity/index.ts';
import { createSheet } from '../../sheet/index.ts';
import { bandPoints, findPoints, pointLines } from './band-points.ts';
import type { BandWish } from './band-wish.ts';

export type FormName = 'self' | 'fixed' | 'source';

/** The gate: at the near rail over a resistor, or at a divider between both rails. */
type GateBias = { readonly type: 'rail' } | { readonly type: 'divider'; readonly pair: DividerPair };

/** One way to bias, with preferred values. Voltages are in the n-channel frame, against the near rail. */
export interface BiasForm {
  readonly form: FormName;
  /** null where the form needs what there is not; `reasons` says what. */
  readonly bias: {
    readonly gate: GateBias;
    /** V, of the values taken. */
    readonly V_GG: number;
    /** Ohms in the source leg, or amperes drawn from it. */
    readonly source:
      | { readonly type: 'resistor'; readonly ohms: number }
      | { readonly type: 'current'; readonly amps: number };
    /** What the construction asks before values are preferred. */
    readonly exact: { readonly V_GG: number; readonly ohms: number | null };
  } | null;
  /** What the form cannot do, and why, as sentences. */
  readonly reasons: readonly string[];
  /** The line through both limits as the construction gives it, as a sentence; null for another form. */
  readonly line: string | null;
}

/** A larger share of the supply at the gate is no bias any more; a fifth is what a gate gets that may have any (common practice, no source). */
const MOST_GATE = 0.9;
const FREE_GATE = 0.2;
/** What a current source needs across it, V (common practice for a transistor and its resistor, no source). */
const COMPLIANCE = 1;
/** A source resistance is found once it no longer moves V_GS through V_DS: share and passes. */
const SETTLED = 1e-6;
const PASSES = 8;
/** Divider pairs looked at for one whose voltage lies in the window, and how far their parallel resistance may be off, as a factor. */
const PAIRS = 300;
const PARALLEL_OFF = 2;
/** Values above the least source resistance that are tried for a divider in their window. */
const STEPS = 4;
/** A resistor above this is seldom stocked, ohms (common practice, no source). */
const MOST_STOCKED = 22e6;

/** The three forms; a sentence where the part has no points for such a band. */
export function biasForms(wish: BandWish): readonly BiasForm[] | string {
  const fixed = fixedForm(wish);
  const self = selfForm(wish);
  const source = sourceForm(wish);
  for (const each of [fixed, self, source]) if (typeof each === 'string') return each;
  return [self, fixed, source] as BiasForm[];
}

/** The allowance for resistors alone, where one is asked for. */
function resistorAllowance({ roomy, tolerance }: BandWish): number {
  return roomy ? tolerance.share : 0;
}

function selfForm(wish: BandWish): BiasForm | string {
  const settled = settle(wish, (points) => Math.max(0, middleResistor(points, 0)));
  if (typeof settled === 'string') return settled;
  const { points, ohms } = settled;
  if (!(ohms > 0)) {
    const asked = biasLine(points);
    const reasons = [
      points.vgsMost >= 0
        ? `Self-bias holds V_GS below 0 V; ${amps(wish.most)} needs ${volts(points.vgsMost)} at least.`
        : `Self-bias holds no part of the band: ${amps(wish.least)} needs ${volts(points.vgsLeast)} of V_GS from a low device.`,
    ];
    if (asked && asked.V_GG > 0) reasons.push(`The bias line starts at V_GG ${volts(asked.V_GG)}, not at 0 V.`);
    return { form: 'self', bias: null, reasons, line: null };
  }
  const window = selfBiasWindow(points, { resistor: resistorAllowance(wish), gate: 0 });
  const reasons =
    window.low <= window.high
      ? []
      : [
          `With V_GG at 0 V the high end asks for ${resistance(window.low)} or more in the source, the low end for ${
            window.high > 0 ? `${resistance(window.high)} or less` : 'none at all'
          }.`,
        ];
  return {
    form: 'self',
    bias: {
      gate: { type: 'rail' },
      V_GG: 0,
      source: { type: 'resistor', ohms: preferredIn(wish.series, ohms, window) },
      exact: { V_GG: 0, ohms },
    },
    reasons,
    line: null,
  };
}

function fixedForm(wish: BandWish): BiasForm | string {
  const { rails } = wish;
  const reasons: string[] = [];
  const choose = (points: BandPoints): Target => targetOf(points, wish);
  const settled = settle(wish, (points) => choose(points).ohms);
  if (typeof settled === 'string') return settled;
  const { points } = settled;
  const target = choose(points);
  if (target.why !== null) reasons.push(target.why);
  const forward = gateForward(wish, points.vgsLeast, wish.least);
  if (forward !== null) reasons.push(forward);
  const line = lineSentence(points, target);
  if (!(target.ohms > 0)) {
    reasons.push(`The line would need ${resistance(target.ohms)} in the source.`);
    return { form: 'fixed', bias: null, reasons, line };
  }
  const { ohms, pair } = preferredLine(points, target, wish);
  if (pair.upper > MOST_STOCKED) reasons.push(tooLarge(pair.upper));
  return {
    form: 'fixed',
    bias: {
      gate: { type: 'divider', pair },
      V_GG: pair.ratio * rails.height,
      source: { type: 'resistor', ohms },
      exact: { V_GG: target.V_GG, ohms: target.ohms },
    },
    reasons,
    line,
  };
}

/** What the construction gives before and, where room is left, after the tolerances. */
function lineSentence(points: BandPoints, { isLeast, why, ohms, V_GG }: Target): string {
  const exact = biasLine(points)!;
  const plain = `The line through both limit devices: R_S ${resistance(exact.R_S)} from V_GG ${volts(exact.V_GG)}`;
  return isLeast && why === null && ohms !== exact.R_S
    ? `${plain}; with room for the tolerances ${resistance(ohms)} from ${volts(V_GG)}.`
    : `${plain}.`;
}

/** The least preferred source resistance that has a divider of preferred values in its window, else the least with the nearest. */
function preferredLine(points: BandPoints, target: Target, wish: BandWish): { ohms: number; pair: DividerPair } {
  const most = MOST_GATE * wish.rails.height;
  let ohms = preferredValue(wish.series, target.ohms, target.isLeast ? 'up' : 'nearest');
  let first: { ohms: number; pair: DividerPair } | null = null;
  for (let step = 0; step < STEPS; step++) {
    const { low, high } = gateWindow(points, ohms, target.allowance);
    const window = { low: Math.max(low, 0), high: Math.min(high, most) };
    const isOpen = window.low <= window.high;
    const { pair, isInside } = pairFor(
      isOpen ? (window.low + window.high) / 2 : Math.min(target.V_GG, most),
      window,
      wish,
    );
    first ??= { ohms, pair };
    if (isInside) return { ohms, pair };
    if (!target.isLeast) break;
    ohms = nextPreferred(wish.series, ohms, 'up');
  }
  return first!;
}

/** A line and how it came about. */
interface Target {
  readonly ohms: number;
  readonly V_GG: number;
  readonly allowance: BiasAllowance;
  /** It is the least resistance that holds the band, and so is rounded up. */
  readonly isLeast: boolean;
  /** What is odd about it; null where nothing is. */
  readonly why: string | null;
}

function targetOf(points: BandPoints, wish: BandWish): Target {
  const { height } = wish.rails;
  const most = MOST_GATE * height;
  const exact = biasLine(points)!;
  const none = { resistor: 0, gate: 0 };
  const middle = (V_GG: number, why: string | null): Target => {
    return { ohms: middleResistor(points, V_GG), V_GG, allowance: none, isLeast: false, why };
  };
  if (exact.R_S <= 0) {
    const fixedEnds = `${volts(points.vgsLeast)} to ${volts(points.vgsMost)}`;
    return middle(
      FREE_GATE * height,
      `The line through both limits asks for ${resistance(exact.R_S)}, a negative R_S: the band is wider than the part spreads at a fixed V_GS of ${fixedEnds}. V_GG is chosen at a fifth of the supply.`,
    );
  }
  if (exact.V_GG > most) return middle(most, aboveSupply(exact.V_GG, wish));
  const allowance = gateAllowance(exact.V_GG, wish);
  const line = biasLine(points, allowance);
  if (line === null) {
    return {
      ...exact,
      ohms: exact.R_S,
      allowance: none,
      isLeast: true,
      why: `Resistors and supply alone move the current by more than from ${amps(wish.least)} to ${amps(wish.most)}: no line leaves room for their tolerances.`,
    };
  }
  const refined = biasLine(points, gateAllowance(line.V_GG, wish)) ?? line;
  if (refined.V_GG > most) {
    return middle(most, aboveSupply(refined.V_GG, wish));
  }
  if (refined.V_GG <= 0) {
    return middle(
      FREE_GATE * height,
      `Self-bias holds the band already; with V_GG at a fifth of the supply, as here, the current moves less.`,
    );
  }
  return {
    ohms: refined.R_S,
    V_GG: refined.V_GG,
    allowance: gateAllowance(refined.V_GG, wish),
    isLeast: true,
    why: null,
  };
}

function aboveSupply(V_GG: number, { rails }: BandWish): string {
  const beyond = V_GG - rails.height;
  return beyond > 0
    ? `The line asks for V_GG of ${volts(V_GG)}, ${volts(beyond)} above the supply of ${volts(rails.height)}; the divider stops at nine tenths of the supply.`
    : `The line asks for V_GG of ${volts(V_GG)}, ${volts(-beyond)} below the supply of ${volts(rails.height)}: nothing is left for the FET. The divider stops at nine tenths of the supply.`;
}

function gateAllowance(V_GG: number, wish: BandWish): BiasAllowance {
  if (!wish.roomy) return { resistor: 0, gate: 0 };
  const ratio = Math.min(MOST_GATE, Math.max(0.01, V_GG / wish.rails.height));
  return { resistor: wish.tolerance.share, gate: dividerAllowance(ratio, wish.tolerance.share, wish.supplyOff) };
}

function sourceForm(wish: BandWish): BiasForm | string {
  const { rails } = wish;
  const current = roundInside(Math.sqrt(wish.least * wish.most), wish);
  const held = [
    { current, vds: Math.max(rails.height / 2 - (wish.drain?.ohms ?? 0) * current, rails.height / 10), end: 'largest' },
  ] as const;
  const { names, lines } = pointLines(wish, held);
  const found = findPoints(createSheet([...wish.behind, ...wish.added, ...lines].join('\n')), wish, held, names);
  if (typeof found === 'string') return found;
  const reasons: string[] = [];
  const off = wish.sourceTolerance.share;
  if (current * (1 - off) < wish.least || current * (1 + off) > wish.most)
    reasons.push(`A source of ±${wish.sourceTolerance.text} alone moves the current by more than the band.`);
  const forward = gateForward(wish, found[0]!.vgs, current);
  if (forward !== null) reasons.push(forward);
  const wanted = found[0]!.vgs + COMPLIANCE;
  const source = { type: 'current', amps: current } as const;
  if (wanted <= 0) {
    const bias = { gate: { type: 'rail' }, V_GG: 0, source, exact: { V_GG: 0, ohms: null } } as const;
    return { form: 'source', bias, reasons, line: null };
  }
  if (wanted > MOST_GATE * rails.height) {
    return { form: 'source', bias: null, reasons: [...reasons, aboveSupply(wanted, wish)], line: null };
  }
  // Room for the divider's own tolerances; the voltage itself matters little.
  const V_GG = wanted * (1 + gateAllowance(wanted, { ...wish, roomy: true }).gate);
  const { pair } = pairFor(V_GG, { low: wanted, high: Infinity }, wish);
  if (pair.upper > MOST_STOCKED) reasons.push(tooLarge(pair.upper));
  const bias = {
    gate: { type: 'divider', pair },
    V_GG: pair.ratio * rails.height,
    source,
    exact: { V_GG, ohms: null },
  } as const;
  return { form: 'source', bias, reasons, line: null };
}

/** A source resistance and the points of the band that it leads to, in step with each other. */
function settle(
  wish: BandWish,
  resistor: (points: BandPoints) => number,
): { readonly points: BandPoints; readonly ohms: number } | string {
  let ohms = 0;
  let last: BandPoints | null = null;
  for (let pass = 0; ; pass++) {
    const points = bandPoints(wish, ohms);
    if (typeof points === 'string') return points;
    ohms = Math.max(0, resistor(points));
    const near = (a: number, b: number): boolean => Math.abs(a - b) <= SETTLED * (Math.abs(a) + Math.abs(b));
    const isSettled = last !== null && near(points.vgsLeast, last.vgsLeast) && near(points.vgsMost, last.vgsMost);
    if (isSettled || pass === PASSES) return { points, ohms };
    last = points;
  }
}

/** The preferred value nearest to one that lies in a window, else the nearest. */
function preferredIn(series: SeriesName, wanted: number, { low, high }: { low: number; high: number }): number {
  const [nearest, up, down] = (['nearest', 'up', 'down'] as const).map((way) => preferredValue(series, wanted, way));
  return [nearest!, up!, down!].find((value) => value >= low && value <= high) ?? nearest!;
}

/** The divider for a gate voltage: the best ranked one that stays in the window, else the best; and whether it does. */
function pairFor(
  V_GG: number,
  { low, high }: { low: number; high: number },
  wish: BandWish,
): { readonly pair: DividerPair; readonly isInside: boolean } {
  const { height } = wish.rails;
  const pairs = dividerPairs({ ratio: V_GG / height, parallel: wish.gateOhms, series: wish.series }, PAIRS);
  const inside = pairs.find(({ ratio, parallel }) => {
    const off = Math.max(parallel / wish.gateOhms, wish.gateOhms / parallel);
    return ratio * height >= low && ratio * height <= high && off <= PARALLEL_OFF;
  });
  return { pair: inside ?? pairs[0]!, isInside: inside !== undefined };
}

function tooLarge(ohms: number): string {
  return `A divider resistor of ${formatValue(ohms, RESISTANCE, { zeros: 'drop' }).text} is seldom stocked; with less resistance at the gate both are smaller.`;
}

/** What a JFET's gate does at a current; null where it only holds. */
function gateForward(wish: BandWish, vgs: number, current: number): string | null {
  if (wish.family !== 'JFET' || vgs <= 0) return null;
  return `At ${amps(current)} a low device stands at V_GS ${volts(vgs)} in its own sense: its gate would conduct.`;
}

/** A current of two digits where that lies in the band, else of three. */
function roundInside(current: number, { least, most }: BandWish): number {
  const rounded = Number(current.toPrecision(2));
  return rounded > least && rounded < most ? rounded : Number(current.toPrecision(3));
}

const volts = (value: number): string => formatValue(value, VOLTAGE).text;
const amps = (value: number): string => formatValue(value, CURRENT, { zeros: 'drop' }).text;
const resistance = (value: number): string => formatValue(value, RESISTANCE).text;
