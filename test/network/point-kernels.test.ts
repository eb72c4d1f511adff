import { describe, expect, it } from 'vitest';
import { currentPoint } from '../../src/network/current-point.ts';
import { generalPoint } from '../../src/network/general-point.ts';
import { THERMAL_CEILING } from '../../src/network/thermal-balance.ts';
import { POINT_STATUS } from '../../src/network/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { runKernel } from '../support/run-kernel.ts';
import { lowerText } from '../support/stage-text.ts';
import type { StageSetup } from '../support/stage-text.ts';

const ROOM = 298.15;
const base = {
  channel: 1, beta: 1e-3, V_TO: 1, lambda: 0.01, V_GG: 5, R_m: 0, V_L: 10, R_L: 0, V_SB0: 0, R_b: 0, r_s: 0, r_d: 0,
  gamma: 0, phi: 0.6, I_GSS: 0, doubling: 10, q_gs: 0, q_ds: 0, q_sb: 0, beta_exponent: -1.5, tempco: -2e-3,
  T_nom: ROOM, T_A: ROOM, R_thJA: 0,
}; // prettier-ignore

describe('the general-point kernel', () => {
  it('raises the threshold by the body effect that its own current makes', () => {
    const point = runKernel(generalPoint, { ...base, gamma: 0.5, R_m: 1e3, R_L: 2e3, R_b: 1e3 });
    const vt = 1 + 0.5 * (Math.sqrt(0.6 + 1e3 * point.I_D) - Math.sqrt(0.6));
    expect(point.V_SB).toBeCloseTo(1e3 * point.I_D, 12);
    expect(point.V_ov).toBeCloseTo(5 - 1e3 * point.I_D - vt, 11);
    expect(point.I_D).toBeCloseTo(1e-3 * point.V_ov ** 2 * (1 + 0.01 * point.V_DS), 14);
    expect(point.g_mb).toBeCloseTo((point.g_m * 0.5) / (2 * Math.sqrt(0.6 + point.V_SB)), 14);
  });

  it('has slopes at its terminals that are those of finite differences, forward and reversed, with leads and body', () => {
    const draw = createDraw(8);
    for (let n = 0; n < 200; n++) {
      const given = {
        ...base,
        gamma: draw(),
        r_s: 20 * draw(),
        r_d: 20 * draw(),
        V_GG: 2 + 4 * draw(),
        V_L: -3 + 12 * draw(),
        V_SB0: 3 + draw(),
      };
      const at = (change: Record<string, number>): number => runKernel(generalPoint, { ...given, ...change }).I_D;
      const point = runKernel(generalPoint, given);
      const h = 1e-5;
      const slope = (name: 'V_GG' | 'V_L' | 'V_SB0'): number =>
        (at({ [name]: given[name] + h }) - at({ [name]: given[name] - h })) / (2 * h);
      expect(point.g_m, `case ${n}`).toBeCloseTo(slope('V_GG'), 7);
      expect(point.g_ds, `case ${n}`).toBeCloseTo(slope('V_L'), 7);
      expect(-point.g_mb, `case ${n}`).toBeCloseTo(slope('V_SB0'), 7);
    }
  });

  it('settles at the temperature of its own heat', () => {
    const point = runKernel(generalPoint, { ...base, R_m: 200, R_L: 500, R_thJA: 300 });
    expect(point.T_J).toBeCloseTo(ROOM + 300 * point.V_DS * point.I_D, 9);
    expect(point.beta).toBeCloseTo(1e-3 * (point.T_J / ROOM) ** -1.5, 15);
    expect(point.V_TO).toBeCloseTo(1 - 2e-3 * (point.T_J - ROOM), 12);
  });

  it('takes the first of several thermal roots, the one that a cold start reaches', () => {
    // A threshold that falls fast with heat at constant V_DS: two balances, the upper one unstable.
    const given = { ...base, V_GG: 1.1, tempco: -4e-3, beta_exponent: 0, beta: 0.02, lambda: 0, R_thJA: 1000 };
    const heated = (T: number): number => ROOM + 1000 * 10 * 0.02 * (1.1 - 1 + 4e-3 * (T - ROOM)) ** 2;
    const point = runKernel(generalPoint, given);
    expect(point.status).toBe(0);
    expect(point.thermal_roots).toBe(2);
    expect(point.T_J).toBeCloseTo(heated(point.T_J), 9);
    expect(point.T_J).toBeLessThan(ROOM + 5);
  });

  it('says that a FET runs away, and gives no number beside it', () => {
    const point = runKernel(generalPoint, {
      ...base,
      V_GG: 3,
      tempco: -6e-3,
      beta_exponent: 0,
      beta: 0.05,
      R_thJA: 300,
    });
    expect(POINT_STATUS[point.status]).toBe('thermal runaway');
    expect(point.I_D).toBeNaN();
    expect(point.T_J).toBeNaN();
    expect(THERMAL_CEILING).toBe(600);
  });

  it('doubles the leakage for every 10 K of the junction and moves the gate by it', () => {
    const point = runKernel(generalPoint, { ...base, I_GSS: 1e-9, q_gs: 1e6, T_A: ROOM + 20, V_GG: 2 });
    expect(point.I_G).toBeCloseTo(4e-9, 20);
    expect(point.V_GS).toBeCloseTo(2.004, 12);
  });
});

