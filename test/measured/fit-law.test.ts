// Fits against the constants from which the readings were made, against their own standard errors, and against a general
// least-squares library.

import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { describe, expect, it } from 'vitest';
import { binomialInterval, pow } from '../../src/numeric/index.ts';
import { fitLaw } from '../../src/measured/index.ts';
import type { LawFit, Points } from '../../src/measured/index.ts';
import { createNormal, DEVICES, readings, scattered } from './devices.ts';
import type { Device } from './devices.ts';

const DRIVES = [0.15, 0.4, 0.7, 1, 1.3];
const VOLTS = [0.3, 0.8, 5, 10, 15];

function fit(points: Points, options: Partial<Parameters<typeof fitLaw>[1]> & { channel: 1 | -1 }): LawFit {
  const found = fitLaw(points, { exponent: 'square', lambda: 'fit', ...options });
  if ('code' in found) throw new Error(found.text);
  return found;
}
function faultOf(points: Points, channel: 1 | -1 = 1): string {
  const found = fitLaw(points, { channel, exponent: 'square', lambda: 'fit' });
  return 'code' in found ? `${found.code}: ${found.text}` : 'none';
}
const off = (x: number, y: number): number => Math.abs(x - y) / Math.abs(y);
const codes = ({ flags }: LawFit): string[] => flags.map(({ code }) => code);

describe.each(DEVICES)('readings of %s without scatter', (_, device) => {
  const points = readings(device, [-0.5, ...DRIVES], VOLTS);

  it('give its constants back', () => {
    const found = fit(points, { channel: device.channel });
    expect(off(found.beta, device.beta)).toBeLessThan(1e-9);
    expect(off(found.V_TO, device.V_TO)).toBeLessThan(1e-9);
    expect(Math.abs(found.lambda - device.lambda)).toBeLessThan(1e-9);
    expect(found.relative).toBeLessThan(1e-9);
    expect(found.regions.filter((region) => region === 'cutoff')).toHaveLength(VOLTS.length);
    expect(found.regions[VOLTS.length * 5]).toBe('ohmic');
    expect(found.regions.at(-1)).toBe('saturation');
    expect(codes(found)).toEqual(device.lambda === 0 ? ['lambda'] : []);
  });

  it('give its constants from saturation alone, with lambda known', () => {
    const found = fit(readings(device, DRIVES, [12]), { channel: device.channel, lambda: device.lambda });
    expect(off(found.beta, device.beta)).toBeLessThan(1e-9);
    expect(off(found.V_TO, device.V_TO)).toBeLessThan(1e-9);
    expect(found.lambda).toBe(device.lambda);
    expect(found.errors.lambda).toBeNull();
  });

  it('give its constants from output curves at one gate voltage', () => {
    const found = fit(readings(device, [1], [0.1, 0.3, 0.5, 0.9, 2, 6, 14]), { channel: device.channel });
    expect(off(found.beta, device.beta)).toBeLessThan(1e-6);
    expect(off(found.V_TO, device.V_TO)).toBeLessThan(1e-6);
  });

  it('give, mirrored, mirrored constants to the last bit', () => {
    const noisy = scattered(points, 1e-6, 3);
    const mirror = { V_GS: noisy.V_GS.map((v) => -v), V_DS: noisy.V_DS.map((v) => -v), I_D: noisy.I_D };
    const [here, there] = [
      fit(noisy, { channel: device.channel }),
      fit(mirror, { channel: device.channel === 1 ? -1 : 1 }),
    ];
    expect([there.beta, -there.V_TO, there.lambda, there.rms]).toEqual([here.beta, here.V_TO, here.lambda, here.rms]);
    expect(there.errors).toEqual(here.errors);
    expect([...there.residuals]).toEqual([...here.residuals]);
  });
});

