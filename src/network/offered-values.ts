// The one table of what a stage and a point offer: name, unit, whose it is, how it is set, what it means.
// V_<place> stands for one value per place: V_drain, V_out.

/** `K` is a point of the temperature scale here; `region` a code of `REGIONS`. */
export type OfferedUnit = 'A' | 'V' | 'S' | 'ohm' | '1' | 'K' | 'W' | 'F' | 'Hz' | 'region';

/** One row of the table. */
export interface OfferedValue {
  readonly name: string;
  readonly unit: OfferedUnit;
  /** Whose it is: one per FET, one per place (then `name` is the prefix `V_`), or one per stage. */
  readonly per: 'fet' | 'place' | 'stage';
  /** A point offers it too. */
  readonly point: boolean;
  /** Symbol in TeX. */
  readonly tex: string;
  readonly sentence: string;
  /** Not computed yet. */
  readonly later?: true;
}

/** Everything that a stage or a point offers, in the order in which it is shown. */
export const OFFERED_VALUES: readonly OfferedValue[] = [
  fet(
    'I_D',
    'A',
    'I_\\mathrm{D}',
    'Drain current, positive from drain to source in an n-channel FET, from source to drain in a p-channel FET.',
  ),
  fet('V_GS', 'V', 'V_\\mathrm{GS}', 'Gate to source voltage, as a difference of node voltages.'),
  fet('V_DS', 'V', 'V_\\mathrm{DS}', 'Drain to source voltage, as a difference of node voltages.'),
  fet('V_SB', 'V', 'V_\\mathrm{SB}', 'Source to bulk voltage, as a difference of node voltages.'),
  fet('V_ov', 'V', 'V_\\mathrm{ov}', 'Gate voltage beyond the threshold, in the sense of the device.'),
  fet(
    'V_DSsat',
    'V',
    'V_\\mathrm{DSsat}',
    'Drain to source voltage at which saturation begins, in the sense of the device.',
  ),
  fet(
    'margin',
    'V',
    '\\mathrm{margin}',
    'Drain to source voltage beyond the onset of saturation; in cutoff the missing gate voltage, negative.',
  ),
  fet('region', 'region', '\\mathrm{region}', 'Cutoff, ohmic or saturation.'),
  fet('g_m', 'S', 'g_\\mathrm{m}', 'Transconductance at the terminals, dI_D/dV_GS.'),
  fet('g_ds', 'S', 'g_\\mathrm{ds}', 'Output conductance at the terminals, dI_D/dV_DS.'),
  fet('r_o', 'ohm', 'r_\\mathrm{o}', 'Output resistance, 1/g_ds.'),
  fet('g_mb', 'S', 'g_\\mathrm{mb}', 'Transconductance from the bulk, at the terminals.'),
  fet('I_G', 'A', 'I_\\mathrm{G}', 'Gate leakage at the junction temperature.'),
  fet('C_gs', 'F', 'C_\\mathrm{gs}', 'Gate to source capacitance at the operating point.'),
  fet('C_gd', 'F', 'C_\\mathrm{gd}', 'Gate to drain capacitance at the operating point.'),
  fet('P_D', 'W', 'P_\\mathrm{D}', 'Power dissipated in the FET at rest.'),
  fet('T_J', 'K', 'T_\\mathrm{J}', 'Junction temperature.'),
  fet('f_T', 'Hz', 'f_\\mathrm{T}', 'Frequency at which the current gain is 1, from g_m, C_gs and C_gd.'),
  {
    name: 'V_',
    unit: 'V',
    per: 'place',
    point: false,
    tex: 'V',
    sentence: 'Voltage of the place against 0 V, at rest.',
  },
  stage(
    'A_v',
    '1',
    'A_\\mathrm{v}',
    'Voltage gain from the test source to the output at midband, with what hangs at load.',
  ),
  stage('R_in', 'ohm', 'R_\\mathrm{in}', 'Resistance that the test source sees at midband.'),
  stage('R_out', 'ohm', 'R_\\mathrm{out}', 'Resistance at the output at midband, without what hangs at load.'),
  {
    ...stage('f_low', 'Hz', 'f_\\mathrm{low}', 'Frequency below midband at which the gain is 3 dB down.'),
    later: true,
  },
  {
    ...stage('f_high', 'Hz', 'f_\\mathrm{high}', 'Frequency above midband at which the gain is 3 dB down.'),
    later: true,
  },
  stage(
    'swing_up',
    'V',
    '\\hat{v}_\\mathrm{up}',
    'Largest upward peak at the output before the FET leaves saturation or its gate conducts.',
  ),
  stage(
    'swing_down',
    'V',
    '\\hat{v}_\\mathrm{down}',
    'Largest downward peak at the output before the FET leaves saturation or its gate conducts.',
  ),
  stage('P_total', 'W', 'P_\\mathrm{total}', 'Power delivered by all rails and sources at rest.'),
];

/** The names of the region codes: `REGIONS[code]`. */
export const REGIONS = ['cutoff', 'ohmic', 'saturation'] as const;

/** The row of an offered name; a name that begins with `V_` and is no other row's is that of a place; else null. */
export function offeredValue(name: string): OfferedValue | null {
  const row = OFFERED_VALUES.find((value) => value.per !== 'place' && value.name === name);
  if (row) return row;
  return name.length > 2 && name.startsWith('V_') ? OFFERED_VALUES.find((value) => value.per === 'place')! : null;
}

function fet(name: string, unit: OfferedUnit, tex: string, sentence: string): OfferedValue {
  return { name, unit, per: 'fet', point: true, tex, sentence };
}

function stage(name: string, unit: OfferedUnit, tex: string, sentence: string): OfferedValue {
  return { name, unit, per: 'stage', point: false, tex, sentence };
}
