import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, placeLines, type LooseLine } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { SMALL_PROSE } from './type-sizes.ts';

const ABOVE_NOTE = 5;
/** A note of more lines is set in two columns, which the eye follows more easily. */
const MOST_LINES_ACROSS = 3;

/** A note under a table, about its marks; nothing for null. The name is unique on the sheet. */
export function layTableNote(flow: SheetFlow, name: string, note: string | null): void {
  if (note === null) return;
  flow.skip(ABOVE_NOTE);
  const linesIn = (width: number): readonly LooseLine[] => linesOf(note, 'sans', SMALL_PROSE, width, paragraph(name));
  const across = linesIn(flow.width);
  if (across.length > MOST_LINES_ACROSS) {
    flow.inTwoColumns(linesIn(flow.halfWidth), SMALL_PROSE);
    return;
  }
  const height = heightOf(across, SMALL_PROSE);
  flow.need(height);
  flow.place(placeLines(across, SMALL_PROSE, { x: flow.left, top: flow.y, width: flow.width }), height);
}
