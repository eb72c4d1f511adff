// What the workings pane says of a cell.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { printStep, workingsOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { kindWords, valueWords } from '../../src/ui/workings/cell-words.ts';
import { equationOf } from '../../src/ui/workings/equation.ts';
import { faultWords } from '../../src/ui/workings/fault-words.ts';
import { formRows, partRows } from '../../src/ui/workings/part-rows.ts';
import { sourceWords } from '../../src/ui/workings/source-words.ts';
import { spreadSentences } from '../../src/ui/workings/spread-words.ts';
import { stepsFor } from '../../src/ui/workings/steps-for.ts';

const sheet = createSheet(readFileSync('public/examples/crevasse-listener.txt', 'utf8'));

function spreadOf(entry: string): readonly string[] {
  const { spread, reading } = createSheet(`X_1 = ${entry}\n`).cell('X_1')!;
  if (typeof reading!.type === 'string') throw new Error(`${entry} is no quantity`);
  return spreadSentences(spread!, reading!.type, reading!.as);
}

describe('the steps for one value of a stage', () => {
  const all = sheet.workings('A1').map(({ name }) => name);

  it.each(['V_GS', 'margin', 'g_m', 'A_v', 'R_out'])('of %s hold every step before that it rests on', (value) => {
    const { first } = stepsFor(sheet, 'A1', value);
    expect(first.at(-1)!.name).toBe(value);
    const inChain = new Set(first.map(({ name }) => name));
    // The heat balance uses the dissipation, which is worked out behind it.
    const missing = first.flatMap((step) => {
      const before = all.slice(0, all.indexOf(step.name));
      return step.operands.filter(({ name }) => before.includes(name) && !inChain.has(name));
    });
    expect(missing).toEqual([]);
  });

  it('are fewer than all, which stay at hand', () => {
    const { first, all: whole } = stepsFor(sheet, 'A1', 'V_GS');
    expect(first.length).toBeLessThan(whole.length);
    expect(whole.map(({ name }) => name)).toEqual(all);
  });

  it('are all of them where no value is asked for, or one without steps', () => {
    expect(stepsFor(sheet, 'A1', null)).toMatchObject({ all: [] });
    expect(stepsFor(sheet, 'A1', 'C_gs').first.map(({ name }) => name)).toEqual(all);
  });
});

describe('an equation', () => {
  it('has formula, numbers in place and result, none of them twice', () => {
    const [step] = workingsOf(sheet, 'R_Sbuy');
    const { left, sides, verdict } = equationOf(step!);
    expect(left!.text).toBe('R_Sbuy');
    expect(sides.map(({ text }) => text)).toEqual([step!.text.formula, step!.text.substitution, step!.text.result]);
    expect(verdict).toBeNull();
    for (const name of ['A1', 'A2', 'Q1']) {
      for (const printed of sheet.workings(name).map((each) => printStep(each, name))) {
        const texts = equationOf(printed).sides.map(({ text }) => text);
        expect(texts.filter((text, i) => text === texts[i - 1])).toEqual([]);
      }
    }
  });

  it('of a check ends in its verdict', () => {
    const [step] = workingsOf(sheet, 'headroom');
    const { sides, verdict } = equationOf(step!);
    expect(verdict).toBe('holds');
    expect(sides.map(({ text }) => text)).toEqual(['A1.margin >= 1.5 V', expect.stringMatching(/^11\.6 V >= 1\.5 V$/)]);
  });
});

