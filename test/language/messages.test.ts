// Every message of the language with the text it is about: code, sheet, line and column, whole words.

import { expect, test } from 'vitest';
import { lineColumn, parseSheet } from '../../src/language/index.ts';
import type { Line, Message } from '../../src/language/index.ts';
import { MESSAGE_CODES } from '../../src/language/messages.ts';

/** The messages of a sheet in the order of its lines. */
function messagesOf(text: string): { line: Line; message: Message }[] {
  const { cells, loose } = parseSheet(text);
  const found = [...loose];
  for (const { entry, line, fields } of cells) {
    if (entry.type === 'broken') found.push({ line, message: entry.message });
    for (const { body, line: below } of fields)
      if (body.type === 'broken') found.push({ line: below, message: body.message });
  }
  return found.toSorted((a, b) => a.line.index - b.line.index);
}

const CASES: readonly (readonly [code: string, sheet: string, line: number, column: number, text: string])[] = [
  ['character-unknown', 'x = 5 $ 3', 1, 7, '$ has no meaning here.'],
  [
    'remark-mark',
    'x = 15 V # supply rail',
    1,
    10,
    '# begins no remark here: a remark stands behind ;, as in ; supply rail.',
  ],
  [
    'remark-mark',
    'x = 15 V // main supply [a]',
    1,
    10,
    '// begins no remark here: a remark stands behind ;, as in ; main supply.',
  ],
  [
    'remark-mark',
    'Q1 = n-JFET\n  V_P: -2 V # typ',
    2,
    13,
    '# begins no remark here: a remark stands behind ;, as in ; typ.',
  ],
  [
    'remark-mark',
    'Q1 = n-JFET\n  V_P: -2 V // as measured',
    2,
    13,
    '// begins no remark here: a remark stands behind ;, as in ; as measured.',
  ],
  ['character-unknown', 'x = 15 V #', 1, 10, '# has no meaning here.'],
  [
    'operator-missing',
    'x = R_1 R_2 // R_3 R_4',
    1,
    5,
    'An operator is missing between R_1 and R_2: write R_1 * R_2 for a product.',
  ],
  ['unit-mega', 'x = 1 meg', 1, 5, 'meg is no unit: mega is M here and stands before one, as in 1 Mohm or 1 MHz.'],
  ['unit-mega', 'x = 1 Meg', 1, 5, 'Meg is no unit: mega is M here and stands before one, as in 1 Mohm or 1 MHz.'],
  ['unit-mega', 'x = 2.2MEG', 1, 5, 'MEG is no unit: mega is M here and stands before one, as in 2.2 Mohm or 2.2 MHz.'],
  ['operator-spelling', 'x = 5 — 3', 1, 7, '— is no operator here: write -.'],
  ['operator-spelling', 'x = a ** 2', 1, 7, '** is no operator here: write ^.'],
  ['operator-spelling', 'c = check a == b', 1, 13, '== is no operator here: write =.'],
  ['operator-spelling', 'x = 1 V ... 5 V', 1, 9, '... is no operator here: write two dots.'],
  ['decimals-missing', 'x = 5. V', 1, 5, '5. has no digit behind its point: write 5.0.'],
  ['whole-part-missing', 'x = .5 V', 1, 5, 'The number has no digit before its point: write 0.5.'],
  [
    'number-range',
    'x = 1e999 V',
    1,
    5,
    '1e999 is too large or too small to be computed with: magnitudes lie between 1e-323 and 1e308.',
  ],
  [
    'number-range',
    'x = 1e-999 V',
    1,
    5,
    '1e-999 is too large or too small to be computed with: magnitudes lie between 1e-323 and 1e308.',
  ],
  [
    'decimal-comma',
    'x = 3,3 kohm',
    1,
    5,
    '3,3 has a comma between its digits: write 3.3 for one number, or 3, 3 for two.',
  ],
  ['digits-grouped', 'x = 10 000 ohm', 1, 5, '10 000 has a blank between its digits: write 10000.'],
  ['code-decimals', 'x = 4.7k', 1, 5, '4.7k mixes a decimal point with the letter of a code: write 4k7 or 4.7 kohm.'],
  ['code-decimals', 'x = 4.7n', 1, 5, '4.7n mixes a decimal point with the letter of a code: write 4n7 or 4.7 nF.'],
  [
    'code-blank',
    'x = 47 k',
    1,
    5,
    '47 k is a code with a blank in it, or a number without its unit: write 47k or 47 kohm.',
  ],
  [
    'code-letter',
    'x = 4m7',
    1,
    5,
    '4m7 is no code: m does not stand for a decimal point. R, k, M, G do in ohms, p, n, u in farads.',
  ],
  [
    'code-end',
    'x = 4k7x',
    1,
    5,
    '4k7x is neither a number nor a code such as 4k7 or 10p: letters or digits follow where it should end.',
  ],
  ['code-with-unit', 'x = 4k7 ohm', 1, 5, '4k7 ohm names its unit twice: 4k7 alone already is a resistance.'],
  ['code-with-unit', 'x = 10p/V', 1, 5, '10p/V names its unit twice: 10p alone already is a capacitance.'],
  ['character-unknown', 'x = 5 \u2003V', 1, 7, 'U+2003 has no meaning here.'],
  [
    'row-without-bench',
    'Q1 = n-JFET\n  -1, 5',
    2,
    3,
    'This reads as a row of numbers: rows stand below the line columns: of a bench, and nowhere else.',
  ],
  ['unit-unknown', 'x = 3kOhm', 1, 6, 'kOhm is no unit: write 3 kohm.'],
  ['unit-unknown', 'x = 3blub', 1, 6, 'blub is no unit: write 3 * blub for a product.'],
  [
    'unit-glued',
    'x = 10 V/R_D',
    1,
    5,
    '10 V/R_D has no blanks around its operator, so it reads as one unit, and it is none: write 10 V / R_D.',
  ],
  [
    'unit-glued',
    'x = 10 V/2',
    1,
    5,
    '10 V/2 has no blanks around its operator, so it reads as one unit, and it is none: write 10 V / 2.',
  ],
  [
    'unit-glued',
    'x = 10 V*R_D',
    1,
    5,
    '10 V*R_D has no blanks around its operator, so it reads as one unit, and it is none: write 10 V * R_D.',
  ],
  [
    'unit-glued',
    'x = 10 V/ (a + b)',
    1,
    5,
    '10 V/ (a + b) has no blanks around its operator, so it reads as one unit, and it is none: write 10 V / (a + b).',
  ],
  ['unit-blank', 'x = 10 V /A', 1, 5, '10 V /A has a blank inside its unit: write 10 V/A.'],
  [
    'unit-power',
    'x = 10 V ^ 2',
    1,
    5,
    '10 V ^ 2 can be read in two ways: write (10 V)^2 for the power of the quantity, or 10 V^2 for a power in the unit.',
  ],
  ['unit-power', 'x = 10 V^x', 1, 5, '10 V^x raises a quantity without parentheses: write (10 V)^x.'],
  ['unit-power', 'x = 4k7²', 1, 5, '4k7² raises a quantity without parentheses: write (4k7)^2.'],
  ['unit-without-number', 'x = y /V', 1, 8, 'V is a unit and stands only behind a number: write 1 V.'],
  ['unit-missing', 'x = 5 mV as', 1, 12, 'A unit is missing here, such as kohm or mA/V^2.'],
  ['unit-form', 'x = 5 mV as V/R', 1, 15, 'R is not a unit known here. Write ohm.'],
  ['unit-form', 'x = 5 dB/V + 1', 1, 7, 'dB takes no other unit beside it, so dB/V is not a unit. Write dB.'],
  [
    'operand-missing',
    'x = 5 *',
    1,
    8,
    'The place behind * lacks a value: a number, a name or a parenthesis belongs there.',
  ],
  ['operand-missing', 'x = * 5', 1, 5, 'This place lacks a value: a number, a name or a parenthesis belongs there.'],
  [
    'operand-missing',
    'x = f(1,)',
    1,
    9,
    'The place behind , lacks a value: a number, a name or a parenthesis belongs there.',
  ],
  ['operator-missing', 'x = 3 R_D', 1, 5, 'An operator is missing between 3 and R_D: write 3 * R_D for a product.'],
  [
    'operator-missing',
    'x = R_D R_S',
    1,
    5,
    'An operator is missing between R_D and R_S: write R_D * R_S for a product.',
  ],
  [
    'operator-missing-plain',
    'x = (a) (b)',
    1,
    7,
    'An operator is missing between these two values: write * for a product.',
  ],
  ['operator-missing-unit', 'x = 3 ohms', 1, 5, 'ohms is no unit: write 3 ohm, or 3 * ohms for a product.'],
  ['word-as-value', 'x = 5 + at', 1, 9, "at is a word of the sheet's language and cannot stand for a value."],
  ['word-as-value', 'x = if', 1, 5, "if is a word of the sheet's language and cannot stand for a value."],
  ['parenthesis-open', 'x = (1 + 2', 1, 5, 'This parenthesis is never closed: a ) is missing.'],
  ['parenthesis-open', 'x = f(1, 2', 1, 6, 'This parenthesis is never closed: a ) is missing.'],
  ['parenthesis-extra', 'x = 1)', 1, 6, 'This ) closes nothing: its ( is missing.'],
  ['path-name-missing', 'x = A1. I_D', 1, 7, 'A name is missing behind the dot of A1, as in A1.I_D.'],
  ['path-name-missing', 'x = A1.5', 1, 7, 'A name is missing behind the dot of A1, as in A1.I_D.'],
  ['operator-missing', 'x = 1 1 x1', 1, 5, 'An operator is missing between 1 and 1: write 1 * 1 for a product.'],
  [
    'number-length',
    `x = ${'1'.repeat(101)}`,
    1,
    5,
    'This number has more than 100 digits; no measured value has so many.',
  ],
  ['comparison-chained', 'c = check 0 V < a < 5 V', 1, 19, 'Comparisons do not chain: write 0 V < a and a < 5 V.'],
  [
    'comparison-chained-within',
    'c = check a within 1 .. 2 < 3',
    1,
    27,
    'Comparisons do not chain: write two of them with and between, as in a within 1 .. 2 and b > 0.',
  ],
  [
    'comparison-misplaced',
    'x = a >= b',
    1,
    7,
    '>= belongs to a condition and this entry is a quantity: conditions stand in a check, as in check a >= b, or in if(a >= b, c, d).',
  ],
  [
    'comparison-misplaced',
    'x = a and b',
    1,
    7,
    'and belongs to a condition and this entry is a quantity: conditions stand in a check, as in check a >= b, or in if(a >= b, c, d).',
  ],
  [
    'range-missing',
    'c = check a within 5',
    1,
    13,
    'within wants two ends with .. between them, as in within 4 .. 12 or within 5 mA ± 10 %.',
  ],
  [
    'range-missing',
    'c = check a within 1 ..',
    1,
    13,
    'within wants two ends with .. between them, as in within 4 .. 12 or within 5 mA ± 10 %.',
  ],
  [
    'tolerance-kind',
    'c = check a within 5 mA ± 1 V',
    1,
    27,
    '1 V, a voltage, cannot be a tolerance of 5 mA, a current: it has to be of the same kind, or a percentage.',
  ],
  ['with-form', 'x = a with b', 1, 7, 'Behind with stands one input and its setting, as in A1.A_v with V_C = -8 V.'],
  [
    'nested-too-deep',
    `x = ${'('.repeat(101)}1`,
    1,
    106,
    'This is nested more than 100 deep: give a part of it a cell of its own.',
  ],
  [
    'expression-too-long',
    `x = 1${' + 1'.repeat(1001)}`,
    1,
    4007,
    'This expression has more than 1000 operators: give a part of it a cell of its own.',
  ],
  ['limit-not-literal', 'x = 5 V ± R_D', 1, 11, 'R_D is no number: limits and tolerances are written as numbers.'],
  [
    'operand-missing',
    'x = 5 V ±',
    1,
    10,
    'The place behind ± lacks a value: a number, a name or a parenthesis belongs there.',
  ],
  ['limit-not-literal', 'x = R_D .. 5 V', 1, 5, 'R_D is no number: limits and tolerances are written as numbers.'],
  ['range-missing', 'x = 5 V in 3 V', 1, 9, 'in wants two ends with .. between them, as in 5 mA in 2 mA .. 9 mA.'],
  [
    'bounds-empty',
    'x = ..',
    1,
    5,
    'Both limits are missing here: at least one end stands beside .., as in 5 mA .. or .. 1 nA.',
  ],
  [
    'law-without-spread',
    'x = 5 V uniform',
    1,
    9,
    'uniform says how a spread is distributed and there is none before it, as in 15 V ± 5 % uniform.',
  ],
  ['law-order', 'x = 5 V ± 1 % service normal', 1, 23, 'service stands behind the law: write normal service.'],
  [
    'spread-order',
    'x = 5 V at I_D = 3 mA ± 5 %',
    1,
    23,
    '± stands too late: value, spread, law, condition, unit come in this order, as in 5 mA ± 10 % at V_DS = 15 V as mA.',
  ],
  [
    'spread-order',
    'x = 5 V as mV at I_D = 3 mA',
    1,
    15,
    'at stands too late: value, spread, law, condition, unit come in this order, as in 5 mA ± 10 % at V_DS = 15 V as mA.',
  ],
  [
    'spread-twice',
    'x = 5 V ± 1 % in 3 V .. 4 V',
    1,
    15,
    'in gives a second spread: a quantity has one, either ± or limits.',
  ],
  ['condition-form', 'x = 5 V at I_D', 1, 15, 'A condition names a quantity and its number, as in at V_DS = 15 V.'],
  ['entry-missing', 'x =', 1, 1, 'x has no entry: a value or a kind of cell belongs behind =.'],
  ['entry-missing', 'x = ; note only', 1, 1, 'x has no entry: a value or a kind of cell belongs behind =.'],
  ['leftover', 'x = 5 V over 3', 1, 9, 'over cannot stand behind 5 V.'],
  ['leftover', 'x = bench of Q1', 1, 11, 'of cannot stand behind bench.'],
  ['name-missing', 'x = another', 1, 12, 'The name of the cell to repeat is missing here, as in another R_Da.'],
  ['leftover', 'x = another Q1 Q2', 1, 16, 'Q2 cannot stand behind Q1.'],
  ['name-missing', 'x = point Q1', 1, 11, 'The word of is missing here, as in point of Q1.'],
  [
    'name-missing',
    'x = stage of Q1, Q2',
    1,
    14,
    'A name of its own for each FET is missing here, as in stage of Qa = Q1, Qb = Q1.',
  ],
  [
    'name-missing',
    'x = stage of Qa = Q1, Q2',
    1,
    25,
    'The part of this FET is missing here, as in stage of Qa = Q1, Qb = Q1.',
  ],
  ['part-spelling', 'x = n-jfet', 1, 5, 'n-jfet is no kind of part: write n-JFET.'],
  ['part-spelling', 'x = MOSFET', 1, 5, 'MOSFET is no kind of part: write n-MOSFET or p-MOSFET.'],
  ['name-missing', 'x = n-JFET fitted M1', 1, 19, 'The word to is missing here, as in n-JFET fitted to M1.'],
  [
    'figure-unknown',
    'x = plot transfr of A1',
    1,
    10,
    'transfr is no figure. Did you mean transfer? The figures are transfer, output, response, noise, bench and spread.',
  ],
  ['name-missing', 'x = plot transfer A1', 1, 19, 'The word of is missing here, as in plot transfer of A1.'],
  [
    'plot-form',
    'x = plot A1.I_D',
    1,
    5,
    'A plot is a figure, as in plot transfer of A1, or values against an input, as in plot A1.I_D against R_S over 100 ohm .. 10 kohm.',
  ],
  [
    'range-missing',
    'x = plot A1.I_D against R_S',
    1,
    25,
    'against wants two ends with .. between them, as in against R_S over 100 ohm .. 10 kohm.',
  ],
  [
    'range-missing',
    'x = plot A1.I_D against R_S over 5',
    1,
    29,
    'over wants two ends with .. between them, as in over 100 ohm .. 10 kohm.',
  ],
  [
    'inverse-form',
    'x = R_S such that a > 5 over 1 .. 2',
    1,
    21,
    'An inverse cell reads INPUT such that TARGET = VALUE over LOW .. HIGH, as in R_S such that A1.I_D = 1 mA over 100 ohm .. 10 kohm.',
  ],
  [
    'inverse-input',
    'x = 2 * R_S such that a = b over 1 .. 2',
    1,
    5,
    '2 * R_S is no input: before such that stands the name of one, as in R_S or Q1.V_P.',
  ],
  [
    'log-misplaced',
    'x = R_S such that a = b over 1 .. 2 log',
    1,
    37,
    'An inverse cell chooses its own steps and takes no log: only the range of a plot does.',
  ],
  [
    'field-without-cell',
    '  gate: R_G to 0 V',
    1,
    3,
    'No cell stands above this field: fields belong to a title, part, point, stage or bench.',
  ],
  [
    'field-of-unread-line',
    '2N = n-JFET\n  I_DSS: 5 mA',
    2,
    3,
    'The cell of this field could not be read: see the line above.',
  ],
  [
    'field-not-taken',
    'x = 5 V\n  a: 5 V',
    2,
    3,
    'The cell above takes no fields: only the title, parts, points, stages and benches have some.',
  ],
  [
    'field-unreadable',
    'x = 5 V\n  (5 V)',
    2,
    3,
    'An indented line is a field, a name with a colon behind it, as in gate: R_G to 0 V.',
  ],
  [
    'field-unreadable',
    'Q1 = n-JFET\n  (I_DSS)',
    2,
    3,
    'An indented line is a field, a name with a colon behind it, as in gate: R_G to 0 V.',
  ],
  [
    'colon-missing',
    'Q1 = n-JFET\n  I_DSS 5 mA',
    2,
    3,
    'I_DSS has no colon behind it: a field reads I_DSS: and its value.',
  ],
  [
    'field-equals',
    'Q1 = n-JFET\n  I_DSS = 5 mA',
    2,
    3,
    'I_DSS has = where a field has a colon: write I_DSS: and its value.',
  ],
  [
    'field-not-indented',
    'Q1 = n-JFET\nI_DSS: 5 mA',
    2,
    1,
    'I_DSS: is a field and stands at the margin: put two blanks before it.',
  ],
  ['field-empty', 'Q1 = n-JFET\n  I_DSS:', 2, 3, 'I_DSS has no value: write I_DSS: 5 mA.'],
  [
    'title-field-unknown',
    '# T\n  projekt: x',
    2,
    3,
    'projekt is no field of the title. Did you mean project? They are project, number, author, checker, revision, reason, status, date, paper, samples, seed, yield and checked.',
  ],
  [
    'title-field-doubled',
    '# T\n  project: x\n  project: y',
    3,
    3,
    'project stands in the title twice: the first one counts, remove the other.',
  ],
  ['field-equals', '# T\n  author = me', 2, 3, 'author has = where a field has a colon: write author: and its value.'],
  [
    'leg-form',
    'A1 = stage of Q1\n  gate: R_G',
    2,
    9,
    'A leg is an element and a place joined by to, as in R_G to 0 V.',
  ],
  [
    'place-missing',
    'A1 = stage of Q1\n  gate: R_G to',
    2,
    13,
    'A place is missing behind to: a terminal, a node, signal, common or a voltage.',
  ],
  [
    'spread-in-leg',
    'A1 = stage of Q1\n  gate: R_G ± 5 % to 0 V',
    2,
    13,
    'A leg carries no spread: give the element a cell of its own, as in R_S = 1 kohm ± 1 %, and name it here.',
  ],
  [
    'output-form',
    'A1 = stage of Q1\n  output: 5 V',
    2,
    11,
    'The output is a place or a difference of two, as in output: drain or output: out_a - out_b.',
  ],
  [
    'driven-form',
    'A1 = stage of Q1\n  driven: R_G',
    2,
    11,
    'driven names the resistor of the source, as in driven: through R_G.',
  ],
  [
    'columns-form',
    'M1 = bench\n  columns: 5',
    2,
    12,
    'Columns are names with their units, as in columns: V_GS [V], I_D [mA].',
  ],
  ['bracket-open', 'M1 = bench\n  columns: a [V', 2, 14, 'This unit is never closed: a ] is missing.'],
  ['unit-form', 'M1 = bench\n  columns: a [foo]', 2, 15, 'foo is not a unit known here.'],
  [
    'bench-field',
    'M1 = bench\n  column: a',
    2,
    3,
    'column is no field of a bench. Did you mean columns? They are columns, V_DS, lambda, exponent, R_thJA, keep, match and fitting.',
  ],
  ['exponent-form', 'M1 = bench\n  exponent: 1.9', 2, 13, 'exponent is the word free, or 2 for the square law.'],
  [
    'keep-form',
    'M1 = bench\n  keep: V_P ± 0.2 V',
    2,
    9,
    'keep names a quantity and the range to stay in, as in keep: V_P in -2.2 V .. -1.8 V or keep: V_GS in -1.2 V .. -0.9 V at I_D = 1 mA.',
  ],
  [
    'bounds-empty',
    'M1 = bench\n  keep: V_P in ..',
    2,
    16,
    'Both limits are missing here: at least one end stands beside .., as in 5 mA .. or .. 1 nA.',
  ],
  [
    'match-form',
    'M1 = bench\n  match: triples at I_D = 1 mA',
    2,
    10,
    'match asks for pairs or quads at a current, with a second one behind and where it matters, as in match: pairs at I_D = 1 mA and 3 mA, V_DS = 5 V.',
  ],
  [
    'condition-form',
    'M1 = bench\n  match: pairs at 1 mA',
    2,
    19,
    'A condition names a quantity and its number, as in at V_DS = 15 V.',
  ],
  [
    'fitting-form',
    'M1 = bench\n  fitting:',
    2,
    11,
    'fitting names the current that each specimen is to carry and its V_DS, as in fitting: I_D = 1 mA, V_DS = 10 V.',
  ],
  [
    'row-gap',
    'M1 = bench\n  -0.5, , 15',
    2,
    9,
    'Place 2 of this row is empty: two commas follow one another. Write what was measured there, or take the row out.',
  ],
  [
    'row-form',
    'M1 = bench\n  1, (2)',
    2,
    6,
    '( is neither a number nor a name: a row of a bench holds these with commas between them, as in -0.5, 2.1, 15.',
  ],
  ['comma-missing', 'M1 = bench\n  1 2', 2, 3, 'A comma is missing between 1 and 2.'],
  [
    'operand-missing',
    'M1 = bench\n  1,',
    2,
    5,
    'The place behind the comma lacks a value: a number, a name or a parenthesis belongs there.',
  ],
  ['name-taken-unit', 'V = 5 V', 1, 1, 'V is a unit and cannot name a cell: write V_1.'],
  ['name-taken-unit', 'µA = 5', 1, 1, 'µA is a unit and cannot name a cell: write µA_1.'],
  ['name-taken-word', 'gate = 5', 1, 1, "gate is a word of the sheet's language and cannot name a cell: write gate_1."],
  ['name-form', 'x.y = 5', 1, 1, 'x.y is no name: a name is a letter, then letters, digits and _, as in R_S or Q1.'],
  ['name-form', 'R S = 5', 1, 1, 'R S is no name: a name is a letter, then letters, digits and _, as in R_S or Q1.'],
  ['equals-missing', 'R_S 5 kohm', 1, 1, 'R_S has no = behind it: a cell reads NAME = entry, as in R_S = 1 kohm.'],
  [
    'colon-for-equals',
    'R_S: 5 kohm',
    1,
    4,
    'R_S has a colon where a cell has =: write R_S = and its entry, or indent the line for a field.',
  ],
  [
    'line-unknown',
    'Sits behind the piezo',
    1,
    1,
    'This line is no cell, which reads NAME = entry. Prose begins with >, a note with ;.',
  ],
  ['heading-blank', '#foo', 1, 1, 'A heading has a blank behind its #: write # foo.'],
  ['heading-level', '### foo', 1, 1, 'There are two levels of heading, # for the title and ## for sections.'],
  ['heading-indented', '  # foo', 1, 3, 'A heading begins at the margin: remove the blanks before it.'],
  ['cell-indented', '  x = 5', 1, 3, 'x begins a cell and stands behind blanks: a cell begins at the margin.'],
  ['source-open', 'x = 5 [abc', 1, 7, 'This source is never closed: a ] is missing.'],
  [
    'source-behind',
    'x = 5 [abc] foo',
    1,
    13,
    'foo stands behind the source, where only a note may follow: put ; before it.',
  ],
  ['character-unknown', 'ΔV = 𝛼 + 5', 1, 6, '𝛼 has no meaning here.'],
];

