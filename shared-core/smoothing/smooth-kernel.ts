import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import { centralMoments } from '../tally/central-moments.ts';
import { automaticBandwidth, bandwidthProblem } from './bandwidth.ts';
import type { EffectiveFrequencies } from './effective-frequencies.ts';
import { freemanTukeyResiduals, momentsOf } from './fit-statistics.ts';
import { kernelCumulative, shrinkage, type GridDistribution } from './kernel.ts';
import { smoothingStatement } from './smoothing-statement.ts';
import type { Moments, Smoothed, SmoothingChoice, SmoothingResult } from './smoothing.ts';

type Choice = Extract<SmoothingChoice, { readonly kind: 'kernel' }>;

/**
 * Kernel smoothing of the observed shares, or of those of a log-linear fit. The probability of a score is the mass of the
 * continuous distribution within half a step of it; the scores at the ends take the tails.
 */
export function smoothKernel(
  scale: ScoreScale,
  frequencies: EffectiveFrequencies,
  choice: Choice,
  after: Smoothed | null,
): SmoothingResult {
  const problem = choice.bandwidth === 'auto' ? null : bandwidthProblem(choice.bandwidth);
  if (problem !== null) throw new RangeError(problem);
  const scores = attainableScores(scale);
  const observed = frequencies.at.map((frequency) => frequency / frequencies.total);
  const discrete = distributionOf(after?.probabilities ?? observed);
  const steps = choice.bandwidth === 'auto' ? automaticBandwidth(discrete) : choice.bandwidth / scale.step;
  const bandwidth = choice.bandwidth === 'auto' ? steps * scale.step : choice.bandwidth;
  const curve = kernelCumulative(discrete, steps);
  const last = scores.length - 1;
  const limits = scores.map((_, k) => (k === last ? 1 : curve(k + 0.5)));
  const probabilities = limits.map((limit, k) => Math.max(0, limit - (limits[k - 1] ?? 0)));
  const facts = { choice, degree: after?.degree ?? null, degrees: after?.degrees ?? [], bandwidth, shape: null };
  const result: Smoothed = {
    ...facts,
    probabilities,
    cumulative: (position, shift) => {
      if (!Number.isInteger(position) || position < 0 || position > last) {
        throw new RangeError(`no position ${position} on the grid`);
      }
      return curve(position + shift);
    },
    g2: after?.g2 ?? null,
    x2: after?.x2 ?? null,
    df: after?.df ?? null,
    aic: after?.aic ?? null,
    bic: after?.bic ?? null,
    momentsObserved: momentsOf(scores, observed),
    momentsFitted: continuousMoments(scale, discrete, steps),
    residuals: freemanTukeyResiduals(
      frequencies.at,
      probabilities.map((probability) => probability * frequencies.total),
    ),
    varianceOf: null,
    rankVariancesOf: null,
    statement: smoothingStatement(facts),
  };
  return { ok: true, smoothed: result };
}

function distributionOf(probabilities: readonly number[]): GridDistribution {
  const positions = probabilities.map((_, k) => k);
  const { mean, m2 } = centralMoments(positions, probabilities);
  return { probabilities, mean, variance: m2 };
}

/** Moments of a X + (1 − a)μ + a h Z, X the discrete score and Z normal: mean and variance are those of X. */
function continuousMoments(scale: ScoreScale, discrete: GridDistribution, steps: number): Moments {
  const positions = discrete.probabilities.map((_, k) => k);
  const { mean, m2, m3, m4 } = centralMoments(positions, discrete.probabilities);
  const a = shrinkage(discrete, steps);
  const h2 = steps * steps;
  const fourth = a ** 4 * (m4 + 6 * m2 * h2 + 3 * h2 * h2);
  return {
    mean: scale.min + mean * scale.step,
    sd: Math.sqrt(m2) * scale.step,
    skewness: (a ** 3 * m3) / m2 ** 1.5,
    excessKurtosis: fourth / (m2 * m2) - 3,
  };
}
