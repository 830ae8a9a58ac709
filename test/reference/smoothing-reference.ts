import * as v from 'valibot';
import { smooth } from '../../shared-core/smoothing/smooth.ts';
import type { LogLinearChoice, Smoothed, SmoothingChoice } from '../../shared-core/smoothing/smoothing.ts';
import { tableFromCounts, type FrequencyTable } from '../../shared-core/tally/frequency-table.ts';
import { numberIn, readRows, readText, wholeScale, type ReferenceRow } from './read-reference.ts';

/** Cohorts without weights that log-linear and kernel smoothing were computed for with R. */
export const SMOOTHED_COHORTS = ['c1_tiny', 'c2_leftskew', 'c3_twomodes', 'c4_large'] as const;
export const REFERENCE_DEGREES = [2, 3, 4, 5, 6, 7, 8] as const;

const FIT = v.object({
  G2_deviance: v.number(),
  X2_pearson: v.number(),
  FT_stat: v.number(),
  df_resid: v.number(),
  AIC_dev: v.number(),
  BIC_dev_Ncases: v.number(),
});

const SMOOTHING_REFERENCE = v.object({
  N: v.number(),
  loglinear: v.object({
    best_k_by_AIC_R: v.number(),
    best_k_by_BIC_dev_Ncases: v.number(),
    fits: v.record(v.string(), FIT),
  }),
  kernel: v.object({ h: v.array(v.number()), smooth_k_used: v.number() }),
});

export function readSmoothingReference(id: string): v.InferOutput<typeof SMOOTHING_REFERENCE> {
  return v.parse(SMOOTHING_REFERENCE, JSON.parse(readText(`cohorts/${id}_ref.json`)));
}

/** A column of a file that has a number in each row. */
export function columnOf(rows: readonly ReferenceRow[], column: string): readonly number[] {
  return rows.map((row) => {
    const number = numberIn(row, column);
    if (number === null) throw new RangeError(`an empty cell in ${column}`);
    return number;
  });
}

/** The frequencies of a cohort on its whole scale, from the file of its log-linear fits. */
export function cohortTable(id: string): FrequencyTable {
  const rows = readRows(`${id}_loglinear.csv`);
  return tableFromCounts(wholeScale(0, rows.length - 1), columnOf(rows, 'freq'));
}

export function logLinear(degree: LogLinearChoice['degree']): { readonly kind: 'log-linear' } & LogLinearChoice {
  return { kind: 'log-linear', degree, keptScores: [], comb: null };
}

/** The smoothed distribution of a choice that the data carry. */
export function smoothed(
  table: FrequencyTable,
  choice: Exclude<SmoothingChoice, { readonly kind: 'none' }>,
): Smoothed {
  const result = smooth(table, choice);
  if (!result.ok) throw new Error(result.problem);
  return result.smoothed;
}

/** Weights that make Σ g_k p_k the cumulative proportion at a position with half of its own share. */
export function midpointWeights(length: number, position: number): readonly number[] {
  return Array.from({ length }, (_, k) => (k < position ? 1 : k === position ? 0.5 : 0));
}
