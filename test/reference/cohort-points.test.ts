import { describe, expect, it } from 'vitest';
import { percentilePoint, type PointDefinition } from '../../shared-core/percentile/percentile-point.ts';
import { summarise } from '../../shared-core/tally/cohort-summary.ts';
import { EXACT, expectAllNear, expectNear } from './near.ts';
import { readCohortReference, readRows, tableFromScores, wholeScale } from './read-reference.ts';

const COHORTS = ['c1_tiny', 'c2_leftskew', 'c3_twomodes', 'c4_large'];

const TYPES = [
  'type-1',
  'type-2',
  'type-3',
  'type-4',
  'type-5',
  'type-6',
  'type-7',
  'type-8',
  'type-9',
] as const satisfies readonly PointDefinition[];

describe.each(COHORTS)('the distribution of %s', (id) => {
  const reference = readCohortReference(id);
  const people = readRows(`${id}_cohort.csv`).map((row) => Number(row['score']));
  const table = tableFromScores(wholeScale(reference.scale.min, reference.scale.max), people);
  const pointsOf = (definition: PointDefinition, shares: readonly number[], width = 1): readonly number[] =>
    shares.map((share) => percentilePoint(table, share, definition, width).score);

  it('has the people of the file', () => {
    expect(people.length).toBe(reference.N);
    expect(reference.probs.length).toBe(9);
  });

  it.each(TYPES)('%s', (type) => {
    const expected = reference.quantiles[type.replace('-', '')] ?? [];
    expectAllNear(pointsOf(type, reference.probs), expected, EXACT, type);
  });

  it('quartiles of type 6, and the nearest rank as type 1', () => {
    expectAllNear(pointsOf('type-6', [0.25, 0.5, 0.75]), reference.quartiles_0_25_type6, EXACT, 'quartiles');
    expect(pointsOf('nearest-rank', reference.probs)).toEqual(pointsOf('type-1', reference.probs));
  });

  it('five numbers and moments', () => {
    const summary = summarise(table);
    expect(summary.fiveNumbers).toEqual(reference.fivenum);
    expectNear(summary.mean, reference.moments_observed.mean, EXACT, 'mean');
    expectNear(summary.sd, reference.moments_observed.sd_n1, EXACT, 'standard deviation');
    expectNear(summary.skewness, reference.moments_observed.skew_pop, EXACT, 'skewness');
    expectNear(summary.excessKurtosis, reference.moments_observed.excess_kurt_pop, EXACT, 'excess kurtosis');
    expect(summary.effectiveN).toBe(reference.N);
    expect(summary.weightSum).toBe(reference.N);
  });

  it('points of the spread-out distribution: the middle where the lower and the upper differ', () => {
    const { upper, lower } = reference.percentile_points_exact_limits;
    reference.probs.forEach((share, index) => {
      const [high, low] = [upper[index] ?? NaN, lower[index] ?? NaN];
      const found = percentilePoint(table, share, 'inverse', 1);
      expectNear(found.score, (high + low) / 2, EXACT, `point of ${share}`);
      expect(found.flat).toBe(high - low > EXACT);
    });
  });

  it('points within classes between exact limits', () => {
    const grouped = reference.grouped_exact_limits;
    const points = pointsOf('grouped', grouped.probs, grouped.width);
    expectAllNear(points, grouped.percentile_points, EXACT, 'grouped points');
  });
});
