// Readings from which no law can be had, and why.

import type { Points } from './points.ts';

/** Why there is no fit. */
export interface FitFault {
  readonly code: string;
  readonly text: string;
}

/** A law of two constants wants one reading more than that. */
const LEAST = 3;

/** What keeps readings (n-channel frame) from being fitted; null where nothing does. */
export function unusable({ V_GS, V_DS, I_D }: Points, channel: 1 | -1): FitFault | null {
  const all = [...V_GS, ...V_DS, ...I_D];
  if (!all.every(Number.isFinite))
    return { code: 'not-finite', text: 'A reading is no finite number. Give every row V_GS, V_DS and I_D.' };
  const conducting = [...I_D.keys()].filter((i) => I_D[i] !== 0);
  if (conducting.length === 0)
    return { code: 'no-current', text: 'No reading carries current. Measure with the channel on, in saturation best.' };
  const against = conducting.filter((i) => V_DS[i]! !== 0 && V_DS[i]! > 0 !== I_D[i]! > 0);
  if (2 * against.length > conducting.length) {
    const [kind, sign] = channel === 1 ? ['an n', 'positive'] : ['a p', 'negative'];
    return {
      code: 'signs',
      text: `The signs do not fit ${kind}-channel FET: its V_DS is ${sign} where current flows, and its current is written positive.`,
    };
  }
  if (conducting.length < LEAST) {
    return {
      code: 'too-few',
      text: `${conducting.length} ${conducting.length === 1 ? 'reading carries' : 'readings carry'} current, and a law wants at least ${LEAST}. Measure more of them.`,
    };
  }
  return null;
}
