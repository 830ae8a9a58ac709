import chiSquareCdf from '@stdlib/stats-base-dists-chisquare-cdf';
import { akaike, fitStatistics, schwarz } from './fit-statistics.ts';
import { highestDeterminedDegree, parametersOf, type LogLinearDesign } from './log-linear-design.ts';
import { fitLogLinear, probabilitiesOf, type LogLinearFit } from './log-linear.ts';
import type { DegreeLine, DegreeRule } from './smoothing.ts';

export const HIGHEST_DEGREE = 10;
/** Level of the successive likelihood-ratio tests. */
export const TEST_LEVEL = 0.05;

/** A degree with its fit and its line in the table of degrees. */
export interface DegreeFit {
  readonly fit: LogLinearFit;
  readonly probabilities: readonly number[];
  readonly line: DegreeLine;
}

/**
 * The highest degree that can be compared: at most 10, one that the observed scores determine, and with more people (or
 * effective people) than parameters. Below 1 nothing can be fitted.
 */
export function highestDegree(design: LogLinearDesign): number {
  const people = Math.ceil(design.total) - 2 - design.indicators;
  return Math.min(HIGHEST_DEGREE, highestDeterminedDegree(design), people);
}

/** Fits of degree 1 to the highest, each started from the one before it; those that fail are marked in their line. */
export function fitDegrees(design: LogLinearDesign, highest: number): readonly DegreeFit[] {
  const fits: DegreeFit[] = [];
  let start: Float64Array | null = null;
  for (let degree = 1; degree <= highest; degree += 1) {
    const next: DegreeFit = fitDegree(design, degree, start, fits.at(-1)?.line ?? null);
    fits.push(next);
    if (next.fit.converged) start = next.fit.logs;
  }
  return fits;
}

/** One degree, from equal shares unless a start is given, tested against the line before it. */
export function fitDegree(
  design: LogLinearDesign,
  degree: number,
  start: Float64Array | null,
  lower: DegreeLine | null,
): DegreeFit {
  const fit = fitLogLinear(design, degree, start);
  const probabilities = probabilitiesOf(design, fit);
  const fitted = probabilities.map((probability) => probability * design.total);
  const { g2, x2 } = fitStatistics(design.observed, fitted);
  const parameters = parametersOf(design, degree);
  const line: DegreeLine = {
    degree,
    converged: fit.converged,
    g2,
    x2,
    df: design.points.length - parameters,
    aic: akaike(g2, parameters),
    bic: schwarz(g2, parameters, design.total),
    p: lower !== null && lower.converged && fit.converged ? 1 - chiSquareCdf(Math.max(0, lower.g2 - g2), 1) : null,
  };
  return { fit, probabilities, line };
}

/**
 * The degree that a rule picks among the converged fits, or null when there is none. Lowest BIC or AIC, the lower degree
 * on a tie; or tests of each degree against the next lower one at the 0.05 level from the highest degree down, which end
 * at the first that rejects (Haberman 1974), and at the lowest degree when none does.
 */
export function chooseDegree(fits: readonly DegreeFit[], rule: DegreeRule): DegreeFit | null {
  const able = fits.filter(({ fit }) => fit.converged);
  switch (rule) {
    case 'bic':
      return lowest(able, ({ line }) => line.bic);
    case 'aic':
      return lowest(able, ({ line }) => line.aic);
    case 'likelihood-ratio':
      return able.findLast(({ line }) => line.p !== null && line.p < TEST_LEVEL) ?? able[0] ?? null;
  }
}

function lowest(fits: readonly DegreeFit[], value: (fit: DegreeFit) => number): DegreeFit | null {
  return fits.reduce<DegreeFit | null>((best, fit) => (best === null || value(fit) < value(best) ? fit : best), null);
}
