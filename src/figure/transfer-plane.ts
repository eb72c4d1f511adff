// The transfer plane of a stage: drain current against gate-source voltage, for the nominal device and the low and
// high one, with the bias line V_GS = V_GG - R_m I_D. Ranges follow from the operating points: a curve leaves
// the plane by its edge.

import { CURRENT, formatValue, VOLTAGE } from '../quantity/index.ts';
import { createAxis } from './axis.ts';
import type { Area, Chart, Curve, Mark } from './chart.ts';
import { sample, sampleRising } from './sample.ts';
import type { StraightLine } from './straight-line.ts';
import { cutLine } from './straight-line.ts';

/** Drain current in amperes, positive on both channels, from V_GS and V_DS in volts as true node differences. */
export type DeviceLaw = (vgs: number, vds: number) => number;

interface OperatingPoint {
  readonly vgs: number;
  readonly vds: number;
  readonly id: number;
}

export interface PlaneDevice {
  readonly role: 'nominal' | 'low' | 'high';
  /** `nominal`, `low device`, `worst end`. */
  readonly label: string;
  readonly law: DeviceLaw;
  /** V_TO in volts, as it stands on the device (negative for n-channel depletion). */
  readonly threshold: number;
  readonly q: OperatingPoint;
}

interface TransferInput {
  readonly name: string;
  readonly channel: 'n' | 'p';
  /** The nominal device, or the corner, comes first. */
  readonly devices: readonly PlaneDevice[];
  readonly bias: StraightLine & { readonly label: string };
}

/** How much of the plane lies beyond the largest current and the outermost voltage. */
const CURRENT_ROOM = 1.5;
const VOLTAGE_ROOM = 1.08;
/** Where all devices are off, the plane still shows this share of the current at V_GS = 0 or the drive. */
const IDLE_CURRENT = 1e-3;

/** Transfer plane as a chart in volts and amperes. Throws RangeError without a device. */
export function transferPlane({ name, channel, devices, bias }: TransferInput): Chart {
  const first = devices[0];
  if (first === undefined) throw new RangeError('a plane needs a device');
  const sign = channel === 'n' ? 1 : -1;
  const range = voltageRange(devices, sign);
  const top = currentTop(devices, range);
  const x = createAxis('V_GS', VOLTAGE, range);
  const y = createAxis('I_D', CURRENT, { low: 0, high: top });
  const [off, on] = sign > 0 ? [x.low, x.high] : [x.high, x.low];
  const curves: Curve[] = [];
  const line = cutLine({ ...bias, ohms: sign * bias.ohms }, { low: x.low, high: x.high, bottom: 0, top: y.high });
  if (line !== null) curves.push({ role: 'bias', ...line, label: bias.label, labelAt: 0.12 });
  for (const { role, label, law, threshold, q } of devices) {
    const start = sign * threshold > sign * off ? threshold : off;
    if (sign * start >= sign * on) continue;
    curves.push({ role, ...sampleRising((vgs) => law(vgs, q.vds), start, on, y.high), label, labelAt: 0.85 });
  }
  const marks = devices.map(({ role, q }) => markOf(role, q.vgs, q.id)).filter(({ y: id }) => id <= y.high);
  return {
    title: `Transfer plane of ${name}`,
    sentence: sentenceOf(name, devices, bias),
    x,
    y,
    yAt: Math.abs(x.low) > Math.abs(x.high) ? 'right' : 'left',
    areas: bandOf(devices, off, on, y.high),
    curves,
    posts: [],
    marks,
  };
}

/** The mark of an operating point: Q for the nominal one, triangles for the ends. */
export function markOf(role: PlaneDevice['role'], x: number, y: number): Mark {
  if (role === 'nominal') return { role: 'point', shape: 'disc', x, y, label: 'Q' };
  return { role, shape: role === 'low' ? 'down' : 'up', x, y, label: '' };
}

function voltageRange(devices: readonly PlaneDevice[], sign: number): { low: number; high: number } {
  const values = devices.flatMap(({ threshold, q }) => [threshold, q.vgs]);
  // V_GS = 0 is always in view: it is where a depletion device has I_DSS, and where an enhancement device is off.
  let low = Math.min(0, ...values) * VOLTAGE_ROOM;
  let high = Math.max(0, ...values) * VOLTAGE_ROOM;
  const drive = Math.max(0, ...devices.map(({ threshold, q }) => sign * (q.vgs - threshold)));
  if (sign > 0 && high > 0) high = Math.max(high, ...devices.map(({ q }) => q.vgs + 0.2 * drive));
  if (sign < 0 && low < 0) low = Math.min(low, ...devices.map(({ q }) => q.vgs - 0.2 * drive));
  return low < high ? { low, high } : { low: -1, high: 0 };
}

function currentTop(devices: readonly PlaneDevice[], { low, high }: { low: number; high: number }): number {
  const most = Math.max(0, ...devices.map(({ q }) => q.id));
  if (most > 0) return most * CURRENT_ROOM;
  const ends = devices.flatMap(({ law, q }) => [law(low, q.vds), law(high, q.vds)]);
  return Math.max(0, ...ends) || IDLE_CURRENT;
}

/** Between the low and the high device, where both are there. */
function bandOf(devices: readonly PlaneDevice[], off: number, on: number, top: number): Area[] {
  const low = devices.find(({ role }) => role === 'low');
  const high = devices.find(({ role }) => role === 'high');
  if (low === undefined || high === undefined) return [];
  const cut = (device: PlaneDevice) => (vgs: number) => Math.min(top, device.law(vgs, device.q.vds));
  const upper = sample(cut(high), off, on);
  const lower = cut(low);
  const [one, two] = [upper.y, upper.x.map((vgs) => lower(vgs))];
  return [
    {
      role: 'band',
      x: upper.x,
      low: one.map((value, at) => Math.min(value, two[at]!)),
      high: one.map((value, at) => Math.max(value, two[at]!)),
    },
  ];
}

function sentenceOf(name: string, devices: readonly PlaneDevice[], bias: TransferInput['bias']): string {
  const volts = (value: number): string => formatValue(value, VOLTAGE).text;
  const points = devices.map(({ label, q }) => `${label} V_GS ${volts(q.vgs)}, I_D ${formatValue(q.id, CURRENT).text}`);
  return `Transfer plane of ${name}: ${bias.label} from ${volts(bias.volts)}; operating points: ${points.join('; ')}.`;
}
