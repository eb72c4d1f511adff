// A part in every convention: each against its closed form, each as a way back to the same law, and the routes side by side.

import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { PartReading } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';

function partOf(rows: readonly string[], kind = 'n-JFET'): PartReading {
  const sheet = createSheet(`Q1 = ${kind}\n${rows.map((row) => `  ${row}`).join('\n')}\n`);
  expect(sheet.error('Q1')).toBeNull();
  return sheet.part('Q1')!;
}

const valuesOf = ({ conventions }: PartReading): Record<string, number> =>
  Object.fromEntries(conventions.map(({ name, value }) => [name, value]));

function expectNear(found: number, wanted: number, what: string): void {
  expect(Math.abs(found / wanted - 1), `${what}: ${found}, not ${wanted}`).toBeLessThan(1e-9);
}

describe('the conventions of the trade', () => {
  it('of a JFET follow from beta and V_TO: the card has no factor of 2, g_fs0 has one', () => {
    const beta = 1.25e-3;
    const law = valuesOf(partOf(['beta: 1.25 mA/V^2', 'V_TO: -2 V']));
    expect(Object.keys(law)).toEqual(['beta', 'V_TO', 'I_DSS', 'V_P', 'V_GSoff', 'g_fs0', 'R_DSon', 'g_fs', 'lambda']);
    expectNear(law.I_DSS!, beta * 4, 'I_DSS = beta V_P²');
    expectNear(law.g_fs0!, (2 * law.I_DSS!) / 2, 'g_fs0 = 2 I_DSS / |V_P|');
    expectNear(law.R_DSon!, 1 / (2 * beta * 2), 'R_DS(on) = 1 / (2 beta |V_P|)');
    expectNear(law.g_fs!, 2 * Math.sqrt(beta * 1e-3), 'g_fs at 1 mA');
    expect(law.V_P).toBe(-2);
    expect(law.V_GSoff!).toBeLessThan(-2);
  });

  it('of a p-JFET have the sign of the channel, but for V_TO of the card', () => {
    const law = valuesOf(partOf(['beta: 1.25 mA/V^2', 'V_TO: -2 V'], 'p-JFET'));
    expect([law.V_TO, law.V_P]).toEqual([-2, 2]);
    expect(law.V_GSoff!).toBeGreaterThan(2);
    expect(law.I_DSS!).toBeGreaterThan(0);
  });

  it('of an enhancement MOSFET: K is half of what the card calls KP, per W / L', () => {
    const law = valuesOf(partOf(['K_P: 40 mA/V^2', 'W: 30 um', 'L: 10 um', 'V_TO: 2 V'], 'n-MOSFET'));
    expectNear(law.K!, (40e-3 / 2) * 3, 'K = (K_P / 2)(W / L)');
    expectNear(law.K_P!, 40e-3, 'K_P');
    expectNear(law.I_on!, 60e-3 * 64, 'I_on at 10 V');
    expectNear(law.R_DSon!, 1 / (2 * 60e-3 * 8), 'R_DS(on) at 10 V and small V_DS');
    expect(Object.keys(law)).not.toContain('I_DSS');
    expect(law.V_GSth!).toBeGreaterThan(2);
  });

  it('of a depletion MOSFET are those at V_GS = 0', () => {
    const law = valuesOf(partOf(['K: 2 mA/V^2', 'V_TO: 3 V'], 'p-MOSFET'));
    expectNear(law.I_DSS!, 18e-3, 'I_DSS');
    expect([law.V_TO, law.V_P]).toEqual([3, 3]);
    expect(Object.keys(law)).not.toContain('V_GSth');
  });

  it('are read at the conditions of the part where its rows have some, and say what was written there', () => {
    const { conventions } = partOf(
      ['V_TO: 1.5 V', 'K: 10 mA/V^2', 'R_DSon: 7 ohm at V_GS = 5 V', 'R_DSon: 5 ohm at V_GS = 12 V'],
      'n-MOSFET',
    );
    const rows = conventions.filter(({ name }) => name === 'R_DSon');
    expect(rows.map(({ conditions, written }) => [conditions[0]!.value, written])).toEqual([
      [5, 7],
      [12, 5],
    ]);
    expectNear(rows[0]!.value, 1 / (2 * 10e-3 * 3.5), 'R_DS(on)');
  });

  it('a waiting or broken part has none', () => {
    const sheet = createSheet('Q1 = n-JFET\n  I_DSS: 5 mA\nR = 1 kohm\n');
    expect([sheet.part('Q1'), sheet.part('R'), sheet.part('none')]).toEqual([null, null, null]);
  });
});

