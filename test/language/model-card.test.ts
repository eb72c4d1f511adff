// Model cards in their many spellings, the traps of their suffixes and signs, and the parts that come of them.

import { describe, expect, it } from 'vitest';
import { cardLines, readCardNumeral, readModelCards } from '../../src/language/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';

describe('a number of a card', () => {
  it.each([
    ['2', 2],
    ['-2.2', -2.2],
    ['+.5', 0.5],
    ['1.', 1],
    ['1.5e-3', 1.5e-3],
    ['3E2', 300],
    ['2f', 2e-15],
    ['2.2p', 2.2e-12],
    ['10pF', 10e-12],
    ['4.7n', 4.7e-9],
    ['33u', 33e-6],
    ['1m', 1e-3],
    // The trap: M is milli, whatever its case, and MEG is mega.
    ['1M', 1e-3],
    ['1MEG', 1e6],
    ['1meg', 1e6],
    ['1Megohm', 1e6],
    ['10mA', 10e-3],
    ['1mil', 25.4e-6],
    ['2MIL', 2 * 25.4e-6],
    ['4.7k', 4700],
    ['4.7kohm', 4700],
    ['1g', 1e9],
    ['1T', 1e12],
    // Letters without a suffix of size mean nothing.
    ['12V', 12],
    ['5ohm', 5],
    ['1e3k', 1e6],
    // A femto, not a farad.
    ['1F', 1e-15],
  ])('%s is %f', (text, value) => {
    expect(readCardNumeral(text)?.value).toBe(value);
  });

  it.each(['', 'x', '1,5', '1..2', '{a}', '--1', '1e', 'k'])('%s is none', (text) => {
    // `1e` is a 1 with a letter behind it.
    expect(readCardNumeral(text)?.value ?? null).toBe(text === '1e' ? 1 : null);
  });
});

const CANONICAL = '.model J1 NJF (BETA=1.1m VTO=-2.2 LAMBDA=8m RS=12 CGS=4p)';

describe('the same card', () => {
  const wanted = readModelCards(CANONICAL).cards[0]!;

  it('is read as the rows of a part', () => {
    expect(cardLines(wanted, 'Q1')).toEqual([
      'Q1 = n-JFET',
      '  beta: 1.1 mA/V^2  [model card J1]',
      '  V_TO: -2.2 V  [same]',
      '  lambda: 0.008 /V  [same]',
      '  r_s: 12 ohm  [same]',
      '  C_GS: 4 pF  [same]',
    ]);
  });

  it.each([
    ['without the word in front', 'J1 NJF (BETA=1.1m VTO=-2.2 LAMBDA=8m RS=12 CGS=4p)'],
    ['without brackets', '.model J1 NJF BETA=1.1m VTO=-2.2 LAMBDA=8m RS=12 CGS=4p'],
    ['glued to its bracket', '.model J1 NJF(BETA=1.1m VTO=-2.2 LAMBDA=8m RS=12 CGS=4p)'],
    ['in small letters', '.MODEL J1 njf (beta=1.1M vto=-2.2 lambda=8M rs=12 cgs=4P)'],
    ['with blanks around the signs', '.model J1 NJF ( BETA = 1.1m , VTO = -2.2, LAMBDA= 8m RS =12 CGS=4p )'],
    ['without signs', '.model J1 NJF BETA 1.1m VTO -2.2 LAMBDA 8m RS 12 CGS 4p'],
    ['in another order', '.model J1 NJF (CGS=4p RS=12 VTO=-2.2 LAMBDA=8m BETA=1.1m)'],
    ['over lines that go on', '.model J1 NJF (BETA=1.1m VTO=-2.2\n+ LAMBDA=8m RS=12\n+CGS=4p)'],
    ['over lines in an open bracket', '.model J1 NJF (\n  BETA=1.1m VTO=-2.2\n  LAMBDA=8m\n RS=12 CGS=4p )\n'],
    [
      'with comments',
      '* a JFET\n.model J1 NJF (BETA=1.1m ; best\n* between\n+ VTO=-2.2 LAMBDA=8m $ dull\n+ RS=12 CGS=4p)\n.end',
    ],
    ['with letters behind its suffixes', '.model J1 NJF (BETA=1.1mA VTO=-2.2V LAMBDA=8m RS=12ohm CGS=4pF)'],
    ['with the digit 0 for the letter O', '.model J1 NJF (BETA=1.1m VT0=-2.2 LAMBDA=8m RS=12 CGS=4p)'],
    ['with its level', '.model J1 NJF (LEVEL=1 BETA=1.1m VTO=-2.2 LAMBDA=8m RS=12 CGS=4p)'],
    ['with the line ends of another system', '.model J1 NJF (BETA=1.1m VTO=-2.2\r\n+ LAMBDA=8m RS=12 CGS=4p)\r\n'],
  ])('is read alike %s', (_, text) => {
    const { cards, faults } = readModelCards(text);
    expect(faults).toEqual([]);
    expect(cards).toEqual([wanted]);
  });
});

