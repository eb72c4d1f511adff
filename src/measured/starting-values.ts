// Where a fit begins: thresholds below the readings that conduct, near and far, each with the beta that suits it best.

import { BETA, CONSTANTS, EXPONENT, fillCurrents, LAMBDA, V_TO } from './law.ts';
import type { Points } from './points.ts';
import { exp, ln } from '../numeric/index.ts';

/** A reading conducts from this share of the largest current on. */
const CONDUCTS = 1e-3;
/** Thresholds are tried so far below the first reading that conducts, as shares of the range of the readings. */
const NEAREST = 0.003;
const FURTHEST = 300;
const TRIALS = 48;
/** Fits begun at most. */
const STARTS = 3;

/** Constants to begin with (n-channel frame, exponent 2), the most promising first; none where nothing conducts. */
export function startingValues(points: Points, lambda: number): Float64Array[] {
  const { V_GS, V_DS, I_D } = points;
  const most = I_D.reduce((largest, current) => Math.max(largest, Math.abs(current)), 0);
  const conducting = [...I_D.keys()].filter((i) => Math.abs(I_D[i]!) > CONDUCTS * most);
  if (!(most > 0)) return [];
  const drive = (i: number): number => (V_DS[i]! < 0 ? V_GS[i]! - V_DS[i]! : V_GS[i]!);
  const first = Math.min(...conducting.map(drive));
  const range = Math.max(Math.max(...conducting.map(drive)) - first, ...conducting.map((i) => Math.abs(V_DS[i]!)), 0.1);
  const currents = new Float64Array(I_D.length);
  const tried = Array.from({ length: TRIALS }, (_, k) => {
    const share = exp(ln(NEAREST) + (ln(FURTHEST / NEAREST) * k) / (TRIALS - 1));
    const law = new Float64Array(CONSTANTS);
    law[BETA] = 1;
    law[V_TO] = first - share * range;
    law[LAMBDA] = lambda;
    law[EXPONENT] = 2;
    fillCurrents(law, points, currents);
    let [products, squares, own] = [0, 0, 0];
    for (let i = 0; i < currents.length; i++) {
      products += currents[i]! * I_D[i]!;
      squares += currents[i]! * currents[i]!;
      own += I_D[i]! * I_D[i]!;
    }
    law[BETA] = products / squares;
    return { law, cost: own - (products * products) / squares };
  }).filter(({ law }) => law[BETA]! > 0);
  const isLeast = ({ cost }: { cost: number }, k: number): boolean =>
    cost <= (tried[k - 1]?.cost ?? Infinity) && cost <= (tried[k + 1]?.cost ?? Infinity);
  return tried
    .filter(isLeast)
    .toSorted((a, b) => a.cost - b.cost)
    .slice(0, STARTS)
    .map(({ law }) => law);
}
