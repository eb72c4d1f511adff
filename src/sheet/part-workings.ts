// Workings of a part: how its rows settle beta and V_TO, and what the settled law says to every row.
//
// All voltages of these lines are in the n-channel frame, so that one set of formulas serves both
// channels; the sentence of the first line says so for a p-channel part.

import type { PartEntry } from '../language/index.ts';
import { BOLTZMANN, DEFAULTS, ELEMENTARY_CHARGE } from '../fet/index.ts';
import {
  CURRENT,
  PLAIN,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  SQUARE_LAW_CONSTANT,
  VOLTAGE,
  formatValue,
} from '../quantity/index.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import type { Read } from './draft.ts';
import { evaluateStep, stepAgrees } from './evaluate-step.ts';
import { conventionValue, lawNumbers } from './law-numbers.ts';
import type { WorkingStep } from './model.ts';
import type { PartLaw } from './part-law.ts';
import { lawOf, magnitude, operand, solvedForm } from './row-formulas.ts';
import type { LawInHand } from './row-formulas.ts';
import { fieldsOf, routeDifference, routeName } from './part-law.ts';

/** The steps of a part; rows whose formula is not closed are shown as what the law gives beside what was written. */
export function partWorkings(
  name: string,
  entry: PartEntry,
  given: GivenFields,
  law: PartLaw,
  read: Read,
): WorkingStep[] {
  const T_nom = given.get('T_nom')?.[0];
  const temperature = T_nom ? read(T_nom.handle) : DEFAULTS[entry.family].T_nom.value;
  const numbers = lawNumbers(entry, law, given, read);
  const constants: LawInHand = {
    part: name,
    // Bare K, W and L are units in a formula, so those of a MOSFET bear the part's name.
    letter: entry.family === 'JFET' ? 'beta' : `${name}.K`,
    beta: read(law.used.beta),
    V_TO: read(law.used.V_TO),
    lambda: read(law.lambda),
    n: DEFAULTS[entry.family].n.value,
    V_th: (BOLTZMANN * temperature) / ELEMENTARY_CHARGE,
    r_s: law.r_s === null ? 0 : read(law.r_s),
    r_d: law.r_d === null ? 0 : read(law.r_d),
    readings: law.readings,
    given,
    channel: entry.channel === 'n' ? 1 : -1,
    read,
    reads: (field) => conventionValue(field.name, numbers, field.conditions),
  };
  const frame = entry.channel === 'p' ? ' Voltages are mirrored into the frame of an n-channel FET.' : '';
  const steps = settling(name, law, constants).filter(stepAgrees);
  if (steps[0]) {
    const reading = steps[0].sentence.includes(': ') ? ` ${steps[0].sentence}` : '';
    steps[0] = { ...steps[0], sentence: `${routeName(law.used.route)} settles the law.${frame}${reading}` };
  }
  return [
    ...measuredSteps(constants),
    ...steps,
    ...slope(constants),
    ...fittedLead(law, constants, frame),
    ...rows(constants),
    ...comparisons(law, read, constants),
  ];
}

/** What is taken from a bench, with its standard error. */
function measuredSteps(c: LawInHand): WorkingStep[] {
  return [...c.given.values()].flat().flatMap(({ name, handle, kind, measured }): WorkingStep[] => {
    if (!measured) return [];
    const value = c.read(handle);
    const { formula, error } = measured;
    const path = formula.replace(/^-/, '');
    const operands = [operand(path, formula === path ? value : -value, kind)];
    const sentence = error === null ? '' : `Standard error ${formatValue(error, kind, { digits: 2 }).text}.`;
    return [{ name, formula, operands, value, type: kind, as: null, sentence }];
  });
}

/** beta and V_TO, each from the row that fixes it once the other is known. */
function settling(name: string, law: PartLaw, c: LawInHand): WorkingStep[] {
  const fields = fieldsOf(law.used.route, law.rows);
  return fields.flatMap((field) => {
    const solved = solvedForm(field, c);
    if (!solved) return [];
    const { target, formula, operands } = solved;
    const value = target === 'V_TO' ? c.V_TO : c.beta;
    const kind = target === 'V_TO' ? VOLTAGE : SQUARE_LAW_CONSTANT;
    return [{ name: target, formula, operands, value, type: kind, as: null, sentence: rowText(name, field, c) }];
  });
}

