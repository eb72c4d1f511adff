// The three ways to bias a FET into a band, each as far as it goes: self-bias, fixed-plus-self and a current source.
//
// Values come from the bias-line construction and are then taken from a preferred series; what a form cannot do is said with
// the number by which it cannot.

import { biasLine, middleResistor, selfBiasWindow } from '../../network/index.ts';
import type { BandPoints } from '../../network/index.ts';
import type { DividerPair } from '../../quantity/index.ts';
import { createSheet } from '../../sheet/index.ts';
import { amps, resistance, volts } from './amounts.ts';
import { bandPoints, findPoints, pointLines } from './band-points.ts';
import { aboveSupply, gateAllowance, lineSentence, MOST_GATE, resistorAllowance, targetOf } from './band-target.ts';
import type { Target } from './band-target.ts';
import type { BandWish } from './band-wish.ts';
import { pairFor, preferredIn, preferredLine, tooLarge } from './preferred-bias.ts';

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

/** What a current source needs across it, V (common practice for a transistor and its resistor, no source). */
const COMPLIANCE = 1;
/** A source resistance is found once it no longer moves V_GS through V_DS: share and passes. */
const SETTLED = 1e-6;
const PASSES = 8;
/** The three forms; a sentence where the part has no points for such a band. */
export function biasForms(wish: BandWish): readonly BiasForm[] | string {
  const fixed = fixedForm(wish);
  const self = selfForm(wish);
  const source = sourceForm(wish);
  for (const each of [fixed, self, source]) if (typeof each === 'string') return each;
  return [self, fixed, source] as BiasForm[];
}

function selfForm(wish: BandWish): BiasForm | string {
  const settled = settle(wish, (points) => Math.max(0, middleResistor(points, 0)));
  if (typeof settled === 'string') return settled;
  const { points, ohms } = settled;
  if (!(ohms > 0)) {
    const asked = biasLine(points);
    const side = wish.rails.channel > 0 ? 'below' : 'above';
    const own = (value: number): string => volts(wish.rails.channel * value);
    const reasons = [
      points.vgsMost >= 0
        ? `With the gate at its rail V_GS lies ${side} 0 V; a high device needs ${own(points.vgsMost)} for ${amps(wish.most)}.`
        : `With the gate at its rail no resistor comes near: a low device needs V_GS ${own(points.vgsLeast)} for ${amps(wish.least)}.`,
    ];
    if (asked && asked.V_GG > 0) reasons.push(`The bias line starts at V_GG ${own(asked.V_GG)}, not at 0 V.`);
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
  const line = lineSentence(points, target, wish);
  if (!(target.ohms > 0)) {
    reasons.push(`The line would need ${resistance(target.ohms)} in the source.`);
    return { form: 'fixed', bias: null, reasons, line };
  }
  const { ohms, pair, isInside } = preferredLine(points, target, wish);
  if (target.why === null && !isInside)
    reasons.push(`No divider of ${wish.series} values meets the window of V_GG for these R_S; a finer series may.`);
  const large = tooLarge(pair.upper);
  if (large !== null) reasons.push(large);
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
  const large = tooLarge(pair.upper);
  if (large !== null) reasons.push(large);
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

/** What a JFET's gate does at a current; null where it only holds. */
function gateForward(wish: BandWish, vgs: number, current: number): string | null {
  if (wish.family !== 'JFET' || vgs <= 0) return null;
  return `At ${amps(current)} a low device stands at V_GS ${volts(wish.rails.channel * vgs)}: its gate would conduct.`;
}

/** A current of two digits where that lies in the band, else of three. */
function roundInside(current: number, { least, most }: BandWish): number {
  const rounded = Number(current.toPrecision(2));
  return rounded > least && rounded < most ? rounded : Number(current.toPrecision(3));
}
