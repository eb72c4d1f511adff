// Judges and solves stages by nodal equations over all places at once, dense and without any reduction:
// the plain way, against which the reduced one is held.

import type { NetLeg, StageNet } from '../../src/network/index.ts';

/** Numbers of a stage by handle. */
export type ValueOf = (handle: number) => number;

/** Small-signal slopes of the FET, S. */
export interface OracleSlopes {
  readonly gm: number;
  readonly gds: number;
  readonly gmb: number;
}

/**
 * Largest sum of currents (A) at any place that is free at rest, beyond what the last digits of the highest voltage make, divided by the largest current that flows anywhere.
 * `voltage` gives each place's voltage, `current` the channel current from drain to source in the true frame.
 */
export function currentImbalance(
  net: StageNet,
  valueOf: ValueOf,
  voltage: (place: string) => number,
  current: number,
  leakage: number,
): number {
  const groups = joined(net, (leg) => !leg.element || leg.element.kind === 'inductor');
  const sums = new Map<string, number>();
  const roundings = new Map<string, number>();
  let largest = Math.abs(current);
  const flow = (from: string, to: string, amps: number): void => {
    largest = Math.max(largest, Math.abs(amps));
    sums.set(groups(from), (sums.get(groups(from)) ?? 0) - amps);
    sums.set(groups(to), (sums.get(groups(to)) ?? 0) + amps);
  };
  const at = (place: string): number => {
    if (place.startsWith('=')) return valueOf(Number(place.slice(1)));
    return place === '0' || place === 'signal' ? 0 : voltage(place);
  };
  // A voltage may be the difference of two of the order of the highest one in the stage.
  const highest = Math.max(...net.legs.flatMap((leg) => [Math.abs(at(leg.from)), Math.abs(at(farPlace(leg)))]));
  for (const leg of net.legs) {
    const far = farPlace(leg);
    if (leg.element?.kind === 'resistor') {
      const ohms = valueOf(leg.element.value);
      flow(leg.from, far, (at(leg.from) - at(far)) / ohms);
      const rounding = (2 ** -50 * highest) / ohms;
      for (const place of [leg.from, far]) roundings.set(groups(place), (roundings.get(groups(place)) ?? 0) + rounding);
    }
    if (leg.element?.kind === 'source') {
      if (leg.reversed) flow(far, leg.from, valueOf(leg.element.value));
      else flow(leg.from, far, valueOf(leg.element.value));
    }
  }
  flow('drain', 'source', current);
  flow('drain', 'gate', leakage);
  const held = new Set([...fixedPlaces(net)].map(groups));
  let worst = 0;
  for (const [place, sum] of sums)
    if (!held.has(place)) worst = Math.max(worst, Math.abs(sum) - (roundings.get(place) ?? 0));
  return largest === 0 ? worst : worst / largest;
}

/** A_v, R_in and R_out at midband by one dense solve each; null where the equations are singular. */
export function midbandByNodes(
  net: StageNet,
  valueOf: ValueOf,
  slopes: OracleSlopes,
): { gain: number; rin: number; rout: number } | null {
  const driven = solveSmall(net, valueOf, slopes, { volts: 1, push: 0 }, net.legs);
  const inside = net.legs.filter(({ from, to }) => !(from === 'load' && to.type !== 'node'));
  const pushed = solveSmall(net, valueOf, slopes, { volts: 0, push: 1 }, inside);
  if (!driven || !pushed) return null;
  return { gain: driven.output, rin: 1 / driven.sourceCurrent, rout: pushed.output };
}

