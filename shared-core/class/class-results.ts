import type { NamedNumber } from '../norms/five-numbers.ts';
import type { FiveNumbers } from '../tally/cohort-summary.ts';
import type { ClassListRow, MissedStatus } from './class-list.ts';
import type { ClassTable, ClassTableGroup, ClassTableRow } from './class-table.ts';

/** A quarter of the norm group by printed rank: 1–24, 25–49, 50–74, 75–99. */
export type Quarter = 1 | 2 | 3 | 4;

/** A pupil with a score that the table holds. */
export interface PupilResult {
  /** Place in the list, from 0: the pupil's key in codes and pages. */
  readonly index: number;
  readonly row: ClassListRow;
  /** Name as printed, after corrections; the code where the list has no name. */
  readonly name: string;
  /** As the list names it; empty where it names none. */
  readonly group: string;
  /** Raw-score points, and as printed. */
  readonly score: number;
  readonly scoreText: string;
  /** The table and its row that the score was found in: every printed text of the pupil is one of the row's. */
  readonly table: ClassTableGroup;
  readonly found: ClassTableRow;
  readonly quarter: Quarter;
}

/** A pupil without a score, and why. */
export interface PupilMissed {
  readonly index: number;
  readonly row: ClassListRow;
  readonly name: string;
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

export interface QuarterCount {
  readonly quarter: Quarter;
  /** "1–24". */
  readonly ranks: string;
  readonly count: number;
}

/** The class in numbers; all texts as printed. */
export interface ClassFacts {
  /** Pupils reported. */
  readonly n: number;
  /** Lowest, lower hinge, median, upper hinge, highest raw score; null for nobody. */
  readonly fiveNumbers: readonly NamedNumber[] | null;
  /** The same as raw-score points for the box plot; null below five pupils, whose scores are listed instead. */
  readonly boxPlot: FiveNumbers | null;
  /** Why there is no box plot, in a sentence; null where there is one. */
  readonly boxProblem: string | null;
  /** Every score obtained, lowest first, with how many have it. */
  readonly scores: readonly { readonly score: number; readonly scoreText: string; readonly count: number }[];
  /** Lowest quarter first; always four. */
  readonly quarters: readonly QuarterCount[];
}

export interface ComparedGroup {
  readonly group: string;
  readonly n: number;
  /** Raw scores; null in a group of fewer than two. */
  readonly median: string | null;
  readonly mean: string | null;
  /** Mean of the normal curve equivalents; null in a group of fewer than two or where somebody has none. */
  readonly nceMean: string | null;
}

export interface GroupComparison {
  /** In order of the groups' names; groups are those that the list names. */
  readonly groups: readonly ComparedGroup[];
  /** True where at least one group has a mean of normal curve equivalents. */
  readonly hasNce: boolean;
  /** Why a mean is missing, in sentences; empty where none is. */
  readonly remarks: readonly string[];
}

/** Every number that pages, slips and files of a class print. */
export interface ClassResults {
  readonly table: ClassTable;
  /** In order of the list. */
  readonly pupils: readonly PupilResult[];
  readonly missed: readonly PupilMissed[];
  readonly leftOut: readonly PupilSetAside[];
  readonly open: readonly PupilSetAside[];
  readonly counts: ClassCounts;
  readonly facts: ClassFacts;
  /** Null where the list names fewer than two groups. */
  readonly comparison: GroupComparison | null;
  /** "7F3A-91C2", of everything printed but names and codes: it says nothing of who is who. */
  readonly check: string;
}

export type ClassResultsBuilt =
  { readonly ok: true; readonly results: ClassResults } | { readonly ok: false; readonly problem: string };
