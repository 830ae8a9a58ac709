import { figure, type PrintWords, say } from '../languages/phrases.ts';
import { namedFiveNumbers, quarterWord } from '../norms/five-numbers.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';
import { scaleGrid } from '../scale/score-scale.ts';
import { printCount, printNumber, printShare } from '../scores/printed-number.ts';
import type { FactTable } from './fact-table.ts';
import { printedTitle } from './sheet-texts.ts';

/** A column of a table with a row for each group. */
export interface GroupFact {
  /** One line or two. */
  readonly head: readonly string[];
  readonly text: (norms: GroupNorms) => string;
}

const NO_VALUE = '\u2013';

/** A table of facts with a row for each group. */
export function groupTable(
  name: string,
  { project, groups }: NormSet,
  facts: readonly GroupFact[],
  words: PrintWords,
): FactTable {
  return {
    name,
    heads: [[say(words, 'norm-group.group')], ...facts.map(({ head }) => head)],
    rows: groups.map((norms) => ({
      cells: [printedTitle(project, norms.group), ...facts.map(({ text }) => figure(words, text(norms)))],
      strong: false,
    })),
  };
}

/** n, what n is worth, mean, SD, quarters and shares at the ends of the scale. */
export function sizeAndSpread(groups: readonly GroupNorms[], words: PrintWords): readonly GroupFact[] {
  const decimals = ({ group }: GroupNorms): number => scaleGrid(group.table.scale).decimals + 1;
  return [
    { head: inLines(say(words, 'norm-group.n')), text: ({ summary }) => printCount(summary.n) },
    ...(groups.some(isWeighted) ? [effectiveFact(words)] : []),
    ...(groups.some(isDrawnInClusters) ? clusterFacts(words) : []),
    { head: inLines(say(words, 'norm-group.mean')), text: (norms) => printNumber(norms.summary.mean, decimals(norms)) },
    {
      head: inLines(say(words, 'norm-group.sd')),
      text: (norms) => orDash(norms.summary.sd, (sd) => printNumber(sd, decimals(norms))),
    },
    ...fiveFacts(groups, words).slice(1, 4),
    { head: inLines(say(words, 'norm-group.at-lowest')), text: ({ summary }) => printShare(summary.shareAtLowest) },
    { head: inLines(say(words, 'norm-group.at-highest')), text: ({ summary }) => printShare(summary.shareAtHighest) },
  ];
}

export function isWeighted({ group }: GroupNorms): boolean {
  return group.table.weighted;
}

export function isDrawnInClusters({ sampling }: GroupNorms): boolean {
  return sampling.clusters !== null;
}

function clusterFacts(words: PrintWords): readonly GroupFact[] {
  return [
    { head: inLines(say(words, 'norm-group.clusters')), text: ({ sampling }) => orDash(sampling.clusters, printCount) },
    {
      head: inLines(say(words, 'norm-group.design-effect')),
      text: ({ sampling }) => orDash(sampling.designEffect, (effect) => printNumber(effect, 1)),
    },
    {
      head: inLines(say(words, 'norm-group.for-intervals')),
      text: ({ sampling }) => printNumber(sampling.effectiveN, 1),
    },
  ];
}

function effectiveFact(words: PrintWords): GroupFact {
  return {
    head: inLines(say(words, 'norm-group.effective-n')),
    text: ({ summary }) => printNumber(summary.effectiveN, 1),
  };
}

/** The five numbers; quarters are called quartiles where a group has no hinges. */
export function fiveFacts(groups: readonly GroupNorms[], words: PrintWords): readonly GroupFact[] {
  const quarter = quarterOf(groups);
  const keys = ['lowest', `lower-${quarter}`, 'median', `upper-${quarter}`, 'highest'] as const;
  return keys.map((key, index) => ({
    head: inLines(say(words, `five-head.${key}`)),
    text: (norms) => namedFiveNumbers(norms)[index]?.printed ?? NO_VALUE,
  }));
}

/** What stands a quarter of the way in, for all groups together. */
export function quarterOf(groups: readonly GroupNorms[]): 'hinge' | 'quartile' {
  return groups.every(({ group }) => quarterWord(group.table) === 'hinge') ? 'hinge' : 'quartile';
}

function orDash(value: number | null, print: (value: number) => string): string {
  return value === null ? NO_VALUE : print(value);
}

function inLines(head: string): readonly string[] {
  return head.split('\n');
}
