import { decimalOf, powerOfTen } from '../scale/decimal.ts';
import { attainableScores } from '../scale/score-scale.ts';
import {
  mirrorTable,
  peopleIn,
  tableFromCounts,
  weighsEqually,
  weightUnitsIn,
  type FrequencyTable,
} from '../tally/frequency-table.ts';
import { ratio, ratioToNumber, type ExactRatio } from './exact-ratio.ts';
import { scoresPerClass } from './percentile-rank.ts';

/**
 * How the score of a proportion is found: the nine sample quantiles of Hyndman & Fan (1996, The American Statistician
 * 50, 361–365) by their numbers, the nearest rank, interpolation within classes (`grouped`), and the inverse of the
 * midpoint rank, in which each score's people are spread evenly over half a step to either side.
 */
export const POINT_DEFINITIONS = [
  'type-1',
  'type-2',
  'type-3',
  'type-4',
  'type-5',
  'type-6',
  'type-7',
  'type-8',
  'type-9',
  'nearest-rank',
  'grouped',
  'inverse',
] as const;

export type PointDefinition = (typeof POINT_DEFINITIONS)[number];

/** The definitions in words, for print. */
export const POINT_DEFINITION_WORDS: Readonly<Record<PointDefinition, string>> = {
  'type-1': 'the lowest score that the proportion reaches (type 1)',
  'type-2': 'the lowest score that the proportion reaches, two neighbours averaged on a tie (type 2)',
  'type-3': 'the person nearest to np, the even one on a tie (type 3)',
  'type-4': 'interpolated at position np (type 4)',
  'type-5': 'interpolated at position np + 1/2 (type 5)',
  'type-6': 'interpolated at position (n + 1)p (type 6)',
  'type-7': 'interpolated at position (n − 1)p + 1 (type 7)',
  'type-8': 'interpolated at position (n + 1/3)p + 1/3 (type 8)',
  'type-9': 'interpolated at position (n + 1/4)p + 3/8 (type 9)',
  'nearest-rank': 'the person whose rank is np, rounded up',
  grouped: 'interpolated within score classes between exact limits',
  inverse: 'the score whose midpoint percentile rank is the percentage',
};

export interface PercentilePoint {
  /** 0–1. */
  readonly proportion: number;
  readonly definition: PointDefinition;
  /** In raw-score points; need not be attainable. */
  readonly score: number;
  /** True where nobody scored on a stretch of the scale and its middle was taken. */
  readonly flat: boolean;
}

/** Why a definition cannot be used on a table, in a sentence, or null. */
export function pointProblem(table: FrequencyTable, definition: PointDefinition, classWidth: number): string | null {
  if (peopleIn(table) === 0) return 'A group without people has no percentile points.';
  if (definition === 'grouped' && scoresPerClass(table.scale, classWidth) === null) {
    return `The class width must be a multiple of the scale's step, ${table.scale.step}.`;
  }
  if (needsPeople(definition) && !weighsEqually(table)) {
    return `${definition} counts people one by one; with weights use type-1, type-2, nearest-rank, grouped or inverse.`;
  }
  return null;
}

function needsPeople(definition: PointDefinition): boolean {
  return /^type-[3-9]$/.test(definition);
}

/**
 * The percentile point of a proportion (0–1, taken as the decimal it is written as, so 0.1 is one tenth).
 * `classWidth` in raw-score points serves `grouped` alone. Where low scores are good the proportion counts from the
 * high end. Throws where `pointProblem` has something to say.
 */
export function percentilePoint(
  table: FrequencyTable,
  proportion: number,
  definition: PointDefinition,
  classWidth: number,
): PercentilePoint {
  const problem = pointProblem(table, definition, classWidth);
  if (problem !== null) throw new RangeError(problem);
  if (!(proportion >= 0 && proportion <= 1)) throw new RangeError('a proportion lies between 0 and 1');
  const written = decimalOf(proportion);
  const share = ratio(written.units, powerOfTen(written.decimals));
  const counted = table.weighted && weighsEqually(table) ? tableFromCounts(table.scale, table.counts) : table;
  const found =
    table.scale.direction === 'high-is-good'
      ? pointOf(counted, attainableScores(table.scale), share, definition, classWidth)
      : mirrored(counted, share, definition, classWidth);
  return { proportion, definition, ...found };
}

interface Found {
  readonly score: number;
  readonly flat: boolean;
}

function mirrored(table: FrequencyTable, share: ExactRatio, definition: PointDefinition, classWidth: number): Found {
  const scores = attainableScores(table.scale)
    .map((score) => -score)
    .toReversed();
  const found = pointOf(mirrorTable(table), scores, share, definition, classWidth);
  return { ...found, score: -found.score };
}

