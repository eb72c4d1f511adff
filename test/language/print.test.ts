// Round trip of expressions, and that any text can be read without a throw.

import fc from 'fast-check';
import { expect, test, vi } from 'vitest';
import type { Expr, Span } from '../../src/language/index.ts';
import { parseExpression, parseSheet, pathsOf, printExpr, walkExpr } from '../../src/language/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomExpression, randomSheet } from '../support/random-sheet.ts';
import { isMessage, withoutSpans } from './show.ts';

const SEED = 20_240_607;
vi.setConfig({ testTimeout: 30_000 });

function parsed(text: string): Expr {
  const read = parseExpression(text);
  if (isMessage(read)) throw new Error(`${text}: ${read.text}`);
  return read;
}

test('printing an expression and parsing it gives the same tree', () => {
  fc.assert(
    fc.property(fc.nat(), fc.integer({ min: 0, max: 6 }), (seed, depth) => {
      const tree = parsed(randomExpression(createDraw(seed), depth));
      const printed = printExpr(tree);
      expect(withoutSpans(parsed(printed))).toBe(withoutSpans(tree));
      expect(printExpr(parsed(printed))).toBe(printed);
    }),
    { seed: SEED, numRuns: 2000 },
  );
});

test('a number in any unit keeps its value to the last bit', () => {
  const units = [
    '',
    ' V',
    ' mV',
    ' kohm',
    ' pF',
    ' ppm',
    ' %',
    ' deg',
    ' degC',
    ' dB',
    ' nV/√Hz',
    ' V/√kHz',
    ' uA/V^2',
  ];
  fc.assert(
    fc.property(fc.double({ min: 1e-30, max: 1e30, noNaN: true }), fc.constantFrom(...units), (value, unit) => {
      const tree = parsed(`${value}${unit}`);
      expect(withoutSpans(parsed(printExpr(tree)))).toBe(withoutSpans(tree));
    }),
    { seed: SEED, numRuns: 2000 },
  );
});

test.each([
  ['a  ·  b', 'a * b'],
  ['-  20 V', '-20 V'],
  ['β//R_S', 'beta || R_S'],
  ['√x²', '√x^2'],
  ['4k7', '4700 ohm'],
  ['−40 °C', '-40 °C'],
  ['- +40 degC', '-+40 degC'],
  ['not  a≤b', 'not a <= b'],
  ['x within 5 mA +/- 10%', 'x within 4.5 mA .. 5.5 mA'],
  ['x within -5 V ± 10 %', 'x within -5.5 V .. -4.5 V'],
  ['max( a,b )', 'max(a, b)'],
  ['1e-12 F', '1e-12 F'],
  ['0.0000001', '1e-7'],
  ['100000000000000000000000', '1e23'],
])('%s is printed as %s', (text, printed) => {
  expect(printExpr(parsed(text))).toBe(printed);
});

test('a tree that was not parsed gets the parentheses it needs', () => {
  const name = (text: string): Expr => parsed(text);
  const binary = (operator: '*' | '-' | '^' | 'or' | '=', left: Expr, right: Expr): Expr => ({
    type: 'binary',
    operator,
    left,
    right,
    operatorSpan: { start: 0, end: 0 },
    span: { start: 0, end: 0 },
  });
  expect(printExpr(binary('*', name('a + b'), name('c')))).toBe('(a + b) * c');
  expect(printExpr(binary('-', name('a'), name('b - c')))).toBe('a - (b - c)');
  expect(printExpr(binary('^', name('10 V'), name('2')))).toBe('(10 V)^2');
  expect(printExpr(binary('^', name('-a'), name('-b')))).toBe('(-a)^-b');
  expect(printExpr(binary('*', name('a or b'), name('not c')))).toBe('(a or b) * (not c)');
  expect(printExpr(binary('=', name('a = b'), name('c')))).toBe('(a = b) = c');
});

test('every path of an expression is found, in the order written', () => {
  const paths = pathsOf(parsed('a + f(b.c, √d) within (e with g.h = i) .. -j'));
  expect(paths.map((path) => path.names.map((each) => each.name).join('.'))).toEqual([
    'a',
    'b.c',
    'd',
    'e',
    'g.h',
    'i',
    'j',
  ]);
});

