// Readings of one specimen, as meters showed them.

/** Readings in V and A, one number each; voltages with the sign a voltmeter shows, currents positive on both channels. */
export interface Points {
  readonly V_GS: Float64Array;
  readonly V_DS: Float64Array;
  readonly I_D: Float64Array;
}

/** The readings in the frame of an n-channel FET. */
export function mirrored({ V_GS, V_DS, I_D }: Points, channel: 1 | -1): Points {
  return { V_GS: V_GS.map((v) => channel * v), V_DS: V_DS.map((v) => channel * v), I_D };
}
