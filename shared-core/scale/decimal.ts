/** A decimal number held exactly: `units / 10^decimals`. */
export interface Decimal {
  readonly units: bigint;
  readonly decimals: number;
}

export type DecimalMark = '.' | ',';

const PLAIN = /^([+-]?)(\d*)(?:\.(\d*))?(?:[eE]([+-]?\d{1,3}))?$/;
const MAX_DIGITS = 40;
/** Beyond the exponents of doubles (5e-324 to 1.8e308). */
const MAX_DOUBLE_SHIFT = 400;

export function powerOfTen(exponent: number): bigint {
  return 10n ** BigInt(exponent);
}

/**
 * Reads a decimal as people type it: sign, digits, one decimal mark, an exponent.
 * Thousands separators are not accepted, because "1.200" and "1,200" cannot be told apart.
 * Returns null for anything else, and for numbers of more than 40 digits.
 */
export function parseDecimal(text: string, mark: DecimalMark = '.'): Decimal | null {
  let plain = text.trim();
  if (mark === ',') {
    if (plain.includes('.')) return null;
    plain = plain.replace(',', '.');
  }
  return readPlain(plain.replace(/^[\u2212\u2013]/, '-'), MAX_DIGITS);
}

function readPlain(plain: string, maxShift: number): Decimal | null {
  const match = PLAIN.exec(plain);
  if (match === null) return null;
  const whole = match[2] ?? '';
  const fraction = (match[3] ?? '').replace(/0+$/, '');
  if (whole === '' && (match[3] ?? '') === '') return null;
  if (whole.length + fraction.length > MAX_DIGITS) return null;
  const sign = match[1] === '-' ? -1n : 1n;
  const units = sign * BigInt(whole + fraction || '0');
  const shift = fraction.length - Number(match[4] ?? '0');
  if (shift > maxShift || shift < -maxShift) return null;
  return shift >= 0 ? { units, decimals: shift } : { units: units * powerOfTen(-shift), decimals: 0 };
}

/** The decimal that the shortest text of a finite number stands for (0.1 is one tenth). */
export function decimalOf(value: number): Decimal {
  const decimal = readPlain(String(value), MAX_DOUBLE_SHIFT);
  if (decimal === null) throw new RangeError(`not a finite number: ${value}`);
  return decimal;
}

/** The same number in units of 10^-decimals; throws if it does not fit, which is a programmer's mistake. */
export function unitsAt(decimal: Decimal, decimals: number): bigint {
  if (decimal.decimals <= decimals) return decimal.units * powerOfTen(decimals - decimal.decimals);
  const factor = powerOfTen(decimal.decimals - decimals);
  if (decimal.units % factor !== 0n) throw new RangeError('the number has more decimals than the unit');
  return decimal.units / factor;
}
