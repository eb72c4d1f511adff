// Readings of synthetic FETs for the tests: constants and scatter invented, currents by the law of src/fet.

import { channelCurrent } from '../../src/fet/index.ts';
import type { Points } from '../../src/measured/index.ts';
import { drawKey, normalQuantile, uniformAt } from '../../src/numeric/index.ts';

export interface Device {
  readonly channel: 1 | -1;
  readonly beta: number;
  /** As a voltmeter shows it. */
  readonly V_TO: number;
  readonly lambda: number;
}

export const DEVICES: readonly (readonly [string, Device])[] = [
  ['an n-JFET', { channel: 1, beta: 1.3e-3, V_TO: -2.2, lambda: 0.011 }],
  ['a p-JFET', { channel: -1, beta: 0.8e-3, V_TO: 1.7, lambda: 0.02 }],
  ['an n-MOSFET', { channel: 1, beta: 45e-3, V_TO: 1.9, lambda: 0.006 }],
  ['a p-MOSFET', { channel: -1, beta: 12e-3, V_TO: -2.6, lambda: 0.03 }],
  ['a depletion MOSFET', { channel: 1, beta: 6e-3, V_TO: -1.1, lambda: 0.008 }],
  ['without lambda', { channel: 1, beta: 2e-3, V_TO: -1.4, lambda: 0 }],
];

/** Currents of a device at a grid of overdrives and drain voltages (n-channel frame), voltages with the device's signs. */
export function readings(
  { channel, beta, V_TO, lambda }: Device,
  drives: readonly number[],
  volts: readonly number[],
): Points {
  const grid = drives.flatMap((drive) => volts.map((vds) => ({ drive, vds })));
  return {
    V_GS: Float64Array.from(grid, ({ drive }) => V_TO + channel * drive),
    V_DS: Float64Array.from(grid, ({ vds }) => channel * vds),
    I_D: Float64Array.from(grid, ({ drive, vds }) => channelCurrent(beta, lambda, drive, vds)),
  };
}

/** Normal numbers, the same for the same seed. */
export function createNormal(seed: number): () => number {
  const key = drawKey(seed, 'scatter');
  let n = 0;
  return () => normalQuantile(uniformAt(key, n++, 0));
}

/** The same readings with scatter of a standard deviation in A. */
export function scattered(points: Points, sd: number, seed: number): Points {
  const draw = createNormal(seed);
  return { ...points, I_D: points.I_D.map((current) => current + sd * draw()) };
}
