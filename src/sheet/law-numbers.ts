// The settled law of a part as numbers, and what it reads in a convention of the trade.

import { DEFAULTS, FORMS } from '../fet/index.ts';
import type { PartEntry } from '../language/index.ts';
import type { Read } from './draft.ts';
import type { GivenFields } from './part-given.ts';
import type { PartLaw } from './part-law.ts';

/** Test conditions by name, SI and in the sense of the channel. */
export type Conditions = ReadonlyMap<string, number>;

/** The settled law as numbers: SI, n-channel frame. */
export interface LawNumbers {
  readonly family: 'JFET' | 'MOSFET';
  readonly channel: 1 | -1;
  readonly known: Readonly<Record<string, number>>;
}

/** The law with all that its conventions read. */
export function lawNumbers(
  { family, channel: letter }: PartEntry,
  law: PartLaw,
  given: GivenFields,
  read: Read,
): LawNumbers {
  const channel = letter === 'n' ? 1 : -1;
  const lead = (name: 'r_s' | 'r_d'): number => (law[name] === null ? 0 : read(law[name]));
  const only = (name: string, otherwise: number): number => {
    const field = given.get(name)?.[0];
    return field ? read(field.handle) : otherwise;
  };
  const { n, T_nom } = DEFAULTS[family];
  const known = {
    channel,
    beta: read(law.used.beta),
    V_TO: read(law.used.V_TO),
    lambda: read(law.lambda),
    n: n.value,
    T_nom: only('T_nom', T_nom.value),
    r_s: lead('r_s'),
    r_d: lead('r_d'),
    W: only('W', 1),
    L: only('L', 1),
  };
  return { family, channel, known };
}

/** What the law reads in a convention at its conditions, in the sense of the channel; NaN where it has no reading. */
export function conventionValue(name: string, { family, channel, known }: LawNumbers, conditions: Conditions): number {
  if (name === 'beta' || name === 'K') return known.beta!;
  if (name === 'lambda') return known.lambda!;
  // The model card of a JFET has no channel in its sign.
  if (name === 'V_TO') return family === 'JFET' ? known.V_TO! : channel * known.V_TO!;
  const { inputs, run } = FORMS[name]!;
  const values = inputs.map((input) => {
    const [field, condition] = input.split('@');
    return condition === undefined ? known[field!]! : (conditions.get(condition) ?? NaN);
  });
  const slots = Float64Array.from([...values, NaN]);
  run(
    slots,
    Int32Array.from(slots, (_, slot) => slot),
    0,
  );
  return slots[values.length]!;
}
