// The two constants of the square law in every convention of the trade: the inverse of the routes.
//
// beta in A/V^2 and vto in V are in the n-channel frame, lambda in 1/V, `lift` is 1 + lambda V_DS of the
// condition (1 where none is stated). Voltages come out in the n-channel frame.

import type { NamedKernel } from './kernel.ts';
import { channelCurrent } from './channel.ts';
import { inversionUnit, testPointDrive } from './test-point.ts';

/** I_D in A in saturation, or at V_DS where that is below the drive; vds NaN: at the edge of saturation without lambda. */
function currentAtGate(beta: number, vto: number, lambda: number, vgs: number, vds: number): number {
  const drive = vgs - vto;
  return vds !== vds ? channelCurrent(beta, 0, drive, Math.max(drive, 0)) : channelCurrent(beta, lambda, drive, vds);
}

/** g_fs in S at a current in saturation: 2 sqrt(beta (1 + lambda V_DS) I_D). */
function transconductanceAtCurrent(beta: number, lift: number, current: number): number {
  return 2 * Math.sqrt(beta * lift * current);
}

/** V_GS in V of a test current, V_GS(off) or V_GS(th); unit is 2 n V_T. */
function gateAtTestCurrent(beta: number, vto: number, lift: number, current: number, unit: number): number {
  return vto + testPointDrive(current / lift, beta, unit);
}

/**
 * R_DS(on) in ohm at V_GS and a drain current: R with 1 / (R - R_0) = beta (2 V_ov - I_D R); Infinity where the channel is
 * off or saturates below that current.
 */
function onResistance(beta: number, vto: number, vgs: number, current: number, series: number): number {
  const twice = 2 * (vgs - vto);
  if (!(twice > 0)) return Infinity;
  // I beta R^2 - b R + c = 0, the smaller root.
  const b = beta * (twice + current * series);
  const c = 1 + beta * twice * series;
  const discriminant = b * b - 4 * current * beta * c;
  return discriminant < 0 ? Infinity : (2 * c) / (b + Math.sqrt(discriminant));
}

/** g_os in S at a drain current and V_DS in saturation. */
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

/** 1 + lambda V_DS, V_DS in the slot at `at`. */
function liftAt(s: Float64Array, a: Int32Array, p: number, at: number): number {
  const vds = s[a[at]];
  return vds !== vds ? 1 : 1 + s[a[p + 3]] * s[a[p]] * vds;
}

/** The current at V_GS = 0, where a transconductance or output conductance without a current is meant; at its V_DS. */
function zeroGateCurrent(s: Float64Array, a: Int32Array, p: number, at: number): number {
  const drive = Math.max(0, -s[a[p + 2]]);
  return s[a[p + 1]] * drive * drive * liftAt(s, a, p, at);
}

const testGate = (field: string): Form =>
  form(field, [`${field}@I_D`, `${field}@V_DS`], (s, a, p) => {
    const current = s[a[p + FIRST]];
    if (current !== current) return s[a[p]] * s[a[p + 2]];
    const unit = inversionUnit(s[a[p + 4]], s[a[p + 5]]);
    return s[a[p]] * gateAtTestCurrent(s[a[p + 1]], s[a[p + 2]], liftAt(s, a, p, p + FIRST + 1), current, unit);
  });

/**
 * One kernel per field, with the field's name and conditions; voltages in the sense of the channel, as the field is written.
 * Without a current, g_fs and g_os are those at V_GS = 0; without V_GS, R_DSon is that at V_GS = 0.
 */
export const FORMS: Readonly<Record<string, Form>> = {
  I_DSS: form('I_DSS', ['I_DSS@V_DS'], (s, a, p) =>
    currentAtGate(s[a[p + 1]], s[a[p + 2]], s[a[p + 3]], 0, s[a[p]] * s[a[p + FIRST]]),
  ),
  V_P: form('V_P', [], (s, a, p) => s[a[p]] * s[a[p + 2]]),
  V_GSoff: testGate('V_GSoff'),
  V_GSth: testGate('V_GSth'),
  g_fs0: form(
    'g_fs0',
    ['g_fs0@V_DS'],
    (s, a, p) => 2 * s[a[p + 1]] * Math.max(0, -s[a[p + 2]]) * liftAt(s, a, p, p + FIRST),
  ),
  g_fs: form('g_fs', ['g_fs@I_D', 'g_fs@V_DS'], (s, a, p) => {
    const stated = s[a[p + FIRST]];
    const current = stated !== stated ? zeroGateCurrent(s, a, p, p + FIRST + 1) : stated;
    return transconductanceAtCurrent(s[a[p + 1]], liftAt(s, a, p, p + FIRST + 1), current);
  }),
  g_os: form('g_os', ['g_os@I_D', 'g_os@V_DS'], (s, a, p) => {
    const stated = s[a[p + FIRST]];
    const current = stated !== stated ? zeroGateCurrent(s, a, p, p + FIRST + 1) : stated;
    return outputConductanceAtCurrent(s[a[p + 3]], liftAt(s, a, p, p + FIRST + 1), current);
  }),
  K_P: form('K_P', ['W', 'L'], (s, a, p) => {
    const ratio = s[a[p + FIRST]] / s[a[p + FIRST + 1]];
    return (2 * s[a[p + 1]]) / (ratio !== ratio ? 1 : ratio);
  }),
  I_on: form('I_on', ['I_on@V_GS', 'I_on@V_DS'], (s, a, p) =>
    currentAtGate(s[a[p + 1]], s[a[p + 2]], s[a[p + 3]], s[a[p]] * s[a[p + FIRST]], s[a[p]] * s[a[p + FIRST + 1]]),
  ),
  R_DSon: form('R_DSon', ['R_DSon@V_GS', 'R_DSon@I_D'], (s, a, p) =>
    onResistance(
      s[a[p + 1]],
      s[a[p + 2]],
      orZero(s[a[p]] * s[a[p + FIRST]]),
      orZero(s[a[p + FIRST + 1]]),
      orZero(s[a[p + 6]]) + orZero(s[a[p + 7]]),
    ),
  ),
};
