// Extremes over the declared set: cases that are known in closed form, and a brute force over a dense grid that reads the
// sheet build by build and judges membership by formulas of its own.

import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { SpreadModel } from '../../src/sheet/index.ts';
import { searchExtremes, slotsAt } from '../../src/spread/index.ts';
import type { Extremes } from '../../src/spread/index.ts';

/** The extremes of some values of a sheet, by path. */
function extremesOf(text: string, paths: readonly string[]): { model: SpreadModel; of: (path: string) => Extremes } {
  const model = createSheet(text).spreadModel();
  const wanted = paths.map((path) => model.values.find((value) => value.path === path)!.slot);
  const search = searchExtremes(model, wanted);
  return { model, of: (path) => search.of(paths.indexOf(path)) };
}

/** How far a number is from another, as a share of it. */
const off = (x: number, y: number): number => Math.abs(x - y) / Math.max(Math.abs(y), 1e-300);

describe('closed forms', () => {
  test('a divider stands at the corners of its resistors', () => {
    const { of } = extremesOf(
      'V_1 = 10 V ± 5 %\nR_1 = 20 kohm ± 1 %\nR_2 = 10 kohm ± 2 %\nV_x = V_1 * R_2 / (R_1 + R_2)',
      ['V_x'],
    );
    expect(off(of('V_x').low.value, (9.5 * 9.8) / (20.2 + 9.8))).toBeLessThan(1e-14);
    expect(off(of('V_x').high.value, (10.5 * 10.2) / (19.8 + 10.2))).toBeLessThan(1e-14);
  });

  test('a turning point between the ends is found', () => {
    const { of } = extremesOf('R_i = 1 kohm\nR_L = 1 kohm in 100 ohm .. 10 kohm\nP = (1 V)^2 * R_L / (R_i + R_L)^2', [
      'P',
    ]);
    expect(off(of('P').high.value, 0.25e-3)).toBeLessThan(1e-12);
    expect(off(of('P').low.value, (1 * 10e3) / 11e3 ** 2)).toBeLessThan(1e-12);
  });

  test('a kink between the ends is found', () => {
    const { of } = extremesOf('x = 2 V in 0 V .. 5 V\ny = abs(x - 3.3 V)', ['y']);
    expect(of('y').low.value).toBeLessThan(1e-9);
    expect(off(of('y').high.value, 3.3)).toBeLessThan(1e-14);
  });

  test('the greatest heat of a FET on a load resistor is that of half the supply', () => {
    const { of } = extremesOf(
      `V_DD = 12 V
R_D = 1 kohm
V_G = 3 V in 2 V .. 6 V
Q1 = n-MOSFET
  V_TO: 2 V
  K: 4 mA/V^2
A1 = stage of Q1
  gate: to V_G
  drain: R_D to V_DD
  source: to 0 V`,
      ['A1.P_D'],
    );
    expect(off(of('A1.P_D').high.value, 36e-3)).toBeLessThan(1e-9);
    expect(of('A1.P_D').low.value).toBe(0);
  });

  test('a choice is the same in every build', () => {
    const { of } = extremesOf('R_x = 1 kohm ± 20 %\nR_E = E24(R_x)\nR_y = E24(R_x) ± 1 %\nR_n = nominal(R_x)', [
      'R_E',
      'R_y',
      'R_n',
    ]);
    expect(of('R_E').low.value).toBe(1000);
    expect(of('R_E').high.value).toBe(1000);
    expect(off(of('R_y').high.value, 1010)).toBeLessThan(1e-14);
    expect(of('R_n').high.value).toBe(1000);
  });

  test('another piece has ends of its own', () => {
    const { of } = extremesOf('R_a = 1 kohm ± 1 %\nR_b = another R_a\nx = R_a / R_b\ny = R_a / R_a', ['x', 'y']);
    expect(off(of('x').high.value, 1.01 / 0.99)).toBeLessThan(1e-14);
    expect(of('y').high.value).toBe(1);
  });

  test('a row of limits that is not needed to compute cuts the declared set', () => {
    // g_fs0 = 2 I_DSS / |V_P| within 2 mS .. 4 mS, so the largest I_DSS at |V_P| = 1 V is 2 mA.
    const part = 'Q1 = n-JFET\n  I_DSS: 4 mA in 1 mA .. 9 mA\n  V_P: -2 V in -4 V .. -1 V\n';
    const cut = `${part}  g_fs0: 2 mS .. 4 mS\n`;
    const value = 'x = Q1.I_DSS / Q1.V_P^2';
    expect(off(extremesOf(part + value, ['x']).of('x').high.value, 9e-3)).toBeLessThan(1e-12);
    expect(off(extremesOf(cut + value, ['x']).of('x').high.value, 2e-3)).toBeLessThan(1e-9);
    expect(off(extremesOf(cut + value, ['x']).of('x').low.value, 4e-3 / 16)).toBeLessThan(1e-9);
  });

  test('lock-step leaves the diagonal alone, and no more than that', () => {
    const part = (t: string): string =>
      `Q1 = n-JFET\n  I_DSS: 5 mA in 1 mA .. 9 mA\n  V_P: -2.5 V in -4 V .. -1 V\n${t}x = Q1.I_DSS / abs(Q1.V_P)`;
    expect(off(extremesOf(part(''), ['x']).of('x').high.value, 9e-3)).toBeLessThan(1e-12);
    // On the diagonal I_DSS = 1 + 8 u and |V_P| = 1 + 3 u, and the ratio rises with u.
    const locked = extremesOf(part('  tracking: 1\n'), ['x']).of('x');
    expect(off(locked.high.value, 9e-3 / 4)).toBeLessThan(1e-9);
    expect(off(locked.low.value, 1e-3)).toBeLessThan(1e-9);
    // |u - v| <= 0.25: the largest ratio stands at u = 0, v = 0.25 or at v = 1, u = 0.75.
    const half = extremesOf(part('  tracking: 0.75\n'), ['x']).of('x');
    expect(off(half.high.value, Math.max(3e-3 / 1, 9e-3 / 3.25))).toBeLessThan(1e-9);
  });
});

