// What a row of a part leaves unsaid, and how it is taken.

import type { GivenField } from './part-given.ts';

/** How a row that settles the law is read where it does not say so itself, as sentences that go on behind its name. */
export function rowReadings(
  field: GivenField,
  { hasSlope, hasLeads }: { hasSlope: boolean; hasLeads: boolean },
): string[] {
  const lacks = (condition: string): boolean => !field.conditions.has(condition);
  switch (field.name) {
    case 'V_GSth':
    case 'V_GSoff':
      return lacks('I_D')
        ? [`no test current is stated; it is taken as ${field.name === 'V_GSth' ? 'V_TO' : 'V_P'} of the square law.`]
        : [];
    case 'R_DSon':
      return lacks('I_D') ? ['no I_D is stated; it is taken at V_DS = 0.'] : [];
    case 'g_os':
      return [
        ...(lacks('I_D') ? ['no I_D is stated; it is taken at I_DSS.'] : []),
        ...(hasLeads ? ['it is taken inside r_s and r_d; at the terminals it is smaller.'] : []),
      ];
    case 'I_DSS':
    case 'I_on':
    case 'g_fs':
      return [
        ...(field.name === 'g_fs' && lacks('I_D') ? ['no I_D is stated; it is taken as g_fs0, at V_GS = 0.'] : []),
        ...(hasSlope && lacks('V_DS')
          ? ['no V_DS is stated; it is taken at the edge of saturation, without lambda.']
          : []),
      ];
    default:
      return [];
  }
}
