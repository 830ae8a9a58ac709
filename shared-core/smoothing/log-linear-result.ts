import { TEST_LEVEL, type DegreeFit } from './choose-degree.ts';
import { cumulativeOnGrid } from './cumulative.ts';
import { freemanTukeyResiduals, momentsOf } from './fit-statistics.ts';
import { logLinearVariances } from './log-linear-covariance.ts';
import type { LogLinearDesign } from './log-linear-design.ts';
import type { DegreeRule, LogLinearChoice, Smoothed } from './smoothing.ts';
import { ordinal } from './ordinal.ts';

/** A converged fit as the distribution that the program shows, with the degrees it was compared with. */
export function logLinearResult(
  design: LogLinearDesign,
  choice: { readonly kind: 'log-linear' } & LogLinearChoice,
  { line, probabilities }: DegreeFit,
  fits: readonly DegreeFit[],
): Smoothed {
  const { scores, observed } = design;
  return {
    choice,
    probabilities,
    cumulative: cumulativeOnGrid(probabilities),
    degree: line.degree,
    bandwidth: null,
    g2: line.g2,
    x2: line.x2,
    df: line.df,
    aic: line.aic,
    bic: line.bic,
    degrees: fits.map((fit) => fit.line),
    momentsObserved: momentsOf(
      scores,
      observed.map((frequency) => frequency / design.total),
    ),
    momentsFitted: momentsOf(scores, probabilities),
    residuals: freemanTukeyResiduals(
      observed,
      probabilities.map((probability) => probability * design.total),
    ),
    ...logLinearVariances(design, line.degree, probabilities),
    statement: statementOf(choice, line.degree, fits),
  };
}

const RULES: Readonly<Record<DegreeRule, string>> = {
  bic: 'the lowest BIC (people counted)',
  aic: 'the lowest AIC',
  'likelihood-ratio': `successive likelihood-ratio tests at the ${TEST_LEVEL} level from the highest degree down`,
};

function statementOf(choice: LogLinearChoice, degree: number, fits: readonly DegreeFit[]): string {
  const highest = fits.length;
  const among = highest > 1 ? `degrees 1 to ${highest}` : 'degree 1 alone';
  const failed = fits.filter(({ fit }) => !fit.converged).map(({ line }) => line.degree);
  const left = failed.length === 0 ? '' : `, without ${failed.join(', ')}, where no fit was found`;
  const how = typeof choice.degree === 'number' ? '' : `, chosen by ${RULES[choice.degree]} among ${among}${left}`;
  const kept = choice.keptScores.length === 0 ? '' : `; the frequency at ${choice.keptScores.join(', ')} is kept`;
  const { comb } = choice;
  const teeth =
    comb === null
      ? ''
      : `; the share of every ${ordinal(comb.every)} score, counted from position ${comb.offset + 1}, is kept`;
  const moments = degree === 1 ? 'their mean is' : `their first ${degree} moments are`;
  return `Log-linear smoothing of degree ${degree} of the observed scores${how}${kept}${teeth}; ${moments} kept.`;
}
