// The small language in which loops over lanes are written, and its way to instructions.
//
//   x = (a + b) / 2            arithmetic as in the scalar code: + - * / and unary -, left to right
//   m = x > 0 & !(b < a)       comparisons give masks; & | ! join them
//   y = select(m, x, -x)       lane by lane; sqrt, abs, min, max, floor take numbers
//   while m .. end             as long as a lane of the mask is set: what is assigned inside is selected by hand
//   if m .. end                left out where no lane of the mask is set
//   y = power(a, b)            a text of the library, set in with variables of its own; it stands alone in its line
//
// exponent(x), mantissa(x) of x > 0 and twoTo(k) are those of the bits; lookUp(T, j) is number j of the table T. 1/3 without
// blanks is one number. Both lanes compute everything: what one of them does not want it must not select. A stack machine
// takes each expression as it is read.

import { PAIRS, constant, firstVector, get, lane, set, unsigned } from './lane-module.ts';

/** A kernel in this language. */
export interface LaneText {
  readonly inputs: readonly string[];
  readonly outputs: readonly string[];
  readonly text: string;
  /** An input that must be 0 in every sample, or the text does not hold. */
  readonly zero?: string;
}

const BLOCK_AND_LOOP = [0x02, 0x40, 0x03, 0x40];
const LEAVE_UNLESS_TRUE = [0x45, 0x0d, 1];

const CONSTANTS: Readonly<Record<string, number>> = { NaN, Infinity };
const UNARY: Readonly<Record<string, number>> = { sqrt: 0xef, abs: 0xec, floor: 0x75 };
const BINARY: Readonly<Record<string, number>> = { min: 0xf4, max: 0xf5 };

/** Operators from the loosest to the tightest, with their instructions. */
const LEVELS: readonly Readonly<Record<string, number>>[] = [
  { '|': 0x50 },
  { '&': 0x4e },
  { '==': 0x47, '!=': 0x48, '<=': 0x4b, '>=': 0x4c, '<': 0x49, '>': 0x4a },
  { '+': 0xf0, '-': 0xf1 },
  { '*': 0xf2, '/': 0xf3 },
];
const OPERATORS = new Map(
  LEVELS.flatMap((level, depth) => Object.entries(level).map(([sign, code]) => [sign, { depth, code }] as const)),
);

const TOKEN = /\s*(\d[\d.]*(?:e[-+]?\d+)?(?:\/\d+)?|\w+|[<>=!]=|[-+*/()<>&|!,])/y;

