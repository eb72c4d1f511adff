// Ends of a value while one input is turned: looked for with what was prepared once, they are those that a fresh search finds.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { ANALYSES } from '../../src/spread/index.ts';

const weir = readFileSync('public/examples/weir-gauge.txt', 'utf8');
const demo = readFileSync('public/examples/crevasse-listener.txt', 'utf8');

/** The spread model of a sheet with an input written anew. */
function modelOf(text: string, input: string, entry: string) {
  return createSheet(text.replace(new RegExp(`^${input} = \\S+ \\w+`, 'm'), `${input} = ${entry}`)).spreadModel();
}

describe.each([
  // Its limits stay where they are, and so does the least margin, until the nominal leaves them.
  ['a supply that changes in use', weir, 'V_B', ['10.6 V', '13 V', '14.4 V'], 'A1.margin', 1],
  ['a toleranced resistor', demo, 'R_S2', ['300 ohm', '1 kohm', '4.7 kohm'], 'A1.I_D', 3],
  // Both FETs of the chain and a chosen value rest on it.
  ['a toleranced supply', demo, 'V_DD', ['14 V', '17 V', '24 V'], 'A2.margin', 3],
  // The climate moves the very rows that the further limits of a part cut.
  ['the climate', weir, 'T_A', ['-10 degC', '0 degC', '40 degC'], 'A1.I_D', 1],
])('with %s turned', (_, text, input, entries, path, different) => {
  it('the prepared search finds the ends of a fresh one to the last bit', () => {
    const first = modelOf(text, input, entries[0]!);
    const { slot: turned } = first.drawn.find(({ name }) => name === input)!;
    const { slot } = first.values.find((value) => value.path === path)!;
    const over = ANALYSES.endsOver(first, turned, [slot], ['low', 'high']);
    const found = new Set<number>();
    for (const entry of [...entries, entries[0]!]) {
      const model = modelOf(text, input, entry);
      const [ends] = over(model);
      expect(ends).toEqual(ANALYSES.ends(model, [slot], ['low', 'high'])[0]);
      expect(ends!.low).toBeLessThan(ends!.high);
      found.add(ends!.low);
      // One end alone is the same end.
      const [low] = ANALYSES.ends(model, [slot], ['low']);
      expect(Math.abs(low!.low / ends!.low - 1)).toBeLessThan(1e-9);
    }
    expect(found.size).toBe(different);
  });
});
