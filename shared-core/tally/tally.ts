import type { ScoreScale } from '../scale/score-scale.ts';

/**
 * The sufficient statistic of a cohort: for every combination of group values the number of people at each attainable
 * score and, in a weighted cohort, the sum of their weights and of their squared weights; with a cluster column, the same
 * by cluster. It holds no person's record and no name of a cluster.
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
  /** The same people by the cluster (school) they were drawn in; null where no cluster column was read. */
  readonly clusters: CellClusters | null;
}

/** The people of a cell by cluster. Parts and `alone` add up to the cell at every score. */
export interface CellClusters {
  /** One for each cluster with people in the cell, in order of their numbers. */
  readonly parts: readonly ClusterPart[];
  /** People whose cluster is not told, at each attainable score: each stands as a cluster of one. */
  readonly alone: readonly number[];
  /** Sums of their squared weights, in the units of `squares`; null for an unweighted cohort. */
  readonly aloneSquares: readonly string[] | null;
}

/** The people of one cluster in a cell; the lists go with `positions`. */
export interface ClusterPart {
  /** From 0 by the order of the cluster column's values, the same in every cell. The values themselves are not kept. */
  readonly cluster: number;
  /** Positions on the scale, ascending, at which the cluster has people. */
  readonly positions: readonly number[];
  readonly counts: readonly number[];
  /** Weight sums, in the units of the cell's weights; null for an unweighted cohort. */
  readonly weights: readonly string[] | null;
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
