import { ADJUSTED_MARK } from '../../../shared-core/norms/adjustment-words.ts';
import type { SheetChoices } from '../../../shared-core/norms/norm-project.ts';
import { chosenType } from '../../../shared-core/pages/table-type.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';
import type { PdfCell, PdfLine } from './pdf-text.ts';
import { withPlainSpaces } from './read-text.ts';

/** Points by which edges may differ. */
export const EDGE = 1;
/** Baselines further apart than this, in rows, do not belong to one table: a row that is missing is no end of it. */
const ROWS_APART = 3.5;
export const SAME_SIZE = 0.05;

/** Points from one row of a table to another that still belongs to it. */
export function rowReach(sheet: SheetChoices): number {
  return ROWS_APART * chosenType(sheet).row.leading;
}

/**
 * The rows below a line of heads, from the top, one text for each column: lines in the type of the first of them, whose
 * every cell stands within a column that ends at one of the edges, until the next is out of reach.
 */
export function rowsBelow(
  lines: readonly PdfLine[],
  at: number,
  edges: readonly number[],
  reach: number,
): readonly (readonly string[])[] {
  const size = lines[at + 1]?.cells[0]?.size ?? 0;
  const rows: (readonly string[])[] = [];
  let above = lines[at]?.baseline ?? 0;
  for (const line of lines.slice(at + 1)) {
    const sameType = line.cells.every((cell) => Math.abs(cell.size - size) < SAME_SIZE);
    const row = inColumns(line, edges);
    if (row === null || !sameType || above - line.baseline > reach) break;
    rows.push(row);
    above = line.baseline;
  }
  return rows;
}

/** The texts of a line by the columns that they stand in; null where one reaches over the edge of a column. */
function inColumns({ cells }: PdfLine, edges: readonly number[]): readonly string[] | null {
  const texts = edges.map(() => '');
  for (const cell of cells) {
    const column = edges.findIndex((right) => endOf(cell) <= right + EDGE);
    const before = edges[column - 1];
    if (column < 0 || (before !== undefined && cell.left < before - EDGE)) return null;
    texts[column] = `${texts[column] ?? ''}${withPlainSpaces(cell.text)}`;
  }
  return texts;
}

/** Where the figures of a cell end; the mark of an adjusted rank may hang beyond them. */
export function endOf({ text, right, size }: PdfCell): number {
  return text.endsWith(ADJUSTED_MARK) ? right - textWidth(ADJUSTED_MARK, 'sans', size) : right;
}

/** The cell of a line that ends at an edge. */
export function cellEndingAt(line: PdfLine | undefined, right: number): PdfCell | null {
  return line?.cells.find((cell) => Math.abs(cell.right - right) <= EDGE) ?? null;
}
