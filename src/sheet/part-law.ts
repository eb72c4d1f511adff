// The constants of a part's square law: which of its rows settle them, what the other rows would say,
// and the same law in every convention of the trade.

import { DEFAULTS, LAMBDA_ROUTES, ROUTES, ROUTE_STATUS } from '../fet/index.ts';
import type { Route } from '../fet/index.ts';
import type { PartEntry } from '../language/index.ts';
import type { Handle } from '../network/index.ts';
import { PLAIN, formatValue } from '../quantity/index.ts';
import type { GivenField, GivenFields, RouteResult } from './part-given.ts';
import type { CellContext, OfferDraft, Placed, Read } from './draft.ts';
import { lawForms } from './part-forms.ts';
import { fittedLeadFault, leadDisagreement, leadsOf } from './part-leads.ts';
import { rowReadings } from './row-readings.ts';
import { stop } from './stop.ts';

/** Beyond this the routes of a part do not speak of one square law (design: 25 %). */
const DISAGREEMENT = 0.25;

export interface PartLaw {
  /** The first complete route: it computes. */
  readonly used: RouteResult;
  /** The other complete routes, for comparison. */
  readonly others: readonly RouteResult[];
  readonly lambda: Handle;
  /** Resistances in the leads: as given, or what the rows fit; null where there is none. */
  readonly r_s: Handle | null;
  readonly r_d: Handle | null;
  /** What was given, as the routes read it: g_fs of a JFET without a current is g_fs0. */
  readonly rows: GivenFields;
  /** How a row is read where it does not say so itself, by row; the same sentences stand among the assumptions. */
  readonly readings: ReadonlyMap<GivenField, readonly string[]>;
  readonly forms: readonly OfferDraft[];
  readonly assumptions: readonly string[];
  readonly verify: (read: Read) => Placed | null;
  readonly cautions: (read: Read) => { text: string; line: Placed['line'] }[];
}

/** Settles the law of a part from what it was given; stops when no route is complete. */
export function partLaw(entry: PartEntry, channel: 1 | -1, written: GivenFields, context: CellContext): PartLaw {
  const { builder, tree } = context;
  const given = asRoutesRead(entry.family, written);
  const assumptions: string[] = [];
  const defaults = DEFAULTS[entry.family];
  const slope = lambdaOf({ channel, given, lambda: NO_HANDLE, defaults, context });
  if (!slope)
    assumptions.push(`${tree.name.name}: lambda is 0 /V, since neither lambda nor g_os is given; r_o is infinite.`);
  const lambda = slope?.handle ?? builder.constant(0);

  const complete = ROUTES.filter(
    (route) => route.families.includes(entry.family) && isComplete(route, settling(given)),
  );
  if (complete.length === 0) incomplete(entry, given, context);
  const results = complete.map((route): RouteResult => {
    const inputs = route.inputs.map((input) => inputHandle(input, { channel, given, lambda, defaults, context }));
    const [beta, vto, status, R_0 = null] = builder.call(route.id, inputs, route.outputs.length);
    return { route, inputs, beta: beta!, V_TO: vto!, status: status!, R_0 };
  });
  const used = results[0]!;
  const others = results
    .slice(1)
    .filter(({ route }) => !hasLimitsAlone(route, used.route, given) && !complete.some((all) => isPartOf(route, all)));
  const { r_s, r_d } = leadsOf(used, given, context);
  const thresholds = ['V_GSoff', 'V_GSth']
    .flatMap((name) => given.get(name) ?? [])
    .filter((field) => field.conditions.has('I_D'));
  if (thresholds.length > 0 && used.route.inputs.includes('n')) {
    assumptions.push(
      `${tree.name.name}: n = ${defaults.n.value} in the law near the threshold, which turns ${thresholds[0]!.name} at its test current into V_TO.`,
    );
  }
  const readings = new Map<GivenField, string[]>();
  const hasLeads = r_s !== null || r_d !== null;
  const slopes = given.has('lambda') ? [] : (given.get('g_os') ?? []);
  const compared = given.get('g_fs0') === given.get('g_fs') ? (given.get('g_fs') ?? []) : [];
  for (const field of new Set([...fieldsOf(used.route, given), ...slopes, ...compared])) {
    if (field.measured) continue;
    const sentences = rowReadings(field, { hasSlope: slope !== null, hasLeads });
    readings.set(field, sentences);
    assumptions.push(...sentences.map((sentence) => `${tree.name.name}.${field.name}: ${sentence}`));
  }
  if (used.R_0 !== null && r_d !== null && !given.has('r_d')) {
    assumptions.push(
      `${tree.name.name}: the series part R_0 that the three R_DSon rows fit is taken to lie in the drain lead: r_d = R_0 - r_s.`,
    );
  }
  if (used.route.needs.includes('R_DSon2') && used.R_0 === null) {
    const none = hasLeads ? '' : ', which is 0 since neither is given';
    assumptions.push(`${tree.name.name}: the series part of both R_DSon rows is taken as R_0 = r_s + r_d${none}.`);
  }
  return {
    used,
    others,
    lambda,
    r_s,
    r_d,
    rows: given,
    readings,
    forms: lawForms(entry.family, channel, used, { lambda, r_s, r_d }, written, builder),
    assumptions: [...new Set(assumptions)],
    verify(read) {
      const bad = [
        { status: slope?.status ? read(slope.status) : 0, field: given.get('g_os')?.[0] },
        { status: read(used.status), field: fieldsOf(used.route, given)[0] },
      ].find(({ status }) => status !== 0);
      if (!bad) return fittedLeadFault(used, given, context, read);
      const line = bad.field?.tree.line ?? tree.line;
      const span = bad.field?.tree.body.span ?? tree.entry.span;
      const text = `${tree.name.name} does not settle its square law. ${ROUTE_STATUS[bad.status]!.sentence}`;
      return { line, message: { code: 'no-law', text, span } };
    },
    cautions: (read) => [
      ...others.flatMap((other) =>
        disagreement(used, other, read).map((text) => ({
          text,
          line: lineOf(other.route, used.route, given, context),
        })),
      ),
      ...leadDisagreement(used, given, read, DISAGREEMENT).map((text) => ({
        text,
        line: lineOf(used.route, null, given, context),
      })),
    ],
  };
}

