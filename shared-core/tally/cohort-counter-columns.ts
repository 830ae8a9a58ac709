import type { Reply } from '../desk.ts';
import type { ColumnRole, Reading } from '../norms/reading.ts';

/** Which cell of a row holds what; positions count from 0. */
export interface CountedColumns {
  readonly score: number;
  readonly count: number | null;
  readonly weight: number | null;
  readonly id: number | null;
  /** The column of the clusters people were drawn in. */
  readonly cluster: { readonly at: number; readonly name: string } | null;
  /** Positions and names of the grouping columns, in file order. */
  readonly groups: readonly number[];
  readonly groupColumns: readonly string[];
  /** Cells of a full row. */
  readonly width: number;
  /** The rightmost cell that is needed. */
  readonly lastNeeded: number;
}

/** Finds the columns that a reading names among the columns of the file. The problem says which column to change. */
export function countedColumns(reading: Reading, columns: readonly string[]): Reply<CountedColumns> {
  const found: Record<ColumnRole, number[]> = {
    score: [],
    count: [],
    weight: [],
    group: [],
    id: [],
    cluster: [],
    unused: [],
  };
  for (const { column, role } of reading.roles) {
    if (role === 'unused') continue;
    const position = columns.indexOf(column);
    if (position < 0) return refused(`The file has no column "${column}". Choose the columns again.`);
    if (!found[role].includes(position)) found[role].push(position);
  }
  const nameAt = (position: number | undefined): string => columns[position ?? 0] ?? '';
  for (const role of ['score', 'count', 'weight', 'id', 'cluster'] as const) {
    const [first, second] = found[role];
    if (second !== undefined) {
      return refused(`Both "${nameAt(first)}" and "${nameAt(second)}" are marked as ${role}. Keep one of them.`);
    }
  }
  const all = [...found.score, ...found.count, ...found.weight, ...found.group, ...found.id, ...found.cluster];
  const twice = all.find((position, index) => all.indexOf(position) !== index);
  if (twice !== undefined) return refused(`Column "${nameAt(twice)}" is given two roles. Keep one of them.`);
  const score = found.score[0];
  if (score === undefined)
    return refused('No column is marked as the score. Mark the column that holds the raw scores.');
  const count = found.count[0] ?? null;
  if (reading.layout === 'counts' && count === null) {
    return refused(
      'The rows are read as counts, but no column is marked as the count. Mark the column with the counts.',
    );
  }
  if (reading.layout === 'people' && count !== null) {
    return refused(
      `Column "${nameAt(count)}" is marked as the count, but every row is read as one person. ` +
        'Read the rows as counts, or leave the column unused.',
    );
  }
  const [cluster] = found.cluster;
  const groups = found.group.toSorted((left, right) => left - right);
  return {
    ok: true,
    value: {
      score,
      count,
      weight: found.weight[0] ?? null,
      id: found.id[0] ?? null,
      cluster: cluster === undefined ? null : { at: cluster, name: nameAt(cluster) },
      groups,
      groupColumns: groups.map(nameAt),
      width: columns.length,
      lastNeeded: Math.max(...all),
    },
  };
}

function refused<T>(problem: string): Reply<T> {
  return { ok: false, problem };
}
