import { isClusterName } from '../tally/guess-roles.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';
import type { Asked, AskedOfGroup } from './queries.ts';

/** Below this many clusters their variance is itself unsure (common practice). */
const FEW_CLUSTERS = 20;

/** What a proof-reader would ask of the clusters that a group was drawn in. */
export function clusterQueries({ group, sampling }: GroupNorms): readonly AskedOfGroup[] {
  const { clusters } = sampling;
  if (clusters === null || clusters >= FEW_CLUSTERS) return [];
  if (clusters === 1) {
    return [
      {
        id: 'one-cluster',
        station: 'groups',
        weight: 'must',
        lead: `All of ${group.title} stand in one cluster.`,
        why: 'One cluster does not tell how far others would differ: there is no interval and no standard error.',
        whatToDo: 'Merge groups or gather more clusters, or leave the cluster column unused and say so.',
      },
    ];
  }
  return [
    {
      id: 'few-clusters',
      station: 'groups',
      weight: 'should',
      lead: `${group.title} was drawn in only ${clusters} clusters.`,
      why: `Below ${FEW_CLUSTERS} clusters the design effect and the intervals hang on the few that were drawn.`,
      whatToDo: 'Merge groups or gather more clusters, or say on the sheet that the intervals are unsure.',
    },
  ];
}

/** A column that by its name holds clusters, though people are taken as drawn one by one. */
export function unusedClusterQueries({ reading }: NormProject): readonly Asked[] {
  if (reading === null || reading.roles.some(({ role }) => role === 'cluster')) return [];
  const unused = reading.roles.find(({ column, role }) => role === 'unused' && isClusterName(column));
  if (unused === undefined) return [];
  return [
    {
      id: 'cluster-unused',
      station: 'cohort',
      weight: 'note',
      group: null,
      lead: `The column “${unused.column}” is not used.`,
      why: 'People of one school are alike; taken as drawn one by one they make ranks look surer than they are.',
      whatToDo: 'If people were drawn by it, make it the cluster column.',
    },
  ];
}
