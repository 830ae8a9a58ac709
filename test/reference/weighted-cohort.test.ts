import { describe, expect, it } from 'vitest';
import { ratioToNumber } from '../../shared-core/percentile/exact-ratio.ts';
import { percentilePoint } from '../../shared-core/percentile/percentile-point.ts';
import { percentileRanks, rankParts } from '../../shared-core/percentile/percentile-rank.ts';
import { derivedScores, normalisedZ } from '../../shared-core/scores/derived-score.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { squaredUnitsIn, weighsEqually } from '../../shared-core/tally/frequency-table.ts';
import { EXACT, NORMAL, expectNear } from './near.ts';
import {
  numberIn,
  readRows,
  readWeightedReference,
  squareOf,
  weightOf,
  weightedTable,
  wholeScale,
} from './read-reference.ts';

describe('the weighted cohort c5_weighted', () => {
  const reference = readWeightedReference('c5_weighted');
  const people = readRows('c5_weighted_cohort.csv').map((row) => ({
    score: Number(row['score']),
    weight: Number(row['weight']),
  }));
  const table = weightedTable(wholeScale(0, 40), people);
  const rows = readRows('c5_weighted_scores.csv');
  const summary = summarise(table);

  function compare(column: string, actual: readonly (number | null)[], tolerance: number): void {
    expect(actual.length).toBe(rows.length);
    rows.forEach((row, position) => {
      const expected = numberIn(row, column);
      const what = `${column} of ${row['score']}`;
      if (expected === null) expect(actual[position], what).toBeNull();
      else expectNear(actual[position] ?? null, expected, tolerance, what);
    });
  }

  it('sums of weights, of squared weights, and the effective number', () => {
    expect(summary.n).toBe(reference.n);
    expect(summary.weightSum).toBe(reference.sum_w);
    expectNear(squareOf(table, squaredUnitsIn(table)), reference.sum_w2, EXACT, 'sum of squares');
    expectNear(summary.effectiveN, reference.kish_neff, EXACT, 'effective n');
    expect(weighsEqually(table)).toBe(false);
  });

  it('weights at and below each score', () => {
    const parts = rankParts(table);
    compare('n_unweighted', table.counts, 0);
    compare('w_freq', parts.map(({ at }) => weightOf(table, at)), EXACT);
    compare('w_cum_atbelow', parts.map(({ below, at }) => weightOf(table, below + at)), EXACT);
  });

  it('weighted ranks and what is derived from them', () => {
    const ranks = percentileRanks(table, { kind: 'midpoint' });
    const derived = ranks.map((rank) => derivedScores(rank, normalisedZ(rank)));
    compare('pr_below', percentileRanks(table, { kind: 'below' }).map(ratioToNumber), EXACT);
    compare('pr_atbelow', percentileRanks(table, { kind: 'at-or-below' }).map(ratioToNumber), EXACT);
    compare('pr_mid', ranks.map(ratioToNumber), EXACT);
    compare('z_from_pr_mid', derived.map(({ z }) => z), NORMAL);
    compare('T_mid', derived.map(({ t }) => t), NORMAL);
    compare('nce2106_mid', derived.map(({ nce }) => nce), NORMAL);
    compare('stanine_pr_ge', derived.map(({ stanine }) => stanine), 0);
  });

  it('weighted points', () => {
    const { upper, lower } = reference.percentile_points_exact_limits;
    reference.probs.forEach((share, index) => {
      const lowest = percentilePoint(table, share, 'type-1', 1).score;
      const inverse = percentilePoint(table, share, 'inverse', 1).score;
      expect(lowest, `type 1 of ${share}`).toBe(reference.quantile_inverse_weighted_ecdf[index]);
      expectNear(inverse, ((upper[index] ?? NaN) + (lower[index] ?? NaN)) / 2, EXACT, `point of ${share}`);
    });
  });

  it('weighted moments, the standard deviation for reliability weights', () => {
    const moments = reference.moments_weighted;
    expectNear(summary.mean, moments.mean, EXACT, 'mean');
    expectNear(summary.sd, moments.sd_reliability_weights, EXACT, 'standard deviation');
    expectNear(summary.skewness, moments.skew_pop, EXACT, 'skewness');
    expectNear(summary.excessKurtosis, moments.kurt_pop - 3, EXACT, 'excess kurtosis');
  });
});
