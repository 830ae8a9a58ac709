import type { ExactRatio } from '../percentile/exact-ratio.ts';
import { attainableScores } from '../scale/score-scale.ts';
import { peopleIn, type FrequencyTable } from '../tally/frequency-table.ts';
import type { ForeignColumn, ForeignRow } from './why-differ-column.ts';
import { ranksByConvention, type AppliedConvention, type ConventionRanks } from './why-differ-conventions.ts';
import {
  endRules,
  roundedTo,
  ROUNDING_RULES,
  samePrint,
  textOfPrint,
  withEnds,
  type EndRule,
  type RoundingRule,
} from './why-differ-rules.ts';

/** One way to bring a rank to print. */
export interface PrintWay {
  readonly rounding: RoundingRule;
  readonly ends: EndRule;
}

/** A convention with the ways of printing that go equally well with it; the rows given cannot tell these apart. */
export interface Explanation {
  readonly applied: AppliedConvention;
  /** At least one, the more usual first. */
  readonly ways: readonly PrintWay[];
}

export interface DisagreeingRow {
  /** Raw-score points. */
  readonly score: number;
  /** As it was pasted. */
  readonly theirs: string;
  /** What the explanation would print; null where its convention has no rank for the score. */
  readonly expected: string | null;
}

/** Why somebody's ranks differ from this table: what reproduces them, or the nearest with the rows that disagree. */
export type WhyDiffer =
  | {
      readonly kind: 'reproduced';
      /** Every convention that gives all rows, the more usual first. */
      readonly explanations: readonly Explanation[];
      readonly compared: number;
    }
  | {
      readonly kind: 'nearest';
      readonly explanation: Explanation;
      readonly disagreeing: readonly DisagreeingRow[];
      readonly compared: number;
    };

interface Fit {
  readonly ranks: ConventionRanks;
  readonly ways: readonly PrintWay[];
  readonly misses: number;
}

/**
 * Finds how a column of percentile ranks was made from the same people: every rank definition, common plotting positions
 * and class widths, the two percent ranks of spreadsheets, counted from either end, with and without weights; every
 * rounding and rule for ends. The decimals are those of the column. Throws on a table without people or a column without
 * rows.
 */
export function whyDiffer(table: FrequencyTable, column: ForeignColumn): WhyDiffer {
  if (peopleIn(table) === 0 || column.rows.length === 0) throw new RangeError('nothing to compare');
  let fewest = column.rows.length + 1;
  const fits: Fit[] = [];
  for (const ranks of ranksByConvention(table)) {
    const fit = fitOf(ranks, column, fewest);
    if (fit === null) continue;
    fewest = Math.min(fewest, fit.misses);
    fits.push(fit);
  }
  const best = fits.filter(({ misses }) => misses === fewest);
  const [first] = best;
  if (first === undefined) throw new RangeError('no convention was compared');
  const compared = column.rows.length;
  if (fewest === 0) {
    const explanations = best.map(({ ranks, ways }) => ({ applied: ranks.applied, ways }));
    return { kind: 'reproduced', explanations, compared };
  }
  const explanation = { applied: first.ranks.applied, ways: first.ways };
  return { kind: 'nearest', explanation, disagreeing: disagreeing(table, column, first), compared };
}

/** The ways of printing that miss the fewest rows, or null when all miss more than `most`. */
function fitOf(ranks: ConventionRanks, column: ForeignColumn, most: number): Fit | null {
  let misses = most;
  let ways: PrintWay[] = [];
  for (const rounding of ROUNDING_RULES) {
    const cells = cellsOf(ranks, column, rounding);
    for (const ends of endRules(column.decimals)) {
      const missed = missesOf(cells, column.decimals, ends, misses);
      if (missed > misses) continue;
      if (missed < misses) ways = [];
      misses = missed;
      ways.push({ rounding, ends });
    }
  }
  return ways.length === 0 ? null : { ranks, ways, misses };
}

interface Cell {
  readonly row: ForeignRow;
  readonly rank: ExactRatio | null;
  readonly rounded: ExactRatio | null;
}

function cellsOf({ ranks }: ConventionRanks, column: ForeignColumn, rounding: RoundingRule): readonly Cell[] {
  return column.rows.map((row) => {
    const rank = ranks[row.position] ?? null;
    return { row, rank, rounded: rank === null ? null : roundedTo(rank, column.decimals, rounding) };
  });
}

function missesOf(cells: readonly Cell[], decimals: number, ends: EndRule, most: number): number {
  let misses = 0;
  for (const { row, rank, rounded } of cells) {
    const same = rank !== null && rounded !== null && samePrint(withEnds(rank, rounded, decimals, ends), row.printed);
    if (!same) misses += 1;
    if (misses > most) break;
  }
  return misses;
}

function disagreeing(table: FrequencyTable, column: ForeignColumn, { ranks, ways }: Fit): readonly DisagreeingRow[] {
  const [way] = ways;
  if (way === undefined) throw new RangeError('an explanation without a way of printing');
  const scores = attainableScores(table.scale);
  return cellsOf(ranks, column, way.rounding).flatMap(({ row, rank, rounded }): readonly DisagreeingRow[] => {
    const score = scores[row.position];
    if (score === undefined) throw new RangeError('a row beyond the scale');
    if (rank === null || rounded === null) return [{ score, theirs: row.text, expected: null }];
    const ours = withEnds(rank, rounded, column.decimals, way.ends);
    if (samePrint(ours, row.printed)) return [];
    return [{ score, theirs: row.text, expected: textOfPrint(ours, column.decimals) }];
  });
}
