// What each build would have wanted of an inverse cell, and cells that are answered in each build: closed forms of a source
// follower without lambda, I_D = K (V_G - I_D R_S - V_TO)^2.

import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { analyse } from '../../src/spread/index.ts';
import type { SheetSpread } from '../../src/spread/index.ts';

const K = 0.004;
const FOLLOWER = `V_G = 6 V
R_S = 1.2 kohm ± 1 %
Q1 = n-MOSFET
  V_TO: 2 V in 1.5 V .. 3 V
  K: 4 mA/V^2
A1 = stage of Q1
  gate: to V_G
  drain: to 15 V
  source: R_S to 0 V
`;
/** The resistor for a current with a threshold. */
const wanted = (I: number, V_TO: number): number => (6 - V_TO - Math.sqrt(I / K)) / I;
const off = (x: number | null, y: number): number => Math.abs(x! - y) / Math.abs(y);

function spreadOf(text: string, samples = 2000): SheetSpread {
  return analyse(createSheet(text).spreadModel(), { samples, seed: 5 })!;
}

describe('an inverse cell', () => {
  it('has the range of what builds would have wanted, while what rests on it stays as chosen', () => {
    const spread = spreadOf(
      `${FOLLOWER}x = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 100 kohm\nbuy = E24(x)\ny = 2 * x\n`,
    );
    const { low, high, answered, distribution } = spread.value('x')!;
    expect(off(low.value, wanted(0.0007, 3))).toBeLessThan(1e-12);
    expect(off(high.value, wanted(0.0007, 1.5))).toBeLessThan(1e-12);
    expect(answered).toMatchObject({ share: 1, n: 2000 });
    // Half of the specimens lie on either side of the nominal.
    expect(off(distribution!.p50, wanted(0.0007, 2))).toBeLessThan(0.01);
    for (const path of ['buy', 'y']) expect(spread.value(path)).toMatchObject({ moves: false, answered: null });
  });

  it('does not depend on what its own input is in a build', () => {
    const spread = spreadOf(
      `${FOLLOWER.replace(/^R_S = .*$/m, 'R_S = 2 kohm ± 20 %')}x = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 100 kohm\n`,
    );
    const { low, high } = spread.value('x')!;
    expect(off(low.value, wanted(0.0007, 3))).toBeLessThan(1e-12);
    for (const { where } of [low, high]) {
      expect(where.map(({ draw }) => spread.model.drawn[draw]!.name)).toEqual(['Q1.V_TO']);
    }
  });

  it('says in what share of builds there is no answer', () => {
    // R_S for 0.7 mA lies above 5.3 kohm where V_TO is below a certain threshold.
    const border = 6 - 0.0007 * 5300 - Math.sqrt(0.0007 / K);
    const share = border < 2 ? (0.5 * (border - 1.5)) / 0.5 : 0.5 + 0.5 * (border - 2);
    const spread = spreadOf(`${FOLLOWER}x = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 5.3 kohm\n`, 10_000);
    const { answered, high } = spread.value('x')!;
    expect(answered!.n).toBe(10_000);
    // Four standard deviations of a share.
    expect(Math.abs(answered!.share - (1 - share))).toBeLessThan(4 * Math.sqrt((share * (1 - share)) / 10_000));
    expect(high.value!).toBeLessThanOrEqual(5300);
    expect(high.value!).toBeGreaterThan(5290);
  });

  it('is answered in each build where that is asked for', () => {
    const spread = spreadOf(
      `${FOLLOWER}R_fit = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 100 kohm each
A2 = stage of Q1
  gate: to V_G
  drain: to 15 V
  source: R_fit to 0 V
V_f = A2.I_D * R_fit
`,
    );
    // The same specimen in both stages: with its own resistor it carries the wanted current in every build.
    const { low, high } = spread.value('A2.I_D')!;
    expect(off(low.value, 0.0007)).toBeLessThan(1e-12);
    expect(off(high.value, 0.0007)).toBeLessThan(1e-12);
    const fit = spread.value('R_fit')!;
    expect(off(fit.low.value, wanted(0.0007, 3))).toBeLessThan(1e-12);
    const V_f = spread.value('V_f')!;
    expect(off(V_f.high.value, 0.0007 * wanted(0.0007, 1.5))).toBeLessThan(1e-12);
    expect(off(V_f.distribution!.p50, 0.0007 * wanted(0.0007, 2))).toBeLessThan(0.01);
    // The stage with the resistor that was bought moves as ever.
    expect(spread.value('A1.I_D')!.high.value! / spread.value('A1.I_D')!.low.value!).toBeGreaterThan(1.2);
  });

  it('is answered in each build within another one', () => {
    const spread = spreadOf(
      `a = 2 ± 10 %
b = 3 ± 10 %
x = b such that a * b = 12 over 0 .. 100 each
y = a such that x / a = 1 over 0.1 .. 100 each
`,
    );
    // x = 12 / a; y solves 12 / y^2 = 1, whatever a is.
    const y = spread.value('y')!;
    expect(off(y.low.value, Math.sqrt(12))).toBeLessThan(1e-12);
    expect(off(y.high.value, Math.sqrt(12))).toBeLessThan(1e-12);
    const x = spread.value('x')!;
    expect(off(x.low.value, 12 / 2.2)).toBeLessThan(1e-12);
    expect(off(x.high.value, 12 / 1.8)).toBeLessThan(1e-12);
  });

  it('is the same in every build where it asks for ends', () => {
    const sheet = `V_1 = 15 V ± 5 %\nR_1 = 3.3 kohm ± 1 %\nV_x = V_1 - R_1 * 1.5 mA\nR_max = R_1 such that high(V_x) = 11 V over 100 ohm .. 22 kohm\n`;
    const spread = spreadOf(sheet, 100);
    expect(spread.value('R_max')).toBeNull();
  });

  it('comes out at the nominal position to the last bit as the sheet has it', () => {
    const text = `${FOLLOWER}x = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 100 kohm\n`.replace(
      ' in 1.5 V .. 3 V',
      '',
    );
    const sheet = createSheet(text);
    const { low, high } = analyse(sheet.spreadModel(), { samples: 10, seed: 1 })!.value('x')!;
    expect(low.value).toBe(sheet.value('x'));
    expect(high.value).toBe(sheet.value('x'));
  });
});

describe('standing at a corner', () => {
  it('answers again what is answered in each build, and keeps what was chosen', () => {
    const text = `a = 2 ± 10 %\nb = 3\nx = b such that a * b = 12 over 0 .. 100 each\ny = b such that a * b = 12 over 0 .. 100\n`;
    const sheet = createSheet(text);
    const { drawn } = sheet.spreadModel();
    const corner = sheet.standing(new Map([[drawn[0]!.slot, 2.2]]));
    expect(corner.value('x')).toBeCloseTo(12 / 2.2, 12);
    expect(corner.value('y')).toBeCloseTo(6, 12);
  });
});
