import { describe, expect, it } from 'vitest';
import { smooth } from '../../../shared-core/smoothing/smooth.ts';
import { logLinear } from '../../reference/smoothing-reference.ts';
import { generator, randomCohort } from './random-cohorts.ts';

const DEGREES = [1, 2, 3, 4, 5, 6, 7, 8];
/** SMOOTHING_SOAK=500 draws that many cohorts of each size, for a long run by hand. */
const COHORTS = Number(process.env['SMOOTHING_SOAK'] ?? 60);

interface Outcome {
  readonly fitted: number;
  /** Refused beforehand: the observed scores do not determine the degree, or it has as many parameters as people. */
  readonly undetermined: number;
  readonly unmet: number;
  /** Largest gap between observed and fitted moments of positions from −1 to 1, as a share of N. */
  readonly worstMoment: number;
}

function refits(people: number, seed: number): Outcome {
  const next = generator(seed);
  let [fitted, undetermined, unmet, worstMoment] = [0, 0, 0, 0];
  for (let cohort = 0; cohort < COHORTS; cohort += 1) {
    const table = randomCohort(next, people);
    const last = table.counts.length - 1;
    for (const degree of DEGREES) {
      const result = smooth(table, logLinear(degree), 'fit-only');
      if (!result.ok) {
        if (result.problem.includes('too few')) undetermined += 1;
        else unmet += 1;
        continue;
      }
      fitted += 1;
      for (let power = 1; power <= degree; power += 1) {
        const gap = table.counts.reduce(
          (sum, count, k) =>
            sum + (count / people - (result.smoothed.probabilities[k] ?? NaN)) * ((2 * k - last) / last) ** power,
          0,
        );
        worstMoment = Math.max(worstMoment, Math.abs(gap));
      }
    }
  }
  return { fitted, undetermined, unmet, worstMoment };
}

describe('refits of random cohorts with degrees 1 to 8', () => {
  it.each([200, 500, 2000, 20_000])('never fail with %i people', (people) => {
    const outcome = refits(people, people);
    expect(outcome.unmet).toBe(0);
    expect(outcome.worstMoment).toBeLessThan(1e-10);
    expect(outcome.fitted).toBeGreaterThan(0.9 * COHORTS * DEGREES.length);
  });

  it.each([30, 60, 100])('are met or refused in words with %i people', (people) => {
    const outcome = refits(people, people);
    expect(outcome.fitted + outcome.undetermined + outcome.unmet).toBe(COHORTS * DEGREES.length);
    expect(outcome.worstMoment).toBeLessThan(1e-10);
    expect(outcome.fitted).toBeGreaterThan(0.8 * COHORTS * DEGREES.length);
  });
});
