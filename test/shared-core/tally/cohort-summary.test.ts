import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { attainableScores, type ScoreScale } from '../../../shared-core/scale/score-scale.ts';
import { summarise, type CohortSummary } from '../../../shared-core/tally/cohort-summary.ts';
import { tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { anyTables, copied, countedTables, equallyWeighted, lowIsGood } from '../percentile/some-tables.ts';

const SCALE: ScoreScale = { min: 0, max: 4, step: 1, direction: 'high-is-good' };

/** Weights in tenths. */
function weighted(counts: readonly number[], weights: readonly bigint[], squares: readonly bigint[]): FrequencyTable {
  return { scale: SCALE, counts, weights, squares, weightUnit: 10n, weighted: true, clusters: null };
}

function shapeOf(summary: CohortSummary): readonly number[] {
  const { mean, sd, skewness, excessKurtosis, fiveNumbers, shareAtLowest, shareAtHighest } = summary;
  return [mean, sd ?? -1, skewness ?? -99, excessKurtosis ?? -99, ...fiveNumbers, shareAtLowest, shareAtHighest];
}

function expectAlike(left: readonly number[], right: readonly number[]): void {
  const far = left.filter((value, index) => !(Math.abs(value - (right[index] ?? NaN)) < 1e-7));
  expect(far).toEqual([]);
  expect(left.length).toBe(right.length);
}

describe('a group', () => {
  it('of one person has no standard deviation, skewness or kurtosis', () => {
    const one = summarise(tableFromCounts(SCALE, [0, 0, 0, 1, 0]));
    expect(one).toMatchObject({ n: 1, weightSum: 1, effectiveN: 1, mean: 3, sd: null, skewness: null });
    expect(one.excessKurtosis).toBeNull();
    expect(one.fiveNumbers).toEqual([3, 3, 3, 3, 3]);
    expect(one.unobserved).toEqual([0, 1, 2, 4]);
  });

  it('of people with one score has standard deviation 0 exactly', () => {
    const tenths: ScoreScale = { min: 0, max: 0.3, step: 0.1, direction: 'high-is-good' };
    const alike = summarise(tableFromCounts(tenths, [0, 0, 7, 0]));
    expect(alike).toMatchObject({ n: 7, mean: 0.2, sd: 0, skewness: null, excessKurtosis: null });
  });

  it('of nobody cannot be described', () => {
    expect(() => summarise(tableFromCounts(SCALE, [0, 0, 0, 0, 0]))).toThrow(RangeError);
  });

  it('worked by hand: 0 0 1 4', () => {
    const summary = summarise(tableFromCounts(SCALE, [2, 1, 0, 0, 1]));
    expect(summary.mean).toBe(1.25);
    expect(summary.sd).toBeCloseTo(Math.sqrt(10.75 / 3), 12);
    expect(summary.skewness).toBeCloseTo((-2 * 1.25 ** 3 - 0.25 ** 3 + 2.75 ** 3) / 4 / (10.75 / 4) ** 1.5, 12);
    expect(summary.excessKurtosis).toBeCloseTo((2 * 1.25 ** 4 + 0.25 ** 4 + 2.75 ** 4) / 4 / (10.75 / 4) ** 2 - 3, 12);
    expect(summary.fiveNumbers).toEqual([0, 0, 0.5, 2.5, 4]);
    expect([summary.shareAtLowest, summary.shareAtHighest]).toEqual([0.5, 0.25]);
    expect(summary.unobserved).toEqual([2, 3]);
  });

  it('with weights worked by hand: 0 weighs 0.5, 1 weighs 1, 4 weighs 2.5', () => {
    const summary = summarise(weighted([1, 1, 0, 0, 1], [5n, 10n, 0n, 0n, 25n], [25n, 100n, 0n, 0n, 625n]));
    expect(summary).toMatchObject({ n: 3, weightSum: 4 });
    expect(summary.effectiveN).toBeCloseTo(16 / 7.5, 12);
    expect(summary.mean).toBe(2.75);
    const variance = (0.5 * 2.75 ** 2 + 1.75 ** 2 + 2.5 * 1.25 ** 2) / 4;
    expect(summary.sd).toBeCloseTo(Math.sqrt(variance / (1 - 7.5 / 16)), 12);
    expect(summary.fiveNumbers).toEqual([0, 1, 4, 4, 4]);
    expect(summary.shareAtHighest).toBe(0.625);
  });

  it('with weights averages two neighbours where the weight meets a quarter exactly', () => {
    const summary = summarise(weighted([1, 1, 0, 1, 0], [10n, 10n, 0n, 20n, 0n], [100n, 100n, 0n, 400n, 0n]));
    expect(summary.fiveNumbers).toEqual([0, 0.5, 2, 3, 3]);
  });

  it('whose weight lies at one score varies in nothing, though somebody of weight 0 scored otherwise', () => {
    const summary = summarise(weighted([2, 0, 0, 1, 0], [20n, 0n, 0n, 0n, 0n], [200n, 0n, 0n, 0n, 0n]));
    expect(summary).toMatchObject({ mean: 0, sd: 0, skewness: null, excessKurtosis: null });
  });
});

describe('the summary', () => {
  it('is that of the unweighted group when all weigh the same, effective n included', () => {
    fc.assert(
      fc.property(countedTables(), fc.bigInt({ min: 1n, max: 90_000n }), (table, units) => {
        const plain = summarise(table);
        const same = summarise(equallyWeighted(table, units));
        expect(same.effectiveN).toBe(plain.n);
        expect(plain.effectiveN).toBe(plain.n);
        expect(same.n).toBe(plain.n);
        expectAlike([same.weightSum], [(plain.n * Number(units)) / 10_000]);
        expectAlike(shapeOf(same), shapeOf(plain));
      }),
    );
  });

  it('does not depend on which end of the scale is good', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        expect(summarise(lowIsGood(table))).toEqual(summarise(table));
      }),
    );
  });

  it('of everybody k times keeps mean and shape; the effective n is k-fold', () => {
    fc.assert(
      fc.property(anyTables(), fc.integer({ min: 2, max: 9 }), (table, times) => {
        const [one, many] = [summarise(table), summarise(copied(table, times))];
        expectAlike([many.effectiveN / times, many.mean], [one.effectiveN, one.mean]);
        expectAlike(
          [many.skewness ?? -99, many.excessKurtosis ?? -99],
          [one.skewness ?? -99, one.excessKurtosis ?? -99],
        );
        const variance = (summary: CohortSummary): number =>
          ((summary.sd ?? 0) ** 2 * (summary.effectiveN - 1)) / summary.effectiveN;
        if (one.sd !== null) expectAlike([variance(many)], [variance(one)]);
      }),
    );
  });

  it('moves and stretches with the scores', () => {
    fc.assert(
      fc.property(anyTables(), (table) => {
        const { scale } = table;
        const moved = { ...scale, min: -5, max: -5 + 2 * (table.counts.length - 1), step: 2 };
        const [before, after] = [summarise(table), summarise({ ...table, scale: moved })];
        const place = (score: number): number => ((score - scale.min) / scale.step) * 2 - 5;
        expectAlike([after.mean, ...after.fiveNumbers], [place(before.mean), ...before.fiveNumbers.map(place)]);
        expectAlike([after.sd ?? -1], [before.sd === null ? -1 : (before.sd / scale.step) * 2]);
        expectAlike([after.skewness ?? -99], [before.skewness ?? -99]);
      }),
    );
  });

  it('has hinges that are the medians of the halves, the median in both when n is odd', () => {
    const sizes = fc.array(fc.integer({ min: 0, max: 4 }), { minLength: 1, maxLength: 40 });
    const median = (sorted: readonly number[]): number => {
      const middle = (sorted.length - 1) / 2;
      return ((sorted[Math.floor(middle)] ?? NaN) + (sorted[Math.ceil(middle)] ?? NaN)) / 2;
    };
    fc.assert(
      fc.property(sizes, (scores) => {
        const sorted = scores.toSorted((left, right) => left - right);
        const half = Math.ceil(sorted.length / 2);
        const counts = attainableScores(SCALE).map((score) => scores.filter((other) => other === score).length);
        expect(summarise(tableFromCounts(SCALE, counts)).fiveNumbers).toEqual([
          sorted[0],
          median(sorted.slice(0, half)),
          median(sorted),
          median(sorted.slice(-half)),
          sorted.at(-1),
        ]);
      }),
    );
  });
});
