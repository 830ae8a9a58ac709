import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces.js';
import type { NormSet } from '../../shared-core/norms/norm-set.ts';
import type { Block, Booklet, BookletPage, Rule, TextLine } from '../../shared-core/pages/booklet.ts';
import { composeBooklet } from '../../shared-core/pages/booklet-pages.ts';
import { PRINTED_COLOURS } from '../../shared-core/pages/ogive-picture.ts';
import { tableMarks } from '../../shared-core/pages/table-blocks.ts';
import { ascentOf } from '../../shared-core/pages/text-width.ts';
import { FONT_STYLES } from './fonts.ts';
import { housePrinter } from './house-printer.ts';
import { releaseDay } from './release-day.ts';

export interface DrawnBooklet {
  readonly pdf: Uint8Array;
  readonly pages: number;
  readonly remarks: readonly string[];
}

/** The booklet of a set as a PDF of version 1.7. The same set gives the same bytes. */
export async function bookletPdf(
  normSet: NormSet,
  onProgress: (share: number) => void = () => {},
): Promise<DrawnBooklet> {
  const booklet = composeBooklet(normSet);
  const printer = housePrinter(onProgress);
  // Kept pages can still be counted before they are written.
  const document = printer.createPdf(definition(booklet, releaseDay(normSet.project)), { bufferPages: true });
  const drawn = (await document.getStream()).bufferedPageRange().count;
  if (drawn !== booklet.pages.length) {
    throw new Error(`the booklet has ${booklet.pages.length} pages, but ${drawn} were drawn`);
  }
  return { pdf: new Uint8Array(await document.getBuffer()), pages: drawn, remarks: booklet.remarks };
}

function definition(booklet: Booklet, day: Date): TDocumentDefinitions {
  return {
    version: '1.7',
    language: 'en',
    displayTitle: true,
    info: { title: booklet.title, creator: 'Normloom', producer: 'Normloom', creationDate: day, modDate: day },
    pageSize: { width: booklet.paper.width, height: booklet.paper.height },
    pageMargins: 0,
    defaultStyle: { font: 'Source Sans 3', fontSize: 8 },
    content: booklet.pages.map(drawPage),
  };
}

function drawPage(page: BookletPage): Content {
  const stack: Content[] = page.blocks.flatMap(drawBlock);
  // The outline needs a line of text to hang on; this one has no width and stands at the top of the page.
  const anchor: Content =
    page.opens === null
      ? { text: '', fontSize: 1 }
      : { text: '\u200b', fontSize: 1, outline: true, outlineText: page.opens, absolutePosition: { x: 0, y: 0 } };
  return { stack: [anchor, ...stack], ...(page.number === 1 ? {} : { pageBreak: 'before' as const }) };
}

function drawBlock(block: Block): Content[] {
  switch (block.kind) {
    case 'text':
      return [drawText(block)];
    case 'rule':
      return [drawRule(block)];
    case 'table-column':
      return tableMarks(block).map((mark) => (mark.kind === 'text' ? drawText(mark) : drawRule(mark)));
    case 'picture':
      return [
        {
          svg: block.svg,
          width: block.width,
          height: block.height,
          absolutePosition: { x: block.x, y: block.y },
        },
      ];
  }
}

function drawText({ x, baseline, width, align, size, colour, runs }: TextLine): Content {
  const ascent = Math.max(...runs.map(({ face }) => ascentOf(face, size)), 0);
  return {
    absolutePosition: { x, y: baseline - ascent },
    columns: [
      {
        width,
        alignment: align,
        noWrap: true,
        fontSize: size,
        color: PRINTED_COLOURS[colour],
        text: runs.map(({ text, face }) => ({ text, ...FONT_STYLES[face] })),
      },
    ],
  };
}

function drawRule({ x, y, width, weight }: Rule): Content {
  return {
    absolutePosition: { x, y },
    canvas: [{ type: 'line', x1: 0, y1: 0, x2: width, y2: 0, lineWidth: weight, lineColor: PRINTED_COLOURS.ink }],
  };
}
