import type { Reply } from '../../shared-core/desk.ts';
import { COLUMN_KEYS, type ColumnKey } from '../../shared-core/norms/column-keys.ts';
import { definitionFromKey } from '../../shared-core/norms/definitions.ts';
import { POINT_DEFINITIONS, type PointDefinition } from '../../shared-core/percentile/percentile-point.ts';
import type { RankDefinition } from '../../shared-core/percentile/percentile-rank.ts';
import { parseDecimal } from '../../shared-core/scale/decimal.ts';
import { scaleProblems, type Direction, type ScoreScale } from '../../shared-core/scale/score-scale.ts';

const FORMATS = ['text', 'csv', 'json'] as const;

/** Columns of the file by the work they do; null where there is none. */
export interface NamedColumns {
  readonly score: string;
  readonly count: string | null;
  readonly weight: string | null;
  readonly id: string | null;
  readonly by: readonly string[];
}

export interface TableOptions {
  readonly named: NamedColumns;
  /** Null: taken from the scores. */
  readonly scale: ScoreScale | null;
  readonly direction: Direction;
  readonly missing: readonly string[];
  readonly definition: RankDefinition;
  /** Proportions, 0–1. */
  readonly points: readonly number[];
  readonly pointDefinitions: readonly PointDefinition[];
  /** Columns beside the rank; null for the usual ones. */
  readonly columns: readonly ColumnKey[] | null;
  readonly format: (typeof FORMATS)[number];
}

type Values = Readonly<Record<string, string | boolean | undefined>>;

/** Turns the texts of the options into what they mean; the problem says which option to change and how. */
export function tableOptions(values: Values): Reply<TableOptions> {
  try {
    return { ok: true, value: readOptions(values) };
  } catch (error) {
    if (error instanceof WrongOption) return { ok: false, problem: error.message };
    throw error;
  }
}

class WrongOption extends Error {}

function readOptions(values: Values): TableOptions {
  const given = (name: string): string | null => {
    const value = values[name];
    return typeof value === 'string' ? value : null;
  };
  const direction = values['low-is-good'] === true ? 'low-is-good' : 'high-is-good';
  const points = given('points');
  const pointDefinition = given('point-definition');
  if (pointDefinition !== null && points === null) {
    throw new WrongOption('--point-definition needs --points, such as --points 0.25,0.5,0.75.');
  }
  const format = oneOf('format', FORMATS, given('format') ?? 'text');
  if (points !== null && format === 'csv') {
    throw new WrongOption('csv has no place for percentile points. Use --format text or json, or leave --points out.');
  }
  return {
    named: namedColumns(given),
    scale: given('scale') === null ? null : readScale(given('scale') ?? '', direction),
    direction,
    missing: listOf('missing', given('missing')).filter((text) => text !== ''),
    definition: readDefinition(given('definition') ?? 'midpoint'),
    points: listOf('points', points).map(readProportion),
    pointDefinitions: listOf('point-definition', pointDefinition ?? 'inverse').map((name) =>
      oneOf('point-definition', POINT_DEFINITIONS, name),
    ),
    columns: given('columns') === null ? null : readColumns(given('columns') ?? ''),
    format,
  };
}

function namedColumns(given: (name: string) => string | null): NamedColumns {
  const score = given('score');
  if (score === null) throw new WrongOption('Name the column of raw scores with --score COL.');
  const named = {
    score,
    count: given('count'),
    weight: given('weight'),
    id: given('id'),
    by: listOf('by', given('by')),
  };
  const all = [score, named.count, named.weight, named.id, ...named.by].filter((name) => name !== null);
  const twice = all.find((name, index) => all.indexOf(name) !== index);
  if (twice !== undefined) throw new WrongOption(`Column "${twice}" is given two kinds of work. Keep one of them.`);
  return named;
}

/** One item of a list with commas, and the comma or the end behind it; in double quotes it may hold commas. */
const LIST_ITEM = /\s*(?:"((?:[^"]|"")*)"|([^",]*))\s*(,|$)/y;

/** Null and the empty text are empty lists. */
function listOf(option: string, text: string | null): readonly string[] {
  if (text === null || text.trim() === '') return [];
  const items: string[] = [];
  LIST_ITEM.lastIndex = 0;
  for (;;) {
    const found = LIST_ITEM.exec(text);
    if (found === null)
      throw new WrongOption(`--${option} is a list with commas; a double quote in it is out of place.`);
    const [, quoted, plain = '', behind] = found;
    items.push(quoted === undefined ? plain.trim() : quoted.replaceAll('""', '"'));
    if (behind === '') return items;
  }
}

function readScale(text: string, direction: Direction): ScoreScale {
  const parts = text.split(':');
  const [min = null, max = null, step] = parts.map(numberIn);
  if (parts.length > 3 || min === null || max === null || step === null) {
    throw new WrongOption(`--scale is MIN:MAX or MIN:MAX:STEP, such as 0:40 or 0:20:0.5, not "${text}".`);
  }
  const scale = { min, max, step: step ?? 1, direction };
  const problems = scaleProblems(scale);
  if (problems.length > 0) throw new WrongOption(`--scale ${text}: ${problems.join(' ')}`);
  return scale;
}

function numberIn(text: string): number | null {
  const decimal = parseDecimal(text);
  return decimal === null ? null : Number(decimal.units) / 10 ** decimal.decimals;
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

function oneOf<T extends string>(option: string, known: readonly T[], text: string): T {
  const found = known.find((each) => each === text);
  if (found === undefined) throw new WrongOption(`--${option} knows ${known.join(', ')}; not "${text}".`);
  return found;
}
