// Arithmetic of dimensions, their names and their SI units.

import { expect, test } from 'vitest';
import {
  DECIBEL,
  DIMENSIONLESS,
  dimensionName,
  divideDimensions,
  isUnitFault,
  linearKind,
  multiplyDimensions,
  parseUnit,
  PLAIN,
  raiseDimension,
  sameDimension,
  sameKind,
  siUnitText,
  TEMPERATURE_DIFFERENCE,
  TEMPERATURE_POINT,
} from '../../src/quantity/index.ts';
import type { Dimension, ValueKind } from '../../src/quantity/index.ts';
import { createDraw } from '../support/counter-random.ts';

function kindOf(text: string): ValueKind {
  const unit = parseUnit(text);
  if (isUnitFault(unit)) throw new Error(text);
  return unit.kind;
}

const V: Dimension = [1, 0, 0, 0, 0];

test('the laws of exponents hold for halves and thirds', () => {
  expect(sameDimension(multiplyDimensions(raiseDimension(V, 1 / 3), raiseDimension(V, 2 / 3)), V)).toBe(true);
  let sum = DIMENSIONLESS;
  for (let i = 0; i < 10; i++) sum = multiplyDimensions(sum, raiseDimension(V, 0.1));
  expect(sameDimension(sum, V)).toBe(true);
  expect(sameDimension(raiseDimension(V, 0.5), V)).toBe(false);
});

test('dividing undoes multiplying, and a power of a product is the product of powers', () => {
  const draw = createDraw(5);
  const exponent = () => Math.floor(draw() * 13 - 6) / 2;
  for (let i = 0; i < 2000; i++) {
    const a: Dimension = [exponent(), exponent(), exponent(), exponent(), exponent()];
    const b: Dimension = [exponent(), exponent(), exponent(), exponent(), exponent()];
    const n = exponent();
    const product = multiplyDimensions(a, b);
    expect(sameDimension(divideDimensions(product, b), a)).toBe(true);
    expect(
      sameDimension(raiseDimension(product, n), multiplyDimensions(raiseDimension(a, n), raiseDimension(b, n))),
    ).toBe(true);
  }
});

test('a point of the temperature scale, a difference of two and a level are three kinds', () => {
  expect(sameKind(TEMPERATURE_POINT, TEMPERATURE_DIFFERENCE)).toBe(false);
  expect(sameKind(PLAIN, DECIBEL)).toBe(false);
  expect(sameKind(kindOf('ohm'), kindOf('V/A'))).toBe(true);
});

test.each([
  ['V', 'a voltage', 'V'],
  ['A', 'a current', 'A'],
  ['V/A', 'a resistance', 'ohm'],
  ['A/V', 'a conductance', 'S'],
  ['s/ohm', 'a capacitance', 'F'],
  ['ohm*s', 'an inductance', 'H'],
  ['A*s', 'a charge', 'C'],
  ['V^2/ohm', 'a power', 'W'],
  ['C*V', 'an energy', 'W*s'],
  ['/s', 'a frequency', 'Hz'],
  ['ohm*F', 'a time', 's'],
  ['um', 'a length', 'm'],
  ['um^2', 'an area', 'm^2'],
  ['degC', 'a temperature', 'K'],
  ['K', 'a temperature difference', 'K'],
  ['degC/W', 'a thermal resistance', 'K/W'],
  ['mV/K', 'a temperature coefficient of voltage', 'V/K'],
  ['ppm/K', 'a relative temperature coefficient', '1/K'],
  ['W*s/K', 'an energy per kelvin', 'W*s/K'],
  ['mA/V^2', 'a square-law constant', 'A/V^2'],
  ['S/V', 'a square-law constant', 'A/V^2'],
  ['/V', 'a reciprocal voltage', '1/V'],
  ['S/A', 'a reciprocal voltage', '1/V'],
  ['√V', 'a body-effect coefficient', 'V^0.5'],
  ['nV/√Hz', 'a noise voltage density', 'V/Hz^0.5'],
  ['fA/√Hz', 'a noise current density', 'A/Hz^0.5'],
  ['V²/Hz', 'a squared noise voltage density', 'V^2/Hz'],
  ['A²/Hz', 'a squared noise current density', 'A^2/Hz'],
  ['V/us', 'a slew rate', 'V/s'],
  ['V*s', 'a magnetic flux', 'V*s'],
  ['%', 'a plain number', '1'],
  ['deg', 'a plain number', '1'],
  ['dB', 'a level in dB', 'dB'],
])('%s is %s, in SI %s', (unit, name, si) => {
  expect(dimensionName(kindOf(unit))).toBe(name);
  expect(siUnitText(kindOf(unit))).toBe(si);
});

test.each([
  ['A^2/V', 'a quantity in A²/V', 'A^2/V'],
  ['/V/K', 'a quantity in 1/V/K', '1/V/K'],
  ['V^3', 'a quantity in V³', 'V^3'],
  ['A^1.5*√V', 'a quantity in √V·√A³', 'V^0.5*A^1.5'],
  ['m/K^2', 'a quantity in m/K²', 'm/K^2'],
])('a dimension without a name, %s, is %s', (unit, name, si) => {
  expect(dimensionName(kindOf(unit))).toBe(name);
  expect(siUnitText(kindOf(unit))).toBe(si);
});

test('the SI unit of a kind reads back as a unit of that kind and of factor 1', () => {
  const draw = createDraw(7);
  const exponent = () => Math.floor(draw() * 9 - 4) / 2;
  const kinds = Array.from({ length: 2000 }, () =>
    linearKind([exponent(), exponent(), exponent(), exponent(), exponent()]),
  ).filter((kind) => !sameKind(kind, PLAIN));
  const wrong = kinds.filter((kind) => {
    const unit = parseUnit(siUnitText(kind));
    return isUnitFault(unit) || unit.factor !== 1 || !sameKind(unit.kind, kind);
  });
  expect(wrong).toEqual([]);
});
