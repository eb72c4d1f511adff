import { describe, expect, it } from 'vitest';
import { linePoint } from '../../src/network/line-point.ts';
import { judgeRandomLines, judgeSpecialLines } from '../support/line-oracle.ts';
import { runKernel } from '../support/run-kernel.ts';

const base = { channel: 1, beta: 1e-3, V_TO: -2, lambda: 0, V_GG: 0, R_m: 0, V_L: 15, R_L: 0, r_s: 0, r_d: 0 };

describe('the line solve', () => {
  it('is right to 1e-12 in the current on 100 000 random extremes', () => {
    expect(judgeRandomLines(20, 100_000)).toEqual([]);
  });

  it('is right on every combination of special values', { timeout: 60_000 }, () => {
    const { faults, count } = judgeSpecialLines();
    expect(count).toBeGreaterThan(284_310);
    expect(faults).toEqual([]);
  });
});

describe('the line-point kernel', () => {
  it('gives the textbook point of a self-biased JFET', () => {
    // I = 1 mA/V² (2 V - 1 kohm I)²: the root below 2 mA is 1 mA.
    const point = runKernel(linePoint, { ...base, R_m: 1e3, R_L: 3e3 });
    expect(point.status).toBe(0);
    expect(point.I_D).toBeCloseTo(1e-3, 15);
    expect(point.V_GS).toBeCloseTo(-1, 12);
    expect(point.V_DS).toBeCloseTo(12, 12);
    expect(point.region).toBe(2);
    expect(point.g_m).toBeCloseTo(2e-3, 14);
  });

  it('mirrors a p-channel FET to the last bit', () => {
    const given = { ...base, lambda: 0.02, V_GG: 0.7, R_m: 470, R_L: 2670, r_s: 12, r_d: 7 };
    for (const V_L of [15, 1, -3]) {
      const n = runKernel(linePoint, { ...given, V_L });
      const p = runKernel(linePoint, { ...given, channel: -1, V_GG: -0.7, V_L: -V_L });
      expect(p).toEqual({ ...n, V_GS: 0 - n.V_GS, V_DS: 0 - n.V_DS });
    }
  });

  it('swaps drain and source where V_DS is negative', () => {
    const point = runKernel(linePoint, { ...base, V_L: -1, R_m: 0, R_L: 0 });
    // V_GD = 1 V, so V_ov = 3 V at the acting source, V_SD = 1 V: ohmic.
    expect(point.I_D).toBeCloseTo(-1e-3 * 1 * (2 * 3 - 1), 15);
    expect(point.region).toBe(1);
    expect(point.V_ov).toBe(3);
    expect(point.V_DS).toBe(-1);
    expect(point.margin).toBe(-2);
  });

  it('keeps r_s and r_d inside: terminal voltages and slopes are those at the leads', () => {
    const given = { ...base, lambda: 0.01, V_GG: 0.5, V_L: 10, r_s: 50, r_d: 80 };
    const at = (V_GG: number, V_L: number): number => runKernel(linePoint, { ...given, V_GG, V_L }).I_D;
    const point = runKernel(linePoint, given);
    expect(point.V_GS).toBe(0.5);
    expect(point.V_DS).toBeCloseTo(10, 12);
    expect(point.g_m).toBeCloseTo((at(0.5001, 10) - at(0.4999, 10)) / 2e-4, 9);
    expect(point.g_ds).toBeCloseTo((at(0.5, 10.001) - at(0.5, 9.999)) / 2e-3, 9);
  });

  it('gives no number beside a status when an input is no number', () => {
    for (const wrong of [{ beta: 0 }, { beta: -1 }, { V_L: NaN }, { R_L: Infinity }, { lambda: -0.1 }, { R_L: -1 }]) {
      const point = runKernel(linePoint, { ...base, ...wrong });
      expect(point.status).toBe(3);
      expect(point.I_D).toBeNaN();
    }
  });

  it('has margin above zero in saturation and nowhere else', () => {
    for (const V_L of [0, 0.5, 1.9, 2, 2.1, 20]) {
      for (const V_GG of [-3, -2, -1, 0]) {
        const point = runKernel(linePoint, { ...base, V_GG, V_L, R_L: 100 });
        expect(point.margin * (point.region === 2 ? 1 : -1)).toBeGreaterThanOrEqual(0);
        expect(point.region === 0 ? point.V_ov : point.margin).toBe(point.margin);
      }
    }
  });
});
