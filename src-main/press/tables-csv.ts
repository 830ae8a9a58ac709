import { definitionKey } from '../../shared-core/norms/definitions.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { csvBytes } from './csv-text.ts';
import { safeForCsv } from './safe-text.ts';

/**
 * All tables as one csv file, with the decimal point. Numbers are unrounded; `printed` and the columns `printed-…` hold the
 * texts of the booklet. The names mean what they mean in `norm-set.json`: `percentile-rank` is the observed one, `standard-error` that of the
 * midpoint rank, `interval-low` and `interval-high` (0–100) are of the observed rank; where a group is smoothed, `printed`
 * follows `smoothed-percentile-rank`. Cells are empty where there is no such number.
 * `adjusted` tells what was changed by hand, why and by whom; `status` is draft or released.
 */
export function tablesCsv(normSet: NormSet): Uint8Array {
  const { project, groups, check, status } = normSet;
  const { columns } = project.table;
  const { by } = project.groups;
  const heads = [
    ...by.map(safeForCsv),
    'group-title',
    'raw-score',
    'n',
    'count',
    'cumulative',
    'percentile-rank',
    'smoothed-percentile-rank',
    'smoothed-standard-error',
    'interval-low',
    'interval-high',
    'standard-error',
    'printed',
    ...columns.map((key) => `printed-${key}`),
    'edition',
    'definition',
    'check',
    'adjusted',
    'status',
  ];
  const records = groups.flatMap(({ group, summary, rows }) =>
    rows.map((row) => [
      ...by.map((_, index) => safeForCsv(group.values[index] ?? '')),
      safeForCsv(group.title),
      String(row.score),
      String(summary.n),
      String(row.count),
      String(row.cumulative),
      String(row.observed.percentileRank),
      numberOrNothing(row.smoothed?.percentileRank),
      numberOrNothing(row.smoothed?.standardError),
      numberOrNothing(row.interval?.low),
      numberOrNothing(row.interval?.high),
      numberOrNothing(row.midpointError),
      row.printed,
      ...columns.map((key) => row.texts[key]),
      safeForCsv(project.release.edition),
      definitionKey(project.curve.definition),
      check,
      row.adjusted === null
        ? ''
        : `from ${row.adjusted.from} to ${row.printed}: ${row.adjusted.reason} (${row.adjusted.by})`,
      status,
    ]),
  );
  return csvBytes([heads, ...records]);
}

function numberOrNothing(value: number | null | undefined): string {
  return value === null || value === undefined ? '' : String(value);
}
