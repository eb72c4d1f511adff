// Where each published JFET quantity stands in the sheet of its case.

import type { Comparison } from './comparison.ts';

/** By the id of the case; its sheet is sheets/<id>.txt. */
export const JFET_COMPARISONS: Readonly<Record<string, Comparison>> = {
  'fixed-edutecnica-J1': {
    quantities: { ID: 'A1.I_D', VDS: 'A1.V_DS' },
  },
  'fixed-bell-10.4': {
    quantities: { IDmin: 'Pmin.I_D' },
    own: [
      {
        path: 'Pmax.I_D',
        value: 3.042222222,
        unit: 'mA',
        because: 'the maximum device at the same gate voltage, 8 mA (1 - 2.3/6)^2',
      },
    ],
  },
  'fixed-boylestad-7.1': {
    quantities: { ID: 'P1.I_D', VDS: 'V_DS1' },
    own: [
      { path: 'A1.region', value: 'ohmic', unit: '', because: '4.75 V is below V_DSsat = 6 V' },
      { path: 'A1.V_DS', value: 5.038750305, unit: 'V', because: 'ohmic branch: y = 16 - 0.3125 y (12 - y)' },
    ],
  },
  'self-edutecnica-J2-design': {
    quantities: { RS: 'R_S', RD: 'R_D' },
    own: [
      { path: 'A1.I_D', value: 5, unit: 'mA', because: 'the designed stage carries the wanted current' },
      { path: 'A1.V_DS', value: 10, unit: 'V', because: 'and stands at the wanted voltage' },
    ],
  },
  'self-edutecnica-J4-design': {
    quantities: { RS: 'R_S', RD: 'R_D' },
    own: [
      { path: 'A1.I_D', value: 5, unit: 'mA', because: 'the designed stage carries the wanted current' },
      { path: 'A1.V_DS', value: 8, unit: 'V', because: 'and stands at the wanted voltage' },
    ],
  },
  'self-floyd-8.4': {
    quantities: { ID: 'A1.I_D', VD: 'A1.V_drain', gm: 'A1.g_m', vout_pp: 'v_pp', vout_rms_loaded: 'v_rms' },
  },
  'self-boylestad-7.2': {
    quantities: { ID: 'A1.I_D', VGS: 'A1.V_GS', VDS: 'A1.V_DS', VD: 'A1.V_drain' },
  },
  'self-it-notes-1': {
    quantities: { ID: 'A1.I_D', VGS: 'A1.V_GS', VDS: 'A1.V_DS' },
  },
  'self-bell-10.8-design': {
    quantities: { RD: 'R_D', RD_gatebias: 'R_D0' },
    own: [
      { path: 'R_S1', value: 775.2551286, unit: 'ohm', because: '6 V (1 - sqrt(3/8)) / 3 mA' },
      { path: 'Amin.I_D', value: 1.509348237, unit: 'mA', because: 'root of I = 4 mA (1 - 766.667 ohm I / 3 V)^2' },
    ],
  },
  'self-bell-10.12-universal': {
    quantities: { 'ID/IDSS': 'ratio', VDS: 'A1.V_DS' },
  },
  'self-floyd-7.8-p-design': {
    quantities: { ID: 'P1.I_D', RS: 'R_S' },
  },
  'self-floyd-7.9-midpoint': {
    quantities: { RS: 'R_S', RD: 'R_D' },
    own: [
      { path: 'A1.I_D', value: 6, unit: 'mA', because: 'the designed stage carries half of I_DSS' },
      { path: 'A1.V_drain', value: 6, unit: 'V', because: 'and its drain stands at half of the supply' },
    ],
  },
  'self-floyd-2N5457-rs-range': {
    quantities: { RS_from_min: 'R_S1', RS_from_max: 'R_S2' },
    own: [
      {
        path: 'Amin.I_D',
        value: 0.2845134189,
        unit: 'mA',
        because: 'drawn, not printed: I = 1 mA (1 - 820 ohm I / 0.5 V)^2',
      },
      {
        path: 'Amax.I_D',
        value: 2.326203394,
        unit: 'mA',
        because: 'drawn, not printed: I = 5 mA (1 - 820 ohm I / 6 V)^2',
      },
    ],
  },
  'self-malvino-13-7-spread': {
    quantities: {
      IDmin: 'Amin.I_D',
      VGSmin: 'Amin.V_GS',
      IDmax: 'Amax.I_D',
      VGSmax: 'Amax.V_GS',
      RSlow: 'R_S1',
      RShigh: 'R_S2',
    },
  },
  'vdiv-it-notes-6': {
    quantities: { ID: 'A1.I_D', VGS: 'A1.V_GS', VDS: 'A1.V_DS', gm: 'A1.g_m', Av: 'A1.A_v', VDSsat: 'A1.V_DSsat' },
  },
  'vdiv-boylestad-7.5': {
    quantities: { ID: 'A1.I_D', VGS: 'A1.V_GS', VD: 'A1.V_drain', VS: 'A1.V_source', VDS: 'A1.V_DS' },
  },
  'vdiv-floyd-7.11': {
    quantities: { ID: 'I_D1', VGS: 'V_GS1' },
    own: [
      { path: 'A1.V_drain', value: 7, unit: 'V', because: 'the circle closes' },
      { path: 'A1.V_GS', value: -1.7948717949, unit: 'V', because: '12 V / 7.8 - 2.2 kohm 5 V / 3.3 kohm' },
    ],
  },
  'vdiv-bell-10.9-design': {
    quantities: { R1: 'R_1' },
    own: [
      { path: 'A1.I_D', value: 3, unit: 'mA', because: 'the maximum device carries the wanted current' },
      { path: 'A1.V_DS', value: 10, unit: 'V', because: 'at the wanted voltage' },
    ],
  },
  'vdiv-bell-10.13-universal': {
    quantities: { 'ID/IDSS': 'ratio', VDS: 'A1.V_DS' },
  },
  'vdiv-p-60V': {
    quantities: { ID: '-A1.I_D', VGS: 'A1.V_GS', VDS: 'A1.V_DS' },
  },
  'vdiv-dual-neamen-3.20': {
    quantities: { VGS: 'P1.V_GS', VG: 'V_G1', R2: 'R_2', R1: 'R_1', RD: 'R_D' },
    own: [
      { path: 'A1.I_D', value: 5, unit: 'mA', because: 'the designed stage carries the wanted current' },
      { path: 'A1.V_DS', value: 5, unit: 'V', because: 'at the wanted voltage' },
    ],
  },
  'dual-malvino-13-10': {
    quantities: { ID: 'A1.I_D', VD: 'A1.V_drain' },
  },
  'cc-bell-10.11-bjt': {
    quantities: { RD: 'R_D' },
    own: [
      { path: 'A1.V_DS', value: 9, unit: 'V', because: 'the designed stage stands at the wanted voltage' },
      { path: 'A1.V_GS', value: -4.630587414, unit: 'V', because: '-8 V (1 - sqrt(2.838235/16))' },
    ],
  },
  'cc-malvino-13-11-bjt': {
    quantities: { ID: 'A1.I_D', VD: 'A1.V_drain' },
  },
  'cc-neamen-p': {
    quantities: { VGS: 'A1.V_GS', VS: 'A1.V_source', VD: 'A1.V_drain', VSD: '-A1.V_DS', VSDsat: 'A1.V_DSsat' },
  },
  'csrc-led-5mA': {
    quantities: { RS: 'R_S' },
    own: [{ path: 'A1.I_D', value: 5, unit: 'mA', because: 'the source delivers the wanted current' }],
  },
  'cg-boylestad-bias': {
    quantities: { ID: 'A1.I_D', VGS: 'A1.V_GS', VD: 'A1.V_drain', VDS: 'A1.V_DS' },
  },
  'cg-bell-11.5': {
    quantities: { Av_overall: 'A1.A_v' },
    own: [
      {
        path: 'A2.A_v',
        value: 12.88848263,
        unit: '1',
        because: 'from the source terminal: 3 mS (4.7 kohm || 50 kohm)',
      },
      { path: 'A2.R_in', value: 302.7522936, unit: 'ohm', because: '3.3 kohm || 333.33 ohm' },
    ],
  },
  'cg-floyd-8.10': {
    quantities: { Av: 'A1.A_v', Rin: 'A1.R_in' },
  },
  'cs-bell-11.2': {
    quantities: { Zi: 'A1.R_in', Zo: 'A1.R_out', Av: 'A1.A_v' },
    own: [{ path: 'A1.I_D', value: 1.5, unit: 'mA', because: 'the bias stands where the data are stated' }],
  },
  'cs-floyd-8.1-8.3': {
    quantities: { Av1: '-A1.A_v', Av2: '-A2.A_v', Av3: '-A3.A_v' },
  },
  'cs-boylestad-unbypassed': {
    quantities: { gm: 'A1.g_m', Av: 'A1.A_v', Av_no_rd: 'A2.A_v' },
  },
  'cs-boylestad-gain-design': {
    quantities: { RS: 'R_S', RD_a: 'R_Da', RD_b: 'R_Db' },
    own: [
      { path: 'A1.A_v', value: -8, unit: '1', because: 'the wanted gain' },
      { path: 'A2.A_v', value: -8, unit: '1', because: 'the wanted gain, on a supply of 40 V' },
    ],
  },
  'cs-bell-11.3-flag': {
    quantities: { Av: 'A_v0' },
    own: [
      { path: 'A1.A_v', value: -1.158889678, unit: '1', because: '-g_m R / (1 + g_m R_S) with R = R_D || R_L' },
      { path: 'A2.A_v', value: -1.152870348, unit: '1', because: '-g_m R / (1 + g_m R_S + (R + R_S) y_os)' },
      { path: 'A2.R_out', value: 4684.530812, unit: 'ohm', because: '4.7 kohm || 1.4233 Mohm' },
    ],
  },
  'cd-bell-11.4': {
    quantities: { Av: 'A1.A_v' },
    own: [{ path: 'A1.R_in', value: 600, unit: 'kohm', because: '1.5 Mohm || 1 Mohm' }],
  },
  'cd-malvino-13-14-16': {
    quantities: { Av14: 'A14.A_v', Av15: 'A15.A_v', Av16: 'A16.A_v' },
  },
  'dmos-floyd-7.13-7.15': {
    quantities: { ID_m3: 'Pm3.I_D', ID_p3: 'Pp3.I_D', VDS15: 'A15.V_DS' },
  },
  'gm-malvino-13-12': {
    quantities: { VGSoff: 'V_GSoff1', gm: 'P1.g_m' },
  },
  'gm-it-notes-8': {
    quantities: { VGS: 'P1.V_GS', gm: 'P1.g_m' },
  },
  'sat-floyd-7.1': {
    quantities: { VDDmin: 'V_DDmin' },
    own: [
      { path: 'A1.region', value: 'saturation', unit: '', because: '10 mV above the least supply' },
      { path: 'A2.region', value: 'ohmic', unit: '', because: '10 mV below it' },
    ],
  },
  'rin-floyd-8.6': {
    quantities: { Rin: 'A1.R_in' },
  },
  'hf-bell-11.7-miller': {
    quantities: { f2: 'f_2' },
    own: [{ path: 'C_in', value: 14.48509485, unit: 'pF', because: '4 pF + (1 + 9.48508) 1 pF' }],
  },
  'hf-boylestad-corners': {
    quantities: { Ci: 'C_i', fHi: 'f_Hi', Co: 'C_o', fHo: 'f_Ho' },
    own: [{ path: 'A1.g_m', value: 2, unit: 'mS', because: 'V_GS = -2 V on the bias line of 1 kohm' }],
  },
  'cap-bell-12.5-design': {
    quantities: { C3: 'C_3' },
    own: [
      { path: 'C_2', value: 9.549296586, unit: 'uF', because: '6 mS / (2 pi 100 Hz)' },
      { path: 'C_1', value: 19.28773479, unit: 'nF', because: '10 / (2 pi 100 Hz (824.561 kohm + 0.6 kohm))' },
    ],
  },
  'vcr-it-notes-10': {
    quantities: { r_half: 'A2.r_o', vout0: 'v_0', vout_half: 'v_half' },
  },
  'switch-bell-10.16': {
    quantities: { Vi: 'V_i' },
    own: [
      { path: 'R_D', value: 1.5, unit: 'kohm', because: '12 V / 8 mA' },
      { path: 'A0.region', value: 'cutoff', unit: '', because: '1 V beyond V_GS(off)' },
      { path: 'A0.V_drain', value: 12, unit: 'V', because: 'the switch is open' },
    ],
  },
  'rds-J112-datasheet': {
    quantities: { r_low: 'Plow.r_o', r_high: 'Phigh.r_o' },
  },
  'ztc-063-theory': {
    quantities: { Vov_ztc: 'V_ov1' },
    own: [
      {
        path: 'steady',
        value: true,
        unit: '',
        because: 'at that V_ov the current does not move with temperature, 1.4 V above it it does',
      },
    ],
  },
  'ztc-it-notes-12': {
    quantities: { VGS: 'P1.V_GS', ID: 'P1.I_D' },
  },
  'igss-2N5457-doubling': {
    quantities: { IGSS100: 'P1.I_G' },
  },
  'thermal-J111-philips': {
    quantities: { TJmax: 'P1.T_J' },
    own: [{ path: 'P1.P_D', value: 400, unit: 'mW', because: 'the rating' }],
  },
  'thermal-PN4391-philips': {
    quantities: { TJmax: 'P1.T_J' },
  },
  'thermal-2N5457-onsemi': {
    quantities: { TJmax: 'P1.T_J' },
  },
  'diff-neamen-P11.54': {
    quantities: { gf_max: 'g_f', vd_switch: 'v_d' },
  },
};
