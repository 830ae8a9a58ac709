import type { RankDefinition } from '../percentile/percentile-rank.ts';
import { countedRank } from '../precision/counted-rank.ts';
import { smoothedStandardErrors } from '../precision/rank-variance.ts';
import { smooth } from '../smoothing/smooth.ts';
import type { DegreeLine, Smoothed, SmoothingChoice } from '../smoothing/smoothing.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';

/** A smoothed distribution as plain data: it can cross to another thread and be kept. Lists run from the lowest score. */
export interface SmoothedCurve extends Omit<Smoothed, 'cumulative' | 'varianceOf' | 'rankVariancesOf'> {
  /** Cumulative proportions 0–1 half a step below each score, at it, and half a step above. */
  readonly below: readonly number[];
  readonly middle: readonly number[];
  readonly atOrBelow: readonly number[];
  /** Standard errors of the ranks by the project's definition, in percentile-rank points; null where there are none. */
  readonly standardErrors: readonly number[] | null;
}

export type GroupSmoothing =
  | { readonly state: 'none' }
  | { readonly state: 'smoothed'; readonly curve: SmoothedCurve }
  | {
      readonly state: 'refused';
      readonly problem: string;
      readonly instead: SmoothingChoice;
      readonly degrees: readonly DegreeLine[];
    };

/** Smooths a group as chosen. A refusal is a state of its own: what cannot be smoothed is never printed as smooth. */
export function smoothGroup(
  table: FrequencyTable,
  choice: SmoothingChoice,
  definition: RankDefinition,
): GroupSmoothing {
  if (choice.kind === 'none') return { state: 'none' };
  const result = smooth(table, choice);
  if (!result.ok) {
    const { problem, instead, degrees } = result;
    return { state: 'refused', problem, instead, degrees };
  }
  const { cumulative: _c, varianceOf: _v, rankVariancesOf: _r, ...facts } = result.smoothed;
  const { smoothed } = result;
  const counted = countedRank(definition);
  const at = (shift: -0.5 | 0 | 0.5): readonly number[] =>
    facts.probabilities.map((_, k) => smoothed.cumulative(k, shift));
  const { direction } = table.scale;
  return {
    state: 'smoothed',
    curve: {
      ...facts,
      below: at(-0.5),
      middle: at(0),
      atOrBelow: at(0.5),
      standardErrors: counted === null ? null : smoothedStandardErrors(smoothed, direction, counted),
    },
  };
}

/** The curve as the functions of smoothing and precision take it; it carries no variances. */
export function smoothedFrom({ below, middle, atOrBelow, standardErrors: _, ...facts }: SmoothedCurve): Smoothed {
  const lists = { '-0.5': below, '0': middle, '0.5': atOrBelow } as const;
  return {
    ...facts,
    varianceOf: null,
    rankVariancesOf: null,
    cumulative: (position, shift) => {
      const value = lists[`${shift}`][position];
      if (value === undefined) throw new RangeError(`no position ${position} on the grid`);
      return value;
    },
  };
}
