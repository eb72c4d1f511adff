// The numbers that describe one specimen of a FET to a stage or a point: SI, n-channel frame.

import type { Handle } from './emitter.ts';

/** What one device field means, and what its absence means. */
interface DeviceFieldInfo {
  readonly unit: string;
  readonly sentence: string;
  /** Where the part says nothing; null: the effect is left out and no operation is emitted for it. */
  readonly fallback: number | null;
}

/** Every device field, its unit and its meaning; voltages in the n-channel frame, temperatures in kelvin. */
export const DEVICE_FIELDS = {
  beta: { unit: 'A/V^2', sentence: 'square-law constant at T_nom', fallback: null },
  V_TO: { unit: 'V', sentence: 'threshold (pinch-off) voltage at T_nom without back bias', fallback: null },
  lambda: { unit: '1/V', sentence: 'channel-length modulation', fallback: 0 },
  gamma: { unit: 'V^0.5', sentence: 'body-effect constant', fallback: null },
  phi: { unit: 'V', sentence: 'surface potential of the body effect', fallback: 0.6 },
  r_s: { unit: 'ohm', sentence: 'resistance inside the source lead', fallback: null },
  r_d: { unit: 'ohm', sentence: 'resistance inside the drain lead', fallback: null },
  I_GSS: { unit: 'A', sentence: 'gate leakage at T_nom', fallback: null },
  doubling: { unit: 'K', sentence: 'temperature step that doubles the gate leakage', fallback: 10 },
  tempco: { unit: 'V/K', sentence: 'change of V_TO with temperature', fallback: 0 },
  beta_exponent: { unit: '1', sentence: 'power of T / T_nom in beta', fallback: 0 },
  T_nom: { unit: 'K', sentence: 'temperature at which the fields hold', fallback: 298.15 },
  R_thJA: { unit: 'K/W', sentence: 'thermal resistance from junction to ambient', fallback: null },
  C_GS: { unit: 'F', sentence: 'gate-source capacitance at 0 V', fallback: null },
  C_GD: { unit: 'F', sentence: 'gate-drain capacitance at 0 V', fallback: null },
  PB: { unit: 'V', sentence: 'built-in potential of the junction law', fallback: 0.8 },
  M: { unit: '1', sentence: 'grading exponent of the junction law', fallback: 0.5 },
} as const satisfies Record<string, DeviceFieldInfo>;

export type DeviceField = keyof typeof DEVICE_FIELDS;

/** The fields whose absence is told by null; all others always have a handle. */
type OptionalDeviceField = 'gamma' | 'r_s' | 'r_d' | 'I_GSS' | 'R_thJA' | 'C_GS' | 'C_GD';

/** The device fields of one specimen as the running program knows them. */
export type DeviceHandles = { readonly [F in Exclude<DeviceField, OptionalDeviceField>]: Handle } & {
  readonly [F in OptionalDeviceField]: Handle | null;
};
