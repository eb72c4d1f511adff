import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createAxis, positionOn, valueOn } from '../../src/figure/index.ts';
import { CURRENT, FREQUENCY, TEMPERATURE_POINT, VOLTAGE } from '../../src/quantity/index.ts';

/** Leading digits of the distance between neighbouring ticks. */
function stepDigits(ticks: readonly number[]): number {
  return Number((ticks[1]! - ticks[0]!).toExponential(6).split('e')[0]);
}

describe('an axis', () => {
  it('from -5.4 V to 0 V has whole volts', () => {
    const axis = createAxis('V_GS', VOLTAGE, { low: -5.4, high: 0 });
    expect(axis.labels).toEqual(['−5', '−4', '−3', '−2', '−1', '0']);
    expect(axis.unit).toBe('V');
  });

  it('has one prefix for all its numbers', () => {
    const axis = createAxis('I_D', CURRENT, { low: 0, high: 2.4e-3 });
    expect(axis.labels).toEqual(['0', '0.5', '1', '1.5', '2']);
    expect(axis.unit).toBe('mA');
    expect(axis.prefix).toBe(-3);
  });

  it('of temperatures has whole degrees', () => {
    const axis = createAxis('T_A', TEMPERATURE_POINT, { low: 253.15, high: 333.15 });
    expect(axis.labels).toEqual(['−20', '0', '20', '40', '60']);
    expect(axis.unit).toBe('°C');
  });

  it('has 3 to 6 ticks at steps of 1, 2 or 5 within its range, whatever the range', () => {
    const ends = fc.tuple(
      fc.double({ min: -1e3, max: 1e3, noNaN: true }),
      fc.double({ min: 1e-9, max: 1e4, noNaN: true }),
    );
    const property = fc.property(ends, ([low, span]) => {
      fc.pre(low + span > low && span > 1e-9 * Math.abs(low));
      const axis = createAxis('x', VOLTAGE, { low, high: low + span });
      expect(axis.ticks.length).toBeGreaterThanOrEqual(3);
      expect(axis.ticks.length).toBeLessThanOrEqual(6);
      expect([1, 2, 5, 10].some((digit) => Math.abs(stepDigits(axis.ticks) - digit) < 1e-3)).toBe(true);
      expect(axis.low).toBeLessThanOrEqual(axis.ticks[0]!);
      expect(axis.high).toBeGreaterThanOrEqual(axis.ticks.at(-1)!);
      expect(axis.low).toBeLessThanOrEqual(low);
      expect(axis.high).toBeGreaterThanOrEqual(low + span);
    });
    fc.assert(property, { seed: 20260101, numRuns: 2000 });
  });

  it('keeps its range where the steps fit into it', () => {
    const { low, high } = createAxis('x', VOLTAGE, { low: -0.3, high: 3.3 });
    expect([low, high]).toEqual([-0.3, 3.3]);
  });

  it.each([
    [1, 1e5, ['0.001', '0.01', '0.1', '1', '10', '100']],
    [100, 10_000, ['0.1', '0.5', '1', '5', '10']],
    [20, 800, ['20', '50', '100', '200', '500']],
    [1000, 3000, ['1', '1.5', '2', '2.5', '3']],
  ])('with a logarithmic scale from %d Hz to %d Hz has few round numbers', (low, high, labels) => {
    expect(createAxis('f', FREQUENCY, { low, high, log: true }).labels).toEqual(labels);
  });

  it('with a logarithmic scale has 3 to 6 ticks, whatever the range', () => {
    const property = fc.property(
      fc.double({ min: -12, max: 9, noNaN: true }),
      fc.double({ min: 0.01, max: 12, noNaN: true }),
      (decade, span) => {
        const { ticks } = createAxis('f', FREQUENCY, { low: 10 ** decade, high: 10 ** (decade + span), log: true });
        expect(ticks.length).toBeGreaterThanOrEqual(3);
        expect(ticks.length).toBeLessThanOrEqual(6);
      },
    );
    fc.assert(property, { seed: 20260102, numRuns: 1000 });
  });

  it('places a value by its share of the range, or by its logarithm', () => {
    const linear = createAxis('V_DS', VOLTAGE, { low: -1, high: 3 });
    expect(positionOn(linear, 0)).toBe(0.25);
    expect(valueOn(linear, 0.25)).toBe(0);
    const log = createAxis('f', FREQUENCY, { low: 10, high: 1000, log: true });
    expect(positionOn(log, 100)).toBeCloseTo(0.5, 14);
    expect(positionOn(log, 31.6227766016838)).toBeCloseTo(0.25, 14);
    expect(positionOn(log, 0)).toBe(-Infinity);
  });

  it('refuses a range that is none', () => {
    expect(() => createAxis('x', VOLTAGE, { low: 1, high: 1 })).toThrow(RangeError);
    expect(() => createAxis('x', VOLTAGE, { low: 0, high: Infinity })).toThrow(RangeError);
    expect(() => createAxis('f', FREQUENCY, { low: 0, high: 1, log: true })).toThrow(RangeError);
  });
});
