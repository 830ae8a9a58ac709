import { say, type PrintWords } from '../languages/phrases.ts';
import type { FitNotes } from './fit-notes.ts';
import { noteTableHeight, noteTableWidth, placeNoteTable, type NoteTable } from './note-table.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, paragraphLines, placeLines } from './text-lines.ts';
import { CONTINUED, SMALL_PROSE } from './type-sizes.ts';

const BELOW_TITLE = 5;
const BETWEEN_PARTS = 7;
/** Width of a table that has the whole page, in points, where it needs no more. */
const WIDEST_TABLE = 300;

/**
 * The technical notes: the first table on the left, what else there is on the right, on one page where they fit on any;
 * otherwise one part below the other.
 */
export function layFitNotes(flow: SheetFlow, { degrees, moments, paragraphs }: FitNotes, words: PrintWords): void {
  const [first, second] = degrees === null ? [moments, null] : [degrees, moments];
  const lines = paragraphLines(paragraphs, SMALL_PROSE, flow.halfWidth, 'technical notes');
  const title = linesOf(say(words, 'fit.title'), 'serif-bold', CONTINUED, flow.width, {
    kind: 'heading',
    level: 2,
    name: 'technical title',
  });
  const titleHeight = heightOf(title, CONTINUED) + BELOW_TITLE;
  const aboveLines = second === null ? 0 : noteTableHeight(second) + BETWEEN_PARTS;
  const height = Math.max(noteTableHeight(first), aboveLines + heightOf(lines, SMALL_PROSE));
  const placeTitle = (): void =>
    flow.place(placeLines(title, CONTINUED, { x: flow.left, top: flow.y, width: flow.width }), titleHeight);
  const narrow = [first, moments].every((table) => noteTableWidth(table) <= flow.halfWidth);
  if (!narrow || titleHeight + height > flow.freshRoom) {
    flow.need(titleHeight + noteTableHeight(first));
    placeTitle();
    for (const table of second === null ? [first] : [first, second]) placeAlone(flow, table, words);
    flow.inTwoColumns(lines, SMALL_PROSE);
    return;
  }
  flow.need(titleHeight + height);
  placeTitle();
  const [top, width] = [flow.y, flow.halfWidth];
  flow.place(
    [
      ...placeNoteTable(first, { x: flow.left, top, width }, words),
      ...(second === null ? [] : placeNoteTable(second, { x: flow.rightHalf, top, width }, words)),
      ...placeLines(lines, SMALL_PROSE, { x: flow.rightHalf, top: top + aboveLines, width }),
    ],
    height,
  );
}

function placeAlone(flow: SheetFlow, table: NoteTable, words: PrintWords): void {
  const height = noteTableHeight(table);
  flow.need(height);
  const width = Math.min(flow.width, Math.max(noteTableWidth(table), WIDEST_TABLE));
  flow.place(placeNoteTable(table, { x: flow.left, top: flow.y, width }, words), height + BETWEEN_PARTS);
}
