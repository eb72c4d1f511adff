// A threshold line and a gain line put together: the pair (beta, V_TO) that meets both.

import type { NamedKernel } from './kernel.ts';
import {
  BETA,
  COMMON_INPUTS,
  CURRENT,
  KNEE,
  MUST_BE_OHMIC,
  POINT,
  RECORD_LENGTH,
  REFERENCE,
  SLOPE,
  TEST,
} from './route-legs.ts';
import type { Leg } from './route-legs.ts';
import { NOT_OHMIC, NO_OVERDRIVE, OK, TEST_CURRENT, WEAK_INVERSION } from './route-status.ts';
import { inversionUnit, solveTiedDrive, testPointDrive } from './test-point.ts';

/** What every route writes first, in this order: A/V^2, V in the n-channel frame, a code of ROUTE_STATUS. */
export const PAIR_OUTPUTS = ['beta', 'V_TO', 'status'] as const;

const RECORD = new Float64Array(RECORD_LENGTH);
const PAIR = new Float64Array(2);

/** The kernel of a route made of two legs. */
export function pairKernel(threshold: Leg, gain: Leg): NamedKernel {
  const inputs = [...COMMON_INPUTS, ...threshold.inputs, ...gain.inputs];
  const thresholdAt = COMMON_INPUTS.length;
  const gainAt = thresholdAt + threshold.inputs.length;
  const outputAt = inputs.length;
  return {
    inputs,
    outputs: PAIR_OUTPUTS,
    run(s, a, p) {
      let status = threshold.read(s, a, p, p + thresholdAt, RECORD);
      if (status === OK) status = gain.read(s, a, p, p + gainAt, RECORD);
      if (status === OK) status = solvePair(RECORD, inversionUnit(s[a[p + 2]], s[a[p + 3]]), PAIR);
      writePair(s, a, p + outputAt, PAIR[0], PAIR[1], status);
    },
  };
}

/** Writes a route's results; NaN for both numbers unless the status is ok. */
export function writePair(s: Float64Array, a: Int32Array, at: number, beta: number, vto: number, status: number): void {
  s[a[at]] = status === OK ? beta : NaN;
  s[a[at + 1]] = status === OK ? vto : NaN;
  s[a[at + 2]] = status;
}

/** Solves the record into out = (beta, V_TO); unit is 2 n V_T, used where there is a test current. */
function solvePair(record: Float64Array, unit: number, out: Float64Array): number {
  const test = record[TEST];
  const isTested = test === test;
  if (record[BETA] === record[BETA]) {
    out[0] = record[BETA];
    out[1] = isTested ? record[POINT] - testPointDrive(test, record[BETA], unit) : record[POINT];
    return OK;
  }
  const distance = record[REFERENCE] - record[POINT];
  if (!(distance > 0)) return NO_OVERDRIVE;
  let drive = distance;
  if (isTested) {
    const ratio = Math.sqrt(test / record[CURRENT]);
    if (!(ratio < 1) && record[KNEE] === Infinity) return TEST_CURRENT;
    drive = solveTiedDrive(distance, ratio, test / record[SLOPE], record[KNEE], unit);
    if (drive !== drive) return WEAK_INVERSION;
  }
  const saturated = drive <= record[KNEE];
  if (saturated && record[MUST_BE_OHMIC] === 1) return NOT_OHMIC;
  out[0] = saturated ? record[CURRENT] / (drive * drive) : record[SLOPE] / (2 * drive - record[KNEE]);
  out[1] = record[REFERENCE] - drive;
  return OK;
}
