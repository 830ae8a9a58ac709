import { ratio, ratioToNumber } from '../percentile/exact-ratio.ts';
import { clustersIn, type TableClusters } from '../tally/clusters.ts';
import { mirrorTable, weightUnitsIn, type FrequencyTable } from '../tally/frequency-table.ts';
import { rankShares, shareOfTied, type CountedRank } from './counted-rank.ts';

/**
 * Standard error, in percentile-rank points, of every attainable score's rank for people drawn in clusters, lowest score
 * first: the linearised variance of a ratio between clusters, taken as drawn with replacement (ultimate clusters),
 *
 *   C/(C − 1) · Σ_c (Z_c − t W_c)² / W²,
 *
 * with t the rank as a proportion, W_c the weight of cluster c, W that of all, and Z_c the weight in c that the rank
 * counts: those below the score and none, half or all of those at it, by the definition. C counts the clusters with
 * people in the group; those who stand alone are a cluster each. (From memory: Kish 1965, Survey Sampling, ch. 6; Wolter
 * 1985, Introduction to Variance Estimation, ch. 6.) Null without clusters or with only one, which tells of no other.
 */
export function clusterRankErrors(table: FrequencyTable, counted: CountedRank): readonly number[] | null {
  if (table.clusters === null) return null;
  const clusters = clustersIn(table.clusters);
  if (clusters < 2) return null;
  if (table.scale.direction === 'high-is-good') return errorsFromBelow(table, table.clusters, clusters, counted);
  const { clusters: mirrored, ...others } = mirrorTable(table);
  if (mirrored === null) throw new RangeError('a mirrored table keeps its clusters');
  const seen = { ...others, clusters: mirrored, scale: { ...table.scale, direction: 'high-is-good' as const } };
  return errorsFromBelow(seen, mirrored, clusters, counted).toReversed();
}

function errorsFromBelow(
  table: FrequencyTable,
  { named, alone, aloneSquares }: TableClusters,
  clusters: number,
  counted: CountedRank,
): readonly number[] {
  const all = weightUnitsIn(table);
  const tied = shareOfTied(counted);
  const ranks = rankShares(table).map(({ below, at }) => below + tied * at);
  const sums = new Array<number>(ranks.length).fill(0);
  // In the order of their numbers, so that sums of doubles do not hang on how tables were merged.
  for (const [, { positions, weights }] of [...named].sort(([left], [right]) => left - right)) {
    const shares = weights.map((weight) => ratioToNumber(ratio(weight, all)));
    const share = shares.reduce((sum, one) => sum + one, 0);
    let below = 0;
    let next = 0;
    ranks.forEach((rank, position) => {
      const at = positions[next] === position ? (shares[next] ?? 0) : 0;
      sums[position] = (sums[position] ?? 0) + (below + tied * at - rank * share) ** 2;
      if (positions[next] === position) next += 1;
      below += at;
    });
  }
  if (alone.some((people) => people > 0)) {
    const squares = aloneSquares.map((square) => ratioToNumber(ratio(square, all * all)));
    const below = sumsBefore(squares);
    // Summed from the other end, not subtracted: nobody above is exactly 0.
    const above = sumsBefore(squares.toReversed()).toReversed();
    ranks.forEach((rank, position) => {
      const [worse, at, better] = [below[position] ?? 0, squares[position] ?? 0, above[position] ?? 0];
      sums[position] = (sums[position] ?? 0) + worse * (1 - rank) ** 2 + at * (tied - rank) ** 2 + better * rank ** 2;
    });
  }
  return sums.map((sum) => 100 * Math.sqrt((clusters / (clusters - 1)) * sum));
}

/** Of each value the sum of those before it. */
function sumsBefore(values: readonly number[]): readonly number[] {
  let sum = 0;
  return values.map((value) => {
    const before = sum;
    sum += value;
    return before;
  });
}
