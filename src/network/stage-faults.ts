// What is wrong with a stage before any number is known, in sentences that name the places.

import { terminalName } from './place-graph.ts';
import type { PlaceGraph } from './place-graph.ts';
import { componentsOf, terminalsOf } from './rest-network.ts';
import type { NetElement, StageFault, StageNet } from './stage-net.ts';

/** Faults of the legs as such: missing, without a place, with an element that cannot be. */
export function legFaults(net: StageNet): StageFault[] {
  if (net.fets.length !== 1) {
    return [{ code: 'several-fets', text: 'A stage of several FETs is not computed yet.', leg: null }];
  }
  const [fet] = net.fets;
  const faults: StageFault[] = [];
  const terminals = ['gate', 'drain', 'source'].map((terminal) => terminalName(fet, terminal));
  const bulk = terminalName(fet, 'bulk');
  const known = new Set([...terminals, ...net.nodes, ...(fet.family === 'MOSFET' ? [bulk] : [])]);
  const used = new Set<string>();
  for (const { from, to, element, leg } of net.legs) {
    for (const place of to.type === 'node' ? [from, to.name] : [from]) {
      used.add(place);
      if (known.has(place)) continue;
      const text =
        place === bulk
          ? `${place} stands in the stage, and a JFET has no bulk. Leave the line out.`
          : `There is no ${place} in this stage. Give it a line of its own, such as ${place}: 100 kohm to 0 V.`;
      faults.push({ code: place === bulk ? 'no-such-terminal' : 'no-such-place', text, leg });
    }
    if (element) faults.push(...elementFaults(from, element, leg));
  }
  for (const terminal of terminals) {
    if (used.has(terminal)) continue;
    const proposal = terminal.endsWith('gate') ? '1 Mohm to 0 V' : '1 kohm to 0 V';
    faults.push({
      code: 'terminal-without-leg',
      text: `${terminal} has no leg. Write what hangs on it, such as ${terminal}: ${proposal}.`,
      leg: null,
    });
  }
  return faults;
}

function elementFaults(from: string, { kind, nominal, label }: NetElement, leg: number): StageFault[] {
  if (kind === 'source' || nominal > 0) return [];
  if (kind === 'resistor') {
    const text =
      nominal === 0
        ? `${label} on ${from} is 0 ohm. A resistor has more than 0 ohm; to join two places, write no element at all.`
        : `${label} on ${from} is below 0 ohm. A resistor has more than 0 ohm.`;
    return [{ code: 'resistor-not-positive', text, leg }];
  }
  const unit = kind === 'capacitor' ? '0 F' : '0 H';
  return [
    {
      code: 'element-not-positive',
      text: `${label} on ${from} is not above ${unit}. Its value is above ${unit}.`,
      leg,
    },
  ];
}

/** Where the channel current is forced: the terminal whose island only current sources feed. */
export type Forcing = 'drain' | 'source' | null;

/** Faults of the graph at rest, and which terminal's island forces the channel current. */
export function restFaults(net: StageNet, graph: PlaceGraph): { faults: StageFault[]; forcing: Forcing } {
  const faults: StageFault[] = [];
  graph.holders.forEach((holders, c) => {
    if (holders.length < 2) return;
    const [first, second] = holders;
    const names = graph.names[c];
    const subject = names.length > 0 ? namesText(names) : first.label;
    const text =
      names.length > 0
        ? `${subject} ${names.length > 1 ? 'are' : 'is'} tied to ${first.label} and to ${second.label}: a place has one voltage. Put a resistor into one of the two legs.`
        : `${first.label} and ${second.label} are tied together. Put a resistor between them.`;
    faults.push({ code: 'two-rails', text, leg: Math.max(first.leg, second.leg) });
  });
  const at = terminalsOf(graph, net.fets[0]);
  let forcing: Forcing = null;
  for (const { classes, anchored } of componentsOf(graph)) {
    if (anchored) continue;
    const holds = (['drain', 'source'] as const).filter((terminal) => classes.has(at[terminal]));
    const fed = graph.drives.some(({ from, to }) => classes.has(from) !== classes.has(to));
    if (holds.length === 1 && fed) {
      if (forcing) {
        const text =
          'drain and source are both fed by current sources alone, and only one of the two can set the current. Give the other a resistor to a rail.';
        faults.push({ code: 'currents-conflict', text, leg: null });
      }
      forcing = holds[0];
      continue;
    }
    const names = [...classes].flatMap((c) => graph.names[c]);
    const leg = net.legs.find(({ from }) => names.includes(from))?.leg ?? null;
    const text = `${namesText(names)} ${names.length > 1 ? 'float' : 'floats'}: no resistor, inductor or tie leads from there to a rail or to signal. Add one, such as ${names[0]}: 1 Mohm to 0 V.`;
    faults.push({ code: 'node-floats', text, leg });
  }
  return { faults, forcing };
}

/** `drain`, `drain and out`, `drain, out and load`. */
function namesText(names: readonly string[]): string {
  return names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
