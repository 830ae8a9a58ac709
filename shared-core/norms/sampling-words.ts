import { ENGLISH_WORDS, figure, say, sayCounted } from '../languages/phrases.ts';
import { DESIGN_EFFECT_RANKS, type SamplingDesign } from '../precision/sampling-design.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import type { NormProject, PeopleNoun } from './norm-project.ts';

/** True where a cluster column was read with the cohort. */
export function isClustered({ tally }: Pick<NormProject, 'tally'>): boolean {
  return tally?.cells.some(({ clusters }) => clusters !== null) ?? false;
}

/** "24 clusters, design effect 2.1"; empty where people are taken as drawn one by one. */
export function clusterFacts({ clusters, designEffect }: SamplingDesign, words = ENGLISH_WORDS): string {
  if (clusters === null) return '';
  const printed = printCount(clusters);
  const counted = sayCounted(words, 'clusters', printed, { count: figure(words, printed) });
  if (designEffect === null) return counted;
  const effect = figure(words, printNumber(designEffect, 1));
  return say(words, 'clusters.with-effect', { clusters: counted, effect });
}

/** "as if pupils were drawn one by one", or "for pupils drawn in 24 clusters, design effect 2.1". */
export function drawnInWords(noun: PeopleNoun, design: SamplingDesign, words = ENGLISH_WORDS): string {
  const people = say(words, `people.${noun}`);
  return design.clusters === null
    ? say(words, 'drawn.one-by-one', { people })
    : say(words, 'drawn.in-clusters', { people, clusters: clusterFacts(design, words) });
}

/** The same of the whole project, before any group is looked at. */
export function drawnInGeneral(project: Pick<NormProject, 'tally' | 'people'>, words = ENGLISH_WORDS): string {
  const people = say(words, `people.${project.people}`);
  return say(words, isClustered(project) ? 'drawn.somehow-in-clusters' : 'drawn.one-by-one', { people });
}

/** How the design effect is had, for print. */
export function designEffectNote(words = ENGLISH_WORDS): string {
  const [low, high] = DESIGN_EFFECT_RANKS.map((rank) => figure(words, String(rank)));
  return say(words, 'clusters.effect-note', { low: low ?? '', high: high ?? '' });
}
