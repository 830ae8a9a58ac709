import ExcelJS, { type Cell, type Worksheet } from 'exceljs';
import { ENGLISH_WORDS } from '../../../shared-core/languages/phrases.ts';
import type { NormSet } from '../../../shared-core/norms/norm-set.ts';
import { tableColumns } from '../../../shared-core/norms/table-columns.ts';
import { draftTitle, markedText, sheetTitle } from '../../../shared-core/pages/sheet-texts.ts';
import { unroundedColumns } from '../unrounded-columns.ts';
import { CellComparison, type CellPlace, type FileReadBack } from './cell-differences.ts';
import { readLookUp } from './read-look-up.ts';
import { isPrintedNumber, shownCell } from './shown-cell.ts';

/** The heads of a table stand within so many rows below its title. */
const HEAD_REACH = 40;

/**
 * Reads a workbook as a spreadsheet program shows it. For each group: the sheet with its title, every head, and every
 * cell in place, numbers as numbers and texts as texts; then the rows behind the look-up and what the look-up shows.
 */
export async function readWorkbook(file: string, bytes: Uint8Array, normSet: NormSet): Promise<FileReadBack> {
  const comparison = new CellComparison(file);
  const workbook = new ExcelJS.Workbook();
  await workbook.xlsx.load(Uint8Array.from(bytes).buffer);
  const left = [...workbook.worksheets];
  normSet.groups.forEach((norms, group) => {
    const title = draftTitle(normSet, sheetTitle(normSet.project, norms));
    const at = left.findIndex((sheet) => sheet.getCell(1, 1).value === title);
    const [sheet] = at < 0 ? [] : left.splice(at, 1);
    const place = { where: sheet?.name ?? 'workbook', group: norms.group.title, score: '', column: 'title' };
    comparison.compare(place, title, sheet === undefined ? '' : title);
    if (sheet !== undefined) readTable(comparison, sheet, normSet, group);
  });
  readLookUp(comparison, workbook, normSet);
  return comparison.result('workbook');
}

function readTable(comparison: CellComparison, sheet: Worksheet, normSet: NormSet, group: number): void {
  const norms = normSet.groups[group];
  if (norms === undefined) return;
  const columns = tableColumns(normSet.project);
  const unrounded = unroundedColumns(normSet.project, norms);
  const heads = [
    ...columns.map(({ heading }) => heading.join(' ').replace('- ', '')),
    ...unrounded.map(({ head }) => head),
  ];
  const headRow = headRowOf(sheet, heads);
  const place = (row: number, column: number, score: string): CellPlace => ({
    where: `${sheet.name}!${sheet.getCell(row, column).address}`,
    group: norms.group.title,
    score,
    column: columns[column - 1]?.name ?? unrounded[column - 1 - columns.length]?.head ?? '',
  });
  heads.forEach((head, index) => {
    comparison.compare(place(headRow, index + 1, ''), head, shownCell(sheet.getCell(headRow, index + 1)));
  });
  norms.rows.forEach((row, index) => {
    const at = headRow + 1 + index;
    columns.forEach((column, position) => {
      const cell = sheet.getCell(at, position + 1);
      comparePrinted(comparison, place(at, position + 1, row.scoreText), markedText(ENGLISH_WORDS, row, column), cell);
    });
    unrounded.forEach(({ valueOf }, position) => {
      const cell = sheet.getCell(at, columns.length + 1 + position);
      const value = valueOf(row);
      const expected = value === null ? '' : String(value);
      const found = typeof cell.value === 'number' ? String(cell.value) : shownCell(cell);
      comparison.compare(place(at, columns.length + 1 + position, row.scoreText), expected, found);
    });
  });
  const after = sheet.getCell(headRow + 1 + norms.rows.length, 1);
  if (typeof after.value === 'number') {
    comparison.compare(place(headRow + 1 + norms.rows.length, 1, ''), '', shownCell(after));
  }
}

/** The row where most of the heads stand. */
function headRowOf(sheet: Worksheet, heads: readonly string[]): number {
  const found = (row: number): number =>
    heads.filter((head, index) => sheet.getCell(row, index + 1).value === head).length;
  let best = 1;
  for (let row = 2; row <= HEAD_REACH; row += 1) if (found(row) > found(best)) best = row;
  return best;
}

/** A printed text that is a number must be held as one; what is shown must be the printed text either way. */
function comparePrinted(comparison: CellComparison, place: CellPlace, expected: string, cell: Cell): void {
  const found = shownCell(cell);
  const wrongType = found === expected && isPrintedNumber(expected) !== (typeof cell.value === 'number');
  comparison.compare(place, expected, wrongType ? `${found}, not held as a number` : found);
}
