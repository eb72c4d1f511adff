import { describe, expect, it } from 'vitest';
import { scanPlaces, scanRoots, sin } from '../../src/numeric/index.ts';

describe('scanPlaces', () => {
  it('goes in equal ratios over a decade above 0 and evenly otherwise, its ends exact', () => {
    const wide = scanPlaces(100, 10_000);
    expect([wide[0], wide[64]]).toEqual([100, 10_000]);
    expect(wide[32]).toBeCloseTo(1000, 9);
    const narrow = scanPlaces(100, 900);
    expect(narrow[32]).toBe(500);
    expect(scanPlaces(-1, 1)[16]).toBe(-0.5);
    expect(scanPlaces(10_000, 100)[32]).toBeCloseTo(1000, 9);
  });
});

describe('scanRoots', () => {
  it('finds every root of a function that crosses 0 several times', () => {
    const { roots, jumps } = scanRoots((x) => sin(x), 1, 20);
    expect(jumps).toEqual([]);
    expect(roots.length).toBe(6);
    roots.forEach((root, k) => expect(Math.abs(root - (k + 1) * Math.PI)).toBeLessThan(1e-14 * 20));
  });

  it('tells a jump and a pole from a root', () => {
    const step = scanRoots((x) => (x < 2 / 3 ? -1 : 2), 0, 1);
    expect(step.roots).toEqual([]);
    expect(step.jumps.length).toBe(1);
    expect(step.jumps[0]).toBeCloseTo(2 / 3, 12);
    const pole = scanRoots((x) => 1 / (x - 0.3), 0, 1);
    expect(pole.roots).toEqual([]);
    expect(pole.jumps[0]).toBeCloseTo(0.3, 12);
  });

  it('finds a steep root, and one between the border of what is defined and the next place', () => {
    expect(scanRoots((x) => 1e12 * (x - 0.123456789), 0, 1).roots[0]).toBeCloseTo(0.123456789, 15);
    const bounded = (x: number): number => (x < 0.501 ? NaN : Math.sqrt(x - 0.501) - 0.01);
    expect(scanRoots(bounded, 0, 1).roots[0]).toBeCloseTo(0.5011, 12);
    expect(scanRoots((x) => bounded(1 - x), 0, 1).roots[0]).toBeCloseTo(1 - 0.5011, 12);
  });

  it('counts a root at an end or at a place once, and knows a constant', () => {
    expect(scanRoots((x) => x - 1, 1, 2).roots).toEqual([1]);
    expect(scanRoots((x) => x - 2, 1, 2).roots).toEqual([2]);
    expect(scanRoots((x) => x - 1.5, 1, 2).roots).toEqual([1.5]);
    expect(scanRoots(() => 3, 1, 2)).toMatchObject({ roots: [], isConstant: true, atFirst: 3 });
    expect(scanRoots((x) => x, 1, 2).isConstant).toBe(false);
  });
});
