import type { EditionComparison, GroupChange, RowChange } from '../../shared-core/norms/edition-compare.ts';
import type { ChangedPerson, FollowedRoster } from '../../shared-core/norms/erratum-roster.ts';
import { personInWords } from '../../shared-core/norms/erratum.ts';
import { csvFile } from '../press/csv-records.ts';
import { safeForCsv } from '../press/safe-text.ts';

/** Every printed cell in which two editions differ, a line each; an empty cell where only one of them has the row. */
export function changedCellsCsv({ groups }: EditionComparison): Uint8Array {
  return csvFile([['group', 'raw-score', 'column', 'before', 'after'], ...groups.flatMap(groupRecords)]);
}

function groupRecords(group: GroupChange): readonly (readonly string[])[] {
  const title = safeForCsv(group.title);
  switch (group.kind) {
    case 'came':
      return [[title, '', 'table', '', 'printed']];
    case 'went':
      return [[title, '', 'table', 'printed', '']];
    case 'changed':
      return group.rows.flatMap((row) => rowRecords(row).map((cells) => [title, safeForCsv(row.scoreText), ...cells]));
  }
}

function rowRecords(row: RowChange): readonly (readonly string[])[] {
  switch (row.kind) {
    case 'changed':
      return row.cells.map(({ column, before, after }) => [column, safeForCsv(before), safeForCsv(after)]);
    case 'came':
      return row.cells.map(({ column, text }) => [column, '', safeForCsv(text)]);
    case 'went':
      return row.cells.map(({ column, text }) => [column, safeForCsv(text), '']);
  }
}

/** The people of a roster whom a new edition concerns, a line for each thing that changes, and those not found. */
export function peopleCsv({ cut, changed, unplaced }: FollowedRoster): Uint8Array {
  return csvFile([
    ['row', 'person', 'group', 'raw-score', 'what', 'before', 'after', 'remark'],
    ...changed.flatMap((person) =>
      personRecords(person, cut?.text ?? '').map((record) => [
        String(person.of.row),
        safeForCsv(personInWords(person.of)),
        safeForCsv(person.group),
        safeForCsv(person.scoreText),
        ...record.map(safeForCsv),
      ]),
    ),
    ...unplaced.map(({ of, problem }) => [
      String(of.row),
      safeForCsv(personInWords(of)),
      safeForCsv(of.values.join(', ')),
      safeForCsv(of.score),
      ...['not found', '', '', safeForCsv(problem)],
    ]),
  ]);
}

function personRecords({ cells, side, crossed }: ChangedPerson, cut: string): readonly (readonly string[])[] {
  const sideOf = (good: boolean): string => (good ? 'good side' : 'other side');
  return [
    ...cells.map(({ column, before, after }) => [column, before, after, '']),
    ...(side === null ? [] : [[`side of rank ${cut}`, side.before, side.after, '']]),
    ...crossed.map(({ name, before, after, nowGood }) => [
      `side of cut ${name}`,
      sideOf(!nowGood),
      sideOf(nowGood),
      `cut score ${before} → ${after}`,
    ]),
  ];
}
