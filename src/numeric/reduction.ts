// An angle less its nearest multiple of pi/2, as a sum of two doubles.
//
// Up to 2^20 pi/2 (1.6e6) by subtraction of pi/2 in four parts, of which three have at most 33 bits so
// that their products with the multiple are exact. Beyond, for every finite double, by the fraction of
// x (2/pi) in integers of 1280 bits: slow (about 2 us), never wrong.
//
// Source: W. J. Cody and W. Waite, Software Manual for the Elementary Functions (1980), ch. 8;
// M. H. Payne and R. N. Hanek, "Radian reduction for trigonometric functions", SIGNUM 18 (1983).

import { biasedExponent, powerOfTwo } from './bits.ts';
import { sumRemainder } from './exact.ts';

const TWO_OVER_PI = 0.6366197723675814;
const PART_1 = 1.5707963267341256;
const PART_2 = 6.077100506303966e-11;
const PART_3 = 2.0222662487111665e-21;
const PART_4 = 8.4784276603689e-32;
const LARGEST_BY_PARTS = 1.5 * powerOfTwo(20);

/** Writes x - n pi/2 into out as leading part and remainder, and returns n modulo 4; x finite. */
export function reduceAngle(x: number, out: Float64Array): number {
  if (!(Math.abs(x) < LARGEST_BY_PARTS)) return reduceLargeAngle(x, out);
  const n = Math.round(x * TWO_OVER_PI);
  const a = x - n * PART_1;
  const second = n * PART_2;
  const b = a - second;
  const third = n * PART_3;
  const c = b - third;
  const rest = sumRemainder(a, -second, b) + sumRemainder(b, -third, c) - n * PART_4;
  const high = c + rest;
  out[0] = high;
  out[1] = c - high + rest;
  return n & 3;
}

const FROM_192_BITS = powerOfTwo(-192);
const FRACTION_BITS = 1280n;
/** 2/pi times 2^1280. */
const TWO_OVER_PI_BITS = BigInt(
  '0xa2f9836e4e441529fc2757d1f534ddc0db6295993c439041fe5163abdebbc561b7246e3a424dd2e006492eea09d1921c' +
    'fe1deb1cb129a73ee88235f52ebb4484e99c7026b45f7e413991d639835339f49c845f8bbdf9283b1ff897ffde05980f' +
    'ef2f118b5a0a6d1f6d367ecf27cb09b74f463f669e5fea2d7527bac7ebe5f17b3d0739f78a5292ea6bfb5fb11f8d5d08' +
    '56033046fc7b6babf0cfbc209af4361d',
);
/** pi/2 times 2^192. */
const HALF_PI_BITS = 0x1921fb54442d18469898cc51701b839a252049c1114cf98e8n;

function reduceLargeAngle(x: number, out: Float64Array): number {
  const size = Math.abs(x);
  const exponent = biasedExponent(size) - 1075;
  const places = FRACTION_BITS - BigInt(exponent);
  const product = BigInt(size * powerOfTwo(-exponent)) * TWO_OVER_PI_BITS;
  let n = product >> places;
  let fraction = product - (n << places);
  if (fraction >> (places - 1n) === 1n) {
    n += 1n;
    fraction -= 1n << places;
  }
  const angle = ((fraction >> (places - 192n)) * HALF_PI_BITS) >> 192n;
  const leading = Number(angle);
  const sign = x < 0 ? -1 : 1;
  out[0] = sign * leading * FROM_192_BITS;
  out[1] = sign * Number(angle - BigInt(leading)) * FROM_192_BITS;
  const quadrant = Number(n & 3n);
  return x < 0 ? (4 - quadrant) & 3 : quadrant;
}
