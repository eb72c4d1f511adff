import { describe, expect, it } from 'vitest';
import { atan, cos, exp, expm1, hypot, ln, log10, log1p, pow, sin, tan } from '../../src/numeric/index.ts';
import { ATAN_TABLE, EXP_TABLE, LN_TABLE, LN_TABLE_FIRST, LOG10_TABLE } from '../../src/numeric/table.ts';
import { expFixed, ln2, lnFixed, reference, sinCosFixed, toFixed, ulpsOff, type Reference } from './reference.ts';

/** xorshift32: the same points in every run. */
function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}

type Sampler = (u: () => number) => number;
const signed = (u: () => number): number => (u() < 0.5 ? -1 : 1);
const fine = (u: () => number): number => u() + u() / 2 ** 32;
const uniform =
  (low: number, high: number): Sampler =>
  (u) =>
    low + (high - low) * fine(u);
const decades =
  (low: number, high: number): Sampler =>
  (u) =>
    (1 + fine(u)) * 2 ** Math.floor(low + (high - low) * u());
const signedDecades =
  (low: number, high: number): Sampler =>
  (u) =>
    signed(u) * decades(low, high)(u);

interface Row {
  readonly name: string;
  readonly of: (x: number) => number;
  readonly truth: (x: number) => Reference;
  readonly points: readonly Sampler[];
  readonly extremes: readonly number[];
  /** Largest deviation allowed, in ulp, and the largest mean: correctly rounded results have a mean of 0.25. */
  readonly worst: number;
}
const ROWS: readonly Row[] = [
  {
    name: 'exp',
    of: exp,
    truth: reference.exp,
    points: [uniform(-5, 5), uniform(-745, 709.7), signedDecades(-60, 0)],
    extremes: [709.782712893384, -708.3964185322641, -745.1332191019411, -1e-300, 1],
    worst: 0.56,
  },
  {
    name: 'expm1',
    of: expm1,
    truth: reference.expm1,
    points: [uniform(-1, 1), uniform(-40, 40), signedDecades(-60, -1), uniform(-0.26, 0.26)],
    extremes: [709.782712893384, 0.25, -0.25, 1e-16, -36.7],
    worst: 1,
  },
  {
    name: 'ln',
    of: ln,
    truth: reference.ln,
    points: [uniform(0.5, 2), uniform(0.9, 1.1), uniform(0.999, 1.001), decades(-1074, 1023)],
    extremes: [Number.MIN_VALUE, Number.MAX_VALUE, 1 + 2 ** -52, 1 - 2 ** -53, Math.SQRT2, 2, 2 ** -1022],
    worst: 0.8,
  },
  {
    name: 'log10',
    of: log10,
    truth: reference.log10,
    points: [uniform(0.5, 2), uniform(0.999, 1.001), decades(-1074, 1023)],
    extremes: [Number.MIN_VALUE, Number.MAX_VALUE, 1 + 2 ** -52, 1 - 2 ** -53],
    worst: 0.8,
  },
  {
    name: 'log1p',
    of: log1p,
    truth: reference.log1p,
    points: [uniform(-0.9, 2), signedDecades(-60, -2), decades(1, 100)],
    extremes: [-1 + 2 ** -53, 2 ** -53, -(2 ** -53), 1.5 * 2 ** -53, 1e300],
    worst: 0.8,
  },
  {
    name: 'sin',
    of: sin,
    truth: reference.sin,
    points: [uniform(-1, 1), uniform(-30, 30), uniform(-1.6e6, 1.6e6), signedDecades(20, 1022), signedDecades(-30, 0)],
    extremes: [Math.PI, 2 * Math.PI, Math.PI / 2, 1572864, 1e22, Number.MAX_VALUE, 6381956970095103 * 2 ** 797],
    worst: 0.9,
  },
  {
    name: 'cos',
    of: cos,
    truth: reference.cos,
    points: [uniform(-1, 1), uniform(-30, 30), uniform(-1.6e6, 1.6e6), signedDecades(20, 1022), signedDecades(-30, 0)],
    extremes: [Math.PI, Math.PI / 2, (3 * Math.PI) / 2, 1e22, Number.MAX_VALUE, 6381956970095103 * 2 ** 797],
    worst: 0.9,
  },
  {
    name: 'tan',
    of: tan,
    truth: reference.tan,
    points: [uniform(-1, 1), uniform(-30, 30), uniform(-1.6e6, 1.6e6), signedDecades(20, 1022), signedDecades(-30, 0)],
    extremes: [Math.PI, Math.PI / 2, Math.PI / 4, 1e22, Number.MAX_VALUE, 6381956970095103 * 2 ** 797],
    worst: 0.9,
  },
  {
    name: 'atan',
    of: atan,
    truth: reference.atan,
    points: [uniform(-1, 1), uniform(-40, 40), signedDecades(-60, 70)],
    extremes: [1, 1 + 2 ** -52, 1 / 32, 3 / 32, 31, 1e15, 1e-15],
    worst: 0.55,
  },
];
const POINTS_PER_SAMPLER = 2500;

