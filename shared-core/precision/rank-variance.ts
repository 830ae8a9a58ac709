import type { Direction } from '../scale/score-scale.ts';
import type { Smoothed } from '../smoothing/smoothing.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import { deviateOf } from './confidence-level.ts';
import { rankShares, shareOfTied, type CountedRank, type RankShares } from './counted-rank.ts';
import { percentInterval, type PercentInterval } from './percent-interval.ts';

/**
 * Standard error, in percentile-rank points, of a rank on n (or effective n) people under multinomial sampling. A rank is
 * the mean over people of g = 1 below the score, t at it and 0 above, with t = 0, 1/2 or 1 as the definition has it; so
 * its variance is [b + t²a − (b + ta)²]/n with b the share below and a the share at the score. For the midpoint that is
 * [b + a/4 − (b + a/2)²]/n, for the two others the binomial p(1 − p)/n.
 */
export function rankStandardError({ below, at }: RankShares, counted: CountedRank, n: number): number {
  if (!(n > 0)) throw new RangeError('a standard error needs people');
  const tied = shareOfTied(counted);
  const above = 1 - below - at;
  const share = below + tied * at;
  // The same variance as a sum of squares about the rank, which cannot fall below 0.
  const variance = below * (1 - share) ** 2 + at * (tied - share) ** 2 + Math.max(0, above) * share ** 2;
  return 100 * Math.sqrt(variance / n);
}

/** The standard error of every attainable score's rank, lowest score first; throws on a table without people. */
export function rankStandardErrors(table: FrequencyTable, counted: CountedRank, effectiveN: number): readonly number[] {
  return rankShares(table).map((shares) => rankStandardError(shares, counted, effectiveN));
}

/**
 * Standard errors, in percentile-rank points, of smoothed ranks by the delta method: the root of the variance of Σ g p̂
 * (Holland & Thayer 1987, ETS Research Report 87-31). Null where the method has no covariance, or where its ranks are no
 * sums of probabilities (kernel).
 */
export function smoothedStandardErrors(
  smoothed: Smoothed,
  direction: Direction,
  counted: CountedRank,
): readonly number[] | null {
  const { rankVariancesOf, choice } = smoothed;
  if (rankVariancesOf === null || choice.kind === 'kernel') return null;
  const tied = shareOfTied(counted);
  // Where a low score is good the people above count, whose share is 1 less the others' and varies as theirs.
  return rankVariancesOf(direction === 'high-is-good' ? tied : 1 - tied).map((variance) => 100 * Math.sqrt(variance));
}

/** Rank ± z standard errors, all in percentile-rank points, held within 0 and 100; level in per cent. */
export function normalInterval(rank: number, standardError: number, level: number): PercentInterval {
  const reach = deviateOf(level) * standardError;
  return percentInterval((rank - reach) / 100, (rank + reach) / 100);
}
