// Where each published MOSFET quantity stands in the sheet of its case.

import type { Comparison } from './comparison.ts';

/** By the id of the case; its sheet is sheets/<id>.txt. */
export const MOSFET_COMPARISONS: Readonly<Record<string, Comparison>> = {
  'nmos-bias-stability-vt': {
    quantities: { I_D_new: 'A2.I_D', change: 'change' },
    own: [
      { path: 'A1.I_D', value: 0.5, unit: 'mA', because: 'the design current' },
      { path: 'A1.V_source', value: 5, unit: 'V', because: 'as the example states' },
    ],
  },
  'nmos-dual-supply-design': {
    quantities: { V_GS: 'P1.V_GS', R_S: 'R_S', R_D: 'R_D' },
    own: [
      { path: 'A1.I_D', value: 0.4, unit: 'mA', because: 'the designed stage carries the wanted current' },
      { path: 'A1.V_drain', value: 0.5, unit: 'V', because: 'at the wanted drain voltage' },
    ],
  },
  'nmos-diode-connected-design': {
    quantities: { V_D: 'A1.V_drain', R: 'R_1' },
    own: [{ path: 'A1.I_D', value: 80, unit: 'uA', because: 'the designed stage carries the wanted current' }],
  },
  'nmos-divider-grounded-source': {
    quantities: { V_GS: 'A1.V_GS', I_D: 'A1.I_D', V_DS: 'A1.V_DS' },
  },
  'nmos-dual-supply-divider-design': {
    quantities: { V_GS: 'P1.V_GS', R_2: 'R_2', R_1: 'R_1' },
    own: [{ path: 'A1.I_D', value: 0.5, unit: 'mA', because: 'the designed stage carries the wanted current' }],
  },
  'nmos-diode-connected-resistor': {
    quantities: { V_GS: 'A1.V_GS', I_D: 'A1.I_D' },
    own: [
      {
        path: 'A2.I_D',
        value: 0.2134058,
        unit: 'mA',
        because: 'the resistor on the other side carries the same current',
      },
    ],
  },
  'nmos-dual-supply-4r-analysis': {
    quantities: { I_D: 'A1.I_D', V_GS: 'A1.V_GS', V_DS: 'A1.V_DS' },
    own: [{ path: 'A1.I_D', value: 1.3542486889354, unit: 'mA', because: '4 - sqrt(7)' }],
  },
  'nmos-4r-device-spread': {
    quantities: {
      A_I_D: 'A1.I_D',
      A_V_GS: 'A1.V_GS',
      A_V_DS: 'A1.V_DS',
      A_I_D_rejected_root: 'I_rejected',
      B_I_D: 'A2.I_D',
      B_V_GS: 'A2.V_GS',
      B_V_DS: 'A2.V_DS',
    },
  },
  'nmos-4r-from-idon': {
    quantities: { I_D: 'A1.I_D', V_GS: 'A1.V_GS', V_DS: 'A1.V_DS' },
  },
  'nmos-divider-200mA': {
    quantities: { V_GS: 'A1.V_GS', V_DS: 'A1.V_DS' },
  },
  'nmos-drain-feedback': {
    quantities: { I_D: 'A1.I_D', V_DS: 'A1.V_DS', I_D_rejected_root: 'I_rejected' },
  },
  'nmos-drain-feedback-2': {
    quantities: { I_D: 'A1.I_D', V_DS: 'A1.V_DS' },
  },
  'nmos-drain-feedback-alt-idon': {
    quantities: { V_GS: 'A1.V_GS', I_D: 'A1.I_D' },
  },
  'nmos-dual-supply-e24': {
    quantities: { R_D: 'R_D', R_S: 'R_S', I_D: 'A1.I_D', V_S: 'A1.V_source', V_D: 'A1.V_drain' },
    own: [{ path: 'R_S0', value: 6, unit: 'kohm', because: 'before rounding to the series' }],
  },
  'nmos-fixed-vgs-sensitivity': {
    quantities: { V_GS: 'P1.V_GS', change_I_D: 'change' },
  },
  'nmos-four-transistor-current-source': {
    quantities: { V_GS3: 'A1.M3.V_GS', V_GS1: 'A1.M1.V_GS', V_DS2: 'A1.M2.V_DS' },
    waits: { V_GS3: 'several FETs', V_GS1: 'several FETs', V_DS2: 'several FETs' },
    own: [{ path: 'A1.M1.I_D', value: 0.225, unit: 'mA', because: 'exactly' }],
  },
  'nmos-enhancement-load-inverter': {
    quantities: {
      'V_o at V_i=5': 'A1.M2.V_DS',
      'I_D at V_i=5': 'A1.M2.I_D',
      'region_M2 at 5': 'A1.M2.region',
      'V_o at V_i=1.5': 'A2.M2.V_DS',
      'I_D at V_i=1.5': 'A2.M2.I_D',
      'region_M2 at 1.5': 'A2.M2.region',
    },
    waits: {
      'V_o at V_i=5': 'several FETs',
      'I_D at V_i=5': 'several FETs',
      'region_M2 at 5': 'several FETs',
      'V_o at V_i=1.5': 'several FETs',
      'I_D at V_i=1.5': 'several FETs',
      'region_M2 at 1.5': 'several FETs',
    },
  },
  'nmos-depletion-zero-vgs': {
    quantities: { I_D: 'A1.I_D', V_DS: 'A1.V_DS', V_DS_sat: 'A1.V_DSsat', region: 'A1.region' },
  },
  'nmos-depletion-borderline-ohmic': {
    quantities: { I_D_if_saturated: 'P1.I_D', V_DS_if_saturated: 'V_DS1', V_DS_sat: 'A1.V_DSsat', region: 'A1.region' },
    own: [
      { path: 'A1.I_D', value: 0.7499270433, unit: 'mA', because: 'ohmic branch: y = 6 - 0.564 y (5 - y)' },
      { path: 'A1.V_DS', value: 2.475342897, unit: 'V', because: '25 mV inside the ohmic region' },
    ],
  },
  'nmos-depletion-divider': {
    quantities: { I_D: 'A1.I_D', V_DS: 'A1.V_DS' },
    own: [{ path: 'A1.V_gate', value: 1.5, unit: 'V', because: 'as the example states' }],
  },
  'dmos-transfer-both-signs': {
    quantities: {
      'I_D(-1 V)': 'P1.I_D',
      'I_D(-2 V)': 'P2.I_D',
      'I_D(0)': 'P3.I_D',
      'I_D(+1 V)': 'P4.I_D',
      'I_D(+2 V)': 'P5.I_D',
    },
  },
  'dmos-zero-bias': {
    quantities: { V_DS: 'A1.V_DS' },
  },
  'emos-k-from-idon': {
    quantities: { 'I_D(3 V)': 'P1.I_D', 'I_D(4.5 V)': 'P2.I_D' },
  },
  'pmos-divider-ends-ohmic': {
    quantities: {
      I_D_if_saturated: 'P1.I_D',
      V_SD_if_saturated: 'V_SD1',
      I_D_final: 'A1.I_D',
      V_SD_final: '-A1.V_DS',
      region: 'A1.region',
    },
  },
  'pmos-divider-saturated': {
    quantities: { V_SG: '-A1.V_GS', I_D: 'A1.I_D', V_SD: '-A1.V_DS', V_SD_sat: 'A1.V_DSsat' },
  },
  'pmos-4r': {
    quantities: { I_D: 'A1.I_D', V_DS: 'A1.V_DS', V_D: 'A1.V_drain', drop_R_S: 'V_RS' },
  },
  'pmos-dual-supply-design': {
    quantities: { V_SG: '-P1.V_GS', V_G: 'V_G1', R_1: 'R_1', R_S: 'R_S', V_D: 'A1.V_drain' },
    own: [{ path: 'A1.I_D', value: 100, unit: 'uA', because: 'the designed stage carries the wanted current' }],
  },
  'pmos-region-and-edge': {
    quantities: {
      'I_D(V_D=4)': 'P1.I_D',
      'region(V_D=4)': 'P1.region',
      'I_D(V_D=1.5)': 'P2.I_D',
      'region(V_D=1.5)': 'P2.region',
    },
  },
  'pmos-region-berkeley': {
    quantities: { I_SD: 'P1.I_D', region: 'P1.region' },
  },
  'nmos-ohmic-small-vds': {
    quantities: { I_D: 'P1.I_D', R_D: 'R_D', r_DS: 'r_DS1' },
    own: [
      { path: 'A1.V_DS', value: 0.1, unit: 'V', because: 'the designed stage stands at the wanted voltage' },
      { path: 'A1.region', value: 'ohmic', unit: '', because: 'as the example states' },
    ],
  },
  'nmos-process-and-rds': {
    quantities: { C_ox: 'C_ox', "k_n'": 'k_n', V_GS: 'P1.V_GS', V_DS_min: 'P1.V_DSsat', V_GS_c: 'V_GS2' },
    own: [{ path: 'P2.r_o', value: 1000, unit: 'ohm', because: 'the wanted resistance at very small V_DS' }],
  },
  'nmos-region-quiz': {
    quantities: {
      'v_o(0)': 'A0.V_drain',
      'region(0)': 'A0.region',
      'I_D(6)': 'A6.I_D',
      'v_o(6)': 'A6.V_drain',
      'region(6)': 'A6.region',
    },
  },
  'nmos-transfer-curve-and-limit': {
    quantities: {
      V_in_max_sat: 'V_inmax',
      'V_out(1.8)': 'A1.V_drain',
      'V_out(2.0)': 'A2.V_drain',
      'V_out(2.2)': 'A3.V_drain',
      'gain(1.8)': 'A1.A_v',
      'gain(2.0)': 'A2.A_v',
    },
    own: [
      { path: 'A4.V_drain', value: 1.129843788, unit: 'V', because: '10 = y + 5 y (2.7 - y)' },
      { path: 'A5.V_drain', value: 1, unit: 'V', because: '10 = y + 5 y (2.8 - y)' },
      { path: 'A6.region', value: 'saturation', unit: '', because: '1 mV below the edge' },
      { path: 'A7.region', value: 'ohmic', unit: '', because: '1 mV beyond it' },
    ],
  },
  'nmos-source-follower-large-signal': {
    quantities: {
      'V_out(2)': 'A2.V_source',
      'V_out(3)': 'A3.V_source',
      'rejected_root(2)': 'V_rejected',
      average_gain: 'slope',
    },
  },
  'body-effect-from-doping': {
    quantities: { phi_fp: 'phi_fp', C_ox: 'C_ox', delta_V_T: 'delta_V' },
  },
  'cs-max-swing-design': {
    quantities: { V_DS_sat: 'Pt.V_DSsat', V_DSQ: 'A1.V_DS', R_D: 'R_D', V_GSQ: 'A1.V_GS', R_1: 'R_1', R_2: 'R_2' },
    own: [{ path: 'A1.I_D', value: 0.5, unit: 'mA', because: 'the designed stage carries the wanted current' }],
  },
  'cs-divider-with-source-resistance': {
    quantities: {
      V_GSQ: 'A2.V_GS',
      I_DQ: 'A2.I_D',
      V_DSQ: 'A2.V_DS',
      g_m: 'A2.g_m',
      r_o: 'r_o1',
      R_i: 'A2.R_in',
      A_v: 'A1.A_v',
      R_o: 'A1.R_out',
    },
  },
  'cs-centred-design': {
    quantities: {
      V_DS_transition: 'Pt.V_DSsat',
      R_D: 'R_D',
      V_GSQ: 'A1.V_GS',
      R_1: 'R_1',
      R_2: 'R_2',
      g_m: 'A1.g_m',
      r_o: 'r_o1',
      A_v: 'A1.A_v',
    },
    own: [
      { path: 'A1.I_D', value: 2, unit: 'mA', because: 'the designed stage carries the wanted current' },
      { path: 'A1.V_DS', value: 7, unit: 'V', because: 'at the wanted voltage' },
    ],
  },
  'cs-current-source-bias': {
    quantities: { V_GSQ: 'A1.V_GS', V_DSQ: 'A1.V_DS', g_m: 'A1.g_m', A_v: 'A1.A_v' },
  },
  'source-follower': {
    quantities: {
      I_DQ: 'A1.I_D',
      V_GSQ: 'A1.V_GS',
      g_m: 'A1.g_m',
      r_o: 'r_o1',
      R_i: 'A2.R_in',
      A_v: 'A1.A_v',
      R_o: 'A1.R_out',
    },
  },
  'drain-feedback-amplifier': {
    quantities: { I_D: 'A0.I_D', V_D: 'A0.V_drain', A_v: 'A1.A_v', R_in: 'R_in1', v_i_max: 'v_i1' },
    own: [
      {
        path: 'A2.A_v',
        value: -3.287920921,
        unit: '1',
        because: 'with the current through R_G: (1/R_G - g_m)/(1/R + 1/R_G)',
      },
      { path: 'A2.R_in', value: 2.332132561, unit: 'Mohm', because: 'R_G / (1 - A_v)' },
    ],
  },
  'cs-power-emos': {
    quantities: { V_GS: 'A1.V_GS', g_m: 'A1.g_m', r_d: 'r_d', A_v: '-A1.A_v', v_out: 'v_out' },
  },
  'common-gate': {
    quantities: { A_v: 'A1.A_v', R_in: 'A1.R_in' },
  },
  'cascode-dc-design': {
    quantities: {
      V_S1: 'V_S1',
      V_GS: 'P1.V_GS',
      R_3: 'R_3',
      'R_2+R_3': 'R_23',
      R_1: 'R_1',
      R_2: 'R_2',
      R_D: 'R_D',
      g_m: 'P1.g_m',
      A_v: 'A1.A_v',
    },
    waits: { A_v: 'several FETs' },
  },
  'active-load-cmos-cs': {
    quantities: { g_m: 'A1.g_m', r_o: 'r_on', A_v: 'A1.A_v' },
  },
  'active-load-cmos-cs-2': {
    quantities: { g_m1: 'A1.g_m', r_o1: 'r_o1', r_o2: 'r_o2', A_v: 'A1.A_v', V_SG: '-P2.V_GS', V_OA: 'V_OA' },
  },
  'simple-current-mirror': {
    quantities: { V_O_min: 'P1.V_DSsat', r_o2: 'P2.r_o', 'delta_I_O per V': 'delta_I' },
    own: [{ path: 'A1.I_D', value: 100, unit: 'uA', because: 'the reference branch carries the wanted current' }],
  },
  'mirror-width-ratios': {
    quantities: { '(W/L)_2': 'ratio_2', '(W/L)_1': 'ratio_1', V_GS3: 'V_GS3', '(W/L)_3': 'ratio_3' },
    own: [{ path: 'P2.I_D', value: 0.1, unit: 'mA', because: 'the drawn device carries the wanted current' }],
  },
  'mos-diff-pair-dc': {
    quantities: {
      V_GS4: 'A4.V_GS',
      'I_1 = I_Q': 'I_Q',
      I_D1: 'A1.I_D',
      V_GS1: 'A1.V_GS',
      v_o1: 'A1.V_drain',
      V_cm_max: 'V_cmmax',
      V_cm_min: 'V_cmmin',
    },
  },
  'mos-diff-pair-gain-cmrr': {
    quantities: { R_o: 'R_o', A_d: 'A_d', CMRR: 'rejection' },
    own: [{ path: 'A2.A_v', value: -0.04683313924, unit: '1', because: '-g_m R_D / (1 + 2 g_m R_o)' }],
  },
  'cs-coupling-bypass-corners': {
    quantities: { C_S: 'C_S', C_C1: 'C_C1', C_C2: 'C_C2' },
  },
  'coupling-capacitor': {
    quantities: { tau: 'tau', C_C: 'C_C' },
  },
  'pmos-cs-load-capacitor': {
    quantities: { g_m: 'A1.g_m', tau_P: 'tau_P', f_H: 'f_H', A_v_max: '-A1.A_v' },
  },
  'f-t-and-miller': {
    quantities: { g_m: 'P1.g_m', f_T: 'P1.f_T', C_M: 'C_M', f_with_Miller: 'f_M' },
  },
  'miller-theorem': {
    quantities: { Z_1: 'Z_1', Z_2: 'Z_2', 'V_o/V_sig': 'gain_2', f_3dB: 'f_3dB' },
  },
  'resistor-noise': {
    quantities: {
      'P_n(1)': 'P_n',
      'E_n(1)': 'E_a',
      'E_n(20k)': 'E_b',
      'E_n(50k)': 'E_c',
      'E_n(series)': 'E_s',
      'E_n(parallel)': 'E_p',
    },
  },
  'resistor-noise-100k': {
    quantities: { E_n: 'E_1' },
  },
  'noise-power-and-voltage': {
    quantities: { P_n: 'P_1', V_n: 'V_n' },
  },
  'kt-over-c-and-4ktr-reference': {
    quantities: { 'v_n(1 pF)': 'v_1', 'e_n(1 kohm)': 'e_1' },
  },
  'channel-thermal-noise-formula': {
    quantities: { 'ln(f_hi/f_lo)': 'span' },
    own: [
      { path: 'e_1', value: 3.323430758, unit: 'nV/sqrt(Hz)', because: 'sqrt(8 k T / (3 g_m)), not published' },
      { path: 'i_2', value: 3.321768627, unit: 'nA', because: 'over the band, not published' },
    ],
  },
  'thermal-derating-and-heatsink': {
    quantities: {
      theta_JA: 'theta_JA',
      'P_Dmax(50 C)': 'P_50',
      'T_J(1 W, 25 C)': 'P1.T_J',
      'P_Dmax(heat sink)': 'P_sink',
      'P_Dmax(infinite sink)': 'P_infinite',
    },
  },
};
