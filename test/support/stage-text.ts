// Stages for tests in one string per place: `drain: 3300 to 15 V, 1e-6 F to load`. A bare number is ohms; F, H and A
// say what else. A place behind `to` or `from` is a node's name, `signal`, `-signal`, `common`, or a number with V.

import { DEVICE_FIELDS, lowerStage } from '../../src/network/index.ts';
import type {
  DeviceField,
  DeviceHandles,
  NetElement,
  NetLeg,
  PlaceRef,
  StageLowering,
  StageNet,
} from '../../src/network/index.ts';
import { createDirectEmitter } from './direct-emitter.ts';
import type { DirectEmitter } from './direct-emitter.ts';

export interface StageSetup {
  readonly channel?: 1 | -1;
  readonly family?: 'JFET' | 'MOSFET';
  readonly device: Partial<Record<DeviceField, number>>;
  readonly lines: readonly string[];
  readonly output?: string;
  readonly driven?: number;
  readonly ambient?: number;
}

export interface LoweredStage {
  readonly net: StageNet;
  readonly lowering: StageLowering;
  readonly emitter: DirectEmitter;
  /** Status of the solve; -1 where there are faults. */
  readonly status: number;
  /** An offered value; NaN where it is absent. */
  value(name: string): number;
}

/** Lowers and computes one stage. */
export function lowerText(setup: StageSetup): LoweredStage {
  const emitter = createDirectEmitter();
  const net = netOf(setup, emitter);
  const lowering = lowerStage(net, emitter);
  return {
    net,
    lowering,
    emitter,
    status: lowering.status === null ? -1 : emitter.value(lowering.status),
    value(name) {
      const handle = lowering.values.get(name);
      return handle === undefined ? NaN : emitter.value(handle);
    },
  };
}

/** The net of a stage in text. */
export function netOf(setup: StageSetup, emitter: DirectEmitter): StageNet {
  const known = new Map<string, number>();
  const valueOf = (text: string): number => {
    const number = Number(text);
    if (Number.isNaN(number)) throw new Error(`stage-text: ${text} is no number`);
    if (number === 0) return emitter.constant(0);
    if (!known.has(text)) known.set(text, emitter.input(number));
    return known.get(text)!;
  };
  const legs: NetLeg[] = [];
  const nodes: string[] = [];
  for (const line of setup.lines) {
    const [from, text] = line.split(':').map((part) => part.trim());
    if (!/^(.*\.)?(gate|drain|source|bulk)$/.test(from)) nodes.push(from);
    for (const leg of text.split(',').map((part) => part.trim())) {
      if (leg === '') continue;
      const match = /^(?:(\S+)( [FHA])? )?(to|from) (.+)$/.exec(leg);
      if (!match) throw new Error(`stage-text: ${leg} is no leg`);
      const kind = ({ F: 'capacitor', H: 'inductor', A: 'source' } as const)[match[2]?.trim() as 'F'] ?? 'resistor';
      const element: NetElement | null = match[1]
        ? { kind, value: valueOf(match[1]), nominal: Number(match[1]), label: match[1] }
        : null;
      legs.push({ from, element, reversed: match[3] === 'from', to: placeOf(match[4], valueOf), leg: legs.length });
    }
  }
  const [plus, minus] = setup.output?.split(' - ') ?? [];
  const device = Object.fromEntries(
    Object.entries(DEVICE_FIELDS).map(([field, { fallback }]) => {
      const number = setup.device[field as DeviceField] ?? fallback;
      return [field, number === null ? null : emitter.input(number)];
    }),
  ) as unknown as DeviceHandles;
  return {
    fets: [{ name: null, channel: setup.channel ?? 1, family: setup.family ?? 'JFET', device }],
    nodes,
    legs,
    output: plus ? { plus, minus: minus ?? null } : null,
    driven: setup.driven === undefined ? null : valueOf(String(setup.driven)),
    ambient: emitter.input(setup.ambient ?? 298.15),
  };
}

function placeOf(text: string, valueOf: (text: string) => number): PlaceRef {
  if (text === 'signal' || text === '-signal') return { type: 'signal', inverted: text.startsWith('-') };
  if (text === 'common') return { type: 'common' };
  const volts = /^(\S+) V$/.exec(text);
  return volts ? { type: 'rail', volts: valueOf(volts[1]), label: text } : { type: 'node', name: text };
}
