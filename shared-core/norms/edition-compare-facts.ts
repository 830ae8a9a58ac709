import { scaleGrid } from '../scale/score-scale.ts';
import { printCount, printNumber, printShare } from '../scores/printed-number.ts';
import { textChanges, type NamedText, type TextChange } from './edition-compare-choices.ts';
import { namedFiveNumbers } from './five-numbers.ts';
import type { GroupNorms } from './group-norms.ts';

/** Title, size and description of a group where they differ as printed. */
export function changedFacts(before: GroupNorms, after: GroupNorms): readonly TextChange[] {
  return textChanges(factsOf(before), factsOf(after));
}

function factsOf(norms: GroupNorms): readonly NamedText[] {
  const { group, summary, smoothing } = norms;
  const decimals = scaleGrid(group.table.scale).decimals + 1;
  const number = (value: number | null): string | null => (value === null ? null : printNumber(value, decimals));
  const shape = (value: number | null): string | null => (value === null ? null : printNumber(value, 2));
  return [
    { what: 'title', text: group.title },
    { what: 'n', text: printCount(summary.n) },
    { what: 'sum of weights', text: group.table.weighted ? printNumber(summary.weightSum, 1) : null },
    { what: 'effective n', text: group.table.weighted ? printNumber(summary.effectiveN, 1) : null },
    { what: 'mean', text: number(summary.mean) },
    { what: 'SD', text: number(summary.sd) },
    { what: 'skewness', text: shape(summary.skewness) },
    { what: 'excess kurtosis', text: shape(summary.excessKurtosis) },
    ...namedFiveNumbers(norms).map(({ name, printed }) => ({ what: name, text: printed })),
    { what: 'share at the lowest score', text: printShare(summary.shareAtLowest) },
    { what: 'share at the highest score', text: printShare(summary.shareAtHighest) },
    { what: 'smoothing', text: smoothing.state === 'smoothed' ? smoothing.curve.statement : 'not smoothed' },
  ];
}
