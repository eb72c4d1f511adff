// What a fit comes to.

/** Something to know of a fit. */
export interface FitFlag {
  readonly code: 'spacing' | 'law' | 'lambda' | 'outliers' | 'no-saturation' | 'exponent';
  readonly text: string;
}

/** The law of one specimen: I_D = beta V_ov^exponent (1 + lambda V_DS) in saturation. */
export interface LawFit {
  readonly channel: 1 | -1;
  /** A/V² (A/V^exponent where that is free). */
  readonly beta: number;
  /** V, as a voltmeter shows it. */
  readonly V_TO: number;
  /** 1/V. */
  readonly lambda: number;
  readonly exponent: number;
  /** Standard errors in the units of the constants; null where a constant was not fitted. */
  readonly errors: {
    readonly beta: number;
    readonly V_TO: number;
    readonly lambda: number | null;
    readonly exponent: number | null;
  };
  /** Of the errors of beta and V_TO, n-channel frame. */
  readonly correlation: number;
  /** Root mean square of the residuals in A, and as a share of the root mean square of the readings. */
  readonly rms: number;
  readonly relative: number;
  /** Readings less law, A. */
  readonly residuals: Float64Array;
  /** For each reading `cutoff`, `ohmic` or `saturation`, by the fitted law. */
  readonly regions: readonly string[];
  readonly flags: readonly FitFlag[];
}
