import type { RankPrint } from '../scores/printed-number.ts';
import { nearestWhole, withPoint, type Fraction } from './fraction.ts';

/** Cumulative per cents that open stanines 2 to 9. */
const STANINES_OPEN = [4n, 11n, 23n, 40n, 60n, 77n, 89n, 96n] as const;

/** A rank as it must be printed: rounded, and neither 0 nor 100. */
export function rankText({ top, bottom }: Fraction, { decimals, rounding, ends }: RankPrint): string {
  const one = decimals === 0 ? 1n : 10n;
  const scaled = { top: top * one, bottom };
  const least = withPoint(1n, decimals);
  const most = withPoint(100n * one - 1n, decimals);
  if (ends === 'signs') {
    if (scaled.top < bottom) return `<${least}`;
    if (scaled.top > bottom * (100n * one - 1n)) return `>${most}`;
  }
  const whole = nearestWhole(scaled, rounding);
  if (whole === 0n) return least;
  return whole >= 100n * one ? most : withPoint(whole, decimals);
}

/** The rank to two decimals, a half upwards. */
export function exactText({ top, bottom }: Fraction): string {
  return withPoint(nearestWhole({ top: top * 100n, bottom }, 'half-up'), 2);
}

/** Weight units as a weight: whole where the unit is 1, else to one decimal, a half upwards. */
export function weightText(units: bigint, unit: bigint): string {
  return unit === 1n ? units.toString() : withPoint(nearestWhole({ top: units * 10n, bottom: unit }, 'half-up'), 1);
}

/** The stanine of a rank; a rank on a cut belongs to the stanine above it. */
export function stanineText({ top, bottom }: Fraction): string {
  const reached = STANINES_OPEN.findLastIndex((cut) => cut * bottom <= top);
  return String(reached + 2);
}
