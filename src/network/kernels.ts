// The table of kernels by the name under which an emitted program calls them.

import type { Kernel } from './kernel.ts';
import { linePoint } from './line-point.ts';

/** Every kernel of this folder. */
export const KERNELS = {
  'line-point': linePoint,
} as const satisfies Record<string, Kernel>;

export type KernelName = keyof typeof KERNELS;
