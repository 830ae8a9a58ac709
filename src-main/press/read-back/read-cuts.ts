import type { Workbook } from 'exceljs';
import { cutTables } from '../../../shared-core/norms/cut-table.ts';
import { cutName } from '../../../shared-core/norms/cuts.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { CUTS, CUTS_HEAD_ROW, cutSheetColumns } from '../cuts-sheet.ts';
import { ADJUSTED_MARK } from '../../../shared-core/norms/adjustment-words.ts';
import { printedTitle } from '../../../shared-core/pages/sheet-texts.ts';
import type { CellComparison } from './cell-differences.ts';
import { shownCell } from './shown-cell.ts';

/** The sheet of the cuts: heads, and a row for each cut and group, as a spreadsheet program shows them. */
export function readCuts(comparison: CellComparison, workbook: Workbook, normSet: NormSet): void {
  const { project, groups } = normSet;
  const sheet = workbook.getWorksheet(CUTS);
  if (project.cuts.length === 0) return;
  const heads = cutSheetColumns(normSet).map(({ head }) => head);
  const titles = groups.map(({ group }) => printedTitle(project, group));
  const rows = cutTables(project, groups).flatMap(({ cut, scoreText, rows: own }) =>
    own.map((row) => ({
      group: row.title,
      cut: cutName(cut),
      score: scoreText,
      texts: [
        cut.name.trim(),
        scoreText,
        titles[row.group] ?? '',
        row.n,
        `${row.rank}${row.row === null || row.row.adjusted === null ? '' : ADJUSTED_MARK}`,
        ...(row.interval === null ? [] : [row.interval]),
        row.shareText,
      ],
    })),
  );
  const found = (row: number, column: number): string =>
    sheet === undefined ? '' : shownCell(sheet.getCell(row, column));
  heads.forEach((head, index) => {
    const place = { where: `${CUTS}!${address(CUTS_HEAD_ROW, index)}`, group: '', score: '', column: 'heading' };
    comparison.compare(place, head, found(CUTS_HEAD_ROW, index + 1));
  });
  rows.forEach(({ group, cut, score, texts }, position) => {
    const at = CUTS_HEAD_ROW + 1 + position;
    texts.forEach((text, index) => {
      const column = `${heads[index] ?? ''} at the cut ${cut}`;
      comparison.compare({ where: `${CUTS}!${address(at, index)}`, group, score, column }, text, found(at, index + 1));
    });
  });
  const after = CUTS_HEAD_ROW + 1 + rows.length;
  const place = { where: `${CUTS}!${address(after, 0)}`, group: '', score: '', column: 'cut' };
  comparison.compare(place, '', found(after, 1));
}

function address(row: number, column: number): string {
  return `${String.fromCharCode(65 + column)}${row}`;
}