test.each(CASES)('%s: %s', (code, sheet, line, column, text) => {
  const last = messagesOf(sheet).at(-1)!;
  expect([
    last.message.code,
    last.line.index + 1,
    lineColumn(last.line, last.message.span.start),
    last.message.text,
  ]).toEqual([code, line, column, text]);
});

test('each code occurs in the table', () => {
  const shown = new Set(CASES.map(([code]) => code));
  expect(MESSAGE_CODES.filter((code) => !shown.has(code))).toEqual([]);
});

test.each(CASES)('the message is a whole sentence without blame: %s, %s', (_code, _sheet, _line, _column, text) => {
  expect(text).toMatch(/[.]$/);
  expect(text).not.toMatch(/\b(?:error|invalid|oops|please|illegal)\b/i);
});

test('a span covers what is wrong, in UTF-16 units of its own line', () => {
  const spanned = (sheet: string): string[] =>
    messagesOf(sheet).map(({ line, message }) => line.text.slice(message.span.start, message.span.end));
  expect(spanned('# 𝛼\nx = 10 V/R_D + 3')).toEqual(['10 V/R_D']);
  expect(spanned('x = 3,3 kohm')).toEqual(['3,3']);
  expect(spanned('x = 5 + V')).toEqual(['V']);
  expect(spanned('x = 5 *')).toEqual(['']);
  expect(spanned('V = 5 V ; 𝛼')).toEqual(['V']);
});

test('a broken line keeps its text and breaks no other', () => {
  const sheet = parseSheet('a = 1 V\nb = 10 V/R [src] ; note\nc = 2 V\n');
  expect(sheet.cells.map((cell) => cell.entry.type)).toEqual(['quantity', 'broken', 'quantity']);
  const { entry, source, note, line } = sheet.cells[1];
  expect(line.text.slice(entry.span.start, entry.span.end)).toBe('10 V/R');
  expect([source?.text, note?.text]).toEqual(['src', 'note']);
});
