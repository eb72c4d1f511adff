import { describe, expect, it } from 'vitest';
import { CURRENT, knownUnit, PLAIN, POWER, VOLTAGE } from '../../src/quantity/index.ts';
import { checkText, proseParts, reserveText, shownCell, verdictOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';

function verdict(text: string): { state: string; sentence: string } {
  const { state, sentence } = verdictOf(createSheet(text));
  return { state, sentence };
}

describe('what a check says', () => {
  const V = knownUnit('V');
  it.each([
    [0.4, '0.40 V to spare'],
    [0.4099, '0.40 V to spare'],
    [0.0429, '0.042 V to spare'],
    [35.69, '35.6 V to spare'],
    [-1.788, '1.79 V short'],
    [-1.7801, '1.79 V short'],
    [-0.0401, '0.041 V short'],
    [-1e-9, '1.00 nV short'],
  ])('rounds %d V to spare down and short up: %s', (reserve, text) => {
    expect(reserveText(reserve, VOLTAGE, V)).toBe(text);
  });

  it('speaks in the unit of the limit, else with a prefix of its own', () => {
    expect(reserveText(0.00014, CURRENT, knownUnit('mA'))).toBe('0.14 mA to spare');
    expect(reserveText(0.0356, POWER, knownUnit('mW'))).toBe('35.6 mW to spare');
    expect(reserveText(0.0356, POWER, null)).toBe('35.6 mW to spare');
    expect(reserveText(-0.49, PLAIN, null)).toBe('0.49 short');
  });

  it.each([
    ['x = check 3 V >= 2.6 V', 'holds, 0.40 V to spare'],
    ['x = check 0.211 V >= 2 V', 'fails, 1.79 V short'],
    ['x = check 2 V >= 2 V', 'holds, nothing to spare'],
    ['x = check 2 V > 2 V', 'fails, exactly at the limit'],
    ['x = check 9.76 within 6 .. 14', 'holds, 3.76 to spare'],
    ['x = check 3 mA <= 2.5 mA or 1 V > 2 V', 'fails'],
    ['x = check 3 mA <= 2.5 mA or 1 A < 500 mA', 'fails, 0.50 mA short'],
  ])('%s %s', (line, text) => {
    expect(checkText(createSheet(line).cell('x')!)).toBe(text);
  });
});

describe('the verdict', () => {
  it('is good where all checks hold', () => {
    expect(verdict('a = check 3 V > 2 V\nb = check 1 < 2')).toEqual({
      state: 'holds',
      sentence: 'All 2 checks hold at the nominal values.',
    });
    expect(verdict('headroom = check 3 V > 2 V').sentence).toBe(
      'The only check, headroom, holds at the nominal values.',
    );
  });

  it('names the first check that fails and by how much', () => {
    expect(verdict('a = check 3 V > 2 V\nb = check 1 V > 2 V\nc = check 1 V > 5 V')).toEqual({
      state: 'fails',
      sentence: '1 of 3 checks holds at the nominal values. b fails, 1.00 V short.',
    });
  });

  it('counts broken cells first and is incomplete whatever the checks say', () => {
    expect(verdict('a = check 3 V > 2 V\nR_1 = 1 kohm +\nR_2 = R_1 / 2\n?')).toEqual({
      state: 'incomplete',
      sentence:
        '2 cells are broken: R_1, line 4. 1 cell has no value: R_2. The only check, a, holds at the nominal values.',
    });
  });

  it('is not good where a check has no verdict', () => {
    const { state, sentence } = verdict('a = check 3 V > 2 V\nb = check nowhere > 2 V');
    expect(state).toBe('incomplete');
    expect(sentence).toBe('1 cell is broken: b. 1 of 2 checks holds at the nominal values.');
  });

  it('says that nothing is required', () => {
    expect(verdict('R_1 = 1 kohm')).toEqual({
      state: 'nothing required',
      sentence: 'Nothing is required of this sheet yet.',
    });
    expect(verdict('').state).toBe('nothing required');
  });
});

describe('values as shown', () => {
  it.each([
    ['x = 1.2345 kohm', '1.2345 kΩ'],
    ['x = 1.2 kohm ± 1 %', '1.2 kΩ'],
    ['x = 4k7', '4.7 kΩ'],
    ['x = 2 * 1.2345 kohm', '2.47 kΩ'],
    ['x = 2 * 5 V', '10 V'],
    ['x = 1 V / 3', '333 mV'],
    ['x = 10 kohm as ohm', '10\u2009000 Ω'],
    ['x = -5 V', '−5 V'],
    ['x = 1 ohm / 0', '∞'],
  ])('%s is shown as %s', (line, text) => {
    expect(shownCell(createSheet(line).cell('x')!)).toBe(text);
  });
});

describe('sentences', () => {
  it('set their quantities and leave the rest as it is', () => {
    expect(proseParts('A1.I_D has no upper limit: I_DSS of Q1, see p. 2.', null)).toEqual([
      { type: 'name', text: 'A1.I_D', tex: 'I_{\\mathrm{D},\\,\\mathrm{A1}}' },
      { type: 'text', text: ' has no upper limit: ' },
      { type: 'name', text: 'I_DSS', tex: 'I_{\\mathrm{DSS}}' },
      { type: 'text', text: ' of Q1, see p. 2.' },
    ]);
  });
});