describe('the signs and kinds of the four types', () => {
  it.each([
    ['NJF', 'BETA=1m VTO=-2', 'n-JFET', { 'Q1.V_P': -2, 'Q1.I_DSS': 4e-3 }],
    // The trap: negative on the card of either channel; a voltmeter shows the pinch-off of a p-channel FET positive.
    ['PJF', 'BETA=1m VTO=-2', 'p-JFET', { 'Q1.V_P': 2, 'Q1.I_DSS': 4e-3 }],
    // beta = (KP / 2)(W / L): half of what the card says.
    ['NMOS', 'KP=20m VTO=1.9 W=4u L=2u', 'n-MOSFET', { 'Q1.K': 20e-3, 'Q1.V_TO': 1.9 }],
    ['NMOS', 'KP=20m VTO=-1', 'n-MOSFET', { 'Q1.K': 10e-3, 'Q1.I_DSS': 10e-3 }],
    ['PMOS', 'KP=20m VTO=-2.5', 'p-MOSFET', { 'Q1.K': 10e-3, 'Q1.V_TO': -2.5 }],
  ])('%s (%s) is a part with these constants', (type, parameters, kind, constants) => {
    const [card] = readModelCards(`.model X ${type} (${parameters})`).cards;
    expect(card!.faults).toEqual([]);
    expect(card!.kind).toBe(kind);
    const sheet = createSheet(`${cardLines(card!, 'Q1').join('\n')}\n`);
    expect(sheet.error('Q1')).toBeNull();
    for (const [path, value] of Object.entries(constants)) {
      expect(Math.abs((sheet.value(path) as number) / value - 1), path).toBeLessThan(1e-12);
    }
  });

  it('every parameter that is taken computes in a part', () => {
    const jfet = '.model X NJF (BETA=1m VTO=-2 LAMBDA=10m RS=5 RD=6 PB=0.7 TNOM=27 CGS=4p CGD=3p M=0.4 VTOTC=-2.5m)';
    const mosfet =
      '.model Y PMOS (KP=20m VTO=-2 LAMBDA=10m RS=5 RD=6 PB=0.7 TNOM=27 GAMMA=0.6 PHI=0.65 CBD=9p MJ=0.4 W=1m L=10u)';
    const [j, m] = readModelCards(`${jfet}\n${mosfet}`).cards;
    const sheet = createSheet(`${[...cardLines(j!, 'Q1'), ...cardLines(m!, 'Q2')].join('\n')}\n`);
    expect([j!, m!].map(({ faults, untaken }) => [faults, untaken])).toEqual([
      [[], []],
      [[], []],
    ]);
    for (const name of ['Q1', 'Q2']) expect(sheet.error(name)).toBeNull();
    expect(sheet.value('Q1.T_nom')).toBeCloseTo(300.15, 9);
    expect(sheet.value('Q1.tempco')).toBe(-2.5e-3);
    expect(sheet.value('Q2.gamma')).toBe(0.6);
  });
});

