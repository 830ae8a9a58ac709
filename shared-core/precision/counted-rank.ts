import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { rankParts, type RankDefinition } from '../percentile/percentile-rank.ts';
import type { Direction } from '../scale/score-scale.ts';
import type { Smoothed } from '../smoothing/smoothing.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';

/** The definitions whose rank is the share of a count of people: those below, those at or below, or half of those at. */
export type CountedRank = 'below' | 'at-or-below' | 'midpoint';

/** The count that a definition uses, or null for ranks that are no share of a count. */
export function countedRank(definition: RankDefinition): CountedRank | null {
  switch (definition.kind) {
    case 'below':
    case 'at-or-below':
    case 'midpoint':
      return definition.kind;
    case 'plotting-position':
    case 'grouped':
      return null;
  }
}

/** Which part of the people at a score counts as below it. */
export function shareOfTied(counted: CountedRank): 0 | 0.5 | 1 {
  switch (counted) {
    case 'below':
      return 0;
    case 'midpoint':
      return 0.5;
    case 'at-or-below':
      return 1;
  }
}

/** Proportions 0–1 of those who did worse than a score and of those at it. */
export interface RankShares {
  readonly below: number;
  readonly at: number;
}

/** The shares of every attainable score, lowest score first; throws on a table without people. */
export function rankShares(table: FrequencyTable): readonly RankShares[] {
  return rankParts(table).map(({ below, at, all }) => ({
    below: ratioToNumber(ratio(below, all)),
    at: ratioToNumber(ratio(at, all)),
  }));
}

/**
 * How many of n people a rank counts: n times its share, which is a whole number (or a half, for the midpoint) exactly
 * where all people weigh the same and n is their number.
 */
export function rankCounts(table: FrequencyTable, counted: CountedRank, n: number): readonly number[] {
  const halves = BigInt(2 * shareOfTied(counted));
  const whole = Number.isSafeInteger(n);
  return rankParts(table).map(({ below, at, all }) => {
    const twice = 2n * below + halves * at;
    return whole ? ratioToNumber(ratio(twice * BigInt(n), 2n * all)) : n * ratioToNumber(ratio(twice, 2n * all));
  });
}

/**
 * The percentile ranks 0–100 of a smoothed distribution, lowest score first, seen from the poor end of the scale. Held
 * at 0 and 100, which sums of doubles may pass by their last bit.
 */
export function smoothedRanks(smoothed: Smoothed, direction: Direction, counted: CountedRank): readonly number[] {
  const tied = shareOfTied(counted) - 0.5;
  return smoothed.probabilities.map((_, position) => {
    const rank =
      direction === 'high-is-good'
        ? 100 * smoothed.cumulative(position, shiftOf(tied))
        : 100 * (1 - smoothed.cumulative(position, shiftOf(-tied)));
    return Math.min(100, Math.max(0, rank));
  });
}

function shiftOf(steps: number): -0.5 | 0 | 0.5 {
  return steps < 0 ? -0.5 : steps > 0 ? 0.5 : 0;
}
