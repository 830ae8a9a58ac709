import ExcelJS, { type Cell, type Worksheet } from 'exceljs';
import { pupilsInOrder, type ClassPrint } from '../../../../shared-core/pages/class-print.ts';
import { pupilColumns } from '../../../../shared-core/pages/class-pupils-table.ts';
import type { ClassSheet, ClassSheets } from '../../../../shared-core/pages/class-sheets.ts';
import { printWords } from '../../../../shared-core/languages/phrases.ts';
import { CellComparison, type FileReadBack } from '../../read-back/cell-differences.ts';
import { isPrintedNumber, shownCell } from '../../read-back/shown-cell.ts';
import { HEAD_ROW, SUBTITLE_ROW, subtitleOf } from '../class-workbook.ts';
import { textFromTable } from './table-texts.ts';

/** First row of the paragraphs of a sheet without heads. */
const FIRST_PARAGRAPH = 3;

/**
 * Reads the workbook of a class as a spreadsheet program shows it: every cell of every sheet, numbers as numbers and texts
 * as texts; and the pupils once more against the rows of the table, where there is one.
 */
export async function readClassWorkbook(
  file: string,
  bytes: Uint8Array,
  content: ClassSheets,
  print: ClassPrint | null,
): Promise<FileReadBack> {
  const comparison = new CellComparison(file);
  const workbook = new ExcelJS.Workbook();
  await workbook.xlsx.load(Uint8Array.from(bytes).buffer);
  const count = Math.max(content.sheets.length, workbook.worksheets.length);
  comparison.compare(
    { where: 'workbook', group: '', score: '', column: 'sheets' },
    String(content.sheets.length),
    String(workbook.worksheets.length),
  );
  for (let index = 0; index < count; index += 1) {
    const [sheet, found] = [content.sheets[index], workbook.worksheets[index]];
    if (sheet !== undefined && found !== undefined) readSheet(comparison, found, sheet, content);
  }
  const [people] = workbook.worksheets;
  if (print !== null && people !== undefined) readPupils(comparison, people, print);
  return comparison.result('class workbook');
}

function readSheet(comparison: CellComparison, found: Worksheet, sheet: ClassSheet, content: ClassSheets): void {
  const { title, heads, kinds, rows } = sheet;
  const compare = (row: number, column: number, expected: string, kind: 'words' | 'figures'): void => {
    const cell = found.getCell(row, column);
    const place = { where: `${found.name}!${cell.address}`, group: '', score: '', column: heads[column - 1] ?? '' };
    comparison.compare(place, expected, foundIn(cell, expected, kind));
  };
  compare(1, 1, title, 'words');
  compare(SUBTITLE_ROW, 1, subtitleOf(sheet, content), 'words');
  heads.forEach((head, place) => compare(HEAD_ROW, place + 1, head, 'words'));
  const first = heads.length === 0 ? FIRST_PARAGRAPH : HEAD_ROW + 1;
  rows.forEach((row, index) => {
    row.forEach((text, place) => compare(first + index, place + 1, text, kinds[place] ?? 'words'));
  });
  compare(first + rows.length, 1, '', 'words');
}

/** Every printed text of every pupil, looked up in the table by the raw score alone. */
function readPupils(comparison: CellComparison, found: Worksheet, print: ClassPrint): void {
  const columns = pupilColumns(print, printWords(print.file.report.language));
  pupilsInOrder(print).forEach((pupil, row) => {
    columns.forEach(({ key }, place) => {
      const fromTable = textFromTable(pupil, key);
      if (fromTable === null) return;
      const cell = found.getCell(HEAD_ROW + 1 + row, place + 1);
      const where = { where: `${found.name}!${cell.address}`, group: '', score: pupil.scoreText, column: key };
      comparison.compare(where, fromTable, foundIn(cell, fromTable, 'figures'));
    });
  });
}

/** A figure that is a number must be held as one, and a text never; what is shown must be the printed text either way. */
function foundIn(cell: Cell, expected: string, kind: 'words' | 'figures'): string {
  const found = shownCell(cell);
  if (found !== expected || expected === '') return found;
  const isNumber = kind === 'figures' && isPrintedNumber(expected);
  if (isNumber === (typeof cell.value === 'number')) return found;
  return `${found}, ${isNumber ? 'not held as a number' : 'not held as a text'}`;
}
