import { checkCodeOf } from '../norms/check-code.ts';
import { printScore } from '../scores/printed-number.ts';
import type { ClassFile } from './class-file.ts';
import {
  rowsOfClass,
  type ClassCounts,
  type ClassRows,
  type PupilMissed,
  type PupilSetAside,
  type ScoredPupil,
} from './class-rows.ts';
import type { ClassTable, ClassTableGroup, ClassTableRow } from './class-table.ts';
import { compareGroups, type GroupComparison } from './group-comparison.ts';
import { quarterCounts, quarterOf, type Quarter, type QuarterCount } from './rank-quarters.ts';
import { scoreFacts, type ScoreFacts } from './score-facts.ts';

/** A pupil with a score that the table holds. */
export interface PupilResult extends ScoredPupil {
  /** The table and the row of it that the score was found in: every printed text of the pupil is one of the row's. */
  readonly table: ClassTableGroup;
  readonly found: ClassTableRow;
  readonly quarter: Quarter;
}

/** The class in numbers: raw scores, and how many fill each quarter of the norm group. */
export interface ClassFacts extends ScoreFacts {
  readonly quarters: readonly QuarterCount[];
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
  /**
   * "7F3A-91C2", of everything printed but names and codes, so that it does not tell who is who. It is made from every
   * single score: pages that leave cells out, such as a summary, need a code of their own texts and may not print it.
   */
  readonly check: string;
}

export type ClassResultsBuilt =
  { readonly ok: true; readonly results: ClassResults } | { readonly ok: false; readonly problem: string };

/** Looks up every pupil that can be, and describes the class. Any class will do, also one of which nobody was tested. */
export function classResults(file: ClassFile): ClassResultsBuilt {
  const { table, people } = file;
  if (table === null) {
    return {
      ok: false,
      problem: 'There is no table to look the scores up in. Choose one, or report the standing within the class.',
    };
  }
  const rows = rowsOfClass(file);
  const pupils = rows.scored.map(({ sorted, outcome }): PupilResult => {
    const { index, row, name } = sorted;
    const { score, corrected, found } = outcome;
    if (found === null) throw new RangeError('a score that was not looked up');
    const scoreText = printScore(table.scale, score);
    const quarter = quarterOf(found.row.printed);
    return {
      index,
      row,
      name,
      group: row.group,
      score,
      scoreText,
      corrected,
      table: found.table,
      found: found.row,
      quarter,
    };
  });
  const facts: ClassFacts = {
    ...scoreFacts(
      table.scale,
      pupils.map(({ score }) => score),
      people,
    ),
    quarters: quarterCounts(pupils.map(({ found }) => found.printed)),
  };
  const compared = pupils.map(({ group, score, found }) => ({ group, score, nce: found.nce }));
  const comparison = compareGroups(compared, table.scale, people);
  const check = checkOf(file, table, pupils, rows, facts, comparison);
  const { missed, leftOut, open, counts } = rows;
  return { ok: true, results: { table, pupils, missed, leftOut, open, counts, facts, comparison, check } };
}

function checkOf(
  { title, date, people }: ClassFile,
  table: ClassTable,
  pupils: readonly PupilResult[],
  { missed, counts }: ClassRows,
  facts: ClassFacts,
  comparison: GroupComparison | null,
): string {
  return checkCodeOf([
    [title, date, people],
    [table.title, table.form, table.edition, table.date, table.check, table.cited, table.definition, table.draft],
    [table.reliability, table.level, table.columns.map(({ name }) => name)],
    pupils.map(({ group, scoreText, table: { title: looked }, found }) => [
      group,
      scoreText,
      looked,
      found.printed,
      found.band?.text ?? '',
      table.columns.map(({ key }) => found.texts[key] ?? ''),
    ]),
    missed.map(({ group, status }) => [group, status]),
    counts,
    [facts.fiveNumbers, facts.quarters],
    comparison,
  ]);
}
