import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { openPoints, recordHtml, recordOf, shownReading, stepText, workingsOf } from '../../src/record/index.ts';
import type { RecordTree } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { PROBE } from './record-sheet.ts';
import { sectionText, textOf } from './record-text.ts';

const DIGEST = '0123456789abcdef'.repeat(4);
const record = (text: string): RecordTree => recordOf(createSheet(text), { digest: DIGEST });

describe('the record of a finished sheet', () => {
  const sheet = createSheet(PROBE);
  const tree = recordOf(sheet, { digest: DIGEST, printedAt: '2027-03-02 14:05' });
  const titles = tree.sections.map(({ title }) => title);

  it('goes from the result to the sheet text', () => {
    expect(titles).toEqual([
      'Result',
      'Checks',
      'To be confirmed',
      'The sheet',
      'Workings',
      'Figures',
      'Cautions and limits',
      'Sign-off',
      'The sheet text',
    ]);
    expect(tree.sections.map(({ number }) => number)).toEqual(titles.map((_, at) => String(at + 1)));
  });

  it('has the title block as the lines under the title say, with room for what they leave open', () => {
    const filled = tree.titleBlock.map(({ label, content }) => [label, textOf(content)]);
    expect(filled).toEqual([
      ['Project', 'Ice survey'],
      ['Number', 'BP-3'],
      ['Revision', 'B'],
      ['Status', 'draft'],
      ['Date', ''],
      ['What this revision changes', 'gate resistor raised'],
      ['Made by', ''],
      ['Checked by', ''],
    ]);
    const blanks = tree.titleBlock.filter(({ content }) => content.some(({ type }) => type === 'blank'));
    expect(blanks.map(({ label }) => label)).toEqual(['Date', 'Made by', 'Checked by']);
    expect(tree).toMatchObject({ edition: 'revision B, draft', paper: 'A4', digest: DIGEST, incomplete: null });
  });

  it('has every check with its requirement, its numbers and its reserve', () => {
    const checks = sheet.cells().filter(({ kind }) => kind === 'check');
    expect(checks.length).toBe(2);
    const words = sectionText(tree, 'Checks');
    for (const cell of checks) {
      const step = workingsOf(sheet, cell.name)[0]!;
      expect(words).toContain(step.text.formula);
      expect(words).toContain(step.text.substitution!);
    }
    expect(words).toMatch(/headroom A1.margin >= 1.5 V 1\d\.\d V >= 1.5 V holds, \S+ V to spare/);
  });

  it('tells at its head what the author says of the sheet, and how well it is founded', () => {
    const words = sectionText(tree, 'Result');
    expect(words).toContain('All 2 checks hold at the nominal values.');
    expect(words).toContain('A piezo disc drives a JFET stage. Every unit has to work.');
    const { length } = sheet.assumptions();
    expect(length).toBeGreaterThan(3);
    expect(words).toContain(`2 assumed inputs, 2 inputs without a source, ${length} numbers taken by the sheet.`);
  });

  it('lists what is assumed, has no source, or was taken by the sheet', () => {
    const words = sectionText(tree, 'To be confirmed');
    expect(words).toContain('R_x = 2.2 kohm (line 16) Q1 lambda: 0.015 /V (line 23)');
    expect(words).toContain('Q1 V_DSmax: 30 V (line 24) P1 I_D: 1 mA (line 34)');
    expect(words).toContain('Q1.I_DSS: no nominal is given');
  });

  it('has every input with its ends, its source followed up where it is the same as above', () => {
    const words = sectionText(tree, 'The sheet');
    expect(words).toContain('V_DD 18 V ± 4 % 17.28 18 V 18.72 regulator data sheet, table 3');
    expect(words).toContain('R_S 1.2 kohm ± 1 % 1.188 1.2 kΩ 1.212 stock list, resistors; bypassed');
    expect(words).toContain('R_x 2.2 kohm 2.2 kΩ assumed');
    for (const cell of sheet.cells().filter(({ isInput }) => isInput)) expect(words).toContain(cell.name);
  });

  it('keeps the prose of a section in its place, and has that of the whole sheet once', () => {
    const words = sectionText(tree, 'The sheet');
    expect(words).toMatch(/R_x 2.2 kohm 2.2 kΩ assumed What follows is the part as bought. 4.2 Device/);
    expect(words).not.toContain('Every unit has to work.');
  });

  it('has the rows of a part as data sheets print them, negative ones by magnitude, and the law they settle', () => {
    const words = sectionText(tree, 'The sheet');
    expect(words).toContain('I_DSS 2.5 4.33 mA 7.5 V_DS = 15 V data sheet Q1, p. 2');
    expect(words).toContain('V_GSoff −1.1 −1.88 V −3.2 I_D = 100 nA data sheet Q1, p. 2');
    expect(words).toContain('V_DSmax 30 V no source beta 1.1');
  });

  it('shows the values of every stage and point as the terminal does', () => {
    const words = sectionText(tree, 'The sheet');
    const offered = sheet.cells().filter(({ kind }) => kind === 'stage' || kind === 'point');
    expect(offered.length).toBe(2);
    for (const { values, fields } of offered) {
      const written = new Set(fields.map(({ name }) => name));
      for (const value of values.filter(({ name }) => !written.has(name))) {
        expect(words).toContain(`${value.name}${value.value === null ? '' : ` ${shownReading(value)}`}`);
      }
    }
    expect(words).toMatch(/Without a value: [^.]*\(/);
  });

  it('has every step of every part, stage, point and formula, all sides of it, each numbered', () => {
    const section = tree.sections.find(({ title }) => title === 'Workings')!;
    const steps = section.blocks.flatMap((block) => (block.type === 'steps' ? block.steps : []));
    const expected = sheet
      .cells()
      .filter(({ kind }) => kind !== 'check')
      .flatMap((cell) => workingsOf(sheet, cell.name));
    expect(expected.length).toBeGreaterThan(30);
    expect(steps.map(({ sides }) => sides.map(({ text: words }) => words).join(' = '))).toEqual(expected.map(stepText));
    expect(new Set(steps.map(({ number }) => number)).size).toBe(steps.length);
    expect(steps.filter(({ agrees }) => !agrees)).toEqual([]);
  });

  it('draws each stage, its planes and the plots, each once', () => {
    const figures = JSON.stringify(tree).match(/"svg":/g)!.length;
    expect(figures).toBe(4);
    expect(sectionText(tree, 'Figures')).toMatch(
      /^Figure 1 \(F1\)\. Transfer.*Figure 2\. Output.*Figure 3 \(F2\)\. Plot/,
    );
  });

  it('has the cautions of the sheet, then those that hold for any', () => {
    const words = sectionText(tree, 'Cautions and limits');
    for (const { text: caution } of sheet.cautions())
      expect(words).toContain(caution.split(':').at(-1)!.split('V_')[0]!.trim());
    for (const due of ['60 V d.c.', 'hold their charge', 'gets hot', 'Local codes and licensed practice decide']) {
      expect(words).toContain(due);
    }
  });

  it('has the sheet text from which it can be had again', () => {
    const listing = tree.sections.at(-1)!.blocks.find(({ type }) => type === 'listing');
    expect(listing).toEqual({ type: 'listing', lines: PROBE.replace(/\n$/, '').split('\n') });
  });
});

describe('the record of a sheet that is not finished', () => {
  const text = `# Half done
  author: N. N.
  checked: supply [N. N., 3 March]
V_DD = 15 V  [bench]
R_S = 3 V + 2 mA
R_T = R_S * 2
supply = check V_DD >= 16 V
fine = check V_DD >= 10 V
waits = check R_T >= 1 ohm
!! no line of a sheet
`;
  const tree = record(text);

  it('says so at its head', () => {
    expect(textOf(tree.incomplete)).toBe(
      'Record of an incomplete sheet: 2 cells are broken and 2 have no value. Not to be signed as it stands.',
    );
  });

  it('lists what is broken and what waits, in words and with their places', () => {
    const words = sectionText(tree, 'Not computed');
    expect(words).toContain('line 5, column 7: 3 V is a voltage and 2 mA is a current');
    expect(words).toContain('line 10, column 1: ');
    expect(words).toContain('R_T waits for R_S');
    expect(words).toContain('waits waits for R_T');
  });

  it('has failing checks first, then those that are not decided', () => {
    const words = sectionText(tree, 'Checks');
    const order = ['fails, 1.00 V short', 'waits for R_T', 'holds, 5.00 V to spare'].map((part) => words.indexOf(part));
    expect(order).toEqual(order.toSorted((a, b) => a - b));
    expect(order[0]).toBeGreaterThan(0);
  });

  it('names who designed it and what was checked by whom', () => {
    const words = sectionText(tree, 'Sign-off');
    expect(words).toContain('N. N.');
    expect(words).toContain('Checked: supply, by N. N., 3 March');
  });

  it('shows no value where there is none', () => {
    expect(sectionText(tree, 'The sheet')).toContain('R_T R_S * 2 waits for R_S');
  });
});

describe('the record of the worked sheet', () => {
  const sheet = createSheet(readFileSync('public/examples/crevasse-listener.txt', 'utf8'));

  it('is complete, and every line of its workings adds up', () => {
    const tree = recordOf(sheet, { digest: DIGEST });
    expect(tree.incomplete).toBeNull();
    const workings = tree.sections.find(({ title }) => title === 'Workings')!;
    const steps = workings.blocks.flatMap((block) => (block.type === 'steps' ? block.steps : []));
    expect(steps.length).toBeGreaterThan(80);
    expect(steps.filter(({ agrees }) => !agrees)).toEqual([]);
  });
});

describe('a record', () => {
  it('is made of an empty sheet, too', () => {
    const tree = record('');
    expect(tree.title).toBe('Sheet without a title');
    expect(recordHtml(tree)).toContain('Nothing is required of this sheet yet.');
  });

  it('is printed on the paper that the sheet names', () => {
    expect(record('# A\n  paper: Letter\n').paper).toBe('Letter');
    expect(record('# A\n  paper: A4\n').paper).toBe('A4');
    expect(record('# A\n').paper).toBe('A4');
  });

  it('tells what of the sheet text cannot be seen in print', () => {
    const words = sectionText(record('# A\r\nx = 1 V \r\ny =\t2 V'), 'The sheet text');
    expect(words).toBe(
      'Line 2 ends in blanks. Line 3 holds tabs. Lines end with carriage return and line feed. No line end stands behind the last line.',
    );
  });
});

describe('what is open before a record can be issued', () => {
  it('comes with the place to mend it, the gravest first', () => {
    const points = openPoints(
      createSheet('# A\n  number: 7\nx = 1 V\ny = 2 V + 1 A\nc = check x >= 3 V\nz = 5 V [assumed]\n'),
    );
    const kinds = points.map(({ kind, cell, line }) => [kind, cell, line]);
    expect(kinds).toEqual([
      ['broken', 'y', 3],
      ['failing', 'c', 4],
      ['assumed', 'z', 5],
      ['no source', 'x', 2],
      ...Array.from({ length: 6 }, () => ['field', null, 0]),
    ]);
  });

  it('is nothing for a sheet that has all', () => {
    const fields = ['project', 'number', 'revision', 'status', 'date', 'author', 'checker'].map(
      (label) => `  ${label}: x\n`,
    );
    expect(openPoints(createSheet(`# A\n${fields.join('')}x = 1 V [bench]\nc = check x >= 0.5 V\n`))).toEqual([]);
  });
});
