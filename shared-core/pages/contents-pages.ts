import { openBlock, ownText } from './block-opening.ts';
import type { BlockBody, BlockContext } from './block-pages.ts';
import { layText, type Column } from './block-text.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { heightOf, linesOf, placeLines } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { textWidth } from './text-width.ts';
import { CONTENTS } from './type-sizes.ts';

/** A line of the contents. */
export interface ContentsEntry {
  readonly name: string;
  readonly page: number;
  /** A table stands under the heading of all tables. */
  readonly within: boolean;
}

const INDENT = 16;
const WIDEST = 390;
const WIDEST_PAGE = '9999';
const BEFORE_NUMBER = 14;
const ABOVE_HEADING = 3;

/** What is found on which page, in print order. The number of pages depends on the names alone. */
export function contentsPages(context: BlockContext, entries: readonly ContentsEntry[]): BlockBody {
  const flow = openBlock(context);
  layText(flow, 'own', ownText(context.block));
  const column = { x: flow.left, width: Math.min(flow.width, WIDEST) };
  entries.forEach((entry, index) => layEntry(flow, entry, index, column));
  return { pages: flow.pages, remarks: [] };
}

function layEntry(flow: SheetFlow, { name, page, within }: ContentsEntry, index: number, column: Column): void {
  const role = paragraph(`entry ${index}`);
  const indent = within ? INDENT : 0;
  const numbers = textWidth(WIDEST_PAGE, 'sans', CONTENTS.size);
  const width = column.width - indent - numbers - BEFORE_NUMBER;
  const lines = linesOf(name, 'sans', CONTENTS, width, role);
  const height = heightOf(lines, CONTENTS);
  if (!within) flow.skip(ABOVE_HEADING);
  flow.need(height);
  const last = { x: column.x + column.width - numbers, top: flow.y + height - CONTENTS.leading, width: numbers };
  flow.place(
    [
      ...placeLines(lines, CONTENTS, { x: column.x + indent, top: flow.y, width }),
      ...placeLines(linesOf(String(page), 'sans', CONTENTS, numbers, role), CONTENTS, { ...last, align: 'right' }),
    ],
    height,
  );
}
