import type { TalliedCohort } from '../../shared-core/desk.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';

/**
 * The project with a newly read cohort. Grouping columns that are gone are dropped; a first reading, which has no
 * `earlier` tally, is grouped by its first grouping column. Where the scale was taken from the scores, the direction
 * chosen before stays.
 */
export function withTally(
  project: NormProject,
  { source, tally }: TalliedCohort,
  earlier: NormProject['tally'],
): NormProject {
  const first = earlier === null && project.groups.by.length === 0;
  const by = first
    ? tally.groupColumns.slice(0, 1)
    : project.groups.by.filter((column) => tally.groupColumns.includes(column));
  const direction = source.scaleInferred ? earlier?.scale.direction : undefined;
  return {
    ...project,
    source,
    tally: direction === undefined ? tally : { ...tally, scale: { ...tally.scale, direction } },
    groups: { ...project.groups, by },
  };
}
