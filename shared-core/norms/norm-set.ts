import { definitionProblem } from '../percentile/percentile-rank.ts';
import { peopleIn } from '../tally/frequency-table.ts';
import { checkCode } from './check-code.ts';
import { normsOfGroup, type GroupNorms } from './group-norms.ts';
import { strayAdjustments, type RefusedAdjustment } from './adjustments.ts';
import { normGroups } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';
import { openMustQueries, queriesOf, type Query } from './queries.ts';

/** Every number that screen, PDF, workbook and csv print, from one project. */
export interface NormSet {
  readonly project: NormProject;
  /** Groups that get a table, in print order. */
  readonly groups: readonly GroupNorms[];
  readonly queries: readonly Query[];
  /** Adjustments by hand that could not be made, of all groups and of groups that are no more. */
  readonly refusedAdjustments: readonly RefusedAdjustment[];
  /** A draft while a query that must be answered is open; every page and file says so. */
  readonly status: 'draft' | 'released';
  /** "7F3A-91C2": the same on every page and machine for the same printed texts, another when one differs. */
  readonly check: string;
}

export type NormSetBuilt =
  { readonly ok: true; readonly normSet: NormSet } | { readonly ok: false; readonly problem: string };

/** Pure: the same project gives the same set everywhere. What stands in the way comes back as a sentence. */
export function buildNormSet(project: NormProject): NormSetBuilt {
  if (project.tally === null) {
    return {
      ok: false,
      problem: 'No cohort has been read yet. Choose a file at the Cohort station, or type the counts.',
    };
  }
  const { definition } = project.curve;
  const problem = definitionProblem(project.tally.scale, definition);
  if (problem !== null) return { ok: false, problem };
  const all = normGroups(project);
  const printed = all.filter((group) => group.printed && peopleIn(group.table) > 0);
  if (printed.length === 0) {
    return { ok: false, problem: 'No group gets a table. At the Groups station, let at least one be printed.' };
  }
  const groups = printed.map((group) => normsOfGroup(project, group));
  const refusedAdjustments = [
    ...strayAdjustments(project, all),
    ...groups.flatMap((norms) => norms.refusedAdjustments),
  ];
  const whenReleased = checkCode(project, groups, 'released');
  const queries = queriesOf(project, groups, refusedAdjustments, whenReleased);
  const status = openMustQueries(queries).length > 0 ? 'draft' : 'released';
  const check = status === 'released' ? whenReleased : checkCode(project, groups, status);
  return { ok: true, normSet: { project, groups, queries, refusedAdjustments, status, check } };
}

/**
 * Why a set cannot be pressed or handed out, in a sentence that tells what to do, or null: a group whose smoothing was
 * refused would be printed as something it is not, and a rank that could not be adjusted as what nobody wanted.
 */
export function pressProblem({ groups, refusedAdjustments }: NormSet): string | null {
  const [adjustment] = refusedAdjustments;
  if (adjustment !== undefined) return adjustment.problem;
  const refused = groups.find(({ smoothing }) => smoothing.state === 'refused');
  if (refused?.smoothing.state !== 'refused') return null;
  return `${refused.group.title} cannot be smoothed as chosen. ${refused.smoothing.problem}`;
}
