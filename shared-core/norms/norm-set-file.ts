import type { PercentilePoint } from '../percentile/percentile-point.ts';
import { definitionKey } from './definitions.ts';
import { toFileKeys } from './file-keys.ts';
import type { GroupNorms, NormSet } from './norm-set.ts';

/** A group's percentile points, where some were asked for. */
export type PointsOf = (norms: GroupNorms) => readonly PercentilePoint[];

/**
 * The numbers of a set as plain JSON, unrounded beside the printed texts: what the command line prints and what
 * `norm-set.json` holds. Every key is lower-case-with-hyphens; only the `group` object has the file's own column names.
 */
export function normSetForFile(normSet: NormSet, pointsOf: PointsOf): Readonly<Record<string, unknown>> {
  const { project, groups } = normSet;
  const { source, tally } = project;
  return {
    source:
      source === null
        ? null
        : {
            file: source.file,
            sha256: source.sha256,
            'rows-read': source.rowsRead,
            'rows-kept': source.rowsKept,
            'left-out': source.leftOut.map(({ rule, count, rows }) => ({ rule, count, rows })),
          },
    scale: tally === null ? null : { min: tally.scale.min, max: tally.scale.max, step: tally.scale.step },
    definition: definitionKey(project.curve.definition),
    groups: groups.map((norms) => groupForFile(normSet, norms, pointsOf(norms))),
  };
}

function groupForFile(normSet: NormSet, norms: GroupNorms, points: readonly PercentilePoint[]): unknown {
  const { summary, group, rows } = norms;
  return {
    group: Object.fromEntries(normSet.project.groups.by.map((column, index) => [column, group.values[index] ?? ''])),
    n: summary.n,
    'weight-sum': summary.weightSum,
    'effective-n': summary.effectiveN,
    mean: summary.mean,
    sd: summary.sd,
    skewness: summary.skewness,
    'excess-kurtosis': summary.excessKurtosis,
    'five-number': summary.fiveNumbers,
    points: points.map(({ proportion, definition, score }) => ({ proportion, definition, score })),
    rows: rows.map((row) => ({
      score: row.score,
      count: row.count,
      weight: row.weight,
      cumulative: row.cumulative,
      'percentile-rank': row.percentileRank,
      printed: row.printed,
      derived: row.derived,
      provenance: toFileKeys(row.provenance),
    })),
  };
}
