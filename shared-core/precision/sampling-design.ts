import { clustersIn } from '../tally/clusters.ts';
import { peopleIn, type FrequencyTable } from '../tally/frequency-table.ts';
import { clusterRankErrors } from './cluster-variance.ts';
import { rankShares, shareOfTied, type CountedRank } from './counted-rank.ts';
import { rankStandardErrors } from './rank-variance.ts';

/** How the people of a group were drawn, and how many drawn one by one they are worth. */
export interface SamplingDesign {
  /** Clusters with people in the group; null where people are taken as drawn one by one. */
  readonly clusters: number | null;
  /**
   * How many times the variance of as many people drawn one by one and unweighted the ranks have (Kish 1965). Null
   * without clusters, or where one cluster, or equal scores, leave nothing to compare.
   */
  readonly designEffect: number | null;
  /** What intervals, the band of the whole curve and drawn samples count as people. */
  readonly effectiveN: number;
}

/** Ranks, in per cent, between which the design effect is averaged: further out it hangs on few people. */
export const DESIGN_EFFECT_RANKS = [10, 90] as const;

/** Ranks as near to 0 or 100 as this are 0 or 100 but for rounding, and do not vary. */
const NO_VARIANCE = 1e-9;

/**
 * The design of a group of at least one person. The design effect is the mean, over the scores that somebody obtained
 * and whose rank lies from 10 to 90 (over all scores with a variance where there is none of these), of the variance
 * between clusters over the multinomial variance on n. The effective n is n over it, but never above `effectiveN`, that
 * of the weights, which it is without clusters or a design effect.
 */
export function samplingDesign(table: FrequencyTable, counted: CountedRank, effectiveN: number): SamplingDesign {
  if (table.clusters === null) return { clusters: null, designEffect: null, effectiveN };
  const n = peopleIn(table);
  const clusters = clustersIn(table.clusters);
  const designEffect = meanEffect(table, counted, n);
  return {
    clusters,
    designEffect,
    effectiveN: designEffect === null ? effectiveN : Math.min(effectiveN, n / designEffect),
  };
}

function meanEffect(table: FrequencyTable, counted: CountedRank, n: number): number | null {
  const errors = clusterRankErrors(table, counted);
  if (errors === null) return null;
  const tied = shareOfTied(counted);
  const ranks = rankShares(table).map(({ below, at }) => 100 * (below + tied * at));
  const simple = rankStandardErrors(table, counted, n);
  const known = errors.flatMap((error, position) => {
    const rank = ranks[position] ?? 0;
    const plain = simple[position] ?? 0;
    // Where all score alike the rank is that of everybody and does not vary either.
    if ((table.counts[position] ?? 0) === 0 || plain < NO_VARIANCE) return [];
    if (rank < NO_VARIANCE || rank > 100 - NO_VARIANCE) return [];
    return [{ rank, effect: (error / plain) ** 2 }];
  });
  const [low, high] = DESIGN_EFFECT_RANKS;
  const middle = known.filter(({ rank }) => rank >= low && rank <= high);
  const taken = middle.length > 0 ? middle : known;
  return taken.length === 0 ? null : taken.reduce((sum, { effect }) => sum + effect, 0) / taken.length;
}
