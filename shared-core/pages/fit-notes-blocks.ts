import type { FitNotes } from './fit-notes.ts';
import { noteTableHeight, noteTableWidth, placeNoteTable, type NoteTable } from './note-table.ts';
import type { Paragraph } from './paragraph.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, paragraphLines, placeLines, type LooseLine } from './text-lines.ts';
import { CONTINUED, SMALL_PROSE } from './type-sizes.ts';

const TITLE = 'Technical notes on the smoothing';
const BELOW_TITLE = 5;
const BETWEEN_PARTS = 7;
/** Most room between two columns of figures where a table has the whole width. */
const WIDEST_TABLE = 300;

/** A table with the paragraphs that stand below it. */
interface Part {
  readonly table: NoteTable;
  readonly paragraphs: readonly Paragraph[];
}

/**
 * The technical notes: degrees and moments side by side with what is to be said of them, on one page where they fit on
 * any; otherwise one part after the other.
 */
export function layFitNotes(flow: SheetFlow, notes: FitNotes): void {
  const parts = partsOf(notes);
  const title = linesOf(TITLE, 'serif-bold', CONTINUED, flow.width);
  const titleHeight = heightOf(title, CONTINUED) + BELOW_TITLE;
  const columns = parts.map(({ table, paragraphs }) => {
    const lines = paragraphLines(paragraphs, SMALL_PROSE, flow.halfWidth);
    return { table, lines, height: noteTableHeight(table) + BETWEEN_PARTS + heightOf(lines, SMALL_PROSE) };
  });
  const height = titleHeight + Math.max(...columns.map((column) => column.height));
  const narrow = parts.every(({ table }) => noteTableWidth(table) <= flow.halfWidth);
  const placeTitle = (): void =>
    flow.place(placeLines(title, CONTINUED, { x: flow.left, top: flow.y, width: flow.width }), titleHeight);
  if (narrow && height <= flow.freshRoom) {
    flow.need(height);
    placeTitle();
    placeSideBySide(flow, columns, height - titleHeight);
    return;
  }
  const first = parts[0]?.table;
  flow.need(titleHeight + (first === undefined ? 0 : noteTableHeight(first)));
  placeTitle();
  for (const { table, paragraphs } of parts) placeInTurn(flow, table, paragraphs);
}

/** Without a table of degrees the moments stand alone on the left, what is said of them on the right. */
function partsOf({ degrees, aboutDegrees, moments, facts }: FitNotes): readonly Part[] {
  const second = { table: moments, paragraphs: facts };
  return degrees === null ? [second] : [{ table: degrees, paragraphs: aboutDegrees }, second];
}

function placeSideBySide(
  flow: SheetFlow,
  columns: readonly { readonly table: NoteTable; readonly lines: readonly LooseLine[] }[],
  height: number,
): void {
  const top = flow.y;
  const [width, edges] = [flow.halfWidth, [flow.left, flow.rightHalf]];
  const alone = columns.length === 1;
  const blocks = columns.flatMap(({ table, lines }, index) => {
    const x = edges[index] ?? flow.left;
    const textPlace = alone
      ? { x: flow.rightHalf, top, width }
      : { x, top: top + noteTableHeight(table) + BETWEEN_PARTS, width };
    return [...placeNoteTable(table, { x, top, width }), ...placeLines(lines, SMALL_PROSE, textPlace)];
  });
  flow.place(blocks, height);
}

function placeInTurn(flow: SheetFlow, table: NoteTable, paragraphs: readonly Paragraph[]): void {
  const height = noteTableHeight(table);
  flow.need(height);
  const width = Math.min(flow.width, Math.max(noteTableWidth(table), WIDEST_TABLE));
  flow.place(placeNoteTable(table, { x: flow.left, top: flow.y, width }), height + BETWEEN_PARTS);
  flow.inTwoColumns(paragraphLines(paragraphs, SMALL_PROSE, flow.halfWidth), SMALL_PROSE);
  flow.skip(BETWEEN_PARTS);
}
