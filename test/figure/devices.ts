// Square-law devices and their operating points for the tests of planes, worked out here by bisection.

import type { OutputDevice } from '../../src/figure/index.ts';

export interface Surrounding {
  readonly channel: 'n' | 'p';
  /** Ohms in series with the source, and in the whole loop. */
  readonly rs: number;
  readonly loop: number;
  readonly supply: number;
  readonly gate: number;
}

export const SELF_BIAS: Surrounding = { channel: 'n', rs: 1200, loop: 6300, supply: 18, gate: 0 };

const LAMBDA = 0.012;

export function device(role: OutputDevice['role'], beta: number, threshold: number, at: Surrounding): OutputDevice {
  const sign = at.channel === 'n' ? 1 : -1;
  const law = (vgs: number, vds: number): number => {
    const [drive, across] = [sign * (vgs - threshold), sign * vds];
    if (drive <= 0 || across <= 0) return 0;
    const shape = across < drive ? across * (2 * drive - across) : drive * drive;
    return beta * shape * (1 + LAMBDA * across);
  };
  let [low, high] = [0, at.supply / at.loop];
  for (let step = 0; step < 100; step++) {
    const id = (low + high) / 2;
    if (law(at.gate - sign * at.rs * id, sign * (at.supply - at.loop * id)) > id) low = id;
    else high = id;
  }
  const q = { vgs: at.gate - sign * at.rs * low, vds: sign * (at.supply - at.loop * low), id: low };
  const label = role === 'nominal' ? 'nominal' : `${role} device`;
  const load = { volts: sign * at.supply, ohms: at.loop, amps: 0, label: 'load line' };
  return { role, label, law, threshold, q, load };
}

/** Low, nominal and high n-JFETs in one self-biased stage, and their mirror images. */
export function jfets(channel: 'n' | 'p'): OutputDevice[] {
  const at = { ...SELF_BIAS, channel };
  const sign = channel === 'n' ? 1 : -1;
  return [
    device('nominal', 0.816e-3, sign * -2.5, at),
    device('low', 1.77e-3, sign * -1.2, at),
    device('high', 0.407e-3, sign * -5, at),
  ];
}
