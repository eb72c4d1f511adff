// What stands in where a part says nothing. Each value in use is listed in the record as an assumption,
// with its sentence.

import type { Family } from './kinds.ts';

interface Default {
  /** SI, n-channel frame. */
  readonly value: number;
  /** SI unit in the sheet's spelling, `1` for a plain number. */
  readonly unit: string;
  readonly sentence: string;
}

const T_nom: Default = {
  value: 298.15,
  unit: 'K',
  sentence: 'Device data are taken to hold at 25 °C.',
};
const doubling: Default = {
  value: 10,
  unit: 'K',
  sentence: 'Gate leakage is taken to double every 10 K.',
};
const PB: Default = {
  value: 0.8,
  unit: 'V',
  sentence: 'The built-in potential of the junctions is taken as 0.8 V.',
};
const M: Default = {
  value: 0.5,
  unit: '1',
  sentence: 'The junctions are taken as abrupt: capacitance falls with the root of the voltage.',
};
const phi: Default = {
  value: 0.6,
  unit: 'V',
  sentence: 'The surface potential of the body effect is taken as 0.6 V.',
};

/** Fields that every family of FET has a default for. */
export type DefaultField = 'tempco' | 'beta_exponent' | 'n' | 'T_nom' | 'doubling' | 'PB' | 'M' | 'phi';

/** Defaults by family. Source: tempco, exponents and n: common practice; see the sentences. */
export const DEFAULTS: Readonly<Record<Family, Readonly<Record<DefaultField, Default>>>> = {
  JFET: {
    tempco: {
      value: -2.2e-3,
      unit: 'V/K',
      sentence: 'V_TO of a JFET is taken to move by −2.2 mV/K: |V_P| grows with heat.',
    },
    beta_exponent: {
      value: -2.1,
      unit: '1',
      sentence: 'beta of a JFET is taken to fall as T^−2.1; with −2.2 mV/K the drift is zero near V_ov = 0.63 V.',
    },
    n: {
      value: 1.1,
      unit: '1',
      sentence: 'The slope factor below pinch-off is taken as n = 1.1 for a JFET.',
    },
    T_nom,
    doubling,
    PB,
    M,
    phi,
  },
  MOSFET: {
    tempco: {
      value: -2e-3,
      unit: 'V/K',
      sentence: 'V_TO of a MOSFET is taken to move by −2 mV/K; a power part may move by three times as much.',
    },
    beta_exponent: {
      value: -1.5,
      unit: '1',
      sentence: 'beta of a MOSFET is taken to fall as T^−1.5; a power part falls faster.',
    },
    n: {
      value: 1.4,
      unit: '1',
      sentence: 'The slope factor below threshold is taken as n = 1.4 for a MOSFET.',
    },
    T_nom,
    doubling,
    PB,
    M,
    phi,
  },
};
