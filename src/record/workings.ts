// Workings as they are printed: formula, numbers in place, result.
//
// The numbers in place are the sheet's own language, so that a reader can type the line and get the
// result. Digits grow until that is true: first those of the operands, for the same digits of the
// result; where even all digits of the operands leave the last digit of the result open (it stands at
// the edge of two roundings), the result takes one more. A comparison grows until the printed numbers
// compare as the real ones do.

import { parseExpression, printExpr } from '../language/index.ts';
import type { Expr } from '../language/index.ts';
import { evaluateExpression } from '../sheet/index.ts';
import type { Sheet, WorkingStep } from '../sheet/index.ts';
import type { ProsePart } from './prose.ts';
import { proseParts } from './prose.ts';
import { exactText, infinityText, operandText, quantityText } from './quantity-text.ts';
import type { OperandTexts } from './substitution.ts';
import { operandFor, substitute } from './substitution.ts';
import { texOfExpression } from './tex.ts';
import { texOfPath } from './tex-name.ts';
import { texOfShown } from './tex-number.ts';

/** The pieces of a line, as plain text in the sheet language or as TeX. */
interface StepLine {
  /** What the step is the value of; null for a comparison that has no name. */
  readonly left: string | null;
  readonly formula: string;
  /** null where the formula holds no names, or where its numbers in place are already the result. */
  readonly substitution: string | null;
  readonly result: string;
}

export interface PrintedStep {
  readonly kind: 'step';
  /** The result is a verdict (`holds`), not a value that the formula equals. */
  readonly isCondition: boolean;
  readonly text: StepLine;
  readonly tex: StepLine;
  readonly sentence: string;
  readonly sentenceParts: readonly ProsePart[];
  /** The printed numbers give the printed result; false would be a fault of the program. */
  readonly agrees: boolean;
}

const LEAST_DIGITS = 3;
const MOST_DIGITS = 15;
/** As many as tell any two doubles apart: for operands that cancel to their last digits. */
const ALL_DIGITS = 17;

/** The printed workings of a cell; empty where it has none. */
export function workingsOf(sheet: Sheet, name: string): readonly PrintedStep[] {
  return sheet.workings(name).map((step) => printStep(step, name));
}

/** One step in print; `subject` is the cell whose workings these are. Throws when the step's formula is not of the sheet language. */
export function printStep(step: WorkingStep, subject: string): PrintedStep {
  const tree = parseFormula(step.formula);
  const { operands, digits, agrees } = growDigits(step, tree);
  const result = resultText(step, tree, digits);
  const substitution = substitute(step.formula, tree, operands);
  const shows = substitution !== step.formula && substitution !== result;
  const texOptions = { text: step.formula, subject };
  return {
    kind: 'step',
    isCondition: step.type === 'condition',
    // An `=` of its own would be read as one of the step's.
    text: {
      left: step.name,
      formula: tree.type === 'with' ? `(${step.formula})` : step.formula,
      substitution: shows ? substitution : null,
      result,
    },
    tex: {
      left: step.name === null ? null : texOfPath(step.name.split('.'), subject),
      formula: texOfExpression(tree, texOptions),
      substitution: shows
        ? texOfExpression(tree, { ...texOptions, operand: (expr) => operandFor(expr, operands) })
        : null,
      result: texOfShown(result).tex,
    },
    sentence: step.sentence,
    sentenceParts: proseParts(step.sentence, subject),
    agrees,
  };
}

/** The pieces of `stepText` that equal each other: left side, formula, numbers in place, result; none of them twice. */
export function stepSides(step: PrintedStep): readonly string[] {
  const { left, formula, substitution, result } = step.text;
  if (step.isCondition) {
    const sides = substitution === null ? formula : `${formula}, ${substitution}`;
    return [`${left === null ? '' : `${left}: `}${sides}: ${result}`];
  }
  const sides = [left, formula, substitution, result].filter((side) => side !== null);
  return sides.filter((side, i) => side !== sides[i - 1]);
}

/** `V_GS = -R_S * I_D = -1.2 kΩ * 1.16 mA = −1.39 V`; for a comparison `V_DS >= V_ov, 10.7 V >= 1.09 V: holds`. */
export function stepText(step: PrintedStep): string {
  return stepSides(step).join(' = ');
}

function parseFormula(formula: string): Expr {
  const tree = parseExpression(formula);
  if ('code' in tree) throw new Error(`The formula "${formula}" of a working step cannot be read: ${tree.text}`);
  return tree;
}

function growDigits(step: WorkingStep, tree: Expr): { operands: OperandTexts; digits: number; agrees: boolean } {
  for (let digits = LEAST_DIGITS; digits <= MOST_DIGITS; digits++) {
    for (const operandDigits of [...range(digits, MOST_DIGITS), ALL_DIGITS]) {
      if (agreesAt(step, tree, operandDigits, digits)) {
        return { operands: operandTexts(step, operandDigits, infinitySign), digits, agrees: true };
      }
    }
  }
  return { operands: operandTexts(step, ALL_DIGITS, infinitySign), digits: LEAST_DIGITS, agrees: false };
}

function range(from: number, to: number): number[] {
  return Array.from({ length: to - from + 1 }, (_, i) => from + i);
}

function infinitySign(value: number): string {
  return value < 0 ? '−∞' : '∞';
}

/** `infinite` spells what has no end: for the eye, or for the language. */
function operandTexts(step: WorkingStep, digits: number, infinite: typeof infinityText): OperandTexts {
  return new Map(
    step.operands.map(({ name, value, type, as }) => {
      const key = canonicalOperand(name);
      if (typeof value === 'string' || typeof type === 'string') return [key, String(value)];
      return [key, Number.isFinite(value) ? operandText(value, type, as, digits) : infinite(value, type)];
    }),
  );
}

/** Calls and settings are known by their printed form, whatever blanks the step writes. */
function canonicalOperand(name: string): string {
  return /^[\w.]+$/.test(name) ? name : printExpr(parseFormula(name));
}

function agreesAt(step: WorkingStep, tree: Expr, operandDigits: number, digits: number): boolean {
  if (step.value === null) return true;
  const evaluated = evaluateExpression(substitute(step.formula, tree, operandTexts(step, operandDigits, infinityText)));
  if ('code' in evaluated) {
    throw new Error(`The workings of ${step.name ?? step.formula} cannot be read again: ${evaluated.text}`);
  }
  const { value } = evaluated;
  if (typeof value !== 'number' || typeof step.value !== 'number') return value === step.value;
  return numberText(value, step, digits) === numberText(step.value, step, digits);
}

function resultText(step: WorkingStep, tree: Expr, digits: number): string {
  const { value, type, as } = step;
  if (value === null) return 'no value';
  if (typeof value === 'boolean') return value ? 'holds' : 'does not hold';
  if (typeof value === 'string' || typeof type === 'string') return String(value);
  const isLiteral = tree.type === 'number' || (tree.type === 'unary' && tree.operand.type === 'number');
  if (isLiteral) return quantityText(value, type, as, 'all');
  return exactText(value, type, as, digits) ?? quantityText(value, type, as, digits);
}

function numberText(value: number, { type, as }: WorkingStep, digits: number): string {
  return typeof type === 'string' || Number.isNaN(value) ? String(value) : quantityText(value, type, as, digits);
}
