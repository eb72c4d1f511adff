// The output plane of a stage: drain current against drain-source voltage, with the load line V_DS = V_L - R_L I_D,
// a family of curves at round gate voltages, the device's own curve through Q, the edge between ohmic and
// saturation, and, where a check asks for a margin, the strip beyond that edge that it forbids.

import { bestPrefix, CURRENT, formatValue, VOLTAGE } from '../quantity/index.ts';
import { createAxis, linearTicks } from './axis.ts';
import type { Axis } from './axis.ts';
import type { Area, Chart, Curve } from './chart.ts';
import { sampleRising } from './sample.ts';
import type { StraightLine } from './straight-line.ts';
import { cutLine } from './straight-line.ts';
import type { DeviceLaw, PlaneDevice } from './transfer-plane.ts';
import { markOf } from './transfer-plane.ts';

export interface OutputDevice extends PlaneDevice {
  readonly load: StraightLine & { readonly label: string };
}

interface OutputInput {
  readonly name: string;
  readonly channel: 'n' | 'p';
  /** The nominal device, or the corner, comes first; it is the one with the family. */
  readonly devices: readonly OutputDevice[];
  /** Volts of margin that a check asks for, drawn for the last device; null for none. */
  readonly margin: number | null;
}

const VOLTAGE_ROOM = 1.06;
/** The load line's ends are in view up to these multiples of the operating point. */
const LONGEST_VOLTAGE = 20;
const SHORT_VOLTAGE = 8;
const STEEPEST_CURRENT = 3.2;
const INTERCEPT_ROOM = 1.12;
const CURRENT_ROOM = 2;
const IDLE_CURRENT = 1e-3;
const HALVINGS = 40;
/** A member of the family nearer than this share of a step to the device's own V_GS is left out. */
const LEAST_DISTANCE = 0.3;

/** Output plane as a chart in volts and amperes; V_DS is negative for p-channel. Throws RangeError without a device. */
export function outputPlane({ name, channel, devices, margin }: OutputInput): Chart {
  const first = devices[0];
  if (first === undefined) throw new RangeError('a plane needs a device');
  const sign = channel === 'n' ? 1 : -1;
  const reach = Math.max(...devices.map((device) => voltageReach(device))) * VOLTAGE_ROOM;
  const x = createAxis('V_DS', VOLTAGE, sign > 0 ? { low: 0, high: reach } : { low: -reach, high: 0 });
  const y = createAxis('I_D', CURRENT, { low: 0, high: currentTop(devices, sign * reach) });
  const far = sign > 0 ? x.high : x.low;
  const curves: Curve[] = [];
  const family = familyOf(first, sign, far, y.high);
  const prefix = bestPrefix(Math.max(0, ...family.map(Math.abs)), VOLTAGE);
  for (const vgs of family) {
    const label = formatValue(vgs, VOLTAGE, { digits: 6, zeros: 'drop', prefix }).text;
    const said = `V_GS ${label}`;
    curves.push({
      role: 'family',
      ...sampleRising((vds) => first.law(vgs, vds), 0, far, y.high),
      label,
      said,
      labelAt: 1,
    });
  }
  const edge = edgeOf(first.law, first.threshold);
  curves.push({ role: 'edge', ...sampleRising(edge, 0, far, y.high), label: '' });
  for (const { role, label, law, q, load } of devices) {
    const box = { low: x.low, high: x.high, bottom: 0, top: y.high };
    const line = cutLine({ ...load, ohms: sign * load.ohms }, box);
    const lineRole = role === 'nominal' ? 'bias' : role;
    const again = first.load !== load && first.load.volts === load.volts && first.load.ohms === load.ohms;
    if (line !== null && !again)
      curves.push({ role: lineRole, ...line, label: load.label, labelAt: sign > 0 ? 0.75 : 0.25 });
    const own = role === 'nominal' ? formatValue(q.vgs, VOLTAGE).text : label;
    const said = role === 'nominal' ? `V_GS ${own}` : `V_GS ${formatValue(q.vgs, VOLTAGE).text}, ${label}`;
    curves.push({ role, ...sampleRising((vds) => law(q.vgs, vds), 0, far, y.high), label: own, said, labelAt: 1 });
  }
  const last = devices.at(-1)!;
  const strip = margin === null ? null : stripOf(last, sign * margin, x, y);
  if (strip !== null) curves.push(strip.curve);
  return {
    title: `Output plane of ${name}`,
    sentence: sentenceOf(name, devices, margin),
    x,
    y,
    yAt: sign > 0 ? 'left' : 'right',
    areas: strip === null ? [] : [strip.area],
    curves,
    posts: [],
    marks: devices.map(({ role, q }) => markOf(role, q.vds, q.id)).filter((mark) => mark.y <= y.high),
  };
}

