import * as v from 'valibot';
import { COLUMN_KEYS } from '../norms/column-keys.ts';
import { decimalOf } from '../scale/decimal.ts';
import { placeOnGrid, scaleGrid, scaleProblems, type ScoreScale } from '../scale/score-scale.ts';

/**
 * What the pupils of a class are looked up in: one or more conversion tables as they are printed, from a project, a
 * released edition or a published table. Plain readonly data that stands in a class file; nothing in it is a person.
 */

const shortText = v.pipe(v.string(), v.maxLength(400));
const longText = v.pipe(v.string(), v.maxLength(8000));
const number = v.pipe(v.number(), v.finite());
const percent = v.pipe(number, v.minValue(0), v.maxValue(100));
const texts = v.pipe(v.array(shortText), v.readonly());

/** The key of a column that a published table brings along: "column-1". */
const PUBLISHED_COLUMN = /^column-[1-9]\d?$/;

const columnKey = v.union([v.picklist(COLUMN_KEYS), v.pipe(v.string(), v.regex(PUBLISHED_COLUMN))]);

const column = v.pipe(
  v.object({
    key: columnKey,
    /** One line, as in "T score". */
    name: shortText,
    /** The same as a heading of one or two lines. */
    heading: texts,
  }),
  v.readonly(),
);

const row = v.pipe(
  v.object({
    /** Raw-score points; both ends belong to the row and are the same where it stands for one score. */
    low: number,
    high: number,
    /** "27", or "25–27". */
    scoreText: shortText,
    /** The percentile rank as it is printed: "63", "<1", with † where it was adjusted by hand. */
    printed: v.pipe(v.string(), v.regex(/^[<>]?\d{1,3}(?:\.\d{1,40})?\u2020?$/)),
    /** The rank 0–100 before rounding where that is known, as printed in a published table; null for "<1" and ">99" there. */
    rank: v.nullable(percent),
    /** Normal curve equivalent, not rounded, held as the table holds it; null where there is none. */
    nce: v.nullable(number),
    /** Measurement band: its printed text and its ends as percentile ranks 0–100; null without a reliability. */
    band: v.nullable(v.pipe(v.object({ text: shortText, low: percent, high: percent }), v.readonly())),
    /** Printed text by the key of the column: every column of the table has one. */
    texts: v.pipe(v.record(v.string(), shortText), v.readonly()),
  }),
  v.check(({ low, high }) => low <= high, 'a range of scores ends before it begins'),
  v.readonly(),
);

const group = v.pipe(
  v.object({
    /** One value for each grouping column. */
    values: texts,
    /** "Grade 5". */
    title: longText,
    /** People that the table was made from; null where that is not known. */
    n: v.nullable(v.pipe(v.number(), v.safeInteger(), v.minValue(0))),
    /** Whom the group stands for, in words; may be empty. */
    population: longText,
    /** What is said under the table of ranks adjusted by hand; empty where there are none. */
    note: v.string(),
    /** Lowest score first, without gaps on the steps of the scale. */
    rows: v.pipe(v.array(row), v.minLength(1), v.readonly()),
  }),
  v.readonly(),
);

export const classTableSchema = v.pipe(
  v.object({
    source: v.picklist(['project', 'edition', 'published']),
    title: shortText,
    /** Form, season or whatever tells it from other tables of the same test. */
    form: shortText,
    edition: shortText,
    /** yyyy-mm-dd, or empty. */
    date: shortText,
    /** Check code of the norm set; empty for a published table. */
    check: shortText,
    /** True where the norm set was a draft: every page says so. */
    draft: v.boolean(),
    /** Where a published table is printed; empty for others. */
    cited: longText,
    /** What a rank counts, to stand behind "the share of the group scoring"; empty where it is not known. */
    definition: shortText,
    /** The same for sentences that are chosen by it: kind of a rank definition, or `unknown`. */
    definitionKind: v.picklist(['midpoint', 'at-or-below', 'below', 'plotting-position', 'grouped', 'unknown']),
    /** What the people of the table may be called. */
    groupNoun: v.picklist(['norm group', 'sample']),
    groupColumns: texts,
    groups: v.pipe(v.array(group), v.minLength(1), v.readonly()),
    /** Columns beside raw score and percentile rank, in print order; the measurement band among them where there is one. */
    columns: v.pipe(v.array(column), v.readonly()),
    /** Lowest and highest score that the table knows, and the step; of a published table as its rows show them. */
    scale: v.pipe(
      v.object({ min: number, max: number, step: number, direction: v.picklist(['high-is-good', 'low-is-good']) }),
      v.check((scale) => scaleProblems(scale).length === 0, 'the score scale cannot be used'),
      v.readonly(),
    ),
    /** Reliability of the test, 0–1, and the level of the measurement band in per cent; null where none is given. */
    reliability: v.nullable(v.pipe(number, v.minValue(0), v.maxValue(1))),
    level: v.nullable(percent),
    /** Values of the group that is meant where a class list does not say which; null: none is. */
    defaultGroup: v.nullable(texts),
    /** Fewest people in a printed cell of counts, cells of 0 not meant. */
    smallestCell: v.pipe(v.number(), v.safeInteger(), v.minValue(0)),
    peopleNoun: v.picklist(['pupils', 'students', 'candidates', 'people']),
  }),
  v.check(
    ({ columns }) => new Set(columns.map(({ key }) => key)).size === columns.length,
    'a column stands in it twice',
  ),
  v.check(
    ({ columns, groups }) =>
      groups.every(({ rows }) =>
        rows.every(
          ({ texts }) =>
            Object.keys(texts).length === columns.length && columns.every(({ key }) => texts[key] !== undefined),
        ),
      ),
    'the texts of a row are not those of the columns',
  ),
  v.check(
    ({ scale, groups }) => groups.every(({ rows }) => rowsFit(scale, rows)),
    'the rows of a group do not fit the scale',
  ),
  v.readonly(),
);

interface RowEnds {
  readonly low: number;
  readonly high: number;
}

/** From the lowest score to the highest without gaps, so that every score of the scale has one row. */
function rowsFit(scale: ScoreScale, rows: readonly RowEnds[]): boolean {
  if (scaleProblems(scale).length > 0) return true; // told already
  const grid = scaleGrid(scale);
  const place = (score: number): number => {
    const found = placeOnGrid(grid, decimalOf(score));
    return typeof found === 'number' ? found : NaN;
  };
  const next = rows.reduce((expected, { low, high }) => (place(low) === expected ? place(high) + 1 : NaN), 0);
  return next === grid.length;
}

export type ClassTable = v.InferOutput<typeof classTableSchema>;
export type ClassTableGroup = ClassTable['groups'][number];
export type ClassTableRow = ClassTableGroup['rows'][number];
export type ClassTableColumn = ClassTable['columns'][number];
