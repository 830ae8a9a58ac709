import type { SamplingDesign } from '../precision/sampling-design.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import type { ColumnKey } from './column-keys.ts';
import type { ConversionRow } from './conversion-table.ts';
import { definitionName } from './definitions.ts';
import type { GroupNorms } from './group-norms.ts';
import type { NormProject } from './norm-project.ts';
import type { RankAlternative } from './print-range.ts';
import { clusterFacts, designEffectNote, drawnInWords } from './sampling-words.ts';
import { intervalName } from './smoothing-words.ts';

export type PrecisionColumn = Extract<ColumnKey, 'interval' | 'standard-error' | 'measurement-band' | 'print-range'>;

/** The steps behind a cell that tells how sure a rank is. */
export function precisionWorkings(
  project: NormProject,
  norms: GroupNorms,
  row: ConversionRow,
  column: PrecisionColumn,
): readonly string[] {
  return [...lines(project, norms, row, column), `Printed: ${row.texts[column]}.`];
}

function lines(
  { precision: choices, curve, people }: NormProject,
  { summary, sampling, precision, group }: GroupNorms,
  row: ConversionRow,
  column: PrecisionColumn,
): readonly string[] {
  const clustered = sampling.clusters !== null;
  const n =
    group.table.weighted || clustered
      ? `the effective n, ${printNumber(sampling.effectiveN, 1)}`
      : `n = ${printCount(summary.n)}`;
  switch (column) {
    case 'interval':
      return row.interval === null
        ? [precision.intervalProblem ?? 'There is no interval.']
        : [
            `The ${choices.level} % ${intervalName(choices.interval)} interval of the observed share, on ${n}: ${printNumber(row.interval.low, 2)} to ${printNumber(row.interval.high, 2)}.`,
            ...effectiveLines(sampling, summary.n),
            `It is error of sampling, ${drawnInWords(people, sampling)}; it says nothing of the error of one score.`,
          ];
    case 'standard-error':
      if (row.standardError === null) return ['This definition or method has no standard error in closed form.'];
      if (clustered && row.smoothed === null) {
        return [
          `Standard error of the ${definitionName(curve.definition)} rank between ${clusterFacts(sampling)}, linearised: ${printNumber(row.standardError, 4)} points.`,
        ];
      }
      return [
        row.smoothed === null
          ? `Multinomial standard error of the ${definitionName(curve.definition)} rank, on ${n}: ${printNumber(row.standardError, 4)} points.`
          : `Standard error of the smoothed rank by the delta method, on ${n}: ${printNumber(row.standardError, 4)} points.`,
      ];
    case 'measurement-band':
      return row.band === null || precision.sem === null
        ? [precision.bandProblem ?? 'The reliability of the test is not given.']
        : [
            `Standard error of measurement: SD × √(1 − ${choices.reliability ?? 0}) = ${printNumber(precision.sem, 4)} raw-score points.`,
            `Ranks of the scores at either end of the ${choices.level} % band: ${printNumber(row.band.low, 2)} to ${printNumber(row.band.high, 2)}.`,
          ];
    case 'print-range':
      return row.range === null
        ? []
        : [`Lowest: ${alternativeInWords(row.range.lowBy)}.`, `Highest: ${alternativeInWords(row.range.highBy)}.`];
  }
}

/** How clusters make an effective n of the people. */
function effectiveLines({ designEffect, effectiveN }: SamplingDesign, n: number): readonly string[] {
  if (designEffect === null) return [];
  return [
    effectiveN < n / designEffect
      ? `A design effect of ${printNumber(designEffect, 2)} leaves more than the weights do; the effective n is theirs.`
      : `Effective n: ${printCount(n)} / ${printNumber(designEffect, 2)} = ${printNumber(effectiveN, 1)}.`,
    designEffectNote(),
  ];
}

/** "at or below, smoothed": one of the defensible ways to a rank. */
export function alternativeInWords({ definition, smoothing }: RankAlternative): string {
  const name = definitionName(definition);
  if (smoothing === null) return `${name}, not smoothed`;
  return smoothing === 0 ? `${name}, smoothed` : `${name}, smoothed with a neighbouring degree`;
}
