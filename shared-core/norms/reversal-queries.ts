import { printNumber } from '../scores/printed-number.ts';
import type { GroupNorms } from './group-norms.ts';
import { listed } from './listed.ts';
import { groupKey } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';
import { policySays } from './policy.ts';
import type { Asked } from './queries.ts';

/** Two groups that are alike but for one column, in whose order one comes next after the other. */
interface Neighbours {
  readonly column: string;
  readonly earlier: GroupNorms;
  readonly later: GroupNorms;
}

/**
 * What a proof-reader would ask of groups in an order, such as grades and ages: a later group that does worse, or that
 * stands higher at the same raw score though it does better.
 */
export function reversalQueries(project: NormProject, groups: readonly GroupNorms[]): readonly Asked[] {
  return neighboursIn(project.groups.by, groups).flatMap((pair): readonly Asked[] => {
    const worse = worseQuery(project, pair);
    return worse === null ? rankQueries(project, pair) : [worse];
  });
}

function worseQuery({ tally }: NormProject, { column, earlier, later }: Neighbours): Asked | null {
  const better = tally?.scale.direction === 'low-is-good' ? -1 : 1;
  const falls = (before: number, after: number): boolean => (after - before) * better < 0;
  const [before, after] = [earlier.summary, later.summary];
  const [medianBefore, medianAfter] = [before.fiveNumbers[2], after.fiveNumbers[2]];
  const byMean = falls(before.mean, after.mean);
  if (!byMean && !falls(medianBefore, medianAfter)) return null;
  const compared = byMean
    ? `mean ${printNumber(after.mean, 2)} after ${printNumber(before.mean, 2)}`
    : `median ${printNumber(medianAfter, 2)} after ${printNumber(medianBefore, 2)}`;
  return {
    id: `reversal-level:${column}:${later.group.key}`,
    station: 'groups',
    weight: 'should',
    group: later.group.key,
    lead: `${later.group.title} does worse than ${earlier.group.title}: ${compared}.`,
    why: 'Where groups follow an order, as grades and ages do, a later one that does worse may be mislabelled or chosen otherwise.',
    whatToDo: 'Check the labels and the sampling of both, or say that these groups have no order.',
  };
}

function rankQueries({ policy }: NormProject, { column, earlier, later }: Neighbours): readonly Asked[] {
  const higher = later.rows.filter((row, position) => {
    const before = earlier.rows[position];
    return before !== undefined && row.percentileRank - before.percentileRank > policy.rankReversal.value;
  });
  if (higher.length === 0) return [];
  return [
    {
      id: `reversal-ranks:${column}:${later.group.key}`,
      station: 'table',
      weight: 'should',
      group: later.group.key,
      lead: `At ${listed(higher.map(({ scoreText }) => scoreText))} the same score ranks higher in ${later.group.title} than in ${earlier.group.title}.`,
      why: `On the whole ${later.group.title} does better, so a score should rank lower there. ${policySays(policy, 'rankReversal')}`,
      whatToDo: 'Check the labels of both, smooth, or give the reason.',
    },
  ];
}

/** Groups next to one another along each column whose values are all different numbers, or begin with one. */
function neighboursIn(by: readonly string[], groups: readonly GroupNorms[]): readonly Neighbours[] {
  return by.flatMap((column, index) => {
    const numbers = new Map(
      groups.map(({ group }) => [group.values[index] ?? '', numberIn(group.values[index] ?? '')]),
    );
    if (new Set(numbers.values()).size < numbers.size || [...numbers.values()].includes(null)) return [];
    const others = ({ group }: GroupNorms): string => groupKey(group.values.with(index, ''));
    return [...new Set(groups.map(others))].flatMap((key) => {
      const alike = groups.filter((norms) => others(norms) === key);
      const place = ({ group }: GroupNorms): number => numbers.get(group.values[index] ?? '') ?? 0;
      const ordered = alike.toSorted((left, right) => place(left) - place(right));
      return ordered.slice(1).flatMap((later, position): readonly Neighbours[] => {
        const earlier = ordered[position];
        return earlier === undefined ? [] : [{ column, earlier, later }];
      });
    });
  });
}

/** The first number in a value of a grouping column: 4 of "4" and of "Grade 4"; null where there is none. */
function numberIn(value: string): number | null {
  const found = /\d+(?:\.\d+)?/.exec(value);
  return found === null ? null : Number(found[0]);
}
