import { DESIGN_EFFECT_RANKS, type SamplingDesign } from '../precision/sampling-design.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import type { NormProject } from './norm-project.ts';

/** True where a cluster column was read with the cohort. */
export function isClustered({ tally }: Pick<NormProject, 'tally'>): boolean {
  return tally?.cells.some(({ clusters }) => clusters !== null) ?? false;
}

/** "24 clusters, design effect 2.1"; empty where people are taken as drawn one by one. */
export function clusterFacts({ clusters, designEffect }: SamplingDesign): string {
  if (clusters === null) return '';
  const count = `${printCount(clusters)} ${clusters === 1 ? 'cluster' : 'clusters'}`;
  return designEffect === null ? count : `${count}, design effect ${printNumber(designEffect, 1)}`;
}

/** "as if pupils were drawn one by one", or "for pupils drawn in 24 clusters, design effect 2.1". */
export function drawnInWords(people: string, design: SamplingDesign): string {
  return design.clusters === null
    ? `as if ${people} were drawn one by one`
    : `for ${people} drawn in ${clusterFacts(design)}`;
}

/** The same of the whole project, before any group is looked at. */
export function drawnInGeneral(project: Pick<NormProject, 'tally' | 'people'>): string {
  return isClustered(project)
    ? `for ${project.people} drawn in clusters`
    : `as if ${project.people} were drawn one by one`;
}

/** How the design effect is had, for print. */
export const DESIGN_EFFECT_NOTE =
  'The design effect is averaged over the scores whose rank lies between ' +
  `${DESIGN_EFFECT_RANKS[0]} and ${DESIGN_EFFECT_RANKS[1]}.`;
