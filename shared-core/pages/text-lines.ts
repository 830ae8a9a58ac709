import type { Colour, TextLine, TextRun } from './booklet.ts';
import { breakLines, type ProseLine } from './prose.ts';
import type { Paragraph } from './paragraph.ts';
import { paragraph, type TextRole } from './text-role.ts';
import type { FontFace } from './text-width.ts';
import { PARAGRAPH_GAP, type TypeSize } from './type-sizes.ts';

/** A line of prose that has yet to be placed. */
export interface LooseLine {
  readonly runs: ProseLine;
  /** Extra room above it, where it does not stand at the top. */
  readonly before: number;
  readonly role: TextRole;
}

/** One text of one face, broken to a width. */
export function linesOf(
  text: string,
  face: FontFace,
  { size }: TypeSize,
  width: number,
  role: TextRole,
): readonly LooseLine[] {
  return breakLines([{ text, face }], size, width).map((runs) => ({ runs, before: 0, role }));
}

/** Paragraphs of one face under a name of their own, broken to a width; those without text are left out. */
export function plainParagraphs(
  texts: readonly string[],
  face: FontFace,
  type: TypeSize,
  width: number,
  name: string,
): readonly LooseLine[] {
  return texts
    .map((text, index) => linesOf(text, face, type, width, paragraph(`${name} ${index}`)))
    .filter((lines) => lines.length > 0)
    .flatMap((lines, index) =>
      lines.map((line, place) => ({ ...line, before: place === 0 && index > 0 ? PARAGRAPH_GAP : 0 })),
    );
}

/** Paragraphs with bold leads under a name of their own, broken to a width. */
export function paragraphLines(
  paragraphs: readonly Paragraph[],
  type: TypeSize,
  width: number,
  name: string,
): readonly LooseLine[] {
  return paragraphs.flatMap(({ lead, text }, index) => {
    const runs: readonly TextRun[] = [
      { text: `${lead} `, face: 'sans-bold' },
      { text, face: 'sans' },
    ];
    return breakLines(runs, type.size, width).map((line, place) => ({
      runs: line,
      before: place === 0 && index > 0 ? PARAGRAPH_GAP : 0,
      role: paragraph(`${name} ${index}`),
    }));
  });
}

/** Height of lines set one below the other, in points. */
export function heightOf(lines: readonly LooseLine[], { leading }: TypeSize): number {
  return lines.reduce((sum, { before }, index) => sum + leading + (index === 0 ? 0 : before), 0);
}

/** How many of the lines stand in a height. */
export function countThatFits(lines: readonly LooseLine[], type: TypeSize, height: number): number {
  let count = 0;
  while (count < lines.length && heightOf(lines.slice(0, count + 1), type) <= height) count += 1;
  return count;
}

export interface Place {
  readonly x: number;
  readonly top: number;
  readonly width: number;
  readonly align?: 'left' | 'right';
  readonly colour?: Colour;
}

/** Share of the leading that stands above the baseline. */
const ABOVE_BASELINE = 0.76;

/** Lines set one below the other. */
export function placeLines(lines: readonly LooseLine[], type: TypeSize, place: Place): readonly TextLine[] {
  let { top } = place;
  return lines.map(({ runs, before, role }, index) => {
    if (index > 0) top += before;
    const baseline = top + type.leading * ABOVE_BASELINE;
    top += type.leading;
    return {
      kind: 'text',
      x: place.x,
      baseline,
      width: place.width,
      align: place.align ?? 'left',
      size: type.size,
      colour: place.colour ?? 'ink',
      runs,
      role,
    };
  });
}
