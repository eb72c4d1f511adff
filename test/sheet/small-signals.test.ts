import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { KINDS, number, partOf, textOf } from './kinds.ts';

const LAMBDA = '  lambda: 0.015 /V\n';
const bias = (kind: string): number => (kind.endsWith('JFET') ? 0 : 5);

/** Stages without capacitors: what the test source does to them slowly it does at any frequency. */
const SHAPES: readonly (readonly [name: string, lines: (kind: string) => string, output: string])[] = [
  [
    'with its source on a resistor',
    (kind) =>
      `  gate: 47 kohm to signal, 100 kohm to {${2 * bias(kind)}}\n  drain: 1.5 kohm to {18}\n  source: 1.2 kohm to 0 V\n`,
    'drain',
  ],
  [
    'as a follower',
    (kind) =>
      `  gate: 10 kohm to signal, 10 kohm to {${2 * bias(kind)}}\n  drain: to {18}\n  source: 2.2 kohm to 0 V\n`,
    'source',
  ],
  [
    'with its gate held',
    (kind) =>
      `  gate: to {${bias(kind)}}\n  drain: 1.5 kohm to {18}\n  source: 1.2 kohm to foot\n  foot: 100 ohm to signal\n`,
    'drain',
  ],
  [
    'with feedback from its drain',
    (kind) =>
      `  gate: 33 kohm to signal, 100 kohm to drain, 270 kohm to {${kind.endsWith('JFET') ? -12 : 9}}\n  drain: 2.2 kohm to {18}\n  source: 330 ohm to 0 V\n`,
    'drain',
  ],
  [
    'between drain and source',
    (kind) =>
      `  gate: 10 kohm to signal, 10 kohm to {${2 * bias(kind)}}\n  drain: 1 kohm to {18}\n  source: 1.2 kohm to 0 V\n`,
    'drain - source',
  ],
];

describe.each(KINDS)('small signals of an %s are slopes of the stage itself', (kind) => {
  const bodies = kind.endsWith('MOSFET') ? ['', '  bulk: to {-1}\n'] : [''];
  for (const [name, lines, output] of SHAPES) {
    it.each(bodies)(`${name} %j`, (bulk) => {
      const more = bulk ? `${LAMBDA}  gamma: 0.5 V^0.5\n` : LAMBDA;
      const head = textOf(kind, partOf(kind, more));
      const body = textOf(kind, lines(kind) + bulk);
      const stage = createSheet(`${head}A1 = stage of Q1\n${body}  output: ${output}\n`);
      expect(stage.error('A1')).toBeNull();

      /** The stage with the test source at a voltage and a current pushed into the output: output and source current. */
      const solved = (volts: number, amps: number): { out: number; current: number } => {
        const [plus, minus] = output.split(' - ');
        const pushed = body
          .replaceAll('signal', 'V_s')
          .replace(new RegExp(`^  ${plus}: `, 'm'), `  ${plus}: I_t from ${minus ?? '0 V'}, `);
        const sheet = createSheet(`V_s = ${volts} V\nI_t = ${amps} A\n${head}A1 = stage of Q1\n${pushed}`);
        const v = (place: string): number => number(sheet, `A1.V_${place}`);
        let current = 0;
        for (const [, place, legs] of pushed.matchAll(/^ {2}(\w+): (.*)$/gm)) {
          const drive = /([\d.]+) (k?)ohm to V_s/.exec(legs);
          if (drive) current += (volts - v(place)) / (Number(drive[1]) * (drive[2] ? 1e3 : 1));
        }
        return { out: v(plus) - (minus ? v(minus) : 0), current };
      };
      const step = 1e-4;
      const [up, down] = [solved(step, 0), solved(-step, 0)];
      const gain = (up.out - down.out) / (2 * step);
      expect(number(stage, 'A1.A_v') / gain).toBeCloseTo(1, 7);
      expect((number(stage, 'A1.R_in') * (up.current - down.current)) / (2 * step)).toBeCloseTo(1, 7);
      const push = 1e-7;
      const resistance = (solved(0, push).out - solved(0, -push).out) / (2 * push);
      expect(number(stage, 'A1.R_out') / resistance).toBeCloseTo(1, 7);
    });
  }

  it('at its terminals, from points a little apart', () => {
    const body = kind.endsWith('MOSFET') ? '  gamma: 0.5 V^0.5\n' : '';
    const at = (vgs: number, vds: number, vsb: number): number =>
      number(
        createSheet(
          textOf(
            kind,
            `${partOf(kind, `${LAMBDA}${body}  r_s: 20 ohm\n  r_d: 30 ohm\n`)}P1 = point of Q1\n  V_GS: {${vgs}}\n  V_DS: {${vds}}\n  V_SB: {${vsb}}\n`,
          ),
        ),
        'P1.I_D',
      );
    const offered = (vgs: number, vds: number, name: string): number =>
      number(
        createSheet(
          textOf(
            kind,
            `${partOf(kind, `${LAMBDA}${body}  r_s: 20 ohm\n  r_d: 30 ohm\n`)}P1 = point of Q1\n  V_GS: {${vgs}}\n  V_DS: {${vds}}\n  V_SB: {1}\n`,
          ),
        ),
        `P1.${name}`,
      );
    const vgs = kind.endsWith('JFET') ? -0.5 : 3;
    const h = 1e-4;
    for (const vds of [8, 0.4, -0.3]) {
      const gm = (at(vgs + h, vds, 1) - at(vgs - h, vds, 1)) / (2 * h);
      const gds = (at(vgs, vds + h, 1) - at(vgs, vds - h, 1)) / (2 * h);
      const gmb = (at(vgs, vds, 1 - h) - at(vgs, vds, 1 + h)) / (2 * h);
      expect(offered(vgs, vds, 'g_m') / gm).toBeCloseTo(1, 7);
      expect(offered(vgs, vds, 'g_ds') / gds).toBeCloseTo(1, 7);
      expect(body ? offered(vgs, vds, 'g_mb') / gmb : 1).toBeCloseTo(1, 6);
      expect(offered(vgs, vds, 'r_o') * offered(vgs, vds, 'g_ds')).toBeCloseTo(1, 14);
    }
  });
});

