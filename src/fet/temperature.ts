// How a specimen's constants move with temperature, in the n-channel frame; temperatures in K.
//
// Source: A. S. Sedra and K. C. Smith, Microelectronic Circuits (threshold falls about 2 mV/K, mobility
// as a power of T); J. Millman and C. C. Halkias, Integrated Electronics (zero-drift point of a JFET).

import { pow } from '../numeric/index.ts';

/** V_TO in V at `temperature`, from its value at `nominal`; tempco in V/K. */
export function thresholdAt(vto: number, tempco: number, temperature: number, nominal: number): number {
  return vto + tempco * (temperature - nominal);
}

/** beta in A/V^2 at `temperature`: beta (T/T_nom)^exponent. */
export function betaAt(beta: number, exponent: number, temperature: number, nominal: number): number {
  return beta * pow(temperature / nominal, exponent);
}

/** Gate leakage in A at `temperature`, twice as large every `doubling` kelvin. */
export function leakageAt(leakage: number, doubling: number, temperature: number, nominal: number): number {
  return leakage * pow(2, (temperature - nominal) / doubling);
}

/** V_ov in V at which the drain current does not move with temperature: 2 tempco T / exponent, both of one sign. */
export function zeroDriftDrive(tempco: number, exponent: number, temperature: number): number {
  return (2 * tempco * temperature) / exponent;
}
