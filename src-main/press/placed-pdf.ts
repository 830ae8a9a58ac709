import type { TDocumentDefinitions } from 'pdfmake/interfaces.js';
import type { Block, Picture, PlacedPages, Rule, TextLine } from '../../shared-core/pages/booklet.ts';
import { tableMarks } from '../../shared-core/pages/table-blocks.ts';
import { PICTURE_FONTS } from './fonts.ts';
import { producerName, programVersion } from '../program-version.ts';
import { housePrinter } from './house-printer.ts';
import { drawPicture, drawRule, drawText } from './page-drawing.ts';
import { packStructure } from './structure-packing.ts';
import { placeOf, StructureTree, type DrawnPart } from './structure-tree.ts';

export interface DrawnPdf {
  readonly pdf: Uint8Array;
  readonly pages: number;
  readonly remarks: readonly string[];
}

/**
 * Placed pages as a tagged PDF of version 1.7: pdfmake makes the document, and every placed mark is drawn into it under
 * its element of the structure tree. `day` is the moment that it carries as its own. The same pages and day give the same
 * bytes.
 */
export async function placedPdf(
  placed: PlacedPages,
  day: Date,
  onProgress: (share: number) => void = () => {},
): Promise<DrawnPdf> {
  const made = housePrinter(PICTURE_FONTS).createPdf(definition(placed, day));
  const document = await made.getStream();
  drawPages(document, placed, onProgress);
  const { start, count } = document.bufferedPageRange();
  if (start + count !== placed.pages.length) {
    throw new Error(`there are ${placed.pages.length} pages, but ${start + count} were drawn`);
  }
  return { pdf: packStructure(await made.getBuffer()), pages: start + count, remarks: placed.remarks };
}

/** The document with its first page, still white. */
function definition({ title, paper, language }: PlacedPages, day: Date): TDocumentDefinitions {
  return {
    version: '1.7',
    language,
    tagged: true,
    displayTitle: true,
    info: { title, creator: 'Normloom', producer: producerName(programVersion()), creationDate: day, modDate: day },
    pageSize: { width: paper.width, height: paper.height },
    pageMargins: 0,
    defaultStyle: { font: 'Source Sans 3' },
    content: [],
  };
}

function drawPages(
  document: PDFKit.PDFDocument,
  { paper, pages }: PlacedPages,
  onProgress: (share: number) => void,
): void {
  const tree = new StructureTree(document);
  const parts = pages.map(({ blocks }) => marksTogether(blocks.flatMap(marksOf)));
  const all = parts.reduce((sum, onPage) => sum + onPage.length, 0);
  let drawn = 0;
  numberPages(document);
  pages.forEach(({ number, opens }, index) => {
    if (number > 1) document.addPage({ size: [paper.width, paper.height] });
    if (opens !== null) {
      document.outline.addItem(opens);
      tree.openSheet(opens);
    }
    for (const { part, marks } of parts[index] ?? []) {
      tree.mark(part, () => {
        for (const mark of marks) drawMark(document, mark);
      });
      drawn += 1;
      onProgress(drawn / all);
    }
  });
  tree.closeSheet();
}

type Mark = TextLine | Rule | Picture;

function marksOf(block: Block): readonly Mark[] {
  return block.kind === 'table-column' ? tableMarks(block) : [block];
}

interface MarkedPart {
  readonly part: DrawnPart;
  readonly marks: readonly Mark[];
}

/** Marks that follow each other and belong to one part. */
function marksTogether(marks: readonly Mark[]): readonly MarkedPart[] {
  const parts: { readonly part: DrawnPart; readonly marks: Mark[] }[] = [];
  let before = '';
  for (const mark of marks) {
    const part = partOf(mark);
    const place = placeOf(part);
    if (place === before) parts.at(-1)?.marks.push(mark);
    else parts.push({ part, marks: [mark] });
    before = place;
  }
  return parts;
}

function partOf(mark: Mark): DrawnPart {
  return mark.kind === 'text' ? mark.role : mark;
}

function drawMark(document: PDFKit.PDFDocument, mark: Mark): void {
  switch (mark.kind) {
    case 'text':
      drawText(document, mark, spaceBehind(mark));
      return;
    case 'rule':
      drawRule(document, mark);
      return;
    case 'picture':
      drawPicture(document, mark);
      return;
  }
}

/** A line of prose or of a head ends in the space before the next word, unless its last word goes on in the next line. */
function spaceBehind({ role, runs }: TextLine): '' | ' ' {
  const goesOn = /[^ ][-–—/]$/.test(runs.at(-1)?.text ?? '');
  return (role.kind !== 'cell' || role.row === 'head') && !goesOn ? ' ' : '';
}

/** Pages carry their printed numbers as labels, which pdfkit has no call for. */
function numberPages(document: PDFKit.PDFDocument): void {
  const { _root } = document as PDFKit.PDFDocument & {
    readonly _root: { readonly data: Record<string, unknown> };
  };
  _root.data['PageLabels'] = { Nums: [0, { S: 'D' }] };
}
