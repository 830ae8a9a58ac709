import type { TableColumn } from '../../../shared-core/norms/table-columns.ts';
import { cellEndingAt, rowsBelow } from './column-rows.ts';
import type { PdfCell, PdfLine } from './pdf-text.ts';
import { squeezed, withPlainSpaces } from './read-text.ts';

/** A table as it stands on a page: the heads, left to right, and the rows of all its columns of rows, in reading order. */
export interface BookletTable {
  readonly heads: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** The conversion tables on a page: found by a line of heads, read downwards by the right edges of the heads. */
export function bookletTables(
  lines: readonly PdfLine[],
  columns: readonly TableColumn[],
  reach: number,
): readonly BookletTable[] {
  return lines.flatMap((line, at) => {
    if (!isHeadLine(line, columns)) return [];
    const edges = line.cells.map(({ right }) => right);
    const rows = rowsBelow(lines, at, edges, reach);
    const blocks = Array.from({ length: edges.length / columns.length }, (_, index) =>
      rows
        .map((row) => row.slice(index * columns.length, (index + 1) * columns.length))
        .filter((own) => own.some((text) => text !== '')),
    );
    return [{ heads: headsOf(lines, at, columns), rows: blocks.flat() }];
  });
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

/** Each head with the lines above it, which end at the same edge. */
function headsOf(lines: readonly PdfLine[], at: number, columns: readonly TableColumn[]): readonly string[] {
  return (lines[at]?.cells ?? []).map((cell, index) => {
    const above = (columns[index % columns.length]?.heading.length ?? 1) - 1;
    const found = Array.from({ length: above }, (_, up) => cellEndingAt(lines[at - above + up], cell.right));
    const all = [...found, cell].filter((line): line is PdfCell => line !== null);
    return withPlainSpaces(all.map(({ text }) => text).join(' '));
  });
}
