import { ratioToNumber } from '../percentile/exact-ratio.ts';
import { printCount, printNumber, printShare } from '../scores/printed-number.ts';
import { clusterQueries } from './cluster-queries.ts';
import { rangeRowQueries } from './cut-queries.ts';
import { derivedQueries } from './derived-queries.ts';
import type { GroupNorms } from './group-norms.ts';
import { listed } from './listed.ts';
import { countedPeople } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';
import { policySays } from './policy.ts';
import type { AskedOfGroup } from './queries.ts';
import { smoothingQueries } from './smoothing-queries.ts';

/** What a proof-reader would ask of one group's numbers. */
export function groupQueries(project: NormProject, norms: GroupNorms): readonly AskedOfGroup[] {
  return [
    ...smoothingQueries(project, norms),
    ...clusterQueries(norms),
    ...sizeQueries(project, norms),
    ...endQueries(project, norms),
    ...gapQueries(project, norms),
    ...cellQueries(project, norms),
    ...stepQueries(project, norms),
    ...unobservedQueries(norms),
    ...derivedQueries(project, norms),
    ...rangeRowQueries(project, norms),
  ];
}

function sizeQueries({ policy, people }: NormProject, { group, summary }: GroupNorms): readonly AskedOfGroup[] {
  const asked: AskedOfGroup[] = [];
  const tiny = summary.n < policy.smallestMust.value;
  if (tiny || summary.n < policy.smallestShould.value) {
    asked.push({
      id: 'small-group',
      station: 'groups',
      weight: tiny ? 'must' : 'should',
      lead: `Only ${countedPeople(printCount(summary.n), people)} in ${group.title}.`,
      why:
        `One ${tiny ? 'alone' : 'of them'} is worth ${printNumber(100 / summary.n, 1)} points of percentile rank. ` +
        policySays(policy, tiny ? 'smallestMust' : 'smallestShould'),
      whatToDo: 'Merge groups, gather more data, or say on the sheet how coarse the ranks are.',
    });
  }
  if (summary.effectiveN < summary.n * policy.leastEffective.value) {
    asked.push({
      id: 'uneven-weights',
      station: 'groups',
      weight: 'should',
      lead: `By their weights, the ${printCount(summary.n)} in ${group.title} count as ${printNumber(summary.effectiveN, 0)}.`,
      why: `Very uneven weights let few people decide the ranks. ${policySays(policy, 'leastEffective')}`,
      whatToDo: 'Check the largest weights in the file.',
    });
  }
  return asked;
}

function endQueries({ policy, tally }: NormProject, { group, summary }: GroupNorms): readonly AskedOfGroup[] {
  const best = tally?.scale.direction === 'low-is-good' ? 'lowest' : 'highest';
  const ends = [
    [summary.shareAtLowest, 'lowest'],
    [summary.shareAtHighest, 'highest'],
  ] as const;
  return ends
    .filter(([share]) => share > policy.crowdedEnd.value)
    .map(([share, end]) => ({
      id: `crowded-${end}`,
      station: 'table',
      weight: 'should',
      lead: `${printShare(share)} of ${group.title} stand at the ${end} score.`,
      why: `The test does not tell its ${end === best ? 'best' : 'poorest'} apart; ranks there are coarse. ${policySays(policy, 'crowdedEnd')}`,
      whatToDo: 'Say so in the notes of the sheet.',
    }));
}

/** Runs of scores that nobody obtained, between two that enough people did. */
function gapQueries({ policy }: NormProject, { group, rows }: GroupNorms): readonly AskedOfGroup[] {
  const obtained = rows.flatMap(({ count }, position) => (count > 0 ? [position] : []));
  const gaps = obtained.flatMap((position, index) => {
    const before = obtained[index - 1] ?? position - 1;
    if (position - before - 1 <= policy.longestGap.value) return [];
    const beside = Math.min(rows[before]?.count ?? 0, rows[position]?.count ?? 0);
    if (beside < policy.gapNeighbours.value) return [];
    return [`${rows[before + 1]?.scoreText ?? ''} to ${rows[position - 1]?.scoreText ?? ''}`];
  });
  if (gaps.length === 0) return [];
  return [
    {
      id: 'gap',
      station: 'table',
      weight: 'should',
      lead: `Nobody in ${group.title} stands from ${listed(gaps)}, though others do on both sides.`,
      why: `Such a gap may come from a wrong key, a wrong scale or scores that cannot be obtained. ${policySays(policy, 'longestGap')}`,
      whatToDo: 'Look at the scores in the file, or give the reason for the gap.',
    },
  ];
}

function cellQueries({ policy, table, people }: NormProject, { group, rows }: GroupNorms): readonly AskedOfGroup[] {
  const small = rows.filter(({ count }) => count > 0 && count < policy.smallestCell.value);
  if (!table.columns.includes('count') || small.length === 0) return [];
  return [
    {
      id: 'small-cells',
      station: 'table',
      weight: 'should',
      lead: `The printed counts of ${group.title} tell of fewer than ${policy.smallestCell.value} ${people} at ${listed(small.map(({ scoreText }) => scoreText))}.`,
      why: `Who knows the group may recognise a person in so small a count. ${policySays(policy, 'smallestCell')}`,
      whatToDo: 'Leave the column of counts out; csv and norm set hold all counts, so think of who gets those.',
    },
  ];
}

function stepQueries({ policy }: NormProject, { rows }: GroupNorms): readonly AskedOfGroup[] {
  const leaps = rows.filter((row, index) => {
    const before = rows[index - 1];
    return (
      before !== undefined && Math.abs(ratioToNumber(row.rank) - ratioToNumber(before.rank)) > policy.wideStep.value
    );
  });
  if (leaps.length === 0) return [];
  return [
    {
      id: 'wide-steps',
      station: 'curve',
      weight: 'note',
      lead: `One mark is worth more than ${policy.wideStep.value} points at ${listed(leaps.map((row) => row.scoreText))}.`,
      why: `Neighbouring scores lie far apart in rank though they differ by one step. ${policySays(policy, 'wideStep')}`,
      whatToDo: 'Remind readers that a rank is not exact.',
    },
  ];
}

function unobservedQueries({ group, summary, rows }: GroupNorms): readonly AskedOfGroup[] {
  if (summary.unobserved.length === 0) return [];
  return [
    {
      id: 'unobserved',
      station: 'table',
      weight: 'note',
      lead: `Nobody in ${group.title} scored ${listed(rows.filter(({ count }) => count === 0).map((row) => row.scoreText))}.`,
      why: 'Their ranks follow from the neighbours by the definition; every attainable score has a row.',
      whatToDo: 'Nothing, if those scores can be obtained.',
    },
  ];
}
