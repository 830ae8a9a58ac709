import type { PercentilePoint } from '../percentile/percentile-point.ts';
import { bootstrapForFile, rowBootstrapForFile, type GroupBootstrap } from './bootstrap-file.ts';
import { cutsForFile } from './cut-file.ts';
import { definitionKey } from './definitions.ts';
import { toFileKeys } from './file-keys.ts';
import type { GroupSmoothing } from './group-smoothing.ts';
import { printRanges, type GroupNorms } from './group-norms.ts';
import type { CohortSource } from './norm-project.ts';
import type { PrintRange } from './print-range.ts';
import type { NormSet } from './norm-set.ts';

/** A group's percentile points, where some were asked for. */
export type PointsOf = (norms: GroupNorms) => readonly PercentilePoint[];

/** A group's bootstrap, or null where none was made. */
export type BootstrapOf = (norms: GroupNorms) => GroupBootstrap | null;

/**
 * The numbers of a set as plain JSON, unrounded beside the printed texts: what the command line prints and what
 * `norm-set.json` holds. Every key is lower-case-with-hyphens; only the `group` object has the file's own column names.
 */
export function normSetForFile(
  normSet: NormSet,
  pointsOf: PointsOf,
  bootstrapOf: BootstrapOf = () => null,
): Readonly<Record<string, unknown>> {
  const { project, groups } = normSet;
  const { source, tally } = project;
  return {
    source: source === null ? null : sourceForFile(source),
    scale: tally === null ? null : { min: tally.scale.min, max: tally.scale.max, step: tally.scale.step },
    definition: definitionKey(project.curve.definition),
    groups: groups.map((norms) => groupForFile(normSet, norms, pointsOf(norms), bootstrapOf(norms))),
    ...(project.cuts.length === 0 ? {} : { cuts: cutsForFile(normSet) }),
  };
}

/** Where the people come from, and which rows were left out. */
export function sourceForFile({ file, sha256, rowsRead, rowsKept, leftOut }: CohortSource): unknown {
  return {
    file,
    sha256,
    'rows-read': rowsRead,
    'rows-kept': rowsKept,
    'left-out': leftOut.map(({ rule, count, rows }) => ({ rule, count, rows })),
  };
}

function groupForFile(
  normSet: NormSet,
  norms: GroupNorms,
  points: readonly PercentilePoint[],
  bootstrap: GroupBootstrap | null,
): unknown {
  const { summary, sampling, group, rows, smoothing } = norms;
  const curve = smoothing.state === 'smoothed' ? smoothing.curve : null;
  const ranges = printRanges(normSet.project, group.table, curve);
  return {
    group: Object.fromEntries(normSet.project.groups.by.map((column, index) => [column, group.values[index] ?? ''])),
    n: summary.n,
    'weight-sum': summary.weightSum,
    'effective-n': summary.effectiveN,
    clusters: sampling.clusters,
    'design-effect': sampling.designEffect,
    mean: summary.mean,
    sd: summary.sd,
    skewness: summary.skewness,
    'excess-kurtosis': summary.excessKurtosis,
    'five-number': summary.fiveNumbers,
    points: points.map(({ proportion, definition, score }) => ({ proportion, definition, score })),
    smoothing: smoothingForFile(norms.smoothing),
    ...(bootstrap === null ? {} : { bootstrap: bootstrapForFile(bootstrap) }),
    rows: rows.map((row, position) => ({
      score: row.score,
      count: row.count,
      weight: row.weight,
      cumulative: row.cumulative,
      'percentile-rank': row.observed.percentileRank,
      printed: row.printed,
      adjusted: row.adjusted,
      derived: row.derived,
      interval: row.interval === null ? null : { low: row.interval.low, high: row.interval.high },
      'standard-error': row.midpointError,
      smoothed: toFileKeys(row.smoothed),
      alternatives: rangeForFile(ranges[position] ?? null),
      band: row.band === null ? null : { low: row.band.low, high: row.band.high },
      ...(bootstrap === null ? {} : { bootstrap: rowBootstrapForFile(bootstrap, position) }),
      provenance: toFileKeys(row.provenance),
    })),
  };
}

function rangeForFile(range: PrintRange | null): unknown {
  return range === null ? null : { low: range.low, high: range.high };
}

function smoothingForFile(smoothing: GroupSmoothing): unknown {
  if (smoothing.state !== 'smoothed') return null;
  const { choice, degree, bandwidth, g2, x2, df, aic, bic, momentsObserved, momentsFitted } = smoothing.curve;
  return {
    method: choice.kind,
    degree,
    bandwidth,
    g2,
    x2,
    df,
    aic,
    bic,
    converged: true,
    'moments-observed': toFileKeys(momentsObserved),
    'moments-fitted': toFileKeys(momentsFitted),
  };
}
