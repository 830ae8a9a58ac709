import type { Worksheet } from 'exceljs';
import { ADJUSTED_MARK, adjustmentNote } from '../../shared-core/norms/adjustment-words.ts';
import type { GroupNorms } from '../../shared-core/norms/group-norms.ts';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../shared-core/norms/table-columns.ts';
import { cautionsOf, smoothingSentence } from '../../shared-core/pages/group-method.ts';
import {
  cellText,
  draftTitle,
  editionLine,
  sampleFacts,
  sheetSubtitle,
  sheetTitle,
  surveyName,
} from '../../shared-core/pages/sheet-texts.ts';
import { inFives } from '../../shared-core/pages/table-rows.ts';
import { typedCell, type TypedCell } from './typed-cell.ts';
import { UNROUNDED_FORMAT, unroundedColumns } from './unrounded-columns.ts';
import { asBold, asHead, asTitle, fillCell, proseRow, ruleBelow, setUpPages } from './workbook-look.ts';

const COLUMN_WIDTH = 11;
const HEAD_LINES = 3;

/** One group's table: what it is, its cautions, and a row of typed cells for each attainable score. */
export function fillTableSheet(sheet: Worksheet, normSet: NormSet, norms: GroupNorms): void {
  const { project } = normSet;
  const columns = tableColumns(project);
  const unrounded = unroundedColumns(project, norms);
  const width = columns.length + unrounded.length;
  sheet.columns = Array.from({ length: width }, () => ({ width: COLUMN_WIDTH }));
  const prose = [
    surveyName(project),
    `${sheetSubtitle(project)}.`,
    sampleFacts(project, norms),
    smoothingSentence(project, norms),
    `${editionLine(normSet, norms)}.`,
    project.sheet.howToRead,
    cautionsOf(project),
    project.sheet.notes,
    adjustmentNote(norms) ?? '',
  ].filter((text) => text.trim() !== '');
  sheet.getCell(1, 1).value = draftTitle(normSet, sheetTitle(project, norms));
  asTitle(sheet.getCell(1, 1));
  prose.forEach((text, index) => proseRow(sheet, index + 2, text, width, width * COLUMN_WIDTH));
  const headRow = prose.length + 3;
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
  const endsFive = new Set(inFives(norms.rows, norms.group.table.scale).map((five) => five.at(-1)?.score));
  norms.rows.forEach((row, index) => {
    const at = headRow + 1 + index;
    columns.forEach((column, place) => {
      const cell = sheet.getCell(at, place + 1);
      const typed = typedCell(cellText(row, column));
      fillCell(cell, column.key === 'rank' && row.adjusted !== null ? marked(typed) : typed);
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
  const lastRow = headRow + norms.rows.length;
  sheet.views = [{ state: 'frozen', xSplit: 1, ySplit: headRow, topLeftCell: `B${headRow + 1}`, activeCell: 'A1' }];
  setUpPages(sheet, project.sheet, editionLine(normSet, norms));
  sheet.pageSetup.printArea = `A1:${sheet.getColumn(width).letter}${lastRow}`;
  sheet.pageSetup.printTitlesRow = `${headRow}:${headRow}`;
}

/** A rank adjusted by hand stays a number: its format shows the mark. */
function marked(typed: TypedCell): TypedCell {
  return typed.kind === 'text'
    ? { kind: 'text', value: `${typed.value}${ADJUSTED_MARK}` }
    : { ...typed, format: `${typed.format.split(';')[0] ?? ''}"${ADJUSTED_MARK}"` };
}
