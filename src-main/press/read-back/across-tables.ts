import { cellEndingAt, EDGE, rowsBelow } from './column-rows.ts';
import type { PdfCell, PdfLine } from './pdf-text.ts';
import { squeezed } from './read-text.ts';

/** Columns of groups beside heads of rows, as they stand on a page. */
export interface AcrossColumns {
  /** For each group from left to right, its title and the note under it, without spaces. */
  readonly heads: readonly { readonly title: string; readonly note: string }[];
  /** From the top: the head of each row, a cell for each group, and the head at the right edge where there is one. */
  readonly rows: readonly AcrossCells[];
}

interface AcrossCells {
  readonly head: string;
  readonly cells: readonly string[];
  readonly again: string | null;
}

/** How a table with the groups across is headed: above the heads of its rows, and under the titles of groups. */
export interface AcrossHeads {
  /** The last of the lines. */
  readonly rowHead: string;
  readonly isNote: (text: string) => boolean;
}

/** Most lines of a title, and the room between two of them in sizes of type. */
const MOST_TITLE_LINES = 8;
const TITLE_LEADING = 1.6;

/** The tables with the groups across on a page: found by a line that holds the head of the rows and notes of groups. */
export function acrossTables(lines: readonly PdfLine[], heads: AcrossHeads, reach: number): readonly AcrossColumns[] {
  return lines.flatMap((line, at) => {
    const places = headPlaces(line, heads);
    if (places.length === 0) return [];
    const edges = line.cells.map(({ right }) => right);
    const rows = rowsBelow(lines, at, edges, reach);
    return places.map(({ first, groups, again }) => ({
      heads: line.cells.slice(first + 1, first + 1 + groups).map((note) => ({
        title: titleAbove(lines, at, note),
        note: squeezed(note.text),
      })),
      rows: rows
        .map((row) => ({
          head: row[first] ?? '',
          cells: row.slice(first + 1, first + 1 + groups),
          again: again ? (row[first + 1 + groups] ?? '') : null,
        }))
        .filter(({ head, cells }) => head !== '' || cells.some((text) => text !== '')),
    }));
  });
}

interface HeadPlace {
  /** Position of the head of the rows in its line, and how many groups stand beside it. */
  readonly first: number;
  readonly groups: number;
  /** True where the heads of rows stand at the right edge once more. */
  readonly again: boolean;
}

/** Columns of rows side by side in one line of heads; none where it is no such line. */
function headPlaces({ cells }: PdfLine, { rowHead, isNote }: AcrossHeads): readonly HeadPlace[] {
  const isRowHead = cells.map(({ text }) => squeezed(text) === squeezed(rowHead));
  const notes = cells.filter(({ text }) => isNote(squeezed(text)));
  if (isRowHead[0] !== true || notes.length * 2 < cells.length - isRowHead.filter(Boolean).length) return [];
  const again = isRowHead.length > 1 && isRowHead.at(-1) === true;
  const places: HeadPlace[] = [];
  let first = 0;
  while (first < cells.length) {
    const next = isRowHead.indexOf(true, first + 1);
    const end = next < 0 ? cells.length : next;
    if (end > first + 1) places.push({ first, groups: end - first - 1, again });
    first = again ? end + 1 : end;
  }
  return places;
}

/** The lines of a title above its note, which end at the same edge. */
function titleAbove(lines: readonly PdfLine[], at: number, note: PdfCell): string {
  const title: string[] = [];
  let below = note;
  for (let up = at - 1; up >= 0 && title.length < MOST_TITLE_LINES; up -= 1) {
    const cell = cellEndingAt(lines[up], note.right);
    const gap = (lines[up]?.baseline ?? 0) - below.baseline;
    if (gap > TITLE_LEADING * note.size) break;
    if (cell === null || gap < EDGE) continue;
    title.unshift(squeezed(cell.text));
    below = cell;
  }
  return title.join('');
}
