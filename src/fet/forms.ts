// The two constants of the square law in every convention of the trade: the inverse of the routes.
//
// Voltages are in the n-channel frame and at the terminals, as a data sheet measures them; NaN where no
// condition is stated.

import { solveBracketed } from '../numeric/index.ts';
import type { NamedKernel } from './kernel.ts';
import { channelCurrent } from './channel.ts';
import { inversionUnit, testPointDrive } from './test-point.ts';

/** The constants of a law: A/V^2, V, 1/V, and the ohms in the leads. */
interface Law {
  readonly beta: number;
  readonly vto: number;
  readonly lambda: number;
  readonly rs: number;
  readonly rd: number;
}

/**
 * I_D in A at the terminals' V_GS and V_DS, what the leads take from them counted; vds NaN: at the edge of saturation without
 * lambda.
 */
function currentAtGate(law: Law, vgs: number, vds: number): number {
  const { beta, vto, lambda, rs, rd } = law;
  const channel = (i: number): number => {
    const drive = vgs - i * rs - vto;
    return vds !== vds
      ? channelCurrent(beta, 0, drive, Math.max(drive, 0))
      : channelCurrent(beta, lambda, drive, vds - i * (rs + rd));
  };
  const most = channel(0);
  return rs + rd > 0 && most > 0 ? solveBracketed((i) => channel(i) - i, 0, most).value : most;
}

/** g_fs in S at the terminals at a current in saturation: g_m = 2 sqrt(beta (1 + lambda V_DS) I_D) of the channel. */
function transconductanceAtCurrent(law: Law, vds: number, current: number): number {
  const lift = liftOf(law, vds, current);
  const gds = vds !== vds ? 0 : (law.lambda * current) / lift;
  const gm = 2 * Math.sqrt(law.beta * lift * current);
  return gm / (1 + gm * law.rs + gds * (law.rs + law.rd));
}

/** V_GS in V of a test current, V_GS(off) or V_GS(th); unit is 2 n V_T. */
function gateAtTestCurrent(law: Law, vds: number, current: number, unit: number): number {
  return law.vto + current * law.rs + testPointDrive(current / liftOf(law, vds, current), law.beta, unit);
}

/** 1 + lambda V_DS of the channel, 1 where no V_DS is stated. */
function liftOf({ lambda, rs, rd }: Law, vds: number, current: number): number {
  return vds !== vds ? 1 : 1 + lambda * (vds - current * (rs + rd));
}

/**
 * R_DS(on) in ohm at V_GS and a drain current, r_s + r_d included; Infinity where the channel is off or saturates below that
 * current.
 */
function onResistance({ beta, vto, lambda, rs, rd }: Law, vgs: number, current: number): number {
  const drive = vgs - current * rs - vto;
  if (!(drive > 0)) return Infinity;
  if (current === 0) return rs + rd + 1 / (2 * beta * drive);
  if (channelCurrent(beta, lambda, drive, drive) < current) return Infinity;
  const vds = solveBracketed((v) => channelCurrent(beta, lambda, drive, v) - current, 0, drive).value;
  return rs + rd + vds / current;
}

/** g_os in S at a drain current and V_DS in saturation, inside the leads. */
function outputConductanceAtCurrent(lambda: number, lift: number, current: number): number {
  return (lambda * current) / lift;
}

const COMMON = ['channel', 'beta', 'V_TO', 'lambda', 'n', 'T_nom', 'r_s', 'r_d'] as const;
const FIRST = COMMON.length;
const orZero = (x: number): number => (x !== x ? 0 : x);

/** One convention; its kernel bears the name `id`. */
interface Form extends NamedKernel {
  readonly id: string;
}

type FormLaw = (s: Float64Array, a: Int32Array, p: number) => number;

function form(field: string, conditions: readonly string[], law: FormLaw): Form {
  const inputs = [...COMMON, ...conditions];
  const output = inputs.length;
  return {
    id: `form of ${field}`,
    inputs,
    outputs: ['value'],
    run(s, a, p) {
      s[a[p + output]] = law(s, a, p);
    },
  };
}

function lawAt(s: Float64Array, a: Int32Array, p: number): Law {
  return {
    beta: s[a[p + 1]],
    vto: s[a[p + 2]],
    lambda: orZero(s[a[p + 3]]),
    rs: orZero(s[a[p + 6]]),
    rd: orZero(s[a[p + 7]]),
  };
}

const testGate = (field: string): Form =>
  form(field, [`${field}@I_D`, `${field}@V_DS`], (s, a, p) => {
    const current = s[a[p + FIRST]];
    if (current !== current) return s[a[p]] * s[a[p + 2]];
    const unit = inversionUnit(s[a[p + 4]], s[a[p + 5]]);
    return s[a[p]] * gateAtTestCurrent(lawAt(s, a, p), s[a[p]] * s[a[p + FIRST + 1]], current, unit);
  });

/**
 * One kernel per field, with the field's name and conditions; voltages in the sense of the channel, as the field is written.
 * Without a current, g_fs and g_os are those at V_GS = 0; without V_GS, R_DSon is that at V_GS = 0.
 */
export const FORMS: Readonly<Record<string, Form>> = {
  I_DSS: form('I_DSS', ['I_DSS@V_DS'], (s, a, p) => currentAtGate(lawAt(s, a, p), 0, s[a[p]] * s[a[p + FIRST]])),
  V_P: form('V_P', [], (s, a, p) => s[a[p]] * s[a[p + 2]]),
  V_GSoff: testGate('V_GSoff'),
  V_GSth: testGate('V_GSth'),
  g_fs0: form('g_fs0', ['g_fs0@V_DS'], (s, a, p) => {
    const law = lawAt(s, a, p);
    const vds = s[a[p]] * s[a[p + FIRST]];
    return transconductanceAtCurrent(law, vds, currentAtGate(law, 0, vds));
  }),
  g_fs: form('g_fs', ['g_fs@I_D', 'g_fs@V_DS'], (s, a, p) => {
    const law = lawAt(s, a, p);
    const stated = s[a[p + FIRST]];
    const vds = s[a[p]] * s[a[p + FIRST + 1]];
    return transconductanceAtCurrent(law, vds, stated !== stated ? currentAtGate(law, 0, vds) : stated);
  }),
  g_os: form('g_os', ['g_os@I_D', 'g_os@V_DS'], (s, a, p) => {
    const law = lawAt(s, a, p);
    const stated = s[a[p + FIRST]];
    const vds = s[a[p]] * s[a[p + FIRST + 1]];
    const lift = vds !== vds ? 1 : 1 + law.lambda * vds;
    return outputConductanceAtCurrent(law.lambda, lift, stated !== stated ? currentAtGate(law, 0, vds) : stated);
  }),
  K_P: form('K_P', ['W', 'L'], (s, a, p) => {
    const ratio = s[a[p + FIRST]] / s[a[p + FIRST + 1]];
    return (2 * s[a[p + 1]]) / (ratio !== ratio ? 1 : ratio);
  }),
  I_on: form('I_on', ['I_on@V_GS', 'I_on@V_DS'], (s, a, p) =>
    currentAtGate(lawAt(s, a, p), s[a[p]] * s[a[p + FIRST]], s[a[p]] * s[a[p + FIRST + 1]]),
  ),
  R_DSon: form('R_DSon', ['R_DSon@V_GS', 'R_DSon@I_D'], (s, a, p) =>
    onResistance(lawAt(s, a, p), orZero(s[a[p]] * s[a[p + FIRST]]), orZero(s[a[p + FIRST + 1]])),
  ),
};