/** The row's name, and how it is read where it does not say so itself. */
function rowText(name: string, field: GivenField, c: LawInHand): string {
  const readings = (c.readings.get(field) ?? []).join(' ');
  return `${name}.${field.name}${readings === '' ? '' : `: ${readings}`}`;
}

/** lambda from g_os, at the current and V_DS of its row. */
function slope(c: LawInHand): WorkingStep[] {
  const field = c.given.get('g_os')?.[0];
  if (!field || c.given.has('lambda')) return [];
  const own = field.conditions.get('I_D');
  const saturated = c.given.get('I_DSS')?.[0];
  if (own === undefined && !saturated) return [];
  const at = own === undefined ? saturated! : field;
  const current = own === undefined ? operand('I_DSS', c.read(at.handle), CURRENT) : operand('I_D', own, CURRENT);
  const vds = operand('V_DS', Math.abs(at.conditions.get('V_DS') ?? 0), VOLTAGE);
  const step: WorkingStep = {
    name: 'lambda',
    formula: `g_os / (${current.name} - g_os * V_DS)`,
    operands: [operand('g_os', c.read(field.handle), field.kind), current, vds],
    value: c.lambda,
    type: RECIPROCAL_VOLTAGE,
    as: null,
    sentence: rowText(c.part, field, c),
  };
  return stepAgrees(step) ? [step] : [];
}

/** The drain lead that three rows of R_DSon fit. */
function fittedLead({ used }: PartLaw, c: LawInHand, frame: string): WorkingStep[] {
  if (used.R_0 === null || c.given.has('r_d')) return [];
  return [
    {
      name: 'r_d',
      formula: 'R_0 - r_s',
      operands: [operand('R_0', c.read(used.R_0), RESISTANCE), operand('r_s', c.r_s, RESISTANCE)],
      value: c.r_d,
      type: RESISTANCE,
      as: null,
      sentence: `The three R_DSon rows settle the law and fit a series part R_0, which is taken to lie in the drain lead.${frame}`,
    },
  ];
}

/** What the law gives for every row of data, beside what was written. */
function rows(c: LawInHand): WorkingStep[] {
  return [...c.given.values()].flat().flatMap((field): WorkingStep[] => {
    if (field.measured) return [];
    const shape = lawOf(field, c);
    if (!shape) return [];
    const step = { formula: shape.formula, operands: shape.operands };
    const value = evaluateStep(step);
    const written = magnitude(field, c);
    const spread = field.quantity.spread?.(c.read);
    const limits =
      spread && field.quantity.chosen
        ? [Math.abs(spread.low ?? 0), Math.abs(spread.high ?? Infinity)].toSorted((a, b) => a - b)
        : null;
    const found = limits ? withinLimits(field, Math.abs(value), limits) : difference(field, value, written);
    const readings = field.name === 'R_DSon' ? (c.readings.get(field) ?? []) : [];
    const sentence = [found, ...readings.map((text) => `${field.name}: ${text}`)].join(' ');
    return [{ name: field.name, ...step, value, type: field.kind, as: null, sentence }];
  });
}

function difference(field: GivenField, value: number, written: number): string {
  const relative = value / written - 1;
  if (Math.abs(relative) < 1e-9) return `As written in ${field.name}.`;
  const percent = formatValue(Math.abs(relative) * 100, PLAIN, { digits: 2 }).text;
  return `${percent} % ${relative > 0 ? 'above' : 'below'} what ${field.name} says.`;
}

function withinLimits(field: GivenField, value: number, [low, high]: number[]): string {
  const inside = value >= low! * (1 - 1e-12) && value <= high! * (1 + 1e-12);
  return inside ? `Inside the limits of ${field.name}.` : `Outside the limits of ${field.name}.`;
}

function comparisons(law: PartLaw, read: Read, c: LawInHand): WorkingStep[] {
  return law.others.flatMap((other): WorkingStep[] => {
    const relative = routeDifference(law.used, other, read);
    if (relative === null) return [];
    const value = read(other.beta);
    const percent = formatValue(Math.abs(relative) * 100, PLAIN, { digits: 2 }).text;
    const name = `${c.letter}_2`;
    return [
      {
        name: null,
        formula: `${name} / ${c.letter}`,
        operands: [operand(name, value, SQUARE_LAW_CONSTANT), operand(c.letter, c.beta, SQUARE_LAW_CONSTANT)],
        value: value / c.beta,
        type: PLAIN,
        as: null,
        sentence: `${routeName(other.route)} puts the constant ${percent} % ${relative >= 0 ? 'above' : 'below'}.`,
      },
    ];
  });
}