describe('readings with scatter', () => {
  const device: Device = { channel: 1, beta: 1.3e-3, V_TO: -2.2, lambda: 0.015 };
  const points = readings(device, [0.2, 0.5, 0.8, 1.1, 1.4, 1.7, 2, 2.2], [1, 5, 9, 13, 17]);
  const SEEDS = 500;

  // A normal error lies within 1.96 standard errors in 95 % of fits; of 500, all but one in ten thousand such experiments
  // count within the bounds. 37 degrees of freedom take 0.7 % from that.
  it.each(['robust', 'plain'] as const)('hold their constants within the standard errors (%s loss)', (loss) => {
    const within = { beta: 0, V_TO: 0, lambda: 0 };
    for (let seed = 0; seed < SEEDS; seed++) {
      const found = fit(scattered(points, 20e-6, seed), { channel: 1, loss });
      for (const name of ['beta', 'V_TO', 'lambda'] as const) {
        if (Math.abs(found[name] - device[name]) <= 1.96 * found.errors[name]!) within[name]++;
      }
    }
    for (const count of Object.values(within)) {
      expect(count).toBeGreaterThan(SEEDS * 0.943 - 3.9 * Math.sqrt(SEEDS * 0.943 * 0.057));
      expect(count).toBeLessThan(SEEDS * 0.95 + 3.9 * Math.sqrt(SEEDS * 0.95 * 0.05));
    }
    expect(binomialInterval(within.beta, SEEDS, 0.95).low).toBeLessThan(0.95);
  });

  it('give what a general library finds with the same loss', () => {
    for (let seed = 0; seed < 20; seed++) {
      const noisy = scattered(points, 20e-6, 1000 + seed);
      const own = fit(noisy, { channel: 1, loss: 'plain' });
      const index = Array.from(noisy.I_D.keys());
      // In mA, so that all constants are of one order for the library's differences.
      const law =
        ([beta, V_TO, lambda]: number[]) =>
        (i: number): number => {
          const [drive, vds] = [noisy.V_GS[i]! - V_TO!, noisy.V_DS[i]!];
          if (drive <= 0) return 0;
          const w = Math.min(drive, vds);
          return beta! * w * (2 * drive - w) * (1 + lambda! * vds);
        };
      const theirs = levenbergMarquardt({ x: index, y: Array.from(noisy.I_D, (I) => I * 1e3) }, law, {
        initialValues: [1, -2, 0.01],
        gradientDifference: 1e-6,
        centralDifference: true,
        maxIterations: 200,
        errorTolerance: 1e-14,
        damping: 1e-3,
      });
      const [beta, V_TO, lambda] = theirs.parameterValues;
      expect(off(own.beta * 1e3, beta!)).toBeLessThan(1e-5);
      expect(off(own.V_TO, V_TO!)).toBeLessThan(1e-5);
      expect(Math.abs(own.lambda - lambda!)).toBeLessThan(1e-6);
    }
  });

  it('is not led far by readings that are plainly wrong, and names them', () => {
    const noisy = scattered(points, 20e-6, 7);
    const wrong = { ...noisy, I_D: noisy.I_D.map((I, i) => (i === 12 ? I * 1.3 : i === 30 ? I * 0.8 : I)) };
    const [robust, plain] = [fit(wrong, { channel: 1 }), fit(wrong, { channel: 1, loss: 'plain' })];
    expect(Math.abs(robust.V_TO - device.V_TO)).toBeLessThan(4 * robust.errors.V_TO);
    expect(Math.abs(robust.V_TO - device.V_TO)).toBeLessThan(Math.abs(plain.V_TO - device.V_TO) / 3);
    expect(robust.flags.find(({ code }) => code === 'outliers')?.text).toBe(
      'Readings 13 and 31 lie far off the others and count less. Look at them again.',
    );
  });

  it('tells a free exponent', () => {
    for (const exponent of [1.7, 1.85, 2.2]) {
      const draw = createNormal(exponent * 100);
      const bent = {
        ...points,
        I_D: points.V_GS.map((vgs, i) => {
          const [drive, vds] = [vgs + 2.2, points.V_DS[i]!];
          const rest = Math.max(0, drive - vds);
          const shape = pow(drive, exponent) - (rest > 0 ? pow(rest, exponent) : 0);
          return 1.3e-3 * shape * (1 + 0.015 * vds) + 2e-6 * draw();
        }),
      };
      const free = fit(bent, { channel: 1, exponent: 'free' });
      expect(Math.abs(free.exponent - exponent)).toBeLessThan(4 * free.errors.exponent!);
      expect(free.errors.exponent).toBeLessThan(0.02);
      expect(Math.abs(free.V_TO + 2.2)).toBeLessThan(4 * free.errors.V_TO);
      // The square law is told not to fit, and by what exponent.
      const square = fit(bent, { channel: 1 });
      expect(square.flags.find(({ code }) => code === 'law')?.text).toMatch(
        new RegExp(`^The square law does not fit: .* An exponent of ${exponent.toFixed(2).slice(0, 3)}`),
      );
    }
  });

  it('keeps a free exponent within its range and says so', () => {
    const linear = { ...points, I_D: points.V_GS.map((vgs) => 2e-3 * (vgs + 2.2)) };
    const found = fit(linear, { channel: 1, exponent: 'free' });
    expect(found.exponent).toBe(1.5);
    expect(codes(found)).toContain('exponent');
  });
});

