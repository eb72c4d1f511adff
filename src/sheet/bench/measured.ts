// What a bench tells the parts that are fitted to it: plain numbers, so that equal ones leave the part as it is.

/** A constant of the law as measured; one specimen has a standard error, several have ends around their median. */
interface MeasuredNumber {
  readonly nominal: number;
  readonly low: number | null;
  readonly high: number | null;
  /** null where it was not fitted, or where several specimens stand side by side. */
  readonly error: number | null;
}

export interface Measured {
  readonly channel: 1 | -1;
  /** The channel conducts at V_GS = 0. */
  readonly depletion: boolean;
  readonly specimens: number;
  /** How many of them the lines `keep` leave. */
  readonly kept: number;
  /** A/V². */
  readonly beta: MeasuredNumber;
  /** V, as a voltmeter shows it. */
  readonly V_TO: MeasuredNumber;
  /** A; 0 where the channel is closed at V_GS = 0. */
  readonly I_DSS: MeasuredNumber;
  /** 1/V. */
  readonly lambda: MeasuredNumber;
  /** How far the amounts of threshold and current go together from specimen to specimen, -1..1; null for one. */
  readonly tracking: number | null;
}
