// The device fields of one specimen, as points and stages take them, from a part's rows and the defaults.

import { DEFAULTS, JUNCTION_LAW } from '../fet/index.ts';
import type { DefaultField } from '../fet/index.ts';
import type { DeviceHandles, Handle } from '../network/index.ts';
import type { Builder } from '../program/index.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import type { PartLaw } from './part-law.ts';

interface PartDevice {
  readonly device: DeviceHandles;
  /** tempco and beta_exponent were both given. */
  readonly statedTemperatureLaws: boolean;
  /** Defaults in use, a sentence each. */
  readonly assumptions: readonly string[];
}

/** Fields that have a default and what else must be given for the default to matter (null: always). */
const DEFAULTED: readonly { readonly field: DefaultField; readonly matters: (given: GivenFields) => boolean }[] = [
  { field: 'tempco', matters: () => true },
  { field: 'beta_exponent', matters: () => true },
  { field: 'T_nom', matters: () => true },
  { field: 'doubling', matters: (given) => given.has('I_GSS') },
  { field: 'phi', matters: (given) => given.has('gamma') },
  { field: 'PB', matters: hasCapacitance },
  { field: 'M', matters: hasCapacitance },
];

const ROUGH_C_GD = 'C_GD of a MOSFET is taken to follow the junction law, which is rough.';

/** Collects the device of a part, in the n-channel frame. */
export function partDevice(family: 'JFET' | 'MOSFET', law: PartLaw, given: GivenFields, builder: Builder): PartDevice {
  const defaults = DEFAULTS[family];
  const only = (name: string): Handle | null => given.get(name)?.[0]?.handle ?? null;
  const orDefault = (name: DefaultField): Handle => only(name) ?? builder.constant(defaults[name].value);
  const PB = orDefault('PB');
  const M = orDefault('M');
  const { C_GS, C_GD } = capacitances(family, given, PB, M, builder);
  return {
    device: {
      beta: law.used.beta,
      V_TO: law.used.V_TO,
      lambda: law.lambda,
      gamma: only('gamma'),
      phi: orDefault('phi'),
      r_s: law.r_s,
      r_d: law.r_d,
      I_GSS: only('I_GSS'),
      doubling: orDefault('doubling'),
      tempco: orDefault('tempco'),
      beta_exponent: orDefault('beta_exponent'),
      T_nom: orDefault('T_nom'),
      R_thJA: only('R_thJA'),
      C_GS,
      C_GD,
      PB,
      M,
    },
    statedTemperatureLaws: given.has('tempco') && given.has('beta_exponent'),
    assumptions: [
      ...DEFAULTED.filter(({ field, matters }) => !given.has(field) && matters(given)).map(
        ({ field }) => defaults[field].sentence,
      ),
      ...(family === 'MOSFET' && C_GD !== null ? [ROUGH_C_GD] : []),
    ],
  };
}

/**
 * C_GS and C_GD at 0 V: as given, or C_iss - C_rss and C_rss at their stated voltages, taken back to 0 V by the
 * junction law where the capacitance follows it.
 */
function capacitances(
  family: 'JFET' | 'MOSFET',
  given: GivenFields,
  PB: Handle,
  M: Handle,
  builder: Builder,
): { C_GS: Handle | null; C_GD: Handle | null } {
  const [iss, rss] = [given.get('C_iss')?.[0], given.get('C_rss')?.[0]];
  const atZero = (value: Handle, forward: number, follows: boolean): Handle =>
    follows && forward !== 0
      ? builder.call('zero-bias capacitance', [value, builder.constant(forward), PB, M], 1)[0]!
      : value;
  const law = JUNCTION_LAW[family];
  const C_GD = given.get('C_GD')?.[0]?.handle ?? (rss ? atZero(rss.handle, gateDrain(rss), law.C_GD) : null);
  const C_GS =
    given.get('C_GS')?.[0]?.handle ??
    (iss && rss ? atZero(builder.sub(iss.handle, rss.handle), gateSource(iss), law.C_GS) : null);
  return { C_GS, C_GD };
}

/** Forward voltage of the gate against the source at which a row was measured, in the n-channel frame: reverse bias however it is signed. */
function gateSource(field: GivenField): number {
  return -Math.abs(field.conditions.get('V_GS') ?? 0);
}

/** The same of the gate against the drain. */
function gateDrain(field: GivenField): number {
  const stated = field.conditions.get('V_DG');
  if (stated !== undefined) return -Math.abs(stated);
  return gateSource(field) - Math.abs(field.conditions.get('V_DS') ?? 0);
}

function hasCapacitance(given: GivenFields): boolean {
  return given.has('C_GS') || given.has('C_GD') || given.has('C_rss');
}