describe('a declared spread in words', () => {
  it.each([
    ['1.2 kohm ± 1 %', ['From 1.188 kΩ to 1.212 kΩ.', 'Units lie evenly between the limits.']],
    [
      '15 V ± 5 % normal',
      ['From 14.25 V to 15.75 V.', 'Units follow a normal law that ends at the limits, which stand for 3 sigma.'],
    ],
    [
      '24 V in 21 V .. 27 V service',
      [
        'From 21 V to 27 V.',
        'Half of the units lie evenly below the nominal value, half evenly above.',
        'It changes in use, not from unit to unit.',
      ],
    ],
    ['8 mA in 5 mA ..', ['At least 5 mA; no upper limit is given.']],
    ['3 V ± 1 %', ['From 2.97 V to 3.03 V.', 'Units lie evenly between the limits.']],
  ])('%s', (entry, sentences) => {
    expect(spreadOf(entry)).toEqual(sentences);
  });

  it('rounds its ends outward', () => {
    expect(spreadOf('1.2345 kohm ± 1 %')[0]).toBe('From 1.222 kΩ to 1.247 kΩ.');
  });

  it('says where the sheet chose the nominal value', () => {
    expect(spreadOf('2 mA .. 8 mA')).toContainEqual(
      'The nominal value, 4 mA, was chosen by the sheet: the limits stand alone.',
    );
  });
});

describe('the source of a line', () => {
  const { lines } = sheet.tree;
  const source = (name: string): string | null => sourceWords(sheet.cell(name)!.tree, lines);

  it('is what stands there, and for `same` what stands above', () => {
    expect(source('T_A')).toBe('borehole log, season 2');
    expect(source('R_S2')).toMatch(/^stock list, resistors, as in line \d+$/);
    expect(source('R_probe')).toBe('assumed, to be confirmed');
    expect(source('A_chain')).toBeNull();
  });

  it('says so where `same` has nothing above it', () => {
    const { tree } = createSheet('R_1 = 1 kohm [same]\n');
    expect(sourceWords(tree.cells[0]!, tree.lines)).toBe('same, but no line above has a source');
  });
});

describe('a cell in words', () => {
  it.each([
    ['R_D', 'input', '6.8 kΩ'],
    ['R_Sbuy', 'computed', '910 Ω'],
    ['A1', 'stage', null],
    ['Q1', 'part', null],
    ['headroom', 'check', 'holds, 10.0 V to spare'],
  ])('%s', (name, kind, value) => {
    const cell = sheet.cell(name)!;
    expect([kindWords(cell), valueWords(cell)]).toEqual([kind, value]);
  });

  it('has its fault with line and column, which count characters', () => {
    const broken = createSheet('# 😀\nV_CC = 15 V + 2 mA\nhalf = V_CC / 2\n');
    const { place, text } = faultWords(broken.cell('V_CC')!, broken)!;
    const { span } = broken.cell('V_CC')!.fault!;
    expect(place).toBe(`line 2, column ${span.start + 1}`);
    expect(text).toBe(broken.error('V_CC')!.text);
    expect(faultWords(broken.cell('half')!, broken)).toBeNull();
  });
});

describe('a part in tables', () => {
  const cell = sheet.cell('Q1')!;

  it('has a row for each number given, ends and source as the sheet says them', () => {
    const rows = partRows(cell, sheet);
    expect(rows.map(({ name }) => name)).toEqual(cell.fields.map(({ name }) => name));
    expect(rows[0]).toEqual({
      name: 'I_DSS',
      low: '2.5 mA',
      nominal: '4.33 mA',
      high: '7.5 mA',
      source: 'data sheet Q1, ed. 4, p. 2',
    });
    expect(rows.find(({ name }) => name === 'R_thJA')).toMatchObject({ low: '', nominal: '350 K/W', high: '' });
  });

  it('says an open end, and an input without a source', () => {
    const open = createSheet('Q1 = n-JFET\n  I_DSS: 5 mA ..\n  V_P: -2 V\n');
    expect(partRows(open.cell('Q1')!, open)[0]).toMatchObject({ low: '5 mA', high: 'open', source: 'no source yet' });
  });

  it('has other forms beside what was given', () => {
    const given = new Set(cell.fields.map(({ name }) => name));
    const forms = formRows(cell);
    expect(forms.map(({ name }) => name)).toContain('beta');
    expect(forms.filter(({ name }) => given.has(name))).toEqual([]);
  });
});
