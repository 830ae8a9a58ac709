import { basename } from 'node:path';
import { groupKey, normGroups, type NormGroup } from '../../shared-core/norms/norm-groups.ts';
import { whyDiffer } from '../../shared-core/norms/why-differ.ts';
import type { DifferOptions } from './differ-options.ts';
import { differJson, differText, type Compared } from './differ-result.ts';
import { refused, wrongUsage, type Outcome } from './outcome.ts';
import { readRankFile } from './rank-file.ts';
import { readCohort } from './read-cohort.ts';

/** Finds how somebody's ranks were made from the people of a cohort file. */
export async function differCommand(path: string, options: DifferOptions): Promise<Outcome> {
  const cohort = await readCohort(path, options);
  if (!cohort.ok) return cohort.outcome;
  const { project, remarks } = cohort;
  const groups = normGroups(project);
  const group = groups.find(({ key }) => key === groupKey(options.group));
  if (group === undefined) return wrongUsage(noSuchGroup(options.group, groups));
  const column = await readRankFile(options.ranks, group.table.scale);
  if (!column.ok) return refused(column.problem, remarks);
  const compared: Compared = {
    project,
    group,
    ranksFile: basename(options.ranks),
    column: column.value,
    found: whyDiffer(group.table, column.value),
  };
  return { kind: 'done', result: options.format === 'json' ? differJson(compared) : differText(compared), remarks };
}

const GROUPS_NAMED = 20;

function noSuchGroup(values: readonly string[], groups: readonly NormGroup[]): string {
  const named = groups.slice(0, GROUPS_NAMED).map((group) => `"${group.values.join(',')}"`);
  const more = groups.length > GROUPS_NAMED ? ' …' : '.';
  return `There is no group "${values.join(',')}". The groups: ${named.join(', ')}${more}`;
}
