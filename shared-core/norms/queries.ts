import { ratioToNumber } from '../percentile/exact-ratio.ts';
import { printCount, printNumber, printShare } from '../scores/printed-number.ts';
import { countedPeople, missingDocumentation } from './norm-groups.ts';
import { listed } from './listed.ts';
import type { NormProject } from './norm-project.ts';
import { clusterQueries, unusedClusterQueries } from './cluster-queries.ts';
import { smoothingQueries } from './smoothing-queries.ts';
import type { GroupNorms } from './group-norms.ts';

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

/** Below this many people a percentile rank can move by several points with other people drawn (common practice). */
const SMALL_GROUP = 200;
const TINY_GROUP = 30;
/** Share at an end of the scale from which scores there stop telling people apart (common practice). */
const CROWDED_END = 0.15;
/** Share of rows left out that asks for a second look (common practice). */
const MANY_LEFT_OUT = 0.05;
/** Percentile-rank points between neighbouring scores from which one mark more is a leap (common practice). */
const WIDE_STEP = 10;

/** All queries of a project, most pressing first, those with a reason given last. */
export function queriesOf(project: NormProject, groups: readonly GroupNorms[]): readonly Query[] {
  const asked = [
    ...cohortQueries(project),
    ...unusedClusterQueries(project),
    ...releaseQueries(project),
    ...titleQueries(groups),
    ...groups.flatMap((one) => groupQueries(project, one)),
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

function cohortQueries({ source, reading }: NormProject): readonly Asked[] {
  if (source === null) return [];
  const asked: Asked[] = [];
  const out = source.rowsRead - source.rowsKept;
  if (source.scaleInferred) {
    asked.push({
      id: 'scale-inferred',
      station: 'cohort',
      weight: 'must',
      group: null,
      lead: 'Is this the whole scale?',
      why: 'Its ends were taken from the scores that occur; a score that nobody obtained would have no row.',
      whatToDo: 'Declare the lowest and the highest attainable score.',
    });
  }
  if (source.rowsRead > 0 && out / source.rowsRead > MANY_LEFT_OUT) {
    asked.push({
      id: 'many-left-out',
      station: 'cohort',
      weight: 'should',
      group: null,
      lead: `${printShare(out / source.rowsRead)} of the rows are left out.`,
      why: 'If those left out differ from the others, every rank shifts.',
      whatToDo: 'Look at the rules of the exclusion flow and the rows they name.',
    });
  }
  if (reading?.decisions.duplicateId === 'keep-all' && reading.roles.some(({ role }) => role === 'id')) {
    asked.push({
      id: 'duplicates-kept',
      station: 'cohort',
      weight: 'should',
      group: null,
      lead: 'Repeated identifiers are kept.',
      why: 'A person who stands in the file twice counts twice.',
      whatToDo: 'Keep the first row of each, or give the reason for keeping all.',
    });
  }
  return asked;
}

function releaseQueries(project: NormProject): readonly Asked[] {
  const asked: Asked[] = [];
  const missing = missingDocumentation(project.groups.documentation);
  if (missing.length > 0) {
    asked.push({
      id: 'documentation',
      station: 'groups',
      weight: 'should',
      group: null,
      lead: 'Whom does the table speak of?',
      why: `Not told yet: ${missing.join('; ')}. Until then it is headed “sample”, not “norm group”.`,
      whatToDo: 'Describe the group at the Groups station.',
    });
  }
  if (project.release.date === '') {
    asked.push({
      id: 'edition-date',
      station: 'release',
      weight: 'should',
      group: null,
      lead: 'The edition has no date.',
      why: 'A reader cannot tell how old the table is.',
      whatToDo: 'Give the date of the edition.',
    });
  }
  if (project.sheet.cautions.trim() === '') {
    asked.push({
      id: 'no-cautions',
      station: 'sheet',
      weight: 'must',
      group: null,
      lead: 'The cautions are gone.',
      why: 'A table without them is read as per cent correct, averaged, and used alone.',
      whatToDo: 'Put cautions back, or give the reason for printing none.',
    });
  }
  return asked;
}

function titleQueries(groups: readonly GroupNorms[]): readonly Asked[] {
  const titles = groups.map(({ group }) => group.title);
  return [...new Set(titles.filter((title, index) => titles.indexOf(title) !== index))].map((title) => ({
    id: `same-title:${title}`,
    station: 'groups',
    weight: 'must',
    group: null,
    lead: `More than one table is called ${title}.`,
    why: 'A reader cannot tell which of them a person belongs to.',
    whatToDo: 'Give each a title of its own.',
  }));
}

function groupQueries(project: NormProject, norms: GroupNorms): readonly Asked[] {
  const { group, summary, rows } = norms;
  const asked: Asked[] = [];
  const add = (id: string, query: Omit<AskedOfGroup, 'id'>): void => {
    asked.push({ ...query, id: `${id}:${group.key}`, group: group.key });
  };
  for (const query of [...smoothingQueries(project, norms), ...clusterQueries(norms)]) add(query.id, query);
  const people = countedPeople(printCount(summary.n), project.people);
  if (summary.n < SMALL_GROUP) {
    add('small-group', {
      station: 'groups',
      weight: summary.n < TINY_GROUP ? 'must' : 'should',
      lead: `Only ${people} in ${group.title}.`,
      why: `One ${summary.n < TINY_GROUP ? 'alone' : 'of them'} is worth ${printNumber(100 / summary.n, 1)} points of percentile rank.`,
      whatToDo: 'Merge groups, gather more data, or say on the sheet how coarse the ranks are.',
    });
  }
  if (summary.effectiveN < summary.n / 2) {
    add('uneven-weights', {
      station: 'groups',
      weight: 'should',
      lead: `By their weights, the ${printCount(summary.n)} in ${group.title} count as ${printNumber(summary.effectiveN, 0)}.`,
      why: 'Very uneven weights let few people decide the ranks.',
      whatToDo: 'Check the largest weights in the file.',
    });
  }
  const best = project.tally?.scale.direction === 'low-is-good' ? 'lowest' : 'highest';
  for (const [share, end] of [
    [summary.shareAtLowest, 'lowest'],
    [summary.shareAtHighest, 'highest'],
  ] as const) {
    if (share <= CROWDED_END) continue;
    add(`crowded-${end}`, {
      station: 'table',
      weight: 'should',
      lead: `${printShare(share)} of ${group.title} stand at the ${end} score.`,
      why: `The test does not tell its ${end === best ? 'best' : 'poorest'} apart; ranks there are coarse.`,
      whatToDo: 'Say so in the notes of the sheet.',
    });
  }
  const leaps = rows.filter((row, index) => {
    const before = rows[index - 1];
    return before !== undefined && Math.abs(ratioToNumber(row.rank) - ratioToNumber(before.rank)) > WIDE_STEP;
  });
  if (leaps.length > 0) {
    add('wide-steps', {
      station: 'curve',
      weight: 'note',
      lead: `One mark is worth more than ${WIDE_STEP} points at ${listed(leaps.map((row) => row.scoreText))}.`,
      why: 'Neighbouring scores lie far apart in rank though they differ by one step.',
      whatToDo: 'Remind readers that a rank is not exact.',
    });
  }
  if (summary.unobserved.length > 0) {
    const texts = rows.filter((row) => row.count === 0).map((row) => row.scoreText);
    add('unobserved', {
      station: 'table',
      weight: 'note',
      lead: `Nobody in ${group.title} scored ${listed(texts)}.`,
      why: 'Their ranks follow from the neighbours by the definition; every attainable score has a row.',
      whatToDo: 'Nothing, if those scores can be obtained.',
    });
  }
  return asked;
}
