// The places of a stage as the nodes of a network: what is one piece of wire is one node, the rest are resistors and
// sources between nodes. Dense elimination, without any reduction beforehand.

import type { NaiveDevice } from './naive-device.ts';

export interface NaiveLeg {
  readonly from: string;
  readonly to: { readonly place: string } | { readonly rail: number; readonly label: string } | 'signal';
  readonly element: { readonly kind: 'R' | 'C' | 'L' | 'I'; readonly value: number } | null;
  readonly reversed: boolean;
}

export interface NaiveStage {
  readonly device: NaiveDevice;
  readonly nodes: readonly string[];
  readonly legs: readonly NaiveLeg[];
  readonly output: { readonly plus: string; readonly minus: string | null } | null;
  readonly driven: number | null;
  readonly ambient: number;
}

export interface Network {
  readonly rootOf: (place: string) => string;
  readonly held: ReadonlyMap<string, { readonly volts: number; readonly label: string }[]>;
  readonly free: readonly string[];
  readonly resistors: readonly { readonly a: string; readonly b: string; readonly g: number; readonly leg: NaiveLeg }[];
  readonly sources: readonly { readonly from: string; readonly to: string; readonly amps: number }[];
}

export function farPlace({ to }: NaiveLeg): string {
  if (to === 'signal') return 'signal';
  return 'place' in to ? to.place : `=${to.label}`;
}

/** Joins what is one piece of wire; the rest are resistors and sources between the pieces. */
export function networkOf(stage: NaiveStage, legs: readonly NaiveLeg[], isWire: (leg: NaiveLeg) => boolean): Network {
  const up = new Map<string, string>();
  const rootOf = (place: string): string => {
    const parent = up.get(place);
    return parent === undefined || parent === place ? place : rootOf(parent);
  };
  const places = new Set(['gate', 'drain', 'source', ...stage.nodes]);
  if (stage.device.family === 'MOSFET') places.add('bulk');
  for (const leg of legs) {
    places.add(leg.from).add(farPlace(leg));
    if (isWire(leg) && rootOf(leg.from) !== rootOf(farPlace(leg))) up.set(rootOf(leg.from), rootOf(farPlace(leg)));
  }
  const bulkIsTied = legs.some((leg) => leg.from === 'bulk' || farPlace(leg) === 'bulk');
  if (!bulkIsTied && places.has('bulk') && rootOf('bulk') !== rootOf('source'))
    up.set(rootOf('bulk'), rootOf('source'));
  const held = new Map<string, { volts: number; label: string }[]>();
  const hold = (place: string, volts: number, label: string): void => {
    const there = held.get(rootOf(place)) ?? [];
    if (!there.some((other) => other.label === label)) held.set(rootOf(place), [...there, { volts, label }]);
  };
  for (const leg of legs) {
    if (leg.to === 'signal') hold('signal', 0, 'signal');
    else if ('rail' in leg.to) hold(farPlace(leg), leg.to.rail, leg.to.label);
  }
  const between = legs.filter((leg) => rootOf(leg.from) !== rootOf(farPlace(leg)));
  return {
    rootOf,
    held,
    free: [...new Set([...places].map(rootOf))].filter((root) => !held.has(root)),
    resistors: between.flatMap((leg) =>
      leg.element?.kind === 'R'
        ? [{ a: rootOf(leg.from), b: rootOf(farPlace(leg)), g: 1 / leg.element.value, leg }]
        : [],
    ),
    sources: between.flatMap((leg) => {
      if (leg.element?.kind !== 'I') return [];
      const [from, to] = [rootOf(leg.from), rootOf(farPlace(leg))];
      return [{ from: leg.reversed ? to : from, to: leg.reversed ? from : to, amps: leg.element.value }];
    }),
  };
}

/** Gauss with pivoting on rows with their right side; an unknown that nothing determines is NaN, and what hangs on it. */
export function eliminate(matrix: Float64Array[]): Float64Array {
  const n = matrix.length;
  const pivots: number[] = [];
  let r = 0;
  for (let c = 0; c < n; c++) {
    const scale = Math.max(...matrix.map((line) => Math.abs(line[c])), 0);
    let best = r;
    for (let k = r; k < n; k++) if (Math.abs(matrix[k][c]) > Math.abs(matrix[best]?.[c] ?? 0)) best = k;
    if (r >= n || Math.abs(matrix[best][c]) <= 1e-14 * scale || scale === 0) continue;
    [matrix[r], matrix[best]] = [matrix[best], matrix[r]];
    for (let k = 0; k < n; k++) {
      if (k === r || matrix[k][c] === 0) continue;
      const f = matrix[k][c] / matrix[r][c];
      for (let j = c; j <= n; j++) matrix[k][j] -= f * matrix[r][j];
      matrix[k][c] = 0;
    }
    pivots[r++] = c;
  }
  const open = matrix.map((_, c) => c).filter((c) => !pivots.includes(c));
  const x = new Float64Array(n).fill(NaN);
  pivots.forEach((c, k) => {
    const hangs = open.some((o) => Math.abs(matrix[k][o]) > 1e-12 * Math.abs(matrix[k][c]));
    x[c] = hangs ? NaN : matrix[k][n] / matrix[k][c];
  });
  return x;
}

export function bulkOf({ device }: NaiveStage): string {
  return device.family === 'MOSFET' ? 'bulk' : 'source';
}