describe('published examples with a least and a largest device', () => {
  // A. Malvino and D. Bates, Electronic Principles, Ex. 13-7 (FOSSEE companion notebook): the bias line of 270 ohm through the
  // transfer curves of a 2N5486 of 8 mA, -2 V and one of 20 mA, -6 V; the graph reads 2.8 mA and 8.0 mA.
  test('self bias: the two crossings of the bias line are the ends of I_D and of V_GS', () => {
    const { of } = extremesOf(
      `Q1 = n-JFET
  I_DSS: 8 mA .. 20 mA
  V_P: -6 V .. -2 V
A1 = stage of Q1
  gate: to 0 V
  drain: to 30 V
  source: 270 ohm to 0 V`,
      ['A1.I_D', 'A1.V_GS'],
    );
    expect(off(of('A1.I_D').low.value, 2.926912e-3)).toBeLessThan(1e-6);
    expect(off(of('A1.I_D').high.value, 8.08937e-3)).toBeLessThan(1e-6);
    expect(off(of('A1.V_GS').high.value, -0.7902662)).toBeLessThan(1e-6);
    expect(off(of('A1.V_GS').low.value, -2.18413)).toBeLessThan(1e-6);
  });

  // Y. N. Bapat, Electronics Circuits and Systems, Examples 4.9 and 4.10: two devices in a four-resistor stage. With V_T and K
  // going up together the ends of the current are those two devices.
  test('four resistors: two devices that go up together', () => {
    const { of } = extremesOf(
      `Q1 = n-MOSFET
  V_TO: 2 V .. 3 V
  K: 0.25 mA/V^2 .. 0.375 mA/V^2
  tracking: 1
A1 = stage of Q1
  gate: 12 Mohm to 24 V, 8.57 Mohm to 0 V
  drain: 12 kohm to 24 V
  source: 6 kohm to 0 V`,
      ['A1.I_D', 'A1.V_GS'],
    );
    expect(off(of('A1.I_D').high.value, 0.9998611e-3)).toBeLessThan(1e-6);
    expect(off(of('A1.I_D').low.value, 0.9072656e-3)).toBeLessThan(1e-6);
    expect(off(of('A1.V_GS').low.value, 3.999861)).toBeLessThan(1e-6);
    expect(off(of('A1.V_GS').high.value, 4.555434)).toBeLessThan(1e-6);
  });
});

/** A sheet, the draws that are turned on the grid, and which specimens belong to it. */
interface Forced {
  readonly name: string;
  readonly text: string;
  readonly paths: readonly string[];
  readonly steps: number;
  /** By draw name, SI values. */
  readonly belongs: (values: Readonly<Record<string, number>>) => boolean;
}

