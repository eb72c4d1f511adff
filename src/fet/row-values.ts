// What a data-sheet row would read on a FET whose square law is known: the routes the other way round. With it a row
// that is not needed to compute says which specimens belong to the part.
//
// Rows are read inside the leads but for R_DS(on), and at their stated conditions: a current with a V_DS at that V_DS,
// one without at the edge of saturation and without lambda, as the routes take them.

import { channelCurrent, transconductance } from './channel.ts';
import type { NamedKernel } from './kernel.ts';
import { inversionUnit, testPointDrive } from './test-point.ts';

/** Slots of the device, before those of the row's conditions. */
const DEVICE = ['channel', 'beta', 'V_TO', 'lambda', 'n', 'T_nom', 'r_s', 'r_d', 'W', 'L'] as const;
const CONDITIONS = ['V_GS', 'V_DS', 'I_D'] as const;

/** Everything a row depends on, in the n-channel frame; a condition that is not stated is NaN. */
interface Device {
  channel: number;
  beta: number;
  vto: number;
  lambda: number;
  n: number;
  tNom: number;
  series: number;
  ratio: number;
  gate: number;
  drain: number;
  current: number;
}

const device: Device = {
  channel: 1,
  beta: 0,
  vto: 0,
  lambda: 0,
  n: 1,
  tNom: 0,
  series: 0,
  ratio: 1,
  gate: NaN,
  drain: NaN,
  current: NaN,
};

function row(read: (d: Device) => number): NamedKernel {
  return {
    inputs: [...DEVICE, ...CONDITIONS],
    outputs: ['reading'],
    run(s, a, p) {
      const d = device;
      d.channel = s[a[p]];
      d.beta = s[a[p + 1]];
      d.vto = s[a[p + 2]];
      d.lambda = s[a[p + 3]];
      d.n = s[a[p + 4]];
      d.tNom = s[a[p + 5]];
      d.series = s[a[p + 6]] + s[a[p + 7]];
      d.ratio = s[a[p + 8]] / s[a[p + 9]];
      d.gate = d.channel * s[a[p + 10]];
      d.drain = d.channel * s[a[p + 11]];
      d.current = s[a[p + 12]];
      s[a[p + 13]] = read(d);
    },
  };
}

/** Drain current at a gate voltage. */
function currentAt(d: Device, gate: number): number {
  const drive = gate - d.vto;
  return d.drain === d.drain
    ? channelCurrent(d.beta, d.lambda, drive, d.drain)
    : d.beta * Math.max(0, drive) * Math.max(0, drive);
}

/** Transconductance at a gate voltage. */
function slopeAt(d: Device, gate: number): number {
  const drive = gate - d.vto;
  return d.drain === d.drain ? transconductance(d.beta, d.lambda, drive, d.drain) : 2 * d.beta * Math.max(0, drive);
}

const gateOrZero = (d: Device): number => (d.gate === d.gate ? d.gate : 0);
const lengthening = (d: Device): number => (d.drain === d.drain ? 1 + d.lambda * d.drain : 1);

/** g_fs = 2 sqrt(beta (1 + lambda V_DS) I_D) at a current; at a gate voltage, 0 unless stated, without one. */
function transconductanceRow(d: Device): number {
  return d.current === d.current ? 2 * Math.sqrt(d.beta * lengthening(d) * d.current) : slopeAt(d, gateOrZero(d));
}

/** g_os = lambda I_D / (1 + lambda V_DS), I_D that of V_GS = 0 unless stated. */
function outputConductanceRow(d: Device): number {
  const current = d.current === d.current ? d.current : d.beta * d.vto * d.vto * lengthening(d);
  return (d.lambda * current) / lengthening(d);
}

/**
 * R with 1 / (R - R_0) = beta (2 V_ov - I_D R): the smaller root of I R² - (2 V_ov + I R_0) R + 2 V_ov R_0 + 1/beta = 0;
 * Infinity where the channel is off or cannot carry the current.
 */
function resistanceRow(d: Device): number {
  const drive = gateOrZero(d) - d.vto;
  if (drive <= 0) return Infinity;
  const current = d.current === d.current ? d.current : 0;
  const b = 2 * drive + current * d.series;
  const c = 2 * drive * d.series + 1 / d.beta;
  const square = b * b - 4 * current * c;
  return square >= 0 ? (2 * c) / (b + Math.sqrt(square)) : Infinity;
}

/** Gate voltage at the test current, the threshold of the law where none is stated. */
function thresholdRow(d: Device): number {
  if (d.current !== d.current) return d.channel * d.vto;
  const edge = d.current / lengthening(d);
  return d.channel * (d.vto + testPointDrive(edge, d.beta, inversionUnit(d.n, d.tNom)));
}

/**
 * What each row of a part reads on a known law, in the sign and unit in which the row is written: A, V in the true frame, S,
 * ohm, A/V². Source: the conventions table of the design, as the routes have it.
 */
export const ROW_VALUES: Readonly<Record<string, NamedKernel>> = {
  I_DSS: row((d) => currentAt(d, 0)),
  I_on: row((d) => currentAt(d, d.gate)),
  g_fs0: row((d) => slopeAt(d, 0)),
  g_fs: row(transconductanceRow),
  g_os: row(outputConductanceRow),
  R_DSon: row(resistanceRow),
  V_GSoff: row(thresholdRow),
  V_GSth: row(thresholdRow),
  V_P: row((d) => d.channel * d.vto),
  beta: row((d) => d.beta),
  K: row((d) => d.beta),
  K_P: row((d) => (2 * d.beta) / d.ratio),
};
