/** A number as one whole number over another, the bottom above 0; never shortened and never rounded. */
export interface Fraction {
  readonly top: bigint;
  readonly bottom: bigint;
}

const DECIMAL = /^(-?)(\d*)\.?(\d*)(?:e([+-]?\d+))?$/;

/** The number that a decimal text stands for: "0.375", ".5", "1e-7". Throws on any other text. */
export function fractionOfText(text: string): Fraction {
  const found = DECIMAL.exec(text.trim());
  if (found === null || !/\d/.test(text)) throw new RangeError(`not a decimal number: ${text}`);
  const [, sign = '', whole = '', behind = '', exponent = '0'] = found;
  const digits = BigInt(`${whole}${behind}` || '0') * (sign === '-' ? -1n : 1n);
  const places = behind.length - Number(exponent);
  return places >= 0
    ? { top: digits, bottom: 10n ** BigInt(places) }
    : { top: digits * 10n ** BigInt(-places), bottom: 1n };
}

/** "3/8" or "0.375". */
export function fractionOfOffset(text: string): Fraction {
  const [top = '', bottom] = text.trim().split('/');
  return bottom === undefined ? fractionOfText(top) : { top: BigInt(top), bottom: BigInt(bottom) };
}

export function times(left: Fraction, right: Fraction): Fraction {
  return { top: left.top * right.top, bottom: left.bottom * right.bottom };
}

export function plus(left: Fraction, right: Fraction): Fraction {
  return { top: left.top * right.bottom + right.top * left.bottom, bottom: left.bottom * right.bottom };
}

export type HalfGoes = 'half-up' | 'half-even';

/**
 * The whole number nearest to a fraction of 0 or more, found by halving the span of candidates and comparing multiples;
 * nothing is divided. A fraction midway between two goes up, or to the even one.
 */
export function nearestWhole({ top, bottom }: Fraction, halfGoes: HalfGoes): bigint {
  if (top < 0n) throw new RangeError('only fractions of 0 or more are rounded here');
  let [low, high] = [0n, 1n];
  while (high * bottom <= top) high *= 2n;
  while (high - low > 1n) {
    const middle = (low + high) >> 1n;
    if (middle * bottom <= top) low = middle;
    else high = middle;
  }
  const toLow = top - low * bottom;
  const toHigh = high * bottom - top;
  if (toLow === toHigh) return halfGoes === 'half-even' && low % 2n === 0n ? low : high;
  return toLow < toHigh ? low : high;
}

/** Tens of a whole number as a decimal text: 235 with one decimal is "23.5". */
export function withPoint(units: bigint, decimals: number): string {
  const digits = units.toString().padStart(decimals + 1, '0');
  const split = digits.length - decimals;
  return decimals === 0 ? digits : `${digits.slice(0, split)}.${digits.slice(split)}`;
}
