// Workings of a bench: the fitted law at the largest reading of each specimen, and the medians of several.
//
// All voltages of these lines are in the n-channel frame, as those of a part.

import { CURRENT, PLAIN, RECIPROCAL_VOLTAGE, SQUARE_LAW_CONSTANT, VOLTAGE, formatValue } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import { evaluateStep } from '../evaluate-step.ts';
import type { WorkingStep } from '../model.ts';
import type { FittedSpecimen } from './fits.ts';
import type { Measured } from './measured.ts';

/** The steps of a bench. */
export function benchWorkings(name: string, specimens: readonly FittedSpecimen[], measured: Measured): WorkingStep[] {
  const steps = specimens.map((each) => lawStep(each));
  const frame = measured.channel === -1 ? ' Voltages are mirrored into the frame of an n-channel FET.' : '';
  if (frame) steps[0] = { ...steps[0]!, sentence: `${steps[0]!.sentence}${frame}` };
  if (measured.specimens === 1) return steps;
  const kept = specimens.filter(({ reading }) => reading.isKept);
  return [
    ...steps,
    median(name, 'V_TO', VOLTAGE, kept, measured.V_TO),
    ...(measured.depletion
      ? [median(name, 'I_DSS', CURRENT, kept, measured.I_DSS)]
      : [median(name, 'beta', SQUARE_LAW_CONSTANT, kept, measured.beta)]),
  ];
}

/** The law at the largest reading, beside what was measured there. */
function lawStep({ specimen, fit, free, reading }: FittedSpecimen): WorkingStep {
  const { points } = specimen;
  const largest = points.I_D.reduce((most, current, i) => (current > points.I_D[most]! ? i : most), 0);
  const { channel, beta, V_TO, lambda } = fit;
  const vgs = channel * points.V_GS[largest]!;
  const vds = channel * points.V_DS[largest]!;
  const isOhmic = vds < vgs - channel * V_TO;
  const operands = [
    operand('beta', beta, SQUARE_LAW_CONSTANT),
    operand('V_GS', vgs, VOLTAGE),
    operand('V_TO', channel * V_TO, VOLTAGE),
    operand('lambda', lambda, RECIPROCAL_VOLTAGE),
    operand('V_DS', vds, VOLTAGE),
  ];
  const drive = isOhmic ? 'V_DS * (2 * (V_GS - V_TO) - V_DS)' : '(V_GS - V_TO)^2';
  const formula = `beta * ${drive} * (1 + lambda * V_DS)`;
  const value = evaluateStep({ formula, operands });
  const said = [
    `${specimen.name === '' ? 'The' : `${specimen.name}: the`} fitted law at its largest reading, ${shown(points.I_D[largest]!, CURRENT)}.`,
    errorsText(reading),
    `Its ${points.I_D.length} readings differ from it by ${shown(reading.rms, CURRENT)} rms.`,
    ...(free
      ? [
          `The exponent that fits best is ${shown(free.exponent, PLAIN)}${reading.errors.exponent === null ? '' : `, standard error ${shown(reading.errors.exponent, PLAIN)}`}; it leaves ${shown(free.rms, CURRENT)} rms.`,
        ]
      : []),
  ];
  return { name: 'I_D', formula, operands, value, type: CURRENT, as: null, sentence: said.join(' ') };
}

/** The median of the specimens that are kept: the middle one, or the mean of the two in the middle. */
function median(
  bench: string,
  name: 'V_TO' | 'I_DSS' | 'beta',
  kind: ValueKind,
  kept: readonly FittedSpecimen[],
  { nominal, low, high }: Measured['beta'],
): WorkingStep {
  const sorted = kept.map(({ reading }) => reading).toSorted((a, b) => a[name] - b[name]);
  const middle = sorted.slice((sorted.length - 1) >> 1, (sorted.length >> 1) + 1);
  const paths = middle.map((each) => `${bench}.${each.name}.${name}`);
  return {
    name,
    formula: paths.length === 1 ? paths[0]! : `(${paths.join(' + ')}) / 2`,
    operands: middle.map((each, i) => operand(paths[i]!, each[name], kind)),
    value: nominal,
    type: kind,
    as: null,
    sentence: `The median of ${kept.length} ${kept.length === 1 ? 'specimen' : 'specimens'}, which ${kept.length === 1 ? 'lies' : 'lie'} from ${shown(low!, kind)} to ${shown(high!, kind)}.`,
  };
}

function errorsText({ errors }: FittedSpecimen['reading']): string {
  const parts = (
    [
      ['beta', SQUARE_LAW_CONSTANT],
      ['V_TO', VOLTAGE],
      ['lambda', RECIPROCAL_VOLTAGE],
    ] as const
  ).flatMap(([name, kind]) => {
    const error = errors[name];
    return error === null ? [] : [`${name} ${shown(error, kind)}`];
  });
  return parts.length === 0
    ? 'As many readings as constants leave no standard errors.'
    : `Standard errors: ${parts.join(', ')}.`;
}

function shown(value: number, kind: ValueKind): string {
  return formatValue(value, kind).text;
}

function operand(name: string, value: number, type: ValueKind): WorkingStep['operands'][number] {
  return { name, value, type, as: null };
}
