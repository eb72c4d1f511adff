import { describe, expect, it } from 'vitest';
import {
  CUTOFF,
  DEVICE_POINT,
  OHMIC,
  SATURATION,
  bodyTransconductance,
  channelCurrent,
  channelRegion,
  devicePoint,
  outputConductance,
  saturationMargin,
  threshold,
  thresholdSlope,
  transconductance,
} from '../../src/fet/index.ts';
import type { ChannelConstants, ChannelSign } from '../../src/fet/index.ts';
import { between, decade, generator } from './seeded.ts';

const BETA = 8e-3 / 36; // I_DSS = 8 mA, V_P = -6 V

/** Central difference with a step that balances rounding and curvature; exact but for rounding where f is quadratic. */
function slope(f: (x: number) => number, x: number, step = 1e-4): number {
  return (f(x + step) - f(x - step)) / (2 * step);
}

describe('the channel law', () => {
  it('gives the three regions of the design, by hand', () => {
    // I_DSS (1 - V_GS/V_P)^2 with lambda, V_GS = -2 V, V_DS = 10 V.
    expect(channelCurrent(BETA, 0.01, 4, 10)).toBeCloseTo(8e-3 * (4 / 6) ** 2 * 1.1, 15);
    expect(channelCurrent(BETA, 0, 4, 1)).toBeCloseTo(BETA * 1 * (8 - 1), 15);
    expect(channelCurrent(BETA, 0.01, 0, 10)).toBe(0);
    expect(channelCurrent(BETA, 0.01, -1, 10)).toBe(0);
  });

  it('names the region and gives a margin that is positive in saturation alone', () => {
    const cases: [number, number, number, number][] = [
      [-1, 5, CUTOFF, -1],
      [0, 5, CUTOFF, 0],
      [2, 0, OHMIC, -2],
      [2, 1, OHMIC, -1],
      [2, 2, SATURATION, 0],
      [2, 5, SATURATION, 3],
      [2, -1, OHMIC, -2],
      [-1, -3, SATURATION, 1],
      [-4, -3, CUTOFF, -1],
    ];
    for (const [vov, vds, region, margin] of cases) {
      expect([channelRegion(vov, vds), saturationMargin(vov, vds)]).toEqual([region, margin]);
    }
  });

  it('is the negative of itself with drain and source exchanged', () => {
    const u = generator(1);
    for (let k = 0; k < 2000; k++) {
      const vgs = between(u, -4, 4);
      const vds = between(u, -8, 8);
      // Exchanged: V_GD is the new V_GS, -V_DS the new V_DS.
      expect(channelCurrent(1e-3, 0.02, vgs - vds, -vds) + channelCurrent(1e-3, 0.02, vgs, vds)).toBe(0);
    }
  });

  it('has the derivatives it claims, in every region and reversed', () => {
    const u = generator(2);
    const seen = new Set<string>();
    for (let k = 0; k < 8000; k++) {
      const beta = decade(u, 1e-6, 1);
      const lambda = u() < 0.2 ? 0 : decade(u, 1e-4, 0.3);
      const vov = between(u, -3, 6);
      const vds = between(u, -8, 8);
      const drive = vds < 0 ? vov - vds : vov;
      // A difference across a border sees two formulas; the borders have their own test.
      if (Math.min(Math.abs(drive), Math.abs(vds), Math.abs(Math.abs(vds) - drive)) < 1e-3) continue;
      seen.add(`${channelRegion(vov, vds)} ${vds < 0}`);
      const scale = beta * (1 + Math.abs(drive) + Math.abs(vds)) ** 2;
      const gm = slope((v) => channelCurrent(beta, lambda, v, vds), vov);
      const gds = slope((v) => channelCurrent(beta, lambda, vov, v), vds);
      expect(Math.abs(transconductance(beta, lambda, vov, vds) - gm) / scale).toBeLessThan(1e-9);
      expect(Math.abs(outputConductance(beta, lambda, vov, vds) - gds) / scale).toBeLessThan(1e-8);
    }
    expect(seen.size).toBe(6);
  });

  it('is continuous with both first derivatives over every border', () => {
    const u = generator(3);
    const tiny = 1e-9;
    for (let k = 0; k < 3000; k++) {
      const lambda = between(u, 0, 0.2);
      const v = between(u, 0.05, 5);
      const far = between(u, -6, 6);
      // [vov, vds] on a border and a direction across it: pinch-off forwards and backwards, V_DS = 0, cutoff both ways.
      const borders: [number, number, number, number][] = [
        [v, v, 0, 1],
        [v, v, 1, 0],
        [0, -v, 1, 0],
        [far, 0, 0, 1],
        [0, v, 1, 0],
        [-v, -v, 1, 0],
        [-v, -v, 0, 1],
      ];
      for (const [vov, vds, dOv, dDs] of borders) {
        for (const f of [channelCurrent, transconductance, outputConductance]) {
          const left = f(1, lambda, vov - tiny * dOv, vds - tiny * dDs);
          const right = f(1, lambda, vov + tiny * dOv, vds + tiny * dDs);
          expect(Math.abs(right - left)).toBeLessThan(1e-7);
        }
      }
    }
  });

  it('gives g_m = 2 sqrt(beta (1 + lambda V_DS) I_D) in saturation', () => {
    const u = generator(4);
    for (let k = 0; k < 500; k++) {
      const [beta, lambda, vov] = [decade(u, 1e-5, 1), between(u, 0, 0.1), between(u, 0.01, 5)];
      const vds = vov + between(u, 0, 20);
      const expected = 2 * Math.sqrt(beta * (1 + lambda * vds) * channelCurrent(beta, lambda, vov, vds));
      expect(transconductance(beta, lambda, vov, vds) / expected).toBeCloseTo(1, 13);
    }
  });
});

