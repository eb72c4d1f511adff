// Kernels down columns against the same kernels sample by sample, to the last bit.

import { expect, test } from 'vitest';
import { KERNELS, POINT_STATUS } from '../../src/network/index.ts';
import type { Kernel } from '../../src/network/index.ts';
import { createLaneMemory } from '../../src/program/accelerator.ts';
import { PROGRAM_KERNELS } from '../../src/program/index.ts';
import { createDraw } from '../support/counter-random.ts';

const SPECIAL = [0, -0, 1, -1, NaN, Infinity, -Infinity, 1e-300, -1e300];

/** What a kernel is given: the usual size of each input, by name, and its sign. */
const USUAL: Readonly<Record<string, readonly [low: number, high: number]>> = {
  beta: [1e-4, 1e-1],
  lambda: [0, 0.1],
  V_TO: [-4, 4],
  V_GG: [-10, 10],
  V_L: [-20, 20],
  R_m: [0, 1e4],
  R_L: [0, 1e4],
  r_s: [0, 50],
  r_d: [0, 50],
  beta_exponent: [-2, 0],
  tempco: [-3e-3, 0],
  T_nom: [297, 299],
  T: [220, 420],
  doubling: [8, 12],
  C_GS: [1e-12, 1e-9],
  C_GD: [1e-12, 1e-9],
  PB: [0.5, 1],
  M: [0.3, 0.5],
  V_SB0: [0, 2],
  R_b: [0, 1e4],
  phi: [0.6, 0.9],
  I_GSS: [0, 1e-8],
  q_gs: [-1e6, 1e6],
  q_ds: [-1e4, 1e4],
  q_sb: [-1e4, 1e4],
  T_A: [230, 380],
  R_thJA: [0, 600],
  V_GS: [-5, 1],
  V_DS: [-5, 20],
};

type Form = (all: Float64Array, places: Int32Array, at: number, count: number) => void;

/** Gives a kernel many samples in one of its forms, compares what it leaves with that of single samples, and answers with it. */
function compareForm(kernel: Kernel, form: Form, seed: number): Float64Array[] {
  const draw = createDraw(seed);
  const width = kernel.inputs.length + kernel.outputs.length;
  const count = 700;
  const stride = count + 24;
  const all = new Float64Array(width * stride);
  kernel.inputs.forEach((name, k) => {
    const [low, high] = USUAL[name] ?? [-2, 2];
    const isZero = name === kernel.zeroInLanes || draw() < 0.05;
    const same = isZero ? 0 : draw() < 0.2 ? low + (high - low) * draw() : NaN;
    for (let i = 0; i < count; i++) {
      const usual = name === 'channel' ? (draw() < 0.5 ? 1 : -1) : same === same ? same : low + (high - low) * draw();
      all[k * stride + i] =
        name !== kernel.zeroInLanes && draw() < 0.01 ? SPECIAL[Math.floor(draw() * SPECIAL.length)]! : usual;
    }
  });
  const places = Int32Array.from({ length: width + 2 }, (_, n) => (n - 2) * stride);
  form(all, places, 2, count);
  const slots = new Float64Array(width);
  const args = Int32Array.from({ length: width }, (_, n) => n);
  for (let i = 0; i < count; i++) {
    for (let k = 0; k < width; k++) slots[k] = k < kernel.inputs.length ? all[k * stride + i]! : 0;
    kernel.run(slots, args, 0);
    kernel.outputs.forEach((name, n) => {
      const k = kernel.inputs.length + n;
      if (!Object.is(all[k * stride + i], slots[k])) {
        throw new Error(`${name} of sample ${i} is ${all[k * stride + i]}, not ${slots[k]} (seed ${seed})`);
      }
    });
  }
  return kernel.outputs.map((_, n) => all.slice((kernel.inputs.length + n) * stride).subarray(0, count));
}

/** Runs the lanes of a kernel on columns of their own memory. */
function lanesOf(name: string, width: number): Form {
  const index = PROGRAM_KERNELS.findIndex((kernel) => kernel.name === name);
  const memory = createLaneMemory(PROGRAM_KERNELS, width * 724)!;
  return (all, places, at, count) => {
    memory.all.set(all, memory.free);
    const addresses = Array.from({ length: width }, (_, n) => 8 * (memory.free + places[at + n]!));
    memory.kernels[index]!(...addresses, count);
    all.set(memory.all.subarray(memory.free, memory.free + all.length));
  };
}

const kernels = Object.entries<Kernel>(KERNELS);
const forms = [
  ...kernels.flatMap(([name, kernel]) =>
    kernel.columns ? [[name, 'down columns', kernel, kernel.columns] as const] : [],
  ),
  ...kernels.flatMap(([name, kernel]) =>
    kernel.lanes
      ? [[name, 'in lanes', kernel, lanesOf(name, kernel.inputs.length + kernel.outputs.length)] as const]
      : [],
  ),
];

test('the operating point on its lines has both forms', () => {
  expect(forms.filter(([name]) => name === 'line-point').length).toBe(2);
});

test.each(forms)('%s %s leaves what it leaves sample by sample', (_name, _form, kernel, form) => {
  for (let seed = 0; seed < 60; seed++) expect(compareForm(kernel, form, seed).length).toBe(kernel.outputs.length);
});

test('lanes meet every way in which heat can end: one root, several, none, and what is no number', () => {
  const kernel: Kernel = KERNELS['general-point'];
  const form = lanesOf('general-point', kernel.inputs.length + kernel.outputs.length);
  const [status, roots] = ['status', 'thermal_roots'].map((name) => kernel.outputs.indexOf(name));
  const ends = new Map<string, number>();
  for (let seed = 0; seed < 60; seed++) {
    const results = compareForm(kernel, form, seed);
    results[status!]!.forEach((code, i) => {
      const end = `${POINT_STATUS[code]} ${results[roots!]![i]}`;
      ends.set(end, (ends.get(end) ?? 0) + 1);
    });
  }
  for (const end of ['solved 1', 'solved 2', 'solved 3', 'thermal runaway NaN', 'not a number NaN']) {
    expect(ends.get(end), end).toBeGreaterThan(10);
  }
});
