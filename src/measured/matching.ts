// Specimens that go together: groups whose V_GS at a current differ as little as can be.

import type { LawFit } from './law-fit.ts';

interface MatchOptions {
  readonly size: 2 | 4;
  /** The current at which they work, and a second one at which they are to agree as well, in A. */
  readonly I_D: number;
  readonly I_second: number | null;
  /** In V, by its amount; NaN for the edge of saturation, without lambda. */
  readonly V_DS: number;
}

interface Member {
  /** Place in the list of fits. */
  readonly index: number;
  /** V at the first and at the second current, as a voltmeter shows it. */
  readonly V_GS: number;
  readonly second: number | null;
  /** Ohms in its source lead that bring its gate to that of the group's highest at the first current; 0 for that one. */
  readonly R_S: number;
}

interface Group {
  readonly members: readonly Member[];
  /** Largest difference of V_GS in V: the offset at the gates. At the second current, without and with the resistors. */
  readonly difference: number;
  readonly second: number | null;
  readonly equalised: number | null;
}

/**
 * Groups with the least sum of differences at the first current, the best first; `single` are those left over. In order of
 * V_GS the members of a group stand side by side, so that the best choice of who is left over is found from one end to the other.
 */
export function matchGroups(
  fits: readonly LawFit[],
  options: MatchOptions,
): { readonly groups: readonly Group[]; readonly single: readonly number[] } {
  const { size, I_D, I_second } = options;
  const rows = fits
    .map((fit, index) => ({
      index,
      channel: fit.channel,
      V_GS: gateVoltage(fit, I_D, options.V_DS),
      second: I_second === null ? null : gateVoltage(fit, I_second, options.V_DS),
    }))
    .toSorted((a, b) => a.V_GS - b.V_GS);
  const starts = bestStarts(
    rows.map(({ V_GS }) => V_GS),
    size,
  );
  const taken = new Set(starts.flatMap((start) => Array.from({ length: size }, (_, k) => start + k)));
  const groups = starts.map((start): Group => {
    const group = rows.slice(start, start + size);
    const top = Math.max(...group.map(({ channel, V_GS }) => channel * V_GS));
    const members = group.map(({ index, channel, V_GS, second }): Member => ({
      index,
      V_GS,
      second,
      R_S: (top - channel * V_GS) / I_D,
    }));
    return {
      members,
      difference: reach(members.map(({ V_GS }) => V_GS)),
      second: I_second === null ? null : reach(members.map(({ second }) => second!)),
      equalised:
        I_second === null
          ? null
          : reach(members.map(({ second, R_S }) => group[0]!.channel * second! + R_S * I_second)),
    };
  });
  return {
    groups: groups.toSorted((a, b) => a.difference - b.difference),
    single: rows.flatMap(({ index }, k) => (taken.has(k) ? [] : [index])),
  };
}

/** V_GS in saturation, as a voltmeter shows it. */
function gateVoltage({ channel, beta, V_TO, lambda }: LawFit, I_D: number, V_DS: number): number {
  const modulation = Number.isNaN(V_DS) ? 1 : 1 + lambda * V_DS;
  return V_TO + channel * Math.sqrt(I_D / (beta * modulation));
}

/** Where groups begin in a sorted list, as many as fit in, so that the sum of their reaches is least. */
function bestStarts(sorted: readonly number[], size: number): number[] {
  const count = sorted.length;
  const spare = count % size;
  // least[left][k]: the least sum over the first k, with so many of them left over; `joins` says how it came about.
  const least = Array.from({ length: spare + 1 }, () => new Float64Array(count + 1).fill(Infinity));
  const joins = Array.from({ length: spare + 1 }, () => new Uint8Array(count + 1));
  least[0]![0] = 0;
  for (let k = 1; k <= count; k++) {
    for (let left = 0; left <= spare; left++) {
      const grouped = k >= size ? least[left]![k - size]! + sorted[k - 1]! - sorted[k - size]! : Infinity;
      const alone = left > 0 ? least[left - 1]![k - 1]! : Infinity;
      least[left]![k] = Math.min(grouped, alone);
      joins[left]![k] = grouped <= alone && grouped < Infinity ? 1 : 0;
    }
  }
  const starts: number[] = [];
  for (let k = count, left = spare; k > 0;) {
    if (joins[left]![k] === 1) starts.unshift((k -= size));
    else {
      k--;
      left--;
    }
  }
  return starts;
}

function reach(values: readonly number[]): number {
  return Math.max(...values) - Math.min(...values);
}