describe('elementary functions', () => {
  for (const row of ROWS) {
    it(`${row.name} stays within ${row.worst} ulp of a reference in long integers`, () => {
      const u = generator(20240601);
      const points = [...row.extremes];
      for (const sampler of row.points) for (let k = 0; k < POINTS_PER_SAMPLER; k++) points.push(sampler(u));
      let worst = 0;
      let at = 0;
      let total = 0;
      for (const x of points) {
        const { value, places } = row.truth(x);
        const off = ulpsOff(row.of(x), value, places);
        if (!(off <= worst)) {
          worst = off;
          at = x;
        }
        total += off;
      }
      expect({ at, within: worst <= row.worst || worst }).toEqual({ at, within: true });
      expect(total / points.length).toBeLessThan(0.3);
    });
  }

  it('pow stays within 0.6 ulp of a reference in long integers', () => {
    const u = generator(7);
    let worst = 0;
    let at = '';
    for (let k = 0; k < 8000; k++) {
      const x = k % 2 ? decades(-20, 20)(u) : k % 4 ? uniform(0.9, 1.1)(u) : decades(-1022, 1023)(u);
      const limit = Math.abs(1000 / Math.log2(x));
      const y = Math.min(1e17, limit) * (2 * fine(u) - 1);
      const { value, places } = reference.pow(x, y);
      const off = ulpsOff(pow(x, y), value, places);
      if (!(off <= worst)) {
        worst = off;
        at = `${x}^${y}`;
      }
    }
    expect({ at, within: worst <= 0.6 || worst }).toEqual({ at, within: true });
  });

  it('hypot stays within 0.6 ulp, 0.76 where the result is subnormal and rounds twice', () => {
    const u = generator(11);
    const beyond: string[] = [];
    for (let k = 0; k < 8000; k++) {
      const a = signedDecades(-1074, 1022)(u);
      const b = a * signedDecades(-34, 34)(u);
      if (!Number.isFinite(b) || b === 0 || !Number.isFinite(hypot(a, b))) continue;
      const { value, places } = reference.hypot(a, b);
      const off = ulpsOff(hypot(a, b), value, places);
      if (!(off <= (hypot(a, b) < 2 ** -1022 ? 0.76 : 0.6))) beyond.push(`${a}, ${b}: ${off}`);
    }
    expect(beyond).toEqual([]);
  });

  it('pow of whole numbers is exact wherever the power is a double', () => {
    const wrong: string[] = [];
    const compare = (x: number, y: number, wanted: number): void => {
      if (pow(x, y) !== wanted) wrong.push(`${x}^${y} = ${pow(x, y)}`);
    };
    for (let base = 2; base <= 40; base++) {
      let exact = 1n;
      for (let exponent = 0; exponent < 80; exponent++) {
        const asDouble = Number(exact);
        if (BigInt(asDouble) === exact) {
          compare(base, exponent, asDouble);
          compare(-base, exponent, exponent % 2 ? -asDouble : asDouble);
        }
        exact *= BigInt(base);
      }
    }
    for (let k = -1074; k <= 1023; k++) compare(2, k, k < -1022 ? 2 ** (k + 60) * 2 ** -60 : 2 ** k);
    for (let n = 1; n < 3000; n++) compare(n * n, 0.5, n);
    compare(10, 22, 1e22);
    expect(wrong).toEqual([]);
  });

  it('log10 of a whole power of ten and ln of 1 are exact', () => {
    for (let k = 0; k <= 22; k++) expect(log10(Number(`1e${k}`))).toBe(k);
    for (let k = -307; k <= 308; k++) expect(log10(Number(`1e${k}`))).toBe(k);
    expect(ln(1)).toBe(0);
  });

  it('special values are those of the language for every function', () => {
    const wrong: string[] = [];
    const compare = (name: string, got: number, wanted: number): void => {
      if (!Object.is(got, wanted)) wrong.push(`${name} = ${got}, not ${wanted}`);
    };
    const isSpecial = (v: number): boolean => v === 0 || !Number.isFinite(v) || Math.abs(v) === 1;
    const values = [0, -0, 1, -1, Infinity, -Infinity, NaN, 2, -2, 3, -3, 0.5, -0.5, 1e308, -1e308, 5e-324, -5e-324];
    for (const x of values) {
      for (const y of values) if (isSpecial(x ** y)) compare(`${x}^${y}`, pow(x, y), x ** y);
    }
    const pairs: [string, (x: number) => number, (x: number) => number][] = [
      ['exp', exp, Math.exp],
      ['expm1', expm1, Math.expm1],
      ['ln', ln, Math.log],
      ['log10', log10, Math.log10],
      ['log1p', log1p, Math.log1p],
      ['sin', sin, Math.sin],
      ['cos', cos, Math.cos],
      ['tan', tan, Math.tan],
      ['atan', atan, Math.atan],
    ];
    for (const [name, own, native] of pairs) {
      for (const x of [0, -0, 1, Infinity, -Infinity, NaN, -1, 1e-320, -1e-320, 800, -800]) {
        if (isSpecial(native(x))) compare(`${name}(${x})`, own(x), native(x));
      }
    }
    for (const x of [0, -0, Infinity, -Infinity, NaN]) {
      for (const y of [0, -0, 1, Infinity, NaN]) compare(`hypot(${x}, ${y})`, hypot(x, y), Math.hypot(x, y));
    }
    compare('hypot(3e300, 4e300)', hypot(3e300, 4e300), 5e300);
    compare('hypot(3e-320, 4e-320)', hypot(3e-320, 4e-320), 5e-320);
    compare('hypot(1e308, 1.7e308)', hypot(1e308, 1.7e308), Infinity);
    expect(wrong).toEqual([]);
  });

  it('every table entry is what long integers give', () => {
    const P = 300;
    const one = 1n << BigInt(P);
    const near = (row: Float64Array, k: number, truth: bigint): void => {
      const off = toFixed(row[2 * k], P) + toFixed(row[2 * k + 1], P) - truth;
      const size = off < 0n ? -off : off;
      expect({ k, near: size < one >> 94n }).toEqual({ k, near: true });
    };
    expect([EXP_TABLE.length, LN_TABLE.length, ATAN_TABLE.length]).toEqual([64, 94, 34]);
    for (let j = 0; j < 32; j++) near(EXP_TABLE, j, expFixed((ln2(P) * BigInt(j)) / 32n, P));
    for (let j = 0; j < 47; j++) near(LN_TABLE, j, lnFixed((one * BigInt(j + LN_TABLE_FIRST)) / 64n, P));
    const ln10 = lnFixed(10n * one, P);
    expect(LOG10_TABLE.length).toBe(94);
    for (let j = 0; j < 47; j++) {
      near(LOG10_TABLE, j, (lnFixed((one * BigInt(j + LN_TABLE_FIRST)) / 64n, P) << BigInt(P)) / ln10);
    }
    for (let j = 0; j <= 16; j++) {
      const x = (one * BigInt(j)) / 16n;
      const sum = toFixed(ATAN_TABLE[2 * j], P) + toFixed(ATAN_TABLE[2 * j + 1], P);
      const [s, c] = sinCosFixed(sum, P);
      const off = (s << BigInt(P)) / c - x;
      expect({ j, near: (off < 0n ? -off : off) < one >> 100n }).toEqual({ j, near: true });
    }
  });
});
