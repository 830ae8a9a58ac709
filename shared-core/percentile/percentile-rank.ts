import { decimalOf, parseDecimal, powerOfTen } from '../scale/decimal.ts';
import type { ScoreScale } from '../scale/score-scale.ts';
import { mirrorTable, peopleIn, weightUnitsIn, type FrequencyTable } from '../tally/frequency-table.ts';
import { compareToWhole, ratio, type ExactRatio } from './exact-ratio.ts';

/**
 * What a percentile rank means here. `midpoint`, `at-or-below` and `below` stand side by side in the Standards for
 * Educational and Psychological Testing and in Crawford, Garthwaite & Slick (2009, The Clinical Neuropsychologist 23,
 * 1173–1195). `plotting-position` uses the mean rank r of tied scores: 100 (r − a)/(N + 1 − 2a), with a = 1/2 Hazen,
 * 3/8 Blom (1958), 1/3 Tukey (1962), 0 Weibull. `grouped` interpolates within classes of `width` points between exact
 * limits, half a step beyond the apparent ones (Gravetter & Wallnau, Statistics for the Behavioral Sciences, ch. 2).
 */
export type RankDefinition =
  | { readonly kind: 'midpoint' }
  | { readonly kind: 'at-or-below' }
  | { readonly kind: 'below' }
  | { readonly kind: 'plotting-position'; /** "0.375" or "3/8", from 0 to below 1 */ readonly offset: string }
  | { readonly kind: 'grouped'; /** class width in raw-score points */ readonly width: number };

/** Counts or weight units below and at a score, of all: what a rank is made of. Seen from the poor end of the scale. */
export interface RankParts {
  readonly below: bigint;
  readonly at: bigint;
  readonly all: bigint;
}

/** The offset a of a plotting position as a ratio, or null when the text is not a number from 0 to below 1. */
export function parseOffset(text: string): ExactRatio | null {
  const fraction = /^(\d{1,6})\/(\d{1,6})$/.exec(text.trim());
  let value: ExactRatio;
  if (fraction !== null) {
    const denominator = BigInt(fraction[2] ?? '0');
    if (denominator === 0n) return null;
    value = ratio(BigInt(fraction[1] ?? '0'), denominator);
  } else {
    if (!/^\d*\.?\d{1,12}$/.test(text.trim())) return null;
    const decimal = parseDecimal(text);
    if (decimal === null) return null;
    value = ratio(decimal.units, powerOfTen(decimal.decimals));
  }
  return value.numerator < value.denominator ? value : null;
}

/** Attainable scores in one class of a grouped definition, or null when the width is not a multiple of the step. */
export function scoresPerClass(scale: ScoreScale, width: number): number | null {
  if (!Number.isFinite(width) || width <= 0) return null;
  const [a, b] = [decimalOf(width), decimalOf(scale.step)];
  const decimals = Math.max(a.decimals, b.decimals);
  const widthUnits = a.units * powerOfTen(decimals - a.decimals);
  const stepUnits = b.units * powerOfTen(decimals - b.decimals);
  return widthUnits % stepUnits === 0n ? Number(widthUnits / stepUnits) : null;
}

/** Why a definition cannot be used on a scale, in a sentence, or null. */
export function definitionProblem(scale: ScoreScale, definition: RankDefinition): string | null {
  if (definition.kind === 'plotting-position' && parseOffset(definition.offset) === null) {
    return 'The offset of a plotting position is a number from 0 to below 1, such as 0.375 or 3/8.';
  }
  if (definition.kind === 'grouped' && scoresPerClass(scale, definition.width) === null) {
    return `The class width must be a multiple of the scale's step, ${scale.step}.`;
  }
  return null;
}

/** The table seen from its poor end: as it is where high is good, mirrored where low is good. */
function fromPoorEnd(table: FrequencyTable): FrequencyTable {
  return table.scale.direction === 'high-is-good' ? table : mirrorTable(table);
}

function inScoreOrder<T>(table: FrequencyTable, values: readonly T[]): readonly T[] {
  return table.scale.direction === 'high-is-good' ? values : values.toReversed();
}

/** For each attainable score, lowest first, the weight units of those who did worse, those at it, and all. */
export function rankParts(table: FrequencyTable): readonly RankParts[] {
  const all = weightUnitsIn(table);
  let below = 0n;
  const parts = fromPoorEnd(table).weights.map((at) => {
    const part = { below, at, all };
    below += at;
    return part;
  });
  return inScoreOrder(table, parts);
}

/**
 * The exact percentile rank, 0–100, of every attainable score, lowest score first. Where low scores are good,
 * "below" reads "did worse". With weights, plotting positions are taken on weights rescaled to sum to N; they are held
 * at 0 and 100.
 * Throws on an empty table or an unusable definition; ask `definitionProblem` first.
 */
export function percentileRanks(table: FrequencyTable, definition: RankDefinition): readonly ExactRatio[] {
  const problem = definitionProblem(table.scale, definition);
  if (problem !== null) throw new RangeError(problem);
  if (weightUnitsIn(table) === 0n) throw new RangeError('a table without people has no ranks');
  const parts = rankParts(table);
  switch (definition.kind) {
    case 'midpoint':
      return parts.map(({ below, at, all }) => ratio(100n * (2n * below + at), 2n * all));
    case 'at-or-below':
      return parts.map(({ below, at, all }) => ratio(100n * (below + at), all));
    case 'below':
      return parts.map(({ below, all }) => ratio(100n * below, all));
    case 'plotting-position':
      return plottingPositions(parts, BigInt(peopleIn(table)), definition.offset);
    case 'grouped':
      return inScoreOrder(table, groupedRanks(fromPoorEnd(table), definition.width));
  }
}

function plottingPositions(parts: readonly RankParts[], people: bigint, offset: string): readonly ExactRatio[] {
  const a = parseOffset(offset);
  if (a === null) throw new RangeError('unusable offset');
  // r = (2B + w)N/(2W) + 1/2; both sides of (r − a)/(N + 1 − 2a) are brought over 2W·a.denominator.
  const divisor = (people + 1n) * a.denominator - 2n * a.numerator;
  return parts.map(({ below, at, all }) => {
    const twiceRank = (2n * below + at) * people + all;
    return held(ratio(100n * (twiceRank * a.denominator - 2n * all * a.numerator), 2n * all * divisor));
  });
}

/** Held at 0 and 100, which offsets above 1/2 would pass where nobody, or little weight, lies at an end. */
function held(rank: ExactRatio): ExactRatio {
  if (compareToWhole(rank, 0n) < 0) return ratio(0n, 1n);
  return compareToWhole(rank, 100n) > 0 ? ratio(100n, 1n) : rank;
}

function groupedRanks(table: FrequencyTable, width: number): readonly ExactRatio[] {
  const perClass = scoresPerClass(table.scale, width);
  if (perClass === null) throw new RangeError('unusable width');
  const all = weightUnitsIn(table);
  const size = BigInt(perClass);
  const ranks: ExactRatio[] = [];
  let below = 0n;
  for (let start = 0; start < table.weights.length; start += perClass) {
    const members = table.weights.slice(start, start + perClass);
    const inClass = members.reduce((sum, weight) => sum + weight, 0n);
    members.forEach((_, index) => {
      const twiceHeight = BigInt(2 * index + 1);
      ranks.push(ratio(100n * (2n * size * below + inClass * twiceHeight), 2n * size * all));
    });
    below += inClass;
  }
  return ranks;
}
