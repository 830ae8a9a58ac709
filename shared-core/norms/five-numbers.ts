import { decimalOf } from '../scale/decimal.ts';
import { scaleGrid, type ScoreScale } from '../scale/score-scale.ts';
import { printNumber, printScore } from '../scores/printed-number.ts';
import { weighsEqually } from '../tally/frequency-table.ts';
import type { GroupNorms } from './group-norms.ts';

/** One of the five numbers of a group as every place prints it. */
export interface NamedNumber {
  readonly name: string;
  readonly printed: string;
}

/** The five numbers of a group with their names, lowest first; hinges, or quartiles where people weigh differently. */
export function namedFiveNumbers({ summary, group }: GroupNorms): readonly NamedNumber[] {
  const quarter = quarterWord(group.table);
  const names = ['lowest', `lower ${quarter}`, 'median', `upper ${quarter}`, 'highest'];
  return summary.fiveNumbers.map((score, index) => ({
    name: names[index] ?? '',
    printed: printFiveNumber(group.table.scale, score),
  }));
}

/** What stands a quarter of the way in: hinges are not defined for unequal weights. */
export function quarterWord(table: GroupNorms['group']['table']): 'hinge' | 'quartile' {
  return weighsEqually(table) ? 'hinge' : 'quartile';
}

/** A score of the scale, or the middle between two of them, which takes one decimal more. */
function printFiveNumber(scale: ScoreScale, score: number): string {
  const { decimals } = scaleGrid(scale);
  return decimalOf(score).decimals <= decimals ? printScore(scale, score) : printNumber(score, decimals + 1);
}
