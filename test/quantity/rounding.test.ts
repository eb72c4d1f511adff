// Rounding of printed values, judged in exact fractions: what is printed may not cross the value.

import { expect, test } from 'vitest';
import {
  CURRENT,
  formatValue,
  knownUnit,
  parseUnit,
  isUnitFault,
  PLAIN,
  plainText,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  scaleToSI,
  SQUARE_LAW_CONSTANT,
  TEMPERATURE_POINT,
  VOLTAGE,
} from '../../src/quantity/index.ts';
import type { Rounding } from '../../src/quantity/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { compare, plus, rationalOf, rationalOfText, times } from './exact-rational.ts';
import type { Rational } from './exact-rational.ts';

const SEED = 1999;
const COUNT = 100_000;

/** Values over 30 decades; a third have few digits, a third are such values with float noise. */
function drawValue(draw: () => number): number {
  const sign = draw() < 0.5 ? -1 : 1;
  const exponent = Math.floor(draw() * 30 - 18);
  const form = draw();
  if (form < 1 / 3) return sign * (1 + 9 * draw()) * 10 ** exponent;
  const short = Number(`${1 + Math.floor(draw() * 99_999)}e${exponent}`);
  return form < 2 / 3 ? sign * short : sign * short * (1 + Math.round(draw() * 8 - 4) * 1.1e-16);
}

/** What was printed as a plain number: `−1.20×10⁻⁵` as -1.20e-5. */
function asTyped(number: string): string {
  const raised = (mark: string) => ('⁰¹²³⁴⁵⁶⁷⁸⁹'.includes(mark) ? String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(mark)) : '-');
  return number
    .replace('−', '-')
    .replaceAll('\u2009', '')
    .replace(/×10([⁻⁰¹²³⁴-⁹]+)/, (_, power: string) => `e${[...power].map(raised).join('')}`);
}

function printed(value: number, digits: number, rounding: Rounding) {
  const typed = asTyped(formatValue(value, PLAIN, { digits, rounding }).number);
  // 12300 to three digits is a multiple of 100, which its zeros do not tell.
  const wholeDigits = /^-?[1-9]\d*/.exec(typed)?.[0].replace('-', '').length ?? 0;
  const { quantum, ...read } = rationalOfText(typed);
  return { ...read, quantum: times(quantum, 10n ** BigInt(Math.max(0, wholeDigits - digits))) };
}

/** The allowance for float noise that round-decimal.ts states. */
const noise = (value: Rational): Rational => times(value.over < 0n ? times(value, -1n) : value, 1n, 10n ** 12n);

test(`down never prints above the value and up never below, beyond 1e-12 of it (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const wrong: unknown[] = [];
  for (let i = 0; i < COUNT; i++) {
    const value = drawValue(draw);
    const exact = rationalOf(value);
    const digits = 1 + Math.floor(draw() * 6);
    const [down, up] = [printed(value, digits, 'down'), printed(value, digits, 'up')];
    const slack = noise(exact);
    const outward = compare(down, plus(exact, slack)) <= 0 && compare(plus(up, slack), exact) >= 0;
    // And no further than one unit of the last digit printed.
    const tight = compare(plus(down, down.quantum), exact) > 0 && compare(plus(up, times(up.quantum, -1n)), exact) < 0;
    if (!outward || !tight) wrong.push([value, digits, down, up]);
  }
  expect(wrong).toEqual([]);
});

test(`nearest is within half a unit of the last digit (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const wrong: unknown[] = [];
  for (let i = 0; i < COUNT; i++) {
    const value = drawValue(draw);
    const exact = rationalOf(value);
    const near = printed(value, 1 + Math.floor(draw() * 6), 'nearest');
    const away = plus(near, times(exact, -1n));
    const distance = away.over < 0n ? times(away, -1n) : away;
    if (compare(distance, plus(times(near.quantum, 1n, 2n), noise(exact))) > 0) wrong.push(value);
  }
  expect(wrong).toEqual([]);
});

