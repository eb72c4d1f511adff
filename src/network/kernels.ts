// The table of kernels by the name under which an emitted program calls them.

import { jfetCapacitances, mosfetCapacitances } from './capacitances.ts';
import { deviceAtTemperature, gateLeakage } from './device-temperature.ts';
import { forcedPoint } from './forced-point.ts';
import { generalPoint } from './general-point.ts';
import type { Kernel } from './kernel.ts';
import { linePoint } from './line-point.ts';
import { ratio } from './ratio.ts';
import { currentPoint } from './current-point.ts';
import { swing } from './swing.ts';

/** Every kernel of this folder. */
export const KERNELS = {
  'device-at-temperature': deviceAtTemperature,
  'gate-leakage': gateLeakage,
  'line-point': linePoint,
  'general-point': generalPoint,
  'forced-point': forcedPoint,
  'current-point': currentPoint,
  'jfet-capacitances': jfetCapacitances,
  'mosfet-capacitances': mosfetCapacitances,
  ratio,
  swing,
} as const satisfies Record<string, Kernel>;

export type KernelName = keyof typeof KERNELS;