function solveSmall(
  net: StageNet,
  valueOf: ValueOf,
  { gm, gds, gmb }: OracleSlopes,
  drive: { volts: number; push: number },
  legs: readonly NetLeg[],
): { output: number; sourceCurrent: number } | null {
  // Unknowns: every place, then the current of every wire. A wire is a tie, a large capacitor, or the bulk's own.
  const places = [
    ...new Set([
      '0',
      'signal',
      'gate',
      'drain',
      'source',
      'bulk',
      ...net.nodes,
      ...legs.flatMap((leg) => [leg.from, farPlace(leg)]),
    ]),
  ];
  const roots = new Map(places.map((place) => [place, place]));
  const find = (place: string): string => (roots.get(place) === place ? place : find(roots.get(place)!));
  const wires: [string, string, number][] = [];
  const wire = (a: string, b: string): void => {
    if (find(a) === find(b)) return; // a loop of wires says nothing new
    roots.set(find(a), find(b));
    wires.push([a, b, 0]);
  };
  for (const place of places) if (place.startsWith('=')) wire(place, '0');
  for (const leg of legs) {
    const isShort = leg.element?.kind === 'capacitor' && leg.element.nominal >= 1e-9;
    if (!leg.element || isShort) wire(leg.from, farPlace(leg));
  }
  if (!legs.some(({ from, to }) => from === 'bulk' || (to.type === 'node' && to.name === 'bulk')))
    wire('bulk', 'source');
  wires.push(['signal', '0', drive.volts]);
  const row = new Map(places.map((place, index) => [place, index]));
  const size = places.length + wires.length;
  const M = Array.from({ length: size }, () => new Float64Array(size));
  const rhs = new Float64Array(size);
  const i = (place: string): number => row.get(place)!;
  const conduct = (a: string, b: string, g: number): void => {
    M[i(a)][i(a)] += g;
    M[i(b)][i(b)] += g;
    M[i(a)][i(b)] -= g;
    M[i(b)][i(a)] -= g;
  };
  for (const leg of legs) {
    if (leg.element?.kind === 'resistor') conduct(leg.from, farPlace(leg), 1 / valueOf(leg.element.value));
  }
  const control = (p: string, n: string, g: number): void => {
    M[i('drain')][i(p)] += g;
    M[i('drain')][i(n)] -= g;
    M[i('source')][i(p)] -= g;
    M[i('source')][i(n)] += g;
  };
  control('gate', 'source', gm);
  control('drain', 'source', gds);
  control('bulk', 'source', gmb);
  wires.forEach(([a, b, volts], index) => {
    const k = places.length + index;
    M[i(a)][k] += 1;
    M[i(b)][k] -= 1;
    M[k][i(a)] += 1;
    M[k][i(b)] -= 1;
    rhs[k] = volts;
  });
  const { plus, minus } = net.output!;
  rhs[i(plus)] += drive.push;
  if (minus) rhs[i(minus)] -= drive.push;
  // Ground: its own equation is the sum of the others.
  M[i('0')].fill(0);
  M[i('0')][i('0')] = 1;
  rhs[i('0')] = 0;
  const x = solveDense(M, rhs);
  if (!x) return null;
  const output = x[i(plus)] - (minus ? x[i(minus)] : 0);
  return { output, sourceCurrent: -x[size - 1] };
}

/** Gaussian elimination with partial pivoting; null when a pivot is nothing beside its column's scale. */
function solveDense(M: Float64Array[], rhs: Float64Array): Float64Array | null {
  const n = rhs.length;
  for (let c = 0; c < n; c++) {
    let pivot = c;
    for (let r = c + 1; r < n; r++) if (Math.abs(M[r][c]) > Math.abs(M[pivot][c])) pivot = r;
    if (Math.abs(M[pivot][c]) < 1e-14) return null;
    [M[c], M[pivot]] = [M[pivot], M[c]];
    [rhs[c], rhs[pivot]] = [rhs[pivot], rhs[c]];
    for (let r = c + 1; r < n; r++) {
      const f = M[r][c] / M[c][c];
      if (f === 0) continue;
      for (let k = c; k < n; k++) M[r][k] -= f * M[c][k];
      rhs[r] -= f * rhs[c];
    }
  }
  for (let c = n - 1; c >= 0; c--) {
    for (let k = c + 1; k < n; k++) rhs[c] -= M[c][k] * rhs[k];
    rhs[c] /= M[c][c];
  }
  return rhs;
}

/** `=HANDLE` for a rail, `signal`, or the node's name. */
function farPlace(leg: NetLeg): string {
  if (leg.to.type === 'node') return leg.to.name;
  if (leg.to.type === 'rail') return `=${leg.to.volts}`;
  return 'signal';
}

function fixedPlaces(net: StageNet): Set<string> {
  return new Set(['0', 'signal', ...net.legs.map(farPlace).filter((place) => place.startsWith('='))]);
}

/** Which places are one piece of wire, by a representative. */
function joined(net: StageNet, isWire: (leg: NetLeg) => boolean): (place: string) => string {
  const roots = new Map<string, string>();
  const find = (place: string): string => {
    const up = roots.get(place) ?? place;
    return up === place ? place : find(up);
  };
  for (const leg of net.legs) if (isWire(leg)) roots.set(find(leg.from), find(farPlace(leg)));
  if (!net.legs.some(({ from }) => from === 'bulk')) roots.set(find('bulk'), find('source'));
  return find;
}
