import type { DecimalMark } from '../scale/decimal.ts';

/** What a column of a class list holds. Several columns may hold parts of the name, and several the group. */
export const CLASS_ROLES = ['name', 'code', 'score', 'group', 'status', 'unused'] as const;

export type ClassRole = (typeof CLASS_ROLES)[number];

/** How a class list is read: all of it guessed at first, shown, and the teacher's to change. */
export interface ClassReading {
  readonly decimalMark: DecimalMark;
  /** Line of the heading: rows above it are passed over. Null where the first row is a pupil already. */
  readonly headingLine: number | null;
  /** One for each column. */
  readonly roles: readonly ClassRole[];
}