/**
 * Stages with capacitors, and the same with each capacitor as a rail at the voltage it rests at: what the large signal
 * sees. `v` in the second is the test source.
 */
const SWINGS: readonly (readonly [
  name: string,
  stage: (kind: string) => string,
  large: (kind: string, rest: (place: string) => number) => string,
  output: string,
])[] = [
  [
    'with source and load by capacitors',
    (kind) =>
      `  gate: 1 Mohm to {${bias(kind)}}, 100 nF to signal\n  drain: 2.2 kohm to {18}, 1 uF to load\n  source: 1.2 kohm to 0 V, 47 uF to 0 V\n  load: 10 kohm to 0 V\n`,
    (_, rest) =>
      `  gate: to ${rest('gate')} V + v\n  drain: 2.2 kohm to {18}, 10 kohm to ${rest('drain')} V\n  source: to ${rest('source')} V\n`,
    'drain',
  ],
  [
    'with half of its source resistance open',
    (kind) =>
      `  gate: 1 Mohm to {${bias(kind)}}, 100 nF to signal\n  drain: 2.2 kohm to {18}\n  source: 470 ohm to foot\n  foot: 820 ohm to 0 V, 47 uF to 0 V\n`,
    (_, rest) =>
      `  gate: to ${rest('gate')} V + v\n  drain: 2.2 kohm to {18}\n  source: 470 ohm to ${rest('foot')} V\n`,
    'drain',
  ],
  [
    'as a follower into a load',
    (kind) =>
      `  gate: 1 Mohm to {${bias(kind) + 1}}, 100 nF to signal\n  drain: to {18}\n  source: 2.2 kohm to 0 V, 1 uF to load\n  load: 4.7 kohm to 0 V\n`,
    (_, rest) =>
      `  gate: to ${rest('gate')} V + v\n  drain: to {18}\n  source: 2.2 kohm to 0 V, 4.7 kohm to ${rest('source')} V\n`,
    'source',
  ],
  [
    'with its gate held',
    (kind) =>
      `  gate: to {${bias(kind)}}\n  drain: 2.2 kohm to {18}\n  source: 1.2 kohm to 0 V, 10 uF to in\n  in: 50 ohm to signal\n`,
    (kind, rest) =>
      `  gate: to {${bias(kind)}}\n  drain: 2.2 kohm to {18}\n  source: 1.2 kohm to 0 V, 50 ohm to ${rest('source')} V + v\n`,
    'drain',
  ],
];

describe.each(KINDS)(
  'the swing of an %s is where the stage itself leaves saturation or its gate conducts',
  (kind, sign) => {
    it.each(SWINGS)('%s', (_, stageLines, largeLines, output) => {
      const head = textOf(kind, partOf(kind, LAMBDA));
      const stage = createSheet(`${head}A1 = stage of Q1\n${textOf(kind, stageLines(kind))}  output: ${output}\n`);
      expect(stage.value('A1.region')).toBe('saturation');
      const rest = (place: string): number => number(stage, `A1.V_${place}`);
      const large = textOf(kind, largeLines(kind, rest));
      const sheet = createSheet('');
      const at = (volts: number): { out: number; isSound: boolean } => {
        sheet.update(`v = ${volts} V\n${head}A1 = stage of Q1\n${large}`);
        const conducts = kind.endsWith('JFET') && sign * number(sheet, 'A1.V_GS') > 0.5;
        return {
          out: number(sheet, `A1.V_${output}`) - rest(output),
          isSound: sheet.value('A1.region') === 'saturation' && !conducts,
        };
      };
      expect(Math.abs(at(0).out)).toBeLessThan(1e-9);
      const peaks = [1, -1].map((direction) => {
        let [good, bad] = [0, 0];
        while (at(direction * bad).isSound) [good, bad] = [bad, bad + 0.05];
        for (let step = 0; step < 34; step++) {
          const middle = (good + bad) / 2;
          if (at(direction * middle).isSound) good = middle;
          else bad = middle;
        }
        return at(direction * good).out;
      });
      expect(Math.sign(peaks[0]) * Math.sign(peaks[1])).toBe(-1);
      expect(number(stage, 'A1.swing_up')).toBeCloseTo(Math.max(...peaks), 8);
      expect(number(stage, 'A1.swing_down')).toBeCloseTo(-Math.min(...peaks), 8);
    });
  },
);
