// The resistor that sets the bias: alone, or in a chain, between the source and a rail. Turning it moves Q along the
// curve of the device; so a place on the curve asks for a resistance.

import type { SheetView, StageReading } from '../sheet/index.ts';

/** The resistor to be turned, or why there is none. */
export type SourceLeg =
  | {
      readonly cell: string;
      /** The resistance in ohms that puts Q at that V_GS on the curve through Q; null where no positive one does. */
      readonly resistanceAt: (vgs: number) => number | null;
    }
  | { readonly reason: string };

type Leg = StageReading['legs'][number];

/** What turns when Q is dragged: the largest resistor of the chain, which must be a named input. */
export function sourceLeg(stage: StageReading, sheet: SheetView): SourceLeg {
  const stay = (why: string): SourceLeg => ({ reason: `Q of ${stage.name} cannot be dragged: ${why}.` });
  const { q, lines, channel, law } = stage;
  if (q === null) return stay('the stage is not solved');
  const chain = chainFrom('source', stage.legs);
  if (chain === null) return stay('its source does not lead through resistors alone, one after the other, to a rail');
  const inputs = chain.filter(({ cell }) => cell !== null && sheet.cell(cell)?.isInput === true);
  const turned = inputs.toSorted((a, b) => b.value! - a.value!)[0];
  if (lines === null || turned === undefined) {
    const named = chain.find(({ cell }) => cell !== null);
    return stay(named ? `${named.label} is computed, not entered` : 'no resistor with a name stands in its source leg');
  }
  const begins = q.vgs + channel * lines.R_m * q.id;
  return {
    cell: turned.cell!,
    resistanceAt(vgs) {
      const id = law(vgs, q.vds);
      const resistance = turned.value! - lines.R_m + (channel * (begins - vgs)) / id;
      return id > 0 && resistance > 0 ? resistance : null;
    },
  };
}

/** The resistors that carry the source current to a rail, in order; null where they branch, end or hold something else. */
function chainFrom(start: string, legs: readonly Leg[]): readonly Leg[] | null {
  const carrying = legs.filter(({ kind, from, to }) => kind !== 'capacitor' && from !== 'bulk' && to.name !== 'bulk');
  const chain: Leg[] = [];
  for (let place = start; ;) {
    const onward = carrying.filter((leg) => !chain.includes(leg) && (leg.from === place || endsAt(leg, place)));
    const [leg] = onward;
    if (leg === undefined || onward.length > 1 || leg.kind !== 'resistor') return null;
    chain.push(leg);
    if (leg.from === place && leg.to.kind !== 'node') return leg.to.kind === 'rail' ? chain : null;
    place = leg.from === place ? leg.to.name : leg.from;
    if (place === 'gate' || place === 'drain') return null;
  }
}

function endsAt({ to }: Leg, place: string): boolean {
  return to.kind === 'node' && to.name === place;
}
