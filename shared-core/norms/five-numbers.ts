import { decimalOf } from '../scale/decimal.ts';
import { scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { printNumber, printScore } from '../scores/printed-number.ts';
import type { FiveNumbers } from '../tally/cohort-summary.ts';
import { weighsEqually, type FrequencyTable } from '../tally/frequency-table.ts';
import type { GroupNorms } from './group-norms.ts';

/** One of the five numbers of a group as every place prints it. */
export interface NamedNumber {
  readonly name: string;
  readonly printed: string;
}

/** The five numbers of a group with their names, lowest first; hinges, or quartiles where people weigh differently. */
export function namedFiveNumbers({ summary, group }: GroupNorms): readonly NamedNumber[] {
  return namedNumbers(summary.fiveNumbers, group.table);
}

/** The same of any table of people and its five numbers. */
export function namedNumbers(fiveNumbers: FiveNumbers, table: FrequencyTable): readonly NamedNumber[] {
  const quarter = quarterWord(table);
  const names = ['lowest', `lower ${quarter}`, 'median', `upper ${quarter}`, 'highest'];
  return fiveNumbers.map((score, index) => ({
    name: names[index] ?? '',
    printed: printFiveNumber(table.scale, score),
  }));
}

/** What stands a quarter of the way in: hinges are not defined for unequal weights. */
export function quarterWord(table: FrequencyTable): 'hinge' | 'quartile' {
  return weighsEqually(table) ? 'hinge' : 'quartile';
}

/** A score of the scale, or the middle between two of them, which takes one decimal more. */
export function printFiveNumber(scale: ScoreScale, score: number): string {
  const { decimals } = scaleGrid(scale);
  return decimalOf(score).decimals <= decimals ? printScore(scale, score) : printNumber(score, decimals + 1);
}
