import * as v from 'valibot';
import { LANGUAGE_TAG } from '../languages/language-tag.ts';
import { ENGLISH_NUMBERS } from '../languages/number-format.ts';
import { BLOCK_KINDS, DEFAULT_BLOCKS } from './booklet-blocks.ts';
import { SHEET_LENGTHS } from './sheet-lengths.ts';

const shortText = v.pipe(v.string(), v.maxLength(400));
const longText = v.pipe(v.string(), v.maxLength(8000));

function lengthFrom([least, most]: readonly [number, number]) {
  return v.pipe(v.number(), v.minValue(least), v.maxValue(most));
}

const blocks = v.pipe(
  v.array(
    v.pipe(
      v.object({
        kind: v.picklist(BLOCK_KINDS),
        printed: v.boolean(),
        /** Empty: the standing heading, or the standing text, in the language of the booklet. */
        heading: shortText,
        text: longText,
      }),
      v.readonly(),
    ),
  ),
  v.check((listed) => new Set(listed.map(({ kind }) => kind)).size === listed.length, 'a block stands in it twice'),
  v.readonly(),
);

/** How numbers are written in print. */
const numbers = v.pipe(
  v.object({
    decimalMark: v.picklist(['.', ',']),
    thousands: v.picklist(['narrow-space', 'comma', 'point', 'apostrophe', 'none']),
    minus: v.picklist(['minus', 'hyphen']),
    dateOrder: v.picklist(['yyyy-mm-dd', 'dd.mm.yyyy', 'dd/mm/yyyy', 'mm/dd/yyyy']),
  }),
  v.readonly(),
);

/** The language of something printed: its tag, its words and how its numbers are written. */
export const languageSchema = v.pipe(
  v.object({
    /** Tag of the language of the booklet (BCP 47): it decides how a screen reader speaks. */
    tag: v.pipe(v.string(), v.regex(LANGUAGE_TAG)),
    /** The words that ship with the program and are printed where no others are given. */
    words: v.picklist(['en', 'de', 'es', 'fr']),
    numbers,
    /** Printed words put in place of those that ship. */
    phrases: v.pipe(
      v.array(v.pipe(v.object({ key: v.pipe(v.string(), v.maxLength(80)), text: longText }), v.readonly())),
      v.readonly(),
    ),
  }),
  v.readonly(),
);

/** Words and numbers as they are printed in English. */
export const ENGLISH_LANGUAGE: v.InferOutput<typeof languageSchema> = {
  tag: 'en',
  words: 'en',
  numbers: ENGLISH_NUMBERS,
  phrases: [],
};

/** How everything is set where nothing else was chosen, in the order of the schema; lengths of type in points. */
export const DEFAULT_SETTING = {
  gutterMm: 0,
  rowType: 8.7,
  rowHeight: 12.4,
  fives: true,
  rangeRows: false,
  fillToFours: false,
} as const;

export const sheetSchema = v.pipe(
  v.object({
    paper: v.picklist(['a4', 'letter', 'a5']),
    orientation: v.picklist(['portrait', 'landscape']),
    tableColumns: v.picklist([1, 2, 3, 4]),
    /** White space at every edge, millimetres; null for what is usual on the paper. */
    marginMm: v.optional(v.nullable(lengthFrom(SHEET_LENGTHS.marginMm)), null),
    /** More of it at the edge that is bound: left on odd pages, right on even ones. */
    gutterMm: v.optional(lengthFrom(SHEET_LENGTHS.gutterMm), DEFAULT_SETTING.gutterMm),
    /** Size of the figures, and from one row to the next, points. */
    rowType: v.optional(lengthFrom(SHEET_LENGTHS.rowType), DEFAULT_SETTING.rowType),
    rowHeight: v.optional(lengthFrom(SHEET_LENGTHS.rowHeight), DEFAULT_SETTING.rowHeight),
    /** Rows stand in fives. */
    fives: v.optional(v.boolean(), DEFAULT_SETTING.fives),
    /** Neighbouring scores that print alike stand in one row: "23–25". */
    rangeRows: v.optional(v.boolean(), DEFAULT_SETTING.rangeRows),
    /** Blank pages fill the booklet to a multiple of four, for folding and stitching. */
    fillToFours: v.optional(v.boolean(), DEFAULT_SETTING.fillToFours),
    /** Title before the group's name. */
    title: shortText,
    /** Beside each table. */
    howToRead: longText,
    cautions: longText,
    notes: longText,
    ogive: v.boolean(),
    /** The inverse table beside each table: the lowest raw score that reaches each of some percentiles. */
    inverse: v.boolean(),
    /** What the booklet is made of, in print order; kinds that are not listed are not printed. */
    blocks: v.optional(blocks, DEFAULT_BLOCKS),
    language: v.optional(languageSchema, ENGLISH_LANGUAGE),
  }),
  v.readonly(),
);
