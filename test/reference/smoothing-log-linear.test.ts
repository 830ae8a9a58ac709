import { describe, expect, it } from 'vitest';
import { expectAllNear, expectNear } from './near.ts';
import { readRows, readText, weightedTable, wholeScale } from './read-reference.ts';
import {
  cohortTable,
  columnOf,
  logLinear,
  midpointWeights,
  readSmoothingReference,
  REFERENCE_DEGREES,
  SMOOTHED_COHORTS,
  smoothed,
} from './smoothing-reference.ts';
import * as v from 'valibot';

/** Relative difference allowed to frequencies above 1e-6, and the same number in percentile-rank points. */
const toleranceOf = (degree: number): number => (degree <= 6 ? 1e-7 : 1e-5);
const STATISTICS = 1e-7;
const SMALL = 1e-6;

function expectFit(actual: readonly number[], expected: readonly number[], degree: number): void {
  expected.forEach((m, k) => {
    const tolerance = m > SMALL ? toleranceOf(degree) * m : SMALL;
    expectNear(actual[k] ?? null, m, tolerance, `degree ${degree}, frequency at ${k}`);
  });
}

describe.each(SMOOTHED_COHORTS)('log-linear fits of %s by R', (id) => {
  const rows = readRows(`${id}_loglinear.csv`);
  const table = cohortTable(id);
  const reference = readSmoothingReference(id);

  it.each(REFERENCE_DEGREES)('agree at degree %i', (degree) => {
    const fit = smoothed(table, logLinear(degree));
    const tolerance = toleranceOf(degree);
    expectFit(
      fit.probabilities.map((probability) => probability * reference.N),
      columnOf(rows, `fit_k${degree}`),
      degree,
    );
    expectAllNear(fit.residuals, columnOf(rows, `ftres_k${degree}`), 1e-6, 'Freeman–Tukey residual');
    expectAllNear(
      rows.map((_, position) => 100 * fit.cumulative(position, 0)),
      columnOf(rows, `prmid_k${degree}`),
      tolerance,
      'midpoint rank',
    );
    const { varianceOf } = fit;
    if (varianceOf === null) throw new Error('a log-linear fit has a covariance');
    expectAllNear(
      rows.map((_, position) => 100 * Math.sqrt(varianceOf(midpointWeights(rows.length, position)))),
      columnOf(rows, `se_prmid_k${degree}`),
      tolerance,
      'standard error of the midpoint rank',
    );
  });

  it.each(REFERENCE_DEGREES)('have the same statistics at degree %i', (degree) => {
    const fit = smoothed(table, logLinear(degree));
    const expected = reference.loglinear.fits[`k${degree}`];
    if (expected === undefined) throw new Error(`no degree ${degree}`);
    expectNear(fit.g2, expected.G2_deviance, STATISTICS, 'G²');
    expectNear(fit.x2, expected.X2_pearson, STATISTICS * Math.max(1, expected.X2_pearson), 'X²');
    expect(fit.df).toBe(expected.df_resid);
    expectNear(fit.aic, expected.AIC_dev, STATISTICS, 'AIC');
    expectNear(fit.bic, expected.BIC_dev_Ncases, STATISTICS, 'BIC');
    const sum = fit.residuals.reduce((total, residual) => total + residual * residual, 0);
    expectNear(sum, expected.FT_stat, STATISTICS, 'sum of squared Freeman–Tukey residuals');
  });
});

const WEIGHTED_FITS = v.object({
  sum_w: v.number(),
  kish_neff: v.number(),
  loglinear_weighted: v.record(v.string(), v.object({ G2_deviance: v.number(), X2_pearson: v.number() })),
});

describe('log-linear fits of the weighted cohort by R', () => {
  const rows = readRows('c5_weighted_scores.csv');
  const people = readRows('c5_weighted_cohort.csv').map((row) => ({
    score: Number(row['score']),
    weight: Number(row['weight']),
  }));
  const table = weightedTable(wholeScale(0, rows.length - 1), people);
  const reference = v.parse(WEIGHTED_FITS, JSON.parse(readText('cohorts/c5_weighted_ref.json')));
  const perPerson = reference.kish_neff / reference.sum_w;

  // R fitted the weight sums as they are; the program rescales them to the effective n, which leaves shares as they are.
  it.each(REFERENCE_DEGREES)('agree in shares at degree %i, and in statistics up to the scale', (degree) => {
    const fit = smoothed(table, logLinear(degree));
    expectFit(
      fit.probabilities.map((probability) => probability * reference.sum_w),
      columnOf(rows, `fit_k${degree}`),
      degree,
    );
    expectAllNear(
      rows.map((_, position) => 100 * fit.cumulative(position, 0)),
      columnOf(rows, `prmid_k${degree}`),
      toleranceOf(degree),
      'midpoint rank',
    );
    const expected = reference.loglinear_weighted[`k${degree}`];
    if (expected === undefined) throw new Error(`no degree ${degree}`);
    expectNear(fit.g2, expected.G2_deviance * perPerson, STATISTICS, 'G²');
    expectNear(fit.x2, expected.X2_pearson * perPerson, STATISTICS, 'X²');
    expectNear(fit.bic, (fit.g2 ?? NaN) + Math.log(reference.kish_neff) * (degree + 1), 1e-9, 'BIC');
  });
});
