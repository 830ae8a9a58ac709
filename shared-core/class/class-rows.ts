import type { ClassFile } from './class-file.ts';
import type { ClassListRow, MissedStatus } from './class-list.ts';
import { sortClass, type RowOutcome, type SortedRow } from './sorted-class.ts';

/** A pupil who has a score. */
export interface ScoredPupil {
  /** Place in the list, from 0: the pupil's key in codes and pages. */
  readonly index: number;
  readonly row: ClassListRow;
  /** As printed, after corrections; the code where the list has no name. */
  readonly name: string;
  /** As the list names it; empty where it names none. */
  readonly group: string;
  /** Raw-score points, and as printed. */
  readonly score: number;
  readonly scoreText: string;
  /** True where the score was typed anew in an answer. */
  readonly corrected: boolean;
}

/** A pupil without a score, and why. */
export interface PupilMissed {
  /** Place in the list, from 0: the pupil's key in codes and pages. */
  readonly index: number;
  readonly row: ClassListRow;
  readonly name: string;
  /** As the list names it; empty where it names none. */
  readonly group: string;
  readonly status: MissedStatus;
}

/** A row that is not reported: by an answer, or as long as a question about it is open. */
export interface PupilSetAside {
  readonly index: number;
  readonly row: ClassListRow;
  readonly name: string;
  /** In a sentence. */
  readonly why: string;
}

/** Rows of the list = reported + absent + notTested + excused + leftOut + open, always. */
export interface ClassCounts {
  readonly rows: number;
  readonly reported: number;
  readonly absent: number;
  readonly notTested: number;
  readonly excused: number;
  readonly leftOut: number;
  readonly open: number;
}

export type Scored = Extract<RowOutcome, { readonly kind: 'scored' }>;

/** The rows of a class by what becomes of them, each in order of the list. */
export interface ClassRows {
  readonly scored: readonly { readonly sorted: SortedRow; readonly outcome: Scored }[];
  readonly missed: readonly PupilMissed[];
  readonly leftOut: readonly PupilSetAside[];
  readonly open: readonly PupilSetAside[];
  readonly counts: ClassCounts;
}

export function rowsOfClass(file: ClassFile): ClassRows {
  const { rows } = sortClass(file);
  const scored: { readonly sorted: SortedRow; readonly outcome: Scored }[] = [];
  const missed: PupilMissed[] = [];
  const leftOut: PupilSetAside[] = [];
  const open: PupilSetAside[] = [];
  for (const sorted of rows) {
    const { outcome, index, row, name } = sorted;
    switch (outcome.kind) {
      case 'scored':
        scored.push({ sorted, outcome });
        break;
      case 'missed':
        missed.push({ index, row, name, group: row.group, status: outcome.status });
        break;
      case 'left-out':
        leftOut.push({ index, row, name, why: outcome.why });
        break;
      case 'open':
        open.push({ index, row, name, why: outcome.why });
        break;
    }
  }
  const of = (status: MissedStatus): number => missed.filter((one) => one.status === status).length;
  return {
    scored,
    missed,
    leftOut,
    open,
    counts: {
      rows: rows.length,
      reported: scored.length,
      absent: of('absent'),
      notTested: of('not-tested'),
      excused: of('excused'),
      leftOut: leftOut.length,
      open: open.length,
    },
  };
}
