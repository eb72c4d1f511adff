import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomStage } from '../support/random-stage.ts';
import { stageSheet } from '../support/stage-sheet.ts';
import { KINDS, number, partOf, sheetOf } from './kinds.ts';

/** A gate voltage against the source at which each kind conducts about 2 mA, and one at which it is off. */
const on = (kind: string): number => (kind.endsWith('JFET') ? -0.8 : 2.7);
const off = (kind: string): number => (kind.endsWith('JFET') ? -3 : 0.5);

describe.each(KINDS)('a stage of an %s', (kind, sign) => {
  it('that is off carries nothing, has a negative margin and fails every check that wants saturation', () => {
    const sheet = sheetOf(
      kind,
      `${partOf(kind)}A1 = stage of Q1
  gate: 1 Mohm to {${off(kind)}}
  drain: 1 kohm to {12}
  source: to 0 V
headroom = check A1.margin >= 0 V
alive = check A1.region = saturation
either = check A1.region = ohmic or A1.region = saturation
is_off = check A1.region = cutoff
`,
    );
    expect(sheet.value('A1.region')).toBe('cutoff');
    expect(number(sheet, 'A1.I_D')).toBe(0);
    expect(number(sheet, 'A1.margin')).toBeCloseTo(-1, 12);
    expect(number(sheet, 'A1.V_DS')).toBe(sign * 12);
    expect(['headroom', 'alive', 'either', 'is_off'].map((check) => sheet.value(check))).toEqual([
      false,
      false,
      false,
      true,
    ]);
    expect(sheet.cell('headroom')!.check).toMatchObject({ holds: false, reserve: number(sheet, 'A1.margin') });
  });

  it('is ohmic with a negative margin where the drain resistor takes the supply', () => {
    const sheet = sheetOf(
      kind,
      `${partOf(kind)}A1 = stage of Q1
  gate: 1 Mohm to {${on(kind)}}
  drain: 22 kohm to {12}
  source: to 0 V
headroom = check A1.margin >= 0 V
`,
    );
    expect(sheet.value('A1.region')).toBe('ohmic');
    expect(number(sheet, 'A1.margin')).toBeLessThan(0);
    expect(sheet.value('headroom')).toBe(false);
  });

  it('as a diode stands at V_GS = V_DS, in saturation where it is of the enhancement kind', () => {
    const sheet = sheetOf(
      kind,
      `${partOf(kind)}A1 = stage of Q1\n  gate: to drain\n  drain: 2.2 kohm to {12}\n  source: to 0 V\n`,
    );
    expect(number(sheet, 'A1.V_GS')).toBeCloseTo(number(sheet, 'A1.V_DS'), 14);
    expect(sheet.value('A1.region')).toBe(kind.endsWith('JFET') ? 'ohmic' : 'saturation');
    expect(number(sheet, 'A1.I_D') * 2200 + sign * number(sheet, 'A1.V_DS')).toBeCloseTo(12, 11);
  });

  it('with drain feedback rests where the gate has the voltage of the drain', () => {
    const sheet = sheetOf(
      kind,
      `${partOf(kind)}A1 = stage of Q1\n  gate: 10 Mohm to drain, 100 nF to signal\n  drain: 2.2 kohm to {12}\n  source: to 0 V\n  output: drain\n`,
    );
    expect(number(sheet, 'A1.V_gate')).toBeCloseTo(number(sheet, 'A1.V_drain'), 12);
    // R_in = R_F / (1 - A_v): the feedback resistor carries the difference of both voltages.
    expect(number(sheet, 'A1.R_in') / (10e6 / (1 - number(sheet, 'A1.A_v')))).toBeCloseTo(1, 10);
  });

  it('carries what a current source in the source leg drives', () => {
    const sheet = sheetOf(
      kind,
      `${partOf(kind)}A1 = stage of Q1\n  gate: 1 Mohm to 0 V\n  drain: 1 kohm to {12}\n  source: 1.1 mA {to -9}\n`,
    );
    expect(number(sheet, 'A1.I_D')).toBe(1.1e-3);
    expect(number(sheet, 'A1.V_drain')).toBeCloseTo(sign * (12 - 1.1), 12);
    const beta = 1.5e-3;
    const expected = kind.endsWith('JFET') ? -2 + Math.sqrt(1.1e-3 / beta) : 1.5 + Math.sqrt(1.1e-3 / beta);
    expect(number(sheet, 'A1.V_GS')).toBeCloseTo(sign * expected, 12);
    expect(number(sheet, 'A1.V_source')).toBeCloseTo(-sign * expected, 12);
    expect(
      sheet
        .cell('A1')!
        .cautions.map((caution) => caution.text)
        .join(),
    ).toMatch(/compliance/);
  });

  it('with its drain below its source conducts backwards', () => {
    const gate = kind.endsWith('JFET') ? 0 : 4;
    const sheet = sheetOf(
      kind,
      `${partOf(kind)}A1 = stage of Q1\n  gate: 1 Mohm to {${gate}}\n  drain: 1 kohm to {-2}\n  source: to 0 V\n`,
    );
    expect(number(sheet, 'A1.I_D')).toBeLessThan(0);
    expect(sign * number(sheet, 'A1.V_DS')).toBeLessThan(0);
    expect(number(sheet, 'A1.I_D') * 1000).toBeCloseTo(sign * number(sheet, 'A1.V_drain') * -1 - 2, 11);
    // V_ov counts at the end that acts as the source, here the drain.
    const vgd = sign * (number(sheet, 'A1.V_GS') - number(sheet, 'A1.V_DS'));
    expect(number(sheet, 'A1.V_ov')).toBeCloseTo(vgd - (kind.endsWith('JFET') ? -2 : 1.5), 12);
  });

  it('has its gate moved by the leakage through its resistor, which doubles every 10 K', () => {
    const at = (celsius: number): Sheet =>
      sheetOf(
        kind,
        `T_A = ${celsius} degC\n${partOf(kind, '  I_GSS: 2 nA\n')}A1 = stage of Q1\n  gate: 10 Mohm to {${on(kind)}}\n  drain: 1 kohm to {12}\n  source: 1 kohm to 0 V\n`,
      );
    for (const [celsius, leakage] of [
      [25, 2e-9],
      [35, 4e-9],
      [85, 128e-9],
      [15, 1e-9],
    ]) {
      const sheet = at(celsius);
      expect(number(sheet, 'A1.I_G') / leakage).toBeCloseTo(1, 9);
      expect(sign * number(sheet, 'A1.V_gate')).toBeCloseTo(on(kind) + leakage * 10e6, 9);
    }
    expect(number(at(85), 'A1.I_D')).not.toBe(number(at(25), 'A1.I_D'));
  });

  it('warms itself by P_D R_thJA', () => {
    const text = (rise: string): string =>
      `T_A = 40 degC\n${partOf(kind, rise)}A1 = stage of Q1\n  gate: 1 Mohm to {${on(kind)}}\n  drain: 1 kohm to {24}\n  source: to 0 V\n`;
    const [cold, warm] = [sheetOf(kind, text('')), sheetOf(kind, text('  R_thJA: 350 K/W\n'))];
    expect(number(cold, 'A1.T_J')).toBe(313.15);
    expect(number(warm, 'A1.T_J') - 313.15).toBeCloseTo(350 * number(warm, 'A1.P_D'), 9);
    expect(number(warm, 'A1.T_J')).toBeGreaterThan(313.15 + 5);
    expect(number(warm, 'A1.P_D')).toBeCloseTo(number(warm, 'A1.I_D') * Math.abs(number(warm, 'A1.V_DS')), 14);
    expect(number(warm, 'A1.I_D')).not.toBe(number(cold, 'A1.I_D'));
  });

  it('names a place that floats and a place tied to two rails', () => {
    const faults = (extra: string, gate = '1 Mohm to 0 V'): string | undefined =>
      sheetOf(
        kind,
        `${partOf(kind)}A1 = stage of Q1\n  gate: ${gate}\n  drain: 1 kohm to {12}\n  source: 1 kohm to 0 V\n${extra}`,
      ).error('A1')?.text;
    expect(faults('')).toBeUndefined();
    expect(faults('', '100 nF to signal')).toMatch(/^gate floats/);
    expect(faults('  out: 1 uF to drain\n')).toMatch(/^out floats/);
    expect(faults('  a: 1 kohm to b\n  b: 1 uF to drain\n')).toMatch(/^a and b float/);
    expect(faults('', 'to 0 V, to 5 V')).toMatch(/^gate is tied to 0 V and to 5 V/);
    expect(faults('  x: to 3 V, to 4 V\n')).toMatch(/^x is tied to 3 V and to 4 V/);
  });
});

