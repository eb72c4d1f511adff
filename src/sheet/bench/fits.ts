// The numbers of a bench: each specimen fitted, those that are kept put together, groups that match, and the resistor
// that sets each to a current.

import { channelCurrent } from '../../fet/index.ts';
import { fitLaw } from '../../measured/index.ts';
import type { LawFit, Points } from '../../measured/index.ts';
import { formatValue, VOLTAGE } from '../../quantity/index.ts';
import { stop } from '../stop.ts';
import type { SpecimenReading } from './bench-reading.ts';
import type { BenchRows, BenchSpecimen } from './rows.ts';
import type { BenchSettings, Keep } from './settings.ts';

/** A specimen with its fit; `free` has the exponent fitted, too. */
export interface FittedSpecimen {
  readonly specimen: BenchSpecimen;
  readonly fit: LawFit;
  readonly free: LawFit | null;
  readonly reading: SpecimenReading;
}

/** A specimen that has no law, and why. */
export interface UnfittedSpecimen {
  readonly specimen: BenchSpecimen;
  readonly text: string;
}

/** The laws of a specimen, and what they were found from. */
interface Laws {
  readonly points: Points;
  readonly asked: string;
  readonly fit: LawFit;
  readonly free: LawFit | null;
}

/** By the tree of a specimen's first row, which stays as long as its line does: an edit elsewhere in the table fits nothing again. */
const FOUND = new WeakMap<object, Laws>();

/** Fits every specimen; a dead one among others is left out. Stops where no law fits any. */
export function fitSpecimens(
  { channel, specimens }: BenchRows,
  settings: BenchSettings,
): { readonly fitted: readonly FittedSpecimen[]; readonly unfitted: readonly UnfittedSpecimen[] } {
  const fitted: FittedSpecimen[] = [];
  const unfitted: UnfittedSpecimen[] = [];
  for (const specimen of specimens) {
    const laws = lawsOf(specimen, channel, settings);
    if ('text' in laws) unfitted.push({ specimen, text: laws.text });
    else fitted.push({ specimen, ...laws, reading: readingOf(specimen, laws.fit, laws.free, settings) });
  }
  if (fitted.length === 0) unfit(unfitted[0]!);
  return { fitted, unfitted };
}

function lawsOf(
  { points, rows }: BenchSpecimen,
  channel: 1 | -1,
  { lambda, exponent }: BenchSettings,
): Laws | { readonly text: string } {
  const asked = `${channel} ${lambda} ${exponent}`;
  const key = rows[0]!.values;
  const known = FOUND.get(key);
  if (known && known.asked === asked && isSame(known.points, points)) return known;
  const fit = fitLaw(points, { channel, exponent: 'square', lambda });
  const free = exponent === 'free' ? fitLaw(points, { channel, exponent, lambda }) : null;
  if ('code' in fit) return fit;
  if (free && 'code' in free) return free;
  const laws = { points, asked, fit, free };
  FOUND.set(key, laws);
  return laws;
}

function isSame(a: Points, b: Points): boolean {
  return (['V_GS', 'V_DS', 'I_D'] as const).every(
    (name) => a[name].length === b[name].length && a[name].every((value, i) => value === b[name][i]),
  );
}

function unfit({ specimen, text }: UnfittedSpecimen): never {
  const { name, rows } = specimen;
  const [first] = rows;
  const span = { start: first!.values[0]!.span.start, end: first!.values.at(-1)!.span.end };
  return stop('bench-fit', `${name === '' ? 'The bench' : name} cannot be fitted. ${text}`, span, first!.line);
}

function readingOf(
  specimen: BenchSpecimen,
  fit: LawFit,
  free: LawFit | null,
  settings: BenchSettings,
): SpecimenReading {
  const { channel, beta, V_TO, lambda, errors } = fit;
  const drive = -channel * V_TO;
  const current = drive > 0 ? beta * drive * drive : 0;
  return {
    name: specimen.name,
    isKept: settings.keep.every((keep) => isKept(fit, current, keep)),
    points: specimen.points,
    regions: fit.regions,
    residuals: fit.residuals,
    beta,
    V_TO,
    I_DSS: current,
    lambda,
    exponent: (free ?? fit).exponent,
    errors: {
      beta: known(errors.beta),
      V_TO: known(errors.V_TO),
      I_DSS: drive > 0 ? known(currentError(fit)) : null,
      lambda: known(errors.lambda),
      exponent: known(free?.errors.exponent ?? null),
    },
    rms: fit.rms,
    law: (vgs, vds) => channelCurrent(beta, lambda, channel * (vgs - V_TO), channel * vds),
  };
}

/** As many readings as constants leave nothing from which an error could be told. */
function known(error: number | null): number | null {
  return error === null || Number.isNaN(error) ? null : error;
}

/** Standard error of beta V_TO²: the two constants are correlated, and their product carries that. */
function currentError({ channel, beta, V_TO, errors, correlation }: LawFit): number {
  const fromBeta = V_TO * V_TO * errors.beta;
  const fromThreshold = 2 * beta * channel * V_TO * errors.V_TO;
  const square = fromBeta * fromBeta + fromThreshold * fromThreshold + 2 * correlation * fromBeta * fromThreshold;
  return Math.sqrt(Math.max(0, square));
}

function isKept(fit: LawFit, current: number, { quantity, low, high, at }: Keep): boolean {
  const value = {
    V_P: fit.V_TO,
    V_TO: fit.V_TO,
    I_DSS: current,
    beta: fit.beta,
    lambda: fit.lambda,
    V_GS: at ? gateAt(fit, at) : NaN,
  }[quantity];
  return value >= (low ?? -Infinity) && value <= (high ?? Infinity);
}

/** V_GS at a current in saturation, as a voltmeter shows it; V_DS by its amount, NaN for the edge of saturation without lambda. */
export function gateAt(
  { channel, beta, V_TO, lambda }: LawFit,
  { I_D, V_DS }: { readonly I_D: number; readonly V_DS: number },
): number {
  const lift = Number.isNaN(V_DS) ? 1 : 1 + lambda * V_DS;
  return V_TO + channel * Math.sqrt(I_D / (beta * lift));
}

/** Stops where the lines `keep` leave no specimen, with what there is. */
export function checkKept(specimens: readonly FittedSpecimen[], { keep }: BenchSettings): void {
  if (keep.length === 0 || specimens.some(({ reading }) => reading.isKept)) return;
  const [first] = keep;
  const thresholds = specimens.map(({ fit }) => fit.V_TO);
  const [low, high] = [Math.min(...thresholds), Math.max(...thresholds)].map(
    (volts) => formatValue(volts, VOLTAGE).text,
  );
  stop(
    'bench-keep',
    `No specimen is kept. Their V_TO goes from ${low} to ${high}.`,
    first!.tree.body.span,
    first!.tree.line,
  );
}
