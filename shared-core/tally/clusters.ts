import type { CellClusters, ClusterPart } from './tally.ts';

/** The people of one cluster within a group; lists go with `positions`, the scores (ascending) where it has people. */
export interface TableCluster {
  readonly positions: readonly number[];
  readonly counts: readonly number[];
  /** Weight sums in the units of the table; the counts without weights. */
  readonly weights: readonly bigint[];
}

/** The clusters of a group's people. */
export interface TableClusters {
  /** By the number of the cluster, which is the same in every table of one tally. */
  readonly named: ReadonlyMap<number, TableCluster>;
  /** People who stand as a cluster of one each, at each attainable score, and their squared weights. */
  readonly alone: readonly number[];
  readonly aloneSquares: readonly bigint[];
}

/** The clusters of one cell of a tally. */
export function clustersFromCell({ parts, alone, aloneSquares }: CellClusters): TableClusters {
  return {
    named: new Map(parts.map((part) => [part.cluster, fromPart(part)])),
    alone,
    aloneSquares: aloneSquares?.map(BigInt) ?? alone.map(BigInt),
  };
}

function fromPart({ positions, counts, weights }: ClusterPart): TableCluster {
  return { positions, counts, weights: weights?.map(BigInt) ?? counts.map(BigInt) };
}

/** Clusters of people taken together: a cluster that stands in both is one. */
export function mergeClusters(left: TableClusters, right: TableClusters): TableClusters {
  const named = new Map(left.named);
  for (const [number, cluster] of right.named) {
    const known = named.get(number);
    named.set(number, known === undefined ? cluster : mergeCluster(known, cluster));
  }
  return {
    named,
    alone: left.alone.map((people, position) => people + (right.alone[position] ?? 0)),
    aloneSquares: left.aloneSquares.map((square, position) => square + (right.aloneSquares[position] ?? 0n)),
  };
}

function mergeCluster(left: TableCluster, right: TableCluster): TableCluster {
  const positions = [...new Set([...left.positions, ...right.positions])].sort((one, other) => one - other);
  const sumAt = <T extends number | bigint>(listOf: (cluster: TableCluster) => readonly T[], position: number): T[] =>
    [left, right].flatMap((cluster) => listOf(cluster)[cluster.positions.indexOf(position)] ?? []);
  return {
    positions,
    counts: positions.map((position) => sumAt(({ counts }) => counts, position).reduce((sum, count) => sum + count, 0)),
    weights: positions.map((position) =>
      sumAt(({ weights }) => weights, position).reduce((sum, weight) => sum + weight, 0n),
    ),
  };
}

/** The clusters read from the other end of a scale of so many scores. */
export function mirrorClusters({ named, alone, aloneSquares }: TableClusters, scores: number): TableClusters {
  const mirrored = ({ positions, counts, weights }: TableCluster): TableCluster => ({
    positions: positions.map((position) => scores - 1 - position).toReversed(),
    counts: counts.toReversed(),
    weights: weights.toReversed(),
  });
  return {
    named: new Map([...named].map(([number, cluster]) => [number, mirrored(cluster)])),
    alone: alone.toReversed(),
    aloneSquares: aloneSquares.toReversed(),
  };
}

/** Number of clusters, those of one person included. */
export function clustersIn({ named, alone }: TableClusters): number {
  return named.size + alone.reduce((sum, people) => sum + people, 0);
}
