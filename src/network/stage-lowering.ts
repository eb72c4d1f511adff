// What the lowering of a stage answers with.

import type { Handle } from './emitter.ts';
import type { StageFault } from './stage-net.ts';

/** How the operating point is found: the engine's line solve, the general solve, or a current forced upon the channel. */
export type StagePath = 'line' | 'general' | 'forced';

/** Bias line and load line in the true frame: V_GS = V_GG - R_m I and V_DS = V_L - R_L I, I from drain to source. */
export interface BiasLines {
  readonly V_GG: Handle;
  readonly R_m: Handle;
  readonly V_L: Handle;
  readonly R_L: Handle;
}

/**
 * The network around the channel at midband. With the source at v_s and a change w of the channel current
 * (drain to source), v_gs = a_gs v_s - r_gs w, v_ds = a_ds v_s - r_ds w, v_sb = a_sb v_s + r_sb w and
 * v_out = a_out v_s - r_out w. Where no current can change (`currentFixed`) w stands for the free voltage instead.
 */
export interface MidbandPorts {
  readonly a_gs: Handle;
  readonly a_ds: Handle;
  readonly a_sb: Handle;
  readonly a_out: Handle;
  readonly r_gs: Handle;
  readonly r_ds: Handle;
  readonly r_sb: Handle;
  readonly r_out: Handle;
  readonly currentFixed: boolean;
}

/** Everything that is known about a lowered stage. */
export interface StageLowering {
  /** By offered name: `I_D`, `V_drain`, `A_v`. Empty where there are faults. */
  readonly values: ReadonlyMap<string, Handle>;
  /** Offered names that have no value in this stage, each with a sentence that says why. */
  readonly absent: ReadonlyMap<string, string>;
  readonly faults: readonly StageFault[];
  readonly path: StagePath;
  /** Code of the solve, a key of `POINT_STATUS`; where it is not 0 no value of the stage is one. */
  readonly status: Handle | null;
  /** How many junction temperatures balance the heat; null where the FET does not heat itself. */
  readonly thermalRoots: Handle | null;
  /** Codes of what limits the swing, keys of `SWING_LIMIT`. */
  readonly swingLimits: { readonly up: Handle; readonly down: Handle } | null;
  /** Bias line and load line; null where a current is forced. */
  readonly lines: BiasLines | null;
  readonly ports: MidbandPorts | null;
  /** Labels of the capacitors taken as shorts and of what is taken as open at midband. */
  readonly midband: { readonly shorted: readonly string[]; readonly open: readonly string[] };
}
