import { smooth } from '../smoothing/smooth.ts';
import type { LogLinearChoice, Smoothed } from '../smoothing/smoothing.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';

const LOWEST_DEGREE = 1;
const HIGHEST_DEGREE = 10;

/**
 * The smoothings that are as defensible as a chosen one: itself and, where it has a degree, the degrees one below and one
 * above. A neighbour that the data cannot carry is no alternative and is left out; `none` has no neighbours.
 */
export function defensibleSmoothings(table: FrequencyTable, chosen: Smoothed | null): readonly Smoothed[] {
  if (chosen === null) return [];
  const neighbours = neighbourChoices(chosen).flatMap((choice) => {
    const result = smooth(table, choice, 'fit-only');
    return result.ok ? [result.smoothed] : [];
  });
  return [chosen, ...neighbours];
}

function neighbourChoices({ choice, degree }: Smoothed): readonly Smoothed['choice'][] {
  if (degree === null) return [];
  const degrees = [degree - 1, degree + 1].filter((near) => near >= LOWEST_DEGREE && near <= HIGHEST_DEGREE);
  const at = (model: LogLinearChoice, near: number): LogLinearChoice => ({ ...model, degree: near });
  switch (choice.kind) {
    case 'log-linear':
      return degrees.map((near) => ({ kind: choice.kind, ...at(choice, near) }));
    case 'kernel': {
      const { after, bandwidth, kind } = choice;
      return after === null ? [] : degrees.map((near) => ({ kind, bandwidth, after: at(after, near) }));
    }
    case 'beta-binomial':
      return [];
  }
}
