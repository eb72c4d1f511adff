import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { KINDS, number, sheetOf } from './kinds.ts';

const LEADS = ['', '  r_s: 0.2 ohm\n', '  lambda: 0.03 /V\n', '  lambda: 0.03 /V\n  r_s: 0.2 ohm\n'];

const ROWS = [
  { vgs: 4.5, current: 0.075, resistance: 5 },
  { vgs: 7, current: 0.3, resistance: 3 },
  { vgs: 10, current: 0.5, resistance: 2.5 },
];

function rowsOf(rows: typeof ROWS): string {
  return rows.map((row) => `  R_DSon: ${row.resistance} ohm at V_GS = {${row.vgs}}, I_D = ${row.current} A\n`).join('');
}

/** A point at the V_GS and V_DS at which each row was measured. */
function pointsAt(rows: typeof ROWS): string {
  return rows
    .map((row, k) => `P${k} = point of Q1\n  V_GS: {${row.vgs}}\n  V_DS: {${row.current * row.resistance}}\n`)
    .join('');
}

function texts(sheet: Sheet): string[] {
  return sheet.assumptions().map(({ text }) => text);
}

describe('rows of R_DSon', () => {
  for (const [kind] of KINDS.filter(([name]) => name.endsWith('MOSFET'))) {
    it.each(LEADS)(`three of an ${kind} are met by the device at their own V_GS and I_D: %j`, (more) => {
      const sheet = sheetOf(kind, `Q1 = ${kind}\n${rowsOf(ROWS)}${more}${pointsAt(ROWS)}`);
      ROWS.forEach((row, k) => expect(number(sheet, `P${k}.I_D`) / row.current).toBeCloseTo(1, 9));
      const r_s = more.includes('r_s') ? 0.2 : 0;
      expect(number(sheet, 'Q1.r_d')).toBeGreaterThan(1);
      expect(number(sheet, 'Q1.r_d')).toBeCloseTo(number(sheet, 'Q1.R_0') - r_s, 12);
    });

    it.each([...LEADS, '  lambda: 0.03 /V\n  r_s: 0.2 ohm\n  r_d: 0.3 ohm\n'])(
      `two of an ${kind} are met likewise, and one beside its threshold: %j`,
      (more) => {
        const two = sheetOf(kind, `Q1 = ${kind}\n${rowsOf(ROWS.slice(0, 2))}${more}${pointsAt(ROWS.slice(0, 2))}`);
        for (const k of [0, 1]) expect(number(two, `P${k}.I_D`) / ROWS[k]!.current).toBeCloseTo(1, 9);
        const one = sheetOf(
          kind,
          `Q1 = ${kind}\n  V_TO: {2}\n${rowsOf(ROWS.slice(1, 2))}${more}${pointsAt(ROWS.slice(1, 2))}`,
        );
        expect(number(one, 'P0.I_D') / 0.3).toBeCloseTo(1, 9);
      },
    );
  }

  it('that settle the law are not said to disagree with themselves', () => {
    const sheet = sheetOf('n-MOSFET', `Q1 = n-MOSFET\n${rowsOf(ROWS)}`);
    expect(sheet.cautions()).toEqual([]);
    expect(sheet.workings('Q1').map(({ sentence }) => sentence)).toEqual([
      'The three R_DSon rows settle the law and fit a series part R_0, which is taken to lie in the drain lead.',
      ...Array<string>(3).fill('As written in R_DSon.'),
    ]);
    expect(texts(sheet)).toContain(
      'Q1: the series part R_0 that the three R_DSon rows fit is taken to lie in the drain lead: r_d = R_0 - r_s.',
    );
  });

  it('that fit another series part than the leads as given say so', () => {
    const sheet = sheetOf('n-MOSFET', `Q1 = n-MOSFET\n${rowsOf(ROWS)}  r_d: 0.1 ohm\n`);
    expect(sheet.cautions().map(({ text }) => text)).toEqual([
      expect.stringMatching(
        /^The R_DSon rows fit a series part R_0 of 1\.\d+ Ω; r_s \+ r_d as given are 100 mΩ, and stand\.$/,
      ),
    ]);
  });
});

