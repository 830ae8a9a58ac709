import * as v from 'valibot';
import { scaleProblems } from '../scale/score-scale.ts';
import { adjustmentsSchema } from './adjustment-schema.ts';
import { cutsSchema } from './cut-schema.ts';
import { cellClustersSchema, clustersFit } from './cluster-schema.ts';
import { COLUMN_KEYS } from './column-keys.ts';
import { DEFAULT_POLICY } from './policy.ts';
import { policySchema } from './policy-schema.ts';
import { LEFT_OUT_RULES } from './reading.ts';
import { sheetSchema } from './sheet-schema.ts';
import { precisionSchema, smoothingSchema } from './smoothing-schema.ts';

/**
 * Everything the user chose, with the tally: plain readonly data, one JSON file (`*.normloom`). It holds no person's
 * record and no path. The schema is the file format; unknown keys are left behind when a file is read.
 */

const shortText = v.pipe(v.string(), v.maxLength(400));
const longText = v.pipe(v.string(), v.maxLength(8000));
const wholeNumber = v.pipe(v.number(), v.safeInteger(), v.minValue(0));
const unitText = v.pipe(v.string(), v.regex(/^\d{1,200}$/));

const scoreScale = v.pipe(
  v.object({
    min: v.pipe(v.number(), v.finite()),
    max: v.pipe(v.number(), v.finite()),
    step: v.pipe(v.number(), v.finite()),
    direction: v.picklist(['high-is-good', 'low-is-good']),
  }),
  v.check((scale) => scaleProblems(scale).length === 0, 'the score scale cannot be used'),
  v.readonly(),
);

const texts = v.pipe(v.array(shortText), v.readonly());

const tally = v.pipe(
  v.object({
    scale: scoreScale,
    groupColumns: texts,
    weightDecimals: v.nullable(v.pipe(wholeNumber, v.maxValue(40))),
    cells: v.pipe(
      v.array(
        v.pipe(
          v.object({
            values: texts,
            counts: v.pipe(v.array(wholeNumber), v.readonly()),
            weights: v.nullable(v.pipe(v.array(unitText), v.readonly())),
            squares: v.nullable(v.pipe(v.array(unitText), v.readonly())),
            clusters: v.nullable(cellClustersSchema),
          }),
          v.readonly(),
        ),
      ),
      v.readonly(),
    ),
  }),
  v.readonly(),
);

/** One rule of the exclusion flow: how many rows it left out and which (the first 1 000 row numbers). */
const leftOut = v.pipe(
  v.object({ rule: v.picklist(LEFT_OUT_RULES), count: wholeNumber, rows: v.pipe(v.array(wholeNumber), v.readonly()) }),
  v.readonly(),
);

const source = v.pipe(
  v.object({
    /** People one by one from a file, counts from a file, or counts typed in. */
    kind: v.picklist(['people', 'counts', 'typed']),
    /** File name without its folder; empty for typed counts. */
    file: shortText,
    /** SHA-256 of the file's bytes (of the typed text for typed counts), lower-case hexadecimal. */
    sha256: v.pipe(v.string(), v.regex(/^[0-9a-f]{64}$/)),
    bytes: wholeNumber,
    rowsRead: wholeNumber,
    rowsKept: wholeNumber,
    leftOut: v.pipe(v.array(leftOut), v.readonly()),
    /** True when no scale was declared and its ends were taken from the scores. */
    scaleInferred: v.boolean(),
  }),
  v.check(
    (flow) => flow.rowsRead === flow.rowsKept + flow.leftOut.reduce((sum, rule) => sum + rule.count, 0),
    'rows read must equal rows kept and rows left out',
  ),
  v.readonly(),
);