describe('the current-point kernel', () => {
  it('finds the gate voltage at which the general kernel gives that current back', () => {
    const draw = createDraw(9);
    for (let n = 0; n < 300; n++) {
      const device = {
        ...base,
        channel: draw() < 0.5 ? 1 : -1,
        gamma: draw(),
        r_s: 20 * draw(),
        r_d: 20 * draw(),
        R_thJA: 200 * draw(),
      };
      const sign = device.channel * (draw() < 0.2 ? -1 : 1);
      const held = {
        V_DS: sign * (1 + 9 * draw()),
        V_SB: device.channel * (12 + draw()),
        I_D: sign * device.channel * 5e-3 * draw(),
      };
      const point = runKernel(currentPoint, { ...device, ...held });
      expect(point.status, `case ${n}`).toBe(0);
      const back = runKernel(generalPoint, { ...device, V_GG: point.V_GS, V_L: held.V_DS, V_SB0: held.V_SB });
      for (const name of ['I_D', 'V_ov', 'g_m', 'g_ds', 'g_mb', 'T_J', 'margin', 'region']) {
        expect(Math.abs(back[name] - point[name]), `${name} of case ${n}`).toBeLessThan(
          1e-8 * Math.abs(point[name]) + 1e-12,
        );
      }
    }
  });

  it('says that a current against V_DS cannot be carried', () => {
    const point = runKernel(currentPoint, { ...base, I_D: -1e-3, V_DS: 5, V_SB: 0 });
    expect(point.status).toBe(1);
    expect(point.V_GS).toBeNaN();
  });
});

describe('a forced current', () => {
  const follower: StageSetup = {
    device: { beta: 1e-3, V_TO: -2 },
    lines: ['gate: 1e6 to 0 V', 'drain: to 15 V', 'source: 1e-3 A to 0 V'],
  };

  it('sets V_GS of a source follower', () => {
    const stage = lowerText(follower);
    expect(stage.lowering.path).toBe('forced');
    expect(stage.value('V_GS')).toBe(-1);
    expect(stage.value('V_source')).toBe(1);
    expect(stage.value('P_total')).toBeCloseTo(15e-3, 15);
  });

  it('sets V_DS of a FET whose drain a current source feeds', () => {
    const stage = lowerText({
      device: { beta: 1e-3, V_TO: -2, lambda: 0.02 },
      lines: ['gate: 1e6 to 0 V', 'drain: 4.4e-3 A from 15 V', 'source: to 0 V'],
    });
    // 4 mA (1 + 0.02 V_DS) = 4.4 mA.
    expect(stage.value('V_DS')).toBeCloseTo(5, 10);
    expect(stage.value('V_drain')).toBeCloseTo(5, 10);
  });

  it('flows through a gate tied to its own source by a resistor', () => {
    const stage = lowerText({
      device: { beta: 1e-3, V_TO: -2, lambda: 0.02 },
      lines: ['gate: 1e6 to source', 'drain: 100 to 15 V', 'source: 4.2e-3 A to 0 V'],
    });
    expect(stage.value('V_GS')).toBe(0);
    expect(stage.value('V_DS')).toBeCloseTo(2.5, 10);
    expect(stage.value('V_source')).toBeCloseTo(15 - 0.42 - 2.5, 10);
  });

  it('agrees with a resistor so large that it is as good as a current source, with body effect, leads and heat', () => {
    const device = {
      beta: 1e-3,
      V_TO: 1,
      lambda: 0.02,
      gamma: 0.6,
      r_s: 10,
      r_d: 15,
      R_thJA: 200,
      tempco: -2e-3,
      beta_exponent: -1.5,
    };
    const lines = ['gate: 1e5 to 5 V', 'drain: 1e3 to 15 V', 'bulk: to -3 V'];
    const ideal = lowerText({ family: 'MOSFET', device, lines: [...lines, 'source: 1e-3 A to 0 V'] });
    const nearly = lowerText({ family: 'MOSFET', device, lines: [...lines, 'source: 1e9 to -1e6 V'] });
    for (const name of ['I_D', 'V_GS', 'V_DS', 'V_SB', 'g_m', 'g_ds', 'g_mb', 'T_J', 'V_drain', 'V_source']) {
      expect(nearly.value(name) / ideal.value(name), name).toBeCloseTo(1, 5);
    }
  });

  it('that the channel cannot carry is said so', () => {
    const stage = lowerText({ ...follower, lines: ['gate: 1e6 to source', 'drain: to 15 V', 'source: 5e-3 A to 0 V'] });
    expect(POINT_STATUS[stage.status]).toBe('cannot carry it');
    expect(stage.value('V_DS')).toBeNaN();
  });

  it('of 0 A leaves the voltage open', () => {
    const stage = lowerText({ ...follower, lines: ['gate: 1e6 to 0 V', 'drain: to 15 V', 'source: 0 A to 0 V'] });
    expect(POINT_STATUS[stage.status]).toBe('left open');
  });
});
