// Worked examples of books as nets. `expected` is the same model worked out without rounding (relative 1e-6);
// `printed` are the digits as printed, held to half of the last one. Where a book rounds early or reads a graph its
// digits are left out. Numbers by way of public textbook companions, where not said otherwise; "from memory": not seen
// on a page.

import { describe, expect, it } from 'vitest';
import { lowerText } from '../support/stage-text.ts';
import type { StageSetup } from '../support/stage-text.ts';

interface PublishedStage extends StageSetup {
  readonly source: string;
  readonly expected: Readonly<Record<string, number>>;
  /** Digits as printed and the power of ten of their unit. */
  readonly printed?: Readonly<Record<string, readonly [digits: string, exponent: number]>>;
}

const jfet = (idss: number, vp: number): StageSetup['device'] => ({ beta: idss / vp ** 2, V_TO: -Math.abs(vp) });

const STAGES: readonly PublishedStage[] = [
  {
    source: 'edutecnica.it, "JFET: esercizi risolti", es. 1 (V_DS there from a rounded current)',
    device: jfet(10e-3, 4),
    lines: ['gate: 1e6 to -2.5 V', 'drain: 4.7e3 to 18 V', 'source: to 0 V'],
    expected: { I_D: 1.40625e-3, V_DS: 11.39062 },
    printed: { I_D: ['1.4', -3] },
  },
  {
    source:
      'Boylestad and Nashelsky, Electronic Devices and Circuit Theory, example 7.2 (from memory; V_DS there is read off a graph)',
    device: jfet(8e-3, 6),
    lines: ['gate: 1e6 to 0 V', 'drain: 3.3e3 to 20 V', 'source: 1e3 to 0 V'],
    expected: { I_D: 2.587624e-3, V_GS: -2.587624, V_DS: 8.873216, V_drain: 11.46084 },
    printed: { I_D: ['2.6', -3], V_GS: ['-2.6', 0] },
  },
  {
    source: 'Boylestad and Nashelsky, example 7.5 (from memory; V_DS there is read off a graph)',
    device: jfet(8e-3, 4),
    lines: ['gate: 2.1e6 to 16 V, 270e3 to 0 V', 'drain: 2.4e3 to 16 V', 'source: 1.5e3 to 0 V'],
    expected: { I_D: 2.416309e-3, V_GS: -1.801678, V_drain: 10.20086, V_source: 3.624463, V_DS: 6.576396 },
    printed: { I_D: ['2.4', -3], V_GS: ['-1.8', 0], V_source: ['3.6', 0] },
  },
  {
    source:
      'Bell, Electronic Devices and Circuits, 5th ed., example 10-13, p. 417 (V_DS there from a ratio read off a curve)',
    device: jfet(9e-3, 7),
    lines: ['gate: 4.7e6 to 22 V, 1e6 to 0 V', 'drain: 2.7e3 to 22 V', 'source: 2.7e3 to 0 V'],
    expected: { I_D: 9e-3 * 0.2913976, V_DS: 7.838077 },
  },
  {
    source: 'Neamen, Electronic Circuit Analysis and Design: p-channel JFET on a current source',
    channel: -1,
    device: jfet(2.5e-3, 2.5),
    lines: ['gate: 1e6 to 0 V', 'drain: 4e3 to -9 V', 'source: 0.8e-3 A from 0 V'],
    expected: { V_GS: 1.085786, V_source: -1.085786, V_drain: -5.8, V_DS: -4.714214, V_DSsat: Math.SQRT2 },
    printed: {
      V_GS: ['1.086', 0],
      V_source: ['-1.086', 0],
      V_drain: ['-5.8', 0],
      V_DS: ['-4.71', 0],
      V_DSsat: ['1.41', 0],
    },
  },
  {
    source: 'Floyd, Electronic Devices, 7th ed., example 8.4 with 8.5, pp. 257-258 (gain there from a rounded current)',
    device: jfet(12e-3, 3),
    lines: ['gate: 1e7 to 0 V, 1e-6 F to signal', 'drain: 3.3e3 to 12 V', 'source: 910 to 0 V, 1e-4 F to 0 V'],
    output: 'drain',
    expected: { I_D: 1.963252e-3, V_drain: 5.521269, g_m: 3.235842e-3, A_v: -3.235842e-3 * 3300 },
    printed: { I_D: ['1.96', -3] },
  },
  {
    source: 'Italian school study notes on JFET exercises, es. 6 (coefficients rounded early there)',
    device: jfet(9e-3, 3.5),
    lines: [
      'gate: 1e6 to 18 V, 220e3 to 0 V, 1e-6 F to signal',
      'drain: 2.2e3 to 18 V, 1e-5 F to load',
      'source: 820 to 0 V, 1e-4 F to 0 V',
      'load: 4.7e3 to 0 V',
    ],
    output: 'load',
    expected: { I_D: 5.03439e-3, V_GS: -0.882298, V_DS: 2.796143, g_m: 3.846419e-3, A_v: -5.764054, V_DSsat: 2.617702 },
    printed: { V_GS: ['-0.88', 0], g_m: ['3.85', -3], V_DSsat: ['2.62', 0] },
  },
  {
    source: 'Sharma, Electronic Devices, example 5.4, p. 232 (V_DS there from rounded values)',
    family: 'MOSFET',
    device: { beta: 3e-3 / 25, V_TO: 5 },
    lines: ['gate: 22e6 to 40 V, 18e6 to 0 V', 'drain: 3e3 to 40 V', 'source: 820 to 0 V'],
    expected: { I_D: 6.724565e-3, V_GS: 12.48586, V_DS: 14.31216 },
  },
  {
    source: 'Floyd, Electronic Devices, 7th ed., example 7.16, p. 238',
    family: 'MOSFET',
    device: { beta: 0.2 / 4, V_TO: 2 },
    lines: ['gate: 100e3 to 24 V, 15e3 to 0 V', 'drain: 200 to 24 V', 'source: to 0 V'],
    expected: { V_GS: 3.130435, V_DS: 11.22117 },
    printed: { V_GS: ['3.130435', 0], V_DS: ['11.221172', 0] },
  },
  {
    source: 'Sharma, Electronic Devices, example 5.2, p. 229 (V_DS there from rounded values)',
    family: 'MOSFET',
    device: { beta: 6e-3 / 25, V_TO: 3 },
    lines: ['gate: 1e7 to drain', 'drain: 2e3 to 12 V', 'source: to 0 V'],
    expected: { I_D: 2.794004e-3, V_DS: 6.411991 },
    printed: { I_D: ['2.79', -3] },
  },
  {
    source: 'Sharma, Electronic Devices, example 5.36, p. 258',
    family: 'MOSFET',
    device: { beta: 0.2e-3, V_TO: 2 },
    lines: ['gate: 1e7 to drain', 'drain: 5e3 to 12 V', 'source: to 0 V'],
    expected: { I_D: 1.459688e-3, V_DS: 4.701562 },
    printed: { I_D: ['1.46', -3], V_DS: ['4.70', 0] },
  },
  {
    source: 'Neamen, Electronic Circuit Analysis and Design: depletion MOSFET at V_GS = 0',
    family: 'MOSFET',
    device: { beta: 0.1e-3, V_TO: -2 },
    lines: ['gate: to source', 'drain: to 5 V', 'source: 5e3 to 0 V'],
    expected: { I_D: 0.4e-3, V_DS: 3, V_DSsat: 2, region: 2 },
    printed: { I_D: ['0.40', -3], V_DS: ['3.00', 0], V_DSsat: ['2.00', 0] },
  },
  {
    source: 'Sharma, Electronic Devices, example 5.8, p. 235',
    family: 'MOSFET',
    channel: -1,
    device: { beta: 0.1e-3, V_TO: 1 },
    lines: ['gate: 33e3 to 6 V, 18e3 to 0 V', 'drain: 3e3 to 0 V', 'source: to 6 V'],
    expected: { I_D: 0.8307958e-3, V_GS: -3.882353, V_DS: -3.507612, V_DSsat: 2.882353 },
    printed: { I_D: ['0.83', -3], V_GS: ['-3.88', 0], V_DS: ['-3.51', 0], V_DSsat: ['2.88', 0] },
  },
  {
    source:
      'Neamen, Electronic Circuit Analysis and Design: p-channel divider that ends in the ohmic region (from memory)',
    family: 'MOSFET',
    channel: -1,
    device: { beta: 0.2e-3, V_TO: 0.8 },
    lines: ['gate: 50e3 to 5 V, 50e3 to 0 V', 'drain: 7.5e3 to 0 V', 'source: to 5 V'],
    expected: { I_D: 0.5148953e-3, V_DS: -1.138285, region: 1 },
    printed: { I_D: ['0.515', -3], V_DS: ['-1.14', 0] },
  },
  {
    source: 'Sharma, Electronic Devices, example 5.21, p. 249 (V_DS there from a rounded current)',
    family: 'MOSFET',
    channel: -1,
    device: { beta: 0.075e-3, V_TO: 0.8 },
    lines: ['gate: 100e3 to 10 V, 100e3 to 0 V', 'drain: 3e3 to 0 V', 'source: 6e3 to 10 V'],
    expected: { I_D: 0.34338e-3, V_DS: -6.90958, V_drain: 1.03014 },
    printed: { I_D: ['0.343', -3] },
  },
  {
    source: 'Neamen, Electronic Circuit Analysis and Design: common source on a current source',
    family: 'MOSFET',
    device: { beta: 1e-3, V_TO: 0.8 },
    lines: ['gate: 1e6 to 0 V, 1e-6 F to signal', 'drain: 7e3 to 5 V', 'source: 0.5e-3 A to -5 V, 1e-4 F to 0 V'],
    output: 'drain',
    expected: { V_GS: 1.507107, V_DS: 3.007107, g_m: Math.SQRT2 * 1e-3, A_v: -9.899495 },
    printed: { V_GS: ['1.51', 0], V_DS: ['3.01', 0], g_m: ['1.41', -3], A_v: ['-9.90', 0] },
  },
];

describe('a published stage', () => {
  for (const stage of STAGES) {
    it(`comes out as worked out: ${stage.source}`, () => {
      const { status, value } = lowerText(stage);
      expect(status).toBe(0);
      for (const [name, expected] of Object.entries(stage.expected)) {
        expect(Math.abs(value(name) - expected), name).toBeLessThanOrEqual(1e-6 * Math.abs(expected));
      }
      for (const [name, [digits, exponent]] of Object.entries(stage.printed ?? {})) {
        const decimals = digits.includes('.') ? digits.length - digits.indexOf('.') - 1 : 0;
        const half = 0.5 * 10 ** -decimals * (1 + 1e-9);
        expect(Math.abs(value(name) / 10 ** exponent - Number(digits)), `${name} as printed`).toBeLessThanOrEqual(half);
      }
    });
  }
});
