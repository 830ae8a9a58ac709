import { countedRanks, scoresInClass, type CountedRank } from './counted-ranks.ts';
import { rankText } from './counted-texts.ts';
import { withPoint, type Fraction } from './fraction.ts';
import { groupCounts, type GroupCounts } from './group-counts.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormSet } from '../norms/norm-set.ts';

const DECIMALS_SHOWN = 4;

/**
 * How a stranger redoes the percentile rank of one row by hand: sentences with the numbers, counted from the tally.
 * `group` is the position of the group in the set, `score` a raw score of its table. Throws where there is no such row.
 */
export function recipeOf(normSet: NormSet, group: number, score: number): readonly string[] {
  const { project } = normSet;
  const norms = normSet.groups[group];
  const place = norms?.rows.findIndex((row) => row.score === score) ?? -1;
  const row = norms?.rows[place];
  if (norms === undefined || row === undefined || project.tally === null) throw new RangeError('no such row');
  const counts = groupCounts(project.tally, project.groups.by, norms.group.values);
  const counted = countedRanks(counts, project.tally.scale, project.curve.definition)[place];
  if (counted === undefined) throw new RangeError('no such score');
  const redone = rankText(counted.rank, project.table);
  return [
    ...countingSentences(normSet, norms, counts, row.scoreText, counted),
    ...rankSentences(normSet, norms, counts, place, counted),
    `${roundingSentence(normSet, counted.rank)} That gives ${redone}.`,
    norms.smoothing.state === 'smoothed'
      ? `The table prints ${row.printed}: its ranks are smoothed, and smoothing cannot be redone by hand.`
      : `The table prints ${row.printed}${row.adjusted === null ? '' : `: it was adjusted by hand from ${row.adjusted.from}`}.`,
  ];
}

/** The row that is shown: the score that most people obtained, the lowest of several. Throws on a group without rows. */
export function recipeScore({ rows }: GroupNorms): number {
  const most = Math.max(...rows.map(({ count }) => count));
  const row = rows.find(({ count }) => count === most);
  if (row === undefined) throw new RangeError('a table without rows');
  return row.score;
}

function countingSentences(
  { project }: NormSet,
  { group }: GroupNorms,
  counts: GroupCounts,
  scoreText: string,
  { worse, at }: CountedRank,
): readonly string[] {
  const side = project.tally?.scale.direction === 'low-is-good' ? 'higher' : 'lower';
  const weight = (units: bigint): string => exactly({ top: units, bottom: counts.unit });
  const people = sum(counts.people);
  if (project.tally?.weightDecimals === null) {
    return [
      `Take the ${people} ${project.people} of ${group.title} and the raw score ${scoreText}.`,
      `Count those with a ${side} score: ${worse}. Count those with this score: ${at}.`,
    ];
  }
  return [
    `Take the ${people} ${project.people} of ${group.title}, whose weights add up to ${weight(sum(counts.weights))}, and the raw score ${scoreText}.`,
    `Add up the weights of those with a ${side} score: ${weight(worse)}; and of those with this score: ${weight(at)}.`,
  ];
}

function rankSentences(
  { project }: NormSet,
  { rows }: GroupNorms,
  counts: GroupCounts,
  place: number,
  { worse, at, rank }: CountedRank,
): readonly string[] {
  const { definition } = project.curve;
  const all = exactly({ top: sum(counts.weights), bottom: counts.unit });
  const weight = (units: bigint): string => exactly({ top: units, bottom: counts.unit });
  const divided = ended(`Divide by ${all} and multiply by 100: ${decimalText(rank)}`);
  switch (definition.kind) {
    case 'midpoint':
      return [
        `Add half of the second number to the first: ${exactly({ top: 2n * worse + at, bottom: 2n * counts.unit })}.`,
        divided,
      ];
    case 'at-or-below':
      return [`Add both numbers: ${weight(worse + at)}.`, divided];
    case 'below':
      return [`Keep the first number only: ${weight(worse)}.`, divided];
    case 'plotting-position': {
      const people = sum(counts.people);
      const total = sum(counts.weights);
      const meanRank: Fraction = { top: people * (2n * worse + at) + total, bottom: 2n * total };
      const scaled = counts.people === counts.weights ? '' : `, multiply by ${people}/${all}`;
      return [
        ended(
          `Add half of the second number to the first${scaled} and add 1/2: the mean rank r is ${decimalText(meanRank)}`,
        ),
        `With a = ${definition.offset}, 100 (r − a)/(${people} + 1 − 2a) is ${decimalText(rank)} (held between 0 and 100).`,
      ];
    }
    case 'grouped': {
      const length = rows.length;
      const size = scoresInClass(definition.width, project.tally?.scale.step ?? 1);
      const mirrored = project.tally?.scale.direction === 'low-is-good';
      const fromPoor = mirrored ? length - 1 - place : place;
      const first = fromPoor - (fromPoor % size);
      const poorFirst = mirrored ? counts.weights.toReversed() : counts.weights;
      const [below, within] = [sum(poorFirst.slice(0, first)), sum(poorFirst.slice(first, first + size))];
      return [
        `Classes of ${size} scores are laid from the poor end of the scale; this score is number ${fromPoor - first + 1} ` +
          `in its class, and its middle lies ${2 * (fromPoor - first) + 1}/${2 * size} of the way through it.`,
        `In poorer classes stand ${weight(below)}, in this class ${weight(within)}: add that part of the second to the first.`,
        divided,
      ];
    }
  }
}

function roundingSentence({ project }: NormSet, rank: Fraction): string {
  const { decimals, rounding, ends } = project.table;
  const unit = decimals === 0 ? 'a whole number' : 'one decimal';
  const half = rounding === 'half-up' ? 'upwards' : 'to the even digit';
  const least = withPoint(1n, decimals);
  const most = withPoint(decimals === 0 ? 99n : 999n, decimals);
  const printed = rankText(rank, project.table);
  if (ends === 'signs' && /^[<>]/.test(printed))
    return `Below ${least} prints as <${least}, above ${most} as >${most}.`;
  return `Round to ${unit}, a half ${half}${ends === 'held' ? `, held between ${least} and ${most}` : ''}.`;
}

function sum(numbers: readonly bigint[]): bigint {
  return numbers.reduce((total, each) => total + each, 0n);
}

/** A fraction whose decimals end, in full: 740.5. */
function exactly({ top, bottom }: Fraction): string {
  let [units, decimals] = [top, 0];
  while (units % bottom !== 0n && decimals < 60) {
    units *= 10n;
    decimals += 1;
  }
  return withPoint(units / bottom, decimals);
}

function ended(sentence: string): string {
  return sentence.endsWith('…') ? sentence : `${sentence}.`;
}

/** The first decimals, cut off, with dots where more would follow. */
function decimalText({ top, bottom }: Fraction): string {
  const scaled = top * 10n ** BigInt(DECIMALS_SHOWN);
  const text = withPoint(scaled / bottom, DECIMALS_SHOWN);
  return scaled % bottom === 0n ? text.replace(/\.?0+$/, '') : `${text}…`;
}
