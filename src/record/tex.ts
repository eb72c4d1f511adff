// Expressions in TeX.
//
// The author's parentheses are dropped and set again by rank, because fractions, bars and roots make
// many of them superfluous. Each piece of TeX carries its rank and whether a minus sign stands in
// front, so that `a - (-b)` keeps its parentheses and `(-a) * b` becomes -a b. Two factors stand side
// by side where both are symbols and with a dot where a number or a word would run into its neighbour.

import type { BinaryExpr, CallExpr, Expr } from '../language/index.ts';
import { texOfName, texOfPath } from './tex-name.ts';
import type { NumberTex } from './tex-number.ts';
import { texOfNumber, texOfShown } from './tex-number.ts';

interface TexOptions {
  /** The text that the spans of the tree point into: numbers show the digits that stand there. */
  readonly text: string;
  /** The cell whose workings are shown: its own values go without its name. */
  readonly subject: string | null;
  /** The printed value to set in place of a part of the expression; null or absent to set the part itself. */
  readonly operand?: (expr: Expr) => string | null;
}

/** Binding strength, loosest first. */
const RANK = {
  or: 1,
  and: 2,
  not: 3,
  relation: 4,
  state: 5,
  sum: 6,
  signed: 7, // -a, -a b: loose like a sum behind another sign, but a product may begin with it
  parallel: 8,
  product: 9,
  power: 10,
  atom: 11,
} as const;

interface Piece {
  readonly tex: string;
  readonly rank: number;
  /** A minus sign stands in front. */
  readonly minus: boolean;
  /** What stands at its ends, for the sign between two factors. */
  readonly starts: 'symbol' | 'number' | 'word';
  readonly ends: 'symbol' | 'number' | 'word';
}

const RELATIONS: Readonly<Record<string, string>> = { '=': '=', '<': '<', '>': '>', '<=': '\\le', '>=': '\\ge' };

/** Functions set with an operator of TeX's own. */
const OPERATORS: ReadonlyMap<string, string> = new Map(
  Object.entries({
    min: '\\min',
    max: '\\max',
    exp: '\\exp',
    ln: '\\ln',
    log10: '\\log_{10}',
    sin: '\\sin',
    cos: '\\cos',
    tan: '\\tan',
    atan: '\\arctan',
    sign: '\\operatorname{sgn}',
  }),
);

/** The expression in TeX, without delimiters; it holds no underscore that shows and no character from the text but names and digits. */
export function texOfExpression(expr: Expr, options: TexOptions): string {
  return piece(expr, options).tex;
}

function piece(expr: Expr, options: TexOptions): Piece {
  const operand = options.operand?.(expr) ?? null;
  if (operand !== null) return numberPiece(texOfShown(operand));
  switch (expr.type) {
    case 'group':
      return piece(expr.inner, options);
    case 'number':
      return numberPiece(texOfNumber(expr, options.text));
    case 'path': {
      const tex = texOfPath(
        expr.names.map((name) => name.name),
        options.subject,
      );
      return atom(tex, tex.startsWith('\\mathrm') ? 'word' : 'symbol');
    }
    case 'call':
      return call(expr, options);
    case 'unary': {
      if (expr.operator === '√') return atom(`\\sqrt{${piece(expr.operand, options).tex}}`);
      const operand = piece(expr.operand, options);
      if (expr.operator === 'not') return loose(`\\mathrm{not}\\;${wrap(operand, RANK.not)}`, RANK.not);
      const inner = operand.minus ? parens(operand) : wrap(operand, RANK.product);
      return { tex: `${expr.operator}${inner}`, rank: RANK.signed, minus: true, starts: 'symbol', ends: operand.ends };
    }
    case 'binary':
      return binary(expr, options);
    case 'within': {
      const [value, low, high] = [expr.value, expr.low, expr.high].map((part) =>
        wrap(piece(part, options), RANK.state),
      );
      return loose(`${value}\\;\\mathrm{within}\\;${low} \\ldots ${high}`, RANK.relation);
    }
    case 'with': {
      const setting = `${piece(expr.input, options).tex} = ${piece(expr.setting, options).tex}`;
      const tex = `\\left.${wrap(piece(expr.value, options), RANK.product)}\\right|_{${setting}}`;
      return { ...atom(tex), rank: RANK.power };
    }
  }
}

function numberPiece({ tex, negative, bare }: NumberTex): Piece {
  const rank = negative ? RANK.signed : bare ? RANK.atom : RANK.product;
  return { tex, rank, minus: negative, starts: 'number', ends: 'number' };
}

