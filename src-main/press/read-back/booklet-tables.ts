import { ADJUSTED_MARK } from '../../../shared-core/norms/adjustment-words.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';
import type { TableColumn } from '../../../shared-core/norms/table-columns.ts';
import { squeezed, type PdfCell, type PdfLine } from './pdf-text.ts';
import { withPlainSpaces } from './plain-spaces.ts';

/** A table as it stands on a page: the heads, left to right, and the rows of all its columns of rows, in reading order. */
export interface BookletTable {
  readonly heads: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** Points by which right edges may differ. */
const EDGE = 1;
/** Baselines further apart than this, in type sizes, do not belong to one table: a row that is missing is no end of it. */
const ROW_REACH = 3.6;
const SAME_SIZE = 0.05;

/** The tables on a page: found by a line of heads, read downwards by the right edges of the heads. */
export function bookletTables(lines: readonly PdfLine[], columns: readonly TableColumn[]): readonly BookletTable[] {
  return lines.flatMap((line, at) => {
    if (!isHeadLine(line, columns)) return [];
    const edges = line.cells.map(({ right }) => right);
    const blocks: (readonly string[])[][] = Array.from({ length: edges.length / columns.length }, () => []);
    for (const row of rowLines(lines, at)) {
      const cells = edges.map(() => '');
      for (const cell of row.cells) {
        const edge = edges.findIndex((right) => endOf(cell) <= right + EDGE);
        const place = edge < 0 ? edges.length - 1 : edge;
        cells[place] = `${cells[place] ?? ''}${withPlainSpaces(cell.text)}`;
      }
      blocks.forEach((block, index) => {
        const own = cells.slice(index * columns.length, (index + 1) * columns.length);
        if (own.some((text) => text !== '')) block.push(own);
      });
    }
    return [{ heads: headsOf(lines, at, columns), rows: blocks.flat() }];
  });
}

/** Where the figures of a cell end; the mark of an adjusted rank may hang beyond them. */
function endOf({ text, right, size }: PdfCell): number {
  return text.endsWith(ADJUSTED_MARK) ? right - textWidth(ADJUSTED_MARK, 'sans', size) : right;
}

/** The last lines of all heads, once or several times over; half of them may be misprinted. */
function isHeadLine({ cells }: PdfLine, columns: readonly TableColumn[]): boolean {
  if (cells.length === 0 || cells.length % columns.length !== 0) return false;
  const same = cells.filter((cell, index) => {
    const heading = columns[index % columns.length]?.heading.at(-1) ?? '';
    return squeezed(cell.text) === squeezed(heading);
  });
  return same.length * 2 >= cells.length;
}

/** Each head with the line above it, which ends at the same edge. */
function headsOf(lines: readonly PdfLine[], at: number, columns: readonly TableColumn[]): readonly string[] {
  return (lines[at]?.cells ?? []).map((cell, index) => {
    const twoLines = (columns[index % columns.length]?.heading.length ?? 1) > 1;
    const above = twoLines ? aboveCell(lines[at - 1], cell) : null;
    return withPlainSpaces(above === null ? cell.text : `${above.text} ${cell.text}`);
  });
}

function aboveCell(line: PdfLine | undefined, below: PdfCell): PdfCell | null {
  return line?.cells.find(({ right }) => Math.abs(right - below.right) <= EDGE) ?? null;
}

/** Lines in the type of the first row, until the next is out of reach. */
function rowLines(lines: readonly PdfLine[], at: number): readonly PdfLine[] {
  const size = lines[at + 1]?.cells[0]?.size ?? 0;
  const rows: PdfLine[] = [];
  let above = lines[at]?.baseline ?? 0;
  for (const line of lines.slice(at + 1)) {
    const sameType = line.cells.every((cell) => Math.abs(cell.size - size) < SAME_SIZE);
    if (!sameType || above - line.baseline > ROW_REACH * size) break;
    rows.push(line);
    above = line.baseline;
  }
  return rows;
}
