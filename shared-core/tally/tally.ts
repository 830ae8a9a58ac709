import type { ScoreScale } from '../scale/score-scale.ts';

/**
 * The sufficient statistic of a cohort: for every combination of group values the number of people at each attainable
 * score and, in a weighted cohort, the sum of their weights and of their squared weights. It holds no person's record.
 *
 * Weight sums are whole numbers of 10^-decimals, written as decimal text so that they are exact at any size: cohorts
 * added up in any order give the same bytes.
 */
export interface Tally {
  readonly scale: ScoreScale;
  /** Names of the grouping columns, in file order; empty when the cohort is one group. */
  readonly groupColumns: readonly string[];
  /** Decimals of the weight unit; null for an unweighted cohort. */
  readonly weightDecimals: number | null;
  /** One entry a combination that occurs, in order of `compareGroupValues`. */
  readonly cells: readonly TallyCell[];
}

export interface TallyCell {
  /** One value for each grouping column, as text, leading zeros kept. */
  readonly values: readonly string[];
  /** People at each attainable score, lowest score first. */
  readonly counts: readonly number[];
  /** Weight sums in units of 10^-weightDecimals; null for an unweighted cohort. */
  readonly weights: readonly string[] | null;
  /** Sums of squared weights in units of 10^-(2 weightDecimals); null for an unweighted cohort. */
  readonly squares: readonly string[] | null;
}

/**
 * Order of group values, the same on every machine: numbers by size before other text, other text by code point.
 */
export function compareGroupValues(left: readonly string[], right: readonly string[]): number {
  for (let index = 0; index < left.length; index += 1) {
    const order = compareValue(left[index] ?? '', right[index] ?? '');
    if (order !== 0) return order;
  }
  return 0;
}

function compareValue(left: string, right: string): number {
  const leftNumber = numberIn(left);
  const rightNumber = numberIn(right);
  if (leftNumber !== null && rightNumber !== null && leftNumber !== rightNumber) return leftNumber - rightNumber;
  if (leftNumber !== null && rightNumber === null) return -1;
  if (leftNumber === null && rightNumber !== null) return 1;
  return left < right ? -1 : left > right ? 1 : 0;
}

function numberIn(text: string): number | null {
  return /^-?\d+(\.\d+)?$/.test(text) ? Number(text) : null;
}
