// The sheet of the one-stage bench: a JFET with divider bias at the gate, a resistor at the source and one at the drain.
// Eight inputs have tolerances, 39 cells are computed from them, six of those are summed.

/** Nominal value and relative tolerance of each input, in SI units. */
export const INPUTS = {
  V_DD: [15, 0.05],
  R_1: [1e6, 0.01],
  R_2: [2e5, 0.01],
  R_D: [3300, 0.01],
  R_S: [2200, 0.01],
  I_DSS: [5e-3, 0.4],
  V_P: [-2.5, 0.4],
  lambda: [0.01, 0.5],
} as const;

/** What stands otherwise for samples of which two in five are saturated and the others ohmic, the worst mix for a branch. */
export const MIXED = { R_D: [6100, 0.2] } as const;

/** What has no tolerance, in SI units. */
export const FIXED = { R_L: 1e5, C_1: 1e-7, C_2: 1e-6, C_S: 4.7e-5, pi: Math.PI } as const;

/** A cell and its formula, or the operating point: three cells from one solve. */
export type Step = readonly [name: string, formula: string] | 'operating point';

/** Inputs of the operating point, in the order of every solver here. */
export const POINT_INPUTS = ['beta', 'lambda', 'A', 'R_S', 'V_DD', 'R_DS'] as const;
export const POINT_OUTPUTS = ['I_D', 'V_ov', 'V_DS'] as const;

export const STEPS: readonly Step[] = [
  ['V_GG', 'V_DD * R_2 / (R_1 + R_2)'],
  ['R_in', 'R_1 * R_2 / (R_1 + R_2)'],
  ['beta', 'I_DSS / (V_P * V_P)'],
  ['A', 'V_GG - V_P'],
  ['R_DS', 'R_D + R_S'],
  'operating point',
  ['margin', 'V_DS - V_ov'],
  ['V_S', 'I_D * R_S'],
  ['V_D', 'V_DD - I_D * R_D'],
  ['V_GS', 'V_GG - V_S'],
  ['I_div', 'V_DD / (R_1 + R_2)'],
  ['P_D', 'V_DS * I_D'],
  ['P_RD', 'I_D * I_D * R_D'],
  ['P_RS', 'I_D * I_D * R_S'],
  ['P_total', 'V_DD * (I_D + I_div)'],
  ['V_ch', 'min(V_ov, V_DS)'],
  ['early', '1 + lambda * V_DS'],
  ['g_m', '2 * beta * V_ch * early'],
  ['g_ds', '2 * beta * (V_ov - V_ch) * early + lambda * beta * V_ch * (2 * V_ov - V_ch)'],
  ['r_o', '1 / g_ds'],
  ['R_ac', 'R_D * R_L / (R_D + R_L)'],
  ['A_v', '-(g_m * (r_o * R_ac / (r_o + R_ac)))'],
  ['A_v_dB', '20 * log10(abs(A_v))'],
  ['A_deg', '-(g_m * R_ac / (1 + g_m * R_S + (R_ac + R_S) / r_o))'],
  ['A_deg_dB', '20 * log10(abs(A_deg))'],
  ['R_out', 'R_D * r_o / (R_D + r_o)'],
  ['r_deg', 'r_o + R_S * (1 + g_m * r_o)'],
  ['R_out_deg', 'R_D * r_deg / (R_D + r_deg)'],
  ['R_src', 'R_S / (1 + g_m * R_S)'],
  ['f_in', '1 / (2 * pi * R_in * C_1)'],
  ['f_src', '1 / (2 * pi * R_src * C_S)'],
  ['f_out', '1 / (2 * pi * (R_out + R_L) * C_2)'],
  ['swing_up', 'I_D * R_ac'],
  ['swing', 'min(swing_up, margin)'],
  ['g_m0', '-(2 * I_DSS / V_P)'],
  ['g_ratio', 'g_m / g_m0'],
  ['headroom', 'margin / V_DD'],
];

/** Names of the computed cells, in order: the layout of a row of results. */
export const CELLS: readonly string[] = STEPS.flatMap((step) =>
  step === 'operating point' ? [...POINT_OUTPUTS] : [step[0]],
);

/** Cells that are summed over the samples. */
export const SUMMED: readonly number[] = ['I_D', 'margin', 'g_m', 'A_v_dB', 'P_D', 'R_out'].map((name) =>
  CELLS.indexOf(name),
);

export type InputName = keyof typeof INPUTS;
export const INPUT_NAMES = Object.keys(INPUTS) as InputName[];

/** One column per input, `count` values each, evenly spread over its tolerance; the same at every call. */
export function drawInputs(
  count: number,
  otherwise: Partial<Record<InputName, readonly [nominal: number, tolerance: number]>> = {},
): Record<InputName, Float64Array> {
  let state = 1;
  const even = () => {
    state = (Math.imul(state, 1664525) + 1013904223) | 0;
    return (state >>> 0) / 2 ** 31 - 1;
  };
  const columns = INPUT_NAMES.map((name) => {
    const [nominal, tolerance] = otherwise[name] ?? INPUTS[name];
    // Columns an exact power of two apart would share cache lines.
    const column = new Float64Array(count + 24).subarray(0, count);
    for (let i = 0; i < count; i++) column[i] = nominal * (1 + tolerance * even());
    return [name, column] as const;
  });
  return Object.fromEntries(columns) as Record<InputName, Float64Array>;
}
