import { groupKey, standingTitle, type NormGroup } from '../../shared-core/norms/norm-groups.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';

/** The project with a group's title or its having a table changed. The group's own title is not kept as a choice. */
export function withGroupChoice(
  project: NormProject,
  group: NormGroup,
  change: { readonly title?: string; readonly printed?: boolean },
): NormProject {
  const { by, choices } = project.groups;
  const title = change.title ?? group.title;
  const own = standingTitle(by, group.values, project.people);
  const choice = {
    values: [...group.values],
    title: title.trim() === own ? '' : title.trim(),
    printed: change.printed ?? group.printed,
  };
  const others = choices.filter((known) => groupKey(known.values) !== group.key);
  const next = choice.title === '' && choice.printed ? others : [...others, choice];
  return { ...project, groups: { ...project.groups, choices: next } };
}