describe('rows of a part with resistance in its leads are met at its terminals', () => {
  const more = '  lambda: 0.01 /V\n  r_s: 30 ohm\n  r_d: 20 ohm\n';
  const at15 = (gate: string): string => `P1 = point of Q1\n  ${gate}\n  V_DS: {15}\n`;

  it.each(['n-JFET', 'p-JFET'])('I_DSS, V_GSoff, g_fs, g_fs0 and R_DSon of an %s', (kind) => {
    const part = (rows: string): string => `Q1 = ${kind}\n${rows}${more}`;
    const of = (rows: string, gate: string, path: string): number =>
      number(sheetOf(kind, part(rows) + at15(gate)), path);
    const current = '  I_DSS: 6 mA at V_DS = {15}\n';
    expect(of(`${current}  V_P: {-2}\n`, 'V_GS: {0}', 'P1.I_D')).toBeCloseTo(6e-3, 14);
    expect(of(`${current}  V_GSoff: {-2} at I_D = 10 nA\n`, 'V_GS: {0}', 'P1.I_D')).toBeCloseTo(6e-3, 14);
    expect(of(`${current}  beta: 3 mA/V^2\n`, 'V_GS: {0}', 'P1.I_D')).toBeCloseTo(6e-3, 14);
    const slope = `${current}  g_fs0: 5 mS at V_DS = {15}\n`;
    expect(of(slope, 'V_GS: {0}', 'P1.I_D')).toBeCloseTo(6e-3, 14);
    expect(of(slope, 'V_GS: {0}', 'P1.g_m')).toBeCloseTo(5e-3, 14);
    expect(of('  V_P: {-2}\n  g_fs: 3 mS at I_D = 1 mA, V_DS = {15}\n', 'I_D: 1 mA', 'P1.g_m')).toBeCloseTo(3e-3, 14);
    const small = sheetOf(
      kind,
      `${part('  V_P: {-2}\n  R_DSon: 300 ohm\n')}P1 = point of Q1\n  V_GS: {0}\n  V_DS: {0.000001}\n`,
    );
    expect(1e-6 / number(small, 'P1.I_D')).toBeCloseTo(300, 3);
  });

  it.each(['n-MOSFET', 'p-MOSFET'])('I_on of an %s', (kind) => {
    const rows = '  V_TO: {1.5}\n  I_on: 20 mA at V_GS = {6}, V_DS = {15}\n';
    const sheet = sheetOf(kind, `Q1 = ${kind}\n${rows}${more}${at15('V_GS: {6}')}`);
    expect(number(sheet, 'P1.I_D')).toBeCloseTo(20e-3, 14);
  });

  it.each(['n-JFET', 'p-JFET'])('and the forms that an %s was not given in stand at the terminals', (kind) => {
    const part = `Q1 = ${kind}\n  beta: 3 mA/V^2\n  V_TO: -2 V\n  r_s: 30 ohm\n  r_d: 20 ohm\n`;
    const sheet = sheetOf(
      kind,
      `${part}P1 = point of Q1\n  V_GS: {0}\n  V_DS: {15}\nP2 = point of Q1\n  V_GS: {0}\n  V_DS: {0.000001}\n`,
    );
    expect(number(sheet, 'Q1.I_DSS')).toBeCloseTo(number(sheet, 'P1.I_D'), 14);
    expect(number(sheet, 'Q1.g_fs0')).toBeCloseTo(number(sheet, 'P1.g_m'), 14);
    expect(number(sheet, 'Q1.R_DSon')).toBeCloseTo(1e-6 / number(sheet, 'P2.I_D'), 3);
  });

  it('in the workings, where every row that settles the law comes out as written', () => {
    const rows = [
      '  I_DSS: 6 mA at V_DS = 15 V\n  V_GSoff: -2 V at I_D = 10 nA\n',
      '  V_P: -2 V\n  g_fs: 3 mS at I_D = 1 mA, V_DS = 15 V\n',
      '  V_P: -2 V\n  R_DSon: 300 ohm at I_D = 1 mA\n',
    ];
    for (const row of rows) {
      const steps = createSheet(`Q1 = n-JFET\n${row}${more}`).workings('Q1');
      expect(steps.map(({ sentence }) => sentence)).toContainEqual(expect.stringMatching(/^As written in /));
      expect(steps.flatMap(({ operands }) => operands.map(({ name }) => name))).toContain('r_s');
    }
  });
});

