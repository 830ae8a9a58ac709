import { printFiveNumber } from '../norms/five-numbers.ts';
import { countedPeople } from '../norms/norm-groups.ts';
import type { PeopleNoun } from '../norms/norm-project.ts';
import { scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import { summarise } from '../tally/cohort-summary.ts';
import { compareGroupValues } from '../tally/tally.ts';
import { foldedText } from './list-text.ts';
import { countedScores } from './score-facts.ts';

/** What is compared: never a percentile rank. */
export interface ComparedPupil {
  /** As the list names it; empty where it names none. */
  readonly group: string;
  /** Raw-score points. */
  readonly score: number;
  /** Normal curve equivalent; null where there is none. */
  readonly nce: number | null;
}

export interface ComparedGroup {
  readonly group: string;
  readonly n: number;
  /** Of the raw scores; null in a group of fewer than two. */
  readonly median: string | null;
  readonly mean: string | null;
  /** Mean of the normal curve equivalents; null in a group of fewer than two, and where somebody has none. */
  readonly nceMean: string | null;
}

export interface GroupComparison {
  /** In order of the groups' names. */
  readonly groups: readonly ComparedGroup[];
  /** True where at least one group has a mean of normal curve equivalents. */
  readonly hasNce: boolean;
  /** Why something is missing, in sentences. */
  readonly remarks: readonly string[];
}

const FEWEST_COMPARED = 2;
const NCE_DECIMALS = 1;

/**
 * Groups that the list names, side by side by raw scores and by normal curve equivalents, whose steps are equal so that
 * they may be averaged; percentile ranks may not. Null where fewer than two groups are named.
 */
export function compareGroups(
  pupils: readonly ComparedPupil[],
  scale: ScoreScale,
  people: PeopleNoun,
): GroupComparison | null {
  const named = new Map<string, ComparedPupil[]>();
  for (const pupil of pupils) {
    if (pupil.group === '') continue;
    const key = foldedText(pupil.group);
    const known = named.get(key);
    if (known === undefined) named.set(key, [pupil]);
    else known.push(pupil);
  }
  if (named.size < 2) return null;
  const members = [...named.values()].toSorted((a, b) => compareGroupValues([a[0]?.group ?? ''], [b[0]?.group ?? '']));
  const without = pupils.length - members.reduce((sum, group) => sum + group.length, 0);
  const groups = members.map((group) => comparedGroup(group, scale));
  return {
    groups,
    hasNce: groups.some(({ nceMean }) => nceMean !== null),
    remarks: [
      ...members.flatMap((group) => remarkOn(group, people)),
      ...(without === 0 ? [] : [`The list names no group for ${countedPeople(printCount(without), people)}.`]),
    ],
  };
}

function comparedGroup(members: readonly ComparedPupil[], scale: ScoreScale): ComparedGroup {
  const group = members[0]?.group ?? '';
  const n = members.length;
  if (n < FEWEST_COMPARED) return { group, n, median: null, mean: null, nceMean: null };
  const { mean, fiveNumbers } = summarise(
    countedScores(
      scale,
      members.map(({ score }) => score),
    ),
  );
  const equivalents = members.flatMap(({ nce }) => (nce === null ? [] : [nce]));
  return {
    group,
    n,
    median: printFiveNumber(scale, fiveNumbers[2]),
    mean: printNumber(mean, scaleGrid(scale).decimals + 1),
    nceMean: equivalents.length < n ? null : printNumber(meanOf(equivalents), NCE_DECIMALS),
  };
}

function remarkOn(members: readonly ComparedPupil[], people: PeopleNoun): readonly string[] {
  const group = members[0]?.group ?? '';
  if (members.length < FEWEST_COMPARED) {
    return [`Group ${group} has one score only, so that neither median nor mean is given.`];
  }
  const without = members.filter(({ nce }) => nce === null).length;
  if (without === 0) return [];
  return [
    `Group ${group} has no mean of normal curve equivalents, since ${countedPeople(printCount(without), people)} of it ` +
      `${without === 1 ? 'has' : 'have'} a rank without one.`,
  ];
}

function meanOf(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
