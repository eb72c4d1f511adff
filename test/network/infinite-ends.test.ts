// What an ideal coil in the drain leg, a resistor of the test source and a channel in cutoff leave without a limit: the
// infinities have the sign of their limit, and what has no meaning is not offered. Expected values: the limit g_ds -> 0
// of the stage's own small-signal equations, and design section 4 for cutoff.

import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';

const PART = 'Q1 = n-JFET\n  I_DSS: 8 mA\n  V_P: -3 V\n';
const P_PART = 'Q1 = p-JFET\n  I_DSS: 8 mA\n  V_P: 3 V\n';
const stage = (lines: string[], part = PART) =>
  createSheet(`${part}A1 = stage of Q1\n${lines.map((line) => `  ${line}\n`).join('')}`);

describe('an ideal coil in the drain leg', () => {
  const choke = [
    'gate: 1 Mohm to 0 V, 100 nF to signal',
    'drain: 1 mH to 15 V, 1 uF to load',
    'load: 2 kohm to 0 V',
    'output: load',
  ];

  it('leaves the channel alone at the output: R_out is infinite, not minus infinite, and fails a check from above', () => {
    const sheet = createSheet(
      `${PART}A1 = stage of Q1\n${[...choke, 'source: 500 ohm to 0 V, 10 uF to 0 V'].map((line) => `  ${line}\n`).join('')}zout = check A1.R_out <= 600 ohm\n`,
    );
    expect(sheet.value('A1.R_out')).toBe(Infinity);
    expect(sheet.cell('zout')!.check!.holds).toBe(false);
  });

  it('makes the gain of a common source infinite downwards, of a common gate upwards', () => {
    const source = stage([
      'gate: 1 Mohm to 0 V, 100 nF to signal',
      'source: 500 ohm to 0 V',
      'drain: 1 mH to 15 V',
      'output: drain',
    ]);
    expect(source.value('A1.A_v')).toBe(-Infinity);
    const gate = stage([
      'gate: 1 Mohm to 0 V, 1 uF to 0 V',
      'source: 500 ohm to 0 V, 1 uF to signal',
      'drain: 1 mH to 15 V',
      'output: drain',
    ]);
    expect(gate.value('A1.A_v')).toBe(Infinity);
  });

  it('gives the same in the mirror', () => {
    const mirrored = stage(
      ['gate: 1 Mohm to 0 V, 100 nF to signal', 'source: 500 ohm to 0 V', 'drain: 1 mH to -15 V', 'output: drain'],
      P_PART,
    );
    expect(mirrored.value('A1.A_v')).toBe(-Infinity);
    expect(mirrored.value('A1.R_out')).toBe(Infinity);
  });
});

describe('the resistor of the test source', () => {
  const lines = [
    'gate: 1 Mohm to 0 V, 100 nF to in',
    'in: R_sig to signal',
    'drain: 1 kohm to 15 V',
    'source: 500 ohm to 0 V',
  ];

  it('is left out of R_in where it is the only way in', () => {
    const sheet = createSheet(
      `R_sig = 10 kohm\n${PART}A1 = stage of Q1\n${[...lines, 'driven: through R_sig'].map((line) => `  ${line}\n`).join('')}`,
    );
    expect(sheet.value('A1.R_in')).toBeCloseTo(1e6, 6);
  });

  it('leaves R_in without a value where another resistor is named, or another way leads in', () => {
    for (const extra of [['driven: through R_D'], ['driven: through R_sig', 'drain: 1 uF to signal']]) {
      const sheet = createSheet(
        `R_sig = 10 kohm\nR_D = 1 kohm\n${PART}A1 = stage of Q1\n${[...lines, ...extra].map((line) => `  ${line}\n`).join('')}low = check A1.R_in <= 2 Mohm\n`,
      );
      expect(sheet.value('A1.R_in')).toBe(null);
      expect(sheet.cell('low')!.check).toBe(null);
    }
  });
});

describe('V_DSsat', () => {
  it('is infinite in cutoff, so that no comparison with V_DS holds on a FET that is off', () => {
    const sheet = createSheet(
      `${PART}A1 = stage of Q1\n  gate: 1 Mohm to -5 V\n  source: 1 kohm to 0 V\n  drain: 1 kohm to 15 V\na = check A1.V_DS >= A1.V_DSsat\nb = check A1.V_DS - A1.V_DSsat >= 1 V\nc = check A1.margin >= 0 V\n`,
    );
    expect(sheet.value('A1.V_DSsat')).toBe(Infinity);
    for (const name of ['a', 'b', 'c']) expect(sheet.cell(name)!.check!.holds, name).toBe(false);
  });

  it('counts the drop of the leads, so that V_DS less it is the margin', () => {
    const text = `Q1 = n-JFET\n  I_DSS: 8 mA\n  V_P: -3 V\n  r_s: 100 ohm\n  r_d: 100 ohm\n`;
    for (const vds of ['3.5 V', '15 V']) {
      const sheet = createSheet(`${text}P1 = point of Q1\n  V_GS: 0 V\n  V_DS: ${vds}\n`);
      const read = (name: string): number => sheet.value(`P1.${name}`) as number;
      expect(read('V_DS') - read('V_DSsat')).toBeCloseTo(read('margin'), 12);
    }
  });
});
