/** A number as a fraction of whole numbers, the denominator above 0. Nothing is rounded in it. */
export interface ExactRatio {
  readonly numerator: bigint;
  readonly denominator: bigint;
}

export function ratio(numerator: bigint, denominator: bigint): ExactRatio {
  if (denominator === 0n) throw new RangeError('a ratio needs a denominator other than 0');
  return denominator > 0n ? { numerator, denominator } : { numerator: -numerator, denominator: -denominator };
}

const SAFE = BigInt(Number.MAX_SAFE_INTEGER);
const QUOTIENT_BITS = 64;

/** The nearest double (within 1 part in 2^52) of a ratio, however small or large its two numbers are. */
export function ratioToNumber({ numerator, denominator }: ExactRatio): number {
  const size = numerator < 0n ? -numerator : numerator;
  if (size <= SAFE && denominator <= SAFE) return Number(numerator) / Number(denominator);
  const shift = Math.max(0, QUOTIENT_BITS + bitsIn(denominator) - bitsIn(size));
  return Number((numerator << BigInt(shift)) / denominator) / 2 ** shift;
}

function bitsIn(size: bigint): number {
  return size.toString(2).length;
}

/** Below 0, 0 or above 0 as the ratio lies below, on or above a whole number. */
export function compareToWhole(value: ExactRatio, whole: bigint): number {
  const difference = value.numerator - whole * value.denominator;
  return difference < 0n ? -1 : difference > 0n ? 1 : 0;
}

/** Below 0, 0 or above 0 as the left ratio lies below, on or above the right one. */
export function compareRatios(left: ExactRatio, right: ExactRatio): number {
  const difference = left.numerator * right.denominator - right.numerator * left.denominator;
  return difference < 0n ? -1 : difference > 0n ? 1 : 0;
}

const NEAR_DECIMALS = 9;

/**
 * A computed double as a ratio, rounded half up to 10^-9: smoothed ranks are doubles, and 23.5 must print like 23.5 even
 * where the last bits of a computation say 23.499999999999996. Sizes up to 10^6; throws beyond, and on NaN.
 */
export function ratioNear(value: number): ExactRatio {
  if (!(Math.abs(value) <= 1e6)) throw new RangeError(`not a number of a usual size: ${value}`);
  return ratio(BigInt(Math.round(value * 10 ** NEAR_DECIMALS)), 10n ** BigInt(NEAR_DECIMALS));
}

export type Rounding = 'half-up' | 'half-even';

/**
 * A ratio of 0 or more, rounded to whole multiples of 10^-decimals; returns that multiple (23.5 to one decimal is 235n).
 * Half up takes an exact half to the next multiple, half even to the even one.
 */
export function roundRatio(value: ExactRatio, decimals: number, rounding: Rounding): bigint {
  if (value.numerator < 0n) throw new RangeError('only ratios of 0 or more are rounded here');
  const scaled = value.numerator * 10n ** BigInt(decimals);
  const quotient = scaled / value.denominator;
  const twice = 2n * (scaled % value.denominator);
  if (twice < value.denominator) return quotient;
  if (twice > value.denominator) return quotient + 1n;
  return rounding === 'half-up' || quotient % 2n === 1n ? quotient + 1n : quotient;
}
