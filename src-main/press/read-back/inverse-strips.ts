import { say, type PrintWords } from '../../../shared-core/languages/phrases.ts';
import type { PdfCell, PdfLine } from './pdf-text.ts';
import { squeezed } from './read-text.ts';

/** A percentile of the inverse table with the raw score below it. */
interface InverseCell {
  readonly percentile: string;
  readonly score: string;
}

/** Label and figures of one line differ in size; their baselines lie this close, in points. */
const SAME_LINE = 2.5;
const NEXT_LINE = 16;
/** Points by which right edges of a percentile and its score may differ. */
const EDGE = 1;

/** The inverse tables on a page: a line of percentiles, and below each the raw score that ends at the same edge. */
export function inverseOn(lines: readonly PdfLine[], words: PrintWords): readonly InverseCell[] {
  const rank = squeezed(say(words, 'inverse.percentile-rank'));
  const labels = [say(words, 'inverse.lowest'), say(words, 'inverse.highest')].map(squeezed);
  const cells = lines.flatMap((line) => line.cells);
  return cells
    .filter(({ text }) => squeezed(text) === rank)
    .flatMap((label) => {
      const below = cells.find(
        ({ text, left, baseline }) =>
          labels.includes(squeezed(text)) &&
          Math.abs(left - label.left) <= EDGE &&
          label.baseline - baseline > SAME_LINE &&
          label.baseline - baseline < NEXT_LINE,
      );
      if (below === undefined) return [];
      const scores = beside(cells, below);
      return beside(cells, label).map(({ text, right }) => ({
        percentile: text,
        score: scores.find((score) => Math.abs(score.right - right) <= EDGE)?.text ?? '',
      }));
    });
}

function beside(cells: readonly PdfCell[], label: PdfCell): readonly PdfCell[] {
  return cells.filter((cell) => cell.left > label.right && Math.abs(cell.baseline - label.baseline) < SAME_LINE);
}
