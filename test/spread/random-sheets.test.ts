// Spread of random sheets and of the examples: ends enclose the nominal value and every counted build, and low and high of an
// expression are those of the report.

import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { ANALYSES, analyse } from '../../src/spread/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomEngineSheet } from '../support/random-engine-sheet.ts';

/** Gives some plain inputs a tolerance. */
function withSpread(text: string, draw: () => number): string {
  return text.replace(/^(\w+ = \d[\d.]* ?[\w/%^Ωµ]*)$/gm, (line) =>
    draw() < 0.5 ? `${line} ± ${1 + Math.floor(20 * draw())} %` : line,
  );
}

/** What is wrong with the spread of a sheet, in words; empty where all is well. */
function faults(text: string): string[] {
  const sheet = createSheet(text, ANALYSES);
  const spread = analyse(sheet.spreadModel(), { samples: 400, seed: 3 });
  if (spread === null) return [];
  const { report, model } = spread;
  const found: string[] = [];
  const claim = (holds: boolean, what: string): void => {
    if (!holds) found.push(what);
  };
  const isNominalIn = report.parts.every(({ holdsNominal }) => holdsNominal) && !report.isEmpty;
  for (const { path, low, high, distribution, isWord } of report.values) {
    const nominal = sheet.value(path);
    if (isWord || typeof nominal !== 'number' || low.value === null || high.value === null) continue;
    claim(low.value <= high.value, `${path}: the low end lies above the high end`);
    claim(!isNominalIn || (low.value <= nominal && nominal <= high.value), `${path}: nominal value outside its ends`);
    claim(
      distribution === null || (distribution.p01 >= low.value && distribution.p99 <= high.value),
      `${path}: counted builds outside its ends`,
    );
  }
  for (const { name, yield: share } of report.checks) {
    claim(
      share === null || (share.low <= share.share && share.share <= share.high),
      `${name}: share outside its interval`,
    );
  }
  for (const { where } of report.values.flatMap(({ low, high }) => [low, high])) {
    for (const { draw, t } of where) {
      claim(Math.abs(t) <= 1 && model.drawn[draw] !== undefined, `draw ${draw} stands at ${t}`);
    }
  }
  return found;
}

test.each(Array.from({ length: 30 }, (_, seed) => seed))('the spread of random sheet %d is sound', (seed) => {
  const draw = createDraw(seed);
  const sheet = randomEngineSheet(draw);
  expect(faults(withSpread(sheet.text(), draw))).toEqual([]);
  for (let n = 0; n < 3; n++) sheet.edit();
  expect(faults(withSpread(sheet.text(), draw))).toEqual([]);
});

describe('the spread of each example is sound', () => {
  const folder = new URL('../../public/examples/', import.meta.url);
  test.each(readdirSync(folder).filter((name) => name.endsWith('.txt')))('%s', (name) => {
    expect(faults(readFileSync(new URL(name, folder), 'utf8'))).toEqual([]);
  });
});

test('low(x) and high(x) are the ends that the report has', () => {
  const text = 'R_1 = 10 kohm ± 5 %\nR_2 = 4.7 kohm ± 2 %\nx = R_1 || R_2\na = low(x)\nb = high(R_1 / R_2) - 1\n';
  const sheet = createSheet(text, ANALYSES);
  const spread = analyse(sheet.spreadModel(), { samples: 10, seed: 1 })!;
  expect(sheet.value('a')).toBe(spread.value('x')!.low.value);
  expect(sheet.value('b')).toBeCloseTo(10.5 / (4.7 * 0.98) - 1, 12);
  // They are chosen once: the same in every build.
  expect(spread.value('a')!.moves).toBe(false);
  sheet.update(text.replace('± 5 %', '± 1 %'));
  expect(sheet.value('a')).toBeCloseTo(1 / (1 / 9900 + 1 / (4700 * 0.98)), 9);
});
