// Spread of random sheets: nothing throws, ends enclose the nominal value and every counted build, and low and high of an
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

/** Looks at every end of a sheet; answers how many there were. */
function look(text: string): number {
  const sheet = createSheet(text, ANALYSES);
  const spread = analyse(sheet.spreadModel(), { samples: 400, seed: 3 });
  if (spread === null) return 0;
  const { report, model } = spread;
  let looked = 0;
  const isNominalIn = report.parts.every(({ holdsNominal }) => holdsNominal) && !report.isEmpty;
  for (const { path, low, high, distribution, isWord } of report.values) {
    const nominal = sheet.value(path);
    if (isWord || typeof nominal !== 'number' || low.value === null || high.value === null) continue;
    expect(low.value, path).toBeLessThanOrEqual(high.value);
    if (isNominalIn) {
      expect(low.value, path).toBeLessThanOrEqual(nominal);
      expect(high.value, path).toBeGreaterThanOrEqual(nominal);
    }
    if (distribution) {
      expect(distribution.p01, path).toBeGreaterThanOrEqual(low.value);
      expect(distribution.p99, path).toBeLessThanOrEqual(high.value);
    }
    looked++;
  }
  for (const { yield: share } of report.checks) {
    if (share) expect(share.low <= share.share && share.share <= share.high).toBe(true);
  }
  for (const { where } of report.values.flatMap(({ low, high }) => [low, high])) {
    for (const { draw, t } of where) {
      expect(Math.abs(t)).toBeLessThanOrEqual(1);
      expect(model.drawn[draw]).toBeDefined();
    }
  }
  return looked;
}

test.each(Array.from({ length: 30 }, (_, seed) => seed))('random sheet %d', (seed) => {
  const draw = createDraw(seed);
  const sheet = randomEngineSheet(draw);
  look(withSpread(sheet.text(), draw));
  for (let n = 0; n < 3; n++) sheet.edit();
  look(withSpread(sheet.text(), draw));
});

describe('the examples', () => {
  const folder = new URL('../../public/examples/', import.meta.url);
  test.each(readdirSync(folder).filter((name) => name.endsWith('.txt')))('%s', (name) => {
    look(readFileSync(new URL(name, folder), 'utf8'));
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
