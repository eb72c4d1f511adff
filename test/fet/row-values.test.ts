// Rows read on a known law against the routes that settle a law from rows: there and back.

import fc from 'fast-check';
import { expect, test } from 'vitest';
import { ROUTES, ROW_VALUES } from '../../src/fet/index.ts';
import type { Route } from '../../src/fet/index.ts';

const DEVICE = ['channel', 'beta', 'V_TO', 'lambda', 'n', 'T_nom', 'r_s', 'r_d', 'W', 'L', 'V_GS', 'V_DS', 'I_D'];

/** Runs a kernel on named values; those not named are NaN. */
function run(
  kernel: { readonly inputs: readonly string[]; readonly outputs: readonly string[]; readonly run: Route['run'] },
  given: Readonly<Record<string, number>>,
): Record<string, number> {
  const slots = Float64Array.from([
    ...kernel.inputs.map((name) => given[name] ?? NaN),
    ...kernel.outputs.map(() => NaN),
  ]);
  kernel.run(slots, Int32Array.from(slots.keys()), 0);
  return Object.fromEntries(kernel.outputs.map((name, i) => [name, slots[kernel.inputs.length + i]!]));
}

const device = fc.record({
  channel: fc.constantFrom(1, -1),
  beta: fc.double({ min: 1e-4, max: 0.1, noNaN: true }),
  V_TO: fc.double({ min: -5, max: -0.3, noNaN: true }),
  lambda: fc.double({ min: 0, max: 0.05, noNaN: true }),
  r_s: fc.double({ min: 0, max: 20, noNaN: true }),
  r_d: fc.double({ min: 0, max: 20, noNaN: true }),
});
const fixed = { n: 1.1, T_nom: 298.15, W: 20e-6, L: 2e-6 };

/** Each row with conditions under which the route's formula is unique, as functions of the drive. */
const CASES: readonly {
  readonly row: string;
  readonly route: string;
  readonly at: Readonly<Record<string, number>>;
}[] = [
  { row: 'I_DSS', route: 'V_P', at: {} },
  { row: 'I_DSS', route: 'V_P', at: { V_DS: 15 } },
  { row: 'I_DSS', route: 'V_P', at: { V_DS: 0.2 } },
  { row: 'I_on', route: 'V_TO', at: { V_GS: 8 } },
  { row: 'I_on', route: 'V_TO', at: { V_GS: 8, V_DS: 12 } },
  { row: 'g_fs', route: 'V_P', at: { I_D: 1e-3 } },
  { row: 'g_fs', route: 'V_P', at: { I_D: 1e-3, V_DS: 10 } },
  { row: 'R_DSon', route: 'V_TO', at: { V_GS: 10 } },
  { row: 'R_DSon', route: 'V_TO', at: { V_GS: 10, I_D: 1e-3 } },
  { row: 'K_P', route: 'V_TO', at: {} },
];

test.each(CASES)('$row at $at settles the law it was read on', ({ row, route, at }) => {
  const isMosfet = route === 'V_TO';
  const found = ROUTES.find(
    (candidate) =>
      candidate.families.includes(isMosfet ? 'MOSFET' : 'JFET') &&
      candidate.needs.includes(row) &&
      candidate.needs.includes(route) &&
      (row !== 'I_DSS' || candidate.needs.includes('V_P')),
  )!;
  fc.assert(
    fc.property(device, (d) => {
      const V_TO = isMosfet ? -d.V_TO : d.V_TO;
      const conditions = Object.fromEntries(
        Object.entries(at).map(([name, value]) => [name, name === 'I_D' ? value : d.channel * value]),
      );
      const law = { ...fixed, ...d, V_TO };
      const { reading } = run(ROW_VALUES[row]!, { ...law, ...conditions });
      const given: Record<string, number> = {
        ...fixed,
        ...d,
        [row]: reading!,
        [route]: route === 'V_P' || isMosfet ? d.channel * V_TO : V_TO,
      };
      for (const [name, value] of Object.entries(conditions)) given[`${row}@${name}`] = value;
      if (row === 'K_P') Object.assign(given, { W: fixed.W, L: fixed.L });
      const back = run(found, given);
      expect(back.status).toBe(0);
      expect(Math.abs(back.beta! / d.beta - 1)).toBeLessThan(1e-9);
    }),
    { seed: 7 },
  );
});

test('a threshold row at its test current settles the threshold it was read on', () => {
  const route = ROUTES.find(({ needs }) => needs.includes('K') && needs.includes('V_GSth'))!;
  fc.assert(
    fc.property(device, fc.double({ min: 1e-9, max: 1e-2, noNaN: true }), (d, I_D) => {
      const law = { ...fixed, n: 1.4, ...d, V_TO: -d.V_TO, I_D };
      const { reading } = run(ROW_VALUES.V_GSth!, law);
      const back = run(route, { ...law, K: d.beta, V_GSth: reading!, 'V_GSth@I_D': I_D });
      expect(Math.abs(back.V_TO! - law.V_TO)).toBeLessThan(1e-9);
    }),
    { seed: 8 },
  );
});

test('every row reads the slots in one order', () => {
  for (const { inputs } of Object.values(ROW_VALUES)) expect(inputs).toEqual(DEVICE);
});

test('a channel that is off, or that cannot carry the current, has no finite resistance', () => {
  const law = { ...fixed, channel: 1, beta: 1e-3, V_TO: 2, lambda: 0, r_s: 1, r_d: 1 };
  expect(run(ROW_VALUES.R_DSon!, { ...law, V_GS: 1 }).reading).toBe(Infinity);
  expect(run(ROW_VALUES.R_DSon!, { ...law, V_GS: 3, I_D: 10 }).reading).toBe(Infinity);
});
