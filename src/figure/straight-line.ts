// Bias and load line: the straight line V = V_0 - R I of a resistive surrounding, cut to a chart.

/** V = `volts` - `ohms` I; in a p-channel plane, where V is negative, V = `volts` + `ohms` I. An infinite resistance forces the current `amps`; 0 ohm forces the voltage. */
export interface StraightLine {
  readonly volts: number;
  readonly ohms: number;
  /** The current where the surrounding forces it; not used otherwise. */
  readonly amps: number;
}

/** The two ends (volts, amperes) of the line V = `volts` - `ohms` I inside a rectangle; null where it passes outside. */
export function cutLine(
  line: StraightLine,
  box: { readonly low: number; readonly high: number; readonly bottom: number; readonly top: number },
): { readonly x: Float64Array; readonly y: Float64Array } | null {
  const { volts, ohms, amps } = line;
  const { low, high, bottom, top } = box;
  if (Math.abs(ohms) === Infinity) return amps < bottom || amps > top ? null : ends(low, amps, high, amps);
  if (ohms === 0) return volts < low || volts > high ? null : ends(volts, bottom, volts, top);
  const at = (v: number): number => (volts - v) / ohms;
  const points: [number, number][] = [];
  for (const v of [low, high]) if (at(v) >= bottom && at(v) <= top) points.push([v, at(v)]);
  for (const i of [bottom, top]) {
    const v = volts - ohms * i;
    if (v > low && v < high) points.push([v, i]);
  }
  points.sort((a, b) => a[0] - b[0]);
  const [first, last] = [points[0], points.at(-1)];
  if (first === undefined || last === undefined || first === last) return null;
  return ends(first[0], first[1], last[0], last[1]);
}

function ends(x0: number, y0: number, x1: number, y1: number): { x: Float64Array; y: Float64Array } {
  return { x: Float64Array.of(x0, x1), y: Float64Array.of(y0, y1) };
}
