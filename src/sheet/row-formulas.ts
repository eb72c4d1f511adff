// The formulas between the square law of a part and the rows of its data, with the numbers in them. Rows
// are read at the terminals: with resistance in the leads the channel sees what their drop leaves.

import { CURRENT, PLAIN, RECIPROCAL_VOLTAGE, RESISTANCE, SQUARE_LAW_CONSTANT, VOLTAGE } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Read } from './draft.ts';
import type { WorkingStep } from './model.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import type { PartLaw } from './part-law.ts';

type Operand = WorkingStep['operands'][number];

/** What the formulas of a part are made of: SI, voltages in the n-channel frame. */
export interface LawInHand {
  readonly part: string;
  readonly letter: string;
  readonly beta: number;
  readonly V_TO: number;
  readonly lambda: number;
  readonly n: number;
  readonly V_th: number;
  readonly r_s: number;
  readonly r_d: number;
  readonly readings: PartLaw['readings'];
  readonly given: GivenFields;
  readonly channel: 1 | -1;
  readonly read: Read;
  /** What the law itself reads where a row was written, in the sense of the channel. */
  readonly reads: (field: GivenField) => number;
}

/** The constant that a row fixes once the other is known, as a formula; null where the row has none. */
export function solvedForm(
  field: GivenField,
  c: LawInHand,
): { target: string; formula: string; operands: Operand[] } | null {
  const row = operand(field.name, magnitude(field, c), field.kind);
  const vto = operand('V_TO', c.V_TO, VOLTAGE);
  const beta = operand(c.letter, c.beta, SQUARE_LAW_CONSTANT);
  const at = stated(field, c);
  const lead = sourceLead(field, c);
  switch (field.name) {
    case 'I_DSS': {
      const drive = lead.length > 0 ? '(I_DSS * r_s + V_TO)' : 'V_TO';
      return {
        target: c.letter,
        formula: `I_DSS / (${drive}^2${at.factor})`,
        operands: [row, vto, ...lead, ...at.operands],
      };
    }
    case 'I_on':
      return {
        target: c.letter,
        formula: `I_on / ((V_GS${lead.length > 0 ? ' - I_on * r_s' : ''} - V_TO)^2${at.factor})`,
        operands: [row, condition('V_GS', field, c), vto, ...lead, ...at.operands],
      };
    case 'g_fs0':
      return zeroGateSlope(field, row, vto, c);
    case 'g_fs': {
      if (!field.conditions.has('I_D')) return zeroGateSlope(field, row, vto, c);
      const inside = channelSlope(c, at);
      return {
        target: c.letter,
        formula: `${inside}^2 / (4 * I_D${at.factor})`,
        operands: [row, condition('I_D', field, c), ...leads(c), ...at.operands],
      };
    }
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
        formula: `${field.name}${lead.length > 0 ? ' - I_D * r_s' : ''} - 2 * n * V_th * ln(exp(sqrt(I_D${at.factor ? ` / (${at.factor.slice(3)})` : ''} / (4 * n^2 * ${c.letter} * V_th^2))) - 1)`,
        operands: [
          row,
          operand('n', c.n, PLAIN),
          operand('V_th', c.V_th, VOLTAGE),
          condition('I_D', field, c),
          beta,
          ...lead,
          ...at.operands,
        ],
      };
    default:
      return null;
  }
}

/** The constant from a transconductance at V_GS = 0; left out where r_s moves the gate of the channel by a current that is not in the row. */
function zeroGateSlope(
  field: GivenField,
  row: Operand,
  vto: Operand,
  c: LawInHand,
): { target: string; formula: string; operands: Operand[] } | null {
  if (c.r_s > 0) return null;
  const at = stated(field, c);
  return {
    target: c.letter,
    formula: `${field.name} / (2 * abs(V_TO)${at.factor})`,
    operands: [row, vto, ...at.operands],
  };
}

/** g_m of the channel from g_fs at the terminals and at its current, as a factor of a formula. */
function channelSlope(c: LawInHand, at: { readonly lift: string }): string {
  if (c.r_s + c.r_d === 0) return 'g_fs';
  const lengthened = at.lift === '' ? '' : ` * (1 + lambda * I_D / ${at.lift} * (r_s + r_d))`;
  return `(g_fs${lengthened} / (1 - g_fs * r_s))`;
}

