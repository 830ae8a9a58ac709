import { type PrintWords, say } from '../languages/phrases.ts';
import { measureAcross, type AcrossMeasure, type AcrossPart } from './across-measure.ts';
import { acrossRows, type AcrossTable } from './across-table.ts';
import type { BlockContext } from './block-pages.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { tableHeight } from './table-blocks.ts';
import { heightOfCaption, layTable, type TableCaption } from './table-pages.ts';
import { rowHeightRemark } from './table-type.ts';
import { paragraph } from './text-role.ts';
import { PROSE } from './type-sizes.ts';

const BETWEEN_PARTS = 20;

/**
 * A table with the groups across, over as many pages and in as many parts as it takes. One that is too deep for what is
 * left of the page, and narrow enough, stands in columns of rows side by side. Returns what could not be set as asked.
 */
export function layAcross(flow: SheetFlow, context: BlockContext, table: AcrossTable): readonly string[] {
  const { words, heading } = context;
  const { sheet } = context.normSet.project;
  const heightOf = ({ span, measure }: AcrossPart): number => tableHeight(acrossRows(table, span, sheet), measure);
  const { parts, shortened } = inColumns(table, context, flow, heightOf);
  parts.forEach((part, index) => {
    const caption = parts.length === 1 ? null : captionOf(part, table.groups.length, words);
    if (index > 0) {
      flow.skip(BETWEEN_PARTS);
      flow.need(Math.min(heightOfCaption(caption, flow.width) + heightOf(part), flow.freshRoom));
    }
    layTable(flow, table.table, acrossRows(table, part.span, sheet), part.measure, caption);
  });
  const height = rowHeightRemark(sheet);
  return [
    ...(height === null ? [] : [height]),
    ...(shortened ? [`Titles of groups are too long for “${heading}” and end in “…”. Shorten them.`] : []),
  ];
}

/** "Groups 1 to 8 of 12". */
function captionOf({ span: { first, count } }: AcrossPart, groups: number, words: PrintWords): TableCaption {
  const part = { first: String(first + 1), last: String(first + count), all: String(groups) };
  const text = say(words, count === 1 ? 'across.part-of-one' : 'across.part', part);
  return { text, face: 'sans', type: PROSE, role: paragraph(text) };
}

function inColumns(
  table: AcrossTable,
  { normSet }: BlockContext,
  flow: SheetFlow,
  heightOf: (part: AcrossPart) => number,
): AcrossMeasure {
  const { sheet } = normSet.project;
  const alone = measureAcross(table, sheet, flow.width, 1);
  if (alone === null) throw new RangeError('one column of rows always fits');
  const [first, ...further] = alone.parts;
  if (first === undefined || further.length > 0 || heightOf(first) <= flow.room) return alone;
  for (const columns of [4, 3, 2]) {
    const side = columns > sheet.tableColumns ? null : measureAcross(table, sheet, flow.width, columns);
    if (side !== null) return side;
  }
  return alone;
}