describe.each([
  ['n-MOSFET', 1],
  ['p-MOSFET', -1],
] as const)('an %s with its bulk lifted', (kind, sign) => {
  const text = (bulk: string): string =>
    `${partOf(kind, '  gamma: 0.6 V^0.5\n  phi: 0.7 V\n')}A1 = stage of Q1\n  gate: to {6}\n  drain: 500 ohm to {15}\n  source: 2.2 kohm to 0 V\n${bulk}`;

  it('has its threshold raised by the root law', () => {
    const [tied, lifted] = [sheetOf(kind, text('')), sheetOf(kind, text('  bulk: to 0 V\n'))];
    expect(number(tied, 'A1.V_SB')).toBe(0);
    const vsb = sign * number(lifted, 'A1.V_SB');
    expect(vsb).toBe(sign * number(lifted, 'A1.V_source'));
    const threshold = 1.5 + 0.6 * (Math.sqrt(0.7 + vsb) - Math.sqrt(0.7));
    expect(number(lifted, 'A1.V_ov')).toBeCloseTo(sign * number(lifted, 'A1.V_GS') - threshold, 12);
    expect(number(lifted, 'A1.I_D')).toBeCloseTo(1.5e-3 * number(lifted, 'A1.V_ov') ** 2, 14);
    expect(number(lifted, 'A1.g_mb') / number(lifted, 'A1.g_m')).toBeCloseTo(0.6 / (2 * Math.sqrt(0.7 + vsb)), 12);
    expect(number(lifted, 'A1.I_D')).toBeLessThan(number(tied, 'A1.I_D'));
  });
});

