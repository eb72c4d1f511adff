// Kernel of a quotient that has a meaning wherever its parts have one: a resistance or a gain that no current
// limits is infinite, and nothing over nothing is nothing.

import type { Kernel } from './kernel.ts';

/** x / y for y not below 0; with y = 0 it is infinite with the sign of x, and 0 where x is 0 too. */
export const ratio: Kernel = {
  inputs: ['x', 'y'],
  outputs: ['quotient'],
  run(s, a, p) {
    const x = s[a[p]];
    const y = s[a[p + 1]];
    s[a[p + 2]] = y === 0 ? (x === 0 ? 0 : x * Infinity) : x / y;
  },
  lanes: 'quotient = select(y == 0, select(x == 0, 0, x * Infinity), x / y)',
};
