import { countedRank } from '../precision/counted-rank.ts';
import { samplingDesign, type SamplingDesign } from '../precision/sampling-design.ts';
import { summarise, type CohortSummary } from '../tally/cohort-summary.ts';
import { smooth } from '../smoothing/smooth.ts';
import type { FrequencyTable } from '../tally/frequency-table.ts';
import { adjustRows, type RefusedAdjustment } from './adjustments.ts';
import { conversionRows, type ConversionRow } from './conversion-table.ts';
import { fitEvidence, type FitEvidence } from './fit-evidence.ts';
import { smoothedFrom, smoothGroup, type GroupSmoothing, type SmoothedCurve } from './group-smoothing.ts';
import { inverseTable, type InverseRow } from './inverse-table.ts';
import type { NormGroup } from './norm-groups.ts';
import type { NormProject } from './norm-project.ts';
import { printRange, type PrintRange } from './print-range.ts';
import { defensibleSmoothings } from './print-range-smoothings.ts';
import { precisionOf, type GroupPrecision } from './row-precision.ts';
import { smoothingOf, USUAL_LOG_LINEAR } from './smoothing-choice.ts';

/** One group with its numbers, as plain data: everything that is printed of it. */
export interface GroupNorms {
  readonly group: NormGroup;
  readonly summary: CohortSummary;
  /** How its people were drawn: one by one, or in clusters. */
  readonly sampling: SamplingDesign;
  readonly smoothing: GroupSmoothing;
  /** How fair the smoothing is to the data; null without smoothing. */
  readonly evidence: FitEvidence | null;
  readonly precision: GroupPrecision;
  /** One row for each attainable score, lowest first. */
  readonly rows: readonly ConversionRow[];
  readonly inverse: readonly InverseRow[];
  /** Adjustments of its printed ranks that could not be made. */
  readonly refusedAdjustments: readonly RefusedAdjustment[];
}

/**
 * The numbers of one group. `known` is a smoothing of the same group that was already worked out with the same choice.
 * Where smoothing was refused the rows are the observed ones, and the group may not be pressed. Throws on a group
 * without people.
 */
export function normsOfGroup(project: NormProject, group: NormGroup, known: GroupSmoothing | null = null): GroupNorms {
  const { table } = group;
  const { definition } = project.curve;
  const summary = summarise(table);
  const sampling = samplingDesign(table, countedRank(definition) ?? 'midpoint', summary.effectiveN);
  const smoothing = known ?? smoothGroup(table, smoothingOf(project, group.key), definition);
  const curve = smoothing.state === 'smoothed' ? smoothing.curve : null;
  const precision = precisionOf({ table, summary, sampling, definition, choices: project.precision, curve });
  const ranges = project.table.columns.includes('print-range') ? printRanges(project, table, curve) : null;
  const computed = conversionRows({ table, summary, definition, choices: project.table, curve, precision, ranges });
  const { rows, refused } = adjustRows(project, group, computed);
  return {
    group,
    summary,
    sampling,
    smoothing,
    evidence: curve === null ? null : fitEvidence(computed, curve, table, project.table),
    precision,
    rows,
    inverse: inverseTable(rows, table.scale.direction),
    refusedAdjustments: refused,
  };
}

/**
 * What else could have been printed of each score: the definitions, smoothing off and on (as chosen, otherwise by a
 * log-linear model whose degree BIC picks), and the degrees beside it.
 */
export function printRanges(
  project: NormProject,
  table: FrequencyTable,
  curve: SmoothedCurve | null,
): readonly PrintRange[] {
  const usual = curve === null ? smooth(table, { kind: 'log-linear', ...USUAL_LOG_LINEAR }, 'fit-only') : null;
  const chosen = curve !== null ? smoothedFrom(curve) : usual?.ok === true ? usual.smoothed : null;
  return printRange(table, project.curve.definition, project.table, defensibleSmoothings(table, chosen));
}
