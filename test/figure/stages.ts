// Stages for the tests of schematics: the ones that people build, and any number of random ones.

import type { LegEnd, LegKind, SchematicInput, StageLeg } from '../../src/figure/index.ts';
import { createDraw } from '../support/counter-random.ts';

const RAIL_VOLTS: Readonly<Record<string, number>> = { '0 V': 0, V_DD: 18, V_CC: 5, V_SS: -12, V_GG: -3 };

/** `R_S 1.2 kΩ source 0 V`: label (or `.`), value, kind by unit, from, to; `-` for a tie, `<` before the end for `from`. */
export function leg(text: string): StageLeg {
  const [label, value, unit, from, ...rest] = text.split(' ');
  const end = rest.join(' ');
  const kind: LegKind =
    value === '-'
      ? 'tie'
      : unit!.endsWith('F')
        ? 'capacitor'
        : unit!.endsWith('H')
          ? 'inductor'
          : unit!.endsWith('A')
            ? 'source'
            : 'resistor';
  const reversed = end.startsWith('<');
  return {
    from: from!,
    kind,
    label: label === '.' ? '' : label!,
    value: value === '-' ? '' : `${value} ${unit}`,
    reversed,
    to: endOf(reversed ? end.slice(1) : end),
    cell: label === '.' ? null : label!,
  };
}

function endOf(name: string): LegEnd {
  if (name === 'signal' || name === '-signal') return { kind: 'signal', name, volts: null, value: '' };
  if (name === 'common') return { kind: 'common', name, volts: null, value: '' };
  const volts = RAIL_VOLTS[name];
  if (volts === undefined) return { kind: 'node', name, volts: null, value: '' };
  return { kind: 'rail', name, volts, value: name === '0 V' ? '' : `${volts} V`.replace('-', '−') };
}

/** A stage of an n-JFET with sensible words, changed by `changes`. */
export function stage(legs: readonly string[], changes: Partial<SchematicInput> = {}): SchematicInput {
  return {
    name: 'A1',
    channel: 'n',
    family: 'JFET',
    enhancement: false,
    fetName: 'Q1',
    fetCell: 'Q1',
    nodes: [],
    voltages: { gate: '0 V', drain: '12.1 V', source: '1.39 V' },
    current: '1.16 mA',
    output: [],
    ...changes,
    legs: legs.map(leg),
  };
}

const MOSFET = { family: 'MOSFET', enhancement: true } as const;

/** Stages as they are built, by name. */
export const KNOWN_STAGES: Readonly<Record<string, SchematicInput>> = {
  'common source': stage(
    [
      'R_G 2.2 MΩ gate 0 V',
      '. 22 nF gate signal',
      'R_D 5.1 kΩ drain V_DD',
      '. 1 µF drain load',
      'R_S 1.2 kΩ source 0 V',
      '. 47 µF source 0 V',
      '. 100 kΩ load 0 V',
    ],
    { nodes: ['load'], output: ['load'] },
  ),
  'source follower with split supply': stage(
    [
      'R_G 1 MΩ gate 0 V',
      '. 100 nF gate signal',
      '. - - drain V_DD',
      'R_S 6.8 kΩ source V_SS',
      '. 10 µF source load',
      'R_L 10 kΩ load 0 V',
    ],
    { nodes: ['load'], output: ['load'] },
  ),
  'bootstrapped follower': stage(
    [
      'R_G 1 MΩ gate mid',
      'C_in 10 nF gate signal',
      '. - - drain V_DD',
      'R_S1 680 Ω source mid',
      'R_S2 4.7 kΩ mid 0 V',
      'C_out 1 µF source load',
      'R_L 10 kΩ load 0 V',
    ],
    {
      nodes: ['mid', 'load'],
      output: ['load'],
      voltages: { gate: '5.2 V', source: '6.0 V', drain: '18 V', mid: '5.2 V' },
    },
  ),
  'common gate': stage(
    [
      '. - - gate 0 V',
      'R_D 2.2 kΩ drain V_DD',
      'R_S 470 Ω source 0 V',
      'C_in 10 µF source signal',
      'C_out 1 µF drain load',
      'R_L 47 kΩ load 0 V',
    ],
    { nodes: ['load'], output: ['load'] },
  ),
  'drain feedback': stage(
    [
      'R_F 10 MΩ drain gate',
      'C_in 10 nF gate signal',
      'R_D 2.2 kΩ drain V_DD',
      '. - - source 0 V',
      'C_out 1 µF drain load',
      '. 10 kΩ load 0 V',
    ],
    { ...MOSFET, nodes: ['load'], output: ['load'] },
  ),
  'diode connection': stage(['. - - gate drain', 'R_D 10 kΩ drain V_DD', '. - - source 0 V'], { ...MOSFET }),
  'current limiter': stage(['. - - gate source', 'R_L 1 kΩ drain V_DD', '. - - source 0 V']),
  'divider bias': stage(
    [
      'R_1 1 MΩ gate V_DD',
      'R_2 470 kΩ gate 0 V',
      'C_in 100 nF gate signal',
      'R_D 2.2 kΩ drain V_DD',
      'L_D 4.7 mH drain V_DD',
      'R_S 820 Ω source 0 V',
      'C_S 100 µF source 0 V',
      'C_out 1 µF drain load',
      '. 10 kΩ load 0 V',
    ],
    { ...MOSFET, nodes: ['load'], output: ['load'] },
  ),
  'p-channel high side': stage(
    [
      'R_1 1 MΩ gate V_DD',
      'R_2 470 kΩ gate 0 V',
      '. 10 nF gate signal',
      'R_S 220 Ω source V_DD',
      '. 10 µF source V_DD',
      'R_D 2.2 kΩ drain 0 V',
      'C_out 1 µF drain load',
      '. 10 kΩ load 0 V',
    ],
    {
      ...MOSFET,
      channel: 'p',
      nodes: ['load'],
      output: ['load'],
      voltages: { gate: '5.7 V', drain: '8.9 V', source: '14.1 V' },
    },
  ),
  'p-JFET common source': stage(
    ['R_G 1 MΩ gate V_DD', '. 10 nF gate signal', 'R_S 1.2 kΩ source V_DD', 'R_D 4.7 kΩ drain V_SS'],
    { channel: 'p', output: ['drain'], voltages: { gate: '18 V', drain: '−3.2 V', source: '16.1 V' } },
  ),
  'bulk brought out': stage(
    [
      'R_G 1 MΩ gate 0 V',
      '. 10 nF gate signal',
      'R_D 4.7 kΩ drain V_DD',
      'R_S 1 kΩ source 0 V',
      '. - - bulk V_SS',
      '. 1 nF bulk source',
    ],
    { ...MOSFET, output: ['drain'], voltages: { gate: '0 V', drain: '9 V', source: '2 V', bulk: '−12 V' } },
  ),
  'current source load': stage(
    [
      'R_G 1 MΩ gate 0 V',
      'R_stop 1 kΩ gate in',
      'C_in 10 nF in signal',
      'I_0 2 mA drain <V_DD',
      'R_S 470 Ω source n1',
      'R_T 220 Ω n1 0 V',
      'C_T 47 µF n1 0 V',
      'R_N 100 kΩ drain n1',
    ],
    {
      nodes: ['in', 'n1'],
      output: ['drain'],
      voltages: { gate: '0 V', drain: '9 V', source: '2 V', n1: '0.6 V', in: '0 V' },
    },
  ),
  'voltage-controlled resistor': stage(
    ['R_C 10 kΩ gate V_GG', '. 100 nF gate 0 V', 'R_1 10 kΩ drain signal', '. - - source 0 V', 'R_F 100 kΩ gate drain'],
    { output: ['drain'], voltages: { gate: '−3 V', drain: '0 V', source: '0 V' }, current: '0 A' },
  ),
};

