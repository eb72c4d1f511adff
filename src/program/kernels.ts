// The kernels of FETs and stages, by name.

import { FORMS, LAMBDA_ROUTES, ROUTES } from '../fet/index.ts';
import { KERNELS } from '../network/index.ts';
import type { Kernel } from '../network/index.ts';
import type { LaneText } from './lane-language.ts';
import type { KernelTable } from './segment.ts';

/** Every kernel below the sheet language: operating points, and the routes from data-sheet rows to a square law. */
export const PROGRAM_KERNELS: KernelTable = [
  ...Object.entries<Kernel>(KERNELS).map(([name, kernel]) => ({
    name,
    run: kernel.run,
    columns: kernel.columns,
    lanes: lanesOf(kernel),
  })),
  ...[...ROUTES, ...LAMBDA_ROUTES, ...Object.values(FORMS)].map(({ id, run }) => ({ name: id, run })),
];

function lanesOf({ inputs, outputs, lanes, zeroInLanes }: Kernel): LaneText | undefined {
  if (lanes === undefined) return undefined;
  const results = outputs.map((name) => (inputs.includes(name) ? `${name}_out` : name));
  return { inputs, outputs: results, text: lanes, zero: zeroInLanes };
}
