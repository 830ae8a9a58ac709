import type { Worksheet } from 'exceljs';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../shared-core/norms/table-columns.ts';
import {
  cellText,
  editionLine,
  sampleFacts,
  sheetSubtitle,
  sheetTitle,
  surveyName,
} from '../../shared-core/pages/sheet-texts.ts';
import { inFives } from '../../shared-core/pages/table-rows.ts';
import { typedCell } from './typed-cell.ts';
import { asBold, asHead, asTitle, fillCell, proseRow, ruleBelow, setUpPages } from './workbook-look.ts';

const COLUMN_WIDTH = 11;
const UNROUNDED_FORMAT = '0.000000';

/** One group's table: what it is, its cautions, and a row of typed cells for each attainable score. */
export function fillTableSheet(sheet: Worksheet, normSet: NormSet, norms: GroupNorms): void {
  const { project } = normSet;
  const columns = tableColumns(project);
  const width = columns.length + 1;
  sheet.columns = Array.from({ length: width }, () => ({ width: COLUMN_WIDTH }));
  const prose = [
    surveyName(project),
    `${sheetSubtitle(project)}.`,
    sampleFacts(project, norms),
    `${editionLine(normSet, norms)}.`,
    project.sheet.howToRead,
    project.sheet.cautions,
    project.sheet.notes,
  ].filter((text) => text.trim() !== '');
  sheet.getCell(1, 1).value = sheetTitle(project, norms);
  asTitle(sheet.getCell(1, 1));
  prose.forEach((text, index) => proseRow(sheet, index + 2, text, width, width * COLUMN_WIDTH));
  const headRow = prose.length + 3;
  [...columns.map(({ heading }) => heading.join(' ').replace('- ', '')), 'Rank, unrounded'].forEach((head, index) => {
    const cell = sheet.getCell(headRow, index + 1);
    cell.value = head;
    asHead(cell);
  });
  sheet.getRow(headRow).height = 28;
  const endsFive = new Set(inFives(norms.rows, norms.group.table.scale).map((five) => five.at(-1)?.score));
  norms.rows.forEach((row, index) => {
    const at = headRow + 1 + index;
    columns.forEach((column, place) => {
      const cell = sheet.getCell(at, place + 1);
      fillCell(cell, typedCell(cellText(row, column)));
      if (place === 0) asBold(cell);
    });
    fillCell(sheet.getCell(at, width), { kind: 'number', value: row.percentileRank, format: UNROUNDED_FORMAT });
    const last = index === norms.rows.length - 1;
    if (!endsFive.has(row.score)) return;
    for (let place = 1; place <= width; place += 1) ruleBelow(sheet.getCell(at, place), last ? 'strong' : 'fine');
  });
  const lastRow = headRow + norms.rows.length;
  sheet.views = [{ state: 'frozen', xSplit: 1, ySplit: headRow, topLeftCell: `B${headRow + 1}`, activeCell: 'A1' }];
  setUpPages(sheet, project.sheet, editionLine(normSet, norms));
  sheet.pageSetup.printArea = `A1:${sheet.getColumn(width).letter}${lastRow}`;
  sheet.pageSetup.printTitlesRow = `${headRow}:${headRow}`;
}
