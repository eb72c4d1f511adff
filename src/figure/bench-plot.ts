// The plot of a bench: measured points as rings on the fitted law, and below them what the readings differ by.
// Readings along the gate voltage stand over V_GS, a curve for each V_DS; those along the drain over V_DS, one for each V_GS.

import type { SheetView } from '../sheet/index.ts';
import { CURRENT, VOLTAGE, formatValue } from '../quantity/index.ts';
import { createAxis } from './axis.ts';
import type { Axis } from './axis.ts';
import type { Chart, Curve, CurveRole } from './chart.ts';
import { sample } from './sample.ts';

type Bench = NonNullable<ReturnType<SheetView['bench']>>;
type Specimen = Bench['specimens'][number];

const ROLES: readonly CurveRole[] = ['nominal', 'low', 'high', 'fourth', 'fifth'];
/** Curves that still get a label each; more are told apart in the table. */
const MOST_LABELLED = 5;
/** Curves drawn of one specimen. */
const MOST_CURVES = 12;
const ROOM = 1.06;
/** Voltages closer than this share of the largest are one. */
const SAME = 1e-3;

/** Points with the law above, residuals below. */
export function benchCharts(bench: Bench): Chart[] {
  const { specimens } = bench;
  const all = (quantity: 'V_GS' | 'V_DS'): number[] => specimens.flatMap(({ points }) => [...points[quantity]]);
  const along = distinct(all('V_GS')).length >= distinct(all('V_DS')).length ? 'V_GS' : 'V_DS';
  const held = along === 'V_GS' ? 'V_DS' : 'V_GS';
  const x = voltageAxis(along, all(along));
  const currents = specimens.flatMap(({ points }) => [...points.I_D]);
  const y = createAxis('I_D', CURRENT, { low: Math.min(0, ...currents) * ROOM, high: Math.max(0, ...currents) * ROOM });
  const curves = specimens.flatMap((specimen, i) => lawCurves(specimen, i, bench, { along, held, x, y }));
  const measured = specimens.map((specimen) => ringsOf(specimen, specimen.points[along], specimen.points.I_D, bench));
  const sentence = `Bench ${bench.name}: ${currents.length} readings and the fitted square law of ${specimens.length === 1 ? 'one specimen' : `${specimens.length} specimens`}; ${specimens
    .slice(0, MOST_LABELLED)
    .map(
      (each) =>
        `${each.name === '' ? '' : `${each.name} `}V_TO ${formatValue(each.V_TO, VOLTAGE).text}, rms ${formatValue(each.rms, CURRENT).text}`,
    )
    .join('; ')}.`;
  const common = { yAt: yAtOf(x), areas: [], posts: [], marks: [] } as const;
  return [
    { title: `Bench ${bench.name}`, sentence, x, y, ...common, curves: [...curves, ...measured] },
    { title: `Residuals of ${bench.name}`, ...residuals(bench, along), x, ...common },
  ];
}

function residuals(bench: Bench, along: 'V_GS' | 'V_DS'): Pick<Chart, 'y' | 'curves' | 'sentence'> {
  const largest = Math.max(...bench.specimens.flatMap((each) => [...each.residuals].map(Math.abs)));
  const reach = largest > 0 ? largest * (1 + 2 * (ROOM - 1)) : 1e-9;
  const y = createAxis('measured - law', CURRENT, { low: -reach, high: reach });
  const curves = bench.specimens.map((each) => ringsOf(each, each.points[along], each.residuals, bench));
  const sentence = `What the readings of ${bench.name} differ from the law by: at most ${formatValue(largest, CURRENT).text}.`;
  return { y, curves, sentence };
}

/** The law of one specimen at each voltage that was held. */
function lawCurves(
  specimen: Specimen,
  i: number,
  { specimens }: Bench,
  { along, held, x, y }: { along: 'V_GS' | 'V_DS'; held: 'V_GS' | 'V_DS'; x: Axis; y: Axis },
): Curve[] {
  const steps = distinct([...specimen.points[held]]).slice(0, MOST_CURVES);
  const isOne = specimens.length === 1;
  const count = isOne ? steps.length : specimens.length;
  return steps.map((volts, k): Curve => {
    const law = (at: number): number => (along === 'V_GS' ? specimen.law(at, volts) : specimen.law(volts, at));
    const { x: xs, y: raw } = sample(law, x.low, x.high);
    const ys = raw.map((current) => (current <= y.high ? current : NaN));
    const at = `${held} ${formatValue(volts, VOLTAGE).text}`;
    const named = specimen.name === '' ? '' : specimen.name;
    const label = isOne ? (steps.length === 1 ? 'fitted law' : formatValue(volts, VOLTAGE).text) : k === 0 ? named : '';
    const role = count > MOST_LABELLED ? 'family' : ROLES[(isOne ? k : i) % ROLES.length]!;
    return {
      role: isOne && k === 0 ? 'nominal' : role,
      x: xs,
      y: ys,
      label: count > MOST_LABELLED && !isOne ? '' : label,
      said: [named, 'law', steps.length > 1 ? at : ''].filter((word) => word !== '').join(' '),
      labelAt: along === 'V_DS' ? 0.95 : 0.8,
    };
  });
}

function ringsOf(specimen: Specimen, x: Float64Array, y: Float64Array, { specimens }: Bench): Curve {
  const order = Array.from(x.keys()).toSorted((a, b) => x[a]! - x[b]!);
  const said = specimens.length === 1 ? 'measured' : `${specimen.name} measured`;
  return {
    role: 'nominal',
    x: Float64Array.from(order, (k) => x[k]!),
    y: Float64Array.from(order, (k) => y[k]!),
    label: '',
    said,
    rings: 'only',
  };
}

function voltageAxis(symbol: string, volts: readonly number[]): Axis {
  const [low, high] = [Math.min(0, ...volts), Math.max(0, ...volts)];
  const room = (high - low || 1) * (ROOM - 1);
  return createAxis(symbol, VOLTAGE, {
    low: low < 0 ? low - room : low,
    high: high > 0 || low === 0 ? high + room : high,
  });
}

/** On the side of V = 0, where the trade has it. */
function yAtOf(x: Axis): Chart['yAt'] {
  return Math.abs(x.low) > Math.abs(x.high) ? 'right' : 'left';
}

/** The different voltages, nearly equal ones once. */
function distinct(values: readonly number[]): number[] {
  const least = Math.max(...values.map(Math.abs)) * SAME;
  const found: number[] = [];
  for (const value of values) if (!found.some((other) => Math.abs(other - value) <= least)) found.push(value);
  return found;
}
