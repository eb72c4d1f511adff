// Quantiles from the counts of equal bins.

/** A histogram: counts of equal bins from `low` to `high`; what lies beyond stands in the end bins, which reach to `least` and `largest`. */
interface Histogram {
  readonly counts: Float64Array;
  readonly low: number;
  readonly high: number;
  readonly least: number;
  readonly largest: number;
}

/**
 * The number below which a share p in 0..1 lies, evenly within its bin: off by less than a bin's width from the quantile of
 * the sample itself. NaN where nothing was counted.
 */
export function quantileOf({ counts, low, high, least, largest }: Histogram, p: number): number {
  let total = 0;
  for (let i = 0; i < counts.length; i++) total += counts[i];
  if (total === 0) return NaN;
  const wanted = p * total;
  const width = (high - low) / counts.length;
  let below = 0;
  for (let i = 0; i < counts.length; i++) {
    const here = counts[i];
    if (here > 0 && below + here >= wanted) {
      const from = i === 0 ? Math.min(least, low) : low + i * width;
      const to = i === counts.length - 1 ? Math.max(largest, high) : low + (i + 1) * width;
      return Math.max(least, Math.min(largest, from + ((wanted - below) / here) * (to - from)));
    }
    below += here;
  }
  return largest;
}