const FORCED: readonly Forced[] = [
  {
    name: 'a JFET stage whose g_fs cuts the set',
    text: `V_DD = 15 V ± 10 %
R_S = 1 kohm ± 5 %
Q1 = n-JFET
  I_DSS: 2 mA .. 9 mA
  V_P: -4 V .. -1 V
  g_fs0: 2.5 mS .. 6 mS
  lambda: 0.01 /V
A1 = stage of Q1
  gate: to 0 V
  drain: 2.2 kohm to V_DD
  source: R_S to 0 V`,
    paths: ['A1.I_D', 'A1.margin', 'A1.g_m', 'A1.V_GS'],
    steps: 17,
    belongs: (v) => {
      const slope = (2 * v['Q1.I_DSS']!) / Math.abs(v['Q1.V_P']!);
      return slope >= 2.5e-3 && slope <= 6e-3;
    },
  },
  {
    name: 'a MOSFET switch whose R_DSon is bounded on one side, and whose heat turns',
    text: `V_G = 5 V ± 20 %
R_L = 10 ohm ± 30 %
Q1 = n-MOSFET
  V_TO: 2 V in 1 V .. 3 V
  K: 0.2 A/V^2 in 0.05 A/V^2 .. 0.4 A/V^2
  R_DSon: .. 2 ohm at V_GS = 4.5 V
A1 = stage of Q1
  gate: to V_G
  drain: R_L to 12 V
  source: to 0 V`,
    paths: ['A1.I_D', 'A1.V_DS', 'A1.P_D'],
    steps: 17,
    belongs: (v) => 1 / (2 * v['Q1.K']! * (4.5 - v['Q1.V_TO']!)) <= 2,
  },
  {
    name: 'a p-channel JFET whose draws go together',
    text: `R_S = 1.5 kohm ± 10 %
T_A = 25 degC in 0 degC .. 60 degC
Q1 = p-JFET
  I_DSS: 1 mA .. 5 mA
  V_P: 0.8 V .. 3 V
  tracking: 0.7
A1 = stage of Q1
  gate: to 0 V
  drain: 2 kohm to -20 V
  source: R_S to 0 V`,
    paths: ['A1.I_D', 'A1.V_GS', 'A1.margin'],
    steps: 17,
    belongs: (v) => {
      const quantile = (x: number, low: number, middle: number, high: number): number =>
        x < middle ? (x - low) / (2 * (middle - low)) : 0.5 + (x - middle) / (2 * (high - middle));
      const u = quantile(v['Q1.V_P']!, 0.8, Math.sqrt(0.8 * 3), 3);
      const w = quantile(v['Q1.I_DSS']!, 1e-3, Math.sqrt(5) * 1e-3, 5e-3);
      return Math.abs(u - w) <= 0.3 + 1e-9;
    },
  },
];

describe('brute force', () => {
  test.each(FORCED)(
    '$name: no build of the grid beats an extreme, and each extreme is a build',
    (forced) => {
      const sheet = createSheet(forced.text);
      const { model, of } = extremesOf(forced.text, forced.paths);
      const read = (t: Float64Array): { values: number[]; belongs: boolean } => {
        const slots = slotsAt(model, t);
        const view = sheet.standing(slots);
        const named = Object.fromEntries(model.drawn.map(({ name, slot }) => [name, slots.get(slot)!]));
        return { values: forced.paths.map((path) => view.value(path) as number), belongs: forced.belongs(named) };
      };
      const n = model.drawn.length;
      const best = forced.paths.map(() => [Infinity, -Infinity] as [number, number]);
      // Two draws of the part on the fine grid, the others at their ends and nominals.
      const fine = model.drawn.map(({ cell }) => cell === 'Q1');
      const places = (k: number): number[] =>
        fine[k] ? Array.from({ length: forced.steps }, (_, i) => -1 + (2 * i) / (forced.steps - 1)) : [-1, 0, 1];
      const walk = (k: number, t: Float64Array): void => {
        if (k < n) {
          for (const place of places(k)) walk(k + 1, t.with(k, place));
          return;
        }
        const { values, belongs } = read(t);
        if (!belongs) return;
        values.forEach((value, i) => {
          best[i]![0] = Math.min(best[i]![0], value);
          best[i]![1] = Math.max(best[i]![1], value);
        });
      };
      walk(0, new Float64Array(n));
      forced.paths.forEach((path, i) => {
        const { low, high, unsolved } = of(path);
        expect(unsolved).toBeNull();
        const scale = 1e-9 * Math.max(Math.abs(low.value), Math.abs(high.value));
        expect(low.value).toBeLessThanOrEqual(best[i]![0] + scale);
        expect(high.value).toBeGreaterThanOrEqual(best[i]![1] - scale);
        // The grid comes near: a fabricated extreme would lie far beyond it.
        const range = best[i]![1] - best[i]![0];
        expect(best[i]![0] - low.value).toBeLessThan(0.1 * range);
        expect(high.value - best[i]![1]).toBeLessThan(0.1 * range);
        for (const end of [low, high]) {
          const there = read(end.position);
          expect(off(there.values[i]!, end.value)).toBeLessThan(1e-12);
          expect(there.belongs || isOnBorder(forced, model, end.position)).toBe(true);
        }
      });
    },
    60_000,
  );
});

/** Whether a step of a hundred-millionth towards the nominal belongs to the set: what stands on its border may round out of it. */
function isOnBorder(forced: Forced, model: SpreadModel, position: Float64Array): boolean {
  return [1 - 1e-8, 1 + 1e-8].some((share) => {
    const values = slotsAt(
      model,
      position.map((t) => Math.max(-1, Math.min(1, t * share))),
    );
    return forced.belongs(Object.fromEntries(model.drawn.map(({ name, slot }) => [name, values.get(slot)!])));
  });
}
