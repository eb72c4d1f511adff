// One FET of either channel held at given terminal voltages: everything the channel law says at once.
//
// Here the mirror is applied: voltages are true node differences, negative for p-channel; current,
// overdrive and margin are in the device's own sense, conductances those of the mirrored device. When
// the channel is reversed the drain acts as the source, so its own voltage to the bulk sets the
// threshold, and V_DS moves that threshold too.

import type { ChannelSign } from './kinds.ts';
import { threshold, thresholdSlope } from './body-effect.ts';
import { channelCurrent, channelRegion, outputConductance, saturationMargin, transconductance } from './channel.ts';

/** What `devicePoint` writes, in this order. */
export const DEVICE_POINT = ['I_D', 'g_m', 'g_ds', 'g_mb', 'V_ov', 'margin', 'region'] as const;

/** Constants of one specimen at its temperature: beta A/V^2, vto V and lambda 1/V in the n-channel frame, gamma V^0.5, phi V. */
export interface ChannelConstants {
  readonly beta: number;
  readonly vto: number;
  readonly lambda: number;
  readonly gamma: number;
  readonly phi: number;
}

/**
 * Writes the point into out[at..at + 6]: A, S, S, S, V, V, code. V_ov is V_GS - V_T at the end that acts as the source;
 * g_mb is -dI_D/dV_SB.
 */
export function devicePoint(
  out: Float64Array,
  at: number,
  channel: ChannelSign,
  constants: ChannelConstants,
  vgs: number,
  vds: number,
  vsb: number,
): void {
  const { beta, vto, lambda, gamma, phi } = constants;
  const drain = channel * vds;
  const back = drain < 0 ? channel * vsb + drain : channel * vsb;
  const vov = channel * vgs - (gamma === 0 ? vto : threshold(vto, gamma, phi, back));
  const slope = gamma === 0 ? 0 : thresholdSlope(gamma, phi, back);
  const gm = transconductance(beta, lambda, vov, drain);
  out[at] = channelCurrent(beta, lambda, vov, drain);
  out[at + 1] = gm;
  out[at + 2] = outputConductance(beta, lambda, vov, drain) - (drain < 0 ? gm * slope : 0);
  out[at + 3] = gm * slope;
  out[at + 4] = drain < 0 ? vov - drain : vov;
  out[at + 5] = saturationMargin(vov, drain);
  out[at + 6] = channelRegion(vov, drain);
}