test(`a value with few digits is printed as itself in all three directions, float noise or not (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const wrong: unknown[] = [];
  for (let i = 0; i < COUNT; i++) {
    const digits = 1 + Math.floor(draw() * 6);
    const short = Number(`${1 + Math.floor(draw() * (10 ** digits - 1))}e${Math.floor(draw() * 24 - 15)}`);
    const value = short * (1 + Math.round(draw() * 8 - 4) * 1.1e-16);
    const texts = (['nearest', 'down', 'up'] as const).map((rounding) =>
      asTyped(formatValue(value, PLAIN, { digits, rounding }).number),
    );
    if (texts.some((text) => Number(text) !== short)) wrong.push([value, texts]);
  }
  expect(wrong).toEqual([]);
});

test(`from 13 digits on there is no allowance: down and up enclose the exact double (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const wrong: unknown[] = [];
  for (let i = 0; i < 10_000; i++) {
    const value = drawValue(draw);
    const exact = rationalOf(value);
    const digits = 13 + Math.floor(draw() * 5);
    if (compare(printed(value, digits, 'down'), exact) > 0) wrong.push(value);
    if (compare(printed(value, digits, 'up'), exact) < 0) wrong.push(value);
  }
  expect(wrong).toEqual([]);
});

test.each([
  [0.1 + 0.2, 1, 'up', '0.3'],
  [0.3, 1, 'down', '0.3'],
  [1.005, 3, 'nearest', '1.01'], // the double lies below 1.005; the decimal that was meant does not
  [1.004999, 3, 'nearest', '1.00'],
  [-1.005, 3, 'nearest', '−1.01'],
  [2.5, 1, 'nearest', '3'],
  [-2.5, 1, 'nearest', '−3'],
  [9.999, 3, 'up', '10.0'],
  [9.999, 3, 'down', '9.99'],
  [-9.999, 3, 'down', '−10.0'],
  [-9.991, 3, 'up', '−9.99'],
  [1.0000001, 3, 'up', '1.01'],
  [0.9999999, 3, 'down', '0.999'],
  [1 + 1e-13, 3, 'up', '1.00'],
  [1 + 1e-11, 3, 'up', '1.01'],
] as const)('%d to %d digits, %s, is %s', (value, digits, rounding, shown) => {
  expect(formatValue(value, PLAIN, { digits, rounding }).number).toBe(shown);
});

test('a share of builds below one is never printed as 100 %', () => {
  const percent = { unit: knownUnit('%'), rounding: 'down' } as const;
  expect(formatValue(0.9999, PLAIN, percent).text).toBe('99.9 %');
  expect(formatValue(1 - 1e-7, PLAIN, percent).text).toBe('99.9 %');
  expect(formatValue(1, PLAIN, percent).text).toBe('100 %');
});

test(`what is printed for the eye and typed for the sheet are one number, and all digits read back (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const kinds = [PLAIN, VOLTAGE, CURRENT, RESISTANCE, RECIPROCAL_VOLTAGE, SQUARE_LAW_CONSTANT];
  const wrong: unknown[] = [];
  for (let i = 0; i < 20_000; i++) {
    const kind = kinds[i % kinds.length];
    const value = drawValue(draw);
    const shown = formatValue(value, kind);
    const unitShown = shown.unit === '' ? null : parseUnit(shown.unit);
    if (unitShown && isUnitFault(unitShown)) wrong.push(shown);
    else if (scaleToSI(asTyped(shown.number), unitShown) !== read(plainText(value, kind, { digits: 3 })))
      wrong.push(shown);
    if (read(plainText(value, kind)) !== value) wrong.push(value);
  }
  expect(wrong).toEqual([]);
});

test(`a temperature typed for the sheet reads back as the same double (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const wrong: number[] = [];
  for (let i = 0; i < 20_000; i++) {
    const kelvin = 200 + 300 * draw();
    if (read(plainText(kelvin, TEMPERATURE_POINT)) !== kelvin) wrong.push(kelvin);
  }
  expect(wrong).toEqual([]);
});

function read(typed: string): number {
  const [number, unit] = typed.split(' ');
  return scaleToSI(number, unit === undefined ? null : knownUnit(unit));
}
