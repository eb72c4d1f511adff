import { describe, expect, it } from 'vitest';
import {
  DEFAULTS,
  FORMS,
  ROUTES,
  channelCurrent,
  channelRegion,
  devicePoint,
  leakageAt,
  transconductance,
  zeroDriftDrive,
} from '../../src/fet/index.ts';
import type { ChannelSign } from '../../src/fet/index.ts';
import { call } from './call.ts';

/**
 * One published number: what it is, the digits as printed, ours in the same unit, and how far the two may lie apart
 * (half of the last printed digit unless the source rounds early or cuts, as its row says).
 */
interface Row {
  readonly source: string;
  readonly what: string;
  readonly printed: string;
  readonly ours: number;
  readonly allowance?: number;
}

const law = (id: string, values: Record<string, number>): Record<string, number> => {
  const found = ROUTES.find((route) => route.id === id);
  if (!found) throw new RangeError(id);
  return call(found, { channel: 1, lambda: 0, n: 1.1, T_nom: 298.15, r_s: 0, r_d: 0, ...values });
};
const form = (field: string, values: Record<string, number>): number =>
  call(FORMS[field], { channel: 1, lambda: 0, n: 1.1, T_nom: 298.15, r_s: 0, r_d: 0, ...values })['value'];
const I_DSS_V_P = (current: number, pinchOff: number): { beta: number; V_TO: number } => {
  const { beta, V_TO } = law('I_DSS with V_P of a JFET or MOSFET', { I_DSS: current, V_P: pinchOff });
  return { beta, V_TO };
};
/** Drain current in saturation at V_GS, in A. */
const saturated = ({ beta, V_TO }: { beta: number; V_TO: number }, vgs: number): number =>
  channelCurrent(beta, 0, vgs - V_TO, 100);

const MALVINO_GM = law('g_fs0 with I_DSS of a JFET', { g_fs0: 5000e-6, I_DSS: 5e-3 });
const NOTES_8 = I_DSS_V_P(10e-3, -4);
const NOTES_12 = I_DSS_V_P(8e-3, -4);
const FLOYD_DMOS = I_DSS_V_P(10e-3, -8);
const MALVINO_DMOS = I_DSS_V_P(6e-3, -3);
const MALVINO_EMOS = law('I_on with V_TO of a MOSFET', { I_on: 0.6, 'I_on@V_GS': 4.5, V_TO: 2.1 });
const SHARMA = law('I_on with V_TO of a MOSFET', { I_on: 3e-3, 'I_on@V_GS': 10, V_TO: 5 });
const SEDRA_4_1 = law('K_P with V_TO of a MOSFET', { K_P: 194.0625e-6, W: 8e-6, L: 0.8e-6, V_TO: 0.7 });
const SEDRA_4_4 = law('K_P with V_TO of a MOSFET', { K_P: 1e-3, V_TO: 1 });

const FLOYD = 'T. L. Floyd, Electronic Devices, 7th ed. (textbook companion, page not seen)';
const MALVINO = 'A. Malvino and D. Bates, Electronic Principles (textbook companion, page not seen)';
const NOTES = 'Italian school study notes on JFETs (page read whole)';
const SEDRA = 'A. S. Sedra and K. C. Smith, Microelectronic Circuits (textbook companion, page not seen)';

