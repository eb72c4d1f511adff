// Times several ways of doing the same work in one process. The ways take turns, each round begins with another one,
// the first rounds are thrown away and the median of the others counts: so a slow moment of the machine strikes all of
// them alike, and ratios hold where nanoseconds do not.

export interface Variant {
  readonly name: string;
  /** Does the work once; the sum it returns keeps the work from being left out. */
  readonly run: () => number;
  /** Least and most that the time may be, as a multiple of the reference's (the first variant). */
  readonly target?: { readonly atLeast?: number; readonly atMost?: number };
}

export interface Timing {
  readonly name: string;
  /** Nanoseconds for one unit of the work. */
  readonly ns: number;
  readonly ratio: number;
  readonly target: Variant['target'];
}

export interface CompareOptions {
  /** Into how many units one run divides. */
  readonly units: number;
  readonly rounds: number;
  readonly warmUps: number;
  /** Milliseconds that one variant runs in one round. */
  readonly turn: number;
  /** Milliseconds since some moment. */
  readonly clock: () => number;
}

const DEFAULTS: CompareOptions = { units: 1, rounds: 9, warmUps: 2, turn: 20, clock: () => performance.now() };

/** Times `variants` in turns; the ratios are medians of the rounds' own ratios to the first variant. */
export function compare(variants: readonly Variant[], options: Partial<CompareOptions> = {}): Timing[] {
  const { units, rounds, warmUps, turn, clock } = { ...DEFAULTS, ...options };
  const times = variants.map((): number[] => []);
  for (let round = -warmUps; round < rounds; round++) {
    for (let place = 0; place < variants.length; place++) {
      const index = (place + round + warmUps) % variants.length;
      const ns = timeOnce(variants[index].run, turn, clock) / units;
      if (round >= 0) times[index].push(ns);
    }
  }
  return variants.map(({ name, target }, index) => ({
    name,
    ns: median(times[index]),
    ratio: median(times[index].map((ns, round) => ns / times[0][round])),
    target,
  }));
}

/** Nanoseconds of one run, over as many runs as fit into `turn`. */
function timeOnce(run: () => number, turn: number, clock: () => number): number {
  let sum = 0;
  let runs = 0;
  const start = clock();
  let end: number;
  do {
    sum += run();
    runs++;
    end = clock();
  } while (end - start < turn);
  if (Number.isNaN(sum)) throw new Error('A variant came out as NaN: what is timed is not the work.');
  return ((end - start) * 1e6) / runs;
}

function median(values: readonly number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2;
}

/** The timings as a table, each ratio beside its target. */
export function formatTimings(title: string, unit: string, timings: readonly Timing[]): string {
  const width = Math.max(...timings.map(({ name }) => name.length));
  const rows = timings.map(({ name, ns, ratio, target }) => {
    const time = ns >= 1000 ? Math.round(ns).toString() : ns.toPrecision(3);
    return `  ${name.padEnd(width)}  ${time.padStart(9)}  ${ratio.toPrecision(3).padStart(8)}  ${judge(ratio, target)}`;
  });
  return [
    `${title}`,
    `  ${''.padEnd(width)}  ${`ns/${unit}`.padStart(9)}  ${'ratio'.padStart(8)}  target`,
    ...rows,
  ].join('\n');
}

function judge(ratio: number, target: Variant['target']): string {
  if (target === undefined) return '';
  const { atLeast = 0, atMost = Infinity } = target;
  const words = [
    atLeast > 0 ? `at least ${short(atLeast)}` : '',
    atMost < Infinity ? `at most ${short(atMost)}` : '',
  ].filter((word) => word !== '');
  return `${words.join(', ')}: ${ratio >= atLeast && ratio <= atMost ? 'met' : 'MISSED'}`;
}

function short(ratio: number): string {
  return Number(ratio.toPrecision(2)).toString();
}
