declare module 'jstat' {
  export const jStat: {
    readonly normal: {
      inv(p: number, mean: number, sd: number): number;
      cdf(x: number, mean: number, sd: number): number;
    };
    readonly beta: { inv(p: number, a: number, b: number): number };
    mean(values: readonly number[]): number;
    /** With `true` that of a sample. */
    variance(values: readonly number[], sample: boolean): number;
    quantiles(values: readonly number[], shares: readonly number[], alphap?: number, betap?: number): number[];
  };
}
