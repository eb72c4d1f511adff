import { describe, expect, it } from 'vitest';
import { SWING_LIMIT } from '../../src/network/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomStage } from '../support/random-stage.ts';
import { lowerText } from '../support/stage-text.ts';
import type { LoweredStage, StageSetup } from '../support/stage-text.ts';

const SELF_BIASED: StageSetup = {
  device: { beta: 1e-3, V_TO: -2 },
  lines: ['gate: 1e6 to 0 V, 1e-7 F to signal', 'drain: 5e3 to 15 V', 'source: 1e3 to 0 V, 1e-4 F to 0 V'],
  output: 'drain',
};

/** What limits the swing upwards and downwards. */
function limits({ lowering, emitter }: LoweredStage): string[] {
  const { up, down } = lowering.swingLimits!;
  return [up, down].map((handle) => SWING_LIMIT[emitter.value(handle)]);
}

/** Peaks found by following the source in small steps and solving the whole point by bisection at each. */
function plainSwing(setup: StageSetup, stage: LoweredStage): { up: number; down: number } {
  const { value, lowering, emitter } = stage;
  const port = (name: 'a_gs' | 'a_ds' | 'a_sb' | 'a_out' | 'r_gs' | 'r_ds' | 'r_sb' | 'r_out'): number =>
    emitter.value(lowering.ports![name]);
  const { r_s = 0, r_d = 0, lambda = 0, gamma = 0, V_TO = 0, beta = 0, tempco = 0, beta_exponent = 0 } = setup.device;
  const heat = value('T_J');
  const [betaT, vtoT] = [beta * (heat / 298.15) ** beta_exponent, V_TO + tempco * (heat - 298.15)];
  const I = value('I_D');
  const at = (vs: number, w: number) => {
    const i = I + w;
    const vgs = value('V_GS') + port('a_gs') * vs - port('r_gs') * w - r_s * i;
    const vds = value('V_DS') + port('a_ds') * vs - port('r_ds') * w - (r_s + r_d) * i;
    const vsb = value('V_SB') + port('a_sb') * vs + port('r_sb') * w + r_s * i;
    const vov = vgs - vtoT - gamma * (Math.sqrt(0.6 + Math.max(vsb, -0.3)) - Math.sqrt(0.6));
    return { vgs, vds, vov };
  };
  const law = (vov: number, vds: number): number => {
    if (vov <= 0 || vds <= 0) return 0;
    return betaT * (vds < vov ? vds * (2 * vov - vds) : vov * vov) * (1 + lambda * vds);
  };
  const room = (vs: number): { room: number; out: number } => {
    let [low, high] = [-I, 1];
    for (let n = 0; n < 200; n++) {
      const w = (low + high) / 2;
      const { vov, vds } = at(vs, w);
      if (I + w > law(vov, vds)) high = w;
      else low = w;
    }
    const { vgs, vov, vds } = at(vs, low);
    const gate = setup.family === 'MOSFET' ? Infinity : 0.5 - vgs;
    return { room: Math.min(vov, vds - vov, gate), out: port('a_out') * vs - port('r_out') * low };
  };
  const follow = (direction: number): number => {
    let [low, high] = [0, 1e-3];
    while (room(direction * high).room > 0) {
      if (high > 3e3) return direction * Infinity;
      low = high;
      high *= 1.1;
    }
    for (let n = 0; n < 60; n++) {
      const middle = (low + high) / 2;
      if (room(direction * middle).room > 0) low = middle;
      else high = middle;
    }
    return room(direction * low).out;
  };
  const rise = Math.sign(value('A_v'));
  return { up: Math.max(0, follow(rise)), down: Math.max(0, -follow(-rise)) };
}

