import Papa from 'papaparse';
import { pupilsInOrder, type ClassPrint } from '../../../../shared-core/pages/class-print.ts';
import { CellComparison, type FileReadBack } from '../../read-back/cell-differences.ts';
import { safeForCsv } from '../../safe-text.ts';
import { csvColumn, type CsvRecords } from '../class-csv.ts';
import { textFromTable } from './table-texts.ts';

/**
 * Reads the csv file of a class: every cell in its place, no line too many; and the pupils once more against the rows of
 * the table, where there is one.
 */
export function readClassCsv(
  file: string,
  bytes: Uint8Array,
  { heads, rows }: CsvRecords,
  print: ClassPrint | null,
): FileReadBack {
  const comparison = new CellComparison(file);
  const text = new TextDecoder('utf-8').decode(bytes).replace(/^\uFEFF/, '');
  const [foundHeads = [], ...lines] = Papa.parse<string[]>(text, { delimiter: ',', skipEmptyLines: true }).data;
  const compare = (line: number, column: string, expected: string, found: string, score = ''): void =>
    comparison.compare({ where: `line ${line}`, group: '', score, column }, expected, found);
  compare(1, 'number of columns', String(heads.length), String(foundHeads.length));
  heads.forEach((head, place) => compare(1, `heading ${place + 1}`, head, foundHeads[place] ?? ''));
  compare(1, 'number of lines', String(rows.length), String(lines.length));
  rows.forEach((row, index) => {
    row.forEach((cell, place) => compare(index + 2, heads[place] ?? '', cell, lines[index]?.[place] ?? ''));
  });
  if (print !== null) {
    pupilsInOrder(print).forEach((pupil, index) => {
      for (const key of ['percentile-rank', ...print.results.table.columns.map((column) => column.key)]) {
        const place = foundHeads.indexOf(csvColumn(key));
        const fromTable = textFromTable(pupil, key);
        if (place < 0 || fromTable === null) continue;
        compare(index + 2, csvColumn(key), safeForCsv(fromTable), lines[index]?.[place] ?? '', pupil.scoreText);
      }
    });
  }
  return comparison.result('class csv');
}
