import type { Workbook } from 'exceljs';
import { ENGLISH_WORDS } from '../../../shared-core/languages/phrases.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../../shared-core/norms/table-columns.ts';
import { markedText } from '../../../shared-core/pages/sheet-texts.ts';
import { FIRST_RESULT_ROW, GROUP_CELL, LOOK_UP, LOOK_UP_ROWS, SCORE_CELL } from '../look-up-sheet.ts';
import { distinctTitles } from '../sheet-names.ts';
import type { CellComparison } from './cell-differences.ts';
import { shownCell } from './shown-cell.ts';

/** The rows behind the look-up, in place, and the row that the look-up shows as an example. */
export function readLookUp(comparison: CellComparison, workbook: Workbook, normSet: NormSet): void {
  const sheet = workbook.getWorksheet(LOOK_UP);
  const list = workbook.getWorksheet(LOOK_UP_ROWS);
  const missing = [...(sheet === undefined ? [LOOK_UP] : []), ...(list === undefined ? [LOOK_UP_ROWS] : [])];
  for (const name of missing)
    comparison.compare({ where: 'workbook', group: '', score: '', column: 'sheet' }, name, '');
  if (sheet === undefined || list === undefined) return;
  const { groups, project } = normSet;
  const titles = distinctTitles(groups.map(({ group }) => group.title));
  const columns = tableColumns(project).filter(({ key }) => key !== 'score');
  let at = 1;
  groups.forEach(({ rows, group }, index) => {
    for (const row of rows) {
      at += 1;
      const expected = [
        ['group', titles[index] ?? ''],
        ['raw score', String(row.score)],
        ...columns.map((column) => [column.name, markedText(ENGLISH_WORDS, row, column)]),
      ];
      expected.forEach(([column = '', text = ''], place) => {
        const cell = list.getCell(at, place + 1);
        const where = `${LOOK_UP_ROWS}!${cell.address}`;
        const found = shownCell(cell);
        const asText =
          column === 'raw score' && typeof cell.value !== 'number' ? `${found}, not held as a number` : found;
        comparison.compare({ where, group: group.title, score: row.scoreText, column }, text, asText);
      });
    }
  });
  const title = shownCell(sheet.getCell(GROUP_CELL));
  const score = sheet.getCell(SCORE_CELL).value;
  const chosen = groups[titles.indexOf(title)];
  const row = chosen?.rows.find((each) => each.score === score);
  const place = { where: LOOK_UP, group: title, score: shownCell(sheet.getCell(SCORE_CELL)) };
  if (row === undefined) {
    comparison.compare({ ...place, column: 'group and raw score' }, titles[0] ?? '', title);
    return;
  }
  columns.forEach((column, index) => {
    const cell = sheet.getCell(FIRST_RESULT_ROW + index, 2);
    const where = `${LOOK_UP}!${cell.address}`;
    comparison.compare(
      { ...place, where, column: column.name },
      markedText(ENGLISH_WORDS, row, column),
      shownCell(cell),
    );
  });
}
