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
import type { ValueKind } from '../quantity/index.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import type { Read } from './draft.ts';
import { evaluateStep, stepAgrees } from './evaluate-step.ts';
import type { WorkingStep } from './model.ts';
import type { PartLaw } from './part-law.ts';
import { fieldsOf, routeDifference, routeName } from './part-law.ts';

type Operand = WorkingStep['operands'][number];

interface Constants {
  readonly part: string;
  readonly letter: string;
  readonly beta: number;
  readonly V_TO: number;
  readonly lambda: number;
  readonly n: number;
  readonly V_th: number;
  readonly r: number;
  readonly given: GivenFields;
  readonly channel: 1 | -1;
  readonly read: Read;
}

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
  const sum = ['r_s', 'r_d'].reduce(
    (total, field) => total + (given.has(field) ? read(given.get(field)![0]!.handle) : 0),
    0,
  );
  const constants: Constants = {
    part: name,
    // Bare K, W and L are units in a formula, so those of a MOSFET bear the part's name.
    letter: entry.family === 'JFET' ? 'beta' : `${name}.K`,
    beta: read(law.used.beta),
    V_TO: read(law.used.V_TO),
    lambda: read(law.lambda),
    n: DEFAULTS[entry.family].n.value,
    V_th: (BOLTZMANN * temperature) / ELEMENTARY_CHARGE,
    r: sum,
    given,
    channel: entry.channel === 'n' ? 1 : -1,
    read,
  };
  const frame = entry.channel === 'p' ? ' Voltages are mirrored into the frame of an n-channel FET.' : '';
  const steps = settling(name, law, constants).filter(stepAgrees);
  if (steps[0]) steps[0] = { ...steps[0], sentence: `${routeName(law.used.route)} settles the law.${frame}` };
  return [...steps, ...rows(constants), ...comparisons(law, read, constants)];
}

/** beta and V_TO, each from the row that fixes it once the other is known. */
function settling(name: string, law: PartLaw, c: Constants): WorkingStep[] {
  const fields = fieldsOf(law.used.route, c.given);
  return fields.flatMap((field) => {
    const solved = solvedForm(field, c);
    if (!solved) return [];
    const { target, formula, operands } = solved;
    const value = target === 'V_TO' ? c.V_TO : c.beta;
    const kind = target === 'V_TO' ? VOLTAGE : SQUARE_LAW_CONSTANT;
    return [{ name: target, formula, operands, value, type: kind, as: null, sentence: `${name}.${field.name}` }];
  });
}

function solvedForm(field: GivenField, c: Constants): { target: string; formula: string; operands: Operand[] } | null {
  const row = operand(field.name, magnitude(field, c), field.kind);
  const vto = operand('V_TO', c.V_TO, VOLTAGE);
  const beta = operand(c.letter, c.beta, SQUARE_LAW_CONSTANT);
  const at = stated(field, c);
  switch (field.name) {
    case 'I_DSS':
      return { target: c.letter, formula: `I_DSS / (V_TO^2${at.factor})`, operands: [row, vto, ...at.operands] };
    case 'I_on':
      return {
        target: c.letter,
        formula: `I_on / ((V_GS - V_TO)^2${at.factor})`,
        operands: [row, condition('V_GS', field, c), vto, ...at.operands],
      };
    case 'g_fs0':
      return { target: c.letter, formula: 'g_fs0 / (2 * abs(V_TO))', operands: [row, vto] };
    case 'g_fs':
      return {
        target: c.letter,
        formula: `g_fs^2 / (4 * I_D${at.factor})`,
        operands: [row, condition('I_D', field, c), ...at.operands],
      };
    case 'K_P':
      return {
        target: c.letter,
        formula: `K_P / 2 * ${c.part}.W / ${c.part}.L`,
        operands: [row, size('W', c), size('L', c)],
      };
    case 'V_P':
      return { target: 'V_TO', formula: 'V_P', operands: [row] };
    case 'V_GSoff':
    case 'V_GSth':
      if (!field.conditions.has('I_D')) return { target: 'V_TO', formula: field.name, operands: [row] };
      return {
        target: 'V_TO',
        formula: `${field.name} - 2 * n * V_th * ln(exp(sqrt(I_D${at.factor ? ` / (${at.factor.slice(3)})` : ''} / (4 * n^2 * ${c.letter} * V_th^2))) - 1)`,
        operands: [
          row,
          operand('n', c.n, PLAIN),
          operand('V_th', c.V_th, VOLTAGE),
          condition('I_D', field, c),
          beta,
          ...at.operands,
        ],
      };
    default:
      return null;
  }
}