/** Pairs of conventions that settle a law between them. */
const WAYS = {
  JFET: [
    ['I_DSS', 'V_P'],
    ['I_DSS', 'V_GSoff'],
    ['beta', 'V_TO'],
    ['I_DSS', 'beta'],
    ['g_fs0', 'I_DSS'],
    ['V_P', 'g_fs'],
    ['V_P', 'R_DSon'],
  ],
  MOSFET: [
    ['V_TO', 'K'],
    ['V_TO', 'K_P'],
    ['V_GSth', 'K'],
    ['V_GSth', 'I_on'],
    ['V_GSth', 'g_fs'],
    ['V_TO', 'R_DSon'],
  ],
} as const;
const UNITS: Readonly<Record<string, string>> = {
  I_DSS: 'A',
  I_on: 'A',
  V_P: 'V',
  V_GSoff: 'V',
  V_GSth: 'V',
  V_TO: 'V',
  beta: 'A/V^2',
  K: 'A/V^2',
  K_P: 'A/V^2',
  g_fs: 'S',
  g_fs0: 'S',
  R_DSon: 'ohm',
  V_GS: 'V',
  V_DS: 'V',
  I_D: 'A',
};

describe('every convention leads back to the law it was read from', () => {
  it.each([
    ['n-JFET', 'JFET', -1],
    ['p-JFET', 'JFET', -1],
    ['n-MOSFET', 'MOSFET', 1],
    ['p-MOSFET', 'MOSFET', -1],
  ] as const)('%s', (kind, family, sign) => {
    const random = createDraw(71);
    for (let k = 0; k < 20; k++) {
      const constant = 10 ** (-4 + 2 * random());
      const threshold = sign * (0.5 + 4 * random());
      const leads = random() < 0.5 ? ['lambda: 0 /V'] : ['lambda: 0.01 /V', 'r_s: 3 ohm', 'r_d: 4 ohm'];
      const name = family === 'JFET' ? 'beta' : 'K';
      const { conventions } = partOf([`${name}: ${constant} A/V^2`, `V_TO: ${threshold} V`, ...leads], kind);
      for (const way of WAYS[family]) {
        const rows = way.map((each) => {
          const found = conventions.find((one) => one.name === each)!;
          const at = found.conditions.map((one) => `${one.name} = ${one.value} ${UNITS[one.name]}`).join(', ');
          return `${each}: ${found.value} ${UNITS[each]}${at === '' ? '' : ` at ${at}`}`;
        });
        const back = valuesOf(partOf([...rows, ...leads], kind));
        const isBack = [back[name]! / constant, back.V_TO! / threshold].every((ratio) => Math.abs(ratio - 1) < 1e-9);
        expect(isBack, `${rows.join('; ')}; ${leads.join('; ')} (draw ${k} of seed 71)`).toBe(true);
      }
    }
  });
});

describe('routes side by side', () => {
  it('the one that computes comes first, the others with how far they are from it', () => {
    const { routes } = partOf(['I_DSS: 8 mA', 'V_P: -2 V', 'g_fs0: 10 mS']);
    expect(routes.map(({ name }) => name)).toEqual(['I_DSS with V_P', 'g_fs0 with I_DSS']);
    expect(routes[0]).toMatchObject({ beta: 2e-3, V_TO: -2, difference: 0 });
    // V_P = -2 I_DSS / g_fs0 = -1.6 V, beta = 3.125 mA/V².
    expectNear(routes[1]!.beta!, 3.125e-3, 'beta');
    expectNear(routes[1]!.V_TO!, -1.6, 'V_TO');
    expectNear(routes[1]!.difference!, 3.125 / 2 - 1, 'difference');
  });

  it('a row of limits alone is no route of its own', () => {
    expect(partOf(['I_DSS: 8 mA', 'V_P: -2 V', 'g_fs0: 6 mS .. 10 mS']).routes).toHaveLength(1);
  });
});
