import type { DegreeFit } from './choose-degree.ts';
import { cumulativeOnGrid } from './cumulative.ts';
import { freemanTukeyResiduals, momentsOf } from './fit-statistics.ts';
import { logLinearVariances } from './log-linear-covariance.ts';
import type { LogLinearDesign } from './log-linear-design.ts';
import { smoothingStatement } from './smoothing-statement.ts';
import type { LogLinearChoice, Smoothed } from './smoothing.ts';

/** A converged fit as the distribution that the program shows, with the degrees it was compared with. */
export function logLinearResult(
  design: LogLinearDesign,
  choice: { readonly kind: 'log-linear' } & LogLinearChoice,
  { line, probabilities }: DegreeFit,
  fits: readonly DegreeFit[],
): Smoothed {
  const { scores, observed } = design;
  const facts = { choice, degree: line.degree, degrees: fits.map((fit) => fit.line), bandwidth: null, shape: null };
  return {
    ...facts,
    probabilities,
    cumulative: cumulativeOnGrid(probabilities),
    g2: line.g2,
    x2: line.x2,
    df: line.df,
    aic: line.aic,
    bic: line.bic,
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
    statement: smoothingStatement(facts),
  };
}
