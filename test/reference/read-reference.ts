import { readFileSync } from 'node:fs';
import * as v from 'valibot';
import { decimalOf, unitsAt } from '../../shared-core/scale/decimal.ts';
import { placeOnGrid, scaleGrid, type ScoreScale } from '../../shared-core/scale/score-scale.ts';
import { tableFromCell, tableFromCounts, type FrequencyTable } from '../../shared-core/tally/frequency-table.ts';

/** The files of test/reference, as they lie there. A row of a csv file is a record of texts by column name. */
export type ReferenceRow = Readonly<Record<string, string>>;

export function readText(file: string): string {
  return readFileSync(new URL(file, import.meta.url), 'utf8');
}

/** Plain csv without quotes, which is all that the reference files use. */
export function rowsOf(text: string): readonly ReferenceRow[] {
  const [head = '', ...lines] = text.trimEnd().split('\n');
  const columns = head.split(',');
  return lines.map((line) => {
    const cells = line.split(',');
    return Object.fromEntries(columns.map((column, index) => [column, cells[index] ?? '']));
  });
}

export function readRows(file: string): readonly ReferenceRow[] {
  return rowsOf(readText(`cohorts/${file}`));
}

/** The number in a column; null where the file leaves the cell empty. A column that is missing throws. */
export function numberIn(row: ReferenceRow, column: string): number | null {
  const text = row[column];
  if (text === undefined) throw new RangeError(`no column ${column}`);
  return text === '' ? null : Number(text);
}

export function wholeScale(min: number, max: number): ScoreScale {
  return { min, max, step: 1, direction: 'high-is-good' };
}

/** An unweighted table of people's scores. */
export function tableFromScores(scale: ScoreScale, scores: readonly number[]): FrequencyTable {
  const grid = scaleGrid(scale);
  const counts = new Array<number>(grid.length).fill(0);
  for (const score of scores) {
    const place = placeOnGrid(grid, decimalOf(score));
    if (typeof place !== 'number') throw new RangeError(`${score} is ${place}`);
    counts[place] = (counts[place] ?? 0) + 1;
  }
  return tableFromCounts(scale, counts);
}

/**
 * A weighted table by way of a tally cell. A weight is the decimal that its nearest double is written as, so that
 * 0.20000000000000001 in a file of 17 digits is 0.2.
 */
export function weightedTable(
  scale: ScoreScale,
  people: readonly { readonly score: number; readonly weight: number }[],
): FrequencyTable {
  const grid = scaleGrid(scale);
  const decimals = Math.max(...people.map(({ weight }) => decimalOf(weight).decimals));
  const counts = new Array<number>(grid.length).fill(0);
  const weights = new Array<bigint>(grid.length).fill(0n);
  const squares = new Array<bigint>(grid.length).fill(0n);
  for (const { score, weight } of people) {
    const place = placeOnGrid(grid, decimalOf(score));
    if (typeof place !== 'number') throw new RangeError(`${score} is ${place}`);
    const units = unitsAt(decimalOf(weight), decimals);
    counts[place] = (counts[place] ?? 0) + 1;
    weights[place] = (weights[place] ?? 0n) + units;
    squares[place] = (squares[place] ?? 0n) + units * units;
  }
  const cell = { values: [], counts, weights: weights.map(String), squares: squares.map(String), clusters: null };
  return tableFromCell({ scale, groupColumns: [], weightDecimals: decimals, cells: [cell] }, cell);
}

/** Weight units as a weight. */
export function weightOf(table: FrequencyTable, units: bigint): number {
  return Number(units) / Number(table.weightUnit);
}

/** Squared weight units as a squared weight. */
export function squareOf(table: FrequencyTable, units: bigint): number {
  return Number(units) / Number(table.weightUnit * table.weightUnit);
}

const numbers = v.array(v.number());
const points = v.object({ upper: numbers, lower: numbers });

const COHORT_REFERENCE = v.object({
  N: v.number(),
  scale: v.object({ min: v.number(), max: v.number(), step: v.number() }),
  probs: numbers,
  quantiles: v.record(v.string(), numbers),
  quartiles_0_25_type6: numbers,
  fivenum: numbers,
  percentile_points_exact_limits: points,
  moments_observed: v.object({
    mean: v.number(),
    sd_n1: v.number(),
    skew_pop: v.number(),
    excess_kurt_pop: v.number(),
  }),
  grouped_exact_limits: v.object({
    width: v.number(),
    pr_at_scores: numbers,
    scores: numbers,
    probs: numbers,
    percentile_points: numbers,
  }),
});

const WEIGHTED_REFERENCE = v.object({
  n: v.number(),
  sum_w: v.number(),
  sum_w2: v.number(),
  kish_neff: v.number(),
  probs: numbers,
  quantile_inverse_weighted_ecdf: numbers,
  percentile_points_exact_limits: points,
  moments_weighted: v.object({
    mean: v.number(),
    skew_pop: v.number(),
    kurt_pop: v.number(),
    sd_reliability_weights: v.number(),
  }),
});

const BANDS_REFERENCE = v.object({
  n: v.number(),
  bands: v.array(
    v.object({
      band: v.number(),
      n: v.number(),
      mean: v.number(),
      sd_n1: v.number(),
      median_type7: v.number(),
      q10_type6: v.number(),
      q90_type6: v.number(),
    }),
  ),
});

export type CohortReference = v.InferOutput<typeof COHORT_REFERENCE>;

export function readCohortReference(id: string): CohortReference {
  return v.parse(COHORT_REFERENCE, JSON.parse(readText(`cohorts/${id}_ref.json`)));
}

export function readWeightedReference(id: string): v.InferOutput<typeof WEIGHTED_REFERENCE> {
  return v.parse(WEIGHTED_REFERENCE, JSON.parse(readText(`cohorts/${id}_ref.json`)));
}

export function readBandsReference(id: string): v.InferOutput<typeof BANDS_REFERENCE> {
  return v.parse(BANDS_REFERENCE, JSON.parse(readText(`cohorts/${id}_ref.json`)));
}
