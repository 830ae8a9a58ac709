import { compareToWhole } from '../percentile/exact-ratio.ts';
import type { Direction } from '../scale/score-scale.ts';
import type { ConversionRow } from './conversion-table.ts';

/** Percentiles that the inverse table lists. */
export const INVERSE_PERCENTILES = [1, 5, 10, 20, 25, 30, 40, 50, 60, 70, 75, 80, 90, 95, 99] as const;

export interface InverseRow {
  /** 1–99. */
  readonly percentile: number;
  /** The poorest raw score whose unrounded percentile rank reaches it, as printed; a dash where none does. */
  readonly scoreText: string;
}

/** For each listed percentile the lowest raw score (the highest, where low is good) that reaches it. */
export function inverseTable(rows: readonly ConversionRow[], direction: Direction): readonly InverseRow[] {
  const fromPoorEnd = direction === 'high-is-good' ? rows : rows.toReversed();
  return INVERSE_PERCENTILES.map((percentile) => ({
    percentile,
    scoreText: fromPoorEnd.find((row) => compareToWhole(row.rank, BigInt(percentile)) >= 0)?.scoreText ?? '\u2013',
  }));
}
