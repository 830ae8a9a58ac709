import type { FrequencyTable } from '../tally/frequency-table.ts';
import { effectiveFrequencies } from './effective-frequencies.ts';
import { smoothBetaBinomial } from './smooth-beta-binomial.ts';
import { smoothKernel } from './smooth-kernel.ts';
import { smoothLogLinear, type Extent } from './smooth-log-linear.ts';
import type { SmoothingChoice, SmoothingResult } from './smoothing.ts';

/**
 * Smooths one group on its scale. With weights the frequencies are rescaled to the effective n, in which all statistics
 * then are. All lists of the result run from the lowest score up, whichever end is good. A group that cannot carry the
 * method gives a refusal with the nearest choice that works; a degree, bandwidth or comb that no control can ask for
 * throws. `fit-only` leaves out the table of degrees when the degree is given, for refits by the thousand.
 */
export function smooth(
  table: FrequencyTable,
  choice: Exclude<SmoothingChoice, { readonly kind: 'none' }>,
  extent: Extent = 'with-table-of-degrees',
): SmoothingResult {
  const frequencies = effectiveFrequencies(table);
  if (frequencies.at.filter((frequency) => frequency > 0).length < 2) {
    return {
      ok: false,
      problem: 'People on two scores or more are needed for smoothing. Leave the group unsmoothed.',
      instead: { kind: 'none' },
      degrees: [],
    };
  }
  switch (choice.kind) {
    case 'log-linear':
      return smoothLogLinear(table.scale, frequencies, choice, extent);
    case 'beta-binomial':
      return smoothBetaBinomial(table.scale, frequencies);
    case 'kernel': {
      if (choice.after === null) return smoothKernel(table.scale, frequencies, choice, null);
      const first = smoothLogLinear(table.scale, frequencies, { kind: 'log-linear', ...choice.after }, extent);
      if (first.ok) return smoothKernel(table.scale, frequencies, choice, first.smoothed);
      if (first.instead.kind === 'log-linear') {
        const { degree, keptScores, comb } = first.instead;
        return { ...first, instead: { ...choice, after: { degree, keptScores, comb } } };
      }
      const problem = 'The log-linear curve that is to come first cannot be fitted. The kernel alone works here.';
      return { ...first, problem, instead: { ...choice, after: null } };
    }
  }
}
