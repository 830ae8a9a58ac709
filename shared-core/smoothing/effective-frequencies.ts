import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { squaredUnitsIn, weighsEqually, weightUnitsIn, type FrequencyTable } from '../tally/frequency-table.ts';

/** Frequencies that methods are fitted to: people, or effective people when they do not all weigh the same. */
export interface EffectiveFrequencies {
  /** One for each attainable score, lowest first; whole numbers without weights. */
  readonly at: readonly number[];
  /** Their sum: n, or (Σw)²/Σw² (Kish 1965, Survey Sampling). 0 for an empty group. */
  readonly total: number;
}

/** Weight sums rescaled to add up to the effective n: w_k · Σw/Σw². */
export function effectiveFrequencies(table: FrequencyTable): EffectiveFrequencies {
  if (weighsEqually(table)) {
    return { at: table.counts, total: table.counts.reduce((sum, count) => sum + count, 0) };
  }
  const weights = weightUnitsIn(table);
  const squares = squaredUnitsIn(table);
  return {
    at: table.weights.map((weight) => ratioToNumber(ratio(weight * weights, squares))),
    total: ratioToNumber(ratio(weights * weights, squares)),
  };
}
