import type { Booklet } from '../../../shared-core/pages/booklet.ts';
import type { CellComparison, CellPlace } from './cell-differences.ts';
import { pairedPages } from './paired-pages.ts';
import { placedTexts, readTexts, type PageText } from './page-texts.ts';
import type { PdfPages } from './pdf-text.ts';
import { squeezed } from './read-text.ts';

/** Texts whose baselines lie within so many points of each other stand in one line. */
const SAME_LINE = 1;

/**
 * Compares every line of text of every page with the same booklet placed anew: line by line from the top, in a line from
 * left to right, spaces left aside. A page that is missing, or one too many, is told by its first line.
 */
export function comparePages(comparison: CellComparison, booklet: Booklet, pages: PdfPages): void {
  const placed = booklet.pages.map((page) => placedTexts(page, booklet.paper));
  const read = pages.map(readTexts);
  for (const { expected, found } of pairedPages(placed.map(signature), read.map(signature))) {
    if (found === null) {
      comparison.compareLine(placeOf('no page', `page ${(expected ?? 0) + 1}`), firstLine(placed[expected ?? 0]), '');
    } else if (expected === null) {
      comparison.compareLine(placeOf(`page ${found + 1}`, 'page'), '', firstLine(read[found]));
    } else {
      const place = placeOf(`page ${found + 1}`, 'line');
      for (const line of linesTogether(placed[expected] ?? [], read[found] ?? [])) {
        comparison.compareLine(place, line.expected, line.found);
      }
    }
  }
}

function placeOf(where: string, column: string): CellPlace {
  return { where, group: '', score: '', column };
}

/** The same for pages of the same characters, wherever these stand. */
function signature(texts: readonly PageText[]): string {
  return [...squeezed(texts.map(({ text }) => text).join(''))].sort().join('');
}

function firstLine(texts: readonly PageText[] = []): string {
  return linesTogether(texts, [])[0]?.expected ?? 'a blank page';
}

/** The lines of a page as they should be and as they are, from the top. */
function linesTogether(
  placed: readonly PageText[],
  read: readonly PageText[],
): readonly { readonly expected: string; readonly found: string }[] {
  const all = [
    ...placed.map((text) => ({ ...text, expected: true })),
    ...read.map((text) => ({ ...text, expected: false })),
  ].sort((left, right) => right.baseline - left.baseline);
  const lines: (typeof all)[] = [];
  all.forEach((text, index) => {
    const above = all[index - 1];
    if (above !== undefined && above.baseline - text.baseline < SAME_LINE) lines.at(-1)?.push(text);
    else lines.push([text]);
  });
  return lines.map((line) => {
    const inOrder = line.toSorted((left, right) => left.left - right.left);
    const textOf = (expected: boolean): string =>
      inOrder
        .filter((text) => text.expected === expected)
        .map(({ text }) => text)
        .join(' ');
    return { expected: textOf(true), found: textOf(false) };
  });
}
