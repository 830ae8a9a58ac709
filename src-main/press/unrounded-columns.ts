import { say, wordsOf } from '../../shared-core/languages/phrases.ts';
import type { ConversionRow } from '../../shared-core/norms/conversion-table.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormProject } from '../../shared-core/norms/norm-project.ts';

/** A column of numbers behind the printed texts. */
export interface UnroundedColumn {
  readonly head: string;
  /** Null leaves the cell empty. */
  readonly valueOf: (row: ConversionRow) => number | null;
}

export const UNROUNDED_FORMAT = '0.000000';

/**
 * The unrounded numbers that stand beyond the printed columns: the rank, both the smoothed and the observed one where
 * the group is smoothed, and the numbers behind each printed column of errors.
 */
export function unroundedColumns(project: NormProject, { smoothing }: GroupNorms): readonly UnroundedColumn[] {
  const { table } = project;
  const words = wordsOf(project);
  const has = (key: NormProject['table']['columns'][number]): boolean => table.columns.includes(key);
  return [
    ...(smoothing.state === 'smoothed'
      ? [
          { head: say(words, 'workbook.rank-smoothed'), valueOf: (row: ConversionRow) => row.percentileRank },
          { head: say(words, 'workbook.rank-observed'), valueOf: (row: ConversionRow) => row.observed.percentileRank },
        ]
      : [{ head: say(words, 'workbook.rank'), valueOf: (row: ConversionRow) => row.percentileRank }]),
    ...(has('interval')
      ? [
          { head: say(words, 'workbook.interval-low'), valueOf: (row: ConversionRow) => row.interval?.low ?? null },
          { head: say(words, 'workbook.interval-high'), valueOf: (row: ConversionRow) => row.interval?.high ?? null },
        ]
      : []),
    ...(has('standard-error')
      ? [{ head: say(words, 'workbook.standard-error'), valueOf: (row: ConversionRow) => row.standardError }]
      : []),
    ...(has('measurement-band')
      ? [
          { head: say(words, 'workbook.band-low'), valueOf: (row: ConversionRow) => row.band?.low ?? null },
          { head: say(words, 'workbook.band-high'), valueOf: (row: ConversionRow) => row.band?.high ?? null },
        ]
      : []),
  ];
}
