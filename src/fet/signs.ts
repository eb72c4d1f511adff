// Which sign the number of a field has, by family and channel.
//
// Voltages are as a voltmeter shows them: mirrored on a p-channel part. Model cards alone write V_TO of
// a JFET negative for both channels. Currents, conductances and square-law constants are positive on both.

import type { ChannelSign, Family } from './kinds.ts';

type Sign = 'positive' | 'negative' | 'not negative' | 'any';

interface SignRule {
  readonly n: Sign;
  readonly p: Sign;
  /** Why, in the words of the trade. */
  readonly sentence: string;
}

const both = (sign: Sign, sentence: string): SignRule => ({ n: sign, p: sign, sentence });
const depletion: SignRule = {
  n: 'negative',
  p: 'positive',
  sentence: 'The gate pinches the channel off: below the source in an n-channel part, above it in a p-channel part.',
};
const enhancement: SignRule = {
  n: 'positive',
  p: 'negative',
  sentence: 'The gate opens the channel: above the source in an n-channel part, below it in a p-channel part.',
};
const current = both('positive', 'Currents are written positive on both channels.');
const conductance = both('positive', 'A transconductance is positive on both channels.');
const constant = both('positive', 'The constant of the square law is positive on both channels.');
const resistance = both('positive', 'A resistance is above 0.');
const inside = both('not negative', 'A resistance in a lead is 0 or more.');
const capacitance = both('not negative', 'A capacitance is 0 or more.');
const temperature = both('positive', 'A temperature lies above absolute zero.');

const SIGNS: Readonly<Record<string, SignRule>> = {
  I_DSS: current,
  I_on: current,
  I_D: current,
  I_Dmax: current,
  I_GSS: both('not negative', 'Gate leakage is written as an amount.'),
  V_P: depletion,
  V_GSoff: depletion,
  V_GSth: enhancement,
  V_DS: { n: 'positive', p: 'negative', sentence: 'The drain of a p-channel part stands below its source.' },
  K: constant,
  K_P: constant,
  beta: constant,
  W: both('positive', 'A channel width is above 0.'),
  L: both('positive', 'A channel length is above 0.'),
  g_fs: conductance,
  g_fs0: conductance,
  g_os: both('not negative', 'An output conductance is 0 or more.'),
  lambda: both('not negative', 'lambda is 0 or more on both channels.'),
  R_DSon: resistance,
  r_s: inside,
  r_d: inside,
  gamma: both('not negative', 'gamma is 0 or more on both channels.'),
  phi: both('positive', 'The surface potential is above 0 on both channels.'),
  PB: both('positive', 'The built-in potential is above 0 on both channels.'),
  M: both('not negative', 'The grading exponent is 0 for a constant capacitance, else above 0.'),
  C_iss: capacitance,
  C_rss: capacitance,
  C_oss: capacitance,
  C_GS: capacitance,
  C_GD: capacitance,
  C_DS: capacitance,
  doubling: both('positive', 'The step that doubles the leakage is above 0.'),
  T_nom: temperature,
  T_Jmax: temperature,
  R_thJA: both('positive', 'A thermal resistance is above 0.'),
  f_corner: both('positive', 'A corner frequency is above 0.'),
  e_n: both('positive', 'A noise density is above 0.'),
  matching: both('not negative', 'A largest difference is 0 or more.'),
};

const JFET_V_TO = both('negative', 'A model card writes V_TO of a JFET negative for both channels.');
const ANY = both('any', '');

/** The sign that a field's number has, `any` where both occur (V_TO of a MOSFET, tempco). */
export function wantedSign(field: string, family: Family, channel: ChannelSign): Sign {
  const rule = ruleOf(field, family);
  return channel === 1 ? rule.n : rule.p;
}

/** Why a field has the sign it has; empty where any will do. */
export function signReason(field: string, family: Family): string {
  return ruleOf(field, family).sentence;
}

function ruleOf(field: string, family: Family): SignRule {
  if (field === 'V_TO' && family === 'JFET') return JFET_V_TO;
  return Object.hasOwn(SIGNS, field) ? SIGNS[field] : ANY;
}
