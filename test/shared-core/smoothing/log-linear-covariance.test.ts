import { describe, expect, it } from 'vitest';
import { tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { expectNear } from '../../reference/near.ts';
import { wholeScale } from '../../reference/read-reference.ts';
import { cohortTable, logLinear, midpointWeights, smoothed } from '../../reference/smoothing-reference.ts';

/** People put beside a cell change the fit; their numbers vary as a multinomial sample: the delta method by differences. */
function varianceByDifferences(table: FrequencyTable, degree: number, weights: readonly number[]): number {
  const lift = 1000;
  const at = (counts: readonly number[]): number =>
    smoothed(tableFromCounts(table.scale, counts), logLinear(degree)).probabilities.reduce(
      (sum, probability, k) => sum + probability * (weights[k] ?? 0),
      0,
    );
  const base = table.counts.map((count) => count * lift);
  const n = table.counts.reduce((sum, count) => sum + count, 0);
  const fit = smoothed(table, logLinear(degree)).probabilities;
  const slopes = base.map((_, cell) => {
    const moved = (by: number): number => at(base.map((count, k) => (k === cell ? count + by : count)));
    const step = 40;
    return ((moved(step) - at(base)) / step) * n * lift;
  });
  const mean = slopes.reduce((sum, slope, k) => sum + slope * (fit[k] ?? 0), 0);
  return slopes.reduce((sum, slope, k) => sum + (fit[k] ?? 0) * (slope - mean) ** 2, 0) / n;
}

describe('the covariance of a log-linear fit', () => {
  it.each([1, 2, 4, 6])('is the delta method at degree %i', (degree) => {
    const table = cohortTable('c2_leftskew');
    const { varianceOf } = smoothed(table, logLinear(degree));
    for (const position of [12, 20, 24, 29]) {
      const weights = midpointWeights(table.counts.length, position);
      const ratio = (varianceOf?.(weights) ?? NaN) / varianceByDifferences(table, degree, weights);
      expectNear(ratio, 1, 0.01, `at ${position}`);
    }
  });

  it('is that of a multinomial sample where the degree saturates the scale', () => {
    const counts = [4, 9, 2, 14, 6];
    const n = 35;
    const { varianceOf } = smoothed(tableFromCounts(wholeScale(0, 4), counts), logLinear(4));
    const weights = [1, 1, 0.5, 0, -2];
    const mean = counts.reduce((sum, count, k) => sum + (count / n) * (weights[k] ?? 0), 0);
    const variance = counts.reduce((sum, count, k) => sum + (count / n) * ((weights[k] ?? 0) - mean) ** 2, 0) / n;
    expectNear(varianceOf?.(weights) ?? null, variance, 1e-14, 'variance');
  });

  it('gives the mean the variance of a mean, and a constant none', () => {
    const table = cohortTable('c3_twomodes');
    const { varianceOf, momentsObserved } = smoothed(table, logLinear(6));
    const scores = table.counts.map((_, k) => k);
    expectNear(varianceOf?.(scores) ?? null, momentsObserved.sd ** 2 / 1500, 1e-10, 'variance of the mean');
    expectNear(varianceOf?.(scores.map(() => 3)) ?? null, 0, 1e-25, 'variance of a constant');
    expect(() => varianceOf?.([1])).toThrow('61 scores');
  });

  it('is the same for all ranks in one pass', () => {
    const table = cohortTable('c2_leftskew');
    const { varianceOf, rankVariancesOf } = smoothed(table, { ...logLinear(5), keptScores: [30, 12] });
    for (const tied of [0, 0.5, 1]) {
      const weights = (position: number): readonly number[] =>
        table.counts.map((_, k) => (k < position ? 1 : k === position ? tied : 0));
      const ranks = rankVariancesOf?.(tied) ?? [];
      expect(ranks.length).toBe(31);
      ranks.forEach((variance, k) => expectNear(variance, varianceOf?.(weights(k)) ?? NaN, 1e-18, `at ${k}`));
    }
  });
});
