import { ratioToNumber } from '../percentile/exact-ratio.ts';
import { cutTables } from './cut-table.ts';
import type { NormSet } from './norm-set.ts';

/**
 * The cuts as files tell them, and what each means in each of its groups: the percentile rank (0–100) of its score and
 * the per cent of the group at it or better, unrounded beside their printed texts; null where there is none.
 */
export function cutsForFile({ project, groups }: NormSet): unknown {
  return cutTables(project, groups).map(({ cut, rows }) => ({
    name: cut.name,
    score: cut.score,
    groups: rows.map(({ group, row, share, shareText }) => ({
      group: Object.fromEntries(
        project.groups.by.map((column, index) => [column, groups[group]?.group.values[index] ?? '']),
      ),
      'percentile-rank': row?.percentileRank ?? null,
      printed: row?.printed ?? null,
      'per-cent-at-or-better': share === null ? null : ratioToNumber(share),
      'per-cent-printed': share === null ? null : shareText,
    })),
  }));
}
