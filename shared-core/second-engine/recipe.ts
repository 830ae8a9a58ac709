import { countedRanks, scoresInClass, type CountedRank } from './counted-ranks.ts';
import { rankText } from './counted-texts.ts';
import { withPoint, type Fraction } from './fraction.ts';
import { groupCounts, type GroupCounts } from './group-counts.ts';
import { ENGLISH_WORDS, figure, say, sayCounted, type PrintWords } from '../languages/phrases.ts';
import type { ConversionRow } from '../norms/conversion-table.ts';
import type { GroupNorms } from '../norms/group-norms.ts';
import type { NormProject } from '../norms/norm-project.ts';
import type { NormSet } from '../norms/norm-set.ts';

const DECIMALS_SHOWN = 4;

/**
 * How a stranger redoes the percentile rank of one row by hand: sentences with the numbers, counted from the tally.
 * `group` is the position of the group in the set, `score` a raw score of its table, `title` what the group is called in
 * print. Throws where there is no such row.
 */
export function recipeOf(
  normSet: NormSet,
  group: number,
  score: number,
  words = ENGLISH_WORDS,
  title = normSet.groups[group]?.group.title ?? '',
): readonly string[] {
  const { project } = normSet;
  const norms = normSet.groups[group];
  const place = norms?.rows.findIndex((row) => row.score === score) ?? -1;
  const row = norms?.rows[place];
  if (norms === undefined || row === undefined || project.tally === null) throw new RangeError('no such row');
  const counts = groupCounts(project.tally, project.groups.by, norms.group.values);
  const counted = countedRanks(counts, project.tally.scale, project.curve.definition)[place];
  if (counted === undefined) throw new RangeError('no such score');
  return [
    ...countingSentences(project, words, counts, counted, { title, scoreText: row.scoreText }),
    ...rankSentences(project, norms, words, counts, place, counted),
    say(words, 'recipe.gives', {
      rounding: roundingSentence(project, counted.rank, words),
      rank: figure(words, rankText(counted.rank, project.table)),
    }),
    printedSentence(norms, row, words),
  ];
}

function printedSentence({ smoothing }: GroupNorms, row: ConversionRow, words: PrintWords): string {
  const rank = figure(words, row.printed);
  if (smoothing.state === 'smoothed') return say(words, 'recipe.prints-smoothed', { rank });
  if (row.adjusted === null) return say(words, 'recipe.prints', { rank });
  return say(words, 'recipe.prints-adjusted', { rank, from: figure(words, row.adjusted.from) });
}

/** The row that is shown: the score that most people obtained, the lowest of several. Throws on a group without rows. */
export function recipeScore({ rows }: GroupNorms): number {
  const most = Math.max(...rows.map(({ count }) => count));
  const row = rows.find(({ count }) => count === most);
  if (row === undefined) throw new RangeError('a table without rows');
  return row.score;
}

function countingSentences(
  project: NormProject,
  words: PrintWords,
  counts: GroupCounts,
  { worse, at }: CountedRank,
  { title: group, scoreText }: { readonly title: string; readonly scoreText: string },
): readonly string[] {
  const side = project.tally?.scale.direction === 'low-is-good' ? 'higher' : 'lower';
  const weight = (units: bigint): string => figure(words, exactly({ top: units, bottom: counts.unit }));
  const count = String(sum(counts.people));
  const people = sayCounted(words, `counted.${project.people}`, count, { count });
  const score = figure(words, scoreText);
  const told = { worse: weight(worse), same: weight(at) };
  return project.tally?.weightDecimals === null
    ? [say(words, 'recipe.take', { people, group, score }), say(words, `recipe.count-${side}`, told)]
    : [
        say(words, 'recipe.take-weighted', { people, group, score, weight: weight(sum(counts.weights)) }),
        say(words, `recipe.weigh-${side}`, told),
      ];
}

function rankSentences(
  project: NormProject,
  { rows }: GroupNorms,
  words: PrintWords,
  counts: GroupCounts,
  place: number,
  { worse, at, rank }: CountedRank,
): readonly string[] {
  const { definition } = project.curve;
  const exact = (number: Fraction): string => figure(words, exactly(number));
  const weight = (units: bigint): string => exact({ top: units, bottom: counts.unit });
  const all = weight(sum(counts.weights));
  const printed = figure(words, decimalText(rank));
  const divided = ended(say(words, 'recipe.divide', { all, rank: printed }));
  switch (definition.kind) {
    case 'midpoint':
      return [
        say(words, 'recipe.add-half', { sum: exact({ top: 2n * worse + at, bottom: 2n * counts.unit }) }),
        divided,
      ];
    case 'at-or-below':
      return [say(words, 'recipe.add-both', { sum: weight(worse + at) }), divided];
    case 'below':
      return [say(words, 'recipe.keep-first', { sum: weight(worse) }), divided];
    case 'plotting-position': {
      const people = sum(counts.people);
      const total = sum(counts.weights);
      const meanRank: Fraction = { top: people * (2n * worse + at) + total, bottom: 2n * total };
      const mean = figure(words, decimalText(meanRank));
      return [
        ended(
          counts.people === counts.weights
            ? say(words, 'recipe.mean-rank', { mean })
            : say(words, 'recipe.mean-rank-scaled', { mean, factor: `${people}/${all}` }),
        ),
        say(words, 'recipe.plotting-position', {
          offset: figure(words, definition.offset),
          count: String(people),
          rank: printed,
        }),
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
        say(words, 'recipe.classes', {
          size: String(size),
          number: String(fromPoor - first + 1),
          part: `${2 * (fromPoor - first) + 1}/${2 * size}`,
        }),
        say(words, 'recipe.in-classes', { poorer: weight(below), own: weight(within) }),
        divided,
      ];
    }
  }
}

function roundingSentence({ table }: NormProject, rank: Fraction, words: PrintWords): string {
  const { decimals, rounding, ends } = table;
  const [least, most] = [withPoint(1n, decimals), withPoint(decimals === 0 ? 99n : 999n, decimals)];
  const told = { least: figure(words, least), most: figure(words, most) };
  if (ends === 'signs' && /^[<>]/.test(rankText(rank, table))) {
    return say(words, 'recipe.ends', { ...told, low: figure(words, `<${least}`), high: figure(words, `>${most}`) });
  }
  return say(words, 'recipe.round', {
    unit: say(words, decimals === 0 ? 'recipe.whole-number' : 'recipe.one-decimal'),
    half: say(words, `recipe.${rounding}`),
    held: ends === 'held' ? say(words, 'recipe.held', told) : '',
  });
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

/** Dots that stand for further decimals close a sentence as well. */
function ended(sentence: string): string {
  return sentence.replace(/…\.$/, '…');
}

/** The first decimals, cut off, with dots where more would follow. */
function decimalText({ top, bottom }: Fraction): string {
  const scaled = top * 10n ** BigInt(DECIMALS_SHOWN);
  const text = withPoint(scaled / bottom, DECIMALS_SHOWN);
  return scaled % bottom === 0n ? text.replace(/\.?0+$/, '') : `${text}…`;
}
