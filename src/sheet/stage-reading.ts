// A solved stage as figures want it: its legs, its voltages and its device law, all as numbers.

import { betaAt, channelCurrent, threshold as thresholdWithBulk, thresholdAt } from '../fet/index.ts';
import type { DeviceHandles, StageNet } from '../network/index.ts';
import { solveBracketed } from '../numeric/index.ts';
import { CAPACITANCE, CURRENT, INDUCTANCE, RESISTANCE } from '../quantity/index.ts';
import type { Read } from './draft.ts';
import type { StageReading } from './model.ts';
import type { StageInHand } from './stage-in-hand.ts';

const KINDS = { resistor: RESISTANCE, capacitor: CAPACITANCE, inductor: INDUCTANCE, source: CURRENT } as const;

/** The reading of a stage; without numbers where it is not solved. */
export function readStage(stage: StageInHand & { readonly net: StageNet; readonly solved: boolean }): StageReading {
  const { tree, fets, legs, lowering, net, read, solved } = stage;
  const { part, partName } = fets[0]!;
  const value = (name: string): number =>
    solved && lowering.values.has(name) ? read(lowering.values.get(name)!) : NaN;
  const places = ['gate', 'drain', 'source', 'bulk', ...net.nodes];
  const voltages = new Map<string, number>();
  for (const place of places) if (lowering.values.has(`V_${place}`) && solved) voltages.set(place, value(`V_${place}`));
  const [vgs, vds, id] = [value('V_GS'), value('V_DS'), value('I_D')];
  const { beta, threshold } = lawAt(part.device, value('T_J'), part.channel * value('V_SB'), read);
  const lambda = read(part.device.lambda);
  const channel = withLeads(
    (gate, drain) => channelCurrent(beta, lambda, gate - threshold, drain),
    part.device.r_s === null ? 0 : read(part.device.r_s),
    part.device.r_d === null ? 0 : read(part.device.r_d),
  );
  return {
    name: tree.name.name,
    channel: part.channel,
    family: part.family,
    enhancement: part.family === 'MOSFET' && read(part.device.V_TO) > 0,
    fetName: partName,
    fetCell: partName,
    nodes: net.nodes,
    legs: legs.map(({ net: leg, leg: written }) => ({
      from: leg.from,
      kind: leg.element?.kind ?? 'tie',
      label: leg.element && written.element?.type === 'path' ? leg.element.label : '',
      value: leg.element ? read(leg.element.value) : null,
      type: leg.element ? KINDS[leg.element.kind] : null,
      reversed: leg.reversed,
      to: {
        kind: leg.to.type,
        name:
          leg.to.type === 'node'
            ? leg.to.name
            : leg.to.type === 'rail'
              ? leg.to.label
              : leg.to.type === 'signal' && leg.to.inverted
                ? '-signal'
                : leg.to.type,
        volts: leg.to.type === 'rail' ? (leg.to.volts === null ? 0 : read(leg.to.volts)) : null,
      },
      cell: written.element?.type === 'path' ? written.element.names[0]!.name : null,
    })),
    voltages,
    current: solved ? id : null,
    q: solved ? { vgs, vds, id } : null,
    lines:
      solved && lowering.lines
        ? {
            V_GG: read(lowering.lines.V_GG),
            R_m: read(lowering.lines.R_m),
            V_L: read(lowering.lines.V_L),
            R_L: read(lowering.lines.R_L),
          }
        : null,
    threshold: solved ? part.channel * threshold : null,
    law: (gate, drain) => channel(part.channel * gate, part.channel * drain),
    output: net.output ? [net.output.plus, ...(net.output.minus ? [net.output.minus] : [])] : [],
  };
}

type ChannelLaw = (vgs: number, vds: number) => number;

/** The law of a channel between its terminals, behind resistances (ohm) in the source and the drain lead; n-channel frame. */
function withLeads(law: ChannelLaw, source: number, drain: number): ChannelLaw {
  if (source === 0 && drain === 0) return law;
  return (vgs, vds) => {
    // The leads only take current away: it lies between nothing and what would flow without them.
    const most = law(vgs, vds);
    const left = (current: number): number => law(vgs - source * current, vds - (source + drain) * current) - current;
    return most === 0 ? 0 : solveBracketed(left, Math.min(0, most), Math.max(0, most)).value;
  };
}

/** beta (A/V²) and threshold (V, n-channel frame) at a junction temperature (K) and V_SB (V, n-channel frame). */
function lawAt(device: DeviceHandles, T_J: number, vsb: number, read: Read): { beta: number; threshold: number } {
  const nominal = read(device.T_nom);
  const vto = thresholdAt(read(device.V_TO), read(device.tempco), T_J, nominal);
  return {
    beta: betaAt(read(device.beta), read(device.beta_exponent), T_J, nominal),
    threshold: device.gamma === null ? vto : thresholdWithBulk(vto, read(device.gamma), read(device.phi), vsb),
  };
}
