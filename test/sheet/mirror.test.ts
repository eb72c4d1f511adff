import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomStage } from '../support/random-stage.ts';
import { stageSheet } from '../support/stage-sheet.ts';
import type { StageSetup } from '../support/stage-text.ts';

/** Values that are true node differences; all others are in the device's own sense, or have no sense. */
const TRUE_VOLTAGE = /^(V_GS|V_DS|V_SB|V_P|V_GSoff|V_GSth|V_(?!ov$|DSsat$|TO$).+)$/;

/** The values of a cell by name; `mirrored` turns those of a p-channel sheet into what the n-channel sheet has. */
function valuesOf(sheet: Sheet, cell: string, mirrored: boolean, family: string): Record<string, unknown> {
  return Object.fromEntries(
    sheet.cell(cell)!.values.map(({ name, value }) => {
      const twin = mirrored ? (SWAPPED[name] ?? name) : name;
      const negates = TRUE_VOLTAGE.test(name) || (name === 'V_TO' && family === 'MOSFET');
      if (!mirrored || typeof value !== 'number' || !negates) return [twin, value];
      return [twin, 0 - value];
    }),
  );
}

const SWAPPED: Readonly<Record<string, string>> = { swing_up: 'swing_down', swing_down: 'swing_up' };

function expectMirrored(text: (channel: 1 | -1) => string, cells: readonly string[], family: string): void {
  const [n, p] = ([1, -1] as const).map((channel) => createSheet(text(channel)));
  for (const cell of cells) {
    const [here, there] = [n, p].map((sheet) => sheet.error(cell)?.code ?? null);
    expect(there, text(-1)).toBe(here);
    expect(valuesOf(p, cell, true, family), text(1)).toEqual(valuesOf(n, cell, false, family));
  }
}

const SHAPES: readonly (readonly [name: string, setup: StageSetup])[] = [
  [
    'self-bias',
    {
      device: {},
      lines: [
        'gate: 1e6 to 0 V, 1e-7 F to signal',
        'drain: 3300 to 15 V, 1e-6 F to load',
        'source: 1200 to 0 V, 47e-6 F to 0 V',
        'load: 1e5 to 0 V',
      ],
      output: 'load',
    },
  ],
  [
    'follower',
    {
      device: {},
      lines: [
        'gate: 1e6 to 4 V, 1e-7 F to signal',
        'drain: to 15 V',
        'source: 2200 to 0 V, 1e-6 F to load',
        'load: 1e4 to 0 V',
      ],
      output: 'load',
    },
  ],
  [
    'common gate',
    {
      device: {},
      lines: ['gate: to 0 V', 'drain: 3300 to 15 V', 'source: 1000 to 0 V, 1e-6 F to in', 'in: 50 to signal'],
      output: 'drain',
    },
  ],
  [
    'drain feedback',
    {
      device: {},
      lines: [
        'gate: 2e6 to drain, 1e-7 F to signal',
        'drain: 3300 to 15 V, 1e-6 F to load',
        'source: to 0 V',
        'load: 1e5 to 0 V',
      ],
      output: 'load',
    },
  ],
  ['diode', { device: {}, lines: ['gate: to drain', 'drain: 3300 to 15 V', 'source: to 0 V'], output: 'drain' }],
  [
    'forced current in the source leg',
    {
      device: {},
      lines: ['gate: 1e6 to 0 V, 1e-7 F to signal', 'drain: 3300 to 15 V', 'source: 1e-3 A to -9 V, 1e-5 F to 0 V'],
      output: 'drain',
    },
  ],
  [
    'forced current in the drain leg',
    { device: {}, lines: ['gate: 1e6 to drain', 'drain: 1e-3 A from 15 V', 'source: 100 to 0 V'] },
  ],
  [
    'differential output',
    {
      device: {},
      lines: ['gate: 1e6 to 0 V, 1e-7 F to signal', 'drain: 3300 to 15 V', 'source: 1200 to 0 V'],
      output: 'drain - source',
    },
  ],
  [
    'reversed drain',
    {
      device: {},
      lines: ['gate: 1e6 to 0 V, 1e-7 F to signal', 'drain: 3300 to -5 V', 'source: 1200 to 0 V'],
      output: 'drain',
    },
  ],
];

