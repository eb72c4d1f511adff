import { describe, expect, it } from 'vitest';
import { isCellName } from '../../src/language/index.ts';
import { deriveStage } from '../../src/network/index.ts';
import type { DerivationStep } from '../../src/network/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { evaluateText } from '../support/evaluate-expr.ts';
import { randomStage } from '../support/random-stage.ts';
import { lowerText } from '../support/stage-text.ts';
import type { StageSetup } from '../support/stage-text.ts';

function workings(setup: StageSetup): { steps: readonly DerivationStep[]; value: (name: string) => number } {
  const stage = lowerText(setup);
  if (stage.status !== 0) return { steps: [], value: stage.value };
  return { steps: deriveStage(stage.net, stage.lowering, stage.emitter.value), value: stage.value };
}

/** `name = formula` of every step. */
function lines(setup: StageSetup): string[] {
  return workings(setup).steps.map(({ name, formula }) => `${name} = ${formula}`);
}

/** What is wrong with the steps of one stage: names, formulas against their values, values against the program's. */
function faultsOf(setup: StageSetup): string[] {
  const { steps, value } = workings(setup);
  const faults: string[] = [];
  for (const { name, formula, operands, value: shown } of steps) {
    const where = `${name} = ${formula} (${shown})`;
    if (!isCellName(name)) faults.push(`${where}: ${name} is no name of a cell`);
    const values = new Map(operands.map((operand) => [operand.name, operand.value]));
    const again = evaluateText(formula, values);
    // A difference is as exact as its terms: the largest operand's last digits are allowed in a sum.
    const scale = / [+-] /.test(formula) ? Math.max(Math.abs(shown), 1e-3 * Math.abs(again)) : Math.abs(shown);
    if (!(again === shown || Math.abs(again - shown) <= 1e-9 * scale)) faults.push(`${where}: evaluates to ${again}`);
    if (name.endsWith('_rest')) {
      const left = steps.find((step) => step.name === name.replace('_rest', '_left'))!.value;
      if (!(Math.abs(shown) <= 1e-7 * Math.abs(left))) faults.push(`${where}: too much is left beside ${left}`);
    }
    for (const operand of operands) {
      const offered = value(operand.name);
      const close = Math.abs(offered - operand.value) <= 1e-9 * Math.abs(offered);
      if (!Number.isNaN(offered) && !close)
        faults.push(`${where}: ${operand.name} is ${operand.value}, not ${offered}`);
    }
  }
  return faults;
}

describe('the workings of a stage', () => {
  it(
    'can be evaluated as they stand, and give the numbers of the program, on 300 random stages',
    { timeout: 30_000 },
    () => {
      const draw = createDraw(11);
      const faults: string[] = [];
      for (let n = 0; n < 300; n++) {
        const setup = { ...randomStage(draw), channel: n % 2 === 0 ? 1 : -1 } as StageSetup;
        faults.push(...faultsOf(setup).map((fault) => `${fault} in stage ${n}`));
      }
      expect(faults).toEqual([]);
    },
  );

  it('show the divider, the two lines, both roots and the region test of the textbook', () => {
    const divider: StageSetup = {
      family: 'MOSFET',
      device: { beta: 0.5e-3, V_TO: 1 },
      lines: [
        'gate: 6e4 to 10 V, 4e4 to 0 V, 1e-6 F to signal',
        'drain: 2e3 to 10 V',
        'source: 1e3 to 0 V, 1e-4 F to 0 V',
      ],
      output: 'drain',
    };
    expect(lines(divider)).toEqual([
      'V_GG = R_gate2 / (R_gate + R_gate2) * 10 V',
      'R_m = R_source',
      'V_L = 10 V',
      'R_L = R_source + R_drain',
      'V_A = V_GG - V_TO',
      'root = sqrt(1 + 4 * beta * R_m * V_A)',
      'V_ov = 2 * V_A / (1 + root)',
      'V_ov2 = (-(1 + root)) / (2 * beta * R_m)',
      'I_D = beta * V_ov^2',
      'V_GS = V_GG - R_m * I_D',
      'V_DS = V_L - R_L * I_D',
      'V_DSsat = V_ov',
      'margin = V_DS - V_DSsat',
      'g_m = 2 * beta * V_ov',
      'g_ds = 0 S',
      'P_D = V_DS * I_D',
      'V_gate = R_gate2 / (R_gate + R_gate2) * 10 V',
      'V_source = I_D * R_source',
      'V_drain = 10 V - I_D * R_drain',
      'A_v = -(R_drain * g_m)',
      'R_in = R_gate || R_gate2',
      'R_out = R_drain',
    ]);
  });

  it('show both sides and what is left where the answer is numeric', () => {
    const shown = lines({
      device: { beta: 1e-3, V_TO: -2, lambda: 0.01 },
      lines: ['gate: 1e6 to 0 V', 'drain: 3300 to 15 V', 'source: 1200 to 0 V'],
    });
    expect(shown).toContain('I_D_right = beta * V_ov^2 * (1 + lambda * V_DS)');
    expect(shown).toContain('I_D_rest = I_D_left - I_D_right');
  });

  it('show that an ideal current source sets the current, and the root of the law that follows', () => {
    const shown = lines({
      device: { beta: 1e-3, V_TO: -2 },
      lines: ['gate: to signal', 'drain: to 15 V', 'source: 1e-3 A to 0 V'],
    });
    expect(shown.slice(0, 3)).toEqual(['I_D = I_source', 'V_ov = sqrt(I_D / beta)', 'V_GS = V_TO + V_ov']);
  });
});