describe('what a row leaves unsaid is listed as an assumption and said in the workings', () => {
  it.each([
    [
      'n-MOSFET',
      'V_GSth: 2 V\n  K: 1 mA/V^2',
      'Q1.V_GSth: no test current is stated; it is taken as V_TO of the square law.',
    ],
    [
      'n-JFET',
      'I_DSS: 6 mA\n  V_GSoff: -2 V',
      'Q1.V_GSoff: no test current is stated; it is taken as V_P of the square law.',
    ],
    ['n-JFET', 'V_P: -2 V\n  R_DSon: 300 ohm', 'Q1.R_DSon: no I_D is stated; it is taken at V_DS = 0.'],
    ['n-JFET', 'I_DSS: 6 mA\n  V_P: -2 V\n  g_os: 20 uS', 'Q1.g_os: no I_D is stated; it is taken at I_DSS.'],
    [
      'n-JFET',
      'I_DSS: 6 mA\n  V_P: -2 V\n  g_os: 20 uS at I_D = 1 mA\n  r_s: 10 ohm',
      'Q1.g_os: it is taken inside r_s and r_d; at the terminals it is smaller.',
    ],
  ])('%s with %j', (kind, rows, text) => {
    const sheet = createSheet(`Q1 = ${kind}\n  ${rows}\n`);
    expect(texts(sheet)).toContain(text);
    const said = sheet.workings('Q1').map(({ sentence }) => sentence);
    expect(said).toContainEqual(expect.stringContaining(text.slice(text.indexOf(': '))));
  });

  it.each([
    ['', 'Q1: the series part of both R_DSon rows is taken as R_0 = r_s + r_d, which is 0 since neither is given.'],
    ['  r_s: 0.5 ohm\n', 'Q1: the series part of both R_DSon rows is taken as R_0 = r_s + r_d.'],
  ])('two rows of R_DSon, their series part: %j', (more, text) => {
    expect(texts(sheetOf('n-MOSFET', `Q1 = n-MOSFET\n${rowsOf(ROWS.slice(0, 2))}${more}`))).toContain(text);
  });

  it('a C_GD of a MOSFET, which the junction law fits roughly', () => {
    const rough = 'C_GD of a MOSFET is taken to follow the junction law, which is rough.';
    const law = { 'n-MOSFET': 'V_TO: 2 V\n  K: 1 mA/V^2', 'n-JFET': 'I_DSS: 6 mA\n  V_P: -2 V' };
    const listed = (kind: keyof typeof law, more: string): boolean =>
      texts(createSheet(`Q1 = ${kind}\n  ${law[kind]}\n${more}`)).includes(rough);
    expect([listed('n-MOSFET', '  C_rss: 2 pF'), listed('n-MOSFET', '  C_GD: 2 pF')]).toEqual([true, true]);
    expect([listed('n-MOSFET', '  C_iss: 2 pF'), listed('n-JFET', '  C_rss: 2 pF')]).toEqual([false, false]);
  });

  it('nothing where the rows say it themselves', () => {
    const rows = '  I_DSS: 6 mA at V_DS = 15 V\n  V_GSoff: -2 V at I_D = 10 nA\n  lambda: 0.01 /V\n';
    expect(texts(createSheet(`Q1 = n-JFET\n${rows}`)).filter((text) => text.includes('stated'))).toEqual([]);
  });
});

describe('g_fs of a JFET without a current', () => {
  const law = 'Q1 = n-JFET\n  I_DSS: 6 mA\n  V_P: -2 V\n';

  it('is the one at V_GS = 0 and is compared like any other route', () => {
    expect(createSheet(`${law}  g_fs: 6.2 mS`).cautions()).toEqual([]);
    const sheet = createSheet(`${law}  g_fs: 3 mS`);
    expect(sheet.cautions()).toEqual([
      {
        cell: 'Q1',
        line: 3,
        text: 'g_fs0 with I_DSS puts the square-law constant 75 % below I_DSS with V_P: the square law is not supported over that range.',
      },
    ]);
    expect(texts(sheet)).toContain('Q1.g_fs: no I_D is stated; it is taken as g_fs0, at V_GS = 0.');
  });

  it('settles the law where nothing better does', () => {
    const sheet = createSheet('Q1 = n-JFET\n  I_DSS: 6 mA\n  g_fs: 6 mS');
    expect(number(sheet, 'Q1.V_P')).toBeCloseTo(-2, 12);
    expect(sheet.workings('Q1')[0]!.sentence).toBe(
      'g_fs0 with I_DSS settles the law. Q1.g_fs: no I_D is stated; it is taken as g_fs0, at V_GS = 0.',
    );
  });

  it('as a row of limits alone only cuts the set', () => {
    expect(createSheet(`${law}  g_fs: 1 mS .. 2 mS`).cautions()).toEqual([]);
  });
});
