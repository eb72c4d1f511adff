import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { printStep, stepText, workingsOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { ANALYSES } from '../../src/spread/index.ts';
import { strictTex } from './strict-tex.ts';
import { wrongLine } from './printed-line.ts';
import { SHEETS } from './sheets.ts';

describe.each(SHEETS)('the workings of the sheet %s', (_, text) => {
  const sheet = createSheet(text);
  const cells = sheet.cells();

  it('computes without faults', () => {
    expect(cells.filter((cell) => cell.fault).map((cell) => `${cell.name}: ${cell.fault!.text}`)).toEqual([]);
  });

  it('give, from the printed numbers, the printed results', () => {
    const printed = cells.flatMap((cell) => workingsOf(sheet, cell.name));
    expect(printed.length).toBeGreaterThan(0);
    expect(printed.filter((each) => !each.agrees).map(stepText)).toEqual([]);
    // The language has no numeral for ∞: those lines were compared before they were printed.
    const readable = printed.filter((each) => !stepText(each).includes('∞') && each.text.result !== 'no value');
    expect(readable.map(wrongLine).filter((line) => line !== null)).toEqual([]);
    expect(readable.length).toBeGreaterThan(printed.length / 2);
  });

  it('are there for every stage', () => {
    const stages = cells.filter((cell) => cell.kind === 'stage');
    expect(stages.filter((cell) => workingsOf(sheet, cell.name).length < 4).map((cell) => cell.name)).toEqual([]);
  });

  it('render in strict KaTeX without an underscore that shows', () => {
    for (const cell of cells) {
      for (const { tex } of workingsOf(sheet, cell.name)) {
        for (const part of [tex.left, tex.formula, tex.substitution, tex.result]) {
          if (part === null) continue;
          const html = katex.renderToString(part, { throwOnError: true, strict: strictTex, output: 'html' });
          expect(html.replace(/<[^>]*>/g, ''), part).not.toMatch(/[_\\]/);
        }
      }
    }
  });

  it('do not agree when a formula is another one than was computed', () => {
    let wrong = 0;
    for (const cell of cells) {
      for (const original of sheet.workings(cell.name)) {
        if (typeof original.value !== 'number' || !Number.isFinite(original.value) || original.value === 0) continue;
        const altered = { ...original, formula: `(${original.formula}) + (${original.formula})` };
        const celsius = typeof original.type !== 'string' && original.type.scale === 'celsius';
        if (celsius) continue;
        wrong++;
        expect(printStep(altered, cell.name).agrees, altered.formula).toBe(false);
      }
    }
    expect(wrong).toBeGreaterThan(0);
  });
});

describe('the workings of the examples that come with the program', () => {
  const folder = 'public/examples';

  it.each(readdirSync(folder))('%s give, from the printed numbers, the printed results', (file) => {
    const sheet = createSheet(readFileSync(path.join(folder, file), 'utf8'), ANALYSES);
    expect(sheet.cells().filter(({ fault }) => fault)).toEqual([]);
    const printed = sheet.cells().flatMap((cell) => workingsOf(sheet, cell.name));
    expect(printed.filter((each) => !each.agrees).map(stepText)).toEqual([]);
  });
});

describe('the workings of ends, choices and other states', () => {
  // 5 V over 1 kohm: 5 mA; at the ends 4.5 V / 1.01 kohm and 5.5 V / 990 ohm.
  const sheet = createSheet(
    'U_1 = 5 V ± 10 %\nR = 1 kohm ± 1 %\nI = U_1 / R\ny = low(I) + 1 mA\nz = 2 * nominal(I)\nok = check high(I) <= 6 mA\nw = (I with U_1 = 6 V) - I\nv = I with U_1 = 6 V\nU_x = U_1 such that high(I) = 8 mA over 1 V .. 20 V\nU_y = U_1 such that (I with R = 2 kohm) = 4 mA over 1 V .. 20 V\n',
    ANALYSES,
  );

  it.each([
    ['y', 'y = low(I) + 1 mA = 4.46 mA + 1 mA = 5.46 mA'],
    ['z', 'z = 2 * nominal(I) = 2 * 5 mA = 10 mA'],
    ['ok', 'ok: high(I) <= 6 mA, 5.56 mA <= 6 mA: holds'],
    ['w', 'w = (I with U_1 = 6 V) - I = (6 mA) - 5 mA = 1 mA'],
    ['v', 'v = (I with U_1 = 6 V) = 6 mA'],
    ['U_x', 'high(I) = 8 mA'],
    ['U_y', '(I with R = 2 kohm) = (4 mA) = 4 mA'],
  ])('of %s put one number in the place of each', (name, text) => {
    expect(workingsOf(sheet, name).map(stepText)[0]).toBe(text);
  });

  it('give what an operand is, where one stands in what has no value', () => {
    const broken = createSheet('U_1 = 5 V ± 10 %\nR = 1 kohm\nI = U_1 / R\nb = sqrt(low(I) - 5 mA)\n', ANALYSES);
    expect(broken.error('b')?.text).toBe(
      'sqrt(low(I) - 5 mA) has no value: low(I) - 5 mA is −500 µA. A square root wants a value that is not negative.',
    );
  });
});

describe('the workings of the published examples', () => {
  const folder = 'test/published/sheets';
  const files = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.txt'));

  it.each(files)('%s give, from the printed numbers, the printed results', (file) => {
    const sheet = createSheet(readFileSync(path.join(folder, file), 'utf8'));
    const printed = sheet.cells().flatMap((cell) => workingsOf(sheet, cell.name));
    expect(printed.filter((each) => !each.agrees).map(stepText)).toEqual([]);
    const readable = printed.filter((each) => !stepText(each).includes('∞') && each.text.result !== 'no value');
    expect(readable.map(wrongLine).filter((line) => line !== null)).toEqual([]);
  });
});
