import type { NormProject } from '../../../shared-core/norms/norm-project.ts';
import { projectOf } from './small-projects.ts';

/** Typed counts in groups by one column; every group has a count for each score from 0. */
export function groupedProject(column: string, counts: Readonly<Record<string, readonly number[]>>): NormProject {
  const projects = Object.entries(counts).map(([value, people]) => ({ value, project: projectOf(people) }));
  const [first] = projects;
  if (first === undefined || first.project.tally === null) throw new Error('no group');
  const { project } = first;
  return {
    ...project,
    tally: {
      ...first.project.tally,
      groupColumns: [column],
      cells: projects.flatMap(
        (each) => each.project.tally?.cells.map((cell) => ({ ...cell, values: [each.value] })) ?? [],
      ),
    },
    groups: { ...project.groups, by: [column] },
  };
}
