// The bias line of a band: which source resistor and which gate voltage keep the drain current of every device of a part
// between two limits.
//
// A device in a stage stands where its transfer curve meets the bias line V_GS = V_GG - R_S I. Two points of the part bound
// all of it: the largest V_GS at which any device carries the least current wanted (the low device), and the smallest V_GS at
// which any device carries the largest one (the high device). Curves rise; so every device carries at least I_least where the
// line passes at I_least on the right of the first point, and at most I_most where it passes at I_most on the left of the
// second:
//
//     V_GG - R_S I_least >= V_least        V_GG - R_S I_most <= V_most
//
// The line through both points meets both as equalities: the construction of the textbooks. Its R_S is the least that holds
// the band; a larger one leaves a window for V_GG. With resistors that are off by t and a gate voltage that is off by u
// (shares, worst case) the two conditions read the same with R_S (1 + t), V_GG less u at the first, R_S (1 - t), V_GG more u
// at the second, and are solved as exactly.
//
// Everything in the n-channel frame, voltages against the rail at which the source resistor ends, SI.
//
// Source: the bias line on the transfer curves of the maximum and the minimum device, D. A. Bell, Electronic Devices and
// Circuits, 5th ed. (2008), ch. 10, and A. Malvino and D. Bates, Electronic Principles, ch. 13, both as reproduced in open
// companions; the terms in t and u are worked out here.

/** What is wanted of the current, and the two points of the part that bound it. */
export interface BandPoints {
  /** A, above 0. */
  readonly least: number;
  /** A, above `least`. */
  readonly most: number;
  /** V: the largest V_GS of any device at `least`. */
  readonly vgsLeast: number;
  /** V: the smallest V_GS of any device at `most`. */
  readonly vgsMost: number;
}

/** By which share the parts of the bias may be off, to either side. */
export interface BiasAllowance {
  readonly resistor: number;
  readonly gate: number;
}

interface BiasLine {
  /** Ohms; negative where the band is wider than the part spreads at a fixed gate voltage. */
  readonly R_S: number;
  /** V. */
  readonly V_GG: number;
}

interface Window {
  readonly low: number;
  readonly high: number;
}

const EXACT: BiasAllowance = { resistor: 0, gate: 0 };

/** The line with the least R_S that holds the band; null where the allowance alone takes up more than the band leaves. */
export function biasLine(points: BandPoints, allowance: BiasAllowance = EXACT): BiasLine | null {
  // A gate voltage below 0 is off the other way round.
  const above = meetingPoint(points, allowance.resistor, allowance.gate);
  if (above !== null && above.V_GG >= 0) return above;
  const below = meetingPoint(points, allowance.resistor, -allowance.gate);
  return below !== null && below.V_GG <= 0 ? below : null;
}

/** The gate voltages that hold the band with this source resistor; empty (high below low) where none does. */
export function gateWindow(points: BandPoints, R_S: number, allowance: BiasAllowance = EXACT): Window {
  const { resistor: t, gate: u } = allowance;
  const low = points.vgsLeast + R_S * (1 + t) * points.least;
  const high = points.vgsMost + R_S * (1 - t) * points.most;
  return { low: low / (low > 0 ? 1 - u : 1 + u), high: high / (high > 0 ? 1 + u : 1 - u) };
}

/** The source resistors that hold the band with the gate at 0 V: self-bias; empty (high below low) where none does. */
export function selfBiasWindow(points: BandPoints, allowance: BiasAllowance = EXACT): Window {
  const { resistor: t } = allowance;
  return {
    low: -points.vgsMost / ((1 - t) * points.most),
    high: -points.vgsLeast / ((1 + t) * points.least),
  };
}

/**
 * The source resistor that with this gate voltage is equally far, in volts, from both conditions: in the middle of what holds
 * the band, or, where nothing does, missing both ends by the same voltage. Not above 0 where no resistor helps.
 */
export function middleResistor(points: BandPoints, V_GG: number): number {
  return (V_GG - points.vgsLeast + (V_GG - points.vgsMost)) / (points.least + points.most);
}

/** The bound on how far off a divider's voltage may be, as a share: its supply's own, and both resistors at opposite ends. */
export function dividerAllowance(ratio: number, resistor: number, supply: number): number {
  const [upper, lower] = [(1 - ratio) * (1 - resistor), ratio * (1 + resistor)];
  const high = (lower / (upper + lower) / ratio) * (1 + supply) - 1;
  const [wide, narrow] = [(1 - ratio) * (1 + resistor), ratio * (1 - resistor)];
  const low = 1 - (narrow / (wide + narrow) / ratio) * (1 - supply);
  return Math.max(high, low);
}

/** Where both conditions are equalities, with the gate voltage off by `u` of itself in the sense of a positive one. */
function meetingPoint({ least, most, vgsLeast, vgsMost }: BandPoints, t: number, u: number): BiasLine | null {
  const slope = ((1 - t) * most) / (1 + u) - ((1 + t) * least) / (1 - u);
  if (!(slope > 0)) return null;
  const R_S = (vgsLeast / (1 - u) - vgsMost / (1 + u)) / slope;
  return { R_S, V_GG: (vgsLeast + R_S * (1 + t) * least) / (1 - u) };
}
