// Random stages held against the plain equations of circuits.

import { describe, expect, it } from 'vitest';
import { createDraw } from '../support/counter-random.ts';
import { currentImbalance, midbandByNodes } from '../support/nodal-oracle.ts';
import { randomStage } from '../support/random-stage.ts';
import { lowerText } from '../support/stage-text.ts';
import type { LoweredStage, StageSetup } from '../support/stage-text.ts';

/** The square law, written again. */
function law(beta: number, lambda: number, vov: number, vds: number): number {
  if (vds < 0) return -law(beta, lambda, vov - vds, -vds);
  if (vov <= 0) return 0;
  return beta * (vds < vov ? vds * (2 * vov - vds) : vov * vov) * (1 + lambda * vds);
}

/** Relative to the larger of the expected value and 1e-4 of its unit. */
function difference(found: number, expected: number): number {
  return Math.abs(found - expected) / Math.max(Math.abs(expected), 1e-4);
}

function solvedStages(seed: number, count: number): { setup: StageSetup; stage: LoweredStage; label: string }[] {
  const draw = createDraw(seed);
  const stages = [];
  for (let n = 0; n < count; n++) {
    const setup = randomStage(draw);
    const stage = lowerText(setup);
    if (stage.status === 0) stages.push({ setup, stage, label: `seed ${seed}, stage ${n}: ${JSON.stringify(setup)}` });
  }
  return stages;
}

describe('a random stage', () => {
  const stages = solvedStages(5, 2000);

  it('is solved in most draws, on every path', () => {
    expect(stages.length).toBeGreaterThan(1500);
    expect(new Set(stages.map(({ stage }) => stage.lowering.path))).toEqual(new Set(['line', 'general']));
  });

  it('balances the currents at every place', () => {
    for (const { stage, label } of stages) {
      const { value, emitter } = stage;
      const imbalance = currentImbalance(stage.net, emitter.value, (p) => value(`V_${p}`), value('I_D'), value('I_G'));
      expect(imbalance, label).toBeLessThan(1e-12);
    }
  });

  it('carries the current that the square law gives at its voltages', () => {
    for (const { setup, stage, label } of stages) {
      const { value } = stage;
      const {
        gamma = 0,
        r_s = 0,
        r_d = 0,
        lambda = 0,
        tempco = 0,
        beta_exponent = 0,
        beta = 0,
        V_TO = 0,
      } = setup.device;
      const [I, T] = [value('I_D'), value('T_J')];
      const vds = value('V_DS') - (r_s + r_d) * I;
      const vsb = value('V_SB') + r_s * I + Math.min(0, vds);
      if (gamma > 0 && vsb < -0.3) continue; // the body diode conducts
      const body = gamma > 0 ? gamma * (Math.sqrt(0.6 + vsb) - Math.sqrt(0.6)) : 0;
      const vto = V_TO + tempco * (T - 298.15) + body;
      const vov = value('V_GS') - r_s * I - vto;
      const at = (dvov: number, dvds: number): number =>
        law(beta * (T / 298.15) ** beta_exponent, lambda, vov + dvov, vds + dvds);
      const expected = at(0, 0);
      // What the last digits of 40 V move it by is no fault.
      const moved = at(2e-14 * 40, 2e-14 * 40) - expected;
      expect(Math.abs(expected - I), label).toBeLessThan(1e-9 * Math.abs(I) + Math.abs(moved) + 1e-18);
      const rth = setup.device.R_thJA ?? 0;
      expect(T, label).toBeCloseTo((setup.ambient ?? 298.15) + rth * value('V_DS') * I, 6);
    }
  });

  it('has the node differences that it says', () => {
    for (const { stage, label } of stages) {
      const { value } = stage;
      expect(value('V_gate') - value('V_source'), label).toBeCloseTo(value('V_GS'), 8);
      expect(value('V_drain') - value('V_source'), label).toBeCloseTo(value('V_DS'), 8);
    }
  });

  it('has the gain and resistances of the plain nodal equations', () => {
    let compared = 0;
    for (const { stage, label } of stages) {
      const { value, net, emitter } = stage;
      const oracle = midbandByNodes(net, emitter.value, { gm: value('g_m'), gds: value('g_ds'), gmb: value('g_mb') });
      if (!oracle || !stage.lowering.values.has('A_v')) continue;
      compared++;
      expect(difference(value('A_v'), oracle.gain), label).toBeLessThan(1e-7);
      expect(difference(value('R_out'), oracle.rout), label).toBeLessThan(1e-7);
      expect(difference(1 / value('R_in'), 1 / oracle.rin), label).toBeLessThan(1e-7);
    }
    expect(compared).toBeGreaterThan(1200);
  });

  it('delivers what it turns into heat', () => {
    for (const { stage, label } of stages) {
      const { net, emitter, value } = stage;
      let delivered = 0;
      const at = (place: { type: string; name?: string; volts?: number | null }): number =>
        place.type === 'node' ? value(`V_${place.name}`) : place.type === 'rail' ? emitter.value(place.volts!) : 0;
      for (const { from, to, element, reversed } of net.legs) {
        const near = value(`V_${from}`);
        if (element?.kind === 'resistor') delivered += (near - at(to)) ** 2 / emitter.value(element.value);
        if (element?.kind === 'source') {
          const fall = (reversed ? at(to) - near : near - at(to)) * emitter.value(element.value);
          delivered += Math.max(0, fall);
        }
      }
      delivered += value('P_D') + value('I_G') * (value('V_drain') - value('V_gate'));
      expect(Math.abs(value('P_total') - delivered), label).toBeLessThanOrEqual(1e-9 * delivered);
    }
  });

  it('mirrored to p-channel gives mirrored numbers to the last bit', () => {
    const differing: string[] = [];
    for (const { setup, stage, label } of stages) {
      const lines = setup.lines.map((line) =>
        line
          .replace(/(-?)([\d.e+]+) V/g, (_, sign: string, x: string) =>
            Number(x) === 0 ? '0 V' : `${sign ? '' : '-'}${x} V`,
          )
          .replace(/(A) (to|from)/g, (_, a: string, way: string) => `${a} ${way === 'to' ? 'from' : 'to'}`),
      );
      const mirrored = lowerText({ ...setup, channel: -1, lines });
      expect(mirrored.status, label).toBe(0);
      const other: Record<string, string> = { swing_up: 'swing_down', swing_down: 'swing_up' };
      for (const name of stage.lowering.values.keys()) {
        const flips =
          name === 'V_GS' ||
          name === 'V_DS' ||
          name === 'V_SB' ||
          /^V_(gate|drain|source|bulk|tap|mid|load)$/.test(name);
        const mine = stage.value(other[name] ?? name);
        if (mirrored.value(name) !== (flips ? -mine : mine)) differing.push(`${name} of ${label}`);
      }
    }
    expect(differing).toEqual([]);
  });
});
