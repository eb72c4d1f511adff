// The bias line of a band against published two-device examples, and against devices drawn at random on the line.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { biasLine, dividerAllowance, gateWindow, middleResistor, selfBiasWindow } from '../../src/network/index.ts';
import type { BandPoints } from '../../src/network/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';

interface Case {
  readonly id: string;
  readonly expect: Readonly<Record<string, { readonly recomputed: number }>>;
}
const published = (kind: 'jfet' | 'mosfet', id: string): Case['expect'] => {
  const cases = JSON.parse(readFileSync(`test/published/cases/${kind}.json`, 'utf8')) as Case[];
  return cases.find((each) => each.id === id)!.expect;
};

/** V_GS at which a device of the square law carries a current. */
const gateAt = (beta: number, threshold: number, current: number): number => threshold + Math.sqrt(current / beta);

test('A. Malvino and D. Bates, Ex. 13-7: the line through both devices of a 2N5486 is that of 270 ohm from 0 V', () => {
  const { IDmin, IDmax } = published('jfet', 'self-malvino-13-7-spread');
  const [least, most] = [IDmin!.recomputed * 1e-3, IDmax!.recomputed * 1e-3];
  const points = { least, most, vgsLeast: gateAt(8e-3 / 4, -2, least), vgsMost: gateAt(20e-3 / 36, -6, most) };
  const line = biasLine(points)!;
  expect(Math.abs(line.R_S / 270 - 1)).toBeLessThan(1e-6);
  expect(Math.abs(line.V_GG)).toBeLessThan(1e-6);
});

test('D. A. Bell, Ex. 10-9: the line through both devices gives R_S and, from 25 V over 1 Mohm, R_1', () => {
  const { R1 } = published('jfet', 'vdiv-bell-10.9-design');
  const R_S = (25 - 10) / 3e-3 / 2;
  // The minimum device of the same examples (4 mA, -3 V, Ex. 10-4) on the line of the printed design.
  const sheet = createSheet(
    [
      'Q1 = n-JFET\n  I_DSS: 4 mA\n  V_P: -3 V',
      `A1 = stage of Q1\n  gate: ${R1!.recomputed} Mohm to 25 V, 1 Mohm to 0 V\n  drain: ${R_S} ohm to 25 V\n  source: ${R_S} ohm to 0 V`,
    ].join('\n'),
  );
  const least = sheet.value('A1.I_D') as number;
  const points = { least, most: 3e-3, vgsLeast: gateAt(4e-3 / 9, -3, least), vgsMost: gateAt(8e-3 / 36, -6, 3e-3) };
  const line = biasLine(points)!;
  expect(Math.abs(line.R_S / R_S - 1)).toBeLessThan(1e-6);
  expect(Math.abs((25 / line.V_GG - 1) / R1!.recomputed - 1)).toBeLessThan(1e-6);
});

test('Y. N. Bapat, Ex. 4.9 and 4.10: two enhancement devices behind 12 Mohm over 8.57 Mohm and 6 kohm', () => {
  const { A_I_D, B_I_D } = published('mosfet', 'nmos-4r-device-spread');
  const [most, least] = [A_I_D!.recomputed * 1e-3, B_I_D!.recomputed * 1e-3];
  const points = { least, most, vgsLeast: gateAt(0.375e-3, 3, least), vgsMost: gateAt(0.25e-3, 2, most) };
  const line = biasLine(points)!;
  expect(Math.abs(line.R_S / 6e3 - 1)).toBeLessThan(5e-6);
  expect(Math.abs(line.V_GG / ((24 * 8.57) / 20.57) - 1)).toBeLessThan(5e-6);
});

test('A. S. Sedra and K. C. Smith, Ex. 4.9: thresholds of 1 V and 1.5 V behind 7 V and 10 kohm', () => {
  const { I_D_new } = published('mosfet', 'nmos-bias-stability-vt');
  const least = I_D_new!.recomputed * 1e-3;
  const points = { least, most: 0.5e-3, vgsLeast: gateAt(0.5e-3, 1.5, least), vgsMost: gateAt(0.5e-3, 1, 0.5e-3) };
  const line = biasLine(points)!;
  expect(Math.abs(line.R_S / 10e3 - 1)).toBeLessThan(2e-6);
  expect(Math.abs(line.V_GG / 7 - 1)).toBeLessThan(2e-6);
});

