import { describe, expect, it } from 'vitest';
import type { SpreadInput } from '../../src/figure/index.ts';
import { spreadBar } from '../../src/figure/index.ts';

const NONE = { low: null, high: null };

function bar(low: number | null, nominal: number, high: number | null, more: Partial<SpreadInput> = {}) {
  return spreadBar({ low, nominal, high, own: false, limits: NONE, devices: NONE, refining: false, ...more });
}

describe('the bar of a spread', () => {
  it('stands on a logarithmic scale from a quarter to four times the nominal', () => {
    const { scale, from, nominal, to } = bar(500, 1000, 2000);
    expect(scale).toBe('shared');
    expect([from, nominal, to].map((share) => Math.round(share * 1e9) / 1e9)).toEqual([0.25, 0.5, 0.75]);
  });

  it('of 1 % is a hairline, of 10 : 1 nearly the whole width', () => {
    const narrow = bar(990, 1000, 1010);
    expect(narrow.to - narrow.from).toBeLessThan(0.01);
    const wide = bar(1 / Math.sqrt(10), 1, Math.sqrt(10));
    expect(wide.to - wide.from).toBeGreaterThan(0.8);
    expect(wide.toEnd).toBe('cap');
  });

  it('reads negative values by their magnitude', () => {
    const { from, to, nominal } = bar(-5, -2.5, -1.25);
    expect([from, nominal, to]).toEqual([0.25, 0.5, 0.75]);
  });

  it('beyond the scale has a pointed end and a ratio', () => {
    const { to, toEnd, fromEnd, ratio } = bar(0.5, 1, 12);
    expect([to, toEnd, fromEnd]).toEqual([1, 'point', 'cap']);
    expect(ratio).toBe(12);
  });

  it('with an open end has no cap there', () => {
    const open = bar(2, 4, null);
    expect([open.to, open.toEnd, open.fromEnd]).toEqual([1, 'open', 'cap']);
    const negative = bar(null, -4, -2);
    expect([negative.toEnd, negative.fromEnd]).toEqual(['open', 'cap']);
  });

  it('that crosses zero has a scale of its own', () => {
    const { scale, from, to } = bar(-1, 1, 3);
    expect(scale).toBe('own');
    expect(from).toBeCloseTo(0.08, 12);
    expect(to).toBeCloseTo(0.92, 12);
  });

  it('shows what lies beyond a limit as failing', () => {
    const short = bar(0.212, 9.63, 15, { own: true, limits: { low: 2, high: null } });
    expect(short.posts).toHaveLength(1);
    expect(short.posts[0]!.passed).toBe(true);
    expect(short.failing).toEqual([{ from: short.from, to: short.posts[0]!.at }]);
    const fine = bar(3, 9.63, 15, { own: true, limits: { low: 2, high: null } });
    expect(fine.failing).toEqual([]);
    expect(fine.posts[0]!.passed).toBe(false);
  });

  it('counts an open end as failing where there is a limit on that side', () => {
    const { failing, posts } = bar(1, 2, null, { limits: { low: null, high: 4 } });
    expect(posts[0]).toEqual({ at: 0.75, forbids: 'right', passed: true });
    expect(failing).toEqual([{ from: 0.75, to: 1 }]);
  });

  it('marks the low and the high device', () => {
    const { ticks } = bar(0.5, 1, 2, { devices: { low: 0.5, high: 2 } });
    expect(ticks).toEqual([
      { at: 0.25, device: 'low' },
      { at: 0.75, device: 'high' },
    ]);
  });

  it('of a single value stands in the middle', () => {
    expect(bar(0, 0, 0).nominal).toBe(0.5);
  });
});
