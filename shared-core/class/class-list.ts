import * as v from 'valibot';

const cell = v.pipe(v.string(), v.maxLength(400));

/** Rows that a class list may have. */
export const MOST_CLASS_ROWS = 2000;

const row = v.pipe(
  v.object({
    /** Line of the pasted text or row of the file, from 1; typed rows are numbered from 1. */
    line: v.pipe(v.number(), v.safeInteger(), v.minValue(1)),
    /** As they were written, without the space around them: a name that begins with "=" is that name. */
    name: cell,
    /** The pupil's code or number where the list has one beside the name, or instead of it. */
    code: cell,
    scoreText: cell,
    /** What the list says of the pupil's group; values of several columns with ", " between them. */
    group: cell,
    /** What stands in a column of its own about absence; empty where nothing does. */
    statusText: cell,
  }),
  v.readonly(),
);

export const classListSchema = v.pipe(
  v.object({
    /** How the scores of the list write decimals. */
    decimalMark: v.picklist(['.', ',']),
    rows: v.pipe(v.array(row), v.maxLength(MOST_CLASS_ROWS), v.readonly()),
  }),
  v.readonly(),
);

/** A class as it was typed, pasted or read: texts only, nothing judged yet. */
export type ClassList = v.InferOutput<typeof classListSchema>;
export type ClassListRow = ClassList['rows'][number];

/** Why a pupil has no score. */
export type MissedStatus = 'absent' | 'not-tested' | 'excused';
export type PupilStatus = 'tested' | MissedStatus;