const ROWS: readonly Row[] = [
  { source: `${MALVINO}, Ex. 13-12`, what: 'V_GSoff, V', printed: '-2.0', ours: MALVINO_GM['V_TO'] },
  {
    source: `${MALVINO}, Ex. 13-12`,
    what: 'g_m at V_GS = -1 V, uS',
    printed: '2500',
    ours: 1e6 * transconductance(MALVINO_GM['beta'], 0, -1 - MALVINO_GM['V_TO'], 100),
  },
  {
    source: `${NOTES}, 8`,
    what: 'V_GS at 4 mA, V',
    printed: '-1.47',
    ours: NOTES_8.V_TO + Math.sqrt(4e-3 / NOTES_8.beta),
  },
  {
    source: `${NOTES}, 8`,
    what: 'g_m at 4 mA, mS',
    printed: '3.16',
    ours: 1e3 * form('g_fs', { ...NOTES_8, 'g_fs@I_D': 4e-3 }),
  },
  {
    source: `${NOTES}, 12`,
    what: 'I_D at V_P + 0.7 V, mA',
    printed: '0.245',
    ours: 1e3 * saturated(NOTES_12, -3.3),
  },
  {
    source: 'J. Millman and C. C. Halkias, Integrated Electronics (from memory)',
    what: 'V_ov without drift at 300 K, V',
    printed: '0.63',
    ours: zeroDriftDrive(DEFAULTS.JFET.tempco.value, DEFAULTS.JFET.beta_exponent.value, 300),
  },
  {
    source:
      '2N5457 data sheets: I_GSS 1.0 nA at 25 degC, 200 nA at 100 degC; guaranteed limits, off 9.5 % from doubling',
    what: 'I_GSS at 100 degC, nA',
    printed: '200',
    ours: 1e9 * leakageAt(1e-9, DEFAULTS.JFET.doubling.value, 373.15, 298.15),
    allowance: 19,
  },
  { source: `${FLOYD}, Ex. 7-13`, what: 'I_D at -3 V, mA', printed: '3.906', ours: 1e3 * saturated(FLOYD_DMOS, -3) },
  { source: `${FLOYD}, Ex. 7-13`, what: 'I_D at +3 V, mA', printed: '18.906', ours: 1e3 * saturated(FLOYD_DMOS, 3) },
  {
    source: `${FLOYD}, Ex. 7-15: V_GS = 0, 620 ohm from 18 V`,
    what: 'V_DS, V',
    printed: '10.56',
    ours: 18 - 620 * saturated(I_DSS_V_P(12e-3, -4), 0),
  },
  { source: `${MALVINO}, Ex. 14-1`, what: 'I_D at -1 V, mA', printed: '2.67', ours: 1e3 * saturated(MALVINO_DMOS, -1) },
  { source: `${MALVINO}, Ex. 14-1`, what: 'I_D at -2 V, mA', printed: '0.67', ours: 1e3 * saturated(MALVINO_DMOS, -2) },
  { source: `${MALVINO}, Ex. 14-1`, what: 'I_D at 0, mA', printed: '6.0', ours: 1e3 * saturated(MALVINO_DMOS, 0) },
  { source: `${MALVINO}, Ex. 14-1`, what: 'I_D at +1 V, mA', printed: '10.67', ours: 1e3 * saturated(MALVINO_DMOS, 1) },
  { source: `${MALVINO}, Ex. 14-1`, what: 'I_D at +2 V, mA', printed: '16.67', ours: 1e3 * saturated(MALVINO_DMOS, 2) },
  {
    source: `${MALVINO}, Ex. 14-13; exactly 84.375, cut in print`,
    what: 'I_D at 3 V, mA',
    printed: '84.37',
    ours: 1e3 * form('I_on', { beta: MALVINO_EMOS['beta'], V_TO: 2.1, 'I_on@V_GS': 3 }),
  },
  {
    source: `${MALVINO}, Ex. 14-13`,
    what: 'I_D at 4.5 V, mA',
    printed: '600.0',
    ours: 1e3 * form('I_on', { beta: MALVINO_EMOS['beta'], V_TO: 2.1, 'I_on@V_GS': 4.5 }),
  },
  {
    source: 'S. Sharma, Electronic Devices, Ex. 5.4 (companion)',
    what: 'K, mA/V^2',
    printed: '0.12',
    ours: 1e3 * SHARMA['beta'],
  },
  {
    source: `${SEDRA}, Ex. 4.1 b: 100 uA`,
    what: 'V_GS, V',
    printed: '1.02',
    ours: 0.7 + Math.sqrt(100e-6 / SEDRA_4_1['beta']),
  },
  {
    source: `${SEDRA}, Ex. 4.1 c: 1 kohm; printed 1.22, exactly 1.2153`,
    what: 'V_GS, V',
    printed: '1.22',
    ours: 0.7 + 1 / (2 * SEDRA_4_1['beta'] * 1000),
  },
  {
    source: `${SEDRA}, Ex. 4.4: V_GS = 5 V, V_DS = 0.1 V`,
    what: 'I_D, mA',
    printed: '0.395',
    ours: 1e3 * channelCurrent(SEDRA_4_4['beta'], 0, 4, 0.1),
  },
  {
    source: `${SEDRA}, Ex. 4.4: V_DS / I_D`,
    what: 'r_DS, ohm',
    printed: '253',
    ours: form('R_DSon', { beta: SEDRA_4_4['beta'], V_TO: 1, 'R_DSon@V_GS': 5, 'R_DSon@I_D': 0.395e-3 }),
  },
  {
    source: `${NOTES}, 10: r_DS(on) = 50 ohm and V_P = -4 V, at V_GS = -2 V`,
    what: 'r_DS, ohm',
    printed: '100',
    ours: form('R_DSon', { ...pick(law('R_DSon with V_P of a JFET', { R_DSon: 50, V_P: -4 })), 'R_DSon@V_GS': -2 }),
  },
  {
    source: 'onsemi J111/J112 data sheet, figure 10: typical curves of real parts, 15 % off; V_P / I_DSS would give 88',
    what: 'r_DS of 25 mA, -2.2 V, ohm',
    printed: '52',
    ours: form('R_DSon', I_DSS_V_P(25e-3, -2.2)),
    allowance: 8.1,
  },
  {
    source: 'onsemi J111/J112 data sheet, figure 10: typical curves of real parts, 7 % off; V_P / I_DSS would give 64',
    what: 'r_DS of 75 mA, -4.8 V, ohm',
    printed: '30',
    ours: form('R_DSon', I_DSS_V_P(75e-3, -4.8)),
    allowance: 2.1,
  },
];

