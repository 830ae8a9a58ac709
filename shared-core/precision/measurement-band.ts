import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import { deviateOf, levelProblem } from './confidence-level.ts';
import { rankAt, type ContinuizedRanks } from './continuized-rank.ts';
import type { PercentInterval } from './percent-interval.ts';

/** What the error of measurement leaves open about one score: raw scores and the ranks that they have. */
export interface MeasurementBand {
  /** Raw-score points, x − z·SEM and x + z·SEM; may lie beyond the scale. */
  readonly lowScore: number;
  readonly highScore: number;
  readonly ranks: PercentInterval;
}

export type MeasurementBands =
  | {
      readonly ok: true;
      /** Standard error of measurement, in raw-score points. */
      readonly sem: number;
      readonly bands: readonly MeasurementBand[];
    }
  | { readonly ok: false; readonly problem: string };

/** What is wrong with a reliability, in a sentence, or null. */
export function reliabilityProblem(reliability: number): string | null {
  return reliability >= 0 && reliability <= 1 ? null : 'A reliability is a number from 0 to 1, such as 0.88.';
}

/** SEM = SD √(1 − r), in the units of the standard deviation (Lord & Novick 1968, Statistical Theories of Mental Test Scores). */
export function standardErrorOfMeasurement(sd: number, reliability: number): number {
  const problem = reliabilityProblem(reliability);
  if (problem !== null) throw new RangeError(problem);
  return sd * Math.sqrt(1 - reliability);
}

/**
 * For each attainable score x, lowest first, the band x ± z·SEM turned into percentile ranks by the group's continuized
 * distribution. This is error of measurement: how far one person's score may lie from the true one. It knows nothing of
 * the error of sampling, which is another column. `sd` is null in a group of fewer than two people; level in per cent.
 */
export function measurementBands(
  scale: ScoreScale,
  continuized: ContinuizedRanks,
  sd: number | null,
  { reliability, level }: { readonly reliability: number; readonly level: number },
): MeasurementBands {
  const problem = reliabilityProblem(reliability) ?? levelProblem(level);
  if (problem !== null) return { ok: false, problem };
  if (sd === null) {
    return { ok: false, problem: 'The error of measurement needs a standard deviation, thus at least two people.' };
  }
  const sem = standardErrorOfMeasurement(sd, reliability);
  const reach = deviateOf(level) * sem;
  const bands = attainableScores(scale).map((score) => {
    const [lowScore, highScore] = [score - reach, score + reach];
    const ends = [rankAt(continuized, lowScore), rankAt(continuized, highScore)];
    return { lowScore, highScore, ranks: { low: Math.min(...ends), high: Math.max(...ends) } };
  });
  return { ok: true, sem, bands };
}
