import { decimalOf, powerOfTen, unitsAt } from '../scale/decimal.ts';
import { scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { ratio, roundRatio, type ExactRatio, type Rounding } from '../percentile/exact-ratio.ts';

/** How the two ends of a table print: "<1" and ">99", or held at 1 and 99. */
export type RankEnds = 'signs' | 'held';

export interface RankPrint {
  /** 0 prints whole numbers, 1 one decimal. */
  readonly decimals: 0 | 1;
  readonly rounding: Rounding;
  readonly ends: RankEnds;
}

/** Which end rule, if any, took the place of the rounded number. */
export type EndTaken = 'low' | 'high' | null;

export interface PrintedRank {
  readonly text: string;
  readonly end: EndTaken;
}

const MINUS = '\u2212';

/**
 * A percentile rank as it is printed, never 0 or 100. The smallest printable rank u is 1 in whole numbers and 0.1 with
 * one decimal, the largest 100 − u. With signs, an unrounded rank below u prints "<u" and one above 100 − u ">100 − u";
 * held, the rounded rank is cut to u … 100 − u. The rank is rounded exactly: no half is decided in floating point.
 */
export function printRank(rank: ExactRatio, print: RankPrint): PrintedRank {
  const one = powerOfTen(print.decimals);
  const highest = 100n * one - 1n;
  const scaled = rank.numerator * one;
  const rounded = roundRatio(rank, print.decimals, print.rounding);
  if (print.ends === 'signs') {
    if (scaled < rank.denominator) return { text: `<${withDecimals(1n, print.decimals)}`, end: 'low' };
    if (scaled > highest * rank.denominator) return { text: `>${withDecimals(highest, print.decimals)}`, end: 'high' };
    return { text: withDecimals(rounded, print.decimals), end: null };
  }
  if (rounded < 1n) return { text: withDecimals(1n, print.decimals), end: 'low' };
  if (rounded > highest) return { text: withDecimals(highest, print.decimals), end: 'high' };
  return { text: withDecimals(rounded, print.decimals), end: null };
}

/**
 * A number with a fixed count of decimals, half away from zero on its shortest decimal text, with a true minus sign.
 * Never prints a negative zero.
 */
export function printNumber(value: number, decimals: number): string {
  const exact = decimalOf(Number(Math.abs(value).toPrecision(15)));
  const size = roundRatio(ratio(exact.units, powerOfTen(exact.decimals)), decimals, 'half-up');
  const text = withDecimals(size, decimals);
  return value < 0 && size > 0n ? `${MINUS}${text}` : text;
}

/** An exact ratio of 0 or more with a fixed count of decimals, rounded half up. */
export function printRatio(value: ExactRatio, decimals: number): string {
  return withDecimals(roundRatio(value, decimals, 'half-up'), decimals);
}

/** Whole numbers of 0 or more with a narrow space between thousands: 4 812. */
export function printCount(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u202f');
}

/** A weight sum given in whole units of 10^-decimals, to one decimal; a count of people stays whole. */
export function printWeight(units: bigint, weightUnit: bigint): string {
  return printRatio(ratio(units, weightUnit), weightUnit === 1n ? 0 : 1);
}

/** A share 0–1 as a per cent with one decimal: "4.1 %". */
export function printShare(share: number): string {
  return `${printNumber(share * 100, 1)}\u00a0%`;
}

/** A raw score with the decimals of its scale: "12" on whole scores, "12.5" on halves. */
export function printScore(scale: ScoreScale, score: number): string {
  const { decimals } = scaleGrid(scale);
  const units = unitsAt(decimalOf(score), decimals);
  return units < 0n ? `${MINUS}${withDecimals(-units, decimals)}` : withDecimals(units, decimals);
}

function withDecimals(units: bigint, decimals: number): string {
  if (decimals === 0) return String(units);
  const digits = String(units).padStart(decimals + 1, '0');
  return `${digits.slice(0, -decimals)}.${digits.slice(-decimals)}`;
}
