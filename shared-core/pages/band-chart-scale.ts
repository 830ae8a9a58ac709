import { normalisedZ } from '../scores/derived-score.ts';
import { ratio } from '../percentile/exact-ratio.ts';

/** What the chart shows of one pupil. */
export interface ChartRow {
  /** Percentile rank 0–100 as it is printed. */
  readonly rank: number;
  /** Ends of the band, percentile ranks 0–100; null where there is none. */
  readonly band: { readonly low: number; readonly high: number } | null;
}

/** Ranks that the scale is marked at. */
export const CHART_TICKS = [1, 5, 10, 25, 50, 75, 90, 95, 99] as const;

/** Ends of the scale, percentile ranks. */
const LOWEST = 1;
const HIGHEST = 99;
/** Ranks are placed to a millionth. */
const PARTS = 1_000_000;

/**
 * Place of a percentile rank 0–100 between the ends of a scale from 1 to 99, as a proportion 0–1, spaced by the normal
 * curve: equal distances are equal steps of the normal curve equivalent. Ranks beyond the ends stand at the ends.
 */
export function chartPlace(rank: number): number {
  const highest = deviate(HIGHEST);
  return (deviate(Math.min(HIGHEST, Math.max(LOWEST, rank))) / highest + 1) / 2;
}

/** True of a rank that lies beyond the ends of the scale. */
export function offScale(rank: number): boolean {
  return rank < LOWEST || rank > HIGHEST;
}

function deviate(rank: number): number {
  const z = normalisedZ(ratio(BigInt(Math.round(rank * PARTS)), BigInt(PARTS)));
  if (z === null) throw new RangeError('a rank without a place on the scale');
  return z;
}

/** Least width in which the labels of the scale can be told apart, points. */
export const LEAST_CHART_WIDTH = 80;