const FAMILIES: readonly (readonly ['JFET' | 'MOSFET', StageSetup['device']])[] = [
  ['JFET', { beta: 1.3e-3, V_TO: -2.1, lambda: 0.013 }],
  ['MOSFET', { beta: 2.1e-3, V_TO: 1.7, lambda: 0.017 }],
  ['MOSFET', { beta: 1.1e-3, V_TO: -1.9, lambda: 0.007 }],
];
const EXTRAS: readonly (readonly [name: string, device: StageSetup['device'], ambient: number])[] = [
  ['at 25 degC', {}, 298.15],
  [
    'with leakage, heat and leads in the cold',
    { I_GSS: 3e-9, R_thJA: 350, r_s: 7, r_d: 11, tempco: -2.3e-3, beta_exponent: -1.7 },
    241,
  ],
  ['with capacitances when hot', { C_GS: 4e-12, C_GD: 2e-12, I_GSS: 5e-9 }, 371],
];

describe('a mirrored sheet has mirrored numbers to the last bit', () => {
  for (const [family, law] of FAMILIES) {
    for (const [shape, setup] of SHAPES) {
      it.each(EXTRAS)(`${shape} of a ${family} with V_TO ${law.V_TO} V, %s`, (_, extra, ambient) => {
        const whole: StageSetup = { ...setup, family, device: { ...law, ...extra }, ambient };
        expectMirrored((channel) => stageSheet(whole, channel), ['Q1', 'A1'], family);
        const lifted: StageSetup = {
          ...whole,
          device: { ...whole.device, gamma: 0.47 },
          lines: [...setup.lines, 'bulk: to -1.5 V'],
        };
        if (family === 'MOSFET') expectMirrored((channel) => stageSheet(lifted, channel), ['Q1', 'A1'], family);
      });
    }
  }

  it('random stages of both families', () => {
    const draw = createDraw(77);
    let solved = 0;
    for (let k = 0; k < 250; k++) {
      const setup = randomStage(draw);
      const family = setup.family ?? 'JFET';
      expectMirrored((channel) => stageSheet(setup, channel), ['A1'], family);
      if (createSheet(stageSheet(setup, -1)).error('A1') === null) solved++;
    }
    expect(solved).toBeGreaterThan(150);
  });

  const part = (channel: 1 | -1, kind: string, lines: readonly string[]): string => {
    const volts = (text: string): string =>
      text.replace(/\{([\d.-]+)\}/g, (_, x: string) => `${channel * Number(x)} V`);
    return [
      `Q1 = ${channel === 1 ? 'n' : 'p'}-${kind}`,
      ...lines.map((line) => `  ${volts(line)}`),
      'P1 = point of Q1',
      volts(kind === 'JFET' ? '  V_GS: {-0.4}' : '  V_GS: {5}'),
      volts('  V_DS: {9.3}'),
      'P2 = point of Q1',
      '  I_D: 0.7 mA',
      volts('  V_DS: {6.1}'),
      ...(kind === 'MOSFET' ? [volts('  V_SB: {1.1}')] : []),
      '',
    ].join('\n');
  };

  it.each([
    ['JFET', ['I_DSS: 5.3 mA at V_DS = {15}', 'V_P: {-2.3}', 'lambda: 0.013 /V']],
    [
      'JFET',
      [
        'I_DSS: 2 mA .. 9 mA at V_DS = {15}',
        'V_GSoff: {-4} .. {-1} at I_D = 10 nA',
        'g_os: 17 uS at I_D = 2 mA, V_DS = {10}',
      ],
    ],
    [
      'JFET',
      [
        'V_GSoff: {-2.1} at I_D = 1 uA, V_DS = {12}',
        'g_fs: 1.9 mS at I_D = 1 mA, V_DS = {12}',
        'lambda: 0.02 /V',
        'R_thJA: 300 K/W',
      ],
    ],
    ['JFET', ['V_P: {-1.9}', 'R_DSon: 210 ohm at V_GS = {0}']],
    [
      'MOSFET',
      [
        'V_GSth: {2.1} at I_D = 250 uA',
        'I_on: 130 mA at V_GS = {10}, V_DS = {10}',
        'lambda: 0.004 /V',
        'gamma: 0.4 V^0.5',
      ],
    ],
    ['MOSFET', ['V_TO: {1.3}', 'R_DSon: 1.7 ohm at V_GS = {10}, I_D = 100 mA', 'r_s: 0.1 ohm']],
    ['MOSFET', ['R_DSon: 5 ohm at V_GS = {4.5}', 'R_DSon: 2 ohm at V_GS = {10}']],
    ['MOSFET', ['I_DSS: 4 mA', 'V_P: {-2.7}', 'C_iss: 30 pF at V_DS = {25}', 'C_rss: 5 pF at V_DS = {25}']],
  ] as const)('parts and points of a %s given by %j', (kind, lines) => {
    const cells = ['Q1', 'P1', 'P2'];
    expect(cells.map((cell) => createSheet(part(-1, kind, lines)).error(cell)?.text ?? null)).toEqual([
      null,
      null,
      null,
    ]);
    expectMirrored((channel) => part(channel, kind, lines), cells, kind);
  });
});
