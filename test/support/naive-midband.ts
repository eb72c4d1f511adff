// Small signals at midband: the network once more, its capacitors of 1 nF and more as wires, the FET as stamps.

import { bulkOf, eliminate, networkOf } from './naive-network.ts';
import type { NaiveLeg, NaiveStage, Network } from './naive-network.ts';

/** Slopes at the terminals, S. */
export interface Slopes {
  readonly gm: number;
  readonly gds: number;
  readonly gmb: number;
}

interface Midband {
  readonly A_v: number | null;
  readonly R_in: number | null;
  readonly R_out: number | null;
}

/** A_v, R_in and R_out; null where there is none, NaN where nothing determines it. */
export function midband(stage: NaiveStage, slopes: Slopes): Midband {
  const { output, legs } = stage;
  const isWire = (leg: NaiveLeg): boolean => !leg.element || (leg.element.kind === 'C' && leg.element.value >= 1e-9);
  const loaded = networkOf(stage, legs, isWire);
  const isDriven = legs.some((leg) => leg.to === 'signal');
  const inside = legs.filter((leg) => !(leg.from === 'load' && (leg.to === 'signal' || 'rail' in leg.to)));
  const result: { -readonly [K in keyof Midband]: Midband[K] } = { A_v: null, R_in: null, R_out: null };
  if ((loaded.held.get(loaded.rootOf('signal'))?.length ?? 0) > 1) return result;
  if (isDriven) {
    const v = solveSignals(stage, loaded, slopes, 1, []);
    if (output) result.A_v = v(output.plus) - (output.minus ? v(output.minus) : 0);
    const channelCurrent =
      slopes.gm * (v('gate') - v('source')) +
      slopes.gds * (v('drain') - v('source')) -
      slopes.gmb * (v('source') - v(bulkOf(stage)));
    const source = loaded.rootOf('signal');
    let current = 0;
    for (const { a, b, g } of loaded.resistors) {
      if (a === source) current += (v(a) - v(b)) * g;
      if (b === source) current += (v(b) - v(a)) * g;
    }
    if (loaded.rootOf('drain') === source) current += channelCurrent;
    if (loaded.rootOf('source') === source) current -= channelCurrent;
    // Differences of 1 V and nearly 1 V: below this they are the rounding of this method.
    const seen = 1 / (Math.abs(current) < 1e-16 ? 0 : current);
    result.R_in = stage.driven === null ? seen : seen - stage.driven;
  }
  if (output) {
    const unloaded = networkOf(stage, inside, isWire);
    const push: [string, number][] = [
      [output.plus, 1],
      ...(output.minus ? [[output.minus, -1] as [string, number]] : []),
    ];
    const v = solveSignals(stage, unloaded, slopes, 0, push);
    result.R_out = v(output.plus) - (output.minus ? v(output.minus) : 0);
  }
  return result;
}

function solveSignals(
  stage: NaiveStage,
  net: Network,
  { gm, gds, gmb }: Slopes,
  drive: number,
  push: readonly (readonly [string, number])[],
): (place: string) => number {
  const source = net.held.has(net.rootOf('signal')) ? net.rootOf('signal') : null;
  const known = new Map([...net.held.keys()].map((root) => [root, root === source ? drive : 0]));
  const row = new Map(net.free.map((root, index) => [root, index]));
  const n = net.free.length;
  const matrix = net.free.map(() => new Float64Array(n + 1));
  /** Adds g (v(p) - v(m)) to the current that leaves `root`. */
  const leave = (root: string, p: string, m: string, g: number): void => {
    const i = row.get(net.rootOf(root));
    if (i === undefined) return;
    for (const [place, sign] of [
      [p, 1],
      [m, -1],
    ] as const) {
      const j = row.get(net.rootOf(place));
      if (j === undefined) matrix[i][n] -= sign * g * known.get(net.rootOf(place))!;
      else matrix[i][j] += sign * g;
    }
  };
  for (const { a, b, g } of net.resistors) {
    leave(a, a, b, g);
    leave(b, b, a, g);
  }
  for (const [terminal, sign] of [
    ['drain', 1],
    ['source', -1],
  ] as const) {
    leave(terminal, 'gate', 'source', sign * gm);
    leave(terminal, 'drain', 'source', sign * gds);
    leave(terminal, 'source', bulkOf(stage), -sign * gmb);
  }
  for (const [place, amps] of push) {
    const i = row.get(net.rootOf(place));
    if (i !== undefined) matrix[i][n] += amps;
  }
  const x = eliminate(matrix);
  return (place) => known.get(net.rootOf(place)) ?? x[row.get(net.rootOf(place))!];
}
