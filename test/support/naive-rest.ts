// The operating point of a stage: its network at rest by nodal equations, the channel current as the unknown of a plain
// bisection and the junction temperature around it; where a current source alone feeds the channel, the level of its
// island instead of the current.

import { balance, channelState, hotDevice, hotLeakage, risingRoot } from './naive-device.ts';
import type { ChannelState } from './naive-device.ts';
import { bulkOf, eliminate, farPlace, networkOf } from './naive-network.ts';
import type { NaiveStage, Network } from './naive-network.ts';
import { Broken } from './naive-value.ts';

export interface Rest {
  readonly net: Network;
  readonly state: ChannelState;
  readonly temperature: number;
  /** From drain to source in the circuit's own frame. */
  readonly current: number;
  readonly leakage: number;
  readonly volts: (place: string) => number;
  readonly vgs: number;
  readonly vds: number;
  readonly vsb: number;
}

/** The operating point; null where there is none. */
export function operatingPoint(stage: NaiveStage): Rest | null {
  const { device } = stage;
  const { channel } = device;
  const { net, island, datum } = restNetwork(stage);
  const at = (terminal: string): string => net.rootOf(terminal);
  const bulk = at(bulkOf(stage));
  const sources = net.sources.flatMap(({ from, to, amps }): [string, number][] => [
    [from, -amps],
    [to, amps],
  ]);
  const solve = (currents: [string, number][], level: number, rails: 0 | 1): ((root: string) => number) =>
    solveNodes(net, currents, datum, level, rails);
  const still = solve(sources, 0, 1);
  const perAmpere = solve(
    [
      [at('drain'), -1],
      [at('source'), 1],
    ],
    0,
    0,
  );
  const perLeakage = solve(
    [
      [at('drain'), -channel],
      [at('gate'), channel],
    ],
    0,
    0,
  );

  /** All there is to know for one channel current (n-channel frame), temperature and level of the island. */
  const look = (current: number, temperature: number, level: number): Rest => {
    const leakage = hotLeakage(device, temperature);
    const volts = (place: string): number => {
      const root = net.rootOf(place);
      const lifted = island?.has(root) ? level : 0;
      return still(root) + lifted + channel * current * perAmpere(root) + leakage * perLeakage(root);
    };
    const [vgs, vds] = [volts('gate') - volts('source'), volts('drain') - volts('source')];
    const vsb = volts('source') - volts(bulk);
    const lead = device.rs + device.rd;
    const state = channelState(
      hotDevice(device, temperature),
      channel * vgs - device.rs * current,
      channel * vds - lead * current,
      channel * vsb + device.rs * current,
    );
    return { net, state, temperature, current: channel * current, leakage, volts, vgs, vds, vsb };
  };
  const solveAt = (temperature: number): Rest | null => {
    if (!island) {
      const current = risingRoot((I) => I - look(I, temperature, 0).state.current, 1e-3);
      return look(current, temperature, 0);
    }
    // The current is what the sources leave; the island's level is the unknown.
    const leakage = channel * hotLeakage(device, temperature);
    let into = 0;
    for (const { from, to, amps } of net.sources) into += (island.has(to) ? amps : 0) - (island.has(from) ? amps : 0);
    if (island.has(at('gate'))) into += leakage;
    if (island.has(at('drain'))) into -= leakage;
    const current = channel * (datum === at('drain') ? into : -into);
    const sense = channel * (datum === at('drain') ? 1 : -1);
    const excess = (level: number): number => look(current, temperature, sense * level).state.current - current;
    if (current === 0 || excess(3000) < 0 || excess(-3000) > 0) return null;
    return look(current, temperature, sense * risingRoot(excess, 1));
  };
  if (!Number.isFinite(stage.ambient) || !(device.beta > 0)) return null;
  // A forced current's leakage is that at the ambient temperature; so is its network.
  const temperature = balance(stage.ambient, device.rth, (T) => {
    const rest = solveAt(T);
    return rest ? rest.vds * rest.current : NaN;
  });
  return Number.isNaN(temperature) ? null : solveAt(temperature);
}

/** The stage's network at rest, and where a current source alone feeds the channel; stops where it cannot be. */
function restNetwork(stage: NaiveStage): { net: Network; island: ReadonlySet<string> | null; datum: string } {
  const { legs, device } = stage;
  const named = new Set(legs.flatMap((leg) => [leg.from, farPlace(leg)]));
  for (const terminal of ['gate', 'drain', 'source']) if (!named.has(terminal)) throw new Broken('a bare terminal');
  if (device.family === 'JFET' && named.has('bulk')) throw new Broken('a JFET has no bulk');
  for (const { element } of legs)
    if (element && element.kind !== 'I' && !(element.value > 0)) throw new Broken('an element that is not positive');
  const net = networkOf(stage, legs, (leg) => !leg.element || leg.element.kind === 'L');
  for (const holders of net.held.values()) if (holders.length > 1) throw new Broken('two rails on one place');
  let island: ReadonlySet<string> | null = null;
  let datum = '';
  for (const group of islands(net)) {
    const ends = ['drain', 'source'].filter((terminal) => group.has(net.rootOf(terminal)));
    const isFed = net.sources.some(({ from, to }) => group.has(from) !== group.has(to));
    if (ends.length !== 1 || !isFed || island) throw new Broken('a place floats');
    island = group;
    datum = net.rootOf(ends[0]);
  }
  return { net, island, datum };
}

/** Groups of free places from which no resistor leads to anything held. */
function islands(net: Network): Set<string>[] {
  const left = new Set(net.free);
  const found: Set<string>[] = [];
  while (left.size > 0) {
    const group = new Set([[...left][0]]);
    let touches = false;
    for (const place of group) {
      left.delete(place);
      for (const { a, b } of net.resistors) {
        if (a !== place && b !== place) continue;
        const other = a === place ? b : a;
        if (net.held.has(other)) touches = true;
        else group.add(other);
      }
    }
    if (!touches) found.push(group);
  }
  return found;
}

/** Voltages of all roots with `currents` pushed into some of them and a further place held. */
function solveNodes(
  net: Network,
  currents: readonly (readonly [string, number])[],
  datum: string,
  level: number,
  withRails: 0 | 1,
): (root: string) => number {
  const known = new Map([...net.held].map(([root, [{ volts }]]) => [root, withRails * volts]));
  if (datum) known.set(datum, level);
  const unknown = net.free.filter((root) => !known.has(root));
  const row = new Map(unknown.map((root, index) => [root, index]));
  const matrix = unknown.map(() => new Float64Array(unknown.length + 1));
  for (const { a, b, g } of net.resistors) {
    for (const [here, there] of [
      [a, b],
      [b, a],
    ]) {
      const i = row.get(here);
      if (i === undefined) continue;
      matrix[i][i] += g;
      const j = row.get(there);
      if (j === undefined) matrix[i][unknown.length] += g * known.get(there)!;
      else matrix[i][j] -= g;
    }
  }
  for (const [root, amps] of currents) {
    const i = row.get(root);
    if (i !== undefined) matrix[i][unknown.length] += amps;
  }
  const x = eliminate(matrix);
  return (root) => known.get(root) ?? x[row.get(root)!];
}
