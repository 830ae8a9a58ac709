import { parseDecimal, type Decimal } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { printScore } from '../scores/printed-number.ts';

const LARGEST_SCORE = 1_000_000;
const MOST_DECIMALS = 4;

/**
 * Why a score is none of the table, to stand behind it in a sentence, or null. Without a table a score has a usual size
 * and no more decimals than a scale can have.
 */
export function scoreProblem(score: Decimal, scale: ScoreScale | null): string | null {
  if (scale === null) {
    if (Math.abs(toPoints(score)) > LARGEST_SCORE) return 'is larger than raw scores are';
    return score.decimals > MOST_DECIMALS ? `has more than ${MOST_DECIMALS} decimals` : null;
  }
  const place = placeOnGrid(scaleGrid(scale), score);
  if (typeof place === 'number') return null;
  switch (place) {
    case 'above-scale':
      return `lies above ${printScore(scale, scale.max)}, the highest score of the table`;
    case 'below-scale':
      return `lies below ${printScore(scale, scale.min)}, the lowest score of the table`;
    case 'off-grid':
      return `lies between two scores of the table, which go in steps of ${scale.step}`;
  }
}

/** A score typed in an answer; either decimal mark will do. */
export function typedScore(value: string): Decimal | null {
  return parseDecimal(value, value.includes(',') ? ',' : '.');
}

/** What is wrong with a score typed in an answer, in a sentence, or null. */
export function typedProblem(value: string, scale: ScoreScale | null): string | null {
  const score = typedScore(value);
  const problem = score === null ? 'is not a number' : scoreProblem(score, scale);
  return problem === null ? null : `\u201c${value}\u201d ${problem}. Type another score, or choose another answer.`;
}

/** Raw-score points. */
export function toPoints({ units, decimals }: Decimal): number {
  return Number(units) / 10 ** decimals;
}
