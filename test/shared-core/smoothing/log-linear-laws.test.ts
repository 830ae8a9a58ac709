import { describe, expect, it } from 'vitest';
import { mirrorTable, tableFromCounts, type FrequencyTable } from '../../../shared-core/tally/frequency-table.ts';
import { expectAllNear, expectNear } from '../../reference/near.ts';
import { readRows, weightedTable, wholeScale } from '../../reference/read-reference.ts';
import { cohortTable, logLinear, SMOOTHED_COHORTS, smoothed } from '../../reference/smoothing-reference.ts';
import { generator, randomCohort } from './random-cohorts.ts';

const DEGREES = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
const MOMENT = 1e-9;

function weightedCohort(): FrequencyTable {
  const people = readRows('c5_weighted_cohort.csv');
  return weightedTable(
    wholeScale(0, 40),
    people.map((row) => ({ score: Number(row['score']), weight: Number(row['weight']) })),
  );
}

const cohorts: readonly (readonly [string, FrequencyTable])[] = [
  ...SMOOTHED_COHORTS.map((id) => [id, cohortTable(id)] as const),
  ['c5_weighted', weightedCohort()],
];

describe.each(cohorts)('log-linear smoothing of %s', (_, table) => {
  const weights = table.weights.map(Number);
  const total = weights.reduce((sum, weight) => sum + weight, 0);

  it.each(DEGREES)('keeps raw moments up to degree %i', (degree) => {
    const { probabilities } = smoothed(table, logLinear(degree));
    for (let power = 0; power <= degree; power += 1) {
      const observed = weights.reduce((sum, weight, score) => sum + (weight / total) * score ** power, 0);
      const fitted = probabilities.reduce((sum, probability, score) => sum + probability * score ** power, 0);
      expectNear(fitted / observed, 1, MOMENT, `moment ${power}`);
    }
  });

  it('shows kept moments side by side', () => {
    const { momentsObserved, momentsFitted } = smoothed(table, logLinear(4));
    for (const moment of ['mean', 'sd', 'skewness', 'excessKurtosis'] as const) {
      expectNear(momentsFitted[moment], momentsObserved[moment], 1e-8, moment);
    }
    const second = smoothed(table, logLinear(2));
    expectNear(second.momentsFitted.sd, second.momentsObserved.sd, 1e-9, 'sd');
    expect(Math.abs(second.momentsFitted.skewness - second.momentsObserved.skewness)).toBeGreaterThan(1e-6);
  });

  it('misses less with each degree and counts a degree of freedom less', () => {
    const { degrees } = smoothed(table, logLinear('bic'));
    degrees.slice(1).forEach((line, index) => {
      expect(line.g2).toBeLessThanOrEqual((degrees[index]?.g2 ?? NaN) + 1e-8);
      expect(line.df).toBe((degrees[index]?.df ?? NaN) - 1);
    });
  });

  it('turns round with the scale', () => {
    const fit = smoothed(table, logLinear(5));
    const mirrored = smoothed(mirrorTable(table), logLinear(5));
    expectAllNear(mirrored.probabilities.toReversed(), fit.probabilities, 1e-12, 'probability');
  });

  it('keeps the order of scores where a low score is good', () => {
    const low = { ...table, scale: { ...table.scale, direction: 'low-is-good' as const } };
    expect(smoothed(low, logLinear(3)).probabilities).toEqual(smoothed(table, logLinear(3)).probabilities);
  });
});

describe('log-linear smoothing of random cohorts', () => {
  const next = generator(303);
  const tables = Array.from({ length: 25 }, () => randomCohort(next, 400));

  it('gives chances above 0 that add up to 1, and a cumulative proportion that never falls', () => {
    for (const table of tables) {
      const fit = smoothed(table, logLinear(4));
      const { probabilities } = fit;
      expect(probabilities.every((probability) => probability > 0)).toBe(true);
      expectNear(
        probabilities.reduce((sum, probability) => sum + probability, 0),
        1,
        1e-12,
        'sum',
      );
      probabilities.forEach((probability, position) => {
        const [below, mid, at] = [-0.5, 0, 0.5].map((shift) => fit.cumulative(position, shift as -0.5 | 0 | 0.5));
        expectNear((mid ?? NaN) - (below ?? NaN), probability / 2, 1e-12, 'half of the share');
        expectNear((at ?? NaN) - (below ?? NaN), probability, 1e-12, 'the share');
        if (position > 0) expectNear(fit.cumulative(position - 1, 0.5), below ?? NaN, 0, 'one below the next');
      });
    }
  });

  it('is symmetric for a symmetric cohort', () => {
    for (const table of tables) {
      const counts = table.counts.map((count, k) => count + (table.counts.at(-1 - k) ?? 0));
      const { probabilities, degrees } = smoothed(tableFromCounts(table.scale, counts), logLinear(6));
      expectAllNear(probabilities.toReversed(), probabilities, 1e-11, 'probability');
      expectNear(degrees[2]?.g2 ?? null, degrees[1]?.g2 ?? NaN, 1e-8, 'an odd degree adds nothing');
    }
  });

  it('fits c times the people to c times the cohort, with c times G² and a variance c times as small', () => {
    for (const table of tables) {
      const one = smoothed(table, logLinear(5));
      const seven = smoothed(
        tableFromCounts(
          table.scale,
          table.counts.map((count) => 7 * count),
        ),
        logLinear(5),
      );
      expectAllNear(seven.probabilities, one.probabilities, 1e-12, 'probability');
      expectNear((seven.g2 ?? NaN) / (one.g2 ?? NaN), 7, 1e-8, 'G²');
      expectNear((seven.x2 ?? NaN) / (one.x2 ?? NaN), 7, 1e-8, 'X²');
      const weights = table.counts.map((_, k) => k * k);
      const ratio = (one.varianceOf?.(weights) ?? NaN) / (seven.varianceOf?.(weights) ?? NaN);
      expectNear(ratio, 7, 1e-8, 'variance');
    }
  });

  it('takes equal weights for people without weights', () => {
    for (const table of tables.slice(0, 5)) {
      const heavy: FrequencyTable = {
        ...table,
        weights: table.weights.map((weight) => weight * 3n),
        squares: table.squares.map((square) => square * 9n),
        weightUnit: 2n,
        weighted: true,
      };
      const [plain, weighted] = [smoothed(table, logLinear('bic')), smoothed(heavy, logLinear('bic'))];
      expect(weighted.probabilities).toEqual(plain.probabilities);
      expect(weighted.degrees).toEqual(plain.degrees);
    }
  });

  it('gives back a cohort that the degree saturates', () => {
    const counts = [3, 9, 1, 14, 6, 2];
    const fit = smoothed(tableFromCounts(wholeScale(5, 10), counts), logLinear(5));
    expectAllNear(
      fit.probabilities.map((probability) => probability * 35),
      counts,
      1e-10,
      'frequency',
    );
    expectNear(fit.g2, 0, 1e-12, 'G²');
    expect(fit.df).toBe(0);
  });
});