function binary(expr: BinaryExpr, options: TexOptions): Piece {
  const left = piece(expr.left, options);
  const right = piece(expr.right, options);
  switch (expr.operator) {
    case '+':
    case '-': {
      // a + (b - c) is a + b - c; behind a minus, and in front of another sign, parentheses stay.
      const second = right.minus ? parens(right) : wrap(right, expr.operator === '-' ? RANK.parallel : RANK.sum);
      const tex = `${wrap(left, RANK.sum)} ${expr.operator} ${second}`;
      return { tex, rank: RANK.sum, minus: left.minus, starts: left.starts, ends: right.ends };
    }
    case '*':
      return product(left, right);
    case '/':
      return { ...atom(`\\frac{${left.tex}}{${right.tex}}`), rank: RANK.product };
    case '||':
      return parallel([left, right]);
    case '^':
      return power(left, exponent(expr.right, options));
    case 'and':
    case 'or': {
      const rank = RANK[expr.operator];
      return loose(`${wrap(left, rank)}\\;\\mathrm{${expr.operator}}\\;${wrap(right, rank)}`, rank);
    }
    default:
      return loose(`${wrap(left, RANK.state)} ${RELATIONS[expr.operator]!} ${wrap(right, RANK.state)}`, RANK.relation);
  }
}

function product(left: Piece, right: Piece): Piece {
  const first = left.rank === RANK.signed ? left : factor(left);
  const second = factor(right);
  const dot = second.starts !== 'symbol' || first.ends === 'word' || isUnitNumber(first);
  const tex = `${first.tex}${dot ? ' \\cdot ' : '\\,'}${second.tex}`;
  // A sign in front of the first factor is a sign in front of the product.
  const rank = first.minus ? RANK.signed : RANK.product;
  return { tex, rank, minus: first.minus, starts: first.starts, ends: second.ends };
}

function factor(part: Piece): Piece {
  return part.rank >= RANK.product ? part : atom(parens(part));
}

/** Behind a unit a symbol would be read as part of it. */
function isUnitNumber(part: Piece): boolean {
  return part.ends === 'number' && part.rank !== RANK.atom;
}

function parallel(parts: readonly Piece[]): Piece {
  const tex = parts.map((part) => wrap(part, RANK.parallel)).join(' \\parallel ');
  return { ...loose(tex, RANK.parallel), starts: parts[0]!.starts, ends: parts[parts.length - 1]!.ends };
}

function power(base: Piece, exponentTex: string): Piece {
  const tex = `${base.rank === RANK.atom ? `{${base.tex}}` : parens(base)}^{${exponentTex}}`;
  return { ...atom(tex), rank: RANK.power, starts: base.rank === RANK.atom ? base.starts : 'symbol' };
}

/** A ratio of two numbers is set on the line: x^{1/2}. */
function exponent(expr: Expr, options: TexOptions): string {
  const inner = expr.type === 'group' ? expr.inner : expr;
  if (
    inner.type === 'binary' &&
    inner.operator === '/' &&
    inner.left.type === 'number' &&
    inner.right.type === 'number'
  ) {
    return `${piece(inner.left, options).tex}/${piece(inner.right, options).tex}`;
  }
  return piece(expr, options).tex;
}

function call(expr: CallExpr, options: TexOptions): Piece {
  const name = expr.name.name;
  const parts = expr.args.map((arg) => piece(arg, options));
  const texts = parts.map((part) => part.tex);
  if (name === 'sqrt' && parts.length === 1) return atom(`\\sqrt{${texts[0]}}`);
  if (name === 'abs' && parts.length === 1) return atom(`\\left|${texts[0]}\\right|`);
  if (name === 'par' && parts.length > 1) return parallel(parts);
  if (name === 'if' && parts.length === 3) {
    const [condition, first, second] = texts;
    const lines = `${first} & \\mathrm{if}\\;${condition} \\\\ ${second} & \\mathrm{otherwise}`;
    return loose(`\\begin{cases} ${lines} \\end{cases}`, RANK.state);
  }
  const symbol = OPERATORS.get(name) ?? functionName(name);
  return { ...atom(`${symbol}\\left(${texts.join(', ')}\\right)`), rank: RANK.power };
}

/** `E24_up` is a word with a subscript, not a quantity. */
function functionName(name: string): string {
  const [head, ...rest] = name.split('_');
  if (/^E\d+$/.test(head!)) return `\\mathrm{${head}}${rest.length > 0 ? `_{\\mathrm{${rest.join('')}}}` : ''}`;
  return name.includes('_') ? texOfName(name) : `\\operatorname{${name}}`;
}

function atom(tex: string, end: 'symbol' | 'word' = 'symbol'): Piece {
  return { tex, rank: RANK.atom, minus: false, starts: end, ends: end };
}

function loose(tex: string, rank: number): Piece {
  return { tex, rank, minus: false, starts: 'symbol', ends: 'symbol' };
}

function wrap(part: Piece, rank: number): string {
  return part.rank >= rank ? part.tex : parens(part);
}

function parens(part: Piece): string {
  return `\\left(${part.tex}\\right)`;
}
