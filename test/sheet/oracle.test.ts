import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { evaluateNaively } from '../support/naive-evaluator.ts';
import type { NaiveValue } from '../support/naive-value.ts';
import { randomEngineSheet } from '../support/random-engine-sheet.ts';
import { snapshot } from './snapshot.ts';

/** What a page shows of a cell, wherever it stands. */
const READINGS = { places: false, workings: false };
const REGIONS = ['cutoff', 'ohmic', 'saturation'];
/** Agreement of arithmetic, beside what the evaluator says of its own rounding. */
const ARITHMETIC = 1e-12;

interface Tally {
  values: number;
  broken: number;
  waiting: number;
  unsure: number;
}

/** Every way in which the engine and the naive evaluator differ over one sheet. */
function differences(sheet: Sheet, tally: Tally): string[] {
  const naive = evaluateNaively(sheet.tree.text);
  const keys = [...snapshot(sheet).keys()];
  const cells = sheet.cells();
  expect(keys).toEqual([...naive.keys()]);
  return keys.flatMap((key, i) => {
    const expected = naive.get(key)!;
    const { fault, waitsFor, reading, values } = cells[i];
    const status = fault === null ? 'sound' : waitsFor === null ? 'broken' : 'waits';
    const found: string[] = [];
    if (expected.unsure) {
      tally.unsure++;
      return [];
    }
    if (status !== expected.status) return [`${key} is ${status} (${fault?.text}), not ${expected.status}`];
    if (status === 'waits' && !expected.waitsFor.has(waitsFor!))
      found.push(`${key} waits for ${waitsFor}, which is sound`);
    if (status === 'broken') tally.broken++;
    if (status === 'waits') tally.waiting++;
    if (status !== 'sound') {
      if (values.some(({ value }) => value !== null) || (reading?.value ?? null) !== null)
        found.push(`${key} has a value although it is ${status}`);
      return found;
    }
    if (expected.value) found.push(...unequal(key, reading!.value, expected.value, tally));
    for (const [name, offer] of expected.offers) {
      if (Number.isNaN(offer.bound) || offer.unsure) continue;
      const theirs = values.find((value) => value.name === name);
      if (!theirs) found.push(`${key} does not offer ${name}`);
      else if (theirs.missing === null || offer.value !== null)
        found.push(...unequal(`${key}.${name}`, theirs.value, offer, tally));
    }
    return found;
  });
}

function unequal(name: string, value: number | string | boolean | null, expected: NaiveValue, tally: Tally): string[] {
  tally.values++;
  const { type, value: number, bound } = expected;
  if (type === 'condition') return value === (number === 1) ? [] : [`${name} is ${value}, not ${number === 1}`];
  if (type === 'region') return value === REGIONS[number!] ? [] : [`${name} is ${value}, not ${REGIONS[number!]}`];
  if (typeof value !== 'number') return [`${name} is ${value}, not ${number}`];
  if (value === number || Math.abs(value - number!) <= bound + ARITHMETIC * Math.abs(number!)) return [];
  return [`${name} is ${value}, not ${number} ± ${bound}`];
}

/** Cells whose readings differ, places apart. */
function changes(before: ReadonlyMap<string, string>, after: ReadonlyMap<string, string>): string[] {
  const keys = new Set([...before.keys(), ...after.keys()]);
  return [...keys].filter((key) => before.get(key) !== after.get(key));
}

/** Cells that read otherwise in two sheets of one text. */
function unlike(a: ReadonlyMap<string, string>, b: ReadonlyMap<string, string>): string[] {
  return changes(a, b).map((key) => `${key}: ${a.get(key)} against ${b.get(key)}`);
}

const SEEDS = Array.from({ length: 12 }, (_, i) => 4000 + i);

describe('a sheet under edits', () => {
  const EDITS = 10;
  const tally: Tally = { values: 0, broken: 0, waiting: 0, unsure: 0 };

  it.each(SEEDS)(
    'has the values and faults of a naive evaluator, and those of a sheet made afresh (seed %i)',
    (seed) => {
      const random = randomEngineSheet(createDraw(seed));
      const sheet = createSheet(random.text());
      expect(differences(sheet, tally), random.text()).toEqual([]);
      for (let k = 0; k < EDITS; k++) {
        const before = snapshot(sheet, READINGS);
        const what = `${k}: ${random.edit()}`;
        const text = random.text();
        const changed = sheet.update(text);
        const context = `${what}\n${text}`;
        const fresh = createSheet(text);
        expect(unlike(snapshot(sheet), snapshot(fresh)), context).toEqual([]);
        expect(differences(sheet, tally), context).toEqual([]);
        const missed = changes(before, snapshot(sheet, READINGS)).filter((key) => !changed.has(key));
        expect(missed, context).toEqual([]);
      }
    },
    20_000,
  );

  it('is compared over thousands of values, over what is broken and what waits, and is seldom unsure', () => {
    expect(tally.values).toBeGreaterThan(400 * SEEDS.length);
    expect(tally.broken).toBeGreaterThan(4 * SEEDS.length);
    expect(tally.waiting).toBeGreaterThan(4 * SEEDS.length);
    expect(tally.unsure).toBeLessThan(tally.values / 50);
  });
});
