import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import type { CellClusters, ClusterPart } from '../../../shared-core/tally/tally.ts';
import { READING, settledProject } from './small-projects.ts';

/** The settled project with the people of every cell in so many clusters, each of people with nearly equal scores. */
export function clusteredProject(clusters: number): NormProject {
  const settled = settledProject();
  if (settled.tally === null) throw new Error('no tally');
  return {
    ...settled,
    reading: { ...READING, roles: [...READING.roles, { column: 'school', role: 'cluster' }] },
    tally: {
      ...settled.tally,
      cells: settled.tally.cells.map((cell) => ({ ...cell, clusters: clustersOf(cell.counts, clusters) })),
    },
  };
}

/** People of a cell in so many clusters, each of people with nearly equal scores. */
export function clustersOf(counts: readonly number[], clusters: number): CellClusters {
  const scores = counts.flatMap((count, position) => Array.from({ length: count }, () => position));
  const parts = Array.from({ length: clusters }, (_, cluster): ClusterPart => {
    const own = scores.filter((_, person) => Math.floor((person * clusters) / scores.length) === cluster);
    const positions = [...new Set(own)];
    return {
      cluster,
      positions,
      counts: positions.map((position) => own.filter((score) => score === position).length),
      weights: null,
    };
  });
  return { parts, alone: counts.map(() => 0), aloneSquares: null };
}
