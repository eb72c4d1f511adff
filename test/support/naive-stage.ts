// What a stage of one FET and a point offer, each number with how far this plain method may be off: no more than its own
// rounding and the agreement that is asked of stages.

import { balance, channelState, hotDevice, hotLeakage, junction, risingRoot } from './naive-device.ts';
import type { ChannelState, NaiveDevice } from './naive-device.ts';
import { midband } from './naive-midband.ts';
import type { Slopes } from './naive-midband.ts';
import type { NaiveStage } from './naive-network.ts';
import { operatingPoint } from './naive-rest.ts';
import type { Rest } from './naive-rest.ts';

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
  put('V_DSsat', state.vov > 0 ? state.vov + (device.rs + device.rd) * Math.abs(current) : Infinity, floor);
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
function terminalSlopes({ gm, gds, gmb }: ChannelState, { rs, rd }: NaiveDevice): Slopes {
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
