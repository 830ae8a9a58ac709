import type { Reply } from '../../shared-core/desk.ts';
import { COLUMN_KEYS, type ColumnKey } from '../../shared-core/norms/column-keys.ts';
import { definitionFromKey } from '../../shared-core/norms/definitions.ts';
import { newProject } from '../../shared-core/norms/new-project.ts';
import { POINT_DEFINITIONS, type PointDefinition } from '../../shared-core/percentile/percentile-point.ts';
import type { RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import { countedRank } from '../../shared-core/precision/counted-rank.ts';
import type { SmoothingChoice } from '../../shared-core/smoothing/smoothing.ts';
import { cohortOptions, type CohortOptions } from './cohort-options.ts';
import { listOf, numberIn, oneOf, readOrSay, textGiven, WrongOption, type OptionValues } from './option-values.ts';
import { precisionOptions, type PrecisionOptions } from './precision-options.ts';
import { smoothingFromOption } from './smooth-option.ts';

const FORMATS = ['text', 'csv', 'json'] as const;

export interface TableOptions extends CohortOptions {
  readonly definition: RankDefinition;
  readonly smoothing: SmoothingChoice;
  readonly precision: PrecisionOptions;
  /** Proportions, 0–1. */
  readonly points: readonly number[];
  readonly pointDefinitions: readonly PointDefinition[];
  /** Columns beside the rank; null for the usual ones. */
  readonly columns: readonly ColumnKey[] | null;
  readonly format: (typeof FORMATS)[number];
}

/** Turns the texts of the options into what they mean; the problem says which option to change and how. */
export function tableOptions(values: OptionValues): Reply<TableOptions> {
  return readOrSay(() => {
    const options = readOptions(values);
    const problem = clash(options);
    if (problem !== null) throw new WrongOption(problem);
    return options;
  });
}

function readOptions(values: OptionValues): TableOptions {
  const { precision } = newProject('');
  const points = textGiven(values, 'points');
  const pointDefinition = textGiven(values, 'point-definition');
  if (pointDefinition !== null && points === null) {
    throw new WrongOption('--point-definition needs --points, such as --points 0.25,0.5,0.75.');
  }
  const columns = textGiven(values, 'columns');
  return {
    ...cohortOptions(values),
    definition: readDefinition(textGiven(values, 'definition') ?? 'midpoint'),
    smoothing: smoothingFromOption(textGiven(values, 'smooth') ?? 'none'),
    precision: precisionOptions(values, { level: precision.level, seed: precision.bootstrap.seed }),
    points: listOf('points', points).map(readProportion),
    pointDefinitions: listOf('point-definition', pointDefinition ?? 'inverse').map((name) =>
      oneOf('point-definition', POINT_DEFINITIONS, name),
    ),
    columns: columns === null ? null : readColumns(columns),
    format: oneOf('format', FORMATS, textGiven(values, 'format') ?? 'text'),
  };
}

/** Options that do not go together, in a sentence, or null. */
function clash({ definition, precision, points, columns, format }: TableOptions): string | null {
  if (points.length > 0 && format === 'csv') {
    return 'csv has no place for percentile points. Use --format text or json, or leave --points out.';
  }
  if (precision.bootstrap !== null && format === 'csv') {
    return 'csv has no place for a bootstrap. Use --format text or json, or leave --bootstrap out.';
  }
  if (precision.bootstrap !== null && countedRank(definition) === null) {
    return '--bootstrap needs a rank that counts people: --definition midpoint, at-or-below or below.';
  }
  if (precision.reliability === null && columns?.includes('measurement-band') === true) {
    return '--columns measurement-band needs --reliability R, such as --reliability 0.88.';
  }
  return null;
}

function readDefinition(text: string): RankDefinition {
  const definition = definitionFromKey(text);
  if (definition !== null) return definition;
  throw new WrongOption(
    `--definition is midpoint, at-or-below, below, plotting-position:A with A from 0 to below 1, or grouped:WIDTH, not "${text}".`,
  );
}

function readProportion(text: string): number {
  const proportion = numberIn(text);
  if (proportion !== null && proportion >= 0 && proportion <= 1) return proportion;
  throw new WrongOption(`--points are proportions from 0 to 1, such as 0.5 for the median, not "${text}".`);
}

function readColumns(text: string): readonly ColumnKey[] {
  const columns = listOf('columns', text).map((name) => oneOf('columns', COLUMN_KEYS, name));
  if (new Set(columns).size < columns.length) throw new WrongOption('--columns names a column twice.');
  return columns;
}
