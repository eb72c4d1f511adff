// Model cards of FETs, read as the lines of parts.
//
// A card is `.model NAME TYPE (PARAMETER = VALUE ..)`: the word in front, brackets, commas and equals signs may be left out,
// letters are of either case, the order is free, and a line that begins with + goes on with the one above. `*` begins a line of
// comment, `;` and ` $` a comment behind a line. Nothing is dropped in silence.

import { formatValue, plainText } from '../quantity/index.ts';
import { readCardNumeral } from './card-numeral.ts';
import { NEEDED, TAKEN, UNTAKEN, ZERO_CELSIUS } from './card-parameters.ts';
import { isCellName } from './reserved.ts';

/** Something that cannot be read; line and column count from 1. */
interface CardFault {
  readonly line: number;
  readonly column: number;
  readonly text: string;
}

interface ModelCard {
  /** As the card names it. */
  readonly name: string;
  readonly kind: 'n-JFET' | 'p-JFET' | 'n-MOSFET' | 'p-MOSFET';
  /** Rows of the part, without source. */
  readonly fields: readonly string[];
  /** Parameters that no part has, as written, and what each would have meant. */
  readonly untaken: readonly { readonly name: string; readonly value: string; readonly meaning: string }[];
  /** Values that are not always read as meant. */
  readonly remarks: readonly string[];
  readonly faults: readonly CardFault[];
}

/** The cards of a text, and what stands outside of any. */
interface ReadCards {
  readonly cards: readonly ModelCard[];
  readonly faults: readonly CardFault[];
}

const TYPES = { NJF: 'n-JFET', PJF: 'p-JFET', NMOS: 'n-MOSFET', PMOS: 'p-MOSFET' } as const;
type CardType = keyof typeof TYPES;

interface Word {
  readonly text: string;
  readonly line: number;
  readonly column: number;
}

/** A number of the card and the word that names it. */
interface GivenValue {
  readonly value: number;
  readonly key: Word;
}

/** Reads every card of a text. */
export function readModelCards(text: string): ReadCards {
  const statements = statementsOf(text);
  const cards: ModelCard[] = [];
  const faults: CardFault[] = [];
  for (const words of statements) {
    const [first] = words;
    const isModel = first!.text.toLowerCase() === '.model';
    const head = isModel ? words.slice(1) : words;
    const isCard = isModel || head.slice(0, 2).some(({ text: word }) => typeOf(word) !== null);
    if (isCard) cards.push(cardOf(head, first!));
    else if (!/^\.ends?\b/i.test(first!.text)) {
      faults.push(
        faultAt(first!, `${first!.text} begins no model card. Write a card as .model NAME NJF (BETA=1m VTO=-2).`),
      );
    }
  }
  return { cards, faults };
}

/** The lines of a card as a part of a name. */
export function cardLines({ name: model, kind, fields }: ModelCard, name: string): string[] {
  const source = model === '' ? 'model card' : `model card ${model.replace(/[[\]]/g, '')}`;
  return [`${name} = ${kind}`, ...fields.map((field, k) => `  ${field}  [${k === 0 ? source : 'same'}]`)];
}

function typeOf(word: string): CardType | null {
  const upper = word.toUpperCase();
  return upper in TYPES ? (upper as CardType) : null;
}

/** Statements as words: comments are gone, lines that go on are joined, `=`, brackets and commas stand between words. */
function statementsOf(text: string): Word[][] {
  const statements: Word[][] = [];
  let open = 0;
  text.split(/\r\n|\n|\r/).forEach((whole, index) => {
    if (/^\s*\*/.test(whole)) return;
    const line = whole.replace(/;.*$|(^|\s)\$.*$/, (found) => ' '.repeat(found.length));
    const words: Word[] = [];
    let depth = open;
    for (const found of line.matchAll(/\{[^}]*\}?|[()]|=|[^\s(),={}]+/g)) {
      const [word] = found;
      if (word === '(') depth++;
      else if (word === ')') depth = Math.max(0, depth - 1);
      else words.push({ text: word, line: index + 1, column: found.index + 1 });
    }
    const goesOn = words[0]?.text.startsWith('+') && !/^\+[\d.]/.test(words[0].text);
    if (goesOn) {
      const rest = words[0]!.text.slice(1);
      words.splice(0, 1, ...(rest === '' ? [] : [{ ...words[0]!, text: rest, column: words[0]!.column + 1 }]));
    }
    const last = statements.at(-1);
    if (last && (goesOn || (open > 0 && words[0]?.text.toLowerCase() !== '.model'))) last.push(...words);
    else if (words.length > 0) statements.push(words);
    open = depth;
  });
  return statements;
}

