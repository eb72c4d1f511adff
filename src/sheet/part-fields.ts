// The fields of a part: what each is, for which families, and what may stand behind `at`.

import {
  CAPACITANCE,
  CONDUCTANCE,
  CURRENT,
  FREQUENCY,
  LENGTH,
  NOISE_VOLTAGE_DENSITY,
  PLAIN,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  ROOT_VOLTAGE,
  SQUARE_LAW_CONSTANT,
  TEMPERATURE_DIFFERENCE,
  TEMPERATURE_POINT,
  THERMAL_RESISTANCE,
  VOLTAGE,
  VOLTAGE_TEMPERATURE_COEFFICIENT,
} from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';

interface PartField {
  readonly kind: ValueKind;
  readonly families: readonly ('JFET' | 'MOSFET')[];
  /** What the field means, as a sentence. */
  readonly sentence: string;
  /** `law`: settles beta and V_TO; `model`: refines the law; `limit`: what the data sheet forbids; `later`: kept for analyses to come. */
  readonly role: 'law' | 'model' | 'limit' | 'later';
  /** May stand more than once. */
  readonly repeats?: true;
}

const BOTH = ['JFET', 'MOSFET'] as const;
const J = ['JFET'] as const;
const M = ['MOSFET'] as const;

/** Every field a part may have. */
export const PART_FIELDS: Readonly<Record<string, PartField>> = {
  I_DSS: field(CURRENT, BOTH, 'law', 'Drain current at V_GS = 0 in saturation.'),
  V_P: field(VOLTAGE, BOTH, 'law', 'Pinch-off voltage: V_GS at which the square law reaches 0.'),
  V_GSoff: field(VOLTAGE, BOTH, 'law', 'V_GS at which a small test current flows.'),
  beta: field(SQUARE_LAW_CONSTANT, J, 'law', 'Square-law constant: I_D = beta V_ov².'),
  V_TO: field(VOLTAGE, BOTH, 'law', 'Threshold as a model card writes it; negative for JFETs of both channels.'),
  g_fs0: field(CONDUCTANCE, J, 'law', 'Transconductance at V_GS = 0.'),
  g_fs: field(CONDUCTANCE, BOTH, 'law', 'Transconductance at a drain current.'),
  V_GSth: field(VOLTAGE, M, 'law', 'V_GS at a small test current; a test point, not the threshold of the square law.'),
  K: field(SQUARE_LAW_CONSTANT, M, 'law', 'Square-law constant: I_D = K V_ov².'),
  K_P: field(SQUARE_LAW_CONSTANT, M, 'law', 'Process constant: I_D = (K_P / 2)(W / L) V_ov².'),
  W: field(LENGTH, M, 'law', 'Channel width.'),
  L: field(LENGTH, M, 'law', 'Channel length.'),
  I_on: field(CURRENT, M, 'law', 'Drain current at a stated V_GS.'),
  R_DSon: field(RESISTANCE, BOTH, 'law', 'Resistance of the conducting channel at a stated V_GS.', true),
  lambda: field(RECIPROCAL_VOLTAGE, BOTH, 'model', 'Channel-length modulation.'),
  g_os: field(CONDUCTANCE, BOTH, 'model', 'Output conductance at I_D and V_DS; gives lambda.'),
  gamma: field(ROOT_VOLTAGE, M, 'model', 'Body-effect constant.'),
  phi: field(VOLTAGE, M, 'model', 'Surface potential of the body effect.'),
  r_s: field(RESISTANCE, BOTH, 'model', 'Resistance inside the source lead.'),
  r_d: field(RESISTANCE, BOTH, 'model', 'Resistance inside the drain lead.'),
  I_GSS: field(CURRENT, BOTH, 'model', 'Gate leakage at T_nom.'),
  doubling: field(TEMPERATURE_DIFFERENCE, BOTH, 'model', 'Temperature step that doubles the gate leakage.'),
  C_iss: field(CAPACITANCE, BOTH, 'model', 'Input capacitance, drain shorted to source for signals.'),
  C_rss: field(CAPACITANCE, BOTH, 'model', 'Reverse transfer capacitance.'),
  C_oss: field(CAPACITANCE, BOTH, 'model', 'Output capacitance.'),
  C_GS: field(CAPACITANCE, BOTH, 'model', 'Gate to source capacitance at 0 V.'),
  C_GD: field(CAPACITANCE, BOTH, 'model', 'Gate to drain capacitance at 0 V.'),
  C_DS: field(CAPACITANCE, BOTH, 'model', 'Drain to source capacitance at 0 V.'),
  PB: field(VOLTAGE, BOTH, 'model', 'Built-in potential of the junction law.'),
  M: field(PLAIN, BOTH, 'model', 'Grading exponent of the junction law.'),
  tempco: field(
    VOLTAGE_TEMPERATURE_COEFFICIENT,
    BOTH,
    'model',
    'Change of the threshold with temperature, in the frame of the n-channel FET.',
  ),
  beta_exponent: field(PLAIN, BOTH, 'model', 'Power of T / T_nom in beta.'),
  T_nom: field(TEMPERATURE_POINT, BOTH, 'model', 'Temperature at which the fields hold.'),
  R_thJA: field(THERMAL_RESISTANCE, BOTH, 'model', 'Thermal resistance from junction to ambient.'),
  f_corner: field(FREQUENCY, BOTH, 'later', 'Corner of the flicker noise at a drain current.'),
  e_n: field(NOISE_VOLTAGE_DENSITY, BOTH, 'later', 'Noise voltage density at a frequency.', true),
  tracking: field(PLAIN, BOTH, 'later', 'How far the two constants of the law go together from unit to unit, -1 to 1.'),
  matching: field(VOLTAGE, BOTH, 'later', 'Largest difference of V_GS between specimens at a drain current.'),
  V_DSmax: field(VOLTAGE, BOTH, 'limit', 'Largest drain to source voltage.'),
  V_DGmax: field(VOLTAGE, BOTH, 'limit', 'Largest drain to gate voltage.'),
  V_GSmax: field(VOLTAGE, BOTH, 'limit', 'Largest gate to source voltage.'),
  I_Dmax: field(CURRENT, BOTH, 'limit', 'Largest drain current.'),
  T_Jmax: field(TEMPERATURE_POINT, BOTH, 'limit', 'Highest junction temperature.'),
};

/** What may stand behind `at`. */
export const CONDITION_KINDS: Readonly<Record<string, ValueKind>> = {
  V_DS: VOLTAGE,
  V_GS: VOLTAGE,
  V_DG: VOLTAGE,
  I_D: CURRENT,
  f: FREQUENCY,
  T_A: TEMPERATURE_POINT,
  T_J: TEMPERATURE_POINT,
};

function field(
  kind: ValueKind,
  families: PartField['families'],
  role: PartField['role'],
  sentence: string,
  repeats?: true,
): PartField {
  return repeats ? { kind, families, sentence, role, repeats } : { kind, families, sentence, role };
}
