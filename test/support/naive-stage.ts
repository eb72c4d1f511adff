// A stage of one FET by nodal equations in a matrix: at rest with the channel current as the unknown of a plain
// bisection (and the junction temperature around it), at midband with the FET as stamps. Nothing is reduced first.

import { balance, channelState, hotDevice, hotLeakage, junction, risingRoot } from './naive-device.ts';
import type { ChannelState, NaiveDevice } from './naive-device.ts';
import { Broken } from './naive-value.ts';

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

/** A value and how far this method's own rounding may be off. */
export interface Found {
  readonly value: number;
  readonly bound: number;
}

/** `NaN` in everything where there is no operating point. */
export type NaiveResults = ReadonlyMap<string, Found>;

/** Share of the largest voltage in the stage below which a node voltage of this method means nothing. */
const VOLTAGE_ROUNDING = 1e-13;
/** Agreement asked of stages. */
const STAGE_AGREEMENT = 1e-9;

interface Network {
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
function networkOf(stage: NaiveStage, legs: readonly NaiveLeg[], isWire: (leg: NaiveLeg) => boolean): Network {
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

/** Gauss with pivoting on rows with their right side; an unknown that nothing determines is NaN, and what hangs on it. */
function eliminate(matrix: Float64Array[]): Float64Array {
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

interface Rest {
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
function operatingPoint(stage: NaiveStage): Rest | null {
  const { device } = stage;
  const { channel } = device;
  const { net, island, datum } = restNetwork(stage);
  const at = (terminal: string): string => net.rootOf(terminal);
  const bulk = device.family === 'MOSFET' ? at('bulk') : at('source');
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

/** Every offered number of a stage; null where there is no operating point; stops where the network cannot be. */
export function stageResults(stage: NaiveStage): NaiveResults | null {
  const rest = operatingPoint(stage);
  if (!rest) return null;
  const { device } = stage;
  const { state, volts } = rest;
  const results = new Map<string, Found>();
  const rails = [...rest.net.held.values()].flatMap((holders) => holders.map((holder) => Math.abs(holder.volts)));
  const places = ['gate', 'drain', 'source', ...stage.nodes, ...(device.family === 'MOSFET' ? ['bulk'] : [])];
  const floor = VOLTAGE_ROUNDING * Math.max(1, ...rails, ...places.map((place) => Math.abs(volts(place))));
  const put = (name: string, value: number, bound = 0): void => {
    results.set(name, { value, bound: STAGE_AGREEMENT * Math.abs(value) + bound });
  };
  for (const place of places) put(`V_${place}`, volts(place), floor);
  deviceResults(rest, device, floor, put);
  const conductance = rest.net.resistors.reduce((sum, { g }) => sum + g, 0);
  const largest = floor / VOLTAGE_ROUNDING;
  put('P_total', deliveredPower(stage, rest), floor * (Math.abs(rest.current) + conductance * largest));
  smallSignals(stage, rest, floor, put);
  if (device.cgs !== null && device.cgd !== null) capacitances(device, rest, put, terminalSlopes(state, device).gm);
  return results;
}

type Put = (name: string, value: number, bound?: number) => void;

/** The values of the FET, with what a voltage that is off by `floor` does to each. */
function deviceResults(
  {
    state,
    vgs,
    vds,
    vsb,
    current,
    leakage,
    temperature,
  }: Pick<Rest, 'state' | 'vgs' | 'vds' | 'vsb' | 'current' | 'leakage' | 'temperature'>,
  device: NaiveDevice,
  floor: number,
  put: Put,
): void {
  const slopes = terminalSlopes(state, device);
  const I = device.channel * current;
  const shake = 2 * floor * hotDevice(device, temperature).beta * (1 + device.lambda * state.vds);
  put('I_D', I, floor * (Math.abs(slopes.gm) + Math.abs(slopes.gds)));
  put('V_GS', vgs, floor);
  put('V_DS', vds, floor);
  put('V_SB', vsb, floor);
  put('V_ov', state.vov, floor);
  put('V_DSsat', Math.max(0, state.vov), floor);
  put('margin', state.margin, 2 * floor);
  putRegion(put, state, floor);
  put('g_m', slopes.gm, 2 * shake);
  put('g_ds', slopes.gds, 4 * shake);
  put('g_mb', slopes.gmb, 2 * shake);
  put('r_o', 1 / slopes.gds, slopes.gds > 0 ? (4 * shake) / slopes.gds ** 2 : 0);
  put('I_G', leakage);
  put('T_J', temperature);
  put('P_D', vds * current, floor * Math.abs(I) + Math.abs(vds) * floor * (Math.abs(slopes.gm) + Math.abs(slopes.gds)));
}

function putRegion(put: Put, state: ChannelState, floor: number): void {
  // A region is a word: off by a whole one where the border is nearer than the rounding.
  const nearest = Math.min(Math.abs(state.vov), Math.abs(state.vds - state.vov));
  put('region', state.region, nearest <= 2 * floor + STAGE_AGREEMENT * Math.abs(state.vov) ? 2 : 0);
}

/** Slopes at the terminals: the inner ones behind resistors in both leads, by the two equations of the leads. */
export function terminalSlopes(
  { gm, gds, gmb }: ChannelState,
  { rs, rd }: NaiveDevice,
): { gm: number; gds: number; gmb: number } {
  // i = gm (vgs - rs i) + gds (vds - (rs + rd) i) - gmb (vsb + rs i)
  const share = 1 + gm * rs + gds * (rs + rd) + gmb * rs;
  return { gm: gm / share, gds: gds / share, gmb: gmb / share };
}

function capacitances(device: NaiveDevice, { vgs, vds }: Pick<Rest, 'vgs' | 'vds'>, put: Put, gm: number): void {
  const forwardGs = device.channel * vgs;
  const forwardGd = device.channel * (vgs - vds);
  const cgs = device.family === 'JFET' ? junction(device.cgs!, forwardGs, device.pb, device.m) : device.cgs!;
  const cgd = junction(device.cgd!, forwardGd, device.pb, device.m);
  put('C_gs', cgs);
  put('C_gd', cgd);
  put('f_T', gm / (2 * Math.PI * (cgs + cgd)), 1e-12 / (2 * Math.PI * (cgs + cgd)));
}

/** What rails deliver, and current sources where they do. */
function deliveredPower(stage: NaiveStage, { net, volts, current, leakage }: Rest): number {
  let power = 0;
  const out = new Map<string, number>();
  const draw = (root: string, amps: number): void => void out.set(root, (out.get(root) ?? 0) + amps);
  for (const { a, b, g } of net.resistors) {
    const amps = (volts(a) - volts(b)) * g;
    draw(a, amps);
    draw(b, -amps);
  }
  draw(net.rootOf('drain'), current + stage.device.channel * leakage);
  draw(net.rootOf('source'), -current);
  draw(net.rootOf('gate'), -stage.device.channel * leakage);
  for (const { from, to, amps } of net.sources) {
    draw(from, amps);
    draw(to, -amps);
    power += Math.max(0, amps * (volts(to) - volts(from)));
  }
  for (const [root, [{ volts: rail }]] of net.held) power += rail * (out.get(root) ?? 0);
  return power;
}

/** A_v, R_in, R_out at midband, each with what shaken slopes do to it. */
function smallSignals(stage: NaiveStage, rest: Rest, floor: number, put: Put): void {
  const { state } = rest;
  const { device } = stage;
  const shake = 2 * floor * hotDevice(device, rest.temperature).beta * (1 + device.lambda * state.vds);
  const nominal = terminalSlopes(state, device);
  const shaken = [
    nominal,
    { ...nominal, gm: nominal.gm + 2 * shake },
    { ...nominal, gds: nominal.gds + 4 * shake },
    { ...nominal, gmb: nominal.gmb + 2 * shake },
  ].map((slopes) => midband(stage, slopes));
  const [first, ...others] = shaken;
  for (const name of ['A_v', 'R_in', 'R_out'] as const) {
    const value = first[name];
    if (value === null || Number.isNaN(value)) continue;
    // A ratio below the rounding of 1 V is none.
    put(
      name,
      value,
      (name === 'A_v' ? VOLTAGE_ROUNDING : 0) + Math.max(...others.map((other) => Math.abs(other[name]! - value) || 0)),
    );
  }
}

interface Midband {
  readonly A_v: number | null;
  readonly R_in: number | null;
  readonly R_out: number | null;
}

function midband(stage: NaiveStage, slopes: { gm: number; gds: number; gmb: number }): Midband {
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

function bulkOf({ device }: NaiveStage): string {
  return device.family === 'MOSFET' ? 'bulk' : 'source';
}

function solveSignals(
  stage: NaiveStage,
  net: Network,
  { gm, gds, gmb }: { gm: number; gds: number; gmb: number },
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

/** What a point offers, held at terminal voltages, or at a drain current (device sense); null where nothing carries it. */
export function pointResults(
  device: NaiveDevice,
  held: { readonly vgs: number } | { readonly current: number },
  vds: number,
  vsb: number,
  ambient: number,
): NaiveResults | null {
  const { channel, rs, rd } = device;
  const inner = (T: number, vgs: number, I: number): ChannelState =>
    channelState(hotDevice(device, T), channel * vgs - rs * I, channel * vds - (rs + rd) * I, channel * vsb + rs * I);
  const currentAt = (T: number, vgs: number): number => risingRoot((I) => I - inner(T, vgs, I).current, 1e-3);
  let temperature: number;
  let vgs: number;
  let current: number;
  if ('vgs' in held) {
    ({ vgs } = held);
    temperature = balance(ambient, device.rth, (T) => channel * vds * currentAt(T, vgs));
    if (Number.isNaN(temperature)) return null;
    current = currentAt(temperature, vgs);
  } else {
    ({ current } = held);
    temperature = ambient + device.rth * channel * vds * current;
    const left = channel * vds - (rs + rd) * current;
    if (!(current !== 0 && current > 0 === left > 0 && left !== 0)) return null;
    const sense = Math.sign(current);
    vgs = channel * risingRoot((v) => sense * (inner(temperature, channel * v, current).current - current), 1);
  }
  const found = new Map<string, Found>();
  const put: Put = (name, value, bound = 0) =>
    void found.set(name, { value, bound: STAGE_AGREEMENT * Math.abs(value) + bound });
  const floor = VOLTAGE_ROUNDING * Math.max(1, Math.abs(vgs), Math.abs(vds), Math.abs(vsb), Math.abs(device.vto));
  const state = inner(temperature, vgs, current);
  const whole = {
    state,
    vgs,
    vds,
    vsb,
    current: channel * current,
    leakage: hotLeakage(device, temperature),
    temperature,
  };
  deviceResults(whole, device, floor, put);
  if (device.cgs !== null && device.cgd !== null) capacitances(device, whole, put, terminalSlopes(state, device).gm);
  return found;
}
