// The kernels of FETs and stages, by name.

import { FORMS, LAMBDA_ROUTES, ROUTES } from '../fet/index.ts';
import { KERNELS } from '../network/index.ts';
import type { Kernel } from '../network/index.ts';
import type { KernelTable } from './segment.ts';

/** Every kernel below the sheet language: operating points, and the routes from data-sheet rows to a square law. */
export const PROGRAM_KERNELS: KernelTable = [
  ...Object.entries<Kernel>(KERNELS).map(([name, { run, columns, lanes, inputs, outputs }]) => ({
    name,
    run,
    columns,
    lanes: lanes === undefined ? undefined : { inputs, outputs, text: lanes },
  })),
  ...[...ROUTES, ...LAMBDA_ROUTES, ...Object.values(FORMS)].map(({ id, run }) => ({ name: id, run })),
];
