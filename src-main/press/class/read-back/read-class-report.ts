import { figure, printWords, type PrintWords } from '../../../../shared-core/languages/phrases.ts';
import type { PlacedPages } from '../../../../shared-core/pages/booklet.ts';
import { pupilsInOrder, type ClassPrint, type StandingPrint } from '../../../../shared-core/pages/class-print.ts';
import { pupilColumns } from '../../../../shared-core/pages/class-pupils-table.ts';
import { standingColumns, standingInOrder } from '../../../../shared-core/pages/class-standing-table.ts';
import { missingCharacters } from '../../../../shared-core/pages/text-width.ts';
import { CellComparison, type FileReadBack } from '../../read-back/cell-differences.ts';
import { squeezed } from '../../read-back/read-text.ts';
import { readPlaced, type FoundTexts } from './read-placed.ts';
import { textFromTable } from './table-texts.ts';

/**
 * Reads a class report: every text of it, and every cell of the pupils' table once against the results of the class and
 * once against the row that the table has for the raw score. Columns that the page had no room for are not in the file.
 */
export async function readClassReport(
  file: string,
  bytes: Uint8Array,
  placed: PlacedPages,
  print: ClassPrint,
): Promise<FileReadBack> {
  const comparison = new CellComparison(file);
  const found = await readPlaced(comparison, bytes, placed);
  const words = printWords(print.file.report.language);
  const columns = pupilColumns(print, words);
  pupilsInOrder(print).forEach((pupil, row) => {
    columns.forEach((column, place) => {
      const cell = cellOf(found, 'pupils', row, place);
      if (cell === null) return;
      const where = { where: `pupil ${row + 1}`, group: '', score: pupil.scoreText, column: column.key };
      const printed = inPrint(column.textOf(pupil), column.kind, words);
      if (isDrawn(printed)) comparison.compare(where, squeezed(printed), cell);
      const fromTable = textFromTable(pupil, column.key);
      if (fromTable !== null) comparison.compare(where, squeezed(figure(words, fromTable)), cell);
    });
  });
  return comparison.result('class report');
}

/** The same of a class without a table. */
export async function readClassStanding(
  file: string,
  bytes: Uint8Array,
  placed: PlacedPages,
  print: StandingPrint,
): Promise<FileReadBack> {
  const comparison = new CellComparison(file);
  const found = await readPlaced(comparison, bytes, placed);
  const words = printWords(print.file.report.language);
  const columns = standingColumns(print, words);
  standingInOrder(print).forEach((pupil, row) => {
    columns.forEach(({ key, kind, textOf }, place) => {
      const printed = inPrint(textOf(pupil), kind, words);
      const where = { where: `pupil ${row + 1}`, group: '', score: pupil.scoreText, column: key };
      if (isDrawn(printed)) comparison.compare(where, squeezed(printed), found.cell('standing', row, place) ?? '');
    });
  });
  return comparison.result('class standing');
}

/** A report that names nobody: every text of it. */
export async function readClassSummary(file: string, bytes: Uint8Array, placed: PlacedPages): Promise<FileReadBack> {
  const comparison = new CellComparison(file);
  await readPlaced(comparison, bytes, placed);
  return comparison.result('class summary');
}

/** A cell as it was found; null of a column that was left out, and nothing of a row that is not there. */
function cellOf(found: FoundTexts, table: string, row: number, column: number): string | null {
  return found.cell(table, row, column) ?? (column === 0 ? '' : null);
}

function inPrint(text: string, kind: 'words' | 'figures', words: PrintWords): string {
  return (kind === 'figures' ? figure(words, text) : text).normalize('NFC');
}

/** False where a typeface lacks a sign, which is read back as some other; the line is compared without it. */
function isDrawn(text: string): boolean {
  return missingCharacters(text, 'sans').length === 0 && missingCharacters(text, 'sans-bold').length === 0;
}
