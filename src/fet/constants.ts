// Constants of nature that the device laws use.
//
// Source: SI since 20 May 2019 (CODATA 2018), both exact.

/** J/K. */
export const BOLTZMANN = 1.380649e-23;
/** C. */
export const ELEMENTARY_CHARGE = 1.602176634e-19;

/** kT/q in V at T in K. */
export function thermalVoltage(temperature: number): number {
  return (BOLTZMANN * temperature) / ELEMENTARY_CHARGE;
}
