import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { printStep, stepText, workingsOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
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