/** A loop over lanes as instructions, `tables` telling where each begins in bytes; throws where the text cannot be read. */
export function compileLanes(
  { inputs, outputs, text }: LaneText,
  tables: Readonly<Record<string, number>>,
  library: Readonly<Record<string, LaneText>> = {},
) {
  const first = firstVector(inputs.length + outputs.length);
  const names = new Map([...inputs, ...outputs].map((name, k) => [name, k]));
  const known = new Set(inputs);
  const body: number[] = [];
  const blocks: string[] = [];
  /** Before the names of variables: empty, or that of the text which is being set in. */
  let owner = '';
  let insertions = 0;
  const emit = (...pieces: (readonly number[])[]): void => {
    for (const piece of pieces) for (let i = 0; i < piece.length; i++) body.push(piece[i]);
  };
  const fault = (what: string): Error => new Error(`Lanes of ${outputs.join(', ')}: ${what}.`);

  /** Where in the body the numbers of locals begin: the code of another pair differs in nothing else. */
  const mentions: number[] = [];
  const mention = (instruction: readonly number[]): void => {
    mentions.push(body.length + 1);
    emit(instruction);
  };

  /** The local of a variable for the first pair; that of another pair is as much further on. */
  function localOf(name: string): number {
    let k = names.get(name);
    if (k === undefined) names.set(name, (k = names.size));
    return first + PAIRS * k;
  }

  /** What `write` writes, for each pair. */
  function forEachPair(write: () => void): void {
    const begin = body.length;
    mentions.length = 0;
    write();
    const end = body.length;
    for (let pair = 1; pair < PAIRS; pair++) {
      for (let i = begin; i < end; i++) body.push(body[i]);
      // Locals of a variable begin at a multiple of their count: the addition carries into no further byte.
      for (const at of mentions) body[at + pair * (end - begin)] += pair;
    }
  }

  function expression(source: string): void {
    const scratch = (): number => localOf(`scratch ${names.size}`);
    let token = '';
    let at = 0;
    const advance = (): void => {
      TOKEN.lastIndex = at;
      const match = TOKEN.exec(source);
      token = match === null ? '' : match[1];
      at += match === null ? 0 : match[0].length;
    };
    const expect = (wanted: string): void => {
      if (token !== wanted) throw fault(`expected ${wanted}, found ${token} in ${source}`);
      advance();
    };
    const level = (depth: number): void => {
      operand();
      for (
        let found = OPERATORS.get(token);
        found !== undefined && found.depth >= depth;
        found = OPERATORS.get(token)
      ) {
        advance();
        level(found.depth + 1);
        emit(lane(found.code));
      }
    };
    const operand = (): void => {
      const word = token;
      advance();
      if (word === '(') {
        level(0);
        expect(')');
      } else if (word === '-' || word === '!') {
        operand();
        emit(lane(word === '-' ? 0xed : 0x4d));
      } else if (/^\d/.test(word)) {
        const [over, under = 1] = word.split('/').map(Number);
        emit(constant(over / under));
      } else if (token === '(') call(word);
      else if (word in CONSTANTS) emit(constant(CONSTANTS[word]));
      else if (known.has(owner + word)) mention(get(localOf(owner + word)));
      else throw fault(`nothing is called ${word} in ${source}`);
    };
    const call = (name: string): void => {
      expect('(');
      if (name === 'lookUp') {
        const table = tables[token];
        if (table === undefined) throw fault(`no table is called ${token}`);
        advance();
        expect(',');
        level(0);
        lookUp(table, scratch());
      } else if (name === 'select') {
        const mask = scratch();
        level(0);
        mention(set(mask));
        expect(',');
        level(0);
        expect(',');
        level(0);
        mention(get(mask));
        emit(lane(0x52));
      } else {
        level(0);
        if (name in BINARY) {
          expect(',');
          level(0);
          emit(lane(BINARY[name]));
        } else if (name in UNARY) emit(lane(UNARY[name]));
        else if (name in BITS) emit(BITS[name]);
        else throw fault(`no function is called ${name}`);
      }
      expect(')');
    };
    advance();
    level(0);
    if (token !== '' || at !== source.length) throw fault(`${source} does not end where it should`);
  }

  /** Numbers of a table by whole numbers in both lanes. */
  function lookUp(table: number, index: number): void {
    mention(set(index));
    for (const k of [0, 1]) {
      // The lane as a whole number, times eight, loaded.
      mention(get(index));
      emit(lane(0x21), [k, 0xfc, 2, 0x41, 3, 0x74, 0x2b, 3], unsigned(table));
      emit(lane(k === 0 ? 0x14 : 0x22), k === 0 ? [] : [1]);
    }
  }

  function assign(name: string, source: string): void {
    forEachPair(() => {
      expression(source);
      mention(set(localOf(name)));
    });
    known.add(name);
  }

  function insert(name: string, { inputs, outputs, text }: LaneText, operands: readonly string[]): void {
    const before = owner;
    const inner = `${owner}${insertions++} `;
    inputs.forEach((input, k) => assign(inner + input, operands[k] ?? ''));
    owner = inner;
    statements(text);
    owner = before;
    forEachPair(() => {
      mention(get(localOf(inner + outputs[0])));
      mention(set(localOf(owner + name)));
    });
    known.add(owner + name);
  }

  function statements(text: string): void {
    for (const line of text.split('\n').map((each) => each.trim())) {
      const assignment = /^(\w+) = (.*)$/.exec(line);
      const insertion = /^(\w+) = (\w+)\((.*)\)$/.exec(line);
      const block = /^(while|if) (.*)$/.exec(line);
      if (line === '' || line.startsWith('//')) continue;
      if (insertion !== null && insertion[2] in library) {
        insert(insertion[1], library[insertion[2]], insertion[3].split(','));
      } else if (assignment !== null) assign(owner + assignment[1], assignment[2]);
      else if (block !== null) begin(block[1], block[2]);
      else if (line === 'end') {
        if (blocks.length === 0) throw fault('end without if or while');
        emit([0x0c, blocks.pop() === 'while' ? 0 : 1, 0x0b, 0x0b]);
      } else throw fault(`${line} is no statement`);
    }
  }

  /** block; loop: leave where no lane is set. A loop ends with a branch to its begin, an `if` with one out. */
  function begin(word: string, condition: string): void {
    emit(BLOCK_AND_LOOP);
    forEachPair(() => expression(condition));
    for (let pair = 1; pair < PAIRS; pair++) emit(lane(0x50));
    emit(lane(0x53), LEAVE_UNLESS_TRUE);
    blocks.push(word);
  }

  statements(text);
  if (blocks.length > 0) throw fault(`${blocks[0]} has no end`);
  for (const name of outputs) if (!known.has(name)) throw fault(`${name} is never computed`);
  return { inputs: inputs.length, outputs: outputs.length, locals: PAIRS * names.size, body };
}

/** Both lanes hold these bits, and 32 zeros below them. */
function bits(high: number): number[] {
  const half = [0, 0, 0, 0, high & 255, (high >> 8) & 255, (high >> 16) & 255, (high >> 24) & 255];
  return [...lane(0x0c), ...half, ...half];
}

const shift = (code: number): number[] => [0x41, 52, ...lane(code)];
const FRACTION = [...lane(0x0c), ...[0, 0].flatMap(() => [255, 255, 255, 255, 255, 255, 0x0f, 0])];

/** In 2^52 + n the last bits are those of n. */
const BITS: Readonly<Record<string, readonly number[]>> = {
  exponent: [...shift(0xcd), ...bits(0x43300000), ...lane(0x50), ...constant(2 ** 52 + 1023), ...lane(0xf1)],
  mantissa: [...FRACTION, ...lane(0x4e), ...bits(0x3ff00000), ...lane(0x50)],
  twoTo: [...constant(2 ** 52 + 1023), ...lane(0xf0), ...shift(0xcb)],
};
