import { describe, expect, it } from 'vitest';
import {
  BOLTZMANN,
  DEFAULTS,
  ELEMENTARY_CHARGE,
  JUNCTION_LAW,
  betaAt,
  channelCurrent,
  junctionCapacitance,
  junctionRatio,
  leakageAt,
  thermalVoltage,
  thresholdAt,
  zeroDriftDrive,
} from '../../src/fet/index.ts';
import { between, generator } from './seeded.ts';

describe('temperature', () => {
  it('leaves every constant alone at T_nom, exactly', () => {
    expect(thresholdAt(-2, -2.2e-3, 298.15, 298.15)).toBe(-2);
    expect(betaAt(1e-3, -2.1, 298.15, 298.15)).toBe(1e-3);
    expect(leakageAt(1e-9, 10, 298.15, 298.15)).toBe(1e-9);
  });

  it('makes |V_P| of a JFET grow with heat, V_TO of an enhancement MOSFET fall, beta fall, leakage double', () => {
    expect(thresholdAt(-2, DEFAULTS.JFET.tempco.value, 348.15, 298.15)).toBeCloseTo(-2.11, 12);
    expect(thresholdAt(2, DEFAULTS.MOSFET.tempco.value, 348.15, 298.15)).toBeCloseTo(1.9, 12);
    expect(betaAt(1, -2, 600, 300)).toBe(0.25);
    expect(leakageAt(1e-12, 10, 308.15, 298.15)).toBeCloseTo(2e-12, 24);
  });

  it('leaves the drain current still at the zero-drift drive, to first order', () => {
    for (const { tempco, beta_exponent: exponent } of [DEFAULTS.JFET, DEFAULTS.MOSFET]) {
      for (const nominal of [250, 298.15, 350]) {
        const vto = -3;
        const vgs = vto + zeroDriftDrive(tempco.value, exponent.value, nominal);
        const current = (t: number): number =>
          channelCurrent(
            betaAt(1e-3, exponent.value, t, nominal),
            0,
            vgs - thresholdAt(vto, tempco.value, t, nominal),
            50,
          );
        const perKelvin = (current(nominal + 0.01) - current(nominal - 0.01)) / 0.02 / current(nominal);
        expect(Math.abs(perKelvin)).toBeLessThan(1e-8);
      }
    }
    expect(zeroDriftDrive(-2.2e-3, -2.1, 300)).toBeCloseTo(0.63, 2);
  });

  it('uses the SI constants: kT/q is 25.6926 mV at 25 degC and 25.8520 mV at 300 K', () => {
    expect([BOLTZMANN, ELEMENTARY_CHARGE]).toEqual([1.380649e-23, 1.602176634e-19]);
    expect(1e3 * thermalVoltage(298.15)).toBeCloseTo(25.6926, 4);
    expect(1e3 * thermalVoltage(300)).toBeCloseTo(25.852, 4);
  });

  it('states every default with its unit and a sentence that holds its value', () => {
    for (const table of Object.values(DEFAULTS)) {
      for (const [field, { value, unit, sentence }] of Object.entries(table)) {
        const shown = { 'V/K': value * 1e3, K: field === 'T_nom' ? value - 273.15 : value }[unit] ?? value;
        const number = String(Math.abs(Number(shown.toPrecision(6))));
        expect({ field, said: field === 'M' || sentence.includes(number) }).toEqual({ field, said: true });
        expect(sentence).toMatch(/^[A-Za-z].*\.$/);
      }
    }
  });
});

describe('a junction capacitance', () => {
  it('follows C0 / (1 - V/PB)^M below PB/2', () => {
    expect(junctionCapacitance(4e-12, -2.4, 0.8, 0.5)).toBeCloseTo(2e-12, 24);
    expect(junctionRatio(0, 0.8, 0.5)).toBe(1);
    expect(junctionRatio(0.4, 0.8, 0.5)).toBeCloseTo(Math.SQRT2, 15);
  });

  it('goes on along its tangent beyond PB/2, so that no voltage makes it infinite', () => {
    const u = generator(13);
    for (let k = 0; k < 300; k++) {
      const [pb, m] = [between(u, 0.4, 1), between(u, 0.2, 0.6)];
      const h = 1e-6;
      const below = (junctionRatio(pb / 2, pb, m) - junctionRatio(pb / 2 - h, pb, m)) / h;
      const above = (junctionRatio(pb / 2 + 1, pb, m) - junctionRatio(pb / 2, pb, m)) / 1;
      expect(above / below).toBeCloseTo(1, 4);
      expect(junctionRatio(pb / 2 + 1e-9, pb, m)).toBeCloseTo(junctionRatio(pb / 2, pb, m), 7);
    }
    expect(junctionRatio(5, 0.8, 0.5)).toBeLessThan(20);
  });

  it('is what the design says of each family', () => {
    expect(JUNCTION_LAW).toEqual({
      JFET: { C_GS: true, C_GD: true, C_DS: false },
      MOSFET: { C_GS: false, C_GD: true, C_DS: true },
    });
  });
});
