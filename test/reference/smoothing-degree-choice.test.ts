import chiSquareCdf from '@stdlib/stats-base-dists-chisquare-cdf';
import { describe, expect, it } from 'vitest';
import { expectNear } from './near.ts';
import { plainGlm, standardisedPowers } from './plain-glm.ts';
import {
  cohortTable,
  logLinear,
  readSmoothingReference,
  REFERENCE_DEGREES,
  SMOOTHED_COHORTS,
  smoothed,
} from './smoothing-reference.ts';

const DEGREES = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];

const indexOfLowest = (values: readonly number[]): number => values.indexOf(Math.min(...values));

describe.each(SMOOTHED_COHORTS)('the degree chosen for %s', (id) => {
  const table = cohortTable(id);
  const { counts } = table;
  const n = counts.reduce((sum, count) => sum + count, 0);
  const { loglinear } = readSmoothingReference(id);
  // The tiny cohort has fits with frequencies below 1e-100, which a plain regression cannot come near.
  const plainDegrees = id === 'c1_tiny' ? DEGREES.slice(0, 5) : DEGREES;
  const deviances = plainDegrees.map((degree) => plainGlm(standardisedPowers(counts.length, degree), counts).deviance);
  const fit = smoothed(table, logLinear('bic'));

  it('comes from the same deviances as a plain regression has', () => {
    expect(fit.degrees.map((line) => line.degree)).toEqual(DEGREES);
    expect(fit.degrees.every((line) => line.converged)).toBe(true);
    deviances.forEach((deviance, index) => {
      expectNear(fit.degrees[index]?.g2 ?? null, deviance, 1e-6, `G² of degree ${index + 1}`);
    });
  });

  it('is that of the plain regression by BIC and by AIC', () => {
    const bic = indexOfLowest(deviances.map((deviance, index) => deviance + Math.log(n) * (index + 2))) + 1;
    const aic = indexOfLowest(deviances.map((deviance, index) => deviance + 2 * (index + 2))) + 1;
    expect(fit.degree).toBe(bic);
    expect(smoothed(table, logLinear('aic')).degree).toBe(aic);
  });

  it('is that of R by BIC among the degrees that R was asked for', () => {
    const among = fit.degrees.filter((line) => line.degree >= 2 && line.degree <= 8);
    const best = (value: (line: (typeof among)[number]) => number): number =>
      REFERENCE_DEGREES[indexOfLowest(among.map(value))] ?? NaN;
    expect(best((line) => line.bic)).toBe(loglinear.best_k_by_BIC_dev_Ncases);
    expect(best((line) => line.aic)).toBe(loglinear.best_k_by_AIC_R);
  });

  it('is the first from the top down that a likelihood-ratio test does not let go', () => {
    const p = fit.degrees.map((line) => line.p);
    expect(p[0]).toBeNull();
    deviances.slice(1).forEach((deviance, index) => {
      const expected = 1 - chiSquareCdf(Math.max(0, (deviances[index] ?? NaN) - deviance), 1);
      expectNear(p[index + 1] ?? null, expected, 1e-4, `p of degree ${index + 2}`);
    });
    let degree = 10;
    while (degree > 1 && !((p[degree - 1] ?? 1) < 0.05)) degree -= 1;
    expect(smoothed(table, logLinear('likelihood-ratio')).degree).toBe(degree);
  });
});