/** The rows that may settle the law: those of a bench, where there is one. */
function settling(given: GivenFields): GivenFields {
  const measured = [...given].filter(([, fields]) => fields[0]!.measured);
  return measured.length > 0 ? new Map(measured) : given;
}

/** What was given with g_fs of a JFET that names no current as g_fs0, which is what a data sheet then means. */
function asRoutesRead(family: PartEntry['family'], given: GivenFields): GivenFields {
  const slope = given.get('g_fs');
  if (family !== 'JFET' || !slope || slope[0]!.conditions.has('I_D') || given.has('g_fs0')) return given;
  return new Map([...given, ['g_fs0', slope]]);
}

/** Whether a route takes some of the rows that another one takes whole. */
function isPartOf(route: Route, all: Route): boolean {
  return all.needs.length > route.needs.length && route.needs.every((need) => all.needs.includes(need));
}

/** Whether a route rests on a row of limits alone that the used one does not need: such a row cuts the declared set and names no number to compare. */
function hasLimitsAlone(route: Route, used: Route, given: GivenFields): boolean {
  const needed = fieldNames(used);
  return fieldsOf(route, given).some((field) => field.quantity.chosen && !needed.includes(field.name));
}

/** The fields a route takes, in its order. */
export function fieldsOf(route: Route, given: GivenFields): GivenField[] {
  return fieldNames(route).flatMap((name) => given.get(name) ?? []);
}

/** The names of the fields a route takes, each once. */
export function fieldNames(route: Route): string[] {
  return [...new Set(route.needs.map((need) => parseInput(need).field))];
}

/** beta of one route against the used one: 0.12 is 12 % more; null where the other has no solution. */
export function routeDifference(used: RouteResult, other: RouteResult, read: Read): number | null {
  return read(other.status) === 0 ? read(other.beta) / read(used.beta) - 1 : null;
}

/** How a route is called: `I_DSS with V_GSoff`. */
export function routeName(route: Route): string {
  return fieldNames(route).join(' with ');
}

function disagreement(used: RouteResult, other: RouteResult, read: Read): string[] {
  const difference = routeDifference(used, other, read);
  if (difference === null) return [`${routeName(other.route)} gives no square law beside ${routeName(used.route)}.`];
  if (Math.abs(difference) <= DISAGREEMENT) return [];
  const percent = formatValue(Math.abs(difference) * 100, PLAIN, { digits: 2 }).text;
  return [
    `${routeName(other.route)} puts the square-law constant ${percent} % ${difference > 0 ? 'above' : 'below'} ${routeName(used.route)}: the square law is not supported over that range.`,
  ];
}

