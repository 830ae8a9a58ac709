import { type PrintWords, say } from '../languages/phrases.ts';
import type { PlannedPart } from './booklet-parts.ts';
import type { PageFrame } from './page-frame.ts';
import { linesOf, placeLines } from './text-lines.ts';
import { REPEATED } from './text-role.ts';
import { READING } from './type-sizes.ts';

/** Pages of one sheet of paper that is folded once. */
const ON_A_SHEET = 4;

/**
 * The parts with blank pages that bring `pages`, their number, to a multiple of four: at the end, or before a colophon
 * that stands at the end, which so becomes the back page.
 */
export function filledToFours(
  parts: readonly PlannedPart[],
  pages: number,
  frame: PageFrame,
  words: PrintWords,
): readonly PlannedPart[] {
  const missing = (ON_A_SHEET - (pages % ON_A_SHEET)) % ON_A_SHEET;
  if (missing === 0) return parts;
  const last = parts.at(-1)?.block === 'colophon' ? parts.length - 1 : parts.length;
  const lines = linesOf(say(words, 'block.blank'), 'serif-italic', READING, frame.width, REPEATED);
  const blank = placeLines(lines, READING, { x: frame.left, top: frame.top, width: frame.width, colour: 'soft' });
  const blanks: PlannedPart = {
    block: null,
    group: null,
    name: null,
    under: null,
    frame,
    pages: Array.from({ length: missing }, () => blank),
  };
  return [...parts.slice(0, last), blanks, ...parts.slice(last)];
}
