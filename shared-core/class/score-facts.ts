import { namedNumbers, type NamedNumber } from '../norms/five-numbers.ts';
import { countedPeople } from '../norms/norm-groups.ts';
import type { PeopleNoun } from '../norms/norm-project.ts';
import { decimalOf } from '../scale/decimal.ts';
import { attainableScores, placeOnGrid, scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { printCount, printScore } from '../scores/printed-number.ts';
import { summarise, type FiveNumbers } from '../tally/cohort-summary.ts';
import { tableFromCounts, type FrequencyTable } from '../tally/frequency-table.ts';

/** The raw scores of a class in numbers. */
export interface ScoreFacts {
  /** Pupils with a score. */
  readonly n: number;
  /** Lowest, lower hinge, median, upper hinge, highest raw score as printed; null for nobody. */
  readonly fiveNumbers: readonly NamedNumber[] | null;
  /** The same in raw-score points for the box plot; null where none is drawn. */
  readonly boxPlot: FiveNumbers | null;
  /** Why none is drawn, in a sentence; null where one is. */
  readonly boxProblem: string | null;
  /** Every score obtained, lowest first, with how many have it. */
  readonly scores: readonly { readonly score: number; readonly scoreText: string; readonly count: number }[];
}

/** Fewer have their scores listed: five numbers of fewer than five are no summary (common practice). */
export const FEWEST_FOR_BOX = 5;

/** The scores of some pupils counted on their scale. Throws on a score that the scale does not have. */
export function countedScores(scale: ScoreScale, scores: readonly number[]): FrequencyTable {
  const grid = scaleGrid(scale);
  const counts = new Array<number>(grid.length).fill(0);
  for (const score of scores) {
    const place = placeOnGrid(grid, decimalOf(score));
    if (typeof place !== 'number') throw new RangeError('a score that its scale does not have');
    counts[place] = (counts[place] ?? 0) + 1;
  }
  return tableFromCounts(scale, counts);
}

/** Five numbers, box plot and list of scores; hinges as for cohorts (Tukey 1977). */
export function scoreFacts(scale: ScoreScale, scores: readonly number[], people: PeopleNoun): ScoreFacts {
  const n = scores.length;
  if (n === 0) {
    const boxProblem = 'Nobody has a score yet, so there is no box plot.';
    return { n, fiveNumbers: null, boxPlot: null, boxProblem, scores: [] };
  }
  const table = countedScores(scale, scores);
  const { fiveNumbers } = summarise(table);
  const few = n < FEWEST_FOR_BOX;
  return {
    n,
    fiveNumbers: namedNumbers(fiveNumbers, table),
    boxPlot: few ? null : fiveNumbers,
    boxProblem: few
      ? `A box plot needs ${FEWEST_FOR_BOX} scores or more; with ${countedPeople(printCount(n), people)} the scores themselves are listed.`
      : null,
    scores: attainableScores(scale).flatMap((score, place) => {
      const count = table.counts[place] ?? 0;
      return count === 0 ? [] : [{ score, scoreText: printScore(scale, score), count }];
    }),
  };
}