function pointOf(
  table: FrequencyTable,
  scores: readonly number[],
  share: ExactRatio,
  definition: PointDefinition,
  classWidth: number,
): Found {
  switch (definition) {
    case 'inverse':
      return spreadPoint(table, scores, share, 1);
    case 'grouped':
      return spreadPoint(table, scores, share, scoresPerClass(table.scale, classWidth) ?? 1);
    case 'type-1':
    case 'nearest-rank':
      return { score: scores[reached(table, share).position] ?? NaN, flat: false };
    case 'type-2':
      return averagedPoint(table, scores, share);
    case 'type-3':
      return { score: personAt(table, scores, nearestEven(table, share)), flat: false };
    default:
      return {
        score: interpolated(table, scores, positionOf(BigInt(peopleIn(table)), share, definition)),
        flat: false,
      };
  }
}

/** The lowest position whose cumulative weight reaches the share, and whether it meets it exactly. */
function reached(table: FrequencyTable, share: ExactRatio): { position: number; exact: boolean } {
  const wanted = share.numerator * weightUnitsIn(table);
  let cumulative = 0n;
  for (let position = 0; position < table.weights.length; position += 1) {
    const weight = table.weights[position] ?? 0n;
    cumulative += weight;
    if (weight > 0n && cumulative * share.denominator >= wanted) {
      return { position, exact: cumulative * share.denominator === wanted };
    }
  }
  throw new RangeError('the share lies above 1');
}

function averagedPoint(table: FrequencyTable, scores: readonly number[], share: ExactRatio): Found {
  const { position, exact } = reached(table, share);
  const lower = scores[position] ?? NaN;
  if (!exact) return { score: lower, flat: false };
  const next = table.weights.findIndex((weight, index) => index > position && weight > 0n);
  return { score: next < 0 ? lower : (lower + (scores[next] ?? NaN)) / 2, flat: false };
}

/** Type 3: the person at np, rounded to the nearest, an exact half to the even person. */
function nearestEven(table: FrequencyTable, { numerator, denominator }: ExactRatio): bigint {
  const position = 2n * BigInt(peopleIn(table)) * numerator - denominator;
  if (position < 0n) return 1n;
  const whole = position / (2n * denominator);
  const onHalf = position % (2n * denominator) === 0n;
  return onHalf && whole % 2n === 0n ? whole : whole + 1n;
}

/** The position, counted from 1, that types 4 to 9 interpolate at. */
function positionOf(people: bigint, share: ExactRatio, definition: PointDefinition): ExactRatio {
  const { numerator: p, denominator: q } = share;
  switch (definition) {
    case 'type-4':
      return ratio(people * p, q);
    case 'type-5':
      return ratio(2n * people * p + q, 2n * q);
    case 'type-6':
      return ratio((people + 1n) * p, q);
    case 'type-7':
      return ratio((people - 1n) * p + q, q);
    case 'type-8':
      return ratio((3n * people + 1n) * p + q, 3n * q);
    case 'type-9':
      return ratio((8n * people + 2n) * p + 3n * q, 8n * q);
    default:
      throw new RangeError(`${definition} does not interpolate between people`);
  }
}

function interpolated(table: FrequencyTable, scores: readonly number[], position: ExactRatio): number {
  const whole = position.numerator / position.denominator;
  const part = ratioToNumber(ratio(position.numerator % position.denominator, position.denominator));
  const lower = personAt(table, scores, whole);
  return part === 0 ? lower : lower + part * (personAt(table, scores, whole + 1n) - lower);
}

/** The score of the person at a rank counted from 1, the first or last person beyond the ends. */
export function personAt(table: FrequencyTable, scores: readonly number[], rank: bigint): number {
  const people = BigInt(peopleIn(table));
  let left = rank < 1n ? 1n : rank > people ? people : rank;
  for (let position = 0; position < table.counts.length; position += 1) {
    left -= BigInt(table.counts[position] ?? 0);
    if (left <= 0n) return scores[position] ?? NaN;
  }
  throw new RangeError('no person at that rank');
}

/**
 * L + h (pW − B)/w in classes of `perClass` scores spread evenly between exact limits. At 0 and 1 the outer limits of
 * the observed classes; on a flat stretch its middle.
 */
function spreadPoint(table: FrequencyTable, scores: readonly number[], share: ExactRatio, perClass: number): Found {
  const { step } = table.scale;
  const classes: bigint[] = [];
  for (let start = 0; start < table.weights.length; start += perClass) {
    classes.push(table.weights.slice(start, start + perClass).reduce((sum, weight) => sum + weight, 0n));
  }
  const width = step * perClass;
  const lowest = (scores[0] ?? NaN) - step / 2;
  const wanted = share.numerator * weightUnitsIn(table);
  let below = 0n;
  for (let index = 0; index < classes.length; index += 1) {
    const inClass = classes[index] ?? 0n;
    if (inClass > 0n && (below + inClass) * share.denominator >= wanted) {
      const lower = lowest + index * width;
      const into = ratioToNumber(ratio(wanted - below * share.denominator, inClass * share.denominator));
      if (into < 1) return { score: lower + width * into, flat: false };
      const next = classes.findIndex((weight, other) => other > index && weight > 0n);
      const flat = next > index + 1;
      return { score: flat ? lowest + (width * (index + 1 + next)) / 2 : lower + width, flat };
    }
    below += inClass;
  }
  throw new RangeError('the share lies above 1');
}