describe('what a fit doubts', () => {
  const device: Device = { channel: 1, beta: 2e-3, V_TO: -1.5, lambda: 0.01 };

  it('readings close together in V_GS', () => {
    const found = fit(scattered(readings(device, [0.98, 1, 1.02], [4, 8, 12]), 1e-6, 1), { channel: 1 });
    expect(codes(found)).toContain('spacing');
    expect(codes(fit(scattered(readings(device, [0.3, 0.7, 1.2], [4, 8, 12]), 1e-6, 1), { channel: 1 }))).toEqual([]);
  });

  it('readings that are all ohmic', () => {
    const found = fit(scattered(readings(device, [0.6, 1, 1.4], [0.05, 0.1, 0.2, 0.3]), 1e-7, 1), { channel: 1 });
    expect(codes(found)).toContain('no-saturation');
  });

  it('a lambda that is lost or does not show', () => {
    const one = fit(scattered(readings(device, [0.3, 0.6, 0.9, 1.2], [10]), 1e-6, 1), { channel: 1 });
    expect(one.lambda).toBe(0);
    expect(codes(one)).toEqual(['lambda']);
    const lost = fit(scattered(readings(device, [0.3, 0.6, 0.9, 1.2], [9.9, 10.1]), 5e-6, 4), { channel: 1 });
    expect(codes(lost)).toContain('lambda');
    expect(
      codes(fit(scattered(readings(device, [0.3, 0.6, 0.9, 1.2], [10]), 1e-6, 1), { channel: 1, lambda: 0.01 })),
    ).toEqual([]);
  });
});

describe('what cannot be fitted', () => {
  const at = (V_GS: number[], V_DS: number[], I_D: number[]): Points => ({
    V_GS: Float64Array.from(V_GS),
    V_DS: Float64Array.from(V_DS),
    I_D: Float64Array.from(I_D),
  });

  it.each([
    [
      at([1, 2, 3], [5, 5, 5], [0, 0, 0]),
      1,
      'no-current: No reading carries current. Measure with the channel on, in saturation best.',
    ],
    [
      at([0, -1], [5, 5], [2e-3, 1e-3]),
      1,
      'too-few: 2 readings carry current, and a law wants at least 3. Measure more of them.',
    ],
    [
      at([0, -1, -1.5], [-5, -5, -5], [2e-3, 1e-3, 1e-4]),
      1,
      'signs: The signs do not fit an n-channel FET: its V_DS is positive where current flows, and its current is written positive.',
    ],
    [
      at([0, -1, -1.5], [5, 5, 5], [2e-3, 1e-3, 1e-4]),
      -1,
      'signs: The signs do not fit a p-channel FET: its V_DS is negative where current flows, and its current is written positive.',
    ],
    [
      at([-1, -1, -1], [5, 5, 5], [2e-3, 2.1e-3, 2e-3]),
      1,
      'one-place: All readings that conduct stand at one V_GS in saturation: beta and V_TO cannot be told apart. Add readings at other gate voltages.',
    ],
    [
      at([0, -1, NaN], [5, 5, 5], [2e-3, 1e-3, 1e-4]),
      1,
      'not-finite: A reading is no finite number. Give every row V_GS, V_DS and I_D.',
    ],
  ] as const)('is said: %#', (points, channel, text) => {
    expect(faultOf(points, channel)).toBe(text);
  });
});

it('finds its way from any start: random devices over random grids', () => {
  const draw = createNormal(11);
  let failed = 0;
  for (let n = 0; n < 400; n++) {
    const device: Device = {
      channel: n % 2 === 0 ? 1 : -1,
      beta: Math.exp(draw() * 2) * 2e-3,
      V_TO: draw() * 2,
      lambda: Math.abs(draw()) * 0.02 + 1e-3,
    };
    const span = Math.exp(draw() * 0.8);
    const points = readings(
      device,
      [0.1, 0.35, 0.6, 0.8, 1].map((share) => share * span),
      [0.4 * span, 2 * span, 6 * span],
    );
    const found = fit(points, { channel: device.channel });
    if (off(found.beta, device.beta) > 1e-6 || Math.abs(found.V_TO - device.V_TO) > 1e-6 * span) failed++;
  }
  expect(failed).toBe(0);
});

it('a lambda below 0 never comes out, however the readings scatter', () => {
  const [device] = DEVICES.map(([, each]) => each);
  let least = Infinity;
  for (let seed = 1; seed <= 150; seed++) {
    const points = scattered(readings(device!, DRIVES, [4, 10]), 5e-4, seed);
    for (const exponent of ['square', 'free'] as const) {
      for (const loss of ['robust', 'plain'] as const) {
        const found = fitLaw(points, { channel: device!.channel, exponent, lambda: 'fit', loss });
        if (!('code' in found)) least = Math.min(least, found.lambda);
      }
    }
  }
  expect(least).toBe(0);
});
