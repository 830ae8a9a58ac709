import type { ColumnKey } from '../../shared-core/norms/column-keys.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { smoothingQueries } from '../../shared-core/norms/smoothing-queries.ts';
import type { TableOptions } from './table-options.ts';

/** What is to be said of the smoothing and the errors of the tables beside the tables themselves. */
export function precisionRemarks({ project, groups }: NormSet, { precision, format }: TableOptions): readonly string[] {
  const asked: readonly (readonly [unknown, string, ColumnKey])[] = [
    [precision.interval, 'Intervals show', 'interval'],
    [precision.reliability, 'A reliability shows', 'measurement-band'],
  ];
  const unseen = asked.filter(
    ([given, , column]) => given !== null && format !== 'json' && !project.table.columns.includes(column),
  );
  return [
    ...groups.flatMap((norms) =>
      smoothingQueries(project, norms).map(({ lead, why }) => `${named(lead, norms.group.title)} ${why}`),
    ),
    ...unseen.map(([, what, column]) => `${what} in the column ${column}; name it in --columns to see it.`),
  ];
}

/** A sentence that does not name its group gets the group's title before it. */
function named(sentence: string, title: string): string {
  return sentence.includes(title) ? sentence : `${title}: ${sentence}`;
}