describe('what no part has', () => {
  it('is listed by name, with its value and what it would have meant', () => {
    const [card] = readModelCards('.model X NJF (BETA=1m VTO=-2 KF=1e-17 AF=1 FANCY=7)').cards;
    expect(card!.untaken.map(({ name, value }) => [name, value])).toEqual([
      ['KF', '1e-17'],
      ['AF', '1'],
      ['FANCY', '7'],
    ]);
    expect(card!.untaken[0]!.meaning).toMatch(/flicker noise/);
    expect(card!.untaken[2]!.meaning).toBe('nothing that is known of level 1');
    expect(card!.faults).toEqual([]);
  });

  it.each([
    ['RS=1M', 'RS=1M is in milliohms: on a card M is milli, and MEG is mega.'],
    ['CGS=5F', 'CGS=5F is in femtofarads: on a card F is femto.'],
  ])('%s is pointed out', (parameter, text) => {
    expect(readModelCards(`.model X NJF (BETA=1m VTO=-2 ${parameter})`).cards[0]!.remarks).toEqual([text]);
  });
});

describe('a MOSFET card', () => {
  const remarks = (card: string) => readModelCards(card).cards[0]!.remarks;

  it('whose VTO has the sign of depletion says so', () => {
    expect(remarks('.model X PMOS (KP=1m VTO=2 W=1u L=1u)')).toEqual([
      'VTO=2 makes it a depletion p-MOSFET, which conducts at V_GS = 0. That of an enhancement p-MOSFET is negative.',
    ]);
    expect(remarks('.model X NMOS (KP=1m VTO=-2 W=1u L=1u)')).toEqual([
      'VTO=-2 makes it a depletion n-MOSFET, which conducts at V_GS = 0. That of an enhancement n-MOSFET is positive.',
    ]);
    expect(remarks('.model X PMOS (KP=1m VTO=-2 W=1u L=1u)')).toEqual([]);
  });

  it('without W and L says what is taken', () => {
    expect(remarks('.model X NMOS (KP=1m VTO=2)')).toEqual([
      'The card has no W and no L: W / L is taken as 1, so K is KP / 2.',
    ]);
  });

  it('with W in millimetres says so', () => {
    expect(remarks('.model X NMOS (KP=1m VTO=2 W=1M L=2u)')).toEqual([
      'W=1M is in millimetres: on a card M is milli, not the metre.',
    ]);
  });
});

describe('a value of 0', () => {
  const rows = (card: string) => readModelCards(card).cards[0]!.fields;

  it('is kept where it is a number like others: M = 0 is a constant capacitance', () => {
    expect(rows('.model X NJF (BETA=1m VTO=-2 LAMBDA=0 CGS=4p M=0)')).toEqual([
      'beta: 1 mA/V^2',
      'V_TO: -2 V',
      'lambda: 0 /V',
      'C_GS: 4 pF',
      'M: 0',
    ]);
  });

  it('of a resistance, capacitance or gamma is none, and leaves the row out', () => {
    expect(rows('.model X NMOS (KP=1m VTO=2 RS=0 RD=0 CBD=0 GAMMA=0)')).toEqual(['K_P: 1 mA/V^2', 'V_TO: 2 V']);
  });
});

it('a number comes into the part as the very number of the card', () => {
  const random = createDraw(17);
  for (let k = 0; k < 300; k++) {
    const digits = `${1 + Math.floor(random() * 9)}.${String(Math.floor(random() * 1e9)).padStart(9, '0')}`;
    const suffix = ['f', 'p', 'n', 'u', 'm', '', 'k', 'meg'][Math.floor(random() * 8)]!;
    const [card] = readModelCards(
      `X NJF BETA=${digits}${suffix} VTO=-${digits}${suffix} RS=${digits}${suffix} CGS=${digits}${suffix}`,
    ).cards;
    const sheet = createSheet(`${cardLines(card!, 'Q1').join('\n')}\n`);
    const value = readCardNumeral(`${digits}${suffix}`)!.value;
    const read = ['beta', 'V_TO', 'r_s', 'C_GS'].map((name) => sheet.value(`Q1.${name}`));
    expect(read, `${digits}${suffix}`).toEqual([value, -value, value, value]);
  }
});

