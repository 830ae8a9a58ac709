import { attainableScores, type ScoreScale } from '../scale/score-scale.ts';
import type { EffectiveFrequencies } from './effective-frequencies.ts';
import type { LogLinearChoice } from './smoothing.ts';

/** What a log-linear model is fitted to, apart from its degree. All lists run over the grid, lowest score first. */
export interface LogLinearDesign {
  readonly scores: readonly number[];
  readonly frequencies: Float64Array;
  /** The same in a plain list. */
  readonly observed: readonly number[];
  /** Positions of the grid from −1 to 1. */
  readonly points: Float64Array;
  /** True where the observed frequency is kept, so that the curve does not pass through the cell. */
  readonly kept: readonly boolean[];
  /** 1 at the teeth of the comb that are not kept, else 0; null without a comb. */
  readonly comb: Float64Array | null;
  /** People, or effective people: all, and those in cells that are not kept. */
  readonly total: number;
  readonly freeTotal: number;
  /** Parameters beside the polynomial and the constant: one for each kept score, one for a comb. */
  readonly indicators: number;
}

export type DesignResult =
  { readonly ok: true; readonly design: LogLinearDesign } | { readonly ok: false; readonly problem: string };

/** Throws on a comb that no control can ask for; a score that is not on the scale is a refusal. */
export function logLinearDesign(
  scale: ScoreScale,
  frequencies: EffectiveFrequencies,
  choice: Pick<LogLinearChoice, 'keptScores' | 'comb'>,
): DesignResult {
  const scores = attainableScores(scale);
  const stranger = choice.keptScores.find((score) => !scores.includes(score));
  if (stranger !== undefined)
    return { ok: false, problem: `${stranger} is not a score of this scale, so it cannot be kept.` };
  const keptScores = new Set(choice.keptScores);
  const kept = scores.map((score) => keptScores.has(score));
  const comb = choice.comb === null ? null : teeth(choice.comb, kept);
  const free = kept.filter((isKept) => !isKept).length;
  const freeTotal = sumWhere(frequencies.at, (position) => kept[position] === false);
  if (comb !== null) {
    const cells = comb.reduce((sum, tooth) => sum + tooth, 0);
    const people = sumWhere(frequencies.at, (position) => comb[position] === 1);
    if (cells === 0 || cells === free || people === 0 || people === freeTotal) {
      return {
        ok: false,
        problem: 'The comb takes in none or all of the scores or people that the curve is for. Choose another comb.',
      };
    }
  }
  const last = scores.length - 1;
  const design: LogLinearDesign = {
    scores,
    frequencies: new Float64Array(frequencies.at),
    observed: frequencies.at,
    points: new Float64Array(scores.map((_, position) => (2 * position - last) / last)),
    kept,
    comb,
    total: frequencies.total,
    freeTotal,
    indicators: scores.length - free + (comb === null ? 0 : 1),
  };
  return { ok: true, design };
}

function sumWhere(frequencies: readonly number[], counted: (position: number) => boolean): number {
  return frequencies.reduce((sum, frequency, position) => sum + (counted(position) ? frequency : 0), 0);
}

function teeth(comb: NonNullable<LogLinearChoice['comb']>, kept: readonly boolean[]): Float64Array {
  const { every, offset } = comb;
  if (!Number.isInteger(every) || every < 2 || !Number.isInteger(offset) || offset < 0 || offset >= every) {
    throw new RangeError(
      `a comb has a tooth every 2 or more steps and starts within the first ${every}, not at ${offset}`,
    );
  }
  return new Float64Array(kept.map((isKept, position) => (!isKept && position % every === offset ? 1 : 0)));
}

/** Free parameters of the model of a degree, the constant counted. */
export function parametersOf(design: LogLinearDesign, degree: number): number {
  return degree + 1 + design.indicators;
}

/**
 * The highest degree for which the likelihood has a maximum. A maximum is missing when a polynomial of that degree, not
 * 0 everywhere, is 0 at each observed score and nowhere above 0 on the grid: adding ever more of it never lowers the
 * likelihood. Its roots then cover the observed scores, a pair of neighbours of the grid costing two roots and either end
 * of the grid one; the cheapest cover costs one root more than the highest degree that is determined. (Existence in
 * exponential families: Barndorff-Nielsen 1978, Information and Exponential Families; the count of roots is worked out
 * here.) A comb adds one direction more, for which the fit itself watches.
 */
export function highestDeterminedDegree(design: LogLinearDesign): number {
  const observed = design.observed.filter((_, k) => design.kept[k] === false).map((frequency) => frequency > 0);
  const costs = [false, true].flatMap((low) =>
    [false, true].map((high) => {
      const inner = observed.slice(low ? 1 : 0, high ? -1 : undefined);
      return Number(low) + Number(high) + 2 * pairsToCover(inner);
    }),
  );
  return Math.min(Math.min(...costs) - 1, observed.length - 1);
}

function pairsToCover(observed: readonly boolean[]): number {
  let pairs = 0;
  for (let k = 0; k < observed.length; k += 1) {
    if (observed[k] !== true) continue;
    pairs += 1;
    k += 1;
  }
  return pairs;
}
