// The units of the published figures, as SI factors of their own: the comparison shares no unit table with what it tests.

/** Factor to SI and, for temperatures in degrees Celsius, what is added first. */
const PUBLISHED_UNITS: Readonly<Record<string, readonly [factor: number, offset?: number]>> = {
  '': [1],
  '1': [1],
  'V/V': [1],
  'V/V (magnitude)': [1],
  '%': [1e-2],
  dB: [1],
  V: [1],
  uV: [1e-6],
  mA: [1e-3],
  uA: [1e-6],
  nA: [1e-9],
  ohm: [1],
  kohm: [1e3],
  Mohm: [1e6],
  mS: [1e-3],
  uS: [1e-6],
  'mA/V': [1e-3],
  'uA/V^2': [1e-6],
  W: [1],
  mW: [1e-3],
  fW: [1e-15],
  kHz: [1e3],
  MHz: [1e6],
  uF: [1e-6],
  nF: [1e-9],
  pF: [1e-12],
  'fF/um^2': [1e-3],
  'F/cm^2': [1e4],
  ms: [1e-3],
  ns: [1e-9],
  'nV/sqrt(Hz)': [1e-9],
  'nV/rtHz': [1e-9],
  'C/W': [1],
  'K/W': [1],
  'mW/K': [1e-3],
  C: [1, 273.15],
  degC: [1, 273.15],
};

/** An SI value of the sheet in a published unit; throws for a unit that is not in the table. */
export function inPublishedUnit(si: number, unit: string): number {
  const known = PUBLISHED_UNITS[unit];
  if (!known) throw new Error(`no factor for the published unit ${unit}`);
  const [factor, offset = 0] = known;
  return (si - offset) / factor;
}
