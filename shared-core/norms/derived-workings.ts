import { linearScale } from '../scores/derived-score.ts';
import { printCount, printNumber } from '../scores/printed-number.ts';
import type { ColumnKey } from './column-keys.ts';
import { PRINTED_SCALES, type ConversionRow } from './conversion-table.ts';
import { inBrackets } from './grouped-class.ts';
import type { NormProject } from './norm-project.ts';
import type { GroupNorms } from './group-norms.ts';

export type DerivedColumn = Extract<ColumnKey, 'z' | 't' | 'nce' | 'deviation' | 'sten' | 'stanine'>;

/** The steps from a percentile rank, or from mean and standard deviation, to a printed derived score. */
export function derivedWorkings(
  project: NormProject,
  norms: GroupNorms,
  row: ConversionRow,
  column: DerivedColumn,
): readonly string[] {
  const printed = `Printed: ${row.texts[column]}.`;
  const { z } = row.derived;
  if (column === 'stanine' && (project.table.zSource === 'normalised' || z === null)) {
    return ['Stanines begin at ranks 4, 11, 23, 40, 60, 77, 89 and 96; a rank on a cut goes up.', printed];
  }
  if (column === 'sten' && z === null && row.derived.sten !== null) {
    return ['A rank of 0 or 100 has no finite z and stands in the outermost sten.', printed];
  }
  if (row.printedZ === null) return ['All scores are equal, so there is no z.', printed];
  const zText = inBrackets(printNumber(row.printedZ, 4));
  if (column === 'stanine' || column === 'sten') {
    const [middle, ends] = column === 'stanine' ? ['5', '1 to 9'] : ['5.5', '1 to 10'];
    return [
      ...zLines(project, norms, row),
      `${middle} + 2 × ${zText}, rounded with halves up and cut to ${ends}.`,
      printed,
    ];
  }
  const { mean, spread, low, high } = PRINTED_SCALES[column];
  const value = linearScale(row.printedZ, mean, spread);
  const limits = `between ${printNumber(low, 0)} and ${printNumber(high, 0)}`;
  return [
    ...zLines(project, norms, row),
    ...(column === 'z' ? [] : [`${mean} + ${spread} × ${zText} = ${printNumber(value, 2)}`]),
    ...(project.table.zEnds === 'limits' && (value < low || value > high)
      ? [`Printed scores are held ${limits}.`]
      : []),
    printed,
  ];
}

function zLines(project: NormProject, { group, summary }: GroupNorms, row: ConversionRow): readonly string[] {
  const { z } = row.derived;
  const shown = printNumber(row.printedZ ?? 0, 4);
  if (z === null) {
    return row.provenance.derived === 'half-person'
      ? [
          'A rank of 0 or 100 has no finite z; half a person stands in for it.',
          `z is the normal deviate of the rank of half a person of ${printCount(summary.n)} from the end: ${shown}.`,
        ]
      : [`A rank of 0 or 100 has no finite z; the limit stands in for it: z = ${shown}.`];
  }
  if (project.table.zSource === 'linear') {
    const mean = inBrackets(printNumber(summary.mean, 4));
    const score = inBrackets(row.scoreText);
    const distance = group.table.scale.direction === 'high-is-good' ? `${score} − ${mean}` : `${mean} − ${score}`;
    return [`z = (${distance}) / ${printNumber(summary.sd ?? 0, 4)} = ${shown}`];
  }
  return [`z is the normal deviate of the rank: ${shown}.`];
}
