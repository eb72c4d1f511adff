// What looking for the answers of an inverse cell comes to.

import type { ScannedRoots } from '../numeric/index.ts';

/** What a search for the answers of an inverse cell has found. */
export interface Answers extends ScannedRoots {
  /** `range`: the range has no two different finite ends; `depth`: too many inverse cells stand in each other. */
  readonly obstacle: 'range' | 'depth' | null;
  readonly low: number;
  readonly high: number;
  /** The slots of the sheet turned to the one answer; null where there is none. */
  readonly atAnswer: Float64Array | null;
}
