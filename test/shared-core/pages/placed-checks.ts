import { expect } from 'vitest';
import type { Block, PlacedPage, PlacedPages, TextLine } from '../../../shared-core/pages/booklet.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';

export function linesOn({ blocks }: PlacedPage): readonly TextLine[] {
  return blocks.filter((block): block is TextLine => block.kind === 'text');
}

export const textOf = ({ runs }: TextLine): string => runs.map(({ text }) => text).join('');

export function textsOf(placed: PlacedPages): readonly string[] {
  return placed.pages.flatMap((page) => linesOn(page).map(textOf));
}

/** Where a block draws, points from the left and the top of the page. */
export interface Ink {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

const widthOf = ({ runs, size }: TextLine): number =>
  runs.reduce((sum, { text, face }) => sum + textWidth(text, face, size), 0);

export function inkOf(block: Block): Ink {
  switch (block.kind) {
    case 'text': {
      const wide = widthOf(block);
      const left = block.align === 'left' ? block.x : block.x + block.width - wide;
      return {
        left,
        right: left + wide,
        top: block.baseline - 0.68 * block.size,
        bottom: block.baseline + 0.2 * block.size,
      };
    }
    case 'rule':
      return {
        left: block.x,
        right: block.x + block.width,
        top: block.y - block.weight / 2,
        bottom: block.y + block.weight / 2,
      };
    case 'picture':
      return { left: block.x, right: block.x + block.width, top: block.y, bottom: block.y + block.height };
    case 'table-column':
      throw new Error('pages of a class have no columns of a booklet');
  }
}

export function meet(one: Ink, other: Ink): boolean {
  const trace = 0.05;
  return (
    one.left < other.right - trace &&
    other.left < one.right - trace &&
    one.top < other.bottom - trace &&
    other.top < one.bottom - trace
  );
}

/** No line wider than its room, nothing over the margins, no text on another or on a picture. */
export function checkPages({ paper, pages }: PlacedPages, sideways = paper.margin): void {
  pages.forEach((page, index) => {
    expect(page.number).toBe(index + 1);
    const lines = linesOn(page);
    for (const line of lines) {
      const { left, right, top, bottom } = inkOf(line);
      expect(widthOf(line), textOf(line)).toBeLessThanOrEqual(line.width + 0.01);
      expect(left, textOf(line)).toBeGreaterThanOrEqual(sideways - 0.01);
      expect(right, textOf(line)).toBeLessThanOrEqual(paper.width - sideways + 0.01);
      expect(top).toBeGreaterThan(paper.margin / 3);
      expect(bottom).toBeLessThan(paper.height - paper.margin / 3);
    }
    const pictures = page.blocks.filter((block) => block.kind === 'picture');
    for (const { svg } of pictures) expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    const inks = [...lines, ...pictures].map(inkOf);
    for (const [place, ink] of inks.entries()) {
      const met = inks.findIndex((other, at) => at > place && meet(ink, other));
      const named = (at: number): string => (lines[at] === undefined ? 'a picture' : textOf(lines[at]));
      if (met >= 0) throw new Error(`page ${page.number}: ${named(place)} meets ${named(met)}`);
    }
  });
}
