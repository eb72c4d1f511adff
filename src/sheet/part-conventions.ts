// The law of a part in every convention of the trade, each at a condition of its own, and the routes that lead to it.
//
// A convention that needs a condition takes that of the part's own row where there is one. Else it is read where data sheets
// mostly give it (common practice, no source): V_GSoff at 10 nA, V_GSth at 250 uA, R_DSon and I_on of an enhancement MOSFET at
// a V_GS of 10 V, g_fs and g_os at the power of ten at or below half of the full current, at a V_DS of 10 V.

import type { PartEntry } from '../language/index.ts';
import type { Read } from './draft.ts';
import { conventionValue, lawNumbers } from './law-numbers.ts';
import type { Conditions, LawNumbers } from './law-numbers.ts';
import type { ConventionReading, PartReading, RouteReading } from './model.ts';
import { CONDITION_KINDS, PART_FIELDS } from './part-fields.ts';
import type { GivenFields } from './part-given.ts';
import { routeDifference, routeName } from './part-law.ts';
import type { PartLaw } from './part-law.ts';

const OFF_CURRENT = 10e-9;
const THRESHOLD_CURRENT = 250e-6;
const FULL_DRIVE = 10;
const DRAIN_VOLTAGE = 10;

/** All conventions that apply to the part, in a fixed order, and its complete routes, the one that computes first. */
export function partReading(entry: PartEntry, law: PartLaw, given: GivenFields, read: Read): PartReading {
  const numbers = lawNumbers(entry, law, given, read);
  return {
    conventions: conventionsOf(numbers, given, read),
    routes: routesOf(numbers, law, read),
  };
}

function conventionsOf(law: LawNumbers, given: GivenFields, read: Read): ConventionReading[] {
  return namesFor(law).flatMap((name): ConventionReading[] => {
    const own = given.get(name) ?? [];
    const rows = own.length > 0 ? own : [null];
    return rows.flatMap((field): ConventionReading[] => {
      const conditions = field?.conditions ?? usualConditions(name, law, given);
      const value = conventionValue(name, law, conditions);
      if (Number.isNaN(value)) return [];
      const { kind, sentence } = PART_FIELDS[name]!;
      return [
        {
          name,
          conditions: [...conditions].map(([condition, at]) => ({
            name: condition,
            value: at,
            type: CONDITION_KINDS[condition]!,
          })),
          value,
          type: kind,
          as: null,
          written: field === null ? null : read(field.handle),
          sentence,
        },
      ];
    });
  });
}

function namesFor({ family, known }: LawNumbers): string[] {
  const depletion = ['I_DSS', 'V_P', 'V_GSoff'];
  const slopes = known.lambda === 0 ? ['g_fs', 'lambda'] : ['g_fs', 'lambda', 'g_os'];
  if (family === 'JFET') return ['beta', 'V_TO', ...depletion, 'g_fs0', 'R_DSon', ...slopes];
  const rest = known.V_TO! < 0 ? depletion : ['V_GSth', 'I_on'];
  return ['K', 'K_P', 'V_TO', ...rest, 'R_DSon', ...slopes];
}

/** Where a convention is read that no row of the part gives a condition for. */
function usualConditions(name: string, law: LawNumbers, given: GivenFields): Conditions {
  const { family, channel, known } = law;
  const at = (condition: string, value: number): Conditions => new Map([[condition, value]]);
  switch (name) {
    case 'V_GSoff':
      return at('I_D', OFF_CURRENT);
    case 'V_GSth':
      return at('I_D', THRESHOLD_CURRENT);
    case 'I_on':
      return at('V_GS', channel * FULL_DRIVE);
    case 'R_DSon':
      return at('V_GS', family === 'JFET' || known.V_TO! < 0 ? 0 : channel * FULL_DRIVE);
    case 'g_fs':
    case 'g_os': {
      const full = known.V_TO! < 0 ? 'I_DSS' : 'I_on';
      const most = conventionValue(full, law, usualConditions(full, law, given));
      if (!(most > 0)) return at('I_D', NaN);
      const current = powerOfTen(most / 2);
      return name === 'g_fs'
        ? at('I_D', current)
        : new Map([
            ['I_D', current],
            ['V_DS', drainVoltage(law, given)],
          ]);
    }
    default:
      return new Map();
  }
}

function drainVoltage({ channel }: LawNumbers, given: GivenFields): number {
  return given.get('I_DSS')?.[0]?.conditions.get('V_DS') ?? channel * DRAIN_VOLTAGE;
}

/** The power of ten at or below a number above 0. */
function powerOfTen(x: number): number {
  let exponent = -15;
  while (Number(`1e${exponent + 1}`) <= x) exponent++;
  return Number(`1e${exponent}`);
}

function routesOf({ family, channel }: LawNumbers, law: PartLaw, read: Read): RouteReading[] {
  return [law.used, ...law.others].map((result): RouteReading => {
    const difference = result === law.used ? 0 : routeDifference(law.used, result, read);
    const threshold = read(result.V_TO);
    return {
      name: routeName(result.route),
      beta: difference === null ? null : read(result.beta),
      V_TO: difference === null ? null : family === 'JFET' ? threshold : channel * threshold,
      difference,
    };
  });
}