describe('the swing', () => {
  it('of a common-source stage ends in cutoff upwards, and before ohmic or gate conduction downwards', () => {
    const stage = lowerText(SELF_BIASED);
    // I_D = 1 mA: upwards the drain rises by I_D R_D = 5 V.
    expect(stage.value('swing_up')).toBeCloseTo(5, 12);
    // Downwards: the gate, at -1 V, conducts at +0.5 V: i = 1 mA/V² (2.5 V)² would need more than 15 V, so ohmic first:
    // 9 V - 5 kohm (i - 1 mA) = y with i = 1 mA/V² y², y = 1.564 V.
    expect(stage.value('swing_down')).toBeCloseTo(9 - (-1 + Math.sqrt(1 + 4 * 5 * 14)) / 10, 9);
    expect(limits(stage)).toEqual(['cutoff', 'ohmic']);
  });

  it('ends at gate conduction where the drain has room', () => {
    const stage = lowerText({ ...SELF_BIASED, lines: SELF_BIASED.lines.map((line) => line.replace('5e3', '1e3')) });
    // v_gs rises by 1.5 V: i = 6.25 mA, the drain falls by 5.25 V from 14 V; ohmic would begin at 2.5 V only.
    expect(stage.value('swing_down')).toBeCloseTo(5.25, 10);
    expect(limits(stage)).toEqual(['cutoff', 'gate conduction']);
  });

  it('of a follower on an ideal current source has no lower limit', () => {
    const stage = lowerText({
      device: { beta: 1e-3, V_TO: -2 },
      lines: ['gate: to signal', 'drain: to 15 V', 'source: 1e-3 A to -15 V'],
      output: 'source',
    });
    expect(stage.value('swing_up')).toBeCloseTo(13, 9);
    expect(stage.value('swing_down')).toBe(Infinity);
    expect(limits(stage)).toEqual(['ohmic', 'none']);
  });

  it('is not offered where the signal does not reach the FET', () => {
    const [, ...others] = SELF_BIASED.lines;
    const stage = lowerText({ ...SELF_BIASED, lines: ['gate: 1e6 to 0 V', 'tap: 1e3 to signal', ...others] });
    expect(stage.lowering.values.has('swing_up')).toBe(false);
    expect(stage.lowering.absent.get('swing_down')).toMatch(/does not reach the FET/);
  });

  it('is zero where the stage at rest is not in saturation', () => {
    const stage = lowerText({ ...SELF_BIASED, lines: SELF_BIASED.lines.map((line) => line.replace('5e3', '5e4')) });
    expect(stage.value('region')).toBe(1);
    expect([stage.value('swing_up'), stage.value('swing_down')]).toEqual([0, 0]);
  });

  it(
    'agrees with a plain search along the source, with body effect, heat and leads, on random stages',
    { timeout: 60_000 },
    () => {
      const draw = createDraw(3);
      const faults: string[] = [];
      let compared = 0;
      for (let n = 0; compared < 120 && n < 3000; n++) {
        const setup = randomStage(draw);
        const stage = lowerText(setup);
        const { value } = stage;
        const plain =
          stage.status === 0 &&
          value('region') === 2 &&
          value('V_DS') > 0 &&
          value('V_SB') > -0.2 &&
          Math.abs(value('A_v')) > 1e-3;
        if (!plain || (setup.family === 'JFET' && value('V_GS') > 0.4) || value('margin') < 0.01) continue;
        compared++;
        const { up, down } = plainSwing(setup, stage);
        if (!stage.lowering.values.has('swing_up')) {
          // The signal goes past the FET: nothing in the search limits it, and the stage offers no swing.
          if (up !== Infinity || down !== Infinity) faults.push(`no swing: ${JSON.stringify(setup)}`);
          continue;
        }
        for (const [name, expected] of [
          ['swing_up', up],
          ['swing_down', down],
        ] as const) {
          const near = value(name) === expected || Math.abs(value(name) - expected) <= 1e-5 * expected + 1e-9;
          if (!near) faults.push(`${name} ${value(name)}, not ${expected}: ${JSON.stringify(setup)}`);
        }
      }
      expect(compared).toBe(120);
      expect(faults).toEqual([]);
    },
  );
});
