import type { NormProject } from '../../shared-core/norms/norm-project.ts';

/**
 * The moment that printed files carry as theirs: the start of the edition's day in universal time, or of 1970 where it
 * has none, so that one project gives the same bytes whenever and wherever it is pressed.
 */
export function releaseDay({ release }: NormProject): Date {
  const day = new Date(`${release.date}T00:00:00Z`);
  return Number.isNaN(day.getTime()) ? new Date(0) : day;
}
