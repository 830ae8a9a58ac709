import * as v from 'valibot';
import { languageSchema } from '../norms/sheet-schema.ts';
import { LARGEST_SEED } from '../precision/seeded-random.ts';
import { classListSchema } from './class-list.ts';
import { classTableSchema } from './class-table.ts';

/**
 * Everything of one class: the table, the list, the answers and how it is printed, one JSON file (`*.normclass`). It is
 * the only file of the program that holds names, unless the user presses pages with names.
 */

const shortText = v.pipe(v.string(), v.maxLength(400));
const longText = v.pipe(v.string(), v.maxLength(8000));
const texts = v.pipe(v.array(shortText), v.readonly());

const answer = v.pipe(
  v.object({
    /** Id of the question: another thing asked has another id. */
    question: shortText,
    /** Key of the choice. */
    choice: longText,
    /** What was typed anew where the choice is `value`; empty otherwise. */
    value: shortText,
  }),
  v.readonly(),
);

/** `list` is the order of the list; `score` and `rank` begin with the best. */
export const CLASS_SORTS = ['list', 'name', 'score', 'rank', 'group'] as const;

export const SHARING = ['names', 'codes', 'summary'] as const;

const paper = v.picklist(['a4', 'letter', 'a5']);

const report = v.pipe(
  v.object({
    paper,
    sort: v.picklist(CLASS_SORTS),
    /** Keys of the table's columns that are printed beside raw score and percentile rank. */
    columns: texts,
    language: languageSchema,
  }),
  v.readonly(),
);

const slips = v.pipe(
  v.object({
    paper,
    perPage: v.picklist([1, 2, 3, 4]),
    language: languageSchema,
    /** Sentences put in place of the standing ones, by their keys. */
    texts: v.pipe(v.array(v.pipe(v.object({ key: shortText, text: longText }), v.readonly())), v.readonly()),
  }),
  v.readonly(),
);

const sharing = v.pipe(
  v.object({
    /** With names, with codes in random order, or as a summary without pupils. */
    as: v.picklist(SHARING),
    /** Of the order and the codes. */
    seed: v.pipe(v.number(), v.safeInteger(), v.minValue(0), v.maxValue(LARGEST_SEED)),
  }),
  v.readonly(),
);

export const CLASS_FORMAT = 'normloom-class';
export const CLASS_VERSION = 1;

export const classFileSchema = v.pipe(
  v.object({
    format: v.literal(CLASS_FORMAT),
    version: v.literal(CLASS_VERSION),
    /** "Class 5a". */
    title: shortText,
    /** Date of testing, yyyy-mm-dd, or empty. */
    date: v.pipe(v.string(), v.regex(/^(\d{4}-\d{2}-\d{2})?$/)),
    people: v.picklist(['pupils', 'students', 'candidates', 'people']),
    /** Null: there is no table, and the class is only put in order within itself. */
    table: v.nullable(classTableSchema),
    /** Values of the table for pupils whose row names no group; null: the table's default, if it has one. */
    group: v.nullable(texts),
    /** Which end is good in the standing within the class, where there is no table. */
    direction: v.picklist(['high-is-good', 'low-is-good']),
    list: classListSchema,
    answers: v.pipe(v.array(answer), v.readonly()),
    report,
    slips,
    sharing,
  }),
  v.readonly(),
);

export type ClassFile = v.InferOutput<typeof classFileSchema>;
export type ClassAnswer = ClassFile['answers'][number];
export type ReportChoices = ClassFile['report'];
export type SlipChoices = ClassFile['slips'];
export type SharingChoices = ClassFile['sharing'];
