// One FET as the design writes it: the square law in its three regions, the body effect, temperature, the mirror of
// a p-channel FET, and how the lines of a part settle beta and V_TO. Every equation is solved by bisection.

export interface NaiveDevice {
  readonly channel: 1 | -1;
  readonly family: 'JFET' | 'MOSFET';
  /** At T_nom, n-channel frame, SI. */
  readonly beta: number;
  readonly vto: number;
  readonly lambda: number;
  readonly gamma: number;
  readonly phi: number;
  readonly rs: number;
  readonly rd: number;
  readonly igss: number;
  readonly doubling: number;
  readonly tempco: number;
  readonly betaExponent: number;
  readonly tnom: number;
  readonly rth: number;
  readonly cgs: number | null;
  readonly cgd: number | null;
  readonly pb: number;
  readonly m: number;
}

/** The constants at one junction temperature. */
export interface Hot {
  readonly beta: number;
  readonly vto: number;
  readonly lambda: number;
  readonly gamma: number;
  readonly phi: number;
}

export function hotDevice(device: NaiveDevice, temperature: number): Hot {
  const { lambda, gamma, phi } = device;
  const beta = device.beta * (temperature / device.tnom) ** device.betaExponent;
  return { beta, vto: device.vto + device.tempco * (temperature - device.tnom), lambda, gamma, phi };
}

export function hotLeakage(device: NaiveDevice, temperature: number): number {
  return device.igss * 2 ** ((temperature - device.tnom) / device.doubling);
}

function threshold({ vto, gamma, phi }: Hot, vsb: number): number {
  if (gamma === 0) return vto;
  // Below -phi/2 the tangent goes on.
  const edge = -phi / 2;
  const root = vsb >= edge ? Math.sqrt(phi + vsb) : Math.sqrt(phi / 2) + (vsb - edge) / (2 * Math.sqrt(phi / 2));
  return vto + gamma * (root - Math.sqrt(phi));
}

function thresholdSlope({ gamma, phi }: Hot, vsb: number): number {
  return gamma / (2 * Math.sqrt(Math.max(phi + vsb, phi / 2)));
}

/** What a channel between its inner terminals does; n-channel frame, V_DS of either sign. */
export interface ChannelState {
  readonly current: number;
  readonly gm: number;
  readonly gds: number;
  readonly gmb: number;
  readonly vov: number;
  readonly vds: number;
  readonly margin: number;
  /** 0 cutoff, 1 ohmic, 2 saturation. */
  readonly region: number;
}

export function channelState(hot: Hot, vgs: number, vds: number, vsb: number): ChannelState {
  if (vds >= 0) return forward(hot, vgs, vds, vsb);
  // Drain and source change places.
  const swapped = forward(hot, vgs - vds, -vds, vsb + vds);
  return {
    ...swapped,
    current: 0 - swapped.current,
    gm: 0 - swapped.gm,
    gds: swapped.gm + swapped.gmb + swapped.gds,
    gmb: 0 - swapped.gmb,
  };
}

function forward(hot: Hot, vgs: number, vds: number, vsb: number): ChannelState {
  const { beta, lambda } = hot;
  const vov = vgs - threshold(hot, vsb);
  const stretch = 1 + lambda * vds;
  const state = (region: number, margin: number, current: number, gm: number, gds: number): ChannelState => ({
    current,
    gm,
    gds,
    gmb: gm * thresholdSlope(hot, vsb),
    vov,
    vds,
    margin,
    region,
  });
  if (vov <= 0) return state(0, vov, 0, 0, 0);
  if (vds >= vov) {
    const bare = beta * vov * vov;
    return state(2, vds - vov, bare * stretch, 2 * beta * vov * stretch, bare * lambda);
  }
  const bare = beta * vds * (2 * vov - vds);
  const slope = 2 * beta * (vov - vds) * stretch + bare * lambda;
  return state(1, vds - vov, bare * stretch, 2 * beta * vds * stretch, slope);
}

/** Where a rising function passes 0; `low` below it, `high` above it. */
export function bisect(f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high];
  for (let step = 0; step < 400; step++) {
    const middle = a + (b - a) / 2;
    if (!(middle > a && middle < b)) break;
    if (f(middle) < 0) a = middle;
    else b = middle;
  }
  return Math.abs(f(a)) < Math.abs(f(b)) ? a : b;
}

/** The one root of a rising function, looked for outwards from 0. */
export function risingRoot(f: (x: number) => number, start: number): number {
  const atZero = f(0);
  if (atZero === 0) return 0;
  const sign = atZero < 0 ? 1 : -1;
  let size = start;
  while (sign * f(sign * size) < 0) size *= 2;
  while (sign * f((sign * size) / 2) > 0 && size > 1e-300) size /= 2;
  const [near, far] = [(sign * size) / 2, sign * size];
  return sign > 0 ? bisect(f, near, far) : bisect(f, far, near);
}

const BOLTZMANN = 1.380649e-23;
const CHARGE = 1.602176634e-19;

/** V_GS - V_TO at a small test current: 2 n V_T ln(exp(sqrt(I / I_s)) - 1), I_s = 4 n² beta V_T². */
export function testDrive(current: number, beta: number, n: number, temperature: number): number {
  const vt = (BOLTZMANN * temperature) / CHARGE;
  const x = Math.sqrt(current / (4 * n * n * beta * vt * vt));
  return 2 * n * vt * (x > 30 ? x + Math.log1p(-Math.exp(-x)) : Math.log(Math.expm1(x)));
}

/** The first V_TO from far below towards `top` at which `excess`, negative far below, passes 0; NaN where it never does. */
export function deepestRoot(excess: (vto: number) => number, top: number, depth: number): number {
  const STEPS = 4000;
  for (let k = 0; k < STEPS; k++) {
    const [low, high] = [top - depth * (1 - k / STEPS), top - depth * (1 - (k + 1) / STEPS)];
    if (excess(low) < 0 && excess(high) >= 0) return bisect(excess, low, high);
  }
  return NaN;
}

/** The junction temperature a cold start warms up to; NaN where nothing below 600 K holds it. */
export function balance(ambient: number, rth: number, power: (T: number) => number): number {
  if (rth === 0) return ambient;
  const excess = (T: number): number => T - ambient - rth * power(T);
  const first = excess(ambient);
  if (first === 0) return ambient;
  const STEPS = 256;
  const step = (600 - ambient) / STEPS;
  for (let k = 1; k <= STEPS; k++) {
    const T = ambient + k * step;
    if (excess(T) > 0 === first > 0) continue;
    return first < 0 ? bisect(excess, T - step, T) : bisect((x) => -excess(x), T - step, T);
  }
  return NaN;
}

/** C0 / (1 - V/PB)^M, its tangent beyond PB/2; V forward. */
export function junction(zero: number, volts: number, pb: number, m: number): number {
  if (volts <= pb / 2) return zero / (1 - volts / pb) ** m;
  return zero * 2 ** m * (1 + m * ((volts - pb / 2) / (pb / 2)));
}