/** How the cohort file is read: all of it the user's to change. */
const reading = v.pipe(
  v.object({
    layout: v.picklist(['people', 'counts']),
    encoding: v.picklist(['utf-8', 'utf-16le', 'utf-16be', 'windows-1252']),
    separator: v.picklist([',', ';', '\t', '|']),
    decimalMark: v.picklist(['.', ',']),
    /** False when the first row already holds data; columns are then called "column 1", "column 2" … */
    header: v.boolean(),
    /** Name of the workbook's sheet; null for text files. */
    sheet: v.nullable(shortText),
    roles: v.pipe(
      v.array(
        v.pipe(
          v.object({
            column: shortText,
            role: v.picklist(['score', 'count', 'weight', 'group', 'id', 'cluster', 'unused']),
          }),
          v.readonly(),
        ),
      ),
      v.readonly(),
    ),
    /** Texts that stand for "no score", compared after trimming. */
    missing: texts,
    /** Null: ends and step are taken from the scores. */
    scale: v.nullable(scoreScale),
    decisions: v.pipe(
      v.object({
        duplicateId: v.picklist(['keep-first', 'leave-out-all', 'keep-all']),
        raggedRow: v.picklist(['leave-out', 'keep-readable']),
        blankGroup: v.picklist(['leave-out', 'keep']),
        /** People whose cluster is not told: each a cluster of one, or left out. */
        blankCluster: v.picklist(['alone', 'leave-out']),
      }),
      v.readonly(),
    ),
  }),
  v.readonly(),
);

const groups = v.pipe(
  v.object({
    /** Columns whose values make the tables; empty for one table of everybody. */
    by: texts,
    /** Titles given by the user and groups that get no table; a group not named here has its own title and a table. */
    choices: v.pipe(
      v.array(v.pipe(v.object({ values: texts, title: shortText, printed: v.boolean() }), v.readonly())),
      v.readonly(),
    ),
    /** What a reader must know of the norm group; with all of it given the tables may be called norms. */
    documentation: v.pipe(
      v.object({
        population: longText,
        sampling: longText,
        participation: longText,
        testDates: shortText,
        weighting: longText,
      }),
      v.readonly(),
    ),
  }),
  v.readonly(),
);

const definition = v.pipe(
  v.variant('kind', [
    v.object({ kind: v.literal('midpoint') }),
    v.object({ kind: v.literal('at-or-below') }),
    v.object({ kind: v.literal('below') }),
    v.object({ kind: v.literal('plotting-position'), offset: v.pipe(v.string(), v.maxLength(20)) }),
    v.object({ kind: v.literal('grouped'), width: v.pipe(v.number(), v.finite(), v.gtValue(0)) }),
  ]),
  v.readonly(),
);

const curve = v.pipe(
  v.object({
    definition,
    /** How all groups are smoothed, and the groups that are smoothed in a way of their own. */
    smoothing: smoothingSchema,
    exceptions: v.pipe(
      v.array(v.pipe(v.object({ values: texts, smoothing: smoothingSchema }), v.readonly())),
      v.readonly(),
    ),
  }),
  v.readonly(),
);

const table = v.pipe(
  v.object({
    /** Columns beside raw score and percentile rank, in print order. */
    columns: v.pipe(v.array(v.picklist(COLUMN_KEYS)), v.readonly()),
    decimals: v.picklist([0, 1]),
    rounding: v.picklist(['half-up', 'half-even']),
    ends: v.picklist(['signs', 'held']),
    /** Where z comes from: Φ⁻¹ of the rank, or (x − mean)/SD. */
    zSource: v.picklist(['normalised', 'linear']),
    /** What stands in for the z that ranks 0 and 100 lack: the printed limit, or half a person. */
    zEnds: v.picklist(['limits', 'half-person']),
  }),
  v.readonly(),
);

const release = v.pipe(
  v.object({
    edition: v.pipe(v.string(), v.maxLength(40)),
    /** Date printed on every sheet, yyyy-mm-dd, or empty. */
    date: v.pipe(v.string(), v.regex(/^(\d{4}-\d{2}-\d{2})?$/)),
    answers: v.pipe(v.array(v.pipe(v.object({ query: longText, reason: longText }), v.readonly())), v.readonly()),
    /** Who made the tables and who checked them, as they sign; empty while they have not. */
    analyst: v.optional(shortText, ''),
    checker: v.optional(shortText, ''),
    /** What changed since an earlier edition, for the change list; null where none was compared. */
    changes: v.optional(
      v.nullable(
        v.pipe(
          v.object({
            edition: v.pipe(v.string(), v.maxLength(40)),
            date: v.pipe(v.string(), v.maxLength(10)),
            check: v.pipe(v.string(), v.maxLength(9)),
            lines: v.pipe(v.array(longText), v.readonly()),
          }),
          v.readonly(),
        ),
      ),
      null,
    ),
  }),
  v.readonly(),
);