describe('the body effect', () => {
  it('shifts the threshold by what a published example computes', () => {
    // D. A. Neamen, Semiconductor Physics and Devices, Example 11.10, p. 500 (textbook companion, page not seen):
    // printed 0.66 V; gamma and 2 phi_F follow from its doping and oxide.
    expect(threshold(0, 1.4443, 0.7511, 1)).toBeCloseTo(0.66, 2);
  });

  it('has the slope it claims and goes on smoothly where the body diode conducts', () => {
    const u = generator(5);
    for (let k = 0; k < 2000; k++) {
      const [gamma, phi] = [between(u, 0, 1.5), between(u, 0.4, 1)];
      const vsb = between(u, -2, 10);
      if (Math.abs(vsb + phi / 2) < 1e-3) continue;
      const found = slope((v) => threshold(0.7, gamma, phi, v), vsb, 1e-5);
      expect(thresholdSlope(gamma, phi, vsb)).toBeCloseTo(found, 7);
    }
    const below = threshold(1, 0.5, 0.6, -0.3 - 1e-9);
    expect(below).toBeCloseTo(threshold(1, 0.5, 0.6, -0.3), 8);
    expect(thresholdSlope(0.5, 0.6, -5)).toBe(thresholdSlope(0.5, 0.6, -0.3));
    expect(threshold(1, 0.5, 0.6, 0)).toBe(1);
    expect(bodyTransconductance(1e-3, 0.5, 0.6, 1)).toBeCloseTo((1e-3 * 0.5) / (2 * Math.sqrt(1.6)), 15);
  });
});

describe('a device point', () => {
  const kinds: [string, ChannelConstants][] = [
    ['JFET', { beta: 5e-4, vto: -2.5, lambda: 0.01, gamma: 0, phi: 0.6 }],
    ['MOSFET with body', { beta: 2e-3, vto: 1.2, lambda: 0.02, gamma: 0.6, phi: 0.7 }],
  ];
  const [I_D, G_M, G_DS, G_MB] = DEVICE_POINT.keys();

  for (const [name, constants] of kinds) {
    it(`of a p-${name} mirrors that of the n-${name} bit for bit`, () => {
      const u = generator(6);
      const n = new Float64Array(7);
      const p = new Float64Array(7);
      for (let k = 0; k < 3000; k++) {
        const [vgs, vds, vsb] = [between(u, -5, 5), between(u, -10, 10), between(u, -1, 5)];
        devicePoint(n, 0, 1, constants, vgs, vds, vsb);
        devicePoint(p, 0, -1, constants, -vgs, -vds, -vsb);
        expect(p).toEqual(n);
      }
    });

    for (const channel of [1, -1] as ChannelSign[]) {
      it(`of ${channel === 1 ? 'an n' : 'a p'}-${name} has the derivatives it claims, reversed too`, () => {
        const u = generator(7);
        const out = new Float64Array(7);
        const current = (vgs: number, vds: number, vsb: number): number => {
          devicePoint(out, 0, channel, constants, channel * vgs, channel * vds, channel * vsb);
          return out[I_D];
        };
        let compared = 0;
        for (let k = 0; k < 4000; k++) {
          const [vgs, vds, vsb] = [between(u, -5, 6), between(u, -8, 8), between(u, 0, 4)];
          devicePoint(out, 0, channel, constants, channel * vgs, channel * vds, channel * vsb);
          const [gm, gds, gmb, drive, margin] = [out[G_M], out[G_DS], out[G_MB], out[4], out[5]];
          const back = vds < 0 ? vsb + vds : vsb;
          if (Math.min(Math.abs(drive), Math.abs(margin), Math.abs(vds), Math.abs(back + constants.phi / 2)) < 3e-3)
            continue;
          compared++;
          const near = (got: number, f: (v: number) => number, at: number): void =>
            expect(Math.abs(got - slope(f, at, 1e-5)) / (1e-5 + Math.abs(got))).toBeLessThan(1e-5);
          near(gm, (v) => current(v, vds, vsb), vgs);
          near(gds, (v) => current(vgs, v, vsb), vds);
          near(-gmb, (v) => current(vgs, vds, v), vsb);
        }
        expect(compared).toBeGreaterThan(3500);
      });
    }
  }
});
