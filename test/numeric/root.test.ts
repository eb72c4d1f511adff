import { describe, expect, it } from 'vitest';
import { exp, ln, solveBracketed } from '../../src/numeric/index.ts';

describe('solveBracketed', () => {
  const cases: [string, (x: number) => number, number, number, number][] = [
    ['a line', (x) => 3 * x - 1, -5, 7, 1 / 3],
    ['a square root', (x) => x * x - 2, 0, 2, Math.SQRT2],
    ['a falling function', (x) => 1 - exp(x - 4), -20, 30, 4],
    ['a steep exponential', (x) => exp(x) - 1e200, 0, 700, 200 * Math.LN10],
    ['a root of third order', (x) => (x - 1) * (x - 1) * (x - 1), -3, 4.5, 1],
    ['a root at an end', (x) => x - 2, 2, 5, 2],
    ['a flat function with a wall', (x) => (x < 0.999 ? -1e-12 : x - 0.9995), 0, 1, 0.9995],
    ['a bracket written high to low', (x) => ln(x) - 1, 10, 0.1, Math.E],
    ['values of 1e-300', (x) => (x - 0.3) * 1e-300, 0, 1, 0.3],
  ];
  for (const [name, f, low, high, root] of cases) {
    it(`finds ${name}`, () => {
      const found = solveBracketed(f, low, high);
      expect(found.status).toBe('solved');
      expect(Math.abs(found.value - root)).toBeLessThanOrEqual(
        name.includes('third') ? 1e-5 : 4 * Number.EPSILON * Math.abs(root),
      );
      expect(found.residual).toBe(f(found.value));
      expect(found.iterations).toBeLessThan(120);
    });
  }

  it('needs fewer than 20 evaluations where the function is smooth', () => {
    expect(solveBracketed((x) => x * x * x - x - 1, 0, 3).iterations).toBeLessThan(20);
  });

  it('closes in on a jump and leaves its residual to tell', () => {
    const jump = solveBracketed((x) => (x < 0.7 ? -1 : 1), 0, 1);
    expect(jump.status).toBe('solved');
    expect(jump.value).toBeCloseTo(0.7, 14);
    expect(Math.abs(jump.residual)).toBe(1);
  });

  it('finds a root at zero within the stated scale', () => {
    const found = solveBracketed((x) => x * (1 + x * x), -1, 3);
    expect(Math.abs(found.value)).toBeLessThan(1e-20);
  });

  it('says when there is no bracket, no value, or no more time', () => {
    expect(solveBracketed((x) => x * x + 1, -1, 1)).toEqual({
      value: NaN,
      status: 'not bracketed',
      iterations: 0,
      residual: NaN,
    });
    expect(solveBracketed(() => NaN, -1, 1).status).toBe('left domain');
    expect(solveBracketed((x) => (Math.abs(x) < 0.5 ? NaN : x), -1, 1).status).toBe('left domain');
    const short = solveBracketed((x) => x * x - 2, 0, 2, { cap: 3 });
    expect(short.status).toBe('cap reached');
    expect(short.iterations).toBe(3);
  });

  it('stops at the width that was asked for', () => {
    const f = (x: number): number => x * x - 2;
    const rough = solveBracketed(f, 0, 2, { tolerance: 1e-3 });
    expect(Math.abs(rough.value - Math.SQRT2)).toBeLessThan(2e-3);
    expect(rough.iterations).toBeLessThan(solveBracketed(f, 0, 2).iterations);
  });

  it('refuses ends that are not finite and a negative tolerance', () => {
    expect(() => solveBracketed((x) => x, -Infinity, 1)).toThrow(RangeError);
    expect(() => solveBracketed((x) => x, -1, 1, { tolerance: -1 })).toThrow(RangeError);
  });
});
