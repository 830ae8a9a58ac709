import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import {
  chooseDegree,
  fitDegree,
  fitDegrees,
  HIGHEST_DEGREE,
  highestDegree,
  TEST_LEVEL,
  type DegreeFit,
} from './choose-degree.ts';
import { cumulativeOnGrid } from './cumulative.ts';
import type { EffectiveFrequencies } from './effective-frequencies.ts';
import { freemanTukeyResiduals, momentsOf } from './fit-statistics.ts';
import { logLinearVariance } from './log-linear-covariance.ts';
import { logLinearDesign, type LogLinearDesign } from './log-linear-design.ts';
import type { DegreeRule, LogLinearChoice, Smoothed, SmoothingResult } from './smoothing.ts';

type Choice = { readonly kind: 'log-linear' } & LogLinearChoice;
type Refusal = Extract<SmoothingResult, { readonly ok: false }>;

/** Whether the other degrees are fitted too, for the table of degrees, when the degree is given. */
export type Extent = 'with-table-of-degrees' | 'fit-only';

/** Log-linear smoothing of frequencies; the group holds people on two scores or more. */
export function smoothLogLinear(
  scale: ScoreScale,
  frequencies: EffectiveFrequencies,
  choice: Choice,
  extent: Extent,
): SmoothingResult {
  const { degree } = choice;
  if (typeof degree === 'number' && (!Number.isInteger(degree) || degree < 1 || degree > HIGHEST_DEGREE)) {
    throw new RangeError(`a degree is a whole number from 1 to ${HIGHEST_DEGREE}, not ${degree}`);
  }
  const built = logLinearDesign(scale, frequencies, choice);
  const plain: Choice = { ...choice, keptScores: [], comb: null };
  if (!built.ok) return { ok: false, problem: built.problem, instead: plain, degrees: [] };
  const { design } = built;
  const highest = highestDegree(design);
  if (highest < 1) return nothingDetermined(design, plain);
  if (typeof degree !== 'number') {
    const fits = fitDegrees(design, highest);
    const chosen = chooseDegree(fits, degree);
    return chosen === null ? noFit(fits, choice, 'No degree') : smoothed(scale, design, choice, chosen, fits);
  }
  if (degree > highest) return tooHigh(fitDegrees(design, highest), choice, degree);
  if (extent === 'fit-only') {
    const alone = fitDegree(design, degree, null, null);
    if (alone.fit.converged) return smoothed(scale, design, choice, alone, []);
  }
  const fits = fitDegrees(design, highest);
  const chosen = fits[degree - 1];
  if (chosen?.fit.converged !== true) return noFit(fits, choice, `Degree ${degree}`);
  return smoothed(scale, design, choice, chosen, fits);
}

function smoothed(
  scale: ScoreScale,
  design: LogLinearDesign,
  choice: Choice,
  { line, probabilities }: DegreeFit,
  fits: readonly DegreeFit[],
): SmoothingResult {
  const scores = attainableScores(scale);
  const observed = [...design.frequencies];
  const result: Smoothed = {
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
    varianceOf: logLinearVariance(design, line.degree, probabilities),
    statement: statementOf(choice, line.degree, fits),
  };
  return { ok: true, smoothed: result };
}

const RULES: Readonly<Record<DegreeRule, string>> = {
  bic: 'the lowest BIC (people counted)',
  aic: 'the lowest AIC',
  'likelihood-ratio': `successive likelihood-ratio tests at the ${TEST_LEVEL} level from the highest degree down`,
};

function statementOf(choice: Choice, degree: number, fits: readonly DegreeFit[]): string {
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
  const moments = degree === 1 ? 'the mean' : `the first ${degree} moments`;
  return `Log-linear smoothing of degree ${degree}${how}${kept}${teeth}; ${moments} of the observed scores are kept.`;
}

function ordinal(number: number): string {
  const tens = number % 100;
  const ending = tens > 10 && tens < 14 ? 'th' : (['th', 'st', 'nd', 'rd'][number % 10] ?? 'th');
  return `${number}${ending}`;
}

function nothingDetermined(design: LogLinearDesign, plain: Choice): Refusal {
  if (design.indicators > 0) {
    const problem =
      'Beside the scores that are kept, too few people or scores are left for a curve. Keep fewer scores, or none.';
    return { ok: false, problem, instead: plain, degrees: [] };
  }
  const problem =
    'The observed scores do not determine a curve: too few people, or all of them on one score, on two neighbouring ' +
    'scores or at one end of the scale. Leave the group unsmoothed.';
  return { ok: false, problem, instead: { kind: 'none' }, degrees: [] };
}

function tooHigh(fits: readonly DegreeFit[], choice: Choice, degree: number): Refusal {
  const why = `Degree ${degree} asks for more than this group can say: it has too few distinct scores, or too few people.`;
  return nearest(fits, choice, why, degree);
}

function noFit(fits: readonly DegreeFit[], choice: Choice, which: string): Refusal {
  const wished = typeof choice.degree === 'number' ? choice.degree : 0;
  return nearest(
    fits,
    choice,
    `${which} could be fitted: the equations of the fit were not met.`.replace('Degree', 'No curve of degree'),
    wished,
  );
}

/** Names the converged degree nearest to the wished one, the lower of two. */
function nearest(fits: readonly DegreeFit[], choice: Choice, why: string, degree: number): Refusal {
  const degrees = fits.map(({ line }) => line);
  const best = degrees
    .filter(({ converged }) => converged)
    .reduce<number | null>(
      (found, line) =>
        found === null || Math.abs(line.degree - degree) < Math.abs(found - degree) ? line.degree : found,
      null,
    );
  if (best === null) {
    return { ok: false, problem: `${why} Leave the group unsmoothed.`, instead: { kind: 'none' }, degrees };
  }
  const offer = `Degree ${best} is the nearest that works.`;
  return { ok: false, problem: `${why} ${offer}`, instead: { ...choice, degree: best }, degrees };
}
