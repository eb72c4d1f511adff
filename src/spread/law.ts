// The laws of draws: how a share of units below becomes a place from -1, the low end, over 0, the nominal, to 1, the high end.

import { normalQuantile, normalShare } from '../numeric/index.ts';
import type { Drawn } from '../sheet/index.ts';

type Law = Drawn['spread']['law'];

/** A normal law has its limits at so many standard deviations and is cut off there (design: plus and minus three). */
const SIGMAS = 3;
const BELOW = normalShare(-SIGMAS);

/** The place of the unit below which a share u of all lies. */
export function placeAt(law: Law, u: number): number {
  return law === 'uniform' ? 2 * u - 1 : normalQuantile(BELOW + u * (1 - 2 * BELOW)) / SIGMAS;
}

/** The share of units below a place: the inverse of `placeAt`. */
export function quantileAt({ spread: { law } }: Drawn, t: number): number {
  return law === 'uniform' ? (t + 1) / 2 : (normalShare(SIGMAS * t) - BELOW) / (1 - 2 * BELOW);
}
