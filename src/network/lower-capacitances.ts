// The gate capacitances at an operating point and the frequency f_T that follows from them, as operations.

import type { DeviceHandles } from './device-field.ts';
import type { Emitter, Handle } from './emitter.ts';

/** Adds C_gs, C_gd (F) and f_T (Hz) to the values of a FET; answers with why they are absent where they are. */
export function lowerCapacitances(
  e: Emitter,
  fet: { readonly channel: 1 | -1; readonly family: 'JFET' | 'MOSFET'; readonly device: DeviceHandles },
  values: Map<string, Handle>,
): Map<string, string> {
  const { C_GS, C_GD, PB, M } = fet.device;
  if (C_GS === null || C_GD === null) {
    const why = (name: string): string => `${name} needs C_iss and C_rss, or C_GS and C_GD, of the part.`;
    return new Map(['C_gs', 'C_gd', 'f_T'].map((name) => [name, why(name)]));
  }
  const kernel = fet.family === 'JFET' ? 'jfet-capacitances' : 'mosfet-capacitances';
  const channel = e.constant(fet.channel);
  const [cgs, cgd] = e.call(kernel, [channel, C_GS, C_GD, PB, M, values.get('V_GS')!, values.get('V_DS')!], 2);
  values.set('C_gs', cgs);
  values.set('C_gd', cgd);
  values.set('f_T', e.div(values.get('g_m')!, e.mul(e.constant(2 * Math.PI), e.add(cgs, cgd))));
  return new Map();
}
