// How the reading of a part's numbers can end. The code stands in a slot beside the results; results of
// anything but `ok` are NaN.

export const OK = 0;
export const MISSING = 1;
export const NOT_POSITIVE = 2;
export const WRONG_SIGN = 3;
export const NO_OVERDRIVE = 4;
export const TEST_CURRENT = 5;
export const WEAK_INVERSION = 6;
export const SERIES_RESISTANCE = 7;
export const NOT_OHMIC = 8;
export const NOT_SATURATED = 9;
export const LINES_DISAGREE = 10;
export const TOO_STEEP = 11;
export const OUTPUT_CONDUCTANCE = 12;
export const LEADS = 13;

interface RouteStatus {
  readonly name: string;
  /** What is wrong, what would be right; empty for `ok`. */
  readonly sentence: string;
}

/** By code. */
export const ROUTE_STATUS: readonly RouteStatus[] = [
  { name: 'ok', sentence: '' },
  { name: 'missing', sentence: 'A number that this needs is not known here.' },
  { name: 'not positive', sentence: 'Currents, conductances, resistances and square-law constants are above 0.' },
  { name: 'wrong sign', sentence: 'A voltage has the sign of the other channel.' },
  {
    name: 'no overdrive',
    sentence: 'V_GS of the line does not lie beyond the threshold, where the square law carries a current.',
  },
  {
    name: 'test current',
    sentence: 'The test current is not below the current of the other line, as a test at cut-off wants.',
  },
  {
    name: 'weak inversion',
    sentence:
      'No square law passes through both: between the test current and the other line lies little more than weak inversion. A pinch-off voltage without test current would do.',
  },
  { name: 'series resistance', sentence: 'R_DSon is not above r_s + r_d, which are part of it.' },
  { name: 'not ohmic', sentence: 'At the current of R_DSon the channel would be saturated; a smaller I_D would do.' },
  { name: 'not saturated', sentence: 'At its V_DS the channel is not saturated; a larger V_DS would do.' },
  {
    name: 'lines disagree',
    sentence: 'The R_DSon lines do not lie on one square law with a series resistance: R_DSon must fall as V_GS rises.',
  },
  { name: 'too steep', sentence: 'g_fs exceeds I_D / (n V_T), which is the most that a FET can have at that current.' },
  {
    name: 'output conductance',
    sentence: 'g_os V_DS is not below I_D, so no lambda fits; g_os or I_D is of another device.',
  },
  {
    name: 'leads',
    sentence: 'The leads leave nothing of it: V_DS exceeds the drop across r_s and r_d, and g_fs lies below 1 / r_s.',
  },
];
