import { ratio, type ExactRatio } from '../percentile/exact-ratio.ts';
import { definitionProblem, percentileRanks, rankParts, type RankDefinition } from '../percentile/percentile-rank.ts';
import { peopleIn, tableFromCounts, weighsEqually, type FrequencyTable } from '../tally/frequency-table.ts';
import { definitionInWords } from './definitions.ts';
import type { Direction } from '../scale/score-scale.ts';

/**
 * How somebody may have made ranks. `percent-rank` is the function of spreadsheets: with B people below a score,
 * `inclusive` B/(N − 1) and `exclusive` (B + 1)/(N + 1), a straight line between the values of the neighbouring observed
 * scores where nobody has the score, nothing beyond them; as a spreadsheet returns it, cut (not rounded) to three digits
 * of the proportion.
 */
export type Convention =
  | { readonly kind: 'definition'; readonly definition: RankDefinition }
  | { readonly kind: 'percent-rank'; readonly ends: 'inclusive' | 'exclusive'; readonly cutToThreeDigits: boolean };

/** A convention as it was applied: from which end of the scale, and with or without the group's weights. */
export interface AppliedConvention {
  readonly convention: Convention;
  /** True where they counted from the other end than this table does. */
  readonly reversed: boolean;
  /** True where the group has weights and they counted everybody as one. */
  readonly weightsIgnored: boolean;
}

export interface ConventionRanks {
  readonly applied: AppliedConvention;
  /** Percentile rank 0–100 of each attainable score, lowest first; null where the convention gives none. */
  readonly ranks: readonly (ExactRatio | null)[];
}

/** 1/2 (Hazen) is the midpoint rank and stands there. */
const OFFSETS = ['0', '3/8', '1/3', '0.3', '0.4', '0.44'] as const;
const STEPS_PER_CLASS = [2, 3, 4, 5, 10] as const;

/** The ranks of a table by every convention, the more usual first: as the table is, without weights, and from the other end. */
export function ranksByConvention(table: FrequencyTable): readonly ConventionRanks[] {
  const weighings = weighsEqually(table) ? [false] : [false, true];
  return [false, true].flatMap((reversed) =>
    weighings.flatMap((weightsIgnored) => {
      const scale = { ...table.scale, direction: reversed ? otherEnd(table.scale.direction) : table.scale.direction };
      const seen = weightsIgnored ? tableFromCounts(scale, table.counts) : { ...table, scale };
      return conventionsOn(table).map((convention) => ({
        applied: { convention, reversed, weightsIgnored },
        ranks: ranksOf(seen, convention),
      }));
    }),
  );
}

/** The convention in the middle of a sentence that begins "the share of the group …". */
export function conventionInWords(
  { convention, reversed, weightsIgnored }: AppliedConvention,
  direction: Direction,
): string {
  const seen = reversed ? otherEnd(direction) : direction;
  return `${basisInWords(convention, seen)}${weightsIgnored ? ', everybody counted as one, without weights' : ''}`;
}

function basisInWords(convention: Convention, direction: Direction): string {
  if (convention.kind === 'definition') return `scoring ${definitionInWords(convention.definition, direction)}`;
  const worse = direction === 'high-is-good' ? 'below' : 'above';
  const formula =
    convention.ends === 'inclusive'
      ? `people ${worse} the score, divided by N − 1 (a spreadsheet's inclusive percent rank)`
      : `people ${worse} the score and one more, divided by N + 1 (a spreadsheet's exclusive percent rank)`;
  return convention.cutToThreeDigits ? `${formula}, cut to three digits` : formula;
}

function otherEnd(direction: Direction): Direction {
  return direction === 'high-is-good' ? 'low-is-good' : 'high-is-good';
}

function conventionsOn({ scale, counts }: FrequencyTable): readonly Convention[] {
  const definitions: readonly RankDefinition[] = [
    ...OFFSETS.map((offset) => ({ kind: 'plotting-position' as const, offset })),
    ...STEPS_PER_CLASS.filter((steps) => steps < counts.length).map((steps) => ({
      kind: 'grouped' as const,
      width: Number((steps * scale.step).toPrecision(12)),
    })),
  ];
  const usable = definitions.filter((definition) => definitionProblem(scale, definition) === null);
  return [
    ...(['midpoint', 'at-or-below', 'below'] as const).map((kind) => ({
      kind: 'definition' as const,
      definition: { kind },
    })),
    ...[true, false].flatMap((cutToThreeDigits) =>
      (['inclusive', 'exclusive'] as const).map((ends) => ({ kind: 'percent-rank' as const, ends, cutToThreeDigits })),
    ),
    ...usable.map((definition) => ({ kind: 'definition' as const, definition })),
  ];
}

function ranksOf(table: FrequencyTable, convention: Convention): readonly (ExactRatio | null)[] {
  if (convention.kind === 'definition') return percentileRanks(table, convention.definition);
  // Spreadsheets know no weights.
  const people = tableFromCounts(table.scale, table.counts);
  const ranks = percentRanks(people, convention.ends);
  return convention.cutToThreeDigits ? ranks.map((rank) => (rank === null ? null : cutToTenths(rank))) : ranks;
}

function percentRanks(people: FrequencyTable, ends: 'inclusive' | 'exclusive'): readonly (ExactRatio | null)[] {
  const n = BigInt(peopleIn(people));
  if (ends === 'inclusive' && n < 2n) return people.counts.map(() => null);
  const known = rankParts(people).map(({ below, at }) => {
    if (at === 0n) return null;
    return ends === 'inclusive' ? ratio(100n * below, n - 1n) : ratio(100n * (below + 1n), n + 1n);
  });
  return known.map((rank, position) => rank ?? onLine(known, position));
}

/** On the line between the nearest values to either side, or null where one side has none. */
function onLine(known: readonly (ExactRatio | null)[], position: number): ExactRatio | null {
  const left = known.findLastIndex((rank, place) => place < position && rank !== null);
  const right = known.findIndex((rank, place) => place > position && rank !== null);
  const [low, high] = [known[left] ?? null, known[right] ?? null];
  if (low === null || high === null) return null;
  const [into, span] = [BigInt(position - left), BigInt(right - left)];
  const numerator = low.numerator * high.denominator * (span - into) + high.numerator * low.denominator * into;
  return ratio(numerator, low.denominator * high.denominator * span);
}

function cutToTenths({ numerator, denominator }: ExactRatio): ExactRatio {
  return ratio((10n * numerator) / denominator, 10n);
}
