// Invented readings whose truth is known, as rows of a bench.

import { createDraw } from '../support/counter-random.ts';

export interface Truth {
  readonly name: string;
  /** A/V². */
  readonly beta: number;
  /** V, in the frame of an n-channel FET. */
  readonly V_TO: number;
  /** 1/V. */
  readonly lambda: number;
}

/** Gate and drain voltages in that frame. */
export type Place = readonly [vgs: number, vds: number];

/** Drain current of the square law, n-channel frame, V_DS of 0 and more; written out here by itself. */
export function lawCurrent({ beta, V_TO, lambda }: Truth, [vgs, vds]: Place): number {
  const drive = vgs - V_TO;
  if (drive <= 0) return 0;
  const square = vds >= drive ? drive * drive : vds * (2 * drive - vds);
  return beta * square * (1 + lambda * vds);
}

/** A source of numbers from -1 to 1 that are 0 in the mean, near to normal. */
export function noiseFrom(seed: number): () => number {
  const next = createDraw(seed);
  return () => (next() + next() + next() + next() + next() + next() - 3) / Math.sqrt(0.5);
}

/** A bench of these specimens at these places; `noise` is added to each current as a share of it. */
export function benchText(
  name: string,
  truths: readonly Truth[],
  places: readonly Place[],
  { channel = 1, noise = () => 0, fields = '' }: { channel?: 1 | -1; noise?: () => number; fields?: string } = {},
): string {
  const rows = truths.flatMap((truth) =>
    places.map(([vgs, vds]) => {
      const current = lawCurrent(truth, [vgs, vds]) * (1 + noise());
      return `  ${truth.name}, ${channel * vgs}, ${channel * vds}, ${current}\n`;
    }),
  );
  return `${name} = bench\n  columns: unit, V_GS [V], V_DS [V], I_D [A]\n${fields}${rows.join('')}`;
}