/** The current on the bias line, by bisection on its falling side. */
function currentOn(beta: number, threshold: number, V_GG: number, R_S: number): number {
  let [low, high] = [0, Math.max(0, (V_GG - threshold) / R_S)];
  for (let n = 0; n < 200; n++) {
    const middle = (low + high) / 2;
    const drive = Math.max(0, V_GG - R_S * middle - threshold);
    if (beta * drive * drive > middle) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

interface Drawn {
  readonly points: BandPoints;
  readonly beta: readonly [number, number];
  readonly threshold: readonly [number, number];
}

/** A part with its limits, and a band; depletion and enhancement alike. */
function drawPart(draw: () => number): Drawn {
  const lowest = -4 + 6 * draw();
  const threshold = [lowest, lowest + 0.3 + 2 * draw()] as const;
  const weak = 10 ** (-4 + 2 * draw());
  const beta = [weak, weak * (1.2 + 3 * draw())] as const;
  const least = weak * (0.05 + draw());
  const most = least * (1.1 + 2 * draw());
  const vgsLeast = gateAt(beta[0], threshold[1], least);
  const vgsMost = gateAt(beta[1], threshold[0], most);
  return { points: { least, most, vgsLeast, vgsMost }, beta, threshold };
}

test('every device and every corner of the tolerances stays in the band of the line; the ends touch it', () => {
  const draw = createDraw(78);
  let seen = 0;
  for (let n = 0; n < 400; n++) {
    const { points, beta, threshold } = drawPart(draw);
    const allowance = n % 3 === 0 ? { resistor: 0, gate: 0 } : { resistor: 0.02 * draw(), gate: 0.05 * draw() };
    const line = biasLine(points, allowance);
    if (line === null || line.R_S <= 0) continue;
    seen++;
    const currents: number[] = [];
    for (const u of [1 - allowance.gate, 1, 1 + allowance.gate])
      for (const t of [1 - allowance.resistor, 1, 1 + allowance.resistor])
        for (let k = 0; k < 6; k++) {
          const [b, v] = [[0, 1, 0.5, 0, 1, draw()][k]!, [1, 0, 0.5, 0, 1, draw()][k]!];
          const device = [beta[0] + b * (beta[1] - beta[0]), threshold[0] + v * (threshold[1] - threshold[0])] as const;
          currents.push(currentOn(...device, line.V_GG * u, line.R_S * t));
        }
    const [low, high] = [Math.min(...currents), Math.max(...currents)];
    // The n-th part of seed 78.
    expect({ n, low: Math.abs(low / points.least - 1) < 1e-9 }).toEqual({ n, low: true });
    expect({ n, high: Math.abs(high / points.most - 1) < 1e-9 }).toEqual({ n, high: true });
  }
  expect(seen).toBeGreaterThan(100);
});

test('no smaller source resistor has a gate voltage that holds the band, every larger one has', () => {
  const draw = createDraw(79);
  for (let n = 0; n < 200; n++) {
    const { points } = drawPart(draw);
    const allowance = { resistor: 0.02 * draw(), gate: 0.05 * draw() };
    const line = biasLine(points, allowance);
    if (line === null || line.R_S <= 0) continue;
    const width = (factor: number): number => {
      const { low, high } = gateWindow(points, line.R_S * factor, allowance);
      return high - low;
    };
    expect({ n, signs: [width(0.99) < 0, width(1.01) > 0] }).toEqual({ n, signs: [true, true] });
  }
});

test('self-bias holds a band exactly where the line starts at or below 0 V', () => {
  const draw = createDraw(80);
  const seen = [0, 0];
  for (let n = 0; n < 400; n++) {
    const { points } = drawPart(draw);
    const line = biasLine(points)!;
    const { low, high } = selfBiasWindow(points);
    const holds = low <= high && high > 0;
    if (line.R_S <= 0) continue;
    seen[holds ? 0 : 1]++;
    expect({ n, holds }).toEqual({ n, holds: line.V_GG <= 0 });
    const middle = middleResistor(points, 0);
    expect({ n, inside: middle >= low && middle <= high }).toEqual({ n, inside: holds });
    const { low: from, high: to } = gateWindow(points, middle);
    expect(Math.abs(from + to)).toBeLessThan(1e-9 * (1 + Math.abs(from)));
  }
  expect(Math.min(...seen)).toBeGreaterThan(20);
});

test('tolerances that move the current by more than the band leave no line', () => {
  const points = { least: 1e-3, most: 1.02e-3, vgsLeast: 2, vgsMost: 1 };
  expect(biasLine(points)).not.toBeNull();
  expect(biasLine(points, { resistor: 0.01, gate: 0.03 })).toBeNull();
});

test('the allowance of a divider is the worst of its four corners and both of its supply', () => {
  const [ratio, t, s] = [0.3, 0.01, 0.05];
  const [upper, lower] = [700, 300];
  const shares = [1 - t, 1 + t].flatMap((a) =>
    [1 - t, 1 + t].flatMap((b) => [1 - s, 1 + s].map((c) => ((lower * a) / (lower * a + upper * b) / ratio) * c - 1)),
  );
  expect(dividerAllowance(ratio, t, s)).toBeCloseTo(Math.max(...shares.map(Math.abs)), 12);
});
