import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import { centralMoments } from '../tally/central-moments.ts';
import { betaBinomial, type BetaBinomialTrouble } from './beta-binomial.ts';
import { cumulativeOnGrid } from './cumulative.ts';
import type { EffectiveFrequencies } from './effective-frequencies.ts';
import { fitStatistics, freemanTukeyResiduals, momentsOf } from './fit-statistics.ts';
import { workingOffer } from './smooth-log-linear.ts';
import { smoothingStatement } from './smoothing-statement.ts';
import type { SmoothingResult } from './smoothing.ts';

/** Two moments and the total are taken from the data. */
const PARAMETERS = 3;

const LOG_LINEAR = { kind: 'log-linear', degree: 'bic', keptScores: [], comb: null } as const;

const TROUBLES: Readonly<Record<BetaBinomialTrouble, string>> = {
  'not-above-binomial':
    'The scores spread no more than the binomial distribution of their mean, which leaves nothing for a beta-binomial curve.',
  'only-at-the-ends': 'All people have the lowest or the highest score, which no beta-binomial curve can follow.',
};

/** Beta-binomial smoothing by moments, for number-right scores in whole marks from 0. */
export function smoothBetaBinomial(scale: ScoreScale, frequencies: EffectiveFrequencies): SmoothingResult {
  if (scale.min !== 0 || scale.step !== 1 || scale.max < 2) {
    return refusal(
      scale,
      frequencies,
      'Beta-binomial smoothing is for the number of right answers: whole marks from 0 to 2 or more.',
    );
  }
  const scores = attainableScores(scale);
  const observed = frequencies.at.map((frequency) => frequency / frequencies.total);
  const { mean, m2 } = centralMoments(scores, observed);
  const curve = betaBinomial(scale.max, mean, m2);
  if (!curve.ok) return refusal(scale, frequencies, TROUBLES[curve.trouble]);
  const { a, b, probabilities } = curve;
  const fitted = probabilities.map((probability) => probability * frequencies.total);
  const facts = {
    choice: { kind: 'beta-binomial' },
    degree: null,
    degrees: [],
    bandwidth: null,
    shape: { a, b },
  } as const;
  return {
    ok: true,
    smoothed: {
      ...facts,
      probabilities,
      cumulative: cumulativeOnGrid(probabilities),
      ...fitStatistics(frequencies.at, fitted),
      df: scores.length - PARAMETERS,
      // Both criteria are of maximum likelihood, which a fit by moments is not.
      aic: null,
      bic: null,
      momentsObserved: momentsOf(scores, observed),
      momentsFitted: momentsOf(scores, probabilities),
      residuals: freemanTukeyResiduals(frequencies.at, fitted),
      varianceOf: null,
      rankVariancesOf: null,
      statement: smoothingStatement(facts),
    },
  };
}

function refusal(scale: ScoreScale, frequencies: EffectiveFrequencies, why: string): SmoothingResult {
  const instead = workingOffer(scale, frequencies, LOG_LINEAR);
  const advice = instead.kind === 'none' ? 'Leave the group unsmoothed.' : 'Log-linear smoothing works here.';
  return { ok: false, problem: `${why} ${advice}`, instead, degrees: [] };
}