/** The current at the edge of saturation: there V_DS = V_GS - V_TO. */
function edgeOf(law: DeviceLaw, threshold: number): (vds: number) => number {
  return (vds) => law(threshold + vds, vds);
}

function voltageReach({ q, load, threshold }: OutputDevice): number {
  const point = Math.max(Math.abs(q.vds), Math.abs(q.vgs - threshold)) || 1;
  if (load.ohms === Infinity) return 2 * point;
  const intercept = Math.abs(load.volts);
  return intercept > LONGEST_VOLTAGE * point ? SHORT_VOLTAGE * point : Math.max(intercept, 1.2 * point);
}

function currentTop(devices: readonly OutputDevice[], far: number): number {
  const most = Math.max(0, ...devices.map(({ q }) => q.id));
  const intercepts = devices.flatMap(({ load }) => (load.ohms > 0 ? [Math.abs(load.volts) / load.ohms] : []));
  const highest = Math.max(0, ...intercepts);
  if (most === 0) return highest || Math.max(0, ...devices.map(({ law, q }) => law(q.vgs, far))) || IDLE_CURRENT;
  if (highest > most && highest <= STEEPEST_CURRENT * most) return highest * INTERCEPT_ROOM;
  return most * CURRENT_ROOM;
}

/** Round gate voltages between threshold and what drives the current to the top, without the device's own. */
function familyOf({ law, threshold, q }: OutputDevice, sign: number, far: number, top: number): number[] {
  let [off, on] = [threshold, threshold + sign];
  for (let step = 0; step < HALVINGS && law(on, far) < top; step++) on = threshold + 2 * (on - threshold);
  for (let step = 0; step < HALVINGS; step++) {
    const middle = (off + on) / 2;
    if (law(middle, far) < top) off = middle;
    else on = middle;
  }
  if (on === threshold) return [];
  const ticks = linearTicks(Math.min(threshold, on), Math.max(threshold, on));
  const step = ticks[1]! - ticks[0]!;
  return ticks.filter((vgs) => {
    const id = law(vgs, far);
    return id > 0.02 * top && id <= top * 1.5 && Math.abs(vgs - q.vgs) > LEAST_DISTANCE * step;
  });
}

/** Where the margin V_DS - V_DSsat is less than asked for: between the edge and the edge moved out by it. */
function stripOf(
  { law, threshold }: OutputDevice,
  margin: number,
  x: Axis,
  y: Axis,
): { curve: Curve; area: Area } | null {
  const far = margin > 0 ? x.high : x.low;
  if (margin === 0 || Math.abs(margin) >= Math.abs(far)) return null;
  const moved = (vds: number): number => law(threshold + vds - margin, vds);
  const outer = sampleRising(moved, margin, far, y.high);
  const inner = sampleRising(edgeOf(law, threshold), 0, far, y.high);
  // Both over the same voltages, from 0 outwards: the strip is what lies between.
  const grid = Float64Array.from([...inner.x, ...outer.x].toSorted((a, b) => Math.abs(a) - Math.abs(b)));
  const end = Math.abs(outer.x.at(-1)!);
  const xs = grid.filter((vds) => Math.abs(vds) <= end);
  return {
    curve: { role: 'limit', ...outer, label: '' },
    area: {
      role: 'hatch',
      x: xs,
      low: xs.map((vds) => (Math.abs(vds) < Math.abs(margin) ? 0 : Math.min(y.high, moved(vds)))),
      high: xs.map((vds) => Math.min(y.high, edgeOf(law, threshold)(vds))),
    },
  };
}

function sentenceOf(name: string, devices: readonly OutputDevice[], margin: number | null): string {
  const points = devices.map(({ label, q }) => {
    const volts = formatValue(q.vds, VOLTAGE).text;
    return `${label} V_DS ${volts}, I_D ${formatValue(q.id, CURRENT).text}`;
  });
  const strip =
    margin === null ? '' : ` The hatched strip is where the margin is under ${formatValue(margin, VOLTAGE).text}.`;
  return `Output plane of ${name} with load line; operating points: ${points.join('; ')}.${strip}`;
}