/** What the law gives for every row of data, beside what was written. */
function rows(c: Constants): WorkingStep[] {
  return [...c.given.values()].flat().flatMap((field): WorkingStep[] => {
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
    const sentence = limits ? withinLimits(field, Math.abs(value), limits) : difference(field, value, written);
    return [{ name: field.name, ...step, value, type: field.kind, as: null, sentence }];
  });
}

function lawOf(field: GivenField, c: Constants): { formula: string; operands: Operand[] } | null {
  const vto = operand('V_TO', c.V_TO, VOLTAGE);
  const beta = operand(c.letter, c.beta, SQUARE_LAW_CONSTANT);
  const at = stated(field, c);
  switch (field.name) {
    case 'I_DSS':
      return { formula: `${c.letter} * V_TO^2${at.factor}`, operands: [beta, vto, ...at.operands] };
    case 'I_on':
      if (!field.conditions.has('V_GS')) return null;
      return {
        formula: `${c.letter} * (V_GS - V_TO)^2${at.factor}`,
        operands: [beta, condition('V_GS', field, c), vto, ...at.operands],
      };
    case 'g_fs0':
      return { formula: `2 * ${c.letter} * abs(V_TO)`, operands: [beta, vto] };
    case 'g_fs':
      if (field.conditions.has('I_D')) {
        return {
          formula: `2 * sqrt(${c.letter}${at.factor} * I_D)`,
          operands: [beta, ...at.operands, condition('I_D', field, c)],
        };
      }
      return { formula: `2 * ${c.letter} * abs(V_TO)${at.factor}`, operands: [beta, vto, ...at.operands] };
    case 'R_DSon': {
      const vgs = operand('V_GS', c.channel * (field.conditions.get('V_GS') ?? 0), VOLTAGE);
      const current = field.conditions.get('I_D') ?? 0;
      const vds = operand('V_DS', current * magnitude(field, c), VOLTAGE);
      return {
        formula: `r + 1 / (${c.letter} * (2 * (V_GS - V_TO) - V_DS))`,
        operands: [operand('r', c.r, RESISTANCE), beta, vgs, vto, vds],
      };
    }
    default:
      return null;
  }
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

function comparisons(law: PartLaw, read: Read, c: Constants): WorkingStep[] {
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

/** (1 + lambda V_DS) of the stated V_DS as a factor of a formula; nothing where none is stated or lambda is 0. */
function stated(field: GivenField, c: Constants): { factor: string; operands: Operand[] } {
  const vds = field.conditions.get('V_DS');
  if (vds === undefined || c.lambda === 0) return { factor: '', operands: [] };
  return {
    factor: ' * (1 + lambda * V_DS)',
    operands: [operand('lambda', c.lambda, RECIPROCAL_VOLTAGE), operand('V_DS', Math.abs(vds), VOLTAGE)],
  };
}

function condition(name: 'V_GS' | 'I_D', field: GivenField, c: Constants): Operand {
  const value = field.conditions.get(name) ?? NaN;
  return name === 'I_D' ? operand(name, value, CURRENT) : operand(name, c.channel * value, VOLTAGE);
}

function size(name: 'W' | 'L', c: Constants): Operand {
  const field = c.given.get(name)?.[0];
  const path = `${c.part}.${name}`;
  return field ? operand(path, c.read(field.handle), field.kind) : operand(path, 1, PLAIN);
}

/** A row's value in the n-channel frame. */
function magnitude(field: GivenField, c: Constants): number {
  const value = c.read(field.handle);
  return ['V_P', 'V_GSoff', 'V_GSth'].includes(field.name) ? c.channel * value : value;
}

function operand(name: string, value: number, type: ValueKind): Operand {
  return { name, value, type, as: null };
}