/** What the law gives for a row of data, as a formula; null where there is none. */
export function lawOf(field: GivenField, c: LawInHand): { formula: string; operands: Operand[] } | null {
  const vto = operand('V_TO', c.V_TO, VOLTAGE);
  const beta = operand(c.letter, c.beta, SQUARE_LAW_CONSTANT);
  const at = stated(field, c, ['I_DSS', 'I_on'].includes(field.name) ? c.reads(field) : NaN);
  const lead = sourceLead(field, c);
  // Where the value stands on both sides of its equation it is the law's own, solved apart: the step shows that it fits.
  const row = (): Operand => operand(field.name, c.reads(field), field.kind);
  switch (field.name) {
    case 'I_DSS':
      if (lead.length === 0)
        return { formula: `${c.letter} * V_TO^2${at.factor}`, operands: [beta, vto, ...at.operands] };
      return {
        formula: `${c.letter} * (I_DSS * r_s + V_TO)^2${at.factor}`,
        operands: [beta, row(), vto, ...lead, ...at.operands],
      };
    case 'I_on':
      if (!field.conditions.has('V_GS')) return null;
      return {
        formula: `${c.letter} * (V_GS${lead.length > 0 ? ' - I_on * r_s' : ''} - V_TO)^2${at.factor}`,
        operands: [
          beta,
          condition('V_GS', field, c),
          vto,
          ...(lead.length > 0 ? [row()] : []),
          ...lead,
          ...at.operands,
        ],
      };
    case 'g_fs0':
      return zeroGateLaw(beta, vto, at, c);
    case 'g_fs':
      if (!field.conditions.has('I_D')) return zeroGateLaw(beta, vto, at, c);
      return {
        formula: seenOutside(`2 * sqrt(${c.letter}${at.factor} * I_D)`, at, c),
        operands: [beta, ...leads(c), ...at.operands, condition('I_D', field, c)],
      };
    case 'R_DSon': {
      const vgs = operand('V_GS', c.channel * (field.conditions.get('V_GS') ?? 0), VOLTAGE);
      const current = field.conditions.get('I_D') ?? 0;
      const inLeads = c.r_s + c.r_d > 0 ? 'r_s + r_d + ' : '';
      if (current === 0) {
        return {
          formula: `${inLeads}1 / (2 * ${c.letter} * (V_GS - V_TO))`,
          operands: [...leads(c), beta, vgs, vto],
        };
      }
      if (c.reads(field) === Infinity) return null;
      const vds = inLeads === '' ? 'I_D * R_DSon' : 'I_D * (R_DSon - r_s - r_d)';
      const drive = `2 * (V_GS${c.r_s > 0 ? ' - I_D * r_s' : ''} - V_TO) - ${vds}`;
      const lift = c.lambda === 0 ? '' : ` * (1 + lambda * ${vds})`;
      return {
        formula: `${inLeads}1 / (${c.letter} * (${drive})${lift})`,
        operands: [
          ...leads(c),
          beta,
          vgs,
          vto,
          operand('I_D', current, CURRENT),
          row(),
          ...(lift === '' ? [] : [operand('lambda', c.lambda, RECIPROCAL_VOLTAGE)]),
        ],
      };
    }
    default:
      return null;
  }
}

/** g_fs at V_GS = 0; with r_s the channel stands at a gate voltage that only its own current tells. */
function zeroGateLaw(
  beta: Operand,
  vto: Operand,
  at: ReturnType<typeof stated>,
  c: LawInHand,
): { formula: string; operands: Operand[] } {
  if (c.r_s === 0) return { formula: `2 * ${c.letter} * abs(V_TO)${at.factor}`, operands: [beta, vto, ...at.operands] };
  // The edge of saturation: I (r_s) solved as in part-forms.ts.
  const u = `(sqrt(1 + 4 * ${c.letter} * r_s * abs(V_TO)) - 1) / r_s`;
  return { formula: `1 / (r_s + 1 / (${u}))`, operands: [beta, operand('r_s', c.r_s, RESISTANCE), vto] };
}

/** A transconductance of the channel as the terminals show it. */
function seenOutside(gm: string, at: { readonly lift: string }, c: LawInHand): string {
  if (c.r_s + c.r_d === 0) return gm;
  const lengthened = at.lift === '' ? '' : ` + lambda * I_D / ${at.lift} * (r_s + r_d)`;
  return `${gm} / (1 + ${gm} * r_s${lengthened})`;
}

function leads(c: LawInHand): Operand[] {
  return c.r_s + c.r_d > 0 ? [operand('r_s', c.r_s, RESISTANCE), operand('r_d', c.r_d, RESISTANCE)] : [];
}

/** r_s as an operand, where a current of the row drops something across it. */
function sourceLead(field: GivenField, c: LawInHand): Operand[] {
  const hasCurrent = ['I_DSS', 'I_on'].includes(field.name) || field.conditions.has('I_D');
  return hasCurrent && c.r_s > 0 ? [operand('r_s', c.r_s, RESISTANCE)] : [];
}

/** (1 + lambda V_DS) of the channel of a row, as a factor and alone; nothing where no V_DS is stated or lambda is 0. */
function stated(
  field: GivenField,
  c: LawInHand,
  value = magnitude(field, c),
): { factor: string; lift: string; operands: Operand[] } {
  const vds = field.conditions.get('V_DS');
  if (vds === undefined || c.lambda === 0) return { factor: '', lift: '', operands: [] };
  const current = ['I_DSS', 'I_on'].includes(field.name) ? field.name : field.conditions.has('I_D') ? 'I_D' : null;
  const inLeads = current !== null && c.r_s + c.r_d > 0;
  const lift = inLeads ? `(1 + lambda * (V_DS - ${current} * (r_s + r_d)))` : '(1 + lambda * V_DS)';
  return {
    factor: ` * ${lift}`,
    lift,
    operands: [
      operand('lambda', c.lambda, RECIPROCAL_VOLTAGE),
      operand('V_DS', Math.abs(vds), VOLTAGE),
      ...(inLeads ? leads(c) : []),
      ...(inLeads && current !== 'I_D' ? [operand(current, value, field.kind)] : []),
    ],
  };
}

function condition(name: 'V_GS' | 'I_D', field: GivenField, c: LawInHand): Operand {
  const value = field.conditions.get(name) ?? NaN;
  return name === 'I_D' ? operand(name, value, CURRENT) : operand(name, c.channel * value, VOLTAGE);
}

function size(name: 'W' | 'L', c: LawInHand): Operand {
  const field = c.given.get(name)?.[0];
  const path = `${c.part}.${name}`;
  return field ? operand(path, c.read(field.handle), field.kind) : operand(path, 1, PLAIN);
}

/** A row's value in the n-channel frame. */
export function magnitude(field: GivenField, c: LawInHand): number {
  const value = c.read(field.handle);
  return ['V_P', 'V_GSoff', 'V_GSth'].includes(field.name) ? c.channel * value : value;
}

/** A named number of a step. */
export function operand(name: string, value: number, type: ValueKind): Operand {
  return { name, value, type, as: null };
}
