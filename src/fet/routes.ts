// Every way in which a part's lines settle the two constants of the square law, in the order in which
// they are tried: the first whose `needs` are all given computes, the others are compared.

import type { Family } from './kinds.ts';
import type { NamedKernel } from './kernel.ts';
import { pairKernel } from './pair-solution.ts';
import {
  BETA_CARD,
  G_FS,
  I_DSS,
  I_on,
  JFET_R_DSon,
  JFET_V_TO,
  K,
  K_P,
  MOSFET_R_DSon,
  MOSFET_V_TO,
  V_GSoff,
  V_GSth,
  V_P,
} from './route-legs.ts';
import type { Leg } from './route-legs.ts';
import { G_FS0_AND_I_DSS, I_DSS_AND_BETA, THREE_R_DSON, TWO_R_DSON } from './special-routes.ts';

/** A route. Its kernel bears the name `id` and writes beta, V_TO in the n-channel frame and the status first. */
export interface Route extends NamedKernel {
  readonly id: string;
  readonly families: readonly Family[];
  /** Fields and test conditions (`I_on@V_GS`, `R_DSon2@V_GS` for the second R_DSon) that must be given. */
  readonly needs: readonly string[];
}

function route(families: readonly Family[], needs: readonly string[], law: NamedKernel): Route {
  const fields = needs.filter((name) => !name.includes('@'));
  return { id: `${fields.join(' with ')} of a ${families.join(' or ')}`, families, needs, ...law };
}

function pair(families: readonly Family[], threshold: Leg, gain: Leg): Route {
  return route(families, [...gain.needs, ...threshold.needs], pairKernel(threshold, gain));
}

const JFET: readonly Family[] = ['JFET'];
const MOSFET: readonly Family[] = ['MOSFET'];
const BOTH: readonly Family[] = ['JFET', 'MOSFET'];

const R_DSON_LINES = ['R_DSon', 'R_DSon@V_GS', 'R_DSon2', 'R_DSon2@V_GS', 'R_DSon3', 'R_DSon3@V_GS'];

/** All routes, best first; three R_DSon lines also give R_0, as a fourth output. */
export const ROUTES: readonly Route[] = [
  pair(BOTH, V_P, I_DSS),
  pair(BOTH, V_GSoff, I_DSS),
  pair(JFET, JFET_V_TO, BETA_CARD),
  route(JFET, ['I_DSS', 'beta'], I_DSS_AND_BETA),
  route(JFET, ['g_fs0', 'I_DSS'], G_FS0_AND_I_DSS),
  pair(JFET, V_P, G_FS),
  pair(JFET, V_GSoff, G_FS),
  pair(JFET, V_P, JFET_R_DSon),
  pair(JFET, V_GSoff, JFET_R_DSon),
  ...[MOSFET_V_TO, V_GSth].flatMap((threshold) =>
    [K, K_P, I_on, G_FS, MOSFET_R_DSon].map((gain) => pair(MOSFET, threshold, gain)),
  ),
  route(MOSFET, R_DSON_LINES, THREE_R_DSON),
  route(MOSFET, R_DSON_LINES.slice(0, 4), TWO_R_DSON),
];
