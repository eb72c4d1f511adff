// A point: one specimen held at given terminal voltages, or at a drain current and the others.

import type { DeviceHandles } from './device-field.ts';
import type { Emitter, Handle } from './emitter.ts';
import { GENERAL_OUTPUTS } from './general-point.ts';
import { lowerCapacitances } from './lower-capacitances.ts';
import { shareEmitter } from './sharing-emitter.ts';

/** What a point holds: voltages in the true frame (V), I_D in the device's own sense (A). */
interface SpecimenHeld {
  readonly channel: 1 | -1;
  readonly family: 'JFET' | 'MOSFET';
  readonly device: DeviceHandles;
  readonly held: { readonly type: 'V_GS' | 'I_D'; readonly value: Handle };
  readonly V_DS: Handle;
  /** null: 0 V. */
  readonly V_SB: Handle | null;
  /** Ambient temperature, K. */
  readonly ambient: Handle;
}

export interface SpecimenLowering {
  /** By offered name. */
  readonly values: ReadonlyMap<string, Handle>;
  /** Offered names that have no value here, each with a sentence that says why. */
  readonly absent: ReadonlyMap<string, string>;
  /** A code of `POINT_STATUS`. */
  readonly status: Handle;
  /** How many junction temperatures balance the heat; null where the FET does not heat itself. */
  readonly thermalRoots: Handle | null;
  /** beta (A/V²) and V_TO (V) at the junction temperature. */
  readonly beta: Handle;
  readonly vto: Handle;
}

/** Lowers a point: the channel law at the temperature of the specimen's own heat. */
export function lowerPoint(specimen: SpecimenHeld, emitter: Emitter): SpecimenLowering {
  const e = shareEmitter(emitter);
  const { device, held } = specimen;
  const zero = e.constant(0);
  const channel = e.constant(specimen.channel);
  const vsb = specimen.V_SB ?? zero;
  const thermal = [device.beta_exponent, device.tempco, device.T_nom, specimen.ambient, device.R_thJA ?? zero];
  const inside = [device.r_s ?? zero, device.r_d ?? zero, device.gamma ?? zero, device.phi];
  const leakage = [device.I_GSS ?? zero, device.doubling];
  const own = [channel, device.beta, device.V_TO, device.lambda];
  const results =
    held.type === 'V_GS'
      ? e.call(
          'general-point',
          // Ideal voltages: lines without resistance.
          [
            ...own,
            held.value,
            zero,
            specimen.V_DS,
            zero,
            vsb,
            zero,
            ...inside,
            ...leakage,
            zero,
            zero,
            zero,
            ...thermal,
          ],
          GENERAL_OUTPUTS.length,
        )
      : e.call(
          'current-point',
          [...own, held.value, specimen.V_DS, vsb, ...inside, ...leakage, ...thermal],
          GENERAL_OUTPUTS.length,
        );
  const out = new Map(GENERAL_OUTPUTS.map((name, index) => [name as string, results[index]]));
  const values = new Map(FET_NAMES.map((name) => [name, out.get(name)!]));
  values.set('r_o', e.div(e.constant(1), out.get('g_ds')!));
  const power = e.mul(out.get('V_DS')!, out.get('I_D')!);
  values.set('P_D', specimen.channel === 1 ? power : e.neg(power));
  const absent = lowerCapacitances(e, specimen, values);
  return {
    values,
    absent,
    status: out.get('status')!,
    thermalRoots: device.R_thJA === null ? null : out.get('thermal_roots')!,
    beta: out.get('beta')!,
    vto: out.get('V_TO')!,
  };
}

const FET_NAMES = [
  'I_D',
  'V_GS',
  'V_DS',
  'V_SB',
  'V_ov',
  'V_DSsat',
  'margin',
  'region',
  'g_m',
  'g_ds',
  'g_mb',
  'I_G',
  'T_J',
];