it('whatever is pasted is read to the end without an exception, and what a sound card becomes is a part', () => {
  const random = createDraw(23);
  const pieces = [
    '.model',
    'X',
    'NJF',
    'pmos',
    'BETA',
    'KP',
    'VTO',
    'M',
    'LEVEL',
    '=',
    '(',
    ')',
    '+',
    '\n+',
    '\n',
    ' ',
    ',',
    '1m',
    '-2',
    '1e',
    '{',
    '}',
    '*',
    ';',
    '$',
    '[',
    ']',
    "'",
    '2MEG',
    'RS',
  ];
  const begins = ['', 'X NJF BETA=1m VTO=-2 ', '.model X PMOS (KP=1m VTO=-2 '];
  let sound = 0;
  for (let k = 0; k < 2000; k++) {
    const some = Array.from({ length: 8 }, () => pieces[Math.floor(random() * pieces.length)]);
    const text = begins[k % 3]! + some.join(random() < 0.5 ? ' ' : '');
    for (const card of readModelCards(text).cards.filter(({ faults }) => faults.length === 0)) {
      sound++;
      expect(createSheet(`${cardLines(card, 'Q').join('\n')}\n`).error('Q'), text).toBeNull();
    }
  }
  expect(sound).toBeGreaterThan(100);
});

describe('what cannot be read says where, what and what would be right', () => {
  it.each([
    ['hello', '1:1 hello begins no model card. Write a card as .model NAME NJF (BETA=1m VTO=-2).'],
    ['.model X NPN (BF=100)', '1:10 NPN is no type that is read here. Types are NJF, PJF, NMOS and PMOS.'],
    [
      '.model X NJF (BETA=1m VTO=-2 LEVEL=2)',
      '1:36 LEVEL 2 is another model. Cards of level 1 are read, the square law.',
    ],
    ['.model X NJF (VTO=-2)', '1:1 The card has no BETA, and without it there is no law. Add BETA to the card.'],
    ['.model X NMOS (KP=1m)', '1:1 The card has no VTO, and without it there is no law. Add VTO to the card.'],
    [
      '.model X NJF (BETA=1m\n+ VTO=2)',
      '2:3 VTO of a JFET is negative on the card of either channel. Write VTO=-2 for a pinch-off voltage of 2 V.',
    ],
    ['.model X PJF (BETA=-1m VTO=-2)', '1:15 BETA is not negative on a card of either channel.'],
    ['.model X NMOS (KP=1m VTO=2 W=1m)', '1:28 W counts only with L. Write both, or neither for W / L = 1.'],
    [
      '.model X NJF (BETA=1m VTO=-2 PB=0)',
      '1:30 PB is 0 and has to be above it. Leave it out for the value that a part takes without it.',
    ],
    ['.model X NJF (BETA=1m VTO=-2 TNOM=-300)', '1:30 TNOM is in °C and lies above absolute zero, as in TNOM=27.'],
    ['.model X NJF (BETA=0 VTO=-2)', '1:15 BETA is 0: such a FET carries no current.'],
    ['.model X NJF (BETA={b} VTO=-2)', '1:20 BETA is a formula here, {b}. Write its number, such as 1.2m or 3e-12.'],
    ['.model X NJF (BETA=abc VTO=-2)', '1:20 BETA is no number here, abc. Write its number, such as 1.2m or 3e-12.'],
    ['.model X NJF (BETA=1m VTO=-2 RS)', '1:30 RS has no value. Write it behind, such as RS=1m.'],
    ['.model X NJF (BETA=1m VTO= RS=2)', '1:23 VTO has no value. Write it behind, such as VTO=1m.'],
    ['.model X NJF (BETA=1m VTO=-2 BETA=2m)', '1:30 BETA stands twice. Leave one of them.'],
    ['.model X NJF (BETA=1m VTO=-2 7=3)', '1:30 7 is no parameter. A card has pairs such as VTO=-2.'],
  ])('%s', (text, wanted) => {
    const { cards, faults } = readModelCards(text);
    const said = [...faults, ...cards.flatMap((card) => card.faults)].map(
      ({ line, column, text: words }) => `${line}:${column} ${words}`,
    );
    expect(said).toContain(wanted);
  });
});

it('several cards are read one by one', () => {
  const { cards, faults } = readModelCards(
    `${CANONICAL}\n.model M1 PMOS (KP=1m VTO=-2)\n\n.model M2 NMOS KP=2m VTO=1\n.ends\n`,
  );
  expect(faults).toEqual([]);
  expect(cards.map(({ name, kind }) => `${name} ${kind}`)).toEqual(['J1 n-JFET', 'M1 p-MOSFET', 'M2 n-MOSFET']);
});
