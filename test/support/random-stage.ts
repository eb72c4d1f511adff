// Random stages: every shape of bias network that the text allows, with values over many decades.

import type { StageSetup } from './stage-text.ts';

const PLACES = ['gate', 'drain', 'source', 'tap', 'mid', 'load'];

/** A stage drawn from `draw`; many have faults, most do not. */
export function randomStage(draw: () => number): StageSetup {
  const pick = <T>(from: readonly T[]): T => from[Math.floor(draw() * from.length)];
  const family = draw() < 0.5 ? 'JFET' : 'MOSFET';
  const ohms = (): string => Math.exp(2 + 14 * draw()).toPrecision(4);
  const rail = (): string => `${(-20 + 40 * draw()).toPrecision(3)} V`;
  const ac = (): string => (draw() < 0.2 ? '47e-12' : '1e-6');
  const lines = new Map<string, string[]>(PLACES.map((place) => [place, []]));
  if (family === 'MOSFET' && draw() < 0.5) lines.set('bulk', [draw() < 0.5 ? 'to 0 V' : `${ohms()} to -5 V`]);
  lines.get('drain')!.push(`${ohms()} to ${(5 + 20 * draw()).toPrecision(3)} V`);
  lines.get('source')!.push(draw() < 0.2 ? 'to 0 V' : `${ohms()} to ${draw() < 0.7 ? '0 V' : rail()}`);
  lines.get('gate')!.push(`${ohms()} to ${draw() < 0.6 ? '0 V' : rail()}`);
  lines.get('load')!.push(`${ohms()} to 0 V`);
  lines.get('tap')!.push(`${ohms()} to ${pick(PLACES)}`);
  lines.get('mid')!.push(`${ohms()} to ${pick(['0 V', 'drain', 'source', 'tap'])}`);
  const extra = Math.floor(4 * draw());
  for (let n = 0; n < extra; n++) {
    const [from, to] = [pick(PLACES), pick(PLACES)];
    lines.get(from)!.push(`${ohms()} to ${to}`);
  }
  if (draw() < 0.2)
    lines
      .get(pick(['source', 'drain', 'tap']))!
      .push(`${(1e-3 * draw()).toPrecision(3)} A ${pick(['to', 'from'])} 0 V`);
  lines
    .get(pick(['gate', 'gate', 'gate', 'source', 'tap']))!
    .push(draw() < 0.3 ? `${ohms()} to signal` : `${ac()} F to signal`);
  lines.get(pick(['drain', 'source', 'tap']))!.push(`${ac()} F to load`);
  if (draw() < 0.5) lines.get('source')!.push(`${ac()} F to ${pick(['0 V', 'tap', '0 V'])}`);
  return {
    family,
    device: {
      beta: Math.exp(-10 + 8 * draw()),
      V_TO: family === 'JFET' ? -4 * draw() - 0.3 : 3 * draw(),
      lambda: draw() < 0.2 ? 0 : 0.05 * draw(),
      ...(family === 'MOSFET' && draw() < 0.6 ? { gamma: draw() } : {}),
      ...(draw() < 0.3 ? { I_GSS: 1e-9 * draw() } : {}),
      ...(draw() < 0.3 ? { r_s: 20 * draw(), r_d: 20 * draw() } : {}),
      ...(draw() < 0.3 ? { R_thJA: 400 * draw(), tempco: -2e-3, beta_exponent: -1.5 } : {}),
    },
    lines: [...lines].map(([place, legs]) => `${place}: ${legs.join(', ')}`),
    output: draw() < 0.8 ? 'load' : pick(['drain', 'source', 'drain - source']),
    ambient: draw() < 0.7 ? 298.15 : 253.15 + 100 * draw(),
  };
}
