import { printRank, type RankPrint } from '../scores/printed-number.ts';
import { effectiveFrequencies } from '../smoothing/effective-frequencies.ts';
import { peopleIn, type FrequencyTable } from '../tally/frequency-table.ts';
import type { ConversionRow } from './conversion-table.ts';
import type { SmoothedCurve } from './group-smoothing.ts';

/** What smoothing did to a group's table, and where it may be unfair to the data. */
export interface FitEvidence {
  /** Largest move of a rank, in percentile-rank points, and the raw score it happens at. */
  readonly largestMove: { readonly points: number; readonly scoreText: string };
  /** Printed ranks that smoothing changes, and how many there are. */
  readonly changed: number;
  readonly of: number;
  /** Scores inside the observed range that nobody has though the curve expects at least five people there. */
  readonly filledGaps: readonly string[];
  /** Scores at which the curve dips between two rises though the data do not. */
  readonly inventedDips: readonly string[];
  /** Degrees whose BIC is lower than that of the degree taken, or at most 2 higher (common practice). */
  readonly nearlyAsGood: readonly number[];
}

/** Expected people at an empty score from which a gap in the data is no chance (e⁻⁵ is below 1 in 100). */
const GAP_EXPECTED = 5;
/** A dip counts where the curve falls at least this share below the lower of the rises beside it. */
const DIP_SHARE = 0.05;
const NEAR_BIC = 2;
/** Half the window, in scores, in which the data are asked whether they dip too. */
const DIP_WINDOW = 2;

/** The evidence for a group's smoothed rows. */
export function fitEvidence(
  rows: readonly ConversionRow[],
  curve: SmoothedCurve,
  table: FrequencyTable,
  print: RankPrint,
): FitEvidence {
  const moves = rows.map((row) => ({
    points: Math.abs(row.percentileRank - row.observed.percentileRank),
    scoreText: row.scoreText,
  }));
  const largestMove = moves.reduce((largest, move) => (move.points > largest.points ? move : largest));
  const taken = curve.degrees.find(({ degree }) => degree === curve.degree);
  return {
    largestMove,
    changed: rows.filter((row) => printRank(row.observed.rank, print).text !== row.printed).length,
    of: rows.length,
    filledGaps: filledGaps(rows, curve, table),
    inventedDips: inventedDips(rows, curve, table),
    nearlyAsGood:
      taken === undefined
        ? []
        : curve.degrees
            .filter((line) => line.converged && line.degree !== taken.degree && line.bic - taken.bic < NEAR_BIC)
            .map(({ degree }) => degree),
  };
}

function filledGaps(
  rows: readonly ConversionRow[],
  { probabilities }: SmoothedCurve,
  table: FrequencyTable,
): readonly string[] {
  const people = peopleIn(table);
  const first = table.counts.findIndex((count) => count > 0);
  const last = table.counts.findLastIndex((count) => count > 0);
  return rows
    .filter(
      (row, position) =>
        position > first &&
        position < last &&
        row.count === 0 &&
        (probabilities[position] ?? 0) * people >= GAP_EXPECTED,
    )
    .map(({ scoreText }) => scoreText);
}

function inventedDips(
  rows: readonly ConversionRow[],
  { probabilities }: SmoothedCurve,
  table: FrequencyTable,
): readonly string[] {
  const { at, total } = effectiveFrequencies(table);
  return rows
    .filter((_, position) => dipsAt(probabilities, position, total) && !dataDipAt(at, probabilities, position))
    .map(({ scoreText }) => scoreText);
}

/** A local minimum with a rise of at least the share on both sides, to a score where at least one person is expected. */
function dipsAt(values: readonly number[], position: number, people: number): boolean {
  const here = values[position] ?? 0;
  if (!(here < (values[position - 1] ?? 0) && here <= (values[position + 1] ?? 0))) return false;
  const rises = [Math.max(...values.slice(0, position)), Math.max(...values.slice(position + 1))];
  const lower = Math.min(...rises);
  return here < (1 - DIP_SHARE) * lower && lower * people >= 1;
}

/**
 * The data dip too when fewer people a score stand about the dip than about the tops of the curve on either side; at an end
 * of the scale there are fewer scores about a top.
 */
function dataDipAt(frequencies: readonly number[], curve: readonly number[], position: number): boolean {
  const about = (centre: number): number => {
    const near = frequencies.slice(Math.max(0, centre - DIP_WINDOW), centre + DIP_WINDOW + 1);
    return near.reduce((sum, frequency) => sum + frequency, 0) / near.length;
  };
  const topOf = (from: number, to: number): number => {
    const part = curve.slice(from, to);
    return from + part.indexOf(Math.max(...part));
  };
  const here = about(position);
  return here < about(topOf(0, position)) && here < about(topOf(position + 1, curve.length));
}
