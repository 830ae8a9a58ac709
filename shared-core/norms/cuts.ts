import { decimalOf } from '../scale/decimal.ts';
import { attainableScores, scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { printNumber } from '../scores/printed-number.ts';
import { groupKey } from './norm-groups.ts';
import type { Cut, NormProject } from './norm-project.ts';

/** The cuts that hold for the group of a key, in print order. */
export function cutsOfGroup({ cuts }: Pick<NormProject, 'cuts'>, key: string): readonly Cut[] {
  return cuts.filter(({ values }) => values === null || groupKey(values) === key);
}

/**
 * Position (0 = lowest) of the first attainable score on the good side of a cut: the lowest score that is not below it,
 * or, where low is good, the highest that is not above it. Null where the cut lies outside the scale.
 */
export function firstOnGoodSide(scale: ScoreScale, cut: number): number | null {
  if (cut < scale.min || cut > scale.max) return null;
  const scores = attainableScores(scale);
  return scale.direction === 'high-is-good'
    ? scores.findIndex((score) => score >= cut)
    : scores.findLastIndex((score) => score <= cut);
}

/** Positions of the scores before which a cut parts the rows of a group: the score below it stands on its other side. */
export function cutStarts(project: Pick<NormProject, 'cuts'>, key: string, scale: ScoreScale): ReadonlySet<number> {
  const beyond = scale.direction === 'high-is-good' ? 0 : 1;
  return new Set(
    cutsOfGroup(project, key).flatMap(({ score }) => {
      const position = firstOnGoodSide(scale, score);
      return position === null ? [] : [position + beyond];
    }),
  );
}

/** “Reading support”, or "without a name". */
export function cutName({ name }: Cut): string {
  const given = name.replace(/\s+/g, ' ').trim();
  return given === '' ? 'without a name' : `“${given}”`;
}

/** The score of a cut as it is printed: with the decimals of the scale, or with its own where it has more. */
export function cutScoreText(scale: ScoreScale, score: number): string {
  return printNumber(score, Math.max(scaleGrid(scale).decimals, decimalOf(score).decimals));
}
