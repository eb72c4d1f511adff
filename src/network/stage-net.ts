// A stage as the lowering takes it: its FETs, its named nodes and its legs with every name resolved.
// Voltages and currents stand in the true frame of the circuit; only the kernels mirror a p-channel FET.

import type { DeviceHandles } from './device-field.ts';
import type { Handle } from './emitter.ts';

/** Where a leg ends. `signal` is 0 V at rest and 0 ohm; `-signal` and `common` serve differential drive. */
export type PlaceRef =
  | { readonly type: 'node'; readonly name: string }
  /** `volts` null: known to be 0 V. */
  | { readonly type: 'rail'; readonly volts: Handle | null; readonly label: string }
  | { readonly type: 'signal'; readonly inverted: boolean }
  | { readonly type: 'common' };

/** What hangs between two places: value in SI (ohm, farad, henry, ampere), its nominal, its name for messages. */
export interface NetElement {
  readonly kind: 'resistor' | 'capacitor' | 'inductor' | 'source';
  readonly value: Handle;
  readonly nominal: number;
  readonly label: string;
}

/** One leg; without an element it ties the two places together. */
export interface NetLeg {
  /** The place whose line holds the leg: a terminal or a named node. */
  readonly from: string;
  readonly element: NetElement | null;
  /** `1 mA from V_DD`: the source drives from the far place into `from`. */
  readonly reversed: boolean;
  readonly to: PlaceRef;
  /** Index of the leg in the stage's text, for messages. */
  readonly leg: number;
}

/** One FET of a stage. Its terminals are `gate`, `drain`, `source`, `bulk`, or `NAME.gate` .. where it has a name. */
export interface NetFet {
  readonly name: string | null;
  readonly channel: 1 | -1;
  readonly family: 'JFET' | 'MOSFET';
  readonly device: DeviceHandles;
}

/** The whole input of the lowering. */
export interface StageNet {
  /** One FET; several have a solver of their own. */
  readonly fets: readonly NetFet[];
  /** Nodes that have a line of their own; `load` is the outside world. */
  readonly nodes: readonly string[];
  readonly legs: readonly NetLeg[];
  readonly output: { readonly plus: string; readonly minus: string | null } | null;
  /** The resistance that belongs to the test source (`driven: through R`). */
  readonly driven: Handle | null;
  /** Ambient temperature in kelvin. */
  readonly ambient: Handle;
}

/** What keeps a stage from being computed. */
export interface StageFault {
  readonly code: StageFaultCode;
  /** Whole sentence(s), the place first. */
  readonly text: string;
  /** Index of the leg it concerns, or null. */
  readonly leg: number | null;
}
type StageFaultCode =
  | 'terminal-without-leg'
  | 'no-such-place'
  | 'no-such-terminal'
  | 'node-floats'
  | 'two-rails'
  | 'resistor-not-positive'
  | 'element-not-positive'
  | 'currents-conflict'
  | 'several-fets';
