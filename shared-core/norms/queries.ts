import { adjustmentQueries } from './adjustment-queries.ts';
import type { RefusedAdjustment } from './adjustments.ts';
import { unusedClusterQueries } from './cluster-queries.ts';
import { cohortQueries } from './cohort-queries.ts';
import { editionQueries } from './edition-queries.ts';
import { cutQueries } from './cut-queries.ts';
import { descriptionQueries } from './description-queries.ts';
import type { GroupNorms } from './group-norms.ts';
import { groupQueries } from './group-queries.ts';
import type { NormProject } from './norm-project.ts';
import { reversalQueries } from './reversal-queries.ts';

export type Station = 'cohort' | 'groups' | 'curve' | 'table' | 'sheet' | 'release';

/** What a proof-reader would ask. */
export interface Query {
  /** The same text for the same question, so that an answer stays with it. */
  readonly id: string;
  /** Where it is asked. */
  readonly station: Station;
  /** `must` wants an answer before release, `should` a look, `note` tells. */
  readonly weight: 'must' | 'should' | 'note';
  /** Key of the group it concerns; null for the whole project. */
  readonly group: string | null;
  readonly lead: string;
  readonly why: string;
  readonly whatToDo: string;
  /** The user's reason, where the query was answered. */
  readonly answer: string | null;
}

export type Asked = Omit<Query, 'answer'>;

/** A query of one group, before it is told which; its id names the question alone. */
export type AskedOfGroup = Omit<Asked, 'group'>;

/**
 * All queries of a project, most pressing first, those with a reason given last. Their thresholds are those of the
 * project's policy. `refused` are the adjustments that were not made, of all groups and of none; `check` is the code that
 * a released edition of the project carries.
 */
export function queriesOf(
  project: NormProject,
  groups: readonly GroupNorms[],
  refused: readonly RefusedAdjustment[],
  check: string,
): readonly Query[] {
  const asked = [
    ...cohortQueries(project),
    ...unusedClusterQueries(project),
    ...descriptionQueries(project, groups),
    ...adjustmentQueries(groups, refused),
    ...cutQueries(project),
    ...groups.flatMap((norms) =>
      groupQueries(project, norms).map((query) => ({
        ...query,
        id: `${query.id}:${norms.group.key}`,
        group: norms.group.key,
      })),
    ),
    ...reversalQueries(project, groups),
    ...editionQueries(project, check),
  ];
  const weights = { must: 0, should: 1, note: 2 } as const;
  return asked
    .map((query) => ({
      ...query,
      answer: project.release.answers.find((given) => given.query === query.id)?.reason ?? null,
    }))
    .sort((left, right) => rankOf(left) - rankOf(right));

  function rankOf(query: Query): number {
    return weights[query.weight] + (query.answer === null ? 0 : 10);
  }
}

/** Queries that still want an answer before release. */
export function openQueries(queries: readonly Query[]): readonly Query[] {
  return queries.filter((query) => query.answer === null && query.weight !== 'note');
}

/** Queries without whose answer an edition is a draft. */
export function openMustQueries(queries: readonly Query[]): readonly Query[] {
  return openQueries(queries).filter(({ weight }) => weight === 'must');
}
