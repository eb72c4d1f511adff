// Every message of the language: its stable code and its words. Texts are made here and nowhere else.
// The subject comes first, then what is wrong, then what would be right.

import type { Message, Span } from './syntax.ts';

const either = (names: readonly string[]): string => names.join(' or ');
const meant = (names: readonly string[]): string => (names.length > 0 ? ` Did you mean ${either(names)}?` : '');

const TEXTS = {
  // Characters and numbers
  'character-unknown': (found: string) => `${found} has no meaning here.`,
  'remark-mark': (mark: string, remark: string) =>
    `${mark} begins no remark here: a remark stands behind ;, as in ; ${remark}.`,
  'decimals-missing': (found: string, right: string) => `${found} has no digit behind its point: write ${right}.`,
  'whole-part-missing': (right: string) => `The number has no digit before its point: write ${right}.`,
  'number-range': (found: string) =>
    `${found} is too large or too small to be computed with: magnitudes lie between 1e-323 and 1e308.`,
  'number-length': (most: number) => `This number has more than ${most} digits; no measured value has so many.`,
  'decimal-comma': (found: string, point: string, two: string) =>
    `${found} has a comma between its digits: write ${point} for one number, or ${two} for two.`,
  'digits-grouped': (found: string, right: string) => `${found} has a blank between its digits: write ${right}.`,
  'code-decimals': (found: string, code: string, unit: string) =>
    `${found} mixes a decimal point with the letter of a code: write ${code} or ${unit}.`,
  'code-blank': (found: string, code: string, unit: string) =>
    `${found} is a code with a blank in it, or a number without its unit: write ${code} or ${unit}.`,
  'code-letter': (found: string, letter: string) =>
    `${found} is no code: ${letter} does not stand for a decimal point. R, k, M, G do in ohms, p, n, u in farads.`,
  'code-end': (found: string) =>
    `${found} is neither a number nor a code such as 4k7 or 10p: letters or digits follow where it should end.`,
  'code-with-unit': (found: string, code: string, kind: string) =>
    `${found} names its unit twice: ${code} alone already is ${kind}.`,

  // Units
  'unit-unknown': (left: string, found: string, right: string | null) =>
    `${found} is no unit: write ${right ? `${left} ${right}` : `${left} * ${found} for a product`}.`,
  'unit-mega': (left: string, found: string) =>
    `${found} is no unit: mega is M here and stands before one, as in ${left} Mohm or ${left} MHz.`,
  'unit-glued': (found: string, right: string) =>
    `${found} has no blanks around its operator, so it reads as one unit, and it is none: write ${right}.`,
  'unit-blank': (found: string, right: string) => `${found} has a blank inside its unit: write ${right}.`,
  'unit-power': (found: string, group: string, glued: string | null) =>
    glued
      ? `${found} can be read in two ways: write ${group} for the power of the quantity, or ${glued} for a power in the unit.`
      : `${found} raises a quantity without parentheses: write ${group}.`,
  'unit-without-number': (found: string) => `${found} is a unit and stands only behind a number: write 1 ${found}.`,
  'unit-missing': () => 'A unit is missing here, such as kohm or mA/V^2.',
  'unit-form': (sentence: string) => sentence,

  // Expressions
  'operand-missing': (where: string) => `${where} lacks a value: a number, a name or a parenthesis belongs there.`,
  'operator-missing': (left: string, right: string) =>
    `An operator is missing between ${left} and ${right}: write ${left} * ${right} for a product.`,
  'operator-missing-plain': () => 'An operator is missing between these two values: write * for a product.',
  'operator-missing-unit': (left: string, word: string, unit: string) =>
    `${word} is no unit: write ${left} ${unit}, or ${left} * ${word} for a product.`,
  'word-as-value': (word: string) => `${word} is a word of the sheet's language and cannot stand for a value.`,
  'parenthesis-open': () => 'This parenthesis is never closed: a ) is missing.',
  'parenthesis-extra': () => 'This ) closes nothing: its ( is missing.',
  'path-name-missing': (before: string) => `A name is missing behind the dot of ${before}, as in A1.I_D.`,
  'comparison-chained': (right: string) => `Comparisons do not chain: write ${right}.`,
  'comparison-chained-within': () =>
    'Comparisons do not chain: write two of them with and between, as in a within 1 .. 2 and b > 0.',
  'comparison-misplaced': (found: string) =>
    `${found} belongs to a condition and this entry is a quantity: conditions stand in a check, as in check a >= b, or in if(a >= b, c, d).`,
  'operator-spelling': (found: string, right: string) => `${found} is no operator here: write ${right}.`,
  'range-missing': (where: string, example: string) =>
    `${where} wants two ends with .. between them, as in ${example}.`,
  'with-form': () => 'Behind with stands one input and its setting, as in A1.A_v with V_C = -8 V.',
  'tolerance-kind': (tolerance: string, centre: string) =>
    `${tolerance} cannot be a tolerance of ${centre}: it has to be of the same kind, or a percentage.`,
  'nested-too-deep': (most: number) => `This is nested more than ${most} deep: give a part of it a cell of its own.`,
  'expression-too-long': (most: number) =>
    `This expression has more than ${most} operators: give a part of it a cell of its own.`,

  // Quantities
  'limit-not-literal': (found: string) => `${found} is no number: limits and tolerances are written as numbers.`,
  'bounds-empty': () => 'Both limits are missing here: at least one end stands beside .., as in 5 mA .. or .. 1 nA.',
  'law-without-spread': (word: string) =>
    `${word} says how a spread is distributed and there is none before it, as in 15 V ± 5 % ${word}.`,
  'law-order': (right: string) => `service stands behind the law: write ${right}.`,
  'spread-order': (found: string) =>
    `${found} stands too late: value, spread, law, condition, unit come in this order, as in 5 mA ± 10 % at V_DS = 15 V as mA.`,
  'spread-twice': (found: string) => `${found} gives a second spread: a quantity has one, either ± or limits.`,
  'spread-in-leg': () =>
    'A leg carries no spread: give the element a cell of its own, as in R_S = 1 kohm ± 1 %, and name it here.',
  'condition-form': () => 'A condition names a quantity and its number, as in at V_DS = 15 V.',

  // Entries
  'entry-missing': (name: string) => `${name} has no entry: a value or a kind of cell belongs behind =.`,
  'comma-missing': (left: string, right: string) => `A comma is missing between ${left} and ${right}.`,
  leftover: (found: string, after: string) => `${found} cannot stand behind ${after}.`,
  'name-missing': (what: string, example: string) => `${what} is missing here, as in ${example}.`,
  'part-spelling': (found: string, right: string) => `${found} is no kind of part: write ${right}.`,
  'figure-unknown': (found: string, hints: readonly string[]) =>
    `${found} is no figure.${meant(hints)} The figures are transfer, output, response, noise, bench and spread.`,
  'plot-form': () =>
    'A plot is a figure, as in plot transfer of A1, or values against an input, as in plot A1.I_D against R_S over 100 ohm .. 10 kohm.',
  'inverse-form': () =>
    'An inverse cell reads INPUT such that TARGET = VALUE over LOW .. HIGH, as in R_S such that A1.I_D = 1 mA over 100 ohm .. 10 kohm.',
  'inverse-input': (found: string) =>
    `${found} is no input: before such that stands the name of one, as in R_S or Q1.V_P.`,
  'log-misplaced': () => 'An inverse cell chooses its own steps and takes no log: only the range of a plot does.',

  // Fields and rows
  'field-without-cell': () => 'No cell stands above this field: fields belong to a title, part, point, stage or bench.',
  'field-of-unread-line': () => 'The cell of this field could not be read: see the line above.',
  'field-not-taken': () =>
    'The cell above takes no fields: only the title, parts, points, stages and benches have some.',
  'field-unreadable': (example: string) =>
    `An indented line is a field, a name with a colon behind it, as in ${example}.`,
  'row-without-bench': () =>
    'This reads as a row of numbers: rows stand below the line columns: of a bench, and nowhere else.',
  'field-not-indented': (label: string) => `${label}: is a field and stands at the margin: put two blanks before it.`,
  'colon-missing': (label: string) => `${label} has no colon behind it: a field reads ${label}: and its value.`,
  'field-equals': (label: string) => `${label} has = where a field has a colon: write ${label}: and its value.`,
  'field-empty': (label: string, example: string) => `${label} has no value: write ${label}: ${example}.`,
  'title-field-unknown': (found: string, hints: readonly string[]) =>
    `${found} is no field of the title.${meant(hints)} They are project, number, author, checker, revision, reason, status, date, paper, samples, seed, yield and checked.`,
  'title-field-doubled': (found: string) =>
    `${found} stands in the title twice: the first one counts, remove the other.`,
  'leg-form': () => 'A leg is an element and a place joined by to, as in R_G to 0 V.',
  'place-missing': (word: string) =>
    `A place is missing behind ${word}: a terminal, a node, signal, common or a voltage.`,
  'output-form': () => 'The output is a place or a difference of two, as in output: drain or output: out_a - out_b.',
  'driven-form': () => 'driven names the resistor of the source, as in driven: through R_G.',
  'columns-form': () => 'Columns are names with their units, as in columns: V_GS [V], I_D [mA].',
  'bench-field': (found: string, hints: readonly string[]) =>
    `${found} is no field of a bench.${meant(hints)} They are columns, V_DS, lambda, exponent, R_thJA, keep, match and fitting.`,
  'exponent-form': () => 'exponent is the word free, or 2 for the square law.',
  'keep-form': () =>
    'keep names a quantity and the range to stay in, as in keep: V_P in -2.2 V .. -1.8 V or keep: V_GS in -1.2 V .. -0.9 V at I_D = 1 mA.',
  'match-form': () =>
    'match asks for pairs or quads at a current, with a second one behind and where it matters, as in match: pairs at I_D = 1 mA and 3 mA, V_DS = 5 V.',
  'fitting-form': () =>
    'fitting names the current that each specimen is to carry and its V_DS, as in fitting: I_D = 1 mA, V_DS = 10 V.',
  'row-gap': (place: number) =>
    `Place ${place} of this row is empty: two commas follow one another. Write what was measured there, or take the row out.`,
  'row-form': (found: string) =>
    `${found} is neither a number nor a name: a row of a bench holds these with commas between them, as in -0.5, 2.1, 15.`,

  // Lines
  'name-taken-unit': (name: string, right: string) => `${name} is a unit and cannot name a cell: write ${right}.`,
  'name-taken-word': (name: string, right: string) =>
    `${name} is a word of the sheet's language and cannot name a cell: write ${right}.`,
  'name-form': (found: string) =>
    `${found} is no name: a name is a letter, then letters, digits and _, as in R_S or Q1.`,
  'cell-indented': (name: string) => `${name} begins a cell and stands behind blanks: a cell begins at the margin.`,
  'equals-missing': (name: string) => `${name} has no = behind it: a cell reads NAME = entry, as in R_S = 1 kohm.`,
  'colon-for-equals': (name: string) =>
    `${name} has a colon where a cell has =: write ${name} = and its entry, or indent the line for a field.`,
  'line-unknown': () => 'This line is no cell, which reads NAME = entry. Prose begins with >, a note with ;.',
  'heading-blank': (right: string) => `A heading has a blank behind its #: write ${right}.`,
  'heading-level': () => 'There are two levels of heading, # for the title and ## for sections.',
  'heading-indented': () => 'A heading begins at the margin: remove the blanks before it.',
  'source-open': () => 'This source is never closed: a ] is missing.',
  'bracket-open': () => 'This unit is never closed: a ] is missing.',
  'source-behind': (found: string) =>
    `${found} stands behind the source, where only a note may follow: put ; before it.`,
} satisfies Record<string, (...args: never[]) => string>;

/** The stable codes of all messages. */
type MessageCode = keyof typeof TEXTS;

/** Every code there is. */
export const MESSAGE_CODES = Object.keys(TEXTS) as readonly MessageCode[];

type Arguments<C extends MessageCode> = Parameters<(typeof TEXTS)[C]>;

/** The message of this code about this stretch of the line. */
export function message<C extends MessageCode>(code: C, span: Span, ...args: Arguments<C>): Message {
  const write = TEXTS[code] as (...args: Arguments<C>) => string;
  return { code, text: write(...args), span: { start: span.start, end: span.end } };
}

/** Carries a message out of a half-read construct; `reading` catches it and nothing else sees it. */
class Halt {
  constructor(readonly message: Message) {}
}

/** Leaves the construct being read with this message. */
export function halt<C extends MessageCode>(code: C, span: Span, ...args: Arguments<C>): never {
  throw new Halt(message(code, span, ...args));
}

/** What `read` returns, or what `otherwise` makes of the message with which it was left. */
export function reading<T, U>(read: () => T, otherwise: (message: Message) => U): T | U {
  try {
    return read();
  } catch (halted) {
    if (halted instanceof Halt) return otherwise(halted.message);
    throw halted;
  }
}
