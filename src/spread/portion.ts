// How builds are cut into portions. The last digits of their sums depend on the cut, so there is one cut, whoever counts.

/** Builds of a full portion. */
const FULL = 8192;
/** Builds of the first one, after which the first counts can be shown; it and the second make up a full one. */
const FIRST = 512;

/** Builds `first` .. `first + count`. */
interface Portion {
  readonly first: number;
  readonly count: number;
}

/** The portions of so many builds, in the order in which their tallies add up. */
export function portionsOf(samples: number): Portion[] {
  const portions: Portion[] = [];
  for (let first = 0; first < samples;) {
    const count = Math.min(first === 0 ? FIRST : FULL - (first % FULL), samples - first);
    portions.push({ first, count });
    first += count;
  }
  return portions;
}