function cardOf(head: readonly Word[], first: Word): ModelCard {
  const typeAt = head.slice(0, 2).findIndex(({ text }) => typeOf(text) !== null);
  const name = typeAt === 1 ? head[0]!.text : '';
  const nothing = { name: head[0]?.text ?? '', kind: 'n-JFET', fields: [], untaken: [], remarks: [] } as const;
  if (typeAt < 0) {
    const word = head[1] ?? head[0] ?? first;
    const text = `${word.text} is no type that is read here. Types are NJF, PJF, NMOS and PMOS.`;
    return { ...nothing, faults: [faultAt(word, text)] };
  }
  const type = typeOf(head[typeAt]!.text)!;
  const family = familyOf(type);
  const faults: CardFault[] = [];
  const remarks: string[] = [];
  const untaken: { name: string; value: string; meaning: string }[] = [];
  const values = new Map<string, GivenValue>();
  const seen = new Set<string>();
  for (const { key, value } of pairsOf(head.slice(typeAt + 1), faults)) {
    const parameter = parameterOf(key.text);
    if (seen.has(parameter)) {
      faults.push(faultAt(key, `${parameter} stands twice. Leave one of them.`));
      continue;
    }
    seen.add(parameter);
    const numeral = readCardNumeral(value.text);
    if (parameter === 'LEVEL') {
      if (numeral?.value !== 1)
        faults.push(faultAt(value, `LEVEL ${value.text} is another model. Cards of level 1 are read, the square law.`));
      continue;
    }
    const taken = TAKEN[family][parameter];
    if (!taken) {
      untaken.push({
        name: parameter,
        value: value.text,
        meaning: UNTAKEN[parameter] ?? 'nothing that is known of level 1',
      });
      continue;
    }
    if (numeral === null) {
      const what = value.text.startsWith('{') ? 'a formula' : 'no number';
      faults.push(
        faultAt(value, `${parameter} is ${what} here, ${value.text}. Write its number, such as 1.2m or 3e-12.`),
      );
      continue;
    }
    values.set(parameter, { value: numeral.value, key });
    remarks.push(...traps(parameter, value.text, numeral.suffix, taken.field));
  }
  for (const needed of NEEDED[family]) {
    if (!seen.has(needed))
      faults.push(
        faultAt(first, `The card has no ${needed}, and without it there is no law. Add ${needed} to the card.`),
      );
  }
  for (const [one, other] of [
    ['W', 'L'],
    ['L', 'W'],
  ] as const) {
    if (seen.has(one) && !seen.has(other) && family === 'MOSFET')
      faults.push(
        faultAt(
          values.get(one)?.key ?? first,
          `${one} counts only with ${other}. Write both, or neither for W / L = 1.`,
        ),
      );
  }
  faults.push(...faultsOfValues(type, values));
  remarks.push(...remarksOn(type, values, seen));
  const fields = Object.entries(TAKEN[family]).flatMap(([parameter, { field, kind, zero }]) => {
    const value = values.get(parameter)?.value;
    if (value === undefined || (value === 0 && zero === 'none')) return [];
    const si = parameter === 'TNOM' ? value + ZERO_CELSIUS : value;
    return [`${field}: ${plainText(si, kind)}`];
  });
  return { name, kind: TYPES[type], fields, untaken, remarks, faults };
}

