import { figure, printWords } from '../../../../shared-core/languages/phrases.ts';
import type { PlacedPages } from '../../../../shared-core/pages/booklet.ts';
import { pupilsInOrder, type ClassPrint } from '../../../../shared-core/pages/class-print.ts';
import { slipKey } from '../../../../shared-core/pages/slip-pages.ts';
import { CellComparison, type FileReadBack } from '../../read-back/cell-differences.ts';
import { squeezed } from '../../read-back/read-text.ts';
import { readPlaced } from './read-placed.ts';
import { textFromTable } from './table-texts.ts';

const FIGURES = ['raw-score', 'percentile-rank', 'measurement-band'] as const;

/** Reads slips: every text of them, and the figures of each once more against the row that the table has for the raw score. */
export async function readSlips(
  file: string,
  bytes: Uint8Array,
  placed: PlacedPages,
  print: ClassPrint,
): Promise<FileReadBack> {
  const comparison = new CellComparison(file);
  const found = await readPlaced(comparison, bytes, placed);
  const words = printWords(print.file.slips.language);
  pupilsInOrder(print).forEach((pupil, index) => {
    FIGURES.forEach((key, column) => {
      if (key === 'measurement-band' && pupil.found.band === null) return;
      const where = { where: `slip ${index + 1}`, group: '', score: pupil.scoreText, column: key };
      const cell = found.cell(`${slipKey(index)} figures`, 0, column) ?? '';
      comparison.compare(where, squeezed(figure(words, textFromTable(pupil, key) ?? '')), cell);
    });
  });
  return comparison.result('slips');
}
