// Inverse cells: answers that are known in closed form, what keeps its own entry, and answers that follow every edit.

import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { ANALYSES } from '../../src/spread/index.ts';
import { createDraw } from '../support/counter-random.ts';

/** A source follower without lambda: I_D = K (V_G - I_D R_S - V_TO)^2. */
function follower(V_G: number, R_S: number, sign: 1 | -1 = 1): string {
  return `V_G = ${sign * V_G} V
R_S = ${R_S} ohm
Q1 = ${sign === 1 ? 'n' : 'p'}-MOSFET
  V_TO: ${sign * 2} V
  K: 4 mA/V^2
A1 = stage of Q1
  gate: to V_G
  drain: to ${sign * 15} V
  source: R_S to 0 V
`;
}

function number(sheet: Sheet, path: string): number {
  const value = sheet.value(path);
  if (typeof value !== 'number') throw new Error(`${path}: ${sheet.error(path)?.text ?? String(value)}`);
  return value;
}

const off = (x: number, y: number): number => Math.abs(x - y) / Math.abs(y);

describe('an inverse cell', () => {
  it('answers with the resistor that gives a current, as the square law has it', () => {
    const draw = createDraw(11);
    for (let n = 0; n < 20; n++) {
      const [V_G, I] = [4 + 6 * draw(), 0.0002 + 0.002 * draw()];
      const expected = (V_G - 2 - Math.sqrt(I / 0.004)) / I;
      const sheet = createSheet(`${follower(V_G, 1200)}x = R_S such that A1.I_D = ${I} A over 1 ohm .. 1 Mohm\n`);
      expect(off(number(sheet, 'x'), expected)).toBeLessThan(1e-12);
      expect(number(sheet, 'R_S')).toBe(1200);
    }
  });

  it('lets the stage reach its target once the answer is put in', () => {
    const asked = 'x = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 100 kohm\n';
    const x = number(createSheet(follower(6, 1200) + asked), 'x');
    expect(off(number(createSheet(follower(6, x) + asked), 'A1.I_D'), 0.0007)).toBeLessThan(1e-12);
  });

  it('is mirrored to the last bit', () => {
    const asked = (I: string): string => `x = R_S such that A1.I_D = ${I} over 100 ohm .. 100 kohm\n`;
    const n = createSheet(follower(6, 1200) + asked('0.7 mA'));
    const p = createSheet(follower(6, 1200, -1) + asked('0.7 mA'));
    expect(number(p, 'x')).toBe(number(n, 'x'));
  });

  it('turns a field of a part, a supply and a temperature', () => {
    const V_TO = number(
      createSheet(`${follower(6, 1000)}x = Q1.V_TO such that A1.I_D = 1 mA over 0.1 V .. 5 V\n`),
      'x',
    );
    expect(off(V_TO, 6 - 1 - 0.5)).toBeLessThan(1e-12);
    const V_G = number(createSheet(`${follower(6, 1000)}x = V_G such that A1.I_D = 1 mA over 0 V .. 15 V\n`), 'x');
    expect(off(V_G, 2 + 1 + 0.5)).toBeLessThan(1e-12);
    // The zero-temperature-coefficient point of a JFET: 0.63 V of overdrive with the default laws (design, section 4).
    const heat = createSheet('T_A = 25 degC\nx = T_A such that T_A - 0 degC = 40 K over -40 degC .. 125 degC\n');
    expect(number(heat, 'x')).toBeCloseTo(313.15, 9);
  });

  it('feeds other cells, and follows every edit that reaches it', () => {
    const asked = 'x = R_S such that A1.I_D = I_0 over 100 ohm .. 100 kohm\nbuy = E24(x)\nI_0 = 0.7 mA\n';
    const sheet = createSheet(follower(6, 1200) + asked);
    const expected = (I: number, V: number): number => (V - 2 - Math.sqrt(I / 0.004)) / I;
    expect(off(number(sheet, 'x'), expected(0.0007, 6))).toBeLessThan(1e-12);
    expect(number(sheet, 'buy')).toBe(5100);
    sheet.update(follower(6, 1200) + asked.replace('0.7 mA', '0.5 mA'));
    expect(off(number(sheet, 'x'), expected(0.0005, 6))).toBeLessThan(1e-12);
    sheet.update(follower(7, 1200) + asked.replace('0.7 mA', '0.5 mA'));
    expect(off(number(sheet, 'x'), expected(0.0005, 7))).toBeLessThan(1e-12);
    // Another formula that happens to have the same value at the present input.
    const text = 'a = 2\ny = a * 3\nx = a such that y = 12 over 0 .. 10\n';
    const direct = createSheet(text);
    expect(number(direct, 'x')).toBeCloseTo(4, 12);
    direct.update(text.replace('a * 3', 'a + 4'));
    expect(number(direct, 'x')).toBeCloseTo(8, 12);
  });

  it('stands in another one, three deep', () => {
    const text = `a = 1
b = 1
c = 1
x1 = a such that a^2 = b over 0 .. 100
x2 = b such that x1 = c over 0 .. 100
x3 = c such that x2 = 16 over 0 .. 10
`;
    // x1 is the root of b, x2 the square of c, x3 the root of 16.
    const sheet = createSheet(text);
    expect(number(sheet, 'x1')).toBeCloseTo(1, 12);
    expect(number(sheet, 'x2')).toBeCloseTo(1, 10);
    expect(number(sheet, 'x3')).toBeCloseTo(4, 9);
  });

  it('asks for ends: the largest resistor whose worst voltage is still 1 V', () => {
    const sheet = createSheet(
      `V_1 = 15 V ± 5 %
R_1 = 3.3 kohm ± 1 %
V_x = V_1 - R_1 * 1.5 mA
R_max = R_1 such that low(V_x) = 1 V over 100 ohm .. 22 kohm
`,
      ANALYSES,
    );
    expect(off(number(sheet, 'R_max'), (0.95 * 15 - 1) / (1.01 * 0.0015))).toBeLessThan(1e-12);
  });

  it('is drawn in a plot together with what rests on it', () => {
    const sheet = createSheet(
      'a = 2\nb = 3\nx = a such that a * b = 12 over 0 .. 100\ny = 2 * x\nF1 = plot y against b over 1 .. 4\n',
    );
    const { input, series } = sheet.sweep('F1', 7)!;
    input.values.forEach((b, i) => expect(series[0]!.values[i]).toBeCloseTo(24 / b, 9));
  });

  it('shows both sides of its equation with the answer in place', () => {
    const sheet = createSheet(
      `${follower(6, 1200)}I = 0.7 mA\nx = R_S such that A1.I_D = I over 100 ohm .. 100 kohm\ny = R_S such that A1.I_D = 0.7 mA over 100 ohm .. 100 kohm\n`,
    );
    const [target, value] = sheet.workings('x');
    expect(target).toMatchObject({ formula: 'A1.I_D', operands: [{ name: 'A1.I_D' }] });
    expect(off(target!.value as number, 0.0007)).toBeLessThan(1e-12);
    expect(value).toMatchObject({ formula: 'I', value: 0.0007 });
    // A number that was typed needs no line of its own.
    expect(sheet.workings('y')).toHaveLength(1);
  });
});
