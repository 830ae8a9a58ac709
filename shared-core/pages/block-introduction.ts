import { ownText } from './block-opening.ts';
import type { BlockContext } from './block-pages.ts';
import { layLines } from './block-text.ts';
import type { SheetFlow } from './sheet-flow.ts';
import { sheetSubtitle } from './sheet-texts.ts';
import { linesOf, plainParagraphs } from './text-lines.ts';
import { paragraph } from './text-role.ts';
import { PROSE, SUBTITLE } from './type-sizes.ts';

const WIDEST_TEXT = 390;
const ABOVE_TEXT = 5;
const BELOW_TEXT = 11;

/** Above a table of all groups: what its ranks count, and how it is read, in the user's words where there are any. */
export function layIntroduction(flow: SheetFlow, { normSet, block }: BlockContext, standing: string): void {
  const across = { x: flow.left, width: flow.width };
  const narrow = { x: flow.left, width: Math.min(flow.width, WIDEST_TEXT) };
  const own = ownText(block);
  const subtitle = sheetSubtitle(normSet.project);
  layLines(flow, linesOf(subtitle, 'serif-italic', SUBTITLE, across.width, paragraph('subtitle')), SUBTITLE, across);
  flow.skip(ABOVE_TEXT);
  const texts = own.length > 0 ? own : [standing];
  layLines(flow, plainParagraphs(texts, 'sans', PROSE, narrow.width, 'how to read'), PROSE, narrow);
  flow.skip(BELOW_TEXT);
}
