import { ratioNear } from '../percentile/exact-ratio.ts';
import type { RankDefinition } from '../percentile/percentile-rank.ts';
import { observedContinuization, smoothedContinuization } from '../precision/continuized-rank.ts';
import { clusterRankErrors } from '../precision/cluster-variance.ts';
import { countedRank, type CountedRank } from '../precision/counted-rank.ts';
import { measurementBands, type MeasurementBand } from '../precision/measurement-band.ts';
import type { PercentInterval } from '../precision/percent-interval.ts';
import { rankIntervals } from '../precision/proportion-interval.ts';
import { rankStandardErrors } from '../precision/rank-variance.ts';
import type { SamplingDesign } from '../precision/sampling-design.ts';
import { printRank, type RankPrint } from '../scores/printed-number.ts';
import type { CohortSummary } from '../tally/cohort-summary.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import { smoothedFrom, type SmoothedCurve } from './group-smoothing.ts';
import type { PrecisionChoices } from './norm-project.ts';

/** How sure the ranks of a group are: lists from the lowest score up, null where there is nothing of the kind. */
export interface GroupPrecision {
  /** Sampling interval of the observed rank, per cent 0–100. */
  readonly intervals: readonly PercentInterval[] | null;
  /** Why there are none, in a sentence. */
  readonly intervalProblem: string | null;
  /** Standard error of the observed rank by the definition, percentile-rank points. */
  readonly standardErrors: readonly number[] | null;
  /** The same of the observed midpoint rank, whatever the definition; null where clusters cannot tell it. */
  readonly midpointErrors: readonly number[] | null;
  /** What standard errors of smoothed ranks, had on the n of the weights, are multiplied by: the root of what the clusters
   * add to the variance, 1 without clusters, null where they cannot tell it. */
  readonly smoothedErrorFactor: number | null;
  /** Measurement band, from the reliability. */
  readonly bands: readonly MeasurementBand[] | null;
  readonly bandProblem: string | null;
  /** Standard error of measurement, raw-score points. */
  readonly sem: number | null;
}

interface PrecisionBasis {
  readonly table: FrequencyTable;
  readonly summary: CohortSummary;
  readonly sampling: SamplingDesign;
  readonly definition: RankDefinition;
  readonly choices: PrecisionChoices;
  readonly curve: SmoothedCurve | null;
}

const ONE_CLUSTER =
  'All people of the group are in one cluster, which does not tell how clusters differ. Choose other groups, or leave ' +
  'the cluster column unused and say so.';

/** Intervals, standard errors and measurement bands of a group's ranks. */
export function precisionOf({ table, summary, sampling, definition, choices, curve }: PrecisionBasis): GroupPrecision {
  const { sd } = summary;
  const counted = countedRank(definition);
  const { clusters, designEffect, effectiveN } = sampling;
  const intervals =
    clusters === 1
      ? { ok: false as const, problem: ONE_CLUSTER }
      : rankIntervals(table, effectiveN, definition, { method: choices.interval, level: choices.level });
  const errors = (of: CountedRank): readonly number[] | null =>
    clusters === null ? rankStandardErrors(table, of, effectiveN) : clusterRankErrors(table, of);
  const { reliability, level } = choices;
  const continuized =
    curve === null ? observedContinuization(table) : smoothedContinuization(smoothedFrom(curve), table.scale);
  const bands = reliability === null ? null : measurementBands(table.scale, continuized, sd, { reliability, level });
  return {
    intervals: intervals.ok ? intervals.intervals : null,
    intervalProblem: intervals.ok ? null : intervals.problem,
    standardErrors: counted === null ? null : errors(counted),
    midpointErrors: errors('midpoint'),
    smoothedErrorFactor: clusters !== null && designEffect === null ? null : Math.sqrt(summary.effectiveN / effectiveN),
    bands: bands?.ok === true ? bands.bands : null,
    bandProblem: bands === null || bands.ok ? null : bands.problem,
    sem: bands?.ok === true ? bands.sem : null,
  };
}

/** An interval of ranks as it is printed: both ends by the table's rules, one text where they are the same. */
export function printInterval({ low, high }: PercentInterval, print: RankPrint): string {
  return printedRange(printRank(ratioNear(low), print).text, printRank(ratioNear(high), print).text);
}

/** "45–50", or "<1" where both ends are the same text. */
export function printedRange(low: string, high: string): string {
  return low === high ? low : `${low}\u2013${high}`;
}
