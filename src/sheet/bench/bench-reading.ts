// What a bench has found, as figures, tables and the record show it. Voltages as a voltmeter shows them.

import type { Points } from '../../measured/index.ts';

/** One specimen and the square law that was fitted to its points. */
export interface SpecimenReading {
  /** '' where the bench holds one specimen without a name. */
  readonly name: string;
  /** The lines `keep` leave it. */
  readonly isKept: boolean;
  readonly points: Points;
  /** Of each point: cutoff, ohmic or saturation. */
  readonly regions: readonly string[];
  /** Measured minus law in A, for each point. */
  readonly residuals: Float64Array;
  readonly beta: number;
  readonly V_TO: number;
  /** 0 where the channel is closed at V_GS = 0. */
  readonly I_DSS: number;
  readonly lambda: number;
  /** 2, or what fits best where it is free. */
  readonly exponent: number;
  /** Standard errors; null where a constant was not fitted, and where as many readings as constants leave none. */
  readonly errors: {
    readonly beta: number | null;
    readonly V_TO: number | null;
    readonly I_DSS: number | null;
    readonly lambda: number | null;
    readonly exponent: number | null;
  };
  /** Of the residuals, in A. */
  readonly rms: number;
  /** Drain current of the fitted law. */
  readonly law: (vgs: number, vds: number) => number;
}

/** One specimen of a group. */
interface MemberReading {
  readonly name: string;
  /** At the current of the stage, and at the second one. */
  readonly V_GS: number;
  readonly second: number | null;
  /** The resistor in its source lead that makes it look like the others, in ohm; 0 for the one that needs none. */
  readonly R_S: number;
}

/** Specimens whose V_GS lie next to each other at the current of their stage. */
interface GroupReading {
  readonly members: readonly MemberReading[];
  /** The largest difference of V_GS in it, which is the offset of a pair at equal currents. */
  readonly difference: number;
  /** The same at the second current; null where none is asked for. */
  readonly second: number | null;
  /** What is left of it there with the resistors in place. */
  readonly equalised: number | null;
}

export interface MatchReading {
  readonly size: 2 | 4;
  readonly I_D: number;
  readonly I_second: number | null;
  /** By its amount; NaN for the edge of saturation without lambda. */
  readonly V_DS: number;
  readonly groups: readonly GroupReading[];
  /** Specimens left over. */
  readonly single: readonly string[];
}

/** One specimen and the resistor that sets it to the current. */
export interface FittedReading {
  readonly name: string;
  readonly V_GS: number;
  /** In ohm; null where no resistor above 0 sets the current. */
  readonly R_S: number | null;
  /** The nearest value that is sold, and the current with it. */
  readonly bought: { readonly R_S: number; readonly I_D: number } | null;
}

/** For a V_GS between two values, the resistor to fit; `from` is that of the smaller drop. */
export interface FittingRow {
  readonly from: number;
  readonly to: number;
  readonly R_S: number;
}

/** Which resistor sets which specimen to a current. */
export interface FittingReading {
  readonly I_D: number;
  /** By its amount; NaN for the edge of saturation without lambda. */
  readonly V_DS: number;
  readonly V_GG: number;
  readonly specimens: readonly FittedReading[];
  readonly table: readonly FittingRow[];
}

export interface BenchReading {
  readonly name: string;
  readonly channel: 1 | -1;
  /** How many are kept, and which share of a whole batch would be, with its exact interval at 95 %; null where all are kept unasked. */
  readonly kept: { readonly count: number; readonly of: number; readonly low: number; readonly high: number } | null;
  readonly specimens: readonly SpecimenReading[];
  /** Those that no law fits, which are left out. */
  readonly unfitted: readonly { readonly name: string; readonly readings: number; readonly text: string }[];
  readonly match: MatchReading | null;
  readonly fitting: FittingReading | null;
}
