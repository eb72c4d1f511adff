// Sheets whose workings the tests read back.

/** A self-biased JFET amplifier with checks, formulas and units of many kinds. */
export const AMPLIFIER = `# Hydrophone preamplifier
V_DD = 18 V ± 5 %    [bench supply]
T_A = 12 degC in -2 degC .. 35 degC
R_G = 2.2 Mohm
R_D = 5.1 kohm ± 1 %
R_S = 1.2 kohm ± 1 %
R_x = R_D || R_S || 4k7
R_y = R_D*R_S/(R_D+R_S)
tau = R_G * 22 nF
ratio = -R_D/R_S
level = dB(R_D / R_S) - 3 dB
warm = T_A - 25 degC
half = (V_DD / 2)^2 / R_D as mW
root = sqrt(4 * 1.38e-23 W·s/K * 300 K * R_G)
nearest = E24(R_y)
odd = V_DD - 17.9871 V
even = -odd + 2 * odd - -odd

## Device
Q1 = n-JFET
  I_DSS: 6 mA in 3 mA .. 12 mA at V_DS = 15 V
  V_P: -2.5 V in -5 V .. -1.2 V
  lambda: 0.012 /V
A1 = stage of Q1
  gate: R_G to 0 V, 22 nF to signal
  drain: R_D to V_DD, 1 uF to load
  source: R_S to 0 V, 47 uF to 0 V
  load: 100 kohm to 0 V
  output: load

headroom = check A1.margin >= 2 V
tight = check V_DD >= 18.0004 V
gain_band = check abs(A1.A_v) within 6 .. 14
on = check A1.region = saturation and A1.I_D > 0.4 mA
drop = A1.I_D*R_D
gain_estimate = -A1.g_m * (A1.r_o || R_D || 100 kohm)
`;

/** The same kind of stage with a p-channel device, without lambda: r_o has no end. */
export const MIRRORED = `# Mirrored
Q1 = p-JFET
  I_DSS: 6 mA
  V_P: 2.5 V
R_D = 5.1 kohm
A1 = stage of Q1
  gate: 2.2 Mohm to 0 V, 22 nF to signal
  drain: R_D to -18 V
  source: 1.2 kohm to 0 V
  output: drain
R_far = A1.r_o || R_D
`;

/** A MOSFET with a divider at its gate and a bulk at its source. */
export const DIVIDER = `# Divider
V_DD = 24 V
R_1 = 1 Mohm
R_2 = 330 kohm
Q1 = n-MOSFET
  V_TO: 2.1 V
  K: 40 mA/V^2
  lambda: 0.02 /V
A1 = stage of Q1
  gate: R_1 to V_DD, R_2 to 0 V, 100 nF to signal
  drain: 470 ohm to V_DD
  source: 100 ohm to 0 V
  output: drain
heat = check A1.P_D <= 250 mW
`;

/** A follower on an ideal current source and one that is driven deep into the ohmic region. */
export const FOLLOWERS = `# Followers
Q1 = n-JFET
  I_DSS: 8 mA
  V_P: -3 V
  lambda: 0.01 /V
A1 = stage of Q1
  gate: 1 Mohm to 0 V, 100 nF to signal
  drain: to 12 V
  source: 3.3 kohm to -12 V, 10 uF to load
  load: 10 kohm to 0 V
  output: load
A2 = stage of Q1
  gate: 1 Mohm to 0 V
  drain: 10 kohm to 12 V
  source: to 0 V
`;

export const SHEETS: readonly (readonly [name: string, text: string])[] = [
  ['amplifier', AMPLIFIER],
  ['mirrored', MIRRORED],
  ['divider', DIVIDER],
  ['followers', FOLLOWERS],
];
