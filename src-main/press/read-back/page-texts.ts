import type { Booklet, BookletPage, Picture, TextLine } from '../../../shared-core/pages/booklet.ts';
import { tableMarks } from '../../../shared-core/pages/table-blocks.ts';
import { textWidth } from '../../../shared-core/pages/text-width.ts';
import type { PdfLine } from './pdf-text.ts';

/** A text on a page; points from the left and from the bottom of the paper. */
export interface PageText {
  readonly text: string;
  readonly left: number;
  readonly baseline: number;
}

/** Every text that a placed page says, its pictures among them. */
export function placedTexts({ blocks }: BookletPage, { height }: Booklet['paper']): readonly PageText[] {
  return blocks.flatMap((block): readonly PageText[] => {
    switch (block.kind) {
      case 'text':
        return [lineText(block, height)];
      case 'table-column':
        return tableMarks(block).flatMap((mark) => (mark.kind === 'text' ? [lineText(mark, height)] : []));
      case 'picture':
        return pictureTexts(block, height);
      case 'rule':
        return [];
    }
  });
}

/** Every text that was read on a page. */
export function readTexts(lines: readonly PdfLine[]): readonly PageText[] {
  return lines.flatMap(({ cells }) => cells);
}

function lineText({ x, baseline, width, align, size, runs }: TextLine, height: number): PageText {
  const wide = runs.reduce((sum, { text, face }) => sum + textWidth(text, face, size), 0);
  const text = runs.map((run) => run.text).join('');
  return { text, left: align === 'left' ? x : x + width - wide, baseline: height - baseline };
}

const TEXT_ELEMENT = /<text ([^>]*)>([^<]*)<\/text>/g;

/** The words of a picture as it is drawn; those that are turned are read by nobody. */
function pictureTexts({ x, y, svg }: Picture, height: number): readonly PageText[] {
  return [...svg.matchAll(TEXT_ELEMENT)].flatMap(([, attributes = '', content = '']) => {
    if (attributes.includes('rotate')) return [];
    const [left, baseline] = [Number(attributeOf(attributes, 'x')), Number(attributeOf(attributes, 'y'))];
    const text = plainText(content);
    const wide = textWidth(text, 'sans', Number(attributeOf(attributes, 'font-size')));
    const anchor = attributeOf(attributes, 'text-anchor');
    const before = anchor === 'end' ? wide : anchor === 'middle' ? wide / 2 : 0;
    return [{ text, left: x + left - before, baseline: height - y - baseline }];
  });
}

function attributeOf(attributes: string, name: string): string {
  return new RegExp(`(?:^| )${name}="([^"]*)"`).exec(attributes)?.[1] ?? '';
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&lt;': '<',
  '&gt;': '>',
  '&quot;': '"',
  '&#39;': "'",
  '&amp;': '&',
};

function plainText(content: string): string {
  return content.replace(/&(?:lt|gt|quot|#39|amp);/g, (entity) => ENTITIES[entity] ?? entity);
}
