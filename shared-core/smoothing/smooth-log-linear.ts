import type { ScoreScale } from '../scale/score-scale.ts';
import { chooseDegree, fitDegree, fitDegrees, HIGHEST_DEGREE, highestDegree, type DegreeFit } from './choose-degree.ts';
import type { EffectiveFrequencies } from './effective-frequencies.ts';
import { logLinearDesign } from './log-linear-design.ts';
import { logLinearResult } from './log-linear-result.ts';
import type { LogLinearChoice, SmoothingChoice, SmoothingResult } from './smoothing.ts';

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
  if (!built.ok) return unkept(scale, frequencies, choice, built.problem);
  const { design } = built;
  const highest = highestDegree(design);
  if (highest < 1) {
    const problem =
      design.indicators > 0
        ? 'Beside what is kept, too few people or scores are left for a curve. Keep fewer scores, or none.'
        : 'There are too few people for any curve. Leave the group unsmoothed.';
    return unkept(scale, frequencies, choice, problem);
  }
  if (extent === 'fit-only' && typeof degree === 'number' && degree <= highest) {
    const alone = fitDegree(design, degree, null, null);
    if (alone.fit.converged) return { ok: true, smoothed: logLinearResult(design, choice, alone, []) };
  }
  const fits = fitDegrees(design, highest);
  const chosen = typeof degree === 'number' ? (fits[degree - 1] ?? null) : chooseDegree(fits, degree);
  if (chosen?.fit.converged === true) {
    return { ok: true, smoothed: logLinearResult(design, choice, chosen, fits) };
  }
  return nearest(fits, choice);
}

/** A refusal of what is to be kept offers the curve without it, if there is one. */
function unkept(scale: ScoreScale, frequencies: EffectiveFrequencies, choice: Choice, problem: string): Refusal {
  if (choice.keptScores.length === 0 && choice.comb === null) {
    return { ok: false, problem, instead: { kind: 'none' }, degrees: [] };
  }
  const plain: Choice = { ...choice, keptScores: [], comb: null };
  return { ok: false, problem, instead: workingOffer(scale, frequencies, plain), degrees: [] };
}

/** The offered choice where it works, and otherwise what its own refusal offers. */
export function workingOffer(scale: ScoreScale, frequencies: EffectiveFrequencies, offer: Choice): SmoothingChoice {
  const tried = smoothLogLinear(scale, frequencies, offer, 'fit-only');
  return tried.ok ? offer : tried.instead;
}

/** Names the converged degree nearest to the wished one, the lower of two. */
function nearest(fits: readonly DegreeFit[], choice: Choice): Refusal {
  const degrees = fits.map(({ line }) => line);
  const { degree } = choice;
  const why = whyNot(degree, fits.length);
  const able = degrees.filter(({ converged }) => converged).map((line) => line.degree);
  const wished = typeof degree === 'number' ? degree : 1;
  const [best] = able.toSorted((left, right) => Math.abs(left - wished) - Math.abs(right - wished) || left - right);
  return best === undefined
    ? { ok: false, problem: `${why} Leave the group unsmoothed.`, instead: { kind: 'none' }, degrees }
    : {
        ok: false,
        problem: `${why} Degree ${best} is the nearest that works.`,
        instead: { ...choice, degree: best },
        degrees,
      };
}

function whyNot(degree: Choice['degree'], highest: number): string {
  if (typeof degree !== 'number') return 'No curve of any degree could be fitted.';
  return degree > highest
    ? `Degree ${degree} asks for more than this group can say: it has too few distinct scores, or too few people.`
    : `The equations of degree ${degree} could not be met.`;
}
