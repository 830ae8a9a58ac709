import { centralMoments } from '../tally/central-moments.ts';
import type { Moments } from './smoothing.ts';

/** How far fitted frequencies lie from observed ones; both in people (or effective people), one for each score. */
export interface FitStatistics {
  /** Likelihood-ratio statistic 2 Σ f log(f/m), 0 or more. */
  readonly g2: number;
  /** Pearson's Σ (f − m)²/m. */
  readonly x2: number;
}

/** Both lists add up to the same. A score that nobody has and nobody is fitted to counts as 0. */
export function fitStatistics(observed: readonly number[], fitted: readonly number[]): FitStatistics {
  let half = 0;
  let x2 = 0;
  observed.forEach((f, k) => {
    const m = fitted[k] ?? 0;
    // f log(f/m) − (f − m) is never below 0, so that the sum does not lose its digits where the fit is close.
    half += f > 0 ? f * Math.log(f / m) - (f - m) : m;
    x2 += f === m ? 0 : (f - m) ** 2 / m;
  });
  return { g2: Math.max(0, 2 * half), x2 };
}

/** Freeman & Tukey's (1950) residuals √f + √(f + 1) − √(4m + 1), one for each score. */
export function freemanTukeyResiduals(observed: readonly number[], fitted: readonly number[]): readonly number[] {
  return observed.map((f, k) => Math.sqrt(f) + Math.sqrt(f + 1) - Math.sqrt(4 * (fitted[k] ?? 0) + 1));
}

/** AIC as G² + 2 · parameters (Akaike 1974); the constant is a parameter. */
export function akaike(g2: number, parameters: number): number {
  return g2 + 2 * parameters;
}

/** BIC as G² + ln N · parameters (Schwarz 1978), N being people, not cells. */
export function schwarz(g2: number, parameters: number, people: number): number {
  return g2 + Math.log(people) * parameters;
}

/** Moments of probabilities at scores, dividing by N. Throws when all lies on one score, which has no skewness. */
export function momentsOf(scores: readonly number[], probabilities: readonly number[]): Moments {
  const { mean, m2, m3, m4 } = centralMoments(scores, probabilities);
  if (!(m2 > 0)) throw new RangeError('a distribution on one score has no skewness');
  return { mean, sd: Math.sqrt(m2), skewness: m3 / m2 ** 1.5, excessKurtosis: m4 / (m2 * m2) - 3 };
}
