import { describe, expect, it } from 'vitest';
import { OFFERED_VALUES, lowerStage, offeredValue } from '../../src/network/index.ts';
import { createDirectEmitter } from '../support/direct-emitter.ts';
import { lowerText, netOf } from '../support/stage-text.ts';

const device = { beta: 1e-3, V_TO: -2 };
const sound = ['gate: 1e6 to 0 V', 'drain: 3300 to 15 V', 'source: 1200 to 0 V'];

function faults(lines: readonly string[], family: 'JFET' | 'MOSFET' = 'JFET') {
  return lowerText({ device, lines, family }).lowering.faults;
}

describe('a stage that cannot be computed', () => {
  it('names the terminal that has no leg', () => {
    expect(faults([sound[0], sound[1]])).toEqual([
      {
        code: 'terminal-without-leg',
        text: 'source has no leg. Write what hangs on it, such as source: 1 kohm to 0 V.',
        leg: null,
      },
    ]);
  });

  it('names a place that floats', () => {
    expect(faults([...sound, 'out: 1e-6 F to drain'])).toEqual([
      {
        code: 'node-floats',
        text: 'out floats: no resistor, inductor or tie leads from there to a rail or to signal. Add one, such as out: 1 Mohm to 0 V.',
        leg: 3,
      },
    ]);
    expect(faults(['gate: 1e-9 F to signal', sound[1], sound[2]])[0].code).toBe('node-floats');
  });

  it('names the two rails of one place', () => {
    expect(faults(['gate: to 0 V, to 5 V', sound[1], sound[2]])).toEqual([
      {
        code: 'two-rails',
        text: 'gate is tied to 0 V and to 5 V: a place has one voltage. Put a resistor into one of the two legs.',
        leg: 1,
      },
    ]);
    expect(faults([sound[0], 'drain: 1e-3 H to 15 V, to 12 V', sound[2]])[0].code).toBe('two-rails');
    expect(faults(['gate: to 5 V, to 5 V', sound[1], sound[2]])).toEqual([]);
  });

  it('names a resistor of 0 ohm or less, and other elements that cannot be', () => {
    expect(faults(['gate: 0 to 0 V', sound[1], sound[2]])[0]).toMatchObject({ code: 'resistor-not-positive', leg: 0 });
    expect(faults(['gate: -5 to 0 V', sound[1], sound[2]])[0].text).toBe(
      '-5 on gate is below 0 ohm. A resistor has more than 0 ohm.',
    );
    expect(faults([...sound, 'source: -1e-6 F to 0 V'])[0]).toMatchObject({ code: 'element-not-positive', leg: 3 });
  });

  it('names a bulk that a JFET does not have and a place without a line', () => {
    expect(faults([...sound, 'bulk: to 0 V'])[0]).toMatchObject({ code: 'no-such-terminal', leg: 3 });
    expect(faults([...sound, 'bulk: to 0 V'], 'MOSFET')).toEqual([]);
    expect(faults([...sound, 'source: 1e-6 F to nowhere'])[0]).toMatchObject({ code: 'no-such-place', leg: 3 });
  });

  it('says that two current sources in series cannot both set the current', () => {
    expect(faults([sound[0], 'drain: 1e-3 A from 15 V', 'source: 1e-3 A to 0 V'])[0].code).toBe('currents-conflict');
  });

  it('says that several FETs are not computed yet', () => {
    const emitter = createDirectEmitter();
    const net = netOf({ device, lines: sound }, emitter);
    const { faults: found } = lowerStage({ ...net, fets: [net.fets[0], net.fets[0]] }, emitter);
    expect(found[0].code).toBe('several-fets');
  });
});

describe('what a stage does not offer', () => {
  it('is listed with the reason', () => {
    const bare = lowerText({ device, lines: sound, output: 'drain' }).lowering;
    expect(bare.absent.get('A_v')).toBe(
      'Nothing drives this stage. Lead a leg to signal, such as gate: 100 nF to signal.',
    );
    expect(bare.absent.get('f_low')).toBe('f_low is not computed yet.');
    const silent = lowerText({ device, lines: ['gate: to signal', sound[1], sound[2]] }).lowering;
    expect(silent.absent.get('A_v')).toBe('No output is named. Add a line such as output: drain.');
    expect(silent.values.has('R_in')).toBe(true);
    const both = lowerText({
      device,
      lines: [...sound, 'gate: 1e-7 F to signal', 'source: 1e-6 F to -signal'],
      output: 'drain',
    });
    expect(both.lowering.absent.get('A_v')).toBe('Differential drive is not computed yet.');
    expect(both.value('I_D')).toBeGreaterThan(0);
  });

  it('and what it offers together are the whole table', () => {
    const stage = lowerText({ device, lines: [...sound, 'gate: 1e-7 F to signal'], output: 'drain' }).lowering;
    for (const { name } of OFFERED_VALUES.filter(({ per }) => per !== 'place')) {
      expect(stage.values.has(name) !== stage.absent.has(name), name).toBe(true);
    }
    expect(offeredValue('V_drain')?.unit).toBe('V');
    expect(offeredValue('V_DS')?.per).toBe('fet');
    expect(offeredValue('nothing')).toBeNull();
  });
});

describe('capacitances', () => {
  it('of a JFET fall with reverse bias, and give f_T', () => {
    const stage = lowerText({
      device: { ...device, C_GS: 4e-12, C_GD: 2e-12 },
      lines: ['gate: to 0 V', 'drain: to 10 V', 'source: to 0 V'],
    });
    expect(stage.value('C_gs')).toBe(4e-12);
    expect(stage.value('C_gd')).toBeCloseTo(2e-12 / Math.sqrt(1 + 10 / 0.8), 24);
    const f = stage.value('g_m') / (2 * Math.PI * (stage.value('C_gs') + stage.value('C_gd')));
    expect(stage.value('f_T') / f).toBeCloseTo(1, 12);
  });
});
