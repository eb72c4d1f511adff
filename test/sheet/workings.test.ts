import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { siUnitText } from '../../src/quantity/index.ts';
import { stepText, workingsOf } from '../../src/record/index.ts';
import { ANALYSES } from '../../src/spread/index.ts';
import { createSheet, evaluateExpression } from '../../src/sheet/index.ts';
import type { Sheet, WorkingStep } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomEngineSheet } from '../support/random-engine-sheet.ts';
import { randomStage } from '../support/random-stage.ts';
import { stageSheet } from '../support/stage-sheet.ts';

/** A closed form is shown only where it agrees with the solution so closely (design, section 4). */
const AGREEMENT = 1e-9;

type Operand = WorkingStep['operands'][number];

/** An operand as the language writes it, every digit of it, in parentheses. */
function inLanguage({ value, type }: Pick<Operand, 'value' | 'type'>): string {
  if (typeof value === 'string' || typeof type === 'string') return String(value);
  if (type.scale === 'celsius') return `(${value - 273.15} degC)`;
  const written = siUnitText(type).replace(/^1(?=\/|$)/, '');
  const unit = written === '' ? '' : ` ${written}`;
  if (Math.abs(value) === Infinity) return `(${Math.sign(value)}${unit} / 0)`;
  return `(${value}${unit})`;
}

/** The formula with its operands in place; longer names go first, so that A1.V_GS is not taken for V_GS. */
function inPlace({ formula, operands }: WorkingStep): string {
  const known = new Map(operands.map((operand) => [operand.name.replaceAll(' ', ''), inLanguage(operand)]));
  const calls = operands.filter(({ name }) => !/^[\w.]+$/.test(name));
  let text = formula;
  for (const call of calls) text = text.replaceAll(call.name, inLanguage(call));
  return text.replace(/[A-Za-z_][\w.]*(?![\w.(])/g, (name, at: number) => {
    // A name behind a digit or a blank and a digit is a unit.
    const isUnit = /[\d)] ?\/?$/.test(text.slice(0, at)) && !known.has(name);
    return isUnit ? name : (known.get(name) ?? name);
  });
}

/** What is wrong with a step; null where its formula gives its value. */
function wrong(step: WorkingStep): string | null {
  const text = inPlace(step);
  const result = evaluateExpression(text);
  const where = `${step.name} = ${step.formula} = ${text}`;
  if ('code' in result) return `${where}: ${result.text}`;
  const { value } = result;
  if (Object.is(value, step.value)) return null;
  if (typeof value !== 'number' || typeof step.value !== 'number') return `${where} is ${value}, not ${step.value}`;
  const close = Math.abs(value - step.value) <= AGREEMENT * Math.max(Math.abs(value), Math.abs(step.value));
  return close ? null : `${where} is ${value}, not ${step.value}`;
}

function stepsOf(sheet: Sheet): WorkingStep[] {
  return sheet.cells().flatMap((cell) => [...sheet.workings(cell.name)]);
}

const folder = 'public/examples';
const EXAMPLES = readdirSync(folder).map((file): [string, string] => [
  file,
  readFileSync(path.join(folder, file), 'utf8'),
]);

describe('every step of the workings gives its value from its formula and its operands', () => {
  it.each(EXAMPLES)('in the example %s', (_, text) => {
    const sheet = createSheet(text, ANALYSES);
    expect(
      stepsOf(sheet)
        .map(wrong)
        .filter((fault) => fault !== null),
    ).toEqual([]);
    for (const cell of sheet.cells()) {
      const printed = workingsOf(sheet, cell.name);
      expect(printed.filter((step) => !step.agrees).map(stepText)).toEqual([]);
      expect(cell.kind !== 'stage' || printed.length > 10, cell.name).toBe(true);
    }
  });

  it('in random stages of both channels', () => {
    const draw = createDraw(601);
    let steps = 0;
    let stages = 0;
    for (let k = 0; k < 60; k++) {
      const text = stageSheet(randomStage(draw), k % 2 === 0 ? 1 : -1);
      const sheet = createSheet(text);
      if (sheet.error('A1')) continue;
      stages++;
      const own = sheet.workings('A1');
      steps += own.length;
      expect(
        own.map(wrong).filter((fault) => fault !== null),
        text,
      ).toEqual([]);
      // The chain ends in what the stage offers.
      const offered = new Map(sheet.cell('A1')!.values.map(({ name, value }) => [name, value]));
      const ends = own.filter(({ name }) => offered.has(name!) && typeof offered.get(name!) === 'number');
      const off = ends.filter(({ name, value }) => {
        const there = offered.get(name!) as number;
        return !(Object.is(value, there) || Math.abs((value as number) - there) <= AGREEMENT * Math.abs(there));
      });
      expect(off, text).toEqual([]);
    }
    expect(stages).toBeGreaterThan(30);
    expect(steps).toBeGreaterThan(12 * stages);
  });

  it('in random sheets of quantities, parts, points and checks', () => {
    let steps = 0;
    for (let seed = 0; seed < 6; seed++) {
      const text = randomEngineSheet(createDraw(8000 + seed)).text();
      const all = stepsOf(createSheet(text));
      steps += all.length;
      expect(
        all.map(wrong).filter((fault) => fault !== null),
        text,
      ).toEqual([]);
    }
    expect(steps).toBeGreaterThan(200);
  });
});

describe('a step that does not add up is caught', () => {
  const steps = EXAMPLES.flatMap(([, text]) => stepsOf(createSheet(text))).filter(
    ({ value }) => typeof value === 'number' && Number.isFinite(value) && value !== 0,
  );
  const isPoint = ({ type }: WorkingStep): boolean => typeof type !== 'string' && type.scale === 'celsius';

  it('with another formula', () => {
    const tampered = steps
      .filter((step) => !isPoint(step))
      .map((step) => ({ ...step, formula: `(${step.formula}) * 1.000001` }));
    expect(tampered.length).toBeGreaterThan(50);
    expect(tampered.filter((step) => wrong(step) === null)).toEqual([]);
  });

  it('with one sign turned', () => {
    const turned = steps
      .filter(({ formula }) => formula.includes(' + '))
      .map((step) => ({ ...step, formula: step.formula.replace(' + ', ' - ') }));
    expect(turned.length).toBeGreaterThan(5);
    expect(turned.filter((step) => wrong(step) === null)).toEqual([]);
  });

  it('with another value', () => {
    const tampered = steps.map((step) => ({ ...step, value: (step.value as number) * (1 + 2e-9) }));
    expect(tampered.filter((step) => wrong(step) === null)).toEqual([]);
  });

  it('without one of its operands', () => {
    const tampered = steps
      .filter(({ operands }) => operands.length > 0)
      .map((step) => ({ ...step, operands: step.operands.slice(1) }));
    expect(tampered.filter((step) => wrong(step) === null)).toEqual([]);
  });
});