describe('the zero of the drift', () => {
  it.each(['n-JFET', 'p-JFET'])('of an %s with the default temperature laws lies at V_ov = 0.63 V', (kind) => {
    /** dI_D/dT over I_D at an overdrive at 25 degC, from sheets 1 K above and below. */
    const drift = (vov: number): number => {
      const [hot, cold] = [26, 24].map((celsius) =>
        number(
          sheetOf(kind, `T_A = ${celsius} degC\n${partOf(kind)}P1 = point of Q1\n  V_GS: {${vov - 2}}\n  V_DS: {10}\n`),
          'P1.I_D',
        ),
      );
      return (hot - cold) / 2 / ((hot + cold) / 2);
    };
    // (2 |tempco| / V_ov - |beta_exponent| / T) changes sign at 2 (2.2 mV/K)(298.15 K) / 2.1 = 0.62469 V.
    expect(Math.abs(drift(0.6247))).toBeLessThan(2e-6);
    expect(drift(0.4)).toBeGreaterThan(1e-3);
    expect(drift(1.2)).toBeLessThan(-1e-3);
    expect(Math.abs(drift(0.63))).toBeLessThan(Math.abs(drift(1.2)) / 20);
  });
});

/** What leaves each place of a stage, from its printed voltages and the numbers in its text. */
function imbalance(text: string, channel: 1 | -1): { worst: number; largest: number } {
  const sheet = createSheet(text);
  const volts = (place: string): number => {
    const rail = /^(-?[\d.e+-]+) V$/.exec(place);
    if (rail) return Number(rail[1]);
    return place === 'signal' ? 0 : number(sheet, `A1.V_${place}`);
  };
  const up = new Map<string, string>();
  const rootOf = (place: string): string => (up.has(place) ? rootOf(up.get(place)!) : place);
  const flows: [from: string, to: string, amps: number, rounding: number][] = [];
  const held = new Set<string>();
  const lines = text.split('\n');
  const body = lines
    .slice(lines.indexOf('A1 = stage of Q1') + 1)
    .filter((line) => line !== '' && !line.includes('output:'));
  for (const line of body) {
    const [from, legs] = line.split(':').map((part) => part.trim());
    for (const leg of legs.split(',').map((part) => part.trim())) {
      const match = /^(?:(\S+) (\S+) )?(to|from) (.+)$/.exec(leg);
      if (!match) continue;
      const [, value, unit, way, place] = match;
      if (/ V$|^signal$/.test(place)) held.add(place);
      if (!value && rootOf(from) !== rootOf(place)) up.set(rootOf(from), rootOf(place));
      const there = volts(place);
      if (unit === 'ohm') {
        const rounding = (2 ** -50 * (Math.abs(volts(from)) + Math.abs(there))) / Number(value);
        flows.push([from, place, (volts(from) - there) / Number(value), rounding]);
      }
      if (unit === 'A') flows.push([from, place, (way === 'to' ? 1 : -1) * Number(value), 0]);
    }
  }
  if (!body.some((line) => line.trim().startsWith('bulk:') || /\bbulk\b/.test(line.split(':')[1])))
    up.set('bulk', rootOf('source'));
  flows.push(['drain', 'source', channel * number(sheet, 'A1.I_D'), 0]);
  flows.push(['drain', 'gate', channel * number(sheet, 'A1.I_G'), 0]);
  const sums = new Map<string, number>();
  const add = (place: string, amps: number): void =>
    void sums.set(rootOf(place), (sums.get(rootOf(place)) ?? 0) + amps);
  let slack = 0;
  for (const [from, to, amps, rounding] of flows) {
    add(from, -amps);
    add(to, amps);
    slack += rounding;
  }
  const heldRoots = new Set([...held].map(rootOf));
  const free = [...sums].filter(([root]) => !heldRoots.has(root)).map(([, sum]) => Math.max(0, Math.abs(sum) - slack));
  return { worst: Math.max(0, ...free), largest: Math.max(...flows.map(([, , amps]) => Math.abs(amps))) };
}

describe('random stages', () => {
  it.each([1, -1] as const)('keep the sum of currents at every place (channel %i)', (channel) => {
    const draw = createDraw(channel === 1 ? 501 : 502);
    let compared = 0;
    for (let k = 0; k < 60; k++) {
      const text = stageSheet(randomStage(draw), channel);
      if (createSheet(text).error('A1')) continue;
      const { worst, largest } = imbalance(text, channel);
      expect(worst, text).toBeLessThanOrEqual(1e-11 * largest);
      compared++;
    }
    expect(compared).toBeGreaterThan(30);
  });
});