export const PROJECT_FORMAT = 'normloom-project';
export const PROJECT_VERSION = 4;

export const normProjectSchema = v.pipe(
  v.object({
    format: v.literal(PROJECT_FORMAT),
    version: v.literal(PROJECT_VERSION),
    /** Name of the survey or test. */
    title: shortText,
    /** Form, season or whatever tells this cohort from others of the same test. */
    subtitle: shortText,
    people: v.picklist(['pupils', 'students', 'candidates', 'people']),
    source: v.nullable(source),
    reading: v.nullable(reading),
    tally: v.nullable(tally),
    groups,
    curve,
    precision: precisionSchema,
    table,
    sheet: sheetSchema,
    release,
    /** Raw scores that decide something, told in the booklet. */
    cuts: v.optional(cutsSchema, []),
    /** Values of the group whose table is meant where a class list does not say which; null: none is. */
    classTable: v.optional(v.nullable(texts), null),
    /** Printed ranks that somebody changed by hand. */
    adjustments: v.optional(adjustmentsSchema, []),
    /** Thresholds of the queries. */
    policy: v.optional(policySchema, DEFAULT_POLICY),
  }),
  v.check((project) => tallyFits(project), 'the tally does not fit its scale and columns'),
  v.readonly(),
);

export type NormProject = v.InferOutput<typeof normProjectSchema>;
export type CohortSource = NonNullable<NormProject['source']>;
export type LeftOut = CohortSource['leftOut'][number];
export type Documentation = NormProject['groups']['documentation'];
export type TableChoices = NormProject['table'];
export type PrecisionChoices = NormProject['precision'];
export type SheetChoices = NormProject['sheet'];
export type Cut = NormProject['cuts'][number];
export type PeopleNoun = NormProject['people'];

interface TallyBearing {
  readonly tally: v.InferOutput<typeof tally> | null;
  readonly groups: { readonly by: readonly string[] };
}

function tallyFits({ tally, groups }: TallyBearing): boolean {
  if (tally === null) return true;
  const length = Math.round((tally.scale.max - tally.scale.min) / tally.scale.step) + 1;
  const weighted = tally.weightDecimals !== null;
  return (
    groups.by.every((column) => tally.groupColumns.includes(column)) &&
    tally.cells.every((cell) => (cell.clusters === null) === (tally.cells[0]?.clusters === null)) &&
    tally.cells.every(
      (cell) =>
        clustersFit(cell) &&
        cell.values.length === tally.groupColumns.length &&
        cell.counts.length === length &&
        (weighted
          ? weighsWhereCounted(cell.counts, cell.weights) &&
            weighsWhereCounted(cell.counts, cell.squares) &&
            cell.counts.every((count, position) =>
              squaresFit(count, cell.weights?.[position], cell.squares?.[position]),
            )
          : cell.weights === null && cell.squares === null),
    )
  );
}

/** Sums of weights stand at exactly the scores that somebody obtained. */
function weighsWhereCounted(counts: readonly number[], sums: readonly string[] | null): boolean {
  return (
    sums !== null &&
    sums.length === counts.length &&
    counts.every((count, position) => count > 0 === /[1-9]/.test(sums[position] ?? ''))
  );
}

/** Squares of so many weights add up to at most the square of their sum, and to at least that square over the count. */
function squaresFit(count: number, weight = '0', squares = '0'): boolean {
  if (count === 0) return true;
  const square = BigInt(weight) ** 2n;
  const sum = BigInt(squares);
  return sum <= square && sum * BigInt(count) >= square;
}
