import { powerOfTen } from '../scale/decimal.ts';
import { scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { clustersFromCell, mergeClusters, mirrorClusters, type TableClusters } from './clusters.ts';
import { compareGroupValues, type Tally, type TallyCell } from './tally.ts';

/**
 * The frequencies of one group on its scale, lowest score first. Without weights every person weighs one unit, so that
 * `weights` equals `counts` and one formula serves both.
 */
export interface FrequencyTable {
  readonly scale: ScoreScale;
  /** People at each attainable score. */
  readonly counts: readonly number[];
  /** Weight sums, in whole units. */
  readonly weights: readonly bigint[];
  /** Sums of squared weights, in squared units. */
  readonly squares: readonly bigint[];
  /** Units in a weight of 1: 1n without weights, 10^decimals with. */
  readonly weightUnit: bigint;
  readonly weighted: boolean;
  /** The same people by the cluster they were drawn in; null where they are taken as drawn one by one. */
  readonly clusters: TableClusters | null;
}

/** An unweighted table from people counted at each attainable score; counts are whole numbers of 0 or more. */
export function tableFromCounts(scale: ScoreScale, counts: readonly number[]): FrequencyTable {
  const { length } = scaleGrid(scale);
  if (counts.length !== length) throw new RangeError(`the scale has ${length} scores, not ${counts.length}`);
  if (!counts.every((count) => Number.isSafeInteger(count) && count >= 0)) {
    throw new RangeError('counts are whole numbers of 0 or more');
  }
  const weights = counts.map(BigInt);
  return { scale, counts, weights, squares: weights, weightUnit: 1n, weighted: false, clusters: null };
}

/** One cell of a tally as a frequency table. */
export function tableFromCell(tally: Tally, cell: TallyCell): FrequencyTable {
  const clusters = cell.clusters === null ? null : clustersFromCell(cell.clusters);
  if (tally.weightDecimals === null || cell.weights === null || cell.squares === null) {
    return { ...tableFromCounts(tally.scale, cell.counts), clusters };
  }
  return {
    scale: tally.scale,
    counts: cell.counts,
    weights: cell.weights.map(BigInt),
    squares: cell.squares.map(BigInt),
    weightUnit: powerOfTen(tally.weightDecimals),
    weighted: true,
    clusters,
  };
}

/** People of two tables of one scale and one weight unit taken together, both with clusters or both without. */
export function mergeTables(left: FrequencyTable, right: FrequencyTable): FrequencyTable {
  if (left.weighted !== right.weighted || left.weightUnit !== right.weightUnit || !sameScale(left.scale, right.scale)) {
    throw new RangeError('only tables of one scale and one weight unit can be merged');
  }
  const [clusters, others] = [left.clusters, right.clusters];
  if ((clusters === null) !== (others === null)) {
    throw new RangeError('clusters of some people cannot be merged with no clusters of others');
  }
  return {
    ...left,
    counts: left.counts.map((count, index) => count + (right.counts[index] ?? 0)),
    weights: left.weights.map((weight, index) => weight + (right.weights[index] ?? 0n)),
    squares: left.squares.map((square, index) => square + (right.squares[index] ?? 0n)),
    clusters: clusters === null || others === null ? null : mergeClusters(clusters, others),
  };
}

function sameScale(left: ScoreScale, right: ScoreScale): boolean {
  return (
    left.min === right.min && left.max === right.max && left.step === right.step && left.direction === right.direction
  );
}

/** The table read from the other end of the scale: position 0 becomes the last. */
export function mirrorTable(table: FrequencyTable): FrequencyTable {
  return {
    ...table,
    counts: table.counts.toReversed(),
    weights: table.weights.toReversed(),
    squares: table.squares.toReversed(),
    clusters: table.clusters === null ? null : mirrorClusters(table.clusters, table.counts.length),
  };
}

export interface GroupedTable {
  /** One value for each of the chosen columns. */
  readonly values: readonly string[];
  readonly table: FrequencyTable;
}

/** The tally merged to the chosen grouping columns (none: one group), in the order of group values. */
export function tablesByGroup(tally: Tally, by: readonly string[]): readonly GroupedTable[] {
  const picks = by.map((column) => {
    const index = tally.groupColumns.indexOf(column);
    if (index < 0) throw new RangeError(`the tally has no column ${column}`);
    return index;
  });
  const merged = new Map<string, GroupedTable>();
  for (const cell of tally.cells) {
    const values = picks.map((index) => cell.values[index] ?? '');
    const key = JSON.stringify(values);
    const table = tableFromCell(tally, cell);
    const known = merged.get(key);
    merged.set(key, { values, table: known === undefined ? table : mergeTables(known.table, table) });
  }
  return [...merged.values()].sort((left, right) => compareGroupValues(left.values, right.values));
}

/** Number of people. */
export function peopleIn(table: FrequencyTable): number {
  return table.counts.reduce((sum, count) => sum + count, 0);
}

/** Sum of weights in units. */
export function weightUnitsIn(table: FrequencyTable): bigint {
  return table.weights.reduce((sum, weight) => sum + weight, 0n);
}

/** Sum of squared weights in squared units. */
export function squaredUnitsIn(table: FrequencyTable): bigint {
  return table.squares.reduce((sum, square) => sum + square, 0n);
}

/** True when all people weigh the same, so that counts alone carry the table (N Σw² = (Σw)²). */
export function weighsEqually(table: FrequencyTable): boolean {
  if (!table.weighted) return true;
  const sum = weightUnitsIn(table);
  return BigInt(peopleIn(table)) * squaredUnitsIn(table) === sum * sum;
}
