import { percentilePoint, personAt } from '../percentile/percentile-point.ts';
import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { attainableScores } from '../scale/score-scale.ts';
import { centralMoments } from './central-moments.ts';
import { peopleIn, squaredUnitsIn, weighsEqually, weightUnitsIn, type FrequencyTable } from './frequency-table.ts';

/** Minimum, lower hinge, median, upper hinge, maximum, in raw-score points. */
export type FiveNumbers = readonly [number, number, number, number, number];

export interface CohortSummary {
  /** People. */
  readonly n: number;
  /** Sum of weights; n without weights. */
  readonly weightSum: number;
  /** (Σw)²/Σw² (Kish 1965, Survey Sampling); n without weights. */
  readonly effectiveN: number;
  readonly mean: number;
  /**
   * Standard deviation dividing by n − 1. With weights the variance is the weighted one times n_eff/(n_eff − 1), which
   * is the unbiased form for reliability weights and the same thing when all weigh the same. Null for fewer than two.
   */
  readonly sd: number | null;
  /** m3/m2^1.5, the moment form g1; null when all scores are equal. */
  readonly skewness: number | null;
  /** m4/m2² − 3, the moment form g2; null when all scores are equal. */
  readonly excessKurtosis: number | null;
  readonly fiveNumbers: FiveNumbers;
  /** Shares 0–1 of the weight at the lowest and highest attainable score. */
  readonly shareAtLowest: number;
  readonly shareAtHighest: number;
  /** Attainable scores that nobody obtained. */
  readonly unobserved: readonly number[];
}

/**
 * Describes a group of at least one person. The five numbers use Tukey's hinges (1977, Exploratory Data Analysis: the
 * medians of the halves, the median counted in both when n is odd); with unequal weights, where hinges are not defined,
 * the lowest scores that a quarter, a half and three quarters of the weight reach, neighbours averaged on a tie.
 */
export function summarise(table: FrequencyTable): CohortSummary {
  const n = peopleIn(table);
  if (n === 0) throw new RangeError('a group without people cannot be described');
  const scores = attainableScores(table.scale);
  const weightSum = weightUnitsIn(table);
  const effectiveN = ratioToNumber(ratio(weightSum * weightSum, squaredUnitsIn(table)));
  const shares = table.weights.map((weight) => ratioToNumber(ratio(weight, weightSum)));
  const { mean, m2, m3, m4 } = centralMoments(scores, shares);
  const varies = table.weights.filter((weight) => weight > 0n).length > 1;
  return {
    n,
    weightSum: ratioToNumber(ratio(weightSum, table.weightUnit)),
    effectiveN,
    mean,
    sd: n > 1 && effectiveN > 1 ? (varies ? Math.sqrt((m2 * effectiveN) / (effectiveN - 1)) : 0) : null,
    skewness: varies ? m3 / m2 ** 1.5 : null,
    excessKurtosis: varies ? m4 / (m2 * m2) - 3 : null,
    fiveNumbers: fiveNumbers(table, scores),
    shareAtLowest: shares[0] ?? 0,
    shareAtHighest: shares.at(-1) ?? 0,
    unobserved: scores.filter((_, position) => table.counts[position] === 0),
  };
}

function fiveNumbers(table: FrequencyTable, scores: readonly number[]): FiveNumbers {
  const observed = scores.filter((_, position) => (table.counts[position] ?? 0) > 0);
  const ends = [observed[0] ?? NaN, observed.at(-1) ?? NaN] as const;
  const inner = weighsEqually(table) ? hinges(table, scores) : weightedQuarters(table);
  return [ends[0], inner[0], inner[1], inner[2], ends[1]];
}

function weightedQuarters(table: FrequencyTable): readonly [number, number, number] {
  const ascending: FrequencyTable = { ...table, scale: { ...table.scale, direction: 'high-is-good' } };
  const at = (share: number): number => percentilePoint(ascending, share, 'type-2', 1).score;
  return [at(0.25), at(0.5), at(0.75)];
}

/** Tukey's depth of the fourth is (⌊(n + 1)/2⌋ + 1)/2, counted in from either end. */
function hinges(table: FrequencyTable, scores: readonly number[]): readonly [number, number, number] {
  const n = peopleIn(table);
  const depth = (Math.floor((n + 1) / 2) + 1) / 2;
  const personOf = (rank: number): number => personAt(table, scores, BigInt(rank));
  const at = (position: number): number => (personOf(Math.floor(position)) + personOf(Math.ceil(position))) / 2;
  return [at(depth), at((n + 1) / 2), at(n + 1 - depth)];
}
