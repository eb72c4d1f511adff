// Exact sums of decimals for limits that are written as a centre and a tolerance.

/** Decimals further apart than this are not added digit by digit: the smaller one cannot show. */
const WIDEST = 60;

interface Decimal {
  readonly digits: bigint;
  readonly exponent: number;
}

/** centre + tolerance, or centre + |centre| × tolerance, rounded once from the shortest decimals of both. */
export function addTolerance(centre: number, tolerance: number, relative: boolean): number {
  const a = decimalOf(centre);
  const t = decimalOf(tolerance);
  const magnitude = a.digits < 0n ? -a.digits : a.digits;
  const b = relative ? { digits: magnitude * t.digits, exponent: a.exponent + t.exponent } : t;
  const exponent = Math.min(a.exponent, b.exponent);
  if (Math.abs(a.exponent - b.exponent) > WIDEST) return centre + (relative ? Math.abs(centre) * tolerance : tolerance);
  const digits = a.digits * 10n ** BigInt(a.exponent - exponent) + b.digits * 10n ** BigInt(b.exponent - exponent);
  return Number(`${digits}e${exponent}`);
}

function decimalOf(value: number): Decimal {
  const [coefficient, exponent = '0'] = String(value).split('e');
  const [whole, fraction = ''] = coefficient.split('.');
  return { digits: BigInt(whole + fraction), exponent: Number(exponent) - fraction.length };
}
