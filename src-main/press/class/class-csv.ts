import { printWords } from '../../../shared-core/languages/phrases.ts';
import { peopleRows, standingRows, type PeopleRows } from '../../../shared-core/pages/class-people-rows.ts';
import type { ClassPrint, StandingPrint } from '../../../shared-core/pages/class-print.ts';
import { classSummary, toldCounts, type ClassSummary } from '../../../shared-core/pages/class-summary.ts';
import { safeForCsv } from '../safe-text.ts';

/** A csv file before it is written: the texts of its cells, safe for spreadsheet programs. */
export interface CsvRecords {
  readonly heads: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** Columns that hold what no table prints; all others hold printed texts. */
const PLAIN: ReadonlySet<string> = new Set(['name', 'code', 'group', 'table', 'raw-score', 'place', 'per-cent']);
const RANK = 'percentile-rank';

/** The name of a column of the pupils in a csv file: `printed` is the percentile rank, as in `tables.csv`. */
export function csvColumn(key: string): string {
  if (PLAIN.has(key)) return key;
  return key === RANK ? 'printed' : `printed-${key}`;
}

/**
 * Everybody of a class list, one to a line: who, group, table where there are several, raw score, the printed texts of
 * the report, why somebody has none, and the check codes of table and report. Texts are those of the table, with the
 * decimal point.
 */
export function classRecords(print: ClassPrint): CsvRecords {
  const { table, check } = print.results;
  return peopleRecords(peopleRows(print, printWords(print.file.report.language)), [
    ['table-check', table.check],
    ['table-status', table.draft ? 'draft' : ''],
    ['report-check', check],
  ]);
}

/** The same of a class without a table. */
export function standingRecords(print: StandingPrint): CsvRecords {
  const { check } = print.standing;
  return peopleRecords(standingRows(print, printWords(print.file.report.language)), [['report-check', check]]);
}

function peopleRecords({ columns, rows }: PeopleRows, facts: readonly (readonly [string, string])[]): CsvRecords {
  return {
    heads: [...columns.map(({ key }) => csvColumn(key)), 'status', ...facts.map(([name]) => name)],
    rows: rows.map(({ texts, score, status }) => [
      ...texts.map((text, place) =>
        columns[place]?.key === 'raw-score' ? (score === null ? '' : String(score)) : safeForCsv(text),
      ),
      status,
      ...facts.map(([, value]) => value),
    ]),
  };
}

const SUMMARY_COLUMNS = [
  'group',
  'ranks-1-24',
  'ranks-25-49',
  'ranks-50-74',
  'ranks-75-99',
  'tested',
  'absent',
  'not-tested',
  'excused',
  'listed',
] as const;

const HIDDEN = 'hidden';
const WHOLE_CLASS = 'whole-class';

/** The counts of a summary that may be told; those without a group stand in a line whose group is empty. */
export function summaryRecords(print: ClassPrint): CsvRecords {
  const summary = classSummary(print);
  return {
    heads: [...SUMMARY_COLUMNS, 'report-check'],
    rows: toldRecords(summary).map((record) => [...record, summary.check]),
  };
}

function toldRecords({ counts, groups }: ClassSummary): readonly (readonly string[])[] {
  const record = (label: string, row: readonly (number | null)[]): readonly string[] => [
    safeForCsv(label),
    ...row.map((count) => (count === null ? HIDDEN : String(count))),
  ];
  switch (counts.kind) {
    case 'nothing':
      return [];
    case 'class-only':
      return [record(WHOLE_CLASS, toldCounts(counts.together))];
    case 'table':
      return [
        ...groups.map((group, index) => {
          const row = counts.rows[index];
          if (row === undefined) throw new RangeError('a group without counts');
          return record(group ?? '', toldCounts(row));
        }),
        record(WHOLE_CLASS, toldCounts(counts.together)),
      ];
  }
}