/** The line of the last row of a route, of those that another one does not take. */
function lineOf(route: Route, beside: Route | null, given: GivenFields, context: CellContext): Placed['line'] {
  const all = fieldsOf(route, given);
  const known = beside === null ? [] : fieldsOf(beside, given);
  const own = all.filter((field) => !known.includes(field));
  const fields = own.length > 0 ? own : all;
  return fields[fields.length - 1]?.tree.line ?? context.tree.line;
}

function isComplete(route: Route, given: GivenFields): boolean {
  return isGiven(route.needs, given);
}

function isGiven(needs: readonly string[], given: GivenFields): boolean {
  return needs.every((input) => {
    const { field, nth, condition } = parseInput(input);
    const found = given.get(field)?.[nth];
    return found !== undefined && (condition === null || found.conditions.has(condition));
  });
}

/** Stands where lambda itself is being worked out. */
const NO_HANDLE: Handle = -1;

interface Inputs {
  readonly channel: 1 | -1;
  readonly given: GivenFields;
  readonly lambda: Handle;
  readonly defaults: (typeof DEFAULTS)['JFET'];
  readonly context: CellContext;
}

/** The slot of a route's input: a field, a field's test condition (NaN where none is stated), or a constant of the family. */
function inputHandle(input: string, { channel, given, lambda, defaults, context }: Inputs): Handle {
  const { builder } = context;
  switch (input) {
    case 'channel':
      return builder.constant(channel);
    case 'lambda':
      return lambda;
    case 'n':
      return builder.constant(defaults.n.value);
    case 'T_nom':
      return given.get('T_nom')?.[0]?.handle ?? builder.constant(defaults.T_nom.value);
    case 'r_s':
    case 'r_d':
      return given.get(input)?.[0]?.handle ?? builder.constant(0);
  }
  const { field, nth, condition } = parseInput(input);
  const found = given.get(field)?.[nth];
  if (condition !== null) return builder.constant(found?.conditions.get(condition) ?? NaN);
  if (found) return found.handle;
  return builder.constant(field === 'W' || field === 'L' ? 1 : NaN);
}

/** `R_DSon2@V_GS` is the condition V_GS of the second R_DSon. */
function parseInput(input: string): { field: string; nth: number; condition: string | null } {
  const [name, condition = null] = input.split('@') as [string, string?];
  const numbered = /^(R_DSon)([23])$/.exec(name);
  return { field: numbered ? numbered[1]! : name, nth: numbered ? Number(numbered[2]) - 1 : 0, condition };
}

/** lambda as given, or from g_os with its status; null where neither is given. */
function lambdaOf(inputs: Inputs): { handle: Handle; status: Handle | null } | null {
  const { given, context } = inputs;
  const lambda = given.get('lambda')?.[0];
  if (lambda) return { handle: lambda.handle, status: null };
  const slope = given.get('g_os')?.[0];
  if (!slope) return null;
  const route = LAMBDA_ROUTES.find((candidate) => isGiven(candidate.needs, given));
  if (!route) {
    stop(
      'g_os-current',
      `g_os belongs to a drain current: write g_os: 20 uS at I_D = 1 mA, V_DS = 10 V.`,
      slope.tree.body.span,
      slope.tree.line,
    );
  }
  const [handle, status] = context.builder.call(
    route.id,
    route.inputs.map((input) => inputHandle(input, inputs)),
    route.outputs.length,
  );
  return { handle: handle!, status: status! };
}

function incomplete(entry: PartEntry, given: GivenFields, context: CellContext): never {
  const wanted =
    entry.family === 'JFET'
      ? 'I_DSS with V_P or V_GSoff, or beta with V_TO, or I_DSS with beta, or g_fs0 with I_DSS, or V_P with g_fs at a drain current'
      : 'V_TO or V_GSth with one of K, K_P, I_on at a V_GS, g_fs at an I_D, R_DSon at a V_GS; or I_DSS with V_P or V_GSoff; or two R_DSon at different V_GS';
  const missing = ['I_on', 'R_DSon'].find((name) => given.has(name) && !given.get(name)![0]!.conditions.has('V_GS'));
  const noCurrent = given.has('g_fs') && !given.get('g_fs')![0]!.conditions.has('I_D');
  const hint =
    missing && entry.family === 'MOSFET'
      ? ` ${missing} counts only with its V_GS: write at V_GS = 10 V behind it.`
      : noCurrent
        ? ' g_fs counts only with its current: write at I_D = 10 mA behind it.'
        : '';
  stop(
    'part-incomplete',
    `${context.tree.name.name} does not settle its square law. It wants ${wanted}.${hint}`,
    entry.span,
  );
}