test('the span of each part of an expression reads as that part', () => {
  fc.assert(
    fc.property(fc.nat(), (seed) => {
      const text = randomExpression(createDraw(seed), 3);
      walkExpr(parsed(text), (part) => {
        // The ends of `c ± d` have no text of their own.
        if (part.type === 'within' || (part.type === 'with' && part.value.type === 'within')) return;
        const own = text.slice(part.span.start, part.span.end);
        if (/±|\+\/-/.test(own)) return;
        if (/^[⁻⁰¹²³⁴-⁹]/.test(own)) return;
        expect(withoutSpans(parsed(own))).toBe(withoutSpans(part));
      });
    }),
    { seed: SEED, numRuns: 500 },
  );
});

// ---------------------------------------------------------------- any text

/** All spans in a tree. */
function spansIn(tree: unknown, found: Span[] = []): Span[] {
  if (typeof tree !== 'object' || tree === null) return found;
  for (const [key, value] of Object.entries(tree)) {
    if (/span$/i.test(key)) found.push(value as Span);
    else if (key !== 'unit' && key !== 'kind') spansIn(value, found);
  }
  return found;
}

function expectSound(text: string): void {
  const unsound = parseSheet(text).lines.filter((line) => {
    const whole = text.slice(line.offset, line.offset + line.text.length) === line.text;
    const inside = spansIn(line.tree).every(({ start, end }) => start >= 0 && start <= end && end <= line.text.length);
    return !whole || !inside;
  });
  expect(unsound).toEqual([]);
}

const WORDS = [
  ...(
    'x R_S A1.I_D Q1 V mA k 4k7 10 0.5 5. .5 3,3 1e9 1e999 °C β µ ² ⁻ + - * / // || | ^ = < >= ± .. ' +
    '... , ( ) √ . : [ ] ; # > in at as to of over such that with within and not if check plot stage ' +
    'point bench n-JFET another fitted columns output driven through signal normal service each log ' +
    '𝛼 % $ " ∞'
  ).split(' '),
  ' ',
  ' ',
  ' ',
  '  ',
  '\n',
  '\n  ',
  '\nx = ',
  '\r\n',
  '\t',
  '\u00a0',
  '\ud800',
  '\0',
];

test('any text gives a tree with spans inside its lines, and nothing is thrown', () => {
  const soup = fc.array(fc.constantFrom(...WORDS), { maxLength: 40 }).map((words) => words.join(''));
  fc.assert(fc.property(soup, expectSound), { seed: SEED, numRuns: 3000 });
  fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 60 }), expectSound), { seed: SEED, numRuns: 1000 });
});

test('a sheet with a few characters changed gives a sound tree', () => {
  const change = fc.record({ at: fc.nat(), cut: fc.nat({ max: 3 }), put: fc.constantFrom(...WORDS) });
  fc.assert(
    fc.property(fc.nat(), fc.array(change, { minLength: 1, maxLength: 4 }), (seed, changes) => {
      let text = randomSheet(createDraw(seed));
      for (const { at, cut, put } of changes) {
        const start = at % text.length;
        text = text.slice(0, start) + put + text.slice(start + cut);
      }
      expectSound(text);
    }),
    { seed: SEED, numRuns: 300 },
  );
});

test('very long and very deep texts end in a message', () => {
  for (const text of [
    '('.repeat(50_000),
    '-'.repeat(50_000),
    '√'.repeat(50_000),
    'not '.repeat(20_000),
    '2^'.repeat(50_000),
    'f('.repeat(50_000),
  ])
    expect(isMessage(parseExpression(text))).toBe(true);
  expect(parseExpression('1 + '.repeat(50_000))).toMatchObject({ code: 'expression-too-long' });
  expect(parseExpression('9'.repeat(50_000))).toMatchObject({ code: 'number-length' });
});

test('random sheets are read without a message', () => {
  fc.assert(
    fc.property(fc.nat(), fc.constantFrom('\n', '\r\n'), (seed, lineEnd) => {
      const { cells, loose, title } = parseSheet(randomSheet(createDraw(seed), { lineEnd }));
      const broken = cells.filter(
        ({ entry, fields }) => entry.type === 'broken' || fields.some(({ body }) => body.type === 'broken'),
      );
      expect([loose, broken, title !== null]).toEqual([[], [], true]);
      const types = new Set(cells.map((cell) => cell.entry.type));
      expect(types.size).toBe(9);
    }),
    { seed: SEED, numRuns: 200 },
  );
});
