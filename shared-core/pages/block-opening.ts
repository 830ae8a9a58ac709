import type { BookletBlock } from '../norms/booklet-blocks.ts';
import type { BlockContext } from './block-pages.ts';
import { say } from './block-words.ts';
import { firstLines } from './prose.ts';
import { SheetFlow } from './sheet-flow.ts';
import { heightOf, placeLines, type LooseLine } from './text-lines.ts';
import { REPEATED, type TextRole } from './text-role.ts';
import { CONTINUED, TITLE, type TypeSize } from './type-sizes.ts';

const MOST_HEADING_LINES = 6;
const MOST_CONTINUED_LINES = 2;
const BELOW_HEADING = 13;
const BELOW_CONTINUED = 10;

/** The first page of a block with its heading on it; further pages repeat the heading. */
export function openBlock({ heading, frame, words }: BlockContext): SheetFlow {
  const continued = headingLines(say(words, 'block.continued', { heading }), CONTINUED, frame.width, REPEATED);
  const flow = new SheetFlow(frame, (top) => ({
    blocks: placeLines(continued, CONTINUED, { x: frame.left, top, width: frame.width }),
    bottom: top + heightOf(continued, CONTINUED) + BELOW_CONTINUED,
  }));
  const lines = headingLines(heading, TITLE, frame.width, { kind: 'heading', level: 1, name: 'title' });
  flow.place(
    placeLines(lines, TITLE, { x: flow.left, top: flow.y, width: flow.width }),
    heightOf(lines, TITLE) + BELOW_HEADING,
  );
  return flow;
}

function headingLines(text: string, { size }: TypeSize, width: number, role: TextRole): readonly LooseLine[] {
  const most = role === REPEATED ? MOST_CONTINUED_LINES : MOST_HEADING_LINES;
  return firstLines([{ text, face: 'serif-bold' }], size, width, most).lines.map((runs) => ({ runs, before: 0, role }));
}

/** The paragraphs that the user wrote for a block; none where the standing text is meant. */
export function ownText({ text }: BookletBlock): readonly string[] {
  return text.split(/\r\n|\r|\n/).filter((line) => line.trim() !== '');
}
