import { FONT_WIDTHS } from './font-widths.ts';

export type FontFace = keyof typeof FONT_WIDTHS;

/** A character the typefaces lack is drawn as a box of about this width, in thousandths of the type size. */
const MISSING_WIDTH = 1000;

const widthsByFace: Readonly<Record<FontFace, ReadonlyMap<number, number>>> = {
  sans: widthsOf('sans'),
  'sans-bold': widthsOf('sans-bold'),
  'serif-bold': widthsOf('serif-bold'),
  'serif-italic': widthsOf('serif-italic'),
};

function widthsOf(face: FontFace): ReadonlyMap<number, number> {
  const widths = new Map<number, number>();
  for (const [start, row] of Object.entries<string>(FONT_WIDTHS[face].rows)) {
    row.split(' ').forEach((width, index) => {
      if (width !== '-') widths.set(Number(start) + index, Number(width));
    });
  }
  return widths;
}

/**
 * Width of a text in points: the sum of its advance widths. Kerning, which draws letters together, is left out, so the
 * text as drawn needs at most a trace more and mostly less.
 */
export function textWidth(text: string, face: FontFace, size: number): number {
  const widths = widthsByFace[face];
  let sum = 0;
  for (const character of text) sum += widths.get(character.codePointAt(0) ?? 0) ?? MISSING_WIDTH;
  return (sum * size) / 1000;
}

/** Characters of a text that a typeface cannot draw, each once. */
export function missingCharacters(text: string, face: FontFace): readonly string[] {
  const widths = widthsByFace[face];
  return [...new Set(text)].filter((character) => !/\s/.test(character) && !widths.has(character.codePointAt(0) ?? 0));
}
