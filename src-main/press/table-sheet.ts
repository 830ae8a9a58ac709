import type { Worksheet } from 'exceljs';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { cellText, draftTitle, editionLine, sheetTitle } from '../../shared-core/pages/sheet-texts.ts';
import { inFives } from '../../shared-core/pages/row-blocks.ts';
import type { TableSheetLayout } from './table-layout.ts';
import { rankCell, typedCell } from './typed-cell.ts';
import { UNROUNDED_FORMAT } from './unrounded-columns.ts';
import { asBold, asHead, fillCell, proseRow, ruleBelow, titleRow } from './workbook-look.ts';
import { colophonRow, setUpPages } from './workbook-pages.ts';

const COLUMN_WIDTH = 11;
const HEAD_LINES = 3;
/** Text over a narrow table may be wider than the table. */
const FEWEST_PROSE_COLUMNS = 6;

/** One group's table: what it is, its cautions, and a row of typed cells for each attainable score. */
export function fillTableSheet(
  sheet: Worksheet,
  normSet: NormSet,
  norms: GroupNorms,
  { prose, columns, unrounded, width, headRow, firstRow, lastRow }: TableSheetLayout,
): void {
  const { project } = normSet;
  const proseColumns = Math.max(width, FEWEST_PROSE_COLUMNS);
  const across = proseColumns * COLUMN_WIDTH;
  sheet.columns = Array.from({ length: proseColumns }, () => ({ width: COLUMN_WIDTH }));
  titleRow(sheet, draftTitle(normSet, sheetTitle(project, norms)), proseColumns, across);
  prose.forEach((text, index) => proseRow(sheet, index + 2, text, proseColumns, across));
  const heads = [
    ...columns.map(({ heading }) => heading.join(' ').replace('- ', '')),
    ...unrounded.map(({ head }) => head),
  ];
  heads.forEach((head, index) => {
    const cell = sheet.getCell(headRow, index + 1);
    cell.value = head;
    asHead(cell);
  });
  sheet.getRow(headRow).height = 14 * HEAD_LINES;
  const endsFive = new Set(
    inFives(norms.rows, norms.group.table.scale, ({ score }) => score).map((five) => five.at(-1)?.score),
  );
  norms.rows.forEach((row, index) => {
    const at = firstRow + index;
    columns.forEach((column, place) => {
      const cell = sheet.getCell(at, place + 1);
      fillCell(cell, column.key === 'rank' ? rankCell(row) : typedCell(cellText(row, column)));
      if (place === 0) asBold(cell);
    });
    unrounded.forEach(({ valueOf }, place) => {
      const value = valueOf(row);
      if (value === null) return;
      fillCell(sheet.getCell(at, columns.length + 1 + place), { kind: 'number', value, format: UNROUNDED_FORMAT });
    });
    const last = index === norms.rows.length - 1;
    if (!endsFive.has(row.score)) return;
    for (let place = 1; place <= width; place += 1) ruleBelow(sheet.getCell(at, place), last ? 'strong' : 'fine');
  });
  colophonRow(sheet, lastRow + 2, normSet, proseColumns, across);
  sheet.views = [{ state: 'frozen', xSplit: 1, ySplit: headRow, topLeftCell: `B${firstRow}`, activeCell: 'A1' }];
  setUpPages(sheet, project.sheet, editionLine(normSet, norms), across);
  sheet.pageSetup.printArea = `A$1:${sheet.getColumn(proseColumns).letter}$${lastRow + 2}`;
  sheet.pageSetup.printTitlesRow = `${headRow}:${headRow}`;
}