function pick({ beta, V_TO }: Record<string, number>): { beta: number; V_TO: number } {
  return { beta, V_TO };
}

describe('published device relations', () => {
  let compared = 0;
  it.each(ROWS)('$source: $what = $printed', ({ printed, ours, allowance }) => {
    const places = printed.split('.')[1]?.length ?? 0;
    expect(Math.abs(ours - Number(printed))).toBeLessThanOrEqual((allowance ?? 0.5 * 10 ** -places) * (1 + 1e-9));
    compared++;
  });

  it('compared every row', () => {
    expect(compared).toBe(ROWS.length);
  });

  it('names the region that published region exercises name', () => {
    const at = (channel: ChannelSign, beta: number, vto: number, vgs: number, vds: number): [number, string] => {
      const out = new Float64Array(7);
      devicePoint(out, 0, channel, { beta, vto, lambda: 0, gamma: 0, phi: 0.6 }, vgs, vds, 0);
      return [Number(out[0].toPrecision(6)), ['cutoff', 'ohmic', 'saturation'][out[6]]];
    };
    // University exercise (excerpt seen): k_p = 80 uA/V^2 with I_D = k_p V_ov^2 / 2, V_tp = -1.5 V, V_G = 0, V_S = 5 V.
    expect(at(-1, 40e-6, 1.5, -5, -1)).toEqual([240e-6, 'ohmic']);
    expect(at(-1, 40e-6, 1.5, -5, -3.5)).toEqual([490e-6, 'saturation']);
    // UC Berkeley EE105, fall 2005, discussion 5 (excerpt seen): K_p = 100 uA/V^2, W/L = 5, V_T = -0.8 V.
    expect(at(-1, 250e-6, 0.8, -2, -3)).toEqual([360e-6, 'saturation']);
    // UC San Diego quiz 2, fall 2009 (excerpt seen): k'(W/L) = 0.8 mA/V^2, V_t = 2 V; v_i = 0, then 6 V with V_DS = 5.6 V.
    expect(at(1, 0.4e-3, 2, 0, 12)).toEqual([0, 'cutoff']);
    expect(at(1, 0.4e-3, 2, 6, 5.6)).toEqual([6.4e-3, 'saturation']);
    // S. Sharma, Ex. 5.17 (companion): depletion, k = 0.12 mA/V^2, V_T = -2.5 V; ohmic by 25 mV.
    expect(channelRegion(2.5, 2.475)).toBe(1);
  });
});
