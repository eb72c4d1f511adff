// The kernels a sheet may call: those of the FETs and stages, and the few of the language itself.

import { junctionRatio } from '../fet/index.ts';
import { SERIES, preferredValue } from '../quantity/index.ts';
import type { PreferredDirection, SeriesName } from '../quantity/index.ts';
import { PROGRAM_KERNELS } from '../program/index.ts';
import type { Kernel, KernelTable } from '../program/index.ts';

const DIRECTIONS: readonly PreferredDirection[] = ['nearest', 'up', 'down'];

/** The kernel that answers with a preferred value. */
export function preferredKernel(series: SeriesName, direction: PreferredDirection): string {
  return `${series} ${direction}`;
}

/** Inputs: condition (1 or 0), a, b. Output: a or b; NaN where the condition is. */
const select: Kernel = (s, a, p) => {
  const condition = s[a[p]!]!;
  s[a[p + 3]!] = condition === 1 ? s[a[p + 1]!]! : condition === 0 ? s[a[p + 2]!]! : NaN;
};

const SELECT_LANES = {
  inputs: ['condition', 'a', 'b'],
  outputs: ['chosen'],
  text: 'chosen = select(condition == 1, a, select(condition == 0, b, NaN))',
};

/** Inputs: x, digits. Output: x rounded to so many significant digits, as the shortest decimal reads. */
const round: Kernel = (s, a, p) => {
  const x = s[a[p]!]!;
  s[a[p + 2]!] = Number.isFinite(x) ? Number(x.toPrecision(s[a[p + 1]!]!)) : x;
};

/** Inputs: capacitance at a forward voltage, that voltage, PB, M. Output: the capacitance at 0 V. */
const zeroBias: Kernel = (s, a, p) => {
  s[a[p + 4]!] = s[a[p]!]! / junctionRatio(s[a[p + 1]!]!, s[a[p + 2]!]!, s[a[p + 3]!]!);
};

function preferred(series: SeriesName, direction: PreferredDirection): Kernel {
  return (s, a, p) => {
    const x = s[a[p]!]!;
    s[a[p + 1]!] = x > 0 && x < Infinity ? preferredValue(series, x, direction) : NaN;
  };
}

/** Input: x. Output: the same, settled once at the nominal values. */
const nominal: Kernel = (s, a, p) => {
  s[a[p + 1]!] = s[a[p]!]!;
};

/** Inputs: what an answer rests on (residual, both ends of the range), the answer as it was put in. Output: that answer. */
const answer: Kernel = (s, a, p) => {
  s[a[p + 4]!] = s[a[p + 3]!]!;
};

/** Every kernel of a sheet's program; a program refers to them by position. */
export const KERNELS: KernelTable = [
  ...PROGRAM_KERNELS,
  { name: 'select', run: select, lanes: SELECT_LANES },
  { name: 'round', run: round },
  { name: 'zero-bias capacitance', run: zeroBias },
  { name: 'answer', run: answer },
  ...choices(),
];

/** Kernels whose result is a choice: settled once, at the nominal values, and the same in every build. */
function choices(): { name: string; run: Kernel }[] {
  const series = (Object.keys(SERIES) as SeriesName[]).flatMap((name) =>
    DIRECTIONS.map((direction) => ({ name: preferredKernel(name, direction), run: preferred(name, direction) })),
  );
  return [{ name: 'nominal', run: nominal }, ...series];
}

const CHOICES: ReadonlySet<string> = new Set(choices().map(({ name }) => name));

/** Whether the kernel at this place of the table makes a choice; it has one output, its last slot. */
export function isChoice(kernel: number): boolean {
  return CHOICES.has(KERNELS[kernel]!.name);
}

/** Whether what this kernel gave stays in another state of the same build: a choice, or an answer. */
export function staysChosen(kernel: number): boolean {
  return isChoice(kernel) || KERNELS[kernel]!.name === 'answer';
}

const keep: Kernel = () => {};

/** The kernels of a build: what was chosen at the nominal values stays. */
export const BUILD_KERNELS: KernelTable = KERNELS.map((kernel, i) => (isChoice(i) ? { ...kernel, run: keep } : kernel));
