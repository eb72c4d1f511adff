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
import { exactOf, exactOfText, lastDigitOf } from './exact-fixed.ts';

const SEED = 1999;
const COUNT = 60_000;
/** So many values take a second, on a busy machine more. */
const PATIENCE = 60_000;

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

function printed(value: number, digits: number, rounding: Rounding): string {
  return asTyped(formatValue(value, PLAIN, { digits, rounding }).number);
}

const magnitude = (exact: bigint): bigint => (exact < 0n ? -exact : exact);
/** The allowance for float noise that round-decimal.ts states. */
const noise = (exact: bigint): bigint => magnitude(exact) / 10n ** 12n;

test(
  `down never prints above the value and up never below, beyond 1e-12 of it (seed ${SEED})`,
  () => {
    const draw = createDraw(SEED);
    const wrong: unknown[] = [];
    for (let i = 0; i < COUNT; i++) {
      const value = drawValue(draw);
      const exact = exactOf(value);
      const digits = 1 + Math.floor(draw() * 6);
      const [downText, upText] = [printed(value, digits, 'down'), printed(value, digits, 'up')];
      const [down, up] = [exactOfText(downText), exactOfText(upText)];
      const allowed = noise(exact);
      const outward = down <= exact + allowed && up >= exact - allowed;
      // And no further away than one unit of the last digit.
      const tight = down + lastDigitOf(downText, digits) > exact && up - lastDigitOf(upText, digits) < exact;
      if (!outward || !tight) wrong.push([value, digits, downText, upText]);
    }
    expect(wrong).toEqual([]);
  },
  PATIENCE,
);

test(
  `nearest is within half a unit of the last digit (seed ${SEED})`,
  () => {
    const draw = createDraw(SEED);
    const wrong: unknown[] = [];
    for (let i = 0; i < COUNT; i++) {
      const value = drawValue(draw);
      const exact = exactOf(value);
      const digits = 1 + Math.floor(draw() * 6);
      const near = printed(value, digits, 'nearest');
      const away = magnitude(exactOfText(near) - exact);
      if (away > lastDigitOf(near, digits) / 2n + noise(exact)) wrong.push([value, digits, near]);
    }
    expect(wrong).toEqual([]);
  },
  PATIENCE,
);

test(
  `a value with few digits is printed as itself in all three directions, float noise or not (seed ${SEED})`,
  () => {
    const draw = createDraw(SEED);
    const wrong: unknown[] = [];
    for (let i = 0; i < 30_000; i++) {
      const digits = 1 + Math.floor(draw() * 6);
      const short = Number(`${1 + Math.floor(draw() * (10 ** digits - 1))}e${Math.floor(draw() * 24 - 15)}`);
      const value = short * (1 + Math.round(draw() * 8 - 4) * 1.1e-16);
      for (const rounding of ['nearest', 'down', 'up'] as const)
        if (Number(printed(value, digits, rounding)) !== short) wrong.push([value, digits, rounding]);
    }
    expect(wrong).toEqual([]);
  },
  PATIENCE,
);

test(`from 13 digits on there is no allowance: down and up enclose the exact double (seed ${SEED})`, () => {
  const draw = createDraw(SEED);
  const wrong: unknown[] = [];
  for (let i = 0; i < 10_000; i++) {
    const value = drawValue(draw);
    const digits = 13 + Math.floor(draw() * 5);
    if (exactOfText(printed(value, digits, 'down')) > exactOf(value)) wrong.push([value, digits]);
    if (exactOfText(printed(value, digits, 'up')) < exactOf(value)) wrong.push([value, digits]);
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
