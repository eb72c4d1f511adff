import { describe, expect, it } from 'vitest';
import { createPropagation, markDependents, propagate, runAll } from '../../src/program/index.ts';
import { KERNELS, createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { snapshot } from './snapshot.ts';

const names = (changed: ReadonlySet<string>): string[] => [...changed].toSorted();

const STAGE = `V_DD = 15 V ± 5 %
R_D = 3.3 kohm
R_S = 1.2 kohm
R_other = 10 kohm
T_A = 25 degC
Q1 = n-JFET
  I_DSS: 6 mA
  V_P: -2 V
A1 = stage of Q1
  gate: 1 Mohm to 0 V, 100 nF to signal
  drain: R_D to V_DD, 1 uF to load
  source: R_S to 0 V
  load: 100 kohm to 0 V
  output: load
P1 = point of Q1
  V_GS: -1 V
  V_DS: 5 V
gain = dB(A1.A_v)
headroom = check A1.margin >= 1 V
half = R_other / 2
quarter = half / 2
sign_of = sign(V_DD)
`;

function expectFresh(sheet: Sheet): void {
  expect([...snapshot(sheet)]).toEqual([...snapshot(createSheet(sheet.tree.text))]);
}

describe('an edit reaches just what it concerns', () => {
  it.each([
    ['R_D = 3.3 kohm', 'R_D = 2.2 kohm', ['A1', 'R_D', 'gain', 'headroom']],
    ['R_other = 10 kohm', 'R_other = 12 kohm', ['R_other', 'half', 'quarter']],
    ['quarter = half / 2', 'quarter = half / 3', ['quarter']],
    ['  V_GS: -1 V', '  V_GS: -0.5 V', ['P1']],
    ['T_A = 25 degC', 'T_A = 45 degC', ['A1', 'P1', 'T_A', 'gain', 'headroom']],
    ['  V_P: -2 V', '  V_P: -2.2 V', ['A1', 'P1', 'Q1', 'gain', 'headroom']],
    // The values of the cell itself change, those of its users do not.
    ['V_DD = 15 V ± 5 %', 'V_DD = 15 V ± 10 %', ['V_DD']],
    ['half = R_other / 2', 'half = R_other * 0.5', ['half']],
    ['R_other = 10 kohm', 'R_other = 10000 ohm', ['R_other']],
    ['# none', '# none', []],
  ])('%s becomes %s', (before, after, reached) => {
    const sheet = createSheet(STAGE);
    expect(names(sheet.update(STAGE.replace(before, after)))).toEqual(reached);
    expectFresh(sheet);
    expect(names(sheet.update(STAGE))).toEqual(reached);
  });

  it('moves lines without computing anything', () => {
    const sheet = createSheet(STAGE);
    expect(names(sheet.update(`> Prose.\n\n${STAGE}`))).toEqual([]);
    expect(sheet.cell('half')!.tree.line.index).toBe(createSheet(STAGE).cell('half')!.tree.line.index + 2);
    expectFresh(sheet);
  });

  it('is the same for splices as for the whole text', () => {
    const sheet = createSheet(STAGE);
    const at = STAGE.indexOf('3.3 kohm');
    expect(names(sheet.edit([{ start: at, end: at + 3, text: '2.2' }]))).toEqual(['A1', 'R_D', 'gain', 'headroom']);
    expect(sheet.tree.text).toBe(STAGE.replace('3.3 kohm', '2.2 kohm'));
    expectFresh(sheet);
  });

  it('says who else is concerned where a cell comes or goes', () => {
    const sheet = createSheet(STAGE);
    expect(names(sheet.update(STAGE.replace('half = R_other / 2\n', '')))).toEqual(['R_other', 'half', 'quarter']);
    expect(sheet.error('quarter')?.code).toBe('unknown-name');
    expect(names(sheet.update(STAGE))).toEqual(['R_other', 'half', 'quarter']);
    expect(sheet.value('quarter')).toBe(2500);
  });
});

describe('the compiled sheet', () => {
  it('gives the same slots when it is run from its constants', () => {
    const { program, slots } = createSheet(STAGE).compiled();
    const again = Float64Array.from(slots, () => NaN);
    program.constantSlots.forEach((slot, i) => (again[slot] = program.constantValues[i]));
    runAll(program, again, KERNELS);
    const differing = [...slots].flatMap((value, slot) => (Object.is(value, again[slot]) ? [] : [slot]));
    const isConstant = new Set(program.constantSlots);
    expect(differing.filter((slot) => !isConstant.has(slot) && !Number.isNaN(slots[slot]))).toEqual([]);
  });

  it('runs, after one input has changed, just the segments that the sheet names', () => {
    const sheet = createSheet(STAGE);
    const { program, slots, cells } = sheet.compiled();
    const work = createPropagation(program);
    const input = cells.indexOf('R_other');
    const slot = program.slotStart[input];
    expect(slots[slot]).toBe(10_000);
    slots[slot] = 12_000;
    markDependents(program, work, input);
    propagate(program, work, slots, KERNELS);
    expect([...work.changed.subarray(0, work.count)].map((k) => cells[k]).toSorted()).toEqual(['half', 'quarter']);
    const edited = createSheet(STAGE.replace('R_other = 10 kohm', 'R_other = 12 kohm'));
    expect(slots[program.slotStart[cells.indexOf('quarter')]]).toBe(edited.value('quarter'));
  });
});

describe('ten thousand cells, each on the one before', () => {
  const DEPTH = 10_000;
  const chain = (first: string): string =>
    [`x_0 = ${first}`, ...Array.from({ length: DEPTH }, (_, k) => `x_${k + 1} = x_${k} + 1 mV`), ''].join('\n');

  it('are made, edited, closed to a circle and opened again without running out of stack', () => {
    const sheet = createSheet(chain('1 V'));
    const last = (): number | string | boolean | null => sheet.value(`x_${DEPTH}`);
    expect(last()).toBeCloseTo(1 + DEPTH * 1e-3, 9);
    expect(sheet.update(chain('2 V')).size).toBe(DEPTH + 1);
    expect(last()).toBeCloseTo(2 + DEPTH * 1e-3, 9);
    // The whole of it as one circle.
    sheet.update(chain(`x_${DEPTH} - 1 V`));
    expect(sheet.error('x_7000')?.code).toBe('cycle');
    sheet.update(chain('2 V'));
    expect(last()).toBeCloseTo(2 + DEPTH * 1e-3, 9);
  }, 30_000);
});

describe('a circle', () => {
  const sound = 'a = 1 V\nb = a + 1 V\nc = b * 2\nd = c + 1 V\ne = d / 2\nf = 3 V\n';
  const circle = sound.replace('a = 1 V', 'a = d + 1 V');

  it('is reported with its whole path, mended, and broken again', () => {
    const sheet = createSheet(sound);
    expect(sheet.value('e')).toBe(2.5);
    for (let round = 0; round < 3; round++) {
      expect(names(sheet.update(circle))).toEqual(['a', 'b', 'c', 'd', 'e']);
      for (const name of ['a', 'b', 'c', 'd']) {
        expect(sheet.error(name)).toMatchObject({
          code: 'cycle',
          text: `${name} depends on itself: a → d → c → b → a. Break the circle by entering one of them as a number.`,
        });
      }
      expect(sheet.cell('e')).toMatchObject({ waitsFor: 'd', fault: { code: 'waits-for' } });
      expect(sheet.value('f')).toBe(3);
      expectFresh(sheet);
      expect(names(sheet.update(sound))).toEqual(['a', 'b', 'c', 'd', 'e']);
      expect(sheet.value('e')).toBe(2.5);
      expectFresh(sheet);
    }
  });

  it('is told apart from what hangs on it, wherever that stands', () => {
    const sheet = createSheet('late = b + 1 V\na = b\nb = a\nlater = late * 2\n');
    expect(sheet.cells().map((cell) => [cell.name, cell.fault?.code, cell.waitsFor])).toEqual([
      ['late', 'waits-for', 'b'],
      ['a', 'cycle', null],
      ['b', 'cycle', null],
      ['later', 'waits-for', 'late'],
    ]);
  });

  it('names for every member a path on which it lies', () => {
    const sheet = createSheet('a = b + c\nb = a\nc = a\n');
    expect(['a', 'b', 'c'].map((name) => /itself: ([^.]*)\./.exec(sheet.error(name)!.text)![1])).toEqual([
      'a → b → a',
      'a → b → a',
      'c → a → c',
    ]);
  });

  it('may go through a stage, by a rail, an element or the ambient temperature', () => {
    const through = (line: string): string =>
      `Q1 = n-JFET\n  I_DSS: 6 mA\n  V_P: -2 V\n${line}\nA1 = stage of Q1\n  gate: to 0 V\n  drain: R_1 to V_DD\n  source: to 0 V\n`;
    const others = 'R_1 = 1 kohm\nV_DD = 15 V\n';
    expect(createSheet(through(others)).error('A1')).toBeNull();
    for (const [name, line] of [
      ['R_1', 'V_DD = 15 V\nR_1 = A1.V_DS / 1 mA'],
      ['V_DD', 'R_1 = 1 kohm\nV_DD = A1.V_DS + 1 V'],
      ['T_A', `${others}T_A = A1.T_J`],
    ]) {
      const sheet = createSheet(through(line));
      expect(
        [name, 'A1'].map((cell) => sheet.error(cell)?.code),
        line,
      ).toEqual(['cycle', 'cycle']);
      sheet.update(through(others));
      expect(sheet.error('A1')).toBeNull();
      expectFresh(sheet);
    }
  });
});

describe('what has been broken is sound again when it is mended', () => {
  const part = 'Q1 = n-MOSFET\n  V_TO: 2 V\n  K: 2 mA/V^2\n';
  const stage = (extra = ''): string =>
    `A1 = stage of Q1\n  gate: 1 Mohm to 5 V, 100 nF to signal\n  drain: R_1 to 15 V\n  source: to 0 V, C_1 to foot\n  foot: 100 ohm to 0 V\n  output: drain\n${extra}`;
  const text = (R = '1 kohm', C = '1 uF', more = ''): string =>
    `R_1 = ${R}\nC_1 = ${C}\n${part}${stage()}x = A1.A_v * 2\n${more}`;

  it.each([
    ['a name that stood twice', text('1 kohm', '1 uF', 'x = 3\n')],
    ['a resistor that was below zero', text('-1 kohm')],
    ['a resistor that had no value', text('1 kohm * ln(-1)')],
    ['a resistor of another kind', text('1 kohm * 1 V')],
    ['a resistor that was gone', text().replace('R_1 = 1 kohm\n', '')],
    ['a capacitor that was no short at midband', text('1 kohm', '100 pF')],
    ['a cell named like a node', text('1 kohm', '1 uF', 'foot = 3 V\n')],
    ['a part that had the wrong sign', text().replace('K: 2', 'K: -2')],
    ['a part that was gone', text().replace(part, '')],
    ['a line that could not be read', text().replace('drain: R_1', 'drain: 3 R_1')],
    ['a name close to one that was missing', text().replace('C_1 = 1 uF', 'C_2 = 1 uF')],
  ])('%s', (_, broken) => {
    const sheet = createSheet(text());
    const before = [...snapshot(sheet)];
    for (let round = 0; round < 2; round++) {
      sheet.update(broken);
      expectFresh(sheet);
      sheet.update(text());
      expect([...snapshot(sheet)]).toEqual(before);
    }
  });

  it('a logarithmic plot whose range reached zero', () => {
    const plot = (end: string): string =>
      `x_0 = ${end}\n${text()}F_1 = plot A1.I_D against R_1 over x_0 .. 2 kohm log\n`;
    const sheet = createSheet(plot('100 ohm'));
    expect(sheet.error('F_1')).toBeNull();
    sheet.update(plot('0 ohm'));
    expect(sheet.error('F_1')?.code).toBe('plot-log-range');
    sheet.update(plot('1 ohm'));
    expect(sheet.error('F_1')).toBeNull();
  });

  it('a proposal follows the names that there are', () => {
    const sheet = createSheet('R_1 = 1 kohm\nx = R_3\n');
    expect(sheet.error('x')!.text).toBe('There is no cell R_3. Did you mean R_1?');
    sheet.update('R_2 = 1 kohm\nx = R_3\n');
    expect(sheet.error('x')!.text).toBe('There is no cell R_3. Did you mean R_2?');
  });
});

describe('no number is not taken for one', () => {
  it.each([
    ['x = if(sqrt(0 V - 5 V) > 1 V^0.5, 1, 2)', 'x'],
    ['x = if(not (sqrt(0 V - 5 V) > 1 V^0.5), 1, 2)', 'x'],
    ['x = if(1 > 2 and ln(-1) > 1, 1, 2)', 'x'],
    ['x = if(ln(-1) within 1 .. 2, 1, 2)', 'x'],
    ['c = check ln(-1) < 1', 'c'],
    ['c = check not (ln(-1) < 1)', 'c'],
    ['c = check 1 < 2 or ln(-1) < 1', 'c'],
    ['c = check ln(-1) within -1 .. 1', 'c'],
    ['x = min(ln(-1), 3)', 'x'],
    ['x = 0 * (1 / 0)', 'x'],
  ])('%s has no value', (text, name) => {
    const sheet = createSheet(text);
    expect(sheet.error(name)?.code).toBe('no-value');
    expect(sheet.value(name)).toBeNull();
    expect(sheet.cell(name)!.check).toBeNull();
  });

  it.each([
    ['x = 1 / 0', Infinity],
    ['x = -1 / 0', -Infinity],
    ['x = 3 ohm || (1 ohm / 0)', 3],
    ['x = if(1 / 0 > 5, 1, 2)', 1],
    ['x = if(1 / 0 >= 1 / 0, 1, 2)', 1],
    ['x = atan(1 / 0)', Math.PI / 2],
    ['x = exp(-1 / 0)', 0],
  ])('%s is %d', (text, value) => {
    expect(createSheet(text).value('x')).toBe(value);
  });
});

describe('a cell that waits for a broken one', () => {
  it('names it and its line, wherever edits move it', () => {
    const sheet = createSheet('z = y\ny = x\nx = 3 R\n');
    const said = (): (string | undefined)[] => ['z', 'y'].map((name) => sheet.error(name)?.text);
    expect(said()).toEqual(['waits for y, because x is broken in line 3', 'waits for x, which is broken in line 3']);
    expect([...sheet.update('z = y\ny = x\n> moved\nx = 3 R\n')].toSorted()).toEqual(['y', 'z']);
    expect(said()).toEqual(['waits for y, because x is broken in line 4', 'waits for x, which is broken in line 4']);
    sheet.update('z = y\ny = 1 V + 1 A\n> moved\nx = 3 R\n');
    expect(said()[0]).toBe('waits for y, which is broken in line 2');
    sheet.update('z = y\ny = 1 V\n');
    expect(said()).toEqual([undefined, undefined]);
  });
});