/** Words as parameters with their values. */
function pairsOf(words: readonly Word[], faults: CardFault[]): { key: Word; value: Word }[] {
  const pairs: { key: Word; value: Word }[] = [];
  for (let at = 0; at < words.length;) {
    const key = words[at++]!;
    if (key.text === '=') continue;
    if (words[at]?.text === '=') at++;
    const value = words[at];
    if (!/^[a-z]\w*$/i.test(key.text)) {
      faults.push(faultAt(key, `${key.text} is no parameter. A card has pairs such as VTO=-2.`));
      continue;
    }
    if (!value || value.text === '=' || (words[at + 1]?.text === '=' && readCardNumeral(value.text) === null)) {
      faults.push(faultAt(key, `${key.text} has no value. Write it behind, such as ${key.text}=1m.`));
      continue;
    }
    at++;
    pairs.push({ key, value });
  }
  return pairs;
}

/** Suffixes that say something else than is often meant. */
function traps(parameter: string, written: string, suffix: string, field: string): string[] {
  if (suffix === 'm' && (field === 'r_s' || field === 'r_d'))
    return [`${parameter}=${written} is in milliohms: on a card M is milli, and MEG is mega.`];
  if (suffix === 'f' && field.startsWith('C_'))
    return [`${parameter}=${written} is in femtofarads: on a card F is femto.`];
  if (suffix === 'm' && (field === 'W' || field === 'L'))
    return [`${parameter}=${written} is in millimetres: on a card M is milli, not the metre.`];
  return [];
}

/** A parameter in capitals; a 0 in VT0 is the letter O. */
function parameterOf(word: string): string {
  const upper = word.toUpperCase();
  return upper === 'VT0' ? 'VTO' : upper;
}

/** What a sign or a size on the card cannot mean. */
function faultsOfValues(type: CardType, values: ReadonlyMap<string, GivenValue>): CardFault[] {
  const family = familyOf(type);
  return [...values].flatMap(([parameter, { value, key }]): CardFault[] => {
    const { zero, kind } = TAKEN[family][parameter]!;
    if (parameter === 'VTO' && family === 'JFET' && value >= 0) {
      const volts = formatValue(value || 2, kind, { zeros: 'drop' }).text;
      return [
        faultAt(
          key,
          `VTO of a JFET is negative on the card of either channel. Write VTO=${-value || -2} for a pinch-off voltage of ${volts}.`,
        ),
      ];
    }
    if (parameter === 'TNOM' && value <= -ZERO_CELSIUS)
      return [faultAt(key, 'TNOM is in °C and lies above absolute zero, as in TNOM=27.')];
    if (value < 0 && !SIGNED.has(parameter))
      return [faultAt(key, `${parameter} is not negative on a card of either channel.`)];
    if (value === 0 && zero === 'refused') return [faultAt(key, zeroText(parameter))];
    return [];
  });
}

const SIGNED: ReadonlySet<string> = new Set(['VTO', 'VTOTC', 'TNOM']);

function zeroText(parameter: string): string {
  return parameter === 'BETA' || parameter === 'KP'
    ? `${parameter} is 0: such a FET carries no current.`
    : `${parameter} is 0 and has to be above it. Leave it out for the value that a part takes without it.`;
}

/** What a card leaves to be understood. */
function remarksOn(type: CardType, values: ReadonlyMap<string, GivenValue>, seen: ReadonlySet<string>): string[] {
  if (familyOf(type) === 'JFET') return [];
  const VTO = values.get('VTO')?.value ?? 0;
  const isDepletion = type === 'NMOS' ? VTO < 0 : VTO > 0;
  const kind = TYPES[type];
  return [
    ...(isDepletion
      ? [
          `VTO=${VTO} makes it a depletion ${kind}, which conducts at V_GS = 0. That of an enhancement ${kind} is ${type === 'NMOS' ? 'positive' : 'negative'}.`,
        ]
      : []),
    ...(seen.has('W') || seen.has('L') ? [] : ['The card has no W and no L: W / L is taken as 1, so K is KP / 2.']),
  ];
}

function familyOf(type: CardType): 'JFET' | 'MOSFET' {
  return type.endsWith('JF') ? 'JFET' : 'MOSFET';
}

function faultAt({ line, column }: Word, text: string): CardFault {
  return { line, column, text };
}

/** A name for the part: that of the card where a cell can bear it. */
export function nameOfCard({ name }: ModelCard, otherwise: string): string {
  return isCellName(name) ? name : otherwise;
}
