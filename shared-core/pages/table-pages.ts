import type { SheetFlow } from './sheet-flow.ts';
import { placeTable, rowMeasure, tableOverhead } from './table-blocks.ts';
import type { ColumnTable } from './booklet.ts';
import type { TableMeasure } from './table-measure.ts';
import { columnHeight, fillColumns, type Five } from './table-rows.ts';

/** A table begins on a page only where this many of its rows find room. */
const LEAST_ROWS = 5;

/**
 * A table over as many pages as it takes, its heads above every column of rows. `again` where the same table has printed
 * its heads before.
 */
export function layTable(
  flow: SheetFlow,
  table: ColumnTable,
  blocks: readonly Five[],
  measure: TableMeasure,
  again = false,
): void {
  const rows = rowMeasure(measure);
  const overhead = tableOverhead(measure);
  const count = blocks.reduce((sum, five) => sum + five.length, 0);
  let rest = blocks;
  while (rest.length > 0) {
    const first = rest[0] ?? [];
    flow.need(overhead + Math.max(columnHeight([first], rows), Math.min(LEAST_ROWS, count) * rows.pitch));
    const page = fillColumns(rest, measure.columns, flow.room - overhead, rows);
    const { blocks: placed, height } = placeTable(table, page.columns, measure, {
      x: flow.left,
      top: flow.y,
      continued: again || rest !== blocks,
    });
    flow.place(placed, height);
    rest = page.rest;
    if (rest.length > 0) flow.turn();
  }
}