const KINDS = ['resistor', 'capacitor', 'inductor', 'source', 'tie'] as const;
const VALUES: Readonly<Record<LegKind, string>> = {
  resistor: '4.7 kΩ',
  capacitor: '470 nF',
  inductor: '10 mH',
  source: '1.25 mA',
  tie: '',
};

/** Any stage at all: up to five named nodes, up to nineteen legs between any places. */
export function randomStage(seed: number): SchematicInput {
  const draw = createDraw(seed);
  const pick = <T>(list: readonly T[]): T => list[Math.floor(draw() * list.length)]!;
  const family = pick(['JFET', 'MOSFET'] as const);
  const named = ['load', 'n1', 'n2', 'mid', 'out_b'].slice(0, Math.floor(draw() * 6));
  const places = ['gate', 'drain', 'source', ...named, ...(family === 'MOSFET' && draw() < 0.4 ? ['bulk'] : [])];
  const legs: StageLeg[] = [];
  const count = 2 + Math.floor(draw() * 18);
  for (let at = 0; at < count; at++) {
    const from = at < 3 ? places[at]! : pick(places);
    const kind = pick(KINDS);
    const chance = draw();
    const to: LegEnd =
      chance < 0.45
        ? endOf(pick(['0 V', '0 V', 'V_DD', 'V_CC', 'V_SS']))
        : chance < 0.55
          ? endOf(pick(['signal', '-signal', 'common']))
          : { kind: 'node', name: pick(places), volts: null, value: '' };
    const named = draw() < 0.6;
    legs.push({
      from,
      kind,
      label: named && kind !== 'tie' ? `${pick(['R', 'C', 'R_long'])}_${at}` : '',
      value: draw() < 0.85 ? VALUES[kind] : '',
      reversed: draw() < 0.5,
      to,
      cell: named ? `R_${at}` : null,
      fails: draw() < 0.1,
    });
  }
  const voltages: Record<string, string | null> = {};
  for (const place of places) voltages[place] = draw() < 0.8 ? pick(['0 V', '12.1 V', '−345 mV']) : null;
  return {
    name: 'A1',
    channel: pick(['n', 'p'] as const),
    family,
    enhancement: draw() < 0.5,
    fetName: pick(['Q1', 'Q2_long', 'Qa']),
    fetCell: 'Q1',
    nodes: named,
    legs,
    voltages,
    current: draw() < 0.7 ? '12.6 mA' : null,
    output: draw() < 0.7 ? [pick(places)] : [pick(places), pick(places)],
  };
}
