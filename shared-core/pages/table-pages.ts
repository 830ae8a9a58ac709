import type { ColumnTable } from './booklet.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { placeTable, rowMeasure, tableOverhead } from './table-blocks.ts';
import type { TableMeasure } from './table-measure.ts';
import { columnHeight, fillColumns, type Five } from './table-rows.ts';
import { heightOf, linesOf, placeLines, type LooseLine } from './text-lines.ts';
import { REPEATED, type ProseRole, type TextRole } from './text-role.ts';
import type { FontFace } from './text-width.ts';
import type { TypeSize } from './type-sizes.ts';

/** Words above a table, printed again on its further pages. */
export interface TableCaption {
  readonly text: string;
  readonly face: FontFace;
  readonly type: TypeSize;
  readonly role: ProseRole;
}

/** A table begins on a page only where this many of its rows find room. */
const LEAST_ROWS = 5;
const BELOW_CAPTION = 3;

/** A table over as many pages as it takes, with its heads above every column of rows. */
export function layTable(
  flow: SheetFlow,
  table: ColumnTable,
  blocks: readonly Five[],
  measure: TableMeasure,
  caption: TableCaption | null = null,
): void {
  const rows = rowMeasure(measure);
  const captionHeight = heightOfCaption(caption, flow.width);
  const overhead = captionHeight + tableOverhead(measure);
  const count = blocks.reduce((sum, five) => sum + five.length, 0);
  let rest = blocks;
  while (rest.length > 0) {
    const continued = rest !== blocks;
    const first = rest[0] ?? [];
    flow.need(overhead + Math.max(columnHeight([first], rows), Math.min(LEAST_ROWS, count) * rows.pitch));
    const page = fillColumns(rest, measure.columns, flow.room - overhead, rows);
    placeCaption(flow, caption, continued, captionHeight);
    const { blocks: placed, height } = placeTable(table, page.columns, measure, {
      x: flow.left,
      top: flow.y,
      continued,
    });
    flow.place(placed, height);
    rest = page.rest;
    if (rest.length > 0) flow.turn();
  }
}

/** Height of a caption with the room below it, in points; 0 for none. */
export function heightOfCaption(caption: TableCaption | null, width: number): number {
  return caption === null ? 0 : heightOf(captionLines(caption, width, caption.role), caption.type) + BELOW_CAPTION;
}

function captionLines({ text, face, type }: TableCaption, width: number, role: TextRole): readonly LooseLine[] {
  return linesOf(text, face, type, width, role);
}

function placeCaption(flow: SheetFlow, caption: TableCaption | null, continued: boolean, height: number): void {
  if (caption === null) return;
  const lines = captionLines(caption, flow.width, continued ? REPEATED : caption.role);
  flow.place(placeLines(lines, caption.type, { x: flow.left, top: flow.y, width: flow.width }), height);
}
